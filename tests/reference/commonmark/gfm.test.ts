import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { inStep } from '../../unit/procedure/sample';
import { sameForm } from './html';

/**
 * Examples of the GitHub Flavored Markdown specification 0.29 (section 4.10 tables, 6.5 strikethrough, 5.3 task lists,
 * 6.9 autolinks). Written from memory of that text, not verified against it.
 */

const head = (...cells: string[]) => `<table><thead><tr>${cells.map((c) => `<th>${c}</th>`).join('')}</tr></thead>`;
const rows = (...all: string[][]) =>
  `<tbody>${all.map((r) => `<tr>${r.map((c) => `<td>${c}</td>`).join('')}</tr>`).join('')}</tbody></table>`;

/** [example of section 4.10, Markdown, HTML] */
const TABLES: [number, string, string][] = [
  [198, '| foo | bar |\n| --- | --- |\n| baz | bim |', head('foo', 'bar') + rows(['baz', 'bim'])],
  [199, '| abc | defghi |\n:-: | -----------:\nbar | baz', '<table><thead><tr><th align="center">abc</th><th align="right">defghi</th></tr></thead><tbody><tr><td align="center">bar</td><td align="right">baz</td></tr></tbody></table>'],
  [200, '| f\\|oo  |\n| ------ |\n| b `\\|` az |\n| b **\\|** im |', head('f|oo') + rows(['b <code>|</code> az'], ['b <strong>|</strong> im'])],
  [201, '| abc | def |\n| --- | --- |\n| bar | baz |\n> bar', `${head('abc', 'def')}${rows(['bar', 'baz'])}<blockquote><p>bar</p></blockquote>`],
  [202, '| abc | def |\n| --- | --- |\n| bar | baz |\nbar\n\nbar', `${head('abc', 'def')}${rows(['bar', 'baz'], ['bar', ''])}<p>bar</p>`],
  [203, '| abc | def |\n| --- |\n| bar |', '<p>| abc | def | | --- | | bar |</p>'],
  [205, '| abc | def |\n| --- | --- |', `${head('abc', 'def')}</table>`],
]; // prettier-ignore

describe('GFM', () => {
  it.each(TABLES)('table, example %i', (_, markdown, html) => {
    const parsed = parseProcedure(inStep(markdown));
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors));
    expect(sameForm(parsed.rendered.steps[0]?.html ?? '')).toBe(sameForm(html));
  });

  it('makes a whole https address a link, and leaves the sentence its full stop and its bracket', () => {
    const parsed = parseProcedure(inStep('See https://halden.example/a_b. (And https://halden.example/c?d=e)'));
    expect(parsed.ok && parsed.rendered.steps[0]?.html).toBe(
      '<p>See <a href="https://halden.example/a_b" rel="noopener">https://halden.example/a_b</a>. (And <a href="https://halden.example/c?d=e" rel="noopener">https://halden.example/c?d=e</a>)</p>',
    );
  });

  it('leaves other addresses plain text, on purpose: nothing but https is linked to', () => {
    const words = 'Ask a@b.example or www.halden.example or http://halden.example.';
    const parsed = parseProcedure(inStep(words));
    expect(parsed.ok && parsed.rendered.steps[0]?.html).toBe(`<p>${words}</p>`);
  });

  it('leaves a single tilde alone: about ~5 drops', () => {
    const parsed = parseProcedure(inStep('About ~5 drops and ~6 more.'));
    expect(parsed.ok && parsed.rendered.steps[0]?.html).toBe('<p>About ~5 drops and ~6 more.</p>');
  });

  it.each([
    ['struck-through text, example 491', '~~Hi~~ Hello, world!', 'Text that is struck through is not used.'],
    ['task lists, example 279', '- [ ] foo\n- [x] bar', 'Boxes to tick are not used'],
    ['cells beyond the heading, example 204', '| abc | def |\n| --- | --- |\n| bar |\n| bar | baz | boo |', 'This row has 3 cells, the first row 2.'],
    ['footnotes', 'Words.[^1]\n\n[^1]: More.', 'Footnotes are not used.'],
  ])('refuses on purpose: %s', (_, markdown, message) => {
    const parsed = parseProcedure(inStep(markdown));
    expect(parsed.ok ? '' : parsed.errors[0]?.message).toContain(message);
  }); // prettier-ignore
});
