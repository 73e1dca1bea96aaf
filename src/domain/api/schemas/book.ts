import { z } from 'zod';
import { FrontmatterFields, SKILLS } from '../../procedure/schema';
import { REVISION_STATES } from '../../revision/types';
import { ProcedureNumber, RevisionLetter, BookRef, PersonRef } from './common';

/** Published sheets and their revisions. The OpenAPI document is made from these schemas. */

export const ClampOverride = z.object({
  torque: z.string().describe('Name of the torque'),
  share: z.number().describe('Clamp load over proof load: 1.23 is 123 %'),
  person: PersonRef,
  reason: z.string(),
  at: z.string(),
});
export type ClampOverride = z.infer<typeof ClampOverride>;

export const RevisionSummary = z.object({
  letter: RevisionLetter,
  state: z.enum(REVISION_STATES),
  hash: z.string().describe('SHA-256 of the canonical text, hex'),
  sheetCheck: z.string().describe('First 8 hex digits of the hash'),
  publishedAt: z.string(),
  reason: z.string(),
  author: PersonRef,
  reviewers: z.array(PersonRef),
  overrides: z.array(ClampOverride).describe('Torques past proof load that editors let stand, and why'),
});
export type RevisionSummary = z.infer<typeof RevisionSummary>;

export const ProcedureSummary = z.object({
  number: ProcedureNumber,
  title: z.string(),
  summary: z.string(),
  book: BookRef,
  system: z.string(),
  engines: z.array(z.string()),
  minutes: z.number(),
  skill: z.enum(SKILLS),
  critical: z.boolean(),
  holds: z.number().int(),
  revision: z.object({ letter: RevisionLetter, hash: z.string(), publishedAt: z.string() }),
  withdrawn: z.boolean().describe('Nobody works from it while this is true'),
});
export type ProcedureSummary = z.infer<typeof ProcedureSummary>;

export const Reference = z.union([
  z.object({ kind: z.literal('torque'), key: z.string(), pass: z.number().int().optional() }),
  z.object({ kind: z.enum(['limit', 'part', 'figure']), key: z.string() }),
  z.object({ kind: z.literal('timer'), key: z.string(), stage: z.enum(['skin-over', 'cure']).optional() }),
  z.object({ kind: z.literal('worksheet'), worksheet: z.string(), keys: z.array(z.string()) }),
]);

export const SheetStep = z.object({
  id: z.string(),
  number: z.number().int(),
  title: z.string(),
  cautions: z.array(z.string()),
  html: z.string(),
  holds: z.array(z.string()),
  references: z.array(Reference),
  text: z.string(),
});
export type SheetStep = z.infer<typeof SheetStep>;

export const Sheet = z.object({
  number: ProcedureNumber,
  title: z.string(),
  book: BookRef,
  revision: RevisionSummary,
  current: z
    .object({ letter: RevisionLetter, publishedAt: z.string() })
    .describe('The revision to work from; the same as `revision` on a current sheet'),
  earlier: z.number().int().describe('How many revisions stand before this one'),
  withdrawn: z
    .object({ at: z.string(), reason: z.string(), by: PersonRef })
    .nullable()
    .describe('Set while the procedure is withdrawn: nobody works from any revision of it'),
  openProposals: z.number().int().describe('Proposals waiting for review on this procedure'),
  frontmatter: FrontmatterFields,
  introHtml: z.string(),
  steps: z.array(SheetStep),
  source: z.string(),
});
export type Sheet = z.infer<typeof Sheet>;
