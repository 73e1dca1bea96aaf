import { chromium, type Page } from '@playwright/test';
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

/** A page of a signed-in browser of its own. */
export async function openPage(address: string, cookie: string): Promise<{ page: Page; close: () => Promise<void> }> {
  const browser = await chromium.launch({ executablePath, args: ARGS });
  const context = await browser.newContext();
  await context.addCookies(cookies(address, cookie));
  // tsx names functions through a helper of its own, which a function handed to the page does not find there.
  await context.addInitScript('globalThis.__name = (named) => named');
  return { page: await context.newPage(), close: () => browser.close() };
}

/** Bytes of script a page loads, each file compressed with gzip, and the number of files. */
export async function scriptWeight(address: string, path: string, cookie: string): Promise<number> {
  const { page, close } = await openPage(address, cookie);
  const bodies: Promise<Buffer>[] = [];
  page.on('response', (response) => {
    if (response.request().resourceType() === 'script') bodies.push(response.body());
  });
  await page.goto(address + path, { waitUntil: 'networkidle' });
  const inline = await page.$$eval('script:not([src], [type="application/ld+json"])', (all) =>
    all.map((s) => s.textContent ?? ''),
  );
  const files = await Promise.all(bodies);
  await close();
  return [...files, ...inline.map((text) => Buffer.from(text))].reduce((sum, file) => sum + gzipSync(file).length, 0);
}

/** Milliseconds from a key press until the list of hits for exactly what stands in the field is in the page, typing real queries. */
export async function keystrokes(
  address: string,
  cookie: string,
  queries: string[],
): Promise<{ p50: number; p95: number }> {
  const { page, close } = await openPage(address, cookie);
  await page.goto(address, { waitUntil: 'load' });
  await page.waitForSelector('[data-index="ready"]', { timeout: 60_000 });
  await page.evaluate(() => {
    const form = document.querySelector<HTMLElement>('[data-shown]');
    if (!form) throw new Error('Look-up says nothing of what it shows.');
    const spans: number[] = [];
    (window as unknown as { spans: number[] }).spans = spans;
    let pressed: { at: number; value: string } | null = null;
    document.addEventListener(
      'input',
      ({ target }) => {
        pressed = { at: performance.now(), value: (target as HTMLInputElement).value.trim() };
      },
      true,
    );
    new MutationObserver(() => {
      if (pressed?.value && form.dataset.shown === pressed.value) {
        spans.push(performance.now() - pressed.at);
        pressed = null;
      }
    }).observe(form, { attributes: true });
  });
  const field = page.getByRole('searchbox');
  for (const query of queries) {
    await field.fill('');
    await field.pressSequentially(query, { delay: 120 });
    await page.waitForTimeout(400);
  }
  const spans = await page.evaluate(() => (window as unknown as { spans: number[] }).spans);
  await close();
  const pressed = queries.join('').length;
  if (spans.length < pressed * 0.6) throw new Error(`Only ${spans.length} of ${pressed} keystrokes were answered.`);
  const at = (share: number) => spans.sort((a, b) => a - b)[Math.floor(spans.length * share)] ?? NaN;
  return { p50: at(0.5), p95: at(0.95) };
}

/** Lighthouse's four scores, 0 to 100, for a page behind sign-in. */
export async function scores(
  address: string,
  path: string,
  cookie: string,
  debugPort: number,
): Promise<Record<string, number>> {
  const browser = await chromium.launch({ executablePath, args: [...ARGS, `--remote-debugging-port=${debugPort}`] });
  // Cookies of the browser itself: a header that Lighthouse adds would not go with what a worker fetches.
  const session = await browser.newBrowserCDPSession();
  await session.send('Storage.setCookies', { cookies: cookies(address, cookie) });
  const result = await lighthouse(address + path, {
    port: debugPort,
    output: 'json',
    logLevel: 'error',
    disableStorageReset: true,
    onlyCategories: ['performance', 'accessibility', 'best-practices', 'seo'],
  });
  await browser.close();
  if (!result) throw new Error('Lighthouse gave no result.');
  return Object.fromEntries(
    Object.entries(result.lhr.categories).map(([name, category]) => [name, Math.round((category.score ?? 0) * 100)]),
  );
}
