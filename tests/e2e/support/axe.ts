import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { expect, expectNoSidewaysScroll } from './book';

/** WCAG 2.2 A and AA, as axe-core tags its rules. */
const TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Nothing that axe finds wrong with the page as it stands. */
export async function expectNoFaults(page: Page, where = page.url()): Promise<void> {
  // Legacy mode looks at no frames of other origins; there are none, and it is much faster.
  const { violations } = await new AxeBuilder({ page }).setLegacyMode().withTags(TAGS).analyze();
  const found = violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`);
  expect(found, `axe: ${where}`).toEqual([]);
}

/** The same on a desk and on a phone, and nothing sticks out there or on a narrower one. Leaves the page as wide as a desk. */
export async function expectSound(page: Page): Promise<void> {
  for (const width of [1360, 390]) {
    await page.setViewportSize({ width, height: 900 });
    await expectNoFaults(page, `${page.url()} at ${width} px`);
    await expectNoSidewaysScroll(page, width);
  }
  await expectNoSidewaysScroll(page, 320);
  await page.setViewportSize({ width: 1360, height: 900 });
}
