import type { ClassFacts } from '../class/class-results.ts';
import { figure, say, type PhraseKey, type PrintWords } from '../languages/phrases.ts';
import { printCount, printNumber, printScore } from '../scores/printed-number.ts';
import { layHeading } from './block-text.ts';
import { boxPicture, quartersPicture } from './class-pictures.ts';
import type { ClassPrint } from './class-print.ts';
import { readingParagraphs, theGroup } from './class-report-texts.ts';
import { figureInWords } from './class-words.ts';
import {
  layRowTable,
  placeRowTable,
  type RowChart,
  type RowTable,
  type RowTableCell,
  type RowTableColumn,
} from './row-table.ts';
import { measureRowTable, type MeasuredRowTable } from './row-table-measure.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, paragraphLines, placeLines, type LooseLine } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { PROSE, READING, SMALL_PROSE } from './type-sizes.ts';

const BETWEEN_SECTIONS = 19;
const BELOW_HEADING = 4;
const BELOW_PICTURE = 4;
const BOX_HEIGHT = 62;
const LEAST_BARS = 60;
/** Width of the table with the bars against that of the page. */
const BARS_SHARE = 0.72;

/** The class in numbers: who, the raw scores, the quarters of the norm group, its groups, and how to read all this. */
export function layClassFacts(flow: SheetFlow, print: ClassPrint, words: PrintWords): void {
  const { facts, comparison } = print.results;
  laySideBySide(flow, words, [
    { name: 'counts', heading: 'class.counts-heading', table: countsTable(print, words) },
    ...(facts.boxPlot === null
      ? []
      : [{ name: 'scores', heading: 'class.scores-heading', table: scoresTable(facts, words) } as const]),
  ]);
  layScores(flow, print, words);
  if (facts.n > 0) layQuarters(flow, print, words);
  if (comparison !== null) layComparison(flow, print, words);
  flow.skip(BETWEEN_SECTIONS);
  const paragraphs = readingParagraphs(print, words);
  const [left, right] = [paragraphs.slice(0, -1), paragraphs.slice(-1)].map((each, side) =>
    paragraphLines(each, PROSE, flow.halfWidth, `reading ${side}`),
  );
  flow.sideBySide(left ?? [], right ?? [], PROSE);
}

interface Section {
  readonly name: string;
  readonly heading: PhraseKey & `class.${string}-heading`;
  readonly table: RowTable;
}

/** Two small tables beside each other, each under its heading. */
function laySideBySide(flow: SheetFlow, words: PrintWords, sections: readonly Section[]): void {
  const placed = sections.map(({ name, heading, table }) => {
    const lines = linesOf(say(words, heading), 'sans-bold', READING, flow.halfWidth, {
      kind: 'heading',
      level: 2,
      name: `${name} heading`,
    });
    const measure = fitted(table, flow.halfWidth);
    const headed = heightOf(lines, READING) + BELOW_HEADING;
    const { height } = placeRowTable(table, measure, { x: 0, top: 0 });
    return { lines, table, measure, headed, height: headed + height };
  });
  const height = Math.max(...placed.map((each) => each.height));
  flow.need(height);
  const top = flow.y;
  placed.forEach(({ lines, table, measure, headed }, index) => {
    const x = index === 0 ? flow.left : flow.rightHalf;
    flow.place(
      [
        ...placeLines(lines, READING, { x, top, width: flow.halfWidth }),
        ...placeRowTable(table, measure, { x, top: top + headed }).blocks,
      ],
      0,
    );
  });
  flow.place([], height);
}

function fitted(table: RowTable, width: number): MeasuredRowTable {
  const measure = measureRowTable(table, width);
  if (measure === null) throw new RangeError(`the table ${table.name} does not fit the page`);
  return measure;
}

function countsTable({ results }: ClassPrint, words: PrintWords): RowTable {
  const { counts } = results;
  const rows = [
    ['class.count-listed', counts.rows, true],
    ['class.count-reported', counts.reported, true],
    ['class.count-absent', counts.absent, true],
    ['class.count-not-tested', counts.notTested, true],
    ['class.count-excused', counts.excused, true],
    ['class.count-left-out', counts.leftOut, false],
    ['class.count-open', counts.open, false],
  ] as const;
  const shown = rows.filter(([, count, always]) => always || count > 0);
  return namedFigures(
    'counts',
    say(words, 'class.counted'),
    say(words, 'class.count'),
    shown.map(([key, count]) => [say(words, key), figure(words, printCount(count))]),
  );
}

