import { readProposal } from './support/api';
import { alive, expect, test } from './support/book';
import { WritingDesk } from './support/writing';

const NO_NETWORK = [/ERR_INTERNET_DISCONNECTED/];

test('a sheet says that the network is gone, and that it is back', async ({ as }) => {
  const page = await as('apprentice', { allow: NO_NETWORK });
  await page.goto('/procedures/P-0142');
  const notice = page.getByText('No network.', { exact: true });
  await expect(notice).toBeHidden();
  await page.context().setOffline(true);
  await expect(notice).toBeVisible();
  await expect(page.getByRole('region', { name: /^Step 8:/ })).toBeVisible();
  // The units switch in place all the same.
  await page.getByRole('button', { name: 'Inch units' }).click();
  await expect(page.locator('html')).toHaveAttribute('data-units', 'inch');
  await page.context().setOffline(false);
  await expect(notice).toBeHidden();
});

test('look up goes on without the network, with the index that the page has', async ({ as }) => {
  const page = await as('apprentice', { allow: NO_NETWORK });
  await page.goto('/');
  await alive(page);
  await expect(page.getByRole('search')).toHaveAttribute('data-index', 'ready');
  await page.context().setOffline(true);
  await page.getByRole('searchbox').fill('89 lbf·in cover');
  await expect(page.getByRole('list', { name: 'Sheets' }).getByRole('link').first()).toHaveText(
    'Reseal the valve cover',
  );
});

test('what is typed into a draft without the network is held, and sent once it is back', async ({ as }) => {
  const page = await as('technician', { allow: NO_NETWORK });
  await page.goto('/procedures/P-0113');
  await page.getByRole('button', { name: 'Propose a change' }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  await page.context().setOffline(true);
  await desk.reason.fill('Typed beside a car park with no signal.');
  await expect(desk.keeping).toHaveText('Kept on this device. Sent when the network is back.');
  await page.getByRole('button', { name: 'Propose', exact: true }).click();
  await expect(page.getByText(/There is no network\. Nothing was sent; your words are held/)).toBeVisible();
  await page.context().setOffline(false);
  await desk.kept();
  await expect
    .poll(async () => (await readProposal(page, desk.id)).reason)
    .toBe('Typed beside a car park with no signal.');
});

test('words typed without the network survive a browser that dies', async ({ as }) => {
  const page = await as('technician', { allow: NO_NETWORK });
  await page.goto('/procedures/P-0115');
  await page.getByRole('button', { name: 'Propose a change' }).click();
  const desk = new WritingDesk(page);
  await desk.ready();
  const { id } = desk;
  const before = (await readProposal(page, id)).version;
  await page.context().setOffline(true);
  await desk.write('Held words, typed in the pit.');
  await expect(desk.keeping).toHaveAttribute('data-keeping', 'unreachable');
  // A page that is closed still sends its last words; one that dies does not.
  const died = page.waitForEvent('crash');
  const devtools = await page.context().newCDPSession(page);
  void devtools.send('Page.crash').catch(() => null);
  await died;
  const context = page.context();
  await page.close();

  await context.setOffline(false);
  const next = new WritingDesk(await context.newPage());
  expect((await readProposal(next.page, id)).version).toBe(before);
  await next.page.goto(`/proposals/${id}/edit`);
  await next.ready();
  await expect(next.middle.getByText('Words that were held on this device are back on the screen.')).toBeVisible();
  await expect(next.how).toHaveText('Held words, typed in the pit.');
  await next.kept();
  await expect.poll(async () => (await readProposal(next.page, id)).source).toContain('Held words, typed in the pit.');
});
