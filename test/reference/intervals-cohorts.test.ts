import { describe, expect, it } from 'vitest';
import { rankIntervals, type IntervalMethod } from '../../shared-core/precision/proportion-interval.ts';
import { rankStandardErrors } from '../../shared-core/precision/rank-variance.ts';
import type { CountedRank } from '../../shared-core/precision/counted-rank.ts';
import { EXACT, NORMAL, expectNear } from './near.ts';
import { numberIn, readCohortReference, readRows, tableFromScores, wholeScale } from './read-reference.ts';

const COHORTS = ['c1_tiny', 'c2_leftskew', 'c3_twomodes', 'c4_large'];

const COUNTED: readonly (readonly [string, CountedRank])[] = [
  ['below', 'below'],
  ['atbelow', 'at-or-below'],
  ['mid', 'midpoint'],
];

const METHODS: readonly (readonly [string, IntervalMethod])[] = [
  ['wilson', 'wilson'],
  ['clopper', 'clopper-pearson'],
  ['jeffreys', 'jeffreys'],
];

/** Every column of a file of intervals but the score, with what it is of. */
const COLUMNS = COUNTED.flatMap(([prefix, kind]) =>
  METHODS.filter(([, method]) => kind !== 'midpoint' || method !== 'clopper-pearson').flatMap(([word, method]) =>
    [90, 95].map((level) => ({ column: `${prefix}_${word}_${level}`, kind, method, level })),
  ),
);

describe.each(COHORTS)('percentile ranks of %s', (id) => {
  const { scale } = readCohortReference(id);
  const people = readRows(`${id}_cohort.csv`).map((row) => Number(row['score']));
  const table = tableFromScores(wholeScale(scale.min, scale.max), people);
  const rows = readRows(`${id}_intervals.csv`);

  it('have all intervals of the file', () => {
    const columns = Object.keys(rows[0] ?? {}).filter((column) => column !== 'score');
    expect(COLUMNS.flatMap(({ column }) => [`${column}_lo`, `${column}_hi`]).toSorted()).toEqual(columns.toSorted());
    expect(rows.length).toBe(table.counts.length);
    for (const { column, kind, method, level } of COLUMNS) {
      const found = rankIntervals(table, people.length, { kind }, { method, level });
      if (!found.ok) throw new Error(found.problem);
      rows.forEach((row, position) => {
        const { low, high } = found.intervals[position] ?? { low: NaN, high: NaN };
        const what = `${column} of ${row['score']}`;
        expectNear(low, numberIn(row, `${column}_lo`) ?? NaN, NORMAL, `${what}, low`);
        expectNear(high, numberIn(row, `${column}_hi`) ?? NaN, NORMAL, `${what}, high`);
      });
    }
  });

  it('have the multinomial standard error of the midpoint rank', () => {
    const errors = rankStandardErrors(table, 'midpoint', people.length);
    readRows(`${id}_scores.csv`).forEach((row, position) => {
      const expected = numberIn(row, 'se_pr_mid_multinomial') ?? NaN;
      expectNear(errors[position] ?? null, expected, EXACT, `standard error of ${row['score']}`);
    });
  });
});
