import type { ClassResults } from '../class/class-results.ts';
import { figure, say, type PhraseKey, type PrintWords } from '../languages/phrases.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import { quartersPicture } from './class-pictures.ts';
import type { ClassPrint } from './class-print.ts';
import { readingParagraphs, theGroup } from './class-report-texts.ts';
import { layCountsAndScores } from './class-scores-blocks.ts';
import { BETWEEN_SECTIONS, column, laySection } from './class-sections.ts';
import { figureInWords } from './class-words.ts';
import type { RowChart, RowTable, RowTableColumn } from './row-table.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { paragraphLines } from './text-lines.ts';
import { PROSE } from './type-sizes.ts';

const LEAST_BARS = 60;
/** Width of the table with the bars against that of the page. */
const BARS_SHARE = 0.72;
const NO_VALUE = '\u2013';

/** The class in numbers: who, the raw scores, the quarters of the norm group, its groups, and how to read all this. */
export function layClassFacts(flow: SheetFlow, print: ClassPrint, words: PrintWords): void {
  const { results } = print;
  layCountsAndScores(flow, results.counts, results.facts, results.table.scale, words);
  if (results.facts.n > 0) layQuarters(flow, results, words);
  if (results.comparison !== null) layComparison(flow, results.comparison, words);
  flow.skip(BETWEEN_SECTIONS);
  const paragraphs = readingParagraphs(print, words);
  const [left = [], right = []] = [paragraphs.slice(0, 2), paragraphs.slice(2)].map((each, side) =>
    paragraphLines(each, PROSE, flow.halfWidth, `reading ${side}`),
  );
  flow.sideBySide(left, right, PROSE);
}

/** How many of the class have ranks in each quarter, beside a quarter of the class where there are enough for one. */
function layQuarters(flow: SheetFlow, { facts, table }: ClassResults, words: PrintWords): void {
  const counts = facts.quarters.map(({ count }) => figure(words, printCount(count)));
  const expected = { n: figure(words, printCount(facts.n)), expected: quarterOf(facts.n, words) };
  const inWords = facts.quarters.map(({ ranks }, index) =>
    say(words, 'class.quarter-alt', { ranks: figureInWords(words, ranks), count: counts[index] ?? '' }),
  );
  const bars: RowChart = {
    leastWidth: LEAST_BARS,
    draw: (rows, size, headRule) => ({
      svg: quartersPicture(
        facts.quarters,
        rows.map(({ middle }) => middle),
        size,
        headRule,
      ),
      alt: say(words, 'class.quarters-alt', { ...expected, counts: inWords.join('; ') }),
    }),
  };
  const few = facts.boxPlot === null;
  const quarters: RowTable = {
    name: 'quarters',
    fives: false,
    columns: [
      column(
        say(words, 'class.quarter-ranks'),
        'figures',
        facts.quarters.map(({ ranks }) => ranks),
        (text) => figureInWords(words, text),
      ),
      column(say(words, 'class.quarter-count'), 'figures', counts),
    ],
    chart: few ? null : bars,
  };
  const noun = table.groupNoun === 'norm group';
  laySection(flow, quarters, {
    heading: say(words, noun ? 'class.quarters-heading' : 'class.quarters-heading-sample'),
    caption: few ? '' : say(words, 'class.quarters-expected', { ...expected, 'the-group': theGroup(table, words) }),
    width: flow.width * BARS_SHARE,
  });
}

/** A quarter of a count with the decimals that it takes: 7, 7.5, 7.25. */
function quarterOf(n: number, words: PrintWords): string {
  return figure(words, printNumber(n / 4, n % 4 === 0 ? 0 : n % 2 === 0 ? 1 : 2));
}

/** The groups of the class by raw scores and normal curve equivalents. */
function layComparison(
  flow: SheetFlow,
  { groups, hasNce }: NonNullable<ClassResults['comparison']>,
  words: PrintWords,
): void {
  const shown = (text: string | null): string => (text === null ? NO_VALUE : figure(words, text));
  const saidOf = (text: string): string | null => {
    const said = figureInWords(words, text);
    return said === text ? null : said;
  };
  const figures = (key: PhraseKey & `class.compared-${string}`, texts: readonly (string | null)[]): RowTableColumn =>
    column(say(words, key), 'figures', texts.map(shown), saidOf);
  const table: RowTable = {
    name: 'groups',
    fives: true,
    columns: [
      column(
        say(words, 'class.compared-group'),
        'words',
        groups.map(({ group }) => group),
      ),
      figures(
        'class.compared-n',
        groups.map(({ n }) => printCount(n)),
      ),
      figures(
        'class.compared-median',
        groups.map(({ median }) => median),
      ),
      figures(
        'class.compared-mean',
        groups.map(({ mean }) => mean),
      ),
      ...(hasNce
        ? [
            figures(
              'class.compared-nce',
              groups.map(({ nceMean }) => nceMean),
            ),
          ]
        : []),
    ],
    chart: null,
  };
  laySection(flow, table, {
    heading: say(words, 'class.compared-heading'),
    caption: say(words, 'class.compared-note'),
  });
}
