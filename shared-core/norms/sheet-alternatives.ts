import type { Alternative } from './alternatives.ts';
import { bookletExtent, withExtent } from './booklet-choice.ts';
import type { NormProject, SheetChoices } from './norm-project.ts';
import { COLUMN_WORDS, PAPER_NAMES } from './sheet-statement.ts';

/** Choices of the Sheet station that are made from a list. */
export type ListedSheetChoice =
  'booklet' | 'paper' | 'orientation' | 'fours' | 'table-columns' | 'fives' | 'range-rows' | 'ogive' | 'inverse';

/** All alternatives of a choice of the Sheet station, the present one marked. */
export function sheetAlternatives(project: NormProject, choice: ListedSheetChoice): readonly Alternative[] {
  const { sheet } = project;
  const offer = (change: Partial<SheetChoices>, label: string, explanation: string): Alternative => {
    const next = { ...sheet, ...change };
    return {
      label,
      explanation,
      chosen: JSON.stringify(sheet) === JSON.stringify(next),
      project: { ...project, sheet: next },
    };
  };
  switch (choice) {
    case 'booklet':
      return bookletAlternatives(project);
    case 'paper':
      return [
        offer({ paper: 'a4' }, PAPER_NAMES.a4, '210 × 297 mm.'),
        offer({ paper: 'letter' }, PAPER_NAMES.letter, '8½ × 11 inches.'),
        offer({ paper: 'a5' }, PAPER_NAMES.a5, '148 × 210 mm, for a small booklet.'),
      ];
    case 'orientation':
      return [
        offer({ orientation: 'portrait' }, 'portrait', 'Upright.'),
        offer({ orientation: 'landscape' }, 'landscape', 'On its side.'),
      ];
    case 'fours':
      return [
        offer({ fillToFours: false }, 'no blank pages', 'As many pages as the blocks take.'),
        offer(
          { fillToFours: true },
          'blank pages to a multiple of four',
          'Sheets printed on both sides and folded once have four pages each: for a booklet that is stitched.',
        ),
      ];
    case 'table-columns':
      return [
        offer({ tableColumns: 1 }, COLUMN_WORDS[1], 'The table runs down the page once.'),
        offer({ tableColumns: 2 }, COLUMN_WORDS[2], 'The table is split in two, the heading repeated.'),
        offer({ tableColumns: 3 }, COLUMN_WORDS[3], 'The table is split in three, the heading repeated.'),
        offer({ tableColumns: 4 }, COLUMN_WORDS[4], 'For few figures and many scores, or a sheet on its side.'),
      ];
    case 'fives':
      return [
        offer({ fives: true }, 'set in fives', 'A little room after every fifth score keeps the eye on its row.'),
        offer({ fives: false }, 'evenly spaced', 'All rows alike, for tables that must be short.'),
      ];
    case 'range-rows':
      return [
        offer({ rangeRows: false }, 'a row for each score', 'Every attainable score is found in the first column.'),
        offer(
          { rangeRows: true },
          'one row for scores that print alike',
          'Neighbouring scores with the same printed figures share a row, as “23–25”. Shorter, but a score is looked for.',
        ),
      ];
    case 'ogive':
      return [
        offer({ ogive: true }, 'with its ogive', 'The cumulative distribution as a picture below the table.'),
        offer({ ogive: false }, 'without a picture', 'The table and its notes alone.'),
      ];
    case 'inverse':
      return [
        offer({ inverse: false }, 'without an inverse table', 'From raw score to rank only.'),
        offer(
          { inverse: true },
          'with the lowest score for each percentile',
          'Also from percentile to raw score: the poorest score that reaches it.',
        ),
      ];
  }
}

/** Ticks are set in the list of blocks; it is named as an alternative only where they differ from both others. */
function bookletAlternatives(project: NormProject): readonly Alternative[] {
  const { sheet } = project;
  const extent = bookletExtent(sheet);
  const own: Alternative = {
    label: 'blocks of your own choice',
    explanation: 'As ticked in the list of blocks.',
    chosen: true,
    project,
  };
  return [
    {
      label: 'a sheet for each table',
      explanation: 'The tables alone, each with what its reader needs beside it. Tick more in the list of blocks.',
      chosen: extent === 'tables',
      project: { ...project, sheet: withExtent(sheet, 'tables') },
    },
    {
      label: 'a whole booklet',
      explanation: 'Every block, from the title page to the colophon. Leave some out in the list of blocks.',
      chosen: extent === 'whole',
      project: { ...project, sheet: withExtent(sheet, 'whole') },
    },
    ...(extent === 'own' || extent === 'nothing' ? [own] : []),
  ];
}
