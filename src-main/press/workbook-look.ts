import type { Cell, Worksheet } from 'exceljs';
import type { TypedCell } from './typed-cell.ts';

const INK = { argb: 'FF1E2326' };
const QUIET = { argb: 'FF5B6166' };
const FINE = { style: 'thin', color: { argb: 'FFD8D3C7' } } as const;
const STRONG = { style: 'thin', color: INK } as const;

const BODY = { name: 'Calibri', family: 2, size: 11, color: INK } as const;

const TITLE_SIZE = 15;
const TITLE_HEIGHT = 21;
/** Width of a title's letters, in those of the usual type. */
const TITLE_LETTER = 1.5;

export function asBold(cell: Cell): void {
  cell.font = { ...BODY, bold: true };
}

/** The name of a column as it begins a line; letters that stand for quantities stay as they are. */
export function asLabel(name: string): string {
  return /^\p{Ll}{2}/u.test(name) ? `${name.charAt(0).toUpperCase()}${name.slice(1)}` : name;
}

export function fillCell(cell: Cell, typed: TypedCell): void {
  cell.value = typed.value;
  if (typed.kind === 'number') cell.numFmt = typed.format;
  cell.alignment = { horizontal: 'right' };
}

export function asTitle(cell: Cell): void {
  cell.font = { ...BODY, size: TITLE_SIZE, bold: true };
}

/** A title over several columns, as high as its lines; the width is in characters of the usual type. */
export function titleRow(sheet: Worksheet, text: string, columns: number, width: number): void {
  sheet.mergeCells(1, 1, 1, columns);
  const cell = sheet.getCell(1, 1);
  cell.value = text;
  asTitle(cell);
  asProse(cell);
  sheet.getRow(1).height = TITLE_HEIGHT * linesIn(text, width / TITLE_LETTER);
}

export function asProse(cell: Cell): void {
  cell.alignment = { wrapText: true, vertical: 'top' };
}

/** Small words that explain a column, or name a number that stands below them. */
export function asNote(cell: Cell): void {
  cell.font = { ...BODY, size: 8, color: QUIET };
  cell.alignment = { horizontal: 'right', vertical: 'top', wrapText: true };
}

/** Where a sheet comes from, in small type. */
export function asColophon(cell: Cell): void {
  cell.font = { ...BODY, size: 8, color: QUIET };
  cell.alignment = { wrapText: true, vertical: 'top' };
}

/** A head of two rules; the row below it starts the table. */
export function asHead(cell: Cell): void {
  cell.font = { ...BODY, size: 9, bold: true };
  cell.alignment = { horizontal: 'right', vertical: 'bottom', wrapText: true };
  cell.border = { top: STRONG, bottom: STRONG };
}

export function ruleBelow(cell: Cell, weight: 'fine' | 'strong'): void {
  cell.border = { bottom: weight === 'fine' ? FINE : STRONG };
}

/** Prose over several columns, as high as its lines; widths are in characters of the usual type. */
export function proseRow(sheet: Worksheet, row: number, text: string, columns: number, width: number): void {
  if (columns > 1) sheet.mergeCells(row, 1, row, columns);
  const cell = sheet.getCell(row, 1);
  cell.value = text;
  asProse(cell);
  sheet.getRow(row).height = 15 * linesIn(text, width);
}

/** About how many lines a wrapped text takes in so many characters of the usual type. */
export function linesIn(text: string, width: number): number {
  return text.split('\n').reduce((sum, line) => sum + Math.max(1, Math.ceil((line.length * 1.1) / width)), 0);
}
