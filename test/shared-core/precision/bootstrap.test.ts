import { describe, expect, it } from 'vitest';
import {
  bootstrapProblem,
  bootstrapRanks,
  replicatesNeeded,
  type Bootstrapped,
  type BootstrapPlan,
  type BootstrapProgress,
  type BootstrapResult,
} from '../../../shared-core/precision/bootstrap.ts';
import { rankStandardErrors, smoothedStandardErrors } from '../../../shared-core/precision/rank-variance.ts';
import { smoothedRanks } from '../../../shared-core/precision/counted-rank.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import { tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';

const scale = { min: 0, max: 12, step: 1, direction: 'high-is-good' as const };
const table = tableFromCounts(scale, [4, 9, 16, 30, 47, 62, 66, 60, 45, 31, 17, 8, 5]);
const N = 400;
const plan: BootstrapPlan = { choice: { kind: 'none' }, counted: 'midpoint', replicates: 4000, seed: 20, level: 95 };
const logLinear = (degree: number | 'bic') => ({ kind: 'log-linear' as const, degree, keptScores: [], comb: null });

function run(
  of: FrequencyTable,
  n: number,
  how: BootstrapPlan,
): { readonly told: readonly BootstrapProgress[]; readonly result: BootstrapResult } {
  const steps = bootstrapRanks(of, n, how);
  const told: BootstrapProgress[] = [];
  for (;;) {
    const step = steps.next();
    if (step.done === true) return { told, result: step.value };
    told.push(step.value);
  }
}

function bootstrapped(of: FrequencyTable, n: number, how: BootstrapPlan): Bootstrapped {
  const { result } = run(of, n, how);
  if (!result.ok) throw new Error(result.problem);
  return result.bootstrapped;
}

/** A standard deviation of R replicates is off by about 1/√(2R), 1.1 %; five times that is allowed. */
const TOLERANCE = 5 / Math.sqrt(2 * plan.replicates);

