import { printWords, say, type PrintWords } from '../languages/phrases.ts';
import type { PlacedPages } from './booklet.ts';
import { layClassFacts } from './class-facts-blocks.ts';
import { layMissed, layTitle, openReport, placedReport, type ReportHead } from './class-report-frame.ts';
import type { ClassPrint } from './class-print.ts';
import { pupilsTable } from './class-pupils-table.ts';
import {
  classFoot,
  classSubtitle,
  classTitle,
  missedParagraphs,
  tableNotes,
  tableParagraphs,
  tableTitle,
} from './class-report-texts.ts';
import { layRowTable } from './row-table.ts';
import { measureRowTable } from './row-table-measure.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { plainParagraphs } from './text-lines.ts';
import { PROSE, SMALL_PROSE } from './type-sizes.ts';

const ABOVE_TABLE = 12;
const BELOW_TABLE = 5;
const ABOVE_FACTS = 22;

/**
 * The report of a class: every pupil of the list, in the table or by name below it, then the class in numbers. Under
 * codes it holds no name anywhere. Pure: the same class gives the same pages everywhere.
 */
export function composeClassReport(print: ClassPrint): PlacedPages {
  const { file, results } = print;
  if (file.sharing.as === 'summary') throw new RangeError('a summary has pages of its own');
  const words = printWords(file.report.language);
  const head: ReportHead = {
    title: classTitle(print, words),
    subtitle: classSubtitle(print, tableTitle(results.table), words),
    place: tableTitle(results.table),
    foot: classFoot(results.table, words, results.check),
    draft: results.table.draft ? say(words, 'head.draft') : '',
  };
  const { flow, frame, paper } = openReport(head, file.report.paper, words);
  layTitle(flow, head, tableParagraphs(print, words));
  const remarks = layPupils(flow, print, words);
  layMissed(flow, missedParagraphs(print, results, words));
  if (results.facts.boxPlot !== null) flow.turn();
  else flow.skip(ABOVE_FACTS);
  layClassFacts(flow, print, words);
  return placedReport(head, { flow, frame, paper }, file.report.language, remarks);
}

/** The table of the pupils with its notes; says what of it had to be left out. */
function layPupils(flow: SheetFlow, print: ClassPrint, words: PrintWords): readonly string[] {
  flow.skip(ABOVE_TABLE);
  if (print.results.pupils.length === 0) {
    flow.sideBySide(plainParagraphs([say(words, 'class.nobody')], 'sans', PROSE, flow.halfWidth, 'nobody'), [], PROSE);
    return [];
  }
  const table = pupilsTable(print, words);
  const columns = [...table.columns];
  const left: string[] = [];
  let measure = measureRowTable(table, flow.width);
  while (measure === null) {
    const last = columns.pop();
    if (last === undefined) throw new RangeError('a table that does not even hold names');
    left.unshift(last.heading.join(' '));
    measure = measureRowTable({ ...table, columns }, flow.width);
  }
  layRowTable(flow, { ...table, columns }, measure);
  flow.skip(BELOW_TABLE);
  const notes = tableNotes(print, words, measure.chart !== null);
  flow.inTwoColumns(plainParagraphs(notes, 'sans', SMALL_PROSE, flow.halfWidth, 'table note'), SMALL_PROSE);
  return remarksOn(left, measure.chart !== null, measure.scale);
}

function remarksOn(left: readonly string[], hasChart: boolean, scale: number): readonly string[] {
  return [
    ...(left.length === 0
      ? []
      : [`The page is too narrow for ${left.join(', ')}; left out. Choose fewer columns, or larger paper.`]),
    ...(hasChart ? [] : ['The chosen columns leave no room for the band chart. Choose fewer, or larger paper.']),
    ...(scale < 1 ? ['The chosen columns are set in smaller type to fit. Choose fewer, or larger paper.'] : []),
  ];
}
