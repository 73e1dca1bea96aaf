import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { atomFeed, type Feed } from '@/domain/feed/atom';
import { summaryOf } from '@/domain/feed/entry';
import { elements, given, readAtom, texts } from '../../factories/atom';
import { feedEvent } from '../../factories/feedEvents';

const ORIGIN = 'https://book.example';
const feed = (change: Partial<Feed> = {}): string =>
  atomFeed({
    id: '0192f3a4-0000-7000-8000-0000000000ff',
    title: 'Matchmark: common book',
    updated: '2026-03-04T05:06:07.000Z',
    origin: ORIGIN,
    self: `${ORIGIN}/feed/key.atom`,
    first: `${ORIGIN}/feed/key.atom`,
    next: null,
    entries: [feedEvent()],
    ...change,
  });

const URI = /^[a-z][a-z0-9+.-]*:\S+$/;

describe('a feed holds what RFC 4287 says it must', () => {
  const doc = readAtom(
    feed({
      entries: [
        feedEvent(),
        feedEvent({ id: '0192f3a4-0000-7000-8000-000000000002', kind: 'withdrawn', reviewers: [] }),
      ],
      next: `${ORIGIN}/feed/key.atom?before=x`,
    }),
  );

  test('2: it is well-formed XML with the namespace of Atom, and its schema accepts it', () => {
    expect(elements(doc, '/a:feed')).toHaveLength(1);
  });
  test('the schema refuses what is wrong, so that the line above means something', () => {
    for (const broken of [
      feed().replace(/<updated>[^<]*<\/updated>/, ''),
      feed().replace(/<id>[^<]*<\/id>/, ''),
      feed().replace(/(<updated>[0-9-]+)T/, '$1 '),
      feed().replace('<title>', '<title type="markdown">'),
      feed().replace('<name>', '<nom>').replace('</name>', '</nom>'),
      feed().replace('</feed>', '<title>again</title></feed>'),
    ]) {
      expect(broken).not.toBe(feed());
      expect(() => readAtom(broken)).toThrow();
    }
  });
  test('3.3: dates are those of RFC 3339, with capital T and Z', () => {
    for (const date of [...texts(doc, '//a:updated'), ...texts(doc, '//a:published')])
      expect(date).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d(\.\d+)?Z$/);
  });
  test('4.1.1: every entry has an author, as the feed itself has none; no alternate stands twice', () => {
    expect(texts(doc, '/a:feed/a:author')).toEqual([]);
    for (const entry of elements(doc, '//a:entry')) expect(texts(entry, 'a:author/a:name')).toHaveLength(1);
    expect(given(doc, '/a:feed/a:link[@rel="alternate"]', 'href')).toHaveLength(1);
    expect(given(doc, '/a:feed/a:link[@rel="self"]', 'href')).toEqual([`${ORIGIN}/feed/key.atom`]);
  });
  test('4.1.2: each entry has one id, title and updated, and without content an alternate link', () => {
    for (const entry of elements(doc, '//a:entry')) {
      for (const name of ['id', 'title', 'updated']) expect(texts(entry, `a:${name}`)).toHaveLength(1);
      expect(given(entry, 'a:link[@rel="alternate"]', 'href')).toEqual([`${ORIGIN}/procedures/P-0142/revisions/C`]);
      expect(elements(entry, 'a:content')).toEqual([]);
    }
  });
  test('4.1.1: no two entries share an id; 4.2.6: ids are absolute and stay when the page moves', () => {
    const ids = texts(doc, '//a:id');
    expect(new Set(ids).size).toBe(ids.length);
    for (const id of ids) expect(id).toMatch(URI);
    const elsewhere = readAtom(
      feed({ origin: 'https://moved.example', self: 'https://moved.example/feed/other.atom' }),
    );
    expect(texts(elsewhere, '//a:id')).toEqual([ids[0], ids[1]]);
  });
  test('4.2.2: each category has a term; 4.2.7: each link has an absolute href and a known relation', () => {
    expect(given(doc, '//a:category', 'term')).toHaveLength(elements(doc, '//a:category').length);
    for (const href of given(doc, '//a:link', 'href')) expect(href).toMatch(URI);
    // "first" and "next" are of RFC 5005, 3.
    expect(new Set(given(doc, '//a:link', 'rel'))).toEqual(new Set(['self', 'first', 'next', 'alternate']));
  });
  test('3.1.1: titles and summaries are plain text, without child elements', () => {
    for (const name of ['title', 'summary']) expect(elements(doc, `//a:${name}[@type or *]`)).toEqual([]);
  });
});

test('a title, a reason and a name read as they were written, whatever is in them', () => {
  const hostile = 'Bore < 81 mm & "gap" ]]> <script>alert(1)</script> Ærø 🔧';
  const doc = readAtom(feed({ entries: [feedEvent({ title: hostile, author: hostile, reason: `${hostile}.` })] }));
  expect(texts(doc, '//a:entry/a:title')).toEqual([`P-0142 C, ${hostile}: published`]);
  expect(texts(doc, '//a:author/a:name')).toEqual([hostile]);
  expect(texts(doc, '//a:entry/a:summary')[0]).toContain(hostile);
});

test('any words make a valid feed, and come back as they were but for what XML cannot hold', () => {
  fc.assert(
    fc.property(
      fc.string({ unit: 'binary', maxLength: 40 }),
      fc.string({ unit: 'binary', maxLength: 40 }),
      (title, author) => {
        const doc = readAtom(feed({ entries: [feedEvent({ title, author })] }));
        const plain = (text: string) =>
          [...text].every((c) => /[\t\n\u0020-\uD7FF\uE000-\uFFFD]|[\u{10000}-\u{10FFFF}]/u.test(c));
        if (plain(author)) expect(texts(doc, '//a:author/a:name')).toEqual([author]);
        doc.dispose();
      },
    ),
    { numRuns: 200 },
  );
});

describe('what an entry says', () => {
  test('the reason, then what changed, in sentences; and never to work from it', () => {
    expect(summaryOf(feedEvent())).toBe(
      'It wept at the corners.\nWhat changed:\nA torque changes: Cover bolt.\nWork from the sheet in the book, not from this notice.',
    );
  });
  test('a first revision says so and lists no changes', () => {
    expect(
      summaryOf(feedEvent({ supersedes: null, criticalReasons: ['a new sheet gives a torque: Cover bolt'] })),
    ).toBe('First revision.\nIt wept at the corners.\nWork from the sheet in the book, not from this notice.');
  });
  test('a withdrawal says that the sheet is not to be worked from', () => {
    expect(summaryOf(feedEvent({ kind: 'withdrawn', reason: 'The torque is wrong.' }))).toBe(
      'The torque is wrong.\nDo not work from this sheet, on paper neither.',
    );
  });
});
