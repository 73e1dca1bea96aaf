import { expectSound } from './support/axe';
import { call, propose } from './support/api';
import { alive, expect, test } from './support/book';

const NUMBER = 'P-0163';

/** The change of this test: one torque of the starter sheet, far past proof load. */
const strain = (nm: number) => (source: string) => source.replace(/^ {4}nm: .*$/m, `    nm: ${nm}`);

test('a torque past proof load is refused, overridden with a reason, published, and seen in the history', async ({
  as,
}) => {
  const author = await as('senior');
  const { id, failing } = await propose(author, NUMBER, strain(400), 'The bolts come loose at half of that.');
  expect(failing).toHaveLength(1);
  const { name } = failing[0]!;
  const second = await as('editor2');
  expect((await call(second, 'POST', `/proposals/${id}/agree`)).status()).toBe(200);

  const page = await as('editor', { allow: [/status of 422/] });
  const refused = await call(page, 'POST', `/proposals/${id}/publish`);
  expect(refused.status()).toBe(409);
  expect(((await refused.json()) as { detail: string }).detail).toContain(`this clamps ${name} to `);

  await page.goto(`/proposals/${id}`);
  await alive(page);
  await expect(page.getByRole('button', { name: 'Publish', exact: true })).toBeDisabled();
  await expect(page.getByText('The clamp check fails', { exact: true })).toBeVisible();
  await page.getByRole('link', { name: 'Judge it' }).click();
  const row = page.locator('.clamp-row');
  await row.getByText('Override the clamp check').click();
  const reason = row.getByRole('textbox', { name: 'Why this torque is right all the same' });
  await expectSound(page);

  // Without a reason nothing is sent, and what was typed outlives the page.
  await row.getByRole('button', { name: 'Override with this reason' }).click();
  await expect(reason).toHaveAttribute('aria-invalid', 'true');
  await reason.fill('Stretch measured on three bolts.');
  await page.reload();
  await alive(page);
  await expect(reason).toHaveValue('Stretch measured on three bolts.');
  await row.getByRole('button', { name: 'Override with this reason' }).click();
  await expect(page.getByText('Clamp check overridden.')).toBeVisible();
  await expect(reason).toBeHidden();
  await expect(row).toContainText(/overrode this on .*: Stretch measured on three bolts\./);

  await page.getByRole('link', { name: 'Publish', exact: true }).click();
  await page.getByRole('button', { name: /^Publish as / }).click();
  await expect(page.getByText(/^Published as /).first()).toBeVisible();

  // For every reader, an apprentice of another shop too.
  const reader = await as('sawmillApprentice');
  await reader.goto(`/procedures/${NUMBER}/revisions`);
  await expect(
    reader
      .getByRole('list', { name: /^What happened to/ })
      .getByRole('listitem')
      .filter({ hasText: 'current' }),
  ).toContainText(/of proof load\. .* overrode the clamp check on .*: Stretch measured on three bolts\./);
  await expectSound(reader);
});

test('without JavaScript the reason is a form of the page, and what was typed comes back', async ({ as }) => {
  const author = await as('senior');
  const { id } = await propose(author, NUMBER, strain(410), 'One more turn of the screw.');
  const page = await as('editor', { javaScriptEnabled: false, allow: [/status of 422/] });
  await page.goto(`/proposals/${id}`);
  const row = page.locator('.clamp-row');
  await row.getByText('Override the clamp check').click();
  const reason = row.getByRole('textbox', { name: 'Why this torque is right all the same' });
  await row.getByRole('button', { name: 'Override with this reason' }).click();
  await expect(reason).toBeVisible();
  await expect(row).toContainText('Write why this torque is right all the same');
  await reason.fill('Tried on the bench.');
  await row.getByRole('button', { name: 'Override with this reason' }).click();
  await expect(page).toHaveURL(/\?done=override$/);
  await expect(row).toContainText('Tried on the bench.');
  // Left behind for no other test.
  const declined = await call(page, 'POST', `/proposals/${id}/decline`, { reason: 'It was a test.' });
  expect(declined.status()).toBe(200);
});
