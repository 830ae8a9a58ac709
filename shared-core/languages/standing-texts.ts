import type { ShippedWords } from './shipped-words.ts';
import { frenchSpaces } from './french/spaces.ts';

/** Texts that the user may rewrite, as they stand in a project until then. */
export interface StandingTexts {
  /** Title before the group's name. */
  readonly title: string;
  readonly howToRead: string;
  readonly cautions: string;
}

const STANDING_TEXTS: Readonly<Record<ShippedWords, StandingTexts>> = {
  en: {
    title: 'Raw score to percentile rank',
    howToRead:
      'Find the raw score in the first column. The percentile rank beside it tells where that score stands in the group ' +
      'this table was made from.',
    cautions:
      'A percentile rank is a place in a named group, not a per cent of correct answers. Its steps are unequal: do not ' +
      'add, subtract or average percentile ranks. Use this table only for this form, season and group. Never let one ' +
      'score be the only ground for a decision about a person; follow local rules and the judgement of a qualified ' +
      'professional.',
  },
  de: {
    title: 'Vom Rohwert zum Prozentrang',
    howToRead:
      'Suchen Sie den Rohwert in der ersten Spalte. Der Prozentrang daneben sagt, wo dieser Wert in der Gruppe steht, aus ' +
      'der die Tabelle gewonnen wurde.',
    cautions:
      'Ein Prozentrang ist ein Platz in einer benannten Gruppe, kein Prozentsatz richtiger Antworten. Seine Schritte sind ' +
      'ungleich: Prozentränge dürfen nicht addiert, subtrahiert oder gemittelt werden. Verwenden Sie diese Tabelle nur ' +
      'für diese Testform, diesen Zeitpunkt und diese Gruppe. Ein einzelner Wert darf nie der einzige Grund für eine ' +
      'Entscheidung über einen Menschen sein; beachten Sie die örtlichen Regeln und das Urteil einer Fachperson.',
  },
  es: {
    title: 'De la puntuación directa al rango percentil',
    howToRead:
      'Busque la puntuación directa en la primera columna. El rango percentil que está a su lado indica el lugar de esa ' +
      'puntuación en el grupo del que procede esta tabla.',
    cautions:
      'Un rango percentil es un lugar en un grupo concreto, no un porcentaje de respuestas correctas. Sus pasos son ' +
      'desiguales: no sume, reste ni promedie rangos percentiles. Utilice esta tabla solo para esta forma de la prueba, ' +
      'esta época y este grupo. Una sola puntuación nunca debe ser el único motivo de una decisión sobre una persona; ' +
      'siga las normas locales y el criterio de un profesional cualificado.',
  },
  fr: frenchSpaces({
    title: 'Du score brut au rang centile',
    howToRead:
      'Cherchez le score brut dans la première colonne. Le rang centile à côté indique la place de ce score dans le groupe ' +
      'd’où vient ce tableau.',
    cautions:
      'Un rang centile est une place dans un groupe précis, et non un pourcentage de bonnes réponses. Ses pas sont ' +
      'inégaux : il ne faut ni additionner, ni soustraire, ni moyenner des rangs centiles. N’utilisez ce tableau que pour ' +
      'cette forme du test, cette période et ce groupe. Un seul score ne doit jamais être l’unique motif d’une décision ' +
      'concernant une personne ; suivez les règles locales et l’avis d’un professionnel qualifié.',
  }),
};

/** The texts that ship for a language. */
export function standingTexts(words: ShippedWords): StandingTexts {
  return STANDING_TEXTS[words];
}
