import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratio, ratioToNumber, type ExactRatio } from '../../../shared-core/percentile/exact-ratio.ts';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import { decimalOf, powerOfTen } from '../../../shared-core/scale/decimal.ts';
import {
  derivedScores,
  linearScale,
  normalisedZ,
  stanineOfRank,
  stanineOfZ,
  stenOfZ,
} from '../../../shared-core/scores/derived-score.ts';
import { anyTables } from '../percentile/some-tables.ts';
import { areaBelow } from './normal-curve.ts';

function rankOf(perCent: number): ExactRatio {
  const { units, decimals } = decimalOf(perCent);
  return ratio(units, powerOfTen(decimals));
}

describe('normalised z', () => {
  it('returns to the z it came from, by way of its rank', () => {
    fc.assert(
      fc.property(fc.double({ min: -4.5, max: 4.5, noNaN: true }), (z) => {
        expect(Math.abs((normalisedZ(rankOf(100 * areaBelow(z))) ?? NaN) - z)).toBeLessThan(1e-8);
      }),
    );
  });

  it('returns to the rank it came from, to 1e-12 of the whole', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: 1n, max: 10n ** 9n - 1n }), (part) => {
        const rank = ratio(100n * part, 10n ** 9n);
        expect(Math.abs(areaBelow(normalisedZ(rank) ?? NaN) - ratioToNumber(rank) / 100)).toBeLessThan(1e-12);
      }),
    );
  });

  it('is symmetric about 50 and does not exist at 0 and 100', () => {
    expect(normalisedZ(rankOf(50))).toBe(0);
    expect((normalisedZ(rankOf(2.5)) ?? NaN) + (normalisedZ(rankOf(97.5)) ?? NaN)).toBeCloseTo(0, 12);
    expect(normalisedZ(rankOf(0))).toBeNull();
    expect(normalisedZ(rankOf(100))).toBeNull();
    expect(normalisedZ(ratio(1n, 10n ** 9n))).toBeCloseTo(-6.70602, 4);
  });

  it('never falls with the rank, nor do the scores derived from it', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        const rows = percentileRanks(table, { kind: 'midpoint' }).map((rank) => derivedScores(rank, normalisedZ(rank)));
        for (const key of ['z', 't', 'nce', 'deviation', 'stanine', 'sten'] as const) {
          const scores = rows.map((row) => row[key]).filter((score) => score !== null);
          expect(
            scores.every((score, index) => index === 0 || score >= (scores[index - 1] ?? NaN)),
            key,
          ).toBe(true);
        }
      }),
    );
  });
});

describe('derived scores', () => {
  it('of the middle rank are the means of their scales', () => {
    expect(derivedScores(rankOf(50), 0)).toEqual({ z: 0, t: 50, nce: 50, deviation: 100, stanine: 5, sten: 6 });
  });

  it('of a rank without z are whole ones only', () => {
    const none = { z: null, t: null, nce: null, deviation: null };
    expect(derivedScores(rankOf(0), null)).toEqual({ ...none, stanine: 1, sten: 1 });
    expect(derivedScores(rankOf(100), null)).toEqual({ ...none, stanine: 9, sten: 10 });
    expect(derivedScores(rankOf(50), null)).toEqual({ ...none, stanine: 5, sten: null });
  });

  it('are straight lines of z', () => {
    expect(derivedScores(rankOf(93), 1.5)).toMatchObject({ t: 65, deviation: 122.5 });
    expect(derivedScores(rankOf(93), 1.5).nce).toBeCloseTo(81.59, 10);
    expect(linearScale(-2, 10, 3)).toBe(4);
  });
});

describe('stanines and stens', () => {
  it('of z have half-deviation bands whose lower bound belongs to them, and are cut at the ends', () => {
    expect([-9, -1.76, -1.75, -0.25, 0, 0.24, 0.25, 1.74, 1.75, 9].map(stanineOfZ)).toEqual([
      1, 1, 2, 5, 5, 5, 6, 8, 9, 9,
    ]);
    expect([-9, -2.01, -2, -0.01, 0, 0.49, 0.5, 1.99, 2, 9].map(stenOfZ)).toEqual([1, 1, 2, 5, 6, 6, 7, 9, 10, 10]);
  });

  it('of a rank on a cut go up, however the ratio is written', () => {
    expect(stanineOfRank(ratio(4n, 1n))).toBe(2);
    expect(stanineOfRank(ratio(400n, 100n))).toBe(2);
    expect(stanineOfRank(ratio(399n, 100n))).toBe(1);
    expect(stanineOfRank(ratio(100n * 92n, 4n * 100n))).toBe(4);
    expect([10, 11, 22, 23, 39, 40, 59, 60, 76, 77, 88, 89, 95, 96].map((rank) => stanineOfRank(rankOf(rank)))).toEqual(
      [2, 3, 3, 4, 4, 5, 5, 6, 6, 7, 7, 8, 8, 9],
    );
  });
});
