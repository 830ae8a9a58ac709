import { expect, test } from 'playwright/test';
import { complaintsOf, goTo } from './page-checks.ts';
import { Program } from './program.ts';

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

test('a rank is changed by hand with a reason, refused out of order, and taken back', async ({ page }) => {
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();
  await goTo(page, 'Table');
  const cell = page.getByRole('button', { name: /^percentile rank .*, raw score 24$/ });
  await cell.click();
  const before = Number(await cell.textContent());

  await page.getByRole('button', { name: 'Change the printed rank by hand' }).click();
  const rank = page.getByLabel('Rank to print at raw score 24');
  await expect(rank).toHaveValue(String(before));
  await rank.fill('99');
  await page.getByRole('button', { name: 'Change the printed rank', exact: true }).click();
  await expect(page.getByRole('alert')).toHaveText('Give the reason; it is printed under the table.');
  await page.getByLabel('Reason, printed under the table').fill('Agreed with the board');
  await page.getByLabel('Who changes it').fill('M. Orr');
  await page.getByRole('button', { name: 'Change the printed rank', exact: true }).click();
  await expect(page.getByRole('alert')).toContainText('a better score may not print a lower rank');
  await rank.fill(String(before + 1));
  await page.getByRole('button', { name: 'Change the printed rank', exact: true }).click();

  await expect(cell).toHaveText(`${before + 1}†`);
  await expect(page.getByText(/^Adjusted by hand \(Agreed with the board; M\. Orr\), from/)).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(cell).toHaveText(String(before));
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect(cell).toHaveText(`${before + 1}†`);
  await page.getByRole('button', { name: /^Withdraw the adjustment of/ }).click();
  await expect(cell).toHaveText(String(before));
  expect(complaints).toEqual([]);
});

test('a policy is shown, refused where it cannot be used, and asks by its own thresholds', async ({ page }) => {
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();
  await goTo(page, 'Groups');
  await expect(page.getByRole('row', { name: /^Group without a query at least 200 common practice$/ })).toBeVisible();
  await page.getByRole('button', { name: 'Show or change the policy’s text' }).click();
  const text = page.getByLabel(/^Text of the policy/);
  const usual = await text.inputValue();
  await text.fill(usual.replace('"value": 200', '"value": -1'));
  await page.getByRole('button', { name: 'Use this policy' }).click();
  await expect(page.getByRole('alert')).toContainText('smallest-should.value: a number of 0 or more.');
  await page.getByLabel('Choose a policy file').setInputFiles({
    name: 'office.policy.json',
    mimeType: 'application/json',
    buffer: Buffer.from(
      usual.replace('"value": 200,\n  "source": "common practice"', '"value": 5000, "source": "Rules, 3"'),
    ),
  });
  await expect(text).toHaveValue(/Rules, 3/);
  await page.getByRole('button', { name: 'Use this policy' }).click();
  await expect(page.getByText(/Only 1\u202f598 pupils in Grade 4\./)).toBeVisible();
  await expect(page.getByText(/Policy: at least 5\u202f000 \(Rules, 3\)\./).first()).toBeVisible();
  expect(complaints).toEqual([]);
});
