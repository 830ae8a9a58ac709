import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import { spokenFigure } from './spoken-text.ts';
import { say, type PrintWords } from '../languages/phrases.ts';
import type { PeopleNoun } from '../norms/norm-project.ts';

/** "pupils". */
export function peopleWord(words: PrintWords, people: PeopleNoun): string {
  return say(words, `people.${people}`);
}

/** "pupil". */
export function personWord(words: PrintWords, people: PeopleNoun): string {
  return say(words, `person.${people}`);
}

/** "28 pupils". */
export function countedWord(words: PrintWords, count: string, people: PeopleNoun): string {
  return say(words, count === '1' ? `counted.${people}:one` : `counted.${people}:many`, { count });
}

/** A printed figure as the language writes it. */
export function printedFigure(words: PrintWords, printed: string): string {
  return words.words === 'en' ? printed : printed.replace('.', ',');
}

/** A printed figure in words, for sentences and for those who listen: "<1" is "below 1". The mark of hand-set ranks is left out. */
export function figureInWords(words: PrintWords, printed: string): string {
  const figure = printedFigure(words, printed.replace(ADJUSTED_MARK, ''));
  return spokenFigure(figure) ?? figure;
}

/** A date yyyy-mm-dd as the language writes it. */
export function printedDate(words: PrintWords, date: string): string {
  return words.words === 'en' ? date : date.split('-').toReversed().join('.');
}
