import type { Root } from 'hast';
import rehypeParse from 'rehype-parse';
import { unified } from 'unified';
import { describe, expect, it } from 'vitest';
import { SCHEMAS } from '@/domain/writing/field/schema';
import { writeWords } from '@/domain/writing/field/writeWords';
import { fromHtml } from '@/domain/writing/paste/fromHtml';
import { fromPlain } from '@/domain/writing/paste/fromPlain';
import { leftOutWords } from '@/domain/writing/paste/leftOut';
import { GOOGLE_DOC, LIBREOFFICE, WEB_PAGE, WORD_LISTS, WORD_TABLE } from '../../../fixtures/clipboard';

const schema = SCHEMAS.step;
const written = (content: Parameters<typeof schema.topNodeType.create>[1]) => {
  const document = schema.topNodeType.createChecked(null, content);
  return writeWords(document, 'step').split('\n');
};
function pasted(html: string) {
  const { content, left } = fromHtml(unified().use(rehypeParse).parse(html) as Root, schema);
  return { lines: written(content), left: leftOutWords(left) };
}
const plain = (text: string) => written(fromPlain(text, schema, 'step'));

describe('what a word processor puts on the clipboard', () => {
  it('gives lists, heading and emphasis of a word processor with its own list paragraphs', () => {
    expect(pasted(WORD_LISTS)).toEqual({
      lines: [
        '**Refit the cover**',
        '',
        'Before you start, **read** the *whole* sheet. Use 10\u00a0N·m at most.',
        '',
        '- Wipe the rail',
        '- Lay the gasket',
        '  1. corners first',
        '  2. then the straights',
        '- Run the bolts in',
        '',
        '4. Draw it down',
        '5. Go round again',
        '',
        'Area 10² mm, O₂ sensor.',
      ],
      left: [
        '1 picture was left out: “The bolt order”. Put drawings in with the button Drawing.',
        '1 passage that was struck through was left out: “Use 25 N·m.”.',
      ],
    });
  });

  it('gives a table its first row as heads, and fills what was merged', () => {
    expect(pasted(WORD_TABLE).lines).toEqual([
      '| Bolt | Torque | Remark |',
      '| - | - | - |',
      '| Cover \\| rear | 10 N·m | dry second pass |',
      '| All | | none |',
    ]);
  });

  it('takes no wrapper of an online document for bold, and reads bold from style', () => {
    expect(pasted(GOOGLE_DOC)).toEqual({
      lines: [
        '**Check the weep**',
        '',
        'Wipe the edge **dry** and *wait*.',
        '',
        '- Look at the cloth',
        '  - front corners',
        '- Sign',
        '',
        'See [the handbook](https://halden.example/weep).',
      ],
      left: [],
    });
  });

  it('reads paragraphs, fonts and lists of another one', () => {
    expect(pasted(LIBREOFFICE).lines).toEqual([
      'Drain the **coolant** and the *oil*.',
      '',
      '3. Open the tap',
      '4. Close it',
      '',
      '> Hot coolant burns.',
    ]);
  });

  it('takes the words of a page and leaves what is not words', () => {
    expect(pasted(WEB_PAGE)).toEqual({
      lines: ['**Torque**', '', 'First line\\', 'second line', '', 'next paragraph with `code` and a bad link.'],
      left: [
        '2 pictures were left out: “A valve”. Put drawings in with the button Drawing.',
        '1 link was left out, the words stayed: “bad link”. Links go to https:// or to a path of this book.',
      ],
    });
  });
});

describe('numbers that are pasted', () => {
  it.each([
    ['10<span style="vertical-align:super">2</span> mm', '10² mm'],
    ['O<span style="vertical-align: sub">2</span>', 'O₂'],
    ['10<sup>2.5</sup>', '10^2.5'],
    ['10<sup><b>2</b>.5</sup>3', '10^**2**.5 3'],
    ['A1<sub>2.5</sub>', 'A1 2.5'],
    ['the 1<sup>st</sup> of 3<sup>[2]</sup>', 'the 1st of 3[2]'],
    ['1<s>0</s>2', '1 2'],
    ['1<img alt="to">2', '1 2'],
    ['a<s>b</s>c', 'ac'],
  ])('%s', (html, words) => expect(pasted(`<p>${html}</p>`).lines.join('|').replaceAll('\\', '')).toBe(words));

  it('keep the caption of their table, and their row and column where cells span rows', () => {
    const { lines } = pasted(
      '<table><caption>Engine cold</caption><tr><th>Valve<th>Side<th>Gap</tr>' +
        '<tr><td rowspan=2>Inlet<td>left<td>0.20</tr><tr><td>right<td>0.25</tr><tr><td>Outlet<td>left<td>0.30</tr></table>',
    );
    expect(lines).toEqual([
      'Engine cold',
      '',
      '| Valve | Side | Gap |',
      '| - | - | - |',
      '| Inlet | left | 0.20 |',
      '| Inlet | right | 0.25 |',
      '| Outlet | left | 0.30 |',
    ]);
  });

  it('are told where they stood in a formula or between the points of a list', () => {
    expect(pasted('<p>So <math><mi>p</mi><mo>=</mo><mn>2</mn></math></p><ul>at 20 bar<li>a</li></ul>')).toEqual({
      lines: ['So', '', '- a'],
      left: [
        '1 formula was left out: “p=2”. Write it in one line.',
        '1 passage between points of a list was left out: “at 20 bar”.',
      ],
    });
  });
});

describe('plain words', () => {
  it.each([
    ['One.\nTwo.', ['One.', '', 'Two.']],
    ['One\nis long.\n\nTwo.', ['One is long.', '', 'Two.']],
    ['Do:\n- a\n- b\n  - c\n* d', ['Do:', '', '- a', '- b', '  - c', '- d']],
    ['1. a\n2) b\nEnd', ['1. a', '2. b', '', 'End']],
    ['- a\n\n- b\n\nEnd', ['- a', '- b', '', 'End']],
    ['a *b* <c> {d}', ['a \\*b\\* \\<c> \\{d}']],
    ['Set\u200b to\u202e 10', ['Set to 10']],
  ])('%j', (text, lines) => expect(plain(text)).toEqual(lines));

  it('reads our own text with its components', () => {
    expect(plain('Tighten to <Torque of="bolt" pass="1" />.\r\n\r\n<Hold>Look.</Hold>')).toEqual([
      'Tighten to <Torque of="bolt" pass="1" />.',
      '',
      '<Hold>Look.</Hold>',
    ]);
    expect(plain('Broken <Torque of="bolt"')).toEqual(['Broken \\<Torque of="bolt"']);
  });

  it('makes an address a link where it may be one', () => {
    expect(plain('https://halden.example/a')).toEqual(['[https://halden.example/a](https://halden.example/a)']);
    expect(plain('http://halden.example')[0]).not.toContain('](');
  });
});
