import { smallestToldCount, type SuppressedCell, type SuppressedTable } from './small-cells.ts';

/** Which statistics of raw scores may stand in a summary that is shared. */
export interface MayTell {
  readonly lowest: boolean;
  readonly quartiles: boolean;
  readonly median: boolean;
  readonly highest: boolean;
  readonly mean: boolean;
  readonly standardDeviation: boolean;
}

export const TELL_NOTHING: MayTell = {
  lowest: false,
  quartiles: false,
  median: false,
  highest: false,
  mean: false,
  standardDeviation: false,
};

const LEAST_FOR_MEAN = 5;
const LEAST_FOR_SPREAD = 10;

/**
 * What may be told of the scores of n tested people where the policy's smallest cell is `smallestCell` people. With k the
 * smallest count that is told (`smallestToldCount`):
 * - the lowest and the highest score never: each is one person's;
 * - the median from n = 2k, k people on each side; the quartiles from n = 4k, k people in each quarter;
 * - the mean from n = 2k, and at least 5; the standard deviation from n = 4k, and at least 10: whole-number scores of few
 *   people can be found from their mean, median and standard deviation together;
 * - nothing where all scores are alike: each statistic would be everybody's score.
 * Thresholds of this kind are common practice; these values are this program's own.
 */
export function summaryMayTell(n: number, smallestCell: number, areAllAlike: boolean): MayTell {
  const least = smallestToldCount(smallestCell);
  if (areAllAlike) return TELL_NOTHING;
  return {
    ...TELL_NOTHING,
    median: n >= 2 * least,
    quartiles: n >= 4 * least,
    mean: n >= Math.max(2 * least, LEAST_FOR_MEAN),
    standardDeviation: n >= Math.max(4 * least, LEAST_FOR_SPREAD),
  };
}

/**
 * What may be told beside shared counts, of the class and of its groups. Only a group whose tested are told has an n to
 * stand beside its statistics. The groups stand together: a statistic is told for every group that has tested people or
 * for none, since that of one left out could be subtracted from the class.
 */
export function summariesMayTell(
  shared: SuppressedTable,
  smallestCell: number,
  areAllAlike: { readonly together: boolean; readonly rows: readonly boolean[] },
): { readonly together: MayTell; readonly groups: MayTell } {
  if (shared.kind === 'nothing') return { together: TELL_NOTHING, groups: TELL_NOTHING };
  const ofCell = (tested: SuppressedCell, alike: boolean): MayTell =>
    tested.kind === 'told' ? summaryMayTell(tested.count, smallestCell, alike) : TELL_NOTHING;
  const together = ofCell(shared.together.tested, areAllAlike.together);
  if (shared.kind === 'class-only' || shared.rows.length < 2) return { together, groups: TELL_NOTHING };
  const groups = shared.rows.flatMap(({ tested }, row) =>
    tested.kind === 'told' && tested.count === 0 ? [] : [ofCell(tested, areAllAlike.rows[row] ?? true)],
  );
  const forAll = (told: (group: MayTell) => boolean): boolean => groups.length > 0 && groups.every(told);
  return {
    together,
    groups: {
      ...TELL_NOTHING,
      quartiles: forAll(({ quartiles }) => quartiles),
      median: forAll(({ median }) => median),
      mean: forAll(({ mean }) => mean),
      standardDeviation: forAll(({ standardDeviation }) => standardDeviation),
    },
  };
}
