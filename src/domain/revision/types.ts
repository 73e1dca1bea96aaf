/** Shapes shared by the comparison, the API and the review desk. */

export const REVISION_STATES = ['draft', 'proposed', 'returned', 'declined', 'published', 'superseded'] as const;
export type RevisionState = (typeof REVISION_STATES)[number];

/** A run of words: kept in both texts, only in the old, or only in the new. */
export interface WordRun {
  kind: 'same' | 'removed' | 'added';
  text: string;
}

/**
 * One changed value of the front matter, told as a technician would read it.
 * `from` and `to` are display texts with unit ("10 N·m"), null where the value did not or does not exist.
 */
export interface ValueChange {
  /** `torques.cover-bolt.nm`, `parts.cover-gasket`, `title` */
  path: string;
  list: 'head' | 'parts' | 'tools' | 'supplies' | 'torques' | 'limits' | 'cautions' | 'timers' | 'figures' | 'sources';
  key: string | null;
  kind: 'added' | 'removed' | 'changed';
  /** What it is called at the bench: "Cover bolt", "First pass". */
  label: string;
  /** What it stands on: "M6×1.0, class 8.8, dry". */
  detail: string | null;
  from: string | null;
  to: string | null;
  /** Relative change of a single number in per cent, for example 20; null where there is none. */
  percent: number | null;
  /** What it does at the bench beyond the change itself: "Wider: allows 0.02 mm more"; null where nothing can be said. */
  effect: string | null;
  /** Why this makes the proposal critical, or null. */
  critical: string | null;
}

export interface StepChange {
  id: string;
  kind: 'same' | 'edited' | 'added' | 'removed';
  /** True where its place among the steps that both texts share has changed. */
  moved: boolean;
  /** Places counted from 1; null where the step is not in that text. */
  fromNumber: number | null;
  toNumber: number | null;
  title: WordRun[];
  /** The step's Markdown; components shown as the values they stand for. */
  body: WordRun[];
  /** Keys of cautions that stand ahead of the step in either text. */
  cautions: { from: string[]; to: string[] };
  /** What it does at the bench beyond the words: "Nobody needs to check here any longer". */
  effects: string[];
  critical: string | null;
}

/** The clamp load that a torque gives, before and after. Texts are "8.3 kN, 72 % of proof load". */
export interface ClampChange {
  /** Of the torque in the new text. */
  key: string;
  name: string;
  /** Null where there was no such torque, or where nothing can be said of it. */
  from: string | null;
  to: string | null;
  verdict: 'over' | 'low' | 'ok' | 'unknown';
  /** The verdict in a sentence. */
  why: string;
  /** Units that may have been mixed up, each a sentence. */
  mixUps: string[];
}

/** What one earlier revision changed and a proposal sets back, each in words. */
export interface TakenBackFrom {
  /** Its letter. */
  revision: string;
  /** "Cover bolt torque, 10 to 12 N·m" */
  what: string[];
}

/** Least first. What makes a change grave stands in `severity.ts`. */
export const SEVERITY_LEVELS = ['ordinary', 'serious', 'grave'] as const;

export interface Severity {
  level: (typeof SEVERITY_LEVELS)[number];
  /** What decided it, gravest first: "the limit “Gap” is wider". Empty for an ordinary change. */
  because: string[];
}

export interface Comparison {
  values: ValueChange[];
  clamp: ClampChange[];
  intro: WordRun[];
  /** In the order of the new text; removed steps stand after the step they followed. */
  steps: StepChange[];
  /** Why two editors are needed, most serious first; empty for an ordinary change. */
  criticalReasons: string[];
  severity: Severity;
  identical: boolean;
}
