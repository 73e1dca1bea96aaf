import { expect, test } from './support/book';

const METRIC = '10 ±1 N·m';
const INCH = '89 ±9 lbf·in';

test('units are switched in place and remembered on other pages, in other browsers, before signing in', async ({
  as,
}) => {
  const page = await as('northOwner');
  await page.goto('/procedures/P-0142');
  const value = page
    .getByRole('region', { name: /^Step 8:/ })
    .locator('.text-value')
    .first();
  await expect(value).toHaveText(new RegExp(METRIC));
  await expect(value.getByText('N·m')).toBeVisible();
  const saved = page.waitForResponse((answer) => answer.url().endsWith('/profile/units'));
  await page.getByRole('button', { name: 'Inch units' }).click();
  await expect(page.getByRole('button', { name: 'Inch units' })).toHaveAttribute('aria-pressed', 'true');
  await expect(value.locator('[data-units="inch"]')).toBeVisible();
  await expect(value.locator('[data-units="metric"]')).toBeHidden();
  await expect(value.locator('[data-units="inch"]')).toHaveText(INCH);
  await saved;

  await page.goto('/procedures/P-0137');
  await expect(page.locator('html')).toHaveAttribute('data-units', 'inch');
  await page.goto('/?q=P-0142');
  await expect(page.locator('html')).toHaveAttribute('data-units', 'inch');
  await page.goto('/profile');
  await expect(page.getByLabel('Units', { exact: true })).toHaveValue('inch');

  const elsewhere = await as('northOwner');
  await elsewhere.goto('/procedures/P-0142');
  await expect(elsewhere.locator('html')).toHaveAttribute('data-units', 'inch');
  await expect(elsewhere.getByRole('region', { name: /^Step 8:/ })).toContainText(INCH);

  await page.getByLabel(/Cyrus Pemberwick: profile/).click();
  await page.getByRole('button', { name: 'Sign out', exact: true }).click();
  await expect(page).toHaveURL(/\/sign-in/);
  await expect(page.locator('html')).toHaveAttribute('data-units', 'inch');
});

test('the menu and the profile switch them too', async ({ as }) => {
  const page = await as('sawmillEditor');
  await page.goto('/handbook');
  await page.getByLabel(/Piran Holm: profile/).click();
  await page.getByRole('button', { name: 'Show inch units' }).click();
  await expect(page).toHaveURL('/handbook');
  await expect(page.locator('html')).toHaveAttribute('data-units', 'inch');
  await page.goto('/profile');
  await page.getByLabel('Units', { exact: true }).selectOption('metric');
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await expect(page.getByText('Saved', { exact: true })).toBeVisible();
  await expect(page.locator('html')).toHaveAttribute('data-units', 'metric');
});
