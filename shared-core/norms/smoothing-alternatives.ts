import { INTERVAL_METHODS, type IntervalMethod } from '../precision/proportion-interval.ts';
import type { DegreeRule, SmoothingChoice } from '../smoothing/smoothing.ts';
import type { Alternative } from './alternatives.ts';
import type { NormProject } from './norm-project.ts';
import { groupKey } from './norm-groups.ts';
import { logLinearIn, ownSmoothing, USUAL_LOG_LINEAR, withLogLinear, withSmoothing } from './smoothing-choice.ts';
import { degreeInWords, intervalName, smoothingInWords } from './smoothing-words.ts';

/** Values of the group whose own smoothing is chosen; null for all groups. */
export type SmoothingScope = readonly string[] | null;

/** The smoothing that a scope's choices change. */
export function smoothingInScope(project: NormProject, scope: SmoothingScope): SmoothingChoice {
  return (scope === null ? null : ownSmoothing(project, groupKey(scope))) ?? project.curve.smoothing;
}

/** Ways of smoothing, each with what it does to the data. */
export function smoothingAlternatives(project: NormProject, scope: SmoothingScope): readonly Alternative[] {
  const now = smoothingInScope(project, scope);
  const model = logLinearIn(now) ?? USUAL_LOG_LINEAR;
  const bandwidth = now.kind === 'kernel' ? now.bandwidth : 'auto';
  const ways: readonly (readonly [SmoothingChoice, string])[] = [
    [{ kind: 'none' }, 'Each rank is what the sample gives, with the accidents of its steps.'],
    [
      { kind: 'log-linear', ...model },
      'Keeps the number of people and as many moments as its degree: mean, standard deviation, skewness … The usual choice.',
    ],
    [
      { kind: 'kernel', bandwidth, after: null },
      'Spreads each score by a normal curve; keeps mean and standard deviation and follows the data closely.',
    ],
    [
      { kind: 'kernel', bandwidth, after: model },
      'First the log-linear model, then a kernel that makes its steps continuous.',
    ],
    [
      { kind: 'beta-binomial' },
      'Two parameters, for number-right scores from 0 in whole marks; refused where the spread does not fit.',
    ],
  ];
  return ways.map(([smoothing, explanation]) => ({
    label: smoothingInWords(smoothing),
    explanation,
    chosen: sameKind(now, smoothing),
    project: withSmoothing(project, smoothing, scope),
  }));
}

function sameKind(left: SmoothingChoice, right: SmoothingChoice): boolean {
  return left.kind === right.kind && (logLinearIn(left) === null) === (logLinearIn(right) === null);
}

const RULES: readonly (readonly [DegreeRule, string])[] = [
  ['bic', 'The degree with the lowest G² + ln n · (degree + 1): charges for every moment; sparing.'],
  ['aic', 'The degree with the lowest G² + 2 · (degree + 1): keeps more of the shape.'],
  ['likelihood-ratio', 'From degree 10 down, the first whose highest moment matters at the 5 % level.'],
];

/** Degrees of the log-linear model: rules and numbers. */
export function degreeAlternatives(project: NormProject, scope: SmoothingScope): readonly Alternative[] {
  const now = smoothingInScope(project, scope);
  const model = logLinearIn(now) ?? USUAL_LOG_LINEAR;
  const numbers = Array.from({ length: 10 }, (_, index): readonly [number, string] => [
    index + 1,
    momentsKept(index + 1),
  ]);
  return [...RULES, ...numbers].map(([degree, explanation]) => ({
    label: degreeInWords(degree),
    explanation,
    chosen: model.degree === degree,
    project: withSmoothing(project, withLogLinear(now, { ...model, degree }), scope),
  }));
}

function momentsKept(degree: number): string {
  const names = ['mean', 'standard deviation', 'skewness', 'kurtosis'].slice(0, degree);
  return degree <= names.length
    ? `Keeps ${names.join(', ')}.`
    : `Keeps ${names.join(', ')} and moments up to the ${degree}th.`;
}

const INTERVAL_EXPLANATIONS: Readonly<Record<IntervalMethod, string>> = {
  wilson: 'Covers close to the level on average, also near the ends (Wilson 1927).',
  'clopper-pearson': 'Covers at least the level, so it is wide; whole counts only (Clopper & Pearson 1934).',
  jeffreys: 'Equal tails of a beta distribution; close to the level on average.',
};

export function intervalAlternatives(project: NormProject): readonly Alternative[] {
  return INTERVAL_METHODS.map((interval) => ({
    label: `${intervalName(interval)} interval`,
    explanation: INTERVAL_EXPLANATIONS[interval],
    chosen: project.precision.interval === interval,
    project: { ...project, precision: { ...project.precision, interval } },
  }));
}

const LEVELS: readonly (readonly [number, string])[] = [
  [68, 'About one standard error to either side.'],
  [80, 'Misses in one table cell of five.'],
  [90, 'Misses in one of ten.'],
  [95, 'Misses in one of twenty. The usual choice.'],
  [99, 'Misses in one of a hundred.'],
];

export function levelAlternatives(project: NormProject): readonly Alternative[] {
  const now = project.precision.level;
  const levels = LEVELS.some(([level]) => level === now)
    ? LEVELS
    : [...LEVELS, [now, 'As this project has it.'] as const];
  return levels.map(([level, explanation]) => ({
    label: `${level} %`,
    explanation,
    chosen: now === level,
    project: { ...project, precision: { ...project.precision, level } },
  }));
}
