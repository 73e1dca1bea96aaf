import { z } from 'zod';
import { ENTRY_FIELDS, type ListName } from '../procedure/fields';
import { Frontmatter } from '../procedure/schema';
import type { Procedure } from '../procedure/types';
import { fieldsOf } from '../revision/fields';
import { readNumber } from '../writing/numbers';
import { entryAt, readAnchor } from './anchors';

/** What a reviewer would write instead. Where it belongs is said by the anchor of its thread: a step, or one field. */
export const Suggestion = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('words'), quote: z.string(), replacement: z.string() }),
  z.object({
    kind: z.literal('value'),
    /** The stored value that it would replace; null where the field was not set. */
    from: z.union([z.string(), z.number()]).nullable(),
    to: z.union([z.string(), z.number()]),
    /** Both as the sheet shows them, with their unit. */
    fromText: z.string(),
    toText: z.string(),
  }),
]);
export type Suggestion = z.infer<typeof Suggestion>;

export type Applied = { ok: true; procedure: Procedure } | { ok: false; why: string };
const refuse = (why: string) => ({ ok: false, why }) as const;

/** Fields that hold one number; lists of numbers and keys are not suggested one at a time. */
const NUMBERS: Partial<Record<ListName, readonly string[]>> = {
  parts: ['quantity'],
  supplies: ['skinOver', 'cure'],
  torques: ['pitch', 'length', 'nm', 'tolerance', 'angleTolerance', 'count'],
  limits: ['min', 'max', 'nominal', 'resolution'],
  timers: ['minutes'],
};
const NOT_ONE_VALUE = ['key', 'passes', 'angles', 'positions', 'order'];

export const isNumberField = (list: ListName, field: string) => NUMBERS[list]?.includes(field) ?? false;
/** Fields of an entry that can be suggested, each with its name in words. */
export const suggestible = (list: ListName): [field: string, words: string][] =>
  Object.entries(ENTRY_FIELDS[list]).filter(([field]) => !NOT_ONE_VALUE.includes(field));

const valueAt = (entry: object, field: string) => (entry as Record<string, string | number | undefined>)[field] ?? null;
/** A value as the sheet shows it; "not there" where it is not set. */
export const textAt = (list: ListName, entry: object, field: string): string =>
  fieldsOf(list, entry).find(({ path }) => path === field)?.text ?? 'not there';

/** Components hold values and are not words: nothing is found inside them. Places stay where they are. */
const wordsOnly = (body: string) => body.replace(/<[^>]*>/g, (tag) => '\0'.repeat(tag.length));

/** Where `quote` stands in a text, also where two of them overlap. */
function placesOfQuote(text: string, quote: string): number[] {
  const found: number[] = [];
  for (let at = text.indexOf(quote); at >= 0 && quote; at = text.indexOf(quote, at + 1)) found.push(at);
  return found;
}

function replaceWords(procedure: Procedure, id: string, quote: string, replacement: string): Applied {
  const step = procedure.steps.find((one) => one.id === id);
  if (!step) return refuse('The step that this was suggested for is no longer there.');
  if (!quote.trim()) return refuse('Quote the words that are to be replaced.');
  if (/[<>{}\0]/.test(replacement))
    return refuse('Suggest plain words. A value is suggested at the value itself, so that it is written once.');
  const at = placesOfQuote(wordsOnly(step.body), quote);
  const [start] = at;
  if (start === undefined)
    return refuse(
      'The quoted words do not stand in this step as it is written now. Values between them cannot be quoted.',
    );
  if (at.length > 1)
    return refuse(
      `The quoted words stand ${at.length} times in this step. Quote more of them, so that they stand once.`,
    );
  const body = (step.body.slice(0, start) + replacement + step.body.slice(start + quote.length)).trim();
  if (body === step.body) return refuse('The suggested words are the same as those that stand there.');
  return {
    ok: true,
    procedure: { ...procedure, steps: procedure.steps.map((s) => (s === step ? { ...s, body } : s)) },
  };
}

function replaceValue(
  procedure: Procedure,
  list: ListName,
  key: string,
  field: string,
  suggestion: { from: string | number | null; to: string | number; fromText?: string },
): Applied {
  const entry = entryAt(procedure, { list, key });
  if (!entry) return refuse('The value that this was suggested for is no longer there.');
  if (NOT_ONE_VALUE.includes(field) || !Object.hasOwn(ENTRY_FIELDS[list], field))
    return refuse('One value is suggested at a time: not a list of them, and not a key.');
  const { from, to } = suggestion;
  if (valueAt(entry, field) !== from)
    return refuse(
      `This was suggested in place of ${suggestion.fromText ?? from}, and the text says ${textAt(list, entry, field)} now. Change it by hand, or resolve it.`,
    );
  if (to === from) return refuse('The suggested value is the same as the one that stands there.');
  if (isNumberField(list, field) !== (typeof to === 'number'))
    return refuse('The suggested value must be a number, without its unit.');
  const changed = {
    ...procedure.frontmatter,
    [list]: procedure.frontmatter[list].map((one) => (one === entry ? { ...one, [field]: to } : one)),
  };
  const read = Frontmatter.safeParse(changed);
  if (!read.success) {
    const [issue] = read.error.issues;
    return refuse(
      `The sheet cannot hold that value: ${issue?.path.at(-1) ?? field} ${issue?.message ?? 'is not usable'}.`,
    );
  }
  return { ok: true, procedure: { ...procedure, frontmatter: read.data } };
}

/**
 * The procedure with a suggestion taken up, or why it cannot be: the words must stand exactly once, and the value must
 * be the one that it was suggested in place of. The procedure that is given stays as it is.
 */
export function applySuggestion(procedure: Procedure, anchor: string | null, suggestion: Suggestion): Applied {
  const at = readAnchor(anchor);
  if (suggestion.kind === 'words')
    return at?.to === 'step'
      ? replaceWords(procedure, at.id, suggestion.quote, suggestion.replacement)
      : refuse('Words are suggested for a step.');
  if (at?.to !== 'value' || at.field === null) return refuse('A value is suggested for one field of a value.');
  return replaceValue(procedure, at.list, at.key, at.field, suggestion);
}

/** Completes a suggested value with what it would replace; `typed` is what was written into the box. */
export function valueSuggestion(
  procedure: Procedure,
  anchor: string | null,
  typed: string,
): { ok: true; suggestion: Suggestion } | { ok: false; why: string } {
  const at = readAnchor(anchor);
  if (at?.to !== 'value' || at.field === null) return refuse('A value is suggested for one field of a value.');
  const { list, field } = at;
  const entry = entryAt(procedure, at);
  if (!entry) return refuse('The text that was proposed has no such value.');
  const text = typed.trim();
  if (!text) return refuse('Write the value that you suggest.');
  const to = isNumberField(list, field) ? readNumber(text) : text;
  if (isNumberField(list, field) && typeof to === 'string')
    return refuse('The suggested value must be a number, without its unit.');
  const suggestion: Suggestion = {
    kind: 'value',
    from: valueAt(entry, field),
    to,
    fromText: textAt(list, entry, field),
    toText: textAt(list, { ...entry, [field]: to }, field),
  };
  const tried = applySuggestion(procedure, anchor, suggestion);
  return tried.ok ? { ok: true, suggestion } : tried;
}
