import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareToWhole, ratio, ratioToNumber, roundRatio } from '../../../shared-core/percentile/exact-ratio.ts';

describe('a ratio', () => {
  it('has a denominator above 0', () => {
    expect(ratio(3n, -4n)).toEqual({ numerator: -3n, denominator: 4n });
    expect(() => ratio(1n, 0n)).toThrow(RangeError);
  });

  it('is compared with whole numbers exactly', () => {
    const justBelow = ratio(4n * 10n ** 40n - 1n, 10n ** 40n);
    expect(compareToWhole(justBelow, 4n)).toBe(-1);
    expect(compareToWhole(ratio(8n, 2n), 4n)).toBe(0);
    expect(compareToWhole(ratio(-7n, 2n), -4n)).toBe(1);
  });
});

describe('its nearest double', () => {
  it('is the quotient of small numbers', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), fc.integer({ min: 1 }), (numerator, denominator) => {
        expect(ratioToNumber(ratio(BigInt(numerator), BigInt(denominator)))).toBe(numerator / denominator + 0);
      }),
    );
  });

  it('keeps 52 bits whatever the sizes', () => {
    const sizes = fc.bigInt({ min: 1n, max: 10n ** 45n });
    fc.assert(
      fc.property(sizes, sizes, (numerator, denominator) => {
        const found = ratioToNumber(ratio(numerator, denominator));
        // |found·d − n| ≤ n / 2^52, with the double taken apart into a whole number and a power of two.
        const power = 1100n;
        const mantissaBits = 200;
        let scaled = found;
        let shift = 0;
        while (!Number.isInteger(scaled) && shift < mantissaBits * 5) {
          scaled *= 2;
          shift += 1;
        }
        const whole = BigInt(scaled) << (power - BigInt(shift));
        const difference = whole * denominator - (numerator << power);
        expect((difference < 0n ? -difference : difference) << 52n).toBeLessThanOrEqual(numerator << power);
      }),
    );
    expect(ratioToNumber(ratio(1n, 3n * 10n ** 30n))).toBeCloseTo(1e-30 / 3, 45);
    expect(ratioToNumber(ratio(-(10n ** 40n), 3n))).toBe(Number(`-${'3'.repeat(40)}.3`));
    expect(ratioToNumber(ratio(1n, 10n ** 30n))).toBe(1e-30);
  });
});

describe('rounding', () => {
  it('halves up or to the even multiple', () => {
    expect(roundRatio(ratio(5n, 2n), 0, 'half-up')).toBe(3n);
    expect(roundRatio(ratio(5n, 2n), 0, 'half-even')).toBe(2n);
    expect(roundRatio(ratio(7n, 2n), 0, 'half-even')).toBe(4n);
    expect(roundRatio(ratio(1n, 4n), 1, 'half-up')).toBe(3n);
    expect(roundRatio(ratio(1n, 4n), 1, 'half-even')).toBe(2n);
    expect(roundRatio(ratio(1n, 3n), 3, 'half-up')).toBe(333n);
    expect(roundRatio(ratio(2n, 3n), 3, 'half-even')).toBe(667n);
  });

  it('refuses ratios below 0', () => {
    expect(() => roundRatio(ratio(-1n, 2n), 0, 'half-up')).toThrow(RangeError);
  });

  it('errs by at most half a unit', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: 0n, max: 10n ** 30n }), fc.bigInt({ min: 1n, max: 10n ** 30n }), (n, d) => {
        const distance = roundRatio(ratio(n, d), 2, 'half-even') * d - 100n * n;
        expect(2n * (distance < 0n ? -distance : distance)).toBeLessThanOrEqual(d);
      }),
    );
  });
});
