import { COHORT_FINGERPRINT, LAYOUT_NAMES, type TextChange } from './edition-compare-choices.ts';
import { changeInWords, counted, namedCell } from './edition-compare-words.ts';
import type { EditionComparison, GroupChange, RowChange } from './edition-compare.ts';

/** How many changed rows a change list names; the others are counted. */
const ROWS_OF_A_GROUP = 12;
const ROWS_IN_ALL = 120;

/** Facts of a group that a change list tells beside its rows; mean, SD and the like follow from them. */
const TOLD_FACTS: ReadonlySet<string> = new Set(['title', 'n', 'smoothing']);

/**
 * What changed since an earlier edition, as sentences for print: choices other than those of the layout, columns, tables that came or went, then for each
 * changed table how many rows changed and which, the first of them by name.
 */
export function changeLines({ choices, columns, groups }: EditionComparison): readonly string[] {
  let left = ROWS_IN_ALL;
  const lines = [
    ...choices.filter(({ what }) => !LAYOUT_NAMES.has(what)).map(choiceLine),
    ...columns.map(({ kind, name }) =>
      kind === 'came' ? `New column: ${name}.` : `Column no longer printed: ${name}.`,
    ),
    ...groups.flatMap((group) => {
      const named = Math.min(left, ROWS_OF_A_GROUP);
      if (group.kind === 'changed') left -= Math.min(named, group.rows.length);
      return linesOf(group, named);
    }),
  ];
  return lines.length === 0 ? ['Nothing that is printed changed.'] : lines;
}

/** Nobody reads two fingerprints off a page. */
function choiceLine(change: TextChange): string {
  if (change.what === COHORT_FINGERPRINT) return 'The tables are made from another cohort file.';
  const text = changeInWords(change);
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

function linesOf(group: GroupChange, named: number): readonly string[] {
  const { title } = group;
  switch (group.kind) {
    case 'came':
      return [`New table: ${title}, ${counted(group.rows, 'row')}.`];
    case 'went':
      return [`Table no longer printed: ${title}.`];
    case 'changed': {
      const { facts, rows, inverse } = group;
      const others = rows.length - named;
      return [
        ...facts.filter(({ what }) => TOLD_FACTS.has(what)).map((fact) => `${title}, ${changeInWords(fact)}.`),
        ...(rows.length === 0 ? [] : [`${title}: ${counted(rows.length, 'row')} changed.`]),
        ...rows.slice(0, named).map((row) => `${title}, raw score ${row.scoreText}: ${rowChange(row)}.`),
        ...(others > 0 && named > 0 ? [`${title}: and ${counted(others, 'row')} more.`] : []),
        ...(inverse.length === 0 ? [] : [`${title}: ${counted(inverse.length, 'line')} of the inverse table changed.`]),
      ];
    }
  }
}

/** "13 → 14, stanine 3 → 4": the percentile rank goes without its name. */
function rowChange(row: RowChange): string {
  switch (row.kind) {
    case 'changed':
      return row.cells
        .map((cell) => (cell.column === 'rank' ? `${cell.before} → ${cell.after}` : namedCell(cell)))
        .join(', ');
    case 'came':
      return 'new row';
    case 'went':
      return 'row taken out';
  }
}
