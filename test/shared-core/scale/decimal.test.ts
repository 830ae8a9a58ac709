import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalOf, parseDecimal, powerOfTen, unitsAt } from '../../../shared-core/scale/decimal.ts';

describe('a decimal as people type it', () => {
  it.each([
    ['17', 17n, 0],
    ['17.5', 175n, 1],
    ['17.50', 175n, 1],
    [' 0.1 ', 1n, 1],
    ['.5', 5n, 1],
    ['5.', 5n, 0],
    ['+3', 3n, 0],
    ['-3', -3n, 0],
    ['\u22123', -3n, 0],
    ['\u20133', -3n, 0],
    ['-0', 0n, 0],
    ['007', 7n, 0],
    ['1e3', 1000n, 0],
    ['1.25e1', 125n, 1],
    ['2E-3', 2n, 3],
    ['0.00000000000000000001', 1n, 20],
    ['1.0366999999999999', 10366999999999999n, 16],
  ])('%j', (text, units, decimals) => {
    expect(parseDecimal(text)).toEqual({ units, decimals });
  });

  it.each([
    '',
    ' ',
    '.',
    '-',
    'abs',
    '99a',
    '1,5',
    '1.200,5',
    '1 200',
    '1.2.3',
    '--3',
    '0x10',
    'NaN',
    'Infinity',
    '1e',
    '1e4444',
  ])('refuses %j', (text) => {
    expect(parseDecimal(text)).toBeNull();
  });

  it('with a decimal comma, refuses points and a second comma', () => {
    expect(parseDecimal('17,5', ',')).toEqual({ units: 175n, decimals: 1 });
    expect(parseDecimal('\u22120,25', ',')).toEqual({ units: -25n, decimals: 2 });
    expect(parseDecimal('17', ',')).toEqual({ units: 17n, decimals: 0 });
    expect(parseDecimal('1.200,5', ',')).toBeNull();
    expect(parseDecimal('17.5', ',')).toBeNull();
    expect(parseDecimal('1,200,5', ',')).toBeNull();
  });

  it('takes 40 digits and no more', () => {
    expect(parseDecimal('1'.repeat(40))?.units).toBe(BigInt('1'.repeat(40)));
    expect(parseDecimal('1'.repeat(41))).toBeNull();
    expect(parseDecimal(`0.${'1'.repeat(40)}`)).toBeNull();
    expect(parseDecimal('1e-41')).toBeNull();
    expect(parseDecimal('1e41')).toBeNull();
  });
});

describe('the decimal of a number', () => {
  it('is what the number is written as: 0.1 + 0.2 is not 0.3, and 0.3 is', () => {
    expect(decimalOf(0.3)).toEqual({ units: 3n, decimals: 1 });
    expect(decimalOf(0.1 + 0.2)).toEqual({ units: 30000000000000004n, decimals: 17 });
    expect(decimalOf(1.005)).toEqual({ units: 1005n, decimals: 3 });
    expect(decimalOf(-2.5)).toEqual({ units: -25n, decimals: 1 });
    expect(decimalOf(-0).units).toBe(0n);
  });

  it('exists for the smallest and the largest numbers', () => {
    expect(decimalOf(5e-324)).toEqual({ units: 5n, decimals: 324 });
    expect(decimalOf(1e300)).toEqual({ units: powerOfTen(300), decimals: 0 });
    expect(decimalOf(1.5e-45).decimals).toBe(46);
  });

  it('does not exist for what is no number', () => {
    expect(() => decimalOf(NaN)).toThrow(RangeError);
    expect(() => decimalOf(Infinity)).toThrow(RangeError);
  });

  it('returns the number when it is written out and read again', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const { units, decimals } = decimalOf(value);
        expect(Number(`${units}e-${decimals}`)).toBe(value + 0);
      }),
    );
  });
});

describe('units', () => {
  it('widen, narrow without loss, and refuse to lose digits', () => {
    expect(unitsAt({ units: 15n, decimals: 1 }, 3)).toBe(1500n);
    expect(unitsAt({ units: 1500n, decimals: 3 }, 1)).toBe(15n);
    expect(unitsAt({ units: -1500n, decimals: 3 }, 1)).toBe(-15n);
    expect(() => unitsAt({ units: 15n, decimals: 1 }, 0)).toThrow(RangeError);
  });

  it('ten tenths add up to one', () => {
    const tenth = unitsAt(decimalOf(0.1), 4);
    expect(10n * tenth).toBe(powerOfTen(4));
    expect(unitsAt(decimalOf(0.1), 4) + unitsAt(decimalOf(0.2), 4)).toBe(unitsAt(decimalOf(0.3), 4));
  });
});
