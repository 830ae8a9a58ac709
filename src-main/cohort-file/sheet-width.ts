import type { RowTaker } from './row-taker.ts';

/**
 * Rows of a sheet end at their last cell that holds something; this fills them up to the width of the heading, so that
 * only rows with cells beyond it differ from it.
 */
export function evenWidth(taker: RowTaker): RowTaker {
  let width = 0;
  return {
    columns: (names) => {
      width = names.length;
      return taker.columns(names);
    },
    rows: (rows, firstNumber) =>
      taker.rows(
        rows.map((row) => (row.length < width ? [...row, ...new Array<string>(width - row.length).fill('')] : row)),
        firstNumber,
      ),
  };
}
