import { nextLetter } from '@/domain/revision/letters';
import { call, draft, propose, readProposal, readSheet } from './support/api';
import { expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

const minutes = (more: number) => (source: string) =>
  source.replace(/^minutes: (\d+)/m, (_, was: string) => `minutes: ${Number(was) + more}`);
const titled = (words: string) => (source: string) => source.replace(/^(title: .*)$/m, `$1${words}`);

/** Publishes a change to a sheet by somebody else; both editors agree, whatever it needs. */
async function published(
  as: (who: 'northSenior' | 'editor' | 'editor2') => Promise<import('@playwright/test').Page>,
  number: string,
  change: (source: string) => string,
) {
  const { id } = await propose(await as('northSenior'), number, change, 'It matters.');
  await call(await as('editor'), 'POST', `/proposals/${id}/agree`);
  const answer = await call(await as('editor2'), 'POST', `/proposals/${id}/publish`);
  expect(answer.ok(), await answer.text()).toBe(true);
}

test('a draft and a revision whose changes do not touch are brought together with one press', async ({ as }) => {
  const author = await as('technician');
  const base = (await readSheet(author, 'P-0124')).revision.letter;
  const mine = await draft(author, 'P-0124', minutes(5), 'Five minutes more.');
  await published(as, 'P-0124', titled(', in order'));
  const letter = nextLetter(base);
  const desk = new WritingDesk(author);
  await author.goto(`/proposals/${mine.id}/edit`);
  await desk.ready();
  const notice = author.getByRole('alert').filter({ hasText: `Revision ${letter} was published meanwhile` });
  await expect(notice).toContainText('do not touch');
  await expect(notice.getByRole('listitem')).toHaveText([/^Title: .*, in order$/]);
  await notice.getByRole('button', { name: `Go on from revision ${letter}` }).click();
  await expect(notice).toBeHidden();
  await expect(desk.reason).toHaveValue('Five minutes more.');
  const after = await readProposal(author, mine.id);
  expect(after).toMatchObject({ base: letter, stale: false, takesBack: [] });
  expect(after.source).toBe(titled(', in order')(mine.source));
});

test('where they touch, the author chooses place by place, also after a reload, and nothing is lost', async ({
  as,
}) => {
  const author = await as('technician');
  const base = (await readSheet(author, 'P-0152')).revision.letter;
  const mine = await draft(author, 'P-0152', (source) => titled(', by mine')(minutes(5)(source)), 'Timed.');
  await published(as, 'P-0152', (source) =>
    minutes(9)(source.replace(/^(summary: .*)$/m, '$1 Read it whole.').replace(/^(title: .*)$/m, '$1, by theirs')),
  );
  const letter = nextLetter(base);
  const desk = new WritingDesk(author);
  await author.goto(`/proposals/${mine.id}/edit`);
  await desk.ready();
  await author.getByRole('button', { name: 'Choose in 2 places' }).click();
  const title = author.getByRole('group', { name: 'Title' });
  const time = author.getByRole('group', { name: 'Bench time' });
  await expect(title).toContainText(', by theirs');
  await expect(author.getByText('2 places still to choose.')).toBeVisible();

  // The keyboard alone: the button leads to the first place, arrows choose.
  await author.getByRole('button', { name: 'Go to the next place' }).press('Enter');
  await expect(title.getByRole('radio').first()).toBeFocused();
  await author.keyboard.press('ArrowDown');
  await expect(title.getByRole('radio', { name: `Revision ${letter}, as published` })).toBeChecked();
  await time.getByRole('radio', { name: 'Give values of my own' }).check();
  await time.getByLabel('Bench time').last().fill('123');
  await expect(author.getByText('Every place is chosen.')).toBeVisible();
  for (const width of [820, 390, 1360]) await expectNoSidewaysScroll(author, width);

  await author.reload();
  await expect(author.getByText('Every place is chosen.')).toBeVisible();
  expect((await readProposal(author, mine.id)).source, 'the draft is as it was until it is taken').toBe(mine.source);
  await author.getByRole('button', { name: 'Back to the draft' }).click();
  await expect(desk.reason).toHaveValue('Timed.');
  await author.getByRole('button', { name: 'Choose in 2 places' }).click();
  await author.getByRole('button', { name: `Go on from revision ${letter}` }).click();
  await expect(desk.reason).toBeVisible();
  await expect(author.getByText('was published meanwhile')).toBeHidden();
  const after = await readProposal(author, mine.id);
  expect(after).toMatchObject({ base: letter, stale: false, reason: 'Timed.' });
  expect(after.source).toMatch(/^title: .*, by theirs$/m);
  expect(after.source).toMatch(/^minutes: 123$/m);
  expect(after.source).toContain('Read it whole.');
});
