import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import { countedRank, smoothedRanks, type CountedRank } from '../../../shared-core/precision/counted-rank.ts';
import {
  normalInterval,
  rankStandardError,
  rankStandardErrors,
  smoothedStandardErrors,
} from '../../../shared-core/precision/rank-variance.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import type { Smoothed } from '../../../shared-core/smoothing/smoothing.ts';
import { summarise } from '../../../shared-core/tally/cohort-summary.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, copied, lowIsGood } from '../percentile/some-tables.ts';

const KINDS: readonly CountedRank[] = ['below', 'at-or-below', 'midpoint'];
const scale = { min: 0, max: 10, step: 1, direction: 'high-is-good' as const };
const table = tableFromCounts(scale, [3, 8, 14, 25, 31, 40, 33, 22, 13, 7, 2]);

function fitted(choice: Parameters<typeof smooth>[1], of = table): Smoothed {
  const result = smooth(of, choice);
  if (!result.ok) throw new Error(result.problem);
  return result.smoothed;
}

const model = { keptScores: [], comb: null };

describe('the standard error of a rank', () => {
  it('follows the formulas: binomial for counts, multinomial for the midpoint', () => {
    const shares = fc
      .tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }))
      .map(([below, part]) => ({ below, at: (1 - below) * part }));
    fc.assert(
      fc.property(shares, fc.integer({ min: 1, max: 100_000 }), (share, n) => {
        const { below: b, at: a } = share;
        const points = (variance: number): number => 100 * Math.sqrt(Math.max(0, variance) / n);
        const near = (kind: CountedRank, variance: number): void =>
          expect(Math.abs(rankStandardError(share, kind, n) - points(variance))).toBeLessThan(1e-6);
        near('below', b * (1 - b));
        near('at-or-below', (b + a) * (1 - b - a));
        near('midpoint', b + a / 4 - (b + a / 2) ** 2);
      }),
    );
  });

  it('is divided by the root of k when everybody is there k times, and is the same from the other end', () => {
    fc.assert(
      fc.property(anyTables(), fc.constantFrom(...KINDS), fc.constantFrom(2, 9, 100), (some, kind, times) => {
        const n = summarise(some).effectiveN;
        const often = copied(some, times);
        const errors = rankStandardErrors(often, kind, summarise(often).effectiveN);
        rankStandardErrors(some, kind, n).forEach((error, position) => {
          expect(Math.abs((errors[position] ?? NaN) * Math.sqrt(times) - error)).toBeLessThan(1e-9 * (1 + error));
        });
        const mirrored = rankStandardErrors(lowIsGood(some), 'midpoint', n);
        rankStandardErrors(some, 'midpoint', n).forEach((error, position) => {
          expect(Math.abs((mirrored[position] ?? NaN) - error)).toBeLessThan(1e-9);
        });
      }),
    );
  });

  it('is never more for the midpoint than its binomial one, and 0 where all people are on one side', () => {
    expect(rankStandardError({ below: 0.3, at: 0.2 }, 'midpoint', 100)).toBeLessThan(
      100 * Math.sqrt((0.4 * 0.6) / 100),
    );
    expect(rankStandardError({ below: 1, at: 0 }, 'midpoint', 9)).toBe(0);
    expect(rankStandardError({ below: 0, at: 0 }, 'below', 9)).toBe(0);
    expect(() => rankStandardError({ below: 0, at: 0 }, 'below', 0)).toThrow(RangeError);
  });
});

describe('the standard error of a smoothed rank', () => {
  it('is the observed one where the model gives every score its own parameter', () => {
    const exact = fitted({ kind: 'log-linear', degree: 10, ...model });
    for (const kind of KINDS) {
      const errors = smoothedStandardErrors(exact, 'high-is-good', kind) ?? [];
      rankStandardErrors(table, kind, 198).forEach((error, position) => {
        expect(Math.abs((errors[position] ?? NaN) - error)).toBeLessThan(1e-6);
      });
    }
  });

  it('is smaller with fewer parameters', () => {
    const few = smoothedStandardErrors(fitted({ kind: 'log-linear', degree: 2, ...model }), 'high-is-good', 'midpoint');
    const observed = rankStandardErrors(table, 'midpoint', 198);
    expect(few?.every((error, position) => error > 0 && error < (observed[position] ?? 0))).toBe(true);
  });

  it('is the same seen from the other end, and below and at or below change places', () => {
    const smoothed = fitted({ kind: 'log-linear', degree: 4, ...model });
    const pairs: readonly (readonly [CountedRank, CountedRank])[] = [
      ['midpoint', 'midpoint'],
      ['below', 'at-or-below'],
      ['at-or-below', 'below'],
    ];
    for (const [kind, other] of pairs) {
      const errors = smoothedStandardErrors(smoothed, 'high-is-good', kind) ?? [];
      const mirrored = smoothedStandardErrors(smoothed, 'low-is-good', other) ?? [];
      expect(errors.length).toBe(11);
      errors.forEach((error, position) => expect(mirrored[position]).toBeCloseTo(error, 9));
    }
  });

  it('is not given where the method has no covariance', () => {
    const kernel = fitted({ kind: 'kernel', bandwidth: 0.6, after: null });
    expect(smoothedStandardErrors(kernel, 'high-is-good', 'midpoint')).toBeNull();
  });
});

describe('smoothed ranks', () => {
  it('are the observed ones where the model gives every score its own parameter, from either end', () => {
    for (const some of [table, lowIsGood(table)]) {
      const smoothed = fitted({ kind: 'log-linear', degree: 10, ...model }, some);
      for (const kind of KINDS) {
        const ranks = smoothedRanks(smoothed, some.scale.direction, kind);
        percentileRanks(some, { kind }).forEach((rank, position) => {
          expect(Math.abs((ranks[position] ?? NaN) - ratioToNumber(rank))).toBeLessThan(1e-7);
        });
      }
    }
  });

  it('count people for three definitions', () => {
    expect(KINDS.map((kind) => countedRank({ kind }))).toEqual(KINDS);
    expect(countedRank({ kind: 'grouped', width: 2 })).toBeNull();
    expect(countedRank({ kind: 'plotting-position', offset: '0' })).toBeNull();
  });
});

describe('a symmetric interval', () => {
  it('reaches z standard errors to either side, held within 0 and 100', () => {
    const { low, high } = normalInterval(40, 2, 95);
    expect(low).toBeCloseTo(40 - 2 * 1.959963984540054, 9);
    expect(high).toBeCloseTo(40 + 2 * 1.959963984540054, 9);
    expect(normalInterval(1, 2, 95).low).toBe(0);
    expect(normalInterval(99, 2, 95).high).toBe(100);
  });
});
