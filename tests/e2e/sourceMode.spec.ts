import type { Locator, Page } from '@playwright/test';
import { expectNoFaults, expectSound } from './support/axe';
import { draft, readProposal } from './support/api';
import { expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

/** The desk of a new draft, its sheet shown as text in the editor. */
async function asText(page: Page, number: string): Promise<{ desk: WritingDesk; text: Locator; offers: Locator }> {
  const { id } = await draft(page, number, (source) => source.replace(/^(title: .*)$/m, '$1, as text'), 'By hand.');
  const desk = new WritingDesk(page);
  await page.goto(`/proposals/${id}/edit`);
  await desk.ready();
  await desk.middle.getByRole('button', { name: 'Edit the whole sheet as text' }).click();
  const text = desk.middle.getByRole('textbox', { name: 'The whole text' });
  await expect(desk.middle.locator('.cm-editor')).toBeVisible();
  return { desk, text, offers: page.getByRole('listbox') };
}
/** Takes what is offered, or goes on to the next of it. A moment must pass, so that nobody takes what comes up under a key they press already. */
async function take(page: Page, key = 'Enter'): Promise<void> {
  await page.waitForTimeout(150);
  await page.keyboard.press(key);
}
/** Puts the caret at the end of the first line that begins so. */
async function caretAfter(page: Page, line: RegExp): Promise<void> {
  // Only the lines near what is on the screen are there.
  const wanted = page.locator('.cm-line').filter({ hasText: line }).first();
  const scroller = page.locator('.cm-scroller');
  await scroller.evaluate((box) => (box.scrollTop = 0));
  for (let screens = 0; (await wanted.count()) === 0 && screens < 60; screens += 1) {
    await scroller.evaluate((box) => box.scrollBy(0, box.clientHeight / 2));
    await page.evaluate(() => new Promise(requestAnimationFrame));
  }
  await wanted.click();
  await page.keyboard.press('End');
}

test('the editor comes only when it is asked for, shows the text and saves it', async ({ as }) => {
  const page = await as('northSenior');
  const loaded: string[] = [];
  page.on('request', (request) => loaded.push(new URL(request.url()).pathname));
  const id = (await draft(page, 'P-0101', (source) => source.replace(/^(title: .*)$/m, '$1, by hand'), 'By hand.')).id;
  const desk = new WritingDesk(page);
  await page.goto(`/proposals/${id}/edit`);
  await desk.ready();
  expect(loaded.filter((path) => /\/editor\./.test(path))).toEqual([]);
  await desk.middle.getByRole('button', { name: 'Edit the whole sheet as text' }).click();
  await expect(page.locator('.cm-editor')).toBeVisible();
  expect(loaded.filter((path) => /\/editor\./.test(path))).toHaveLength(1);
  const text = desk.middle.getByRole('textbox', { name: 'The whole text' });
  await expect(text).toHaveAccessibleDescription(/Tab leaves the text/);
  await expect(page.locator('.cm-lineNumbers')).toContainText('1');
  await expect(page.locator('.source-field').first()).toHaveText('title');
  await caretAfter(page, /^title:/);
  await page.keyboard.type(' and once more');
  await expect.poll(async () => (await readProposal(page, id)).source).toContain('by hand and once more');
  // Its own undo takes its own words back.
  await page.keyboard.press('Control+z');
  await expect.poll(async () => (await readProposal(page, id)).source).not.toContain('and once more');
  await page.keyboard.press('Control+Shift+z');
  await desk.middle.getByRole('button', { name: 'Edit it in the form' }).click();
  await page.evaluate(() => (location.hash = '#sheet'));
  await expect(desk.middle.getByLabel('Title')).toHaveValue(/by hand and once more$/);
  // What was done as text is one step back at the desk.
  await page.locator('.writing-undo').getByRole('button', { name: 'Undo: title changed' }).click();
  await expect(desk.middle.getByLabel('Title')).toHaveValue(/by hand$/);
});

test('fields, words, keys and worksheets are offered by the keyboard alone', async ({ as }) => {
  const page = await as('northSenior');
  const { desk, text, offers } = await asText(page, 'P-0142');
  await caretAfter(page, /^ {4}condition:/);
  await page.keyboard.press('Control+Shift+ArrowLeft');
  await page.keyboard.press('Backspace');
  await page.keyboard.press('Control+Space');
  await expect(offers.getByRole('option')).toHaveText(['dry', 'oiled', 'threadlocker', 'sealant', 'anti-seize']);
  await take(page, 'ArrowDown');
  await take(page);
  await expect(
    page
      .locator('.cm-line')
      .filter({ hasText: /^ {4}condition:/ })
      .first(),
  ).toHaveText('    condition: oiled');
  await page.keyboard.press('Enter');
  // The fields of a torque, without those that it has.
  await page.keyboard.type('angle');
  await expect(offers.getByRole('option').filter({ hasText: 'angle tolerance' })).toBeVisible();
  await expect(offers.getByRole('option').filter({ hasText: /^condition/ })).toHaveCount(0);
  await page.keyboard.press('Escape');

  // A torque's key by its name, in a component that completes itself.
  await page.keyboard.press('Control+End');
  for (let i = 0; i < 2; i += 1) await page.keyboard.press('ArrowUp');
  await page.keyboard.press('End');
  await expect(page.locator('.source-tag').first()).toBeVisible();
  await page.keyboard.type(' <Tor');
  await expect(offers.getByRole('option', { name: /^Torque/ })).toBeVisible();
  await take(page);
  await expect(offers.getByRole('option').first()).toContainText('Cover bolt');
  await take(page);
  await expect(text).toContainText('<Torque of="cover-bolt" />');

  // Escape closes what is offered; Tab leaves the editor, and Shift+Tab comes back into it.
  await page.keyboard.press('Control+Space');
  await page.keyboard.press('Escape');
  await expect(text).toBeFocused();
  await page.keyboard.press('Tab');
  await expect(text).not.toBeFocused();
  await page.keyboard.press('Shift+Tab');
  await expect(text).toBeFocused();
  await page.keyboard.press('Shift+Tab');
  await expect(desk.middle.getByRole('button', { name: 'Use a plain box' })).toBeFocused();
});

test('what is wrong is underlined, told at the caret and listed, and each leads there', async ({ as }) => {
  const page = await as('northSenior');
  const { desk } = await asText(page, 'P-0137');
  await caretAfter(page, /^skill:/);
  await page.keyboard.type('x');
  const here = desk.middle.getByRole('status').filter({ hasText: /^Line \d+: / });
  await expect(page.locator('.cm-lintRange-error').first()).toContainText('x');
  await expect(here).toContainText(/Skill/i);
  const list = desk.middle.getByRole('listitem').filter({ hasText: /^Line \d+/ });
  await expect(list).toHaveCount(1);
  // Elsewhere nothing is told; the list leads back.
  await page
    .locator('.cm-line')
    .filter({ hasText: /^title:/ })
    .click();
  await expect(here).toHaveCount(0);
  await list.getByRole('button').click();
  await expect(here).toBeVisible();
  await page
    .locator('.cm-line')
    .filter({ hasText: /^title:/ })
    .click();
  await page.keyboard.press('F8');
  await expect(here).toBeVisible();
  await expectSound(page);
});

test('a phone completes too, with nothing sticking out', async ({ as }) => {
  const page = await as('northSenior', { viewport: { width: 390, height: 800 } });
  const { offers } = await asText(page, 'P-0152');
  await caretAfter(page, /^skill:/);
  await page.keyboard.press('Enter');
  await page.keyboard.type('t');
  await expect(offers).toBeVisible();
  await expectNoFaults(page);
  await expectNoSidewaysScroll(page, 390);
});

test('without the network the plain box stays and works; it can be chosen for good', async ({ as }) => {
  const page = await as('northSenior', { allow: [/ERR_INTERNET_DISCONNECTED/, /Failed to (load|fetch)/] });
  const { id } = await draft(page, 'P-0104', (source) => source.replace(/^(title: .*)$/m, '$1, as text'), 'By hand.');
  const desk = new WritingDesk(page);
  await page.goto(`/proposals/${id}/edit`);
  await desk.ready();
  await page.context().setOffline(true);
  await desk.middle.getByRole('button', { name: 'Edit the whole sheet as text' }).click();
  const text = desk.middle.getByRole('textbox', { name: 'The whole text' });
  await expect(desk.middle.getByText(/The editor could not be loaded; this box does the same work\./)).toBeVisible();
  await text.fill((await text.inputValue()).replace('as text', 'in a plain box'));
  await expect(desk.keeping).toHaveText('Kept on this device. Sent when the network is back.');
  await page.context().setOffline(false);
  await expect.poll(async () => (await readProposal(page, id)).source).toContain('in a plain box');

  await page.reload();
  await desk.ready();
  await desk.middle.getByRole('button', { name: 'Edit the whole sheet as text' }).click();
  await expect(page.locator('.cm-editor')).toBeVisible();
  await desk.middle.getByRole('button', { name: 'Use a plain box' }).click();
  await expect(page.locator('.cm-editor')).toHaveCount(0);
  await expect(text).toHaveValue(/in a plain box/);
  await page.reload();
  await desk.ready();
  await desk.middle.getByRole('button', { name: 'Edit the whole sheet as text' }).click();
  await expect(text).toHaveValue(/in a plain box/);
  await expect(desk.middle.getByRole('button', { name: 'Use the editor with line numbers' })).toBeVisible();
});
