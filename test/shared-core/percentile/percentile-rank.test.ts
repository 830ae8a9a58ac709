import { describe, expect, it } from 'vitest';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';
import {
  definitionProblem,
  parseOffset,
  percentileRanks,
  rankParts,
  scoresPerClass,
  type RankDefinition,
} from '../../../shared-core/percentile/percentile-rank.ts';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';

const SCALE: ScoreScale = { min: 0, max: 3, step: 1, direction: 'high-is-good' };
const SECONDS: ScoreScale = { ...SCALE, direction: 'low-is-good' };

describe('the offset of a plotting position', () => {
  it.each([
    ['0', 0n, 1n],
    ['0.375', 375n, 1000n],
    ['.5', 5n, 10n],
    ['3/8', 3n, 8n],
    [' 1/3 ', 1n, 3n],
    ['0.999999999999', 999999999999n, 10n ** 12n],
  ])('%j', (text, numerator, denominator) => {
    expect(parseOffset(text)).toEqual({ numerator, denominator });
  });

  it.each(['', 'x', '1', '1.0', '8/8', '3/0', '0/0', '-0.1', '-1/3', '0,375', '1e-3', '0.', '1/2/3', '9'.repeat(400)])(
    'refuses %j',
    (text) => {
      expect(parseOffset(text)).toBeNull();
    },
  );
});

describe('the width of classes', () => {
  it('is a multiple of the step, also where doubles do not divide', () => {
    const tenths: ScoreScale = { ...SCALE, step: 0.1 };
    expect(scoresPerClass(tenths, 0.3)).toBe(3);
    expect(scoresPerClass(tenths, 0.25)).toBeNull();
    expect(scoresPerClass({ ...SCALE, step: 0.5 }, 2)).toBe(4);
    expect(scoresPerClass(SCALE, 0)).toBeNull();
    expect(scoresPerClass(SCALE, -1)).toBeNull();
    expect(scoresPerClass(SCALE, NaN)).toBeNull();
    expect(scoresPerClass(SCALE, Infinity)).toBeNull();
  });
});

describe('a definition that cannot be used', () => {
  const offset: RankDefinition = { kind: 'plotting-position', offset: '1' };
  const width: RankDefinition = { kind: 'grouped', width: 1.5 };

  it('says why, and throws when it is used all the same', () => {
    const table = tableFromCounts(SCALE, [1, 2, 3, 4]);
    expect(definitionProblem(SCALE, offset)).toMatch(/from 0 to below 1/);
    expect(definitionProblem(SCALE, width)).toMatch(/multiple of the scale's step, 1/);
    expect(definitionProblem(SCALE, { kind: 'midpoint' })).toBeNull();
    expect(() => percentileRanks(table, offset)).toThrow(RangeError);
    expect(() => percentileRanks(table, width)).toThrow(RangeError);
  });

  it('nobody has no ranks', () => {
    expect(() => percentileRanks(tableFromCounts(SCALE, [0, 0, 0, 0]), { kind: 'midpoint' })).toThrow(RangeError);
  });
});

describe('where low scores are good', () => {
  const table = tableFromCounts(SECONDS, [1, 2, 0, 1]);

  it('below reads did worse', () => {
    expect(rankParts(table).map(({ below, at, all }) => [below, at, all])).toEqual([
      [3n, 1n, 4n],
      [1n, 2n, 4n],
      [1n, 0n, 4n],
      [0n, 1n, 4n],
    ]);
  });

  it('the fewest seconds rank highest by every definition', () => {
    const ranks = (definition: RankDefinition): readonly number[] =>
      percentileRanks(table, definition).map(ratioToNumber);
    expect(ranks({ kind: 'midpoint' })).toEqual([87.5, 50, 25, 12.5]);
    expect(ranks({ kind: 'below' })).toEqual([75, 25, 25, 0]);
    expect(ranks({ kind: 'at-or-below' })).toEqual([100, 75, 25, 25]);
    expect(ranks({ kind: 'plotting-position', offset: '0' })).toEqual([80, 50, 30, 20]);
    expect(ranks({ kind: 'grouped', width: 2 })).toEqual([81.25, 43.75, 18.75, 6.25]);
  });
});
