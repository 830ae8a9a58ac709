import { DEFAULT_BLOCKS } from './booklet-blocks.ts';
import { DEFAULT_POLICY } from './policy.ts';
import { PROJECT_FORMAT, PROJECT_VERSION, type NormProject } from './norm-project.ts';
import { DEFAULT_SETTING, ENGLISH_LANGUAGE } from './sheet-schema.ts';

/** Cautions that print unless the user rewrites them. */
export const STANDING_CAUTIONS =
  'A percentile rank is a place in a named group, not a per cent of correct answers. Its steps are unequal: do not add, ' +
  'subtract or average percentile ranks. Use this table only for this form, season and group. Never let one score be ' +
  'the only ground for a decision about a person; follow local rules and the judgement of a qualified professional.';

export const STANDING_HOW_TO_READ =
  'Find the raw score in the first column. The percentile rank beside it tells where that score stands in the group ' +
  'this table was made from.';

/** A project with nothing read yet and every choice at its default. */
export function newProject(title: string): NormProject {
  return {
    format: PROJECT_FORMAT,
    version: PROJECT_VERSION,
    title,
    subtitle: '',
    people: 'people',
    source: null,
    reading: null,
    tally: null,
    groups: {
      by: [],
      choices: [],
      documentation: { population: '', sampling: '', participation: '', testDates: '', weighting: '' },
    },
    curve: { definition: { kind: 'midpoint' }, smoothing: { kind: 'none' }, exceptions: [] },
    precision: { interval: 'wilson', level: 95, reliability: null, bootstrap: { replicates: 1000, seed: 1 } },
    table: {
      columns: ['stanine', 't'],
      decimals: 0,
      rounding: 'half-up',
      ends: 'signs',
      zSource: 'normalised',
      zEnds: 'limits',
    },
    sheet: {
      paper: 'a4',
      orientation: 'portrait',
      tableColumns: 3,
      marginMm: null,
      ...DEFAULT_SETTING,
      title: 'Raw score to percentile rank',
      howToRead: STANDING_HOW_TO_READ,
      cautions: STANDING_CAUTIONS,
      notes: '',
      ogive: true,
      inverse: false,
      blocks: DEFAULT_BLOCKS,
      language: ENGLISH_LANGUAGE,
    },
    release: { edition: '1.0', date: '', answers: [], analyst: '', checker: '', changes: null },
    cuts: [],
    classTable: null,
    adjustments: [],
    policy: DEFAULT_POLICY,
  };
}
