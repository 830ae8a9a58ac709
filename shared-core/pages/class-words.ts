import { figure, say, type PrintWords } from '../languages/phrases.ts';
import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { PeopleNoun } from '../norms/norm-project.ts';
import { spokenFigure } from './spoken-text.ts';

/** "pupils". */
export function peopleWord(words: PrintWords, people: PeopleNoun): string {
  return say(words, `people.${people}`);
}

/**
 * A printed figure in words, for sentences and for those who listen: "<1" is "below 1". The mark of a rank set by hand is
 * left out.
 */
export function figureInWords(words: PrintWords, printed: string): string {
  const plain = figure(words, printed.replace(ADJUSTED_MARK, ''));
  return spokenFigure(words, plain) ?? plain;
}
