import type { IntervalMethod } from '../precision/proportion-interval.ts';
import { ordinal } from '../smoothing/ordinal.ts';
import type { DegreeRule, LogLinearChoice, SmoothingChoice } from '../smoothing/smoothing.ts';

/** The rule for a degree after "whose degree is". */
export function degreeInWords(degree: number | DegreeRule): string {
  switch (degree) {
    case 'bic':
      return 'chosen by BIC';
    case 'aic':
      return 'chosen by AIC';
    case 'likelihood-ratio':
      return 'chosen by likelihood-ratio tests';
    default:
      return String(degree);
  }
}

/** The method after "the distribution is". */
export function smoothingInWords(choice: SmoothingChoice): string {
  switch (choice.kind) {
    case 'none':
      return 'not smoothed';
    case 'log-linear':
      return 'smoothed by a log-linear model';
    case 'kernel':
      return choice.after === null
        ? 'smoothed by a normal kernel'
        : 'smoothed by a normal kernel after a log-linear model';
    case 'beta-binomial':
      return 'smoothed by a beta-binomial distribution';
  }
}

/** A few words for the list of stations. */
export function smoothingInBrief(choice: SmoothingChoice): string {
  switch (choice.kind) {
    case 'none':
      return 'not smoothed';
    case 'log-linear':
      return `log-linear, ${typeof choice.degree === 'number' ? `degree ${choice.degree}` : degreeInWords(choice.degree).replace('chosen ', '')}`;
    case 'kernel':
      return choice.after === null ? 'kernel' : 'log-linear and kernel';
    case 'beta-binomial':
      return 'beta-binomial';
  }
}

/** Scores and comb that a log-linear model keeps, after "keeping". */
export function keptInWords({ keptScores, comb }: LogLinearChoice): string {
  const parts = [
    ...(keptScores.length === 0 ? [] : [`the share of ${keptScores.join(', ')}`]),
    ...(comb === null ? [] : [`the share of every ${ordinal(comb.every)} score from step ${comb.offset}`]),
  ];
  return parts.length === 0 ? 'no score apart' : parts.join(' and ');
}

export function bandwidthInWords(bandwidth: number | 'auto'): string {
  return bandwidth === 'auto' ? 'found from the data' : `${bandwidth} points`;
}

const INTERVAL_NAMES: Readonly<Record<IntervalMethod, string>> = {
  wilson: 'Wilson',
  'clopper-pearson': 'Clopper–Pearson',
  jeffreys: 'Jeffreys',
};

export function intervalName(method: IntervalMethod): string {
  return INTERVAL_NAMES[method];
}
