import type { ConversionRow } from '../norms/conversion-table.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormProject } from '../norms/norm-project.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { countedRanks } from './counted-ranks.ts';
import { exactText, rankText, stanineText, weightText } from './counted-texts.ts';
import { fractionOfText, plus, times } from './fraction.ts';
import { groupCounts } from './group-counts.ts';

/** A cell on which the two ways of working out a table do not agree. */
export interface EngineDifference {
  /** Title of the group. */
  readonly group: string;
  readonly score: string;
  readonly column: string;
  /** What the norm set prints, and what the second engine makes of the tally; empty where there is no such row. */
  readonly first: string;
  readonly second: string;
}

const COLUMNS = [
  'raw score',
  'percentile rank',
  'rank to two decimals',
  'number',
  'number at or below',
  'stanine',
] as const;

type Cells = Readonly<Record<(typeof COLUMNS)[number], string>>;

/**
 * Works out every unsmoothed table anew from the tally, by sums from the other end and fractions of its own, and tells
 * each cell that a norm set prints otherwise. Smoothed ranks have no second way and are left out; so are stanines from
 * linear z, which no count decides.
 */
export function compareEngines({ project, groups }: NormSet): readonly EngineDifference[] {
  return groups.filter(isCounted).flatMap((norms) => {
    const anew = recounted(project, norms);
    const length = Math.max(anew.length, norms.rows.length);
    return Array.from({ length }, (_, place) => {
      const row = norms.rows[place];
      return differencesIn(norms.group.title, row === undefined ? null : cellsOf(row, project), anew[place] ?? null);
    }).flat();
  });
}

/** Cells that `compareEngines` looks at. */
export function comparedCells({ project, groups }: NormSet): number {
  const columns = project.table.zSource === 'normalised' ? COLUMNS.length : COLUMNS.length - 1;
  return groups.filter(isCounted).reduce((sum, { rows }) => sum + rows.length * columns, 0);
}

/** Whether the ranks of a group follow from counts alone. */
export function isCounted({ smoothing }: GroupNorms): boolean {
  return smoothing.state === 'none';
}

/** The first difference in a sentence that stops a press, or null where the engines agree. */
export function engineProblem(differences: readonly EngineDifference[]): string | null {
  const [first] = differences;
  if (first === undefined) return null;
  const others = differences.length === 1 ? '' : ` ${differences.length - 1} more cells differ.`;
  return (
    `The tables were worked out twice and do not agree: ${first.group}, raw score ${first.score}, ${first.column}: ` +
    `"${first.first}" by the first way, "${first.second}" by the second.${others} Nothing was pressed. ` +
    'This is a fault of the program: keep the project and report it.'
  );
}

function recounted({ tally, groups, curve, table }: NormProject, { group }: GroupNorms): readonly Cells[] {
  if (tally === null) throw new RangeError('a norm set without a tally');
  const { scale } = tally;
  const counts = groupCounts(tally, groups.by, group.values);
  const [lowest, step] = [fractionOfText(String(scale.min)), fractionOfText(String(scale.step))];
  return countedRanks(counts, scale, curve.definition).map(({ rank, worse, at }, place) => {
    const score = plus(lowest, times(step, { top: BigInt(place), bottom: 1n }));
    return {
      'raw score': String(Number(score.top) / Number(score.bottom)),
      'percentile rank': rankText(rank, table),
      'rank to two decimals': exactText(rank),
      number: String(counts.people[place] ?? 0n),
      'number at or below': weightText(worse + at, counts.unit),
      stanine: table.zSource === 'normalised' ? stanineText(rank) : '',
    };
  });
}

function cellsOf({ score, printed, adjusted, count, texts }: ConversionRow, { table }: NormProject): Cells {
  return {
    'raw score': String(score),
    // What was changed by hand is compared as it was computed.
    'percentile rank': adjusted === null ? printed : adjusted.from,
    'rank to two decimals': texts['exact-rank'],
    number: String(count),
    'number at or below': texts.cumulative,
    stanine: table.zSource === 'normalised' ? texts.stanine : '',
  };
}

function differencesIn(group: string, first: Cells | null, second: Cells | null): readonly EngineDifference[] {
  const score = (first ?? second)?.['raw score'] ?? '';
  return COLUMNS.map((column) => ({
    group,
    score,
    column,
    first: first?.[column] ?? '',
    second: second?.[column] ?? '',
  })).filter((cell) => cell.first !== cell.second);
}
