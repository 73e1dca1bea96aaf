import { join } from 'node:path';
import { addFromRelease, reviseFromRelease, standingOf } from '@/server/book/release';
import { startParsing, stopParsing } from '@/server/book/parsing';
import { readConfig } from '@/server/config';
import { useApp } from '@/server/context';
import { settleText } from '@/server/review/draftText';
import { openBook } from '@/server/start';
import { root } from '../steps.mjs';
import { signIn, start } from './product';

/** A long history beside a short one, in one book. */
const LONG = { number: 'P-9200', revisions: 200 };
const SHORT = { number: 'P-9003', revisions: 3 };

/** A sheet of some 40 lines whose torque or words differ from revision to revision. */
function text(i: number): string {
  const steps = Array.from(
    { length: 10 },
    (_, n) => `<Step id="step-${n}" title="Do part ${n} of the work">
Look at the face before you touch it, and write down what you see${n === i % 10 ? `, for the time ${i}` : ''}. Tighten to
<Torque of="bolt-${n % 3}" />.
</Step>`,
  );
  const torque = (
    n: number,
  ) => `  - { key: bolt-${n}, name: Bolt ${n}, thread: M8, pitch: 1.25, class: "8.8", condition: dry,
      nm: ${n === i % 3 ? 15 + (i % 9) : 20}, count: 4, source: demo }`;
  return `---
title: Measure the history
summary: A sheet that was changed many times.
system: sealing
engines: [tarn-t18f]
minutes: 30
skill: apprentice
torques:
${[0, 1, 2].map(torque).join('\n')}
sources:
  - { key: demo, kind: demonstration, title: Generated values }
---

${steps.join('\n\n')}
`;
}

async function addHistory({ number, revisions }: typeof LONG): Promise<void> {
  for (let i = 0; i < revisions; i++) {
    const standing = await standingOf(number);
    const { text: settled, rendered } = await settleText(text(i), standing?.current?.id ?? null);
    if (standing?.current) await reviseFromRelease({ ...standing, current: standing.current }, settled, rendered);
    else await addFromRelease(number, settled, rendered);
  }
}

export interface Opened {
  /** The first time, when nothing of the history has been worked out yet; milliseconds. */
  first: number;
  /** The middle of many, one after the other; milliseconds. */
  usual: number;
}

async function opened(address: string, cookie: string): Promise<Opened> {
  const times: number[] = [];
  for (let i = 0; i < 61; i++) {
    const from = performance.now();
    const answer = await fetch(address, { headers: { cookie } });
    await answer.arrayBuffer();
    if (answer.status !== 200) throw new Error(`${address} answered ${answer.status}`);
    times.push(performance.now() - from);
  }
  const [first = NaN, ...rest] = times;
  return { first, usual: rest.sort((a, b) => a - b)[30] ?? NaN };
}

export interface HistoryTimes {
  history: { long: Opened; short: Opened };
  origins: { long: Opened; short: Opened };
}

/** How long the history and the origins of a sheet of 200 revisions take to open, beside those of one of three. */
export async function historyTimes(dataDir: string, port: number, reader: string): Promise<HistoryTimes> {
  // The demonstration's people come first: its history is told only in a book that nobody has written in.
  await (await start(dataDir, port)).stop();
  const settings = { DATA_DIR: dataDir, CONTENT_DIR: join(root, 'content'), PORT: String(port) };
  startParsing();
  const running = await openBook(readConfig(settings));
  useApp(running);
  for (const one of [SHORT, LONG]) await addHistory(one);
  useApp(undefined);
  await running.db.close();
  await stopParsing();

  const product = await start(dataDir, port);
  const cookie = await signIn(product.address, reader);
  const page = (number: string, of: string) => opened(`${product.address}/procedures/${number}/${of}`, cookie);
  // The short one first, so that the server has warmed up before the long one is asked.
  const history = { short: await page(SHORT.number, 'revisions'), long: await page(LONG.number, 'revisions') };
  const origins = { short: await page(SHORT.number, 'origins'), long: await page(LONG.number, 'origins') };
  await product.stop();
  return { history, origins };
}
