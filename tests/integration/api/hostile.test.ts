import { setTimeout as rest } from 'node:timers/promises';
import { afterAll, expect, it } from 'vitest';
import { BODY_LIMIT } from '@/server/http/body';
import { stopParsing } from '@/server/book/parsing';
import { COMPONENTS } from '../../fixtures/hostile/components';
import { FRONT_MATTER } from '../../fixtures/hostile/frontmatter';
import { MARKDOWN } from '../../fixtures/hostile/markdown';
import { call } from './support/call';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();
afterAll(stopParsing);

const read = () => call(who('north.apprentice'), 'GET', '/procedures/P-0142');
const start = (source: string) =>
  call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', { body: { base: 'A', source } });

/** What a text may take, in milliseconds. */
const LIMIT = 2000;

/** Starts a draft with a text while others read; how long both took, in milliseconds. */
async function whileOthersRead(source: string) {
  const began = performance.now();
  let took = 0;
  const starting = start(source).finally(() => (took = performance.now() - began));
  const others: number[] = [];
  while (took === 0) {
    await rest(5);
    const asked = performance.now();
    expect((await read()).status).toBe(200);
    others.push(performance.now() - asked);
  }
  return { answer: await starting, took, others };
}

it.each([
  ['Markdown', MARKDOWN],
  ['components', COMPONENTS],
  ['front matter', FRONT_MATTER],
])('refuses each hostile text of %s in time, while others are answered', { timeout: 120_000 }, async (_, texts) => {
  // The thread runs and the routes are loaded before the clock does.
  await start('x');
  await read();
  const waits: number[] = [];
  for (const [name, , source] of texts) {
    // A machine that does other work too may hold up any text once; only a bad text is late each time.
    let { answer, took, others } = await whileOthersRead(source);
    for (let i = 0; i < 3 && took >= LIMIT; i += 1) ({ answer, took, others } = await whileOthersRead(source));
    waits.push(...others);
    const tooLarge = JSON.stringify({ base: 'A', source }).length > BODY_LIMIT;
    expect({ name, status: answer.status }).toEqual({ name, status: tooLarge ? 413 : 422 });
    expect({ name, inTime: took < LIMIT }).toEqual({ name, inTime: true });
    if (tooLarge) continue;
    const [first] = answer.body.errors;
    expect(first, name).toMatchObject({ line: expect.any(Number), column: expect.any(Number) });
    expect(first.message, name).toMatch(/^.{8,400}$/s);
  }
  expect((await call(who('north.senior'), 'GET', '/proposals')).body.items).toEqual([]);
  // A parser in the way would hold everybody up for as long as it runs; a busy machine holds up one now and then.
  waits.sort((a, b) => a - b);
  expect(waits[Math.floor(waits.length / 2)]).toBeLessThan(200);
  expect(waits.at(-1)).toBeLessThan(1500);
  expect(({} as { polluted?: boolean }).polluted).toBeUndefined();
});
