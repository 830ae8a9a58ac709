import { describe, expect, it } from 'vitest';
import { percentilePoint, type PointDefinition } from '../../shared-core/percentile/percentile-point.ts';
import type { ScoreScale } from '../../shared-core/scale/score-scale.ts';
import { printNumber } from '../../shared-core/scores/printed-number.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { EXACT, expectAllNear, expectNear } from './near.ts';
import { readPublished } from './published-checks.ts';
import { tableFromScores, wholeScale } from './read-reference.ts';

const published = readPublished();
const QUARTERS = [0.25, 0.5, 0.75];
const NINE = ['type-1', 'type-2', 'type-3', 'type-4', 'type-5', 'type-6', 'type-7', 'type-8', 'type-9'] as const;

function pointsOf(
  scores: readonly number[],
  definition: PointDefinition,
  shares: readonly number[],
  scale: ScoreScale = wholeScale(0, 120),
): readonly number[] {
  const table = tableFromScores(scale, scores);
  return shares.map((share) => percentilePoint(table, share, definition, 1).score);
}

describe('NIST/SEMATECH e-Handbook 7.2.6.2: the 90th percentile of twelve gauge readings', () => {
  const { data, p, expected_4dp, expected_exact, R_types_1_to_9 } = published.nist_percentile;
  const scale: ScoreScale = { min: 95, max: 95.3, step: 0.0001, direction: 'high-is-good' };

  it('95.1981, by position (n + 1)p', () => {
    const [score = NaN] = pointsOf(data, 'type-6', [p], scale);
    expectNear(score, expected_exact, EXACT, 'type 6');
    expect(printNumber(score, 4)).toBe(String(expected_4dp));
  });

  it('the nine definitions as R computes them', () => {
    const found = NINE.map((type) => pointsOf(data, type, [p], scale)[0] ?? null);
    expectAllNear(found, R_types_1_to_9, EXACT, 'types 1 to 9');
  });
});

describe('quantiles printed elsewhere', () => {
  it('encyclopedia "Percentile": 15 20 35 40 50 (types 5 and 1 computed)', () => {
    const list = [15, 20, 35, 40, 50];
    expectAllNear(pointsOf(list, 'type-7', [0.4, 0.25, 0.3]), [29, 20, 23], EXACT, 'type 7');
    expectAllNear(pointsOf(list, 'type-6', [0.4]), [26], EXACT, 'type 6');
    expectAllNear(pointsOf(list, 'type-5', [0.4]), [27.5], EXACT, 'type 5');
    expect(pointsOf(list, 'type-1', [0.4])).toEqual([20]);
    expect(pointsOf(list, 'nearest-rank', [0.4])).toEqual([20]);
  });

  it('r-help, 13 January 2012: 1 12 14 3 96 111', () => {
    const { data, summary, type1 } = published.r_summary;
    expectAllNear(
      pointsOf(data, 'type-7', [0, 0.25, 0.5, 0.75, 1]),
      [summary.min, summary.q1, summary.median, summary.q3, summary.max],
      EXACT,
      'type 7',
    );
    expect(pointsOf(data, 'type-1', QUARTERS)).toEqual(type1);
    expectNear(summarise(tableFromScores(wholeScale(0, 120), data)).mean, summary.mean, EXACT, 'mean');
  });

  it('the same attachment: the first twelve primes (types 1 and 2 read, the others computed with R)', () => {
    const primes = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37];
    const expected: readonly (readonly number[])[] = [
      [5, 13, 23],
      [6, 15, 26],
      [5, 13, 23],
      [5, 13, 23],
      [6, 15, 26],
      [5.5, 15, 27.5],
      [6.5, 15, 24.5],
      [35 / 6, 15, 26.5],
      [5.875, 15, 26.375],
    ];
    NINE.forEach((type, index) => {
      expectAllNear(pointsOf(primes, type, QUARTERS), expected[index] ?? [], EXACT, type);
    });
    expect(summarise(tableFromScores(wholeScale(0, 120), primes)).fiveNumbers).toEqual([2, 6, 15, 26, 37]);
  });

  it.each(published.quartiles_type7_and_hinges)('encyclopedia "Quartile", type 7: $data', ({ data, q1, q2, q3 }) => {
    expectAllNear(pointsOf(data, 'type-7', QUARTERS), [q1, q2, q3], EXACT, 'type 7');
  });

  it('the same lists by hinges (of the second one computed with R)', () => {
    const [first, second] = published.quartiles_type7_and_hinges.map(
      ({ data }) => summarise(tableFromScores(wholeScale(0, 120), data)).fiveNumbers,
    );
    expect(first).toEqual([6, 25.5, 40, 42.5, 49]);
    expect(second).toEqual([6, 11, 37.5, 40.5, 42]);
  });

  it('quartiles as medians of the halves without the median: type 6 for eleven, hinges for six', () => {
    const [eleven, six] = published.quartiles_halves_without_median;
    if (eleven === undefined || six === undefined) throw new RangeError('two lists are expected');
    expectAllNear(pointsOf(eleven.data, 'type-6', QUARTERS), [eleven.q1, eleven.q2, eleven.q3], EXACT, 'type 6');
    const hinges = summarise(tableFromScores(wholeScale(0, 120), six.data)).fiveNumbers.slice(1, 4);
    expect(hinges).toEqual([six.q1, six.q2, six.q3]);
  });

  it.each(published.five_number)('five numbers of $data (the second list from memory)', ({ data, expected }) => {
    expect(summarise(tableFromScores(wholeScale(0, 120), data)).fiveNumbers).toEqual(expected);
  });
});
