import type { Page } from '@playwright/test';
import type { DraftVersion } from '@/domain/api/schemas/versions';
import { expectSound } from './support/axe';
import { call, draft, readProposal } from './support/api';
import { expect, expectNoSidewaysScroll, signIn, test } from './support/book';
import { PEOPLE } from './support/people';
import { emptyFolder, startServer } from './support/server';
import { WritingDesk } from './support/writing';

const STALE = [/status of 409/];
const NO_NETWORK = [/ERR_INTERNET_DISCONNECTED/, /ERR_CONNECTION_(REFUSED|RESET)/, /ERR_EMPTY_RESPONSE/];

const longer = (source: string) =>
  source.replace(/^minutes: (\d+)/m, (_, minutes: string) => `minutes: ${Number(minutes) + 5}`);
const versions = async (page: Page, id: string): Promise<DraftVersion[]> =>
  ((await (await call(page, 'GET', `/proposals/${id}/versions`)).json()) as { items: DraftVersion[] }).items;

/** A desk on a new draft of the sheet. */
async function deskOn(page: Page, number: string, reason = 'Timed again.'): Promise<WritingDesk> {
  const { id } = await draft(page, number, longer, reason);
  const desk = new WritingDesk(page);
  await page.goto(`/proposals/${id}/edit`);
  await desk.ready();
  return desk;
}

const savedAs = (desk: WritingDesk, reason: string) =>
  expect.poll(async () => (await readProposal(desk.page, desk.id)).reason).toBe(reason);

test.describe('earlier versions', () => {
  test('are listed from the desk, show what going back would change, and are gone back to', async ({ as }) => {
    const page = await as('northSenior');
    const desk = await deskOn(page, 'P-0190');
    const { id } = desk;
    const before = (await desk.stepTitle(1).inputValue()).trim();
    await desk.stepTitle(1).fill('Lay everything out first');
    // What is not saved yet is saved on the way.
    await page.getByRole('link', { name: 'Earlier versions' }).click();
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Earlier versions');
    const rows = page.getByRole('table', { name: 'Versions of the draft' }).getByRole('row');
    await expect(rows).toHaveCount(3);
    await expect(rows.nth(1)).toContainText(/as it stands now.*You.*Step 1 changed/);
    await expect(rows.nth(2)).toContainText(/Begun on revision [A-Z]/);
    await expectSound(page);

    await rows.nth(2).getByRole('link').click();
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Version 1 of');
    const now = page.getByRole('region', { name: 'Version 1' });
    await expect(now.getByText(before).first()).toBeVisible();
    await expect(page.getByRole('region', { name: 'Draft now' }).getByText('Lay everything out first')).toBeVisible();
    await expectSound(page);
    await page.getByRole('button', { name: 'Go back to this version' }).click();
    await desk.ready();
    await expect(desk.middle.getByText(/^The draft is back at version 1\./)).toBeVisible();
    await expect(desk.stepTitle(1)).toHaveValue(before);
    expect((await versions(page, id)).map(({ n, kind, of }) => [n, kind, of])).toEqual([
      [3, 'restore', 1],
      [2, 'write', null],
      [1, 'start', null],
    ]);
    await page.goto(`/proposals/${id}/versions/3`);
    await expect(page.getByText('The draft says the same now')).toBeVisible();
    await expect(page.getByRole('button', { name: 'Go back to this version' })).toHaveCount(0);
  });

  test('are gone back to without a script, and not over what was saved meanwhile', async ({ as }) => {
    const page = await as('northSenior', { javaScriptEnabled: false, allow: STALE });
    const { id, source } = await draft(page, 'P-0183', longer, 'Timed.');
    const save = (reason: string, version: number) =>
      call(page, 'PUT', `/proposals/${id}`, { reason }, { 'if-match': `"${version}"` });
    expect((await save('Timed twice.', 1)).ok()).toBe(true);
    await page.goto(`/proposals/${id}/edit`);
    await page.getByRole('link', { name: 'Earlier versions' }).click();
    await expect(page.getByText(/ UTC$/).first()).toBeVisible();
    await page.getByRole('link', { name: 'Version 1' }).click();
    await expect(page.getByText('The reason, as it was then')).toBeVisible();
    expect((await save('Timed three times.', 2)).ok()).toBe(true);
    const go = page.getByRole('button', { name: 'Go back to this version' });
    await go.click();
    await expect(
      page.getByText(/The draft was changed after this page was opened\. Nothing was overwritten/),
    ).toBeVisible();
    expect((await readProposal(page, id)).reason).toBe('Timed three times.');
    await go.click();
    await expect(page).toHaveURL(new RegExp(`/proposals/${id}/edit\\?back=1$`));
    await expect(page.getByRole('paragraph').filter({ hasText: 'The draft is back at version 1.' })).toBeVisible();
    expect(await readProposal(page, id)).toMatchObject({ reason: 'Timed.', source });
  });

  test('of a text that cannot be read stand there as text; nobody else sees any', async ({ as }) => {
    const page = await as('northSenior');
    const { id } = await draft(page, 'P-0181', longer, 'Timed.');
    await call(page, 'PUT', `/proposals/${id}`, { source: 'Not a sheet' }, { 'if-match': '"1"' });
    await page.goto(`/proposals/${id}/versions/1`);
    await page.getByText('Show both texts').click();
    await expect(page.getByLabel('The draft now')).toHaveValue('Not a sheet');
    await expectSound(page);
    const other = await as('senior', { allow: [/status of 404/] });
    for (const path of ['', '/1', '/99', '/x'])
      expect((await other.goto(`/proposals/${id}/versions${path}`))?.status()).toBe(404);
  });
});

