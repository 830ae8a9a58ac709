import { GERMAN_BLOCKS } from './german/blocks.ts';
import { GERMAN_CLASS_REPORT } from './german/class-report.ts';
import { GERMAN_CLASS_STANDING } from './german/class-standing.ts';
import { GERMAN_SLIPS } from './german/slips.ts';
import { GERMAN_COLUMNS } from './german/columns.ts';
import { GERMAN_FIT } from './german/fit.ts';
import { GERMAN_METHOD } from './german/method.ts';
import { GERMAN_RECIPE } from './german/recipe.ts';
import { GERMAN_SHEET } from './german/sheet.ts';
import { GERMAN_WORKBOOK } from './german/workbook.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in German. */
export const GERMAN_PHRASES: Phrases = {
  ...GERMAN_SHEET,
  ...GERMAN_COLUMNS,
  ...GERMAN_METHOD,
  ...GERMAN_FIT,
  ...GERMAN_WORKBOOK,
  ...GERMAN_RECIPE,
  ...GERMAN_BLOCKS,
  ...GERMAN_CLASS_REPORT,
  ...GERMAN_CLASS_STANDING,
  ...GERMAN_SLIPS,
};
