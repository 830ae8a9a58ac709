import type { CohortSource } from '../../shared-core/norms/norm-project.ts';
import { leftOutInWords } from '../../shared-core/norms/reading.ts';

const ROWS_NAMED = 10;

/** The exclusion flow in lines of text: nothing where every row was kept. */
export function leftOutLines({ rowsRead, rowsKept, leftOut }: CohortSource): readonly string[] {
  if (rowsRead === rowsKept) return [];
  return [
    `${rowsRead} rows read, ${rowsKept} kept, ${rowsRead - rowsKept} left out:`,
    ...leftOut.map(({ rule, count, rows }) => {
      const named = rows.slice(0, ROWS_NAMED).join(', ');
      const where = count === 1 ? `row ${named}` : `rows ${named}${count > ROWS_NAMED ? ' …' : ''}`;
      return `  ${count}: ${leftOutInWords(rule)} (${where})`;
    }),
  ];
}
