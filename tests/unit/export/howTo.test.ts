import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import type { Element, Root } from 'hast';
import rehypeParse from 'rehype-parse';
import { unified } from 'unified';
import { visit } from 'unist-util-visit';
import { describe, expect, test } from 'vitest';
import { howTo, scriptJson } from '@/domain/export/howTo';
import { parseProcedure } from '@/domain/procedure/parse';
import type { RenderedProcedure } from '@/domain/procedure/types';

const FACTS = {
  number: 'P-0142',
  letter: 'C',
  publishedAt: '2026-03-04T05:06:07.000Z',
  author: 'Rowan Achterberg',
  origin: 'https://book.example',
};
const shipped = readdirSync('content/procedures').map((name): [string, RenderedProcedure] => {
  const parsed = parseProcedure(readFileSync(`content/procedures/${name}`, 'utf8'));
  if (!parsed.ok) throw new Error(name);
  return [name, parsed.rendered];
});
const [, valveCover] = shipped.find(([name]) => name.startsWith('p-0142'))!;

test('a sheet says what it is, by the terms of schema.org/HowTo', () => {
  const { step, supply, tool, ...about } = howTo(valveCover, FACTS);
  expect(about).toMatchObject({
    '@context': 'https://schema.org',
    '@type': 'HowTo',
    name: 'Reseal the valve cover',
    identifier: 'P-0142',
    version: 'C',
    dateModified: '2026-03-04T05:06:07.000Z',
    totalTime: 'PT70M',
    url: 'https://book.example/procedures/P-0142/revisions/C',
  });
  expect(tool).toContainEqual({ '@type': 'HowToTool', name: 'Torque wrench, 2 to 25 N·m, reads to 0.2 N·m' });
  expect(supply).toContainEqual({ '@type': 'HowToSupply', name: 'Spark-plug tube seal', requiredQuantity: 4 });
  expect(step).toHaveLength(valveCover.steps.length);
});

test.each(shipped)(
  '%s: each step has its place, its permanent address, and its cautions and holds in its words',
  (_, rendered) => {
    const { step, description } = howTo(rendered, FACTS);
    expect(description).toContain('licensed practice come first');
    rendered.steps.forEach((one, i) => {
      expect((step as object[])[i]).toMatchObject({
        '@type': 'HowToStep',
        position: i + 1,
        name: one.title,
        url: `https://book.example/procedures/P-0142/revisions/C#step-${one.id}`,
      });
      const { text } = (step as readonly { text: string }[])[i]!;
      expect(text).toContain(one.text);
      for (const hold of one.holds) expect(text).toContain(`Hold point. ${hold}`);
      const cautions = rendered.frontmatter.cautions.filter(({ key }) => one.cautions.includes(key));
      for (const { signal, avoid } of cautions) {
        expect(text.indexOf(`${signal}: `)).toBeLessThan(text.indexOf(one.text));
        expect(text).toContain(avoid);
      }
      if (cautions.length > 0) expect(text.startsWith(cautions[0]!.signal)).toBe(true);
    });
  },
);

test('its time is an ISO 8601 duration', () => {
  // ISO 8601-1:2019, 5.5.2.3: minutes may be more than 59.
  for (const [, rendered] of shipped) expect(howTo(rendered, FACTS).totalTime).toMatch(/^PT[1-9]\d*M$/);
});

/** What a browser makes of a page with that in its script: the parser is that of the HTML standard. */
function scriptsIn(json: string): { scripts: Element[]; others: string[] } {
  const tree: Root = unified()
    .use(rehypeParse)
    .parse(`<!doctype html><body><script type="application/ld+json">${json}</script><p id="after">after</p>`);
  const scripts: Element[] = [];
  const others: string[] = [];
  visit(tree, 'element', (element) => {
    if (element.tagName === 'script') scripts.push(element);
    else others.push(element.tagName);
  });
  return { scripts, others };
}

describe('nothing that somebody wrote breaks out of its script', () => {
  const read = (title: string) => {
    const named = { ...valveCover, frontmatter: { ...valveCover.frontmatter, title } };
    const { scripts, others } = scriptsIn(scriptJson(howTo(named, FACTS)));
    expect(others).toEqual(['html', 'head', 'body', 'p']);
    expect(scripts).toHaveLength(1);
    const [words] = scripts[0]!.children;
    expect((JSON.parse(words?.type === 'text' ? words.value : '') as { name: string }).name).toBe(title);
  };
  test.each([
    '</script><script>alert(1)</script>',
    '<!--<script>',
    ']]>',
    '</SCRIPT >',
    '\u2028\u2029',
    '&lt;/script>',
    '"},{"',
  ])('%j', read);
  test('any words at all', () => {
    const piece = fc.constantFrom('<', '</', 'script', '>', '<!--', '-->', '"', '\\', '&', '\n', 'é', '🔧');
    fc.assert(
      fc.property(
        fc.array(piece, { maxLength: 12 }).map((pieces) => pieces.join('')),
        read,
      ),
    );
  });
  test('without the escape it would', () => {
    expect(scriptsIn(JSON.stringify({ name: '</script><b>' })).others).toContain('b');
  });
});
