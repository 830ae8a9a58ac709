import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test, type Page } from 'playwright/test';
import { expectAccessible, goTo } from './page-checks.ts';
import { Program } from './program.ts';

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

/** An export with a byte order mark, semicolons, decimal commas, Windows line ends and one of each defect. */
const DIRTY = `\uFEFFCode;Klasse;Rohwert;Gewicht\r\n${[
  ...Array.from(
    { length: 60 },
    (_, index) =>
      `${String(index + 1).padStart(3, '0')};${index % 2 === 0 ? '07' : '08'};${index % 21};1,${(index % 5) * 2}5`,
  ),
  '001;07;3;1,05',
  '101;07;99;1,05',
  '102;07;;1,05',
  '103;08;krank;1,05',
  '104;08;7,5;1,05',
  '105;08;8',
  '',
  '106;08;31;1,05',
  '107;;9;1,05',
  '108;07;9;-1',
].join('\r\n')}\r\n`;

async function bring(page: Page, name: string, text: string): Promise<void> {
  await page.locator('input[type="file"]').setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(text) });
}

async function flowLine(page: Page, rule: string): Promise<string> {
  return page.getByRole('row', { name: new RegExp(`left out: ${rule}`) }).innerText();
}

test('a dirty file: every defect is found at its row, and undo and redo reach every choice', async ({ page }) => {
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'New norm project' }).click();
  await bring(page, 'erhebung.csv', DIRTY);
  await expect(page.getByText('Give one column the role “raw score”')).toBeVisible();
  await expect(page.getByLabel('separator')).toHaveValue(';');
  await expect(page.getByLabel('decimal mark')).toHaveValue(',');

  for (const [column, role] of [
    ['Code', 'id'],
    ['Klasse', 'group'],
    ['Rohwert', 'score'],
    ['Gewicht', 'weight'],
  ] as const) {
    await page.getByLabel(`Role of the column ${column}`).selectOption(role);
  }
  await page.locator('[data-choice="missing"]').click();
  await page.getByRole('textbox', { name: 'Codes that stand for a missing score' }).fill('99');
  await page.getByRole('button', { name: 'Use these codes' }).click();
  await page.locator('[data-choice="scale"]').click();
  await page.getByRole('textbox', { name: 'Lowest score' }).fill('0');
  await page.getByRole('textbox', { name: 'Highest score' }).fill('20');
  await page.getByRole('textbox', { name: 'Step' }).fill('1');
  await page.getByRole('button', { name: 'Use this scale' }).click();

  await expect(page.getByText('70 − 10 = 60')).toBeVisible();
  for (const [rule, row] of [
    ['an identifier met before', 62],
    ['a code for a missing score', 63],
    ['no score', 64],
    ['a score that is not a number', 65],
    ['a score between two steps', 66],
    ['more or fewer cells', 67],
    ['nothing in the row', 68],
    ['a score above the scale', 69],
    ['no value in a grouping column', 70],
    ['a weight that is not a number', 71],
  ] as const) {
    expect(await flowLine(page, rule)).toMatch(new RegExp(`− 1\\s+row ${row}$`));
  }
  await expectAccessible(page);

  await page.getByLabel('Rows with no value in a grouping column').selectOption('keep');
  await expect(page.getByText('70 − 9 = 61')).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText('70 − 10 = 60')).toBeVisible();
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect(page.getByText('70 − 9 = 61')).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();

  await goTo(page, 'Groups');
  await expect(page.getByRole('textbox', { name: 'Title of Klasse 07' })).toBeVisible();
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByText(/^Saved \d\d:\d\d$/)).toBeVisible();
  const [file] = readdirSync(program.projects).filter((name) => name.endsWith('.normloom'));
  const saved = JSON.parse(readFileSync(join(program.projects, file ?? ''), 'utf8')) as {
    readonly source: { readonly 'rows-read': number; readonly 'rows-kept': number };
  };
  expect([saved.source['rows-read'], saved.source['rows-kept']]).toEqual([70, 60]);
});

test('work that was not saved is offered again after the program was killed', async ({ page }) => {
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'New norm project' }).click();
  await page.getByRole('textbox', { name: 'Name of the survey or test' }).fill('Spelling, spring');
  await page.getByRole('button', { name: 'Type or paste counts' }).click();
  await page
    .getByRole('textbox', { name: 'Counts, one score and its count a line' })
    .fill('0 3\n1 9\n2 14\n3 8\n4 two');
  await page.getByRole('button', { name: 'Take these counts' }).click();
  await expect(page.getByText(/^Line 5: /)).toBeVisible();
  await page.getByRole('textbox', { name: 'Counts, one score and its count a line' }).fill('0 3\n1 9\n2 14\n3 8\n4 2');
  await page.getByRole('button', { name: 'Take these counts' }).click();
  await expect(page.getByText('nothing left out')).toBeVisible();
  await goTo(page, 'Curve');
  await page.getByRole('button', { name: /below, plus half/ }).click();
  await page.getByRole('radio', { name: /at the same score or below/ }).click();
  await expect(page.getByText(/^Draft kept \d\d:\d\d$/)).toBeVisible();

  await program.kill();
  await page.goto(await program.start());
  await expect(page.getByRole('heading', { name: 'Not saved when the program ended' })).toBeVisible();
  await page.getByRole('button', { name: 'Spelling, spring', exact: true }).click();
  await goTo(page, 'Curve');
  await expect(page.getByRole('button', { name: 'at the same score or below' })).toBeVisible();
  await goTo(page, 'Table');
  // 3 + 9 of 36 stand at 1 or below.
  await expect(page.getByRole('button', { name: 'percentile rank 33, raw score 1' })).toBeVisible();
  expect(existsSync(join(program.projects))).toBe(false);
});

test('a file that is no cohort is refused in a sentence, and nothing is lost', async ({ page }) => {
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'New norm project' }).click();
  await bring(page, 'report.pdf', '%PDF-1.7 and so on');
  await expect(page.getByRole('alert')).toContainText(/csv|xlsx/);
  await page.getByRole('button', { name: 'Close' }).click();
  await expect(page.getByText('Bring the raw scores of the cohort.')).toBeVisible();
});
