import { alive, expect, test } from './support/book';

const RULES = '/shop/rules';

test('an owner sets a rule of thumb, and the calculators of that shop go by it', async ({ as }) => {
  const owner = await as('sawmillOwner');
  await owner.goto('/');
  await owner.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Shop' }).click();
  await expect(owner.getByRole('heading', { level: 1, name: 'Rules of thumb' })).toBeVisible();
  await expect(owner.getByText('stands behind these numbers')).toBeVisible();
  const box = owner.getByRole('textbox', { name: /Low below this share of proof/ });
  await expect(box).toHaveValue('');
  await box.fill('40');
  await owner.getByRole('button', { name: 'Save' }).click();
  await expect(owner.getByRole('status').filter({ hasText: 'Saved. One rule changed.' })).toBeVisible();
  await expect(box).toHaveValue('40');
  await expect(owner.getByText(/40 % set by Saoirse Wendt/)).toBeVisible();

  const apprentice = await as('sawmillApprentice');
  await apprentice.goto('/handbook/calculators/clamp');
  await expect(apprentice.getByText(/Left empty: 40 %, set by your shop/)).toBeVisible();
  await expect(apprentice.getByRole('link', { name: /for your shop/ })).toHaveCount(0);
  const elsewhere = await as('apprentice');
  await elsewhere.goto('/handbook/calculators/clamp');
  await expect(elsewhere.getByText(/Left empty: 30 %, usual in the trade/)).toBeVisible();

  // From the calculator back to the rule, and to what is usual.
  await owner.goto('/handbook/calculators/clamp');
  await alive(owner);
  await owner.getByRole('link', { name: 'Change it for your shop' }).click();
  await expect(owner).toHaveURL(/\/shop\/rules#clamp\./);
  await box.fill('');
  await owner.getByRole('button', { name: 'Save' }).click();
  await expect(owner.getByText('Saved. One rule changed.')).toBeVisible();
  await apprentice.reload();
  await expect(apprentice.getByText(/Left empty: 30 %, usual in the trade/)).toBeVisible();
});

test('without JavaScript the form saves, refuses beside the box and keeps what was typed', async ({ as }) => {
  const page = await as('pierOwner', { javaScriptEnabled: false, allow: [/status of 422/] });
  await page.goto(RULES);
  const box = page.getByRole('textbox', { name: /Low below this share of proof/ });
  await box.fill('a third');
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(box).toHaveValue('a third');
  await expect(box).toHaveAccessibleDescription(/"a third" is no number/);
  await expect(page.getByText('Some values cannot be used. Nothing was saved.')).toBeVisible();
  await box.fill('33 %');
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByText('Saved. One rule changed.')).toBeVisible();
  await expect(box).toHaveValue('33');
});

test('two who set one rule at once: the second is told and chooses', async ({ as }) => {
  const owner = await as('northOwner', { allow: [/status of 409/] });
  await owner.goto(RULES);
  const steward = await as('steward');
  await steward.goto(RULES);
  await steward.getByRole('link', { name: 'Northgate Engine Works' }).click();
  const boxOf = (page: typeof owner) => page.getByRole('textbox', { name: /Low below this share of proof/ });
  await boxOf(steward).fill('35');
  await steward.getByRole('button', { name: 'Save' }).click();
  await expect(steward.getByText('Saved. One rule changed.')).toBeVisible();
  await boxOf(owner).fill('45');
  await owner.getByRole('button', { name: 'Save' }).click();
  await expect(owner.getByText('Evelyn Strand has set 35 % in the meantime. Save again to have yours.')).toBeVisible();
  await expect(boxOf(owner)).toHaveValue('45');
  await owner.getByRole('button', { name: 'Save' }).click();
  await expect(owner.getByText('Saved. One rule changed.')).toBeVisible();
  await expect(boxOf(owner)).toHaveValue('45');
});

test('a worksheet that is opened on a sheet goes by the shop too, and says so where it cannot', async ({ as }) => {
  const owner = await as('sawmillOwner');
  await owner.goto(RULES);
  await owner.getByRole('textbox', { name: /Spread of the set allowed by rule/ }).fill('4 %');
  await owner.getByRole('button', { name: 'Save' }).click();
  await expect(owner.getByText('Saved. One rule changed.')).toBeVisible();

  const page = await as('sawmillApprentice', { allow: [/Failed to load resource/, /shop\/rules/] });
  const inset = page.getByRole('region', { name: 'Injector set' });
  const open = async () => {
    await page.goto('/procedures/P-0104');
    await page.getByRole('button', { name: 'Work it out here' }).click();
    await expect(inset).toBeVisible();
  };
  await open();
  await expect(inset.getByText(/Left empty: 4 %, set by your shop/)).toBeVisible();
  await page.route('**/api/v1/shop/rules', (route) => route.abort());
  await open();
  await expect(inset.getByText(/could not be fetched. The usual values stand/)).toBeVisible();
  await expect(inset.getByText(/Left empty: 3 %, usual in the trade/)).toBeVisible();
});
