import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  INTERVAL_METHODS,
  proportionInterval,
  rankIntervals,
  type IntervalMethod,
} from '../../../shared-core/precision/proportion-interval.ts';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';
import { summarise } from '../../../shared-core/tally/cohort-summary.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, copied, countedTables, equallyWeighted, weightedTables } from '../percentile/some-tables.ts';

const levels = fc.constantFrom(50, 68, 80, 90, 95, 99, 99.9);
const counts = fc
  .integer({ min: 1, max: 5000 })
  .chain((n) => fc.integer({ min: 0, max: n }).map((count) => ({ count, n })));
const methods = fc.constantFrom<IntervalMethod>(...INTERVAL_METHODS);
const BITS = 1e-9;

describe('the interval of a proportion', () => {
  it('contains the proportion, but for Jeffreys at counts of nobody and of everybody', () => {
    fc.assert(
      fc.property(counts, levels, methods, ({ count, n }, level, method) => {
        const { low, high } = proportionInterval(count, n, { method, level });
        expect(low).toBeGreaterThanOrEqual(0);
        expect(high).toBeLessThanOrEqual(100);
        if (method !== 'jeffreys' || count > 0) expect(low).toBeLessThanOrEqual((100 * count) / n + BITS);
        if (method !== 'jeffreys' || count < n) expect(high).toBeGreaterThanOrEqual((100 * count) / n - BITS);
      }),
    );
    expect(proportionInterval(0, 20, { method: 'jeffreys', level: 95 }).low).toBeGreaterThan(0);
    expect(proportionInterval(20, 20, { method: 'jeffreys', level: 95 }).high).toBeLessThan(100);
  });

  it('begins at 0 for nobody and ends at 100 for everybody by Wilson and by Clopper and Pearson', () => {
    for (const method of ['wilson', 'clopper-pearson'] as const) {
      for (const n of [1, 7, 20, 333, 1600, 20_000, 77.3]) {
        expect(proportionInterval(0, n, { method, level: 95 }).low).toBe(0);
        expect(proportionInterval(n, n, { method, level: 95 }).high).toBe(100);
      }
    }
  });

  it('by Clopper and Pearson contains that by Jeffreys', () => {
    fc.assert(
      fc.property(counts, levels, ({ count, n }, level) => {
        const outer = proportionInterval(count, n, { method: 'clopper-pearson', level });
        const inner = proportionInterval(count, n, { method: 'jeffreys', level });
        expect(outer.low).toBeLessThanOrEqual(inner.low + BITS);
        expect(outer.high).toBeGreaterThanOrEqual(inner.high - BITS);
      }),
    );
  });

  it('by Clopper and Pearson leaves half of the error in each tail of the binomial', () => {
    const atMost = (count: number, n: number, share: number): number => {
      let term = (1 - share) ** n;
      let sum = term;
      for (let k = 1; k <= count; k += 1) {
        term *= ((n - k + 1) / k) * (share / (1 - share));
        sum += term;
      }
      return sum;
    };
    for (const [count, n, level] of [
      [3, 10, 95],
      [1, 29, 90],
      [15, 60, 99],
      [40, 41, 50],
    ] as const) {
      const { low, high } = proportionInterval(count, n, { method: 'clopper-pearson', level });
      expect(1 - atMost(count - 1, n, low / 100)).toBeCloseTo((100 - level) / 200, 9);
      expect(atMost(count, n, high / 100)).toBeCloseTo((100 - level) / 200, 9);
    }
  });

  it('grows with the level and shrinks with n', () => {
    fc.assert(
      fc.property(counts, methods, ({ count, n }, method) => {
        const width = (times: number, level: number): number => {
          const { low, high } = proportionInterval(count * times, n * times, { method, level });
          return high - low;
        };
        expect(width(1, 90)).toBeGreaterThan(width(1, 68));
        expect(width(1, 99)).toBeGreaterThan(width(1, 90));
        expect(width(2, 95)).toBeLessThan(width(1, 95));
      }),
    );
  });

  it('of the others is its mirror image', () => {
    fc.assert(
      fc.property(counts, levels, methods, ({ count, n }, level, method) => {
        const one = proportionInterval(count, n, { method, level });
        const other = proportionInterval(n - count, n, { method, level });
        expect(Math.abs(one.low - (100 - other.high))).toBeLessThan(BITS);
        expect(Math.abs(one.high - (100 - other.low))).toBeLessThan(BITS);
      }),
    );
  });

  it('throws on what is no proportion and no level', () => {
    const wilson = { method: 'wilson', level: 95 } as const;
    expect(() => proportionInterval(3, 2, wilson)).toThrow(RangeError);
    expect(() => proportionInterval(-1, 2, wilson)).toThrow(RangeError);
    expect(() => proportionInterval(0, 0, wilson)).toThrow(RangeError);
    expect(() => proportionInterval(NaN, 2, wilson)).toThrow(RangeError);
    expect(() => proportionInterval(1, 2, { ...wilson, level: 49.9 })).toThrow(RangeError);
    expect(() => proportionInterval(1, 2, { ...wilson, level: 99.95 })).toThrow(RangeError);
  });
});

