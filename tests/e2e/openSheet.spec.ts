import type { Page } from '@playwright/test';
import { extractText, getDocumentProxy } from 'unpdf';
import { nextLetter } from '@/domain/revision/letters';
import { call, propose, readSheet } from './support/api';
import { expect, expectNoSidewaysScroll, test } from './support/book';

const NUMBER = 'P-0154';
const MINUTE = 61_000;

/** Publishes the next revision of the sheet in two browsers of others, by the API alone. */
async function publishNext(author: Page, editor: Page): Promise<string> {
  const { id } = await propose(
    author,
    NUMBER,
    (source) => source.replace(/^minutes: \d+/m, (line) => `minutes: ${Number(line.slice(9)) + 5}`),
    'Timed.',
  );
  const answer = await call(editor, 'POST', `/proposals/${id}/publish`);
  expect(answer.ok(), await answer.text()).toBe(true);
  return ((await answer.json()) as { publishedLetter: string }).publishedLetter;
}

test('a sheet that stays open says that it is superseded, on the screen and on paper', async ({ as }) => {
  const page = await as('apprentice');
  const before = (await readSheet(page, NUMBER)).revision.letter;
  await page.clock.install();
  await page.goto(`/procedures/${NUMBER}`);
  const notice = page.getByRole('alert').filter({ hasText: 'Do not work from this sheet' });

  // It asks by itself, and says nothing as long as there is nothing to say.
  const asked = page.waitForResponse((answer) => answer.url().endsWith(`/api/v1/procedures/${NUMBER}`));
  await page.clock.runFor(MINUTE);
  await (await asked).finished();
  await expect(notice).toBeHidden();

  const now = await publishNext(await as('northSenior'), await as('editor'));
  expect(now).toBe(nextLetter(before));
  await page.clock.runFor(MINUTE);
  await expect(notice).toBeVisible();
  await expect(notice).toContainText(`Revision ${now} was published after you opened revision ${before}.`);
  await expect(page.locator('.title-block')).toContainText('superseded');
  await expect(page.locator('.title-block')).not.toContainText('current');

  for (const width of [1360, 820, 390, 320]) {
    await expectNoSidewaysScroll(page, width);
    // It stays in sight wherever the reader is.
    await page.getByRole('region', { name: /^Step 3:/ }).scrollIntoViewIfNeeded();
    await expect(notice).toBeInViewport({ ratio: 1 });
  }

  const pdf = await page.pdf({ format: 'A4' });
  const { text } = await extractText(await getDocumentProxy(new Uint8Array(pdf)), { mergePages: false });
  const leaves = text.map((leaf) => leaf.replaceAll(/\s+/g, ' '));
  expect(leaves[0]).toContain('Do not work from this sheet');
  for (const leaf of leaves) expect(leaf).toContain(`${before}, superseded`);

  await expect(notice.getByRole('link', { name: 'see what changed' })).toHaveAttribute(
    'href',
    `/procedures/${NUMBER}/compare?from=${before}&to=${now}`,
  );
  await notice.getByRole('link', { name: `Go to revision ${now}` }).click();
  await expect(page).toHaveURL(`/procedures/${NUMBER}`);
  await expect(page.locator('.title-block')).toContainText(`${now}current`);
  await expect(notice).toBeHidden();
});

test('a sheet whose network comes back asks at once', async ({ as }) => {
  const page = await as('apprentice', { allow: [/ERR_INTERNET_DISCONNECTED/] });
  await page.goto(`/procedures/${NUMBER}`);
  await page.context().setOffline(true);
  const now = await publishNext(await as('northSenior'), await as('editor'));
  const notice = page.getByRole('alert').filter({ hasText: 'Do not work from this sheet' });
  await expect(notice).toBeHidden();
  await page.context().setOffline(false);
  await expect(notice).toContainText(`Go to revision ${now}`);
});
