import { z } from 'zod';
import { VERSION_KINDS } from '../../writing/versions';
import { PersonRef, RevisionLetter } from './common';
import { Comparison } from './compare';

/** Versions of a draft to go back to. The OpenAPI document is made from these schemas. */

export const DraftVersion = z.object({
  n: z.number().int().describe('Rises by one with each version of the draft; numbers that are missing were let go'),
  kind: z
    .enum(VERSION_KINDS)
    .describe(
      'How it came to be: begun, saved, sent in, returned, gone back to, put on another revision, a suggestion taken up, or words that were set aside for those of another tab',
    ),
  of: z.number().int().nullable().describe('Of a `restore`, the version that was gone back to'),
  at: z.string(),
  person: PersonRef,
  base: RevisionLetter.nullable().describe('The revision that it stood on; null for a new procedure'),
  reason: z.string(),
  what: z.array(z.string()).describe('What differs from the version before it, in words'),
  current: z.boolean().describe('The draft says the same now'),
});
export type DraftVersion = z.infer<typeof DraftVersion>;

export const DraftVersionInFull = DraftVersion.extend({
  source: z.string(),
  comparison: Comparison.nullable().describe(
    'What going back would change in the draft as it stands; null where one of the two cannot be read',
  ),
});
export type DraftVersionInFull = z.infer<typeof DraftVersionInFull>;
