import { describe, expect, it } from 'vitest';
import { BOUNDS } from '@/domain/procedure/bounds';
import { parseProcedure } from '@/domain/procedure/parse';
import { COMPONENTS } from '../../fixtures/hostile/components';
import { FRONT_MATTER } from '../../fixtures/hostile/frontmatter';
import { HARMLESS, MARKDOWN } from '../../fixtures/hostile/markdown';
import { SAMPLE } from './sample';

/** Milliseconds of processor time; the clock on the wall would blame a text for a busy machine. */
const LIMIT = 500;

/** The best of three tries: the first ones may pay for compiling, or for another program's pressure on the caches. */
function timed(source: string) {
  let milliseconds = Infinity;
  let parsed = parseProcedure('');
  for (let i = 0; i < 3 && milliseconds > LIMIT / 2; i += 1) {
    const before = process.cpuUsage();
    parsed = parseProcedure(source);
    const { user, system } = process.cpuUsage(before);
    milliseconds = Math.min(milliseconds, (user + system) / 1000);
  }
  return { parsed, milliseconds };
}

parseProcedure(SAMPLE);

describe.each([
  ['Markdown', MARKDOWN],
  ['components', COMPONENTS],
  ['front matter', FRONT_MATTER],
])('hostile %s', (_, fixtures) => {
  it.each(fixtures)('%s: %s', (_name, _tries, source) => {
    const { parsed, milliseconds } = timed(source);
    expect(milliseconds).toBeLessThan(LIMIT);
    if (parsed.ok) throw new Error('was accepted');
    expect(parsed.errors.length).toBeGreaterThan(0);
    expect(parsed.errors.length).toBeLessThanOrEqual(50);
    const lines = source.split(/\r\n?|\n/).length;
    for (const { line, column, message } of parsed.errors) {
      expect(line).toBeGreaterThan(0);
      expect(line).toBeLessThanOrEqual(lines);
      expect(column).toBeGreaterThan(0);
      expect(message).toMatch(/[.?)>]$/);
      expect(message.length).toBeLessThan(400);
    }
  });
});

describe('harmless texts that look hostile', () => {
  it.each(HARMLESS)('%s: %s', (_name, _tries, source) => {
    const { parsed, milliseconds } = timed(source);
    expect(milliseconds).toBeLessThan(LIMIT);
    expect(parsed.ok).toBe(true);
  });
});

describe('the set of hostile texts', () => {
  const all = [...MARKDOWN, ...COMPONENTS, ...FRONT_MATTER];

  it('has at least sixty, each with its own text', () => {
    expect(new Set(all.map(([, , source]) => source)).size).toBe(all.length);
    expect(all.length).toBeGreaterThanOrEqual(60);
  });

  it('changes nothing for what comes after', () => {
    for (const [, , source] of all) parseProcedure(source);
    expect(({} as Record<string, unknown>)['critical']).toBeUndefined();
    const parsed = parseProcedure(SAMPLE);
    expect(parsed.ok && parsed.canonical).toBe(SAMPLE);
  });
});

describe('texts just inside the bounds', () => {
  const inside: [string, string][] = [
    ['lists six deep', Array.from({ length: 180 }, (_, i) => `${'  '.repeat(i % 6)}- a`).join('\n')],
    ['a table of twenty columns', `|${'a|'.repeat(20)}\n|${'-|'.repeat(20)}\n${`|${'b|'.repeat(20)}\n`.repeat(100)}`],
    ['a long paragraph', 'word '.repeat(790)],
    ['emphasis in every paragraph', '*a* **b** `c` [d](/e)\n\n'.repeat(180)],
    ['emphasis that never closes', `${'*a '.repeat(240)}\n\n`.repeat(15)],
    ['brackets that never close', `${'['.repeat(240)}\n\n`.repeat(15)],
    ['as many lines as may be', 'a\n'.repeat(BOUNDS.lines - 100)],
  ];
  const head = SAMPLE.slice(0, SAMPLE.indexOf('\n---\n', 4) + 5);

  it.each(inside)('%s are read in time', (_, text) => {
    const { milliseconds } = timed(`${head}\n<Step id="one" title="One">\n${text}\n</Step>\n`);
    expect(milliseconds).toBeLessThan(LIMIT);
  });
});
