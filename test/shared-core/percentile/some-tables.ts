import fc from 'fast-check';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import { tableFromCell, tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';

/** Scales of 2 to 25 scores, whole or in halves and tenths, starting anywhere near zero. */
export function someScales(): fc.Arbitrary<ScoreScale> {
  return fc
    .record({
      start: fc.integer({ min: -30, max: 30 }),
      steps: fc.integer({ min: 1, max: 24 }),
      tenths: fc.constantFrom(1, 5, 10, 20),
    })
    .map(({ start, steps, tenths }) => ({
      min: (start * tenths) / 10,
      max: ((start + steps) * tenths) / 10,
      step: tenths / 10,
      direction: 'high-is-good' as const,
    }));
}

/** Counts for a number of scores, most of them small, many 0, at least one person in all. */
function someCounts(scores: number): fc.Arbitrary<readonly number[]> {
  const count = fc.oneof(fc.constant(0), fc.integer({ min: 0, max: 6 }), fc.integer({ min: 0, max: 3000 }));
  return fc
    .array(count, { minLength: scores, maxLength: scores })
    .filter((counts) => counts.some((people) => people > 0));
}

export function scoresOn(scale: ScoreScale): number {
  return Math.round((scale.max - scale.min) / scale.step) + 1;
}

/** Groups without weights, high scores good. */
export function countedTables(): fc.Arbitrary<FrequencyTable> {
  return someScales().chain((scale) => someCounts(scoresOn(scale)).map((counts) => tableFromCounts(scale, counts)));
}

/** Groups whose people have weights of up to 4 decimals. */
export function weightedTables(): fc.Arbitrary<FrequencyTable> {
  const person = fc.record({
    share: fc.double({ min: 0, max: 1, noNaN: true }),
    units: fc.integer({ min: 1, max: 50_000 }),
  });
  return fc.tuple(someScales(), fc.array(person, { minLength: 1, maxLength: 60 })).map(([scale, people]) => {
    const length = scoresOn(scale);
    const counts = new Array<number>(length).fill(0);
    const weights = new Array<bigint>(length).fill(0n);
    const squares = new Array<bigint>(length).fill(0n);
    for (const { share, units } of people) {
      const place = Math.min(length - 1, Math.floor(share * length));
      counts[place] = (counts[place] ?? 0) + 1;
      weights[place] = (weights[place] ?? 0n) + BigInt(units);
      squares[place] = (squares[place] ?? 0n) + BigInt(units) ** 2n;
    }
    const cell = { values: [], counts, weights: weights.map(String), squares: squares.map(String), clusters: null };
    return tableFromCell({ scale, groupColumns: [], weightDecimals: 4, cells: [cell] }, cell);
  });
}

export function anyTables(): fc.Arbitrary<FrequencyTable> {
  return fc.oneof(countedTables(), weightedTables());
}

/** The same people on a scale whose low scores are good. */
export function lowIsGood(table: FrequencyTable): FrequencyTable {
  return { ...table, scale: { ...table.scale, direction: 'low-is-good' } };
}

/** Everybody k times. */
export function copied(table: FrequencyTable, times: number): FrequencyTable {
  const factor = BigInt(times);
  return {
    ...table,
    counts: table.counts.map((count) => count * times),
    weights: table.weights.map((weight) => weight * factor),
    squares: table.squares.map((square) => square * factor),
  };
}

/** The same people, everybody with one weight, in units of 10^-4. */
export function equallyWeighted(table: FrequencyTable, units: bigint): FrequencyTable {
  return {
    ...table,
    weights: table.counts.map((count) => BigInt(count) * units),
    squares: table.counts.map((count) => BigInt(count) * units * units),
    weightUnit: 10_000n,
    weighted: true,
  };
}
