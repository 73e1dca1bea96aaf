import type { Page } from '@playwright/test';
import { GOOGLE_DOC, WORD_LISTS } from '../fixtures/clipboard';
import { expectNoFaults } from './support/axe';
import { call, draft, readProposal } from './support/api';
import { expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

const STEP = 'Pull the cover down in two passes';
const NUMBER = 'P-0142';

/** A draft of somebody's own with `body` as the words of the step, saved as it is, open at that step. */
async function deskWith(page: Page, body: string): Promise<WritingDesk> {
  const made = await draft(page, NUMBER, (source) => source.replace('straight on.', 'straight on, slowly.'), 'Try it.');
  const source = made.source.replace(
    new RegExp(`(<Step id="draw-down"[^>]*>\n)[^]*?(\n</Step>)`),
    (_, open: string, close: string) => `${open}${body}${close}`,
  );
  const put = await call(page, 'PUT', `/proposals/${made.id}`, { source }, { 'if-match': `"${made.version}"` });
  expect(put.ok(), await put.text()).toBe(true);
  const desk = new WritingDesk(page);
  await page.goto(`/proposals/${made.id}/edit`);
  await desk.ready();
  await desk.choose(STEP);
  await expect(desk.how).toBeVisible();
  return desk;
}

/** The words of the step as they are stored, once the desk has kept them. */
async function stored(desk: WritingDesk): Promise<string> {
  await desk.kept();
  const { source } = await readProposal(desk.page, desk.id);
  return /<Step id="draw-down"[^>]*>\n([^]*?)\n?<\/Step>/.exec(source)?.[1] ?? '';
}
const expectStored = (desk: WritingDesk, body: string) => expect.poll(() => stored(desk)).toBe(body);

test('a torque is put in among typed words, follows its value, is deleted and brought back', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, 'Old words.');
  await desk.write('Tighten to');
  await desk.middle.getByRole('button', { name: 'Torque', exact: true }).click();
  await desk.middle.getByRole('button', { name: /^Cover bolt, first pass/ }).click();
  await page.keyboard.type(', then go on.');
  await expect(desk.how).toHaveText('Tighten to Cover bolt, first pass 5 N·m, then go on.');
  await expectStored(desk, 'Tighten to <Torque of="cover-bolt" pass="1" />, then go on.');

  const torques = desk.middle.getByRole('table', { name: 'Torques of this step' });
  await torques.getByLabel('first pass', { exact: false }).fill('6');
  await expect(desk.chip('first pass')).toHaveText('Cover bolt, first pass 6 N·m');
  await torques.getByLabel('N·m, row 1', { exact: true }).fill('');
  await expect(desk.chip('first pass')).toHaveText('Cover bolt, first pass 6 N·m');
  await torques.getByLabel('N·m, row 1', { exact: true }).fill('10');

  await desk.chip('first pass').click();
  await page.getByRole('dialog').getByRole('button', { name: 'Take it out' }).click();
  await expectStored(desk, 'Tighten to , then go on.');
  await page.keyboard.press('ControlOrMeta+z');
  await expectStored(desk, 'Tighten to <Torque of="cover-bolt" pass="1" />, then go on.');
  await page.keyboard.press('ControlOrMeta+y');
  await expect(desk.chip('first pass')).toHaveCount(0);
});

test('a chip is whole under the keys, and keys alone do all that can be done with it', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, 'To <Torque of="cover-bolt" /> now.\n\nThen <Part of="nothing-here" />.');
  await expect(desk.chip('There is no part “nothing-here”')).toBeVisible();
  await desk.how.focus();
  await page.keyboard.press('ControlOrMeta+Home');
  for (const _ of 'To ') await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowRight');
  const status = desk.middle.getByText('Cover bolt 10 ±1 N·m. Enter shows what can be done with it.');
  await expect(status).toBeAttached();
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: /Cover bolt 10/ });
  await expect(dialog.getByRole('button', { name: 'Go to its value' })).toBeFocused();
  await page.keyboard.press('Escape');
  await expect(dialog).toHaveCount(0);
  await expect(desk.how).toBeFocused();

  await page.keyboard.press('Enter');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await expectStored(desk, 'To <Torque of="cover-bolt" pass="1" /> now.\n\nThen <Part of="nothing-here" />.');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Backspace');
  await expectStored(desk, 'To  now.\n\nThen <Part of="nothing-here" />.'.replace('  ', ' '));
  await page.keyboard.press('ControlOrMeta+z');

  // Copied and pasted a chip is the same one; typed over, it is gone whole.
  await page.keyboard.press('ControlOrMeta+Home');
  await page.keyboard.press('Shift+End');
  await page.keyboard.press('ControlOrMeta+c');
  await page.keyboard.press('ControlOrMeta+End');
  await page.keyboard.press('ControlOrMeta+v');
  await expectStored(
    desk,
    'To <Torque of="cover-bolt" pass="1" /> now.\n\nThen <Part of="nothing-here" />.To <Torque of="cover-bolt" pass="1" /> now.',
  );
  await page.keyboard.press('ControlOrMeta+z');

  await page.keyboard.press('ControlOrMeta+End');
  await page.keyboard.press('Enter');
  await page.keyboard.type('- one');
  await page.keyboard.press('Enter');
  await page.keyboard.type('two');
  await page.keyboard.press('Tab');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Enter');
  await page.keyboard.press('ControlOrMeta+b');
  await page.keyboard.type('End');
  await expectStored(
    desk,
    'To <Torque of="cover-bolt" pass="1" /> now.\n\nThen <Part of="nothing-here" />.\n\n- one\n  - two\n\n**End**',
  );
  await page.keyboard.press('Escape');
  await page.keyboard.press('Tab');
  await expect(desk.how).not.toBeFocused();
});

