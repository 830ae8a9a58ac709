import ExcelJS from 'exceljs';
import { beforeAll, describe, expect, it } from 'vitest';
import type { NormProject } from '../../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../../shared-core/norms/norm-set.ts';
import { normSetJson } from '../../../../src-main/press/norm-set-json.ts';
import { differenceLine } from '../../../../src-main/press/read-back/cell-differences.ts';
import { pressFiles } from '../../../../src-main/press/press-files.ts';
import { readBack, readBackProblem } from '../../../../src-main/press/read-back/read-back.ts';
import { tablesCsv } from '../../../../src-main/press/tables-csv.ts';
import { tablesWorkbook } from '../../../../src-main/press/workbook.ts';
import { KERNEL, sampleNormSet, sampleProject, WHOLE_SCALE } from '../../../shared-core/pages/sample-norm-set.ts';

const everything = (project: NormProject): NormProject => ({
  ...project,
  curve: { ...project.curve, exceptions: [{ values: ['=5'], smoothing: KERNEL }] },
  precision: { ...project.precision, reliability: 0.9 },
  table: { ...project.table, columns: ['count', 'cumulative', 'interval', 'measurement-band', 'z', 't', 'stanine'] },
});

let set: NormSet;
let workbook: Uint8Array;

beforeAll(async () => {
  set = sampleNormSet({ scale: { min: -3, max: 20, step: 0.5 }, groups: ['4', '=5'], weighted: true }, everything);
  workbook = await tablesWorkbook(set);
});

async function linesOf(file: string, bytes: Uint8Array, against: NormSet = set): Promise<readonly string[]> {
  const read = await readBack([{ file, bytes }], against);
  if (!read.ok) throw new Error(read.problem);
  return read.value.flatMap(({ differences }) => differences).map(differenceLine);
}

/** The workbook after somebody changed it in a spreadsheet program. */
async function changed(change: (workbook: ExcelJS.Workbook) => void): Promise<Uint8Array> {
  const opened = new ExcelJS.Workbook();
  await opened.xlsx.load(Uint8Array.from(workbook).buffer);
  change(opened);
  return new Uint8Array(await opened.xlsx.writeBuffer());
}

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

describe('a workbook', () => {
  it('agrees as it was written, also with large counts and negative numbers', async () => {
    expect(await linesOf('tables.xlsx', workbook)).toEqual([]);
    const large = sampleNormSet({ scale: { min: 0, max: 4, step: 1 }, groups: ['4'] }, (project) => ({
      ...project,
      tally:
        project.tally === null
          ? null
          : {
              ...project.tally,
              cells: project.tally.cells.map((cell) => ({ ...cell, counts: [12, 3456, 7890123, 4, 1000] })),
            },
      table: { ...project.table, columns: ['count', 'z'] },
    }));
    expect(await linesOf('tables.xlsx', await tablesWorkbook(large), large)).toEqual([]);
  });

  it('with a number stored as text, another number, another format or a lost row does not', async () => {
    const [four] = set.groups;
    const row = four?.rows[20];
    if (row === undefined) throw new Error('no such row');
    const cellOf = (opened: ExcelJS.Workbook, column: number): ExcelJS.Cell => {
      const sheet = opened.getWorksheet('Grade 4');
      if (sheet === undefined) throw new Error('no such sheet');
      for (let at = 1; at < 100; at += 1) {
        if (sheet.getCell(at, 1).value === row.score && sheet.getCell(at, 2).value !== null)
          return sheet.getCell(at, column);
      }
      throw new Error('no such row');
    };
    const place = `raw score ${row.scoreText}, percentile rank: expected "${row.printed}"`;
    const asText = await changed((opened) => {
      cellOf(opened, 2).value = row.printed;
    });
    expect(await linesOf('tables.xlsx', asText)).toEqual([
      expect.stringMatching(
        new RegExp(`^tables\\.xlsx, Grade 4!B\\d+: Grade 4, ${place}, found "${row.printed}, not held as a number"$`),
      ),
    ]);
    const other = await changed((opened) => {
      cellOf(opened, 2).value = Number(row.printed) + 1;
    });
    expect(await linesOf('tables.xlsx', other)).toHaveLength(1);
    const shownOtherwise = await changed((opened) => {
      const cell = cellOf(opened, 2);
      cell.style = { ...cell.style, numFmt: '0.0' };
    });
    expect((await linesOf('tables.xlsx', shownOtherwise))[0]).toContain(`found "${row.printed}.0"`);
    const lost = await changed((opened) => {
      opened.getWorksheet('Grade 4')?.spliceRows(Number(cellOf(opened, 1).row), 1);
    });
    expect((await linesOf('tables.xlsx', lost))[0]).toContain(`raw score ${row.scoreText}, raw score: expected`);
  });

  it('with wrong data behind its look-up, or without a sheet, does not', async () => {
    const wrong = await changed((opened) => {
      const cell = opened.getWorksheet('Look-up rows')?.getCell('C5');
      if (cell !== undefined) cell.value = '77';
    });
    expect(await linesOf('tables.xlsx', wrong)).toEqual([
      expect.stringMatching(
        /^tables\.xlsx, Look-up rows!C5: Grade 4, raw score −1\.5, percentile rank: .* found "77"$/,
      ),
    ]);
    const shown = await changed((opened) => {
      const cell = opened.getWorksheet('Look-up')?.getCell('B7');
      if (cell !== undefined) cell.value = { formula: 'A1', result: '1234' };
    });
    expect(await linesOf('tables.xlsx', shown)).toEqual([expect.stringContaining('Look-up!B7')]);
    const without = await changed((opened) => opened.removeWorksheet(opened.getWorksheet('Grade 4')?.id ?? 0));
    expect(await linesOf('tables.xlsx', without)).toEqual([expect.stringMatching(/Grade 4, title: .* found nothing$/)]);
  });
});

