import { ENGLISH_CLASS_REPORT } from './english/class-report.ts';
import { ENGLISH_CLASS_STANDING } from './english/class-standing.ts';
import { ENGLISH_PEOPLE } from './english/people.ts';
import { ENGLISH_SLIPS } from './english/slips.ts';
import type { Phrases } from './phrases.ts';

/** Printed words in Spanish. */
export const SPANISH_PHRASES: Phrases = {
  'foot.page': 'página {page} de {pages}',
  'foot.edition': 'Edición {edition}',
  'foot.check': 'código de control {check}',
  'foot.definition': 'definición: {definition}',
  'foot.definition-smoothed': 'definición: {definition}, suavizada',
  'head.draft': 'BORRADOR',
  'head.table': 'Tabla {number} · {title}',
  'sheet.title-with-group': '{title}, {group}',
  'sheet.continued': '{title} (continuación)',
  ...ENGLISH_PEOPLE,
  ...ENGLISH_CLASS_REPORT,
  ...ENGLISH_CLASS_STANDING,
  ...ENGLISH_SLIPS,
};
