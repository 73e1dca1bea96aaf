import { call, numberOf, propose } from './support/api';
import { expect, test } from './support/book';

const NOT_FOUND = [/status of 404/];
const PRIVATE = 'Receive an engine and tag it';

test('somebody who is not signed in sees the sign-in page, and afterwards what they asked for', async ({ as }) => {
  const page = await as(null);
  await page.goto('/procedures/P-0142?from=bench');
  await expect(page).toHaveURL('/sign-in?to=%2Fprocedures%2FP-0142%3Ffrom%3Dbench');
  await page.getByRole('button', { name: /Mika Thornbury/ }).click();
  await expect(page).toHaveURL('/procedures/P-0142?from=bench');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Reseal the valve cover');
});

test('every place asks a visitor to sign in', async ({ as }) => {
  const page = await as(null);
  for (const path of [
    '/',
    '/procedures/P-0142',
    '/handbook',
    '/proposals',
    '/review-desk',
    '/profile',
    '/no-such-page',
  ]) {
    await page.goto(path);
    await expect(page, path).toHaveURL(/\/sign-in/);
    await expect(page.getByLabel('Password')).toBeVisible();
  }
});

test('the API answers a visitor 401 and says nothing else', async ({ as }) => {
  const page = await as(null);
  for (const path of [
    '/me',
    '/procedures',
    '/procedures/P-0142',
    '/search?q=cover',
    '/search-index',
    '/no-such-call',
  ]) {
    const answer = await call(page, 'GET', path);
    expect(answer.status(), path).toBe(401);
    expect(answer.headers()['content-type']).toContain('application/problem+json');
    expect(await answer.json()).toMatchObject({ status: 401 });
    expect(await answer.text()).not.toMatch(/cover|gasket/i);
  }
});

test('a wrong password says so, keeps the address, and the right one goes on', async ({ as }) => {
  const page = await as(null);
  await page.goto('/sign-in?to=/handbook');
  await page.getByLabel('E-mail').fill('technician@northgate.example');
  await page.getByLabel('Password').fill('not the password');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page.getByText('The e-mail address and the password do not belong together.')).toBeVisible();
  await expect(page.getByLabel('E-mail')).toHaveValue('technician@northgate.example');
  await page.getByLabel('Password').fill('matchmark-demo');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page).toHaveURL('/handbook');
});

test('signing out ends the session, also for the back button', async ({ as }) => {
  const page = await as('technician');
  await page.goto('/procedures/P-0137');
  await page.getByLabel(/Dafydd Lorne: profile/).click();
  await page.getByRole('button', { name: 'Sign out', exact: true }).click();
  await expect(page.getByText('Signed out.')).toBeVisible();
  await page.goBack();
  await page.reload();
  await expect(page).toHaveURL(/\/sign-in/);
  expect((await call(page, 'GET', '/me')).status()).toBe(401);
});

test('an apprentice is offered no desk and gets 403 where one is asked for', async ({ as }) => {
  const page = await as('apprentice', { allow: [/status of 403/] });
  await page.goto('/procedures/P-0142');
  const places = page.getByRole('navigation', { name: 'Main' });
  await expect(places.getByRole('link', { name: 'Look up' })).toBeVisible();
  await expect(places.getByRole('link', { name: 'Review desk' })).toHaveCount(0);
  await expect(page.getByRole('button', { name: 'Propose a change' })).toHaveCount(0);
  const response = await page.goto('/review-desk');
  expect(response?.status()).toBe(403);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Not yours to do');
  await page.getByRole('link', { name: 'See your roles' }).click();
  await expect(page.getByText('Apprentice', { exact: true })).toBeVisible();
  expect((await call(page, 'GET', '/review-desk')).status()).toBe(403);
});

test("another shop's private procedure looks like one that never was, in every place", async ({ as }) => {
  const member = await as('pierOwner');
  const number = await numberOf(member, PRIVATE);
  await member.goto(`/procedures/${number}`);
  await expect(member.getByRole('heading', { level: 1 })).toHaveText(PRIVATE);
  await expect(member.getByText('Pier Street Motors').first()).toBeVisible();

  for (const who of ['apprentice', 'sawmillOwner', 'editor'] as const) {
    const page = await as(who, { allow: NOT_FOUND });
    const unseen = await page.goto(`/procedures/${number}`);
    expect(unseen?.status(), who).toBe(404);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Not found');
    await expect(page.getByText(PRIVATE)).toHaveCount(0);
    const html = async (number: string, below: string) => {
      const answer = await page.request.get(`/procedures/${number}${below}`);
      return { status: answer.status(), html: (await answer.text()).replaceAll(number, 'P-n') };
    };
    for (const below of ['', '/revisions', '/revisions/A', '/compare?from=A&to=B'])
      expect(await html(number, below), below).toEqual(await html('P-9999', below));

    for (const below of ['', '/revisions', '/revisions/A', '/compare?from=A&to=A']) {
      const [hidden, unknown] = [
        await call(page, 'GET', `/procedures/${number}${below}`),
        await call(page, 'GET', `/procedures/P-9999${below}`),
      ];
      expect(hidden.status(), below).toBe(404);
      expect((await hidden.text()).replaceAll(number, 'P-9999')).toBe(await unknown.text());
    }
    const found = await call(page, 'GET', `/search?q=${encodeURIComponent(PRIVATE)}`);
    expect(await found.text()).not.toContain(PRIVATE);
    expect(await (await call(page, 'GET', '/search-index')).text()).not.toContain(PRIVATE);
    expect(await (await call(page, 'GET', '/procedures?limit=200')).text()).not.toContain(PRIVATE);
  }
  expect(await (await call(member, 'GET', '/search-index')).text()).toContain(PRIVATE);
});

test('nobody agrees to or publishes what they wrote, though they are an editor', async ({ as }) => {
  const author = await as('editor2', { allow: [/status of 403/] });
  const { id } = await propose(
    author,
    'P-0183',
    (source) => source.replace(/^minutes: \d+/m, 'minutes: 241'),
    'It takes longer than it says.',
  );
  for (const act of ['agree', 'publish', 'return', 'decline']) {
    const answer = await call(author, 'POST', `/proposals/${id}/${act}`, { reason: 'Because' });
    expect(answer.status(), act).toBe(403);
    expect(((await answer.json()) as { detail: string }).detail).toContain('You wrote this proposal');
  }
  await author.goto(`/proposals/${id}`);
  for (const name of ['Agree', 'Publish', 'Return to the author', 'Decline'])
    await expect(author.getByRole('button', { name })).toHaveCount(0);
});

test('a page of another site cannot act for somebody who is signed in', async ({ as }) => {
  const page = await as('senior');
  const answer = await call(page, 'PATCH', '/me', { name: 'Somebody Else' }, { origin: 'http://elsewhere.example' });
  expect(answer.status()).toBe(403);
  expect(await (await call(page, 'GET', '/me')).json()).toMatchObject({ name: 'Rowan Achterberg' });
});
