import { z } from 'zod';
import { operation } from '../operation';
import { Id } from '../schemas/common';
import { Proposal } from '../schemas/proposals';
import { StartThread, Thread, ThreadList, WriteMessage } from '../schemas/threads';

const OfProposal = z.object({ id: Id });
const OfThread = z.object({ id: Id });

export const listThreads = operation({
  id: 'listThreads',
  method: 'get',
  path: '/proposals/{id}/threads',
  area: 'Review',
  summary: 'Remarks, questions and suggestions on a proposal',
  params: OfProposal,
  reply: ThreadList,
});

export const startThread = operation({
  id: 'startThread',
  method: 'post',
  path: '/proposals/{id}/threads',
  area: 'Review',
  summary: 'Remark on a proposal, ask about it, or suggest words or a value',
  description: 'An open question holds publishing up. If-Match names the version of the proposal.',
  params: OfProposal,
  body: StartThread,
  status: 201,
  reply: Thread,
  tag: 'version',
  ifMatch: 'accepted',
  refuses: [409],
});

export const writeMessage = operation({
  id: 'writeMessage',
  method: 'post',
  path: '/threads/{id}/messages',
  area: 'Review',
  summary: 'Answer in a thread',
  params: OfThread,
  body: WriteMessage,
  status: 201,
  reply: Thread,
  tag: 'version',
  refuses: [409],
});

const turn = (id: string, verb: string, summary: string) =>
  operation({
    id,
    method: 'post',
    path: `/threads/{id}/${verb}`,
    area: 'Review',
    summary,
    description: 'If-Match names the version of the thread.',
    params: OfThread,
    reply: Thread,
    tag: 'version',
    ifMatch: 'accepted',
    refuses: [409],
  });

export const resolveThread = turn('resolveThread', 'resolve', 'Resolve a thread');
export const reopenThread = turn('reopenThread', 'reopen', 'Open a thread again');

export const acceptSuggestion = operation({
  id: 'acceptSuggestion',
  method: 'post',
  path: '/threads/{id}/accept',
  area: 'Review',
  summary: 'Take a suggestion up into my draft, and resolve it',
  description:
    'The author of a draft or of a returned proposal does it. 409 while it is under review, and where the quoted words or the old value no longer stand. If-Match names the version of the proposal.',
  params: OfThread,
  reply: Proposal,
  tag: 'version',
  ifMatch: 'accepted',
  refuses: [409, 422],
});
