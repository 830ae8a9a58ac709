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
};
