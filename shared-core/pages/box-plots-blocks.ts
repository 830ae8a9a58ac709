import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { inSeries } from '../languages/series.ts';
import { printScore } from '../scores/printed-number.ts';
import type { BlockContext } from './block-pages.ts';
import { layHeading, layNote, type Column } from './block-text.ts';
import type { Block, TextLine } from './booklet.ts';
import { AXIS_HEIGHT, boxPlotsPicture } from './box-plots-picture.ts';
import { layFactTable, type FactTable } from './fact-table.ts';
import { fiveFacts, groupTable, quarterOf } from './group-facts.ts';
import { firstLines } from './prose.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { spokenFigure, spokenHead } from './spoken-text.ts';
import { REPEATED, type CellRole, type TextRole } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { FINE_RULE, PROSE, STRONG_RULE, TABLE_HEAD } from './type-sizes.ts';

const PITCH = 23;
const HEAD_PADDING = 3;
const GAP = 9;
const TRACE = 1e-9;
/** Share of the width that the names of the groups may take. */
const MOST_FOR_NAMES = 0.24;
/** A narrower picture has its numbers in a table below it. */
const LEAST_PICTURE = 110;
const BELOW_PICTURE = 7;
/** Left for the words below the boxes when they begin on a page. */
const CAPTION_ROOM = 24;
/** The boxes begin on the page where all of them, or this share of a page, find room. */
const MOST_OF_PAGE = 0.85;
/** Half the height of figures, in type sizes. */
const HALF_HEIGHT = 0.33;
const FIVE_TABLE = 'five numbers';

/** The boxes of all groups on one scale, each with its name before it and its five numbers behind. */
export function layBoxPlots(flow: SheetFlow, { normSet, words }: BlockContext): void {
  const { groups } = normSet;
  const scale = groups[0]?.group.table.scale;
  if (scale === undefined) return;
  const table = groupTable(FIVE_TABLE, normSet, fiveFacts(groups, words), words);
  const full = settingOf(table, flow.width, 'with-figures');
  const beside = full.picture.width >= LEAST_PICTURE;
  const setting = beside ? full : settingOf(table, flow.width, 'alone');
  const overhead = setting.headHeight + AXIS_HEIGHT;
  const onePage = overhead + groups.length * PITCH + BELOW_PICTURE + CAPTION_ROOM;
  layHeading(flow, 'boxes heading', say(words, 'pictures.boxes'), Math.min(flow.freshRoom * MOST_OF_PAGE, onePage));
  let first = 0;
  while (first < groups.length) {
    flow.need(overhead + 2 * PITCH);
    const count = Math.max(1, Math.min(groups.length - first, Math.floor((flow.room - overhead) / PITCH)));
    const some = groups.slice(first, first + count);
    const picture = {
      alt: say(words, 'pictures.box-alt', {
        list: inSeries(
          words,
          table.rows.slice(first, first + count).map(({ cells: [name = ''] }) => name),
        ),
        lowest: figure(words, printScore(scale, scale.min)),
        highest: figure(words, printScore(scale, scale.max)),
      }),
      svg: boxPlotsPicture(
        some.map(({ summary }) => summary.fiveNumbers),
        scale,
        { width: setting.picture.width, pitch: PITCH },
        words,
      ),
    };
    flow.place(
      boxBlocks(flow, table, setting, { first, count }, picture, words),
      overhead + count * PITCH + BELOW_PICTURE,
    );
    first += count;
    if (first < groups.length) flow.turn();
  }
  layNote(flow, 'boxes caption', [say(words, `pictures.box-caption-${quarterOf(groups)}s`)]);
  if (!beside) layFactTable(flow, table, words);
}

/** Names, boxes and figures side by side; lengths from the left of the page's body, in points. */
interface Setting {
  readonly width: number;
  readonly picture: { readonly x: number; readonly width: number };
  /** Of the names and, where they stand beside the boxes, of the figures. */
  readonly columns: readonly Column[];
  readonly headHeight: number;
}

