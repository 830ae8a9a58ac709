import { FRENCH_BLOCKS } from './french/blocks.ts';
import { FRENCH_CLASS_REPORT } from './french/class-report.ts';
import { FRENCH_CLASS_STANDING } from './french/class-standing.ts';
import { FRENCH_SLIPS } from './french/slips.ts';
import { FRENCH_COLUMNS } from './french/columns.ts';
import { FRENCH_FIT } from './french/fit.ts';
import { FRENCH_METHOD } from './french/method.ts';
import { FRENCH_RECIPE } from './french/recipe.ts';
import { FRENCH_SHEET } from './french/sheet.ts';
import { FRENCH_WORKBOOK } from './french/workbook.ts';
import { frenchSpaces } from './french/spaces.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in French. */
export const FRENCH_PHRASES: Phrases = frenchSpaces({
  ...FRENCH_SHEET,
  ...FRENCH_COLUMNS,
  ...FRENCH_METHOD,
  ...FRENCH_FIT,
  ...FRENCH_WORKBOOK,
  ...FRENCH_RECIPE,
  ...FRENCH_BLOCKS,
  ...FRENCH_CLASS_REPORT,
  ...FRENCH_CLASS_STANDING,
  ...FRENCH_SLIPS,
});
