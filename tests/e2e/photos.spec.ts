import type { Locator } from '@playwright/test';
import { grain, jpegOf } from '../factories/pictures';
import { expectSound } from './support/axe';
import { propose, readProposal } from './support/api';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';
import { WritingDesk } from './support/writing';

const file = (name: string, buffer: Buffer) => ({ name, mimeType: 'image/jpeg', buffer });
const choose = (within: Locator, ...files: ReturnType<typeof file>[]) =>
  within.getByLabel('Add photos').setInputFiles(files);
/** The pictures of a strip have come, at their own proportions. */
const expectPictures = async (within: Locator, count: number) => {
  await expect(within.locator('.photo-strip img')).toHaveCount(count);
  for (const image of await within.locator('.photo-strip img').all())
    await expect.poll(() => image.evaluate((img) => (img as HTMLImageElement).naturalWidth)).toBeGreaterThan(0);
};
const change = (source: string) => source.replace(/nm: (\d+)/, (_, nm: string) => `nm: ${Number(nm) + 1}`);

test('an editor asks with photos, the author answers with one, the editor removes one', async ({ as }) => {
  test.setTimeout(120_000);
  const author = await as('senior');
  const { id } = await propose(author, 'P-0111', change, 'Measured on four engines.');
  const editor = await as('editor', { allow: [/status of (415|503)/] });
  await editor.goto(`/proposals/${id}`);
  await alive(editor);

  await test.step('each photo tells how it fares; what failed can be tried again or taken off', async () => {
    await editor.locator('.review-head .start-here a', { hasText: 'Ask' }).click();
    const form = editor.getByRole('form', { name: 'Ask about the whole proposal' });
    await form.getByLabel('Your question').fill('Which of these is it?');
    let refusals = 1;
    await editor.route('**/api/v1/photos', async (route) => {
      if (refusals-- > 0)
        await route.fulfill({
          status: 503,
          json: { type: 'x', title: 'x', status: 503, detail: 'Photos cannot be stored at the moment.' },
        });
      else await route.continue();
    });
    await choose(form, file('corner.jpg', await jpegOf(800, 600)), file('notes.jpg', Buffer.from('No photo.')));
    await expect(form.getByText('corner.jpg was not taken. Photos cannot be stored at the moment.')).toBeVisible();
    await expect(form.getByText('notes.jpg was not taken. This is no photo that can be read here.')).toBeVisible();
    await expect(form.getByRole('button', { name: 'Try again notes.jpg' })).toHaveCount(0);
    await form.getByRole('button', { name: 'Ask' }).click();
    await expect(form.getByText('A photo could not be sent. Try it again or take it off.')).toBeVisible();
    await expectSound(editor);
    await form.getByRole('button', { name: 'Try again corner.jpg' }).click();
    await form.getByRole('button', { name: 'Take off notes.jpg' }).click();
    await expect(form.getByLabel('Add photos')).toBeFocused();
    await form.getByRole('button', { name: 'Ask' }).click();
    await expect(form.getByLabel('What photo 1 shows')).toBeFocused();
    await expect(form.getByText('Say what the photo shows, for whoever cannot see it.')).toBeVisible();
    await form.getByLabel('What photo 1 shows').fill('The rear corner');
  });

  await test.step('a slow network shows how far it has come, and a failed sending loses nothing', async () => {
    const form = editor.getByRole('form', { name: 'Ask about the whole proposal' });
    const network = await editor.context().newCDPSession(editor);
    await network.send('Network.enable');
    const speed = { offline: false, latency: 0, downloadThroughput: -1 };
    const photo = await grain(1600, 1200).jpeg({ quality: 70 }).toBuffer();
    await network.send('Network.emulateNetworkConditions', { ...speed, uploadThroughput: photo.length / 3 });
    await choose(form, file('side.jpg', photo));
    await expect(form.getByRole('progressbar', { name: /^side\.jpg: Sending, \d+ %/ })).toBeVisible();
    await form.getByRole('button', { name: 'Ask' }).click();
    await expect(form.getByText('A photo is still on its way. Wait until it is there, or take it off.')).toBeVisible();
    await form.getByLabel('What photo 2 shows').fill('The side', { timeout: 30_000 });
    await network.send('Network.emulateNetworkConditions', { ...speed, uploadThroughput: -1 });

    await editor.route('**/threads', (route) =>
      route.fulfill({ status: 503, json: { type: 'x', title: 'Busy', status: 503, detail: 'The book is busy.' } }),
    );
    await form.getByRole('button', { name: 'Ask' }).click();
    await expect(form.getByText('The book is busy.')).toBeVisible();
    await expect(form.getByLabel('What photo 2 shows')).toHaveValue('The side');
    await editor.unroute('**/threads');
    await form.getByRole('button', { name: 'Ask' }).click();
    const question = editor.getByRole('region', { name: 'Question, not answered yet' });
    await expect(question).toBeFocused();
    await expectPictures(question, 2);
    await expectSound(editor);
  });

  await test.step('the author opens them large, by keyboard, and answers with a pasted picture', async () => {
    await author.goto(`/proposals/${id}`);
    await alive(author);
    const question = author.getByRole('region', { name: 'Question, not answered yet' });
    await expectPictures(question, 2);
    const first = question.getByRole('link', { name: 'The rear corner' });
    await first.focus();
    await author.keyboard.press('Enter');
    const dialog = author.getByRole('dialog', { name: 'Photo 1 of 2' });
    await expect(dialog.getByRole('img', { name: 'The rear corner' })).toBeVisible();
    await author.keyboard.press('ArrowRight');
    await expect(
      author.getByRole('dialog', { name: 'Photo 2 of 2' }).getByRole('img', { name: 'The side' }),
    ).toBeVisible();
    await author.keyboard.press('ArrowRight');
    await expect(dialog).toBeVisible();
    await expectSound(author);
    const link = dialog.getByRole('link', { name: 'Open the full picture' });
    const answer = await author.request.get((await link.getAttribute('href')) ?? '');
    expect(answer.headers()).toMatchObject({ 'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff' });
    await author.keyboard.press('Escape');
    await expect(dialog).toHaveCount(0);
    await expect(first).toBeFocused();

    await question.locator('summary', { hasText: 'Answer' }).click();
    const box = question.getByLabel('Your answer');
    await box.fill('Neither: this one.');
    const bytes = [...(await jpegOf(300, 400))];
    await box.evaluate((element, data) => {
      const clipboardData = new DataTransfer();
      clipboardData.items.add(new File([new Uint8Array(data)], 'image.png', { type: 'image/png' }));
      element.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }));
    }, bytes);
    await question.getByLabel('What photo 1 shows').fill('The front corner');
    await question.getByRole('button', { name: 'Answer', exact: true }).click();
    await expectPictures(author.getByRole('region', { name: 'Question, answered but not resolved' }), 3);
  });

  await test.step('on paper the photos stand, and nothing to press', async () => {
    await author.emulateMedia({ media: 'print' });
    await expect(author.locator('.photo-strip img').first()).toBeVisible();
    await expect(author.locator('.photo-picker').first()).toBeHidden();
    await author.emulateMedia({ media: null });
  });

  await test.step('the editor removes one; who, when and why stay', async () => {
    await editor.reload();
    await alive(editor);
    const question = editor.getByRole('region', { name: /^Question/ });
    await question.getByRole('link', { name: 'The front corner' }).click();
    await editor.getByRole('dialog').getByRole('link', { name: 'Remove it' }).click();
    await expect(editor.getByRole('heading', { name: 'Remove a photo' })).toBeVisible();
    await expectSound(editor);
    await editor.getByLabel('Why it goes').fill('It shows a number plate.');
    await editor.getByRole('button', { name: 'Remove the photo' }).click();
    await expect(editor).toHaveURL(new RegExp(`/proposals/${id}#thread-`));
    await expect(
      editor.getByText(/^Photo removed by Ines Okafor on .*, because: It shows a number plate\.$/),
    ).toBeVisible();
    await expectPictures(question, 2);
  });
});