function settingOf({ heads, rows }: FactTable, width: number, figures: 'with-figures' | 'alone'): Setting {
  const natural = heads.map((lines, column) =>
    Math.max(
      ...lines.map((line) => textWidth(line, 'sans-bold', TABLE_HEAD.size)),
      ...rows.map(({ cells }) => textWidth(cells[column] ?? '', 'sans', PROSE.size)),
    ),
  );
  const names = Math.min(natural[0] ?? 0, width * MOST_FOR_NAMES);
  const widths = figures === 'alone' ? [] : natural.slice(1);
  const taken = widths.reduce((sum, wide) => sum + GAP + wide, 0);
  let x = width - taken;
  const columns = widths.map((wide) => {
    const column = { x: x + GAP, width: wide };
    x += GAP + wide;
    return column;
  });
  const lines = Math.max(...heads.map((head) => head.length));
  return {
    width,
    picture: { x: names + GAP, width: width - taken - names - GAP },
    columns: [{ x: 0, width: names }, ...columns],
    headHeight: figures === 'alone' ? HEAD_PADDING : lines * TABLE_HEAD.leading + 2 * HEAD_PADDING,
  };
}

/** Some rows of the table with their boxes, where the pen of the page stands. */
function boxBlocks(
  { left, y: top }: SheetFlow,
  table: FactTable,
  { width, picture, columns, headHeight }: Setting,
  { first, count }: { readonly first: number; readonly count: number },
  drawn: { readonly alt: string; readonly svg: string },
  words: PrintWords,
): readonly Block[] {
  const alone = columns.length === 1;
  const headRule = top + headHeight;
  const height = count * PITCH + AXIS_HEIGHT;
  const rule = (y: number, weight: number): Block => ({ kind: 'rule', x: left, y, width, weight });
  const cell = (row: CellRole['row'], column: number, said: string | null): TextRole => {
    if (alone || (row === 'head' && first > 0)) return REPEATED;
    const headOf = row === 'head' ? 'column' : column === 0 ? 'row' : null;
    return { kind: 'cell', table: table.name, row, column, headOf, said };
  };
  const heads = columns.flatMap((column, index) => {
    const lines = alone ? [] : (table.heads[index] ?? []);
    return lines.map((line, place) => {
      const baseline = headRule - HEAD_PADDING - 1.5 - (lines.length - 1 - place) * TABLE_HEAD.leading;
      return textLine(line, left, column, baseline, TABLE_HEAD.size, cell('head', index, spokenHead(lines)));
    });
  });
  const rows = table.rows.slice(first, first + count).flatMap(({ cells }, index) => {
    const baseline = headRule + (index + 0.5) * PITCH + PROSE.size * HALF_HEIGHT;
    return columns.map((column, place) => {
      const text = cells[place] ?? '';
      const { lines, cut } = firstLines([{ text, face: 'sans' }], PROSE.size, column.width + TRACE, 1);
      const shown = lines[0]?.map((run) => run.text).join('') ?? '';
      const said = cut ? text : place === 0 ? null : spokenFigure(words, text);
      return textLine(shown, left, column, baseline, PROSE.size, cell(first + index, place, said));
    });
  });
  return [
    rule(top, STRONG_RULE),
    { kind: 'picture', x: left + picture.x, y: headRule, width: picture.width, height, ...drawn },
    ...heads,
    ...(alone ? [] : [rule(headRule, FINE_RULE)]),
    ...rows,
    rule(headRule + height, STRONG_RULE),
  ];
}

function textLine(
  text: string,
  left: number,
  { x, width }: Column,
  baseline: number,
  size: number,
  role: TextRole,
): TextLine {
  const bold = size === TABLE_HEAD.size;
  return {
    kind: 'text',
    x: left + x,
    baseline,
    width,
    align: x === 0 ? 'left' : 'right',
    size,
    colour: 'ink',
    runs: [{ text, face: bold ? 'sans-bold' : 'sans' }],
    role,
  };
}
