import { execFileSync } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import ExcelJS from 'exceljs';
import Papa from 'papaparse';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { printCount } from '../../../shared-core/scores/printed-number.ts';
import { FIRST_RESULT_ROW, GROUP_CELL, LOOK_UP, SCORE_CELL } from '../../../src-main/press/look-up-sheet.ts';
import { typedCell } from '../../../src-main/press/typed-cell.ts';
import { tablesWorkbook } from '../../../src-main/press/workbook.ts';
import { sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

const normSet = sampleNormSet({ scale: { min: -2, max: 20, step: 0.5 }, groups: ['4', '5'] }, (project) => ({
  ...project,
  title: '=HYPERLINK("x")',
  table: { ...project.table, columns: ['count', 'z', 'stanine'] },
  groups: {
    ...project.groups,
    choices: [{ values: ['5'], title: '=A1* & "co"?', printed: true }],
  },
}));

async function open(bytes: Uint8Array): Promise<ExcelJS.Workbook> {
  const workbook = new ExcelJS.Workbook();
  const whole = new ArrayBuffer(bytes.length);
  new Uint8Array(whole).set(bytes);
  await workbook.xlsx.load(whole);
  return workbook;
}

const OFFICE = 'soffice';
let bytes: Uint8Array;
let folder: string;

beforeAll(async () => {
  bytes = await tablesWorkbook(normSet);
  folder = await mkdtemp(join(tmpdir(), 'normloom-workbook-'));
});

afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
});

describe('typed cells', () => {
  it('are numbers that show exactly the printed text', () => {
    expect(typedCell('23')).toEqual({ kind: 'number', value: 23, format: '0;"−"0' });
    expect(typedCell('−1.25')).toEqual({ kind: 'number', value: -1.25, format: '0.00;"−"0.00' });
    expect(typedCell('1\u202f489')).toEqual({ kind: 'number', value: 1489, format: '0"\u202f"000;"−"0"\u202f"000' });
    expect(typedCell('<1')).toEqual({ kind: 'text', value: '<1' });
    expect(typedCell('–')).toEqual({ kind: 'text', value: '–' });
  });
});

describe('tablesWorkbook', () => {
  it('has a sheet for each group with every score once, as numbers', async () => {
    const workbook = await open(bytes);
    expect(workbook.worksheets.map(({ name }) => name)).toEqual([
      'Look-up',
      'Grade 4',
      'A1 & "co"',
      'About',
      'Look-up rows',
    ]);
    normSet.groups.forEach((norms, index) => {
      const sheet = workbook.worksheets[index + 1];
      const scores: number[] = [];
      const ranks: unknown[] = [];
      sheet?.getColumn(1).eachCell((cell) => {
        if (typeof cell.value === 'number') {
          scores.push(cell.value);
          ranks.push(sheet.getCell(Number(cell.row), 2).value);
        }
      });
      expect(scores).toEqual(norms.rows.map(({ score }) => score));
      expect(ranks).toEqual(norms.rows.map(({ printed }) => typedCell(printed).value));
      const unrounded = norms.rows.map((row) => row.percentileRank);
      expect(sheet?.getColumn(6).values.filter((value) => typeof value === 'number')).toEqual(unrounded);
    });
  });

  it('runs no text of the user as a formula', async () => {
    const workbook = await open(bytes);
    const formulas: string[] = [];
    for (const sheet of workbook.worksheets) {
      sheet.eachRow((row) =>
        row.eachCell((cell) => {
          if (cell.formula) formulas.push(`${sheet.name}: ${cell.formula}`);
        }),
      );
    }
    expect(formulas.length).toBe(6);
    expect(formulas.every((formula) => /^Look-up( rows)?: (IFERROR\(INDEX|\(1\/\(1\/SUMPRODUCT)/.test(formula))).toBe(
      true,
    );
  });

  it('is the same each time', async () => {
    await new Promise((resolve) => setTimeout(resolve, 2100));
    expect(Buffer.from(await tablesWorkbook(normSet)).equals(Buffer.from(bytes))).toBe(true);
  });

  it('shows the right row for the example before anything is computed', async () => {
    const sheet = (await open(bytes)).getWorksheet(LOOK_UP);
    const row = normSet.groups[0]?.rows.find(({ score }) => score === sheet?.getCell(SCORE_CELL).value);
    expect(sheet?.getCell(GROUP_CELL).value).toBe('Grade 4');
    expect(sheet?.getCell(FIRST_RESULT_ROW, 2).result).toBe(row?.printed);
  });

  it('looks up every kind of score in LibreOffice', async () => {
    const cases = [
      ['Grade 4', -2],
      ['Grade 4', 7.5],
      ['=A1* & "co"?', 20],
      ['=A1* & "co"?', 11],
      ['Grade 4', 7.3],
      ['Grade 9', 7],
    ] as const;
    const files = await Promise.all(
      cases.map(async ([group, score], index) => {
        const workbook = await open(bytes);
        const sheet = workbook.getWorksheet(LOOK_UP);
        if (sheet === undefined) throw new Error('no look-up sheet');
        sheet.getCell(GROUP_CELL).value = group;
        sheet.getCell(SCORE_CELL).value = score;
        forgetResults(workbook);
        const file = join(folder, `case-${index}.xlsx`);
        await writeFile(file, Buffer.from(await workbook.xlsx.writeBuffer()));
        return file;
      }),
    );
    const profile = `-env:UserInstallation=${pathToFileURL(join(folder, 'profile')).href}`;
    const filter = 'csv:Text - txt - csv (StarCalc):44,34,76,1';
    execFileSync(OFFICE, ['--headless', profile, '--convert-to', filter, '--outdir', folder, ...files], {
      stdio: 'ignore',
    });
    const results = await Promise.all(files.map((file) => lookedUp(file.replace(/xlsx$/, 'csv'))));
    const sentence =
      'Not in the table. Choose a group from the list and type a raw score from -2 to 20 in steps of 0.5.';
    expect(results).toEqual(
      cases.map(
        ([group, score]) =>
          expected(normSet, group, score) ?? [sentence, '', '', '', group === 'Grade 9' ? '' : people(group)],
      ),
    );
    expect(results[0]?.[0]).toBe('<1');
    expect(results[2]?.[0]).toBe('>99');
  }, 120_000);
});

/** Without written results a spreadsheet program has to compute. */
function forgetResults(workbook: ExcelJS.Workbook): void {
  for (const sheet of workbook.worksheets) {
    sheet.eachRow((row) =>
      row.eachCell((cell) => {
        if (cell.formula) cell.value = { formula: cell.formula, date1904: false };
      }),
    );
  }
}

async function lookedUp(file: string): Promise<readonly (string | undefined)[]> {
  const { data } = Papa.parse<readonly string[]>(await readFile(file, 'utf8'));
  return data.slice(FIRST_RESULT_ROW - 1, FIRST_RESULT_ROW + 4).map((row) => row[1]);
}

function normsOf(group: string) {
  return normSet.groups.find((norms) => norms.group.title === group);
}

function people(group: string): string {
  return printCount(normsOf(group)?.summary.n ?? 0);
}

function expected(set: NormSet, group: string, score: number): readonly string[] | null {
  const row = set.groups
    .find((norms) => norms.group.title === group)
    ?.rows.find((candidate) => candidate.score === score);
  return row === undefined ? null : [row.printed, row.texts.count, row.texts.z, row.texts.stanine, people(group)];
}

describe('a workbook of one group', () => {
  it('can be made', async () => {
    const workbook = await open(await tablesWorkbook(sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] })));
    expect(workbook.worksheets).toHaveLength(4);
  });
});