test.describe('undo and redo', () => {
  test('say what they take back, by button and by key, and show where', async ({ as }) => {
    const page = await as('northSenior');
    const desk = await deskOn(page, 'P-0131');
    const undo = page.locator('.writing-undo').getByRole('button', { name: /^Undo/ });
    const redo = page.getByRole('button', { name: /^Redo/ });
    await expect(undo).toHaveAttribute('aria-disabled', 'true');
    const first = await desk.stepTitle(1).inputValue();
    const parts = page.getByRole('navigation', { name: 'Parts of the sheet' });
    const third = parts.locator('a[href^="#step-"]').nth(2);
    const words = (await third.textContent()) ?? '';

    await third.click();
    await page.getByRole('button', { name: 'Delete the step' }).click();
    await expect(undo).toHaveText('Undo: step 3 deleted');
    await page.evaluate(() => (location.hash = '#sheet'));
    await desk.middle.getByLabel('Title').fill('Another title');
    await expect(undo).toHaveText('Undo: title changed');

    // In a field the keys are the field's own.
    await page.keyboard.press('Control+z');
    await expect(desk.middle.getByLabel('Title')).not.toHaveValue('Another title');
    await page.keyboard.press('Control+Shift+z');
    await expect(desk.middle.getByLabel('Title')).toHaveValue('Another title');
    await expect(undo).toHaveText('Undo: title changed');
    await page.getByRole('button', { name: 'See what changes' }).focus();
    await page.keyboard.press('Control+z');
    await expect(undo).toHaveText('Undo: step 3 deleted');
    await expect(redo).toHaveText('Redo: title changed');
    await undo.click();
    await expect(third).toHaveText(words);
    await expect(redo).toHaveText('Redo: step 3 deleted');
    // The line that offers to bring the step back is gone: it stands there again.
    await expect(desk.middle.getByRole('button', { name: 'Undo', exact: true })).toHaveCount(0);
    await desk.kept();
    await page.keyboard.press('Control+y');
    await expect(third).not.toHaveText(words);
    await page.keyboard.press('Control+Shift+z');
    await expect(redo).toHaveAttribute('aria-disabled', 'true');
    for (let i = 0; i < 2; i += 1) await undo.click();
    await page.evaluate(() => (location.hash = ''));
    await expect(desk.stepTitle(1)).toHaveValue(first);
    await desk.kept();
    // Everything is back, and so it is on the server.
    await expect.poll(async () => (await versions(page, desk.id)).map(({ current }) => current)).toContain(true);
    await expectSound(page);
  });

  test('take a new step, its title and a value back one by one', async ({ as }) => {
    const page = await as('northSenior');
    const desk = await deskOn(page, 'P-0118');
    const undo = page.locator('.writing-undo').getByRole('button', { name: /^Undo/ });
    const before = (await readProposal(page, desk.id)).source;
    await page.getByRole('button', { name: 'Add a step after this one' }).click();
    await desk.stepTitle(2).fill('Wipe the seat');
    await page.evaluate(() => (location.hash = '#torques'));
    const nm = page.locator('#f-torques-0-nm');
    await nm.fill('33');
    await expect(undo).toHaveText(/^Undo: torque .* changed$/);
    await expect.poll(async () => (await readProposal(page, desk.id)).source).toContain('Wipe the seat');
    await undo.click();
    await expect(nm).not.toHaveValue('33');
    await expect(undo).toHaveText('Undo: step 2 changed');
    await undo.click();
    await expect(undo).toHaveText('Undo: step 2 added');
    await undo.click();
    await expect(undo).toHaveAttribute('aria-disabled', 'true');
    await desk.kept();
    await expect.poll(async () => (await readProposal(page, desk.id)).source).toBe(before);
  });
});

