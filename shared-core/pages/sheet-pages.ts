import { say, wordsOf } from '../languages/phrases.ts';
import { adjustmentNote } from '../norms/adjustment-words.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { BLOCK_WORDS } from './block-words.ts';
import type { Block, TextRun } from './booklet.ts';
import { conversionLines } from './conversion-rows.ts';
import { cutNote } from './cut-note.ts';
import { fitNotesOf } from './fit-notes.ts';
import { layFitNotes } from './fit-notes-blocks.ts';
import { cautionsOf, errorCaution } from './group-method.ts';
import { inverseStrip } from './inverse-strip.ts';
import { ogivePicture } from './ogive-picture.ts';
import type { PageFrame } from './page-frame.ts';
import { firstLines } from './prose.ts';
import { SheetFlow } from './sheet-flow.ts';
import { figureCaption, figureInWords, notesOf, sheetSubtitle, sheetTitle } from './sheet-texts.ts';
import type { TableMeasure } from './table-measure.ts';
import { layTableNote } from './table-notes.ts';
import { layTable } from './table-pages.ts';
import { rowBlocks } from './table-rows.ts';
import {
  countThatFits,
  heightOf,
  linesOf,
  paragraphLines,
  placeLines,
  plainParagraphs,
  type LooseLine,
} from './text-lines.ts';
import { paragraph, REPEATED, type TextRole } from './text-role.ts';
import { CONTINUED, PROSE, SMALL_PROSE, SUBTITLE, TITLE, type TypeSize } from './type-sizes.ts';

const MOST_TITLE_LINES = 6;
const MOST_SUBTITLE_LINES = 3;
/** Longer cautions are printed once and pointed to from the pages that follow. */
const MOST_CAUTION_LINES = 6;
const AROUND_INTRODUCTION = 10;
const BETWEEN_HEAD_LINES = 2;
const BELOW_TABLE = 22;
/** Height of the picture against its width. */
const PICTURE_SHAPE = 0.47;
const BELOW_PICTURE = 5;
const LEAST_NOTE_LINES = 6;

export interface SheetPages {
  readonly pages: readonly (readonly Block[])[];
  /** True where the title had to be cut. */
  readonly shortened: boolean;
}

/** One group's sheet: title, introduction, table, inverse table, picture and notes, over as many pages as they take. */
export function sheetPages(normSet: NormSet, index: number, frame: PageFrame, measure: TableMeasure): SheetPages {
  const norms = normSet.groups[index];
  if (norms === undefined) throw new RangeError('no such group');
  const title = cutText(sheetTitle(normSet.project, norms), 'serif-bold', TITLE, frame.width, MOST_TITLE_LINES, {
    kind: 'heading',
    level: 1,
    name: 'title',
  });
  const flow = new SheetFlow(frame, (top) => furtherHead(normSet, norms, frame, top));
  placeFull(flow, title.lines, TITLE);
  const subtitle = cutText(
    sheetSubtitle(normSet.project),
    'serif-italic',
    SUBTITLE,
    frame.width,
    MOST_SUBTITLE_LINES,
    paragraph('subtitle'),
  );
  placeFull(flow, subtitle.lines, SUBTITLE);
  introduce(flow, normSet);
  layConversion(flow, normSet, norms, measure);
  layTableNote(flow, 'adjustments', adjustmentNote(norms, wordsOf(normSet.project)));
  layTableNote(flow, 'cuts', cutNote(normSet.project, norms, BLOCK_WORDS));
  layInverse(flow, normSet, norms);
  layNotes(flow, normSet, index, norms);
  layTechnicalNotes(flow, normSet, norms);
  return { pages: flow.pages, shortened: title.cut };
}

function cutText(
  text: string,
  face: TextRun['face'],
  type: TypeSize,
  width: number,
  most: number,
  role: TextRole,
): CutLines {
  const first = firstLines([{ text, face }], type.size, width, most);
  return { lines: first.lines.map((runs) => ({ runs, before: 0, role })), cut: first.cut };
}

interface CutLines {
  readonly lines: readonly LooseLine[];
  readonly cut: boolean;
}

function placeFull(flow: SheetFlow, lines: readonly LooseLine[], type: TypeSize): void {
  flow.place(placeLines(lines, type, { x: flow.left, top: flow.y, width: flow.width }), heightOf(lines, type));
}

