import { say } from '../languages/phrases.ts';
import { dateInLanguage } from '../languages/number-format.ts';
import { groupNoun } from '../norms/norm-groups.ts';
import { blockFlow, ownText } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { layLines } from './block-text.ts';
import { printedTitle } from './sheet-texts.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, placeLines, plainParagraphs, type LooseLine } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { DISPLAY_SIZES, DISPLAY_SUBTITLE, PROSE, READING, type TypeSize } from './type-sizes.ts';

/** Share of the height that stays white above the title. */
const ABOVE_TITLE = 0.2;
/** A title of more lines is set smaller. */
const MOST_TITLE_LINES = 4;
/** More lines of names than this, and only the number of groups is told. */
const MOST_GROUP_LINES = 4;
const WIDEST_TITLE = 430;
const WIDEST_TEXT = 330;
const BELOW_TITLE = 7;
const BELOW_SUBTITLE = 24;
const BELOW_FACTS = 12;
const AFTER_HEAD = 14;
const LEAST_WHITE = 20;
/** White below all of it, points. */
const ABOVE_FOOT = 22;

/** The title page: what the booklet is, of whom it tells, and at its foot which edition it is and whom it is for. */
export const titlePage: BlockPages = (context) => {
  const flow = blockFlow(context);
  flow.place([], flow.room * ABOVE_TITLE);
  layTitle(flow, context);
  layFoot(flow, context);
  return { pages: flow.pages, remarks: [] };
};

function layTitle(flow: SheetFlow, { normSet, heading, words }: BlockContext): void {
  const { project, groups, status } = normSet;
  const column = { x: flow.left, width: Math.min(flow.width, WIDEST_TITLE) };
  const set = (text: string, face: 'sans' | 'sans-bold' | 'serif-italic', type: TypeSize, name: string): void =>
    layLines(flow, linesOf(text, face, type, column.width, paragraph(name)), type, column);
  if (status === 'draft') {
    set(say(words, 'title-page.draft'), 'sans-bold', READING, 'draft');
    flow.skip(BELOW_TITLE);
  }
  const title = displayLines(heading, column.width);
  layLines(flow, title.lines, title.type, column);
  flow.skip(BELOW_TITLE);
  set(project.subtitle.trim(), 'serif-italic', DISPLAY_SUBTITLE, 'subtitle');
  flow.skip(BELOW_SUBTITLE);
  const norms = groupNoun(project.groups.documentation) === 'norm group';
  set(say(words, norms ? 'title-page.norms' : 'title-page.sample'), 'sans-bold', READING, 'kind');
  const names = groups.map(({ group }) => printedTitle(project, group)).join(' · ');
  const lines = linesOf(names, 'sans', READING, column.width, paragraph('groups'));
  if (lines.length <= MOST_GROUP_LINES) layLines(flow, lines, READING, column);
  else set(say(words, 'title-page.groups', { count: String(groups.length) }), 'sans', READING, 'groups');
}

/** The title in the largest size in which it is not too long. */
function displayLines(text: string, width: number): { readonly lines: readonly LooseLine[]; readonly type: TypeSize } {
  const set = DISPLAY_SIZES.map((type) => ({
    type,
    lines: linesOf(text, 'serif-bold', type, width, { kind: 'heading', level: 1, name: 'title' }),
  }));
  const fitting = set.find(({ lines }) => lines.length <= MOST_TITLE_LINES) ?? set.at(-1);
  if (fitting === undefined) throw new RangeError('no size for titles');
  return fitting;
}

/** Edition, date, check code and the word to users, at the foot of the page where it has room. */
function layFoot(flow: SheetFlow, { normSet, block, words }: BlockContext): void {
  const { check, project } = normSet;
  const { edition, date } = project.release;
  const facts = [
    [say(words, 'title-page.edition'), edition.trim()],
    [say(words, 'title-page.date'), dateInLanguage(date, words.numbers)],
    [say(words, 'title-page.check'), check],
  ].filter((fact): fact is [string, string] => fact[1] !== '');
  const indent = Math.max(...facts.map(([head]) => textWidth(head, 'sans-bold', PROSE.size))) + AFTER_HEAD;
  const column = { x: flow.left, width: Math.min(flow.width, WIDEST_TEXT) };
  const values = { x: column.x + indent, width: column.width - indent };
  const own = ownText(block);
  const text = own.length > 0 ? own : [say(words, 'title-page.caution')];
  const prose = plainParagraphs(text, 'sans', PROSE, column.width, 'caution');
  const height = facts.length * PROSE.leading + BELOW_FACTS + heightOf(prose, PROSE);
  flow.need(height + LEAST_WHITE);
  flow.place([], Math.max(0, flow.room - height - ABOVE_FOOT));
  facts.forEach(([head, value], index) => {
    const role = paragraph(`fact ${index}`);
    const heads = linesOf(head, 'sans-bold', PROSE, indent, role);
    flow.place(placeLines(heads, PROSE, { ...column, width: indent, top: flow.y }), 0);
    layLines(flow, linesOf(value, 'sans', PROSE, values.width, role), PROSE, values);
  });
  flow.skip(BELOW_FACTS);
  layLines(flow, prose, PROSE, column);
}
