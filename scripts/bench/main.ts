import { mkdtempSync, rmSync } from 'node:fs';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { build, install, root } from '../steps.mjs';
import { keystrokes, scores, scriptWeight } from './browser';
import { writeBook } from './book';
import { deskGrowth } from './desk';
import { historyTimes } from './history';
import { load, references } from './load';
import { signIn, start } from './product';
import { compareAndMerge } from './revision';
import { calculatorTyping, slowestWorksheet } from './worksheets';

/**
 * Measures what README.md claims, on this machine, in one run: ratios to plain servers that send the same bytes,
 * so that a slower machine changes both sides. Prints a table. `npm run bench -- --small` leaves out the large book.
 */

interface Row {
  what: string;
  got: string;
  aim: string;
  met: boolean;
}
const rows: Row[] = [];
const note = (row: Row) => {
  rows.push(row);
  console.error(`${row.what}: ${row.got} (${row.aim})`);
};
const atLeast = (what: string, got: number, aim: number, digits = 2) =>
  note({ what, got: got.toFixed(digits), aim: `≥ ${aim}`, met: got >= aim });
const atMost = (what: string, got: number, aim: number, unit: string, digits = 1) =>
  note({ what, got: `${got.toFixed(digits)} ${unit}`, aim: `≤ ${aim} ${unit}`, met: got <= aim });

const READER = 'apprentice@northgate.example';
const work = mkdtempSync(join(tmpdir(), 'matchmark-bench-'));
const large = process.argv.includes('--small') ? 0 : 10_000;

/** Bytes of an answer as they cross the wire. */
const wireBytes = (url: string, headers: Record<string, string>) =>
  new Promise<number>((resolve, reject) => {
    request(url, { headers }, (response) => {
      let bytes = 0;
      response.on('data', (chunk: Buffer) => (bytes += chunk.length));
      response.on('end', () =>
        response.statusCode === 200 ? resolve(bytes) : reject(new Error(`${url}: ${response.statusCode}`)),
      );
    })
      .on('error', reject)
      .end();
  });

/** A sheet page against a bare server and sirv, and its 304 against the bare server. */
async function pages(name: string, address: string, cookie: string, path: string): Promise<void> {
  const url = address + path;
  const first = await fetch(url, { headers: { cookie, 'accept-encoding': 'identity' } });
  const body = Buffer.from(await first.arrayBuffer());
  const etag = first.headers.get('etag');
  if (first.status !== 200 || !etag) throw new Error(`${url} answered ${first.status} with ETag ${etag}`);
  const plain = await references(body);
  const bare = await load(plain.bare);
  const files = await load(plain.sirv);
  const page = await load(url, { cookie });
  const unchanged = await load(url, { cookie, 'if-none-match': etag }, 304);
  plain.close();
  const size = `${Math.round(body.length / 1000)} kB`;
  atLeast(`${name}: sheet (${size}) against a bare Node server`, page / bare, 0.05, 3);
  atLeast(`${name}: sheet against sirv`, page / files, 0.12, 3);
  atLeast(`${name}: 304 against a bare Node server`, unchanged / bare, 0.1, 3);
}

const QUERIES = [
  '89 lbf in cover',
  'rocker cover',
  'injecter',
  'm10 head bolt',
  'sump gasket',
  '0.35 mm clearance',
  'water pump impeller',
  'timing chain tensioner',
  'P-0142',
];

async function demonstrationBook(): Promise<void> {
  const data = join(work, 'demonstration');
  const first = await start(data, 4396);
  await first.stop();
  atMost('first start, book and demonstration brought in', first.readyMs / 1000, 10, 's');
  const product = await start(data, 4396);
  atMost('later start', product.readyMs / 1000, 2, 's');
  const cookie = await signIn(product.address, READER);
  await pages('26 procedures', product.address, cookie, '/procedures/P-0142');
  atMost(
    'script on a sheet, gzip',
    (await scriptWeight(product.address, '/procedures/P-0142', cookie)) / 1000,
    90,
    'kB',
  );
  const slowest = slowestWorksheet();
  atMost(`slowest worksheet (${slowest.name}), inputs read and worked out`, slowest.ms, 1, 'ms', 2);
  const typing = await calculatorTyping(product.address, cookie, 'injector-set');
  atMost('calculator: key press to the painted answer, p95', typing.p95, 33, 'ms');
  atMost(`calculator: late frames of ${typing.frames} while typing`, (100 * typing.late) / typing.frames, 0, '%');
  for (const [name, path] of [
    ['sheet', '/procedures/P-0142'],
    ['look-up', '/'],
  ] as const)
    for (const [category, score] of Object.entries(await scores(product.address, path, cookie, 9333)))
      atLeast(`Lighthouse, ${name}: ${category}`, score, 98, 0);
  await product.stop();
}

