import type { Cell } from 'exceljs';
import { ADJUSTED_MARK } from '../../../shared-core/norms/adjustment-words.ts';
import { shownNumber } from './shown-number.ts';

/** Whether a printed text is a number that a workbook must hold as one: "12", "−0.5", "4 812", also with the mark of an adjusted rank. */
export function isPrintedNumber(text: string): boolean {
  return /^−?\d+(\u202f\d{3})*(\.\d+)?$/.test(text.endsWith(ADJUSTED_MARK) ? text.slice(0, -1) : text);
}

/** What a spreadsheet program shows of a cell; of a formula, the result that is stored beside it. */
export function shownCell(cell: Cell): string {
  const { value } = cell;
  const content = typeof value === 'object' && value !== null && 'result' in value ? value.result : value;
  if (typeof content === 'string') return content;
  if (typeof content !== 'number') return content === null || content === undefined ? '' : JSON.stringify(content);
  const format = cell.numFmt;
  if (typeof format !== 'string' || format === '' || format === 'General') return String(content);
  return shownNumber(content, format) ?? `${content} in the format ${format}`;
}
