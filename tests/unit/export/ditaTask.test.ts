import { readdirSync, readFileSync } from 'node:fs';
import { XmlElement, type XmlDocument } from 'libxml2-wasm';
import { describe, expect, test } from 'vitest';
import { ditaTask } from '@/domain/export/dita/task';
import type { TaskFacts } from '@/domain/export/dita/prolog';
import { parseProcedure } from '@/domain/procedure/parse';
import type { RenderedProcedure } from '@/domain/procedure/types';
import { limitText, torqueText } from '@/domain/procedure/values';
import { validTask } from '../../factories/dita';

/** Against the DTD of OASIS DITA 1.2 (technicalContent/dtd/task.dtd) under tests/fixtures, read by libxml2. */

const FACTS: TaskFacts = {
  number: 'P-0142',
  letter: 'C',
  sheetCheck: '7f3a91c0',
  standing: 'current',
  firstPublished: '2026-01-02T00:00:00.000Z',
  published: '2026-03-04T00:00:00.000Z',
  author: 'Rowan Achterberg',
  reviewers: ['Ines Okafor', 'Tobias Marchetti'],
  book: 'Common book',
  engines: ['Tarn T18F'],
};
const PLACES = {
  link: (url: string) => ({ href: url, scope: 'external' as const }),
  figure: (file: string) => ({ href: `figures/${file}`, scope: 'local' as const }),
};
const taskOf = (rendered: RenderedProcedure, facts: Partial<TaskFacts> = {}) =>
  ditaTask(rendered, { ...FACTS, ...facts }, PLACES);

function read(source: string): RenderedProcedure {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors));
  return parsed.rendered;
}

const elements = (from: XmlDocument | XmlElement, path: string): XmlElement[] =>
  from.find(path).filter((node) => node instanceof XmlElement);
const texts = (from: XmlDocument | XmlElement, path: string) => elements(from, path).map(({ content }) => content);

const shipped = ['content/procedures', 'content/demonstration'].flatMap((folder) =>
  readdirSync(folder).map((name) => ({ name, source: readFileSync(`${folder}/${name}`, 'utf8') })),
);

