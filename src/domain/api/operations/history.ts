import { z } from 'zod';
import { operation } from '../operation';
import { Id, ListQuery, pageOf, ProcedureNumber, RevisionLetter } from '../schemas/common';
import { AuditEntry, OriginsOfSheet } from '../schemas/history';
import { Proposal } from '../schemas/proposals';

const OfProcedure = z.object({ number: ProcedureNumber });

export const readOrigins = operation({
  id: 'readOrigins',
  method: 'get',
  path: '/procedures/{number}/origins',
  area: 'Book',
  summary: 'Since which revision each step and value of the current sheet reads as it does, by whom and why',
  params: OfProcedure,
  reply: OriginsOfSheet,
});

export const restoreRevision = operation({
  id: 'restoreRevision',
  method: 'post',
  path: '/procedures/{number}/revisions/{letter}/restore',
  area: 'Proposals',
  summary: 'Start a draft that brings the text of an earlier revision back',
  description:
    'The draft stands on the current revision; its reason begins “Brings back revision B: ” and must be completed before it is sent in. Starting it again answers the draft that is there. 409 where the texts are the same.',
  params: OfProcedure.extend({ letter: RevisionLetter }),
  body: z
    .object({ reason: z.string().trim().max(3900, 'must be 3900 characters or fewer').default('') })
    .strict()
    .describe('The rest of the reason'),
  status: 201,
  reply: Proposal,
  tag: 'version',
  refuses: [409, 422],
});

export const readAudit = operation({
  id: 'readAudit',
  method: 'get',
  path: '/audit',
  area: 'Shop',
  summary: 'The audit trail, latest first: all of it for the network steward, their shop’s entries for an owner',
  query: ListQuery.extend({
    shop: Id.optional().describe('Only the entries of this shop; an owner of several may leave it out'),
  }),
  reply: pageOf(AuditEntry),
  refuses: [403, 404],
});
