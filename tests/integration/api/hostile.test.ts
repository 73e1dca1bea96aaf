import { afterAll, beforeEach, expect, it } from 'vitest';
import { stopParsing } from '@/server/book/parsing';
import { call } from './support/call';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();

beforeEach(async () => {
  // The thread runs and the routes are loaded before the clock does.
  await call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', { body: { base: 'A', source: 'x' } });
  await call(who('north.apprentice'), 'GET', '/procedures/P-0142');
});
afterAll(stopParsing);

const body = (inside: string) => text().replace('Wipe both faces', `${inside}\n\nWipe both faces`);

/** Small texts that keep a careless parser busy for seconds, or that try to be run. */
const HOSTILE: Record<string, string> = {
  'nested lists': body(Array.from({ length: 1500 }, (_, i) => `${' '.repeat((i % 40) * 2)}- x`).join('\n')),
  'deep quotes': body('>'.repeat(3000)),
  'endless images': body('!['.repeat(12_000)),
  'endless links': body('[a]('.repeat(12_000)),
  'wide tables': body(`${'|a'.repeat(1500)}|\n${'|-'.repeat(1500)}|\n${'|b|\n'.repeat(400)}`),
  'stars without end': body('*a _b '.repeat(8000)),
  'open elements': body('<Hold>'.repeat(5000)),
  'a line without end': body('x'.repeat(60_000)),
  'aliases that multiply': `---\na: &a [x,x,x,x,x,x,x,x,x]\nb: &b [*a,*a,*a,*a,*a,*a,*a,*a,*a]\nc: [*b,*b,*b,*b,*b,*b,*b,*b,*b]\n---\n`,
  'a deep front matter': `---\ntitle: ${'['.repeat(5000)}\n---\n`,
  'an expression': body('{process.exit(1)}'),
  'an import': `${text().split('\n<Step')[0]}\nimport fs from "node:fs"\n`,
  'a script': body('<script>alert(1)</script>'),
  'an attribute that is run': body('<Torque of={process.env} />'),
  'a link that is run': body('[press](javascript:alert(1))'),
  'a null character': body('a\u0000b'),
  'half a character': body('\ud800'),
  'the name of a prototype': `---\n__proto__:\n  polluted: true\n---\n`,
};

it.each(Object.keys(HOSTILE))('%s: refused with line and column in time, while others are answered', async (name) => {
  const source = HOSTILE[name]!;
  const began = performance.now();
  let took = 0;
  const refusing = call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', { body: { base: 'A', source } });
  void refusing.then(() => (took = performance.now() - began));
  const others: number[] = [];
  while (took === 0) {
    const asked = performance.now();
    expect((await call(who('north.apprentice'), 'GET', '/procedures/P-0142')).status).toBe(200);
    others.push(performance.now() - asked);
  }
  const answer = await refusing;
  expect(answer.status).toBe(422);
  const [first] = answer.body.errors;
  expect(first).toMatchObject({ line: expect.any(Number), column: expect.any(Number) });
  expect(first.message).toMatch(/^.{8,300}$/s);
  expect(took).toBeLessThan(2000);
  // A parser in the way would hold everybody up for as long as it runs; a busy machine holds up one now and then.
  expect(Math.min(...others)).toBeLessThan(200);
  expect(Math.max(...others)).toBeLessThan(1500);
  expect(({} as { polluted?: boolean }).polluted).toBeUndefined();
});
