import { printCount } from '../scores/printed-number.ts';
import type { TextChange } from './edition-compare-choices.ts';
import {
  printsTheSame,
  type CellChange,
  type EditionComparison,
  type EditionName,
  type GroupChange,
  type RowChange,
} from './edition-compare.ts';

/** Longest text that is quoted; of a longer one only that it was rewritten is told. */
const LONGEST_QUOTED = 120;

/** A comparison as plain text: what was compared, how much differs, then every difference on a line of its own. */
export function comparisonText(comparison: EditionComparison): string {
  const { before, after, choices } = comparison;
  const lines = [
    `Old: ${editionInWords(before)}`,
    `New: ${editionInWords(after)}`,
    '',
    differencesInWords(comparison),
    ...(choices.length === 0 ? [] : ['', 'Changed choices', ...choices.map((change) => `  ${changeInWords(change)}`)]),
    ...columnLines(comparison),
    ...comparison.groups.flatMap((group) => ['', ...groupLines(group)]),
  ];
  return lines.map((line) => `${line}\n`).join('');
}

/** "Ostrey Vale reading · Forms A and B, edition 1.0 of 2026-06-15, check 7F3A-91C2" */
export function editionInWords({ title, subtitle, edition, date, check }: EditionName): string {
  const name = [title.trim(), subtitle.trim()].filter((part) => part !== '').join(' · ');
  const numbered = edition.trim() === '' ? 'an edition without a number' : `edition ${edition.trim()}`;
  return [...(name === '' ? [] : [name]), `${numbered}${date === '' ? '' : ` of ${date}`}`, `check ${check}`].join(
    ', ',
  );
}

/** How much differs, in a sentence or two. */
export function differencesInWords(comparison: EditionComparison): string {
  const { counts } = comparison;
  const compared = `${counted(counts.cellsCompared, 'printed cell')} of ${counted(counts.groupsCompared, 'group')} compared.`;
  if (printsTheSame(comparison)) return `No printed cell differs. ${compared}`;
  const parts = [
    ...when(
      counts.rowsChanged,
      `${counted(counts.cellsChanged, 'cell')} in ${counted(counts.rowsChanged, 'row')} changed`,
    ),
    ...when(counts.rowsCame, `${counted(counts.rowsCame, 'row')} came`),
    ...when(counts.rowsWent, `${counted(counts.rowsWent, 'row')} went`),
    ...when(counts.groupsCame, `${counted(counts.groupsCame, 'group')} came`),
    ...when(counts.groupsWent, `${counted(counts.groupsWent, 'group')} went`),
    ...when(counts.columnsCame, `${counted(counts.columnsCame, 'column')} came`),
    ...when(counts.columnsWent, `${counted(counts.columnsWent, 'column')} went`),
    ...when(counts.inverseChanged, `${counted(counts.inverseChanged, 'line')} of inverse tables changed`),
  ];
  return `${parts.join('; ')}. ${compared}`;
}

/** "rounding: halves rounded up → halves rounded to even" */
export function changeInWords({ what, before, after }: TextChange): string {
  const long = [before, after].some((text) => text !== null && (text.length > LONGEST_QUOTED || text.includes('\n')));
  if (before === null) return `${what}: ${long ? 'added' : `none → ${after}`}`;
  if (after === null) return `${what}: ${long ? 'taken out' : `${before} → none`}`;
  return `${what}: ${long ? 'rewritten' : `${before} → ${after}`}`;
}

/** The columns that only one of the editions prints, under a heading; nothing where there are none. */
export function columnLines({ columns }: EditionComparison): readonly string[] {
  if (columns.length === 0) return [];
  const lines = columns.map(({ kind, name }) => `  ${name}: ${kind === 'came' ? 'new' : 'no longer printed'}`);
  return ['', 'Columns', ...lines];
}

/** A group's heading with its differences below; a group that came or went is one line. */
export function groupLines(group: GroupChange): readonly string[] {
  switch (group.kind) {
    case 'came':
      return [`${group.title}: a new table of ${counted(group.rows, 'row')}`];
    case 'went':
      return [`${group.title}: no table any more (it had ${counted(group.rows, 'row')})`];
    case 'changed':
      return [
        group.title,
        ...group.facts.map((fact) => `  ${changeInWords(fact)}`),
        ...group.rows.map((row) => `  ${rowInWords(row)}`),
        ...group.inverse.map((line) => `  ${changeInWords(line)}`),
      ];
  }
}

function rowInWords(row: RowChange): string {
  switch (row.kind) {
    case 'changed':
      return `raw score ${row.scoreText}: ${cellsInWords(row.cells)}`;
    case 'came':
      return `raw score ${row.scoreText}: new row (${row.cells.map(({ name, text }) => `${name} ${text}`).join('; ')})`;
    case 'went':
      return `raw score ${row.scoreText}: row taken out (${row.cells.map(({ name, text }) => `${name} ${text}`).join('; ')})`;
  }
}

/** "percentile rank 24 → 25; stanine 4 → 5" */
export function cellsInWords(cells: readonly CellChange[]): string {
  return cells.map(namedCell).join('; ');
}

/** "stanine 4 → 5" */
export function namedCell({ name, before, after }: CellChange): string {
  return `${name} ${before} → ${after}`;
}

/** "1 row", "2 rows" */
export function counted(count: number, noun: string): string {
  return `${printCount(count)} ${noun}${count === 1 ? '' : 's'}`;
}

function when(count: number, text: string): readonly string[] {
  return count === 0 ? [] : [text];
}
