import type { Page } from '@playwright/test';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { call, readProposal } from './support/api';
import { alive, expect, test } from './support/book';
import { WritingDesk } from './support/writing';

/** Presses Tab until something with that name has the focus; every stop on the way must show where it is. */
async function tabTo(page: Page, name: RegExp, { most = 60, key = 'Tab' } = {}): Promise<void> {
  const passed: string[] = [];
  for (let press = 0; press < most; press += 1) {
    await page.keyboard.press(key);
    const stop = await page.evaluate(() => {
      const at = document.activeElement as HTMLElement | null;
      if (!at || at === document.body) return { name: '', seen: true };
      const labels =
        'labels' in at ? [...((at as HTMLInputElement).labels ?? [])].map((l) => l.innerText).join(' ') : '';
      const style = getComputedStyle(at);
      const around = at.parentElement ? [getComputedStyle(at.parentElement)] : [];
      const outlined = [style, getComputedStyle(at, '::after'), ...around].some(
        (s) => s.outlineStyle !== 'none' && parseFloat(s.outlineWidth) > 0,
      );
      const box = at.getBoundingClientRect();
      return {
        name: (at.getAttribute('aria-label') ?? (labels || at.innerText || at.id)).trim(),
        seen: (outlined || style.boxShadow !== 'none') && box.bottom > 0 && box.top < innerHeight,
      };
    });
    passed.push(stop.name);
    expect(stop.seen, `the focus shows at "${stop.name}"`).toBe(true);
    if (name.test(stop.name)) return;
  }
  throw new Error(`No stop called ${String(name)} after ${most} presses; there were: ${passed.join(' | ')}`);
}

test('without a pointer: sign in, look up, read, propose', async ({ as }) => {
  test.setTimeout(120_000);
  const page = await as(null);
  await page.goto('/');
  await tabTo(page, /Greta Halvorsen/);
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL('/');
  await alive(page);

  await page.keyboard.press('/');
  await page.keyboard.type('starter motor remove');
  const hits = page.getByRole('list', { name: 'Sheets' }).getByRole('link');
  await expect(hits.first()).toContainText('tarter');
  await page.keyboard.press('Escape');
  await expect(page.getByRole('searchbox')).toHaveValue('');
  await page.keyboard.type('P-0163');
  await expect(page.getByRole('search')).toHaveAttribute('data-shown', 'P-0163');
  await expect(hits).toHaveCount(1);
  await page.keyboard.press('ArrowDown');
  await expect(hits.first()).toBeFocused();
  await page.keyboard.press('ArrowUp');
  await expect(page.getByRole('searchbox')).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL('/procedures/P-0163');

  await page.keyboard.press('Tab');
  await expect(page.getByRole('link', { name: 'Skip to the page' })).toBeFocused();
  await page.keyboard.press('Enter');
  await tabTo(page, /^Propose a change$/, { most: 8 });
  await page.keyboard.press('Enter');
  const desk = new WritingDesk(page);
  await desk.ready();

  await tabTo(page, /^Step 1, what to do$/, { most: 90 });
  await page.keyboard.press('End');
  await page.keyboard.type(', and say so');
  await expect(desk.stepTitle(1)).toHaveValue(/, and say so$/);
  await tabTo(page, /^Why this is better, for the editor/);
  await page.keyboard.type('Somebody else had a hand in the engine bay.');
  await desk.kept();
  await tabTo(page, /^Propose$/, { key: 'Shift+Tab', most: 120 });
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\?done=proposed$/);
  expect(await readProposal(page, desk.id)).toMatchObject({
    state: 'proposed',
    reason: 'Somebody else had a hand in the engine bay.',
  });
});

test('steps are moved by keyboard, and a reader hears where to', async ({ as }) => {
  const page = await as('northSenior');
  await page.goto('/procedures/P-0160');
  await page.getByRole('button', { name: 'Propose a change' }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  const steps = page.getByRole('navigation', { name: 'Parts of the sheet' }).getByRole('listitem');
  const title = async (at: number) => (await steps.nth(at).getByRole('link').innerText()).replace(/^\d+\s*/, '');
  const [first, second] = [await title(0), await title(1)];
  await steps
    .nth(0)
    .getByRole('button', { name: /^Move step 1/ })
    .focus();
  await page.keyboard.press('Space');
  await expect(page.getByText(/^(Picked up step 1, place|Now at place) 1 of/)).toBeAttached();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByText(/^Now at place 2 of/)).toBeAttached();
  await page.keyboard.press('Space');
  await expect.poll(() => title(0)).toBe(second);
  expect(await title(1)).toBe(first);
  await desk.kept();
  await page.reload();
  await desk.ready();
  expect(await title(0)).toBe(second);
});

test('whoever switches single-key shortcuts off presses keys in peace, on every page that listens', async ({ as }) => {
  const page = await as('editor2');
  const { items } = (await (await call(page, 'GET', '/review-desk')).json()) as { items: ProposalSummary[] };
  const proposal = `/proposals/${items.find(({ number, critical, author }) => number === 'P-0142' && critical && author.name === 'Rowan Achterberg')?.id ?? ''}`;
  const find = page.getByRole('searchbox');
  const hint = page.locator('kbd:visible');
  /** What pressing each key does where. */
  const acts = async () => {
    await page.goto(proposal);
    await alive(page);
    const hints = await hint.count();
    // An island listens a moment after it has come to life, so the key is pressed until it does.
    let stepped = 0;
    for (let tries = 0; tries < 4 && stepped === 0; tries++) {
      await page.keyboard.press('n');
      await page.waitForTimeout(300);
      stepped = await page.locator('[data-line]:focus').count();
    }
    await page.keyboard.press('/');
    const found = [await find.evaluate((field) => field === document.activeElement)];
    for (const path of ['/procedures/P-0142', '/']) {
      await page.goto(path);
      await alive(page);
      await page.locator('main').focus();
      await page.keyboard.press('/');
      found.push(await find.evaluate((field) => field === document.activeElement));
    }
    return { hints, stepped, found };
  };
  const choose = async (option: 'On' | 'Off') => {
    await page.goto('/profile');
    await page.getByLabel('Single-key shortcuts').selectOption(option);
    await page.getByRole('button', { name: 'Save' }).click();
    await expect(page.getByText('Saved', { exact: true })).toBeVisible();
    await expect(page.getByLabel('Single-key shortcuts')).toHaveValue(option.toLowerCase());
  };
  const on = { hints: 3, stepped: 1, found: [true, true, true] };
  expect(await acts()).toEqual(on);
  await choose('Off');
  expect(await acts()).toEqual({ hints: 0, stepped: 0, found: [false, false, false] });
  await choose('On');
  expect(await acts()).toEqual(on);
});
