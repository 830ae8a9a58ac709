import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { printRange } from '../../../shared-core/norms/print-range.ts';
import { defensibleSmoothings } from '../../../shared-core/norms/print-range-smoothings.ts';
import { ranksOfSmoothed } from '../../../shared-core/norms/smoothed-rank.ts';
import { compareRatios, ratio, ratioNear } from '../../../shared-core/percentile/exact-ratio.ts';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import { smoothedRanks } from '../../../shared-core/precision/counted-rank.ts';
import { printRank, type RankPrint } from '../../../shared-core/scores/printed-number.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import type { Smoothed } from '../../../shared-core/smoothing/smoothing.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, lowIsGood } from '../percentile/some-tables.ts';

const print: RankPrint = { decimals: 0, rounding: 'half-up', ends: 'signs' };
const midpoint = { kind: 'midpoint' } as const;
const KINDS = ['below', 'midpoint', 'at-or-below'] as const;
const scale = { min: 0, max: 10, step: 1, direction: 'high-is-good' as const };
const table = tableFromCounts(scale, [3, 8, 14, 25, 31, 40, 33, 22, 13, 7, 4]);

function fitted(choice: Parameters<typeof smooth>[1]): Smoothed {
  const result = smooth(table, choice);
  if (!result.ok) throw new Error(result.problem);
  return result.smoothed;
}

const logLinear = (degree: number) => fitted({ kind: 'log-linear', degree, keptScores: [], comb: null });

describe('the range of printed ranks', () => {
  it('without smoothing reaches from below to at or below', () => {
    fc.assert(
      fc.property(anyTables(), fc.boolean(), (some, mirrored) => {
        const seen = mirrored ? lowIsGood(some) : some;
        const [below = [], , atOrBelow = []] = KINDS.map((kind) => percentileRanks(seen, { kind }));
        printRange(seen, midpoint, print, []).forEach(({ low, high }, position) => {
          const [first, last] = [below[position], atOrBelow[position]];
          if (first === undefined || last === undefined) throw new Error('a score without a rank');
          expect(low).toBe(printRank(first, print).text);
          expect(high).toBe(printRank(last, print).text);
        });
      }),
    );
  });

  it('holds every alternative, and both its ends are printed by one', () => {
    const smoothings = [logLinear(2), logLinear(3), fitted({ kind: 'kernel', bandwidth: 1.5, after: null })];
    for (const direction of ['high-is-good', 'low-is-good'] as const) {
      const seen = { ...table, scale: { ...scale, direction } };
      const all = KINDS.flatMap((kind) => [
        percentileRanks(seen, { kind }),
        ...smoothings.map((one) => smoothedRanks(one, direction, kind).map(ratioNear)),
      ]);
      expect(all.length).toBe(12);
      printRange(seen, midpoint, { ...print, decimals: 1 }, smoothings).forEach(
        ({ low, high, lowBy, highBy }, position) => {
          const ranks = all.map((one) => one[position] ?? ratio(-1n, 1n)).sort(compareRatios);
          const texts = [ranks[0], ranks.at(-1)].map((rank) =>
            printRank(rank ?? ratio(0n, 1n), { ...print, decimals: 1 }),
          );
          expect([low, high]).toEqual(texts.map(({ text }) => text));
          for (const [text, by] of [
            [low, lowBy],
            [high, highBy],
          ] as const) {
            const smoothed = by.smoothing === null ? null : smoothings[by.smoothing];
            const ranksBy =
              smoothed === null || smoothed === undefined
                ? percentileRanks(seen, by.definition)
                : ranksOfSmoothed(smoothed, seen, by.definition);
            expect(printRank(ranksBy[position] ?? ratio(-1n, 1n), { ...print, decimals: 1 }).text).toBe(text);
          }
        },
      );
    }
  });

  it('takes in the definition that is chosen, where it is none of the three', () => {
    for (const definition of [
      { kind: 'grouped', width: 4 },
      { kind: 'plotting-position', offset: '0.9' },
    ] as const) {
      const usual = printRange(table, midpoint, print, [logLinear(3)]);
      const wider = printRange(table, definition, print, [logLinear(3)]);
      const own = [percentileRanks(table, definition), ranksOfSmoothed(logLinear(3), table, definition)];
      const size = (text: string): number => (text.startsWith('<') ? 0 : text.startsWith('>') ? 100 : Number(text));
      wider.forEach(({ low, high }, position) => {
        const texts = own.map((ranks) => printRank(ranks[position] ?? ratio(-1n, 1n), print).text);
        const all = [...texts, usual[position]?.low ?? '', usual[position]?.high ?? ''].map(size);
        expect([size(low), size(high)]).toEqual([Math.min(...all), Math.max(...all)]);
      });
      const grew = wider.filter(({ lowBy, highBy }) => [lowBy, highBy].some((by) => by.definition === definition));
      if (definition.kind === 'grouped') expect(grew.length).toBeGreaterThan(0);
    }
  });

  it('refuses a smoothing of another scale', () => {
    const short = tableFromCounts({ ...scale, max: 1 }, [1, 1]);
    expect(() => printRange(short, midpoint, print, [logLinear(2)])).toThrow(RangeError);
  });
});

describe('defensible smoothings', () => {
  const degreesOf = (smoothings: readonly Smoothed[]): readonly (number | null)[] =>
    smoothings.map(({ degree }) => degree);

  it('are the chosen degree and the ones beside it', () => {
    expect(degreesOf(defensibleSmoothings(table, logLinear(4)))).toEqual([4, 3, 5]);
    expect(degreesOf(defensibleSmoothings(table, logLinear(1)))).toEqual([1, 2]);
    expect(degreesOf(defensibleSmoothings(table, logLinear(10)))).toEqual([10, 9]);
    const rule = fitted({ kind: 'log-linear', degree: 'bic', keptScores: [], comb: null });
    const chosen = rule.degree ?? NaN;
    expect(degreesOf(defensibleSmoothings(table, rule))).toEqual([chosen, chosen - 1, chosen + 1]);
  });

  it('keep bandwidth and lumps', () => {
    const after = { degree: 3, keptScores: [5], comb: null };
    const kernel = fitted({ kind: 'kernel', bandwidth: 0.6, after });
    const all = defensibleSmoothings(table, kernel);
    expect(all.map(({ choice }) => choice)).toEqual(
      [3, 2, 4].map((degree) => ({ kind: 'kernel', bandwidth: 0.6, after: { ...after, degree } })),
    );
  });

  it('are the method alone where it has no degree, and none without smoothing', () => {
    expect(defensibleSmoothings(table, fitted({ kind: 'kernel', bandwidth: 0.6, after: null })).length).toBe(1);
    expect(defensibleSmoothings(table, fitted({ kind: 'beta-binomial' })).length).toBe(1);
    expect(defensibleSmoothings(table, null)).toEqual([]);
  });
});

describe('a double as a ratio', () => {
  it('loses the last bits of a computation', () => {
    expect(printRank(ratioNear(23.499999999999996), print).text).toBe('24');
    expect(printRank(ratioNear(23.4999999), print).text).toBe('23');
    expect(compareRatios(ratioNear(0.1 + 0.2), ratio(3n, 10n))).toBe(0);
    expect(compareRatios(ratioNear(-2.5), ratio(-5n, 2n))).toBe(0);
    expect(() => ratioNear(NaN)).toThrow(RangeError);
    expect(() => ratioNear(Infinity)).toThrow(RangeError);
  });
});
