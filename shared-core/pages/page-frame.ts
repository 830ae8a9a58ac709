import { say, wordsOf } from '../languages/phrases.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import type { Block, Paper, TextRun } from './booklet.ts';
import { firstLines } from './prose.ts';
import { bookletLine, draftMark, editionLine, surveyName, tableName } from './sheet-texts.ts';
import { heightOf, linesOf, placeLines, type LooseLine } from './text-lines.ts';
import type { PageRole } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { GUTTER, RUNNING, STRONG_RULE } from './type-sizes.ts';

/** What stands at head and foot of every page of a group or a block, and the room between them. */
export interface PageFrame {
  /** As on odd pages. */
  readonly left: number;
  readonly width: number;
  /** The body of the page stands between these. */
  readonly top: number;
  readonly bottom: number;
  /** Head, foot and their rules for one page. */
  readonly blocks: (page: number, pages: number) => readonly Block[];
  /** True where the title of the survey, the group or the block was too long for the head. */
  readonly shortened: boolean;
}

const MOST_HEAD_LINES = 4;
const ROOM_AT_RULE = 4;
const ROOM_TO_BODY = 13;
/** Share of the width that the survey's name may take. */
const LEFT_SHARE = 0.58;
const MOST_PAGES = 9999;
const HEAD: PageRole = { kind: 'running', edge: 'top' };
const FOOT: PageRole = { kind: 'running', edge: 'bottom' };

/** Width between the margins, points. */
export function bodyWidth({ width, margin, gutter }: Paper): number {
  return width - 2 * margin - gutter;
}

/** What the head and foot of a page say. */
export interface RunningTexts {
  /** At the left of the head. */
  readonly survey: readonly TextRun[];
  /** At the right of the head. */
  readonly place: string;
  /** At the left of the foot. */
  readonly line: string;
  /** "page 2 of 3", at the right of the foot. */
  readonly numbered: (page: number, pages: number) => string;
}

/** The pages of one group. */
export function groupFrame(normSet: NormSet, index: number, norms: GroupNorms, paper: Paper): PageFrame {
  return bookletFrame(normSet, tableName(normSet.project, index, norms), editionLine(normSet, norms), paper);
}

/** Pages that belong to no single group; `place` stands at the right of their head. */
export function blockFrame(normSet: NormSet, place: string, paper: Paper): PageFrame {
  return bookletFrame(normSet, place, bookletLine(normSet), paper);
}

function bookletFrame(normSet: NormSet, place: string, line: string, paper: Paper): PageFrame {
  const survey = markedRuns(draftMark(normSet), surveyName(normSet.project));
  const words = wordsOf(normSet.project);
  const numbered = (page: number, pages: number): string =>
    say(words, 'foot.page', { page: String(page), pages: String(pages) });
  return pageFrame({ survey, place, line, numbered }, paper);
}

/** Head and foot, and the room that they leave. */
export function pageFrame({ survey, place, line, numbered }: RunningTexts, paper: Paper): PageFrame {
  const left = paper.margin + paper.gutter;
  const width = bodyWidth(paper);
  const atLeft = headLines(survey, (width - GUTTER) * LEFT_SHARE);
  const atRight = headLines([{ text: place, face: 'sans' }], (width - GUTTER) * (1 - LEFT_SHARE));
  const headTop = paper.edge;
  const headRule = headTop + Math.max(heightOf(atLeft.lines, RUNNING), heightOf(atRight.lines, RUNNING)) + ROOM_AT_RULE;
  const numberWidth = textWidth(numbered(MOST_PAGES, MOST_PAGES), 'sans', RUNNING.size);
  const edition = linesOf(line, 'sans', RUNNING, width - numberWidth - GUTTER, FOOT);
  const footTop = paper.height - paper.edge - heightOf(edition, RUNNING);
  const footRule = footTop - ROOM_AT_RULE;
  const rule = (y: number): Block => ({ kind: 'rule', x: left, y, width, weight: STRONG_RULE });
  const running = (lines: readonly LooseLine[], top: number, align: 'left' | 'right'): readonly Block[] =>
    placeLines(lines, RUNNING, { x: left, top, width, align, colour: 'soft' });
  return {
    left,
    width,
    top: headRule + ROOM_TO_BODY,
    bottom: footRule - ROOM_TO_BODY,
    blocks: (page, pages) => [
      ...running(atLeft.lines, headTop, 'left'),
      ...running(atRight.lines, headTop, 'right'),
      rule(headRule),
      rule(footRule),
      ...running(edition, footTop, 'left'),
      ...running(linesOf(numbered(page, pages), 'sans', RUNNING, width, FOOT), footTop, 'right'),
    ],
    shortened: atLeft.cut || atRight.cut,
  };
}

/** What a page belongs to, behind the word that a draft carries on every page. */
export function markedRuns(mark: string, name: string): readonly TextRun[] {
  if (mark === '') return [{ text: name, face: 'sans' }];
  return [
    { text: mark, face: 'sans-bold' },
    { text: name === '' ? '' : ` · ${name}`, face: 'sans' },
  ];
}

function headLines(
  runs: readonly TextRun[],
  width: number,
): { readonly lines: readonly LooseLine[]; readonly cut: boolean } {
  const first = firstLines(runs, RUNNING.size, width, MOST_HEAD_LINES);
  return { lines: first.lines.map((runs) => ({ runs, before: 0, role: HEAD })), cut: first.cut };
}
