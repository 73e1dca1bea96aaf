import { z } from 'zod';
import { operation } from '../operation';
import { ProcedureSummary, RevisionSummary, Sheet } from '../schemas/book';
import { CheckRequest, CheckResult } from '../schemas/check';
import { ListQuery, ProcedureNumber, RevisionLetter, pageOf } from '../schemas/common';
import { CompareQuery, RevisionComparison } from '../schemas/compare';
import { Proposal, StartProcedure, StartProposal } from '../schemas/proposals';

const OfProcedure = z.object({ number: ProcedureNumber });
const OfRevision = OfProcedure.extend({ letter: RevisionLetter });

export const listProcedures = operation({
  id: 'listProcedures',
  method: 'get',
  path: '/procedures',
  area: 'Book',
  summary: 'The published procedures that I may read, by number',
  query: ListQuery,
  reply: pageOf(ProcedureSummary),
});

export const readProcedure = operation({
  id: 'readProcedure',
  method: 'get',
  path: '/procedures/{number}',
  area: 'Book',
  summary: 'The current sheet',
  params: OfProcedure,
  reply: Sheet,
  tag: 'content',
});

export const listRevisions = operation({
  id: 'listRevisions',
  method: 'get',
  path: '/procedures/{number}/revisions',
  area: 'Book',
  summary: 'The revisions that were ever published, latest first',
  params: OfProcedure,
  query: ListQuery,
  reply: pageOf(RevisionSummary),
});

export const readRevision = operation({
  id: 'readRevision',
  method: 'get',
  path: '/procedures/{number}/revisions/{letter}',
  area: 'Book',
  summary: 'The sheet at one revision; `current` names the one to work from',
  params: OfRevision,
  reply: Sheet,
  tag: 'content',
});

export const compareRevisions = operation({
  id: 'compareRevisions',
  method: 'get',
  path: '/procedures/{number}/compare',
  area: 'Book',
  summary: 'What changed from one revision to another: values, steps, words',
  params: OfProcedure,
  query: CompareQuery,
  reply: RevisionComparison,
});

export const checkSource = operation({
  id: 'checkSource',
  method: 'post',
  path: '/check',
  area: 'Book',
  summary: 'Check a text; writes nothing',
  description:
    'A text with faults answers 200 with `ok: false` and where they are; one over 64 KB is refused with 422.',
  body: CheckRequest,
  reply: CheckResult,
});

export const startProcedure = operation({
  id: 'startProcedure',
  method: 'post',
  path: '/procedures',
  area: 'Proposals',
  summary: 'Start a draft of a new procedure',
  description: 'The number is given now, and stays unseen by others until the procedure is published.',
  body: StartProcedure,
  status: 201,
  reply: Proposal,
  tag: 'version',
});

export const startProposal = operation({
  id: 'startProposal',
  method: 'post',
  path: '/procedures/{number}/proposals',
  area: 'Proposals',
  summary: 'Start a draft of a change',
  description:
    'Starting the same text again answers the draft that is there; a second, different draft by the same person is a 409 that names the first.',
  params: OfProcedure,
  body: StartProposal,
  status: 201,
  reply: Proposal,
  tag: 'version',
  refuses: [409, 422],
});
