import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test, type Page } from 'playwright/test';
import { complaintsOf, DARK, expectAccessible, goTo, keepPicture, LARGE, showIn, SMALL } from './page-checks.ts';
import { Program } from './program.ts';

const EDITION = 'edition-1.0.normedition';
const PRESSED = ['booklet.pdf', 'certificate.json', 'certificate.pdf', 'norm-set.json', 'tables.csv', 'tables.xlsx'];

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

/** Every file of a folder below the projects with its SHA-256. */
function bytesIn(name: string): Readonly<Record<string, string>> {
  const folder = join(program.projects, name);
  return Object.fromEntries(
    readdirSync(folder)
      .sort()
      .map((file) => [
        file,
        createHash('sha256')
          .update(readFileSync(join(folder, file)))
          .digest('hex'),
      ]),
  );
}

function folderNamed(ending: string): string {
  const found = readdirSync(program.projects).find((name) => name.endsWith(ending));
  if (found === undefined) throw new Error(`no folder ${ending} among ${readdirSync(program.projects).join(', ')}`);
  return found;
}

async function sign(page: Page, button: string, name: string): Promise<void> {
  await page.getByRole('button', { name: button }).click();
  const panel = page.getByRole('dialog', { name: 'Choose' });
  await panel.getByRole('textbox').fill(name);
  await panel.getByRole('button', { name: 'Done' }).click();
  await expect(panel).toBeHidden();
}

async function pick(page: Page, label: string, file: string | { name: string; mimeType: string; buffer: Buffer }) {
  await page.locator(`input[type="file"][aria-label="${label}"]`).setInputFiles(file);
}

function releaseButton(page: Page, edition: string) {
  return page.getByRole('main').getByRole('button', { name: `Release edition ${edition}` });
}

async function release(page: Page, edition: string): Promise<void> {
  await releaseButton(page, edition).click();
  await expect(page.getByText(`Edition ${edition} is released.`)).toBeVisible({ timeout: 90_000 });
}

/** Looks at the station in every size, at each of its parts. */
async function look(page: Page, name: string, parts: readonly string[]): Promise<void> {
  for (const each of [SMALL, LARGE, DARK]) {
    await showIn(page, each);
    if (each !== LARGE) await expectAccessible(page);
    for (const part of parts) {
      await page.getByRole('heading', { name: part }).evaluate((heading) => {
        heading.scrollIntoView({ block: 'start' });
      });
      await keepPicture(page, `${name}-${part.toLowerCase().replaceAll(/\W+/g, '-')}`, each);
    }
  }
  await showIn(page, { width: 1280, height: 860, scheme: 'light' });
}

