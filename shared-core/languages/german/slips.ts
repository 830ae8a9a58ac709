import type { ENGLISH_SLIPS } from '../english/slips.ts';

/** The slip that goes home with a pupil, in German. */
export const GERMAN_SLIPS: Readonly<Record<keyof typeof ENGLISH_SLIPS, string>> = {
  'slip.title': '{class} · Ergebniszettel',
  'slip.test': '{test}, getestet am {date}',
  'slip.score-label': 'Testwert',
  'slip.rank-label': 'Prozentrang',
  'slip.band-label': 'Band',

  'slip.means': 'Was dieses Ergebnis bedeutet',
  'slip.score': '{name} hat einen Testwert von {score} erreicht, auf einer Skala von {lowest} bis\u00a0{highest}.',
  'slip.low-is-good': 'In diesem Test ist ein niedriger Wert gut.',
  'slip.group': 'Verglichen wird mit Ergebnissen, die andere {people} erreicht haben: {group}.',
  'slip.population': 'Sie stehen für: {population}.',
  'slip.rank-midpoint':
    'Unter je 100 von ihnen gibt es {share} mit einem {worse} Ergebnis: Das ist der Prozentrang. (Wer genau dasselbe Ergebnis hat, zählt dabei zur Hälfte mit.)',
  'slip.rank-at-or-below':
    'Unter je 100 von ihnen gibt es {share} mit demselben oder einem {worse} Ergebnis: Das ist der Prozentrang.',
  'slip.rank-below': 'Unter je 100 von ihnen gibt es {share} mit einem {worse} Ergebnis: Das ist der Prozentrang.',
  'slip.rank-plotting-position':
    'Unter je 100 von ihnen gibt es {share} mit einem {worse} Ergebnis: Das ist der Prozentrang. (Wer genau dasselbe Ergebnis hat, zählt dabei zum Teil mit.)',
  'slip.rank-grouped':
    'Unter je 100 von ihnen gibt es {share} mit einem {worse} Ergebnis: Das ist der Prozentrang. (Wer dasselbe oder ein nahes Ergebnis hat, zählt dabei zum Teil mit.)',
  'slip.rank-unknown':
    'Unter je 100 von ihnen gibt es {share} mit einem {worse} Ergebnis: Das ist der Prozentrang. (Wie genau gleiche Ergebnisse gezählt werden, ist nicht bekannt.)',
  'slip.share-about': 'etwa {rank}',
  'slip.share-below': 'weniger als {rank}',
  'slip.share-above': 'mehr als {rank}',
  'slip.adjusted': 'Diesen Prozentrang haben die, von denen die Tabelle stammt, von Hand festgelegt.',
  'slip.band':
    'Kein Test ist genau. An einem anderen Tag oder mit anderen Aufgaben derselben Art hätte {name} vielleicht etwas mehr oder etwas weniger erreicht. Das Band, {band}, berücksichtigt das: Auf je 100 {people} kommen etwa {level}, bei denen ein solches Band das Ergebnis enthält, das sie im Durchschnitt hätten, wenn sie viele Tests dieser Art machten.',
  'slip.no-band':
    'Kein Test ist genau. An einem anderen Tag oder mit anderen Aufgaben derselben Art hätte {name} vielleicht etwas mehr oder etwas weniger erreicht. Wie viel, ist für diesen Test nicht bekannt.',
  'slip.picture-dot': 'Der Punkt ist der Prozentrang.',
  'slip.picture-ring': 'Der Ring steht für einen Prozentrang jenseits vom Ende der Skala.',
  'slip.picture-bar': 'Der Balken ist das Band.',
  'slip.picture-scale':
    '50 ist die Mitte; dort liegen die Prozentränge am dichtesten, weil die meisten Ergebnisse dort sind.',
  'slip.picture-alt': 'Eine Skala der Prozentränge von 1 bis 99. Der Prozentrang ist {rank}.',
  'slip.picture-alt-band': 'Eine Skala der Prozentränge von 1 bis 99. Der Prozentrang ist {rank}, das Band {band}.',

  'slip.means-not': 'Was es nicht bedeutet',
  'slip.not-per-cent':
    'Es sagt nicht, wie viel Prozent der Antworten richtig waren. Es ist keine Note, und 50 ist keine Grenze zum Bestehen.',
  'slip.not-judgement':
    'Es zeigt, wie ein Test an einem Tag verlaufen ist. Es ist kein Urteil über {name} und sagt nicht, was {name} lernen kann.',
  'slip.not-alone':
    'Was Lehrkräfte und Familie sonst wissen, zählt ebenso. Allein nach diesem Ergebnis sollte nichts entschieden werden.',
  'slip.ask':
    'Bitte fragen Sie die Schule, wenn etwas unklar ist, wie das Ergebnis verwendet wird und welche Regeln dafür gelten.',
};