test('an author puts a photo to the reason, takes it off again, and sends one in', async ({ as }) => {
  const author = await as('senior');
  await author.goto('/procedures/P-0118');
  await author.getByRole('button', { name: 'Propose a change' }).click();
  const desk = new WritingDesk(author);
  await desk.ready();
  const evidence = author.getByRole('region', { name: 'Photos that show it' });
  for (const words of ['The first try', 'The worn edge']) {
    await choose(evidence, file('edge.jpg', await jpegOf()));
    await evidence.getByLabel('What photo 1 shows').fill(words);
    await evidence.getByRole('button', { name: 'Add the photo to the reason' }).click();
    await expect(evidence.getByRole('img', { name: words })).toBeVisible();
    if (words === 'The first try') {
      await expectSound(author);
      await evidence.getByRole('button', { name: 'Take off photo 1' }).click();
      await expect(evidence.getByRole('img')).toHaveCount(0);
    }
  }
  await desk.choose('Title, engines, introduction');
  await desk.middle.getByLabel('Title').fill('A title that is somewhat better');
  await desk.reason.fill('The edge wears.');
  await desk.kept();
  await desk.propose();
  const { photos } = await readProposal(author, desk.id);
  expect(photos).toMatchObject([{ alt: 'The worn edge', may: { takeOff: false } }]);
  const editor = await as('editor');
  await editor.goto(`/proposals/${desk.id}`);
  await expectPictures(editor.locator('.review-head'), 1);
});

