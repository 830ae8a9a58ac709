import { prints } from './booklet-blocks.ts';
import { bookletExtent, printedBlocks } from './booklet-choice.ts';
import type { NormProject, SheetChoices } from './norm-project.ts';
import { phrase, words, type StatementPart } from './statements.ts';

export const PAPER_NAMES: Readonly<Record<SheetChoices['paper'], string>> = { a4: 'A4', letter: 'Letter', a5: 'A5' };

export const COLUMN_WORDS: Readonly<Record<SheetChoices['tableColumns'], string>> = {
  1: 'one column',
  2: 'two columns',
  3: 'three columns',
  4: 'four columns',
};

/** The whole statement of the Sheet station. */
export function sheetStatement({ sheet }: NormProject): readonly StatementPart[] {
  return [...bookletSentence(sheet), ...rowsSentence(sheet), ...(prints(sheet, 'tables') ? besideSentence(sheet) : [])];
}

function bookletSentence(sheet: SheetChoices): readonly StatementPart[] {
  return [
    words('The booklet is '),
    phrase('booklet', extentInWords(sheet)),
    words(', on '),
    phrase('paper', PAPER_NAMES[sheet.paper]),
    words(', '),
    phrase('orientation', sheet.orientation),
    words(', with '),
    phrase('margin', sheet.marginMm === null ? 'the usual margins' : `margins of ${sheet.marginMm} mm`),
    words(', '),
    phrase('gutter', sheet.gutterMm === 0 ? 'no gutter' : `${sheet.gutterMm} mm more at the binding edge`),
    words(' and '),
    phrase('fours', sheet.fillToFours ? 'blank pages to a multiple of four' : 'no blank pages'),
    words('.'),
  ];
}

/** "a whole booklet", "4 blocks of your own choice" */
function extentInWords(sheet: SheetChoices): string {
  const extent = bookletExtent(sheet);
  switch (extent) {
    case 'tables':
      return 'a sheet for each table';
    case 'whole':
      return 'a whole booklet';
    case 'own': {
      const count = printedBlocks(sheet);
      return count === 1 ? 'one block of your own choice' : `${count} blocks of your own choice`;
    }
    case 'nothing':
      return 'a sheet for each table, as no block is ticked';
  }
}

function rowsSentence(sheet: SheetChoices): readonly StatementPart[] {
  return [
    words(' Tables stand in '),
    phrase('table-columns', COLUMN_WORDS[sheet.tableColumns]),
    words(', figures of '),
    phrase('row-type', `${sheet.rowType} points`),
    words(' on rows of '),
    phrase('row-height', `${sheet.rowHeight} points`),
    words(', '),
    phrase('fives', sheet.fives ? 'set in fives' : 'evenly spaced'),
    words(', with '),
    phrase('range-rows', sheet.rangeRows ? 'one row for scores that print alike' : 'a row for each score'),
    words('.'),
  ];
}

function besideSentence({ ogive, inverse }: SheetChoices): readonly StatementPart[] {
  return [
    words(' Each comes '),
    phrase('ogive', ogive ? 'with its ogive' : 'without a picture'),
    words(' and '),
    phrase('inverse', inverse ? 'with the lowest score for each percentile' : 'without an inverse table'),
    words('.'),
  ];
}
