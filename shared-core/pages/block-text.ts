import type { SheetFlow } from './sheet-flow.ts';
import { countThatFits, heightOf, linesOf, placeLines, plainParagraphs, type LooseLine } from './text-lines.ts';
import { paragraph, type ProseRole } from './text-role.ts';
import { GUTTER, READING, type TypeSize } from './type-sizes.ts';

/** Where the text of a block stands: heads at the side where the page is wide enough for them, otherwise above it. */
export interface TextGrid {
  readonly side: Column | null;
  readonly main: Column;
}

/** A column of a page, points. */
export interface Column {
  readonly x: number;
  readonly width: number;
}

const LEAST_WIDTH_WITH_SIDE = 430;
const SIDE_SHARE = 0.24;
const WIDEST_SIDE = 150;
const WIDEST_TEXT = 390;
const BETWEEN_PARTS = 9;
const BELOW_HEAD = 1.5;
/** From a number of a list to its text, and what of it stays white. */
const HANGING = 19;
const AFTER_NUMBER = 5;
/** Of a paragraph that is divided, so many lines stand on either side. */
const KEPT_TOGETHER = 2;

export function textGrid({ left, width }: SheetFlow): TextGrid {
  if (width < LEAST_WIDTH_WITH_SIDE) return { side: null, main: { x: left, width: Math.min(width, WIDEST_TEXT) } };
  const side = Math.min(WIDEST_SIDE, width * SIDE_SHARE);
  const x = left + side + GUTTER;
  return { side: { x: left, width: side }, main: { x, width: Math.min(width - side - GUTTER, WIDEST_TEXT) } };
}

/** The grid of a numbered list: the numbers hang before the column of the text. */
export function numberedGrid(flow: SheetFlow): TextGrid {
  const { side, main } = textGrid(flow);
  const indent = side === null ? HANGING : 0;
  const x = main.x + indent;
  return { side: { x: x - HANGING, width: HANGING - AFTER_NUMBER }, main: { x, width: main.width - indent } };
}

/** A passage with its head: a heading of its own, or the first words of what it says, such as a number or a name. */
export interface TextPart {
  /** Unique in its block. */
  readonly name: string;
  readonly head: string;
  readonly headIs: 'heading' | 'words';
  readonly paragraphs: readonly string[];
}

/** Passages one below the other, over as many pages as they take. */
export function layParts(
  flow: SheetFlow,
  parts: readonly TextPart[],
  { grid = textGrid(flow), type = READING, between = BETWEEN_PARTS }: PartsLook = {},
): void {
  for (const part of parts) {
    layPart(flow, part, grid, type);
    flow.skip(between);
  }
}

export interface PartsLook {
  readonly grid?: TextGrid;
  readonly type?: TypeSize;
  /** Room between two passages, points. */
  readonly between?: number;
}

/** Paragraphs in the column of the text, without a head. */
export function layText(flow: SheetFlow, name: string, paragraphs: readonly string[], type: TypeSize = READING): void {
  const { main } = textGrid(flow);
  const lines = plainParagraphs(paragraphs, 'sans', type, main.width, name);
  if (lines.length === 0) return;
  layLines(flow, lines, type, main);
  flow.skip(BETWEEN_PARTS);
}

/** A heading within a block; it stands on the page of what follows, which takes `following` points at least. */
export function layHeading(flow: SheetFlow, name: string, text: string, following: number): void {
  const lines = linesOf(text, 'sans-bold', READING, flow.width, { kind: 'heading', level: 2, name });
  const height = heightOf(lines, READING) + 2 * BELOW_HEAD;
  flow.need(height + following);
  flow.place(placeLines(lines, READING, { x: flow.left, top: flow.y, width: flow.width }), height);
}

function layPart(flow: SheetFlow, part: TextPart, { side, main }: TextGrid, type: TypeSize): void {
  const { name, head, headIs, paragraphs } = part;
  const text = plainParagraphs(paragraphs, 'sans', type, main.width, name);
  const role: ProseRole =
    headIs === 'heading' ? { kind: 'heading', level: 2, name: `${name} head` } : paragraph(`${name} 0`);
  const headLines = linesOf(head, 'sans-bold', type, (side ?? main).width, role);
  const headHeight = heightOf(headLines, type);
  const first = heightOf(text.slice(0, leastTogether(text)), type);
  if (side === null) {
    flow.need(headHeight + BELOW_HEAD + first);
    flow.place(placeLines(headLines, type, { ...main, top: flow.y }), headHeight + BELOW_HEAD);
    layLines(flow, text, type, main);
    return;
  }
  flow.need(Math.max(headHeight, first));
  flow.place(placeLines(headLines, type, { ...side, top: flow.y }), 0);
  layLines(flow, text, type, main, headHeight);
}

/** Lines in a column, over as many pages as they take; on the first of them they take `least` points at least. */
export function layLines(
  flow: SheetFlow,
  lines: readonly LooseLine[],
  type: TypeSize,
  column: Column,
  least = 0,
): void {
  let rest = lines;
  let [minimum, turned] = [least, false];
  while (rest.length > 0) {
    const fits = countThatFits(rest, type, flow.room);
    const count = undivided(rest, fits) || (turned ? Math.max(1, fits) : 0);
    const taken = rest.slice(0, count);
    flow.place(placeLines(taken, type, { ...column, top: flow.y }), Math.max(minimum, heightOf(taken, type)));
    rest = rest.slice(count);
    minimum = 0;
    turned = rest.length > 0;
    if (turned) flow.turn();
  }
  if (lines.length === 0) flow.place([], least);
}

/** The most lines up to `fits` after which no paragraph leaves a line alone. */
function undivided(lines: readonly LooseLine[], fits: number): number {
  let count = Math.min(fits, lines.length);
  while (count > 0 && !mayDivide(lines, count)) count -= 1;
  return count;
}

/** The fewest lines that may stand at the foot of a page. */
function leastTogether(lines: readonly LooseLine[]): number {
  let count = 1;
  while (count < lines.length && !mayDivide(lines, count)) count += 1;
  return count;
}

/** Whether the page may turn behind so many lines: between paragraphs, or with enough lines of one on either side. */
function mayDivide(lines: readonly LooseLine[], count: number): boolean {
  const name = nameAt(lines, count);
  if (count >= lines.length || name !== nameAt(lines, count - 1)) return true;
  return Array.from({ length: KEPT_TOGETHER }, (_, away) => [count - 1 - away, count + away]).every((places) =>
    places.every((place) => nameAt(lines, place) === name),
  );
}

function nameAt(lines: readonly LooseLine[], place: number): string | null {
  const role = lines[place]?.role;
  return role !== undefined && 'name' in role ? role.name : null;
}
