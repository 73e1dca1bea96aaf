import fc from 'fast-check';
import JSZip from 'jszip';
import { describe, expect, it } from 'vitest';
import type { ImportedSheet } from '@/domain/api/schemas/imports';
import { parseProcedure } from '@/domain/procedure/parse';
import { readDraft } from '@/domain/writing/readDraft';
import { importDocx } from '@/server/imports/docx';
import * as d from '../../factories/documents';
import { docxWords } from '../../factories/docxWords';
import { lost } from '../../factories/words';

async function read(file: Buffer): Promise<ImportedSheet> {
  const answer = await importDocx(file);
  if (!answer.ok) throw new Error(answer.message);
  return answer.imported;
}
const readable = ({ source, leftOut }: ImportedSheet) =>
  [source.replace(/^ *-? ?key: .*$/gm, ''), ...leftOut.map(({ quote }) => quote)].join('\n');
const draftOf = ({ source }: ImportedSheet) => {
  const draft = readDraft(source);
  if (!draft) throw new Error('The form cannot take it.');
  return draft;
};

describe('a how-to from a word processor', () => {
  const blocks = [
    d.heading(1, 'Fit the drum cover'),
    d.para([
      d.run('Done when it '),
      d.run('weeps', { bold: true }),
      d.run('.'),
      d.footnote(1),
      d.run(' Give it 10'),
      d.run('2', { superScript: true }),
      d.run(' turns.'),
    ]),
    d.para('WARNING: Hot oil can burn skin. Let it cool.'),
    d.point('Take the cover off. Keep the screws.'),
    d.point('the long ones left', 1),
    d.point(d.comment(0, 'Clean the face')),
    d.para([d.run('Wipe it '), d.inserted('twice'), d.deleted('once')]),
    d.para([
      d.picture('The cover from below'),
      d.link('the maker', 'http://maker.example/a'),
      d.run(' and '),
      d.link('the book', 'https://book.example/b'),
    ]),
    d.table([
      ['Face', 'State'],
      [['left', 'upper'], 'dry'],
    ]),
    d.table([['merged'], ['a', 'b']], { merged: true }),
    d.table([['CAUTION: The edge can cut. Wear gloves.']]),
    d.textBox('Words in a box'),
    d.para([d.formula('p=F')]),
    d.point([d.run('Tighten to 10 N·m', { italics: true })]),
    d.para([d.run('gone', { strike: true })]),
  ];
  const made = d.docx(blocks, {
    footnotes: { 1: 'As the maker says' },
    comments: ['Which cloth?'],
    head: 'Shop paper',
    foot: 'Page foot',
  });

  it('keeps title, steps, lists, tables, emphasis and links', async () => {
    const draft = draftOf(await read(await made));
    expect(draft.title).toBe('Fit the drum cover');
    expect(draft.intro).toBe('Done when it **weeps**. Give it 10² turns.');
    expect(draft.steps.map(({ title, body }) => [title, body])).toEqual([
      ['Take the cover off', 'Keep the screws.\n\n1. the long ones left'],
      [
        'Clean the face',
        'Wipe it twice\n\nthe maker and [the book](https://book.example/b)\n\n| Face | State |\n| - | - |\n| left upper | dry |\n\n| merged | |\n| - | - |\n| a | b |\n\nWords in a box',
      ],
      ['Tighten to 10 N·m', ''],
    ]);
    expect(draft.cautions.map(({ signal, hazard, avoid }) => [signal, hazard, avoid])).toEqual([
      ['WARNING', 'Hot oil', 'Let it cool.'],
      ['CAUTION', 'The edge', 'Wear gloves.'],
    ]);
    expect(draft.steps.map(({ cautions }) => cautions)).toEqual([['hot-oil'], ['the-edge'], []]);
  });

  it('tells what it could not take, where it stood and what it said', async () => {
    const { leftOut } = await read(await made);
    expect(leftOut.map(({ what, where, quote, became }) => [what, where, quote, became])).toEqual([
      ['Footnote', 'the introduction', 'As the maker says', null],
      ['Comment', 'step 2: Clean the face', 'Comment [WC1] Which cloth?', null],
      ['Picture', 'step 2: Clean the face', 'The cover from below', null],
      ['Address of a link', 'step 2: Clean the face', 'http://maker.example/a', 'its words, without the link'],
      ['Merged cells of a table', 'step 2: Clean the face', '', 'single cells, some of them empty'],
      ['Words that were struck through', 'step 3: Tighten to 10 N·m', 'gone', null],
      ['Tracked change: words put in', 'near “Wipe it twice”', 'twice', 'words like all others'],
      ['Tracked change: words taken out', 'near “Wipe it twice”', 'once', null],
      ['Text box', 'near “Words in a box”', 'Words in a box', 'words where it was anchored'],
      ['Formula', 'near “Words in a box”', 'p=F', null],
      ['Head of the pages', 'every page', 'Shop paper', null],
      ['Foot of the pages', 'every page', 'Page foot', null],
    ]);
  });

  it('lists the numbers, and makes values of none', async () => {
    const { figures, source } = await read(await made);
    expect(figures).toEqual([
      { step: 'Tighten to 10 N·m', text: '10 N·m', quote: 'Tighten to 10 N·m', list: 'torques' },
    ]);
    expect(source).not.toMatch(/^torques:/m);
  });

  it('loses no word, as libxml2 reads the document', async () => {
    const file = await made;
    const kept = readable(await read(file)).replace(/10²/g, '102');
    expect(lost(await docxWords(file), kept)).toEqual([]);
  });
});

