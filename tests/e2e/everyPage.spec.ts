import type { Page } from '@playwright/test';
import type { ProposalSummary } from '@/domain/api/schemas/proposals';
import { expectNoFaults, expectSound } from './support/axe';
import { call } from './support/api';
import { alive, expect, expectNoSidewaysScroll, test } from './support/book';
import type { Who } from './support/people';
import { WritingDesk } from './support/writing';

interface Scene {
  name: string;
  who: Who | null;
  open: (page: Page, as: (who: Who) => Promise<Page>) => Promise<unknown>;
  allow?: RegExp[];
}

const at = (path: string, ready?: (page: Page) => Promise<unknown>) => async (page: Page) => {
  await page.goto(path);
  await alive(page);
  await ready?.(page);
};

/** The first proposal of a list that fits. */
async function proposalOf(page: Page, list: '/proposals' | '/review-desk', fits: (one: ProposalSummary) => boolean) {
  const { items } = (await (await call(page, 'GET', `${list}?limit=200`)).json()) as { items: ProposalSummary[] };
  const found = items.find(fits);
  expect(found, `a proposal on ${list}`).toBeDefined();
  return found!.id;
}

/** The writing desk on a sheet, at one of its places. */
const writing =
  (number: string, hash: string, then?: (desk: WritingDesk) => Promise<unknown>): Scene['open'] =>
  async (page) => {
    await page.goto(`/procedures/${number}`);
    await page.getByRole('button', { name: 'Propose a change' }).click();
    const desk = new WritingDesk(page);
    await desk.ready();
    await page.evaluate((to) => (location.hash = to), hash);
    await expect(desk.middle).toBeVisible();
    await then?.(desk);
  };

const judging =
  (then?: (page: Page) => Promise<unknown>): Scene['open'] =>
  async (page) => {
    const id = await proposalOf(page, '/review-desk', ({ number, critical }) => number === 'P-0142' && critical);
    await page.goto(`/proposals/${id}`);
    await alive(page);
    await then?.(page);
  };

