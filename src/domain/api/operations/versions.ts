import { z } from 'zod';
import { operation } from '../operation';
import { Id, ListQuery, pageOf } from '../schemas/common';
import { Proposal } from '../schemas/proposals';
import { DraftVersion, DraftVersionInFull } from '../schemas/versions';

const OfProposal = z.object({ id: Id });
const OfVersion = OfProposal.extend({
  n: z
    .string()
    .regex(/^\d{1,9}$/)
    .transform(Number),
});

export const listVersions = operation({
  id: 'listVersions',
  method: 'get',
  path: '/proposals/{id}/versions',
  area: 'Proposals',
  summary: 'Earlier versions of a draft, latest first',
  description: 'Its author sees all that are kept; whoever else may read the proposal sees what was sent in.',
  params: OfProposal,
  query: ListQuery,
  reply: pageOf(DraftVersion),
});

export const setAside = operation({
  id: 'setAside',
  method: 'post',
  path: '/proposals/{id}/versions',
  area: 'Proposals',
  summary: 'Keep words as a version without making them those of my draft',
  params: OfProposal,
  body: z.object({ source: z.string(), reason: z.string().max(4000).default('') }),
  refuses: [409],
});

export const readVersion = operation({
  id: 'readVersion',
  method: 'get',
  path: '/proposals/{id}/versions/{n}',
  area: 'Proposals',
  summary: 'One version with its text, and what going back to it would change',
  params: OfVersion,
  reply: DraftVersionInFull,
});

export const restoreVersion = operation({
  id: 'restoreVersion',
  method: 'post',
  path: '/proposals/{id}/versions/{n}/restore',
  area: 'Proposals',
  summary: 'Go back to a version of my draft',
  description:
    'Its text, reason and base become the draft’s again, as a new version; nothing is deleted. 409 where the draft was saved meanwhile, 428 without If-Match.',
  params: OfVersion,
  reply: Proposal,
  tag: 'version',
  ifMatch: 'required',
  refuses: [409],
});
