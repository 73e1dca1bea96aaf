import type { Page } from '@playwright/test';
import * as d from '../factories/documents';
import { expectNoFaults } from './support/axe';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

const HOW_TO =
  '# Renew the pump drive\n\nWhen it squeals.\n\n## Open it\n\nWarning: Hot oil can burn skin. Let it cool.\n\nTake the lid off, ~~slowly~~.\n\n## Close it\n\nTighten to 10 N·m.\n\n![A lid](lid.png)\n';

/** Nothing that axe finds wrong, and nothing that sticks out at 390 px. */
async function sound(page: Page): Promise<void> {
  await expectNoFaults(page);
  const { width = 1360, height = 900 } = page.viewportSize() ?? {};
  await expectNoSidewaysScroll(page, 390);
  await page.setViewportSize({ width, height });
}

async function press(page: Page, name: string): Promise<number> {
  const answer = page.waitForResponse(
    (one) => one.request().method() === 'POST' && /\/procedures\/new/.test(one.url()),
  );
  await page.getByRole('button', { name, exact: true }).click();
  return (await answer).status();
}

test('a template gives the bones, and is not proposed before it is filled in', async ({ as }) => {
  const page = await as('technician');
  await page.goto('/procedures/new');
  await alive(page);
  await expect(page.getByRole('radio', { name: /Seal a cover/ })).toBeHidden();
  await page.getByRole('radio', { name: /^From a template/ }).check();
  await page.getByRole('radio', { name: /Seal a cover/ }).check();
  await page.getByLabel('Which task?').fill('Seal the timing cover');
  await sound(page);
  // Enter in the field starts it, as a form does.
  await page.getByLabel('Which task?').press('Enter');
  const desk = new WritingDesk(page);
  await desk.ready();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Seal the timing cover, a new procedure');
  await expect(page.getByRole('region', { name: 'Checks' })).toContainText(/\d+ to fill in before it can be proposed/);
  await desk.reason.fill('Three shops asked for it.');
  await page.getByRole('button', { name: 'Propose', exact: true }).click();
  await expect(page.getByRole('alert')).toContainText('Something is to fill in before it can be proposed.');
  await expect(page).toHaveURL(/\/edit/);
  await page.getByRole('checkbox', { name: 'Tarn T18F' }).check();
  await expect(page.getByRole('region', { name: 'Checks' })).not.toContainText('which engines');
});

