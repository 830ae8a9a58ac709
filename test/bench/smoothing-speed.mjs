/**
 * Times one recompute of smoothing in this process: 40 groups of 121 scores, degrees 2 to 8, with the standard error of
 * the midpoint rank at each score; and the same by R's glm where Rscript is installed. Then refits of one group as a
 * bootstrap makes them.
 *
 *   node test/bench/smoothing-speed.mjs
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { loadSource } from '../run/load-source.mjs';

const { multinomialSampler } = await loadSource('shared-core/precision/multinomial.ts');
const { seededRandom } = await loadSource('shared-core/precision/seeded-random.ts');
const { smooth } = await loadSource('shared-core/smoothing/smooth.ts');
const { tableFromCounts } = await loadSource('shared-core/tally/frequency-table.ts');

const GROUPS = 40;
const SCORES = 121;
const DEGREES = [2, 3, 4, 5, 6, 7, 8];
const RUNS = 5;
const REFITS = 1000;
const SEED = 40_121;
/** The two programs stop at different closeness: their sums of standard errors agree to this share. */
const SAME_SUM = 1e-6;

const SCALE = { min: 0, max: SCORES - 1, step: 1, direction: 'high-is-good' };
const choice = (degree) => ({ kind: 'log-linear', degree, keptScores: [], comb: null });

/** Groups of 200 to 2,000 people with middles along the scale, as grades of a school have them. */
function drawnGroups() {
  const next = seededRandom(SEED);
  return Array.from({ length: GROUPS }, (_, group) => {
    const middle = 35 + 1.3 * group;
    const heights = Array.from({ length: SCORES }, (_cell, x) => Math.exp(-0.5 * ((x - middle) / 17) ** 2) + 1e-4);
    const sum = heights.reduce((total, height) => total + height, 0);
    const people = 200 + Math.floor((1800 * group) / (GROUPS - 1));
    return multinomialSampler(heights.map((height) => height / sum))(people, next);
  });
}

function fitted(table, degree, extent) {
  const result = smooth(table, choice(degree), extent);
  if (!result.ok) throw new Error(result.problem);
  return result.smoothed;
}

function recompute(tables) {
  let sum = 0;
  for (const table of tables) {
    for (const degree of DEGREES) {
      for (const variance of fitted(table, degree, 'fit-only').rankVariancesOf(0.5)) sum += Math.sqrt(variance);
    }
  }
  return sum;
}

/** Milliseconds: the first run, as a process just started has it, and the quickest. */
function timed(work) {
  const times = Array.from({ length: RUNS }, () => {
    const started = performance.now();
    work();
    return performance.now() - started;
  });
  return { first: times[0], best: Math.min(...times) };
}

function byR(groups) {
  const folder = mkdtempSync(join(tmpdir(), 'normloom-bench-'));
  try {
    const file = join(folder, 'counts.csv');
    writeFileSync(file, groups.map((counts) => `${counts.join(',')}\n`).join(''));
    const script = fileURLToPath(new URL('smoothing-speed.R', import.meta.url));
    const child = spawnSync('Rscript', ['--vanilla', script, file], { encoding: 'utf8' });
    if (child.error?.code === 'ENOENT') return null;
    if (child.status !== 0) throw new Error(child.stderr);
    const [ms, sum] = child.stdout.trim().split(/\s+/).map(Number);
    return { ms, sum };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const print = (what, ms) => console.log(`  ${what.padEnd(58)} ${ms.toFixed(1).padStart(9)} ms`);

const groups = drawnGroups();
const tables = groups.map((counts) => tableFromCounts(SCALE, counts));
console.log(`${GROUPS} groups of ${SCORES} scores, degrees 2 to 8, with standard errors at each score`);
const all = timed(() => recompute(tables));
print('first run of the process', all.first);
print(`quickest of ${RUNS} runs`, all.best);
const r = byR(groups);
if (r === null) {
  console.log("  R's glm: not measured, Rscript is not installed");
} else {
  print("the same work by R's glm", r.ms);
  console.log(
    `  ratio: ${(r.ms / all.first).toFixed(1)} to the first run, ${(r.ms / all.best).toFixed(1)} to the quickest`,
  );
  if (Math.abs(r.sum / recompute(tables) - 1) > SAME_SUM) throw new Error('the two programs did different work');
}

const [table] = tables.slice(-1);
print('degrees 2 to 8 of one group, with standard errors', timed(() => recompute([table])).best);
print('table of degrees 1 to 10 of one group', timed(() => fitted(table, 'bic')).best);
for (const degree of [6, 'bic']) {
  const draw = multinomialSampler(fitted(table, degree).probabilities);
  const people = table.counts.reduce((sum, count) => sum + count, 0);
  const refits = timed(() => {
    const next = seededRandom(SEED);
    for (let refit = 0; refit < REFITS; refit += 1) {
      smooth(tableFromCounts(SCALE, draw(people, next)), choice(degree), 'fit-only');
    }
  });
  print(`${REFITS} refits of one group, degree ${degree}`, refits.best);
}
