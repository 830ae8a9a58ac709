import { describe, expect, it } from 'vitest';
import { percentileRanks, rankParts, type RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import { ratioToNumber, type ExactRatio } from '../../shared-core/percentile/exact-ratio.ts';
import { derivedScores, normalisedZ, stanineOfZ, stenOfZ } from '../../shared-core/scores/derived-score.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { EXACT, NORMAL, expectAllNear, expectNear } from './near.ts';
import { numberIn, readCohortReference, readRows, tableFromScores, wholeScale } from './read-reference.ts';

const COHORTS = ['c1_tiny', 'c2_leftskew', 'c3_twomodes', 'c4_large'];

const SCORE_COLUMNS: readonly (readonly [string, RankDefinition])[] = [
  ['z_blom', { kind: 'plotting-position', offset: '0.375' }],
  ['z_tukey', { kind: 'plotting-position', offset: '1/3' }],
  ['z_rankit', { kind: 'plotting-position', offset: '0.5' }],
  ['z_vdw', { kind: 'plotting-position', offset: '0' }],
];

describe.each(COHORTS)('every score of %s', (id) => {
  const { scale } = readCohortReference(id);
  const people = readRows(`${id}_cohort.csv`).map((row) => Number(row['score']));
  const table = tableFromScores(wholeScale(scale.min, scale.max), people);
  const rows = readRows(`${id}_scores.csv`);

  /** The reference gives plotting positions only where somebody has the score; returns how many cells were compared. */
  function compare(column: string, actual: readonly (number | null)[], tolerance: number): number {
    expect(actual.length).toBe(rows.length);
    let compared = 0;
    rows.forEach((row, position) => {
      const expected = numberIn(row, column);
      if (expected === null) return;
      expectNear(actual[position] ?? null, expected, tolerance, `${column} of ${row['score']}`);
      compared += 1;
    });
    return compared;
  }

  const exact = (definition: RankDefinition): readonly ExactRatio[] => percentileRanks(table, definition);
  const ranks = (definition: RankDefinition): readonly number[] => exact(definition).map(ratioToNumber);
  const observed = table.counts.filter((count) => count > 0).length;

  it('counts', () => {
    const parts = rankParts(table);
    expect(compare('freq', table.counts, 0)).toBe(rows.length);
    compare('cum_below', parts.map(({ below }) => Number(below)), 0);
    compare('cum_atbelow', parts.map(({ below, at }) => Number(below + at)), 0);
  });

  it('percentile ranks', () => {
    expect(compare('pr_below', ranks({ kind: 'below' }), EXACT)).toBe(rows.length);
    compare('pr_atbelow', ranks({ kind: 'at-or-below' }), EXACT);
    compare('pr_mid', ranks({ kind: 'midpoint' }), EXACT);
    expect(compare('pr_weibull', ranks({ kind: 'plotting-position', offset: '0' }), EXACT)).toBe(observed);
  });

  it('linear z', () => {
    const { mean, sd } = summarise(table);
    const z = rows.map((row) => (Number(row['score']) - mean) / (sd ?? NaN));
    expect(compare('z_linear_n1', z, EXACT)).toBe(rows.length);
  });

  it.each(SCORE_COLUMNS)('%s', (column, definition) => {
    expect(compare(column, exact(definition).map(normalisedZ), NORMAL)).toBe(observed);
  });

  it('scores derived from the midpoint rank, none where it is 0 or 100', () => {
    const midpoints = exact({ kind: 'midpoint' });
    const derived = midpoints.map((rank) => derivedScores(rank, normalisedZ(rank)));
    const finite = rows.filter((row) => row['z_from_pr_mid'] !== '').length;
    expect(derived.filter(({ z }) => z !== null).length).toBe(finite);
    expect(compare('z_from_pr_mid', derived.map(({ z }) => z), NORMAL)).toBe(finite);
    compare('T_mid', derived.map(({ t }) => t), NORMAL);
    compare('dev100_15_mid', derived.map(({ deviation }) => deviation), NORMAL);
    compare('nce2106_mid', derived.map(({ nce }) => nce), NORMAL);
    expect(compare('stanine_pr_ge', derived.map(({ stanine }) => stanine), 0)).toBe(rows.length);
    compare('sten_z', derived.map(({ sten }) => sten), 0);
    compare('sten_z', derived.map(({ z }) => (z === null ? null : stenOfZ(z))), 0);
    compare('stanine_z', derived.map(({ z }) => (z === null ? null : stanineOfZ(z))), 0);
  });

  it('ranks within classes between exact limits', () => {
    const { grouped_exact_limits: grouped } = readCohortReference(id);
    expect(grouped.scores).toEqual(rows.map((row) => Number(row['score'])));
    expectAllNear(ranks({ kind: 'grouped', width: grouped.width }), grouped.pr_at_scores, EXACT, 'grouped ranks');
  });
});
