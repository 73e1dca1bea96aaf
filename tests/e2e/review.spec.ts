import type { Page } from '@playwright/test';
import { extractText, getDocumentProxy } from 'unpdf';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { call } from './support/api';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';

/** Opens the critical change of the demonstration, which waits for its second agreement. */
async function openCritical(page: Page): Promise<void> {
  const { items } = (await (await call(page, 'GET', '/review-desk')).json()) as { items: ProposalSummary[] };
  const found = items.find(({ number, critical }) => number === 'P-0142' && critical);
  expect(found, 'a critical change of P-0142 on the desk').toBeDefined();
  await page.goto(`/proposals/${found!.id}`);
  await alive(page);
}

test('a reason that was typed outlives its panel, another act and a new load', async ({ as }) => {
  const page = await as('editor');
  await openCritical(page);
  const reason = page.getByRole('textbox', { name: /^What must change/ });
  await page.getByRole('link', { name: 'Return with reasons' }).click();
  await expect(reason).toBeFocused();
  await reason.fill('Which washers were on those five?');
  await page.getByRole('link', { name: 'Not now' }).click();
  await expect(reason).toBeHidden();

  await page.getByRole('link', { name: 'Decline' }).click();
  const why = page.getByRole('textbox', { name: 'Why it is declined' });
  await expect(why).toHaveValue('Which washers were on those five?');
  await page.keyboard.press('Escape');
  await expect(why).toBeHidden();
  await expect(page.getByRole('link', { name: 'Decline' })).toBeFocused();

  await page.reload();
  await alive(page);
  await expect(reason).toBeHidden();
  await page.getByRole('link', { name: 'Return with reasons' }).click();
  await expect(reason).toHaveValue('Which washers were on those five?');
});

test('a panel in the text stands clear of the bar above it', async ({ as }) => {
  const page = await as('editor', { viewport: { width: 390, height: 844 } });
  await openCritical(page);
  // Opened by its address, as without a script.
  await page.goto(`${page.url()}?give=return&at=${encodeURIComponent('step:rear-corner')}#give`);
  await alive(page);
  const title = page.locator('#give-title');
  await expect(title).toBeInViewport();
  const covered = await title.evaluate((element) => {
    const { left, top } = element.getBoundingClientRect();
    return !element.contains(document.elementFromPoint(left + 4, top + 4));
  });
  expect(covered, 'something lies over the title of the panel').toBe(false);
});

test('on a phone each old step stands above the new one, in one column', async ({ as }) => {
  const page = await as('editor');
  await openCritical(page);
  for (const width of [390, 320]) await expectNoSidewaysScroll(page, width);
  const boxes = async (side: 'old' | 'new') =>
    (await page.locator(`.pane-${side} .pane-step[data-kind="edited"]`).first().boundingBox())!;
  const [old, now] = [await boxes('old'), await boxes('new')];
  expect(old.y + old.height).toBeLessThanOrEqual(now.y);
  expect(Math.abs(old.x - now.x)).toBeLessThanOrEqual(1);
  // A changed sentence of the values stays whole beside its name.
  for (const cell of await page.locator('.value-table td[data-label] > div:visible').all())
    expect((await cell.boundingBox())!.width).toBeGreaterThan(120);
});

test('on paper a proposal says that it is no sheet, and sets old and new steps side by side', async ({ as }) => {
  const page = await as('editor');
  await openCritical(page);
  const pdf = await page.pdf({ format: 'A4' });
  const { text } = await extractText(await getDocumentProxy(new Uint8Array(pdf)), { mergePages: true });
  expect(text).toContain('Not a sheet to work from');
  for (const tool of ['Return with reasons', 'Next change', 'Return here']) expect(text).not.toContain(tool);
  await page.emulateMedia({ media: 'print' });
  await page.setViewportSize({ width: 794, height: 1000 });
  const box = async (side: 'old' | 'new') =>
    (await page.locator(`.pane-${side} .pane-step[data-kind="edited"]`).first().boundingBox())!;
  const [old, now] = [await box('old'), await box('new')];
  expect(Math.abs(old.y - now.y)).toBeLessThanOrEqual(1);
  expect(old.x + old.width).toBeLessThanOrEqual(now.x);
  await expect(page.locator('.pane-gutter')).toBeHidden();
});
