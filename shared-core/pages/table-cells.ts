import { figure, say, type PrintWords } from '../languages/phrases.ts';
import type { PlacedCell } from './booklet.ts';
import { spokenFigure } from './spoken-text.ts';

/** A figure of the norm set as it is printed. */
export function figureCell(words: PrintWords, text: string): PlacedCell {
  const printed = figure(words, text);
  return { text: printed, said: spokenFigure(words, printed), marked: false };
}

/** A percentile rank of the norm set as it is printed, with its mark where it was adjusted by hand. */
export function rankCell(words: PrintWords, text: string, adjusted: boolean): PlacedCell {
  const cell = figureCell(words, text);
  if (!adjusted) return cell;
  return { ...cell, said: say(words, 'spoken.adjusted', { figure: cell.said ?? cell.text }), marked: true };
}

/** Words, which are read as they stand; `said` where they are only a part of what is said. */
export function wordsCell(text: string, said: string | null = null): PlacedCell {
  return { text, said, marked: false };
}
