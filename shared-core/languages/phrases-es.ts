import { SPANISH_BLOCKS } from './spanish/blocks.ts';
import { SPANISH_CLASS_REPORT } from './spanish/class-report.ts';
import { SPANISH_CLASS_STANDING } from './spanish/class-standing.ts';
import { SPANISH_SLIPS } from './spanish/slips.ts';
import { SPANISH_COLUMNS } from './spanish/columns.ts';
import { SPANISH_FIT } from './spanish/fit.ts';
import { SPANISH_METHOD } from './spanish/method.ts';
import { SPANISH_RECIPE } from './spanish/recipe.ts';
import { SPANISH_SHEET } from './spanish/sheet.ts';
import { SPANISH_WORKBOOK } from './spanish/workbook.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in Spanish. */
export const SPANISH_PHRASES: Phrases = {
  ...SPANISH_SHEET,
  ...SPANISH_COLUMNS,
  ...SPANISH_METHOD,
  ...SPANISH_FIT,
  ...SPANISH_WORKBOOK,
  ...SPANISH_RECIPE,
  ...SPANISH_BLOCKS,
  ...SPANISH_CLASS_REPORT,
  ...SPANISH_CLASS_STANDING,
  ...SPANISH_SLIPS,
};
