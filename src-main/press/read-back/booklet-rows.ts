import { figure, wordsOf, type PrintWords } from '../../../shared-core/languages/phrases.ts';
import { prints } from '../../../shared-core/norms/booklet-blocks.ts';
import { cutStarts } from '../../../shared-core/norms/cuts.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { tableColumns, type TableColumn } from '../../../shared-core/norms/table-columns.ts';
import { markedText } from '../../../shared-core/pages/sheet-texts.ts';
import { bookletTables } from './booklet-tables.ts';
import type { CellComparison, CellPlace } from './cell-differences.ts';
import { rowReach } from './column-rows.ts';
import { inverseOn } from './inverse-strips.ts';
import type { PdfLine } from './pdf-text.ts';
import { withPlainSpaces } from './read-text.ts';
import { PrintedScores } from './printed-scores.ts';

/** Checks off the rows of the sheets of all groups, page by page. */
export class BookletRows {
  readonly #normSet: NormSet;
  readonly #comparison: CellComparison;
  readonly #words: PrintWords;
  /** As they are printed, and as differences name them. */
  readonly #columns: readonly { readonly printed: TableColumn; readonly name: string }[];
  readonly #printed: readonly PrintedScores[];
  /** Positions of scores, and percentiles of the inverse table, in the order they were met, by group. */
  readonly #scores: number[][];
  readonly #percentiles: string[][];

  constructor(normSet: NormSet, comparison: CellComparison) {
    const { project, groups } = normSet;
    this.#normSet = normSet;
    this.#comparison = comparison;
    this.#words = wordsOf(project);
    const names = tableColumns(project);
    this.#columns = tableColumns(project, this.#words).map((printed, index) => ({
      printed,
      name: names[index]?.name ?? printed.name,
    }));
    this.#printed = groups.map(({ rows }) => new PrintedScores(rows, this.#words));
    this.#scores = groups.map(() => []);
    this.#percentiles = groups.map(() => []);
  }

  /** Compares the tables on a page of a group. */
  take(group: number, where: string, lines: readonly PdfLine[]): void {
    const printed = this.#columns.map((column) => column.printed);
    for (const { heads, rows } of bookletTables(lines, printed, rowReach(this.#normSet.project.sheet))) {
      heads.forEach((found, index) => {
        const column = this.#columns[index % this.#columns.length];
        if (column === undefined) return;
        const place = { where, group: this.#title(group), score: '', column: `heading of ${column.name}` };
        this.#comparison.compare(place, withPlainSpaces(column.printed.heading.join(' ')), found);
      });
      for (const cells of rows) this.#takeRow(group, where, cells);
    }
    for (const { percentile, score } of inverseOn(lines, this.#words)) {
      this.#takePercentile(group, where, percentile, score);
    }
  }

  /** Tells the rows that no page held, and those out of order; nothing where the tables are not printed. */
  finish(): void {
    const { sheet } = this.#normSet.project;
    if (!prints(sheet, 'tables') && sheet.blocks.some(({ printed }) => printed)) return;
    this.#normSet.groups.forEach(({ rows, inverse }, group) => {
      const scores = this.#scores[group] ?? [];
      const met = new Set(scores);
      const textAt = (position = -1): string => rows[position]?.scoreText ?? '';
      const place = { where: 'no page', group: this.#title(group) };
      for (const position of rows.keys()) {
        if (met.has(position)) continue;
        const text = textAt(position);
        this.#comparison.compare({ ...place, score: text, column: 'raw score' }, text, '');
      }
      const expected = [...met].sort((left, right) => left - right);
      const swapped = scores.findIndex((position, index) => position !== expected[index]);
      if (swapped >= 0) {
        const [wanted, found] = [textAt(expected[swapped]), textAt(scores[swapped])];
        this.#comparison.compare(
          { where: 'order of rows', group: this.#title(group), score: wanted, column: 'raw score' },
          wanted,
          found,
        );
      }
      if (!sheet.inverse) return;
      const listed = new Set(this.#percentiles[group]);
      for (const { percentile } of inverse) {
        if (listed.has(String(percentile))) continue;
        this.#comparison.compare({ ...place, score: '', column: `percentile ${percentile}` }, String(percentile), '');
      }
    });
  }

  #takeRow(group: number, where: string, cells: readonly string[]): void {
    const [text = ''] = cells;
    const place = { where, group: this.#title(group), score: text, column: 'raw score' };
    const found = this.#printed[group]?.read(text) ?? null;
    if (found === null) {
      this.#comparison.compare(place, '', text || cells.join(' '));
      return;
    }
    if (found.first < found.last) this.#checkRange(group, place, found);
    for (let position = found.first; position <= found.last; position += 1) {
      this.#takeScore(group, position, place, cells);
    }
  }

  /** Whether scores may stand in one row: where the sheet has ranges, and on one side of each cut. */
  #checkRange(
    group: number,
    place: CellPlace,
    { first, last }: { readonly first: number; readonly last: number },
  ): void {
    const { project, groups } = this.#normSet;
    const norms = groups[group];
    if (norms === undefined) return;
    const starts = cutStarts(project, norms.group.key, norms.group.table.scale);
    const cut = [...starts].find((start) => start > first && start <= last);
    if (!project.sheet.rangeRows || cut !== undefined) {
      this.#comparison.compare(place, norms.rows[first]?.scoreText ?? '', place.score);
    }
  }

  #takeScore(group: number, position: number, place: CellPlace, cells: readonly string[]): void {
    const row = this.#normSet.groups[group]?.rows[position];
    const met = this.#scores[group];
    if (row === undefined || met === undefined) return;
    if (met.includes(position)) {
      this.#comparison.compare({ ...place, score: row.scoreText }, '', `${place.score}, a second time`);
      return;
    }
    met.push(position);
    this.#columns.forEach(({ printed, name }, index) => {
      const score = printed.key === 'score';
      const expected = score ? place.score : withPlainSpaces(markedText(this.#words, row, printed));
      this.#comparison.compare({ ...place, score: row.scoreText, column: name }, expected, cells[index] ?? '');
    });
  }

  #takePercentile(group: number, where: string, percentile: string, score: string): void {
    const column = `percentile ${percentile}`;
    const place = { where, group: this.#title(group), score: '', column };
    const row = this.#normSet.groups[group]?.inverse.find((listed) => String(listed.percentile) === percentile);
    this.#percentiles[group]?.push(percentile);
    this.#comparison.compare(place, row === undefined ? '' : this.#figure(row.scoreText), score);
  }

  #figure(text: string): string {
    return withPlainSpaces(figure(this.#words, text));
  }

  #title(group: number): string {
    return this.#normSet.groups[group]?.group.title ?? '';
  }
}
