import { ENGLISH_NUMBERS, inLanguage, type NumberFormat } from './number-format.ts';
import { GERMAN_PHRASES } from './phrases-de.ts';
import { ENGLISH_PHRASES } from './phrases-en.ts';
import { SPANISH_PHRASES } from './phrases-es.ts';
import { FRENCH_PHRASES } from './phrases-fr.ts';
import { filledParts, placeholdersIn, type FilledPart, type PlaceholdersOf } from './placeholders.ts';
import type { ShippedWords } from './shipped-words.ts';

export type PhraseKey = keyof typeof ENGLISH_PHRASES;

/** A text for every key. */
export type Phrases = Readonly<Record<PhraseKey, string>>;

/** Words and numbers as they are printed: the words that ship, with those of the user put over them. */
export interface PrintWords {
  readonly words: ShippedWords;
  readonly phrases: Phrases;
  readonly numbers: NumberFormat;
}

/** The language of a booklet as the project chooses it. */
export interface LanguageChoice {
  readonly words: ShippedWords;
  readonly numbers: NumberFormat;
  readonly phrases: readonly { readonly key: string; readonly text: string }[];
}

const SHIPPED: Readonly<Record<ShippedWords, Phrases>> = {
  en: ENGLISH_PHRASES,
  de: GERMAN_PHRASES,
  es: SPANISH_PHRASES,
  fr: FRENCH_PHRASES,
};

/** The words that ship for a language. */
export function shippedPhrases(words: ShippedWords): Phrases {
  return SHIPPED[words];
}

/** What is shown on screen, and printed where nothing else is chosen. */
export const ENGLISH_WORDS: PrintWords = { words: 'en', phrases: ENGLISH_PHRASES, numbers: ENGLISH_NUMBERS };

/** All keys, in the order in which they are listed. */
export const PHRASE_KEYS = Object.keys(ENGLISH_PHRASES) as readonly PhraseKey[];

function isPhraseKey(key: string): key is PhraseKey {
  return Object.hasOwn(ENGLISH_PHRASES, key);
}

const madeWords = new WeakMap<LanguageChoice, PrintWords>();

/**
 * The words of a language with those of the user put over them; what cannot stand for a phrase is left out. The same
 * choice gives the same words, which are kept, since every printed text asks for them.
 */
export function printWords(language: LanguageChoice): PrintWords {
  const made = madeWords.get(language) ?? madeOf(language);
  madeWords.set(language, made);
  return made;
}

/** The words in which a project is printed. */
export function wordsOf(project: { readonly sheet: { readonly language: LanguageChoice } }): PrintWords {
  return printWords(project.sheet.language);
}

function madeOf({ words, numbers, phrases }: LanguageChoice): PrintWords {
  const own = phrases.filter(({ key, text }) => phraseProblem(key, text) === null);
  return {
    words,
    numbers,
    phrases: { ...SHIPPED[words], ...Object.fromEntries(own.map(({ key, text }) => [key, text])) },
  };
}

const MOST_HEAD_LINES = 2;

/** Why a text cannot stand for a phrase, in a sentence that tells what to do, or null. */
export function phraseProblem(key: string, text: string): string | null {
  if (!isPhraseKey(key)) return `The booklet has no phrase “${key}”. Remove it.`;
  if (text.trim() === '') return `The phrase “${key}” is empty. Write it, or remove it to print the shipped one.`;
  if (key.includes('.heading') && text.split('\n').length > MOST_HEAD_LINES) {
    return `The phrase “${key}” heads a column, which has room for two lines. Shorten it.`;
  }
  const [wanted, found] = [placeholdersIn(ENGLISH_PHRASES[key]), placeholdersIn(text)];
  const missing = wanted.filter((name) => !found.includes(name)).map(inBraces);
  const strange = found.filter((name) => !wanted.includes(name)).map(inBraces);
  if (missing.length === 0 && strange.length === 0) return null;
  const advice = [
    ...(missing.length === 0 ? [] : [`put in ${missing.join(' and ')}`]),
    ...(strange.length === 0 ? [] : [`take out ${strange.join(' and ')}`]),
  ];
  return `The phrase “${key}” must hold what is put into it when it is printed: ${advice.join(', and ')}.`;
}

function inBraces(name: string): string {
  return `{${name}}`;
}

type Template<Key extends PhraseKey> = (typeof ENGLISH_PHRASES)[Key];

/**
 * What a phrase needs: a printed text for each of its placeholders. English templates are single literals, since the
 * compiler does not see into one that is put together.
 */
type ValuesFor<Key extends PhraseKey> =
  string extends Template<Key>
    ? [never]
    : [PlaceholdersOf<Template<Key>>] extends [never]
      ? []
      : [Readonly<Record<PlaceholdersOf<Template<Key>>, string>>];

/** Printed figures, as the language writes them. */
export function figure({ numbers }: PrintWords, printed: string): string {
  return inLanguage(printed, numbers);
}

/** A phrase as it is printed. */
export function say<Key extends PhraseKey>(words: PrintWords, key: Key, ...values: ValuesFor<Key>): string {
  return sayInParts(words, key, ...values)
    .map(({ text }) => text)
    .join('');
}

/** The same in parts, so that what was put in can be told from the words around it. */
export function sayInParts<Key extends PhraseKey>(
  { phrases }: PrintWords,
  key: Key,
  ...values: ValuesFor<Key>
): readonly FilledPart[] {
  return filledParts(phrases[key], values[0] ?? {});
}

type CountedStem = PhraseKey extends infer Key ? (Key extends `${infer Stem}:one` ? Stem : never) : never;

type CountedValues<Stem extends CountedStem> = Readonly<
  Record<PlaceholdersOf<Template<`${Stem}:one` | `${Stem}:many`>>, string>
>;

/**
 * A phrase that a printed whole number chooses: of one, or of many. French counts none as it counts one (Unicode CLDR,
 * plural rules).
 */
export function sayCounted<Stem extends CountedStem>(
  words: PrintWords,
  stem: Stem,
  count: string,
  values: CountedValues<Stem>,
): string {
  const one = count === '1' || (words.words === 'fr' && count === '0');
  return filledParts(words.phrases[`${stem}:${one ? 'one' : 'many'}`], values)
    .map(({ text }) => text)
    .join('');
}
