import { dateInLanguage } from '../languages/number-format.ts';
import { figure, say } from '../languages/phrases.ts';
import { groupNoun } from '../norms/norm-groups.ts';
import { printCount } from '../scores/printed-number.ts';
import { blockFlow, ownText } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { layLines } from './block-text.ts';
import { printedTitle } from './sheet-texts.ts';
import { firstLines } from './prose.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, placeLines, plainParagraphs, type LooseLine } from './text-lines.ts';
import { paragraph, type TextRole } from './text-role.ts';
import { textWidth, type FontFace } from './text-width.ts';
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
/** Share of the page that the title may take, and how many lines stand on its page behind it at least. */
const MOST_FOR_TITLE = 0.55;
const LINES_BELOW = 4;
const TITLE_ROLE: TextRole = { kind: 'heading', level: 1, name: 'title' };
/** White below all of it, points. */
const ABOVE_FOOT = 22;

const TITLE_CUT = 'The title of the booklet is too long for its title page and ends in “…”. Shorten it.';

/** The title page: what the booklet is, of whom it tells, and at its foot which edition it is and whom it is for. */
export const titlePage: BlockPages = (context) => {
  const flow = blockFlow(context);
  const cut = layTitle(flow, context);
  layFoot(flow, context);
  return { pages: flow.pages, remarks: cut ? [TITLE_CUT] : [] };
};

/** True where the title had to be cut. */
function layTitle(flow: SheetFlow, context: BlockContext): boolean {
  const { normSet, heading, words } = context;
  const { project, status } = normSet;
  const column = { x: flow.left, width: Math.min(flow.width, WIDEST_TITLE) };
  const title = displayLines(heading, column.width, flow.room * MOST_FOR_TITLE);
  const set = (text: string, face: FontFace, type: TypeSize, name: string): void =>
    layLines(flow, linesOf(text, face, type, column.width, paragraph(name)), type, column);
  const below = heightOf(title.lines, title.type) + BELOW_TITLE + BELOW_SUBTITLE + LINES_BELOW * READING.leading;
  flow.place([], Math.max(0, Math.min(flow.room * ABOVE_TITLE, flow.room - below)));
  if (status === 'draft') {
    set(say(words, 'title-page.draft'), 'sans-bold', READING, 'draft');
    flow.skip(BELOW_TITLE);
  }
  layLines(flow, title.lines, title.type, column);
  flow.skip(BELOW_TITLE);
  set(project.subtitle.trim(), 'serif-italic', DISPLAY_SUBTITLE, 'subtitle');
  flow.skip(BELOW_SUBTITLE);
  const norms = groupNoun(project.groups.documentation) === 'norm group';
  set(say(words, norms ? 'title-page.norms' : 'title-page.sample'), 'sans-bold', READING, 'kind');
  layLines(flow, groupLines(context, column.width), READING, column);
  return title.cut;
}

/** The names of the groups, or how many there are. */
function groupLines({ normSet: { project, groups }, words }: BlockContext, width: number): readonly LooseLine[] {
  const names = groups.map(({ group }) => printedTitle(project, group)).join(' · ');
  const lines = linesOf(names, 'sans', READING, width, paragraph('groups'));
  if (groups.length === 1 || lines.length <= MOST_GROUP_LINES) return lines;
  const count = say(words, 'title-page.groups', { count: figure(words, printCount(groups.length)) });
  return linesOf(count, 'sans', READING, width, paragraph('groups'));
}

interface DisplayLines {
  readonly lines: readonly LooseLine[];
  readonly type: TypeSize;
  readonly cut: boolean;
}

/** The title in the largest size in which it is neither too long nor taller than `height`; cut where none is. */
function displayLines(text: string, width: number, height: number): DisplayLines {
  const set = DISPLAY_SIZES.map((type, index): DisplayLines => {
    const most = Math.floor(height / type.leading);
    const smallest = index === DISPLAY_SIZES.length - 1;
    const allowed = smallest ? most : Math.min(most, MOST_TITLE_LINES);
    const { lines, cut } = firstLines([{ text, face: 'serif-bold' }], type.size, width, allowed);
    return { type, cut, lines: lines.map((runs) => ({ runs, before: 0, role: TITLE_ROLE })) };
  });
  const fitting = set.find(({ cut }) => !cut) ?? set.at(-1);
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
