import type { Page } from '@playwright/test';
import { expectNoFaults } from './support/axe';
import { expect, expectNoSidewaysScroll, test } from './support/book';

const addressOn = (page: Page) => page.getByLabel('Feed address');

test('a key is made on the profile, opens the feed signed out, and ends when it is revoked', async ({ as }) => {
  const page = await as('senior');
  await page.goto('/profile');
  await page.getByRole('button', { name: 'Make an address: Common book and Pier Street Motors' }).click();
  const address = await addressOn(page).inputValue();
  expect(address).toMatch(/^http:\/\/[^/]+\/feed\/[\w-]{43}\.atom$/);
  // The key is in no address that the browser keeps.
  expect(page.url()).toMatch(/\/profile#feed$/);
  await expect(page.getByText('Copy it now: it is not shown again.')).toBeVisible();
  await expectNoFaults(page);
  for (const width of [390, 320]) await expectNoSidewaysScroll(page, width);

  await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
  await page.getByRole('button', { name: 'Copy the address' }).click();
  await expect(page.getByText('Copied', { exact: true })).toBeVisible();
  expect(await page.evaluate(() => navigator.clipboard.readText())).toBe(address);

  // A feed reader: no cookies, no session.
  const reader = await as(null);
  const feed = await reader.request.get(address);
  expect(feed.status()).toBe(200);
  const { 'content-type': type, 'referrer-policy': referrer, 'x-robots-tag': robots, etag } = feed.headers();
  expect(type).toBe('application/atom+xml; charset=utf-8');
  expect(referrer).toBe('no-referrer');
  expect(robots).toContain('noindex');
  const told = await feed.text();
  expect(told).toContain('P-0142 C, Reseal the valve cover: published');
  expect(told).toContain('P-0173 A, Check the injector return: withdrawn');
  // Pier Street's own sheet is told, Sawmill Lane's is not, and no torque of any.
  expect(told).toContain('Receive an engine and tag it');
  expect(told).not.toContain('Lay up a B3 afloat for the winter');
  expect(told).not.toMatch(/\d N·m/);
  const again = await reader.request.get(address, { headers: { 'if-none-match': etag ?? '' } });
  expect(again.status()).toBe(304);
  expect((await reader.request.head(address)).status()).toBe(200);
  expect((await reader.request.post(address)).status()).toBe(405);

  // Opened later, the page does not show it again.
  await page.goto('/profile');
  await expect(addressOn(page)).toHaveCount(0);
  await expect(page.getByText(/^Address made on /)).toBeVisible();
  expect(await page.content()).not.toContain(address.split('/').at(-1));
  await page.getByRole('button', { name: /^Revoke: / }).click();
  await expect(page.getByText('Revoked', { exact: true })).toBeVisible();
  const ended = await reader.request.get(address);
  expect([ended.status(), await ended.text()]).toEqual([404, 'There is nothing here, or you may not see it.\n']);
});

test('without a script it is a plain form; replacing ends the first address', async ({ as }) => {
  const page = await as('sawmillEditor', { javaScriptEnabled: false });
  await page.goto('/profile');
  await page.getByRole('button', { name: /^Make an address/ }).click();
  await expect(page.getByRole('button', { name: 'Copy the address' })).toBeHidden();
  const first = await addressOn(page).inputValue();
  await page.getByRole('button', { name: /^Replace the address/ }).click();
  const second = await addressOn(page).inputValue();
  expect(second).not.toBe(first);
  const reader = await as(null);
  expect((await reader.request.get(first)).status()).toBe(404);
  const told = await (await reader.request.get(second)).text();
  expect(told).toContain('Lay up a B3 afloat for the winter');
  expect(told).not.toContain('Receive an engine and tag it');
});

test('a page that is sent again says so and takes nothing away', async ({ as }) => {
  const page = await as('northOwner', { allow: [/status of 409/] });
  await page.goto('/profile');
  await page.getByRole('button', { name: /^Make an address/ }).click();
  const address = await addressOn(page).inputValue();
  await page.reload();
  await expect(page.getByText(/Nothing was done\. If you do not have the present one, make a new one\./)).toBeVisible();
  await expectNoFaults(page);
  const reader = await as(null);
  expect((await reader.request.get(address)).status()).toBe(200);
});

test('whoever has no shop has a feed of the common book alone', async ({ as }) => {
  const page = await as('editor');
  await page.goto('/profile');
  await page.getByRole('button', { name: 'Make an address: Common book', exact: true }).click();
  const told = await (await page.request.get(await addressOn(page).inputValue())).text();
  expect(told).toContain('P-0142 C, Reseal the valve cover: published');
  for (const own of ['Receive an engine and tag it', 'Lay up a B3 afloat for the winter'])
    expect(told).not.toContain(own);
});

test('a sheet is kept as a DITA task by whoever reads it, and says what it is to other programs', async ({ as }) => {
  const page = await as('apprentice');
  await page.goto('/procedures/P-0142');
  const [kept] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: 'this sheet as a DITA 1.2 task' }).click(),
  ]);
  expect(kept.suggestedFilename()).toBe('p-0142-reseal-the-valve-cover.dita');
  const said = JSON.parse((await page.locator('script[type="application/ld+json"]').textContent()) ?? '') as {
    '@type': string;
    step: { url: string }[];
  };
  expect(said['@type']).toBe('HowTo');
  for (const { url } of said.step) {
    const { pathname, hash } = new URL(url, page.url());
    expect(pathname).toBe('/procedures/P-0142/revisions/C');
    await expect(page.locator(hash)).toHaveCount(1);
  }
  const signedOut = await as(null);
  const asked = await signedOut.request.get('/procedures/P-0142/task.dita', { maxRedirects: 0 });
  expect(asked.status()).toBe(303);
});
