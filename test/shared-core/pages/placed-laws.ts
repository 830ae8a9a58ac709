import type {
  Booklet,
  BookletPage,
  ColumnTable,
  TableColumnBlock,
  TextLine,
} from '../../../shared-core/pages/booklet.ts';
import { tableMarks } from '../../../shared-core/pages/table-blocks.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';

const TRACE = 0.01;

export const columnsOn = (page: BookletPage): readonly TableColumnBlock[] =>
  page.blocks.filter((block) => block.kind === 'table-column');

/** The columns of rows of one table, on all pages of a booklet or of a group. */
export function columnsOf(
  { pages }: Booklet,
  table: ColumnTable,
  group: number | null = null,
): readonly TableColumnBlock[] {
  return pages
    .filter((page) => group === null || page.group === group)
    .flatMap(columnsOn)
    .filter((column) => column.table === table);
}

export const linesOn = (page: BookletPage): readonly TextLine[] =>
  page.blocks
    .flatMap((block) => (block.kind === 'table-column' ? [...tableMarks(block)] : [block]))
    .filter((mark) => mark.kind === 'text');

export const textOf = ({ runs }: TextLine): string => runs.map(({ text }) => text).join('');

export const widthOf = ({ runs, size }: TextLine): number =>
  runs.reduce((sum, { text, face }) => sum + textWidth(text, face, size), 0);

/** What of any page reaches beyond its margins, and which tables reach into the foot. */
export function frameFaults({ paper, pages }: Booklet): readonly string[] {
  return pages.flatMap((page) => {
    const left = paper.margin + (page.number % 2 === 0 ? 0 : paper.gutter);
    const right = left + paper.width - 2 * paper.margin - paper.gutter;
    const foot = Math.max(...page.blocks.flatMap((block) => (block.kind === 'rule' ? [block.y] : [])));
    const beside = (x: number, width: number): boolean => x < left - TRACE || x + width > right + TRACE;
    const tables = columnsOn(page).flatMap((column) => [
      ...(column.bottom < foot ? [] : ['a table reaches into the foot']),
      ...(column.cutRules.every((y) => y > column.headRule && y < column.bottom) ? [] : ['a rule outside its table']),
      ...tableMarks(column).flatMap((mark) => (beside(mark.x, mark.width) ? [`${mark.kind} beside the page`] : [])),
    ]);
    const lines = linesOn(page).flatMap((line) => [
      ...(widthOf(line) <= line.width + 1e-6 ? [] : [`too wide: ${textOf(line)}`]),
      ...(beside(line.x, line.width) ? [`beside the page: ${textOf(line)}`] : []),
      ...(line.baseline > paper.edge - TRACE && line.baseline < paper.height - paper.edge + TRACE
        ? []
        : [`above or below the page: ${textOf(line)}`]),
    ]);
    return [...tables, ...lines].map((fault) => `page ${page.number}: ${fault}`);
  });
}

/** Columns of rows without heads or rows, not between the lines of their neighbours, or with texts that touch. */
export function columnFaults({ pages }: Booklet): readonly string[] {
  return pages.flatMap((page) => {
    const places = new Map<string, string>();
    return columnsOn(page).flatMap((column) => {
      const place = `${column.table} ${column.top}`;
      const lines = `${column.headRule} ${column.bottom}`;
      const before = places.get(place) ?? lines;
      places.set(place, lines);
      return [
        ...(before === lines ? [] : ['not between the lines of its neighbour']),
        ...(column.rows.length > 0 ? [] : ['no row']),
        ...(column.heads.every((head) => head.lines.length > 0) ? [] : ['no head']),
        ...((column.heads.at(-1)?.right ?? 0) <= column.width + TRACE ? [] : ['wider than itself']),
        ...rowFaults(column),
        ...cellFaults(column),
      ].map((fault) => `page ${page.number}, ${column.table}: ${fault}`);
    });
  });
}

function rowFaults({ rows, headRule, bottom, size }: TableColumnBlock): readonly string[] {
  const [first, last] = [rows[0]?.baseline ?? 0, rows.at(-1)?.baseline ?? 0];
  const touching = rows.some(({ baseline }, index) => {
    const before = rows[index - 1];
    return before !== undefined && baseline - before.baseline < 1.15 * size - 1e-6;
  });
  return [
    ...(first - 0.65 * size > headRule ? [] : ['a row in the heads']),
    ...(last < bottom ? [] : ['a row below the table']),
    ...(touching ? ['rows that touch'] : []),
  ];
}

/** Every text stands between the end of the column before it and the end of its own, a mark right behind its own. */
function cellFaults(column: TableColumnBlock): readonly string[] {
  return tableMarks(column).flatMap((mark) => {
    if (mark.kind !== 'text') return [];
    const start = mark.x - column.x + (mark.align === 'left' ? 0 : mark.width - widthOf(mark));
    const end = start + widthOf(mark);
    if (textOf(mark) === '†') {
      return column.heads.some((head) => Math.abs(head.right - start) < 1e-6) ? [] : ['a mark without its rank'];
    }
    const at = column.heads.findIndex((head) => end <= head.right + 1e-6);
    const free = at >= 0 && start >= (column.heads[at - 1]?.right ?? 0) - 1e-6;
    return free ? [] : [`touches another column: ${textOf(mark)}`];
  });
}

/** Every cell of a table that is its own, by row and column; throws where one stands twice. */
export function cellsOf(columns: readonly TableColumnBlock[]): ReadonlyMap<string, string> {
  const cells = new Map<string, string>();
  for (const { heads, rows } of columns) {
    for (const { row, cells: printed } of rows) {
      printed.forEach(({ text, marked }, index) => {
        const head = heads[index];
        if (head === undefined) throw new Error('a cell without a head');
        if (head.repeated === 'column' || text === '') return;
        const place = `${row} ${head.column}`;
        const before = cells.get(place);
        if (before !== undefined && head.column > 0) throw new Error(`${place} stands twice`);
        cells.set(place, before === undefined ? `${text}${marked ? '†' : ''}` : `${before} ${text}`);
      });
    }
  }
  return cells;
}
