import type { TotalledRow } from '../class/class-counts.ts';
import type { SuppressedCell } from '../class/small-cells.ts';
import { figure, printWords, say, type PrintWords } from '../languages/phrases.ts';
import { printCount } from '../scores/printed-number.ts';
import type { PlacedPages } from './booklet.ts';
import type { ClassPrint } from './class-print.ts';
import { layTitle, openReport, placedReport, type ReportHead } from './class-report-frame.ts';
import {
  classFoot,
  classSubtitle,
  classTitle,
  readingParagraphs,
  tableParagraphs,
  tableTitle,
} from './class-report-texts.ts';
import { BETWEEN_SECTIONS, column, laySection, namedFigures } from './class-sections.ts';
import { classSummary, toldCounts, type ClassSummary, type SharedGroup } from './class-summary.ts';
import type { Paragraph } from './paragraph.ts';
import type { RowTable } from './row-table.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { paragraphLines } from './text-lines.ts';
import { PROSE } from './type-sizes.ts';

const NO_VALUE = '\u2013';

/** The summary of a class: no pupil, no score of a pupil, and no count that could tell of one. */
export function composeClassSummary(print: ClassPrint): PlacedPages {
  const { file, results } = print;
  const words = printWords(file.report.language);
  const summary = classSummary(print);
  const head: ReportHead = {
    title: classTitle(print, words),
    subtitle: classSubtitle(print, tableTitle(results.table), words),
    place: tableTitle(results.table),
    foot: classFoot(results.table, words, summary.check),
    draft: results.table.draft ? say(words, 'head.draft') : '',
  };
  const open = openReport(head, file.report.paper, words);
  const { flow } = open;
  layTitle(flow, head, [...tableParagraphs(print, words), summaryParagraph(summary, words)]);
  layCounts(flow, summary, words);
  layStatistics(flow, summary, words);
  if (summary.compared !== null) layCompared(flow, summary.compared, words);
  flow.skip(BETWEEN_SECTIONS);
  flow.inTwoColumns(paragraphLines(readingParagraphs(print, words), PROSE, flow.halfWidth, 'reading'), PROSE);
  return placedReport(head, open, file.report.language, []);
}

/** What is hidden and why, in the words of the report. */
export function summaryParagraph(summary: ClassSummary, words: PrintWords): Paragraph {
  return { lead: say(words, 'class.summary-lead'), text: summaryText(summary, words) };
}

function summaryText({ counts }: ClassSummary, words: PrintWords): string {
  const again = say(words, 'class.summary-again');
  const least = figure(words, printCount(counts.below));
  switch (counts.kind) {
    case 'nothing':
      return say(words, 'class.summary-nothing', { least });
    case 'class-only':
      return [
        say(words, 'class.summary-class-only', { least }),
        whatIsHidden([counts.together], least, words),
        again,
      ].join(' ');
    case 'table':
      return [whatIsHidden([...counts.rows, counts.together], least, words), again].join(' ');
  }
}

function whatIsHidden(rows: readonly TotalledRow<SuppressedCell>[], least: string, words: PrintWords): string {
  return rows.some(hasHidden) ? say(words, 'class.summary-hidden', { least }) : say(words, 'class.summary-all');
}

function hasHidden(row: TotalledRow<SuppressedCell>): boolean {
  return toldCounts(row).includes(null);
}

/** A row for each group and one for the whole class. */
export function summaryRows(
  { groups, counts }: ClassSummary,
  words: PrintWords,
): readonly { readonly label: string; readonly counts: readonly (number | null)[] }[] {
  const whole = say(words, 'class.summary-whole');
  switch (counts.kind) {
    case 'nothing':
      return [];
    case 'class-only':
      return [{ label: whole, counts: toldCounts(counts.together) }];
    case 'table':
      return [
        ...(groups.length === 0
          ? []
          : counts.rows.map((row, index) => ({
              label: groups[index] ?? say(words, 'class.summary-no-group'),
              counts: toldCounts(row),
            }))),
        { label: whole, counts: toldCounts(counts.together) },
      ];
  }
}

/** Heads of the counts behind the group, in the order of `toldCounts`. */
export function summaryHeads({ quarters }: ClassSummary, words: PrintWords): readonly string[] {
  return [
    ...quarters.map((ranks) => say(words, 'class.summary-ranks', { ranks })),
    say(words, 'class.summary-tested'),
    say(words, 'class.count-absent'),
    say(words, 'class.summary-not-tested'),
    say(words, 'class.count-excused'),
    say(words, 'class.summary-total'),
  ];
}

function layCounts(flow: SheetFlow, summary: ClassSummary, words: PrintWords): void {
  const rows = summaryRows(summary, words);
  if (rows.length === 0) return;
  const table: RowTable = {
    name: 'summary',
    fives: true,
    columns: [
      column(
        say(words, 'class.column-group'),
        'words',
        rows.map(({ label }) => label),
      ),
      ...summaryHeads(summary, words).map((heading, place) =>
        column(
          heading,
          'figures',
          rows.map(({ counts }) => countText(counts[place] ?? null, words)),
        ),
      ),
    ],
    chart: null,
  };
  laySection(flow, table, { heading: say(words, 'class.summary-heading'), caption: '' });
}

function countText(count: number | null, words: PrintWords): string {
  return count === null ? say(words, 'class.hidden') : figure(words, printCount(count));
}

function layStatistics(flow: SheetFlow, { statistics }: ClassSummary, words: PrintWords): void {
  if (statistics.length === 0) return;
  const heads = [say(words, 'class.place'), say(words, 'class.score')] as const;
  const rows = statistics.map(({ name, printed }) => [say(words, `class.${name}`), figure(words, printed)] as const);
  laySection(flow, namedFigures('scores', heads, rows), {
    heading: say(words, 'class.scores-heading'),
    caption: say(words, 'class.summary-ends'),
    width: flow.halfWidth,
  });
}

function layCompared(flow: SheetFlow, groups: readonly SharedGroup[], words: PrintWords): void {
  const columns = (
    [
      ['class.compared-median', groups.map(({ median }) => median)],
      ['class.compared-mean', groups.map(({ mean }) => mean)],
      ['class.compared-nce', groups.map(({ nceMean }) => nceMean)],
    ] as const
  ).filter(([, texts]) => texts.some((text) => text !== null));
  const table: RowTable = {
    name: 'groups',
    fives: true,
    columns: [
      column(
        say(words, 'class.compared-group'),
        'words',
        groups.map(({ group }) => group),
      ),
      ...columns.map(([key, texts]) =>
        column(
          say(words, key),
          'figures',
          texts.map((text) => (text === null ? NO_VALUE : figure(words, text))),
        ),
      ),
    ],
    chart: null,
  };
  laySection(flow, table, {
    heading: say(words, 'class.compared-heading'),
    caption: say(words, 'class.compared-note'),
  });
}
