import { ratioToNumber } from '../percentile/exact-ratio.ts';
import { printNumber } from '../scores/printed-number.ts';
import { computedText } from './adjustments.ts';
import { conversionRows } from './conversion-table.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';

/** What another choice would do to a group's table: printed ranks that change, and the largest move of a rank. */
export interface ChoiceEffect {
  readonly rows: number;
  readonly changed: number;
  /** Percentile-rank points, before rounding. */
  readonly largestMove: number;
}

/** Compares a group's table with the one that another project's definition and printing rules would give; smoothing stays. */
export function choiceEffect(norms: GroupNorms, other: NormProject): ChoiceEffect {
  const { group, summary, smoothing, precision } = norms;
  const rows = conversionRows({
    table: group.table,
    summary,
    definition: other.curve.definition,
    choices: other.table,
    curve: smoothing.state === 'smoothed' ? smoothing.curve : null,
    precision,
    ranges: null,
  });
  const moves = rows.map((row, position) => {
    const before = norms.rows[position];
    return before === undefined ? 0 : Math.abs(ratioToNumber(row.rank) - ratioToNumber(before.rank));
  });
  return {
    rows: rows.length,
    changed: rows.filter((row, position) => {
      const before = norms.rows[position];
      return before === undefined || row.printed !== computedText(before);
    }).length,
    largestMove: Math.max(...moves),
  };
}

/** "changes 31 of 41 printed ranks of Grade 5, by up to 3.1 points" */
export function effectInWords(norms: GroupNorms, effect: ChoiceEffect): string {
  if (effect.changed === 0) return `changes no printed rank of ${norms.group.title}`;
  return `changes ${effect.changed} of ${effect.rows} printed ranks of ${norms.group.title}; a rank moves by up to ${printNumber(effect.largestMove, 1)} points`;
}
