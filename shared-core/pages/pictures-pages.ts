import { wordsOf } from '../languages/phrases.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { layBoxPlots } from './box-plots-blocks.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockPages } from './block-pages.ts';
import { layText, type Column } from './block-text.ts';
import type { Block } from './booklet.ts';
import { ogivePicture } from './ogive-picture.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { figureCaption, figureInWords, tableName } from './sheet-texts.ts';
import { heightOf, paragraphLines, placeLines, type LooseLine } from './text-lines.ts';
import { SMALL_PROSE } from './type-sizes.ts';

const BETWEEN_FIGURES = 20;
const ABOVE_CAPTION = 6;
/** Height of a picture against its width, at most. */
const TALLEST = 0.68;
/** Points that keep a sum of heights from standing just outside of the room it was made for. */
const TRACE = 0.5;
/** Where two figures do not find this much on the first page of the block, they begin on the next. */
const LEAST_SHARE = 0.8;

/** The ogive of each group, large, two to a page; then the boxes of all groups on one scale. */
export const picturesPages: BlockPages = (context) => {
  const { normSet, block } = context;
  const flow = openBlock(context);
  layText(flow, 'own', ownText(block));
  const figures = normSet.groups.map((norms, index) => ({ norms, index }));
  if (flow.width > flow.freshRoom) layInPairs(flow, normSet, figures);
  else layInTurn(flow, normSet, figures);
  layBoxPlots(flow, context);
  return { pages: flow.pages, remarks: [] };
};

interface Figure {
  readonly norms: GroupNorms;
  /** Position of the group in the set. */
  readonly index: number;
}

/** One below the other, all of one height. */
function layInTurn(flow: SheetFlow, normSet: NormSet, figures: readonly Figure[]): void {
  const slotIn = (room: number): number => (room - BETWEEN_FIGURES) / 2;
  const enough = flow.room >= LEAST_SHARE * flow.freshRoom;
  const slot = slotIn(enough ? Math.min(flow.room, flow.freshRoom) : flow.freshRoom);
  const column = { x: flow.left, width: flow.width };
  const height = pictureHeight(normSet, figures, column.width, slot);
  figures.forEach((figure) => {
    const caption = captionOf(normSet, figure, column.width);
    const whole = height + ABOVE_CAPTION + heightOf(caption, SMALL_PROSE);
    flow.need(whole);
    flow.place(figureBlocks(normSet, figure, caption, { ...column, top: flow.y, height }), whole);
    flow.skip(BETWEEN_FIGURES);
  });
}

/** Two side by side. */
function layInPairs(flow: SheetFlow, normSet: NormSet, figures: readonly Figure[]): void {
  const width = flow.halfWidth;
  const enough = flow.room >= LEAST_SHARE * flow.freshRoom;
  const slot = enough ? Math.min(flow.room, flow.freshRoom) : flow.freshRoom;
  const height = pictureHeight(normSet, figures, width, slot);
  for (let first = 0; first < figures.length; first += 2) {
    const pair = figures
      .slice(first, first + 2)
      .map((figure) => ({ figure, caption: captionOf(normSet, figure, width) }));
    const captions = Math.max(...pair.map(({ caption }) => heightOf(caption, SMALL_PROSE)));
    const whole = height + ABOVE_CAPTION + captions;
    flow.need(whole);
    const top = flow.y;
    const blocks = pair.flatMap(({ figure, caption }, place) =>
      figureBlocks(normSet, figure, caption, { x: place === 0 ? flow.left : flow.rightHalf, width, top, height }),
    );
    flow.place(blocks, whole);
    flow.skip(BETWEEN_FIGURES);
  }
}

/** What a picture has of a slot besides the longest of the captions. */
function pictureHeight(normSet: NormSet, figures: readonly Figure[], width: number, slot: number): number {
  const captions = Math.max(...figures.map((figure) => heightOf(captionOf(normSet, figure, width), SMALL_PROSE)));
  return Math.min(width * TALLEST, slot - ABOVE_CAPTION - captions - TRACE);
}

function captionOf({ project }: NormSet, { norms, index }: Figure, width: number): readonly LooseLine[] {
  const paragraph = { lead: `${tableName(project, index, norms)}.`, text: figureCaption(project, norms) };
  return paragraphLines([paragraph], SMALL_PROSE, width, `caption ${index}`);
}

function figureBlocks(
  { project }: NormSet,
  { norms }: Figure,
  caption: readonly LooseLine[],
  { x, width, top, height }: Column & { readonly top: number; readonly height: number },
): readonly Block[] {
  const size = { width, height };
  return [
    {
      kind: 'picture',
      x,
      y: top,
      ...size,
      svg: ogivePicture(norms, project.precision.level, size, wordsOf(project)),
      alt: figureInWords(project, norms),
    },
    ...placeLines(caption, SMALL_PROSE, { x, top: top + height + ABOVE_CAPTION, width }),
  ];
}
