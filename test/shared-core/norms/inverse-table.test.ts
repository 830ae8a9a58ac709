import { describe, expect, it } from 'vitest';
import { INVERSE_PERCENTILES, inverseTable } from '../../../shared-core/norms/inverse-table.ts';
import { curveOf, firstNorms, projectOf, scaleTo, TEN_COUNTS } from './small-projects.ts';

const DASH = '\u2013';

function scoresAt(direction: 'high-is-good' | 'low-is-good', kind: 'midpoint' | 'at-or-below'): Map<number, string> {
  const norms = firstNorms({ ...projectOf(TEN_COUNTS, scaleTo(4, direction)), curve: curveOf({ kind }) });
  return new Map(inverseTable(norms.rows, direction).map((row) => [row.percentile, row.scoreText]));
}

describe('the inverse table', () => {
  it('lists the lowest score that reaches each percentile', () => {
    // Midpoint ranks 5, 20, 45, 60, 80.
    const scores = scoresAt('high-is-good', 'midpoint');
    expect([...scores.keys()]).toEqual([...INVERSE_PERCENTILES]);
    expect([1, 5, 10, 20, 25, 50, 60, 70, 80].map((p) => scores.get(p))).toEqual([
      '0',
      '0',
      '1',
      '1',
      '2',
      '3',
      '3',
      '4',
      '4',
    ]);
    expect([90, 95, 99].map((p) => scores.get(p))).toEqual([DASH, DASH, DASH]);
  });

  it('lists the highest score where low scores are good', () => {
    // Midpoint ranks 95, 80, 55, 40, 20 of the scores 0 to 4.
    const scores = scoresAt('low-is-good', 'midpoint');
    expect([1, 20, 25, 40, 50, 75, 80, 90, 95, 99].map((p) => scores.get(p))).toEqual([
      '4',
      '4',
      '3',
      '3',
      '2',
      '1',
      '1',
      '0',
      '0',
      DASH,
    ]);
  });

  it('reaches every percentile where the best score stands at 100', () => {
    expect([...scoresAt('high-is-good', 'at-or-below').values()]).not.toContain(DASH);
  });

  it('goes by unrounded ranks: 4.99 does not reach 5', () => {
    // Midpoint rank of 0: 100 · 998/2 / 10000 = 4.99, printed 5.
    const norms = firstNorms(projectOf([998, 9002]));
    expect(norms.rows[0]?.printed).toBe('5');
    expect(norms.inverse.find((row) => row.percentile === 5)?.scoreText).toBe('1');
  });
});
