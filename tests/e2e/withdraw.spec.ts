import type { Page } from '@playwright/test';
import { extractText, getDocumentProxy } from 'unpdf';
import { call } from './support/api';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';

const NUMBER = 'P-0183';
const SHEET = `/procedures/${NUMBER}`;
const WORDS = 'Withdrawn. Do not work from this sheet';
const WHY = 'The anode in two stacks was found loose in its thread.';
const BACK = 'Both stacks came from one bad batch. The maker has replaced it.';
const MINUTE = 61_000;

const unread = async (page: Page) =>
  ((await (await call(page, 'GET', '/bulletins')).json()) as { items: { unread: boolean }[] }).items.filter(
    (one) => one.unread,
  ).length;
const noteOn = (page: Page) => page.getByRole('note').filter({ hasText: WORDS });
const inHeader = (page: Page) =>
  page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: /^Bulletins/ });

async function leavesOf(page: Page): Promise<string[]> {
  const pdf = await page.pdf({ format: 'A4' });
  const { text } = await extractText(await getDocumentProxy(new Uint8Array(pdf)), { mergePages: false });
  return text.map((leaf) => leaf.replaceAll(/\s+/g, ' '));
}

test('a sheet is withdrawn, seen where it lies open and in look up, signed, and brought back', async ({ as }) => {
  const apprentice = await as('sawmillApprentice');
  await apprentice.clock.install();
  await apprentice.goto(SHEET);
  const before = await unread(apprentice);
  const since = apprentice.getByRole('alert').filter({ hasText: WORDS });
  await expect(since).toBeHidden();
  await expect(apprentice.getByRole('link', { name: 'Withdraw' })).toHaveCount(0);

  const editor = await as('editor');
  await editor.goto(SHEET);
  await editor.getByRole('link', { name: 'Withdraw' }).filter({ visible: true }).click();
  const dialog = editor.getByRole('dialog', { name: 'Withdraw this sheet' });
  await expect(dialog.getByLabel('Why nobody may work from it')).toBeFocused();
  await dialog.getByRole('button', { name: 'Withdraw' }).click();
  await expect(dialog).toBeVisible();
  await dialog.getByLabel('Why nobody may work from it').fill(WHY);
  await dialog.getByRole('button', { name: 'Withdraw' }).click();
  await expect(noteOn(editor)).toContainText(WORDS);
  await expect(noteOn(editor)).toContainText(WHY);
  await expect(editor.locator('.title-block')).toContainText('withdrawn');
  // Whoever withdrew it need not sign it.
  await expect(editor.getByRole('button', { name: /^I have read this/ })).toHaveCount(0);

  // The sheet that lies open says so by itself, on paper too.
  await apprentice.clock.runFor(MINUTE);
  await expect(since).toBeVisible();
  await expect(since).toContainText(WHY);
  await expect(apprentice.locator('.title-block')).not.toContainText('current');
  for (const width of [1360, 390, 320]) await expectNoSidewaysScroll(apprentice, width);
  for (const leaf of await leavesOf(apprentice)) expect(leaf).toContain(WORDS);

  await since.getByRole('link', { name: 'Open it again' }).click();
  const note = noteOn(apprentice);
  await expect(note).toContainText('by Ines Okafor');
  const sizes = await apprentice.locator('article :is(p, h1, h2, b, span)').evaluateAll((all, words) => {
    const size = (one: Element) => Number.parseFloat(getComputedStyle(one).fontSize);
    const [own] = all.filter((one) => one.textContent === words).map(size);
    return { own: own ?? 0, most: Math.max(...all.filter((one) => one.textContent !== words).map(size)) };
  }, WORDS);
  expect(sizes.own, 'the largest words of the sheet').toBeGreaterThan(sizes.most);
  for (const leaf of await leavesOf(apprentice)) expect(leaf).toContain(WORDS);
  await expect(inHeader(apprentice)).toHaveText(new RegExp(`${before + 1}\\s*unread`));

  await apprentice.goto('/?q=heat+exchanger');
  const rows = apprentice.getByRole('list', { name: 'Sheets' }).getByRole('listitem');
  await expect(rows.last()).toContainText(WORDS);
  await alive(apprentice);
  await expect(rows.filter({ hasText: NUMBER })).toContainText(WORDS);

  await apprentice.goto(SHEET);
  await note.getByRole('button', { name: /^I have read this/ }).click();
  await expect(apprentice).toHaveURL(SHEET);
  await expect(note).toBeVisible();
  await expect(note.getByRole('button')).toHaveCount(0);
  expect(await unread(apprentice)).toBe(before);

  // Another reader's page is another page.
  const other = await as('sawmillOwner');
  await other.goto(SHEET);
  await expect(noteOn(other).getByRole('button', { name: /^I have read this/ })).toBeVisible();

  await editor.getByRole('link', { name: 'Bring back' }).click();
  const back = editor.getByRole('dialog', { name: 'Bring this sheet back' });
  await back.getByLabel('Why it may be worked from again').fill(BACK);
  await back.getByRole('button', { name: 'Bring back' }).click();
  await expect(editor.getByRole('status').filter({ hasText: 'Brought back' })).toBeVisible();
  await expect(noteOn(editor)).toHaveCount(0);

  await apprentice.reload();
  await expect(note).toHaveCount(0);
  const bar = apprentice.getByRole('region', { name: 'Read and sign' });
  await expect(bar).toContainText(BACK);
  await bar.getByRole('button', { name: /^I have read this/ }).click();
  await expect(bar).toHaveCount(0);
  await apprentice.goto(`${SHEET}/revisions`);
  await expect(apprentice.getByText(WHY)).toBeVisible();
  await expect(apprentice.getByText(BACK)).toBeVisible();
});

test('without a script a sheet is withdrawn on a page of its own, and signed', async ({ as }) => {
  const editor = await as('editor2', { javaScriptEnabled: false, allow: [/status of (409|422)/] });
  await editor.goto(SHEET);
  await editor.getByRole('link', { name: 'Withdraw' }).filter({ visible: true }).click();
  await expect(editor).toHaveURL(`${SHEET}/withdraw`);
  await editor.getByLabel('Why nobody may work from it').fill('   ');
  await editor.getByRole('button', { name: 'Withdraw' }).click();
  await expect(editor.getByText(/^Write why nobody may work from it/)).toBeVisible();
  await editor.getByLabel('Why nobody may work from it').fill(WHY);
  await editor.getByRole('button', { name: 'Withdraw' }).click();
  await expect(editor).toHaveURL(SHEET);
  await expect(noteOn(editor)).toContainText(WORDS);

  const reader = await as('technician', { javaScriptEnabled: false });
  await reader.goto('/bulletins');
  const entry = reader
    .getByRole('listitem')
    .filter({ hasText: WHY })
    .filter({ has: reader.getByRole('button') });
  await entry.getByRole('button', { name: /^I have read this/ }).click();
  await expect(entry).toHaveCount(0);

  await editor.getByRole('link', { name: 'Bring back' }).click();
  await editor.getByLabel('Why it may be worked from again').fill(BACK);
  await editor.getByRole('button', { name: 'Bring back' }).click();
  await expect(editor.getByRole('status').filter({ hasText: 'Brought back' })).toBeVisible();
});

test('who does not edit the book finds no way to withdraw from it', async ({ as }) => {
  const page = await as('northOwner', { allow: [/status of 403/] });
  expect((await page.goto(`${SHEET}/withdraw`))?.status()).toBe(403);
  await expect(page.getByText(/An editor of the common book withdraws a sheet/)).toBeVisible();
});