it('takes numbers that were typed by hand for the points of a list', async () => {
  const imported = await read(
    await d.docx([
      d.heading(1, 'Fit it'),
      d.para('1. Open it.'),
      d.para('WARNING: The lid can fall. Hold it.'),
      d.para('2) Lift the lid'),
      d.para('with both hands'),
      d.para('3. Close it'),
    ]),
  );
  expect(draftOf(imported).steps.map(({ title, cautions, body }) => [title, cautions.join(), body])).toEqual([
    ['Open it', '', ''],
    ['Lift the lid', 'the-lid', 'with both hands'],
    ['Close it', '', ''],
  ]);
  expect(imported.leftOut.map(({ what, quote }) => [what, quote])).toEqual([
    ['Number typed by hand', '1'],
    ['Number typed by hand', '2'],
    ['Number typed by hand', '3'],
  ]);
  // One number alone, or one that does not count up, is a number.
  const other = await read(await d.docx([d.heading(1, 'Fit it'), d.para('7. September was dry.'), d.para('2. Words')]));
  expect(draftOf(other).steps[0]?.body).toBe('7\\. September was dry.\n\n2\\. Words');
});

it('tells the words of diagrams and charts, which the text does not hold', async () => {
  const zip = await JSZip.loadAsync(await d.docx([d.heading(1, 'Fit it'), d.para('Words')]));
  const a = 'xmlns:a="http://schemas.openxmlformats.org/drawingml/2006/main"';
  zip.file('word/diagrams/data1.xml', `<x ${a}><a:p><a:r><a:t>Open &amp; close</a:t></a:r></a:p></x>`);
  zip.file('word/charts/chart1.xml', '<x xmlns:c="c"><c:pt><c:v>Flow</c:v></c:pt><c:pt><c:v>12</c:v></c:pt></x>');
  const { leftOut } = await read(await zip.generateAsync({ type: 'nodebuffer' }));
  expect(leftOut.map(({ what, quote }) => [what, quote])).toEqual([
    ['Diagram', 'Open & close'],
    ['Chart', 'Flow 12'],
  ]);
});

describe('any document', () => {
  let count = 0;
  const word = fc.constant(null).map(() => `w${(count += 1)}q`);
  const words = (max = 5) => fc.array(word, { minLength: 1, maxLength: max }).map((some) => some.join(' '));
  const signalled = fc
    .tuple(fc.constantFrom('Warning: ', 'DANGER ', 'Notice - ', ''), words())
    .map(([s, text]) => s + (s ? `A${text}` : text));
  const runs = fc.array(
    fc.oneof(
      { weight: 4, arbitrary: signalled.map((text) => d.run(`${text}. `)) },
      words().map((text) => d.run(text, { bold: true })),
      words().map((text) => d.run(text, { strike: true })),
      words().map(d.inserted),
      words().map(d.deleted),
      words().map(d.picture),
      words().map(d.formula),
      fc.tuple(words(), word).map(([text, host]) => d.link(text, `https://${host}.example`)),
    ),
    { minLength: 1, maxLength: 4 },
  );
  const block = fc.oneof(
    { weight: 4, arbitrary: runs.map(d.para) },
    fc
      .tuple(fc.constantFrom(1 as const, 2 as const, 3 as const), words(22))
      .map(([level, text]) => d.heading(level, text)),
    fc.constantFrom('Parts', 'Tools', 'Steps', 'Warning').map((text) => d.heading(2, text)),
    fc.tuple(runs, fc.nat({ max: 2 })).map(([of, level]) => d.point(of, level)),
    fc.tuple(runs, fc.nat({ max: 2 })).map(([of, level]) => d.dot(of, level)),
    fc
      .array(fc.tuple(words(), words()), { minLength: 1, maxLength: 3 })
      .map((rows) => d.table(rows.map((row) => [...row]))),
    fc.tuple(words(), words(), words()).map(([a, b, c]) => d.table([[a], [b, c]], { merged: true })),
    words().map(d.textBox),
    words().map((text) => d.table([[text]])),
  );

  it('is a draft that can be read, and no word of it is lost', { timeout: 120_000 }, async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(block, { minLength: 1, maxLength: 10 }),
        words(),
        words(),
        async (blocks, note, foot) => {
          const file = await d.docx([...blocks, d.para([d.run('last words'), d.footnote(1)])], {
            footnotes: { 1: note },
            foot,
          });
          const imported = await read(file);
          expect(lost(await docxWords(file), readable(imported))).toEqual([]);
          expect(parseProcedure(imported.source).ok).toBe(true);
        },
      ),
      { numRuns: 40 },
    );
  });
});