/** A page that is copied alone still says what its table is and how not to use it. */
function furtherHead(
  normSet: NormSet,
  norms: GroupNorms,
  { left, width }: PageFrame,
  top: number,
): { readonly blocks: readonly Block[]; readonly bottom: number } {
  const { project } = normSet;
  const words = wordsOf(project);
  const continued = say(words, 'sheet.continued', { title: sheetTitle(project, norms) });
  const cautions = linesOf(cautionsOf(project), 'sans', SMALL_PROSE, width, REPEATED);
  const parts: readonly (readonly [readonly LooseLine[], TypeSize])[] = [
    [cutText(continued, 'serif-bold', CONTINUED, width, 2, REPEATED).lines, CONTINUED],
    [cutText(sheetSubtitle(project), 'serif-italic', PROSE, width, 2, REPEATED).lines, PROSE],
    [
      cautions.length <= MOST_CAUTION_LINES
        ? cautions
        : linesOf(say(words, 'sheet.cautions-elsewhere'), 'sans', SMALL_PROSE, width, REPEATED),
      SMALL_PROSE,
    ],
  ];
  let bottom = top;
  const blocks = parts.flatMap(([lines, type]) => {
    const placed = placeLines(lines, type, { x: left, top: bottom, width });
    bottom += heightOf(lines, type) + BETWEEN_HEAD_LINES;
    return placed;
  });
  return { blocks, bottom: bottom + AROUND_INTRODUCTION };
}

/** How to read the table, and what its columns of errors tell, beside the cautions. */
function introduce(flow: SheetFlow, { project }: NormSet): void {
  const { howToRead, cautions } = project.sheet;
  const texts = { 'how to read': [howToRead, errorCaution(project)], cautions: [cautions] };
  const sides = Object.entries(texts).map(([name, side]) => plainParagraphs(side, 'sans', PROSE, flow.halfWidth, name));
  const [left = [], right = []] = sides.filter((lines) => lines.length > 0);
  flow.skip(AROUND_INTRODUCTION);
  flow.sideBySide(left, right, PROSE);
}

function layConversion(flow: SheetFlow, { project }: NormSet, norms: GroupNorms, measure: TableMeasure): void {
  flow.skip(AROUND_INTRODUCTION + 2);
  const rows = conversionLines(project, norms);
  layTable(flow, 'conversion', rowBlocks(rows, project.sheet, norms.group.table.scale), measure);
}

function layInverse(flow: SheetFlow, { project }: NormSet, norms: GroupNorms): void {
  if (!project.sheet.inverse) return;
  const strip = inverseStrip(norms, flow.width, wordsOf(project));
  flow.skip(BELOW_TABLE - 6);
  flow.need(strip.height);
  flow.place(strip.place(flow.left, flow.y), strip.height);
}

/** The picture and, beside it, the notes; notes that are longer than the page go on in two columns on the next. */
function layNotes(flow: SheetFlow, normSet: NormSet, index: number, norms: GroupNorms): void {
  const { project } = normSet;
  const lines = paragraphLines(notesOf(normSet, norms), PROSE, flow.halfWidth, 'notes');
  flow.skip(BELOW_TABLE);
  if (!project.sheet.ogive) {
    flow.need(Math.min(heightOf(lines, PROSE) / 2 + PROSE.leading, LEAST_NOTE_LINES * PROSE.leading));
    flow.inTwoColumns(lines, PROSE);
    return;
  }
  const picture = { width: flow.halfWidth, height: flow.halfWidth * PICTURE_SHAPE };
  const words = wordsOf(project);
  const figureLead = {
    lead: say(words, 'caption.lead', { number: String(index + 1) }),
    text: figureCaption(project, norms),
  };
  const caption = paragraphLines([figureLead], SMALL_PROSE, flow.halfWidth, 'caption');
  const figure = picture.height + BELOW_PICTURE + heightOf(caption, SMALL_PROSE);
  const whole = heightOf(lines, PROSE);
  flow.need(Math.max(figure, whole <= flow.freshRoom ? whole : LEAST_NOTE_LINES * PROSE.leading));
  const beside = countThatFits(lines, PROSE, flow.room);
  const top = flow.y;
  flow.place(
    [
      {
        kind: 'picture',
        x: flow.left,
        y: top,
        ...picture,
        svg: ogivePicture(norms, project.precision.level, picture, words),
        alt: figureInWords(project, norms),
      },
      ...placeLines(caption, SMALL_PROSE, {
        x: flow.left,
        top: top + picture.height + BELOW_PICTURE,
        width: flow.halfWidth,
      }),
      ...placeLines(lines.slice(0, beside), PROSE, { x: flow.rightHalf, top, width: flow.halfWidth }),
    ],
    Math.max(figure, heightOf(lines.slice(0, beside), PROSE)),
  );
  flow.inTwoColumns(lines.slice(beside), PROSE);
}

function layTechnicalNotes(flow: SheetFlow, { project }: NormSet, norms: GroupNorms): void {
  const notes = fitNotesOf(project, norms);
  if (notes === null) return;
  flow.skip(BELOW_TABLE);
  layFitNotes(flow, notes, wordsOf(project));
}
