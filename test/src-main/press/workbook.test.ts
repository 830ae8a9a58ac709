import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type ExcelJS from 'exceljs';
import Papa from 'papaparse';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { printCount, printNumber } from '../../../shared-core/scores/printed-number.ts';
import { FIRST_RESULT_ROW, GROUP_CELL, LOOK_UP, SCORE_CELL } from '../../../src-main/press/look-up-sheet.ts';
import { typedCell } from '../../../src-main/press/typed-cell.ts';
import { tablesWorkbook } from '../../../src-main/press/workbook.ts';
import { convert, forgetResults, openWorkbook } from './office.ts';
import { KERNEL, LOG_LINEAR, sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

const normSet = sampleNormSet({ scale: { min: -2, max: 20, step: 0.5 }, groups: ['4', '5'] }, (project) => ({
  ...project,
  title: '=HYPERLINK("x")',
  table: { ...project.table, columns: ['count', 'z', 'stanine'] },
  groups: {
    ...project.groups,
    choices: [{ values: ['5'], title: '=A1* & "co"?', printed: true }],
  },
}));

const smoothedSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5', '6'] }, (project) => ({
  ...project,
  curve: {
    ...project.curve,
    smoothing: LOG_LINEAR,
    exceptions: [
      { values: ['5'], smoothing: { kind: 'none' } },
      { values: ['6'], smoothing: KERNEL },
    ],
  },
  precision: { ...project.precision, reliability: 0.9 },
  table: { ...project.table, columns: ['interval', 'standard-error', 'measurement-band'] },
}));

let bytes: Uint8Array;
let smoothedBytes: Uint8Array;
let folder: string;

