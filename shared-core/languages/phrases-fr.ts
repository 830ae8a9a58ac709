import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_PEOPLE } from './english/people.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in French. */
export const FRENCH_PHRASES: Phrases = {
  'foot.page': 'page {page} sur {pages}',
  'foot.edition': 'Édition {edition}',
  'foot.check': 'code de contrôle {check}',
  'foot.definition': 'définition : {definition}',
  'foot.definition-smoothed': 'définition : {definition}, lissée',
  'head.draft': 'BROUILLON',
  'head.table': 'Tableau {number} · {title}',
  'sheet.title-with-group': '{title}, {group}',
  'sheet.continued': '{title} (suite)',
  ...ENGLISH_PEOPLE,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
};