async function largeBook(): Promise<void> {
  const content = join(work, 'content');
  console.error(`Writing ${large} procedures.`);
  writeBook(join(root, 'content'), content, large);
  const env = { CONTENT_DIR: content };
  console.error('Bringing them into a book. This takes minutes.');
  const first = await start(join(work, 'large'), 4397, env);
  console.error(`Brought in after ${(first.readyMs / 1000).toFixed(0)} s.`);
  await first.stop();
  const product = await start(join(work, 'large'), 4397, env);
  atMost('10,000 procedures: later start', product.readyMs / 1000, 2, 's');
  const cookie = await signIn(product.address, READER);
  await pages('10,000 procedures', product.address, cookie, '/procedures/P-4711');
  // The first answer goes out lightly compressed; the tight one takes its place once the server has made it.
  const indexBytes = () => wireBytes(`${product.address}/api/v1/search-index`, { cookie, 'accept-encoding': 'br' });
  const light = await indexBytes();
  let index = light;
  for (let tries = 0; index === light && tries < 60; tries++) {
    await new Promise((resolve) => setTimeout(resolve, 1000));
    index = await indexBytes();
  }
  atMost('10,000 procedures: search index, brotli', index / 1e6, 1.2, 'MB', 2);
  const typed = await keystrokes(product.address, cookie, QUERIES);
  atMost('10,000 procedures: search a keystroke, p95', typed.p95, 16, 'ms');
  await product.stop();
}

function texts(): void {
  const { lines, compare, merge } = compareAndMerge();
  atMost(`compare two texts of ${lines[0]} lines, p95`, compare.p95, 10, 'ms');
  atMost(`merge three texts of ${lines[0]} lines, p95`, merge.p95, 10, 'ms');
  // Linear growth, with room for what a larger heap costs.
  for (const [what, { growth }] of Object.entries({ compare, merge }))
    atMost(`${what}: a line of ${lines[1]} against one of ${lines[0]}`, growth, 1.5, 'times', 2);
}

async function desk(): Promise<void> {
  const { few, many, ratio } = await deskGrowth(work);
  const times = `${many.toFixed(1)} against ${few.toFixed(1)} ms`;
  atMost(`review desk: 500 waiting proposals against 5 (${times})`, ratio, 2, 'times', 2);
}

/** A sheet of 200 revisions against one of three: its history is paged, its origins are kept for each revision. */
async function histories(): Promise<void> {
  const { history, origins } = await historyTimes(join(work, 'histories'), 4398, READER);
  atMost('history of 200 revisions against one of 3', history.long.usual / history.short.usual, 3, 'times');
  atMost('history of 200 revisions, opened', history.long.usual, 100, 'ms');
  atMost('origins of 200 revisions against those of 3', origins.long.usual / origins.short.usual, 2, 'times');
  console.error(
    `The first time ever, in ms: history ${history.short.first.toFixed(0)} and ${history.long.first.toFixed(0)}, ` +
      `origins ${origins.short.first.toFixed(0)} and ${origins.long.first.toFixed(0)}.`,
  );
}

await install();
if ((await build()) !== 0) process.exit(1);
texts();
await desk();
await demonstrationBook();
await histories();
if (large) await largeBook();
rmSync(work, { recursive: true, force: true });

console.log(`\n| measured ${new Date().toISOString().slice(0, 10)} | got | aim | |\n| --- | --- | --- | --- |`);
for (const { what, got, aim, met } of rows)
  console.log(`| ${what} | ${got} | ${aim} | ${met ? 'met' : '**missed**'} |`);
process.exit(rows.every((row) => row.met) ? 0 : 1);
