import type { ClassTable } from '../class/class-table.ts';
import { figure, printWords, say, type PhraseKey, type PrintWords } from '../languages/phrases.ts';
import { asSentence } from '../languages/sentence.ts';
import { printCount } from '../scores/printed-number.ts';
import { countRows, fiveNumbers } from './class-scores-blocks.ts';
import type { ClassPrint, PrintedClass, StandingPrint } from './class-print.ts';
import { peopleRows, standingRows, type ListedStatus, type PeopleRows } from './class-people-rows.ts';
import {
  classSubtitle,
  classTitle,
  missedParagraphs,
  readingParagraphs,
  tableParagraphs,
  tableTitle,
} from './class-report-texts.ts';
import { standingParagraphs } from './class-standing-pages.ts';
import { summaryHeads, summaryParagraph, summaryRows } from './class-summary-pages.ts';
import { classSummary } from './class-summary.ts';
import { peopleWord } from './class-words.ts';
import type { Paragraph } from './paragraph.ts';

/** A sheet of the workbook of a class: a title and one table below it. */
export interface ClassSheet {
  readonly name: string;
  readonly title: string;
  readonly heads: readonly string[];
  /** How each column is filled: words as texts, figures as numbers where they are some. */
  readonly kinds: readonly ('words' | 'figures')[];
  /** Figures as `printed-number` writes them. */
  readonly rows: readonly (readonly string[])[];
}

/** What the workbook of a class holds, in the words of its report. */
export interface ClassSheets {
  readonly title: string;
  readonly subtitle: string;
  /** "DRAFT" where the table is one; empty otherwise. */
  readonly draft: string;
  readonly check: string;
  readonly sheets: readonly ClassSheet[];
}

/** The pupils, the class in numbers, its groups, and what all this is made from. */
export function classSheets(print: ClassPrint): ClassSheets {
  const words = printWords(print.file.report.language);
  const { results } = print;
  const { facts, comparison } = results;
  const groups = comparison?.groups ?? [];
  const about = [
    ...tableParagraphs(print, words),
    ...missedParagraphs(print, results, words),
    ...readingParagraphs(print, words),
  ];
  return sheetsOf(print, words, aboutTable(results.table, words), results.check, [
    peopleSheet(print, words, peopleRows(print, words)),
    figuresSheet(words, [
      ...countRows(results.counts, words),
      ...(facts.boxPlot === null ? [] : fiveNumbers(facts, words)),
      ...facts.quarters.map(
        ({ ranks, count }) =>
          [`${say(words, 'class.quarter-ranks')} ${figure(words, ranks)}`, printCount(count)] as const,
      ),
    ]),
    ...(groups.length === 0
      ? []
      : [
          {
            name: say(words, 'class.sheet-groups'),
            title: say(words, 'class.compared-heading'),
            heads: (['group', 'n', 'median', 'mean', 'nce'] as const).map((key) =>
              oneLine(say(words, `class.compared-${key}`)),
            ),
            kinds: ['words', 'figures', 'figures', 'figures', 'figures'] as const,
            rows: groups.map(({ group, n, median, mean, nceMean }) => [
              group,
              printCount(n),
              median ?? '',
              mean ?? '',
              nceMean ?? '',
            ]),
          },
        ]),
    aboutSheet(words, about),
  ]);
}

