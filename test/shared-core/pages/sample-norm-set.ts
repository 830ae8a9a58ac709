import { newProject } from '../../../shared-core/norms/new-project.ts';
import { buildNormSet, type NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { Direction, ScoreScale } from '../../../shared-core/scale/score-scale.ts';

export interface SampleCohort {
  readonly scale: Omit<ScoreScale, 'direction'>;
  readonly direction?: Direction;
  /** Values of the column "grade". */
  readonly groups?: readonly string[];
  readonly weighted?: boolean;
}

/** An invented cohort of bell-shaped counts, the same each time, with the choices that a test asks for. */
export function sampleProject(
  { scale, direction = 'high-is-good', groups = ['4', '5'], weighted = false }: SampleCohort,
  change: (project: NormProject) => NormProject = (project) => project,
): NormProject {
  const length = Math.round((scale.max - scale.min) / scale.step) + 1;
  const cells = groups.map((value, group) => {
    const [middle, spread] = [length * (0.5 + 0.06 * group), Math.max(1, length * 0.18)];
    const counts = Array.from({ length }, (_, place) => {
      const height = (900 / spread) * Math.exp(-(((place - middle) / spread) ** 2) / 2);
      return Math.round(height * (0.8 + 0.05 * ((place * 7 + group * 3) % 9)));
    });
    return {
      values: [value],
      counts,
      weights: weighted ? counts.map((count, place) => String(count * (90 + (place % 5) * 10))) : null,
      squares: weighted ? counts.map((count, place) => String(count * (90 + (place % 5) * 10) ** 2)) : null,
      clusters: null,
    };
  });
  const project = newProject('Ostrey Vale reading survey (invented)');
  return change({
    ...project,
    subtitle: 'Form A',
    people: 'pupils',
    tally: { scale: { ...scale, direction }, groupColumns: ['grade'], weightDecimals: weighted ? 2 : null, cells },
    groups: { ...project.groups, by: ['grade'] },
    release: { ...project.release, date: '2026-06-01' },
  });
}

export function sampleNormSet(cohort: SampleCohort, change?: (project: NormProject) => NormProject): NormSet {
  const built = buildNormSet(sampleProject(cohort, change));
  if (!built.ok) throw new Error(built.problem);
  return built.normSet;
}

export const WHOLE_SCALE = { min: 0, max: 40, step: 1 } as const;

export const LOG_LINEAR = { kind: 'log-linear', degree: 'bic', keptScores: [], comb: null } as const;
export const KERNEL = { kind: 'kernel', bandwidth: 'auto', after: null } as const;
