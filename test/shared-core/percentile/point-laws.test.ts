import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';
import {
  percentilePoint,
  POINT_DEFINITIONS,
  pointProblem,
  type PointDefinition,
} from '../../../shared-core/percentile/percentile-point.ts';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import { attainableScores } from '../../../shared-core/scale/score-scale.ts';
import { peopleIn, tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, copied, countedTables, equallyWeighted, lowIsGood, weightedTables } from './some-tables.ts';

/** Proportions in thousandths, ends included. */
const THOUSANDTHS = fc.integer({ min: 0, max: 1000 });
const NEAR = 1e-9;

function pointOf(
  table: FrequencyTable,
  thousandths: number,
  definition: PointDefinition,
  width = table.scale.step,
): number {
  return percentilePoint(table, thousandths / 1000, definition, width).score;
}

function definitionsFor(table: FrequencyTable): readonly PointDefinition[] {
  return POINT_DEFINITIONS.filter((definition) => pointProblem(table, definition, table.scale.step) === null);
}

/** Hyndman & Fan's definitions on the people in a row, as their paper states them; p in thousandths, so np is exact. */
function plainQuantile(sorted: readonly number[], thousandths: number, type: PointDefinition): number {
  const n = sorted.length;
  const person = (rank: number): number => sorted[Math.min(n, Math.max(1, rank)) - 1] ?? NaN;
  const whole = Math.floor((n * thousandths) / 1000);
  const left = (n * thousandths) % 1000;
  const between = (position: number): number => {
    const low = Math.floor(position + 1e-12);
    const part = Math.max(0, position - low);
    return (1 - part) * person(low) + part * person(low + 1);
  };
  const p = thousandths / 1000;
  switch (type) {
    case 'type-1':
    case 'nearest-rank':
      return left > 0 ? person(whole + 1) : person(whole);
    case 'type-2':
      return left > 0 ? person(whole + 1) : (person(whole) + person(whole + 1)) / 2;
    case 'type-3': {
      if (left !== 500) return person(left > 500 ? whole + 1 : whole);
      return person(whole % 2 === 0 ? whole : whole + 1);
    }
    case 'type-4':
      return between(n * p);
    case 'type-5':
      return between(n * p + 1 / 2);
    case 'type-6':
      return between((n + 1) * p);
    case 'type-7':
      return between((n - 1) * p + 1);
    case 'type-8':
      return between((n + 1 / 3) * p + 1 / 3);
    case 'type-9':
      return between((n + 1 / 4) * p + 3 / 8);
    default:
      throw new RangeError(type);
  }
}

describe('percentile points', () => {
  it('by types 1 to 9 and the nearest rank are those of the people in a row', () => {
    const sizes = fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 1, maxLength: 60 });
    fc.assert(
      fc.property(sizes, THOUSANDTHS, (scores, thousandths) => {
        const scale = { min: 0, max: 9, step: 1, direction: 'high-is-good' } as const;
        const counts = attainableScores(scale).map((score) => scores.filter((other) => other === score).length);
        const table = tableFromCounts(scale, counts);
        const sorted = scores.toSorted((left, right) => left - right);
        for (const type of POINT_DEFINITIONS) {
          if (type === 'grouped' || type === 'inverse') continue;
          const expected = plainQuantile(sorted, thousandths, type);
          expect(Math.abs(pointOf(table, thousandths, type) - expected), type).toBeLessThan(NEAR);
        }
      }),
      { numRuns: 400 },
    );
  });

  it('never fall as the proportion grows, and never rise where low scores are good', () => {
    fc.assert(
      fc.property(anyTables(), THOUSANDTHS, THOUSANDTHS, (table, one, other) => {
        const [less, more] = [Math.min(one, other), Math.max(one, other)];
        for (const definition of definitionsFor(table)) {
          expect(pointOf(table, more, definition) - pointOf(table, less, definition), definition).toBeGreaterThan(
            -NEAR,
          );
          const reversed = lowIsGood(table);
          const change = pointOf(reversed, more, definition) - pointOf(reversed, less, definition);
          expect(change, definition).toBeLessThan(NEAR);
        }
      }),
    );
  });

  it('by the inverse are the score itself at the midpoint rank of every score somebody has', () => {
    fc.assert(
      fc.property(anyTables(), fc.boolean(), (people, reversed) => {
        const table = reversed ? lowIsGood(people) : people;
        const ranks = percentileRanks(table, { kind: 'midpoint' });
        attainableScores(table.scale).forEach((score, index) => {
          const rank = ranks[index];
          if (rank === undefined || (table.counts[index] ?? 0) === 0) return;
          const found = percentilePoint(table, ratioToNumber(rank) / 100, 'inverse', 1);
          expect(Math.abs(found.score - score)).toBeLessThan(1e-7);
          expect(found.flat).toBe(false);
        });
      }),
    );
  });

  it('at 0 and 1 are the ends of what was observed', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        const observed = attainableScores(table.scale).filter((_, index) => (table.counts[index] ?? 0) > 0);
        const [lowest, highest] = [observed[0] ?? NaN, observed.at(-1) ?? NaN];
        for (const definition of definitionsFor(table)) {
          const reach = definition === 'inverse' || definition === 'grouped' ? table.scale.step / 2 : 0;
          expect(pointOf(table, 0, definition)).toBeCloseTo(lowest - reach, 9);
          expect(pointOf(table, 1000, definition)).toBeCloseTo(highest + reach, 9);
        }
      }),
    );
  });

  it('seen from the other end are the points of what remains, by the definitions that are symmetric', () => {
    const symmetric = ['type-2', 'type-5', 'type-6', 'type-7', 'type-8', 'type-9', 'inverse', 'grouped'] as const;
    fc.assert(
      fc.property(anyTables(), THOUSANDTHS, (table, thousandths) => {
        for (const definition of symmetric) {
          if (pointProblem(table, definition, table.scale.step) !== null) continue;
          const fromTop = pointOf(lowIsGood(table), thousandths, definition);
          expect(Math.abs(fromTop - pointOf(table, 1000 - thousandths, definition)), definition).toBeLessThan(NEAR);
        }
      }),
    );
  });

  it('are those of the unweighted group when all weigh the same, by every definition', () => {
    fc.assert(
      fc.property(countedTables(), THOUSANDTHS, fc.bigInt({ min: 1n, max: 90_000n }), (table, thousandths, units) => {
        for (const definition of POINT_DEFINITIONS) {
          const weighted = equallyWeighted(table, units);
          expect(pointOf(weighted, thousandths, definition)).toBeCloseTo(pointOf(table, thousandths, definition), 9);
        }
      }),
    );
  });

  it('take a weight of k units as k people', () => {
    const byWeight = ['type-1', 'type-2', 'nearest-rank', 'grouped', 'inverse'] as const;
    fc.assert(
      fc.property(weightedTables(), THOUSANDTHS, (table, thousandths) => {
        const people = tableFromCounts(table.scale, table.weights.map(Number));
        for (const definition of byWeight) {
          expect(pointOf(table, thousandths, definition)).toBe(pointOf(people, thousandths, definition));
        }
      }),
    );
  });

  it('stay when everybody is there k times, by the definitions that do not count people', () => {
    const byShare = ['type-1', 'type-2', 'nearest-rank', 'grouped', 'inverse'] as const;
    fc.assert(
      fc.property(anyTables(), THOUSANDTHS, fc.integer({ min: 2, max: 9 }), (table, thousandths, times) => {
        for (const definition of byShare) {
          const many = pointOf(copied(table, times), thousandths, definition);
          expect(many).toBeCloseTo(pointOf(table, thousandths, definition), 9);
        }
      }),
    );
  });

  it('move with the scores', () => {
    fc.assert(
      fc.property(anyTables(), THOUSANDTHS, (table, thousandths) => {
        const { scale } = table;
        const length = table.counts.length;
        const moved = { ...table, scale: { ...scale, min: 7, max: 7 + 3 * (length - 1), step: 3 } };
        for (const definition of definitionsFor(table)) {
          const before = (pointOf(table, thousandths, definition) - scale.min) / scale.step;
          expect(Math.abs((pointOf(moved, thousandths, definition) - 7) / 3 - before), definition).toBeLessThan(NEAR);
        }
      }),
    );
  });
});

