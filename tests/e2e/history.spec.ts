import { expectNoFaults } from './support/axe';
import { call, readProposal, readSheet } from './support/api';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

test('an apprentice reads what happened to a sheet, and follows a permanent link', async ({ as }) => {
  const page = await as('apprentice');
  await page.goto('/procedures/P-0142');
  await page.getByRole('link', { name: /earlier revisions/ }).click();
  await expect(page.getByText(/^This history is whole: \d+ entries in the audit trail, each follows/)).toBeVisible();
  const events = page.getByRole('list', { name: 'What happened to P-0142, latest first' }).locator('> li');
  await expect(events).toHaveCount(3);
  await expect(events.first()).toContainText('Leave the wiped edge before you judge it, 10 to 15 min');
  await expect(events.first()).toContainText('Published');
  await expect(events.first().getByRole('link', { name: 'Grew from B: see both texts' })).toHaveAttribute(
    'href',
    /from=B&to=C/,
  );
  // An apprentice proposes nothing.
  await expect(page.getByRole('button', { name: /^Propose this text again/ })).toHaveCount(0);

  await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
  await events
    .first()
    .getByRole('button', { name: /^Copy the permanent link/ })
    .click();
  await expect(page.getByRole('status').filter({ hasText: 'Link copied' })).toBeVisible();
  const link = await page.evaluate(() => navigator.clipboard.readText());
  expect(new URL(link).pathname).toBe('/procedures/P-0142/revisions/C');

  // The link of the current revision stays its own, with the step in it.
  await page.goto(`${link}#step-check`);
  await expect(page).toHaveURL(/\/revisions\/C#step-check$/);
  await expect(page.getByText('Do not work from this sheet', { exact: true })).toBeHidden();
  const { revision } = await readSheet(page, 'P-0142');
  await page.goto(`/procedures/P-0142/revisions/check/${revision.sheetCheck}#step-sealant`);
  await expect(page).toHaveURL(/\/procedures\/P-0142\/revisions\/C#step-sealant$/);
  const unknown = await page.request.get('/procedures/P-0142/revisions/check/00000000');
  expect(unknown.status()).toBe(404);
});

test('a withdrawal stands in the same order of time', async ({ as }) => {
  const page = await as('apprentice');
  await page.goto('/procedures/P-0173/revisions');
  const events = page.getByRole('list', { name: 'What happened to P-0173, latest first' }).locator('> li');
  await expect(events.first()).toContainText(/Withdrawn at revision A by Tobias Marchetti/);
  await expect(events.first()).toContainText(/Read and signed by \d+ of \d+ in your shop/);
  await expect(events.nth(1)).toContainText('withdrawn');
});

test('each step and value says where it comes from, without script too', async ({ as }) => {
  const page = await as('apprentice', { javaScriptEnabled: false });
  await page.goto('/procedures/P-0142');
  await page.getByRole('link', { name: 'where it comes from' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Where each step and value comes from' })).toBeVisible();
  const step = page
    .locator('section')
    .filter({ has: page.getByRole('heading', { name: /Run it and look for leaks/ }) });
  const since = step.locator('.origin-since').first();
  await expect(since).toContainText('Since revision C');
  await expect(since).toContainText('Leave the wiped edge before you judge it: 15 min');
  await expect(since).toContainText(/Rowan Achterberg, \d+ \w+ \d{4}/);
  await expect(since).toContainText('Reviewed by Ines Okafor');
  await expect(step.locator('.origin-since').nth(1)).toContainText('The words of this step');
  await since.getByRole('link').click();
  await expect(page).toHaveURL('/procedures/P-0142/revisions/C');
});

test('a senior technician brings an old text back as a proposal, once, and must say why', async ({ as }) => {
  const page = await as('northSenior', { allow: [/422/] });
  await page.goto('/procedures/P-0142/revisions');
  await expect(page.getByRole('button', { name: /^Propose this text again.*revision C$/ })).toHaveCount(0);
  await page.getByRole('button', { name: /^Propose this text again.*revision B$/ }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  const { id } = desk;
  await expect(desk.reason).toHaveValue(/^Brings back revision B: ?$/);
  expect(await readProposal(page, id)).toMatchObject({ base: 'C', takesBack: [{ revision: 'C' }] });

  // Pressed again it is the same draft.
  await page.goto('/procedures/P-0142/revisions');
  await page.getByRole('button', { name: /^Propose this text again.*revision B$/ }).click();
  await desk.ready();
  expect(desk.id).toBe(id);

  await page.getByRole('button', { name: 'Propose', exact: true }).click();
  await expect(
    page.getByText('Write why revision B is to come back, behind “Brings back revision B:”.').first(),
  ).toBeVisible();
  await desk.reason.fill('Brings back revision B: ten minutes were enough on both of ours.');
  await desk.kept();
  await desk.propose();
  await expect(page.getByText(/ten minutes were enough/).first()).toBeVisible();
  // Out of the way of other tests.
  const editor = await as('editor');
  expect((await call(editor, 'POST', `/proposals/${id}/decline`, { reason: 'Tried in a test.' })).ok()).toBe(true);
});

test('what cannot be brought back says why in place', async ({ as }) => {
  const page = await as('northSenior', { allow: [/409/] });
  await page.goto('/procedures/P-0142/revisions');
  await page.evaluate(() => {
    document.querySelector<HTMLFormElement>('form[action$="/B/restore"]')!.action =
      '/procedures/P-0142/revisions/C/restore';
  });
  await page.getByRole('button', { name: /^Propose this text again.*revision B$/ }).click();
  await expect(page.getByText('Revision C is the current one, so there is nothing to bring back.')).toBeVisible();
  await page.getByRole('link', { name: 'Back to the history' }).click();
  await expect(page).toHaveURL('/procedures/P-0142/revisions');
});

test('the steward reads the whole trail, an owner their own shop’s, and nobody else any', async ({ as }) => {
  const steward = await as('steward');
  await steward.goto('/shop/audit');
  await expect(steward.getByText(/^The trail is whole: \d+ entries/)).toBeVisible();
  const table = steward.getByRole('table', { name: 'The audit trail, latest first' });
  await expect(table.locator('tbody tr')).toHaveCount(50);
  // To the very first entry, however much was done before.
  const older = steward.getByRole('link', { name: 'Older' });
  while ((await older.count()) > 0) {
    const first = await table.locator('tbody tr').first().textContent();
    await older.click();
    await expect(table.locator('tbody tr').first()).not.toHaveText(first ?? '');
  }
  await expect(table.locator('tbody tr').last()).toContainText('Published a revision');
  await steward.getByRole('link', { name: 'Sawmill Lane Marine' }).click();
  await expect(table.locator('tbody tr').first()).toContainText('Sawmill Lane Marine');

  const owner = await as('sawmillOwner', { allow: [/404/] });
  await owner.goto('/shop/audit');
  const shops = await owner.getByRole('table').locator('tbody tr td:last-child').allTextContents();
  expect(new Set(shops)).toEqual(new Set(['Sawmill Lane Marine']));
  await expect(owner.getByText('The trail is whole')).toHaveCount(0);
  const pier = new URL(
    await steward.getByRole('link', { name: 'Pier Street Motors' }).evaluate((a) => (a as HTMLAnchorElement).href),
  );
  expect((await owner.goto(pier.pathname + pier.search))!.status()).toBe(404);
  const apprentice = await as('apprentice', { allow: [/403/] });
  expect((await apprentice.goto('/shop/audit'))!.status()).toBe(403);
});

for (const [name, path, who] of [
  ['history', '/procedures/P-0142/revisions', 'senior'],
  ['history of a withdrawn sheet', '/procedures/P-0173/revisions', 'apprentice'],
  ['origins', '/procedures/P-0142/origins', 'apprentice'],
  ['audit trail', '/shop/audit', 'steward'],
] as const)
  test(`${name}: read by everybody, on a phone and on paper`, async ({ as }) => {
    const page = await as(who);
    await page.goto(path);
    await alive(page);
    await expectNoFaults(page);
    for (const width of [820, 390, 320]) await expectNoSidewaysScroll(page, width);
    await page.emulateMedia({ media: 'print' });
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await expect(page.getByRole('button', { name: /Copy|Compare|Propose/ })).toHaveCount(0);
  });
