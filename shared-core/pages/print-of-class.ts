import type { ClassFile } from '../class/class-file.ts';
import { classResults } from '../class/class-results.ts';
import { classStanding } from '../class/class-standing.ts';
import { pupilCodes } from '../class/pupil-codes.ts';
import type { Reply } from '../desk.ts';
import type { PlacedPages } from './booklet.ts';
import type { ClassPrint, StandingPrint } from './class-print.ts';
import { composeClassReport } from './class-report-pages.ts';
import { composeClassStanding } from './class-standing-pages.ts';
import { composeClassSummary } from './class-summary-pages.ts';

/** A class as it is printed: looked up in a table, as a summary of that, or in order within itself. */
export type PrintOfClass =
  | { readonly kind: 'report' | 'summary'; readonly print: ClassPrint }
  | { readonly kind: 'standing'; readonly print: StandingPrint };

const NO_SUMMARY =
  'A class without a table has no summary: its standing is made of nothing but single pupils. Choose a table, or share ' +
  'the standing with names or codes.';

function unansweredSummary(rows: number): string {
  return (
    `${rows === 1 ? 'A row of the list has' : `${rows} rows of the list have`} an open question. A summary counts ` +
    'everybody once: answer the questions first, or take the rows out of the list.'
  );
}

/** What is printed of a class file. The problem is a sentence that tells what to do. */
export function printOfClass(file: ClassFile): Reply<PrintOfClass> {
  const codes = file.sharing.as === 'codes' ? pupilCodes(file.list.rows.length, file.sharing.seed) : [];
  if (file.table === null) {
    if (file.sharing.as === 'summary') return { ok: false, problem: NO_SUMMARY };
    return { ok: true, value: { kind: 'standing', print: { file, codes, standing: classStanding(file) } } };
  }
  const built = classResults(file);
  if (!built.ok) return built;
  const kind = file.sharing.as === 'summary' ? 'summary' : 'report';
  const { open } = built.results;
  if (kind === 'summary' && open.length > 0) return { ok: false, problem: unansweredSummary(open.length) };
  return { ok: true, value: { kind, print: { file, codes, results: built.results } } };
}

/** The pages of the report. */
export function reportPages(printed: PrintOfClass): PlacedPages {
  switch (printed.kind) {
    case 'report':
      return composeClassReport(printed.print);
    case 'summary':
      return composeClassSummary(printed.print);
    case 'standing':
      return composeClassStanding(printed.print);
  }
}
