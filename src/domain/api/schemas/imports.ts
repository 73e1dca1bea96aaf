import { z } from 'zod';
import { Caution } from '../../procedure/schema';
import { ProcedureNumber, RevisionLetter } from './common';

/** A how-to that is made into a draft, and where a new procedure began. The OpenAPI document is made from these schemas. */

export const LeftOut = z.object({
  what: z.string().max(120).describe('What it was, for example "Picture" or "Footnote"'),
  where: z.string().max(200).describe('The step or the part of the document where it stood'),
  quote: z.string().max(65_536).describe('Its words, or those of its description; empty where it had none'),
  became: z.string().max(120).nullable().describe('What it is in the draft now; null where it is not in the draft'),
});
export type LeftOut = z.infer<typeof LeftOut>;

export const ImportFigure = z.object({
  step: z.string().describe('Title of the step, or "the introduction"'),
  text: z.string().describe('The number with its unit, as it is written'),
  quote: z.string().describe('The sentence that it stands in'),
  list: z.enum(['torques', 'limits', 'timers']).describe('Where such a value belongs'),
});
export type ImportFigure = z.infer<typeof ImportFigure>;

export const ImportedSheet = z.object({
  source: z.string().describe('The text of the draft, ready for `POST /procedures`'),
  title: z.string(),
  steps: z.array(z.object({ id: z.string(), title: z.string(), cautions: z.number().int() })),
  cautions: z.array(Caution.omit({ key: true }).extend({ steps: z.array(z.number().int()).describe('From 1') })),
  figures: z.array(ImportFigure).describe('Numbers in the prose that are to be made into values by hand'),
  leftOut: z.array(LeftOut).describe('What could not be taken over, or became something else'),
});
export type ImportedSheet = z.infer<typeof ImportedSheet>;

export const ImportRequest = z.object({
  book: z.string().describe('"common" or a shop id: the book that the draft is meant for'),
  markdown: z.string(),
});

/** The form that carries a file instead. */
export const ImportForm = z.object({
  book: z.string().describe('"common" or a shop id'),
  file: z.string().describe('A .docx of 5 MB at most, or a text file of Markdown'),
});

/** Where a new procedure began, kept with it for whoever writes and reviews it. */
export const Origin = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('copy'), number: ProcedureNumber, letter: RevisionLetter }),
  z.object({
    kind: z.literal('import'),
    name: z.string().trim().max(200).describe('Name of the file; empty where the text was pasted'),
    leftOut: z.array(LeftOut).max(600),
  }),
]);
export type Origin = z.infer<typeof Origin>;
