import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import type { Node } from 'prosemirror-model';
import { describe, expect, it } from 'vitest';
import { toSource } from '@/domain/procedure/canonical';
import { parseProcedure } from '@/domain/procedure/parse';
import { documentOf } from '@/domain/writing/field/fromTree';
import { readWords } from '@/domain/writing/field/readWords';
import { givenOf, isChip, SCHEMAS, type Where } from '@/domain/writing/field/schema';
import { writeWords } from '@/domain/writing/field/writeWords';
import { typedProcedure } from '../../procedure/arbitraries';

function open(text: string, where: Where): Node {
  const read = readWords(text, where);
  if (!read.ok) throw new Error(`${read.problem.message}\n${text}`);
  const document = documentOf(read.nodes, SCHEMAS[where]);
  document.check();
  return document;
}
const through = (text: string, where: Where) => writeWords(open(text, where), where);

/** Tags of a text as they stand in it. */
const tagsIn = (text: string) => text.match(/<(Torque|Limit|Part|Timer|Figure|Worksheet)\b[^>]*>/g) ?? [];
const tagsOf = (document: Node): string[] => {
  const tags: string[] = [];
  document.descendants((node) => {
    if (isChip(node))
      tags.push(
        `<${node.type.name}${Object.entries(givenOf(node))
          .map(([name, value]) => ` ${name}="${value}"`)
          .join('')} />`,
      );
  });
  return tags;
};

const folder = 'content/procedures';
const files = readdirSync(folder).filter((name) => name.endsWith('.mdx'));

describe('words, field and words again', () => {
  it.each(files)('%s is the same to the letter, step by step, with every value in its place', (name) => {
    const parsed = parseProcedure(readFileSync(`${folder}/${name}`, 'utf8'));
    if (!parsed.ok) throw new Error(name);
    const { intro, steps } = parsed.procedure;
    expect(through(intro, 'intro')).toBe(intro);
    for (const { body } of steps) {
      expect(through(body, 'step')).toBe(body);
      expect(tagsOf(open(body, 'step'))).toEqual(tagsIn(body));
    }
  });

  it('is the same for whatever a sheet can hold', () => {
    let tried = 0;
    fc.assert(
      fc.property(typedProcedure, (typed) => {
        const parsed = parseProcedure(toSource(typed));
        if (!parsed.ok) return;
        const { intro, steps } = parsed.procedure;
        tried += 1;
        expect(through(intro, 'intro')).toBe(intro);
        for (const { body } of steps) expect(through(body, 'step')).toBe(body);
      }),
      { numRuns: 100 },
    );
    expect(tried).toBeGreaterThan(30);
  }, 120_000);

  it.each([
    '*a*__b__',
    '*a*_b_',
    '**a _b_**',
    '*__a__ b*',
    '*[a](/b)*',
    '[*a*](/b)',
    '*a*[*b*](/c)',
    '[a](/b)[c](/b)',
    '*a&#x20;*&#x62;',
    '*`a`*`b`',
    '**<Torque of="a" pass="2" />** `x|y`',
    'a\\\nb <Part of="a" /> c',
    '- a\n\n* b',
    '1. a\n\n1) b',
    '-\n- b',
    '- - a\n  - b\n- c',
    '- a\n\n  b\n\n- > c\n  >\n  > - d',
    '| a\\|b | `c\\|d` |\n| :- | -: |\n| <Limit of="x" /> | |',
    '<Hold>One *two* <Torque of="a" />\\\nthree.</Hold>',
    '<Worksheet kind="bore" of="clearance:a b" />',
    'Fish \\&amp; chips \\<b> \\{c} 5 \\* 3',
    '<Torque of="a" /> <Limit of="b" />',
  ])('%j', (text) => {
    const read = readWords(text, 'step');
    expect(read.ok, read.ok ? '' : read.problem.message).toBe(true);
    const canonical = through(text, 'step');
    expect(canonical).toBe(text);
  });

  it('keeps a hold point that is still to be written', () => {
    expect(through('Look.\n\n<Hold />', 'step')).toBe('Look.\n\n<Hold />');
  });
});

describe('words that a field cannot show', () => {
  it.each([
    ['Tighten to <Torque of="a".', 'step', 1, /attribute|component/],
    ['One.\n\n# Two', 'step', 3, /Headings/],
    ['a\n</Step>\n\n<Step id="b" title="b">\nc', 'step', 1, /Another step/],
    ['<Caution of="a" />\n\nb', 'step', 1, /ahead of the step/],
    ['<Hold>a</Hold>', 'intro', 1, /introduction/],
    ['---\na: b\n---', 'intro', 1, /./],
  ] as const)('%j', (text, where, line, says) => {
    const read = readWords(text, where);
    if (read.ok) throw new Error('It was read.');
    expect(read.problem.line).toBe(line);
    expect(read.problem.message).toMatch(says);
  });
});
