import { ratio, type ExactRatio } from '../percentile/exact-ratio.ts';
import { printCount, printNumber, printRank, printRatio } from '../scores/printed-number.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import type { ColumnKey } from './column-keys.ts';
import type { ConversionRow } from './conversion-table.ts';
import { derivedWorkings } from './derived-workings.ts';
import { definitionInWords } from './definitions.ts';
import { groupedClass } from './grouped-class.ts';
import { countedPeople } from './norm-groups.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';
import { precisionWorkings } from './precision-workings.ts';

/** How a printed cell came about: a heading and the steps, down to the counts, each a line of text. */
export interface Workings {
  readonly title: string;
  readonly lines: readonly string[];
  /** The text that stands in the table. */
  readonly result: string;
}

/** The workings of one cell of a group's table. Throws when the group has no such row. */
export function workingsOf(
  project: NormProject,
  norms: GroupNorms,
  scoreText: string,
  column: ColumnKey | 'score' | 'rank',
): Workings {
  const row = norms.rows.find((candidate) => candidate.scoreText === scoreText);
  if (row === undefined) throw new RangeError(`no row ${scoreText}`);
  const title = `Raw score ${scoreText}, ${norms.group.title}`;
  const counts = countsLines(project, norms, row);
  switch (column) {
    case 'score':
    case 'count':
      return { title, lines: counts, result: column === 'score' ? scoreText : row.texts.count };
    case 'cumulative':
      return { title, lines: [...counts, togetherLine(norms, row)], result: row.texts.cumulative };
    case 'exact-rank':
      return {
        title,
        lines: [...counts, ...rankLines(project, norms, row), ...smoothedLines(norms, row)],
        result: row.texts['exact-rank'],
      };
    case 'observed-rank':
      return { title, lines: [...counts, ...rankLines(project, norms, row)], result: row.texts['observed-rank'] };
    case 'interval':
    case 'standard-error':
    case 'measurement-band':
    case 'print-range':
      return {
        title,
        lines: [...counts, ...precisionWorkings(project, norms, row, column)],
        result: row.texts[column],
      };
    case 'rank':
      return {
        title,
        lines: [
          ...counts,
          ...rankLines(project, norms, row),
          ...smoothedLines(norms, row),
          roundingLine(project, row),
          ...adjustedLines(row),
        ],
        result: row.printed,
      };
    default:
      return {
        title,
        lines: [
          ...rankLines(project, norms, row),
          ...smoothedLines(norms, row),
          ...derivedWorkings(project, norms, row, column),
        ],
        result: row.texts[column],
      };
  }
}

function countsLines(project: NormProject, { group, summary }: GroupNorms, row: ConversionRow): readonly string[] {
  const { table } = group;
  const worse = table.scale.direction === 'high-is-good' ? 'below' : 'above';
  const { below, at, all } = row.parts;
  if (table.weighted) {
    const weight = (units: bigint): string => exactWeight(table, units);
    return [
      `${countedPeople(row.texts.count, project.people)} of ${printCount(summary.n)} scored ${row.scoreText}.`,
      `By weight, ${weight(below)} lie ${worse} ${row.scoreText} and ${weight(at)} at it, of ${weight(all)}.`,
    ];
  }
  return [
    `${countedPeople(printCount(Number(below)), project.people)} scored ${worse} ${row.scoreText}, ${row.texts.count} scored ${row.scoreText}, of ${printCount(summary.n)}.`,
  ];
}

function togetherLine({ group }: GroupNorms, row: ConversionRow): string {
  const { below, at } = row.parts;
  const [left, right] = [exactWeight(group.table, below), exactWeight(group.table, at)];
  return `Together: ${left} + ${right} = ${exactWeight(group.table, below + at)}. Printed: ${row.texts.cumulative}.`;
}

function rankLines(project: NormProject, { group, summary }: GroupNorms, row: ConversionRow): readonly string[] {
  const { definition } = project.curve;
  const { table } = group;
  const below = exactWeight(table, row.parts.below);
  const at = exactWeight(table, row.parts.at);
  const all = exactWeight(table, row.parts.all);
  const value = printRatio(row.observed.rank, 4);
  const sentence = `Rank: the share scoring ${definitionInWords(definition, table.scale.direction)}.`;
  switch (definition.kind) {
    case 'midpoint':
      return [sentence, `100 × (${below} + ${at}/2) / ${all} = ${value}`];
    case 'at-or-below':
      return [sentence, `100 × (${below} + ${at}) / ${all} = ${value}`];
    case 'below':
      return [sentence, `100 × ${below} / ${all} = ${value}`];
    case 'plotting-position': {
      const meanRank = printRatio(meanRankOf(row, summary.n), table.weighted ? 6 : 1);
      return [
        sentence,
        `Mean rank of those at the score: ${meanRank}${table.weighted ? ', on weights rescaled to add up to n' : ''}.`,
        `100 × (${meanRank} − ${definition.offset}) / (${summary.n} + 1 − 2 × ${definition.offset}) = ${value}`,
      ];
    }
    case 'grouped': {
      const { below: belowClass, inClass, into } = groupedClass(table, row, definition.width);
      const [lower, within] = [exactWeight(table, belowClass), exactWeight(table, inClass)];
      return [sentence, `100 × (${lower} + ${within} × (${into}) / ${definition.width}) / ${all} = ${value}`];
    }
  }
}

/** What smoothing made of the observed rank; nothing where the observed one is printed. */
function smoothedLines({ smoothing }: GroupNorms, { smoothed }: ConversionRow): readonly string[] {
  if (smoothed === null || smoothing.state !== 'smoothed') return [];
  const { standardError } = smoothed;
  const value = printNumber(smoothed.percentileRank, 4);
  return [
    smoothing.curve.statement,
    standardError === null
      ? `Smoothed: ${value}`
      : `Smoothed: ${value}, with a standard error of ${printNumber(standardError, 2)}`,
  ];
}

function meanRankOf({ parts }: ConversionRow, people: number): ExactRatio {
  return ratio((2n * parts.below + parts.at) * BigInt(people) + parts.all, 2n * parts.all);
}

/** A weight sum with all its decimals, so that a reader can do the sum again; a count of people stays whole. */
function exactWeight(table: FrequencyTable, units: bigint): string {
  return printRatio(ratio(units, table.weightUnit), String(table.weightUnit).length - 1);
}

function roundingLine(project: NormProject, row: ConversionRow): string {
  const { decimals, rounding, ends } = project.table;
  const unit = decimals === 0 ? 'whole numbers' : 'one decimal';
  const { text, end } = printRank(row.rank, project.table);
  if (end !== null) {
    const why = end === 'low' ? 'Below the lowest' : 'Above the highest';
    return `${why} rank that is printed${ends === 'held' ? '; held there' : ''}: ${text}.`;
  }
  return `Rounded to ${unit}, ${rounding === 'half-up' ? 'halves up' : 'halves to even'}: ${text}.`;
}

/** What somebody made of the rounded rank; nothing where nobody changed it. */
function adjustedLines({ adjusted, printed }: ConversionRow): readonly string[] {
  if (adjusted === null) return [];
  return [`Adjusted by hand (${adjusted.reason}; ${adjusted.by}), from ${adjusted.from} to ${printed}.`];
}
