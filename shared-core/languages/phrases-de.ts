import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_PEOPLE } from './english/people.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in German. */
export const GERMAN_PHRASES: Phrases = {
  'foot.page': 'Seite {page} von {pages}',
  'foot.edition': 'Ausgabe {edition}',
  'foot.check': 'Prüfcode {check}',
  'foot.definition': 'Definition: {definition}',
  'foot.definition-smoothed': 'Definition: {definition}, geglättet',
  'head.draft': 'ENTWURF',
  'head.table': 'Tabelle {number} · {title}',
  'sheet.title-with-group': '{title}, {group}',
  'sheet.continued': '{title} (Fortsetzung)',
  ...ENGLISH_PEOPLE,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
};
