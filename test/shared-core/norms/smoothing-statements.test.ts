import { describe, expect, it } from 'vitest';
import { alternatives, type Alternative } from '../../../shared-core/norms/alternatives.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { ownSmoothing, withSmoothing } from '../../../shared-core/norms/smoothing-choice.ts';
import { curveStatement, methodText, statementText } from '../../../shared-core/norms/statements.ts';
import type { SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';
import { logLinear, settledProject, smoothedBy } from './small-projects.ts';

const settled = settledProject();
const RANK = 'A pupil’s percentile rank is the share of the group scoring below, plus half of those at the same score.';
const SURE =
  'The sampling error of a rank is told by its 95 % Wilson interval, as if pupils were drawn one by one. ' +
  'The reliability of the test is not given.';

const chosenIn = (listed: readonly Alternative[]): readonly string[] =>
  listed.filter(({ chosen }) => chosen).map(({ label }) => label);

describe('the statement of the Curve station', () => {
  it.each<[string, SmoothingChoice]>([
    ['The distribution is not smoothed.', { kind: 'none' }],
    ['The distribution is smoothed by a log-linear model whose degree is 4, keeping no score apart.', logLinear(4)],
    [
      'The distribution is smoothed by a log-linear model whose degree is chosen by BIC, ' +
        'keeping the share of 0, 20 and the share of every 2nd score from step 1.',
      { ...logLinear('bic'), keptScores: [0, 20], comb: { every: 2, offset: 1 } },
    ],
    [
      'The distribution is smoothed by a normal kernel, with a bandwidth found from the data.',
      { kind: 'kernel', bandwidth: 'auto', after: null },
    ],
    [
      'The distribution is smoothed by a normal kernel after a log-linear model whose degree is chosen by likelihood-ratio tests, ' +
        'keeping no score apart, with a bandwidth 0.8 points.',
      { kind: 'kernel', bandwidth: 0.8, after: logLinear('likelihood-ratio') },
    ],
    ['The distribution is smoothed by a beta-binomial distribution.', { kind: 'beta-binomial' }],
  ])('%s', (sentence, smoothing) => {
    expect(statementText(curveStatement(smoothedBy(settled, smoothing)))).toBe(`${RANK} ${sentence} ${SURE}`);
  });

  it('counts combs in words', () => {
    for (const [every, word] of [
      [3, '3rd'],
      [11, '11th'],
      [21, '21st'],
      [100, '100th'],
    ] as const) {
      const project = smoothedBy(settled, { ...logLinear(2), comb: { every, offset: 0 } });
      expect(statementText(curveStatement(project))).toContain(`every ${word} score from step 0`);
    }
  });

  it('names level, interval and reliability', () => {
    const precision = { ...settled.precision, interval: 'jeffreys' as const, level: 90, reliability: 0.88 };
    expect(statementText(curveStatement({ ...settled, precision }))).toContain(
      'told by its 90 % Jeffreys interval, as if pupils were drawn one by one. The reliability of the test is 0.88.',
    );
  });

  it('speaks of one group where it is asked of one', () => {
    const project = withSmoothing(smoothedBy(settled, logLinear(2)), { kind: 'beta-binomial' }, ['10']);
    const of = (scope: readonly string[] | null): string => statementText(curveStatement(project, scope));
    expect(of(null)).toContain('log-linear model whose degree is 2');
    expect(of(['4'])).toBe(of(null));
    expect(of(['10'])).toContain('The distribution is smoothed by a beta-binomial distribution.');
  });
});

describe('the method as it is printed', () => {
  it('speaks of what the sheet prints, and of nothing else', () => {
    expect(methodText(settled)).not.toMatch(/smoothed|interval|reliability/);
    expect(methodText(smoothedBy(settled, logLinear(3)))).toBe(methodText(settled));
    const withColumn = (column: 'interval' | 'measurement-band'): string =>
      methodText({ ...settled, table: { ...settled.table, columns: [column] } });
    expect(withColumn('interval')).toContain('told by its 95 % Wilson interval.');
    expect(withColumn('measurement-band')).toContain('The reliability of the test is not given.');
  });
});

describe('choices for one group', () => {
  const all = smoothedBy(settled, logLinear(2));
  const change = (project: NormProject, label: string, choice: 'smoothing' | 'degree', values: readonly string[]) => {
    const found = alternatives(project, choice, values).find((alternative) => alternative.label === label);
    if (found === undefined) throw new Error(`no ${label}`);
    return found.project;
  };

  it('leave the others alone', () => {
    const one = change(all, 'smoothed by a beta-binomial distribution', 'smoothing', ['4']);
    expect(one.curve.smoothing).toEqual(logLinear(2));
    expect(one.curve.exceptions).toEqual([{ values: ['4'], smoothing: { kind: 'beta-binomial' } }]);
    const two = change(all, '5', 'degree', ['10']);
    expect([two.curve.smoothing, ownSmoothing(two, '["10"]')]).toEqual([logLinear(2), logLinear(5)]);
  });

  it('begin with what all groups have, and are marked in their own scope', () => {
    expect(chosenIn(alternatives(all, 'degree', ['4']))).toEqual(['2']);
    const own = change(all, 'chosen by AIC', 'degree', ['4']);
    expect(chosenIn(alternatives(own, 'degree', ['4']))).toEqual(['chosen by AIC']);
    expect(chosenIn(alternatives(own, 'degree', ['10']))).toEqual(['2']);
    expect(chosenIn(alternatives(own, 'degree'))).toEqual(['2']);
    expect(chosenIn(alternatives(own, 'smoothing', ['4']))).toEqual(['smoothed by a log-linear model']);
  });
});

describe('another way of smoothing', () => {
  const model = { degree: 5, keptScores: [3], comb: { every: 2, offset: 0 } };
  const kernel: SmoothingChoice = { kind: 'kernel', bandwidth: 0.8, after: model };
  const to = (from: SmoothingChoice, label: string): SmoothingChoice | undefined =>
    alternatives(smoothedBy(settled, from), 'smoothing').find((alternative) => alternative.label === label)?.project
      .curve.smoothing;

  it('takes model and bandwidth along, where it has one', () => {
    expect(to(kernel, 'smoothed by a log-linear model')).toEqual({ kind: 'log-linear', ...model });
    expect(to({ kind: 'log-linear', ...model }, 'smoothed by a normal kernel after a log-linear model')).toEqual({
      kind: 'kernel',
      bandwidth: 'auto',
      after: model,
    });
    expect(to(kernel, 'smoothed by a normal kernel')).toEqual({ kind: 'kernel', bandwidth: 0.8, after: null });
    expect(to({ kind: 'none' }, 'smoothed by a log-linear model')).toEqual(logLinear('bic'));
  });

  it('is the project as it is where it is chosen already', () => {
    for (const smoothing of [
      kernel,
      { kind: 'kernel', bandwidth: 1.5, after: null },
      { kind: 'log-linear', ...model },
      { kind: 'beta-binomial' },
    ] as const) {
      const project = smoothedBy(settled, smoothing);
      const chosen = alternatives(project, 'smoothing').filter((alternative) => alternative.chosen);
      expect(chosen.map((alternative) => alternative.project)).toEqual([project]);
    }
  });

  it('leaves a level that is not among the usual ones in the list', () => {
    const project = { ...settled, precision: { ...settled.precision, level: 97.5 } };
    expect(chosenIn(alternatives(project, 'level'))).toEqual(['97.5 %']);
    expect(alternatives(project, 'level')).toHaveLength(6);
  });
});