describe('the bootstrap', () => {
  it.each(['midpoint', 'below', 'at-or-below'] as const)('gives the analytic standard error of %s ranks', (counted) => {
    const { standardErrors } = bootstrapped(table, N, { ...plan, counted });
    rankStandardErrors(table, counted, N).forEach((expected, position) => {
      const found = standardErrors[position] ?? NaN;
      expect(Math.abs(found - expected), `${position}: ${found}, not ${expected}`).toBeLessThanOrEqual(
        TOLERANCE * expected + 1e-9,
      );
    });
  });

  it('draws as many people as the effective n', () => {
    const quarter = bootstrapped(table, N / 4, plan);
    expect(quarter.people).toBe(100);
    rankStandardErrors(table, 'midpoint', N / 4).forEach((expected, position) => {
      expect(Math.abs((quarter.standardErrors[position] ?? NaN) / expected - 1)).toBeLessThan(TOLERANCE);
    });
  });

  it('agrees with the delta method for a log-linear model of given degree', () => {
    const choice = logLinear(3);
    const fit = smooth(table, choice);
    if (!fit.ok) throw new Error(fit.problem);
    const analytic = smoothedStandardErrors(fit.smoothed, 'high-is-good', 'midpoint') ?? [];
    const found = bootstrapped(table, N, { ...plan, choice, replicates: 2000 });
    expect(found.fitted).toBe(2000);
    expect(found.degrees).toEqual([{ degree: 3, count: 2000 }]);
    analytic.forEach((expected, position) => {
      // The delta method is itself an approximation; it differs by less than 3 % here.
      expect(Math.abs((found.standardErrors[position] ?? NaN) / expected - 1)).toBeLessThan(0.11);
    });
  });

  it('chooses the degree again in each sample', () => {
    const found = bootstrapped(table, N, { ...plan, choice: logLinear('bic'), replicates: 400 });
    expect(found.degrees.length).toBeGreaterThan(1);
    expect(found.degrees.reduce((sum, { count }) => sum + count, 0)).toBe(found.fitted);
  });

  it('has intervals about the ranks, in the order of the scores', () => {
    const choice = logLinear(3);
    const fit = smooth(table, choice);
    if (!fit.ok) throw new Error(fit.problem);
    const { intervals } = bootstrapped(table, N, { ...plan, choice, replicates: 1000 });
    const errors = smoothedStandardErrors(fit.smoothed, 'high-is-good', 'midpoint') ?? [];
    smoothedRanks(fit.smoothed, 'high-is-good', 'midpoint').forEach((rank, position) => {
      const { low, high } = intervals?.[position] ?? { low: NaN, high: NaN };
      expect(low).toBeLessThan(rank);
      expect(high).toBeGreaterThan(rank);
      expect(Math.abs((high - low) / (2 * 1.96 * (errors[position] ?? NaN)) - 1)).toBeLessThan(0.2);
    });
  });

  it('gives the same numbers for the same seed and others for another', () => {
    const small = { ...plan, replicates: 200 };
    expect(bootstrapped(table, N, small)).toEqual(bootstrapped(table, N, small));
    expect(bootstrapped(table, N, small)).not.toEqual(bootstrapped(table, N, { ...small, seed: 21 }));
  });

  it('tells its progress every few samples and stops when it is left', () => {
    const { told } = run(table, N, { ...plan, replicates: 95 });
    expect(told.map(({ done }) => done)).toEqual([10, 20, 30, 40, 50, 60, 70, 80, 90, 95]);
    expect(told.every(({ of, failed }) => of === 95 && failed === 0)).toBe(true);
    const steps = bootstrapRanks(table, N, plan);
    steps.next();
    expect(steps.return(undefined as never).done).toBe(true);
    expect(steps.next().done).toBe(true);
  });

  it('counts the samples that cannot be fitted and draws none in their place', () => {
    const few = tableFromCounts({ ...scale, max: 6 }, [1, 0, 1, 3, 0, 1, 1]);
    const { told, result } = run(few, 7, { ...plan, choice: logLinear(3), replicates: 300 });
    if (!result.ok) throw new Error(result.problem);
    const { fitted, drawn, failures } = result.bootstrapped;
    const failed = failures.reduce((sum, { count }) => sum + count, 0);
    expect(failed).toBeGreaterThan(0);
    expect(fitted).toBeGreaterThan(0);
    expect(drawn).toBe(300);
    expect(fitted + failed).toBe(300);
    expect(told.at(-1)).toEqual({ done: 300, of: 300, failed });
    expect(failures.every(({ problem }) => problem.length > 10)).toBe(true);
  });

  it('has no interval when too few samples were fitted for its level', () => {
    const few = tableFromCounts({ ...scale, max: 6 }, [1, 0, 1, 1, 0, 1, 1]);
    const found = bootstrapped(few, 5, { ...plan, choice: logLinear(3), replicates: 39 });
    expect(found.fitted).toBeLessThan(39);
    expect(found.intervals).toBeNull();
    expect(found.standardErrors.length).toBe(7);
  });

  it('says in words what cannot be drawn', () => {
    expect(bootstrapProblem(table, { ...plan, replicates: 38 })).toContain('39');
    expect(bootstrapProblem(table, { ...plan, replicates: 39 })).toBeNull();
    expect(bootstrapProblem(table, { ...plan, level: 99.9, replicates: 1998 })).toContain('1999');
    expect(bootstrapProblem(table, { ...plan, replicates: 100_000 })).toContain('replicates');
    expect(bootstrapProblem(table, { ...plan, seed: -1 })).toContain('seed');
    expect(bootstrapProblem(table, { ...plan, level: 10 })).toContain('level');
    const nobody = tableFromCounts(scale, new Array<number>(13).fill(0));
    expect(bootstrapProblem(nobody, plan)).toContain('without people');
    const one = tableFromCounts({ ...scale, max: 2 }, [0, 9, 0]);
    const { result } = run(one, 9, { ...plan, choice: logLinear(2) });
    expect(result.ok).toBe(false);
    expect(replicatesNeeded(95)).toBe(39);
    expect(replicatesNeeded(90)).toBe(19);
    expect(replicatesNeeded(50)).toBe(3);
  });
});
