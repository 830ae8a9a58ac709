import { wordsOf } from '../../../shared-core/languages/phrases.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../../shared-core/norms/table-columns.ts';
import { markedText } from '../../../shared-core/pages/sheet-texts.ts';
import { bookletTables } from './booklet-tables.ts';
import type { CellComparison } from './cell-differences.ts';
import { inverseOn } from './inverse-strips.ts';
import type { PdfLine } from './pdf-text.ts';
import { withPlainSpaces } from './plain-spaces.ts';

/** Checks off the rows of all groups, page by page. */
export class BookletRows {
  readonly #normSet: NormSet;
  readonly #comparison: CellComparison;
  /** Scores, and percentiles of the inverse table, in the order they were met, by group. */
  readonly #scores: string[][];
  readonly #percentiles: string[][];

  constructor(normSet: NormSet, comparison: CellComparison) {
    this.#normSet = normSet;
    this.#comparison = comparison;
    this.#scores = normSet.groups.map(() => []);
    this.#percentiles = normSet.groups.map(() => []);
  }

  /** Compares the tables on a page of a group. */
  take(group: number, where: string, lines: readonly PdfLine[]): void {
    const columns = tableColumns(this.#normSet.project);
    for (const { heads, rows } of bookletTables(lines, columns)) {
      heads.forEach((found, index) => {
        const column = columns[index % columns.length];
        if (column === undefined) return;
        const place = { where, group: this.#title(group), score: '', column: `heading of ${column.name}` };
        this.#comparison.compare(place, column.heading.join(' '), found);
      });
      for (const cells of rows) this.#takeRow(group, where, cells);
    }
    for (const { percentile, score } of inverseOn(lines)) this.#takePercentile(group, where, percentile, score);
  }

  /** Tells the rows that no page held, and those out of order. */
  finish(): void {
    this.#normSet.groups.forEach(({ rows, inverse }, group) => {
      const scores = this.#scores[group] ?? [];
      const met = new Set(scores);
      const place = { where: 'no page', group: this.#title(group) };
      for (const { scoreText } of rows) {
        if (met.has(scoreText)) continue;
        this.#comparison.compare({ ...place, score: scoreText, column: 'raw score' }, scoreText, '');
      }
      const expected = rows.map(({ scoreText }) => scoreText).filter((score) => met.has(score));
      const swapped = [...met].findIndex((score, index) => score !== expected[index]);
      if (swapped >= 0) {
        const [wanted = '', found = ''] = [expected[swapped], [...met][swapped]];
        this.#comparison.compare(
          { where: 'order of rows', group: this.#title(group), score: wanted, column: 'raw score' },
          wanted,
          found,
        );
      }
      if (!this.#normSet.project.sheet.inverse) return;
      const listed = new Set(this.#percentiles[group]);
      for (const { percentile } of inverse) {
        if (listed.has(String(percentile))) continue;
        this.#comparison.compare({ ...place, score: '', column: `percentile ${percentile}` }, String(percentile), '');
      }
    });
  }

  #takeRow(group: number, where: string, cells: readonly string[]): void {
    const columns = tableColumns(this.#normSet.project);
    const [score = ''] = cells;
    const place = { where, group: this.#title(group), score };
    const row = this.#normSet.groups[group]?.rows.find(({ scoreText }) => scoreText === score);
    if (row === undefined) {
      this.#comparison.compare({ ...place, column: 'raw score' }, '', score || cells.join(' '));
      return;
    }
    if (this.#scores[group]?.includes(score) === true) {
      this.#comparison.compare({ ...place, column: 'raw score' }, '', `${score}, a second time`);
      return;
    }
    this.#scores[group]?.push(score);
    columns.forEach((column, index) => {
      const expected = withPlainSpaces(markedText(wordsOf(this.#normSet.project), row, column));
      this.#comparison.compare({ ...place, column: column.name }, expected, cells[index] ?? '');
    });
  }

  #takePercentile(group: number, where: string, percentile: string, score: string): void {
    const column = `percentile ${percentile}`;
    const place = { where, group: this.#title(group), score: '', column };
    const row = this.#normSet.groups[group]?.inverse.find((listed) => String(listed.percentile) === percentile);
    this.#percentiles[group]?.push(percentile);
    this.#comparison.compare(place, row?.scoreText ?? '', score);
  }

  #title(group: number): string {
    return this.#normSet.groups[group]?.group.title ?? '';
  }
}