test('a copy is found while it is looked for, and says that nobody has checked its numbers', async ({ as }) => {
  const page = await as('northSenior', { allow: [/status of 422/] });
  await page.goto('/procedures/new');
  await alive(page);
  await page.getByRole('radio', { name: /^From a sheet that is there/ }).check();
  await page.getByRole('radio', { name: /for this shop only/ }).check();
  await page.getByLabel('Which sheet?').fill('rocker cover');
  await page.getByRole('radio', { name: /P-0142/ }).check();
  await page.getByLabel('Which sheet?').fill('thermostat');
  // What was chosen stays, whatever is looked for next.
  await expect(page.getByRole('radio', { name: /P-0137/ })).toBeVisible();
  await expect(page.getByRole('radio', { name: /P-0142/ })).toBeChecked();
  expect(await press(page, 'Start writing')).toBe(422);
  await expect(page.getByText('Write which task it is.')).toBeVisible();
  await expect(page.getByRole('radio', { name: /P-0142/ })).toBeChecked();
  await expect(page.getByRole('radio', { name: /for this shop only/ })).toBeChecked();
  await sound(page);
  await page.getByLabel('Which task?').fill('Reseal the pump lid');
  await page.getByRole('button', { name: 'Start writing' }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  await expect(page.getByText(/^Copied from P-0142 revision [A-Z]$/)).toBeVisible();
  await expect(desk.reason).toHaveValue(/^Copied from P-0142 revision [A-Z]\.$/);
  // Its engines came along; nothing is left to fill in, so it goes to review and says there what it is.
  await desk.kept();
  await desk.propose();
  await expect(page.getByText(/nobody has checked them for this job/)).toBeVisible();
  await sound(page);
});

test('a document is read, shown, and only then started', async ({ as }) => {
  const page = await as('northSenior');
  const file = await d.docx(
    [
      d.heading(1, 'Fit the drum'),
      d.para('DANGER: The drum can fall. Hang it up.'),
      d.point([...d.comment(0, 'Lift it in')]),
      d.point('Tighten to 12 ft-lb'),
      d.para([d.deleted('old words'), d.run('new words')]),
    ],
    { comments: ['Which hook?'] },
  );
  await page.goto('/procedures/new?from=import');
  await alive(page);
  await page
    .getByLabel('A document', { exact: true })
    .setInputFiles({ name: 'drum.docx', mimeType: 'application/octet-stream', buffer: file });
  expect(await press(page, 'Read it')).toBe(200);
  await expect(page.getByRole('heading', { name: '2 steps' })).toBeVisible();
  await expect(page.getByRole('table', { name: 'Cautions found' })).toContainText('The drum');
  await expect(page.getByRole('table', { name: 'Numbers to make into values' })).toContainText('12 ft-lb');
  const left = page.getByRole('table', { name: 'What is not as it was in the document' });
  await expect(left).toContainText('Which hook?');
  await expect(left).toContainText('old words');
  await sound(page);
  await page.getByRole('button', { name: 'Start the draft' }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  await expect(page.getByText('Imported from “drum.docx”', { exact: true })).toBeVisible();
  await page.getByText(/passages not as in the document/).click();
  await expect(page.getByRole('table', { name: 'What is not as it was in the document' })).toContainText('old words');
  await sound(page);
});

test('what is no document is refused beside its field', async ({ as }) => {
  const page = await as('technician', { allow: [/status of 4(13|22)/] });
  await page.goto('/procedures/new?from=import');
  await alive(page);
  const choose = (buffer: Buffer) =>
    page
      .getByLabel('A document', { exact: true })
      .setInputFiles({ name: 'drum.docx', mimeType: 'application/octet-stream', buffer });
  await choose(Buffer.from('MZ\x90\0\x03\0\0\0', 'latin1'));
  expect(await press(page, 'Read it')).toBe(422);
  await expect(page.getByText(/whatever its name says/)).toBeVisible();
  await choose(Buffer.alloc(7 * 1024 * 1024, 0x41));
  expect(await press(page, 'Read it')).toBe(413);
  await expect(page.getByText('A file may have 5 MB at most. Send a smaller one.')).toBeVisible();
  await sound(page);
});

test.describe('without JavaScript', () => {
  test('a template, a copy and a text are started by forms alone', async ({ as }) => {
    const page = await as('northSenior', {
      javaScriptEnabled: false,
      viewport: { width: 390, height: 800 },
      allow: [/status of 422/],
    });
    await page.goto('/procedures/new');
    await page.getByRole('radio', { name: /^From a template/ }).check();
    await page.getByRole('radio', { name: /marine drive/ }).check();
    await page.getByLabel('Which task?').fill('Align the shaft');
    expect(await press(page, 'Start writing')).toBe(303);
    await expect(page.getByRole('textbox', { name: 'The whole text' })).toHaveValue(/title: Align the shaft/);
    await page.getByRole('textbox', { name: 'Why this is better, for the editor' }).fill('Asked for.');
    await page.getByRole('button', { name: 'Propose' }).click();
    await expect(page.locator('noscript li', { hasText: /^Line \d+: Still to fill in/ }).first()).toBeVisible();

    await page.goto('/procedures/new?from=copy');
    await page.getByLabel('Which sheet?').fill('rocker cover');
    expect(await press(page, 'Look up')).toBe(200);
    await page.getByRole('radio', { name: /P-0142/ }).check();
    await page.getByLabel('Which task?').fill('Reseal the lid');
    expect(await press(page, 'Start writing')).toBe(303);
    await expect(page.locator('noscript p', { hasText: /^Copied from P-0142 revision [A-Z]$/ })).toBeVisible();

    await page.goto('/procedures/new?from=import');
    await page.getByLabel('Or paste a text').fill(HOW_TO);
    expect(await press(page, 'Read it')).toBe(200);
    await expect(page.getByText('slowly', { exact: true })).toBeVisible();
    expect(await press(page, 'Start the draft')).toBe(303);
    await expect(page.getByRole('textbox', { name: 'The whole text' })).toHaveValue(
      /<Step id="open-it" title="Open it">\n<Caution of="hot-oil" \/>/,
    );
    await expect(page.locator('noscript p', { hasText: 'Imported from a text that was pasted' })).toBeVisible();
  });
});

test('an apprentice is refused the page', async ({ as }) => {
  const page = await as('apprentice', { allow: [/status of 403/] });
  await page.goto('/procedures/new?from=import');
  await expect(page.getByRole('radio')).toHaveCount(0);
  await expect(page.getByText('A technician, senior technician, editor or owner writes procedures.')).toBeVisible();
});
