import type { ReportChoices } from '../class/class-file.ts';
import { say, type PrintWords } from '../languages/phrases.ts';
import type { Paper, PlacedPage, PlacedPages } from './booklet.ts';
import { missingSignsRemark } from './missing-signs.ts';
import { markedRuns, pageFrame, type PageFrame } from './page-frame.ts';
import { paperOf } from './paper.ts';
import type { Paragraph } from './paragraph.ts';
import { firstLines } from './prose.ts';
import { SheetFlow } from './sheet-flow.ts';
import { heightOf, paragraphLines, placeLines, type LooseLine } from './text-lines.ts';
import { paragraph, REPEATED, type TextRole } from './text-role.ts';
import type { FontFace } from './text-width.ts';
import { CONTINUED, PROSE, SUBTITLE, TITLE, type TypeSize } from './type-sizes.ts';

/** What stands at the head and the foot of every page of a report, and over its first. */
export interface ReportHead {
  readonly title: string;
  readonly subtitle: string;
  /** At the right of the running head. */
  readonly place: string;
  readonly foot: string;
  /** "DRAFT" where the table is one; empty otherwise. */
  readonly draft: string;
}

export interface OpenReport {
  readonly flow: SheetFlow;
  readonly frame: PageFrame;
  readonly paper: Paper;
}

const MOST_TITLE_LINES = 12;
const MOST_CONTINUED_LINES = 2;
const BELOW_TITLE = 9;
const BELOW_CONTINUED = 8;
const ABOVE_MISSED = 9;

/** The first page of a report, still empty; further pages repeat its title. */
export function openReport(head: ReportHead, size: ReportChoices['paper'], words: PrintWords): OpenReport {
  const paper = paperOf({ paper: size, orientation: 'portrait', marginMm: null, gutterMm: 0 });
  const frame = pageFrame(
    {
      survey: markedRuns(head.draft, head.title),
      place: head.place,
      line: head.foot,
      numbered: (page, pages) => say(words, 'foot.page', { page: String(page), pages: String(pages) }),
    },
    paper,
  );
  const title = say(words, 'class.continued', { title: head.title });
  const flow = new SheetFlow(frame, (top) => {
    const lines = cutLines(title, 'serif-bold', CONTINUED, frame.width, MOST_CONTINUED_LINES, REPEATED);
    return {
      blocks: placeLines(lines, CONTINUED, { x: frame.left, top, width: frame.width }),
      bottom: top + heightOf(lines, CONTINUED) + BELOW_CONTINUED,
    };
  });
  return { flow, frame, paper };
}

/** Title, subtitle and, in two columns, what the report is made from. */
export function layTitle(flow: SheetFlow, { title, subtitle }: ReportHead, about: readonly Paragraph[]): void {
  placeAcross(
    flow,
    cutLines(title, 'serif-bold', TITLE, flow.width, MOST_TITLE_LINES, { kind: 'heading', level: 1, name: 'title' }),
    TITLE,
  );
  placeAcross(
    flow,
    cutLines(subtitle, 'serif-italic', SUBTITLE, flow.width, MOST_TITLE_LINES, paragraph('subtitle')),
    SUBTITLE,
  );
  flow.skip(BELOW_TITLE);
  flow.inTwoColumns(paragraphLines(about, PROSE, flow.halfWidth, 'about'), PROSE);
}

/** Those who are in no table, by name. */
export function layMissed(flow: SheetFlow, missed: readonly Paragraph[]): void {
  if (missed.length === 0) return;
  flow.skip(ABOVE_MISSED);
  flow.inTwoColumns(paragraphLines(missed, PROSE, flow.halfWidth, 'missed'), PROSE);
}

/** The pages with their heads, feet and numbers. */
export function placedReport(
  { title, draft }: ReportHead,
  { flow, frame, paper }: OpenReport,
  { tag }: ReportChoices['language'],
  remarks: readonly string[],
): PlacedPages {
  const pages = flow.pages.map((body, index): PlacedPage => ({
    number: index + 1,
    opens: index === 0 ? title : null,
    blocks: [...frame.blocks(index + 1, flow.pages.length), ...body],
  }));
  return {
    title: draft === '' ? title : `${draft} · ${title}`,
    language: tag,
    paper,
    pages,
    remarks: [...remarks, ...missingSignsRemark(pages)],
  };
}

function cutLines(
  text: string,
  face: FontFace,
  { size }: TypeSize,
  width: number,
  most: number,
  role: TextRole,
): readonly LooseLine[] {
  return firstLines([{ text, face }], size, width, most).lines.map((runs) => ({ runs, before: 0, role }));
}

function placeAcross(flow: SheetFlow, lines: readonly LooseLine[], type: TypeSize): void {
  flow.place(placeLines(lines, type, { x: flow.left, top: flow.y, width: flow.width }), heightOf(lines, type));
}
