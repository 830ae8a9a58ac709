import { type PrintWords, say } from '../languages/phrases.ts';
import { dateInLanguage } from '../languages/number-format.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockPages } from './block-pages.ts';
import { layLines, layText, textGrid } from './block-text.ts';
import { linesOf, type LooseLine } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { PARAGRAPH_GAP, READING } from './type-sizes.ts';

type Changes = NonNullable<NormProject['release']['changes']>;

/** Points by which a line is moved in for each space that it begins with. */
const PER_SPACE = 6;
const MOST_SPACES = 8;

/** What changed since an earlier edition, line by line, as it was kept with the project. */
export const changeListPages: BlockPages = (context) => {
  const { normSet, block, words } = context;
  const { changes } = normSet.project.release;
  const flow = openBlock(context);
  const own = ownText(block);
  layText(
    flow,
    'since',
    own.length > 0 ? own : [changes === null ? say(words, 'changes.not-compared') : since(changes, words)],
  );
  if (changes === null) return { pages: flow.pages, remarks: [] };
  if (changes.lines.every((line) => line.trim() === '')) {
    layText(flow, 'none', [say(words, 'changes.none')]);
    return { pages: flow.pages, remarks: [] };
  }
  const { main } = textGrid(flow);
  changes.lines.forEach((line, index) => {
    const spaces = Math.min(MOST_SPACES, line.length - line.trimStart().length);
    const column = { x: main.x + spaces * PER_SPACE, width: main.width - spaces * PER_SPACE };
    layLines(flow, changeLines(line.trim(), index, column.width), READING, column);
    flow.skip(line.trim() === '' ? READING.leading / 2 : PARAGRAPH_GAP / 2);
  });
  return { pages: flow.pages, remarks: [] };
};

function changeLines(line: string, index: number, width: number): readonly LooseLine[] {
  return linesOf(line, 'sans', READING, width, paragraph(`change ${index}`));
}

function since({ edition, date, check }: Changes, words: PrintWords): string {
  const named = edition.trim();
  return [
    named === ''
      ? say(words, 'changes.since-unnumbered')
      : date === ''
        ? say(words, 'changes.since', { edition: named })
        : say(words, 'changes.since-date', { edition: named, date: dateInLanguage(date, words.numbers) }),
    ...(check === '' ? [] : [say(words, 'changes.check', { check })]),
  ].join(' ');
}
