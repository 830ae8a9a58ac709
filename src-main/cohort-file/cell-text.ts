import type { DecimalMark } from '../../shared-core/scale/decimal.ts';

/** How a workbook counts days and how its numbers are to be written. */
export interface CellStyleFacts {
  readonly mark: DecimalMark;
  /** True when day 0 is 1904-01-01, as in workbooks of old Macintosh programs. */
  readonly from1904: boolean;
}

/** A number as the shortest text that stands for it, with the decimal mark of the reading. */
export function numberText(value: number, mark: DecimalMark): string {
  const text = String(value);
  return mark === ',' ? text.replace('.', ',') : text;
}

export function booleanText(value: boolean): string {
  return value ? 'TRUE' : 'FALSE';
}

const DAY = 86_400_000;

/**
 * A day number of a spreadsheet as ISO text: yyyy-mm-dd, with Thh:mm:ss where there is a time of day, or hh:mm:ss alone
 * below day 1. Spreadsheets that count from 1900 have a 29 February 1900 as day 60.
 */
export function dateText(serial: number, { from1904 }: CellStyleFacts): string {
  const seconds = Math.round((serial % 1) * 86_400);
  const time = new Date(seconds * 1000).toISOString().slice(11, 19);
  if (serial >= 0 && serial < 1) return time;
  const day = Math.floor(serial) + (seconds === 86_400 ? 1 : 0);
  const since1970 = from1904 ? day - 24_107 : day - 25_569 + (day < 60 ? 1 : 0);
  const date = new Date(since1970 * DAY);
  if (Number.isNaN(date.getTime())) return String(serial);
  const iso = date.toISOString().slice(0, 10);
  return seconds === 0 || seconds === 86_400 ? iso : `${iso}T${time}`;
}

/** Numbers of the formats for dates and times that workbooks know without writing them out. */
export function isBuiltInDateFormat(id: number): boolean {
  return (id >= 14 && id <= 22) || (id >= 27 && id <= 36) || (id >= 45 && id <= 47) || (id >= 50 && id <= 58);
}

/** True for a number format that shows a date or a time, such as yyyy-mm-dd or [h]:mm. */
export function isDateFormat(code: string): boolean {
  if (/^general$/i.test(code)) return false;
  const bare = code.replace(/"[^"]*"|\\.|_.|\*./g, '').replace(/\[(?!h+\]|m+\]|s+\])[^\]]*\]/gi, '');
  return /[ymdhs]/i.test(bare.split(';')[0] ?? '');
}
