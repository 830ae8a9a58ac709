import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { expect, test, type Page } from 'playwright/test';
import {
  complaintsOf,
  DARK,
  expectAccessible,
  goTo,
  keepPicture,
  LARGE,
  type Look,
  showIn,
  SMALL,
} from './page-checks.ts';
import { Program } from './program.ts';

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

/** Keeps a picture of a station in a size and a scheme. */
async function picture(page: Page, name: string, look: Look): Promise<void> {
  await showIn(page, look);
  await keepPicture(page, `class-${name}`, look);
}

/** The same, and what the accessibility checker finds there. */
async function lookAt(page: Page, name: string, look: Look): Promise<void> {
  await picture(page, name, look);
  await expectAccessible(page);
}

/** A page is higher than wide once it is drawn. */
async function pageDrawn(page: Page, text: RegExp): Promise<void> {
  await expect(page.getByText(text)).toBeVisible({ timeout: 30_000 });
  await expect
    .poll(() => page.locator('main canvas').evaluate((canvas: HTMLCanvasElement) => canvas.height > canvas.width))
    .toBe(true);
}

/** Thirty-one rows as a spreadsheet gives them: three absent, one score too high, one name twice, one name with "=". */
const ROWS: readonly (readonly [string, string])[] = [
  ['=Una Marsh', '21'],
  ['Bram Tolly', '99'],
  ['Ceri Quill', 'absent'],
  ['Dov Ister', 'absent'],
  ['Edda Wray', 'absent'],
  ['Fenn Orrick', '17'],
  ['Fenn Orrick', '24'],
  ...Array.from({ length: 24 }, (_, index): readonly [string, string] => [
    `Pupil ${String.fromCharCode(65 + index)} Harrow`,
    String(8 + ((index * 7) % 30)),
  ]),
];
const PASTED = ['Name\tRaw score', ...ROWS.map((cells) => cells.join('\t'))].join('\n');

function bytesWithName(folder: string, file: string): boolean {
  const bytes = readFileSync(join(folder, file));
  return bytes.includes('Una Marsh') || bytes.includes('Fenn Orrick');
}

test('a pasted list of thirty-one becomes a report and slips, and the key to its codes stays apart', async ({
  page,
}) => {
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await expect(page.getByRole('heading', { name: 'Normloom' })).toBeVisible();
  await page.getByRole('button', { name: 'Class report' }).click();
  await page.getByRole('button', { name: 'The table of the sample' }).click();
  await expect(page.getByRole('main')).toContainText('Scores are looked up in');
  await lookAt(page, 'table', SMALL);

  await goTo(page, 'List');
  await page.getByLabel('Class', { exact: true }).fill('Class 5a');
  await page.getByLabel(/^The list: one line for each/).fill(PASTED);
  await page.getByRole('button', { name: 'Read this list' }).click();
  await expect(page.getByLabel('What Name holds')).toHaveValue('name');
  await expect(page.getByLabel('What Raw score holds')).toHaveValue('score');
  await lookAt(page, 'incoming', DARK);
  await page.getByRole('button', { name: 'Take these 31 rows' }).click();
  await expect(page.getByLabel('Name, line 2', { exact: true })).toHaveValue('=Una Marsh');
  await picture(page, 'list', SMALL);

  await goTo(page, 'Questions');
  await expect(page.getByRole('button', { name: /^Questions/ })).toContainText('2 of 2 open');
  const tooHigh = page.getByRole('group', { name: /^Line 3: the score “99” lies above/ });
  await tooHigh.getByLabel('Type the right score').check();
  await tooHigh.getByRole('textbox').fill('1000');
  await tooHigh.getByRole('textbox').press('Tab');
  await expect(tooHigh.getByRole('alert')).toContainText('lies above');
  await tooHigh.getByRole('textbox').fill('29');
  await tooHigh.getByRole('textbox').press('Tab');
  await expect(tooHigh).toContainText('Answered.');
  await lookAt(page, 'questions', DARK);
  await page
    .getByRole('group', { name: /^Lines 7 and 8/ })
    .getByLabel('One pupil: keep line 8 only')
    .check();
  await expect(page.getByRole('button', { name: /^Questions/ })).toContainText('2 answered');

  await goTo(page, 'Report');
  await pageDrawn(page, /^page 1 of \d+$/);
  await expect(page.getByRole('row', { name: 'absent 3' })).toBeVisible();
  await lookAt(page, 'report', SMALL);
  await goTo(page, 'Slips');
  await pageDrawn(page, /^page 1 of 7$/);
  await lookAt(page, 'slips', LARGE);

  await goTo(page, 'Sharing and press');
  await page.getByRole('radio', { name: /^With codes/ }).check();
  await page.getByRole('button', { name: 'Press', exact: true }).click();
  await expect(page.getByText('Pressed.')).toBeVisible({ timeout: 60_000 });
  await lookAt(page, 'press', DARK);
  const key = await page.getByRole('table', { name: 'The key to the codes' }).getByRole('cell').first().innerText();
  const folder = folderOf(await page.getByText(/^Pressed\. The files lie in/).innerText());
  const files = readdirSync(folder);
  expect(files.filter((file) => file.endsWith('.pdf')).length).toBeGreaterThanOrEqual(2);
  expect(key).toContain('key');
  expect(bytesWithName(dirname(folder), key)).toBe(true);
  expect(readFileSync(join(dirname(folder), key), 'utf8')).toContain('=Una Marsh');
  expect(files.filter((file) => bytesWithName(folder, file))).toEqual([]);

  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByText(/^Saved \d\d:\d\d$/)).toBeVisible();
  await page.getByRole('radio', { name: /^As a summary/ }).check();
  await expect(page.getByText(/^Changed since/)).toBeVisible();
  await page.getByRole('button', { name: 'Normloom' }).click();
  await expect(page.getByRole('dialog', { name: 'Class 5a is not saved' })).toBeVisible();
  await page.getByRole('button', { name: 'Leave without saving' }).click();
  await page.getByRole('button', { name: 'Class 5a' }).click();
  await goTo(page, 'Questions');
  await expect(page.getByRole('button', { name: /^Questions/ })).toContainText('2 answered');
  expect(complaints).toEqual([]);
});

