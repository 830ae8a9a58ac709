import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import { GERMAN_COLUMNS } from './german/columns.ts';
import { GERMAN_FIT } from './german/fit.ts';
import { GERMAN_METHOD } from './german/method.ts';
import { GERMAN_SHEET } from './german/sheet.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in German. */
export const GERMAN_PHRASES: Phrases = {
  ...GERMAN_SHEET,
  ...GERMAN_COLUMNS,
  ...GERMAN_METHOD,
  ...GERMAN_FIT,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
};
