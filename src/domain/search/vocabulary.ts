import { z } from 'zod';
import { wordsOf } from './words';

/**
 * What the trade calls one thing. The files in `content/vocabulary` hold groups of names that mean the same to
 * somebody who is looking something up; a query in any of them finds the sheets that use any other.
 */

const term = z
  .string()
  .trim()
  .min(2, 'must have at least two characters')
  .max(60, 'must be 60 characters or fewer')
  .refine((text) => wordsOf(text).length > 0, 'must contain a word');

export const VocabularyGroup = z
  .object({
    /** Names of one thing, the one the book prefers first. */
    terms: z.array(term).min(1).max(20),
    /** How it is often mistyped; understood in a query, never shown. */
    misspelt: z.array(term).max(20).optional(),
    /** Where the words belong or what they must not be mixed up with. */
    note: z.string().trim().min(1).max(200).optional(),
  })
  .strict()
  .refine((group) => group.terms.length + (group.misspelt?.length ?? 0) > 1, 'must join at least two words');

export const VocabularyFile = z
  .object({
    /** What the file gathers, for example "Cylinder head and valve gear". */
    title: z.string().trim().min(1).max(90),
    groups: z.array(VocabularyGroup).min(1),
  })
  .strict();

export type VocabularyGroup = z.infer<typeof VocabularyGroup>;
export type VocabularyFile = z.infer<typeof VocabularyFile>;
