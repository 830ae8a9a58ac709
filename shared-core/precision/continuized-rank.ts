import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import type { Smoothed } from '../smoothing/smoothing.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import { rankShares } from './counted-rank.ts';

/**
 * A distribution whose scores are spread evenly over half a step to either side: ranks at the edges between scores,
 * straight lines from edge to edge. At an attainable score it gives the midpoint rank.
 */
export interface ContinuizedRanks {
  /** Raw-score points: half a step below the lowest score, between each two, half a step above the highest. */
  readonly edges: readonly number[];
  /** Percentile rank 0–100 at each edge, seen from the poor end of the scale. */
  readonly ranks: readonly number[];
}

export function observedContinuization(table: FrequencyTable): ContinuizedRanks {
  const rising = table.scale.direction === 'high-is-good';
  const shares = rankShares(table);
  const inner = shares.map(({ below, at }) => 100 * (rising ? below : below + at));
  return { edges: edgesOf(table.scale), ranks: [...inner, rising ? 100 : 0] };
}

/** A smoothed distribution at the same edges. */
export function smoothedContinuization(smoothed: Smoothed, scale: ScoreScale): ContinuizedRanks {
  const last = smoothed.probabilities.length - 1;
  const cumulative = smoothed.probabilities.map((_, position) => smoothed.cumulative(position, -0.5));
  const ranks = [...cumulative, smoothed.cumulative(last, 0.5)].map((share) =>
    Math.min(100, Math.max(0, 100 * (scale.direction === 'high-is-good' ? share : 1 - share))),
  );
  return { edges: edgesOf(scale), ranks };
}

function edgesOf(scale: ScoreScale): readonly number[] {
  const half = scale.step / 2;
  return [...attainableScores(scale).map((score) => score - half), scale.max + half];
}

/** Percentile rank 0–100 at any raw score; beyond the outer edges that of the edge. */
export function rankAt({ edges, ranks }: ContinuizedRanks, score: number): number {
  const above = edges.findIndex((edge) => edge > score);
  if (above === 0) return ranks[0] ?? NaN;
  if (above < 0) return ranks.at(-1) ?? NaN;
  const [left = NaN, right = NaN] = [edges[above - 1], edges[above]];
  const [low = NaN, high = NaN] = [ranks[above - 1], ranks[above]];
  return low + ((score - left) / (right - left)) * (high - low);
}
