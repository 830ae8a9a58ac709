import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type ExcelJS from 'exceljs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { roundRatio } from '../../../shared-core/percentile/exact-ratio.ts';
import { tableSheetLayout } from '../../../src-main/press/table-layout.ts';
import { typedCell } from '../../../src-main/press/typed-cell.ts';
import { groupSheets, tablesWorkbook } from '../../../src-main/press/workbook.ts';
import { sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';
import { openWorkbook, recomputed, resultsOf } from './office.ts';
import { FINE_WEIGHTS, WORKBOOK_CASES } from './workbook-cases.ts';

const AT = 16;
const PEOPLE_MORE = 500;
const LONG = 'Pupils of O’Brien’s & Åse’s schools: '.replaceAll('’', "'");

const plain = sampleNormSet({ scale: WHOLE_SCALE });
const odd = sampleNormSet({ scale: WHOLE_SCALE }, (project) => ({
  ...project,
  adjustments: [{ values: ['4'], score: AT, to: '30', reason: 'order', by: 'A. Example' }],
  groups: {
    ...project.groups,
    choices: [
      { values: ['4'], title: `=${LONG}first/one`, printed: true },
      { values: ['5'], title: `=${LONG}second/one`, printed: true },
    ],
  },
}));
const fuller = sampleNormSet({ scale: WHOLE_SCALE }, (project) => {
  if (project.tally === null) throw new Error('no tally');
  const cells = project.tally.cells.map((cell, group) => ({
    ...cell,
    counts: cell.counts.map((count, position) => (group === 0 && position === AT ? count + PEOPLE_MORE : count)),
  }));
  return { ...project, tally: { ...project.tally, cells } };
});

let folder: string;
let bytes: readonly Uint8Array[];
let computed: readonly ExcelJS.Workbook[];
const SETS: readonly NormSet[] = [...WORKBOOK_CASES.map(({ set }) => set), odd, FINE_WEIGHTS];

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'normloom-workings-'));
  bytes = await Promise.all(SETS.map(tablesWorkbook));
  const changed = await openWorkbook(await tablesWorkbook(plain));
  const workings = sheetOf(changed, groupSheets(plain)[0]?.workings);
  workings.getCell(firstRowOf(workings) + AT, columnOf(workings, 'Pupils')).value =
    (first(plain).rows[AT]?.count ?? 0) + PEOPLE_MORE;
  const slipped = await openWorkbook(await tablesWorkbook(plain));
  const layout = tableSheetLayout(plain, first(plain));
  const table = sheetOf(slipped, groupSheets(plain)[0]?.table);
  table.getCell(layout.firstRow + AT, 2).value = Number(table.getCell(layout.firstRow + AT, 2).value) + 3;
  table.getCell(layout.firstRow + AT + 1, 2).value = first(plain).rows[AT + 1]?.printed ?? '';
  table.getCell(layout.firstRow + AT + 2, 1).value = 99;
  const opened = await Promise.all(bytes.map(openWorkbook));
  computed = await recomputed([...opened, changed, slipped], folder);
}, 400_000);

afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
});

