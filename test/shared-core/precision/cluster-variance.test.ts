import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clusterRankErrors } from '../../../shared-core/precision/cluster-variance.ts';
import { shareOfTied, type CountedRank } from '../../../shared-core/precision/counted-rank.ts';
import { rankStandardErrors } from '../../../shared-core/precision/rank-variance.ts';
import { samplingDesign } from '../../../shared-core/precision/sampling-design.ts';
import type { Direction, ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import {
  mirrorTable,
  peopleIn,
  tablesByGroup,
  type FrequencyTable,
} from '../../../shared-core/tally/frequency-table.ts';
import { countRows, readingWith } from '../tally/readings.ts';

interface Person {
  readonly school: string;
  readonly score: number;
  readonly weight: string;
}

const COUNTED = ['below', 'midpoint', 'at-or-below'] as const;
const scaleTo = (max: number, direction: Direction = 'high-is-good'): ScoreScale => ({
  min: 0,
  max,
  step: 1,
  direction,
});

function tableOf(people: readonly Person[], scale: ScoreScale, weighted = true): FrequencyTable {
  const roles = weighted
    ? ({ school: 'cluster', score: 'score', w: 'weight' } as const)
    : ({ school: 'cluster', score: 'score' } as const);
  const rows = people.map(({ school, score, weight }) => [school, String(score), weight]);
  const [group] = tablesByGroup(countRows(readingWith(roles, { scale }), ['school', 'score', 'w'], rows).tally, []);
  if (group === undefined) throw new Error('no group');
  return group.table;
}

function personOf(school: string, score: number, weight = '1'): Person {
  return { school, score, weight };
}

function errorsOf(table: FrequencyTable, counted: CountedRank): readonly number[] {
  const errors = clusterRankErrors(table, counted);
  if (errors === null) throw new Error('no clusters to compare');
  return errors;
}

function expectNear(found: readonly number[], wanted: readonly number[], within = 1e-9): void {
  expect(found).toHaveLength(wanted.length);
  found.forEach((value, index) => expect(Math.abs(value - (wanted[index] ?? NaN))).toBeLessThanOrEqual(within));
}

/** Person by person from the definition: C/(C − 1) Σ_c (Σ_i w_i (g_i − t))² / W²; a blank school is one of its own. */
function plainErrors(people: readonly Person[], scores: number, counted: CountedRank, direction: Direction): number[] {
  const schools = people.map(({ school }, index) => (school === '' ? `alone ${index}` : school));
  const weights = people.map(({ weight }) => Number(weight));
  const all = weights.reduce((sum, weight) => sum + weight, 0);
  return Array.from({ length: scores }, (_, at) => {
    const counts = people.map(({ score }) => {
      const worse = direction === 'high-is-good' ? score < at : score > at;
      return worse ? 1 : score === at ? shareOfTied(counted) : 0;
    });
    const rank = counts.reduce<number>((sum, count, index) => sum + count * (weights[index] ?? 0), 0) / all;
    const sums = new Map<string, number>();
    counts.forEach((count, index) => {
      const school = schools[index] ?? '';
      sums.set(school, (sums.get(school) ?? 0) + (weights[index] ?? 0) * (count - rank));
    });
    const squares = [...sums.values()].reduce((sum, one) => sum + one * one, 0);
    return 100 * Math.sqrt(((sums.size / (sums.size - 1)) * squares) / (all * all));
  });
}

const drawn = fc
  .array(
    fc.record({
      school: fc.constantFrom('', 'a', 'b', 'c', 'd'),
      score: fc.integer({ min: 0, max: 6 }),
      weight: fc.constantFrom('1', '0.25', '1.5', '3.125'),
    }),
    { maxLength: 40 },
  )
  .map((people): readonly Person[] => [personOf('a', 0), personOf('b', 6), ...people]);

describe('the variance between clusters', () => {
  it('is what a hand finds', () => {
    // Two people at 0 in one school, one at 1 and one at 2 in another, one at 2 in a third. At score 1 the midpoint rank
    // is 1/2, and the schools stand 1, −1/2 and −1/2 off it: 3/2 · (1 + 1/4 + 1/4)/25 = 0.09.
    const people = [
      ['a', 0],
      ['a', 0],
      ['b', 1],
      ['b', 2],
      ['c', 2],
    ] as const;
    const table = tableOf(
      people.map(([school, score]) => personOf(school, score)),
      scaleTo(2),
      false,
    );
    expectNear(
      errorsOf(table, 'midpoint'),
      [0.0336, 0.09, 0.0156].map((variance) => 100 * Math.sqrt(variance)),
    );
  });

  it('equals a recomputation person by person, weighted or not, whichever end is good', () => {
    fc.assert(
      fc.property(
        drawn,
        fc.constantFrom(...COUNTED),
        fc.constantFrom('high-is-good' as const, 'low-is-good' as const),
        fc.boolean(),
        (people, counted, direction, weighted) => {
          const known = weighted ? people : people.map((one) => ({ ...one, weight: '1' }));
          const found = errorsOf(tableOf(people, scaleTo(6, direction), weighted), counted);
          expectNear(found, plainErrors(known, 7, counted, direction));
        },
      ),
    );
  });

  it('of a mirrored table is mirrored', () => {
    fc.assert(
      fc.property(drawn, (people) => {
        const table = tableOf(people, scaleTo(6));
        const mirrored = mirrorTable(table);
        expectNear(errorsOf(mirrored, 'midpoint'), errorsOf(table, 'midpoint').toReversed());
        expect(mirrorTable(mirrored)).toEqual(table);
      }),
    );
  });

  it('is the simple one times n/(n − 1) where each is a cluster of one, named or not', () => {
    fc.assert(
      fc.property(drawn, fc.boolean(), fc.constantFrom(...COUNTED), (people, named, counted) => {
        const apart = people.map((one, index) => ({ ...one, school: named ? `s${index}` : '' }));
        const table = tableOf(apart, scaleTo(6), false);
        const n = peopleIn(table);
        const simple = rankStandardErrors(table, counted, n).map((error) => (error * error * n) / (n - 1));
        expectNear(
          errorsOf(table, counted).map((error) => error * error),
          simple,
        );
      }),
    );
  });

  it('cannot be told of one cluster, or of none', () => {
    const table = tableOf([personOf('a', 0), personOf('a', 2)], scaleTo(2), false);
    expect(clusterRankErrors(table, 'midpoint')).toBeNull();
    expect(clusterRankErrors({ ...table, clusters: null }, 'midpoint')).toBeNull();
  });
});

describe('the design effect', () => {
  const forty = Array.from({ length: 40 }, (_, index) => personOf(`s${index}`, (index * 7) % 11));

  it('is m C/(C − 1) where each of C clusters holds one person m times', () => {
    for (const copies of [2, 5]) {
      const people = Array.from({ length: copies }, () => forty).flat();
      const table = tableOf(people, scaleTo(10), false);
      const { clusters, designEffect, effectiveN } = samplingDesign(table, 'midpoint', peopleIn(table));
      expect(clusters).toBe(40);
      expectNear([designEffect ?? NaN, effectiveN], [(copies * 40) / 39, 39]);
    }
  });

  it('is averaged over obtained scores with ranks from 10 to 90', () => {
    const people = [...forty, ...forty.map((one) => ({ ...one, school: 's0' }))];
    const table = tableOf(people, scaleTo(12), false);
    const clustered = errorsOf(table, 'below');
    const simple = rankStandardErrors(table, 'below', 80);
    const ranks = plainRanksBelow(table);
    const effects = clustered
      .map((error, score) => (error / (simple[score] ?? NaN)) ** 2)
      .filter((_, score) => (table.counts[score] ?? 0) > 0 && (ranks[score] ?? 0) >= 10 && (ranks[score] ?? 0) <= 90);
    expect(effects.length).toBeGreaterThan(5);
    expect(effects.length).toBeLessThan(11);
    const mean = effects.reduce((sum, effect) => sum + effect, 0) / effects.length;
    expectNear([samplingDesign(table, 'below', 80).designEffect ?? NaN], [mean]);
  });

  it('has no design effect where everybody scores alike', () => {
    const table = tableOf([personOf('a', 1), personOf('b', 1), personOf('', 1)], scaleTo(2), false);
    for (const counted of COUNTED) {
      expect(samplingDesign(table, counted, 3)).toEqual({ clusters: 3, designEffect: null, effectiveN: 3 });
    }
  });

  it('never makes more of the people than they and their weights are', () => {
    // Each school holds one at either end: schools are more alike than chance.
    const people = Array.from({ length: 60 }, (_, index) => personOf(`s${index >> 1}`, index % 2));
    const { designEffect, effectiveN } = samplingDesign(tableOf(people, scaleTo(1), false), 'midpoint', 60);
    expect(designEffect).toBeLessThan(1);
    expect(effectiveN).toBe(60);
    expect(samplingDesign(tableOf(people, scaleTo(1)), 'midpoint', 44).effectiveN).toBe(44);
  });

  it('is not told without clusters, of one cluster, or of equal scores', () => {
    const one = tableOf([personOf('a', 0), personOf('a', 2)], scaleTo(2), false);
    expect(samplingDesign(one, 'midpoint', 2)).toEqual({ clusters: 1, designEffect: null, effectiveN: 2 });
    const bare = { ...one, clusters: null };
    expect(samplingDesign(bare, 'midpoint', 1.5)).toEqual({ clusters: null, designEffect: null, effectiveN: 1.5 });
    const equal = tableOf([personOf('a', 1), personOf('b', 1)], scaleTo(2), false);
    expect(samplingDesign(equal, 'below', 2)).toEqual({ clusters: 2, designEffect: null, effectiveN: 2 });
  });
});

function plainRanksBelow(table: FrequencyTable): readonly number[] {
  let below = 0;
  return table.counts.map((count) => {
    const rank = (100 * below) / peopleIn(table);
    below += count;
    return rank;
  });
}