describe('a csv', () => {
  it('agrees as it was written; a swapped, lost, added or altered row does not', async () => {
    const text = new TextDecoder('utf-8', { ignoreBOM: true }).decode(tablesCsv(set));
    expect(await linesOf('tables.csv', bytesOf(text))).toEqual([]);
    const lines = text.split('\r\n');
    const swapped = lines.with(5, lines[6] ?? '').with(6, lines[5] ?? '');
    const found = await linesOf('tables.csv', bytesOf(swapped.join('\r\n')));
    expect(found).toContain('tables.csv, line 6: Grade 4, raw score −1.0, raw-score: expected "-1", found "-0.5"');
    expect(found).toContain('tables.csv, line 7: Grade 4, raw score −0.5, raw-score: expected "-0.5", found "-1"');
    const last = await linesOf('tables.csv', bytesOf(lines.toSpliced(-2, 1).join('\r\n')));
    expect(last).toEqual([
      expect.stringMatching(/line 95: Grade =5, raw score 20\.0, line: expected "20\.0", found nothing$/),
    ]);
    const added = await linesOf('tables.csv', bytesOf(`${text}x,y\r\n`));
    expect(added).toEqual(['tables.csv, line 96: line: expected nothing, found "x,y"']);
    const otherName = await linesOf('tables.csv', bytesOf(text.replace('standard-error', 'sd')));
    expect(otherName).toEqual([expect.stringContaining('line 1: heading')]);
  });
});

describe('a norm set file', () => {
  it('agrees as it was written; any other value does not', async () => {
    const text = new TextDecoder().decode(normSetJson(set));
    expect(await linesOf('norm-set.json', bytesOf(text))).toEqual([]);
    const row = set.groups[1]?.rows[3];
    const file = JSON.parse(text) as { groups: { rows: { printed: string; derived: { t: number } }[] }[] };
    const cell = file.groups[1]?.rows[3];
    if (cell === undefined || row === undefined) throw new Error('no such row');
    cell.derived.t = 51;
    file.groups[0]?.rows.pop();
    const found = await linesOf('norm-set.json', bytesOf(JSON.stringify(file)));
    expect(found).toContain(
      `norm-set.json, groups/1/rows/3/derived/t: Grade =5, raw score ${row.scoreText}, derived t: expected "${row.derived.t}", found "51"`,
    );
    expect(found.some((line) => line.includes('Grade 4, raw score 20.0, printed: expected'))).toBe(true);
  });
});

describe('a rank that was adjusted by hand', () => {
  it.each([1, 0] as const)('is read back with its mark in every file, decimals: %s', async (decimals) => {
    const usual = (project: NormProject): NormProject => ({ ...project, table: { ...project.table, decimals } });
    const plain = sampleNormSet({ scale: WHOLE_SCALE }, usual);
    const [four] = plain.groups;
    const [row, next] = [four?.rows[20], four?.rows[21]];
    if (row === undefined || next === undefined) throw new Error('no such row');
    const adjusted = sampleProject({ scale: WHOLE_SCALE }, (project) => ({
      ...usual(project),
      adjustments: [{ values: ['4'], score: 20, to: next.printed, reason: 'order', by: 'A. B.' }],
    }));
    const made = await pressFiles(adjusted);
    if (!made.ok) throw new Error(made.problem);
    const built = sampleNormSet({ scale: WHOLE_SCALE }, () => adjusted);
    expect(built.groups[0]?.rows[20]?.adjusted?.from).toBe(row.printed);
    const found = await linesOf('booklet.pdf', made.value.files[0]?.bytes ?? new Uint8Array(), plain);
    expect(found).toContain(
      `booklet.pdf, page 1: Grade 4, raw score 20, percentile rank: expected "${row.printed}", found "${next.printed}†"`,
    );
  });
});

describe('readBack', () => {
  it('tells files that were never pressed, and damaged ones, in a sentence', async () => {
    expect(await readBack([{ file: 'a.txt', bytes: bytesOf('hello') }], set)).toEqual({
      ok: false,
      problem: 'a.txt is no file that Normloom presses. Name a booklet, workbook, csv or norm set.',
    });
    for (const start of ['%PDF-1.7 and no more', 'PK\u0003\u0004 and no more', '{"format":"normloom-certificate"}']) {
      const read = await readBack([{ file: 'b', bytes: bytesOf(start) }], set);
      expect(read.ok ? '' : read.problem).toMatch(
        /^b cannot be opened \(.+\)\. It is damaged; press the edition again\.$/,
      );
    }
  });

  it('counts what it compared, and says which cells stop a press', async () => {
    const small = sampleNormSet({ scale: WHOLE_SCALE });
    const read = await readBack([{ file: 'tables.csv', bytes: tablesCsv(small) }], small);
    if (!read.ok) throw new Error(read.problem);
    expect(read.value.map(({ cells }) => cells)).toEqual([83 * 20]);
    expect(readBackProblem(read.value)).toBeNull();
    const other = await readBack([{ file: 'tables.csv', bytes: tablesCsv({ ...small, check: '0000-0000' }) }], small);
    if (!other.ok) throw new Error(other.problem);
    expect(readBackProblem(other.value)).toMatch(
      /nothing was written\. tables\.csv, line 2: Grade 4, raw score 0, check: expected ".*", found "0000-0000"; .*; and 77 more\./,
    );
  });
});
