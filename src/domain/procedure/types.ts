import type { Frontmatter } from './schema';

/**
 * A procedure as the writing form, the comparison and the database see it. `body` and `intro` are
 * canonical Markdown with the closed set of components; cautions that guard a step are named in
 * `cautions`, in the order they are shown ahead of it, and are not repeated in `body`.
 */
export interface Step {
  /** Stable for the life of the procedure; a comparison follows a step by it. */
  id: string;
  title: string;
  cautions: string[];
  body: string;
}

export interface Procedure {
  frontmatter: Frontmatter;
  intro: string;
  steps: Step[];
}

/** Something in a step that points at the front matter, in reading order. */
export type Reference =
  | { kind: 'torque'; key: string; pass?: number }
  | { kind: 'limit'; key: string }
  | { kind: 'part'; key: string }
  | { kind: 'timer'; key: string; stage?: 'skin-over' | 'cure' }
  | { kind: 'figure'; key: string }
  | { kind: 'worksheet'; worksheet: string; keys: string[] };

/** What a page needs to show one step; made when a revision is saved, never while reading. */
export interface RenderedStep {
  id: string;
  number: number;
  title: string;
  cautions: string[];
  /** Safe HTML of the prose, values already in place in both unit systems, holds left out. */
  html: string;
  /** Plain text of each hold point, in order. */
  holds: string[];
  /** What stands in the margin: each value once, in the order first used. */
  references: Reference[];
  /** Plain words of the step, values written out; for the text search and for tests. */
  text: string;
}

export interface RenderedProcedure {
  frontmatter: Frontmatter;
  introHtml: string;
  steps: RenderedStep[];
}

/** Where and what is wrong, for the person who wrote it. Lines and columns count from 1. */
export interface SourceProblem {
  line: number;
  column: number;
  message: string;
  /** Dotted place in the form, where known: `torques.0.nm`, `steps.3.body`. */
  path?: string;
}

export type Parsed =
  | {
      ok: true;
      procedure: Procedure;
      rendered: RenderedProcedure;
      canonical: string;
      notices: SourceProblem[];
      /** Places that a template or an import left to the author; while there are any it is not sent in. */
      toFillIn: SourceProblem[];
    }
  | { ok: false; errors: SourceProblem[] };
