import { say, sayInParts, wordsOf, type PrintWords } from '../../../shared-core/languages/phrases.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { tableName } from '../../../shared-core/pages/sheet-texts.ts';
import type { PdfLine, PdfPages } from './pdf-text.ts';
import { phrasePattern } from './phrase-pattern.ts';
import { squeezed } from './read-text.ts';

/** The running head stands within so many points of the first line; its own lines lie closer than so many. */
const HEAD_DEPTH = 40;
const HEAD_LEADING = 11;

/** What head and foot of a page say of its place in the booklet. */
export interface BookletPlace {
  /** Position of the group whose sheet it belongs to, and the head that says so; null for any other page. */
  readonly sheet: { readonly group: number; readonly head: string } | null;
  readonly foot: BookletFoot | null;
}

/** "page 2 of 3", and everything beside and below it. */
export interface BookletFoot {
  readonly number: string;
  readonly page: number;
  readonly pages: number;
  readonly text: string;
}

/** Reads heads and feet in the words of the project. */
export class BookletPlaces {
  readonly #words: PrintWords;
  readonly #names: readonly string[];
  readonly #table: RegExp;
  readonly #page: RegExp;

  constructor({ project, groups }: NormSet) {
    this.#words = wordsOf(project);
    this.#names = groups.map((norms, group) => tableName(project, group, norms));
    const any = { number: '0', title: '' };
    this.#table = phrasePattern(sayInParts(this.#words, 'head.table', any), { number: '\\d+' });
    const pages = sayInParts(this.#words, 'foot.page', { page: '0', pages: '0' });
    this.#page = phrasePattern(pages, { page: '\\d+', pages: '\\d+' });
  }

  of(lines: readonly PdfLine[]): BookletPlace {
    return { sheet: this.#sheetOf(lines), foot: this.#footOf(lines) };
  }

  /** A page number as it is printed. */
  pageNumber(page: number, pages: number): string {
    return say(this.#words, 'foot.page', { page: String(page), pages: String(pages) });
  }

  /** By its whole head where that is right or cut, otherwise by the number of the table in it. */
  #sheetOf(lines: readonly PdfLine[]): BookletPlace['sheet'] {
    const heads = headsOf(lines);
    for (const head of heads) {
      const group = this.#names.findIndex((name) => saysHead(name, head));
      if (group >= 0) return { group, head };
    }
    for (const head of heads) {
      const number = Number(this.#table.exec(squeezed(head))?.groups?.['number'] ?? NaN);
      if (number >= 1 && number <= this.#names.length) return { group: number - 1, head };
    }
    return null;
  }

  #footOf(lines: readonly PdfLine[]): BookletFoot | null {
    const at = lines.findLastIndex(({ cells }) => this.#page.test(squeezed(cells.at(-1)?.text ?? '')));
    const cells = lines.slice(at).flatMap((line) => line.cells);
    const number = lines[at]?.cells.at(-1);
    if (number === undefined) return null;
    const { page, pages } = this.#page.exec(squeezed(number.text))?.groups ?? {};
    const text = cells.filter((cell) => cell !== number).map((cell) => cell.text);
    return { number: number.text, page: Number(page), pages: Number(pages), text: text.join(' ') };
  }
}

/** Whether a running head says a name, whole or cut. */
export function saysHead(name: string, head: string): boolean {
  const cut = head.endsWith('…') && squeezed(name).startsWith(squeezed(head.slice(0, -1)));
  return cut || squeezed(name) === squeezed(head);
}

/** Pages as the booklet counts them: what most of its pages say. */
export function pageTotal(places: readonly BookletPlace[], pages: PdfPages): number {
  const said = places.flatMap(({ foot }) => (foot === null ? [] : [foot.pages]));
  const times = (total: number): number => said.filter((other) => other === total).length;
  return said.reduce((best, total) => (times(total) > times(best) ? total : best), said[0] ?? pages.length);
}

/** What stands at the right of the head: each line near the top with those it goes on in, which end at the same edge. */
function headsOf(lines: readonly PdfLine[]): readonly string[] {
  const top = lines[0]?.baseline ?? 0;
  return lines.flatMap((line, start) => {
    const first = line.cells.at(-1);
    if (first === undefined || top - line.baseline > HEAD_DEPTH) return [];
    const texts = [first.text];
    for (let at = start + 1; at < lines.length; at += 1) {
      const cell = lines[at]?.cells.at(-1);
      const above = lines[at - 1]?.baseline ?? 0;
      if (cell === undefined || above - cell.baseline > HEAD_LEADING || Math.abs(cell.right - first.right) > 1) break;
      texts.push(cell.text);
    }
    return [texts.join(' ')];
  });
}
