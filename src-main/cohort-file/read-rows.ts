import type { Reply } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { readDelimited } from './delimited-rows.ts';
import type { KnownFile } from './file-kind.ts';
import type { PassEnd, ReadHooks, RowTaker } from './row-taker.ts';

/**
 * One pass over a cohort file of any kind, from its first row until the taker stops or the file ends. What reads
 * workbooks is loaded when the first workbook comes.
 */
export async function readRows(
  known: KnownFile,
  reading: Reading,
  taker: RowTaker,
  hooks: ReadHooks,
): Promise<PassEnd> {
  switch (known.kind) {
    case 'text':
      return readDelimited(known, reading, taker, hooks);
    case 'xlsx':
      return (await import('./workbook-rows.ts')).readXlsx(known, reading, taker, hooks);
    case 'whole-workbook':
      return (await import('./whole-workbook-rows.ts')).readWholeWorkbook(known, reading, taker, hooks);
  }
}

/** Names of the sheets of a workbook; none for a text. */
export async function sheetsOf(known: KnownFile): Promise<Reply<readonly string[]>> {
  switch (known.kind) {
    case 'text':
      return { ok: true, value: [] };
    case 'xlsx':
      return (await import('./workbook-rows.ts')).xlsxSheets(known);
    case 'whole-workbook':
      return (await import('./whole-workbook-rows.ts')).wholeWorkbookSheets(known);
  }
}
