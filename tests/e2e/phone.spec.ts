import type { Page } from '@playwright/test';
import { propose, readProposal } from './support/api';
import { alive, expect, test } from './support/book';
import { WritingDesk } from './support/writing';

const PHONE = { viewport: { width: 390, height: 844 }, isMobile: true, hasTouch: true, deviceScaleFactor: 2 };

const expectFits = async (page: Page) =>
  expect(await page.evaluate(() => document.documentElement.scrollWidth), page.url()).toBeLessThanOrEqual(390);

test('reading on a phone: filters, sheet, units, history', async ({ as }) => {
  const page = await as('sawmillApprentice', PHONE);
  await page.goto('/');
  await alive(page);
  await page.locator('summary', { hasText: 'Filters' }).tap();
  await page.getByLabel('Brandreth B3').check();
  await expect(page).toHaveURL(/engine=/);
  await page.getByRole('searchbox').fill('pump');
  const hits = page.getByRole('list', { name: 'Sheets' }).getByRole('link');
  await expect(hits.first()).toBeVisible();
  await expectFits(page);
  await hits
    .filter({ hasText: /raw-water/i })
    .first()
    .tap();
  await expect(page).toHaveURL('/procedures/P-0181');
  await expectFits(page);

  // What is used all the time stays under the thumb, wherever the reader is.
  const units = page.getByRole('button', { name: 'Metric units' });
  await page.getByRole('region', { name: /^Step 3:/ }).scrollIntoViewIfNeeded();
  await expect(units).toBeInViewport();
  await units.tap();
  await expect(page.locator('html')).toHaveAttribute('data-units', 'metric');
  await page.getByRole('button', { name: 'Inch units' }).tap();
  await expect(page.locator('html')).toHaveAttribute('data-units', 'inch');
  for (const control of await page.locator('.actions-bar button:visible').all())
    expect((await control.boundingBox())?.height).toBeGreaterThanOrEqual(43);

  await page.goto('/procedures/P-0142/revisions');
  await expect(page.getByRole('list', { name: 'What happened to P-0142, latest first' })).toBeVisible();
  await expectFits(page);
});

test('writing and judging on a phone', async ({ as }) => {
  test.setTimeout(120_000);
  const author = await as('northOwner', PHONE);
  await author.goto('/procedures/P-0139');
  await author.getByRole('button', { name: 'Propose a change' }).tap();
  const desk = new WritingDesk(author);
  await desk.ready();
  await author.getByLabel('Part of the sheet').selectOption('#parts');
  await expect(desk.middle.getByRole('heading', { name: 'Parts' })).toBeVisible();
  await expectFits(author);
  await author.getByLabel('Part of the sheet').selectOption({ index: 1 });
  await expect(desk.stepTitle(2)).toBeVisible();
  await desk.stepTitle(2).fill('Catch every drop');
  await desk.reason.fill('What is spilled here is found by a foot.');
  await expectFits(author);
  await desk.kept();
  await author.getByRole('button', { name: 'Propose', exact: true }).tap();
  await expect(author).toHaveURL(/\?done=proposed$/);

  const editor = await as('editor', PHONE);
  await editor.goto('/review-desk');
  await expectFits(editor);
  await editor.locator(`main a[href^="/proposals/${desk.id}"]`).first().tap();
  await alive(editor);
  await expect(editor.locator('.pane-new')).toContainText('Catch every drop');
  await expectFits(editor);
  await editor.getByRole('link', { name: 'Publish', exact: true }).tap();
  await editor.getByRole('button', { name: /^Publish as/ }).tap();
  await expect(editor.getByText(/^Published as/).first()).toBeVisible();
  await expectFits(editor);
  expect(await readProposal(author, desk.id)).toMatchObject({ state: 'published' });
});

test('a return on a phone stands at its step, old text above new', async ({ as }) => {
  const author = await as('northOwner');
  const { id } = await propose(
    author,
    'P-0156',
    (source) => source.replace(/(<Step id="([a-z-]+)" title=")/, '$1Quickly: '),
    'It was slow.',
  );
  const editor = await as('editor2', PHONE);
  await editor.goto(`/proposals/${id}`);
  await alive(editor);
  const [before, after] = ['.pane-old', '.pane-new'].map((pane) => editor.locator(`${pane} [data-changed]`).first());
  await expect(after!).toContainText('Quickly');
  await expect(before!).not.toContainText('Quickly');
  expect((await before!.boundingBox())!.y).toBeLessThan((await after!.boundingBox())!.y);
  await editor.getByRole('link', { name: 'Return here' }).first().tap();
  await editor.getByLabel('What must change, and why').fill('Slow is how it stays dry.');
  await editor.getByRole('form', { name: 'Return with reasons' }).getByRole('button', { name: 'Return' }).tap();
  await expect(editor.getByText(/^Returned to/).first()).toBeVisible();
  expect((await readProposal(author, id)).remarks[0]?.anchor).toMatch(/^step:/);
});
