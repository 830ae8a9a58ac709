import { GERMAN_PHRASES } from './phrases-de.ts';
import { ENGLISH_PHRASES } from './phrases-en.ts';
import { SPANISH_PHRASES } from './phrases-es.ts';
import { FRENCH_PHRASES } from './phrases-fr.ts';
import { filledParts, placeholdersIn, type FilledPart, type PlaceholdersOf } from './placeholders.ts';

export type PhraseKey = keyof typeof ENGLISH_PHRASES;

/** A text for every key. */
export type Phrases = Readonly<Record<PhraseKey, string>>;

/** Languages whose words ship with the program. */
export type ShippedWords = 'en' | 'de' | 'es' | 'fr';

/** Words as they are printed: those that ship, with those of the user put over them. */
export interface PrintWords {
  readonly words: ShippedWords;
  readonly phrases: Phrases;
}

/** The words as the project chooses them. */
interface WordsChoice {
  readonly words: ShippedWords;
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

export const ENGLISH_WORDS: PrintWords = { words: 'en', phrases: ENGLISH_PHRASES };

/** All keys, in the order in which they are listed. */
export const PHRASE_KEYS = Object.keys(ENGLISH_PHRASES) as readonly PhraseKey[];

function isPhraseKey(key: string): key is PhraseKey {
  return Object.hasOwn(ENGLISH_PHRASES, key);
}

/** The words of a language with those of the user put over them; what cannot stand for a phrase is left out. */
export function printWords({ words, phrases }: WordsChoice): PrintWords {
  const own = phrases.filter(({ key, text }) => phraseProblem(key, text) === null);
  return {
    words,
    phrases: { ...SHIPPED[words], ...Object.fromEntries(own.map(({ key, text }) => [key, text])) },
  };
}

/** Why a text cannot stand for a phrase, in a sentence that tells what to do, or null. */
export function phraseProblem(key: string, text: string): string | null {
  if (!isPhraseKey(key)) return `The booklet has no phrase “${key}”. Remove it.`;
  if (text.trim() === '') return `The phrase “${key}” is empty. Write it, or remove it to print the shipped one.`;
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

/** What a phrase needs: a printed text for each of its placeholders. */
type ValuesFor<Key extends PhraseKey> = [PlaceholdersOf<Template<Key>>] extends [never]
  ? []
  : [Readonly<Record<PlaceholdersOf<Template<Key>>, string>>];

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