const SCENES: Scene[] = [
  { name: 'sign-in', who: null, open: at('/sign-in') },
  { name: 'sign-in, refused', who: null, open: at('/sign-in?error=CredentialsSignin') },
  { name: 'look up, nothing asked', who: 'apprentice', open: at('/') },
  {
    name: 'look up, with hits',
    who: 'apprentice',
    open: at('/?q=89+lbf%C2%B7in+cover', (page) => expect(page.locator('mark').first()).toBeVisible()),
  },
  { name: 'look up, filtered', who: 'technician', open: at('/?engine=tarn-t24d') },
  { name: 'look up, no hits', who: 'technician', open: at('/?q=qqqqzzzz+wwwwxxxx') },
  { name: 'a sheet', who: 'apprentice', open: at('/procedures/P-0142') },
  { name: 'a sheet, for who may propose, in inch units', who: 'pierOwner', open: at('/procedures/P-0124') },
  { name: 'a sheet that was superseded', who: 'apprentice', open: at('/procedures/P-0142/revisions/A') },
  { name: 'a sheet that is withdrawn', who: 'apprentice', open: at('/procedures/P-0173') },
  { name: 'a sheet with a bulletin to sign', who: 'sawmillApprentice', open: at('/procedures/P-0137') },
  { name: 'look up, with a withdrawn sheet', who: 'apprentice', open: at('/?q=injector+return') },
  { name: 'bulletins', who: 'sawmillApprentice', open: at('/bulletins') },
  {
    name: 'withdrawing, on the sheet',
    who: 'editor',
    open: at('/procedures/P-0139', async (page) => {
      await page.getByRole('link', { name: 'Withdraw' }).filter({ visible: true }).click();
      await expect(page.getByRole('dialog', { name: 'Withdraw this sheet' })).toBeVisible();
    }),
  },
  { name: 'bringing back, on its own page', who: 'editor', open: at('/procedures/P-0173/bring-back') },
  { name: 'history of a withdrawn sheet', who: 'apprentice', open: at('/procedures/P-0173/revisions') },
  { name: 'history', who: 'apprentice', open: at('/procedures/P-0142/revisions') },
  { name: 'where each step and value comes from', who: 'apprentice', open: at('/procedures/P-0142/origins') },
  { name: 'proposing an old text again', who: 'senior', open: at('/procedures/P-0142/revisions/A/restore') },
  { name: 'the audit trail, for the steward', who: 'steward', open: at('/shop/audit') },
  { name: 'the audit trail, for an owner', who: 'northOwner', open: at('/shop/audit') },
  { name: 'raising a flag', who: 'apprentice', open: at('/procedures/P-0142/flag') },
  { name: 'flags', who: 'northSenior', open: at('/flags') },
  { name: 'two revisions compared', who: 'apprentice', open: at('/procedures/P-0142/compare?from=A&to=C') },
  {
    name: 'the menu of a person',
    who: 'apprentice',
    open: at('/handbook', (page) => page.getByLabel(/: profile, units and sign out/).click()),
  },
  {
    name: 'the notice without network',
    who: 'apprentice',
    open: at('/procedures/P-0137', (page) => page.context().setOffline(true)),
  },
  { name: 'handbook', who: 'apprentice', open: at('/handbook') },
  { name: 'the calculators', who: 'apprentice', open: at('/handbook/calculators') },
  {
    name: 'a calculator, for who sets the rules of its shop',
    who: 'sawmillOwner',
    open: at('/handbook/calculators/clamp', async (page) => {
      await page.getByRole('button', { name: 'Try a worked case' }).click();
      await expect(page.getByRole('heading', { name: 'How it is worked out' })).toBeVisible();
      await expect(page.getByRole('link', { name: 'Set it for your shop' })).toBeVisible();
    }),
  },
  {
    name: 'a calculator, with something that cannot be',
    who: 'apprentice',
    open: at('/handbook/calculators/units?measure=furlongs', (page) =>
      expect(page.getByText(/One entry cannot be used/)).toBeVisible(),
    ),
  },
  { name: 'rules of thumb', who: 'sawmillOwner', open: at('/shop/rules') },
  {
    name: 'rules of thumb, refused, for the steward',
    who: 'steward',
    allow: [/status of 422/],
    open: at('/shop/rules', async (page) => {
      await page.getByRole('textbox', { name: /Low below this share of proof/ }).fill('a third');
      await page.getByRole('button', { name: 'Save' }).click();
      await expect(page.locator('[aria-invalid="true"]').first()).toBeVisible();
    }),
  },
  { name: 'profile', who: 'pierOwner', open: at('/profile') },
  {
    name: 'profile, refused',
    who: 'pierOwner',
    allow: [/status of 422/],
    open: at('/profile', async (page) => {
      for (const field of ['Present password', 'New password again']) await page.getByLabel(field).fill('a');
      await page.getByLabel('New password', { exact: true }).fill('b');
      await page.getByRole('button', { name: 'Change password' }).click();
      await expect(page.locator('[aria-invalid="true"]').first()).toBeVisible();
    }),
  },
  { name: 'proposals, none yet', who: 'sawmillEditor', open: at('/proposals') },
  { name: 'proposals', who: 'senior', open: at('/proposals?show=all') },
  { name: 'a new procedure', who: 'senior', open: at('/procedures/new') },
  {
    name: 'a new procedure, from a template',
    who: 'senior',
    open: at('/procedures/new', (page) => page.getByRole('radio', { name: /^From a template/ }).check()),
  },
  {
    name: 'a new procedure, a document read',
    who: 'senior',
    open: at('/procedures/new', async (page) => {
      await page.getByRole('radio', { name: /^From a document/ }).check();
      await page
        .getByLabel(/paste/i)
        .fill('# Fit the belt\n\n## Look\n\nWarning: hot parts. Wait.\n\n## Fit\n\nTo 10 N·m.');
      await page.getByRole('button', { name: /^Read/ }).click();
      await expect(page.getByRole('heading', { name: 'What was found' })).toBeVisible();
    }),
  },
  {
    name: 'earlier versions of a draft',
    who: 'sawmillOwner',
    open: async (page) =>
      at(`/proposals/${await proposalOf(page, '/proposals', ({ state }) => state === 'returned')}/versions`)(page),
  },
  {
    name: 'an earlier version of a draft',
    who: 'sawmillOwner',
    open: async (page) =>
      at(`/proposals/${await proposalOf(page, '/proposals', ({ state }) => state === 'returned')}/versions/1`)(page),
  },
  { name: 'writing a step', who: 'pierEditor', open: writing('P-0121', '#step-marks') },
  { name: 'writing torques', who: 'pierEditor', open: writing('P-0121', '#torques') },
  { name: 'writing limits', who: 'pierEditor', open: writing('P-0121', '#limits') },
  { name: 'writing parts', who: 'pierEditor', open: writing('P-0121', '#parts') },
  { name: 'writing cautions', who: 'pierEditor', open: writing('P-0121', '#cautions') },
  { name: 'writing drawings', who: 'pierEditor', open: writing('P-0142', '#figures') },
  { name: 'writing the head of the sheet', who: 'pierEditor', open: writing('P-0121', '#sheet') },
  {
    name: 'writing, with something to mend',
    who: 'pierEditor',
    open: writing('P-0104', '#sheet', async (desk) => {
      await desk.middle.getByLabel('Title').fill('');
      await expect(desk.page.getByText(/to mend before it can be proposed/)).toBeVisible();
      await desk.page.getByRole('button', { name: 'Propose', exact: true }).click();
      await expect(desk.page.getByRole('alert').filter({ hasText: 'Not proposed' })).toBeVisible();
    }),
  },
  {
    name: 'writing, what changes',
    who: 'pierEditor',
    open: writing('P-0108', '#sheet', async (desk) => {
      await desk.middle.getByLabel('Title').fill('Reseal the oil pan, the long way');
      await desk.page.getByRole('button', { name: 'See what changes' }).click();
      await expect(desk.middle.getByText(/^What changes from revision/)).toBeVisible();
    }),
  },
  {
    name: 'writing, a menu of values',
    who: 'pierEditor',
    open: writing('P-0111', '', async (desk) => {
      await desk.middle.getByRole('button', { name: 'Torque', exact: true }).first().click();
    }),
  },
  {
    name: 'writing as text',
    who: 'pierEditor',
    open: writing('P-0118', '', async (desk) => {
      // The field comes in after the page and moves what stands below it.
      await expect(desk.how).toBeVisible();
      await desk.middle.getByRole('button', { name: 'Edit the whole sheet as text' }).click();
      await expect(desk.middle.getByLabel('The whole text')).toBeVisible();
    }),
  },
  {
    name: 'writing what was returned',
    who: 'sawmillOwner',
    open: async (page) => {
      const id = await proposalOf(page, '/proposals', ({ state }) => state === 'returned');
      await at(`/proposals/${id}/edit`)(page);
      await expect(page.getByRole('region', { name: 'Why it was returned' })).toBeVisible();
    },
  },
  {
    name: 'a returned proposal, for its author',
    who: 'sawmillOwner',
    open: async (page) =>
      at(`/proposals/${await proposalOf(page, '/proposals', ({ state }) => state === 'returned')}`)(page),
  },
  { name: 'the review desk', who: 'editor', open: at('/review-desk') },
  { name: 'the review desk, nothing waits', who: 'sawmillEditor', open: at('/review-desk') },
  { name: 'judging', who: 'editor', open: judging() },
  {
    name: 'judging, returning',
    who: 'editor',
    allow: [/status of 422/],
    open: judging(async (page) => {
      await page.getByRole('link', { name: 'Return with reasons' }).click();
      await page.getByRole('form', { name: 'Return with reasons' }).getByRole('button', { name: 'Return' }).click();
      await expect(page.getByText('Write why, so that the author can act on it')).toBeVisible();
    }),
  },
  {
    name: 'a proposal, for who only reads it',
    who: 'apprentice',
    open: async (page, as) => {
      const id = await proposalOf(await as('editor'), '/review-desk', ({ number }) => number === 'P-0142');
      await at(`/proposals/${id}`)(page);
      await expect(page.getByText(/Only an editor of the common book/)).toBeVisible();
    },
  },
  { name: 'not found', who: 'apprentice', open: at('/procedures/P-9999'), allow: [/status of 404/] },
  { name: 'not yours to do', who: 'apprentice', open: at('/review-desk'), allow: [/status of 403/] },
];

