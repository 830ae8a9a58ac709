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
const WIDEST_PAGE_NUMBER = 'page 9999 of 9999';
const HEAD: PageRole = { kind: 'running', edge: 'top' };
const FOOT: PageRole = { kind: 'running', edge: 'bottom' };

/** Width between the margins, points. */
export function bodyWidth({ width, margin, gutter }: Paper): number {
  return width - 2 * margin - gutter;
}

/** The pages of one group. */
export function groupFrame(normSet: NormSet, index: number, norms: GroupNorms, paper: Paper): PageFrame {
  return pageFrame(normSet, tableName(index, norms), editionLine(normSet, norms), paper);
}

/** Pages that belong to no single group; `place` stands at the right of their head. */
export function blockFrame(normSet: NormSet, place: string, paper: Paper): PageFrame {
  return pageFrame(normSet, place, bookletLine(normSet), paper);
}

function pageFrame(normSet: NormSet, place: string, line: string, paper: Paper): PageFrame {
  const left = paper.margin + paper.gutter;
  const width = bodyWidth(paper);
  const survey = headLines(surveyRuns(normSet), (width - GUTTER) * LEFT_SHARE);
  const table = headLines([{ text: place, face: 'sans' }], (width - GUTTER) * (1 - LEFT_SHARE));
  const headTop = paper.edge;
  const headRule = headTop + Math.max(heightOf(survey.lines, RUNNING), heightOf(table.lines, RUNNING)) + ROOM_AT_RULE;
  const numberWidth = textWidth(WIDEST_PAGE_NUMBER, 'sans', RUNNING.size);
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
      ...running(survey.lines, headTop, 'left'),
      ...running(table.lines, headTop, 'right'),
      rule(headRule),
      rule(footRule),
      ...running(edition, footTop, 'left'),
      ...running(linesOf(`page ${page} of ${pages}`, 'sans', RUNNING, width, FOOT), footTop, 'right'),
    ],
    shortened: survey.cut || table.cut,
  };
}

/** The survey's name, behind the word that a draft carries on every page. */
function surveyRuns(normSet: NormSet): readonly TextRun[] {
  const [mark, name] = [draftMark(normSet), surveyName(normSet.project)];
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