const FIVE_NAMES = ['class.lowest', 'class.lower-hinge', 'class.median', 'class.upper-hinge', 'class.highest'] as const;

/** The five numbers with their names, in the words of the report. */
export function fiveNumbers(facts: ClassFacts, words: PrintWords): readonly (readonly [string, string])[] {
  return (facts.fiveNumbers ?? []).map(({ printed }, index) => {
    const name = FIVE_NAMES[index];
    if (name === undefined) throw new RangeError('a sixth of five numbers');
    return [say(words, name), figure(words, printed)];
  });
}

function scoresTable(facts: ClassFacts, words: PrintWords): RowTable {
  return namedFigures('scores', say(words, 'class.place'), say(words, 'class.score'), fiveNumbers(facts, words));
}

/** A table of names and figures. */
function namedFigures(
  name: string,
  first: string,
  second: string,
  rows: readonly (readonly [string, string])[],
): RowTable {
  return {
    name,
    fives: false,
    columns: [
      column(
        [first],
        'words',
        rows.map(([text]) => text),
      ),
      column(
        [second],
        'figures',
        rows.map(([, text]) => text),
      ),
    ],
    chart: null,
  };
}

function column(
  heading: readonly string[],
  kind: RowTableColumn['kind'],
  texts: readonly string[],
  saidOf: (text: string) => string | null = () => null,
): RowTableColumn {
  return { heading, kind, bold: false, cells: texts.map((text): RowTableCell => ({ text, said: saidOf(text) })) };
}

/** The box plot with what it shows; the scores themselves where there are too few for one. */
function layScores(flow: SheetFlow, { results }: ClassPrint, words: PrintWords): void {
  const { facts, table } = results;
  if (facts.n === 0) return;
  flow.skip(BETWEEN_SECTIONS);
  if (facts.boxPlot === null) {
    const scores = facts.scores.flatMap(({ scoreText, count }) =>
      Array.from({ length: count }, () => figure(words, scoreText)),
    );
    layAcross(flow, 'scores', say(words, 'class.scores-listed', { scores: scores.join(', ') }));
    return;
  }
  const size = { width: flow.width, height: BOX_HEIGHT };
  const caption = captionLines(flow, 'box', say(words, 'class.box-caption'));
  flow.need(size.height + BELOW_PICTURE + heightOf(caption, SMALL_PROSE));
  const printed = (score: number): string => figure(words, printScore(table.scale, score));
  flow.place(
    [
      {
        kind: 'picture',
        x: flow.left,
        y: flow.y,
        ...size,
        svg: boxPicture(facts.boxPlot, facts.scores, table.scale, size, (text) => figure(words, text)),
        alt: say(words, 'class.box-alt', {
          lowest: printed(table.scale.min),
          highest: printed(table.scale.max),
          numbers: fiveNumbers(facts, words)
            .map(([name, text]) => `${name} ${text}`)
            .join(', '),
        }),
      },
    ],
    size.height + BELOW_PICTURE,
  );
  placeCaption(flow, caption);
}

/** How many of the class have ranks in each quarter, beside a quarter of the class. */
function layQuarters(flow: SheetFlow, { results }: ClassPrint, words: PrintWords): void {
  const { facts, table } = results;
  const counts = facts.quarters.map(({ count }) => figure(words, printCount(count)));
  const expected = { n: figure(words, printCount(facts.n)), expected: quarterOf(facts.n, words) };
  const bars: RowChart = {
    leastWidth: LEAST_BARS,
    draw: (rows, size, headRule) => ({
      svg: quartersPicture(
        facts.quarters,
        rows.map(({ middle }) => middle),
        size,
        headRule,
      ),
      alt: say(words, 'class.quarters-alt', {
        ...expected,
        counts: facts.quarters
          .map(({ ranks }, index) =>
            say(words, 'class.quarter-alt', { ranks: figureInWords(words, ranks), count: counts[index] ?? '' }),
          )
          .join('; '),
      }),
    }),
  };
  const quarters: RowTable = {
    name: 'quarters',
    fives: false,
    columns: [
      column(
        [say(words, 'class.quarter-ranks')],
        'figures',
        facts.quarters.map(({ ranks }) => ranks),
        (text) => figureInWords(words, text),
      ),
      column([say(words, 'class.quarter-count')], 'figures', counts),
    ],
    chart: facts.boxPlot === null ? null : bars,
  };
  const measure = fitted(quarters, flow.width * BARS_SHARE);
  const heading = table.groupNoun === 'norm group' ? 'class.quarters-heading' : 'class.quarters-heading-sample';
  const said = say(words, 'class.quarters-expected', { ...expected, 'the-group': theGroup(table, words) });
  const caption = captionLines(flow, 'quarters', facts.boxPlot === null ? '' : said);
  laySection(flow, 'quarters', say(words, heading), quarters, measure, caption);
}

