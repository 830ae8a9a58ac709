import type { ENGLISH_CLASS_STANDING } from '../english/class-standing.ts';

/** The report of a class without a table, in German. */
export const GERMAN_CLASS_STANDING: Readonly<Record<keyof typeof ENGLISH_CLASS_STANDING, string>> = {
  'standing.title': 'Reihenfolge in der Klasse',
  'standing.lead': 'Reihenfolge in der Klasse.',
  'standing.text':
    'Für diesen Test gibt es keine Tabelle. Die Ergebnisse sind innerhalb dieser Klasse von {n} geordnet und sagen nichts darüber hinaus. Platz 1 ist das beste Ergebnis; gleiche Ergebnisse teilen sich ihre Plätze.',
  'standing.coarse-lead': 'Wie grob das ist.',
  'standing.coarse':
    '{one} von {n} entspricht {points} Punkten der letzten Spalte. Ein wenig mehr oder weniger im Test kann mehrere Plätze ausmachen.',
  'standing.place': 'Platz',
  'standing.share-low': 'Gleich oder\nniedriger, %',
  'standing.share-high': 'Gleich oder\nhöher, %',
  'standing.cautions':
    'Ein Platz hängt davon ab, wer in der Klasse ist. Er sagt nicht, wie viel gelernt wurde, ist keine Note und sagt nichts über andere Klassen. Keine Entscheidung über einen Menschen darf auf einem einzigen Ergebnis beruhen; beachten Sie die örtlichen Regeln und das Urteil von Fachleuten.',
};
