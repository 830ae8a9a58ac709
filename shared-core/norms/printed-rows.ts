import type { ConversionRow } from './conversion-table.ts';
import { cutStarts } from './cuts.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';

/** A row of a conversion table as it is printed. */
export interface PrintedRow {
  /** The scores that it stands for, at least one, lowest first: neighbours on the scale that print alike. */
  readonly rows: readonly ConversionRow[];
  /** "23", or "23–25". */
  readonly scoreText: string;
  /** What all of them print beside the score. */
  readonly shown: ConversionRow;
}

type RowChoices = Pick<NormProject, 'cuts' | 'table' | 'sheet'>;

/**
 * The rows of a group's table, lowest first. Each attainable score stands for itself; with `sheet.rangeRows`, neighbours
 * stand in one row where rank and every chosen column print alike, both are as computed or adjusted by hand in the same
 * way, and no cut lies between them. A count is a text like others: scores with different counts stay apart.
 */
export function printedRows(project: RowChoices, norms: GroupNorms): readonly PrintedRow[] {
  const { group, rows } = norms;
  const starts = cutStarts(project, group.key, group.table.scale);
  return runsOf(rows, (before, row, position) => {
    return project.sheet.rangeRows && !starts.has(position) && printAlike(project, before, row);
  }).map(printedRow);
}

/** Scores of the rows that a cut parts though they print alike, as pairs of texts: the row below the cut, and above it. */
export function partedByCuts(project: RowChoices, { group, rows }: GroupNorms): readonly (readonly [string, string])[] {
  const starts = cutStarts(project, group.key, group.table.scale);
  const alike = runsOf(rows, (before, row) => printAlike(project, before, row));
  let position = 0;
  return alike.flatMap((run) => {
    const first = position;
    position += run.length;
    const inside = [...starts].filter((start) => start > first && start < first + run.length);
    const ends = [first, ...inside.sort((left, right) => left - right), first + run.length];
    const parts = ends.slice(1).map((end, index) => textOf(rows.slice(ends[index], end)));
    return parts.slice(1).map((part, index) => [parts[index] ?? '', part] as const);
  });
}

function printedRow(rows: readonly ConversionRow[]): PrintedRow {
  const [shown] = rows;
  if (shown === undefined) throw new RangeError('a row without a score');
  return { rows, shown, scoreText: textOf(rows) };
}

function textOf(rows: readonly ConversionRow[]): string {
  const [first, last] = [rows[0]?.scoreText ?? '', rows.at(-1)?.scoreText ?? ''];
  return rows.length === 1 ? first : `${first}\u2013${last}`;
}

function runsOf(
  rows: readonly ConversionRow[],
  goesOn: (before: ConversionRow, row: ConversionRow, position: number) => boolean,
): readonly (readonly ConversionRow[])[] {
  const runs: ConversionRow[][] = [];
  rows.forEach((row, position) => {
    const before = rows[position - 1];
    if (before !== undefined && goesOn(before, row, position)) runs.at(-1)?.push(row);
    else runs.push([row]);
  });
  return runs;
}

function printAlike({ table }: RowChoices, left: ConversionRow, right: ConversionRow): boolean {
  return (
    left.printed === right.printed &&
    table.columns.every((key) => left.texts[key] === right.texts[key]) &&
    left.adjusted?.from === right.adjusted?.from &&
    left.adjusted?.reason === right.adjusted?.reason &&
    left.adjusted?.by === right.adjusted?.by
  );
}