test('what comes from a word processor comes in clean, and what is left out is told', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, 'First <Torque of="cover-bolt" />.');
  await desk.how.click();
  await page.keyboard.press('ControlOrMeta+End');
  await page.keyboard.press('Enter');
  await desk.paste({ 'text/html': WORD_LISTS, 'text/plain': 'not used' });
  await expectStored(
    desk,
    [
      'First <Torque of="cover-bolt" />.',
      '**Refit the cover**',
      'Before you start, **read** the *whole* sheet. Use 10\u00a0N·m at most.',
      '- Wipe the rail\n- Lay the gasket\n  1. corners first\n  2. then the straights\n- Run the bolts in',
      '4. Draw it down\n5. Go round again',
      'Area 10² mm, O₂ sensor.',
    ].join('\n\n'),
  );
  await expect(desk.middle.getByText('1 picture was left out: “The bolt order”.')).toBeVisible();
  await expect(desk.middle.getByText('“Use 25 N·m.”')).toBeVisible();
  await page.keyboard.press('ControlOrMeta+z');
  await expectStored(desk, 'First <Torque of="cover-bolt" />.');

  await desk.paste({ 'text/html': GOOGLE_DOC, 'text/plain': 'not used' });
  await expect(desk.how.getByRole('listitem').filter({ hasText: /^front corners$/ })).toBeVisible();
  await expect(desk.middle.getByText('left out')).toHaveCount(0);
  await page.keyboard.press('ControlOrMeta+z');

  await desk.paste({ 'text/plain': 'Set <Limit of="gasket-proud" />:\r\n\r\n<Hold>Somebody looks.</Hold>' });
  await expect(desk.chip('Gasket proud')).toHaveText('Gasket proud of its groove, all round 0.80 to 1.40 mm');
  await expectStored(
    desk,
    'First <Torque of="cover-bolt" />.\n\nSet <Limit of="gasket-proud" />:\n\n<Hold>Somebody looks.</Hold>',
  );
});

test('tables, drawings, hold points and links are made without a sign being typed', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, '');
  const layout = async (name: string) => {
    await desk.middle.getByRole('button', { name: 'Layout' }).click();
    await desk.middle.getByRole('button', { name, exact: false }).click();
  };
  await desk.how.click();
  await layout('Table');
  await page.keyboard.type('Bolt');
  await page.keyboard.press('Tab');
  await page.keyboard.type('Torque');
  await page.keyboard.press('Tab');
  await page.keyboard.type('Cover');
  await page.keyboard.press('Tab');
  await desk.middle.getByRole('button', { name: 'Torque', exact: true }).click();
  await desk.middle.getByRole('button', { name: /^Coil bolt/ }).click();
  await layout('Delete the row');
  await page.keyboard.press('ControlOrMeta+End');
  await page.keyboard.type('See ');
  await page.keyboard.press('ControlOrMeta+k');
  const address = page.getByRole('dialog', { name: 'Link' }).getByLabel('Address');
  await address.fill('http://halden.example');
  await page.keyboard.press('Enter');
  await expect(page.getByText('A link goes to an address that starts with https://').last()).toBeVisible();
  await address.fill('/handbook/units');
  await page.keyboard.press('Enter');
  await desk.middle.getByRole('button', { name: 'Hold point' }).click();
  await page.keyboard.type('Ask first.');
  await page.keyboard.press('Enter');
  await desk.middle.getByRole('button', { name: 'Drawing', exact: true }).click();
  await desk.middle.getByRole('button', { name: /^The cover from below/ }).click();
  await expectStored(
    desk,
    [
      '| Bolt | Torque |\n| - | - |\n| | |',
      'See [/handbook/units](/handbook/units)',
      '<Hold>Ask first.</Hold>',
      '<Figure of="underside" />',
    ].join('\n\n'),
  );
});

test('words that cannot be read are text, and chips again once they can', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, 'Tighten to <Torque of="cover-bolt" /> now.\n\n# A heading');
  await expect(desk.middle.getByText('because they cannot be read yet. Line 3: Headings are not used')).toBeVisible();
  await expect(desk.how).toHaveValue('Tighten to <Torque of="cover-bolt" /> now.\n\n# A heading');
  await desk.how.fill('Tighten to <Torque of="cover-bolt" /> now.');
  await desk.middle.getByRole('button', { name: 'Try again with the values as chips' }).click();
  await expect(desk.how).toHaveText('Tighten to Cover bolt 10 ±1 N·m now.');
  await desk.middle.getByRole('button', { name: 'Layout' }).click();
  await desk.middle.getByRole('button', { name: 'Show it as it is stored' }).click();
  await expect(desk.how).toHaveValue('Tighten to <Torque of="cover-bolt" /> now.');
});