describe('workings in formulas', () => {
  it('give the written results in LibreOffice for every definition, print, direction, weight and smoothing', async () => {
    const differing: string[] = [];
    let compared = 0;
    for (const [index, made] of bytes.entries()) {
      const name = WORKBOOK_CASES[index]?.name ?? `further set ${index - WORKBOOK_CASES.length}`;
      const anew = resultsOf(computed[index] ?? unknownBook());
      for (const [place, result] of resultsOf(await openWorkbook(made))) {
        compared += 1;
        if (!alike(result, anew.get(place))) differing.push(`${name}: ${place} ${String(result)}`);
      }
    }
    expect(differing.slice(0, 20)).toEqual([]);
    expect(compared).toBeGreaterThan(40_000);
  }, 60_000);

  it('meet exact halves in those cases', () => {
    const halves = WORKBOOK_CASES.flatMap(({ set }) =>
      set.groups.flatMap(({ rows }) =>
        rows.filter(({ rank }) => {
          const { decimals } = set.project.table;
          return roundRatio(rank, decimals, 'half-up') !== roundRatio(rank, decimals, 'half-even');
        }),
      ),
    );
    expect(halves.length).toBeGreaterThan(20);
  });

  it('agree with every row of the table, and say so above it', async () => {
    for (const [index, set] of SETS.entries()) {
      const workbook = await openWorkbook(bytes[index] ?? new Uint8Array());
      set.groups.forEach((norms, group) => {
        const sheet = sheetOf(workbook, groupSheets(set)[group]?.workings);
        const byHand = norms.rows.filter(({ adjusted }) => adjusted !== null).length;
        const total = norms.rows.length;
        const also = byHand === 0 ? '' : `, ${byHand} by hand`;
        expect(sheet.getCell(headRowOf(sheet) - 2, 1).result).toBe(`${total - byHand} of ${total} rows agree${also}`);
        const agreed = norms.rows.map((_, at) => sheet.getCell(firstRowOf(sheet) + at, columnOf(sheet, 'Agrees')));
        expect(agreed.filter(({ result }) => result === 'same')).toHaveLength(total - byHand);
      });
    }
  });

  it('follow a count that is changed', () => {
    const sheet = sheetOf(computed[SETS.length], groupSheets(plain)[0]?.workings);
    const values = (head: string): readonly unknown[] =>
      first(fuller).rows.map((_, at) => sheet.getCell(firstRowOf(sheet) + at, columnOf(sheet, head)).result);
    const { rows } = first(fuller);
    expect(values('Printed')).toEqual(rows.map(({ printed }) => typedCell(printed).value));
    expect(values('At or below')).toEqual(rows.map(({ cumulative }) => cumulative));
    const same = rows.filter(({ printed }, at) => printed === first(plain).rows[at]?.printed).length;
    expect(same).toBeLessThan(rows.length - 10);
    expect(sheet.getCell(headRowOf(sheet) - 2, 1).result).toBe(`${same} of ${rows.length} rows agree`);
  });

  it('find a rank that differs, a number kept as text, and a wrong score in the table', () => {
    const sheet = sheetOf(computed[SETS.length + 1], groupSheets(plain)[0]?.workings);
    const agrees = [0, 1, 2, 3].map(
      (next) => sheet.getCell(firstRowOf(sheet) + AT + next, columnOf(sheet, 'Agrees')).result,
    );
    expect(agrees).toEqual([-3, 'differs', 'other score', 'same']);
    expect(sheet.getCell(headRowOf(sheet) - 2, 1).result).toBe('38 of 41 rows agree');
  });

  it('write ranks as values, and say so, where weights pass the digits of spreadsheet programs', async () => {
    const workbook = await openWorkbook(bytes.at(-1) ?? new Uint8Array());
    const sheet = sheetOf(workbook, groupSheets(FINE_WEIGHTS)[0]?.workings);
    expect(sheet.getCell(3, 1).value).toMatch(
      /cannot carry the sums exactly: ranks and printed ranks stand here as values/,
    );
    expect(sheet.getCell(firstRowOf(sheet) + AT, columnOf(sheet, 'Printed')).value).toBe(
      typedCell(first(FINE_WEIGHTS).rows[AT]?.printed ?? '').value,
    );
  });

  it('name each table, its people and its agreement, whatever the titles', async () => {
    const workbook = await openWorkbook(bytes.at(-2) ?? new Uint8Array());
    const names = new Map(
      workbook.definedNames.model.filter(({ name }) => !name.startsWith('_')).map(({ name, ranges }) => [name, ranges]),
    );
    const [one, two] = groupSheets(odd);
    const [upper, lower] = odd.groups.map((norms) => tableSheetLayout(odd, norms));
    expect([...names]).toEqual([
      ['Table_Pupils_of_O_Brien_s_Ase_s_schools_first', [`'${one?.table}'!$A$${upper?.headRow}:$E$${upper?.lastRow}`]],
      ['People_Pupils_of_O_Brien_s_Ase_s_schools_first', [`'${one?.workings}'!$D$6`]],
      ['Agreement_Pupils_of_O_Brien_s_Ase_s_schools_first', [`'${one?.workings}'!$A$6`]],
      ['Table_Pupils_of_O_Brien_s_Ase_s_schools_second', [`'${two?.table}'!$A$${lower?.headRow}:$E$${lower?.lastRow}`]],
      ['People_Pupils_of_O_Brien_s_Ase_s_schools_second', [`'${two?.workings}'!$D$6`]],
      ['Agreement_Pupils_of_O_Brien_s_Ase_s_schools_second', [`'${two?.workings}'!$A$6`]],
    ]);
    const kept = computed[SETS.length - 2]?.definedNames.model.map(({ name }) => name) ?? [];
    for (const name of names.keys()) expect(kept).toContain(name);
    expect(one?.table).not.toMatch(/'/);
  });
});

function alike(left: unknown, right: unknown): boolean {
  if (typeof left !== 'number' || typeof right !== 'number') return left === right;
  return Number.isInteger(left) ? left === right : Math.abs(left - right) < 1e-12 * Math.max(1, Math.abs(left));
}

function first({ groups }: NormSet): GroupNorms {
  const [norms] = groups;
  if (norms === undefined) throw new Error('no group');
  return norms;
}

function unknownBook(): never {
  throw new Error('not computed');
}

function sheetOf(workbook: ExcelJS.Workbook | undefined, name: string | undefined): ExcelJS.Worksheet {
  const sheet = workbook?.getWorksheet(name);
  if (sheet === undefined) throw new Error(`no sheet ${name ?? ''}`);
  return sheet;
}

function headRowOf(sheet: ExcelJS.Worksheet): number {
  for (let row = 1; row <= sheet.rowCount; row += 1) if (sheet.getCell(row, 1).value === 'Raw score') return row;
  throw new Error('no heads');
}

/** Below the heads stand the notes. */
function firstRowOf(sheet: ExcelJS.Worksheet): number {
  return headRowOf(sheet) + 2;
}

function columnOf(sheet: ExcelJS.Worksheet, head: string): number {
  for (let column = 1; column <= sheet.columnCount; column += 1) {
    if (sheet.getCell(headRowOf(sheet), column).value === head) return column;
  }
  throw new Error(`no column ${head}`);
}
