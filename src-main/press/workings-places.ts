import type { FactKey, WorkingsKey, WorkingsPlan } from './workings-plan.ts';

/** Where the cells of a sheet of workings stand, as formulas name them. */
export interface WorkingsPlaces {
  /** Row of the facts' values, of the heads, and of the first score; counted from 1. */
  readonly factRow: number;
  readonly headRow: number;
  readonly firstRow: number;
  /** Column of a key, counted from 1; throws on one that the sheet does not have. */
  readonly columnOf: (key: WorkingsKey) => number;
  readonly factColumnOf: (fact: FactKey) => number;
  /** "C12": the cell of a column in the row of the so manieth score, the lowest 0. */
  readonly cell: (key: WorkingsKey, position: number) => string;
  /** "B$10:B$50": all scores from one position to another. */
  readonly span: (key: WorkingsKey, from: number, to: number) => string;
  /** "$D$6" */
  readonly fact: (key: FactKey) => string;
}

/** Columns at the left of the facts that the count of agreeing rows takes. */
export const AGREEMENT_COLUMNS = 3;

/** Places on a sheet whose table of facts has its values in a row. Between facts and heads stands an empty row. */
export function workingsPlaces({ keys, facts }: WorkingsPlan, factRow: number): WorkingsPlaces {
  const headRow = factRow + 2;
  const firstRow = headRow + 2;
  const columnOf = (key: WorkingsKey): number => placeIn(keys, key) + 1;
  const factColumnOf = (fact: FactKey): number => placeIn(facts, fact) + 1 + AGREEMENT_COLUMNS;
  return {
    factRow,
    headRow,
    firstRow,
    columnOf,
    factColumnOf,
    cell: (key, position) => `${columnLetter(columnOf(key))}${firstRow + position}`,
    span: (key, from, to) => {
      const letter = columnLetter(columnOf(key));
      return `${letter}$${firstRow + from}:${letter}$${firstRow + to}`;
    },
    fact: (key) => `$${columnLetter(factColumnOf(key))}$${factRow}`,
  };
}

function placeIn<Key>(keys: readonly Key[], key: Key): number {
  const place = keys.indexOf(key);
  if (place < 0) throw new RangeError(`no cell for ${String(key)}`);
  return place;
}

/** "A" for 1; sheets here have fewer columns than letters. */
export function columnLetter(column: number): string {
  if (!(column >= 1 && column <= 26)) throw new RangeError(`no letter for column ${column}`);
  return String.fromCharCode(64 + column);
}