test('words that are set from outside are taken over and not written back', async ({ as }) => {
  const page = await as('pierEditor', { allow: [/409 \(Conflict\)/] });
  const desk = await deskWith(page, 'Mine.');
  const { version, source } = await readProposal(page, desk.id);
  const theirs = source.replace('\nMine.\n', '\nTheirs <Part of="cover" />.\n');
  const put = await call(page, 'PUT', `/proposals/${desk.id}`, { source: theirs }, { 'if-match': `"${version}"` });
  expect(put.ok()).toBe(true);
  await desk.write('Mine again.');
  await page.getByRole('button', { name: 'Take what was saved there' }).click();
  await expect(desk.how).toHaveText('Theirs Valve cover.');
  await page.waitForTimeout(1500);
  expect((await readProposal(page, desk.id)).source).toBe(theirs);
  await desk.how.click();
  await page.keyboard.press('ControlOrMeta+z');
  await expect(desk.how).toHaveText('Theirs Valve cover.');
});

test('letters that are composed are left alone until they are whole', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, 'Er <Torque of="cover-bolt" />.');
  await desk.how.focus();
  await page.keyboard.press('ControlOrMeta+Home');
  for (const _ of 'Er') await page.keyboard.press('ArrowRight');
  const devtools = await page.context().newCDPSession(page);
  for (const text of [' h', ' ha', ' hä'])
    await devtools.send('Input.imeSetComposition', { text, selectionStart: text.length, selectionEnd: text.length });
  // A value that changes meanwhile is said anew, but not before the word is put in.
  await page.evaluate(() => {
    const box = document.getElementById('f-torques-0-nm') as HTMLInputElement;
    Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, 'value')!.set!.call(box, '11');
    box.dispatchEvent(new Event('input', { bubbles: true }));
  });
  await page.waitForTimeout(300);
  await expect(desk.how).toHaveText('Er hä Cover bolt 10 ±1 N·m.');
  await devtools.send('Input.insertText', { text: ' hält' });
  await expect(desk.how).toHaveText('Er hält Cover bolt 11 ±1 N·m.');
  await expectStored(desk, 'Er hält <Torque of="cover-bolt" />.');
});

test('a picture that is pasted or dropped is told to have been left out', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(page, 'Words.');
  await desk.how.click();
  for (const type of ['paste', 'drop'])
    await test.step(type, async () => {
      const prevented = await desk.how.evaluate((field, name) => {
        const data = new DataTransfer();
        data.items.add(new File(['x'], 'bolts.png', { type: 'image/png' }));
        const { left, top } = field.getBoundingClientRect();
        const common = { bubbles: true, cancelable: true };
        const event =
          name === 'paste'
            ? new ClipboardEvent('paste', { ...common, clipboardData: data })
            : new DragEvent('drop', { ...common, dataTransfer: data, clientX: left + 20, clientY: top + 20 });
        return !field.dispatchEvent(event);
      }, type);
      expect(prevented).toBe(true);
      await expect(desk.middle.getByText('1 picture was left out: “bolts.png”.')).toBeVisible();
      await desk.paste({ 'text/plain': ' ' });
      await expect(desk.middle.getByText('left out')).toHaveCount(0);
    });
  await expect(desk.how).toHaveText('Words.');
  await desk.paste({ 'text/plain': '<Step id="a" title="b">\n<Caution of="hot-oil" />\n\nNew.\n</Step>' });
  await expect(desk.how).toContainText('New.');
  await expect(desk.middle.getByText('1 caution was left out: “hot-oil”.')).toBeVisible();
});

test('it holds on a phone, and a screen reader is told what it is', async ({ as }) => {
  const page = await as('pierEditor');
  const desk = await deskWith(
    page,
    'Good: <Limit of="gasket-proud" />, <Torque of="cover-bolt" />.\n\n| A | B |\n| - | - |\n| <Part of="cover-gasket" /> | c |\n\n<Hold>Look.</Hold>',
  );
  await expect(desk.how).toHaveAttribute('aria-multiline', 'true');
  await expect(desk.how).toHaveAccessibleDescription(/Escape, then Tab leaves the field/);
  for (const width of [390, 320]) await expectNoSidewaysScroll(page, width);
  await page.setViewportSize({ width: 390, height: 844 });
  await desk.chip('Gasket proud').click();
  const dialog = page.getByRole('dialog');
  const box = await dialog.boundingBox();
  expect(box!.x).toBeGreaterThanOrEqual(0);
  expect(box!.x + box!.width).toBeLessThanOrEqual(390);
  await expectNoFaults(page);
});
