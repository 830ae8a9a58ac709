import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import { buildNormSet, type NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { Reading } from '../../../shared-core/norms/reading.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import type { Direction, ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import type { LogLinearChoice, SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';

/** A whole-number scale from 0. */
export function scaleTo(max: number, direction: Direction = 'high-is-good'): ScoreScale {
  return { min: 0, max, step: 1, direction };
}

/** Ten people on a scale of 0 to 4, nobody at 3; every number of it can be had by hand. */
export const TEN_COUNTS = [1, 2, 3, 0, 4] as const;

/** A project of typed counts in one group. */
export function projectOf(counts: readonly number[], scale: ScoreScale = scaleTo(counts.length - 1)): NormProject {
  const people = counts.reduce((sum, count) => sum + count, 0);
  return {
    ...newProject('Ostrey Vale spelling (invented)'),
    people: 'pupils',
    source: {
      kind: 'typed',
      file: '',
      sha256: 'a'.repeat(64),
      bytes: 10,
      rowsRead: people,
      rowsKept: people,
      leftOut: [],
      scaleInferred: false,
    },
    tally: {
      scale,
      groupColumns: [],
      weightDecimals: null,
      cells: [{ values: [], counts, weights: null, squares: null, clusters: null }],
    },
  };
}

/** The ten people with weights of one decimal: 1.0, 2 × 0.5, 3 × 1.2, none, 4 × 0.9. */
export function weightedProject(direction: Direction = 'high-is-good'): NormProject {
  return {
    ...projectOf(TEN_COUNTS),
    tally: {
      scale: scaleTo(4, direction),
      groupColumns: [],
      weightDecimals: 1,
      cells: [
        {
          values: [],
          counts: TEN_COUNTS,
          weights: ['10', '10', '36', '0', '36'],
          squares: ['100', '50', '432', '0', '324'],
          clusters: null,
        },
      ],
    },
  };
}

export const READING: Reading = {
  layout: 'people',
  encoding: 'utf-8',
  separator: ',',
  decimalMark: '.',
  header: true,
  sheet: null,
  roles: [
    { column: 'pupil', role: 'id' },
    { column: 'grade', role: 'group' },
    { column: 'form', role: 'group' },
    { column: 'score', role: 'score' },
  ],
  missing: ['99', 'abs'],
  scale: scaleTo(20),
  decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
};

/** Two grades of 420 people each, spread evenly over 0 to 20, fully documented and signed: nothing to ask about. */
export function settledProject(): NormProject {
  const even = Array.from({ length: 21 }, () => 10);
  const bare = newProject('Ostrey Vale reading (invented)');
  return {
    ...bare,
    subtitle: 'Forms A and B',
    people: 'pupils',
    source: {
      kind: 'people',
      file: 'reading.csv',
      sha256: 'b'.repeat(64),
      bytes: 4096,
      rowsRead: 842,
      rowsKept: 840,
      leftOut: [{ rule: 'missing-code', count: 2, rows: [7, 9] }],
      scaleInferred: false,
    },
    reading: READING,
    tally: {
      scale: scaleTo(20),
      groupColumns: ['grade', 'form'],
      weightDecimals: null,
      cells: ['4', '10'].flatMap((grade) =>
        ['A', 'B'].map((form) => ({
          values: [grade, form],
          counts: even,
          weights: null,
          squares: null,
          clusters: null,
        })),
      ),
    },
    groups: {
      by: ['grade'],
      choices: [],
      documentation: {
        population: 'All pupils of the invented Ostrey Vale.',
        sampling: 'Everybody.',
        participation: '98 in 100.',
        testDates: 'May 2026',
        weighting: 'None.',
      },
    },
    sheet: { ...bare.sheet, notes: 'Read aloud.', inverse: true },
    release: { ...bare.release, edition: '1.0', date: '2026-06-15', analyst: 'A. Weir', checker: 'J. Lund' },
  };
}

/** The choices of the Curve station with one smoothing for all groups, none unless it is given. */
export function curveOf(
  definition: RankDefinition,
  smoothing: SmoothingChoice = { kind: 'none' },
): NormProject['curve'] {
  return { definition, smoothing, exceptions: [] };
}

/** The project with all groups smoothed so. */
export function smoothedBy(project: NormProject, smoothing: SmoothingChoice): NormProject {
  return { ...project, curve: { ...project.curve, smoothing } };
}

/** A log-linear model that keeps nothing apart. */
export function logLinear(degree: LogLinearChoice['degree']): { readonly kind: 'log-linear' } & LogLinearChoice {
  return { kind: 'log-linear', degree, keptScores: [], comb: null };
}

/** The set of a project that can be built; fails the test otherwise. */
export function builtSet(project: NormProject): NormSet {
  const built = buildNormSet(project);
  if (!built.ok) throw new Error(built.problem);
  return built.normSet;
}

/** The first group's norms. */
export function firstNorms(project: NormProject): GroupNorms {
  const [norms] = builtSet(project).groups;
  if (norms === undefined) throw new Error('no group');
  return norms;
}
