import { describe, expect, it } from 'vitest';
import { WrongOption } from '../../../src-main/command-line/option-values.ts';
import { smoothingAsOption, smoothingFromOption } from '../../../src-main/command-line/smooth-option.ts';
import type { SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';

const logLinear = (degree: number | 'bic' | 'aic' | 'likelihood-ratio') => ({ degree, keptScores: [], comb: null });

describe('the value of --smooth', () => {
  it.each<[string, SmoothingChoice]>([
    ['none', { kind: 'none' }],
    ['beta-binomial', { kind: 'beta-binomial' }],
    ['log-linear:auto', { kind: 'log-linear', ...logLinear('bic') }],
    ['log-linear:aic', { kind: 'log-linear', ...logLinear('aic') }],
    ['log-linear:likelihood-ratio', { kind: 'log-linear', ...logLinear('likelihood-ratio') }],
    ['log-linear:1', { kind: 'log-linear', ...logLinear(1) }],
    ['log-linear:10', { kind: 'log-linear', ...logLinear(10) }],
    ['kernel:auto', { kind: 'kernel', bandwidth: 'auto', after: null }],
    ['kernel:0.25', { kind: 'kernel', bandwidth: 0.25, after: null }],
    ['log-linear:4+kernel:2', { kind: 'kernel', bandwidth: 2, after: logLinear(4) }],
    ['log-linear:auto+kernel:auto', { kind: 'kernel', bandwidth: 'auto', after: logLinear('bic') }],
  ])('%s means what it says, and is what is typed for it', (text, choice) => {
    expect(smoothingFromOption(text)).toEqual(choice);
    expect(smoothingAsOption(choice)).toBe(text);
  });

  it.each([
    '',
    'log-linear',
    'log-linear:',
    'log-linear:0',
    'log-linear:11',
    'log-linear:2.5',
    'log-linear:bic ',
    'kernel',
    'kernel:0',
    'kernel:-1',
    'kernel:wide',
    'kernel:1e-9',
    'kernel:1e9',
    'log-linear:2+kernel:1e9',
    'kernel:1+log-linear:2',
    'log-linear:2+log-linear:3',
    'log-linear:2+kernel:1+kernel:1',
    'beta-binomial+kernel:1',
    'none:1',
  ])('"%s" is wrong', (text) => {
    expect(() => smoothingFromOption(text)).toThrow(WrongOption);
    expect(() => smoothingFromOption(text)).toThrow(`not "${text}".`);
  });
});
