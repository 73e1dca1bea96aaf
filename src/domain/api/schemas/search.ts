import { z } from 'zod';
import { SKILLS } from '../../procedure/schema';
import { ProcedureNumber, RevisionLetter } from './common';

/** What is looked up, and what is found. The OpenAPI document is made from these schemas. */

export const MATCHED_FIELDS = [
  'title',
  'summary',
  'torque',
  'limit',
  'timer',
  'part',
  'tool',
  'step',
  'system',
  'text',
] as const;

export const SearchHit = z.object({
  number: ProcedureNumber,
  title: z.string(),
  summary: z.string(),
  engines: z.array(z.string()),
  system: z.string(),
  minutes: z.number(),
  skill: z.enum(SKILLS),
  holds: z.number(),
  letter: RevisionLetter,
  publishedAt: z.string(),
  book: z.string(),
  withdrawn: z.boolean().describe('Nobody works from it while this is true; such sheets stand last'),
  matched: z
    .array(
      z.object({
        field: z.enum(MATCHED_FIELDS).describe('`text` is the prose of the sheet'),
        text: z.string(),
        step: z.number().int().nullable(),
        marks: z.array(z.tuple([z.number().int(), z.number().int()])).describe('Places in `text`, [start, end)'),
      }),
    )
    .describe('What matched, in words'),
});
export type SearchHit = z.infer<typeof SearchHit>;

const Counts = z.record(z.number().int());

export const SearchQuery = z.object({
  q: z.string().max(200).default('').describe('Words, trade names, measures, a number of a sheet or of a part'),
  engine: z.string().max(2000).default('').describe('Keys of engines, with commas between'),
  system: z.string().max(500).default('').describe('Systems, with commas between'),
  fit: z.string().max(100).default('').describe('Skills the sheet is written for, with commas between'),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});

export const SearchReply = z.object({
  items: z.array(SearchHit).describe('Best first'),
  total: z.number().int().describe('How many sheets there are; `items` may be fewer'),
  near: z.boolean().describe('True where nothing held all of the query and the items only come near'),
  readAs: z.object({
    quantities: z.array(z.string()).describe('Measures that were read, in my units'),
    synonyms: z.array(z.array(z.string())).describe('Trade names that were read, each with its other names'),
  }),
  facets: z.object({ engine: Counts, system: Counts, fit: Counts }).describe('How many sheets each choice would show'),
});
export type SearchReply = z.infer<typeof SearchReply>;
