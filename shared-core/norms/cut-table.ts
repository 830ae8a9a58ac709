import { ratio, type ExactRatio } from '../percentile/exact-ratio.ts';
import { printCount, printRatio } from '../scores/printed-number.ts';
import { cutScoreText, cutsOfGroup, firstOnGoodSide } from './cuts.ts';
import type { ConversionRow } from './conversion-table.ts';
import type { GroupNorms } from './group-norms.ts';
import type { Cut, NormProject } from './norm-project.ts';

/** A cut with what it means in each of its groups. */
export interface CutTable {
  readonly cut: Cut;
  /** The score of the cut as it is printed. */
  readonly scoreText: string;
  /** One row for each printed group that it holds for, in their order. */
  readonly rows: readonly CutRow[];
}

export interface CutRow {
  /** Position of the group in the norm set. */
  readonly group: number;
  readonly title: string;
  /** People of the group. */
  readonly n: string;
  /** The row of the conversion table at the cut; null where the cut is no score of the scale. */
  readonly row: ConversionRow | null;
  /** The percentile rank at the cut as it is printed; a dash where there is none. */
  readonly rank: string;
  /** The sampling interval of that rank; null where the project has none. */
  readonly interval: string | null;
  /** Per cent of the group, by weight where people are weighted, at the cut or better; null outside the scale. */
  readonly share: ExactRatio | null;
  /** The same to one decimal; a dash for null. */
  readonly shareText: string;
}

const NO_VALUE = '\u2013';

/**
 * The cuts of a project in print order, each with the groups that it holds for. The rank is that of the conversion
 * table. The share counts everybody at the cut or on its good side: 100 · (all − worse)/all, where worse are those that
 * the midpoint and every other rank counts as below (lower scores, or higher ones where low is good), as observed even
 * where ranks are smoothed. It is exact until it is rounded half up to one decimal, so that it and the share below add
 * up to 100 before rounding.
 */
export function cutTables(project: NormProject, groups: readonly GroupNorms[]): readonly CutTable[] {
  const scale = groups[0]?.group.table.scale;
  if (scale === undefined) return [];
  return project.cuts.map((cut) => ({
    cut,
    scoreText: cutScoreText(scale, cut.score),
    rows: groups.flatMap((norms, group) =>
      cutsOfGroup(project, norms.group.key).includes(cut) ? [cutRow(cut, norms, group)] : [],
    ),
  }));
}

function cutRow({ score }: Cut, { group, summary, rows, precision }: GroupNorms, position: number): CutRow {
  const first = rows[firstOnGoodSide(group.table.scale, score) ?? -1];
  const row = first?.score === score ? first : null;
  const share = first === undefined ? null : shareAtOrBetter(first);
  return {
    group: position,
    title: group.title,
    n: printCount(summary.n),
    row,
    rank: row?.printed ?? NO_VALUE,
    interval: precision.intervals === null ? null : (row?.texts.interval ?? NO_VALUE),
    share,
    shareText: share === null ? NO_VALUE : printRatio(share, 1),
  };
}

function shareAtOrBetter({ parts }: ConversionRow): ExactRatio {
  return ratio(100n * (parts.all - parts.below), parts.all);
}
