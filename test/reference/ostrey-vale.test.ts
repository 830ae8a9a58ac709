import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { weighsEqually } from '../../shared-core/tally/frequency-table.ts';
import { rowsOf, weightedTable, wholeScale, type ReferenceRow } from './read-reference.ts';

const FOLDER = new URL('../../assets/sample-cohorts/', import.meta.url);
const text = readFileSync(new URL('ostrey-vale-reading.csv', FOLDER), 'utf8');

function isClean(row: ReferenceRow): boolean {
  return (
    /^\d{1,2}$/.test(row['raw_score'] ?? '') &&
    Number(row['raw_score']) <= 40 &&
    /^[456]$/.test(row['grade'] ?? '') &&
    /^0*[1-9][0-9.]*$|^0\.\d+$/.test(row['weight'] ?? '')
  );
}

describe('the sample cohort of Ostrey Vale', () => {
  const lines = text.trimEnd().split('\n');
  const rows = rowsOf(lines.filter((line) => line !== '').join('\n'));
  const countOf = (test: (row: ReferenceRow) => boolean): number => rows.filter(test).length;
  const scored = (score: string): number => countOf((row) => row['raw_score'] === score && row['form'] !== '');

  it('is what its generator writes, byte for byte', () => {
    const script = fileURLToPath(new URL('generate-ostrey-vale.mjs', FOLDER));
    const written = execFileSync(process.execPath, [script, '--print'], { maxBuffer: 2 ** 24 });
    expect(written.equals(readFileSync(new URL('ostrey-vale-reading.csv', FOLDER)))).toBe(true);
  });

  it('has LF line ends, no byte-order mark, and ids with leading zeros', () => {
    expect(text.startsWith('pupil_id,school,grade,form,age_months,raw_score,weight\n')).toBe(true);
    expect(text.includes('\r')).toBe(false);
    expect(text.endsWith('\n')).toBe(true);
    expect(countOf((row) => /^00\d{4}$/.test(row['pupil_id'] ?? ''))).toBe(rows.length);
    expect(new Set(rows.map((row) => row['school'])).size).toBe(24);
  });

  it('has the dirt that its README lists', () => {
    const ragged = lines.filter((line) => line !== '' && line.split(',').length !== 7);
    expect(lines.length - 1).toBe(4863);
    expect(lines.filter((line) => line === '').length).toBe(3);
    expect(ragged.map((line) => line.split(',').length)).toEqual([4]);
    expect(scored('99')).toBe(14);
    expect(scored('abs')).toBe(5);
    expect(scored('')).toBe(9 + ragged.length);
    expect(['41', '42', '43', '44'].map(scored)).toEqual([1, 1, 1, 1]);
    expect(['17.5', '22.5'].map(scored)).toEqual([1, 1]);
    expect(countOf((row) => row['grade'] === '')).toBe(1);
    expect(countOf((row) => row['weight'] === '')).toBe(1 + ragged.length);
    expect(countOf((row) => Number(row['weight']) < 0)).toBe(1);
    expect(countOf((row) => row['weight'] === '0')).toBe(1);

    const byId = new Map<string, string[]>();
    for (const row of rows) {
      const id = row['pupil_id'] ?? '';
      byId.set(id, [...(byId.get(id) ?? []), JSON.stringify(row)]);
    }
    const again = [...byId.values()].filter((same) => same.length > 1);
    expect(again.every((same) => same.length === 2)).toBe(true);
    expect(again.length).toBe(9);
    expect(again.filter(([first, second]) => first === second).length).toBe(8);
  });

  it('looks like a reading survey once the dirt is out', () => {
    const clean = [...new Map(rows.filter(isClean).map((row) => [row['pupil_id'], row])).values()];
    expect(clean.length).toBe(4812);
    for (const [grade, people, mean] of [
      ['4', 1598, 20.5],
      ['5', 1613, 24.2],
      ['6', 1601, 27.5],
    ] as const) {
      const own = clean.filter((row) => row['grade'] === grade);
      const table = weightedTable(
        wholeScale(0, 40),
        own.map((row) => ({ score: Number(row['raw_score']), weight: Number(row['weight']) })),
      );
      const summary = summarise(table);
      expect(summary.n).toBe(people);
      expect(weighsEqually(table)).toBe(false);
      expect(Math.abs(summary.weightSum / people - 1)).toBeLessThan(0.05);
      expect(Math.abs(summary.mean - mean)).toBeLessThan(0.5);
      expect(Math.abs((summary.sd ?? NaN) - 7)).toBeLessThan(0.5);
      expect(summary.skewness).toBeLessThan(-0.1);
      expect(summary.skewness).toBeGreaterThan(-0.8);
      expect(summary.effectiveN).toBeLessThan(people);
    }
  });
});
