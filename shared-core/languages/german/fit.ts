import type { ENGLISH_FIT } from '../english/fit.ts';

export const GERMAN_FIT: Readonly<Record<keyof typeof ENGLISH_FIT, string>> = {
  'fit.title': 'Technische Anmerkungen zur Glättung',
  'fit.degrees-lead': 'Grade.',
  'fit.fit-lead': 'Anpassung.',
  'fit.beware-lead': 'Vorsicht.',
  'fit.degree': 'Grad',
  'fit.df': 'df',
  'fit.about-degrees':
    'G² und X² sagen, wie weit die angepassten Häufigkeiten von den beobachteten entfernt liegen. AIC und BIC rechnen ' +
    'für jeden Parameter etwas hinzu; weniger ist besser. p prüft einen Grad gegen den nächstniedrigeren. Der gewählte ' +
    'Grad steht fett über einer Linie.',
  'fit.none-found': 'Wo Striche stehen, wurde keine Anpassung gefunden.',
  'fit.nearly-as-good': 'Nach BIC ebenso gut, niedriger oder höchstens um 2 höher: Grad {degrees}.',
  'fit.moment': 'Moment',
  'fit.observed': 'Beobachtet',
  'fit.smoothed': 'Geglättet',
  'fit.mean': 'Mittelwert',
  'fit.sd': 'SD, geteilt durch n',
  'fit.skewness': 'Schiefe',
  'fit.excess-kurtosis': 'Exzess',
  'fit.moment-pair': '{moment} {observed} beobachtet, {smoothed} geglättet',
  'fit.misfit': 'G² ist {g2} und X² {x2}, bei {df} Freiheitsgraden.',
  'fit.bandwidth': 'Die Bandbreite des Kerns ist {bandwidth} Rohwertpunkte.',
  'fit.bandwidth-found': 'Die Bandbreite des Kerns ist {bandwidth} Rohwertpunkte, aus den Daten bestimmt.',
  'fit.largest-move': 'Am weitesten verschiebt sich ein Rang um {points} Prozentrangpunkte, beim Rohwert {score}.',
  'fit.changed': 'Die Glättung ändert {changed} von {of} gedruckten Rängen.',
  'fit.filled-gaps': 'Die Kurve erwartet fünf oder mehr {people} bei {scores}, wo niemand ist.',
  'fit.invented-dips': 'Die Kurve hat eine Senke bei {scores}, die Daten haben keine.',
};
