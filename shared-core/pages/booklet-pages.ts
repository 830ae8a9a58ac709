import { say, wordsOf } from '../languages/phrases.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { filledToFours } from './blank-pages.ts';
import type { Booklet, BookletPage, Paper } from './booklet.ts';
import { withContents } from './booklet-contents.ts';
import { plannedParts, type BookletPart } from './booklet-parts.ts';
import { blockFrame } from './page-frame.ts';
import { missingSignsRemark } from './missing-signs.ts';
import { paperOf, paperRemarks } from './paper.ts';
import { draftTitle, surveyName } from './sheet-texts.ts';

/**
 * Places every text, figure, rule and picture of a booklet: its blocks in their order, among them the tables with a
 * sheet for each group of the set. Each (group, raw score) stands in exactly one table column. Pure: the same set and
 * version of the program (for the colophon) give the same pages everywhere.
 */
export function composeBooklet(normSet: NormSet, programVersion: string | null = null): Booklet {
  const paper = paperOf(normSet.project.sheet);
  const words = wordsOf(normSet.project);
  const { parts: planned, remarks } = plannedParts({ normSet, paper, words, programVersion });
  const filled = normSet.project.sheet.fillToFours
    ? filledToFours(planned, pagesIn(withContents(planned)), blockFrame(normSet, '', paper), words)
    : planned;
  const pages = numbered(withContents(filled), paper);
  return {
    title: draftTitle(normSet, surveyName(normSet.project) || say(words, 'booklet.title')),
    language: normSet.project.sheet.language.tag,
    paper,
    pages,
    remarks: [...paperRemarks(normSet.project.sheet), ...remarks, ...missingSignsRemark(pages)],
  };
}

/** The parts one after the other, each page with its number, head and foot, moved to its side of the fold. */
function numbered(parts: readonly BookletPart[], { gutter }: Paper): readonly BookletPage[] {
  const total = pagesIn(parts);
  let number = 0;
  return parts.flatMap(({ block, group, name, frame, pages }) =>
    pages.map((body, place): BookletPage => {
      number += 1;
      const blocks = [...frame.blocks(number, total), ...body];
      return {
        number,
        block,
        group,
        opens: place === 0 ? name : null,
        blocks: number % 2 === 0 ? blocks.map((each) => ({ ...each, x: each.x - gutter })) : blocks,
      };
    }),
  );
}

function pagesIn(parts: readonly BookletPart[]): number {
  return parts.reduce((sum, { pages }) => sum + pages.length, 0);
}