/** A quarter of a count with the decimals that it takes: 7, 7.5, 7.25. */
function quarterOf(n: number, words: PrintWords): string {
  return figure(words, printNumber(n / 4, n % 4 === 0 ? 0 : n % 2 === 0 ? 1 : 2));
}

/** The groups of the class by raw scores and normal curve equivalents. */
function layComparison(flow: SheetFlow, { results }: ClassPrint, words: PrintWords): void {
  const { comparison } = results;
  if (comparison === null) return;
  const { groups, hasNce } = comparison;
  const shown = (text: string | null): string => (text === null ? '\u2013' : figure(words, text));
  const said = (text: string): string | null => {
    const figure = figureInWords(words, text);
    return figure === text ? null : figure;
  };
  const figures = (key: PhraseKey & `class.compared-${string}`, texts: readonly string[]): RowTableColumn =>
    column(say(words, key).split('\n'), 'figures', texts, said);
  const table: RowTable = {
    name: 'groups',
    fives: true,
    columns: [
      column(
        [say(words, 'class.compared-group')],
        'words',
        groups.map(({ group }) => group),
      ),
      figures(
        'class.compared-n',
        groups.map(({ n }) => shown(printCount(n))),
      ),
      figures(
        'class.compared-median',
        groups.map(({ median }) => shown(median)),
      ),
      figures(
        'class.compared-mean',
        groups.map(({ mean }) => shown(mean)),
      ),
      ...(hasNce
        ? [
            figures(
              'class.compared-nce',
              groups.map(({ nceMean }) => shown(nceMean)),
            ),
          ]
        : []),
    ],
    chart: null,
  };
  const caption = captionLines(flow, 'groups', say(words, 'class.compared-note'));
  laySection(flow, 'groups', say(words, 'class.compared-heading'), table, fitted(table, flow.width), caption);
}

function laySection(
  flow: SheetFlow,
  name: string,
  heading: string,
  table: RowTable,
  measure: MeasuredRowTable,
  caption: readonly LooseLine[],
): void {
  flow.skip(BETWEEN_SECTIONS);
  const { height } = placeRowTable(table, measure, { x: 0, top: 0 });
  const below = BELOW_PICTURE + heightOf(caption, SMALL_PROSE);
  layHeading(flow, `${name} heading`, heading, Math.min(height + below, flow.freshRoom / 2));
  layRowTable(flow, table, measure);
  flow.skip(BELOW_PICTURE);
  placeCaption(flow, caption);
}

function captionLines(flow: SheetFlow, name: string, text: string): readonly LooseLine[] {
  return linesOf(text, 'sans', SMALL_PROSE, flow.width, paragraph(`${name} caption`));
}

function placeCaption(flow: SheetFlow, lines: readonly LooseLine[]): void {
  const height = heightOf(lines, SMALL_PROSE);
  flow.need(height);
  flow.place(placeLines(lines, SMALL_PROSE, { x: flow.left, top: flow.y, width: flow.width }), height);
}

function layAcross(flow: SheetFlow, name: string, text: string): void {
  const lines = linesOf(text, 'sans', PROSE, flow.width, paragraph(name));
  const height = heightOf(lines, PROSE);
  flow.need(height);
  flow.place(placeLines(lines, PROSE, { x: flow.left, top: flow.y, width: flow.width }), height);
}
