/**
 * How often do the 95 % intervals of percentile ranks hold the true rank? Draws groups of 100, 400 and 1,600 people from
 * three known populations, makes the intervals of every method for the definitions it is meant for, and counts. Writes
 * interval-coverage.md beside itself; fails when a coverage lies outside what is promised.
 *
 *   node test/reference/coverage/interval-coverage.mjs
 */
import { writeFileSync } from 'node:fs';
import { loadSource } from '../../run/load-source.mjs';

const SEED = 20_240_611;
const LEVEL = 95;
const GROUPS = 20_000;
const SIZES = [100, 400, 1600];
/** True ranks of the scores over which coverage is averaged, every such score counting once; the promise is for the middle. */
const RANGES = {
  middle: (rank) => rank >= 5 && rank <= 95,
  ends: (rank) => (rank >= 1 && rank < 5) || (rank > 95 && rank <= 99),
};
const PROMISED = { lowest: 93, highest: 97 };
/** What a coverage over so many groups may lie below 95 by chance: about three standard errors. */
const CHANCE = 0.2;

const { multinomialSampler } = await loadSource('shared-core/precision/multinomial.ts');
const { RANDOM_GENERATOR, seededRandom } = await loadSource('shared-core/precision/seeded-random.ts');
const { proportionInterval } = await loadSource('shared-core/precision/proportion-interval.ts');

const METHODS = [
  { method: 'wilson', title: 'Wilson', definitions: ['below', 'at-or-below', 'midpoint'], highest: PROMISED.highest },
  { method: 'jeffreys', title: 'Jeffreys', definitions: ['below', 'at-or-below', 'midpoint'], highest: PROMISED.highest },
  { method: 'clopper-pearson', title: 'Clopper–Pearson', definitions: ['below', 'at-or-below'], highest: 100 },
];
const TIED = { below: 0, midpoint: 0.5, 'at-or-below': 1 };

/** Shares that add up to 1, from masses at x = (k + ½)/(number of scores). */
function population(title, scores, mass) {
  const masses = Array.from({ length: scores }, (_, k) => mass((k + 0.5) / scores));
  const sum = masses.reduce((total, one) => total + one, 0);
  return { title, shares: masses.map((one) => one / sum) };
}

const bell = (x, mean, spread) => Math.exp(-0.5 * ((x - mean) / spread) ** 2);

const POPULATIONS = [
  population('bell, 0–60', 61, (x) => bell(x, 0.5, 0.17)),
  population('skewed, 0–100', 101, (x) => x ** 4 * (1 - x)),
  population('two modes, 0–80', 81, (x) => bell(x, 0.3, 0.1) + 0.7 * bell(x, 0.7, 0.12)),
];

/** True rank of each score in per cent, by definition. */
function trueRanks(shares, definition) {
  let below = 0;
  return shares.map((share) => {
    const rank = 100 * (below + TIED[definition] * share);
    below += share;
    return rank;
  });
}

/** Intervals are worked out once for each count that occurs. */
function intervalsFor(method, people) {
  const known = new Map();
  return (count) => {
    let interval = known.get(count);
    if (interval === undefined) {
      interval = proportionInterval(count, people, { method, level: LEVEL });
      known.set(count, interval);
    }
    return interval;
  };
}

/** Percentages of groups × scores whose interval held the true rank, one for each method and definition. */
function coverages({ shares }, people, seed) {
  const draw = multinomialSampler(shares);
  const next = seededRandom(seed);
  const tallies = METHODS.flatMap(({ method, definitions }) => {
    const interval = intervalsFor(method, people);
    return definitions.flatMap((definition) => {
      const truth = trueRanks(shares, definition);
      return Object.entries(RANGES).map(([range, within]) => {
        return { method, definition, range, interval, truth, counted: truth.map(within), held: 0, seen: 0 };
      });
    });
  });
  for (let group = 0; group < GROUPS; group += 1) {
    const counts = draw(people, next);
    for (const tally of tallies) {
      let below = 0;
      for (let place = 0; place < counts.length; place += 1) {
        if (tally.counted[place]) {
          const { low, high } = tally.interval(below + TIED[tally.definition] * counts[place]);
          tally.seen += 1;
          if (low <= tally.truth[place] && tally.truth[place] <= high) tally.held += 1;
        }
        below += counts[place];
      }
    }
  }
  return tallies.map(({ method, definition, range, held, seen }) => {
    return { method, definition, range, percent: (100 * held) / seen };
  });
}

const lines = { middle: [], ends: [] };
const broken = [];
for (const people of SIZES) {
  const found = POPULATIONS.map((one, index) => coverages(one, people, SEED + 10 * people + index));
  for (const { method, title, definitions, highest } of METHODS) {
    const lowest = method === 'clopper-pearson' ? LEVEL - CHANCE : PROMISED.lowest;
    for (const definition of definitions) {
      for (const range of Object.keys(RANGES)) {
        const percents = found.map((cells) => {
          const isMeant = (cell) => cell.method === method && cell.definition === definition && cell.range === range;
          return cells.find(isMeant).percent;
        });
        const texts = percents.map((percent) => percent.toFixed(2));
        lines[range].push(`| ${people} | ${title} | ${definition} | ${texts.join(' | ')} |`);
        if (range === 'middle' && percents.some((percent) => percent < lowest || percent > highest)) {
          broken.push(`${title}, ${definition}, ${people} people: ${texts.join(', ')}`);
        }
      }
    }
  }
}

const HEAD = `| people | interval | definition | ${POPULATIONS.map(({ title }) => title).join(' | ')} |
| ---: | --- | --- | ${POPULATIONS.map(() => '---:').join(' | ')} |`;

const text = `# Coverage of the ${LEVEL} % intervals of percentile ranks

Made by \`interval-coverage.mjs\` with the program's own intervals: ${GROUPS} groups drawn from each of three invented populations
at each size (${RANDOM_GENERATOR}, seeds from ${SEED} on). A cell is the percentage of pairs of a group and a score whose
interval holds the true percentile rank, averaged over the scores of a range, each score counting once.

The midpoint rank has a smaller variance than a count of its size, by the half of those tied; its intervals are a little
wide for it where many people share a score. Clopper–Pearson needs whole counts and is not used for it. The people below a
score are those at or below the one before, so that these two definitions have the same coverage but for the scores at
which the range begins and ends. Scores of one group go up and down together: a cell is off by about 0.1 by chance.

## Scores whose true rank lies from 5 to 95

Promised: ${PROMISED.lowest} to ${PROMISED.highest} for Wilson and Jeffreys, at least ${LEVEL} for Clopper–Pearson but for the error of the simulation (${CHANCE}).

${HEAD}
${lines.middle.join('\n')}

## Scores whose true rank lies from 1 to 5 or from 95 to 99

Not promised, but good to know: in small groups a handful of people decide, and coverage comes in steps.

${HEAD}
${lines.ends.join('\n')}
`;
writeFileSync(new URL('interval-coverage.md', import.meta.url), text);
process.stdout.write(text);
if (broken.length > 0) {
  process.stderr.write(`\nOutside what is promised:\n${broken.join('\n')}\n`);
  process.exitCode = 1;
}
