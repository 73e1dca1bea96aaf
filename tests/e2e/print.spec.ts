import { extractText, getDocumentProxy } from 'unpdf';
import { readSheet } from './support/api';
import { expect, test } from './support/book';

const flat = (text: string) => text.replaceAll(/\s+/g, ' ');

async function pagesOf(pdf: Buffer): Promise<string[]> {
  const { text } = await extractText(await getDocumentProxy(new Uint8Array(pdf)), { mergePages: false });
  return text.map(flat);
}

for (const format of ['A4', 'Letter'] as const)
  test(`on ${format}, every leaf says which sheet it is, and none of the screen's tools are printed`, async ({
    as,
  }) => {
    const page = await as('technician');
    const { revision } = await readSheet(page, 'P-0142');
    const check = `${revision.sheetCheck.slice(0, 4)} ${revision.sheetCheck.slice(4)}`;
    await page.goto('/procedures/P-0142');
    const pages = await pagesOf(await page.pdf({ format, preferCSSPageSize: false }));
    expect(pages.length).toBeGreaterThan(2);
    pages.forEach((text, i) => {
      expect(text, `leaf ${i + 1}`).toContain('P-0142');
      expect(text, `leaf ${i + 1}`).toContain('Reseal the valve cover');
      expect(text, `leaf ${i + 1}`).toContain(check);
      expect(text, `leaf ${i + 1}`).toContain(`Revision ${revision.letter}`);
      expect(text, `leaf ${i + 1}`).toContain(`Page ${i + 1} of ${pages.length}`);
      expect(text, `leaf ${i + 1}`).toContain('current service information');
    });
    const whole = pages.join(' ');
    expect(whole).toContain('10 ±1 N·m');
    expect(whole).toContain('CAUTION');
    for (const tool of ['Propose a change', 'Print the sheet', 'Review desk', 'Skip to the page', 'Sign out'])
      expect(whole).not.toContain(tool);
  });

test('a superseded sheet says so on every leaf', async ({ as }) => {
  const page = await as('technician');
  await page.goto('/procedures/P-0142/revisions/A');
  for (const text of await pagesOf(await page.pdf({ format: 'A4' }))) expect(text).toContain('A, superseded');
});

test('the print button prints, and paper shows the units of the screen', async ({ as }) => {
  const page = await as('sawmillApprentice');
  await page.addInitScript(() => {
    window.print = () => {
      document.title = 'printed';
    };
  });
  await page.goto('/procedures/P-0142');
  await page.getByRole('button', { name: 'Print the sheet' }).click();
  await expect(page).toHaveTitle('printed');
  const whole = (await pagesOf(await page.pdf({ format: 'Letter' }))).join(' ');
  expect(whole).toContain('89 ±9 lbf·in');
});
