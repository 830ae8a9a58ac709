import { describe, expect, it } from 'vitest';
import { usualNumbers } from '../../../shared-core/languages/number-format.ts';
import { printWords } from '../../../shared-core/languages/phrases.ts';
import { asSentence, inSentence } from '../../../shared-core/languages/sentence.ts';
import { inSeries } from '../../../shared-core/languages/series.ts';
import type { ShippedWords } from '../../../shared-core/languages/shipped-words.ts';

const wordsIn = (words: ShippedWords) => printWords({ words, phrases: [], numbers: usualNumbers(words) });

describe('a series', () => {
  it.each([
    ['en', 'a, b and c'],
    ['de', 'a, b und c'],
    ['es', 'a, b y c'],
    ['fr', 'a, b et c'],
  ] as const)('in %s', (words, expected) => {
    expect(inSeries(wordsIn(words), ['a', 'b', 'c'])).toBe(expected);
    expect(inSeries(wordsIn(words), ['a'])).toBe('a');
    expect(inSeries(wordsIn(words), [])).toBe('');
  });

  // Before the sound of an i, but not of a diphthong: common practice in Spanish.
  it.each([
    ['intervalo', 'eneatipo e intervalo'],
    ['hilo', 'eneatipo e hilo'],
    ['hielo', 'eneatipo y hielo'],
    ['7', 'eneatipo y 7'],
  ])('says "e" in Spanish where an i follows: %s', (last, expected) => {
    expect(inSeries(wordsIn('es'), ['eneatipo', last])).toBe(expected);
  });
});

describe('words inside a sentence', () => {
  it('begin small where the language has it so', () => {
    expect(inSentence(wordsIn('en'), 'Grade')).toBe('grade');
    expect(inSentence(wordsIn('fr'), 'Élève')).toBe('élève');
    expect(inSentence(wordsIn('en'), 'NCE')).toBe('NCE');
    expect(inSentence(wordsIn('de'), 'Klasse')).toBe('Klasse');
  });

  it('begin with a capital where they begin it', () => {
    expect(asSentence('élèves')).toBe('Élèves');
  });
});
