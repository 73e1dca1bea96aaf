import { expectSound } from './support/axe';
import { call, propose, readProposal } from './support/api';
import { alive, expect, test } from './support/book';
import { WritingDesk } from './support/writing';

const change = (source: string) => source.replace(/nm: (\d+)/, (_, nm: string) => `nm: ${Number(nm) + 1}`);

test('a question and a suggested value, from asking to the published sheet', async ({ as }) => {
  test.setTimeout(150_000);
  const author = await as('senior', { allow: [/status of 409/] });
  const { id } = await propose(author, 'P-0192', change, 'Measured on four engines.');
  const editor = await as('editor', { allow: [/status of (409|422)/] });
  await editor.goto(`/proposals/${id}`);
  await alive(editor);
  const values = editor.getByRole('table', { name: 'What changes at the bench' });
  const row = values.getByRole('row').nth(1);

  await test.step('an editor asks at a step and suggests at the value, by keyboard', async () => {
    const ask = editor.locator('.pane-new .start-here a:visible').filter({ hasText: /^Ask/ }).first();
    await ask.focus();
    await editor.keyboard.press('Enter');
    const form = editor.getByRole('form', { name: /^Ask about step/ });
    const box = form.getByLabel('Your question');
    await expect(box).toBeFocused();
    await box.pressSequentially('On which gauge, @rowan');
    await expect(form.getByRole('option', { name: /Rowan Achterberg/ })).toBeVisible();
    await editor.keyboard.press('Enter');
    await expect(box).toHaveValue('On which gauge, @Rowan Achterberg ');
    await expectSound(editor);
    await form.getByRole('button', { name: 'Ask' }).click();
    const question = editor.getByRole('region', { name: 'Question, not answered yet' });
    await expect(question).toBeFocused();
    await expect(question.locator('.mention')).toHaveText('@Rowan Achterberg');

    await row.hover();
    await row.getByRole('link', { name: /^Suggest/ }).click();
    const suggest = editor.getByRole('form', { name: /^Suggest for/ });
    await suggest.getByLabel('Value instead').fill('a bit more');
    await suggest.getByRole('button', { name: 'Suggest' }).click();
    await expect(suggest.getByText('The suggested value must be a number, without its unit.')).toBeVisible();
    const proposed = Number(/[\d.]+/.exec(await row.locator('td').nth(1).innerText())?.[0]);
    await suggest.getByLabel('Value instead').fill(String(proposed - 0.5));
    await suggest.getByRole('button', { name: 'Suggest' }).click();
    await expect(editor.getByRole('region', { name: 'Suggestion' })).toBeVisible();
    await expectSound(editor);
  });

  await test.step('publishing is refused as long as the question is open', async () => {
    await expect(editor.getByText(/^1 open question/)).toBeVisible();
    await expect(editor.getByRole('button', { name: /^Publish, / })).toBeDisabled();
    const answer = await call(editor, 'POST', `/proposals/${id}/publish`);
    expect(answer.status()).toBe(409);
    expect(((await answer.json()) as { detail: string }).detail).toContain('A question on step');
    await editor.locator('.open-questions a').click();
    await expect(editor.getByRole('region', { name: 'Question, not answered yet' })).toBeInViewport();
    expect((await call(editor, 'POST', `/proposals/${id}/return`, { reason: 'See below' })).ok()).toBe(true);
  });

  await test.step('the author answers, and accepts with one press on the writing desk', async () => {
    await author.goto(`/proposals/${id}/edit`);
    const desk = new WritingDesk(author);
    await desk.ready();
    const ahead = author.getByRole('region', { name: 'Still open' });
    await expectSound(author);
    await ahead.getByRole('button', { name: /^on step/ }).click();
    const question = author.getByRole('region', { name: 'Question, not answered yet' });
    await question.locator('summary').click();
    await question.getByLabel('Your answer').fill('The new one, read twice.');
    await question.getByRole('button', { name: 'Answer' }).click();
    await expect(author.getByRole('region', { name: 'Question, answered but not resolved' })).toContainText(
      'read twice',
    );
    await ahead.getByRole('button', { name: /^on (?!step)/ }).click();
    const before = (await readProposal(author, id)).source;
    await author.getByRole('region', { name: 'Suggestion' }).getByRole('button', { name: 'Accept' }).click();
    await expect(author.getByRole('region', { name: 'Suggestion' })).toHaveCount(0);
    await desk.ready();
    expect((await readProposal(author, id)).source).not.toBe(before);
    await desk.propose();
  });

  await test.step('the editor resolves it, and it is published', async () => {
    const second = await as('editor2');
    expect((await call(second, 'POST', `/proposals/${id}/agree`)).ok()).toBe(true);
    await editor.goto(`/proposals/${id}`);
    await alive(editor);
    await editor.getByRole('button', { name: 'Resolve' }).click();
    await expect(editor.getByText(/^Question, resolved by Ines Okafor/)).toBeVisible();
    await expect(editor.getByText(/^Suggestion, accepted by Rowan Achterberg/)).toBeVisible();
    await expectSound(editor);
    await editor.getByRole('link', { name: 'Publish', exact: true }).click();
    await editor.getByRole('button', { name: /^Publish as/ }).click();
    await expect(editor.getByText(/^Published as/).first()).toBeVisible();
  });
});

test('without a script a question can be read, asked and answered', async ({ as }) => {
  const author = await as('senior', { javaScriptEnabled: false });
  const { id } = await propose(author, 'P-0192', change, 'Measured on six engines.');
  const editor = await as('editor', { javaScriptEnabled: false, allow: [/status of 422/] });
  await editor.goto(`/proposals/${id}?start=question&at=#start`);
  await editor.getByRole('button', { name: 'Ask' }).click();
  await expect(editor.getByText('Write your question.')).toBeVisible();
  await editor.getByLabel('Your question').fill('On which gauge?');
  await editor.getByRole('button', { name: 'Ask' }).click();
  await expect(editor).toHaveURL(/#thread-/);
  await author.goto(`/proposals/${id}`);
  const question = author.getByRole('region', { name: 'Question, not answered yet' });
  await expect(question).toContainText('On which gauge?');
  await question.locator('summary').click();
  await question.getByLabel('Your answer').fill('The new one.');
  await question.getByRole('button', { name: 'Answer' }).click();
  await expect(author.getByRole('region', { name: 'Question, answered but not resolved' })).toContainText(
    'The new one.',
  );
});
