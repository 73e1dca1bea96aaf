import type { RevisionHead } from '@db/models/book';
import type { Parsed, Procedure, RenderedProcedure } from '@/domain/procedure/types';
import { compareProcedures } from '@/domain/revision/compare';
import { acceptedProcedure } from '../book/compare';
import { headOf } from '../book/head';
import { hashOf, parsedText } from '../book/parsed';
import { app } from '../context';
import { invalid } from '../refusal';

/** What a revision row keeps of a text. */
export interface TextColumns {
  source: string;
  hash: string;
  head: RevisionHead | null;
  critical: boolean;
  criticalReasons: string[];
}

export interface Weighed extends TextColumns {
  parsed: Parsed;
  /** Says the same as its base. */
  identical: boolean;
}

/** The text that a draft stands on, as a procedure; null for a new procedure. */
async function baseProcedure(parentId: string | null): Promise<Procedure | null> {
  if (parentId === null) return null;
  const { db } = await app();
  const [base] = await db.read<{ source: string }>('SELECT source FROM revisions WHERE id = :parentId', { parentId });
  return base ? acceptedProcedure(base.source) : null;
}

/** Reads a text, as it was typed, and weighs it against its base. A text that cannot be read is weighed as nothing yet. */
export async function weigh(source: string, parentId: string | null): Promise<Weighed> {
  const parsed = await parsedText(source);
  const plain = { source, hash: hashOf(source), parsed };
  if (!parsed.ok) return { ...plain, head: null, critical: false, criticalReasons: [], identical: false };
  const { criticalReasons, identical } = compareProcedures(await baseProcedure(parentId), parsed.procedure);
  return {
    ...plain,
    head: headOf(parsed.rendered),
    critical: criticalReasons.length > 0,
    criticalReasons,
    identical: identical && parentId !== null,
  };
}

/** The columns of a weighed text. */
export const columnsOf = ({ source, hash, head, critical, criticalReasons }: Weighed): TextColumns => ({
  source,
  hash,
  head,
  critical,
  criticalReasons,
});

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

/** The text as it is proposed and published: in canonical form, weighed again, and with what it looks like. */
export async function settleText(
  source: string,
  parentId: string | null,
): Promise<{ text: Weighed; rendered: RenderedProcedure }> {
  const typed = await parsedText(source);
  refuseUnreadable(typed);
  const text = await weigh(typed.canonical, parentId);
  refuseUnreadable(text.parsed);
  return { text, rendered: text.parsed.rendered };
}
