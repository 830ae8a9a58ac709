import { figure, type PrintWords } from '../../../shared-core/languages/phrases.ts';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import { RANGE_DASH } from '../../../shared-core/pages/range-cell.ts';
import { withPlainSpaces } from './read-text.ts';

/** The scores of a scale as a booklet prints them: single, and as the ends of a row that stands for several. */
export class PrintedScores {
  readonly #positions: ReadonlyMap<string, number>;

  constructor(rows: readonly ConversionRow[], words: PrintWords) {
    const printed = rows.map(({ scoreText }) => withPlainSpaces(figure(words, scoreText)));
    this.#positions = new Map(printed.map((text, position) => [text, position]));
  }

  /** Positions (0 = lowest) of the first and the last score that a printed text stands for; null where it is no score. */
  read(text: string): { readonly first: number; readonly last: number } | null {
    const single = this.#positions.get(text);
    if (single !== undefined) return { first: single, last: single };
    for (let at = text.indexOf(RANGE_DASH); at >= 0; at = text.indexOf(RANGE_DASH, at + 1)) {
      const first = this.#positions.get(text.slice(0, at));
      const last = this.#positions.get(text.slice(at + RANGE_DASH.length));
      if (first !== undefined && last !== undefined && first < last) return { first, last };
    }
    return null;
  }
}
