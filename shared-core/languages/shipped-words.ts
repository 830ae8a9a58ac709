/** Languages whose words ship with the program. */
export type ShippedWords = 'en' | 'de' | 'es' | 'fr';

/** As they are called in English, in the order in which they are offered. */
export const LANGUAGE_NAMES: Readonly<Record<ShippedWords, string>> = {
  en: 'English',
  de: 'German',
  es: 'Spanish',
  fr: 'French',
};