beforeAll(async () => {
  bytes = await tablesWorkbook(normSet);
  smoothedBytes = await tablesWorkbook(smoothedSet);
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
    const workbook = await openWorkbook(bytes);
    expect(workbook.worksheets.map(({ name }) => name)).toEqual([
      'Look-up',
      'Grade 4',
      'A1 & "co"',
      'Workings Grade 4',
      'Workings A1 & "co"',
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
    const workbook = await openWorkbook(bytes);
    const formulas: string[] = [];
    for (const sheet of workbook.worksheets) {
      sheet.eachRow((row) =>
        row.eachCell((cell) => {
          if (cell.formula) formulas.push(`${sheet.name}: ${cell.formula}`);
        }),
      );
    }
    const own = formulas.filter((formula) => !formula.startsWith('Workings '));
    expect(own.length).toBe(6);
    expect(own.every((formula) => /^Look-up( rows)?: (IFERROR\(INDEX|\(1\/\(1\/SUMPRODUCT)/.test(formula))).toBe(true);
    const parts =
      /"(same|differs|other score|<1|>99| of | rows agree)"|'(Grade 4|A1 & "co")'!|[A-Z]{1,12}|[$\d(),.:&<>=*+/-]/g;
    const workings = formulas.filter((formula) => formula.startsWith('Workings '));
    expect(workings.length).toBeGreaterThan(800);
    expect(workings.filter((formula) => formula.replace(/^[^:]*: /, '').replace(parts, '') !== '')).toEqual([]);
  });

  it('has room in every foot for its page, in a line of its own', async () => {
    for (const sheet of [
      ...(await openWorkbook(bytes)).worksheets,
      ...(await openWorkbook(smoothedBytes)).worksheets,
    ]) {
      const foot = sheet.headerFooter.oddFooter ?? '';
      expect(foot).toMatch(/^&L&8 .*\n&8 Page &P of &N$/s);
      expect(foot.length).toBeLessThan(256);
    }
  });

  it('is the same each time', async () => {
    await new Promise((resolve) => setTimeout(resolve, 2100));
    expect(Buffer.from(await tablesWorkbook(normSet)).equals(Buffer.from(bytes))).toBe(true);
    expect(Buffer.from(await tablesWorkbook(smoothedSet)).equals(Buffer.from(smoothedBytes))).toBe(true);
  });

  it('shows the right row for the example before anything is computed', async () => {
    const sheet = (await openWorkbook(bytes)).getWorksheet(LOOK_UP);
    const row = normSet.groups[0]?.rows.find(({ score }) => score === sheet?.getCell(SCORE_CELL).value);
    expect(sheet?.getCell(GROUP_CELL).value).toBe('Grade 4');
    expect(sheet?.getCell(FIRST_RESULT_ROW, 2).result).toBe(row?.printed);
  });

  it('looks up every kind of score in LibreOffice, smoothed or not', async () => {
    const cases = [
      [normSet, 'Grade 4', -2],
      [normSet, 'Grade 4', 7.5],
      [normSet, '=A1* & "co"?', 20],
      [normSet, '=A1* & "co"?', 11],
      [normSet, 'Grade 4', 7.3],
      [normSet, 'Grade 9', 7],
      [smoothedSet, 'Grade 4', 16],
      [smoothedSet, 'Grade 5', 16],
      [smoothedSet, 'Grade 6', 40],
    ] as const;
    const files = await Promise.all(
      cases.map(async ([set, group, score], index) => {
        const workbook = await openWorkbook(set === normSet ? bytes : smoothedBytes);
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
    convert(files, 'csv:Text - txt - csv (StarCalc):44,34,76,1', folder, folder);
    const results = await Promise.all(files.map((file) => lookedUp(file.replace(/xlsx$/, 'csv'))));
    const sentence =
      'Not in the table. Choose a group from the list and type a raw score from -2 to 20 in steps of 0.5.';
    expect(results).toEqual(
      cases.map(
        ([set, group, score]) =>
          expected(set, group, score) ?? [sentence, '', '', '', group === 'Grade 9' ? '' : people(set, group)],
      ),
    );
    expect(results[0]?.[0]).toBe('<1');
    expect(results[2]?.[0]).toBe('>99');
  }, 120_000);
});

describe('a workbook with smoothing', () => {
  it('keeps printed ranges as texts and the unrounded numbers beyond them', async () => {
    const workbook = await openWorkbook(smoothedBytes);
    smoothedSet.groups.forEach((norms, index) => {
      const sheet = workbook.worksheets[index + 1];
      if (sheet === undefined) throw new Error('no sheet');
      const first = norms.rows[0];
      const headRow = rowOfHeads(sheet);
      const heads = valuesIn(sheet, headRow);
      const smoothed = norms.smoothing.state === 'smoothed';
      expect(heads).toEqual([
        'Raw score',
        'Percentile rank',
        '95 % interval',
        'Standard error',
        'Measurement band',
        ...(smoothed ? ['Smoothed rank, unrounded', 'Observed rank, unrounded'] : ['Rank, unrounded']),
        'Interval, low, unrounded',
        'Interval, high, unrounded',
        'Standard error, unrounded',
        'Band, low, unrounded',
        'Band, high, unrounded',
      ]);
      norms.rows.forEach((row, place) => {
        expect(valuesIn(sheet, headRow + 1 + place)).toEqual([
          row.score,
          typedCell(row.printed).value,
          typedCell(row.texts.interval).value,
          typedCell(row.texts['standard-error']).value,
          typedCell(row.texts['measurement-band']).value,
          row.percentileRank,
          ...(smoothed ? [row.observed.percentileRank] : []),
          row.interval?.low,
          row.interval?.high,
          row.standardError ?? undefined,
          row.band?.low,
          row.band?.high,
        ]);
      });
      expect(first?.texts.interval).toMatch(/^<1(–\d+)?$/);
    });
  });

  it('says of each group how it is smoothed and how well that fits', async () => {
    const about = (await openWorkbook(smoothedBytes)).getWorksheet('About');
    const lines = new Map<unknown, unknown>();
    about?.eachRow((row) => lines.set(row.getCell(1).value, row.getCell(2).value));
    const [four, , six] = smoothedSet.groups;
    if (four?.smoothing.state !== 'smoothed' || six?.smoothing.state !== 'smoothed') throw new Error('not smoothed');
    expect(lines.get('Smoothing: Grade 4')).toBe(four.smoothing.curve.statement);
    expect(lines.get('Smoothing: Grade 5')).toBe('The distribution of this group is not smoothed.');
    expect(lines.get('Smoothing: Grade 6')).toBe(six.smoothing.curve.statement);
    const { g2, bic } = four.smoothing.curve;
    expect(lines.get('Fit: Grade 4')).toContain(`G² ${printNumber(g2 ?? NaN, 1)}, `);
    expect(lines.get('Fit: Grade 4')).toContain(`BIC ${printNumber(bic ?? NaN, 1)}.`);
    expect(lines.has('Fit: Grade 5')).toBe(false);
    expect(lines.get('Fit: Grade 6')).toMatch(/^The bandwidth of the kernel is /);
    expect(lines.get('Cautions')).toContain('They are different things');
  });
});

function rowOfHeads(sheet: ExcelJS.Worksheet): number {
  for (let row = 1; row <= sheet.rowCount; row += 1) {
    if (sheet.getCell(row, 2).value === 'Percentile rank') return row;
  }
  throw new Error('no heads');
}

function valuesIn(sheet: ExcelJS.Worksheet, row: number): readonly unknown[] {
  return Array.from({ length: sheet.columnCount }, (_, place) => sheet.getCell(row, place + 1).value ?? undefined);
}

async function lookedUp(file: string): Promise<readonly (string | undefined)[]> {
  const { data } = Papa.parse<readonly string[]>(await readFile(file, 'utf8'));
  return data.slice(FIRST_RESULT_ROW - 1, FIRST_RESULT_ROW + 4).map((row) => row[1]);
}

function people(set: NormSet, group: string): string {
  return printCount(set.groups.find((norms) => norms.group.title === group)?.summary.n ?? 0);
}

function expected(set: NormSet, group: string, score: number): readonly string[] | null {
  const row = set.groups
    .find((norms) => norms.group.title === group)
    ?.rows.find((candidate) => candidate.score === score);
  if (row === undefined) return null;
  return [row.printed, ...set.project.table.columns.map((key) => row.texts[key]), people(set, group)];
}

describe('a workbook of one group', () => {
  it('can be made', async () => {
    const workbook = await openWorkbook(await tablesWorkbook(sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] })));
    expect(workbook.worksheets).toHaveLength(5);
  });
});
