import type { Cell, Worksheet } from 'exceljs';
import type { SheetChoices } from '../../shared-core/norms/norm-project.ts';
import type { TypedCell } from './typed-cell.ts';

/** Numbers by which workbooks name paper (Office Open XML, part 1, 18.3.1.63). */
const PAPER_SIZES: Readonly<Record<SheetChoices['paper'], number>> = { letter: 1, a4: 9, a5: 11 };

const INK = { argb: 'FF1E2326' };
const FINE = { style: 'thin', color: { argb: 'FFD8D3C7' } } as const;
const STRONG = { style: 'thin', color: INK } as const;

const BODY = { name: 'Calibri', family: 2, size: 11, color: INK } as const;

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
  cell.font = { ...BODY, size: 15, bold: true };
}

export function asProse(cell: Cell): void {
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

/** Paper, orientation and foot as in the booklet. */
export function setUpPages(sheet: Worksheet, choices: SheetChoices, foot: string): void {
  Object.assign(sheet.pageSetup, {
    paperSize: PAPER_SIZES[choices.paper],
    orientation: choices.orientation,
    fitToPage: true,
    fitToWidth: 1,
    fitToHeight: 0,
  });
  sheet.headerFooter.oddFooter = `&L${foot.replaceAll('&', '&&')}&RPage &P of &N`;
}
