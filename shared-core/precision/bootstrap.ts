import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { smooth } from '../smoothing/smooth.ts';
import type { Smoothed, SmoothingChoice } from '../smoothing/smoothing.ts';
import { tableFromCounts, weightUnitsIn, type FrequencyTable } from '../tally/frequency-table.ts';
import { rankShares, shareOfTied, smoothedRanks, type CountedRank } from './counted-rank.ts';
import { levelProblem, tailOf } from './confidence-level.ts';
import { multinomialSampler } from './multinomial.ts';
import type { PercentInterval } from './percent-interval.ts';
import { ReplicateRanks } from './replicate-ranks.ts';
import { seededRandom, seedProblem } from './seeded-random.ts';

export interface BootstrapPlan {
  readonly choice: SmoothingChoice;
  readonly counted: CountedRank;
  /** Samples that are drawn and fitted again. */
  readonly replicates: number;
  /** Whole number from 0; printed, so that anybody can draw the same samples. */
  readonly seed: number;
  /** Per cent, 50–99.9. */
  readonly level: number;
}

export interface BootstrapProgress {
  readonly done: number;
  readonly of: number;
  readonly failed: number;
}

export interface Bootstrapped {
  /** Standard deviation of the replicates' ranks, in percentile-rank points, one for each score, lowest score first. */
  readonly standardErrors: readonly number[];
  /** Percentile intervals of the replicates' ranks; null when too few could be fitted for the level. */
  readonly intervals: readonly PercentInterval[] | null;
  readonly drawn: number;
  readonly fitted: number;
  /** Samples that the method refused, by its sentence; none is drawn again in their place. */
  readonly failures: readonly { readonly problem: string; readonly count: number }[];
  /** How often each degree was chosen, lowest first; empty for methods without one. */
  readonly degrees: readonly { readonly degree: number; readonly count: number }[];
  /** People in each sample: the effective n, rounded. */
  readonly people: number;
}

export type BootstrapResult =
  { readonly ok: true; readonly bootstrapped: Bootstrapped } | { readonly ok: false; readonly problem: string };

export const MOST_REPLICATES = 20_000;
const MOST_CELLS = 30_000_000;
const FEWEST_FITTED = 2;
/** Progress is told after so many samples, on long scales after fewer, so that a caller can stop at once. */
const LARGEST_CHUNK = 10;
const CELLS_PER_CHUNK = 1500;

/** Samples that an interval of a level needs, so that each end lies on or within the outermost one. */
export function replicatesNeeded(level: number): number {
  return Math.ceil((1 / tailOf(level)) * (1 - 1e-9)) - 1;
}

/** What is wrong with a number of replicates for an interval of a level, in a sentence, or null. */
export function replicatesProblem(replicates: number, level: number): string | null {
  const needed = replicatesNeeded(level);
  return Number.isSafeInteger(replicates) && replicates >= needed && replicates <= MOST_REPLICATES
    ? null
    : `An interval of ${level} per cent needs from ${needed} to ${MOST_REPLICATES} replicates.`;
}

/** What is wrong with a plan for a table, in a sentence that tells what to do, or null. */
export function bootstrapProblem(table: FrequencyTable, plan: BootstrapPlan): string | null {
  const { replicates, level, seed } = plan;
  const wrong = levelProblem(level) ?? seedProblem(seed);
  if (wrong !== null) return wrong;
  if (weightUnitsIn(table) === 0n) return 'A group without people cannot be drawn from.';
  const unfit = replicatesProblem(replicates, level);
  if (unfit !== null) return unfit;
  const most = Math.floor(MOST_CELLS / table.counts.length);
  return replicates > most ? `A scale of ${table.counts.length} scores can have at most ${most} replicates.` : null;
}

/**
 * Parametric bootstrap (Efron & Tibshirani 1993, An Introduction to the Bootstrap, ch. 6 and 13): samples are drawn from
 * the smoothed distribution (without smoothing, from the observed one), each is smoothed again with the same method *and*
 * the same rule for its degree and bandwidth, and the ranks of the replicates tell how much they vary. Yields progress
 * every few samples, so that a caller can show it or stop; what it returns depends on table and plan alone.
 */
export function* bootstrapRanks(
  table: FrequencyTable,
  effectiveN: number,
  plan: BootstrapPlan,
): Generator<BootstrapProgress, BootstrapResult, undefined> {
  const problem = bootstrapProblem(table, plan);
  if (problem !== null) return { ok: false, problem };
  const fit = ranksOf(table, plan);
  if (!fit.ok) return { ok: false, problem: fit.problem };
  const people = Math.max(1, Math.round(effectiveN));
  const draw = multinomialSampler(fit.smoothed?.probabilities ?? observedShares(table));
  const next = seededRandom(plan.seed);
  const ranks = new ReplicateRanks(table.counts.length, plan.replicates);
  const failures = new Map<string, number>();
  const degrees = new Map<number, number>();
  const chunk = Math.max(1, Math.min(LARGEST_CHUNK, Math.floor(CELLS_PER_CHUNK / table.counts.length)));
  let failed = 0;
  for (let done = 1; done <= plan.replicates; done += 1) {
    const again = ranksOf(tableFromCounts(table.scale, draw(people, next)), plan);
    if (again.ok) {
      ranks.add(again.ranks);
      const degree = again.smoothed?.degree ?? null;
      if (degree !== null) degrees.set(degree, (degrees.get(degree) ?? 0) + 1);
    } else {
      failed += 1;
      failures.set(again.problem, (failures.get(again.problem) ?? 0) + 1);
    }
    if (done % chunk === 0 || done === plan.replicates) yield { done, of: plan.replicates, failed };
  }
  if (ranks.added < FEWEST_FITTED) {
    const why = [...failures.keys()][0] ?? '';
    return { ok: false, problem: `Of ${plan.replicates} drawn samples ${ranks.added} could be smoothed: ${why}` };
  }
  return {
    ok: true,
    bootstrapped: {
      standardErrors: ranks.standardErrors(),
      intervals: ranks.added >= replicatesNeeded(plan.level) ? ranks.intervals(tailOf(plan.level)) : null,
      drawn: plan.replicates,
      fitted: ranks.added,
      failures: [...failures].map(([why, count]) => ({ problem: why, count })),
      degrees: [...degrees].map(([degree, count]) => ({ degree, count })).sort((a, b) => a.degree - b.degree),
      people,
    },
  };
}

type RanksFound =
  | { readonly ok: true; readonly ranks: readonly number[]; readonly smoothed: Smoothed | null }
  | { readonly ok: false; readonly problem: string };

function ranksOf(table: FrequencyTable, { choice, counted }: BootstrapPlan): RanksFound {
  if (choice.kind === 'none') {
    const tied = shareOfTied(counted);
    const ranks = rankShares(table).map(({ below, at }) => 100 * (below + tied * at));
    return { ok: true, ranks, smoothed: null };
  }
  const result = smooth(table, choice, 'fit-only');
  if (!result.ok) return { ok: false, problem: result.problem };
  const { smoothed } = result;
  return { ok: true, ranks: smoothedRanks(smoothed, table.scale.direction, counted), smoothed };
}

function observedShares(table: FrequencyTable): readonly number[] {
  const all = weightUnitsIn(table);
  return table.weights.map((weight) => ratioToNumber(ratio(weight, all)));
}