describe('the intervals of a table', () => {
  const scale = { min: 0, max: 3, step: 1, direction: 'high-is-good' as const };
  const table = tableFromCounts(scale, [2, 5, 0, 3]);

  it('are those of the count that the definition uses', () => {
    const choice = { method: 'wilson', level: 90 } as const;
    const of = (counted: readonly number[]) => ({
      ok: true,
      intervals: counted.map((count) => proportionInterval(count, 10, choice)),
    });
    expect(rankIntervals(table, 10, { kind: 'below' }, choice)).toEqual(of([0, 2, 7, 7]));
    expect(rankIntervals(table, 10, { kind: 'at-or-below' }, choice)).toEqual(of([2, 7, 7, 10]));
    expect(rankIntervals(table, 10, { kind: 'midpoint' }, choice)).toEqual(of([1, 4.5, 7, 8.5]));
  });

  it('are counted from the high end where low scores are good', () => {
    const low = { ...table, scale: { ...scale, direction: 'low-is-good' as const } };
    const choice = { method: 'clopper-pearson', level: 95 } as const;
    expect(rankIntervals(low, 10, { kind: 'at-or-below' }, choice)).toEqual({
      ok: true,
      intervals: [10, 8, 3, 3].map((count) => proportionInterval(count, 10, choice)),
    });
  });

  it('contain the rank of every score, with weights too, by Wilson', () => {
    fc.assert(
      fc.property(anyTables(), levels, fc.constantFrom('below', 'at-or-below', 'midpoint'), (some, level, kind) => {
        const { effectiveN } = summarise(some);
        const found = rankIntervals(some, effectiveN, { kind }, { method: 'wilson', level });
        if (!found.ok) throw new Error(found.problem);
        percentileRanks(some, { kind }).forEach((rank, position) => {
          const { low, high } = found.intervals[position] ?? { low: NaN, high: NaN };
          expect(low).toBeLessThanOrEqual(ratioToNumber(rank) + BITS);
          expect(high).toBeGreaterThanOrEqual(ratioToNumber(rank) - BITS);
        });
      }),
    );
  });

  it('are the same when all weigh the same', () => {
    fc.assert(
      fc.property(countedTables(), methods, (some, method) => {
        const n = summarise(some).n;
        const weighted = equallyWeighted(some, 12_500n);
        const definition = { kind: 'at-or-below' } as const;
        const choice = { method, level: 95 };
        expect(rankIntervals(weighted, summarise(weighted).effectiveN, definition, choice)).toEqual(
          rankIntervals(some, n, definition, choice),
        );
      }),
    );
  });

  it('shrink when everybody is there more often', () => {
    fc.assert(
      fc.property(countedTables(), methods, (some, method) => {
        const n = summarise(some).n;
        const widths = (times: number): readonly number[] => {
          const found = rankIntervals(copied(some, times), n * times, { kind: 'below' }, { method, level: 95 });
          return found.ok ? found.intervals.map(({ low, high }) => high - low) : [];
        };
        const [once, often] = [widths(1), widths(4)];
        expect(once.length).toBe(some.counts.length);
        once.forEach((width, position) => expect(often[position]).toBeLessThan(width));
      }),
    );
  });

  it('are refused in words where a method cannot serve', () => {
    const exact = { method: 'clopper-pearson', level: 95 } as const;
    const says = (result: ReturnType<typeof rankIntervals>): string => (result.ok ? '' : result.problem);
    expect(says(rankIntervals(table, 10, { kind: 'midpoint' }, exact))).toContain('halves');
    expect(says(rankIntervals(table, 8, { kind: 'below' }, exact))).toContain('weights');
    expect(says(rankIntervals(table, 10, { kind: 'grouped', width: 2 }, exact))).toContain('counts people');
    expect(says(rankIntervals(table, 10, { kind: 'below' }, { method: 'wilson', level: 20 }))).toContain('between 50');
    expect(rankIntervals(table, 10, { kind: 'below' }, exact).ok).toBe(true);
    fc.assert(
      fc.property(weightedTables(), (some) => {
        const { effectiveN, n } = summarise(some);
        fc.pre(Math.abs(effectiveN - n) > 1e-6);
        expect(says(rankIntervals(some, effectiveN, { kind: 'below' }, exact))).toContain('weights');
      }),
    );
  });
});
