import { bandLine } from './band-chart-picture.ts';
import type { Block, TextLine } from './booklet.ts';
import type { SlipFact, SlipPassage, SlipTexts } from './slip-texts.ts';
import { heightOf, linesOf, placeLines, plainParagraphs, type LooseLine } from './text-lines.ts';
import { paragraph, type CellRole, type TextRole } from './text-role.ts';
import { textWidth, type FontFace } from './text-width.ts';
import { FINE_RULE, GUTTER, type TypeSize } from './type-sizes.ts';

/** Where a slip stands on its page, points; nothing of it is drawn outside. */
export interface SlipBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Sizes of the type of a slip, all from the size of its sentences in points. */
interface SlipType {
  readonly text: TypeSize;
  readonly name: TypeSize;
  readonly test: TypeSize;
  readonly figure: TypeSize;
  readonly small: TypeSize;
}

/** A slip in a box wider than this many type sizes has its sentences in two columns. */
const WIDE = 46;
/** Longest line of sentences in one column, in type sizes. */
const WIDEST_TEXT = 38;
const LEADING = 1.34;

function typeOf(size: number): SlipType {
  const type = (share: number, leading = LEADING): TypeSize => ({
    size: size * share,
    leading: size * share * leading,
  });
  return {
    text: type(1),
    name: type(1.65, 1.2),
    test: type(1.02, 1.25),
    figure: type(1.6, 1.2),
    small: type(0.82, 1.28),
  };
}

/** The slip in its box with sentences of a size, in points; null where it does not fit whole. `key` is unique to it. */
export function placeSlip(texts: SlipTexts, key: string, box: SlipBox, size: number): readonly Block[] | null {
  const type = typeOf(size);
  const wide = box.width > WIDE * size;
  const pen = new SlipPen(box, key);
  if (wide) placeWide(pen, texts, type);
  else placeNarrow(pen, texts, type);
  const foot = linesOf(texts.foot, 'sans', type.small, box.width, paragraph(`${key} foot`));
  const footTop = box.y + box.height - heightOf(foot, type.small);
  if (pen.y + size * 0.6 > footTop) return null;
  return [...pen.blocks, ...placeLines(foot, type.small, { x: box.x, top: footTop, width: box.width, colour: 'soft' })];
}

/** Goes down a slip, or down one column of it. */
class SlipPen {
  readonly blocks: Block[] = [];
  y: number;
  readonly x: number;
  readonly width: number;
  readonly key: string;

  constructor({ x, y, width }: Omit<SlipBox, 'height'>, key: string) {
    [this.x, this.y, this.width, this.key] = [x, y, width, key];
  }

  lines(lines: readonly LooseLine[], type: TypeSize): void {
    this.blocks.push(...placeLines(lines, type, { x: this.x, top: this.y, width: this.width }));
    this.y += heightOf(lines, type);
  }

  text(text: string, face: FontFace, type: TypeSize, role: TextRole): void {
    this.lines(linesOf(text, face, type, this.width, role), type);
  }

  passage(name: string, { head, paragraphs }: SlipPassage, { text }: SlipType): void {
    this.text(head, 'sans-bold', text, { kind: 'heading', level: 2, name: `${this.key} ${name} head` });
    this.y += text.size * 0.15;
    this.lines(plainParagraphs(paragraphs, 'sans', text, this.width, `${this.key} ${name}`), text);
  }

  chart({ chart, chartAlt, caption }: SlipTexts, { text, small }: SlipType): void {
    const label = small.size * 0.92;
    const size = { width: this.width, height: text.size * 2.4 + label };
    const svg = bandLine(chart, size, label);
    this.blocks.push({ kind: 'picture', x: this.x, y: this.y, ...size, svg, alt: chartAlt });
    this.y += size.height + 2;
    this.text(caption, 'sans', small, paragraph(`${this.key} caption`));
  }
}

