import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { importMarkdown } from '@/domain/writing/import/importHowTo';
import { readDraft } from '@/domain/writing/readDraft';
import { SAMPLE } from '../../procedure/sample';

const read = (markdown: string) => {
  const read = importMarkdown(markdown);
  if (!read.ok) throw new Error(read.message);
  return read.imported;
};
const draft = (markdown: string) => {
  const found = readDraft(read(markdown).source);
  if (!found) throw new Error('The form cannot take it.');
  return found;
};
const titles = (markdown: string) => draft(markdown).steps.map(({ id, title }) => `${id}: ${title}`);

describe('title and steps', () => {
  it('takes the first heading for the title and those of the next level for the steps', () => {
    const text = '# Swap the drum\n\nIntro.\n\n## Open it\n\nA.\n\n### Inside\n\nB.\n\n## Close it\n\nC.';
    expect(draft(text).title).toBe('Swap the drum');
    expect(draft(text).intro).toBe('Intro.');
    expect(titles(text)).toEqual(['open-it: Open it', 'close-it: Close it']);
    expect(draft(text).steps[0]?.body).toBe('A.\n\n**Inside**\n\nB.');
    expect(read(text).leftOut).toEqual([
      { what: 'Heading inside a step', where: 'step 1: Open it', quote: 'Inside', became: 'a line in bold' },
    ]);
  });

  it('takes the points of a numbered list where there are no headings, their first sentence as title', () => {
    const text = '# T\n\n1. Open it. Wait a little.\n2. Close it\n   - gently\n   - all round\n\nEnd.';
    expect(titles(text)).toEqual(['open-it: Open it', 'close-it: Close it']);
    expect(draft(text).steps.map(({ body }) => body)).toEqual(['Wait a little.', '- gently\n- all round\n\nEnd.']);
  });

  it('takes numbered points under a heading that only says that the steps follow', () => {
    const text = '# T\n\n## Procedure\n\n1. Open it\n2. Close it\n';
    expect(titles(text)).toEqual(['open-it: Open it', 'close-it: Close it']);
    expect(read(text).leftOut).toMatchObject([{ what: 'Heading', quote: 'Procedure', became: 'the steps themselves' }]);
  });

  it('leaves title and steps to fill in where the text has none, and gives equal titles ids of their own', () => {
    const text = draft('Just words.');
    expect([text.title, text.steps.map(({ title }) => title)]).toEqual([
      'Fill in: which task it is.',
      ['Fill in: what this step does.'],
    ]);
    expect(titles('# T\n\n## Look\n\na\n\n## Look\n\nb')).toEqual(['look: Look', 'look-2: Look']);
  });

  it('cuts no title: one that is too long stands in the step', () => {
    const long = 'a very long sentence that goes on '.repeat(4).trim();
    const found = draft(`# T\n\n1. ${long}\n`);
    expect(found.steps[0]).toMatchObject({ title: 'Fill in: what this step does.', body: long });
    expect(draft(`# ${long}\n\n1. Go\n`)).toMatchObject({ title: 'Fill in: which task it is.', intro: long });
  });
});

describe('parts and tools', () => {
  it('become lists where their heading says so plainly, and ask for what the document does not say', () => {
    const text =
      '# T\n\n## Parts\n\n| Part | Qty | No. |\n|-|-|-|\n| Gasket | 2 | AB-1 |\n\n## Tools\n\n- Wrench\n- Drift\n\n## Go\n\nGo.';
    const { parts, tools, steps } = draft(text);
    expect(parts).toMatchObject([
      {
        name: 'Gasket',
        quantity: '2',
        number: 'AB-1',
        action: 'inspect',
        note: 'Fill in: new, inspected or used again.',
      },
    ]);
    expect(tools.map(({ name }) => name)).toEqual(['Wrench', 'Drift']);
    expect(steps.map(({ title }) => title)).toEqual(['Go']);
    expect(read(text).leftOut.map(({ quote, became }) => `${quote}: ${became}`)).toEqual([
      'Parts Part Qty No.: the list of parts',
      'Tools: the list of tools',
    ]);
  });

  it('stay tables and lists where a column, a row or the heading does not fit', () => {
    const table = '| Part | Colour |\n|-|-|\n| Gasket | red |\n';
    const text = draft(`# T\n\n## Parts\n\n${table}\n## Go\n\nGo.`);
    expect(text.parts).toEqual([]);
    expect(text.intro).toBe('**Parts**\n\n| Part | Colour |\n| - | - |\n| Gasket | red |');
    expect(draft(`# T\n\n## What we took\n\n${table}\n## Go\n\nGo.`).steps.map(({ title }) => title)).toEqual([
      'What we took',
      'Go',
    ]);
  });
});

