import { markedRank } from './adjustment-words.ts';
import type { ColumnKey } from './column-keys.ts';
import type { ConversionRow } from './conversion-table.ts';
import { changedChoices, type TextChange } from './edition-compare-choices.ts';
import { changedFacts } from './edition-compare-facts.ts';
import { pairedGroups } from './edition-compare-pairs.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormSet } from './norm-set.ts';
import { columnOf, rankColumn } from './table-columns.ts';

export type PrintedColumnKey = 'rank' | ColumnKey;

/** One printed cell whose text differs. */
export interface CellChange {
  readonly column: PrintedColumnKey;
  /** "percentile rank", "stanine". */
  readonly name: string;
  readonly before: string;
  readonly after: string;
}

export interface PrintedCell {
  readonly column: PrintedColumnKey;
  readonly name: string;
  readonly text: string;
}

/** A row in which a cell differs, or that only one of the editions has; scores are raw-score points. */
export type RowChange =
  | {
      readonly kind: 'changed';
      readonly score: number;
      readonly scoreText: string;
      readonly cells: readonly CellChange[];
    }
  | {
      readonly kind: 'came' | 'went';
      readonly score: number;
      readonly scoreText: string;
      readonly cells: readonly PrintedCell[];
    };

/** A group that differs, or that only one of the editions prints. */
export type GroupChange =
  | {
      readonly kind: 'changed';
      readonly title: string;
      /** Title, n and the other descriptive facts as they are printed. */
      readonly facts: readonly TextChange[];
      /** Lowest score first. */
      readonly rows: readonly RowChange[];
      /** Lines of the inverse table, where both editions print one. */
      readonly inverse: readonly TextChange[];
    }
  | { readonly kind: 'came' | 'went'; readonly title: string; readonly rows: number };

/** What names an edition in print. */
export interface EditionName {
  readonly title: string;
  readonly subtitle: string;
  readonly edition: string;
  /** yyyy-mm-dd, or empty. */
  readonly date: string;
  readonly check: string;
}

export interface ComparisonCounts {
  /** Groups that both editions print. */
  readonly groupsCompared: number;
  readonly groupsWithChangedRows: number;
  readonly groupsCame: number;
  readonly groupsWent: number;
  /** Rows of groups that both editions print, by score. */
  readonly rowsCompared: number;
  readonly rowsChanged: number;
  readonly rowsCame: number;
  readonly rowsWent: number;
  readonly cellsCompared: number;
  readonly cellsChanged: number;
  readonly inverseChanged: number;
  readonly columnsCame: number;
  readonly columnsWent: number;
}

export interface EditionComparison {
  readonly before: EditionName;
  readonly after: EditionName;
  readonly choices: readonly TextChange[];
  /** Columns that only one of the editions prints. */
  readonly columns: readonly { readonly kind: 'came' | 'went'; readonly column: ColumnKey; readonly name: string }[];
  /** Only groups in which something differs: first those of the earlier edition in its order, then those that came. */
  readonly groups: readonly GroupChange[];
  readonly counts: ComparisonCounts;
}

/**
 * Everything printed in which two sets differ. Groups are matched as in `pairedGroups`, rows by score, cells by column.
 * Texts are compared as printed; nothing is computed anew.
 */
export function compareEditions(before: NormSet, after: NormSet): EditionComparison {
  const pairs = pairedGroups(before, after);
  const columns = comparedColumns(before, after);
  const compared = pairs.both.map((pair) => comparedPair(pair, columns, before, after));
  const changed = compared.flatMap(({ change }) => (change === null ? [] : [change]));
  const went = pairs.went.map((norms) => lonelyGroup('went', norms));
  const came = pairs.came.map((norms) => lonelyGroup('came', norms));
  const rows = changed.flatMap((group) => group.rows);
  const rowsOf = (kind: RowChange['kind']): number => rows.filter((row) => row.kind === kind).length;
  const rowsCompared = compared.reduce((sum, pair) => sum + pair.rowsCompared, 0);
  const oneSided = columnsOfOne(before, after);
  return {
    before: editionName(before),
    after: editionName(after),
    choices: changedChoices(before.project, after.project),
    columns: oneSided,
    groups: [
      ...inOrderOf(before, [...compared, ...pairs.went.map((norms, i) => ({ norms, change: went[i] ?? null }))]),
      ...came,
    ],
    counts: {
      groupsCompared: compared.length,
      groupsWithChangedRows: changed.filter((group) => group.rows.length > 0).length,
      groupsCame: came.length,
      groupsWent: went.length,
      rowsCompared,
      rowsChanged: rowsOf('changed'),
      rowsCame: rowsOf('came'),
      rowsWent: rowsOf('went'),
      cellsCompared: rowsCompared * columns.length,
      cellsChanged: rows.reduce((sum, row) => sum + (row.kind === 'changed' ? row.cells.length : 0), 0),
      inverseChanged: changed.reduce((sum, group) => sum + group.inverse.length, 0),
      columnsCame: oneSided.filter(({ kind }) => kind === 'came').length,
      columnsWent: oneSided.filter(({ kind }) => kind === 'went').length,
    },
  };
}

