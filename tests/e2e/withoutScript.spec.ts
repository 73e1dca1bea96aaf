import { alive, expect, test } from './support/book';

test.describe('without JavaScript', () => {
  test('one press signs in; a form looks up with the same order as the script', async ({ as }) => {
    const plain = await as(null, { javaScriptEnabled: false });
    await plain.goto('/sign-in');
    await plain.getByRole('button', { name: /Lotte Vance/ }).click();
    await expect(plain).toHaveURL('/');
    await plain.getByRole('searchbox').fill('oil leak cover');
    await plain.getByRole('button', { name: 'Look up' }).click();
    await expect(plain).toHaveURL(/\?.*q=oil\+leak\+cover/);
    const order = await plain.getByRole('list', { name: 'Sheets' }).getByRole('link').allInnerTexts();
    expect(order.length).toBeGreaterThan(1);

    const scripted = await as('sawmillApprentice');
    await scripted.goto('/');
    await alive(scripted);
    await scripted.getByRole('searchbox').fill('oil leak cover');
    await expect(scripted.getByRole('search')).toHaveAttribute('data-shown', 'oil leak cover');
    // What is found in prose alone comes from the server and follows a moment later.
    await expect(scripted.getByRole('list', { name: 'Sheets' }).getByRole('link')).toHaveText(order);
  });

  test('a sheet is whole, its links lead on, its units switch', async ({ as }) => {
    const page = await as('technician', { javaScriptEnabled: false });
    await page.goto('/?q=89+lbf%C2%B7in+cover');
    await page.getByRole('list', { name: 'Sheets' }).getByRole('link').first().click();
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Reseal the valve cover');
    for (const step of ['Step 1: Let it cool, disconnect', 'Step 8: Pull the cover down in two passes'])
      await expect(page.getByRole('region', { name: step })).toBeVisible();
    await expect(page.getByText('CAUTION').first()).toBeVisible();
    // A button that could do nothing is not offered.
    await expect(page.getByRole('button', { name: 'Print the sheet' })).toBeHidden();

    const step = page.getByRole('region', { name: /^Step 8:/ });
    const metric = step.locator('.text-value [data-units="metric"]').first();
    await expect(metric).toHaveText('10 ±1 N·m');
    await expect(metric).toBeVisible();
    await page.getByRole('button', { name: 'Inch units' }).click();
    await expect(page).toHaveURL('/procedures/P-0142');
    await expect(step.locator('.text-value [data-units="inch"]').first()).toHaveText('89 ±9 lbf·in');
    await expect(metric).toBeHidden();
    await page.getByRole('button', { name: 'Metric units' }).click();
    await expect(metric).toBeVisible();
  });

  test('history, an old sheet, two compared, the handbook', async ({ as }) => {
    const page = await as('technician', { javaScriptEnabled: false });
    await page.goto('/procedures/P-0137');
    await page.getByRole('link', { name: /earlier revision/ }).click();
    await expect(page.getByRole('list', { name: /^What happened to P-0137/ }).locator('> li')).toHaveCount(2);
    await page.getByRole('button', { name: 'Compare these two' }).click();
    await expect(page).toHaveURL(/\/procedures\/P-0137\/compare\?(?=.*from=A)(?=.*to=B)/);
    await expect(page.locator('ins').first()).toContainText('a thread');
    await page.goto('/procedures/P-0137/revisions/A');
    await expect(page.getByText('Do not work from this sheet')).toBeVisible();

    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Handbook' }).click();
    const first = page.locator('main').getByRole('listitem').getByRole('link').first();
    await first.click();
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await expect(page.getByRole('heading', { name: 'Where this comes from' })).toBeVisible();
  });

  test('a draft is written as text, kept, refused with its line, and proposed', async ({ as }) => {
    const page = await as('technician', { javaScriptEnabled: false, allow: [/status of 4(09|22)/] });
    /** Status of the page that a button leads to. */
    const press = async (name: string, on = page) => {
      const answer = on.waitForResponse((one) => one.request().method() === 'POST');
      await on.getByRole('button', { name }).click();
      return (await answer).status();
    };
    await page.goto('/procedures/P-0131');
    await page.getByRole('button', { name: 'Propose a change' }).click();
    const text = page.getByRole('textbox', { name: 'The whole text' });
    const reason = page.getByRole('textbox', { name: 'Why this is better, for the editor' });
    const source = await text.inputValue();
    await text.fill(source.replace(/^minutes: .*$/m, 'minutes: soon'));
    await reason.fill('Timed on three engines.');
    expect(await press('Propose')).toBe(422);
    // Searches by text pass over what stands in <noscript>.
    await expect(page.locator('noscript p', { hasText: 'Not accepted' })).toBeVisible();
    await expect(page.locator('noscript li', { hasText: /^Line \d+:/ })).toBeVisible();
    await expect(text).toHaveValue(/minutes: soon/);
    await text.fill(source.replace(/^minutes: .*$/m, 'minutes: 185'));
    await page.getByRole('button', { name: 'Keep the draft' }).click();
    await expect(page.locator('noscript p', { hasText: 'Draft kept.' })).toBeVisible();
    const behind = await page.context().newPage();
    await behind.goto(page.url().replace('?kept', ''));
    await page.getByRole('button', { name: 'Propose' }).click();
    await expect(page).toHaveURL(/\?done=proposed$/);
    await expect(page.getByText('0 of 1 agreed')).toBeVisible();

    // In the tab that was left open behind nothing is stored, and what was typed there stands.
    const late = behind.getByRole('textbox', { name: 'Why this is better, for the editor' });
    await late.fill('Timed on four engines.');
    expect(await press('Keep the draft', behind)).toBe(409);
    await expect(behind.locator('noscript p', { hasText: 'Not accepted' })).toBeVisible();
    await expect(late).toHaveValue('Timed on four engines.');
  });

  test('a new procedure without a title is refused with its status, the form still there', async ({ as }) => {
    const page = await as('technician', { javaScriptEnabled: false, allow: [/status of 422/] });
    await page.goto('/procedures/new');
    // Blanks pass the browser's own check, not ours.
    await page.getByLabel('Which task?').fill('   ');
    const answer = page.waitForResponse((one) => one.request().method() === 'POST');
    await page.getByRole('button', { name: 'Start writing' }).click();
    expect((await answer).status()).toBe(422);
    await expect(page.getByText('Write which task it is.')).toBeVisible();
  });
});
