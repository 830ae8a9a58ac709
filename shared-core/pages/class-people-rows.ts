import type { MissedStatus } from '../class/class-list.ts';
import type { ClassListRow } from '../class/class-list.ts';
import type { ClassResults } from '../class/class-results.ts';
import type { PrintWords } from '../languages/phrases.ts';
import {
  inPrintOrder,
  labelOf,
  pupilsInOrder,
  type ClassPrint,
  type Listed,
  type PrintedClass,
  type StandingPrint,
} from './class-print.ts';
import { pupilColumns } from './class-pupils-table.ts';
import { standingColumns, standingInOrder } from './class-standing-table.ts';

/** Why somebody is in the list with or without a result, as files write it. */
export type ListedStatus = 'tested' | MissedStatus | 'left-out' | 'open';

/** Everybody of a list as a table of texts, for files that hold a row for each. */
export interface PeopleRows {
  /** The first tells who. */
  readonly columns: readonly PeopleColumn[];
  readonly rows: readonly PeopleRow[];
}

export interface PeopleColumn {
  readonly key: string;
  readonly heading: readonly string[];
  readonly kind: 'words' | 'figures';
}

export interface PeopleRow {
  readonly index: number;
  readonly status: ListedStatus;
  /** Raw-score points; null for those without a result. */
  readonly score: number | null;
  /** One text for each column, figures as `printed-number` writes them; empty where there is none. */
  readonly texts: readonly string[];
}

/** First those with a result in the order of the report, then the others by the reason. */
export function peopleRows(print: ClassPrint, words: PrintWords): PeopleRows {
  const columns = pupilColumns(print, words);
  const tested = pupilsInOrder(print).map((pupil): PeopleRow => {
    return {
      index: pupil.index,
      status: 'tested',
      score: pupil.score,
      texts: columns.map(({ textOf }) => textOf(pupil)),
    };
  });
  return { columns, rows: [...tested, ...withoutResult(print, print.results, columns)] };
}

/** The same of a class without a table. */
export function standingRows(print: StandingPrint, words: PrintWords): PeopleRows {
  const columns = standingColumns(print, words);
  const tested = standingInOrder(print).map((pupil): PeopleRow => {
    return {
      index: pupil.index,
      status: 'tested',
      score: pupil.score,
      texts: columns.map(({ textOf }) => textOf(pupil)),
    };
  });
  return { columns, rows: [...tested, ...withoutResult(print, print.standing, columns)] };
}

function withoutResult(
  print: PrintedClass,
  { missed, leftOut, open }: Pick<ClassResults, 'missed' | 'leftOut' | 'open'>,
  columns: readonly PeopleColumn[],
): readonly PeopleRow[] {
  const rows = (
    status: ListedStatus,
    listed: readonly (Listed & { readonly row: ClassListRow })[],
  ): readonly PeopleRow[] =>
    inPrintOrder(print, listed).map((one) => ({
      index: one.index,
      status,
      score: null,
      texts: columns.map(({ key }, place) =>
        place === 0 ? labelOf(print, one) : key === 'group' ? one.row.group : '',
      ),
    }));
  const having = (status: MissedStatus): readonly PeopleRow[] =>
    rows(
      status,
      missed.filter((one) => one.status === status),
    );
  return [
    ...having('absent'),
    ...having('not-tested'),
    ...having('excused'),
    ...rows('left-out', leftOut),
    ...rows('open', open),
  ];
}
