import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import type { SheetChoices } from '../norms/norm-project.ts';
import type { AcrossSpan, AcrossTable } from './across-table.ts';
import { headRoom, leastGap, placedHeads, roomOf, sharedGap, type NaturalColumn } from './column-widths.ts';
import { firstLines } from './prose.ts';
import type { TableMeasure } from './table-measure.ts';
import { chosenType, type TableType } from './table-type.ts';
import { textWidth } from './text-width.ts';
import { GUTTER, TABLE_HEAD } from './type-sizes.ts';

/** Neighbouring groups that stand side by side in the width of the page. */
export interface AcrossPart {
  readonly span: AcrossSpan;
  readonly measure: TableMeasure;
}

export interface AcrossMeasure {
  readonly parts: readonly AcrossPart[];
  /** True where a title needs more lines than a head has. */
  readonly shortened: boolean;
}

/** From so many groups on, the heads of the rows stand at the right edge once more. */
const FEWEST_WITH_BOTH_EDGES = 8;
/** Room that a long word, and a long title, may claim in heads of the usual size, points. */
const WIDEST_WORD = 52;
const WIDEST_HEAD = 78;
const MOST_HEAD_LINES = 8;

/**
 * Sets the groups side by side in a width of so many points; where they do not all fit, in parts of about equal size.
 * All columns of groups are of one width. With `columns` above 1, that many columns of rows stand side by side; null
 * where they do not fit.
 */
export function measureAcross(
  table: AcrossTable,
  sheet: SheetChoices,
  pageWidth: number,
  columns: number,
): AcrossMeasure | null {
  const rooms = roomsOf(table, chosenType(sheet));
  const width = (pageWidth - (columns - 1) * GUTTER) / columns;
  const count = table.groups.length;
  const side = fitting(rooms, width, 1);
  if (columns > 1 && side < count) return null;
  const fewer = groupsInPart(count, Math.max(1, side));
  const edges = fewer < FEWEST_WITH_BOTH_EDGES ? 1 : 2;
  const inPart = edges === 1 ? fewer : groupsInPart(count, Math.max(1, fitting(rooms, width, 2)));
  if (columns > 1 && inPart < count) return null;
  const most = (width - rooms.behind - edgeRoom(rooms, edges)) / inPart - rooms.gap;
  const { heads, shortened } = groupHeads(table, rooms, most);
  const spans = Array.from({ length: Math.ceil(count / inPart) }, (_, part): AcrossSpan => {
    const first = part * inPart;
    return { first, count: Math.min(inPart, count - first), bothEdges: edges === 2 };
  });
  const natural = spans.map((span) => columnsOf(table, rooms, heads, span));
  const gap = sharedGap(natural[0] ?? [], rooms.type, { width, alone: columns === 1, behind: rooms.behind });
  return {
    shortened,
    parts: spans.map((span, part) => ({
      span,
      measure: { columns, type: rooms.type, ...placedHeads(natural[part] ?? [], gap, rooms.behind) },
    })),
  };
}

/** Room that the parts of the table take in the chosen type, points. */
interface Rooms {
  readonly type: TableType;
  readonly rowHeads: number;
  /** The least room of a column of a group. */
  readonly group: number;
  readonly gap: number;
  /** Kept free for a mark that hangs behind the last column. */
  readonly behind: number;
}

function roomsOf({ rowHead, rows, groups }: AcrossTable, type: TableType): Rooms {
  const { size } = type.row;
  const cells = rows.flatMap((row) => row.cells);
  const texts = (face: 'sans' | 'sans-bold', all: readonly string[]): number => roomOf(all, face, size, false).width;
  const words = groups.flatMap(({ title }) => title.split(' ').map((word) => headRoom([word], '', type)));
  const notes = groups.map(({ note }) => headRoom([], note, type));
  return {
    type,
    rowHeads: Math.max(
      texts(
        'sans-bold',
        rows.map(({ head }) => head.text),
      ),
      headRoom(rowHead, '', type),
    ),
    group: Math.max(
      texts(
        'sans',
        cells.map(({ text }) => text),
      ),
      Math.min(Math.max(...words), inHeads(WIDEST_WORD, type)),
      ...notes,
    ),
    gap: leastGap(type),
    behind: cells.some(({ marked }) => marked) ? textWidth(ADJUSTED_MARK, 'sans', size) : 0,
  };
}

function inHeads(usual: number, { head }: TableType): number {
  return (usual * head.size) / TABLE_HEAD.size;
}

/** How many groups stand beside one or two columns of heads of rows: 0 where the width is too small for one. */
function fitting(rooms: Rooms, width: number, edges: number): number {
  const { group, gap, behind } = rooms;
  return Math.max(0, Math.floor((width - behind - edgeRoom(rooms, edges)) / (group + gap)));
}

/** Room of the heads of rows; those at the right edge stand off the last group. */
function edgeRoom({ rowHeads, gap }: Rooms, edges: number): number {
  return edges * (rowHeads + gap) + (edges - 1) * gap;
}

/** Groups in each part but perhaps the last, so that parts are about equal. */
function groupsInPart(groups: number, fitting: number): number {
  return Math.ceil(groups / Math.ceil(groups / fitting));
}

interface GroupHeads {
  /** Lines of each title, and the room that a column has. */
  readonly heads: { readonly lines: readonly (readonly string[])[]; readonly room: number };
  readonly shortened: boolean;
}

/** Titles broken to the room that there is, up to `most` points. */
function groupHeads({ groups }: AcrossTable, { type, group }: Rooms, most: number): GroupHeads {
  const room = Math.max(group, Math.min(most, inHeads(WIDEST_HEAD, type)));
  const broken = groups.map(({ title }) =>
    firstLines([{ text: title, face: 'sans-bold' }], type.head.size, room, MOST_HEAD_LINES),
  );
  const lines = broken.map((each) => each.lines.map((runs) => runs.map(({ text }) => text).join('')));
  return {
    heads: { lines, room: Math.max(group, ...lines.map((each) => headRoom(each, '', type))) },
    shortened: broken.some(({ cut }) => cut),
  };
}

function columnsOf(
  { rowHead, groups }: AcrossTable,
  { rowHeads, gap }: Rooms,
  { lines, room }: GroupHeads['heads'],
  { first, count, bothEdges }: AcrossSpan,
): readonly NaturalColumn[] {
  const plain = { note: '', said: null, align: 'right', range: null } as const;
  const edge = (again: boolean, width: number): NaturalColumn => ({
    width,
    head: { ...plain, column: 0, lines: rowHead, repeated: again ? 'column' : 'nothing' },
  });
  const middle = groups.slice(first, first + count).map(({ title, note }, index): NaturalColumn => {
    const said = `${title}, ${note.replaceAll('\u202f', '')}`;
    const head = { column: 1 + first + index, lines: lines[first + index] ?? [], note, said };
    return { width: room, head: { ...plain, ...head, repeated: 'nothing' } };
  });
  return [edge(first > 0, rowHeads), ...middle, ...(bothEdges ? [edge(true, rowHeads + gap)] : [])];
}
