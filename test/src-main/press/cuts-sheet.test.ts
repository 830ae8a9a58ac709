import { beforeAll, describe, expect, it } from 'vitest';
import { cutTables } from '../../../shared-core/norms/cut-table.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { CUTS } from '../../../src-main/press/cuts-sheet.ts';
import { normSetJson } from '../../../src-main/press/norm-set-json.ts';
import { differenceLine } from '../../../src-main/press/read-back/cell-differences.ts';
import { readBack } from '../../../src-main/press/read-back/read-back.ts';
import { tablesWorkbook } from '../../../src-main/press/workbook.ts';
import { openWorkbook } from './office.ts';
import { sampleNormSet } from '../../shared-core/pages/sample-norm-set.ts';

const cuts: NormProject['cuts'] = [
  { name: '=Support', score: -1.5, values: null },
  { name: 'Extension', score: 12, values: ['5'] },
  { name: 'Between', score: 3.25, values: ['4'] },
];

const set: NormSet = sampleNormSet({ scale: { min: -3, max: 20, step: 0.5 }, weighted: true }, (project) => ({
  ...project,
  cuts,
}));

let workbook: Uint8Array;

beforeAll(async () => {
  workbook = await tablesWorkbook(set);
});

async function differencesIn(file: string, bytes: Uint8Array): Promise<readonly string[]> {
  const read = await readBack([{ file, bytes }], set);
  if (!read.ok) throw new Error(read.problem);
  return read.value.flatMap(({ differences }) => differences).map(differenceLine);
}

describe('the sheet of the cuts', () => {
  it('has a row for each cut and group, figures as numbers, and is read back', async () => {
    const sheet = (await openWorkbook(workbook)).getWorksheet(CUTS);
    const values = (row: number): unknown[] => [1, 2, 3, 4, 5, 6, 7].map((column) => sheet?.getCell(row, column).value);
    expect(values(4).map((head) => String(head).replace(/\s/g, ' '))).toEqual([
      'Cut',
      'Raw score',
      'Group',
      'n',
      'Percentile rank',
      '95 % interval',
      'Per cent at or better',
    ]);
    const [support, extension, between] = cutTables(set.project, set.groups);
    const [four, five] = support?.rows ?? [];
    expect(values(5)).toEqual([
      '=Support',
      -1.5,
      'Grade 4',
      expect.any(Number),
      four?.rank,
      four?.interval,
      expect.any(Number),
    ]);
    expect(values(6)[2]).toBe('Grade 5');
    expect(values(6)[6]).toBe(Number(five?.shareText));
    expect(values(7)).toEqual([
      'Extension',
      12,
      'Grade 5',
      expect.any(Number),
      Number(extension?.rows[0]?.rank),
      extension?.rows[0]?.interval,
      expect.any(Number),
    ]);
    expect(values(8)).toEqual([
      'Between',
      3.25,
      'Grade 4',
      expect.any(Number),
      '–',
      '–',
      Number(between?.rows[0]?.shareText),
    ]);
    expect(await differencesIn('tables.xlsx', workbook)).toEqual([]);
  });

  it('is found where a figure, a name or a row of it was changed', async () => {
    const changed = async (row: number, column: number, value: string | number): Promise<readonly string[]> => {
      const opened = await openWorkbook(workbook);
      const cell = opened.getWorksheet(CUTS)?.getCell(row, column);
      if (cell === undefined) throw new Error('no sheet');
      cell.value = value;
      return differencesIn('tables.xlsx', new Uint8Array(await opened.xlsx.writeBuffer()));
    };
    expect(await changed(6, 7, 12.3)).toEqual([
      expect.stringMatching(
        /^tables\.xlsx, Cuts!G6: Grade 5, raw score −1\.5, Per cent at or better at the cut “=Support”: expected "[\d.]+", found "12\.3"$/,
      ),
    ]);
    expect(await changed(7, 1, 'Other')).toHaveLength(1);
    expect(await changed(9, 1, 'One more')).toEqual([
      expect.stringContaining('Cuts!A9: cut: expected nothing, found "One more"'),
    ]);
  });

  it('stands in no workbook without cuts', async () => {
    const without = sampleNormSet({ scale: { min: 0, max: 9, step: 1 } });
    const opened = await openWorkbook(await tablesWorkbook(without));
    expect(opened.getWorksheet(CUTS)).toBeUndefined();
  });
});

describe('the cuts of a norm set file', () => {
  it('stand in it with their numbers, and are read back', async () => {
    const bytes = normSetJson(set);
    const text = new TextDecoder().decode(bytes);
    const file = JSON.parse(text) as { cuts: { name: string; groups: Record<string, unknown>[] }[] };
    expect(file.cuts.map(({ name, groups }) => [name, groups.length])).toEqual([
      ['=Support', 2],
      ['Extension', 1],
      ['Between', 1],
    ]);
    const [between] = file.cuts[2]?.groups ?? [];
    expect(between).toMatchObject({ group: { grade: '4' }, printed: null, 'percentile-rank': null });
    const share = between?.['per-cent-at-or-better'];
    expect(Number(share).toFixed(1)).toBe(between?.['per-cent-printed']);
    expect(await differencesIn('norm-set.json', bytes)).toEqual([]);
    const other = text.replace('"per-cent-printed": "', '"per-cent-printed": "1');
    expect(await differencesIn('norm-set.json', new TextEncoder().encode(other))).toHaveLength(1);
    const without = new TextDecoder().decode(normSetJson(sampleNormSet({ scale: { min: 0, max: 9, step: 1 } })));
    expect(without).not.toContain('"cuts"');
  });
});
