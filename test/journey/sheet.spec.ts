import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test, type Page } from 'playwright/test';
import { readPdf, type PlacedText } from '../src-main/press/pdf-text.ts';
import { complaintsOf, expectAccessible, expectNoSidewaysScroll, goTo } from './page-checks.ts';
import { Program } from './program.ts';

const POINTS_PER_MM = 72 / 25.4;

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

async function openSheet(page: Page): Promise<void> {
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();
  await goTo(page, 'Sheet');
}

async function choose(page: Page, choice: string, label: string): Promise<void> {
  await page.locator(`[data-choice="${choice}"]`).click();
  await page.getByRole('radio', { name: new RegExp(`^${label}`) }).click();
}

/** The number of pages, once those on screen are those of the choices as they stand. */
async function drawnPages(page: Page): Promise<number> {
  await expect(page.locator('.page.stale')).toHaveCount(0, { timeout: 60_000 });
  const label = await page
    .getByRole('img', { name: /^Page \d+ of/ })
    .first()
    .getAttribute('aria-label');
  return Number(/^Page \d+ of (\d+)/.exec(label ?? '')?.[1]);
}

async function pressed(page: Page): Promise<readonly (readonly PlacedText[])[]> {
  await goTo(page, 'Release');
  await page.getByRole('button', { name: 'Press a proof' }).click();
  await expect(page.getByText('Pressed.')).toBeVisible({ timeout: 90_000 });
  const [folder] = readdirSync(program.projects).map((name) => join(program.projects, name));
  if (folder === undefined) throw new Error('nothing was pressed');
  return (await readPdf(new Uint8Array(readFileSync(join(folder, 'booklet.pdf'))))).pages;
}

/** Place of the first page that has a text, -1 where none has. */
function pageWith(pages: readonly (readonly PlacedText[])[], wanted: string): number {
  return pages.findIndex((items) => items.some(({ text }) => text.trim() === wanted));
}

test('a booklet of one’s own blocks is made, set and pressed', async ({ page }) => {
  const complaints = complaintsOf(page);
  await openSheet(page);
  expect(await drawnPages(page)).toBe(3);

  await choose(page, 'booklet', 'a whole booklet');
  await expect(page.getByText('whole booklet, A4')).toBeVisible();
  await page.getByLabel('Print the block Pictures').uncheck();
  await expect(page.getByText('booklet of 12 blocks, A4')).toBeVisible();
  await expect(page.locator('[data-choice="booklet"]')).toHaveText('12 blocks of your own choice');

  const cautions = page.getByRole('button', { name: 'Cautions', exact: true });
  await cautions.focus();
  for (let step = 0; step < 10; step += 1) {
    await page.keyboard.press('Alt+ArrowUp');
    await expect(cautions).toBeFocused();
  }
  await expect(page.getByText('Cautions is now block 1 of 13.')).toBeAttached();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.locator('li[data-block]').nth(1)).toHaveAttribute('data-block', 'cautions');
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect(page.locator('li[data-block]').first()).toHaveAttribute('data-block', 'cautions');

  await cautions.click();
  await page.getByRole('textbox', { name: 'Heading' }).fill('Take care');
  await page.getByRole('textbox', { name: 'Text', exact: true }).fill('Ask the school before use.');
  await page.keyboard.press('Tab');

  await choose(page, 'paper', 'A5');
  await choose(page, 'orientation', 'landscape');
  await choose(page, 'range-rows', 'one row for scores that print alike');
  await choose(page, 'fours', 'blank pages to a multiple of four');
  await page.locator('[data-choice="gutter"]').click();
  const gutter = page.getByLabel('More of it at the edge that is bound, millimetres');
  await gutter.fill('40');
  await page.getByRole('button', { name: 'Use this' }).click();
  await expect(page.getByRole('alert')).toHaveText('The binding edge takes from 0 to 30 millimetres more.');
  await gutter.fill('10');
  await page.getByRole('button', { name: 'Use this' }).click();
  await expect(page.locator('[data-choice="gutter"]')).toHaveText('10 mm more at the binding edge');

  const count = await drawnPages(page);
  expect(count).toBeGreaterThan(8);
  expect(count % 4).toBe(0);
  await expect(page.getByRole('button', { name: 'Show Cautions, page 1' })).toBeVisible();
  await page.getByRole('button', { name: /^Show Tables, pages/ }).click();
  await expect(page.getByLabel('What the page belongs to')).toContainText('Table 1 · Grade 4');
  await expect(page.getByRole('img', { name: /Table 1 · Grade 4/ })).toBeVisible();

  const pages = await pressed(page);
  expect(pages).toHaveLength(count);
  const order = ['Take care', 'Contents', 'How to read the tables', 'Cut scores', 'Technical notes', 'Colophon'];
  const places = order.map((heading) => pageWith(pages, heading));
  expect(places[0]).toBe(0);
  expect(places).toEqual(places.toSorted((left, right) => left - right));
  expect(places).not.toContain(-1);
  expect(pageWith(pages, 'Ask the school before use.')).toBe(0);
  expect(pageWith(pages, 'Pictures')).toBe(-1);
  expect(pageWith(pages, '39–40')).toBeGreaterThan(0);
  // A sheet on its side is wider than 420 points, and what stands at its left moves away from the fold.
  const all = pages.flat();
  expect(Math.max(...all.map(({ x }) => x))).toBeGreaterThan(450);
  expect(Math.max(...all.map(({ y }) => y))).toBeLessThan(419.53);
  const leftOf = (items: readonly PlacedText[]): number => Math.min(...items.map(({ x }) => x));
  const [odd = [], even = []] = pages.slice(1).filter((items) => items.length > 0);
  expect(Math.abs(leftOf(even) - leftOf(odd))).toBeCloseTo(10 * POINTS_PER_MM, 0);
  expect(complaints).toEqual([]);
});