describe.each(shipped)('$name', ({ source }) => {
  const rendered = read(source);
  const f = rendered.frontmatter;
  const doc = validTask(taskOf(rendered));

  test('has its title, its summary and each step once, in order, with its words', () => {
    expect(texts(doc, '/task/title')).toEqual([f.title]);
    expect(texts(doc, '/task/shortdesc')).toEqual([f.summary]);
    expect(texts(doc, '//steps/step/cmd')).toEqual(rendered.steps.map(({ title }) => title));
    // The sheet's plain words are in metric; the task says a value in both units.
    const inches = [
      ...f.torques.flatMap((one) => [
        torqueText(one),
        ...(one.passes ?? []).map((_, i) => torqueText(one, { pass: i + 1 })),
      ]),
      ...f.limits.map(limitText),
    ].map(({ inch }) => ` (${inch})`);
    elements(doc, '//steps/step').forEach((step, i) => {
      const said = inches.reduce((words, inch) => words.replaceAll(inch, ''), step.content);
      for (const line of rendered.steps[i]!.text.split('\n').filter(Boolean))
        expect(said.replace(/\s+/g, ' ')).toContain(line.replace(/\s+/g, ' '));
    });
  });

  test('has every caution of a step ahead of its command, worst first and in full', () => {
    elements(doc, '//steps/step').forEach((step, i) => {
      const { cautions } = rendered.steps[i]!;
      const hazards = elements(step, 'hazardstatement');
      expect(hazards).toHaveLength(cautions.length);
      expect(elements(step, 'cmd/preceding-sibling::hazardstatement')).toHaveLength(cautions.length);
      for (const key of cautions) {
        const { signal, hazard, harm, avoid } = f.cautions.find((caution) => caution.key === key)!;
        const path = `hazardstatement[@type="${signal.toLowerCase()}"]/messagepanel`;
        expect(texts(step, `${path}/typeofhazard`)).toContain(hazard);
        expect(texts(step, `${path}/consequence`)).toContain(harm);
        expect(texts(step, `${path}/howtoavoid`)).toContain(avoid);
      }
    });
    // One that no step names holds for the whole task.
    const named = new Set(rendered.steps.flatMap(({ cautions }) => cautions));
    expect(elements(doc, '//prereq/hazardstatement')).toHaveLength(
      f.cautions.filter(({ key }) => !named.has(key)).length,
    );
  });

  test('has every torque and limit with its unit in both systems, its state and its origin', () => {
    const rows = elements(doc, '//prereq/table[title="Torques" or title="Limits"]/tgroup/tbody/row').map((row) =>
      texts(row, 'entry'),
    );
    const values = [
      ...f.torques.map((one) => ({ ...one, text: torqueText(one), state: one.condition })),
      ...f.limits.map((one) => ({ ...one, text: limitText(one), state: one.condition ?? '' })),
    ];
    expect(rows).toHaveLength(values.length);
    values.forEach(({ name, text, state, source: from }, i) => {
      const [called, to = '', said = '', origin] = rows[i]!;
      expect(called).toBe(name);
      expect(to).toContain(text.metric);
      expect(to).toContain(text.inch);
      expect(said.toLowerCase()).toContain(state.toLowerCase());
      expect(origin).toBe(f.sources.find(({ key }) => key === from)?.title ?? 'No source stated');
    });
    for (const row of rows) expect(row.slice(1).every((cell) => cell.trim() !== '')).toBe(true);
  });

  test('has at each step the values that the step works to, and every hold point', () => {
    elements(doc, '//steps/step').forEach((step, i) => {
      const { references, holds } = rendered.steps[i]!;
      const keys = new Set(
        references.flatMap((r) => (r.kind === 'torque' || r.kind === 'limit' ? [`${r.kind}:${r.key}`] : [])),
      );
      expect(elements(step, 'info/table[title="Values of this step"]/tgroup/tbody/row')).toHaveLength(keys.size);
      for (const r of references) {
        if (r.kind !== 'torque') continue;
        const torque = f.torques.find(({ key }) => key === r.key)!;
        const { metric, inch } = torqueText(torque, r.pass === undefined ? {} : { pass: r.pass });
        expect(texts(step, './/ph[@outputclass="torque"]')).toContain(metric === inch ? metric : `${metric} (${inch})`);
      }
      expect(texts(step, 'info/note[@outputclass="hold-point"]')).toEqual(holds.map((hold) => `Hold point. ${hold}`));
      expect(step.attr('importance')?.content).toBe(holds.length ? 'required' : undefined);
    });
  });

  test('has its drawings, its parts and its supplies', () => {
    const used = rendered.steps.flatMap(({ references }) =>
      references.flatMap((r) => (r.kind === 'figure' ? [r.key] : [])),
    );
    expect(elements(doc, '//fig/image').map((image) => image.attr('href')?.content)).toEqual(
      used.map((key) => `figures/${f.figures.find((figure) => figure.key === key)!.file}`),
    );
    expect(texts(doc, '//prereq/table[title="Parts"]/tgroup/tbody/row/entry[1]')).toEqual(
      f.parts.map(({ name }) => name),
    );
    expect(texts(doc, '//prereq/table[title="Supplies"]/tgroup/tbody/row/entry[1]')).toEqual(
      f.supplies.map(({ name }) => name),
    );
  });
});

const small = (body: string, head = '') => `---
title: A small sheet
summary: For a test.
system: sealing
engines:
  - tarn-t18f
minutes: 5
skill: apprentice
${head}---

<Step id="one" title="Do it">
${body}
</Step>
`;

