import { LANGUAGE_NAMES, type ShippedWords } from '../languages/shipped-words.ts';
import { usualNumbers } from '../languages/number-format.ts';
import { PAPER_NAMES } from '../norms/sheet-statement.ts';
import type { ClassFile, ReportChoices, SlipChoices } from './class-file.ts';
import { SORT_WORDS, type ClassChoice } from './class-sentences.ts';

/** One way a choice can be made: what it is, what it changes, and the class with it made. */
export interface ClassOffer {
  readonly label: string;
  readonly explanation: string;
  readonly chosen: boolean;
  readonly file: ClassFile;
}

type Paper = ReportChoices['paper'];
type Language = ReportChoices['language'];

const PAPER_SIZES: Readonly<Record<Paper, string>> = {
  a4: '210 × 297 mm.',
  letter: '8½ × 11 inches.',
  a5: '148 × 210 mm.',
};

/** All ways a choice can be made, the present one marked; null for the columns, of which several can be ticked. */
export function classOffers(file: ClassFile, choice: ClassChoice): readonly ClassOffer[] | null {
  const { report, slips } = file;
  const ofReport = (change: Partial<ReportChoices>): ClassFile => ({ ...file, report: { ...report, ...change } });
  const ofSlips = (change: Partial<SlipChoices>): ClassFile => ({ ...file, slips: { ...slips, ...change } });
  switch (choice) {
    case 'report-paper':
      return paperOffers(report.paper, (paper) => ofReport({ paper }));
    case 'slip-paper':
      return paperOffers(slips.paper, (paper) => ofSlips({ paper }));
    case 'report-language':
      return languageOffers(report.language, (language) => ofReport({ language }));
    case 'slip-language':
      return languageOffers(slips.language, (language) => ofSlips({ language }));
    case 'sort':
      return sortOffers(file).map(([sort, explanation]) => ({
        label: SORT_WORDS[sort],
        explanation,
        chosen: report.sort === sort,
        file: ofReport({ sort }),
      }));
    case 'per-page':
      return ([1, 2, 3, 4] as const).map((perPage) => ({
        label: perPage === 1 ? 'one slip' : `${perPage} slips`,
        explanation: perPage === 1 ? 'A page for each.' : 'With marks to cut them apart.',
        chosen: slips.perPage === perPage,
        file: ofSlips({ perPage }),
      }));
    case 'columns':
      return null;
  }
}

function paperOffers(present: Paper, made: (paper: Paper) => ClassFile): readonly ClassOffer[] {
  return (['a4', 'letter', 'a5'] as const).map((paper) => ({
    label: PAPER_NAMES[paper],
    explanation: PAPER_SIZES[paper],
    chosen: present === paper,
    file: made(paper),
  }));
}

/** Tag and numbers follow the words; words of the user’s own stay. */
function languageOffers(present: Language, made: (language: Language) => ClassFile): readonly ClassOffer[] {
  return (Object.keys(LANGUAGE_NAMES) as ShippedWords[]).map((words) => ({
    label: LANGUAGE_NAMES[words],
    explanation: 'Words, numbers and dates as they are usual in this language.',
    chosen: present.words === words,
    file: made({ ...present, tag: words, words, numbers: usualNumbers(words) }),
  }));
}

function sortOffers({ table, people }: ClassFile): readonly (readonly [ReportChoices['sort'], string])[] {
  const best = table === null ? 'The best score of the class stands first.' : 'The best score stands first.';
  return [
    ['list', `As the ${people} stand in your list.`],
    ['name', 'By the letters of the name as it is written.'],
    ['score', best],
    ...(table === null
      ? []
      : [
          [
            'rank',
            `The highest rank stands first; where ${people} have tables of their own, this is not the order of scores.`,
          ] as const,
        ]),
    ['group', 'Groups of the list one after another.'],
  ];
}
