import { expect, test as base, type BrowserContextOptions, type Page } from '@playwright/test';
import { unexpected, watchFaults, type Faults } from './faults';
import { PASSWORD, PEOPLE, type Who } from './people';

interface Fixtures {
  /**
   * A page in a browser of somebody's own, signed in; a visitor's where it is null. Whatever the browser does wrong
   * fails the test, but for the errors of `allow`.
   */
  as: (who: Who | null, options?: BrowserContextOptions & { allow?: RegExp[] }) => Promise<Page>;
}

/** Signs a page's browser in through the calls that the sign-in page makes. */
export async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
  const { csrfToken } = (await (await page.request.get('/api/auth/csrf')).json()) as { csrfToken: string };
  const answer = await page.request.post('/api/auth/callback/credentials', {
    form: { csrfToken, email, password, callbackUrl: '/profile' },
    maxRedirects: 0,
  });
  expect(answer.headers()['location'], `${email} signs in`).toMatch(/\/profile$/);
}

export const test = base.extend<Fixtures>({
  as: async ({ browser, baseURL }, use) => {
    const opened: { faults: Faults; close: () => Promise<void> }[] = [];
    await use(async (who, { allow = [], ...options } = {}) => {
      const context = await browser.newContext({ viewport: { width: 1360, height: 900 }, ...options });
      const faults = watchFaults(context, new URL(options.baseURL ?? baseURL ?? '').host);
      faults.allow.push(...allow);
      opened.push({ faults, close: () => context.close() });
      const page = await context.newPage();
      if (who) await signIn(page, PEOPLE[who]);
      return page;
    });
    const faults = opened.flatMap((one) => unexpected(one.faults));
    for (const { close } of opened) await close();
    expect(faults, 'what the browsers did wrong').toEqual([]);
  },
});
export { expect };

/** Waits until every island of the page has come to life. */
export async function alive(page: Page): Promise<void> {
  await expect(page.locator('astro-island[ssr]')).toHaveCount(0);
}

/** At this width nothing may stick out sideways. */
export async function expectNoSidewaysScroll(page: Page, width: number): Promise<void> {
  await page.setViewportSize({ width, height: 800 });
  await expect
    .poll(() => page.evaluate(() => document.documentElement.scrollWidth - innerWidth), `${page.url()} at ${width} px`)
    .toBeLessThanOrEqual(0);
}