test.describe('one draft in two places', () => {
  test('another tab is told at once, before anything is typed there', async ({ as }) => {
    const one = await deskOn(await as('northSenior'), 'P-0154');
    const two = new WritingDesk(await one.page.context().newPage());
    await two.page.goto(`/proposals/${one.id}/edit`);
    await two.ready();
    await one.reason.fill('Written in the first tab.');
    await savedAs(one, 'Written in the first tab.');
    const clash = two.page
      .getByRole('alert')
      .filter({ hasText: 'This draft was changed in another tab or on another device' });
    await expect(clash).toBeVisible();
    await expect(two.keeping).toHaveText('Changed elsewhere: say which text goes on.');
    await clash.getByRole('button', { name: 'Take what was saved there' }).click();
    await expect(two.reason).toHaveValue('Written in the first tab.');
    await two.kept();
    // It wrote nothing, so there is nothing to keep aside.
    expect((await versions(one.page, one.id)).map(({ kind }) => kind)).toEqual(['write', 'start']);
  });

  test('another device is told when its page comes into view, and neither text is lost', async ({ as }) => {
    const desktop = await deskOn(await as('northSenior', { allow: STALE }), 'P-0156');
    const { id } = desktop;
    const tablet = new WritingDesk(await as('northSenior', { allow: STALE, viewport: { width: 820, height: 1100 } }));
    await tablet.page.goto(`/proposals/${id}/edit`);
    await tablet.ready();
    await desktop.reason.fill('Written at the desk.');
    await savedAs(desktop, 'Written at the desk.');
    const clash = tablet.page.getByRole('alert').filter({ hasText: 'or on another device' });
    await expect(clash).toHaveCount(0);
    await tablet.page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
    await expect(clash).toBeVisible();
    await expectNoSidewaysScroll(tablet.page, 390);

    // What is typed in spite of it is held, and kept among the versions once the other text is taken.
    await tablet.reason.fill('Written at the bench.');
    await expect(tablet.keeping).toHaveAttribute('data-keeping', 'stale');
    expect((await readProposal(desktop.page, id)).reason).toBe('Written at the desk.');
    await clash.getByRole('button', { name: 'Take what was saved there' }).click();
    await expect(tablet.reason).toHaveValue('Written at the desk.');
    await expect
      .poll(async () => (await versions(desktop.page, id))[0])
      .toMatchObject({
        kind: 'aside',
        reason: 'Written at the bench.',
        current: false,
      });

    // And the other way: this screen's words go on, those from elsewhere stay among the versions.
    await tablet.reason.fill('Written at the bench after all.');
    await savedAs(tablet, 'Written at the bench after all.');
    await desktop.reason.fill('Written at the desk once more.');
    const there = desktop.page.getByRole('alert').filter({ hasText: 'or on another device' });
    await there.getByRole('button', { name: 'Keep what is on this screen' }).click();
    await savedAs(desktop, 'Written at the desk once more.');
    expect((await versions(desktop.page, id)).map(({ reason }) => reason)).toEqual([
      'Written at the desk once more.',
      'Written at the bench after all.',
      'Written at the bench.',
      'Written at the desk.',
      'Timed again.',
    ]);
  });

  test('a page in view finds out by itself within half a minute', async ({ as }) => {
    const desktop = await deskOn(await as('northSenior'), 'P-0160');
    const other = new WritingDesk(await as('northSenior'));
    await other.page.clock.install();
    await other.page.goto(`/proposals/${desktop.id}/edit`);
    await other.ready();
    await desktop.reason.fill('Written meanwhile.');
    await savedAs(desktop, 'Written meanwhile.');
    await other.page.clock.fastForward(31_000);
    await expect(other.page.getByRole('alert').filter({ hasText: 'or on another device' })).toBeVisible();
  });
});

