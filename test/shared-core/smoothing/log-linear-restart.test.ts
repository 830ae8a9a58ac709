import { describe, expect, it } from 'vitest';
import { logLinearDesign } from '../../../shared-core/smoothing/log-linear-design.ts';
import { fitLogLinear, probabilitiesOf } from '../../../shared-core/smoothing/log-linear.ts';
import { expectAllNear } from '../../reference/near.ts';
import { cohortTable, logLinear, smoothed } from '../../reference/smoothing-reference.ts';

const table = cohortTable('c3_twomodes');
const built = logLinearDesign(table.scale, { at: table.counts, total: 1500 }, logLinear(5));

/** Starts from which no step leads on, or from which the way is far. */
const STARTS: readonly (readonly [string, (k: number) => number])[] = [
  ['all on one score', (k) => (k === 20 ? 0 : -2000)],
  ['all beyond the people', (k) => -3 * (60 - k)],
  ['two far lumps', (k) => (k === 0 || k === 60 ? 0 : -400)],
];

describe('a log-linear fit', () => {
  it.each(STARTS)('gets there from a start with %s', (_, log) => {
    if (!built.ok) throw new Error(built.problem);
    const start = Float64Array.from(table.counts, (_count, k) => log(k));
    const fit = fitLogLinear(built.design, 5, start);
    expect(fit.converged).toBe(true);
    expectAllNear(
      probabilitiesOf(built.design, fit),
      smoothed(table, logLinear(5)).probabilities,
      1e-12,
      'probability',
    );
  });
});
