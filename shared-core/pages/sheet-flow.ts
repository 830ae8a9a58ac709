import type { Block } from './booklet.ts';
import type { PageFrame } from './page-frame.ts';
import { countThatFits, heightOf, placeLines, type LooseLine } from './text-lines.ts';
import { GUTTER, type TypeSize } from './type-sizes.ts';

/** Puts the head of a further page on it and returns where the body goes on, in points from the top. */
export type FurtherHead = (top: number) => { readonly blocks: readonly Block[]; readonly bottom: number };

/** The pages of one sheet while they fill: a pen that goes down the page and over to the next. */
export class SheetFlow {
  readonly #frame: PageFrame;
  readonly #furtherHead: FurtherHead;
  readonly #pages: Block[][] = [[]];
  #y: number;
  #fresh = true;
  readonly #freshRoom: number;

  constructor(frame: PageFrame, furtherHead: FurtherHead) {
    this.#frame = frame;
    this.#furtherHead = furtherHead;
    this.#y = frame.top;
    this.#freshRoom = frame.bottom - furtherHead(frame.top).bottom;
  }

  /** Blocks of each page, head and foot not among them. */
  get pages(): readonly (readonly Block[])[] {
    return this.#pages;
  }

  /** Where the pen stands, in points from the top of the page. */
  get y(): number {
    return this.#y;
  }

  /** Points left on the page. */
  get room(): number {
    return this.#frame.bottom - this.#y;
  }

  /** True while nothing but its head stands on the page. */
  get fresh(): boolean {
    return this.#fresh;
  }

  /** Points that a further page has below its head. */
  get freshRoom(): number {
    return this.#freshRoom;
  }

  get left(): number {
    return this.#frame.left;
  }

  get width(): number {
    return this.#frame.width;
  }

  /** Width of one of two columns of prose. */
  get halfWidth(): number {
    return (this.#frame.width - GUTTER) / 2;
  }

  get rightHalf(): number {
    return this.#frame.left + this.halfWidth + GUTTER;
  }

  /** Places blocks that were made for where the pen stands, and moves it down by their height. */
  place(blocks: readonly Block[], height: number): void {
    this.#pages.at(-1)?.push(...blocks);
    this.#y += height;
    this.#fresh = false;
  }

  /** Leaves room, unless the page is still fresh. */
  skip(points: number): void {
    if (!this.#fresh) this.#y += points;
  }

  /** Goes on to a new page. */
  turn(): void {
    this.#pages.push([]);
    const { blocks, bottom } = this.#furtherHead(this.#frame.top);
    this.#pages.at(-1)?.push(...blocks);
    this.#y = bottom;
    this.#fresh = true;
  }

  /** Goes on to a new page where less than this much is left of the old one. */
  need(points: number): void {
    if (this.room < points && !this.#fresh) this.turn();
  }

  /** Two texts side by side, over as many pages as they take. */
  sideBySide(left: readonly LooseLine[], right: readonly LooseLine[], type: TypeSize): void {
    let [restLeft, restRight] = [left, right];
    while (restLeft.length > 0 || restRight.length > 0) {
      if (this.room < type.leading) this.turn();
      const takenLeft = restLeft.slice(0, countThatFits(restLeft, type, this.room));
      const takenRight = restRight.slice(0, countThatFits(restRight, type, this.room));
      this.place(
        [
          ...placeLines(takenLeft, type, { x: this.left, top: this.#y, width: this.halfWidth }),
          ...placeLines(takenRight, type, { x: this.rightHalf, top: this.#y, width: this.halfWidth }),
        ],
        Math.max(heightOf(takenLeft, type), heightOf(takenRight, type)),
      );
      restLeft = restLeft.slice(takenLeft.length);
      restRight = restRight.slice(takenRight.length);
    }
  }

  /** One text in two columns, even on the page where it ends. */
  inTwoColumns(lines: readonly LooseLine[], type: TypeSize): void {
    let rest = lines;
    while (rest.length > 0) {
      if (this.room < type.leading) this.turn();
      const left = this.#leftShare(rest, type);
      const right = rest.slice(left, left + countThatFits(rest.slice(left), type, this.room));
      this.sideBySide(rest.slice(0, left), right, type);
      rest = rest.slice(left + right.length);
    }
  }

  /** Lines of the left column: all that fit, or half of a text that ends on this page. */
  #leftShare(lines: readonly LooseLine[], type: TypeSize): number {
    const most = countThatFits(lines, type, this.room);
    for (let count = 1; count < most; count += 1) {
      const right = heightOf(lines.slice(count), type);
      if (right <= heightOf(lines.slice(0, count), type) && right <= this.room) return count;
    }
    return most;
  }
}
