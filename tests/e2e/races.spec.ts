import { nextLetter } from '@/domain/revision/letters';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { call, draft, propose, readProposal, readSheet } from './support/api';
import { alive, expect, test } from './support/book';
import { WritingDesk } from './support/writing';

const STALE = [/status of 409/];
/** A change that one editor can decide. */
const longer = (source: string) =>
  source.replace(/^minutes: (\d+)/m, (_, minutes: string) => `minutes: ${Number(minutes) + 5}`);

test('two tabs on one draft: neither writes over the other, and no word is lost', async ({ as }) => {
  const one = new WritingDesk(await as('technician', { allow: STALE }));
  const { id } = await draft(one.page, 'P-0150', longer, 'Timed again.');
  const two = new WritingDesk(await one.page.context().newPage());
  for (const desk of [one, two]) {
    await desk.page.goto(`/proposals/${id}/edit`);
    await desk.ready();
  }
  await one.reason.fill('Written in the first tab.');
  await one.kept();
  await two.reason.fill('Written in the second tab.');
  const clash = two.page.getByRole('alert').filter({ hasText: 'This draft was changed in another tab' });
  await expect(clash).toBeVisible();
  expect((await readProposal(one.page, id)).reason).toBe('Written in the first tab.');

  await clash.getByRole('button', { name: 'Take what was saved there' }).click();
  await expect(two.reason).toHaveValue('Written in the first tab.');
  await two.middle.getByRole('button', { name: 'Undo', exact: true }).click();
  await expect(two.reason).toHaveValue('Written in the second tab.');
  await two.kept();
  await expect.poll(async () => (await readProposal(one.page, id)).reason).toBe('Written in the second tab.');

  await one.reason.fill('And once more in the first.');
  const back = one.page.getByRole('alert').filter({ hasText: 'This draft was changed in another tab' });
  await back.getByRole('button', { name: 'Keep what is on this screen' }).click();
  await one.kept();
  expect((await readProposal(one.page, id)).reason).toBe('And once more in the first.');
});

test('two editors publish at once: one does, the other is told', async ({ as }) => {
  const author = await as('northSenior');
  const before = await readSheet(author, 'P-0171');
  const { id } = await propose(author, 'P-0171', longer, 'It takes longer.');
  const letter = nextLetter(before.revision.letter);
  const editors = [await as('editor', { allow: STALE }), await as('editor2', { allow: STALE })];
  for (const page of editors) {
    await page.goto(`/proposals/${id}`);
    await alive(page);
    await page.getByRole('link', { name: 'Publish', exact: true }).click();
    await expect(page.getByRole('button', { name: `Publish as ${letter}` })).toBeVisible();
  }
  await Promise.all(editors.map((page) => page.getByRole('button', { name: `Publish as ${letter}` }).click()));
  for (const page of editors)
    await expect(
      page.getByText(`Published as ${letter}.`).or(page.getByText('Not done: this changed in the meantime')).first(),
    ).toBeVisible();
  const told = await Promise.all(
    editors.map((page) => page.getByText('Not done: this changed in the meantime').count()),
  );
  expect(
    told.reduce((sum, count) => sum + count, 0),
    'one of them came second',
  ).toBe(1);
  const after = await readSheet(author, 'P-0171');
  expect(after.revision.letter).toBe(letter);
  expect(after.earlier).toBe(before.earlier + 1);
  expect(after.revision.reviewers).toHaveLength(1);
});

test('a double click does a thing once', async ({ as }) => {
  const author = await as('northSenior');
  const mine = async () => {
    const { items } = (await (await call(author, 'GET', '/proposals?limit=200')).json()) as {
      items: ProposalSummary[];
    };
    return items.filter(({ number }) => number === 'P-0101');
  };
  await author.goto('/procedures/P-0101');
  await author.getByRole('button', { name: 'Propose a change' }).dblclick();
  const desk = new WritingDesk(author);
  await desk.ready();
  expect(await mine()).toHaveLength(1);
  await desk.stepTitle(1).press('End');
  await desk.stepTitle(1).pressSequentially(', twice over');
  await desk.reason.fill('Nobody did it the first time.');
  await author.getByRole('button', { name: 'Propose', exact: true }).dblclick();
  await expect(author).toHaveURL(/\?done=proposed$/);
  expect(await mine()).toHaveLength(1);

  const before = await readSheet(author, 'P-0101');
  const editor = await as('editor');
  await editor.goto(`/proposals/${desk.id}`);
  await alive(editor);
  await editor.getByRole('link', { name: 'Publish', exact: true }).click();
  await editor.getByRole('button', { name: /^Publish as/ }).dblclick();
  await expect(editor.getByText(/^Published as/).first()).toBeVisible();
  const after = await readSheet(author, 'P-0101');
  expect(after.earlier).toBe(before.earlier + 1);
});

test('going back never offers what is over', async ({ as }) => {
  const author = await as('technician');
  await author.goto('/procedures/P-0158');
  await author.getByRole('button', { name: 'Propose a change' }).click();
  const desk = new WritingDesk(author);
  await desk.ready();
  const { id } = desk;
  await desk.stepTitle(1).fill('Lay the parts out in order');
  await desk.reason.fill('It saves looking.');
  await desk.propose();
  await author.goBack();
  await expect(author).toHaveURL(`/proposals/${id}`);
  await expect(author.getByRole('button', { name: 'Propose', exact: true })).toHaveCount(0);

  const editor = await as('editor');
  await editor.goto('/review-desk');
  await editor.goto(`/proposals/${id}`);
  await alive(editor);
  await editor.getByRole('link', { name: 'Publish', exact: true }).click();
  await editor.getByRole('button', { name: /^Publish as/ }).click();
  await editor.getByRole('link', { name: /^Open sheet/ }).click();
  await expect(editor).toHaveURL('/procedures/P-0158');
  await editor.goBack();
  await expect(editor).toHaveURL(new RegExp(`/proposals/${id}`));
  await expect(editor.getByRole('link', { name: /^Open sheet/ })).toBeVisible();
  await expect(editor.getByRole('link', { name: 'Publish', exact: true })).toHaveCount(0);
  await editor.goBack();
  await expect(editor).toHaveURL('/review-desk');
  await expect(editor.locator(`main a[href^="/proposals/${id}"]`)).toHaveCount(0);
});

test('an editor whose return comes too late keeps the reason they wrote', async ({ as }) => {
  const author = await as('northSenior');
  const { id } = await propose(author, 'P-0152', longer, 'Measured twice.');
  const [late, quick] = [await as('editor', { allow: STALE }), await as('editor2')];
  await late.goto(`/proposals/${id}`);
  await alive(late);
  await late.getByRole('link', { name: 'Return with reasons' }).click();
  const why = late.getByLabel('What must change, and why');
  await why.fill('A long reason that took a while to write.');
  expect((await call(quick, 'POST', `/proposals/${id}/return`, { reason: 'Say on which engine.' })).ok()).toBe(true);
  await late.getByRole('form', { name: 'Return with reasons' }).getByRole('button', { name: 'Return' }).click();
  await expect(late.getByText('Not done: this changed in the meantime')).toBeVisible();
  await expect(late.getByText('A long reason that took a while to write.')).toBeVisible();
  const { remarks } = await readProposal(author, id);
  expect(remarks.map(({ text }) => text)).toEqual(['Say on which engine.']);
});
