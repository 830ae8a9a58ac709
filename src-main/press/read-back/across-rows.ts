import { figure, wordsOf } from '../../../shared-core/languages/phrases.ts';
import { prints, type BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { rankColumn, scoreColumn } from '../../../shared-core/norms/table-columns.ts';
import type { AcrossGroup } from '../../../shared-core/pages/across-table.ts';
import { groupHeads } from '../../../shared-core/pages/groups-across-pages.ts';
import { markedText } from '../../../shared-core/pages/sheet-texts.ts';
import { acrossTables, type AcrossColumns } from './across-tables.ts';
import type { CellComparison, CellPlace } from './cell-differences.ts';
import { rowReach } from './column-rows.ts';
import type { PdfLine } from './pdf-text.ts';
import { squeezed, withPlainSpaces } from './read-text.ts';

/** What a table with the groups across prints, straight from the norm set. */
interface AcrossExpected {
  readonly kind: BlockKind;
  /** The last line above the heads of its rows. */
  readonly rowHead: string;
  readonly rows: readonly ExpectedRow[];
}

interface ExpectedRow {
  /** Raw score, for the rows that have one, and the column, as differences name them. */
  readonly score: string;
  readonly column: string;
  readonly head: string;
  /** One text for each group. */
  readonly cells: readonly string[];
}

/** All groups side by side: raw scores down, percentile ranks in the cells. */
export function groupsAcrossExpected({ project, groups }: NormSet): AcrossExpected {
  const words = wordsOf(project);
  const rank = rankColumn(words);
  return {
    kind: 'groups-across',
    rowHead: scoreColumn(words).heading.at(-1) ?? '',
    rows: (groups[0]?.rows ?? []).map(({ scoreText }, position) => ({
      score: scoreText,
      column: 'percentile rank beside other groups',
      head: withPlainSpaces(figure(words, scoreText)),
      cells: groups.map(({ rows }) => {
        const row = rows[position];
        return row === undefined ? '' : withPlainSpaces(markedText(words, row, rank));
      }),
    })),
  };
}

/** All groups side by side: percentile ranks down, raw scores in the cells. */
export function inverseAcrossExpected({ project, groups }: NormSet): AcrossExpected {
  const words = wordsOf(project);
  return {
    kind: 'inverse',
    rowHead: rankColumn(words).heading.at(-1) ?? '',
    rows: (groups[0]?.inverse ?? []).map(({ percentile }, position) => ({
      score: '',
      column: `percentile ${percentile} beside other groups`,
      head: withPlainSpaces(figure(words, String(percentile))),
      cells: groups.map(({ inverse }) => withPlainSpaces(figure(words, inverse[position]?.scoreText ?? ''))),
    })),
  };
}

/** Checks off the cells of a table with the groups across, page by page and part by part. */
export class AcrossRows {
  readonly #normSet: NormSet;
  readonly #comparison: CellComparison;
  readonly #expected: AcrossExpected;
  readonly #groups: readonly AcrossGroup[];
  /** Cells that were met: row and group. */
  readonly #met = new Set<string>();

  constructor(normSet: NormSet, comparison: CellComparison, expected: AcrossExpected) {
    this.#normSet = normSet;
    this.#comparison = comparison;
    this.#expected = expected;
    this.#groups = groupHeads(normSet, wordsOf(normSet.project));
  }

  /** Compares the columns of the table on a page. */
  take(where: string, lines: readonly PdfLine[]): void {
    const notes = new Set(this.#groups.map(({ note }) => squeezed(note)));
    const heads = { rowHead: this.#expected.rowHead, isNote: (text: string) => notes.has(text) };
    for (const columns of acrossTables(lines, heads, rowReach(this.#normSet.project.sheet))) {
      const first = this.#firstGroup(columns);
      this.#takeHeads(where, first, columns);
      for (const row of columns.rows) this.#takeRow(where, first, row);
    }
  }

  /** Tells the cells that no page held, where the table is printed. */
  finish(): void {
    if (!prints(this.#normSet.project.sheet, this.#expected.kind)) return;
    this.#expected.rows.forEach(({ cells }, row) => {
      cells.forEach((text, group) => {
        if (!this.#met.has(`${row} ${group}`)) this.#comparison.compare(this.#place('no page', row, group), text, '');
      });
    });
  }

  /** Groups stand in their order: which of them begins the columns, by what most of their heads say. */
  #firstGroup({ heads }: AcrossColumns): number {
    const votes = heads.flatMap(({ title, note }, column) =>
      this.#groups.flatMap((group, index) => {
        const same = saysTitle(group.title, title);
        return [...(same ? [index - column] : []), ...(same && squeezed(group.note) === note ? [index - column] : [])];
      }),
    );
    const times = (vote: number): number => votes.filter((other) => other === vote).length;
    const [first = 0, ...others] = votes;
    return Math.max(
      0,
      others.reduce((best, vote) => (times(vote) > times(best) ? vote : best), first),
    );
  }

  #takeHeads(where: string, first: number, { heads }: AcrossColumns): void {
    heads.forEach(({ title, note }, column) => {
      const group = this.#groups[first + column];
      const place = { where, group: group?.title ?? '', score: '', column: 'heading of the group' };
      if (group === undefined) {
        this.#comparison.compare(place, '', `${title} ${note}`);
        return;
      }
      this.#comparison.compare(place, group.title, saysTitle(group.title, title) ? group.title : title);
      const number = { ...place, column: 'n of the group' };
      this.#comparison.compare(number, withPlainSpaces(group.note), this.#noteAs(group.note, note));
    });
  }

  /** A note that was read without spaces, with those of the expected one where it is the same. */
  #noteAs(expected: string, found: string): string {
    return squeezed(expected) === found ? withPlainSpaces(expected) : found;
  }

  #takeRow(where: string, first: number, { head, cells, again }: AcrossColumns['rows'][number]): void {
    const row = this.#expected.rows.findIndex((each) => each.head === head);
    if (row < 0) {
      const place = { where, group: '', score: head, column: 'head of the row' };
      this.#comparison.compare(place, '', head || cells.join(' '));
      return;
    }
    cells.forEach((found, column) => {
      const group = first + column;
      const key = `${row} ${group}`;
      const place = this.#place(where, row, group);
      if (this.#met.has(key)) {
        this.#comparison.compare(place, '', `${found}, a second time`);
        return;
      }
      this.#met.add(key);
      this.#comparison.compare(place, this.#expected.rows[row]?.cells[group] ?? '', found);
    });
    if (again === null) return;
    this.#comparison.compare({ ...this.#place(where, row, -1), column: 'head of the row, at the right' }, head, again);
  }

  #place(where: string, row: number, group: number): CellPlace {
    const { score = '', column = '' } = this.#expected.rows[row] ?? {};
    return { where, group: this.#groups[group]?.title ?? '', score, column };
  }
}

/** Whether a head that was read without spaces is a title, whole or cut. */
function saysTitle(title: string, found: string): boolean {
  const whole = squeezed(title);
  return whole === found || (found.endsWith('…') && whole.startsWith(found.slice(0, -1)));
}
