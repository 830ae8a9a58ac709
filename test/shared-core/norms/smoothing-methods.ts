import type { Smoothed } from '../../../shared-core/smoothing/smoothing.ts';
import { logLinear } from './small-projects.ts';

/** 173 people on 0 to 10, nobody at 4: every method can smooth them. */
export const SMOOTHED_COUNTS = [4, 9, 14, 25, 0, 40, 33, 22, 13, 7, 6] as const;

/** Every method of smoothing, in each of the ways it can be chosen. */
export const SMOOTHING_METHODS: readonly (readonly [string, Smoothed['choice']])[] = [
  ['a log-linear model of degree 3', logLinear(3)],
  ['a log-linear model by BIC', logLinear('bic')],
  ['a log-linear model by AIC', logLinear('aic')],
  ['a log-linear model by tests', logLinear('likelihood-ratio')],
  ['a log-linear model that keeps a score', { ...logLinear(2), keptScores: [4] }],
  ['a log-linear model that keeps a comb', { ...logLinear(2), comb: { every: 2, offset: 0 } }],
  ['a kernel', { kind: 'kernel', bandwidth: 'auto', after: null }],
  ['a kernel of a given bandwidth', { kind: 'kernel', bandwidth: 1.2, after: null }],
  ['a kernel after a log-linear model', { kind: 'kernel', bandwidth: 0.7, after: logLinear(4) }],
  ['a beta-binomial distribution', { kind: 'beta-binomial' }],
];
