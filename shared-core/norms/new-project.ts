import { standingTexts } from '../languages/standing-texts.ts';
import { DEFAULT_BLOCKS } from './booklet-blocks.ts';
import { DEFAULT_POLICY } from './policy.ts';
import { PROJECT_FORMAT, PROJECT_VERSION, type NormProject } from './norm-project.ts';
import { DEFAULT_SETTING, ENGLISH_LANGUAGE } from './sheet-schema.ts';

const STANDING = standingTexts('en');

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
      ...STANDING,
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
