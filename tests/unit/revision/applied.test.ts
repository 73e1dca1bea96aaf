import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Frontmatter, KEYED_LISTS } from '@/domain/procedure/schema';
import type { Procedure } from '@/domain/procedure/types';
import { bodyText } from '@/domain/revision/bodyText';
import { compareProcedures } from '@/domain/revision/compare';
import { type Entry, fieldsOf, type ListName, nameOf, wholeOf } from '@/domain/revision/fields';
import type { Comparison, WordRun } from '@/domain/revision/types';
import { pair } from './arbitraries';

/**
 * A procedure as a reviewer reads it: texts alone. A comparison that is applied to the old one, word by word and value
 * by value, must leave exactly the new one; then nothing was forgotten and nothing told that is not so.
 */
interface Read {
  intro: string;
  steps: { id: string; title: string; body: string; cautions: string[] }[];
  /** Of the head and of each list, entry by entry in its order, the fields in words. */
  head: Record<string, string>;
  lists: Record<ListName, { key: string; name: string; whole: string; fields: Record<string, string> }[]>;
}

const fields = (list: ListName | 'head', entry: object) =>
  Object.fromEntries(fieldsOf(list, entry).map(({ path, text }) => [path, text]));
const isList = (name: string): name is ListName => (KEYED_LISTS as readonly string[]).includes(name);
const whole = (list: ListName, entry: Entry) => (wholeOf[list] as (entry: Entry) => string)(entry);

function read({ frontmatter, intro, steps }: Procedure): Read {
  const lists = Object.fromEntries(
    KEYED_LISTS.map((list) => [
      list,
      (frontmatter[list] as Entry[]).map((entry) => ({
        key: entry.key,
        name: nameOf(list, entry),
        whole: whole(list, entry),
        fields: fields(list, entry),
      })),
    ]),
  ) as Read['lists'];
  const head = Object.fromEntries(Object.entries(frontmatter).filter(([name]) => !isList(name)));
  return {
    intro: bodyText(intro, frontmatter),
    steps: steps.map((step) => ({
      id: step.id,
      title: step.title,
      body: bodyText(step.body, frontmatter),
      cautions: step.cautions,
    })),
    head: fields('head', head),
    lists,
  };
}

/** The words of a text with a run of changes made in it, and nothing taken out that does not stand there. */
function worded(old: string, runs: WordRun[]): string {
  let at = 0;
  let out = '';
  for (const { kind, text } of runs) {
    if (kind !== 'added') {
      expect(old.startsWith(text, at)).toBe(true);
      at += text.length;
    }
    if (kind !== 'removed') out += text;
  }
  expect(at).toBe(old.length);
  return out;
}

function withValue(of: Record<string, string>, path: string, from: string | null, to: string | null) {
  expect(of[path] ?? null).toBe(from);
  const { [path]: _, ...others } = of;
  return to === null ? others : { ...others, [path]: to };
}

/** The old text with every change of the comparison made in it. Only words of the comparison go in. */
function applied(old: Read, { values, steps, intro }: Comparison): Omit<Read, 'lists'> & { lists: object } {
  let head = old.head;
  const lists = Object.fromEntries(
    KEYED_LISTS.map((list) => {
      let entries = old.lists[list].map(({ key, whole: text, fields: own }) => ({
        key,
        text,
        fields: own,
        fresh: false,
      }));
      for (const change of values.filter((one) => one.list === list && one.key !== null)) {
        const { key, path, kind, from, to } = change;
        if (path !== `${list}.${key ?? ''}`) {
          const field = path.slice(`${list}.${key ?? ''}.`.length);
          entries = entries.map((one) =>
            one.key === key ? { ...one, fields: withValue(one.fields, field, from, to) } : one,
          );
        } else if (kind === 'removed') {
          expect(entries.find((one) => one.key === key)?.text).toBe(from);
          entries = entries.filter((one) => one.key !== key);
        } else entries = [...entries, { key: key ?? '', text: to ?? '', fields: {}, fresh: true }];
      }
      return [list, entries];
    }),
  );
  for (const { list, path, from, to } of values) if (list === 'head') head = withValue(head, path, from, to);
  const before = new Map(old.steps.map((step) => [step.id, step]));
  return {
    intro: worded(old.intro, intro),
    head,
    lists,
    steps: steps
      .filter(({ kind, id }) => {
        expect(before.has(id)).toBe(kind !== 'added');
        return kind !== 'removed';
      })
      .sort((a, b) => (a.toNumber ?? 0) - (b.toNumber ?? 0))
      .map(({ id, title, body, cautions }) => ({
        id,
        title: worded(before.get(id)?.title ?? '', title),
        body: worded(before.get(id)?.body ?? '', body),
        cautions: cautions.to,
      })),
  };
}

const orderOf = (list: ListName, frontmatter: Frontmatter, other: Frontmatter) =>
  (frontmatter[list] as Entry[])
    .filter(({ key }) => (other[list] as Entry[]).some((one) => one.key === key))
    .map(({ key }) => key);

describe('a comparison applied to the old text', () => {
  it('gives the new one: head, every value, entries that come and go, steps, their order, and words', () => {
    fc.assert(
      fc.property(pair, ([from, to]) => {
        const comparison = compareProcedures(from, to);
        const [made, want] = [applied(read(from), comparison), read(to)];
        expect(made.intro).toBe(want.intro);
        expect(made.steps).toEqual(want.steps);
        expect(made.head).toEqual(want.head);
        for (const list of KEYED_LISTS) {
          const entries = (
            made.lists as Record<ListName, { key: string; text: string; fields: object; fresh: boolean }[]>
          )[list];
          expect(entries.map(({ key }) => key).sort()).toEqual(want.lists[list].map(({ key }) => key).sort());
          for (const { key, text, fields: own, fresh } of entries) {
            const now = want.lists[list].find((one) => one.key === key);
            if (fresh) expect(text).toBe(now?.whole);
            else expect(own).toEqual(now?.fields);
          }
          const order = comparison.values.find((one) => one.list === list && one.path === list);
          const [a, b] = [
            orderOf(list, from.frontmatter, to.frontmatter),
            orderOf(list, to.frontmatter, from.frontmatter),
          ];
          expect(order !== undefined).toBe(a.join() !== b.join());
          if (order)
            expect(order.to).toBe(b.map((key) => want.lists[list].find((one) => one.key === key)?.name).join('; '));
        }
      }),
      { numRuns: 400 },
    );
  });
});
