import type { NormSet } from '../norms/norm-set.ts';
import type { Block, Booklet, BookletPage } from './booklet.ts';
import { pageFrame } from './page-frame.ts';
import { paperOf } from './paper.ts';
import { sheetPages } from './sheet-pages.ts';
import { draftTitle, surveyName, tableName } from './sheet-texts.ts';
import { measureTables } from './table-measure.ts';
import { missingCharacters } from './text-width.ts';

/**
 * Places every text, figure, rule and picture of a booklet: one sheet for each group of the set, in its order. Each
 * (group, raw score) stands in exactly one table column. Pure: the same set gives the same pages everywhere.
 */
export function composeBooklet(normSet: NormSet): Booklet {
  const paper = paperOf(normSet.project.sheet);
  const { measure, remarks } = measureTables(normSet, paper.width - 2 * paper.margin);
  const sheets = normSet.groups.map((norms, group) => {
    const frame = pageFrame(normSet, group, norms, paper);
    return { group, norms, frame, ...sheetPages(normSet, group, frame, measure) };
  });
  const total = sheets.reduce((sum, { pages }) => sum + pages.length, 0);
  let number = 0;
  const pages = sheets.flatMap(({ group, norms, frame, pages: bodies }) =>
    bodies.map((body, place): BookletPage => {
      number += 1;
      return {
        number,
        group,
        opens: place === 0 ? tableName(group, norms) : null,
        blocks: [...frame.blocks(number, total), ...body],
      };
    }),
  );
  return {
    title: draftTitle(normSet, surveyName(normSet.project) || 'Conversion tables'),
    paper,
    pages,
    remarks: [
      ...remarks,
      ...sheets
        .filter(({ shortened, frame }) => shortened || frame.shortened)
        .map(({ group }) => `The titles on table ${group + 1} are too long for the page and end in “…”. Shorten them.`),
      ...missingRemark(pages.flatMap(({ blocks }) => blocks)),
    ],
  };
}

function missingRemark(blocks: readonly Block[]): readonly string[] {
  const missing = new Set(
    blocks.flatMap((block) =>
      block.kind === 'text' ? block.runs.flatMap(({ text, face }) => missingCharacters(text, face)) : [],
    ),
  );
  if (missing.size === 0) return [];
  return [
    `The typefaces have no sign for ${[...missing].slice(0, 12).join(' ')}; boxes print instead. ` +
      'Write those words in Latin, Greek or Cyrillic letters.',
  ];
}
