import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { INTERVAL_METHODS, proportionInterval } from '../../../shared-core/precision/proportion-interval.ts';
import { rankStandardError } from '../../../shared-core/precision/rank-variance.ts';
import {
  carriedPercentiles,
  planSize,
  type PlannedSize,
  type Wish,
} from '../../../shared-core/precision/sample-size.ts';

function planned(ranks: readonly number[], wish: Wish, designEffect = 1): readonly PlannedSize[] {
  const plan = planSize(ranks, wish, designEffect);
  if (!plan.ok) throw new Error(plan.problem);
  expect(plan.people).toBe(Math.max(...plan.sizes.map(({ people }) => people)));
  return plan.sizes;
}

const error = (points: number): Wish => ({ kind: 'standard-error', points });
const peopleFor = (ranks: readonly number[], wish: Wish, designEffect = 1): readonly number[] =>
  planned(ranks, wish, designEffect).map(({ people }) => people);

describe('the planner', () => {
  it('finds n = p(1 − p)/SE² exactly where that is whole', () => {
    expect(peopleFor([50, 20, 10, 2, 1], error(1))).toEqual([2500, 1600, 900, 196, 99]);
    expect(peopleFor([50, 90], error(2))).toEqual([625, 225]);
    expect(peopleFor([50, 20], error(1), 1.5)).toEqual([3750, 2400]);
  });

  it('is the inverse of the standard error: enough, and one fewer would not be', () => {
    const ranks = fc.double({ min: 0.5, max: 99.5, noNaN: true });
    const points = fc.double({ min: 0.05, max: 20, noNaN: true });
    const effects = fc.double({ min: 0.5, max: 5, noNaN: true });
    fc.assert(
      fc.property(ranks, points, effects, (rank, wished, effect) => {
        const [size] = planned([rank], error(wished), effect);
        const people = size?.people ?? NaN;
        const at = (n: number): number => rankStandardError({ below: rank / 100, at: 0 }, 'below', n / effect);
        expect(size?.reached).toBe(at(people));
        expect(at(people)).toBeLessThanOrEqual(wished * (1 + 1e-11));
        if (people > 1) expect(at(people - 1)).toBeGreaterThan(wished * (1 - 1e-11));
      }),
    );
  });

  it('finds the smallest n whose interval is narrow enough, by every method', () => {
    for (const method of INTERVAL_METHODS) {
      for (const rank of [3, 16, 50, 84.1, 98]) {
        for (const level of [68, 95]) {
          const [size] = planned([rank], { kind: 'width', points: 6, interval: { method, level } });
          const people = size?.people ?? NaN;
          const width = (n: number): number => {
            const { low, high } = proportionInterval((rank / 100) * n, n, { method, level });
            return high - low;
          };
          expect(width(people)).toBeLessThanOrEqual(6 + 1e-9);
          for (const fewer of [1, 2, 5, 20]) expect(width(people - fewer)).toBeGreaterThan(6);
          for (const more of [1, 2, 5, 20, 1000]) expect(width(people + more)).toBeLessThan(6);
        }
      }
    }
  });

  it('says in words what cannot be planned', () => {
    const says = (ranks: readonly number[], wish: Wish, effect: number): string => {
      const plan = planSize(ranks, wish, effect);
      return plan.ok ? '' : plan.problem;
    };
    expect(says([], error(1), 1)).toContain('at least one');
    expect(says([0, 50], error(1), 1)).toContain('between 0 and 100');
    expect(says([50], error(0), 1)).toContain('above 0');
    expect(says([50], error(1), 0)).toContain('design effect');
    expect(says([50], error(0.001), 1)).toContain('Wish for less');
    expect(says([50], { kind: 'width', points: 4, interval: { method: 'wilson', level: 30 } }, 1)).toContain('level');
  });
});

describe('a cohort at hand', () => {
  const interval = { method: 'wilson', level: 90 } as const;

  it('carries the percentiles whose interval is narrow enough: the ends before the middle', () => {
    const found = carriedPercentiles(300, interval, 6);
    expect(found.map(({ percentile }) => percentile)).toEqual(Array.from({ length: 99 }, (_, index) => index + 1));
    const carried = found.filter((one) => one.carried).map(({ percentile }) => percentile);
    expect(carried).toContain(1);
    expect(carried).toContain(99);
    expect(carried).not.toContain(50);
    found.forEach(({ percentile, width, carried: can }) => {
      const { low, high } = proportionInterval(3 * percentile, 300, interval);
      expect(width).toBeCloseTo(high - low, 9);
      expect(can).toBe(high - low <= 6);
    });
  });

  it('carries all of them from the planned number of people on', () => {
    const wish = { kind: 'width', points: 6, interval } as const;
    const needed = Math.max(
      ...peopleFor(
        Array.from({ length: 99 }, (_, index) => index + 1),
        wish,
      ),
    );
    expect(carriedPercentiles(needed, interval, 6).every(({ carried }) => carried)).toBe(true);
    expect(carriedPercentiles(needed - 2, interval, 6).every(({ carried }) => carried)).toBe(false);
    expect(() => carriedPercentiles(needed, interval, 0)).toThrow(RangeError);
  });
});
