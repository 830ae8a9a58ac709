import type { Reply } from '../../shared-core/desk.ts';
import { parseDecimal } from '../../shared-core/scale/decimal.ts';

/** What was given for each option by its name without dashes; true for a flag. */
export type OptionValues = Readonly<Record<string, string | boolean | undefined>>;

/** An option that cannot be used; the message says which and how it is meant. */
export class WrongOption extends Error {}

/** The result of reading options, with a wrong one as its sentence. */
export function readOrSay<T>(read: () => T): Reply<T> {
  try {
    return { ok: true, value: read() };
  } catch (error) {
    if (error instanceof WrongOption) return { ok: false, problem: error.message };
    throw error;
  }
}

export function textGiven(values: OptionValues, name: string): string | null {
  const value = values[name];
  return typeof value === 'string' ? value : null;
}

export function numberIn(text: string): number | null {
  const decimal = parseDecimal(text);
  return decimal === null ? null : Number(decimal.units) / 10 ** decimal.decimals;
}

export function oneOf<T extends string>(option: string, known: readonly T[], text: string): T {
  const found = known.find((each) => each === text);
  if (found === undefined) throw new WrongOption(`--${option} knows ${known.join(', ')}; not "${text}".`);
  return found;
}

/** One item of a list with commas, and the comma or the end behind it; in double quotes it may hold commas. */
const LIST_ITEM = /\s*(?:"((?:[^"]|"")*)"|([^",]*))\s*(,|$)/y;

/** Null and the empty text are empty lists. */
export function listOf(option: string, text: string | null): readonly string[] {
  if (text === null || text.trim() === '') return [];
  const items: string[] = [];
  LIST_ITEM.lastIndex = 0;
  for (;;) {
    const found = LIST_ITEM.exec(text);
    if (found === null)
      throw new WrongOption(`--${option} is a list with commas; a double quote in it is out of place.`);
    const [, quoted, plain = '', behind] = found;
    items.push(quoted === undefined ? plain.trim() : quoted.replaceAll('""', '"'));
    if (behind === '') return items;
  }
}
