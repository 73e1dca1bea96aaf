import { call, propose, readProposal } from './support/api';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

const PHONE = { viewport: { width: 390, height: 844 }, isMobile: true, hasTouch: true, deviceScaleFactor: 2 };
/** A PNG of one pixel. */
const PIXEL = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);

test("the author's day: a flag becomes a draft, is written with chips, undone, kept, shown and proposed", async ({
  as,
}) => {
  test.setTimeout(150_000);
  const apprentice = await as('apprentice');
  const raised = await call(apprentice, 'POST', '/procedures/P-0108/flags', {
    kind: 'unclear',
    step: 'draw-up',
    text: 'How far is the first pass?',
  });
  expect(raised.status(), await raised.text()).toBe(201);

  const page = await as('northSenior');
  await page.goto('/flags');
  const flag = page.getByRole('listitem').filter({ hasText: 'How far is the first pass?' });
  await flag.getByRole('button', { name: 'Change the sheet' }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  await expect(desk.reason).toHaveValue(/How far is the first pass\?/);

  await desk.choose('Draw the pan up in order');
  await desk.how.click();
  await page.keyboard.press('ControlOrMeta+End');
  await page.keyboard.type(' Begin with ');
  await desk.middle.getByRole('button', { name: 'Torque', exact: true }).click();
  await desk.middle.getByRole('button', { name: /^Pan bolt, first pass/ }).click();
  await expect(desk.chip('Pan bolt, first pass')).not.toHaveCount(0);
  await desk.kept();

  // What the desk did as a whole can be taken back from its head.
  await desk.middle.getByRole('button', { name: 'Delete the step' }).click();
  await page.getByRole('button', { name: /^Undo: step .* deleted/ }).click();
  await expect(desk.middle.getByLabel(/^Step \d+, what to do$/)).toHaveValue('Draw the pan up in order');
  await desk.kept();

  await page.getByLabel('Add photos').setInputFiles({ name: 'first.png', mimeType: 'image/png', buffer: PIXEL });
  await page.getByLabel('What photo 1 shows').fill('The gap after the first pass');
  await page.getByRole('button', { name: 'Add the photo to the reason' }).click();
  await desk.propose();
  const { source, photos, reason } = await readProposal(page, desk.id);
  expect(source).toContain('Begin with <Torque of="pan-bolt" pass="1" />');
  expect(photos.map(({ alt }) => alt)).toEqual(['The gap after the first pass']);
  expect(reason).toContain('How far is the first pass?');
});

test("the editor's day on a phone: the desk, a question, a return, and the better text published", async ({ as }) => {
  test.setTimeout(150_000);
  const author = await as('senior');
  const { id } = await propose(
    author,
    'P-0113',
    (source) => source.replace(/^(<Step id="[a-z-]+" title=")/m, '$1Slowly: '),
    'Two of us rushed it.',
  );
  const page = await as('editor', PHONE);
  await page.goto('/review-desk');
  await expectNoSidewaysScroll(page, 390);
  await page.locator(`main a[href^="/proposals/${id}"]`).first().tap();
  await alive(page);

  await page.locator('.start-here a:visible').filter({ hasText: /^Ask/ }).first().tap();
  const ask = page.getByRole('form', { name: /^Ask/ });
  await ask.getByLabel('Your question').fill('What does slowly mean here?');
  await ask.getByRole('button', { name: 'Ask' }).tap();
  await expect(page.getByRole('region', { name: 'Question, not answered yet' })).toBeVisible();
  await expectNoSidewaysScroll(page, 390);
  await expect(page.getByRole('button', { name: /^Publish/ }).first()).toBeDisabled();

  await page.getByRole('link', { name: 'Return with reasons' }).first().tap();
  const back = page.getByRole('form', { name: 'Return with reasons' });
  await back.getByLabel('What must change, and why').fill('Say what slowly is.');
  await back.getByRole('button', { name: 'Return' }).tap();
  await expect(page.getByText(/^Returned to/).first()).toBeVisible();

  const returned = await readProposal(author, id);
  const saved = await call(
    author,
    'PUT',
    `/proposals/${id}`,
    {
      source: returned.source.replace('Slowly: ', 'In two turns: '),
      reason: 'Two of us rushed it; two turns is slow.',
    },
    { 'if-match': `"${returned.version}"` },
  );
  expect(saved.ok(), await saved.text()).toBe(true);
  const threads = (await (await call(author, 'GET', `/proposals/${id}/threads`)).json()) as { items: { id: string }[] };
  const [question] = threads.items;
  await call(author, 'POST', `/threads/${question!.id}/messages`, { text: 'Two turns of the wheel.' });
  expect((await call(author, 'POST', `/proposals/${id}/submit`)).ok()).toBe(true);

  await page.goto(`/proposals/${id}`);
  await alive(page);
  await expect(page.locator('.pane-new')).toContainText('In two turns');
  await page.getByRole('button', { name: 'Resolve' }).first().tap();
  await expect(page.getByRole('region', { name: /^Question, not answered|^Question, answered but/ })).toHaveCount(0);
  await page.getByRole('link', { name: 'Publish', exact: true }).tap();
  await page.getByRole('button', { name: /^Publish as/ }).tap();
  await expect(page.getByText(/^Published as/).first()).toBeVisible();
  await expectNoSidewaysScroll(page, 390);
  await page.goto('/procedures/P-0113/revisions');
  await expect(page.getByText('This history is whole')).toBeVisible();
  await expect(
    page
      .getByRole('list', { name: /^What happened/ })
      .getByRole('listitem')
      .first(),
  ).toContainText('two turns is slow');
});
