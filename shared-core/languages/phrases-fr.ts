import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import { FRENCH_COLUMNS } from './french/columns.ts';
import { FRENCH_FIT } from './french/fit.ts';
import { FRENCH_METHOD } from './french/method.ts';
import { FRENCH_SHEET } from './french/sheet.ts';
import { frenchSpaces } from './french/spaces.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in French. */
export const FRENCH_PHRASES: Phrases = frenchSpaces({
  ...FRENCH_SHEET,
  ...FRENCH_COLUMNS,
  ...FRENCH_METHOD,
  ...FRENCH_FIT,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
});
