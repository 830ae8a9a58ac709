import type { LogLinearChoice, SmoothingChoice } from '../smoothing/smoothing.ts';
import { groupKey } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';

/** A log-linear model as it is first offered. */
export const USUAL_LOG_LINEAR: LogLinearChoice = { degree: 'bic', keptScores: [], comb: null };

/** How a group is smoothed: in its own way, or like all others. */
export function smoothingOf(project: NormProject, key: string): SmoothingChoice {
  return ownSmoothing(project, key) ?? project.curve.smoothing;
}

/** A group's own way, or null where it goes with the others. */
export function ownSmoothing(project: NormProject, key: string): SmoothingChoice | null {
  return project.curve.exceptions.find(({ values }) => groupKey(values) === key)?.smoothing ?? null;
}

/** The project with another smoothing for all groups, or for one group alone (given by its values). */
export function withSmoothing(
  project: NormProject,
  smoothing: SmoothingChoice,
  values: readonly string[] | null,
): NormProject {
  if (values === null) return { ...project, curve: { ...project.curve, smoothing } };
  const others = project.curve.exceptions.filter((known) => groupKey(known.values) !== groupKey(values));
  return { ...project, curve: { ...project.curve, exceptions: [...others, { values, smoothing }] } };
}

/** The project with a group smoothed like all others again. */
export function withoutOwnSmoothing(project: NormProject, key: string): NormProject {
  const exceptions = project.curve.exceptions.filter(({ values }) => groupKey(values) !== key);
  return { ...project, curve: { ...project.curve, exceptions } };
}

/** The log-linear model in a choice, by itself or before a kernel; null where there is none. */
export function logLinearIn(smoothing: SmoothingChoice): LogLinearChoice | null {
  switch (smoothing.kind) {
    case 'log-linear':
      return { degree: smoothing.degree, keptScores: smoothing.keptScores, comb: smoothing.comb };
    case 'kernel':
      return smoothing.after;
    case 'none':
    case 'beta-binomial':
      return null;
  }
}

/** The same choice with another log-linear model in it; a choice without one stays as it is. */
export function withLogLinear(smoothing: SmoothingChoice, model: LogLinearChoice): SmoothingChoice {
  switch (smoothing.kind) {
    case 'log-linear':
      return { kind: 'log-linear', ...model };
    case 'kernel':
      return smoothing.after === null ? smoothing : { ...smoothing, after: model };
    case 'none':
    case 'beta-binomial':
      return smoothing;
  }
}
