import { expect, test, type Page } from 'playwright/test';
import { goTo } from './page-checks.ts';
import { Program } from './program.ts';

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

const PUPILS = `id,grade,mark\n${Array.from({ length: 60 }, (_, index) => `${index},${4 + (index % 2)},${index % 21}`).join('\n')}\n`;
const OTHERS = `note;klasse\n${Array.from({ length: 22 }, (_, index) => `${index % 11};x`).join('\n')}\n`;

async function bring(page: Page, name: string, text: string): Promise<void> {
  await page.locator('input[type="file"]').setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(text) });
}

async function chooseMissing(page: Page, code: string): Promise<void> {
  await page.locator('[data-choice="missing"]').click();
  await page.getByRole('textbox', { name: 'Codes that stand for a missing score' }).fill(code);
  await page.getByRole('button', { name: 'Use these codes' }).click();
}

async function startWithPupils(page: Page): Promise<void> {
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'New norm project' }).click();
  await bring(page, 'pupils.csv', PUPILS);
  await expect(page.getByText('60 kept, 0 left out')).toBeVisible();
}

test('undo brings back the file, its first rows and its tally', async ({ page }) => {
  await startWithPupils(page);
  const undo = page.getByRole('button', { name: 'Undo' });

  await page.getByLabel('separator').selectOption(';');
  await expect(page.getByText('Give one column the role “raw score”')).toBeVisible();
  await expect(page.getByRole('alert')).toHaveCount(0);
  await expect(page.getByText('no scores yet')).toBeVisible();
  await undo.click();
  await expect(page.getByLabel('Role of the column mark')).toHaveValue('score');
  await expect(page.getByText('60 kept, 0 left out')).toBeVisible();

  await bring(page, 'others.csv', OTHERS);
  await expect(page.getByText('22 kept, 0 left out')).toBeVisible();
  await undo.click();
  await expect(page.getByLabel('Role of the column mark')).toHaveValue('score');
  await chooseMissing(page, '20');
  await expect(page.getByText('58 kept, 2 left out')).toBeVisible();

  await page.getByRole('button', { name: 'Type or paste counts' }).click();
  await page.getByRole('textbox', { name: 'Counts, one score and its count a line' }).fill('0 3\n1 4');
  await page.getByRole('button', { name: 'Take these counts' }).click();
  await expect(page.getByText('2 kept, 0 left out')).toBeVisible();
  await undo.click();
  await chooseMissing(page, '20, 19');
  await expect(page.getByText('56 kept, 4 left out')).toBeVisible();
});

test('no number stands beside a reading that did not make it', async ({ page }) => {
  await startWithPupils(page);
  await page.locator('[data-choice="scale"]').click();
  await page.getByRole('textbox', { name: 'Lowest score' }).fill('100');
  await page.getByRole('textbox', { name: 'Highest score' }).fill('200');
  await page.getByRole('button', { name: 'Use this scale' }).click();
  await expect(page.getByRole('alert')).toContainText('None of the 60 rows can be counted');
  await expect(page.getByText('no scores yet')).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText('60 kept, 0 left out')).toBeVisible();
  await expect(page.getByRole('alert')).toHaveCount(0);

  let slow = true;
  await page.route('**/desk', async (route) => {
    if (slow && (route.request().postData() ?? '').includes('"tally-cohort"')) {
      await new Promise((resolve) => setTimeout(resolve, 400));
    }
    await route.continue();
  });
  await chooseMissing(page, '20');
  await page.getByRole('button', { name: 'Undo' }).click();
  await page.waitForResponse((response) => (response.request().postData() ?? '').includes('"tally-cohort"'));
  await expect(page.getByText('60 kept, 0 left out')).toBeVisible();
  slow = false;
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect(page.getByText('58 kept, 2 left out')).toBeVisible();
});

test('a file of the same name is read as the one before it', async ({ page }) => {
  await startWithPupils(page);
  await chooseMissing(page, '20');
  await page.locator('[data-choice="scale"]').click();
  await page.getByRole('textbox', { name: 'Highest score' }).fill('30');
  await page.getByRole('button', { name: 'Use this scale' }).click();
  await expect(page.getByText('58 kept, 2 left out')).toBeVisible();
  await bring(page, 'pupils.csv', `${PUPILS}60,5,30\n`);
  await expect(page.getByText('59 kept, 2 left out')).toBeVisible();
  await expect(page.locator('[data-choice="scale"]')).toHaveText(/0 to 30/);
});

test('an emptied title of a group gives way to its standing title, two alike are asked about', async ({ page }) => {
  await startWithPupils(page);
  await goTo(page, 'Groups');
  const titles = page.getByRole('textbox', { name: /^Title of/ });
  await titles.first().fill('   ');
  await titles.first().press('Tab');
  await expect(titles.first()).toHaveValue('Grade 4');
  await titles.nth(1).fill('Grade 4');
  await titles.nth(1).press('Tab');
  await expect(page.getByText('More than one table is called Grade 4.')).toBeVisible();
});