describe('numbers', () => {
  it('are listed with their step and sentence, and are no values yet', () => {
    const { figures, source } = read(
      '# T\n\n## Close it\n\nTighten to 10 N·m. Then read 0.15 mm, wait 5 minutes.\n\n- or 12 ft-lb\n\nUse a 10 mm socket.',
    );
    expect(figures).toEqual([
      { step: 'Close it', text: '10 N·m', quote: 'Tighten to 10 N·m.', list: 'torques' },
      { step: 'Close it', text: '0.15 mm', quote: 'Then read 0.15 mm, wait 5 minutes.', list: 'limits' },
      { step: 'Close it', text: '5 minutes', quote: 'Then read 0.15 mm, wait 5 minutes.', list: 'timers' },
      { step: 'Close it', text: '12 ft-lb', quote: 'or 12 ft-lb', list: 'torques' },
    ]);
    expect(source).not.toMatch(/^(torques|limits|timers):/m);
  });

  it('are never made of two by what is left out between them', () => {
    const { source } = read('# T\n\n## Go\n\n10<sup>2</sup> and 10<b></b>20 and 3~~x~~4 and 5[^1]6.\n\n[^1]: note');
    expect(source).toContain('10² and 10 20 and 3 4 and 5 6.');
  });
});

describe('what a sheet cannot hold', () => {
  const { source, leftOut } = read(`---
made: by hand
---

# T

## Look

![A drum](drum.png "From above") and ~~gone~~ and <kbd>key</kbd> [bad](http://plain.example/x) [good](https://good.example/y "tip") [ref][r]

\`\`\`sh
run it
\`\`\`

<div onclick="alert(1)">raw</div>

- [x] ticked

word[^n]

[^n]: The note.

[r]: https://ref.example/z
`);
  it.each([
    ['Fields above the text', 'made: by hand'],
    ['Picture', 'A drum From above drum.png'],
    ['Words that were struck through', 'gone'],
    ['HTML', '<kbd> </kbd>'],
    ['Address of a link', 'http://plain.example/x'],
    ['Words behind a link', 'tip'],
    ['Code', 'sh run it'],
    ['HTML', '<div onclick="alert(1)">raw</div>'],
    ['Box to tick', 'x ticked'],
    ['Mark of a footnote', 'n'],
    ['Footnote', 'n The note.'],
  ])('%s is listed: %s', (what, quote) => {
    expect(leftOut.map((one) => `${one.what}: ${one.quote}`)).toContain(`${what}: ${quote}`);
  });
  it('keeps what it can: words, good links, emphasis', () => {
    expect(source).toContain('and and key bad [good](https://good.example/y) [ref](https://ref.example/z)');
    expect(source).not.toMatch(/<div|onclick|alert|plain\.example/);
  });
});

it('takes a sheet that was written out of a book as it is', () => {
  const canonical = parseProcedure(SAMPLE);
  expect(read(SAMPLE)).toMatchObject({ source: canonical.ok ? canonical.canonical : '', leftOut: [], figures: [] });
});

it('answers text of a sheet that can be written on at once', () => {
  const parsed = parseProcedure(read('# {a} *b\n\n1. <c> & | `d`\n2. import x from "y"\n').source);
  expect(parsed.ok).toBe(true);
});

describe('refusals', () => {
  it.each([
    ['an empty text', '  \n\n ', /There are no words/],
    ['signs without a word', '# ***\n\n- …', /There are no words/],
    ['more than 64 KB', 'word '.repeat(14_000), /larger than 64 KB/],
    ['brackets without end', '['.repeat(60_000), /4,000 characters|250 formatting signs/],
    ['deep quotations', `${'> '.repeat(60)}x`, /six deep/],
    ['a thousand points', Array.from({ length: 201 }, (_, i) => `1. Do ${i}`).join('\n'), /200 steps/],
  ])('%s', (_, text, message) => {
    const answer = importMarkdown(text);
    expect(answer.ok ? 'ok' : answer.message).toMatch(message);
  });
});
