import { LANGUAGE_NAMES } from '../languages/shipped-words.ts';
import { countedPeople } from '../norms/norm-groups.ts';
import { PAPER_NAMES } from '../norms/sheet-statement.ts';
import { printCount } from '../scores/printed-number.ts';
import type { ClassFile } from './class-file.ts';
import type { ClassQuestion } from './class-questions.ts';

export const CLASS_STATIONS = ['table', 'list', 'questions', 'report', 'slips', 'press'] as const;
export type ClassStation = (typeof CLASS_STATIONS)[number];

const SHARED_AS: Readonly<Record<ClassFile['sharing']['as'], string>> = {
  names: 'with names',
  codes: 'with codes',
  summary: 'as a summary',
};

/** What each station of a class holds now, in a few words. */
export function classContents(
  { table, list, people, report, slips, sharing }: ClassFile,
  questions: readonly ClassQuestion[],
): Readonly<Record<ClassStation, string>> {
  const rows = list.rows.length;
  return {
    table: table === null ? 'none: class standing' : table.title,
    list: rows === 0 ? 'nobody yet' : countedPeople(printCount(rows), people),
    questions: questionsHeld(questions),
    report: `${PAPER_NAMES[report.paper]}, ${LANGUAGE_NAMES[report.language.words]}`,
    slips:
      table === null || sharing.as === 'summary'
        ? 'none'
        : `${slips.perPage} to a page, ${LANGUAGE_NAMES[slips.language.words]}`,
    press: SHARED_AS[sharing.as],
  };
}

function questionsHeld(questions: readonly ClassQuestion[]): string {
  const open = questions.filter(({ answer }) => answer === null).length;
  if (questions.length === 0) return 'none';
  return open === 0 ? `${questions.length} answered` : `${open} of ${questions.length} open`;
}
