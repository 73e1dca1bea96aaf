import { chromium } from '@playwright/test';
import lighthouse from 'lighthouse';
import { gzipSync } from 'node:zlib';

const ARGS = ['--no-sandbox', '--disable-gpu', '--disable-background-networking'];
const executablePath = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';

const cookies = (address: string, header: string) =>
  header.split('; ').map((pair) => ({
    name: pair.slice(0, pair.indexOf('=')),
    value: pair.slice(pair.indexOf('=') + 1),
    url: address,
  }));

/** Bytes of script a page loads, each file compressed with gzip, and the number of files. */
export async function scriptWeight(address: string, path: string, cookie: string): Promise<number> {
  const browser = await chromium.launch({ executablePath, args: ARGS });
  const context = await browser.newContext();
  await context.addCookies(cookies(address, cookie));
  const page = await context.newPage();
  const bodies: Promise<Buffer>[] = [];
  page.on('response', (response) => {
    if (response.request().resourceType() === 'script') bodies.push(response.body());
  });
  await page.goto(address + path, { waitUntil: 'networkidle' });
  const inline = await page.$$eval('script:not([src])', (all) => all.map((s) => s.textContent ?? ''));
  const files = await Promise.all(bodies);
  await browser.close();
  return [...files, ...inline.map((text) => Buffer.from(text))].reduce((sum, file) => sum + gzipSync(file).length, 0);
}

/** Milliseconds from a key press to the next painted frame, at p50 and p95, typing real queries into look-up. */
export async function keystrokes(
  address: string,
  cookie: string,
  queries: string[],
): Promise<{ p50: number; p95: number; handler95: number; loadMs: number }> {
  const browser = await chromium.launch({ executablePath, args: ARGS });
  const context = await browser.newContext();
  await context.addCookies(cookies(address, cookie));
  const page = await context.newPage();
  await page.goto(address, { waitUntil: 'networkidle' });
  const field = page.getByRole('searchbox').or(page.getByRole('combobox')).last();
  const from = performance.now();
  await page.waitForSelector('[data-index="ready"]', { timeout: 30_000 });
  const loadMs = performance.now() - from;
  await page.evaluate(() => {
    const spans: { input: number; frame: number }[] = [];
    (window as unknown as { spans: typeof spans }).spans = spans;
    window.addEventListener(
      'input',
      () => {
        const start = performance.now();
        // Runs after every handler of this event and the synchronous render that follows it.
        queueMicrotask(() => {
          const span = { input: performance.now() - start, frame: 0 };
          spans.push(span);
          const channel = new MessageChannel();
          requestAnimationFrame(() => {
            channel.port1.onmessage = () => (span.frame = performance.now() - start);
            channel.port2.postMessage(0);
          });
        });
      },
      true,
    );
  });
  for (const query of queries) {
    await field.fill('');
    await field.pressSequentially(query, { delay: 60 });
    await page.waitForTimeout(150);
  }
  const spans = await page.evaluate(() => (window as unknown as { spans: { input: number; frame: number }[] }).spans);
  await browser.close();
  const at = (values: number[], share: number) =>
    values.sort((a, b) => a - b)[Math.floor(values.length * share)] ?? NaN;
  return {
    p50: at(
      spans.map((s) => s.frame),
      0.5,
    ),
    p95: at(
      spans.map((s) => s.frame),
      0.95,
    ),
    handler95: at(
      spans.map((s) => s.input),
      0.95,
    ),
    loadMs,
  };
}

/** Lighthouse's four scores, 0 to 100, for a page behind sign-in. */
export async function scores(
  address: string,
  path: string,
  cookie: string,
  debugPort: number,
): Promise<Record<string, number>> {
  const browser = await chromium.launch({ executablePath, args: [...ARGS, `--remote-debugging-port=${debugPort}`] });
  const result = await lighthouse(address + path, {
    port: debugPort,
    output: 'json',
    logLevel: 'error',
    extraHeaders: { Cookie: cookie },
    disableStorageReset: true,
    onlyCategories: ['performance', 'accessibility', 'best-practices', 'seo'],
  });
  await browser.close();
  if (!result) throw new Error('Lighthouse gave no result.');
  return Object.fromEntries(
    Object.entries(result.lhr.categories).map(([name, category]) => [name, Math.round((category.score ?? 0) * 100)]),
  );
}
