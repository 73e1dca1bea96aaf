import { z } from 'zod';
import { SEVERITY_LEVELS } from '../../revision/types';
import { RevisionLetter } from './common';
import { RevisionSummary } from './book';
import { ClampVerdict } from './check';

/** What differs between two texts. The OpenAPI document is made from these schemas. */

/** How grave a change is, and what decided it. */
export const Severity = z.object({
  level: z.enum(SEVERITY_LEVELS),
  because: z.array(z.string()).describe('What decided it, gravest first; empty for an ordinary change'),
});

const WordRun = z.object({ kind: z.enum(['same', 'removed', 'added']), text: z.string() });

export const Comparison = z.object({
  values: z.array(
    z.object({
      path: z.string(),
      list: z.string(),
      key: z.string().nullable(),
      kind: z.enum(['added', 'removed', 'changed']),
      label: z.string(),
      detail: z.string().nullable(),
      from: z.string().nullable(),
      to: z.string().nullable(),
      percent: z.number().nullable(),
      effect: z.string().nullable().describe('What it does at the bench, in words'),
      critical: z.string().nullable(),
    }),
  ),
  clamp: z
    .array(
      z.object({
        key: z.string(),
        name: z.string(),
        from: z.string().nullable(),
        to: z.string().nullable(),
        verdict: ClampVerdict,
        why: z.string(),
        mixUps: z.array(z.string()).describe('Units that may have been mixed up, each a sentence'),
      }),
    )
    .describe('Clamp load then and now of each torque that is new or whose load may have changed'),
  intro: z.array(WordRun),
  steps: z.array(
    z.object({
      id: z.string(),
      kind: z.enum(['same', 'edited', 'added', 'removed']),
      moved: z.boolean(),
      fromNumber: z.number().nullable(),
      toNumber: z.number().nullable(),
      title: z.array(WordRun),
      body: z.array(WordRun),
      cautions: z.object({ from: z.array(z.string()), to: z.array(z.string()) }),
      effects: z.array(z.string()).describe('What it does at the bench beyond the words'),
      critical: z.string().nullable(),
    }),
  ),
  criticalReasons: z.array(z.string()),
  severity: Severity,
  identical: z.boolean(),
});

export const CompareQuery = z.object({ from: RevisionLetter, to: RevisionLetter });

export const RevisionComparison = z.object({ from: RevisionSummary, to: RevisionSummary, comparison: Comparison });

export const ProposalComparison = z.object({ base: RevisionLetter.nullable(), comparison: Comparison });
