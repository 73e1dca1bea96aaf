import { setImmediate } from 'node:timers/promises';
import spec from 'commonmark-spec';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { inStep } from '../../unit/procedure/sample';
import { sameForm } from './html';

/**
 * Every example of the CommonMark specification 0.31.2 (npm commonmark-spec, the specification's own text), as the
 * prose of a step. What a sheet allows must mean what the specification says; the rest must be refused.
 */

interface Example {
  number: number;
  section: string;
  markdown: string;
  html: string;
}

// The specification prints a tab as an arrow.
const examples: Example[] = spec.tests.map((e) => ({
  ...e,
  markdown: e.markdown.replace(/→/g, '\t'),
  html: e.html.replace(/→/g, '\t'),
}));

const hrefs = (html: string) => [...html.matchAll(/href="([^"]*)"/g)].map((m) => m[1] ?? '');

/** What a sheet does not use, and how an example shows that it does. One of these must hold for every refused example. */
const REFUSED_ON_PURPOSE: readonly [reason: string, shows: (e: Example) => boolean][] = [
  ['headings: a step has its title', ({ html }) => /<h[1-6]>/.test(html)],
  ['thematic breaks: start a new step', ({ html }) => /<hr/.test(html)],
  ['blocks of code: a sheet has none', ({ html }) => /<pre>/.test(html)],
  ['signs of a heading or a rule behind four spaces, which CommonMark takes for text', ({ markdown }) => /\n {4,}(\*{3}|#|---)/.test(markdown)],
  ['images: figures are named in the front matter', ({ html }) => /<img /.test(html)],
  ['HTML, comments and angle brackets for addresses: < opens a component', ({ markdown }) => /<[^\s]/.test(markdown)],
  ['link definitions: the address stands where the link stands', ({ markdown }) => /^[ >\t]*\[[^]*?\]:/m.test(markdown)],
  ['link titles: unreadable without a mouse', ({ html }) => / title="/.test(html)],
  ['links without words', ({ html }) => /<a [^>]*><\/a>/.test(html)],
  ['links elsewhere than https: and paths of the book', ({ html }) => hrefs(html).some((href) => !/^(https:\/\/|\/(?!\/))/.test(href) || /%5C|%20|%C2%A0/.test(href))],
]; // prettier-ignore

/** Where an accepted example means something else than in CommonMark, and why that is right here. */
const DIFFERENT: readonly [reason: string, shows: (e: Example) => boolean][] = [
  ['text that is indented is text: components are often indented', ({ markdown, html }) => /<pre><code>/.test(html) || /^ {4,}|^\t/m.test(markdown)],
  ['emphasis in emphasis says nothing more and is written once', ({ html }) => /<(em|strong)>(?:(?!<\/\1>).)*<\1>/s.test(html)],
  ['white space at the edge of a paragraph is not kept', ({ markdown }) => markdown.startsWith('&#9;')],
  ['an empty quotation is left out', ({ html }) => /<blockquote>\s*<\/blockquote>/.test(html)],
  ['an address that starts with https:// is a link (GFM)', ({ markdown, html }) => /https:\/\//.test(markdown) && !/<a /.test(html)],
]; // prettier-ignore

const seen = { same: 0, refused: 0, different: 0 };

describe('CommonMark 0.31.2', () => {
  it.each(examples.map((e) => [e.number, e.section, e] as const))('example %i, %s', async (_, __, example) => {
    // Six hundred tests in a row must leave the runner time to report.
    await setImmediate();
    const parsed = parseProcedure(inStep(example.markdown));
    if (!parsed.ok) {
      seen.refused += 1;
      const reasons = REFUSED_ON_PURPOSE.filter(([, shows]) => shows(example)).map(([reason]) => reason);
      expect(reasons, `${parsed.errors[0]?.message} ${JSON.stringify(example.markdown)}`).not.toEqual([]);
      return;
    }
    const ours = sameForm(parsed.rendered.steps[0]?.html ?? '');
    const theirs = sameForm(example.html);
    if (ours === theirs) {
      seen.same += 1;
      return;
    }
    seen.different += 1;
    const reasons = DIFFERENT.filter(([, shows]) => shows(example)).map(([reason]) => reason);
    expect(reasons, `${JSON.stringify(example.markdown)}\n${ours}\n${theirs}`).not.toEqual([]);
  });

  it('is followed in no fewer examples than before', () => {
    expect(seen.same + seen.refused + seen.different).toBe(652);
    expect(seen.same).toBeGreaterThanOrEqual(275);
    expect(seen.different).toBeLessThanOrEqual(64);
  });
});
