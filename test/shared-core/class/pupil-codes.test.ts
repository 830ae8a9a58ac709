import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MOST_PUPILS_WITH_CODES, orderByCode, pupilCodes } from '../../../shared-core/class/pupil-codes.ts';

const places = (codes: readonly string[]): readonly number[] => {
  const place: number[] = [];
  orderByCode(codes).forEach((pupil, index) => (place[pupil] = index));
  return place;
};

/** Correlation of the place in the list with the place by code. */
function correlation(seed: number, pupils: number): number {
  const middle = (pupils - 1) / 2;
  const spread = (pupils * (pupils ** 2 - 1)) / 12;
  return (
    places(pupilCodes(pupils, seed)).reduce((sum, place, pupil) => sum + (place - middle) * (pupil - middle), 0) /
    spread
  );
}

describe('codes of pupils', () => {
  it('are the same from the same seed, and others, in another order, from another', () => {
    fc.assert(
      fc.property(fc.integer({ min: 20, max: 400 }), fc.nat(), fc.nat(), (pupils, seed, other) => {
        expect(pupilCodes(pupils, seed)).toEqual(pupilCodes(pupils, seed));
        if (seed === other) return;
        expect(pupilCodes(pupils, other)).not.toEqual(pupilCodes(pupils, seed));
        expect(places(pupilCodes(pupils, other))).not.toEqual(places(pupilCodes(pupils, seed)));
      }),
    );
    // Files hold seeds: what they gave once they must give always.
    expect(pupilCodes(5, 2026)).toEqual(['C9J', 'M5F', 'P2D', 'C6P', 'K7M']);
  });

  it('are all different, without vowels, look-alikes and letters side by side', () => {
    for (const pupils of [0, 1, 2, 28, 338, 339, MOST_PUPILS_WITH_CODES]) {
      const codes = pupilCodes(pupils, 7);
      expect(codes.length).toBe(pupils);
      expect(new Set(codes).size).toBe(pupils);
      for (const code of codes) {
        expect(code).toMatch(pupils <= 338 ? /^[A-Z]\d[A-Z]$/ : /^[A-Z]\d[A-Z]\d$/);
        expect(code).not.toMatch(/[AEIOUYBGLQSVZ0134]/);
      }
    }
  });

  it('tell nothing of the order of the list', () => {
    const pupils = 28;
    const seeds = Array.from({ length: 1000 }, (_, seed) => seed);
    const found = seeds.map((seed) => correlation(seed, pupils));
    const mean = found.reduce((sum, one) => sum + one, 0) / found.length;
    const variance = found.reduce((sum, one) => sum + one ** 2, 0) / found.length;
    // Of random orders: mean 0 and variance 1/(n − 1) exactly; bounds of four standard errors.
    expect(Math.abs(mean)).toBeLessThan(4 * Math.sqrt(1 / (pupils - 1) / seeds.length));
    expect(Math.abs(variance * (pupils - 1) - 1)).toBeLessThan(4 * Math.sqrt(2 / seeds.length));
    // The first pupil is as often at each place: chi-square of 27 degrees of freedom, 99.99 % point.
    const firsts = seeds.map((seed) => places(pupilCodes(pupils, seed))[0]);
    const expected = seeds.length / pupils;
    const chiSquare = Array.from(
      { length: pupils },
      (_, place) => firsts.filter((first) => first === place).length,
    ).reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
    expect(chiSquare).toBeLessThan(63.2);
  });

  it('stay as they are when pupils are added at the end', () => {
    expect(pupilCodes(31, 11).slice(0, 28)).toEqual(pupilCodes(28, 11));
    expect(pupilCodes(900, 11).slice(0, 400)).toEqual(pupilCodes(400, 11));
  });

  it('put pupils in order by the signs of the codes, in no locale', () => {
    expect(orderByCode(['M2C', 'C9X', 'C2X', 'X5D'])).toEqual([2, 1, 0, 3]);
  });

  it('are refused for too many pupils and for what is no seed', () => {
    for (const pupils of [-1, 1.5, MOST_PUPILS_WITH_CODES + 1]) expect(() => pupilCodes(pupils, 1)).toThrow(RangeError);
    expect(() => pupilCodes(3, -1)).toThrow(RangeError);
  });
});