test('a flag is raised with photos where no script runs', async ({ as }) => {
  const apprentice = await as('apprentice', { javaScriptEnabled: false, allow: [/status of 422/] });
  await apprentice.goto('/procedures/P-0139/flag');
  await apprentice.getByLabel('In your words').fill('The drawing shows the other side.');
  await apprentice.getByLabel('Photo 1', { exact: true }).setInputFiles(file('a.jpg', await jpegOf()));
  await apprentice.getByLabel('What photo 1 shows').fill('The side as it is');
  await apprentice.getByLabel('Photo 2', { exact: true }).setInputFiles(file('b.jpg', Buffer.from('No photo.')));
  await apprentice.getByRole('button', { name: 'Raise the flag' }).click();
  await expect(apprentice.locator('#file-0-error')).toContainText('This is no photo that can be read here.');
  await expect(apprentice.getByLabel('In your words')).toHaveValue('The drawing shows the other side.');
  await expect(apprentice.getByLabel('What photo 1 shows')).toHaveValue('The side as it is');
  for (const width of [390, 320]) await expectNoSidewaysScroll(apprentice, width);
  await apprentice.getByRole('button', { name: 'Raise the flag' }).click();
  await expect(apprentice.getByText('Flag raised. You are told when it is answered.')).toBeVisible();
  await expect(apprentice.getByRole('img', { name: 'The side as it is' })).toHaveCount(1);
  const address = (await apprentice.getByRole('link', { name: 'The side as it is' }).getAttribute('href')) ?? '';

  const senior = await as('northSenior');
  await senior.goto('/flags');
  await expectPictures(senior.getByRole('listitem').filter({ hasText: 'The drawing shows the other side.' }), 1);
  await expectSound(senior);
  expect((await senior.request.get(address)).status()).toBe(200);
  for (const who of ['senior', 'technician'] as const)
    expect((await (await as(who)).request.get(address)).status(), who).toBe(404);
  const nobody = await (await as(null)).request.get(address, { maxRedirects: 0 });
  expect(nobody.headers()['location']).toMatch(/^\/sign-in/);
});

test('a flag is raised with photos where a script runs', async ({ as }) => {
  const technician = await as('technician');
  await technician.goto('/procedures/P-0139/flag');
  await alive(technician);
  const form = technician.locator('main form');
  await technician.getByLabel('In your words').fill('This one does not fit.');
  await choose(form, file('a.jpg', await jpegOf()), file('b.jpg', await jpegOf()));
  await technician.getByRole('button', { name: 'Raise the flag' }).click();
  await technician.getByLabel('What photo 2 shows').waitFor();
  await technician.getByLabel('What photo 1 shows').fill('The old one');
  await technician.getByLabel('What photo 2 shows').fill('The new one');
  await expectSound(technician);
  await technician.getByRole('button', { name: 'Raise the flag' }).click();
  await expect(technician.getByText('Flag raised. You are told when it is answered.')).toBeVisible();
  await expectPictures(technician.getByRole('listitem').filter({ hasText: 'This one does not fit.' }), 2);
});