for (const { name, who, open, allow = [] } of SCENES)
  test(`${name}: axe at 1360 and 390, nothing sticks out at 390 and 320`, async ({ as }) => {
    const page = await as(who, { allow });
    await open(page, as);
    await expectSound(page);
  });

test('every page of the handbook: axe, and nothing sticks out', async ({ as }) => {
  test.setTimeout(120_000);
  const page = await as('apprentice');
  await page.goto('/handbook');
  const pages = await page
    .locator('main a[href^="/handbook/"]')
    .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
  expect(pages.length).toBeGreaterThanOrEqual(8);
  for (const path of pages) {
    await page.goto(path);
    await page.setViewportSize({ width: 390, height: 900 });
    await expectNoFaults(page);
    await expectNoSidewaysScroll(page, 320);
  }
});

test('every sheet of the common book: nothing sticks out, no drawing is missing', async ({ as }) => {
  test.setTimeout(120_000);
  const page = await as('steward');
  const { items } = (await (await call(page, 'GET', '/procedures?limit=200')).json()) as {
    items: { number: string }[];
  };
  expect(items.length).toBeGreaterThanOrEqual(24);
  for (const { number } of items) {
    await page.goto(`/procedures/${number}`);
    await expectNoSidewaysScroll(page, 320);
    for (const image of await page.locator('main img').all()) {
      await image.scrollIntoViewIfNeeded();
      await expect.poll(() => image.evaluate((img) => (img as HTMLImageElement).naturalWidth)).toBeGreaterThan(0);
    }
  }
});
