/** How many pupils of one group, or of the whole class where it is not divided. */
export interface CountRow {
  /** Tested pupils by where they stand, for example in the quarters of the norm group. */
  readonly standings: readonly number[];
  /** Pupils without a score, for example absent, not tested, excused. */
  readonly statuses: readonly number[];
}

/** One row of a table of counts, or of what is told of them. */
export interface TotalledRow<Cell> {
  readonly standings: readonly Cell[];
  /** Sum of the standings. */
  readonly tested: Cell;
  readonly statuses: readonly Cell[];
  /** Tested and all statuses. */
  readonly total: Cell;
}

export interface TotalledTable<Cell> {
  readonly rows: readonly TotalledRow<Cell>[];
  /** Sums of the rows. */
  readonly together: TotalledRow<Cell>;
}

/** Where a cell stands: `row` is null in the row of sums; `column` counts the standings, or the statuses, from 0. */
export interface CellPlace {
  readonly row: number | null;
  readonly kind: 'standing' | 'tested' | 'status' | 'total';
  readonly column: number;
}

/**
 * The counts with all their sums. There is at least one row and one standing, every row has as many standings and
 * statuses as the first, and every count is a whole number of 0 or more; anything else throws a RangeError.
 */
export function withTotals(rows: readonly CountRow[]): TotalledTable<number> {
  const [first] = rows;
  if (first === undefined || first.standings.length === 0) throw new RangeError('a table has a row and a standing');
  for (const { standings, statuses } of rows) {
    if (standings.length !== first.standings.length || statuses.length !== first.statuses.length) {
      throw new RangeError('all rows of a table have the same columns');
    }
    if (![...standings, ...statuses].every((count) => Number.isSafeInteger(count) && count >= 0)) {
      throw new RangeError('a count is a whole number of 0 or more');
    }
  }
  return { rows: rows.map(totalled), together: totalled(rowTogether(rows)) };
}

/** The class undivided: the sums of the rows as one row. */
export function rowTogether(rows: readonly CountRow[]): CountRow {
  const sums = (of: (row: CountRow) => readonly number[]): readonly number[] =>
    (rows[0] === undefined ? [] : of(rows[0])).map((_, column) => sumOf(rows.map((row) => of(row)[column] ?? 0)));
  return { standings: sums(({ standings }) => standings), statuses: sums(({ statuses }) => statuses) };
}

function totalled({ standings, statuses }: CountRow): TotalledRow<number> {
  const tested = sumOf(standings);
  return { standings, tested, statuses, total: tested + sumOf(statuses) };
}

function sumOf(counts: readonly number[]): number {
  return counts.reduce((sum, count) => sum + count, 0);
}

/** A table of the same shape, made cell by cell: row by row, the row of sums last, each from left to right. */
export function mapCells<From, To>(
  table: TotalledTable<From>,
  to: (cell: From, place: CellPlace) => To,
): TotalledTable<To> {
  const mapRow = (cells: TotalledRow<From>, row: number | null): TotalledRow<To> => ({
    standings: cells.standings.map((cell, column) => to(cell, { row, kind: 'standing', column })),
    tested: to(cells.tested, { row, kind: 'tested', column: 0 }),
    statuses: cells.statuses.map((cell, column) => to(cell, { row, kind: 'status', column })),
    total: to(cells.total, { row, kind: 'total', column: 0 }),
  });
  return { rows: table.rows.map((cells, row) => mapRow(cells, row)), together: mapRow(table.together, null) };
}
