import { describe, expect, it } from 'vitest';
import { ratio, type ExactRatio } from '../../shared-core/percentile/exact-ratio.ts';
import { percentileRanks } from '../../shared-core/percentile/percentile-rank.ts';
import {
  derivedScores,
  linearScale,
  NCE_FACTOR,
  normalisedZ,
  stanineOfRank,
  stanineOfZ,
} from '../../shared-core/scores/derived-score.ts';
import { decimalOf, powerOfTen } from '../../shared-core/scale/decimal.ts';
import { printNumber } from '../../shared-core/scores/printed-number.ts';
import { tableFromCounts } from '../../shared-core/tally/frequency-table.ts';
import { expectAllNear, expectNear } from './near.ts';
import { readPublished } from './published-checks.ts';
import { wholeScale } from './read-reference.ts';

const published = readPublished();

function rankOf(perCent: number): ExactRatio {
  const { units, decimals } = decimalOf(perCent);
  return ratio(units, powerOfTen(decimals));
}

/** How many of `of` evenly spaced midpoint ranks fall into each of the classes 1 to 9. */
function sharesOf(of: number, classOf: (rank: ExactRatio) => number): readonly number[] {
  const shares = new Array<number>(9).fill(0);
  for (let index = 0; index < of; index += 1) {
    const place = classOf(ratio(BigInt(100 * (2 * index + 1)), BigInt(2 * of))) - 1;
    shares[place] = (shares[place] ?? 0) + 1;
  }
  return shares;
}

describe('encyclopedia "Stanine"', () => {
  const { pct, cum, z_bounds } = published.stanine;

  it('4, 7, 12, 17, 20, 17, 12, 7 and 4 of a hundred', () => {
    expect(sharesOf(100, stanineOfRank)).toEqual(pct);
  });

  it('a rank on a cut belongs to the stanine above it, one just below to the stanine below', () => {
    cum.slice(0, 8).forEach((cut, index) => {
      expect(stanineOfRank(rankOf(cut)), `${cut}`).toBe(index + 2);
      expect(stanineOfRank(ratio(BigInt(cut) * 10n ** 20n - 1n, 10n ** 20n)), `below ${cut}`).toBe(index + 1);
    });
    expect(stanineOfRank(rankOf(100))).toBe(9);
    expect(stanineOfRank(rankOf(0))).toBe(1);
  });

  it('z bounds from −1.75 to 1.75 by halves, a bound belonging to the stanine above it', () => {
    z_bounds.forEach((bound, index) => {
      expect(stanineOfZ(bound)).toBe(index + 2);
      expect(stanineOfZ(bound - 1e-12)).toBe(index + 1);
    });
  });

  it('exact areas of the half-deviation bands (computed)', () => {
    const of = 20_000;
    const areas = [4.0059, 6.5591, 12.0978, 17.4666, 19.7413, 17.4666, 12.0978, 6.5591, 4.0059];
    const found = sharesOf(of, (rank) => stanineOfZ(normalisedZ(rank) ?? NaN)).map((count) => (100 * count) / of);
    expectAllNear(found, areas, 0.006, 'areas');
  });
});

describe('normal curve equivalents', () => {
  const { multiplier_conventional, coincide_at } = published.nce;

  it('encyclopedia "Normal curve equivalent": 21.06, meeting percentile ranks at 1, 50 and 99', () => {
    expect(NCE_FACTOR).toBe(multiplier_conventional);
    for (const rank of coincide_at) {
      expect(printNumber(nceOf(rank), 1)).toBe(`${rank}.0`);
    }
  });

  const nceOf = (rank: number): number => linearScale(normalisedZ(rankOf(rank)) ?? NaN, 50, NCE_FACTOR);

  /** Four decimals computed with R; that printed tables show the one-decimal values is from memory. */
  const TABLE: readonly (readonly [number, number, string])[] = [
    [1, 1.0071, '1.0'],
    [2, 6.748, '6.7'],
    [5, 15.3594, '15.4'],
    [10, 23.0105, '23.0'],
    [20, 32.2755, '32.3'],
    [25, 35.7952, '35.8'],
    [30, 38.9561, '39.0'],
    [40, 44.6645, '44.7'],
    [50, 50, '50.0'],
    [60, 55.3355, '55.3'],
    [70, 61.0439, '61.0'],
    [75, 64.2048, '64.2'],
    [80, 67.7245, '67.7'],
    [90, 76.9895, '77.0'],
    [95, 84.6406, '84.6'],
    [98, 93.252, '93.3'],
    [99, 98.9929, '99.0'],
  ];

  it.each(TABLE)('of %d (one decimal from memory)', (rank, computed, printed) => {
    expectNear(nceOf(rank), computed, 0.00005 + 1e-9, 'to four decimals');
    expect(printNumber(nceOf(rank), 1)).toBe(printed);
  });
});

describe('scores of a normal distribution', () => {
  it('z of the 5th, 10th, 25th, 50th and 99th per cent, as tables of the normal curve print them', () => {
    const printed = [5, 10, 25, 50, 99].map((rank) => printNumber(normalisedZ(rankOf(rank)) ?? NaN, 4));
    expect(printed).toEqual(['−1.6449', '−1.2816', '−0.6745', '0.0000', '2.3263']);
  });

  it('one deviation above, two below and two above the mean (from memory; recomputed with R)', () => {
    const whole = (rank: number): readonly string[] => {
      const { z, t, deviation } = derivedScores(rankOf(rank), normalisedZ(rankOf(rank)));
      return [z, t, deviation].map((score) => printNumber(score ?? NaN, 1));
    };
    expect(whole(84.134)).toEqual(['1.0', '60.0', '115.0']);
    expect(whole(2.275)).toEqual(['−2.0', '30.0', '70.0']);
    expect(whole(97.725)).toEqual(['2.0', '70.0', '130.0']);
  });

  const NORMAL_SCORES: readonly (readonly [string, string, readonly number[]])[] = [
    ['Blom (1958)', '3/8', [0.1225808439, 0.3754617702, 0.6554235052, 1.0004905456, 1.5466352714]],
    ['Tukey (1962)', '1/3', [0.1215873828, 0.3722893605, 0.6493239132, 0.9891686273, 1.5179291596]],
    ['Hazen, the rankits', '1/2', [0.1256613469, 0.3853204664, 0.6744897502, 1.0364333895, 1.644853627]],
    ['van der Waerden', '0', [0.1141852943, 0.3487556955, 0.6045853466, 0.9084578685, 1.3351777361]],
  ];

  it.each(NORMAL_SCORES)('%s, ten different scores (computed with R)', (_, offset, upper) => {
    const table = tableFromCounts(wholeScale(1, 10), new Array<number>(10).fill(1));
    const found = percentileRanks(table, { kind: 'plotting-position', offset }).map(normalisedZ);
    const expected = [...upper.map((z) => -z).toReversed(), ...upper];
    expectAllNear(found, expected, 1e-9, offset);
  });
});
