import { z } from 'zod';
import { BULLETIN_KINDS } from '../../bulletins/bulletin';
import { BookRef, Id, PersonRef, ProcedureNumber, RevisionLetter } from './common';

/** Withdrawals and the notices that everybody reads and signs. The OpenAPI document is made from these schemas. */

export const GiveWithdrawalReason = z
  .object({ reason: z.string().max(2000, 'must be 2000 characters or fewer') })
  .strict();

export const Bulletin = z.object({
  id: Id,
  kind: z.enum(BULLETIN_KINDS),
  number: ProcedureNumber,
  title: z.string(),
  book: BookRef,
  revision: z
    .object({ id: Id, letter: RevisionLetter })
    .describe('The revision published then; of a critical change the one that brought it'),
  supersedes: RevisionLetter.nullable().describe('Of a critical change: the revision to compare it with'),
  words: z.array(z.string()).describe('What changed, or the reason, in whole sentences'),
  by: PersonRef,
  at: z.string(),
  unread: z.boolean().describe('True where I have still to read and sign it'),
  signedAt: z.string().nullable().describe('When I signed it'),
});
export type Bulletin = z.infer<typeof Bulletin>;
