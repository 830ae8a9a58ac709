import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'playwright/test';
import { complaintsOf, goTo } from './page-checks.ts';
import { rowsInPdf } from './printed-rows.ts';
import { Program } from './program.ts';

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

interface FiledRow {
  readonly score: number;
  readonly printed: string;
}

interface FiledSet {
  readonly check: string;
  readonly groups: readonly {
    readonly group: { readonly grade: string };
    readonly n: number;
    readonly rows: readonly FiledRow[];
  }[];
}

test('from the sample through the six stations to the booklet, workbook and csv on disk', async ({ page }) => {
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();

  await goTo(page, 'Cohort');
  await expect(page.getByText('4 863 − 51 = 4 812')).toBeVisible();
  await expect(page.getByLabel('Role of the column raw_score')).toHaveValue('score');

  await goTo(page, 'Groups');
  await expect(page.getByRole('textbox', { name: 'Title of Grade 5' })).toHaveValue('Grade 5');
  await page.getByRole('textbox', { name: 'Title of Grade 5' }).fill('Grade five');
  await page.keyboard.press('Tab');

  await goTo(page, 'Curve');
  await page.getByRole('button', { name: /below, plus half/ }).click();
  await expect(page.getByRole('radio', { name: /at the same score or below/ })).toContainText(
    /changes \d+ of 41 printed ranks/,
  );
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: /below, plus half/ })).toBeFocused();

  await goTo(page, 'Table');
  await page.getByRole('button', { name: 'Grade five' }).click();
  await page.getByRole('button', { name: /^percentile rank .*, raw score 24$/ }).click();
  await expect(page.getByText(/^100 × \(.*\) \/ .* = \d+\.\d+$/)).toBeVisible();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('button', { name: /^percentile rank .*, raw score 25$/ })).toBeFocused();
  const onScreen = await page
    .locator('table[aria-label^="Conversion table"] tbody tr')
    .evaluateAll((rows) =>
      rows.map((row) => [...row.querySelectorAll('td')].slice(0, 2).map((cell) => cell.textContent.trim())),
    );
  expect(onScreen).toHaveLength(41);

  await goTo(page, 'Sheet');
  await expect(page.getByText(/^page 1 of 3$/)).toBeVisible();
  await page.getByRole('button', { name: 'Page after' }).click();
  await expect(page.getByText(/^page 2 of 3$/)).toBeVisible();

  await goTo(page, 'Release');
  await page.getByRole('button', { name: 'Press a proof' }).click();
  await expect(page.getByText('Pressed.')).toBeVisible({ timeout: 60_000 });

  const [folder] = readdirSync(program.projects).map((name) => join(program.projects, name));
  if (folder === undefined) throw new Error('nothing was pressed');
  expect(readdirSync(folder).sort()).toEqual([
    'booklet.pdf',
    'certificate.json',
    'certificate.pdf',
    'norm-set.json',
    'tables.csv',
    'tables.xlsx',
  ]);
  await expect(page.getByText(/^Read back: .* cells compared, no difference\. Worked out a second time/)).toBeVisible();
  for (const name of readdirSync(folder)) {
    const hash = createHash('sha256')
      .update(readFileSync(join(folder, name)))
      .digest('hex');
    await expect(page.getByRole('row', { name: new RegExp(`^${name.replace('.', '\\.')}`) })).toContainText(hash);
  }

  const filed = JSON.parse(readFileSync(join(folder, 'norm-set.json'), 'utf8')) as FiledSet;
  await expect(page.getByText(`check code ${filed.check}`)).toBeVisible();
  const titles = ['Grade 4', 'Grade five', 'Grade 6'];
  const expected = filed.groups.flatMap(({ rows }, index) =>
    rows.map(({ score, printed }) => ({ group: titles[index] ?? '', score: String(score), printed })),
  );
  expect(expected).toHaveLength(3 * 41);
  const key = (row: { group: string; score: string; printed: string }): string =>
    `${row.group}|${row.score}|${row.printed}`;
  const inPdf = await rowsInPdf(new Uint8Array(readFileSync(join(folder, 'booklet.pdf'))));
  expect(inPdf.map(key).sort()).toEqual(expected.map(key).sort());
  expect(onScreen.map(([score = '', printed = '']) => key({ group: 'Grade five', score, printed })).sort()).toEqual(
    expected
      .filter(({ group }) => group === 'Grade five')
      .map(key)
      .sort(),
  );
  const [heading = [], ...lines] = readFileSync(join(folder, 'tables.csv'), 'utf8')
    .replace('\uFEFF', '')
    .trim()
    .split('\r\n')
    .map((line) => line.split(','));
  const places = ['group-title', 'raw-score', 'printed'].map((name) => heading.indexOf(name));
  const inCsv = lines.map((cells) => places.map((place) => cells[place] ?? '').join('|'));
  expect(inCsv.sort()).toEqual(expected.map(key).sort());

  // LibreOffice opens the workbook and gives its first sheet, the look-up, with its example computed.
  execFileSync('soffice', [
    '--headless',
    `-env:UserInstallation=file://${program.home}/office`,
    '--convert-to',
    'csv',
    '--outdir',
    program.home,
    join(folder, 'tables.xlsx'),
  ]);
  const lookUp = readFileSync(join(program.home, 'tables.csv'), 'utf8');
  const asked = /^Group,(.*)$/m.exec(lookUp)?.[1]?.replaceAll(',', '') ?? '';
  const score = /^Raw score,(\d+)/m.exec(lookUp)?.[1] ?? '';
  const answer = /^Percentile rank,([^,\r\n]+)/m.exec(lookUp)?.[1] ?? '';
  expect(expected.map(key)).toContain(`${asked}|${score}|${answer}`);
  expect(complaints).toEqual([]);
});
