import { describe, expect, it } from 'vitest';
import { compareToWhole, ratio, type ExactRatio } from '../../shared-core/percentile/exact-ratio.ts';
import { percentilePoint } from '../../shared-core/percentile/percentile-point.ts';
import { percentileRanks, type RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import { printRank, type RankPrint } from '../../shared-core/scores/printed-number.ts';
import { attainableScores } from '../../shared-core/scale/score-scale.ts';
import { tableFromCounts, type FrequencyTable } from '../../shared-core/tally/frequency-table.ts';
import { readPublished } from './published-checks.ts';
import { wholeScale } from './read-reference.ts';

const published = readPublished();
const WHOLE: RankPrint = { decimals: 0, rounding: 'half-up', ends: 'held' };

function rankAt(table: FrequencyTable, score: number, definition: RankDefinition): ExactRatio {
  const rank = percentileRanks(table, definition)[attainableScores(table.scale).indexOf(score)];
  if (rank === undefined) throw new RangeError(`${score} is not on the scale`);
  return rank;
}

/** Frequencies of classes, everybody put at the lowest score of the class. */
function classTable(intervals: readonly (readonly [number, number])[], people: readonly number[]): FrequencyTable {
  const scale = wholeScale(Math.min(...intervals.map(([low]) => low)), Math.max(...intervals.map(([, high]) => high)));
  const counts = attainableScores(scale).map((score) => people[intervals.findIndex(([low]) => low === score)] ?? 0);
  return tableFromCounts(scale, counts);
}

describe('ACT High School Profile 1999, Table 1: per cent at or below, national', () => {
  const { N, columns, rows } = published.act_1999;
  const tests = ['english', 'mathematics', 'reading', 'science', 'composite'];
  const cells = tests.flatMap((test) => rows.map((row) => ({ test, row })));

  /** The rows below 14 are cut off in the copy that was read; their people stand at 13 together. */
  const tables = new Map(
    tests.map((test) => {
      const column = columns.indexOf(`${test}_n`);
      const scale = wholeScale(13, 36);
      const printed = rows.map((row) => row[column] ?? NaN);
      const remainder = N - printed.reduce((sum, count) => sum + count, 0);
      return [test, tableFromCounts(scale, [remainder, ...printed.toReversed()])];
    }),
  );

  it('has 115 printed values', () => {
    expect(cells.length).toBe(115);
    expect(rows.map(([score]) => score)).toEqual(Array.from({ length: 23 }, (_, index) => 36 - index));
  });

  it.each(tests)('%s', (test) => {
    const table = tables.get(test);
    if (table === undefined) throw new RangeError(test);
    for (const { row } of cells.filter((cell) => cell.test === test)) {
      const rank = rankAt(table, row[0] ?? NaN, { kind: 'at-or-below' });
      const expected = String(row[columns.indexOf(`${test}_pct`)]);
      expect(printRank(rank, WHOLE).text, `${test} ${row[0]}`).toBe(expected);
    }
  });

  it('the top score prints 99 because 100 is never printed', () => {
    const table = tables.get('english');
    if (table === undefined) throw new RangeError('english');
    const top = rankAt(table, 36, { kind: 'at-or-below' });
    expect(compareToWhole(top, 100n)).toBe(0);
    expect(printRank(top, WHOLE)).toEqual({ text: '99', end: 'high' });
  });
});

describe('Gravetter & Wallnau, Statistics for the Behavioral Sciences', () => {
  const { ungrouped, grouped } = published.gravetter_wallnau;

  it('Example 2.8: the rank of 7.0 is 32 %', () => {
    const table = tableFromCounts(wholeScale(5, 10), ungrouped.f);
    expect(ungrouped.scores).toEqual([5, 6, 7, 8, 9, 10]);
    const expected = BigInt(ungrouped.pr_at_7);
    expect(compareToWhole(rankAt(table, 7, { kind: 'midpoint' }), expected)).toBe(0);
    expect(compareToWhole(rankAt(table, 7, { kind: 'grouped', width: 1 }), expected)).toBe(0);
  });

  it('Examples 2.9 and 2.10: the 40th percentile is 7.5, the rank of 9.0 is 55 %', () => {
    const table = classTable(grouped.intervals, grouped.f);
    expect(percentilePoint(table, 0.4, 'grouped', 5).score).toBe(grouped.p40);
    const rank = rankAt(table, 9, { kind: 'grouped', width: 5 });
    expect(compareToWhole(rank, BigInt(grouped.pr_at_9))).toBe(0);
  });
});

describe('worked examples', () => {
  it('encyclopedia "Percentile rank": 60 and 95 among ten scores', () => {
    const table = tableFromCounts(wholeScale(3, 7), [5, 2, 1, 1, 1]);
    const midpoint: RankDefinition = { kind: 'midpoint' };
    expect(compareToWhole(rankAt(table, 4, midpoint), BigInt(published.pr_mid_ten_scores.pr_at_4))).toBe(0);
    expect(compareToWhole(rankAt(table, 7, midpoint), BigInt(published.pr_mid_ten_scores.pr_at_7))).toBe(0);
  });

  it('four of eight below a score and two at it make 62.5, printed 63 by halves up and 62 by halves to even', () => {
    const table = tableFromCounts(wholeScale(51, 53), [4, 2, 2]);
    const rank = rankAt(table, 52, { kind: 'midpoint' });
    expect(rank.numerator * 2n).toBe(125n * rank.denominator);
    expect(printRank(rank, WHOLE).text).toBe('63');
    expect(printRank(rank, { ...WHOLE, rounding: 'half-even' }).text).toBe('62');
    expect(printRank(rank, { ...WHOLE, decimals: 1 }).text).toBe('62.5');
    expect(printRank(ratio(127n, 2n), { ...WHOLE, rounding: 'half-even' }).text).toBe('64');
  });
});
