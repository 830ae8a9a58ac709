import type { ENGLISH_CLASS_STANDING } from '../english/class-standing.ts';

/** The report of a class without a table, in French. */
export const FRENCH_CLASS_STANDING: Readonly<Record<keyof typeof ENGLISH_CLASS_STANDING, string>> = {
  'standing.title': 'Ordre dans la classe',
  'standing.lead': 'Ordre dans la classe.',
  'standing.text':
    'Il n’y a pas de tableau pour ce test. Les scores sont rangés à l’intérieur de cette classe de {n} et ne disent rien au-delà. La place 1 est le meilleur score ; les scores égaux partagent leurs places.',
  'standing.coarse-lead': 'Quelle précision.',
  'standing.coarse':
    '{one} sur {n} équivaut à {points} points de la dernière colonne. Un peu plus ou un peu moins de score peut déplacer de plusieurs places.',
  'standing.place': 'Place',
  'standing.share-low': 'Égal ou\nplus bas, %',
  'standing.share-high': 'Égal ou\nplus élevé, %',
  'standing.cautions':
    'Une place dépend de qui est dans la classe. Elle ne dit pas ce qui a été appris, n’est pas une note et ne dit rien d’autres classes. Aucune décision sur qui que ce soit ne peut reposer sur un seul score ; suivez les règles locales et l’avis de personnes qualifiées.',
};
