import { decimalOf, unitsAt, type Decimal } from '../scale/decimal.ts';
import type { Direction } from '../scale/score-scale.ts';
import { printNumber } from '../scores/printed-number.ts';
import type { LineProblem } from '../tally/typed-counts.ts';
import type { PublishedRank, ScoreRange } from './published-cells.ts';

/** A line of a published table that could be read. */
export interface PublishedRow {
  readonly line: number;
  readonly scores: ScoreRange;
  readonly rank: PublishedRank;
  /** Texts of the further columns. */
  readonly further: readonly string[];
}

/** Scores of a table as whole numbers of 10^-decimals points. */
export interface RowUnits {
  readonly row: PublishedRow;
  readonly low: bigint;
  readonly high: bigint;
}

/** All rows in units of the finest decimal of scores and step, lowest score first. */
export function inUnits(
  rows: readonly PublishedRow[],
  declaredStep: number | null,
): { readonly decimals: number; readonly rows: readonly RowUnits[] } {
  const finest = declaredStep === null ? 0 : decimalOf(declaredStep).decimals;
  const decimals = rows.reduce(
    (most, { scores: { low, high } }) => Math.max(most, low.decimals, high.decimals),
    finest,
  );
  const units = rows.map((row) => ({
    row,
    low: unitsAt(row.scores.low, decimals),
    high: unitsAt(row.scores.high, decimals),
  }));
  return { decimals, rows: units.toSorted((a, b) => compare(a.low, b.low) || a.row.line - b.row.line) };
}

/**
 * The step that the scores show, in units: the largest of which all differences between them are multiples. A range
 * stands for the scores within it, so that with ranges it is at most 1 point.
 */
export function stepShown(rows: readonly RowUnits[], decimals: number): bigint {
  const ends = rows.flatMap(({ low, high }) => [low, high]);
  const first = ends[0] ?? 0n;
  const ranged = rows.some(({ low, high }) => low !== high);
  const step = ends.reduce((known, end) => commonDivisor(known, end - first), ranged ? 10n ** BigInt(decimals) : 0n);
  return step === 0n ? 10n ** BigInt(decimals) : step;
}

/** Overlaps, scores twice, scores off the step, and gaps, each with the line to look at. Rows are in order of scores. */
export function rangeProblems(rows: readonly RowUnits[], decimals: number, step: bigint): readonly LineProblem[] {
  const problems: LineProblem[] = [];
  const first = rows[0]?.low ?? 0n;
  let before: RowUnits | null = null;
  for (const one of rows) {
    const { line } = one.row;
    const shown = (units: bigint): string => printNumber(Number(units) / 10 ** decimals, decimals);
    const named = (low: bigint, high: bigint): string =>
      low === high ? shown(low) : `${shown(low)} to ${shown(high)}`;
    if ((one.low - first) % step !== 0n || (one.high - first) % step !== 0n) {
      problems.push({
        line,
        problem: `${named(one.low, one.high)} does not lie on steps of ${shown(step)} from ${shown(first)}. Correct the score, or the step.`,
      });
    } else if (before !== null && one.low <= before.high) {
      const earlier = before.row.line;
      problems.push({
        line,
        problem:
          one.low === before.low && one.high === before.high
            ? `Score ${named(one.low, one.high)} stands in line ${earlier} already. Give each score one line.`
            : `${one.low === one.high ? 'Score' : 'Scores'} ${named(one.low, one.high)} ${one.low === one.high ? 'overlaps' : 'overlap'} with ${named(before.low, before.high)} in line ${earlier}. Give each score one line.`,
      });
    } else if (before !== null && one.low - before.high > step) {
      const [from, to] = [before.high + step, one.low - step];
      const many = from !== to;
      problems.push({
        line,
        problem:
          `${many ? `Scores ${named(from, to)} have` : `Score ${shown(from)} has`} no rank: line ${before.row.line} ends at ` +
          `${shown(before.high)} and this one begins at ${shown(one.low)}. Add the missing ${many ? 'lines' : 'line'}, ` +
          `or, if nobody can obtain ${many ? 'them' : 'it'}, set the step of the scores.`,
      });
    }
    if (before === null || one.high > before.high) before = one;
  }
  return problems;
}

export interface RankOrder {
  /** The end that is good by the ranks; null where they are all the same. */
  readonly seen: Direction | null;
  readonly problems: readonly LineProblem[];
}

/**
 * Ranks rise with the scores, or fall throughout where low scores are good. Without a declared direction, falling ranks
 * are asked about and never taken for granted; where they go both ways, the lines against the run of the others are told.
 */
export function rankOrder(rows: readonly RowUnits[], declared: Direction | null): RankOrder {
  const steps = rows.slice(1).map((row, index) => {
    const before = rows[index];
    return { row, before, turn: before === undefined ? 0 : compareRanks(row.row.rank, before.row.rank) };
  });
  const rises = steps.filter(({ turn }) => turn > 0).length;
  const falls = steps.filter(({ turn }) => turn < 0).length;
  const seen = rises === 0 && falls === 0 ? null : falls > rises ? 'low-is-good' : 'high-is-good';
  if (rises === 0 && falls > 0 && declared !== 'low-is-good') {
    const problem =
      declared === null
        ? 'The ranks fall as the scores rise. If low scores are good here, as with errors or seconds, say so; otherwise correct the lines.'
        : 'The ranks fall as the scores rise, although high scores are said to be good. Say that low scores are good, or correct the lines.';
    return { seen, problems: [{ line: 0, problem }] };
  }
  if (falls === 0 && rises > 0 && declared === 'low-is-good') {
    const problem =
      'The ranks rise with the scores, although low scores are said to be good. Say that high scores are good, or correct the lines.';
    return { seen, problems: [{ line: 0, problem }] };
  }
  const run = declared ?? seen ?? 'high-is-good';
  const against = steps.filter(({ turn }) => (run === 'high-is-good' ? turn < 0 : turn > 0));
  return {
    seen,
    problems: against.map(({ row, before, turn }) => ({
      line: row.row.line,
      problem:
        `The rank ${turn < 0 ? 'falls' : 'rises'} from ${rankText(before?.row.rank)} in line ${before?.row.line ?? 0} to ` +
        `${rankText(row.row.rank)} while the score rises. Correct the one that is wrong.`,
    })),
  };
}

/** "63", "<1", with so many decimals as it was written with. */
export function rankText(rank: PublishedRank | undefined, decimals = rank?.written ?? 0): string {
  if (rank === undefined) return '';
  const sign = { below: '<', at: '', above: '>' }[rank.side];
  return `${sign}${printNumber(toNumber(rank.value), decimals)}`;
}

export function toNumber({ units, decimals }: Decimal): number {
  return Number(units) / 10 ** decimals;
}

/** "<1" stands below 1, ">99" above 99. */
function compareRanks(left: PublishedRank, right: PublishedRank): number {
  const decimals = Math.max(left.value.decimals, right.value.decimals);
  const order = compare(unitsAt(left.value, decimals), unitsAt(right.value, decimals));
  return order || SIDES[left.side] - SIDES[right.side];
}

const SIDES = { below: -1, at: 0, above: 1 } as const;

function compare(left: bigint, right: bigint): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

function commonDivisor(left: bigint, right: bigint): bigint {
  let [a, b] = [left < 0n ? -left : left, right < 0n ? -right : right];
  while (b !== 0n) [a, b] = [b, a % b];
  return a;
}
