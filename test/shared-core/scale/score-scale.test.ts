import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalOf, parseDecimal } from '../../../shared-core/scale/decimal.ts';
import {
  attainableScores,
  MAX_ATTAINABLE_SCORES,
  placeOnGrid,
  scaleGrid,
  scaleInWords,
  scaleProblems,
  type PlaceOnScale,
  type ScoreScale,
} from '../../../shared-core/scale/score-scale.ts';

function scaleOf(min: number, max: number, step: number): ScoreScale {
  return { min, max, step, direction: 'high-is-good' };
}

function place(scale: ScoreScale, text: string): PlaceOnScale {
  const decimal = parseDecimal(text);
  if (decimal === null) throw new RangeError(text);
  return placeOnGrid(scaleGrid(scale), decimal);
}

describe('attainable scores', () => {
  it('whole, halves, tenths, below zero', () => {
    expect(attainableScores(scaleOf(0, 4, 1))).toEqual([0, 1, 2, 3, 4]);
    expect(attainableScores(scaleOf(0, 2, 0.5))).toEqual([0, 0.5, 1, 1.5, 2]);
    expect(attainableScores(scaleOf(0, 0.5, 0.1))).toEqual([0, 0.1, 0.2, 0.3, 0.4, 0.5]);
    expect(attainableScores(scaleOf(-3, 3, 3))).toEqual([-3, 0, 3]);
    expect(attainableScores(scaleOf(0.25, 1.75, 0.5))).toEqual([0.25, 0.75, 1.25, 1.75]);
  });

  it('are written as short as the step, however long the scale', () => {
    const scores = attainableScores(scaleOf(0, 100, 0.1));
    expect(scores.length).toBe(1001);
    expect(scores.every((score, index) => score === Number(`${index}e-1`))).toBe(true);
  });

  it('each stands at its own place', () => {
    const scales = fc
      .record({
        min: fc.integer({ min: -500, max: 500 }),
        steps: fc.integer({ min: 1, max: 200 }),
        step: fc.integer({ min: 1, max: 50 }),
        decimals: fc.integer({ min: 0, max: 4 }),
      })
      .map(({ min, steps, step, decimals }) => {
        const at = (units: number): number => Number(`${units}e-${decimals}`);
        return scaleOf(at(min), at(min + steps * step), at(step));
      });
    fc.assert(
      fc.property(scales, (scale) => {
        expect(scaleProblems(scale)).toEqual([]);
        const grid = scaleGrid(scale);
        const scores = attainableScores(scale);
        expect(scores.map((score) => placeOnGrid(grid, decimalOf(score)))).toEqual(scores.map((_, index) => index));
        expect(scores.at(-1)).toBe(scale.max);
      }),
    );
  });
});

describe('the place of a score', () => {
  it('on a whole scale', () => {
    const scale = scaleOf(0, 40, 1);
    expect(place(scale, '0')).toBe(0);
    expect(place(scale, '40.0')).toBe(40);
    expect(place(scale, '4e1')).toBe(40);
    expect(place(scale, '17.5')).toBe('off-grid');
    expect(place(scale, '-1')).toBe('below-scale');
    expect(place(scale, '-0.001')).toBe('below-scale');
    expect(place(scale, '40.0001')).toBe('above-scale');
    expect(place(scale, '99')).toBe('above-scale');
    expect(place(scale, '1e39')).toBe('above-scale');
  });

  it('on a scale of tenths, where floating point would miss 0.3', () => {
    const scale = scaleOf(0, 1, 0.1);
    expect(place(scale, '0.3')).toBe(3);
    expect(placeOnGrid(scaleGrid(scale), decimalOf(0.1 + 0.2))).toBe('off-grid');
    expect(place(scale, '0.30000000000000000001')).toBe('off-grid');
    expect(place(scale, '0.25')).toBe('off-grid');
  });

  it('on a scale that starts off zero', () => {
    const scale = scaleOf(1, 21, 5);
    expect(place(scale, '6')).toBe(1);
    expect(place(scale, '5')).toBe('off-grid');
    expect(place(scale, '0')).toBe('below-scale');
  });
});

describe('what is wrong with a scale', () => {
  it.each([
    ['no number', scaleOf(NaN, 40, 1), /all numbers/],
    ['infinite', scaleOf(0, Infinity, 1), /all numbers/],
    ['step 0', scaleOf(0, 40, 0), /above 0/],
    ['step below 0', scaleOf(0, 40, -1), /above 0/],
    ['ends swapped', scaleOf(40, 0, 1), /above the lowest/],
    ['one score', scaleOf(5, 5, 1), /above the lowest/],
    ['too fine', scaleOf(0, 1, 0.00001), /decimals/],
    ['much too fine', scaleOf(0, 1, 1e-60), /decimals/],
    ['step that misses the end', scaleOf(0, 10, 3), /never reaches 10/],
    ['too long', scaleOf(0, MAX_ATTAINABLE_SCORES, 1), /at most 5001/],
    ['much too long', scaleOf(0, 1e60, 1), /at most 5001/],
  ])('%s', (_, scale, sentence) => {
    expect(scaleProblems(scale).join(' ')).toMatch(sentence);
    expect(() => scaleGrid(scale)).toThrow(RangeError);
  });

  it('nothing, up to the longest scale', () => {
    expect(scaleProblems(scaleOf(0, MAX_ATTAINABLE_SCORES - 1, 1))).toEqual([]);
    expect(scaleProblems(scaleOf(95, 95.3, 0.0001))).toEqual([]);
  });
});

it('says a scale in a few words', () => {
  expect(scaleInWords(scaleOf(0, 40, 1))).toBe('0 to 40');
  expect(scaleInWords(scaleOf(0, 20, 0.5))).toBe('0 to 20 in steps of 0.5');
});
