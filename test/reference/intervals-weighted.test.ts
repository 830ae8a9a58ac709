import { describe, expect, it } from 'vitest';
import { rankCounts } from '../../shared-core/precision/counted-rank.ts';
import {
  proportionInterval,
  rankIntervals,
  type IntervalMethod,
} from '../../shared-core/precision/proportion-interval.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { NORMAL, expectNear } from './near.ts';
import { numberIn, readRows, weightedTable, wholeScale } from './read-reference.ts';

describe('intervals of the weighted cohort c5_weighted, on its effective n', () => {
  const people = readRows('c5_weighted_cohort.csv').map((row) => ({
    score: Number(row['score']),
    weight: Number(row['weight']),
  }));
  const table = weightedTable(wholeScale(0, 40), people);
  const { effectiveN } = summarise(table);
  const rows = readRows('c5_weighted_scores.csv');

  function compare(word: string, intervals: readonly { readonly low: number; readonly high: number }[]): void {
    expect(intervals.length).toBe(rows.length);
    rows.forEach((row, position) => {
      const { low, high } = intervals[position] ?? { low: NaN, high: NaN };
      const column = `atbelow_${word}95_neff`;
      expectNear(low, numberIn(row, `${column}_lo`) ?? NaN, NORMAL, `${column}_lo of ${row['score']}`);
      expectNear(high, numberIn(row, `${column}_hi`) ?? NaN, NORMAL, `${column}_hi of ${row['score']}`);
    });
  }

  it.each<readonly [string, IntervalMethod]>([
    ['wilson', 'wilson'],
    ['jeffreys', 'jeffreys'],
  ])('%s', (word, method) => {
    const found = rankIntervals(table, effectiveN, { kind: 'at-or-below' }, { method, level: 95 });
    if (!found.ok) throw new Error(found.problem);
    compare(word, found.intervals);
  });

  it('the formula of Clopper and Pearson on fractional counts, which the program refuses to print', () => {
    const choice = { method: 'clopper-pearson', level: 95 } as const;
    expect(rankIntervals(table, effectiveN, { kind: 'at-or-below' }, choice).ok).toBe(false);
    const counts = rankCounts(table, 'at-or-below', effectiveN);
    compare('clopper', counts.map((count) => proportionInterval(Math.min(count, effectiveN), effectiveN, choice)));
  });
});
