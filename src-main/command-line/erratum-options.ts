import type { Reply } from '../../shared-core/desk.ts';
import { cutFromText, type Cut } from '../../shared-core/norms/erratum-roster.ts';
import { cohortOptions, type CohortOptions } from './cohort-options.ts';
import { readOrSay, textGiven, WrongOption, type OptionValues } from './option-values.ts';

export interface RosterOptions {
  readonly path: string;
  /** How the roster is read; its identifiers are names or codes, and without them people are told by their row. */
  readonly cohort: CohortOptions;
  /** Whether the columns of the group values were named; otherwise they are called as in the projects. */
  readonly byGiven: boolean;
}

export interface ErratumOptions {
  readonly roster: RosterOptions | null;
  readonly cut: Cut | null;
}

/** Turns the texts of the options into what they mean; the problem says which option to change and how. */
export function erratumOptions(values: OptionValues): Reply<ErratumOptions> {
  return readOrSay(() => {
    const path = textGiven(values, 'roster');
    if (path === null) {
      const idle = ['score', 'by', 'person', 'cut'].find((name) => textGiven(values, name) !== null);
      if (idle !== undefined) throw new WrongOption(`--${idle} needs --roster FILE, the list of people.`);
      return { roster: null, cut: null };
    }
    const { score, by, person } = values;
    const roster = {
      path,
      cohort: cohortOptions({ score, by, id: person }),
      byGiven: textGiven(values, 'by') !== null,
    };
    const cut = textGiven(values, 'cut');
    return { roster, cut: cut === null ? null : readCut(cut) };
  });
}

function readCut(text: string): Cut {
  const cut = cutFromText(text);
  if (cut === null) throw new WrongOption(`--cut is a percentile rank from 0 to 100, such as 25, not "${text}".`);
  return cut;
}