test.describe('a lost network', () => {
  test('keeps what is typed, says so, and sends it after the page was closed', async ({ as }) => {
    const page = await as('northSenior', { allow: NO_NETWORK });
    const desk = await deskOn(page, 'P-0139');
    const { id } = desk;
    const context = page.context();
    await context.setOffline(true);
    await desk.reason.fill('Typed in the pit.');
    await expect(desk.keeping).toHaveText('Kept on this device. Sent when the network is back.');
    await page.getByRole('button', { name: 'See what changes' }).click();
    await page.getByRole('button', { name: 'Back to writing' }).click();
    await desk.stepTitle(1).fill('Typed in the pit too');
    await page.close({ runBeforeUnload: false });

    // Opened again while there is still no network, there is no page; the words stay where they are.
    const still = await context.newPage();
    await still.goto(`/proposals/${id}/edit`).catch(() => null);
    await still.close();
    await context.setOffline(false);
    const next = new WritingDesk(await context.newPage());
    await next.page.goto(`/proposals/${id}/edit`);
    await next.ready();
    // A page that is closed still tries to send its last words, and may get them through; then none had to be held.
    await expect(next.reason).toHaveValue('Typed in the pit.');
    await expect(next.stepTitle(1)).toHaveValue('Typed in the pit too');
    await next.kept();
    await expect.poll(async () => (await readProposal(next.page, id)).source).toContain('Typed in the pit too');
    // Nothing is left behind on the device once the server has it.
    await expect
      .poll(() =>
        next.page.evaluate(() => Object.keys(localStorage).filter((key) => key.startsWith('matchmark:draft:'))),
      )
      .toEqual([]);
  });

  test('words typed while signed out are held, and sent after signing in again', async ({ as }) => {
    const page = await as('northSenior', { allow: [/status of 401/] });
    const desk = await deskOn(page, 'P-0171');
    await page.context().clearCookies();
    await desk.reason.fill('Typed after the session ended.');
    await expect(desk.keeping).toHaveText('Kept on this device. You are signed out: sent when you sign in again.');
    await expect(page.getByRole('link', { name: 'Sign in in another tab' })).toBeVisible();
    await expectNoSidewaysScroll(page, 390);
    await page.setViewportSize({ width: 1360, height: 900 });
    await signIn(page, PEOPLE.northSenior);
    // As the page does when its author comes back to it from the other tab.
    await page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
    await desk.kept();
    expect((await readProposal(page, desk.id)).reason).toBe('Typed after the session ended.');
  });

  test('a server that is restarted meanwhile gets everything that was typed', async ({ as }, { config }) => {
    test.setTimeout(150_000);
    // Well apart from the ports that other runs on the same machine may use.
    const port = Number(new URL(config.projects[0]!.use.baseURL!).port) + 100;
    const folder = 'data/e2e-restarted';
    await emptyFolder(folder);
    let server = await startServer(port, folder, '1');
    const page = await as('northSenior', { baseURL: server.origin, allow: NO_NETWORK });
    const desk = await deskOn(page, 'P-0142');
    await server.stop();
    await desk.reason.fill('Typed while the server was away.');
    await expect(desk.keeping).toHaveText('Kept on this device. Sent when the network is back.');
    server = await startServer(port, folder, '1');
    await expect(desk.keeping).toHaveAttribute('data-keeping', 'kept', { timeout: 30_000 });
    expect((await readProposal(page, desk.id)).reason).toBe('Typed while the server was away.');
    await page.close();
    await server.stop();
  });
});
