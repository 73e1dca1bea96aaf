import { z } from 'zod';
import { FrontmatterFields } from '../../procedure/schema';
import { SheetStep } from './book';

/** What is wrong with a text, or only worth a notice. The OpenAPI document is made from these schemas. */

export const SourceProblem = z.object({
  line: z.number().int(),
  column: z.number().int(),
  message: z.string(),
  path: z.string().optional(),
});

/** over: past proof load. unknown: nothing can be said, and the message says why. */
export const ClampVerdict = z.enum(['over', 'low', 'ok', 'unknown']);

export const CheckRequest = z.object({
  source: z.string(),
  preview: z.boolean().optional().describe('Also return the rendered steps'),
});

export const CheckResult = z.object({
  ok: z.boolean(),
  errors: z.array(SourceProblem),
  notices: z.array(SourceProblem),
  toFillIn: z
    .array(SourceProblem)
    .describe(
      'Places that a template, an import or the empty sheet left to the author; none may be left to send it in',
    ),
  clamp: z
    .array(
      z.object({
        key: z.string(),
        name: z.string(),
        path: z.string().describe('`torques.0`'),
        verdict: ClampVerdict,
        message: z.string().describe('The verdict in a sentence'),
        clampLoad: z.number().nullable().describe('N'),
        proofLoad: z.number().nullable().describe('N'),
        share: z.number().nullable().describe('Clamp load over proof load: 0.72 is 72 %'),
        nutFactor: z.number().nullable().describe('K of T = K·d·F'),
        mixUp: z.string().nullable().describe('The unit that the figure may really have been in, in a sentence'),
      }),
    )
    .describe('Clamp check of each torque; empty where the text cannot be read'),
  preview: z.object({ frontmatter: FrontmatterFields, introHtml: z.string(), steps: z.array(SheetStep) }).optional(),
});
export type CheckResult = z.infer<typeof CheckResult>;