describe('a point', () => {
  const scale = { min: 0, max: 3, step: 1, direction: 'high-is-good' } as const;
  const gap = tableFromCounts(scale, [1, 0, 0, 1]);

  it('on a flat stretch is its middle and says so', () => {
    expect(percentilePoint(gap, 0.5, 'inverse', 1)).toEqual({
      proportion: 0.5,
      definition: 'inverse',
      score: 1.5,
      flat: true,
    });
    expect(percentilePoint(gap, 0.5, 'grouped', 1).flat).toBe(true);
    expect(percentilePoint(gap, 0.5, 'grouped', 2)).toMatchObject({ score: 1.5, flat: false });
    expect(percentilePoint(gap, 0.49, 'inverse', 1)).toMatchObject({ score: 0.48, flat: false });
    expect(percentilePoint(lowIsGood(gap), 0.5, 'inverse', 1)).toMatchObject({ score: 1.5, flat: true });
  });

  it('takes a proportion as the decimal it is written as: 0.1 of ten is one person', () => {
    const ten = tableFromCounts(scale, [1, 2, 3, 4]);
    expect(peopleIn(ten)).toBe(10);
    expect(percentilePoint(ten, 0.1, 'type-1', 1).score).toBe(0);
    expect(percentilePoint(ten, 0.1, 'type-2', 1).score).toBe(0.5);
    expect(percentilePoint(ten, 0.3, 'type-2', 1).score).toBe(1.5);
    expect(percentilePoint(ten, 0.1 + 0.2, 'type-2', 1).score).toBe(2);
    expect(percentilePoint(ten, 1e-60, 'type-1', 1).score).toBe(0);
  });

  it('that cannot be had says why, and throws when it is asked for all the same', () => {
    const empty = tableFromCounts(scale, [0, 0, 0, 0]);
    const weighted = { ...gap, weights: [2n, 0n, 0n, 1n], squares: [4n, 0n, 0n, 1n], weighted: true };
    expect(pointProblem(empty, 'type-7', 1)).toMatch(/without people/);
    expect(pointProblem(gap, 'grouped', 0.3)).toMatch(/multiple of the scale's step, 1/);
    expect(pointProblem(weighted, 'type-7', 1)).toMatch(/type-7 counts people one by one/);
    expect(pointProblem(weighted, 'type-2', 1)).toBeNull();
    expect(pointProblem(gap, 'type-7', 0.3)).toBeNull();
    expect(() => percentilePoint(weighted, 0.5, 'type-7', 1)).toThrow(RangeError);
    expect(() => percentilePoint(gap, 1.01, 'type-7', 1)).toThrow(RangeError);
    expect(() => percentilePoint(gap, -0.01, 'inverse', 1)).toThrow(RangeError);
    expect(() => percentilePoint(gap, NaN, 'inverse', 1)).toThrow(RangeError);
  });
});
