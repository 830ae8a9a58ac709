import { compareToWhole, ratio, ratioToNumber, type ExactRatio } from '../percentile/exact-ratio.ts';
import { percentileRanks, rankParts, type RankDefinition, type RankParts } from '../percentile/percentile-rank.ts';
import type { PercentInterval } from '../precision/percent-interval.ts';
import { attainableScores } from '../scale/score-scale.ts';
import {
  derivedScores,
  linearScale,
  NCE_FACTOR,
  normalisedZ,
  stanineOfZ,
  stenOfZ,
  type DerivedScores,
} from '../scores/derived-score.ts';
import {
  printCount,
  printNumber,
  printRank,
  printRatio,
  printScore,
  printWeight,
  type EndTaken,
} from '../scores/printed-number.ts';
import type { CohortSummary } from '../tally/cohort-summary.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import type { ColumnKey } from './column-keys.ts';
import type { SmoothedCurve } from './group-smoothing.ts';
import type { TableChoices } from './norm-project.ts';
import type { PrintRange } from './print-range.ts';
import { printedRange, printInterval, type GroupPrecision } from './row-precision.ts';
import { ranksOfCurve } from './smoothed-rank.ts';

/** Where a printed derived score comes from. */
export type DerivedFrom = 'rank' | 'linear' | 'held-at-limit' | 'half-person' | 'none';

/** For each cell of a row: what it was made of. */
export interface RowProvenance {
  readonly percentileRank: {
    readonly from: 'counts' | 'weights';
    /** False where nobody obtained the score and the rank follows from its neighbours. */
    readonly observed: boolean;
    /** People, or weight, that did worse, at the score, and of all. */
    readonly below: number;
    readonly at: number;
    readonly all: number;
  };
  /** Which rank was printed, and which end rule, if any, took the place of the rounded number. */
  readonly printed: { readonly from: 'observed' | 'smoothed' | 'adjusted'; readonly end: EndTaken };
  readonly derived: DerivedFrom;
}

export interface ConversionRow {
  /** Raw-score points. */
  readonly score: number;
  readonly scoreText: string;
  /** People at the score. */
  readonly count: number;
  readonly parts: RankParts;
  /** Sum of weights at the score, and at it or on its poor side; people without weights. */
  readonly weight: number;
  readonly cumulative: number;
  /** The percentile rank that is printed, 0–100: the exact observed one, or the smoothed one where smoothing is on. */
  readonly rank: ExactRatio;
  /** The same as the nearest double. */
  readonly percentileRank: number;
  /** The exact observed rank, whether or not smoothing is on. */
  readonly observed: { readonly rank: ExactRatio; readonly percentileRank: number };
  /** Null without smoothing; the error is in percentile-rank points, null where the method has none. */
  readonly smoothed: {
    readonly proportion: number;
    readonly percentileRank: number;
    readonly standardError: number | null;
  } | null;
  /** Sampling interval of the observed rank, 0–100; null where the definition has none. */
  readonly interval: PercentInterval | null;
  /** Standard error of the printed rank, percentile-rank points; null where there is none. */
  readonly standardError: number | null;
  /** Standard error of the observed midpoint rank, whatever the definition. */
  readonly midpointError: number | null;
  /** What the error of measurement leaves open, 0–100; null without a reliability. */
  readonly band: PercentInterval | null;
  /** What else could have been printed; null where it was not asked for. */
  readonly range: PrintRange | null;
  /** As printed everywhere. */
  readonly printed: string;
  /** What was printed before somebody changed it by hand, why and who; null where nobody did. The rank stays. */
  readonly adjusted: { readonly from: string; readonly reason: string; readonly by: string } | null;
  /** Unrounded; null where no finite value exists. */
  readonly derived: DerivedScores;
  /** The z that printed scores are made from, before they are held: that of `derived`, or what stands in for it. */
  readonly printedZ: number | null;
  /** Printed text of every column that a table can carry. */
  readonly texts: Readonly<Record<ColumnKey, string>>;
  readonly provenance: RowProvenance;
}

/** Printed z is held between −3 and 3 where the limits stand in for missing values. */
const Z_LIMIT = 3;
const NO_VALUE = '\u2013';

/** How printed scores follow from z: mean + spread · z, with the limits where they are held and the printed decimals. */
export const PRINTED_SCALES = {
  z: { mean: 0, spread: 1, low: -Z_LIMIT, high: Z_LIMIT, decimals: 2 },
  t: { mean: 50, spread: 10, low: 50 - 10 * Z_LIMIT, high: 50 + 10 * Z_LIMIT, decimals: 0 },
  nce: { mean: 50, spread: NCE_FACTOR, low: 1, high: 99, decimals: 0 },
  deviation: { mean: 100, spread: 15, low: 100 - 15 * Z_LIMIT, high: 100 + 15 * Z_LIMIT, decimals: 0 },
} as const;

/**
 * One row for each attainable score, lowest first. The only place where a group's numbers become printed texts. Throws
 * on a group without people.
 */
export function conversionRows(basis: RowBasis): readonly ConversionRow[] {
  const { table, definition, curve } = basis;
  const observed = percentileRanks(table, definition);
  const printed = curve === null ? observed : ranksOfCurve(curve, table, definition);
  const parts = rankParts(table);
  return attainableScores(table.scale).map((score, position) => {
    const exact = observed[position];
    const rank = printed[position];
    const part = parts[position];
    if (exact === undefined || rank === undefined || part === undefined) throw new RangeError('a score without a rank');
    return rowOf(basis, { position, score, observed: exact, rank, part });
  });
}

