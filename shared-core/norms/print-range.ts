import { compareRatios, type ExactRatio } from '../percentile/exact-ratio.ts';
import { percentileRanks, type RankDefinition } from '../percentile/percentile-rank.ts';
import { countedRank } from '../precision/counted-rank.ts';
import { printRank, type RankPrint } from '../scores/printed-number.ts';
import type { Smoothed } from '../smoothing/smoothing.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import { ranksOfSmoothed } from './smoothed-rank.ts';

/** One defensible way to a rank: the definition, and the smoothing, by its place in the list given, or none. */
export interface RankAlternative {
  readonly definition: RankDefinition;
  readonly smoothing: number | null;
}

/** The lowest and highest rank that could have been printed for a score, and what prints them. */
export interface PrintRange {
  readonly low: string;
  readonly high: string;
  readonly lowBy: RankAlternative;
  readonly highBy: RankAlternative;
}

const DEFINITIONS: readonly RankDefinition[] = [{ kind: 'midpoint' }, { kind: 'at-or-below' }, { kind: 'below' }];

interface Ranked {
  readonly by: RankAlternative;
  readonly ranks: readonly ExactRatio[];
}

/**
 * What else could have been printed: for every attainable score, lowest first, the range of printed ranks over the
 * definitions midpoint, at or below, and below, and the one chosen, each without smoothing and with every smoothing given.
 * Where low and high are the same text, the row hangs on no choice. Decimals, rounding and ends are those of the table.
 * Throws on a table without people and on a smoothing of another scale.
 */
export function printRange(
  table: FrequencyTable,
  chosen: RankDefinition,
  choices: RankPrint,
  smoothings: readonly Smoothed[],
): readonly PrintRange[] {
  const scores = table.counts.length;
  if (smoothings.some(({ probabilities }) => probabilities.length !== scores)) {
    throw new RangeError('a smoothing of another scale');
  }
  const definitions = countedRank(chosen) === null ? [...DEFINITIONS, chosen] : DEFINITIONS;
  const alternatives = definitions.flatMap((definition): readonly Ranked[] => [
    { by: { definition, smoothing: null }, ranks: percentileRanks(table, definition) },
    ...smoothings.map((smoothed, smoothing) => ({
      by: { definition, smoothing },
      ranks: ranksOfSmoothed(smoothed, table, definition),
    })),
  ]);
  return table.counts.map((_, position) => rangeAt(alternatives, position, choices));
}

function rangeAt(alternatives: readonly Ranked[], position: number, choices: RankPrint): PrintRange {
  const at = alternatives.flatMap(({ by, ranks }) => {
    const rank = ranks[position];
    return rank === undefined ? [] : [{ by, rank }];
  });
  const [first, ...others] = at;
  if (first === undefined) throw new RangeError('a score without a rank');
  const lowest = others.reduce((low, other) => (compareRatios(other.rank, low.rank) < 0 ? other : low), first);
  const highest = others.reduce((high, other) => (compareRatios(other.rank, high.rank) > 0 ? other : high), first);
  return {
    low: printRank(lowest.rank, choices).text,
    high: printRank(highest.rank, choices).text,
    lowBy: lowest.by,
    highBy: highest.by,
  };
}
