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
};