/** What all rows of a group are made from. */
export interface RowBasis {
  readonly table: FrequencyTable;
  readonly summary: CohortSummary;
  readonly definition: RankDefinition;
  readonly choices: TableChoices;
  /** Null: ranks are printed as observed. */
  readonly curve: SmoothedCurve | null;
  readonly precision: GroupPrecision;
  /** Null where they were not asked for. */
  readonly ranges: readonly PrintRange[] | null;
}

interface RowParts {
  readonly position: number;
  readonly score: number;
  readonly observed: ExactRatio;
  readonly rank: ExactRatio;
  readonly part: RankParts;
}

function rowOf(basis: RowBasis, { position, score, observed, rank, part }: RowParts): ConversionRow {
  const { table, summary, choices, curve, precision } = basis;
  const count = table.counts[position] ?? 0;
  const interval = precision.intervals?.[position] ?? null;
  const band = precision.bands?.[position]?.ranks ?? null;
  const range = basis.ranges?.[position] ?? null;
  const oneByOne = curve?.standardErrors?.[position] ?? null;
  const factor = precision.smoothedErrorFactor;
  const smoothedError = oneByOne === null || factor === null ? null : oneByOne * factor;
  const standardError = curve === null ? (precision.standardErrors?.[position] ?? null) : smoothedError;
  const linear = choices.zSource === 'linear';
  const normal = derivedScores(rank, linear ? linearZ(table, summary, score) : normalisedZ(rank));
  const derived =
    linear && normal.z !== null ? { ...normal, stanine: stanineOfZ(normal.z), sten: stenOfZ(normal.z) } : normal;
  const behindPrint = zForPrint(derived.z, rank, summary.n, choices);
  const printed = printRank(rank, choices);
  const asNumber = (units: bigint): number => ratioToNumber(ratio(units, table.weightUnit));
  const fromZ = (key: keyof typeof PRINTED_SCALES): string => {
    if (behindPrint.z === null) return NO_VALUE;
    return printNumber(printedScaleValue(key, behindPrint.z, choices), PRINTED_SCALES[key].decimals);
  };
  return {
    score,
    scoreText: printScore(table.scale, score),
    count,
    parts: part,
    weight: asNumber(part.at),
    cumulative: asNumber(part.below + part.at),
    rank,
    percentileRank: ratioToNumber(rank),
    observed: { rank: observed, percentileRank: ratioToNumber(observed) },
    smoothed:
      curve === null
        ? null
        : {
            proportion: curve.probabilities[position] ?? NaN,
            percentileRank: ratioToNumber(rank),
            standardError: smoothedError,
          },
    interval,
    standardError,
    midpointError: precision.midpointErrors?.[position] ?? null,
    band,
    range,
    printed: printed.text,
    adjusted: null,
    derived,
    printedZ: behindPrint.z,
    texts: {
      count: printCount(count),
      cumulative: printWeight(part.below + part.at, table.weightUnit),
      'exact-rank': printRatio(rank, 2),
      'observed-rank': printRatio(observed, 2),
      interval: interval === null ? NO_VALUE : printInterval(interval, choices),
      'standard-error': standardError === null ? NO_VALUE : printNumber(standardError, 1),
      'measurement-band': band === null ? NO_VALUE : printInterval(band, choices),
      'print-range': range === null ? NO_VALUE : printedRange(range.low, range.high),
      z: fromZ('z'),
      t: fromZ('t'),
      nce: fromZ('nce'),
      deviation: fromZ('deviation'),
      sten: derived.sten === null ? NO_VALUE : String(derived.sten),
      stanine: String(derived.stanine),
    },
    provenance: {
      percentileRank: {
        from: table.weighted ? 'weights' : 'counts',
        observed: count > 0,
        below: asNumber(part.below),
        at: asNumber(part.at),
        all: asNumber(part.all),
      },
      printed: { from: curve === null ? 'observed' : 'smoothed', end: printed.end },
      derived: behindPrint.from,
    },
  };
}

function linearZ(table: FrequencyTable, summary: CohortSummary, score: number): number | null {
  if (summary.sd === null || summary.sd === 0) return null;
  const z = (score - summary.mean) / summary.sd;
  return table.scale.direction === 'high-is-good' ? z : -z;
}

/** The z behind printed derived scores: as it is, or what the user's rule puts where ranks 0 and 100 leave none. */
function zForPrint(
  z: number | null,
  rank: ExactRatio,
  n: number,
  choices: TableChoices,
): { readonly z: number | null; readonly from: DerivedFrom } {
  if (z !== null) {
    if (choices.zEnds === 'limits' && Math.abs(z) > Z_LIMIT) return { z, from: 'held-at-limit' };
    return { z, from: choices.zSource === 'linear' ? 'linear' : 'rank' };
  }
  const low = compareToWhole(rank, 0n) <= 0;
  if (choices.zSource === 'linear' || (!low && compareToWhole(rank, 100n) < 0)) return { z: null, from: 'none' };
  if (choices.zEnds === 'limits') return { z: low ? -Z_LIMIT : Z_LIMIT, from: 'held-at-limit' };
  const people = BigInt(n);
  const half = low ? ratio(100n, 2n * people) : ratio(100n * (2n * people - 1n), 2n * people);
  return { z: normalisedZ(half), from: 'half-person' };
}

/** The number behind a printed score: mean + spread · z, held where the limits stand in for missing values. */
export function printedScaleValue(key: keyof typeof PRINTED_SCALES, z: number, { zEnds }: TableChoices): number {
  const { mean, spread, low, high } = PRINTED_SCALES[key];
  const value = linearScale(z, mean, spread);
  return zEnds === 'limits' ? Math.min(high, Math.max(low, value)) : value;
}
