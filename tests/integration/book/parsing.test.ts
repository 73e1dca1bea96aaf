import { afterAll, afterEach, describe, expect, it } from 'vitest';
import type { Parsed } from '@/domain/procedure/types';
import { ParseQueue, type QueueOptions } from '@/server/book/parseQueue';
import { parseSafely, startParsing, stopParsing } from '@/server/book/parsing';
import { changed, SAMPLE } from '../../unit/procedure/sample';

const url = new URL('../../fixtures/threads/stuck.mjs', import.meta.url);
type Queue = ParseQueue<string, Parsed>;
const refused = (message: string): Parsed => ({ ok: false, errors: [{ line: 1, column: 1, message }] });
const answers = {
  tooLong: refused('This text takes too long to read.'),
  broke: refused('This text could not be read.'),
};
const message = async (queue: Queue, source: string) => {
  const parsed = await queue.parse(source);
  return parsed.ok ? 'ok' : parsed.errors[0]?.message;
};

describe('the parse thread', () => {
  let queue: Queue;
  const open = (options: Partial<QueueOptions<Parsed>> = {}) =>
    (queue = new ParseQueue<string, Parsed>({
      ...{ url, limit: 150, patience: 3_000, startLimit: 10_000, places: 3 },
      ...answers,
      ...options,
    }));
  afterEach(() => queue.close());

  it('ends a text that takes too long, refuses it in a sentence, and reads the next one', async () => {
    open();
    const [first, second] = await Promise.all([message(queue, 'for ever'), message(queue, 'next')]);
    expect(first).toMatch(/^This text takes too long to read\./);
    expect(second).toBe('next');
    expect(await message(queue, 'again')).toBe('again');
  });

  it('keeps answering everything else while a text is stuck', async () => {
    open({ limit: 400 });
    let ticks = 0;
    const clock = setInterval(() => (ticks += 1), 10);
    await message(queue, 'for ever');
    clearInterval(clock);
    expect(ticks).toBeGreaterThan(5);
  });

  it.each(['break', 'leave'])('outlives a thread that ends by itself (%s)', async (way) => {
    open({ limit: 5000 });
    expect(await message(queue, way)).toMatch(/^This text could not be read\./);
    expect(await message(queue, 'next')).toBe('next');
  });

  it('refuses with 503 and a time to wait when too many texts wait', async () => {
    open({ limit: 5000 });
    const taken = [0, 1, 2, 3].map((n) => message(queue, `text ${n}`));
    await expect(queue.parse('one too many')).rejects.toMatchObject({ status: 503, headers: { 'Retry-After': '2' } });
    expect(await Promise.all(taken)).toEqual(['text 0', 'text 1', 'text 2', 'text 3']);
  });

  it('answers what waits when it is closed', async () => {
    open({ limit: 5000 });
    const waiting = ['for ever', 'next'].map((source) => message(queue, source));
    await queue.close();
    for (const answer of await Promise.all(waiting)) expect(answer).toMatch(/^This text could not be read\./);
  });
});

describe('parseSafely', () => {
  afterAll(stopParsing);

  it('gives what the parser gives', async () => {
    startParsing();
    const parsed = await parseSafely(SAMPLE);
    expect(parsed.ok && parsed.canonical).toBe(SAMPLE);
    expect(parsed.ok && parsed.rendered.steps).toHaveLength(3);
    expect(await parseSafely(changed('nm: 10\n', 'nm: ten\n'))).toMatchObject({
      ok: false,
      errors: [{ line: 28, column: 9, path: 'torques.0.nm' }],
    });
  }, 30_000);
});
