import type { RevisionHead } from '@db/models/book';
import type { Parsed, RenderedProcedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { type FailingTorque, failingTorques } from '@/domain/revision/failingTorques';
import { toldChanges } from '@/domain/revision/toldChanges';
import type { Severity, TakenBackFrom } from '@/domain/revision/types';
import { headOf } from '../book/head';
import { hashOf, parsedText } from '../book/parsed';
import { invalid } from '../refusal';
import { ancestryOf, takenBack } from './ancestry';

/** What a revision row keeps of a text. */
export interface TextColumns {
  source: string;
  hash: string;
  head: RevisionHead | null;
  critical: boolean;
  criticalReasons: string[];
  takesBack: TakenBackFrom[];
  failingTorques: FailingTorque[];
  severity: Severity;
}

export interface Weighed extends TextColumns {
  parsed: Parsed;
  /** Says the same as its base. */
  identical: boolean;
  /** What of it those must be told who have worked from its base; worked out when it is asked for, which a save never does. */
  told: () => string[];
}

const NOTHING_YET: Severity = { level: 'ordinary', because: [] };

/** Reads a text, as it was typed, and weighs it against its base. A text that cannot be read is weighed as nothing yet. */
export async function weigh(source: string, parentId: string | null): Promise<Weighed> {
  const parsed = await parsedText(source);
  const plain = { source, hash: hashOf(source), parsed };
  if (!parsed.ok)
    return {
      ...plain,
      head: null,
      critical: false,
      criticalReasons: [],
      takesBack: [],
      failingTorques: [],
      severity: NOTHING_YET,
      identical: false,
      told: () => [],
    };
  const ancestry = await ancestryOf(parentId);
  const base = ancestry[0]?.procedure ?? null;
  const { criticalReasons, severity, identical } = compareProcedures(base, parsed.procedure);
  return {
    ...plain,
    head: headOf(parsed.rendered),
    critical: criticalReasons.length > 0,
    criticalReasons,
    takesBack: takenBack(ancestry, parsed.procedure),
    failingTorques: failingTorques(base?.frontmatter ?? null, parsed.procedure.frontmatter),
    severity,
    identical: identical && parentId !== null,
    told: () => (base && criticalReasons.length > 0 ? toldChanges(base, parsed.procedure) : []),
  };
}

/** The columns of a weighed text. */
export const columnsOf = ({ parsed: _, identical: __, told: ___, ...columns }: Weighed): TextColumns => columns;

/** Refuses 422, with line and column, a text that cannot be read. */
export function refuseUnreadable(parsed: Parsed): asserts parsed is Extract<Parsed, { ok: true }> {
  if (parsed.ok) return;
  const [first] = parsed.errors;
  throw invalid(
    first ? `Line ${first.line}, column ${first.column}: ${first.message}` : 'The text cannot be read.',
    parsed.errors.map(({ line, column, message, path }) => ({
      path: path ? `source.${path}` : 'source',
      message,
      line,
      column,
    })),
  );
}

/** Refuses 422 a text that still holds what a template, an import or the empty sheet left to its author. */
function refuseUnfilled({ toFillIn }: Extract<Parsed, { ok: true }>): void {
  const [first, ...more] = toFillIn;
  if (!first) return;
  const others = more.length ? ` So are ${more.length} other ${more.length === 1 ? 'place' : 'places'}.` : '';
  throw invalid(
    `Line ${first.line}: ${first.message}${others}`,
    toFillIn.map(({ line, column, message, path }) => ({
      path: path ? `source.${path}` : 'source',
      message,
      line,
      column,
    })),
  );
}

/** The text as it is proposed and published: in canonical form, weighed again, and with what it looks like. */
export async function settleText(
  source: string,
  parentId: string | null,
): Promise<{ text: Weighed; rendered: RenderedProcedure }> {
  const typed = await parsedText(source);
  refuseUnreadable(typed);
  refuseUnfilled(typed);
  const text = await weigh(typed.canonical, parentId);
  refuseUnreadable(text.parsed);
  return { text, rendered: text.parsed.rendered };
}
