import type { SheetChoices } from './norm-project.ts';

/** Lengths of the sheet that are typed as numbers: margins in millimetres, type and rows in points. */
export type SheetLength = 'marginMm' | 'gutterMm' | 'rowType' | 'rowHeight';

/** Least and most of each, in its own unit. */
export const SHEET_LENGTHS: Readonly<Record<SheetLength, readonly [least: number, most: number]>> = {
  marginMm: [8, 45],
  gutterMm: [0, 30],
  rowType: [6, 14],
  rowHeight: [8, 36],
};

/** Why a length cannot be used on the sheet as it is, with what to do; null when it can. */
export function sheetLengthProblem(sheet: SheetChoices, length: SheetLength, value: number): string | null {
  const [least, most] = SHEET_LENGTHS[length];
  if (!(value >= least && value <= most)) {
    switch (length) {
      case 'marginMm':
        return `A margin is a number from ${least} to ${most} millimetres.`;
      case 'gutterMm':
        return `The binding edge takes from ${least} to ${most} millimetres more.`;
      case 'rowType':
        return `Figures are ${least} to ${most} points large.`;
      case 'rowHeight':
        return `Rows are ${least} to ${most} points high.`;
    }
  }
  if (length === 'rowType' && value > sheet.rowHeight) {
    return `Figures of ${value} points do not fit on rows of ${sheet.rowHeight} points. Make the rows higher first.`;
  }
  if (length === 'rowHeight' && value < sheet.rowType) {
    return `Rows of ${value} points do not hold figures of ${sheet.rowType} points. Make the figures smaller first.`;
  }
  return null;
}