function placeNarrow(pen: SlipPen, texts: SlipTexts, type: SlipType): void {
  const { size } = type.text;
  const column = new SlipPen({ x: pen.x, y: pen.y, width: Math.min(pen.width, WIDEST_TEXT * size) }, pen.key);
  placeName(column, texts, type);
  column.y += size * 0.7;
  placeFacts(column, texts.facts, type, 'left');
  column.y += size * 0.9;
  column.chart(texts, type);
  column.y += size * 0.9;
  column.passage('means', texts.means, type);
  column.y += size * 0.8;
  column.passage('not', texts.meansNot, type);
  pen.blocks.push(...column.blocks);
  pen.y = column.y;
}

/** Name and figures above, what the result means at the left, the picture and what it does not mean at the right. */
function placeWide(pen: SlipPen, texts: SlipTexts, type: SlipType): void {
  const { size } = type.text;
  const half = (pen.width - GUTTER) / 2;
  const top = pen.y;
  const name = new SlipPen({ x: pen.x, y: top, width: half }, pen.key);
  placeName(name, texts, type);
  const facts = new SlipPen({ x: pen.x + half + GUTTER, y: top, width: half }, pen.key);
  placeFacts(facts, texts.facts, type, 'left');
  const below = Math.max(name.y, facts.y) + size * 0.6;
  const columnsTop = below + size * 0.8;
  const left = new SlipPen({ x: pen.x, y: columnsTop, width: half }, pen.key);
  left.passage('means', texts.means, type);
  const right = new SlipPen({ x: pen.x + half + GUTTER, y: columnsTop, width: half }, pen.key);
  right.chart(texts, type);
  right.y += size * 0.8;
  right.passage('not', texts.meansNot, type);
  pen.blocks.push(
    ...name.blocks,
    ...facts.blocks,
    { kind: 'rule', x: pen.x, y: below, width: pen.width, weight: FINE_RULE },
    ...left.blocks,
    ...right.blocks,
  );
  pen.y = Math.max(left.y, right.y);
}

function placeName(pen: SlipPen, { name, test, draft }: SlipTexts, type: SlipType): void {
  if (draft !== '') pen.text(draft, 'sans-bold', type.small, paragraph(`${pen.key} draft`));
  pen.text(name, 'serif-bold', type.name, { kind: 'heading', level: 1, name: `${pen.key} name` });
  pen.text(test, 'serif-italic', type.test, paragraph(`${pen.key} test`));
}

/** The figures in a row, each below its label: a small table. */
function placeFacts(pen: SlipPen, facts: readonly SlipFact[], type: SlipType, align: 'left'): void {
  const gap = type.text.size * 2;
  const widths = facts.map(({ label, text }) =>
    Math.max(textWidth(label, 'sans', type.small.size), textWidth(text, 'sans-bold', type.figure.size)),
  );
  const labelLine = pen.y + type.small.leading * 0.8;
  const figureLine = pen.y + type.small.leading + type.figure.leading * 0.78;
  const lineOf = (
    index: number,
    set: Pick<TextLine, 'baseline' | 'size' | 'runs' | 'colour'>,
    role: CellRole,
  ): TextLine => ({
    kind: 'text',
    x: pen.x + widths.slice(0, index).reduce((sum, width) => sum + width + gap, 0),
    width: widths[index] ?? 0,
    align,
    ...set,
    role,
  });
  const cell = (row: CellRole['row'], column: number, said: string | null): CellRole => ({
    kind: 'cell',
    table: `${pen.key} figures`,
    row,
    column,
    headOf: row === 'head' ? 'column' : null,
    said,
  });
  pen.blocks.push(
    ...facts.map(({ label }, index) =>
      lineOf(
        index,
        { baseline: labelLine, size: type.small.size, runs: [{ text: label, face: 'sans' }], colour: 'soft' },
        cell('head', index, null),
      ),
    ),
    ...facts.map(({ text, said }, index) =>
      lineOf(
        index,
        { baseline: figureLine, size: type.figure.size, runs: [{ text, face: 'sans-bold' }], colour: 'ink' },
        cell(0, index, said),
      ),
    ),
  );
  pen.y += type.small.leading + type.figure.leading;
}
