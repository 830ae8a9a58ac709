import { layHeading } from './block-text.ts';
import { layRowTable, placeRowTable, type RowTable, type RowTableCell, type RowTableColumn } from './row-table.ts';
import { measureRowTable, type MeasuredRowTable } from './row-table-measure.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, placeLines, type LooseLine } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { PROSE, READING, SMALL_PROSE } from './type-sizes.ts';

/** Above a section of the class in numbers, points. */
export const BETWEEN_SECTIONS = 19;
const BELOW_HEADING = 4;
const BELOW_TABLE = 4;

/** A column of a table of a section. */
export function column(
  heading: string,
  kind: RowTableColumn['kind'],
  texts: readonly string[],
  saidOf: (text: string) => string | null = () => null,
): RowTableColumn {
  return {
    heading: heading.split('\n'),
    kind,
    bold: false,
    cells: texts.map((text): RowTableCell => ({ text, said: saidOf(text) })),
  };
}

/** A table of names and figures. */
export function namedFigures(
  name: string,
  heads: readonly [string, string],
  rows: readonly (readonly [string, string])[],
): RowTable {
  const texts = (place: 0 | 1): readonly string[] => rows.map((row) => row[place]);
  return {
    name,
    fives: false,
    columns: [column(heads[0], 'words', texts(0)), column(heads[1], 'figures', texts(1))],
    chart: null,
  };
}

/** A small table fitted to a width that is known to be enough. */
export function fitted(table: RowTable, width: number): MeasuredRowTable {
  const measure = measureRowTable(table, width);
  if (measure === null) throw new RangeError(`the table ${table.name} does not fit the page`);
  return measure;
}

/** A heading, a table and what is said of it. */
export function laySection(
  flow: SheetFlow,
  table: RowTable,
  {
    heading,
    caption,
    width = flow.width,
  }: { readonly heading: string; readonly caption: string; readonly width?: number },
): void {
  flow.skip(BETWEEN_SECTIONS);
  const measure = fitted(table, width);
  const lines = captionLines(flow, table.name, caption);
  const { height } = placeRowTable(table, measure, { x: 0, top: 0 });
  const below = BELOW_TABLE + heightOf(lines, SMALL_PROSE);
  layHeading(flow, `${table.name} heading`, heading, Math.min(height + below, flow.freshRoom / 2));
  layRowTable(flow, table, measure);
  flow.skip(BELOW_TABLE);
  placeCaption(flow, lines);
}

/** Two small tables beside each other, each under its heading. */
export function laySideBySide(
  flow: SheetFlow,
  sections: readonly { readonly heading: string; readonly table: RowTable }[],
): void {
  const placed = sections.map(({ heading, table }) => {
    const role = { kind: 'heading', level: 2, name: `${table.name} heading` } as const;
    const lines = linesOf(heading, 'sans-bold', READING, flow.halfWidth, role);
    const measure = fitted(table, flow.halfWidth);
    const headed = heightOf(lines, READING) + BELOW_HEADING;
    return { lines, table, measure, headed, height: headed + placeRowTable(table, measure, { x: 0, top: 0 }).height };
  });
  const height = Math.max(...placed.map((each) => each.height));
  flow.need(height);
  const top = flow.y;
  placed.forEach(({ lines, table, measure, headed }, index) => {
    const x = index === 0 ? flow.left : flow.rightHalf;
    flow.place(
      [
        ...placeLines(lines, READING, { x, top, width: flow.halfWidth }),
        ...placeRowTable(table, measure, { x, top: top + headed }).blocks,
      ],
      0,
    );
  });
  flow.place([], height);
}

export function captionLines(flow: SheetFlow, name: string, text: string): readonly LooseLine[] {
  return linesOf(text, 'sans', SMALL_PROSE, flow.width, paragraph(`${name} caption`));
}

export function placeCaption(flow: SheetFlow, lines: readonly LooseLine[]): void {
  const height = heightOf(lines, SMALL_PROSE);
  flow.need(height);
  flow.place(placeLines(lines, SMALL_PROSE, { x: flow.left, top: flow.y, width: flow.width }), height);
}

/** A paragraph across the page. */
export function layAcross(flow: SheetFlow, name: string, text: string): void {
  const lines = linesOf(text, 'sans', PROSE, flow.width, paragraph(name));
  const height = heightOf(lines, PROSE);
  flow.need(height);
  flow.place(placeLines(lines, PROSE, { x: flow.left, top: flow.y, width: flow.width }), height);
}
