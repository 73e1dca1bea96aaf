import { readProposal } from './support/api';
import { alive, expect, test } from './support/book';
import { WritingDesk } from './support/writing';

/** A word that no sheet, synonym or other test holds. */
const NEW_WORD = 'candlepaper';
const NEW_STEP = 'Draw a strip along the joint';
const REASON = 'Two covers wept half way along. Both had eleven bolts at ten and a gasket that stood on its lip.';
const FIELD = 'Find a job, part, engine or torque';

test('a better way gets from one bench to every bench', async ({ as }) => {
  test.setTimeout(180_000);
  const apprentice = await as('apprentice');

  await test.step('the apprentice looks the cover torque up and reads the sheet', async () => {
    await apprentice.goto('/');
    await alive(apprentice);
    await apprentice.getByLabel(FIELD).fill('89 lbf·in cover');
    const [first] = await Promise.all([
      apprentice.getByRole('list', { name: 'Sheets' }).getByRole('listitem').first(),
      expect(apprentice.getByRole('search').getByRole('status')).toContainText('10 N·m'),
    ]);
    await expect(first.getByRole('link')).toHaveText('Reseal the valve cover');
    await expect(first.locator('mark', { hasText: '10' }).first()).toBeVisible();
    await first.getByRole('link').click();
    await expect(apprentice).toHaveURL('/procedures/P-0142');
    await expect(apprentice.getByRole('heading', { level: 1 })).toHaveText('Reseal the valve cover');
    await expect(apprentice.getByLabel('Step 8: Pull the cover down in two passes')).toContainText('10 ±1 N·m');
    await expect(apprentice.getByText('CAUTION').first()).toBeVisible();
    await expect(apprentice.getByText('Hold point.').first()).toBeVisible();
    await expect(apprentice.locator('dl.grid', { hasText: 'Sheet check' })).toContainText(/Revision\s*C\s*current/);
  });

  const senior = await as('senior');
  const desk = new WritingDesk(senior);

  await test.step('the senior technician proposes another torque and a new step, with a reason', async () => {
    await senior.goto('/procedures/P-0142');
    await senior.getByRole('button', { name: 'Change step 8' }).click();
    await desk.ready();
    await expect(desk.stepTitle(8)).toHaveValue('Pull the cover down in two passes');

    const torques = desk.middle.getByRole('table', { name: 'Torques of this step' });
    await torques.getByLabel('N·m, row 1', { exact: true }).fill('11');
    await expect(senior.getByRole('region', { name: 'Checks' })).toContainText('Two editors, because');

    await desk.middle.getByRole('button', { name: 'Add a step after this one' }).click();
    await desk.stepTitle(9).fill(NEW_STEP);
    await desk.write(`Draw a strip of ${NEW_WORD} along both long sides. Where it catches, the lip is folded.`);

    await senior.getByRole('button', { name: 'Propose', exact: true }).click();
    await expect(desk.middle.getByText('Write why it is better: the editor decides by it.')).toBeVisible();
    await desk.reason.fill(REASON);
    await desk.kept();
    await desk.propose();
    await expect(senior.getByText('0 of 2 agreed')).toBeVisible();
    await expect(senior.getByRole('button', { name: 'Agree' })).toHaveCount(0);
  });
  const { id } = desk;

  const editor = await as('editor', { allow: [/status of 422/] });
  await test.step('an editor finds it on the desk and returns it, with a reason at a step', async () => {
    await editor.goto('/review-desk');
    await editor.locator(`a[href^="/proposals/${id}"]`).first().click();
    await alive(editor);
    await expect(editor.getByText(REASON)).toBeVisible();
    const values = editor.getByRole('table', { name: 'What changes at the bench' });
    await expect(values.getByRole('row', { name: /Cover bolt/ }).first()).toContainText(/10.*11/);
    await expect(editor.locator('.pane-new').getByText(NEW_WORD)).toBeVisible();
    await expect(editor.locator('.pane-old')).not.toContainText(NEW_WORD);

    const step = editor.locator('[id="ask-step:draw-down"]');
    await step.click();
    const form = editor.getByRole('form', { name: 'Return with reasons' });
    await form.getByRole('button', { name: 'Return' }).click();
    await expect(form.getByText('Write why, so that the author can act on it')).toBeVisible();
    await form.getByLabel('What must change, and why').fill('Say what the strip must do before the torque goes up.');
    await expect(form.getByLabel('Where')).toHaveValue('step:draw-down');
    await form.getByRole('button', { name: 'Return' }).click();
    await expect(editor.getByText('Returned to Rowan Achterberg.')).toBeVisible();
  });

  await test.step('the author reads the reason where it belongs, improves the text and proposes again', async () => {
    await senior.goto('/proposals');
    const row = senior.getByRole('row', { name: /Reseal the valve cover/ }).filter({ hasText: 'Returned to you' });
    await row.getByRole('link').first().click();
    await desk.ready();
    const why = senior.getByRole('region', { name: 'Why it was returned' });
    await expect(why).toContainText('Say what the strip must do before the torque goes up.');
    await why.getByRole('button', { name: /^Step 8/ }).click();
    await expect(desk.stepTitle(8)).toHaveValue('Pull the cover down in two passes');
    await desk.choose(NEW_STEP);
    await desk.write(
      `Draw a strip of ${NEW_WORD} along both long sides. It must slide freely from end to end before the last pass.`,
    );
    await desk.propose();
    expect(await readProposal(senior, id)).toMatchObject({ state: 'proposed', agreements: 0, agreementsNeeded: 2 });
  });

  await test.step('one editor agrees and is told that it takes another', async () => {
    await editor.goto(`/proposals/${id}`);
    await alive(editor);
    await expect(editor.locator('.pane-new')).toContainText('slide freely');
    await editor.getByRole('button', { name: 'Agree', exact: true }).click();
    await expect(editor.getByText('Agreed, 1 of 2.')).toBeVisible();
    await expect(editor.getByText(/One more editor must agree/)).toBeVisible();
    await expect(editor.getByRole('button', { name: 'Publish, 1 of 2 agreed' })).toBeDisabled();
  });

  await test.step('the second editor agrees by publishing', async () => {
    const second = await as('editor2');
    await second.goto(`/proposals/${id}`);
    await alive(second);
    await second.getByRole('link', { name: 'Publish', exact: true }).click();
    await second.getByRole('button', { name: 'Publish as D' }).click();
    await expect(second.getByText('Published as D.')).toBeVisible();
    await second.getByRole('link', { name: 'Open sheet P-0142 D' }).click();
    await expect(second.getByLabel(/^Step 8:/)).toContainText('11 ±1 N·m');
  });

  await test.step('the apprentice works from the new sheet at once', async () => {
    await apprentice.reload();
    await expect(apprentice.locator('dl.grid', { hasText: 'Sheet check' })).toContainText(/Revision\s*D\s*current/);
    await expect(apprentice.locator('dl.grid', { hasText: 'Sheet check' })).toContainText('Rowan Achterberg');
    await expect(apprentice.locator('dl.grid', { hasText: 'Sheet check' })).toContainText(
      /Ines Okafor.*Tobias Marchetti|Tobias Marchetti.*Ines Okafor/,
    );
    await expect(apprentice.getByLabel(`Step 9: ${NEW_STEP}`)).toContainText(NEW_WORD);
    await expect(apprentice.getByLabel(/^Step 8:/)).toContainText('11 ±1 N·m');
  });

  await test.step('search finds the new word, and the new torque', async () => {
    await apprentice.goto('/');
    await alive(apprentice);
    for (const query of [NEW_WORD, 'valve cover 11 N·m']) {
      await apprentice.getByLabel(FIELD).fill(query);
      const hit = apprentice.getByRole('list', { name: 'Sheets' }).getByRole('listitem').first();
      await expect(hit.getByRole('link')).toHaveText('Reseal the valve cover');
      await expect(hit).toContainText('D');
    }
  });

  await test.step('history keeps every text, and two of them are compared', async () => {
    await apprentice.goto('/procedures/P-0142');
    await apprentice.getByRole('link', { name: /earlier revisions/ }).click();
    const events = apprentice.getByRole('list', { name: /^What happened to P-0142/ }).locator('> li');
    await expect(events).toHaveCount(4);
    await expect(events.first()).toContainText(REASON);
    await apprentice.getByRole('button', { name: 'Compare these two' }).click();
    await expect(apprentice).toHaveURL(/compare\?(?=.*from=C)(?=.*to=D)/);
    await expect(apprentice.locator('.pane-new')).toContainText(NEW_WORD);
    await expect(apprentice.locator('.pane-old')).not.toContainText(NEW_WORD);
    await expect(apprentice.getByRole('row', { name: /Cover bolt/ }).first()).toContainText(/10.*11/);
  });

  await test.step('the old sheet says that it is superseded and leads to the current one', async () => {
    await apprentice.goto('/procedures/P-0142/revisions/C');
    await expect(apprentice.getByRole('note').first()).toContainText('Revision C is superseded.');
    await expect(apprentice.getByText(NEW_WORD)).toHaveCount(0);
    await expect(apprentice.getByLabel(/^Step 8:/)).toContainText('10 ±1 N·m');
    await apprentice.getByRole('link', { name: 'Go to revision D' }).click();
    await expect(apprentice).toHaveURL('/procedures/P-0142');
  });
});
