import AxeBuilder from '@axe-core/playwright';
import { expect, type Page } from 'playwright/test';

/**
 * Nothing that the accessibility checker finds, by the rules of WCAG 2.1 A and AA and its best practices. The page has no
 * frames: the mode without them is several times as quick.
 */
export async function expectAccessible(page: Page): Promise<void> {
  const checker = new AxeBuilder({ page }).options({ resultTypes: ['violations'] }).setLegacyMode(true);
  const { violations } = await checker.analyze();
  expect(
    violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html.slice(0, 120)).join(' | ')}`),
  ).toEqual([]);
}

/** The page as a whole never scrolls sideways. */
export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const [inner, outer] = await page.evaluate(() => [document.documentElement.scrollWidth, window.innerWidth] as const);
  expect(inner).toBeLessThanOrEqual(outer);
}

export interface Look {
  readonly width: number;
  readonly height: number;
  readonly scheme: 'light' | 'dark';
}

/** The least window, a usual one, and a dark one. */
export const SMALL: Look = { width: 1024, height: 700, scheme: 'light' };
export const LARGE: Look = { width: 1440, height: 900, scheme: 'light' };
export const DARK: Look = { width: 1280, height: 800, scheme: 'dark' };

/** The page in a size and a scheme: it never scrolls sideways. */
export async function showIn(page: Page, { width, height, scheme }: Look): Promise<void> {
  await page.setViewportSize({ width, height });
  await page.emulateMedia({ colorScheme: scheme });
  await page.waitForTimeout(150);
  await expectNoSidewaysScroll(page);
}

/** Keeps a picture of the page as it is shown. */
export async function keepPicture(page: Page, name: string, { width, scheme }: Look): Promise<void> {
  await page.screenshot({ path: `.cache/journey-pictures/${name}-${width}-${scheme}.png` });
}

/** Takes down what the page complains of: errors, and breaches of its own policy. */
export function complaintsOf(page: Page): readonly string[] {
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(error.message));
  return complaints;
}

export async function goTo(page: Page, station: string): Promise<void> {
  await page
    .getByRole('navigation', { name: 'Stations' })
    .getByRole('button', { name: new RegExp(`^${station}`) })
    .click();
  await expect(page.getByRole('main', { name: station })).toBeVisible();
}
