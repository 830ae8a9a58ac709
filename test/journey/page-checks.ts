import AxeBuilder from '@axe-core/playwright';
import { expect, type Page } from 'playwright/test';

/** Nothing that the accessibility checker finds, by the rules of WCAG 2.1 A and AA and its best practices. */
export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(
    violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html.slice(0, 120)).join(' | ')}`),
  ).toEqual([]);
}

/** The page as a whole never scrolls sideways. */
export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const [inner, outer] = await page.evaluate(() => [document.documentElement.scrollWidth, window.innerWidth] as const);
  expect(inner).toBeLessThanOrEqual(outer);
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
