import { ENGLISH_BLOCKS } from './english/blocks.ts';
import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import { ENGLISH_COLUMNS } from './english/columns.ts';
import { ENGLISH_FIT } from './english/fit.ts';
import { ENGLISH_METHOD } from './english/method.ts';
import { ENGLISH_RECIPE } from './english/recipe.ts';
import { ENGLISH_SHEET } from './english/sheet.ts';
import { ENGLISH_WORKBOOK } from './english/workbook.ts';

/**
 * Every printed word, as templates. A key is named by where the words stand; `:one` and `:many` are chosen by a count.
 * What stands in braces is put in when the words are printed and stands in every language.
 */
export const ENGLISH_PHRASES = {
  ...ENGLISH_SHEET,
  ...ENGLISH_COLUMNS,
  ...ENGLISH_METHOD,
  ...ENGLISH_FIT,
  ...ENGLISH_WORKBOOK,
  ...ENGLISH_RECIPE,
  ...ENGLISH_BLOCKS,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
} as const;