test('the pages are gone through by number, by block and side by side, and blocks are dragged', async ({ page }) => {
  const complaints = complaintsOf(page);
  await openSheet(page);
  expect(await drawnPages(page)).toBe(3);
  const shown = page.getByLabel('Page shown, of 3');
  await page.getByRole('button', { name: 'Page after' }).click();
  await expect(shown).toHaveValue('2');
  await shown.fill('3');
  await shown.press('Enter');
  await expect(page.getByRole('img', { name: /^Page 3 of 3, Table 3/ })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Page after' })).toBeDisabled();
  await shown.fill('9');
  await shown.press('Enter');
  await expect(shown).toHaveValue('3');
  await page.getByLabel('What the page belongs to').selectOption('Table 1 · Grade 4');
  await expect(shown).toHaveValue('1');
  await page.getByLabel('facing pages').check();
  await expect(page.getByRole('img', { name: /^Page/ })).toHaveCount(1);
  await page.getByRole('button', { name: 'Page after' }).click();
  await expect(page.getByRole('img', { name: /^Page/ })).toHaveCount(2);
  await expectAccessible(page);
  await expectNoSidewaysScroll(page);

  const blocks = page.locator('li[data-block]');
  await blocks.nth(4).hover();
  await blocks.nth(4).locator('.grip').dragTo(blocks.first());
  await expect(blocks.first()).toHaveAttribute('data-block', 'tables');
  await page.getByRole('button', { name: 'Put the usual order back' }).click();
  await expect(blocks.nth(4)).toHaveAttribute('data-block', 'tables');
  await page.getByRole('button', { name: 'Print Tables one place later' }).click();
  await expect(blocks.nth(5)).toHaveAttribute('data-block', 'tables');
  await expect(page.getByRole('button', { name: 'Print Tables one place later' })).toBeFocused();
  expect(complaints).toEqual([]);
});

test('cut scores are named, refused where nobody can score so, changed and removed', async ({ page }) => {
  const complaints = complaintsOf(page);
  await openSheet(page);
  await page.getByRole('button', { name: 'Cut scores', exact: true }).click();
  await page.getByRole('button', { name: 'Name a cut score' }).click();
  await page.getByLabel('Name, as it is printed').fill('Extension');
  await page.getByLabel('Raw score').fill('33,5');
  await page.getByLabel('For which groups').selectOption('Grade 5');
  await page.getByRole('button', { name: 'Add this cut score' }).click();
  await expect(page.getByRole('alert')).toContainText('Nobody can have this score: the scores go from 0 to 40.');
  await page.getByLabel('Raw score').fill('33');
  await page.getByRole('button', { name: 'Add this cut score' }).click();
  await expect(page.getByText('Extension: 33, Grade 5')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Name a cut score' })).toBeFocused();
  await expectAccessible(page);

  await page.getByRole('button', { name: 'Change the cut score Extension, Grade 5' }).click();
  await expect(page.getByLabel('Raw score')).toHaveValue('33');
  await page.getByLabel('Raw score').fill('34');
  await page.getByRole('button', { name: 'Use this' }).click();
  await expect(page.getByText('Extension: 34, Grade 5')).toBeVisible();
  await page.getByRole('button', { name: 'Remove the cut score Extension, Grade 5' }).click();
  await expect(page.getByText('Extension: 34, Grade 5')).toHaveCount(0);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText('Extension: 34, Grade 5')).toBeVisible();
  expect(complaints).toEqual([]);
});
