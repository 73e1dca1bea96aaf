import { z } from 'zod';
import { operation } from '../operation';
import { Id, ListQuery, pageOf } from '../schemas/common';
import { ProposalComparison } from '../schemas/compare';
import { ProposalMerge } from '../schemas/merge';
import {
  DeskItem,
  GiveOverride,
  GiveReason,
  Proposal,
  ProposalSummary,
  SaveProposal,
  SavedProposal,
} from '../schemas/proposals';

const OfProposal = z.object({ id: Id });

export const listMyProposals = operation({
  id: 'listMyProposals',
  method: 'get',
  path: '/proposals',
  area: 'Proposals',
  summary: 'My proposals, open ones first',
  query: ListQuery,
  reply: pageOf(ProposalSummary),
});

export const readProposal = operation({
  id: 'readProposal',
  method: 'get',
  path: '/proposals/{id}',
  area: 'Proposals',
  summary: 'A proposal, what was said of it and what I may do with it',
  params: OfProposal,
  reply: Proposal,
  tag: 'version',
});

export const saveProposal = operation({
  id: 'saveProposal',
  method: 'put',
  path: '/proposals/{id}',
  area: 'Proposals',
  summary: 'Save the text, the reason or the base of my draft',
  description:
    'A text with faults is kept as it was typed and answered with where they are. 409 where the draft was saved elsewhere meanwhile: its version stands in the problem, and nothing is overwritten. 428 without If-Match.',
  params: OfProposal,
  body: SaveProposal,
  reply: SavedProposal,
  tag: 'version',
  ifMatch: 'required',
  refuses: [409],
});

export const discardDraft = operation({
  id: 'discardDraft',
  method: 'delete',
  path: '/proposals/{id}',
  area: 'Proposals',
  summary: 'Throw away my draft, before it was ever proposed',
  params: OfProposal,
  ifMatch: 'accepted',
  refuses: [409],
});

const act = <B extends z.ZodTypeAny = z.ZodUndefined>(
  id: string,
  verb: string,
  area: 'Proposals' | 'Review',
  summary: string,
  body?: B,
) =>
  operation({
    id,
    method: 'post',
    path: `/proposals/{id}/${verb}`,
    area,
    summary,
    params: OfProposal,
    ...(body ? { body } : {}),
    reply: Proposal,
    tag: 'version',
    ifMatch: 'accepted',
    refuses: [409, 422],
  });

export const submitProposal = act('submitProposal', 'submit', 'Proposals', 'Send my draft to be reviewed');
export const returnProposal = act(
  'returnProposal',
  'return',
  'Review',
  'Return it to its author, with reasons',
  GiveReason,
);
export const declineProposal = act(
  'declineProposal',
  'decline',
  'Review',
  'Decline it for good, with a reason',
  GiveReason,
);
export const agreeToProposal = act('agreeToProposal', 'agree', 'Review', 'Agree to the text as it stands');
export const overrideClampCheck = act(
  'overrideClampCheck',
  'overrides',
  'Review',
  'Override the failed clamp check of one torque, with a reason that stays in the history of the sheet',
  GiveOverride,
);
export const publishProposal = act(
  'publishProposal',
  'publish',
  'Review',
  'Publish it: it gets the next letter and is the sheet to work from at once',
);

export const compareProposal = operation({
  id: 'compareProposal',
  method: 'get',
  path: '/proposals/{id}/compare',
  area: 'Review',
  summary: 'What the proposal changes against its base',
  params: OfProposal,
  reply: ProposalComparison,
  refuses: [422],
});

export const mergeProposal = operation({
  id: 'mergeProposal',
  method: 'get',
  path: '/proposals/{id}/merge',
  area: 'Proposals',
  summary: 'My draft brought together with what was published since it was begun',
  description:
    'Changes nothing. Save the merged text with `base` set to `to` to bring the draft up to date. 403 for anybody but its author, 422 where the draft cannot be read yet.',
  params: OfProposal,
  reply: ProposalMerge,
  refuses: [409, 422],
});

export const readDesk = operation({
  id: 'readDesk',
  method: 'get',
  path: '/review-desk',
  area: 'Review',
  summary: 'What waits for me, worst first',
  query: ListQuery,
  reply: pageOf(DeskItem),
});
