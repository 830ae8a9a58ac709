import { mapCells, withTotals, type CountRow, type TotalledTable } from '../../../shared-core/class/class-counts.ts';

export interface Range {
  readonly least: number;
  readonly most: number;
}

export const cellsOf = <Cell>(table: TotalledTable<Cell>): readonly Cell[] => {
  const cells: Cell[] = [];
  mapCells(table, (cell) => cells.push(cell));
  return cells;
};

export const row = (standings: readonly number[], statuses: readonly number[] = []): CountRow =>
  Object.freeze({ standings: Object.freeze([...standings]), statuses: Object.freeze([...statuses]) });

/**
 * Every table of counts whose cells, sums among them, lie in the given ranges, by trying all of them: the plain way, which
 * knows nothing of networks. The inner cells must have finite ranges.
 */
export function possibleTables(
  shape: { readonly rows: number; readonly standings: number; readonly statuses: number },
  ranges: readonly Range[],
): readonly (readonly number[])[] {
  const width = shape.standings + shape.statuses + 2;
  const isSum = (cell: number): boolean =>
    cell >= shape.rows * width || [shape.standings, width - 1].includes(cell % width);
  const inner = ranges.flatMap((range, cell) => (isSum(cell) ? [] : [range]));
  const found: (readonly number[])[] = [];
  const counts: number[] = [];
  const isWithin = (cells: readonly number[]): boolean =>
    cells.every((count, cell) => count >= (ranges[cell]?.least ?? 0) && count <= (ranges[cell]?.most ?? 0));
  const rowsOf = (flat: readonly number[]): readonly CountRow[] =>
    Array.from({ length: flat.length / (width - 2) }, (_, index) => {
      const own = flat.slice(index * (width - 2), (index + 1) * (width - 2));
      return { standings: own.slice(0, shape.standings), statuses: own.slice(shape.standings) };
    });
  const visit = (): void => {
    if (counts.length > 0 && counts.length % (width - 2) === 0) {
      const cells = cellsOf(withTotals(rowsOf(counts)));
      const done = counts.length === inner.length ? cells.length : cells.length - width;
      if (!isWithin(cells.slice(0, done))) return;
      if (counts.length === inner.length) {
        found.push(cells);
        return;
      }
    }
    const { least, most } = inner[counts.length] ?? { least: 0, most: 0 };
    for (let count = least; count <= most; count += 1) {
      counts.push(count);
      visit();
      counts.pop();
    }
  };
  visit();
  return found;
}

/** All ways to put so many pupils into so many places. */
export function splits(pupils: number, places: number): readonly (readonly number[])[] {
  if (places === 1) return [[pupils]];
  return Array.from({ length: pupils + 1 }, (_, first) =>
    splits(pupils - first, places - 1).map((rest) => [first, ...rest]),
  ).flat();
}
