import { ratioNear, ratioToNumber, type ExactRatio } from '../percentile/exact-ratio.ts';
import { parseOffset, scoresPerClass, type RankDefinition } from '../percentile/percentile-rank.ts';
import { smoothedRanks } from '../precision/counted-rank.ts';
import type { Smoothed } from '../smoothing/smoothing.ts';
import { peopleIn, type FrequencyTable } from '../tally/frequency-table.ts';
import { smoothedFrom, type SmoothedCurve } from './group-smoothing.ts';

/**
 * The percentile ranks 0–100 of a smoothed group by a definition, lowest score first, rounded to 1e-9 points so that
 * they print the same everywhere. Plotting positions take N times the smoothed midpoint share plus a half as the mean
 * rank; grouped ranks interpolate in the classes of the smoothed distribution.
 */
export function ranksOfCurve(
  curve: SmoothedCurve,
  table: FrequencyTable,
  definition: RankDefinition,
): readonly ExactRatio[] {
  return ranksOfSmoothed(smoothedFrom(curve), table, definition);
}

/** The same of a distribution as smoothing gives it. */
export function ranksOfSmoothed(
  smoothed: Smoothed,
  table: FrequencyTable,
  definition: RankDefinition,
): readonly ExactRatio[] {
  return rankNumbers(smoothed, table, definition).map((rank) => ratioNear(Math.min(100, Math.max(0, rank))));
}

function rankNumbers(smoothed: Smoothed, table: FrequencyTable, definition: RankDefinition): readonly number[] {
  const { direction } = table.scale;
  switch (definition.kind) {
    case 'midpoint':
    case 'at-or-below':
    case 'below':
      return smoothedRanks(smoothed, direction, definition.kind);
    case 'plotting-position': {
      const offset = parseOffset(definition.offset);
      if (offset === null) throw new RangeError('unusable offset');
      const a = ratioToNumber(offset);
      const people = peopleIn(table);
      return smoothedRanks(smoothed, direction, 'midpoint').map(
        (middle) => (100 * ((people * middle) / 100 + 0.5 - a)) / (people + 1 - 2 * a),
      );
    }
    case 'grouped': {
      const perClass = scoresPerClass(table.scale, definition.width);
      if (perClass === null) throw new RangeError('unusable width');
      const rising = direction === 'high-is-good';
      const inOrder = (ranks: readonly number[]): readonly number[] => (rising ? ranks : ranks.toReversed());
      const lower = inOrder(smoothedRanks(smoothed, direction, 'below'));
      const upper = inOrder(smoothedRanks(smoothed, direction, 'at-or-below'));
      const last = lower.length - 1;
      return inOrder(
        lower.map((_, position) => {
          const start = position - (position % perClass);
          const low = lower[start] ?? NaN;
          const high = upper[Math.min(last, start + perClass - 1)] ?? NaN;
          return low + ((high - low) * (position - start + 0.5)) / perClass;
        }),
      );
    }
  }
}
