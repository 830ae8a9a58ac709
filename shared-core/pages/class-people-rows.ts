import type { MissedStatus } from '../class/class-list.ts';
import type { PupilResult } from '../class/class-results.ts';
import type { PrintWords } from '../languages/phrases.ts';
import { inPrintOrder, labelOf, pupilsInOrder, type ClassPrint } from './class-print.ts';
import { pupilColumns } from './class-pupils-table.ts';

/** Why somebody is in the list with or without a result, as files write it. */
export type ListedStatus = 'tested' | MissedStatus | 'left-out' | 'open';

/** Everybody of a list as a table of texts, for files that hold a row for each. */
export interface PeopleRows {
  readonly columns: readonly {
    readonly key: string;
    readonly heading: readonly string[];
    readonly isFigure: boolean;
  }[];
  readonly rows: readonly PeopleRow[];
}

export interface PeopleRow {
  readonly index: number;
  readonly status: ListedStatus;
  /** One text for each column, figures as the table prints them; empty where there is none. */
  readonly texts: readonly string[];
}

/** First those with a result in the order of the report, then the others by the reason. */
export function peopleRows(print: ClassPrint, words: PrintWords): PeopleRows {
  const columns = pupilColumns(print, words);
  const { missed, leftOut, open } = print.results;
  const tested = pupilsInOrder(print).map((pupil): PeopleRow => ({
    index: pupil.index,
    status: 'tested',
    texts: columns.map(({ textOf }) => textOf(pupil)),
  }));
  const without = (status: ListedStatus, listed: readonly Pick<PupilResult, 'index' | 'name' | 'row'>[]): PeopleRow[] =>
    inPrintOrder(print, listed).map((one) => ({
      index: one.index,
      status,
      texts: columns.map(({ key }, place) =>
        place === 0 ? labelOf(print, one) : key === 'group' ? one.row.group : '',
      ),
    }));
  const having = (status: MissedStatus): PeopleRow[] =>
    without(
      status,
      missed.filter((one) => one.status === status),
    );
  return {
    columns: columns.map(({ key, heading, kind }) => ({ key, heading, isFigure: kind === 'figures' })),
    rows: [
      ...tested,
      ...having('absent'),
      ...having('not-tested'),
      ...having('excused'),
      ...without('left-out', leftOut),
      ...without('open', open),
    ],
  };
}
