import { expect, test as base } from './support/book';
import { emptyFolder, runScript, startServer, type OwnServer } from './support/server';

const DATA_DIR = 'data/e2e-plain';
const STEWARD = { name: 'Wilhelmina Sorley', email: 'first@network.example', password: 'a long first password' };

/** A server as a real network starts it: no demonstration, its first steward made on the command line. */
const test = base.extend<object, { plain: OwnServer }>({
  plain: [
    async ({}, use, { config }) => {
      const port = Number(new URL(config.projects[0]!.use.baseURL!).port) + 1;
      await emptyFolder(DATA_DIR);
      const { name, email, password } = STEWARD;
      const args = ['--name', name, '--email', email, '--password', password];
      expect((await runScript('scripts/admin-create.ts', args, DATA_DIR)).stdout).toContain(`Made ${name} the steward`);
      await expect(runScript('scripts/admin-create.ts', args, DATA_DIR)).rejects.toThrow();
      const server = await startServer(port, DATA_DIR, '0');
      await use(server);
      await server.stop();
    },
    { scope: 'worker', timeout: 120_000 },
  ],
});

test('without the demonstration nobody signs in with one press, nor with its password', async ({ as, plain }) => {
  const page = await as(null, { baseURL: plain.origin });
  await page.goto('/');
  await expect(page).toHaveURL(/\/sign-in/);
  await expect(page.getByText('demonstration')).toHaveCount(0);
  await expect(page.locator('main').getByRole('button')).toHaveCount(1);
  await page.getByLabel('E-mail').fill('steward@halden.example');
  await page.getByLabel('Password').fill('matchmark-demo');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page.getByText('The e-mail address and the password do not belong together.')).toBeVisible();
});

test('the book of a plain server holds the shipped procedures and nothing of the demonstration', async ({
  as,
  plain,
}) => {
  const page = await as(null, { baseURL: plain.origin });
  const answer = await page.request.get('/api/auth/csrf');
  const { csrfToken } = (await answer.json()) as { csrfToken: string };
  await page.request.post('/api/auth/callback/credentials', {
    form: { csrfToken, email: STEWARD.email, password: STEWARD.password },
  });
  const { items } = (await (await page.request.get('/api/v1/procedures?limit=200')).json()) as {
    items: { number: string; book: { kind: string }; revision: { letter: string } }[];
  };
  expect(items.length).toBeGreaterThanOrEqual(24);
  expect(items.every(({ book, revision }) => book.kind === 'common' && revision.letter === 'A')).toBe(true);
  await page.goto('/procedures/P-0142');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Reseal the valve cover');
});

test('the first steward signs in, changes the password, and ends every session', async ({ as, plain }) => {
  const signInAs = async (password: string) => {
    const page = await as(null, { baseURL: plain.origin, allow: [/status of 422/] });
    await page.goto('/sign-in?to=/profile');
    await page.getByLabel('E-mail').fill(STEWARD.email);
    await page.getByLabel('Password').fill(password);
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    return page;
  };
  const page = await signInAs(STEWARD.password);
  await expect(page).toHaveURL('/profile');
  await expect(page.getByLabel('Name')).toHaveValue(STEWARD.name);
  const elsewhere = await signInAs(STEWARD.password);
  await expect(elsewhere).toHaveURL('/profile');

  const change = async (present: string, next: string, again = next) => {
    await page.getByLabel('Present password').fill(present);
    await page.getByLabel('New password', { exact: true }).fill(next);
    await page.getByLabel('New password again').fill(again);
    await page.getByRole('button', { name: 'Change password' }).click();
  };
  const faults = page.locator('[aria-invalid="true"]');
  await change('wrong', 'another long password');
  await expect(faults).toHaveAttribute('name', 'current');
  await change(STEWARD.password, 'short');
  await expect(faults).toHaveAttribute('name', 'next');
  await change(STEWARD.password, 'another long password', 'another wrong password');
  await expect(faults).toHaveAttribute('name', 'repeat');
  await change(STEWARD.password, 'another long password');
  await expect(page.getByText('Password changed')).toBeVisible();

  await elsewhere.reload();
  await expect(elsewhere).toHaveURL(/\/sign-in/);
  const again = await signInAs('another long password');
  await expect(again).toHaveURL('/profile');
  await again.getByRole('button', { name: 'Sign out everywhere' }).click();
  await expect(again.getByText('Signed out everywhere.')).toBeVisible();
  await page.reload();
  await expect(page).toHaveURL(/\/sign-in/);
});