/** The counts that may be told, and what they are made from. */
export function summarySheets(print: ClassPrint): ClassSheets {
  const words = printWords(print.file.report.language);
  const summary = classSummary(print);
  const rows = summaryRows(summary, words);
  const hidden = say(words, 'class.hidden');
  const statistics = summary.statistics.map(({ name, printed }) => [say(words, `class.${name}`), printed] as const);
  return sheetsOf(print, words, aboutTable(print.results.table, words), summary.check, [
    {
      name: say(words, 'class.sheet-summary'),
      title: say(words, 'class.summary-heading'),
      heads: [say(words, 'class.column-group'), ...summaryHeads(summary, words)].map(oneLine),
      kinds: ['words', ...summaryHeads(summary, words).map(() => 'figures' as const)],
      rows: rows.map(({ label, counts }) => [
        label,
        ...counts.map((count) => (count === null ? hidden : printCount(count))),
      ]),
    },
    ...(statistics.length === 0 ? [] : [figuresSheet(words, statistics)]),
    ...(summary.compared === null
      ? []
      : [
          {
            name: say(words, 'class.sheet-groups'),
            title: say(words, 'class.compared-heading'),
            heads: (['group', 'median', 'mean', 'nce'] as const).map((key) =>
              oneLine(say(words, `class.compared-${key}`)),
            ),
            kinds: ['words', 'figures', 'figures', 'figures'] as const,
            rows: summary.compared.map(({ group, median, mean, nceMean }) => [
              group,
              median ?? '',
              mean ?? '',
              nceMean ?? '',
            ]),
          },
        ]),
    aboutSheet(words, [
      ...tableParagraphs(print, words),
      summaryParagraph(summary, words),
      ...readingParagraphs(print, words),
    ]),
  ]);
}

/** The pupils in their order within the class. */
export function standingSheets(print: StandingPrint): ClassSheets {
  const words = printWords(print.file.report.language);
  const { standing } = print;
  return sheetsOf(print, words, { title: say(words, 'standing.title'), draft: '' }, standing.check, [
    peopleSheet(print, words, standingRows(print, words)),
    figuresSheet(words, [
      ...countRows(standing.counts, words),
      ...(standing.facts === null || standing.facts.boxPlot === null ? [] : fiveNumbers(standing.facts, words)),
    ]),
    aboutSheet(words, [...standingParagraphs(print, words), ...missedParagraphs(print, standing, words)]),
  ]);
}

function sheetsOf(
  print: PrintedClass,
  words: PrintWords,
  { title, draft }: About,
  check: string,
  sheets: readonly ClassSheet[],
): ClassSheets {
  return { title: classTitle(print, words), subtitle: classSubtitle(print, title, words), draft, check, sheets };
}

type About = Pick<ClassSheets, 'title' | 'draft'>;

function aboutTable(table: ClassTable, words: PrintWords): About {
  return { title: tableTitle(table), draft: table.draft ? say(words, 'head.draft') : '' };
}

const STATUS_WORDS: Readonly<Record<ListedStatus, PhraseKey & `class.count-${string}`>> = {
  tested: 'class.count-reported',
  absent: 'class.count-absent',
  'not-tested': 'class.count-not-tested',
  excused: 'class.count-excused',
  'left-out': 'class.count-left-out',
  open: 'class.count-open',
};

function peopleSheet(print: PrintedClass, words: PrintWords, { columns, rows }: PeopleRows): ClassSheet {
  return {
    name: asSentence(peopleWord(words, print.file.people)),
    title: classTitle(print, words),
    heads: [...columns.map(({ heading }) => oneLine(heading.join('\n'))), say(words, 'class.column-status')],
    kinds: [...columns.map(({ kind }) => kind), 'words'],
    rows: rows.map(({ texts, status }) => [...texts, say(words, STATUS_WORDS[status])]),
  };
}

function figuresSheet(words: PrintWords, rows: readonly (readonly [string, string])[]): ClassSheet {
  const name = say(words, 'class.sheet-class');
  return {
    name,
    title: name,
    heads: [say(words, 'class.counted'), say(words, 'class.count')],
    kinds: ['words', 'figures'],
    rows,
  };
}

function aboutSheet(words: PrintWords, paragraphs: readonly Paragraph[]): ClassSheet {
  const name = say(words, 'class.sheet-about');
  return {
    name,
    title: name,
    heads: [],
    kinds: ['words', 'words'],
    rows: paragraphs.map(({ lead, text }) => [lead, text]),
  };
}

/** A heading of several lines in one, a divided word put together again. */
function oneLine(heading: string): string {
  return heading.replace(/(?<=\p{L})-\n(?=\p{Ll})/gu, '').replaceAll('\n', ' ');
}
