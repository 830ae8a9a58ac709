import { ratio } from '../percentile/exact-ratio.ts';
import { scoresPerClass } from '../percentile/percentile-rank.ts';
import { printCount, printNumber, printRatio, printWeight } from '../scores/printed-number.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import type { ColumnKey } from './column-keys.ts';
import type { ConversionRow } from './conversion-table.ts';
import { definitionInWords } from './definitions.ts';
import { countedPeople } from './norm-groups.ts';
import type { GroupNorms } from './norm-set.ts';
import type { NormProject } from './norm-project.ts';
import { columnOf } from './table-columns.ts';

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
      return { title, lines: [...counts, `Together: ${row.texts.cumulative}.`], result: row.texts.cumulative };
    case 'exact-rank':
      return { title, lines: [...counts, ...rankLines(project, norms, row)], result: row.texts['exact-rank'] };
    case 'rank':
      return {
        title,
        lines: [...counts, ...rankLines(project, norms, row), roundingLine(project, row)],
        result: row.printed,
      };
    default:
      return {
        title,
        lines: [...rankLines(project, norms, row), ...derivedLines(project, norms, row, column)],
        result: row.texts[column],
      };
  }
}

function countsLines(project: NormProject, { group, summary }: GroupNorms, row: ConversionRow): readonly string[] {
  const { table } = group;
  const worse = table.scale.direction === 'high-is-good' ? 'below' : 'above';
  const weight = (units: bigint): string => printWeight(units, table.weightUnit);
  const { below, at, all } = row.parts;
  if (table.weighted) {
    return [
      `${countedPeople(row.texts.count, project.people)} of ${printCount(summary.n)} scored ${row.scoreText}.`,
      `By weight, ${weight(below)} lie ${worse} ${row.scoreText} and ${weight(at)} at it, of ${weight(all)}.`,
    ];
  }
  return [
    `${countedPeople(printCount(Number(below)), project.people)} scored ${worse} ${row.scoreText}, ${row.texts.count} scored ${row.scoreText}, of ${printCount(summary.n)}.`,
  ];
}

function rankLines(project: NormProject, { group, summary }: GroupNorms, row: ConversionRow): readonly string[] {
  const { definition } = project.curve;
  const { table } = group;
  const weight = (units: bigint): string => printWeight(units, table.weightUnit);
  const below = weight(row.parts.below);
  const at = weight(row.parts.at);
  const all = weight(row.parts.all);
  const value = printRatio(row.rank, 4);
  const sentence = `Rank: the share scoring ${definitionInWords(definition, table.scale.direction)}.`;
  switch (definition.kind) {
    case 'midpoint':
      return [sentence, `100 × (${below} + ${at}/2) / ${all} = ${value}`];
    case 'at-or-below':
      return [sentence, `100 × (${below} + ${at}) / ${all} = ${value}`];
    case 'below':
      return [sentence, `100 × ${below} / ${all} = ${value}`];
    case 'plotting-position': {
      const n = BigInt(summary.n);
      const meanRank = ratio((2n * row.parts.below + row.parts.at) * n + row.parts.all, 2n * row.parts.all);
      return [
        sentence,
        `Mean rank of those at the score: ${printRatio(meanRank, table.weighted ? 4 : 1)}${table.weighted ? ', on weights rescaled to add up to n' : ''}.`,
        `100 × (${printRatio(meanRank, table.weighted ? 4 : 1)} − ${definition.offset}) / (${summary.n} + 1 − 2 × ${definition.offset}) = ${value}`,
      ];
    }
    case 'grouped':
      return [sentence, groupedLine(table, row, definition.width, value)];
  }
}

function groupedLine(table: FrequencyTable, row: ConversionRow, width: number, value: string): string {
  const perClass = scoresPerClass(table.scale, width) ?? 1;
  const good = table.scale.direction === 'high-is-good';
  const weights = good ? table.weights : table.weights.toReversed();
  const fromEnd = Math.round(Math.abs(row.score - (good ? table.scale.min : table.scale.max)) / table.scale.step);
  const start = Math.floor(fromEnd / perClass) * perClass;
  const sum = (values: readonly bigint[]): string =>
    printWeight(values.reduce((total, weight) => total + weight, 0n), table.weightUnit);
  const half = table.scale.step / 2;
  const limit = good
    ? table.scale.min + start * table.scale.step - half
    : table.scale.max - start * table.scale.step + half;
  const into = good ? `${row.scoreText} − ${limit}` : `${limit} − ${row.scoreText}`;
  const all = printWeight(row.parts.all, table.weightUnit);
  const inClass = sum(weights.slice(start, start + perClass));
  return `100 × (${sum(weights.slice(0, start))} + ${inClass} × (${into}) / ${width}) / ${all} = ${value}`;
}

function roundingLine(project: NormProject, row: ConversionRow): string {
  const { decimals, rounding, ends } = project.table;
  const unit = decimals === 0 ? 'whole numbers' : 'one decimal';
  if (row.provenance.printed.end !== null) {
    const why = row.provenance.printed.end === 'low' ? 'Below the lowest' : 'Above the highest';
    return `${why} rank that is printed${ends === 'held' ? '; held there' : ''}: ${row.printed}.`;
  }
  return `Rounded to ${unit}, ${rounding === 'half-up' ? 'halves up' : 'halves to even'}: ${row.printed}.`;
}

function derivedLines(
  project: NormProject,
  { summary }: GroupNorms,
  row: ConversionRow,
  column: Exclude<ColumnKey, 'count' | 'cumulative' | 'exact-rank'>,
): readonly string[] {
  const { zSource } = project.table;
  const formula = columnOf(column, project).explanation;
  if (column === 'stanine' && zSource === 'normalised') {
    return ['Stanines begin at ranks 4, 11, 23, 40, 60, 77, 89 and 96; a rank on a cut goes up.', `Stanine ${row.texts.stanine}.`];
  }
  const z = row.derived.z;
  const lines: string[] = [];
  if (z !== null) {
    lines.push(
      zSource === 'linear'
        ? `z = (${row.scoreText} − ${printNumber(summary.mean, 4)}) / ${printNumber(summary.sd ?? 0, 4)} = ${printNumber(z, 4)}`
        : `z is the normal deviate of the rank: ${printNumber(z, 4)}.`,
    );
  }
  switch (row.provenance.derived) {
    case 'half-person':
      lines.push(`A rank of 0 or 100 has no finite z; half a person of ${printCount(summary.n)} stands in for it.`);
      break;
    case 'held-at-limit':
      lines.push(`${z === null ? 'A rank of 0 or 100 has no finite z. ' : ''}Printed scores are held between z = −3 and 3.`);
      break;
    case 'none':
      lines.push('All scores are equal, so there is no z.');
      break;
    default:
  }
  return [...lines, `${formula} Printed: ${row.texts[column]}.`];
}
