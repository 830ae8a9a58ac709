import { describe, expect, it } from 'vitest';
import { usualNumbers } from '../../../shared-core/languages/number-format.ts';
import {
  ENGLISH_WORDS,
  PHRASE_KEYS,
  phraseProblem,
  printWords,
  say,
  sayInParts,
  shippedPhrases,
} from '../../../shared-core/languages/phrases.ts';
import { placeholdersIn } from '../../../shared-core/languages/placeholders.ts';

const german = { words: 'de', phrases: [], numbers: usualNumbers('de') } as const;

describe('the shipped words', () => {
  it.each(['de', 'es', 'fr'] as const)('%s: every key has a text with the placeholders of the English one', (words) => {
    const phrases = shippedPhrases(words);
    expect(Object.keys(phrases)).toEqual(PHRASE_KEYS);
    for (const key of PHRASE_KEYS) expect(phraseProblem(key, phrases[key]), phrases[key]).toBeNull();
  });

  it('write a placeholder in lower case', () => {
    for (const key of PHRASE_KEYS) {
      const braces = ENGLISH_WORDS.phrases[key].match(/[{}]/g) ?? [];
      expect(braces.length, key).toBeGreaterThanOrEqual(2 * placeholdersIn(ENGLISH_WORDS.phrases[key]).length);
      expect(ENGLISH_WORDS.phrases[key].replace(/\{[a-z][a-z0-9-]*\}/g, ''), key).not.toMatch(/[{}]/);
    }
  });
});

describe('say', () => {
  it('puts values into the words of the language', () => {
    expect(say(ENGLISH_WORDS, 'foot.page', { page: '2', pages: '9' })).toBe('page 2 of 9');
    expect(say(printWords(german), 'foot.page', { page: '2', pages: '9' })).toBe('Seite 2 von 9');
  });

  it('puts a value in as it is, even one that looks like a placeholder', () => {
    expect(say(ENGLISH_WORDS, 'foot.page', { page: '{pages}', pages: '$1' })).toBe('page {pages} of $1');
  });

  it('tells words from what was put into them', () => {
    expect(sayInParts(ENGLISH_WORDS, 'foot.check', { check: '7F3A' })).toEqual([
      { text: 'check ', placeholder: null },
      { text: '7F3A', placeholder: 'check' },
    ]);
  });
});

describe('words of the user', () => {
  it('are printed in place of the shipped ones', () => {
    const words = printWords({ ...german, phrases: [{ key: 'foot.page', text: '{pages}/{page}' }] });
    expect(say(words, 'foot.page', { page: '2', pages: '9' })).toBe('9/2');
    expect(say(words, 'head.draft')).toBe('ENTWURF');
  });

  it.each([
    ['foot.page', 'page {page}', '{pages}'],
    ['foot.page', 'page {page} of {pages} of {book}', '{book}'],
    ['foot.page', '  ', 'empty'],
    ['foot.pages', 'pages', 'foot.pages'],
    ['constructor', 'pages', 'constructor'],
  ])('are refused in a sentence where they cannot stand: %s %s', (key, text, told) => {
    expect(phraseProblem(key, text)).toContain(told);
    const words = printWords({ ...german, phrases: [{ key, text }] });
    expect(words.phrases).toEqual(shippedPhrases('de'));
  });

  it('may hold their placeholders in another order, and more than once', () => {
    expect(phraseProblem('foot.page', '{pages}: {page} ({page})')).toBeNull();
  });
});
