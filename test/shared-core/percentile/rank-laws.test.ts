import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareToWhole, ratio, type ExactRatio } from '../../../shared-core/percentile/exact-ratio.ts';
import { percentileRanks, type RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import {
  mirrorTable,
  tableFromCounts,
  weightUnitsIn,
  type FrequencyTable,
} from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, copied, countedTables, equallyWeighted, lowIsGood, scoresOn } from './some-tables.ts';

const MIDPOINT: RankDefinition = { kind: 'midpoint' };
const BELOW: RankDefinition = { kind: 'below' };
const AT_OR_BELOW: RankDefinition = { kind: 'at-or-below' };

function definitionsFor(table: FrequencyTable): readonly RankDefinition[] {
  return [
    MIDPOINT,
    BELOW,
    AT_OR_BELOW,
    { kind: 'plotting-position', offset: '3/8' },
    { kind: 'plotting-position', offset: '0' },
    { kind: 'plotting-position', offset: '0.9' },
    { kind: 'grouped', width: table.scale.step },
    { kind: 'grouped', width: steps(table, 3) },
  ];
}

/** A number of steps in raw-score points, without the dust of multiplying tenths. */
function steps(table: FrequencyTable, count: number): number {
  return Math.round(table.scale.step * count * 10) / 10;
}

/** Below 0, 0 or above 0 as the left ratio is smaller than, equal to or larger than the right. */
function compare(left: ExactRatio, right: ExactRatio): number {
  return compareToWhole(ratio(left.numerator * right.denominator - right.numerator * left.denominator, 1n), 0n);
}

function expectSame(left: readonly ExactRatio[], right: readonly ExactRatio[]): void {
  expect(left.length).toBe(right.length);
  const differing = left.filter((rank, index) => compare(rank, right[index] ?? ratio(-1n, 1n)) !== 0);
  expect(differing).toEqual([]);
}

function complement(rank: ExactRatio): ExactRatio {
  return ratio(100n * rank.denominator - rank.numerator, rank.denominator);
}

describe('percentile ranks', () => {
  it('lie between 0 and 100, by any definition', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        for (const definition of definitionsFor(table)) {
          const ranks = percentileRanks(table, definition);
          expect(ranks.filter((rank) => compareToWhole(rank, 0n) < 0 || compareToWhole(rank, 100n) > 0)).toEqual([]);
        }
      }),
    );
  });

  it('below ≤ midpoint ≤ at or below, each at or below is the next below, the last is 100', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        const [below, midpoint, atOrBelow] = [BELOW, MIDPOINT, AT_OR_BELOW].map((d) => percentileRanks(table, d));
        if (below === undefined || midpoint === undefined || atOrBelow === undefined) throw new RangeError('three');
        midpoint.forEach((rank, index) => {
          expect(compare(below[index] ?? rank, rank)).toBeLessThanOrEqual(0);
          expect(compare(rank, atOrBelow[index] ?? rank)).toBeLessThanOrEqual(0);
        });
        expectSame(atOrBelow.slice(0, -1), below.slice(1));
        expectSame(atOrBelow.slice(-1), [ratio(100n, 1n)]);
        expectSame(below.slice(0, 1), [ratio(0n, 1n)]);
      }),
    );
  });

  it('midpoint ranks average exactly 50 over people', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        const sum = percentileRanks(table, MIDPOINT).reduce(
          (total, rank, index) =>
            ratio(
              total.numerator * rank.denominator + (table.weights[index] ?? 0n) * rank.numerator * total.denominator,
              total.denominator * rank.denominator,
            ),
          ratio(0n, 1n),
        );
        expect(sum.numerator).toBe(50n * weightUnitsIn(table) * sum.denominator);
      }),
    );
  });

  it('never fall as the score gets better, by any definition', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        for (const definition of definitionsFor(table)) {
          const up = percentileRanks(table, definition);
          const down = percentileRanks(lowIsGood(table), definition);
          up.slice(1).forEach((rank, index) => expect(compare(up[index] ?? rank, rank)).toBeLessThanOrEqual(0));
          down.slice(1).forEach((rank, index) => expect(compare(down[index] ?? rank, rank)).toBeGreaterThanOrEqual(0));
        }
      }),
    );
  });

  it('stay when the raw scores are shifted and stretched', () => {
    const stretches = fc.record({ factor: fc.integer({ min: 1, max: 9 }), shift: fc.integer({ min: -90, max: 90 }) });
    fc.assert(
      fc.property(anyTables(), stretches, (table, { factor, shift }) => {
        const step = factor;
        const scale = { ...table.scale, min: shift, max: shift + step * (scoresOn(table.scale) - 1), step };
        const moved = { ...table, scale };
        for (const definition of [MIDPOINT, BELOW, AT_OR_BELOW]) {
          expectSame(percentileRanks(moved, definition), percentileRanks(table, definition));
        }
        expectSame(
          percentileRanks(moved, { kind: 'grouped', width: step * 2 }),
          percentileRanks(table, { kind: 'grouped', width: steps(table, 2) }),
        );
      }),
    );
  });

  it('are those of the unweighted group when all weigh the same', () => {
    fc.assert(
      fc.property(countedTables(), fc.bigInt({ min: 1n, max: 90_000n }), (table, units) => {
        const weighted = equallyWeighted(table, units);
        for (const definition of definitionsFor(table)) {
          expectSame(percentileRanks(weighted, definition), percentileRanks(table, definition));
        }
      }),
    );
  });

  it('stay when everybody is there k times', () => {
    fc.assert(
      fc.property(anyTables(), fc.integer({ min: 2, max: 12 }), (table, times) => {
        for (const definition of definitionsFor(table)) {
          if (definition.kind === 'plotting-position') continue;
          expectSame(percentileRanks(copied(table, times), definition), percentileRanks(table, definition));
        }
      }),
    );
  });

  it('turn into 100 less the rank when the scale is reversed', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        const up = percentileRanks(table, MIDPOINT);
        expectSame(percentileRanks(lowIsGood(table), MIDPOINT), up.map(complement));
        expectSame(percentileRanks(mirrorTable(table), MIDPOINT), up.map(complement).toReversed());
        expectSame(percentileRanks(lowIsGood(mirrorTable(table)), MIDPOINT), up.toReversed());
        const worse = percentileRanks(lowIsGood(table), BELOW);
        expectSame(worse, percentileRanks(table, AT_OR_BELOW).map(complement));
      }),
    );
  });

  it('Hazen plotting positions are the midpoint ranks of observed scores', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        expectSame(
          percentileRanks(table, { kind: 'plotting-position', offset: '1/2' }),
          percentileRanks(table, MIDPOINT),
        );
      }),
    );
  });

  it('classes of one score give the midpoint ranks', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        expectSame(
          percentileRanks(table, { kind: 'grouped', width: table.scale.step }),
          percentileRanks(table, MIDPOINT),
        );
      }),
    );
  });

  it('agree with counting people one by one', () => {
    fc.assert(
      fc.property(countedTables(), (table) => {
        const people = table.counts.flatMap((count, place) => new Array<number>(Math.min(count, 20)).fill(place));
        const small = tableFromCounts(
          table.scale,
          table.counts.map((count) => Math.min(count, 20)),
        );
        const counted = small.counts.map((_, place) => {
          const worse = people.filter((other) => other < place).length;
          const same = people.filter((other) => other === place).length;
          return ratio(BigInt(100 * worse + 50 * same), BigInt(people.length));
        });
        expectSame(percentileRanks(small, MIDPOINT), counted);
      }),
    );
  });
});
