import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';
import { percentilePoint } from '../../../shared-core/percentile/percentile-point.ts';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import {
  observedContinuization,
  rankAt,
  smoothedContinuization,
} from '../../../shared-core/precision/continuized-rank.ts';
import { measurementBands, standardErrorOfMeasurement } from '../../../shared-core/precision/measurement-band.ts';
import { attainableScores } from '../../../shared-core/scale/score-scale.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import { summarise } from '../../../shared-core/tally/cohort-summary.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, lowIsGood } from '../percentile/some-tables.ts';

const scale = { min: 0, max: 4, step: 1, direction: 'high-is-good' as const };
const table = tableFromCounts(scale, [10, 20, 40, 20, 10]);

describe('continuized ranks', () => {
  it('are the midpoint rank at every attainable score, from either end', () => {
    fc.assert(
      fc.property(anyTables(), fc.boolean(), (some, mirrored) => {
        const seen = mirrored ? lowIsGood(some) : some;
        const continuized = observedContinuization(seen);
        const ranks = percentileRanks(seen, { kind: 'midpoint' });
        attainableScores(seen.scale).forEach((score, position) => {
          const expected = ratioToNumber(ranks[position] ?? { numerator: -1n, denominator: 1n });
          expect(Math.abs(rankAt(continuized, score) - expected)).toBeLessThan(1e-9);
        });
      }),
    );
  });

  it('lead back from the percentile point to its percentage', () => {
    fc.assert(
      fc.property(anyTables(), fc.integer({ min: 1, max: 99 }), (some, percent) => {
        const { score } = percentilePoint(some, percent / 100, 'inverse', 1);
        expect(Math.abs(rankAt(observedContinuization(some), score) - percent)).toBeLessThan(1e-7);
      }),
    );
  });

  it('stay at 0 and 100 beyond the scale', () => {
    const continuized = observedContinuization(table);
    expect([-9, -0.5, 4.5, 99].map((score) => rankAt(continuized, score))).toEqual([0, 0, 100, 100]);
    const mirrored = observedContinuization(lowIsGood(table));
    expect([-9, 99].map((score) => rankAt(mirrored, score))).toEqual([100, 0]);
  });

  it('of a model with a parameter for every score are the observed ones', () => {
    for (const seen of [table, lowIsGood(table)]) {
      const fit = smooth(seen, { kind: 'log-linear', degree: 4, keptScores: [], comb: null });
      if (!fit.ok) throw new Error(fit.problem);
      const smoothed = smoothedContinuization(fit.smoothed, seen.scale);
      observedContinuization(seen).ranks.forEach((rank, edge) => expect(smoothed.ranks[edge]).toBeCloseTo(rank, 7));
    }
  });
});

describe('the band of measurement', () => {
  it('turns x ± z SEM into ranks', () => {
    // SD √(1 − r) = 1 · √0.25 = 0.5, at 68 %: z = 0.99446.
    const found = measurementBands(scale, observedContinuization(table), 1, { reliability: 0.75, level: 68 });
    if (!found.ok) throw new Error(found.problem);
    expect(found.sem).toBe(0.5);
    const middle = found.bands[2];
    expect(middle?.lowScore).toBeCloseTo(2 - 0.497229, 5);
    // 40 people lie evenly between 1.5 and 2.5; below 1.5 there are 30.
    expect(middle?.ranks.low).toBeCloseTo(30 + 40 * 0.002771, 3);
    expect(middle?.ranks.high).toBeCloseTo(70 - 40 * 0.002771, 3);
  });

  it('is the rank itself for a perfect test, and wider the less reliable it is', () => {
    fc.assert(
      fc.property(anyTables(), fc.boolean(), (some, mirrored) => {
        const seen = mirrored ? lowIsGood(some) : some;
        const { sd } = summarise(seen);
        fc.pre(sd !== null);
        const continuized = observedContinuization(seen);
        const widths = [1, 0.9, 0.5, 0].map((reliability) => {
          const found = measurementBands(seen.scale, continuized, sd, { reliability, level: 90 });
          if (!found.ok) throw new Error(found.problem);
          return found.bands.map(({ ranks }) => ranks.high - ranks.low);
        });
        const [perfect = [], ...others] = widths;
        expect(perfect.every((width) => width === 0)).toBe(true);
        others.forEach((wider, index) => {
          wider.forEach((width, position) => {
            expect(width).toBeGreaterThanOrEqual((widths[index]?.[position] ?? NaN) - 1e-9);
          });
        });
      }),
    );
  });

  it('is refused in words without a reliability or a standard deviation', () => {
    const continuized = observedContinuization(table);
    const says = (sd: number | null, reliability: number, level: number): string => {
      const found = measurementBands(scale, continuized, sd, { reliability, level });
      return found.ok ? '' : found.problem;
    };
    expect(says(1, 1.1, 90)).toContain('0 to 1');
    expect(says(1, -0.1, 90)).toContain('0 to 1');
    expect(says(1, NaN, 90)).toContain('0 to 1');
    expect(says(null, 0.9, 90)).toContain('two people');
    expect(says(1, 0.9, 40)).toContain('level');
    expect(() => standardErrorOfMeasurement(10, 2)).toThrow(RangeError);
    expect(standardErrorOfMeasurement(15, 0.91)).toBeCloseTo(4.5, 12);
  });
});
