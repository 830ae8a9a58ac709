import { say, type PrintWords } from './phrases.ts';

/** "a, b and c". Spanish says "e" for "y" before the sound of an i. */
export function listed(words: PrintWords, items: readonly string[]): string {
  const last = items.at(-1) ?? '';
  if (items.length < 2) return last;
  const values = { items: items.slice(0, -1).join(', '), last };
  return say(words, /^h?[ií](?![eé])/i.test(last) ? 'list.and-before-i' : 'list.and', values);
}
