import { LANGUAGE_NAMES } from '../languages/shipped-words.ts';
import { ENGLISH_WORDS } from '../languages/phrases.ts';
import { inSeries } from '../languages/series.ts';
import { PAPER_NAMES } from '../norms/sheet-statement.ts';
import { columnsToTick } from './class-columns.ts';
import type { ClassFile, ReportChoices } from './class-file.ts';

/** Phrases of a class’s sentences that stand for a choice. */
export type ClassChoice =
  'report-paper' | 'report-language' | 'sort' | 'columns' | 'slip-paper' | 'slip-language' | 'per-page';

/** A sentence in order; a part with a choice is a phrase that stands for it. */
export interface ClassSentencePart {
  readonly text: string;
  /** Null for plain words. */
  readonly choice: ClassChoice | null;
}

export const SORT_WORDS: Readonly<Record<ReportChoices['sort'], string>> = {
  list: 'in the order of the list',
  name: 'by name',
  score: 'by raw score',
  rank: 'by percentile rank',
  group: 'by group',
};

/** What the Report station says and lets choose. */
export function reportSentence(file: ClassFile): readonly ClassSentencePart[] {
  const { report, sharing, table, people } = file;
  const what = table === null ? 'class standing' : sharing.as === 'summary' ? 'summary' : 'report';
  return [
    plain(`The ${what} is printed in `),
    phrase('report-language', LANGUAGE_NAMES[report.language.words]),
    plain(' on '),
    phrase('report-paper', PAPER_NAMES[report.paper]),
    ...(table !== null && sharing.as === 'summary'
      ? [plain('; it names nobody.')]
      : [plain(`. The ${people} stand `), ...order(file)]),
  ];
}

function order(file: ClassFile): readonly ClassSentencePart[] {
  const { report, sharing } = file;
  return [
    sharing.as === 'codes' ? plain('in the order of their codes') : phrase('sort', SORT_WORDS[report.sort]),
    ...(columnsToTick(file).length === 0
      ? []
      : [plain(', each with raw score, percentile rank and '), phrase('columns', columnsInWords(file))]),
    plain('.'),
  ];
}

function columnsInWords(file: ClassFile): string {
  const names = columnsToTick(file)
    .filter(({ key }) => file.report.columns.includes(key))
    .map(({ name }) => name);
  return names.length === 0 ? 'no further column' : inSeries(ENGLISH_WORDS, names);
}

/** What the Slips station says and lets choose. */
export function slipSentence({ slips, people }: ClassFile): readonly ClassSentencePart[] {
  return [
    plain(`The ${people} get slips in `),
    phrase('slip-language', LANGUAGE_NAMES[slips.language.words]),
    plain(', printed on '),
    phrase('slip-paper', PAPER_NAMES[slips.paper]),
    plain(' with '),
    phrase('per-page', slips.perPage === 1 ? 'one slip' : `${slips.perPage} slips`),
    plain(' to a page.'),
  ];
}

function plain(text: string): ClassSentencePart {
  return { text, choice: null };
}

function phrase(choice: ClassChoice, text: string): ClassSentencePart {
  return { text, choice };
}
