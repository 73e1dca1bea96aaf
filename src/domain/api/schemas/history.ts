import { z } from 'zod';
import { RevisionSummary } from './book';
import { PersonRef, ProcedureNumber, RevisionLetter } from './common';

/** Where a sheet comes from, and the audit trail. The OpenAPI document is made from these schemas. */

const Origin = z.object({
  place: z.string().describe('For example torques.cover-bolt.nm, or step:draw-down for the words of a step'),
  subject: z.string().describe('What it belongs to, for example Cover bolt'),
  words: z.string().describe('Which field of it, for example tolerance; empty for the value it is about'),
  text: z.string().nullable().describe('How it reads; null for a sentence'),
  letter: RevisionLetter.describe('The revision since which it reads so'),
});

export const OriginsOfSheet = z.object({
  number: ProcedureNumber,
  title: z.string(),
  letter: RevisionLetter.describe('The revision that is told of: the current one'),
  revisions: z.array(RevisionSummary).describe('Those that something comes from, latest first'),
  groups: z.array(
    z.object({
      step: z.object({ id: z.string(), number: z.number().int() }).nullable().describe('Null for what no step uses'),
      title: z.string(),
      origins: z.array(Origin).describe('Latest first'),
    }),
  ),
});
export type OriginsOfSheet = z.infer<typeof OriginsOfSheet>;

export const AuditEntry = z.object({
  seq: z.number().int(),
  at: z.string(),
  actor: PersonRef.nullable().describe('Null where the system itself acted'),
  act: z.string().describe('For example revision.published'),
  subject: z.object({ type: z.string(), id: z.string() }),
  shop: z.object({ id: z.string(), name: z.string() }).nullable(),
  number: ProcedureNumber.nullable().describe('Of the procedure it is about'),
  letter: RevisionLetter.nullable(),
  detail: z.record(z.unknown()),
  previousHash: z.string(),
  hash: z.string().describe('SHA-256 over the entry and the hash of the one before it'),
});
export type AuditEntry = z.infer<typeof AuditEntry>;
