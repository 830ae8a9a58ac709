import type { ENGLISH_RECIPE } from '../english/recipe.ts';

export const GERMAN_RECIPE: Readonly<Record<keyof typeof ENGLISH_RECIPE, string>> = {
  'recipe.take': 'Zugrunde liegen: {people} ({group}) und der Rohwert {score}.',
  'recipe.take-weighted':
    'Zugrunde liegen: {people} ({group}), deren Gewichte zusammen {weight} ergeben, und der Rohwert {score}.',
  'recipe.count-lower':
    'Zählen, wie viele einen niedrigeren Rohwert haben: {worse}. Zählen, wie viele diesen haben: {same}.',
  'recipe.count-higher':
    'Zählen, wie viele einen höheren Rohwert haben: {worse}. Zählen, wie viele diesen haben: {same}.',
  'recipe.weigh-lower':
    'Die Gewichte derer mit niedrigerem Rohwert zusammenzählen: {worse}; und derer mit diesem: {same}.',
  'recipe.weigh-higher':
    'Die Gewichte derer mit höherem Rohwert zusammenzählen: {worse}; und derer mit diesem: {same}.',
  'recipe.add-half': 'Die Hälfte der zweiten Zahl zur ersten zählen: {sum}.',
  'recipe.add-both': 'Beide Zahlen zusammenzählen: {sum}.',
  'recipe.keep-first': 'Nur die erste Zahl behalten: {sum}.',
  'recipe.divide': 'Durch {all} teilen und mit 100 malnehmen: {rank}.',
  'recipe.mean-rank': 'Die Hälfte der zweiten Zahl zur ersten zählen und 1/2 hinzu: Der mittlere Rang r ist {mean}.',
  'recipe.mean-rank-scaled':
    'Die Hälfte der zweiten Zahl zur ersten zählen, mit {factor} malnehmen und 1/2 hinzu: Der mittlere Rang r ist {mean}.',
  'recipe.plotting-position':
    'Mit a = {offset} ist 100 (r − a)/({count} + 1 − 2a) gleich {rank} (zwischen 0 und 100 gehalten).',
  'recipe.classes':
    'Vom schwachen Ende der Skala an werden Klassen von {size} Rohwerten gebildet; dieser Rohwert ist Nummer {number} in seiner Klasse, und seine Mitte liegt bei {part} des Weges durch sie.',
  'recipe.in-classes':
    'In schwächeren Klassen stehen {poorer}, in dieser Klasse {own}: diesen Teil der zweiten Zahl zur ersten zählen.',
  'recipe.ends': 'Unter {least} wird als {low} gedruckt, über {most} als {high}.',
  'recipe.round': 'Runden auf {unit}, {half}{held}.',
  'recipe.whole-number': 'eine ganze Zahl',
  'recipe.one-decimal': 'eine Nachkommastelle',
  'recipe.half-up': 'eine Hälfte aufwärts',
  'recipe.half-even': 'eine Hälfte zur geraden Ziffer',
  'recipe.held': ', zwischen {least} und {most} gehalten',
  'recipe.gives': '{rounding} Das ergibt {rank}.',
  'recipe.prints': 'Die Tabelle druckt {rank}.',
  'recipe.prints-smoothed':
    'Die Tabelle druckt {rank}: Ihre Ränge sind geglättet, und Glättung lässt sich nicht von Hand nachrechnen.',
  'recipe.prints-adjusted': 'Die Tabelle druckt {rank}: Der Rang wurde von Hand geändert, zuvor {from}.',
};
