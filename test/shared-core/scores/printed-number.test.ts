import { describe, expect, it } from 'vitest';
import { ratio } from '../../../shared-core/percentile/exact-ratio.ts';
import {
  printCount,
  printNumber,
  printRatio,
  printScore,
  printShare,
  printWeight,
} from '../../../shared-core/scores/printed-number.ts';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';

describe('a number with a fixed count of decimals', () => {
  it.each([
    [2.5, 0, '3'],
    [-2.5, 0, '\u22123'],
    [1.005, 2, '1.01'],
    [0.285, 2, '0.29'],
    [1.45, 1, '1.5'],
    [0.1 + 0.2, 1, '0.3'],
    [0.15 * 3, 1, '0.5'],
    [-0.04, 1, '0.0'],
    [-0, 1, '0.0'],
    [-1.25, 1, '\u22121.3'],
    [99.95, 1, '100.0'],
    [1234.5, 0, '1235'],
    [7, 3, '7.000'],
    [1e-30, 2, '0.00'],
    [-1.2345678901234e-45, 3, '0.000'],
    [1e21, 0, '1000000000000000000000'],
  ])('%d to %d decimals', (value, decimals, text) => {
    expect(printNumber(value, decimals)).toBe(text);
  });

  it('refuses what is no number', () => {
    expect(() => printNumber(NaN, 1)).toThrow(RangeError);
    expect(() => printNumber(Infinity, 1)).toThrow(RangeError);
  });
});

it('an exact ratio', () => {
  expect(printRatio(ratio(1n, 8n), 2)).toBe('0.13');
  expect(printRatio(ratio(2n, 3n), 4)).toBe('0.6667');
  expect(printRatio(ratio(0n, 3n), 1)).toBe('0.0');
});

it('counts with a narrow space between thousands', () => {
  expect([0, 7, 999, 4812, 1_000_000].map(printCount)).toEqual(['0', '7', '999', '4\u202f812', '1\u202f000\u202f000']);
});

it('weights to one decimal, people whole', () => {
  expect(printWeight(9832534n, 10_000n)).toBe('983.3');
  expect(printWeight(983n, 1n)).toBe('983');
});

it('shares as per cents', () => {
  expect(printShare(0.041)).toBe('4.1\u00a0%');
  expect(printShare(0.285)).toBe('28.5\u00a0%');
  expect(printShare(1)).toBe('100.0\u00a0%');
});

it('raw scores with the decimals of their scale', () => {
  const halves: ScoreScale = { min: -1, max: 20, step: 0.5, direction: 'high-is-good' };
  expect([12, 12.5, -0.5, 0].map((score) => printScore(halves, score))).toEqual(['12.0', '12.5', '\u22120.5', '0.0']);
  expect(printScore({ ...halves, step: 1 }, -1)).toBe('\u22121');
});