/** Whether both editions print the same groups, rows, columns and cells, whatever else differs. */
export function printsTheSame({ counts }: EditionComparison): boolean {
  const { groupsCame, groupsWent, columnsCame, columnsWent } = counts;
  const { rowsChanged, rowsCame, rowsWent, inverseChanged } = counts;
  const differences = [groupsCame, groupsWent, columnsCame, columnsWent, rowsChanged, rowsCame, rowsWent];
  return [...differences, inverseChanged].every((count) => count === 0);
}

/** The columns in which the text of a row differs, in the order given. */
export function changedCells(
  before: ConversionRow,
  after: ConversionRow,
  columns: readonly Pick<PrintedCell, 'column' | 'name'>[],
): readonly CellChange[] {
  return columns
    .map((column) => ({ ...column, before: textIn(before, column.column), after: textIn(after, column.column) }))
    .filter((cell) => cell.before !== cell.after);
}

/** The percentile rank and the columns that both editions print, in the order of the earlier one. */
export function comparedColumns(before: NormSet, after: NormSet): readonly Pick<PrintedCell, 'column' | 'name'>[] {
  const shared = chosenColumns(before).filter((key) => after.project.table.columns.includes(key));
  return [
    { column: 'rank', name: rankColumn().name },
    ...shared.map((column) => ({ column, name: columnOf(column, after.project).name })),
  ];
}

function columnsOfOne(before: NormSet, after: NormSet): EditionComparison['columns'] {
  const only = (one: NormSet, other: NormSet, kind: 'came' | 'went') =>
    chosenColumns(one)
      .filter((key) => !other.project.table.columns.includes(key))
      .map((column) => ({ kind, column, name: columnOf(column, one.project).name }));
  return [...only(before, after, 'went'), ...only(after, before, 'came')];
}

function chosenColumns({ project }: NormSet): readonly ColumnKey[] {
  return [...new Set(project.table.columns)];
}

interface ComparedPair {
  readonly norms: GroupNorms;
  readonly change: Extract<GroupChange, { readonly kind: 'changed' }> | null;
  readonly rowsCompared: number;
}

function comparedPair(
  { before, after }: { readonly before: GroupNorms; readonly after: GroupNorms },
  columns: readonly Pick<PrintedCell, 'column' | 'name'>[],
  beforeSet: NormSet,
  afterSet: NormSet,
): ComparedPair {
  const later = new Map(after.rows.map((row) => [row.score, row]));
  const earlier = new Set(before.rows.map(({ score }) => score));
  const rows = [
    ...before.rows.flatMap((row): readonly RowChange[] => {
      const counterpart = later.get(row.score);
      if (counterpart === undefined) return [lonelyRow('went', row, beforeSet)];
      const cells = changedCells(row, counterpart, columns);
      return cells.length === 0 ? [] : [{ kind: 'changed', score: row.score, scoreText: row.scoreText, cells }];
    }),
    ...after.rows.filter(({ score }) => !earlier.has(score)).map((row) => lonelyRow('came', row, afterSet)),
  ].toSorted((left, right) => left.score - right.score);
  const facts = changedFacts(before, after);
  const inverse =
    beforeSet.project.sheet.inverse && afterSet.project.sheet.inverse ? changedInverse(before, after) : [];
  const same = rows.length + facts.length + inverse.length === 0;
  return {
    norms: before,
    change: same ? null : { kind: 'changed', title: after.group.title, facts, rows, inverse },
    rowsCompared: before.rows.filter(({ score }) => later.has(score)).length,
  };
}

function changedInverse(before: GroupNorms, after: GroupNorms): readonly TextChange[] {
  const later = new Map(after.inverse.map((row) => [row.percentile, row.scoreText]));
  return before.inverse
    .map(({ percentile, scoreText }) => ({
      what: `score that reaches percentile ${percentile}`,
      before: scoreText,
      after: later.get(percentile) ?? null,
    }))
    .filter((line) => line.before !== line.after);
}

function lonelyRow(kind: 'came' | 'went', row: ConversionRow, set: NormSet): RowChange {
  const cells = comparedColumns(set, set).map((column) => ({ ...column, text: textIn(row, column.column) }));
  return { kind, score: row.score, scoreText: row.scoreText, cells };
}

function lonelyGroup(kind: 'came' | 'went', { group, rows }: GroupNorms): GroupChange {
  return { kind, title: group.title, rows: rows.length };
}

/** Changes of groups of one set, in its print order. */
function inOrderOf(
  set: NormSet,
  known: readonly { readonly norms: GroupNorms; readonly change: GroupChange | null }[],
): readonly GroupChange[] {
  const changes = new Map(known.map(({ norms, change }) => [norms, change]));
  return set.groups.flatMap((norms) => changes.get(norms) ?? []);
}

/** As it stands in print: a rank adjusted by hand carries its mark. */
function textIn(row: ConversionRow, column: PrintedColumnKey): string {
  return column === 'rank' ? markedRank(row) : row.texts[column];
}

function editionName({ project, check }: NormSet): EditionName {
  const { title, subtitle, release } = project;
  return { title, subtitle, edition: release.edition, date: release.date, check };
}
