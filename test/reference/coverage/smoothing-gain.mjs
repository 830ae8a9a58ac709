/**
 * What smoothing gains: mean squared error of midpoint percentile ranks against the true ones of five known
 * populations, unsmoothed and smoothed, in cohorts drawn from them. Writes smoothing-gain.md beside itself; the draws
 * have a fixed start, so that a second run writes the same file.
 *
 *   node test/reference/coverage/smoothing-gain.mjs            1,000 cohorts of each kind
 *   node test/reference/coverage/smoothing-gain.mjs 200        that many
 */
import { writeFileSync } from 'node:fs';
import { loadSource } from '../../run/load-source.mjs';

const { smooth } = await loadSource('shared-core/smoothing/smooth.ts');
const { multinomialSampler } = await loadSource('shared-core/precision/multinomial.ts');
const { RANDOM_GENERATOR, seededRandom } = await loadSource('shared-core/precision/seeded-random.ts');
const { tableFromCounts } = await loadSource('shared-core/tally/frequency-table.ts');

const REPORT = new URL('smoothing-gain.md', import.meta.url);
const SEED = 20_260;
const COHORTS = Number(process.argv[2] ?? 1000);
const SIZES = [100, 250, 500];

const normal = (middle, spread) => (x) => Math.exp(-0.5 * ((x - middle) / spread) ** 2);

/** Chances of the scores 0 to last, from any heights. */
function population(name, last, height) {
  const heights = Array.from({ length: last + 1 }, (_, x) => height(x));
  const sum = heights.reduce((total, value) => total + value, 0);
  return { name, chances: heights.map((value) => value / sum) };
}

const bell = normal(22, 6.5);
const POPULATIONS = [
  population('bell, 0–40', 40, bell),
  population('ceiling, 0–30', 30, (x) => (x + 0.5) ** 4.5 * (30.5 - x) ** 0.7),
  population('two modes, 0–60', 60, (x) => 0.6 * normal(18, 5)(x) + 0.4 * normal(43, 6)(x)),
  population('floor with a long tail, 0–50', 50, (x) => (x + 0.5) ** 0.8 * Math.exp(-x / 7)),
  population('bell, every second score half as likely, 0–40', 40, (x) => bell(x) * (x % 2 === 0 ? 1 : 0.5)),
];

const plain = (degree) => ({ degree, keptScores: [], comb: null });
const METHODS = [
  { name: 'log-linear, BIC', choice: { kind: 'log-linear', ...plain('bic') } },
  { name: 'log-linear, AIC', choice: { kind: 'log-linear', ...plain('aic') } },
  {
    name: 'log-linear, BIC, comb of 2',
    choice: { kind: 'log-linear', ...plain('bic'), comb: { every: 2, offset: 0 } },
  },
  { name: 'kernel, auto', choice: { kind: 'kernel', bandwidth: 'auto', after: null } },
  { name: 'beta-binomial', choice: { kind: 'beta-binomial' } },
];

function midpointRanks(chances) {
  let below = 0;
  return chances.map((chance) => {
    below += chance;
    return 100 * (below - chance / 2);
  });
}

/** Squared error in percentile-rank points, averaged over people of the population. */
function squaredError(ranks, { chances, ranks: truth }) {
  return ranks.reduce((sum, rank, x) => sum + chances[x] * (rank - truth[x]) ** 2, 0);
}

function simulate(one, people, next) {
  const truth = { chances: one.chances, ranks: midpointRanks(one.chances) };
  const scale = { min: 0, max: one.chances.length - 1, step: 1, direction: 'high-is-good' };
  const draw = multinomialSampler(one.chances);
  const errors = { unsmoothed: [], smoothed: METHODS.map(() => []), refused: METHODS.map(() => 0) };
  for (let cohort = 0; cohort < COHORTS; cohort += 1) {
    const table = tableFromCounts(scale, draw(people, next));
    const raw = squaredError(midpointRanks(table.counts.map((count) => count / people)), truth);
    errors.unsmoothed.push(raw);
    METHODS.forEach(({ choice }, index) => {
      const result = smooth(table, choice);
      if (!result.ok) errors.refused[index] += 1;
      // What is refused stays unsmoothed, as it would in print.
      const ranks = result.ok ? table.counts.map((_, x) => 100 * result.smoothed.cumulative(x, 0)) : null;
      errors.smoothed[index].push(ranks === null ? raw : squaredError(ranks, truth));
    });
  }
  return errors;
}

const mean = (values) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** Standard error of the ratio of two means over the same cohorts (linearised). */
function ratioError(above, below) {
  const ratio = mean(above) / mean(below);
  const gaps = above.map((value, index) => (value - ratio * below[index]) / mean(below));
  return Math.sqrt(mean(gaps.map((gap) => gap * gap)) / gaps.length);
}

const next = seededRandom(SEED);
const rows = [];
const gains = [];
let refused = METHODS.map(() => 0);
let widest = 0;
for (const one of POPULATIONS) {
  for (const people of SIZES) {
    const errors = simulate(one, people, next);
    const raw = mean(errors.unsmoothed);
    const ratios = errors.smoothed.map((list) => mean(list) / raw);
    const near = errors.smoothed.filter((_, index) => ratios[index] < 2);
    widest = Math.max(widest, ...near.map((list) => ratioError(list, errors.unsmoothed)));
    refused = refused.map((count, index) => count + errors.refused[index]);
    gains.push(ratios);
    const cells = errors.smoothed.map((list, index) => `${mean(list).toFixed(3)} (${ratios[index].toFixed(2)})`);
    rows.push([one.name, people, raw.toFixed(3), ...cells]);
  }
}

/** A table with its columns set even: words left, numbers right. */
function tableOf([head, ...body]) {
  const widths = head.map((_, column) => Math.max(...[head, ...body].map((row) => String(row[column]).length)));
  const padded = (row) =>
    row.map((cell, column) =>
      column === 0 ? String(cell).padEnd(widths[column]) : String(cell).padStart(widths[column]),
    );
  const rule = widths.map((width, column) => (column === 0 ? '-'.repeat(width) : `${'-'.repeat(width - 1)}:`));
  return [padded(head), rule, ...body.map(padded)].map((cells) => `| ${cells.join(' | ')} |`).join('\n');
}

const won = METHODS.map((_, index) => gains.filter((ratios) => ratios[index] < 1).length);
const names = METHODS.map(({ name }) => name);
const total = COHORTS * POPULATIONS.length * SIZES.length;
const text = `# What smoothing gains

Written by \`smoothing-gain.mjs\`: ${COHORTS} cohorts of each population and size, drawn with ${RANDOM_GENERATOR} and
seed ${SEED}. Mean squared error of midpoint percentile ranks against the true ones, in squared percentile-rank points,
averaged over the people of the population and over cohorts; in brackets the ratio to the unsmoothed ranks of the same
cohorts, below 1 where smoothing is nearer to the truth. The largest standard error of a ratio below 2 is
${widest.toFixed(3)}. A refused cohort counts with its unsmoothed ranks.

${tableOf([['population', 'N', 'unsmoothed', ...names], ...rows])}

${tableOf([
  ['over all rows', ...names],
  [`nearer to the truth in so many of ${gains.length} rows`, ...won],
  ['mean ratio', ...METHODS.map((_, index) => mean(gains.map((ratios) => ratios[index])).toFixed(2))],
  [`refused of ${total} cohorts`, ...refused],
])}
`;
writeFileSync(REPORT, text);
console.log(text);
