/** Distinct texts remembered by one memo; later ones are worked out anew each time. */
const MAX_REMEMBERED = 20_000;

/**
 * A copy that does not keep the text it was cut from in memory: engines let a part of a long text share its storage, so
 * that one remembered cell could hold a whole block of the file.
 */
export function ownCopy(text: string): string {
  return ` ${text}`.slice(1);
}

/** Remembers what a text comes to, for a bounded number of distinct texts. */
export class TextMemo<T> {
  private readonly known = new Map<string, T>();

  constructor(private readonly workOut: (text: string) => T) {}

  get(text: string): T {
    const known = this.known.get(text);
    if (known !== undefined) return known;
    const value = this.workOut(text);
    if (this.known.size < MAX_REMEMBERED) this.known.set(ownCopy(text), value);
    return value;
  }
}

/** Numbers the values of one column as they come; blank values have number 0. */
export class ValueNumbers {
  readonly values: string[] = [''];
  private readonly numbers = new Map<string, number>([['', 0]]);
  private readonly memo = new TextMemo((text) => this.numberOfTrimmed(text.trim()));

  numberOf(text: string): number {
    return this.memo.get(text);
  }

  private numberOfTrimmed(text: string): number {
    const known = this.numbers.get(text);
    if (known !== undefined) return known;
    const value = ownCopy(text);
    const number = this.values.length;
    this.values.push(value);
    this.numbers.set(value, number);
    return number;
  }
}
