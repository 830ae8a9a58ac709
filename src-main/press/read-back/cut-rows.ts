import { figure, say, wordsOf, type PrintWords } from '../../../shared-core/languages/phrases.ts';
import { ADJUSTED_MARK } from '../../../shared-core/norms/adjustment-words.ts';
import { prints } from '../../../shared-core/norms/booklet-blocks.ts';
import type { CutRow } from '../../../shared-core/norms/cut-table.ts';
import { cutName } from '../../../shared-core/norms/cuts.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { CellComparison, CellPlace } from './cell-differences.ts';
import { EDGE, endOf, SAME_SIZE } from './column-rows.ts';
import type { PdfCell, PdfLine } from './pdf-text.ts';
import { printedCuts } from '../../../shared-core/pages/cut-scores-pages.ts';
import { squeezed, withPlainSpaces } from './read-text.ts';

interface ExpectedCut {
  readonly title: string;
  readonly score: string;
  readonly cut: string;
  /** n, rank, interval where there is one, and share, as they are printed. */
  readonly figures: readonly { readonly column: string; readonly text: string }[];
}

/** Checks off the rows of the tables of the cuts, which stand in their order over the pages. */
export class CutRows {
  readonly #normSet: NormSet;
  readonly #comparison: CellComparison;
  readonly #expected: readonly ExpectedCut[];
  /** Position of the row that is read next, and of those that were met. */
  #next = 0;
  readonly #met = new Set<number>();

  constructor(normSet: NormSet, comparison: CellComparison) {
    this.#normSet = normSet;
    this.#comparison = comparison;
    this.#expected = expectedCuts(normSet);
  }

  /** Compares the tables of cuts on a page: found by a line of heads, read downwards. */
  take(where: string, lines: readonly PdfLine[]): void {
    const words = wordsOf(this.#normSet.project);
    const columns = 1 + (this.#expected[0]?.figures.length ?? 0);
    const heads = [say(words, 'cuts.group'), say(words, 'cuts.n')].map(squeezed);
    lines.forEach(({ cells }, at) => {
      const [title, n] = cells;
      if (cells.length !== columns || title === undefined || n === undefined) return;
      const same = [title, n].filter(({ text }, index) => squeezed(text) === heads[index]).length;
      const [first] = lines[at + 1]?.cells ?? [];
      if (same > 0 && first !== undefined && Math.abs(first.left - title.left) <= EDGE) {
        this.#takeTable(where, lines.slice(at + 1), cells);
      }
    });
  }

  /** Tells the rows that no page held, where the cuts are printed. */
  finish(): void {
    if (!prints(this.#normSet.project.sheet, 'cut-scores')) return;
    this.#expected.forEach((expected, position) => {
      if (this.#met.has(position)) return;
      this.#comparison.compare(placeOf('no page', expected, 'group'), expected.title, '');
    });
  }

  #takeTable(where: string, lines: readonly PdfLine[], heads: readonly PdfCell[]): void {
    const [head, ...figures] = heads;
    const left = head?.left ?? 0;
    const edges = figures.map(({ right }) => right);
    const size = lines[0]?.cells[0]?.size ?? 0;
    let open: { readonly expected: ExpectedCut; title: string } | null = null;
    const close = (): void => {
      if (open === null) return;
      const { expected, title } = open;
      const same = squeezed(title) === squeezed(expected.title);
      this.#comparison.compare(placeOf(where, expected, 'group'), expected.title, same ? expected.title : title);
      open = null;
    };
    for (const { cells } of lines) {
      const row = titledRow(cells, left, edges, size);
      if (row === null) break;
      if (row.figures.some((text) => text !== '')) {
        close();
        const expected = this.#nextRow(row.title);
        if (expected === null) {
          const place = { where, group: row.title, score: '', column: 'cut' };
          this.#comparison.compare(place, '', row.figures.join(' '));
          continue;
        }
        expected.figures.forEach(({ column, text }, index) => {
          this.#comparison.compare(placeOf(where, expected, column), text, row.figures[index] ?? '');
        });
        open = { expected, title: row.title };
        continue;
      }
      const longer: string = `${open?.title ?? ''} ${row.title}`;
      if (open === null || !squeezed(open.expected.title).startsWith(squeezed(longer))) break;
      open.title = longer;
    }
    close();
  }

  /** The row that a title begins: the next, or a later one where those between were lost; the next for any other title. */
  #nextRow(title: string): ExpectedCut | null {
    const begins = (position: number): boolean =>
      squeezed(this.#expected[position]?.title ?? '').startsWith(squeezed(title));
    const positions = Array.from({ length: this.#expected.length - this.#next }, (_, ahead) => this.#next + ahead);
    const position = positions.find(begins) ?? this.#next;
    const expected = this.#expected[position];
    if (expected === undefined) return null;
    this.#met.add(position);
    this.#next = position + 1;
    return expected;
  }
}

function placeOf(where: string, { title, score, cut }: ExpectedCut, column: string): CellPlace {
  return { where, group: title, score, column: `${column} at the cut ${cut}` };
}

function expectedCuts(normSet: NormSet): readonly ExpectedCut[] {
  const words = wordsOf(normSet.project);
  const tables = printedCuts(normSet);
  const intervals = tables.some(({ rows }) => rows.some(({ interval }) => interval !== null));
  return tables.flatMap(({ cut, scoreText, rows }) =>
    rows.map((row) => ({
      title: row.title,
      score: scoreText,
      cut: cutName(cut),
      figures: figuresOf(row, intervals, words),
    })),
  );
}

function figuresOf(row: CutRow, intervals: boolean, words: PrintWords): ExpectedCut['figures'] {
  const printed = (text: string): string => withPlainSpaces(figure(words, text));
  const mark = row.row === null || row.row.adjusted === null ? '' : ADJUSTED_MARK;
  return [
    { column: 'n', text: printed(row.n) },
    { column: 'percentile rank', text: `${printed(row.rank)}${mark}` },
    ...(intervals ? [{ column: 'interval', text: printed(row.interval ?? '') }] : []),
    { column: 'per cent at or better', text: printed(row.shareText) },
  ];
}

/** A line of a table whose rows begin with words; null where it is none. */
function titledRow(
  cells: readonly PdfCell[],
  left: number,
  edges: readonly number[],
  size: number,
): { readonly title: string; readonly figures: readonly string[] } | null {
  const [title, ...others] = cells;
  const [firstEdge = Infinity] = edges;
  if (title === undefined || Math.abs(title.left - left) > EDGE || title.right >= firstEdge) return null;
  if (cells.some((cell) => Math.abs(cell.size - size) > SAME_SIZE)) return null;
  const figures = edges.map(() => '');
  for (const cell of others) {
    const column = edges.findIndex((right) => endOf(cell) <= right + EDGE);
    if (column < 0) return null;
    figures[column] = `${figures[column] ?? ''}${withPlainSpaces(cell.text)}`;
  }
  return { title: withPlainSpaces(title.text), figures };
}
