import { describe, it } from 'vitest';
import { expectNear } from './near.ts';
import { numberIn, readRows } from './read-reference.ts';
import { cohortTable, readSmoothingReference, SMOOTHED_COHORTS, smoothed } from './smoothing-reference.ts';

const KERNEL = 1e-7;

/** Rows of the file stand every half step; those within half a step of the scale are ones the program prints. */
describe.each(SMOOTHED_COHORTS)('kernel continuization of %s by R', (id) => {
  const rows = readRows(`${id}_kernel.csv`);
  const table = cohortTable(id);
  const { kernel } = readSmoothingReference(id);
  const last = table.counts.length - 1;

  it.each(kernel.h)('agrees at the bandwidth %d, from observed shares and after a log-linear fit', (bandwidth) => {
    const observed = smoothed(table, { kind: 'kernel', bandwidth, after: null });
    const after = { degree: kernel.smooth_k_used, keptScores: [], comb: null };
    const second = smoothed(table, { kind: 'kernel', bandwidth, after });
    let compared = 0;
    for (const row of rows) {
      const x = numberIn(row, 'x') ?? NaN;
      for (const shift of [-0.5, 0, 0.5] as const) {
        const position = x - shift;
        if (!Number.isInteger(position) || position < 0 || position > last) continue;
        const at = (fit: typeof observed): number => 100 * fit.cumulative(position, shift);
        expectNear(at(observed), numberIn(row, `pr_obs_h${bandwidth}`) ?? NaN, KERNEL, `observed, at ${x}`);
        expectNear(at(second), numberIn(row, `pr_smooth_h${bandwidth}`) ?? NaN, KERNEL, `smoothed, at ${x}`);
        compared += 1;
      }
    }
    expectNear(compared, 3 * (last + 1), 0, 'places compared');
  });
});
