import { expectNoFaults } from './support/axe';
import { expect, expectNoSidewaysScroll, test } from './support/book';

test('an apprentice flags a step; a senior technician answers; the apprentice is told once', async ({ as }) => {
  const apprentice = await as('sawmillApprentice', { javaScriptEnabled: false });
  await apprentice.goto('/procedures/P-0181');
  await apprentice.getByRole('link', { name: 'Flag step 2' }).click();
  await expect(apprentice.getByLabel('Where')).toHaveValue(/.+/);
  await apprentice.getByLabel('What', { exact: true }).selectOption('Something is unclear');
  await apprentice.getByLabel('In your words').fill('Which way round does the key go?');
  await apprentice.getByRole('button', { name: 'Raise the flag' }).click();
  await expect(apprentice.getByText('Flag raised. You are told when it is answered.')).toBeVisible();
  await expect(apprentice.getByText('Waits for an answer.')).toBeVisible();

  const senior = await as('sawmillEditor', { allow: [/status of 422/] });
  await senior.goto('/flags');
  const flag = senior.getByRole('listitem').filter({ hasText: 'Which way round does the key go?' });
  await flag.getByRole('button', { name: 'Send the answer' }).click();
  await expect(flag.getByText('Write the answer for whoever asked.')).toBeVisible();
  await expectNoFaults(senior);
  await expectNoSidewaysScroll(senior, 320);
  await flag.getByRole('textbox', { name: 'Answer' }).fill('Flat side to the shaft.');
  await flag.getByRole('button', { name: 'Send the answer' }).click();
  await expect(senior.getByText('Answered. Whoever raised it is told.')).toBeVisible();

  await apprentice.goto('/');
  await apprentice.getByRole('link', { name: 'Read it' }).click();
  await expect(apprentice.getByText('Flat side to the shaft.')).toBeVisible();
  await expect(apprentice.getByText(/^New\. /)).toBeVisible();
  await apprentice.goto('/');
  await expect(apprentice.getByRole('link', { name: 'Read it' })).toHaveCount(0);
});

test('a flag becomes a draft of a change, its words the reason', async ({ as }) => {
  const technician = await as('technician');
  await technician.goto('/procedures/P-0131/flag');
  await technician.getByLabel('In your words').fill('The seal driver is not in the list of tools.');
  await technician.getByRole('button', { name: 'Raise the flag' }).click();
  const senior = await as('northSenior');
  await senior.goto('/flags');
  await senior
    .getByRole('listitem')
    .filter({ hasText: 'The seal driver is not in the list' })
    .getByRole('button', { name: 'Change the sheet' })
    .click();
  await expect(senior).toHaveURL(/\/proposals\/.+\/edit/);
  await technician.goto('/flags');
  await expect(technician.getByText(/took it up on .* and is changing the sheet/)).toBeVisible();
});

test('the form to raise a flag is for everybody, at any width', async ({ as }) => {
  const page = await as('apprentice');
  await page.goto('/procedures/P-0142/flag?step=nothing-here');
  for (const width of [390, 320]) await expectNoSidewaysScroll(page, width);
  await expectNoFaults(page);
});