describe('what the demonstration does not have', () => {
  test('tables, quotes, links, code, emphasis and lists in lists are valid and keep their words', () => {
    const doc = validTask(
      taskOf(
        read(
          small(
            'Look **here** and *there*, at `code` and [P-0101](/procedures/P-0101) or [abroad](https://example.com/?a=1&b=2).\n\n> A word of somebody else.\n\n- one\n  1. first\n  2. second\n- two\n\n| a | b |\n| --- | --- |\n| 1 | **2** |',
          ),
        ),
      ),
    );
    expect(texts(doc, '//info/p[1]')).toEqual(['Look here and there, at code and P-0101 or abroad.']);
    expect(texts(doc, '//info/lq/p')).toEqual(['A word of somebody else.']);
    expect(texts(doc, '//li/ol/li')).toEqual(['first', 'second']);
    expect(texts(doc, '//info/table/tgroup/tbody/row/entry')).toEqual(['1', '2']);
    expect(elements(doc, '//xref').map((xref) => xref.attr('href')?.content)).toEqual([
      '/procedures/P-0101',
      'https://example.com/?a=1&b=2',
    ]);
  });

  test('a limit without origin, a caution that no step names, a value in words', () => {
    const doc = validTask(
      taskOf(
        read(
          small(
            'Play: <Limit of="play" />.',
            'limits:\n  - key: play\n    name: Play\n    quantity: length\n    unit: mm\n    max: 0.1\ncautions:\n  - key: hot\n    signal: DANGER\n    hazard: Heat\n    harm: burns\n    avoid: Wait.\n',
          ),
        ),
        { standing: 'withdrawn' },
      ),
    );
    expect(texts(doc, '//prereq/table/tgroup/tbody/row/entry')).toEqual([
      'Play',
      '0.1 mm or less (0.0039 in or less)',
      'As the step says.',
      'No source stated',
    ]);
    expect(texts(doc, '//prereq/hazardstatement[@type="danger"]//typeofhazard')).toEqual(['Heat']);
    expect(texts(doc, '//context/note')).toEqual(['Withdrawn: do not work from this sheet.']);
    // Words and value stand as on the sheet: no blank has come in between.
    expect(texts(doc, '//info/p')).toEqual(['Play: 0.1 mm or less (0.0039 in or less).']);
  });

  test('words that would break XML are words', () => {
    const hostile = '</title><step> & "]]>" <!-- 🔧 é';
    const rendered = read(small('Words.'));
    const doc = validTask(
      taskOf({ ...rendered, frontmatter: { ...rendered.frontmatter, title: hostile } }, { author: `${hostile}\u0000` }),
    );
    expect(texts(doc, '/task/title')).toEqual([hostile]);
    expect(texts(doc, '//prolog/author[@type="creator"]')).toEqual([`${hostile}\uFFFD`]);
  });
});

test('the DTD refuses what is wrong, so that being valid means something', () => {
  const good = taskOf(read(shipped.find(({ name }) => name.startsWith('p-0142'))!.source));
  validTask(good);
  for (const [what, bad] of Object.entries({
    'a caution behind its command': good.replace(
      /(<hazardstatement[\s\S]*?<\/hazardstatement>)([\s\S]*?<\/cmd>)/,
      '$2$1',
    ),
    'an unknown signal word': good.replace('type="warning"', 'type="hot"'),
    'a step without a command': good.replace(/<cmd>[^<]*<\/cmd>/, ''),
    'a task without a title': good.replace(/<title>[^<]*<\/title>/, ''),
    'an unknown element': good.replaceAll('shortdesc>', 'abstrakt>'),
  })) {
    expect(bad, what).not.toBe(good);
    expect(() => validTask(bad), what).toThrow();
  }
});

test('it names the standard by its public identifier, so that any DITA program finds it', () => {
  expect(taskOf(read(small('Words.')))).toContain(
    '<!DOCTYPE task PUBLIC "-//OASIS//DTD DITA 1.2 Task//EN" "task.dtd">',
  );
});

test('the prolog says who, when, for what, and which sheet it is', () => {
  const doc = validTask(taskOf(read(small('Words.'))));
  expect(texts(doc, '//prolog/author')).toEqual(['Rowan Achterberg', 'Ines Okafor', 'Tobias Marchetti']);
  expect(elements(doc, '//critdates/*').flatMap((e) => [e.attr('date')?.content, e.attr('modified')?.content])).toEqual(
    ['2026-01-02', undefined, undefined, '2026-03-04'],
  );
  expect(texts(doc, '//prodinfo/prodname')).toEqual(['Tarn T18F']);
  expect(
    Object.fromEntries(elements(doc, '//othermeta').map((e) => [e.attr('name')?.content, e.attr('content')?.content])),
  ).toMatchObject({ procedure: 'P-0142', revision: 'C', 'sheet-check': '7f3a91c0', standing: 'current' });
});
