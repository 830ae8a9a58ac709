import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import { SPANISH_COLUMNS } from './spanish/columns.ts';
import { SPANISH_FIT } from './spanish/fit.ts';
import { SPANISH_METHOD } from './spanish/method.ts';
import { SPANISH_SHEET } from './spanish/sheet.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in Spanish. */
export const SPANISH_PHRASES: Phrases = {
  ...SPANISH_SHEET,
  ...SPANISH_COLUMNS,
  ...SPANISH_METHOD,
  ...SPANISH_FIT,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
};
