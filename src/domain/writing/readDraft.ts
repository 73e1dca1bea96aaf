import { parse } from 'yaml';
import { headProblem, sizeProblem } from '../procedure/bounds';
import { toSource } from '../procedure/canonical';
import { ENTRY_FIELDS } from '../procedure/fields';
import { KEYED_LISTS } from '../procedure/schema';
import { plainLines, splitLines } from '../procedure/source';
import type { Step } from '../procedure/types';
import { fieldKind, joinBoxes, type Draft, type Entry, type ListName } from './draft';
import { procedureOf } from './procedureOf';

const OPEN = /^<Step id="([^"]*)" title="([^"]*)">$/;
const CAUTION = /^<Caution of="([^"]*)" \/>$/;

/** Undoes what `toSource` writes into an attribute. */
const unquoted = (text: string) => text.replace(/&quot;|&amp;(?=#?\w+;)/g, (sign) => (sign === '&quot;' ? '"' : '&'));

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const plain = (value: unknown) => (typeof value === 'string' || typeof value === 'number' ? String(value) : '');

function textOf(list: ListName, field: string, value: unknown): string {
  if (!Array.isArray(value)) return plain(value);
  switch (fieldKind(list, field)) {
    case 'numbers':
      return joinBoxes(value.map(plain));
    case 'places':
      return value.map((place) => (Array.isArray(place) ? place.map(plain).join(' ') : plain(place))).join('\n');
    default:
      return value.map(plain).join(' ');
  }
}

const entryOf = (list: ListName, value: unknown): Entry =>
  Object.fromEntries(
    Object.keys(ENTRY_FIELDS[list]).map((field) => [field, isRecord(value) ? textOf(list, field, value[field]) : '']),
  );

function readSteps(lines: readonly string[]): { intro: string; steps: Step[] } {
  const starts = lines.flatMap((line, i) => (OPEN.test(line) ? [i] : []));
  const steps = starts.map((start, n): Step => {
    const [, id = '', title = ''] = OPEN.exec(lines[start] ?? '') ?? [];
    const inside = lines.slice(start + 1, starts[n + 1] ?? lines.length);
    while (inside.at(-1) === '') inside.pop();
    if (inside.at(-1) === '</Step>') inside.pop();
    const cautions: string[] = [];
    for (let found = CAUTION.exec(inside[0] ?? ''); found; found = CAUTION.exec(inside[0] ?? '')) {
      cautions.push(unquoted(found[1] ?? ''));
      inside.shift();
    }
    return { id: unquoted(id), title: unquoted(title), cautions, body: inside.join('\n').trim() };
  });
  return {
    intro: lines
      .slice(0, starts[0] ?? lines.length)
      .join('\n')
      .trim(),
    steps,
  };
}

function head(yaml: string): Record<string, unknown> | null {
  try {
    const value: unknown = parse(yaml, { schema: 'core', maxAliasCount: 0, logLevel: 'silent' });
    return isRecord(value) ? value : null;
  } catch {
    return null;
  }
}

/** An empty draft, every field blank. */
export const emptyDraft = (): Draft => ({
  reason: '',
  title: '',
  summary: '',
  system: '',
  engines: [],
  minutes: '',
  skill: '',
  critical: false,
  intro: '',
  steps: [],
  ...(Object.fromEntries(KEYED_LISTS.map((list) => [list, []])) as unknown as Record<ListName, Entry[]>),
});

/**
 * A text as the form shows it, faults and all: a draft may be wrong in many places and still be edited field by
 * field. null where the form could not give back this very text, because it was written by hand in another shape;
 * then it is edited as text.
 */
export function readDraft(source: string, reason = ''): Draft | null {
  const text = plainLines(source);
  const { lines, headLines } = splitLines(text);
  if (headLines === 0) return null;
  if (sizeProblem(text) ?? headProblem({ lines, headLines })) return null;
  const given = head(lines.slice(1, headLines - 1).join('\n'));
  if (!given) return null;
  const draft: Draft = {
    ...emptyDraft(),
    reason,
    title: plain(given['title']),
    summary: plain(given['summary']),
    system: plain(given['system']),
    engines: Array.isArray(given['engines']) ? given['engines'].map(plain) : [],
    minutes: plain(given['minutes']),
    skill: plain(given['skill']),
    critical: given['critical'] === true,
    ...readSteps(lines.slice(headLines)),
  };
  for (const list of KEYED_LISTS) {
    const entries = given[list];
    if (Array.isArray(entries)) draft[list] = entries.map((entry) => entryOf(list, entry));
  }
  return sourceOf(draft) === text ? draft : null;
}

/** The text of a draft. */
export const sourceOf = (draft: Draft): string => toSource(procedureOf(draft));