function folderOf(line: string): string {
  return /lie in (.*)\.$/.exec(line.split('\n')[0] ?? '')?.[1] ?? '';
}

test('a published table is typed in, its gap is told by line, and a class is looked up in it', async ({ page }) => {
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Class report' }).click();
  await page.getByRole('button', { name: 'A published table' }).click();
  const lines = page.getByLabel(/^Lines of the table/);
  await lines.fill('0-4 <1\n5-9 12\n11 40\n12-20 >99');
  await page.getByRole('button', { name: 'Take this table' }).click();
  await expect(page.getByRole('alert')).toContainText('Give the test its title');
  await page.getByLabel('Title of the test').fill('Harbour spelling test');
  await page.getByLabel('Where it is printed').fill('Harbour tests, manual, table 3');
  await page.getByRole('button', { name: 'Take this table' }).click();
  await expect(page.getByRole('alert')).toContainText('Line 3: Score 10 has no rank');
  await lookAt(page, 'published', SMALL);
  await lines.fill('0-4 <1\n5-9 12\n10-11 40\n12-20 >99');
  await page.getByRole('button', { name: 'Take this table' }).click();
  await expect(page.getByText('Scores are looked up in “Harbour spelling test”.')).toBeVisible();
  await expect(page.getByText('Harbour tests, manual, table 3')).toBeVisible();

  await goTo(page, 'List');
  const more = page.getByRole('form', { name: 'One more' });
  for (const [name, score] of [
    ['Ada Lorne', '7'],
    ['=Ben Stroud', '20'],
  ] as const) {
    await more.getByLabel('Name').fill(name);
    await more.getByLabel('Raw score').fill(score);
    await more.getByRole('button', { name: 'Add a row' }).click();
  }
  await expect(page.getByRole('row', { name: /rank 12/ })).toBeVisible();
  await expect(page.getByRole('row', { name: /rank >99/ })).toBeVisible();
  await lookAt(page, 'typed', LARGE);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByRole('row', { name: /rank >99/ })).toBeHidden();
  await page.getByRole('button', { name: 'Redo' }).click();

  await goTo(page, 'Report');
  await pageDrawn(page, /^page 1 of \d+$/);
  await goTo(page, 'Sharing and press');
  await page.getByRole('button', { name: 'Press', exact: true }).click();
  await expect(page.getByText('Pressed.')).toBeVisible({ timeout: 60_000 });
  const folder = folderOf(await page.getByText(/^Pressed\. The files lie in/).innerText());
  const files = readdirSync(folder);
  expect(readFileSync(join(folder, files.find((file) => file.endsWith('.csv')) ?? ''), 'utf8')).toContain(
    '=Ben Stroud',
  );
  expect(files.filter((file) => /Stroud|Lorne/.test(file))).toEqual([]);
  expect(complaints).toEqual([]);
});