test('an edition is signed, released, changed, compared, released again, and its erratum written', async ({ page }) => {
  test.setTimeout(300_000);
  const complaints = complaintsOf(page);
  await page.goto(await program.start());

  // From the sample to a released booklet in five decisions: open, the station, two signatures, the release.
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();
  await goTo(page, 'Release');
  await expect(page.getByRole('heading', { name: '2 things are missing' })).toBeVisible();
  await expect(releaseButton(page, '1.0')).toBeDisabled();
  await look(page, 'release-missing', ['2 things are missing', 'The press']);
  await sign(page, 'Sign as analyst', 'A. Weir');
  await sign(page, 'Sign as checker', 'a. weir');
  await expect(page.getByText('Analyst and checker are the same person.')).toBeVisible();
  await sign(page, 'Change who checked', 'J. Lund');
  await expect(page.getByRole('heading', { name: 'Nothing is missing' })).toBeVisible();
  await expect(page.getByText('prepared by A. Weir, checked by J. Lund')).toBeVisible();
  await release(page, '1.0');
  const first = folderNamed('– edition 1.0');
  const released = bytesIn(first);
  expect(Object.keys(released)).toEqual([...PRESSED, EDITION].sort());
  for (const [file, sha256] of Object.entries(released)) {
    await expect(page.getByRole('row', { name: new RegExp(`^${file.replaceAll('.', '\\.')}`) })).toContainText(sha256);
  }

  // A rank of the released table is changed by hand; under the same number that can be proofed, not released.
  await goTo(page, 'Table');
  const cell = page.getByRole('button', { name: /^percentile rank .*, raw score 24$/ });
  await cell.click();
  const before = Number(await cell.textContent());
  await page.getByRole('button', { name: 'Change the printed rank by hand' }).click();
  await page.getByLabel('Rank to print at raw score 24').fill(String(before + 1));
  await page.getByLabel('Reason, printed under the table').fill('Agreed with the board');
  await page.getByLabel('Who changes it').fill('M. Orr');
  await page.getByRole('button', { name: 'Change the printed rank', exact: true }).click();
  await expect(cell).toHaveText(`${before + 1}†`);
  await goTo(page, 'Release');
  await releaseButton(page, '1.0').click();
  await expect(page.getByRole('alert')).toContainText('Edition 1.0 was released before, with other contents', {
    timeout: 90_000,
  });
  await page.getByRole('alert').getByRole('button', { name: 'Close' }).click();
  expect(bytesIn(first)).toEqual(released);

  // Compared with the released edition cell by cell; the changes go into the change list, and the number must be raised.
  await pick(page, 'Compare with an earlier edition', join(program.projects, first, EDITION));
  await expect(page.getByText('Released, prepared by A. Weir, checked by J. Lund.')).toBeVisible();
  await expect(page.getByText(/^1 cell in 1 row changed\. /)).toBeVisible();
  await expect(page.getByRole('row', { name: `24 ${before} → ${before + 1}†` })).toBeVisible();
  await page.getByRole('button', { name: 'Put these changes in the change list' }).click();
  await expect(page.getByLabel(/^Change list since edition 1\.0/)).toHaveValue(
    new RegExp(`, raw score 24: ${before} → ${before + 1}†\\.`),
  );
  await expect(page.getByText('There is an edition 1.0 already, and it prints something else.')).toBeVisible();
  await expect(releaseButton(page, '1.0')).toBeDisabled();
  await page.getByRole('button', { name: 'Raise the number to 1.1' }).click();
  await expect(page.getByRole('heading', { name: 'Nothing is missing' })).toBeVisible();
  await release(page, '1.1');
  const second = folderNamed('– edition 1.1');
  expect(Object.keys(bytesIn(second))).toEqual([...PRESSED, 'edition-1.1.normedition'].sort());
  expect(bytesIn(first)).toEqual(released);

  // The erratum names those of a list whose printed value changes.
  const grade = (await page.getByRole('table', { name: /^Changed rows of Grade/ }).getAttribute('aria-label')) ?? '';
  const changed = grade.replace('Changed rows of Grade ', '');
  const roster = `name,grade,points\nAnn,${changed},24\nBen,${changed},25\nCai,9,24\n`;
  await pick(page, 'Choose a list of people', {
    name: 'class list.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from(roster),
  });
  await page.getByRole('combobox', { name: 'Raw score' }).selectOption('points');
  await expect(page.getByRole('combobox', { name: 'Grade' })).toHaveValue('grade');
  await expect(page.getByRole('combobox', { name: 'Name or code' })).toHaveValue('name');
  await page.getByRole('button', { name: 'Show whom it concerns' }).click();
  await expect(page.getByText('3 rows: 1 unchanged, 1 changed, 1 not found in both editions.')).toBeVisible();
  const concerned = page.getByRole('table', { name: 'People whom the erratum concerns' }).getByRole('row');
  await expect(concerned.nth(1)).toContainText(`Ann`);
  await expect(concerned.nth(1)).toContainText(`percentile rank ${before} → ${before + 1}†`);
  await look(page, 'release-compared', ['An earlier edition', 'The press', 'Erratum of edition']);
  await page.getByRole('button', { name: 'Write the erratum' }).click();
  await expect(page.getByText('Written.')).toBeVisible();
  const erratum = folderNamed('– erratum of edition 1.0, people');
  expect(Object.keys(bytesIn(erratum))).toEqual(['erratum-people.csv', 'erratum.csv', 'erratum.txt']);
  expect(readFileSync(join(program.projects, erratum, 'erratum.txt'), 'utf8')).toContain('Ann (Grade');
  for (const folder of [first, second]) expect(JSON.stringify(bytesIn(folder))).not.toContain('erratum');

  // The edition file opens as a project of its own that goes on from it.
  await page.getByRole('button', { name: 'Normloom' }).click();
  await pick(page, 'Open a project', join(program.projects, first, EDITION));
  await goTo(page, 'Release');
  await expect(page.getByText('This is edition 1.1,')).toBeVisible();
  await expect(page.getByText('prepared by (nobody yet), checked by (nobody yet)')).toBeVisible();
  await expect(page.getByText(/^No printed cell differs\. /)).toBeVisible();
  expect(bytesIn(first)).toEqual(released);
  expect(complaints).toEqual([]);
});

test('after a release one click goes on with the next edition, compared with the one just frozen', async ({ page }) => {
  test.setTimeout(200_000);
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();
  await goTo(page, 'Release');
  await sign(page, 'Sign as analyst', 'A. Weir');
  await sign(page, 'Sign as checker', 'J. Lund');
  await release(page, '1.0');
  await page.getByRole('button', { name: 'Go on with edition 1.1' }).click();
  await expect(page.getByText('This is edition 1.1,')).toBeVisible();
  await expect(page.getByText(/^No printed cell differs\. /)).toBeVisible();
  await expect(page.getByRole('heading', { name: '2 things are missing' })).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText('Edition 1.0 is released.')).toBeVisible();
  expect(complaints).toEqual([]);
});
