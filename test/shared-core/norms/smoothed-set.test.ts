import { describe, expect, it } from 'vitest';
import { pressProblem } from '../../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import {
  logLinearIn,
  ownSmoothing,
  smoothingOf,
  withLogLinear,
  withoutOwnSmoothing,
  withSmoothing,
} from '../../../shared-core/norms/smoothing-choice.ts';
import type { SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';
import { builtSet, logLinear, projectOf, scaleTo, settledProject, smoothedBy } from './small-projects.ts';
import { SMOOTHED_COUNTS } from './smoothing-methods.ts';

/** Two grades of 346 people each, not evenly spread. */
function twoGrades(): NormProject {
  const settled = settledProject();
  if (settled.tally === null) throw new Error('no tally');
  const cells = settled.tally.cells.map((cell) => ({ ...cell, counts: SMOOTHED_COUNTS }));
  return { ...settled, tally: { ...settled.tally, scale: scaleTo(10), cells } };
}

const kernel: SmoothingChoice = { kind: 'kernel', bandwidth: 0.8, after: logLinear(3) };
const degreesIn = (project: NormProject) =>
  builtSet(project).groups.map(({ smoothing }) => (smoothing.state === 'smoothed' ? smoothing.curve.degree : null));

describe('the smoothing of a group', () => {
  const all = smoothedBy(twoGrades(), logLinear(2));

  it('is that of all groups, or its own', () => {
    expect(degreesIn(all)).toEqual([2, 2]);
    const own = withSmoothing(all, logLinear(4), ['10']);
    expect(degreesIn(own)).toEqual([2, 4]);
    expect(degreesIn(withSmoothing(own, { kind: 'none' }, ['10']))).toEqual([2, null]);
    expect(degreesIn(withSmoothing(own, logLinear(3), null))).toEqual([3, 4]);
    expect(degreesIn(withoutOwnSmoothing(own, '["10"]'))).toEqual([2, 2]);
    expect(withoutOwnSmoothing(own, '["10"]')).toEqual(all);
    expect([ownSmoothing(own, '["4"]'), ownSmoothing(own, '["10"]')]).toEqual([null, logLinear(4)]);
    expect(smoothingOf(own, '["4"]')).toEqual(logLinear(2));
  });

  it('is kept once for each group', () => {
    const twice = withSmoothing(withSmoothing(all, logLinear(4), ['10']), kernel, ['10']);
    expect(twice.curve.exceptions).toEqual([{ values: ['10'], smoothing: kernel }]);
  });

  it('leaves the numbers of the other groups alone', () => {
    const before = builtSet(all).groups[0];
    const after = builtSet(withSmoothing(all, { kind: 'beta-binomial' }, ['10'])).groups[0];
    expect(after).toEqual(before);
  });

  it('holds a log-linear model, or none', () => {
    expect(logLinearIn(kernel)).toEqual(logLinear(3));
    expect(logLinearIn(logLinear('aic'))).toEqual({ degree: 'aic', keptScores: [], comb: null });
    expect([logLinearIn({ kind: 'none' }), logLinearIn({ kind: 'beta-binomial' })]).toEqual([null, null]);
    const model = { degree: 5, keptScores: [2], comb: null };
    expect(withLogLinear(kernel, model)).toEqual({ ...kernel, after: model });
    expect(withLogLinear(logLinear(2), model)).toEqual({ kind: 'log-linear', ...model });
    for (const none of [
      { kind: 'none' },
      { kind: 'beta-binomial' },
      { kind: 'kernel', bandwidth: 'auto', after: null },
    ] as const) {
      expect(withLogLinear(none, model)).toBe(none);
    }
  });
});

describe('a smoothing that the data cannot carry', () => {
  const few = projectOf([0, 3, 0, 5, 0, 2, 0]);
  const refused = builtSet(smoothedBy(few, logLinear(9)));

  it('is a state of its own, with what works instead', () => {
    const [norms] = refused.groups;
    if (norms?.smoothing.state !== 'refused') throw new Error('not refused');
    expect(norms.smoothing.problem).toMatch(/^Degree 9 asks for more than this group can say.*\.$/);
    expect(norms.evidence).toBeNull();
    const { instead } = norms.smoothing;
    const next = builtSet(smoothedBy(few, instead));
    expect(next.groups[0]?.smoothing.state).toBe(instead.kind === 'none' ? 'none' : 'smoothed');
    expect(pressProblem(next)).toBeNull();
  });

  it('shows the observed ranks', () => {
    const plain = builtSet(few).groups[0];
    expect(refused.groups[0]?.rows).toEqual(plain?.rows);
    expect(refused.groups[0]?.rows.every(({ provenance }) => provenance.printed.from === 'observed')).toBe(true);
  });

  it('may not be pressed, and the sentence names the group', () => {
    expect(pressProblem(refused)).toMatch(/^All pupils cannot be smoothed as chosen\. Degree 9 asks for more/);
    const one = withSmoothing(twoGrades(), { ...logLinear(2), keptScores: [77] }, ['10']);
    expect(pressProblem(builtSet(one))).toBe(
      'Grade 10 cannot be smoothed as chosen. 77 is not a score of this scale, so it cannot be kept.',
    );
    const choices = [{ values: ['10'], title: '', printed: false }];
    expect(pressProblem(builtSet({ ...one, groups: { ...one.groups, choices } }))).toBeNull();
    expect(pressProblem(builtSet(twoGrades()))).toBeNull();
    expect(pressProblem(builtSet(smoothedBy(twoGrades(), logLinear('bic'))))).toBeNull();
  });

  it.each<[string, readonly number[], SmoothingChoice]>([
    ['one score alone', [0, 6, 0], logLinear('bic')],
    ['one score alone, by a kernel', [0, 6, 0], { kind: 'kernel', bandwidth: 'auto', after: null }],
    ['less spread than a binomial', [0, 0, 5, 30, 5, 0, 0], { kind: 'beta-binomial' }],
    ['two people', [1, 0, 1], logLinear('aic')],
  ])('is refused for %s', (_, counts, smoothing) => {
    const set = builtSet(smoothedBy(projectOf(counts), smoothing));
    expect(set.groups[0]?.smoothing.state).toBe('refused');
    expect(pressProblem(set)).toMatch(/^All pupils cannot be smoothed as chosen\. [A-Z].*\.$/);
  });
});

describe('the check code of a smoothed set', () => {
  const plain = twoGrades();
  const codeOf = (project: NormProject): string => builtSet(project).check;
  const variants: readonly (readonly [string, NormProject])[] = [
    ['none', plain],
    ['degree 2', smoothedBy(plain, logLinear(2))],
    ['degree 3', smoothedBy(plain, logLinear(3))],
    ['by BIC', smoothedBy(plain, logLinear('bic'))],
    ['by AIC', smoothedBy(plain, logLinear('aic'))],
    ['a score kept', smoothedBy(plain, { ...logLinear(2), keptScores: [4] })],
    ['a comb kept', smoothedBy(plain, { ...logLinear(2), comb: { every: 2, offset: 0 } })],
    ['kernel', smoothedBy(plain, kernel)],
    ['another bandwidth', smoothedBy(plain, { ...kernel, bandwidth: 0.9 })],
    ['one grade alone', withSmoothing(plain, logLinear(2), ['4'])],
    ['the other grade alone', withSmoothing(plain, logLinear(2), ['10'])],
  ];
  const codes = new Map(variants.map(([name, project]) => [name, codeOf(project)]));

  it('is another for every method, and the same each time', () => {
    expect(new Set(codes.values()).size).toBe(codes.size);
    expect(codeOf(smoothedBy(twoGrades(), logLinear(2)))).toBe(codes.get('degree 2'));
  });

  it('changes with the method even where every printed number stays', () => {
    // An even spread is its own log-linear curve.
    const even = settledProject();
    const numbers = (project: NormProject) =>
      builtSet(project).groups.map(({ rows }) => rows.map((row) => row.printed));
    expect(numbers(smoothedBy(even, logLinear(2)))).toEqual(numbers(even));
    expect(codeOf(smoothedBy(even, logLinear(2)))).not.toBe(codeOf(even));
    const before = withSmoothing(even, logLinear(2), ['4']);
    expect(codeOf(before)).not.toBe(codeOf(even));
  });

  it('knows level, interval and reliability only where a column prints them', () => {
    const withColumns = (columns: NormProject['table']['columns'], change: Partial<NormProject['precision']>) =>
      codeOf({ ...plain, table: { ...plain.table, columns }, precision: { ...plain.precision, ...change } });
    for (const change of [{ level: 90 }, { interval: 'jeffreys' as const }]) {
      expect(withColumns(['interval'], change)).not.toBe(withColumns(['interval'], {}));
      expect(withColumns(['t'], change)).toBe(withColumns(['t'], {}));
    }
    const band = ['measurement-band'] as const;
    expect(withColumns(band, { reliability: 0.9 })).not.toBe(withColumns(band, { reliability: 0.8 }));
    expect(withColumns(['t'], { reliability: 0.9 })).toBe(withColumns(['t'], {}));
  });
});
