import type { Tally } from '../tally/tally.ts';

/** People and their weights at each attainable score of one group, lowest score first. */
export interface GroupCounts {
  readonly people: readonly bigint[];
  /** In units; the same as `people` without weights. */
  readonly weights: readonly bigint[];
  /** Units in a weight of 1. */
  readonly unit: bigint;
}

/** Adds up, score by score, the cells of a tally that belong to a group: one value for each column of `by`. */
export function groupCounts(tally: Tally, by: readonly string[], values: readonly string[]): GroupCounts {
  const own = tally.cells.filter((cell) =>
    by.every((column, index) => cell.values[tally.groupColumns.indexOf(column)] === values[index]),
  );
  const length = own[0]?.counts.length ?? 0;
  const added = (of: (cell: Tally['cells'][number]) => readonly (number | string)[]): readonly bigint[] =>
    Array.from({ length }, (_, place) => own.reduce((sum, cell) => sum + BigInt(of(cell)[place] ?? 0), 0n));
  const people = added(({ counts }) => counts);
  if (tally.weightDecimals === null) return { people, weights: people, unit: 1n };
  return { people, weights: added(({ weights }) => weights ?? []), unit: 10n ** BigInt(tally.weightDecimals) };
}
