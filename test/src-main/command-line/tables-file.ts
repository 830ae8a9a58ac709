import * as v from 'valibot';
import { expect } from 'vitest';
import { normloom } from './run-normloom.ts';

const range = v.object({ low: v.number(), high: v.number() });

const moments = v.object({
  mean: v.number(),
  sd: v.number(),
  skewness: v.number(),
  'excess-kurtosis': v.number(),
});

const smoothing = v.object({
  method: v.picklist(['log-linear', 'kernel', 'beta-binomial']),
  degree: v.nullable(v.number()),
  bandwidth: v.nullable(v.number()),
  g2: v.nullable(v.number()),
  x2: v.nullable(v.number()),
  df: v.nullable(v.number()),
  aic: v.nullable(v.number()),
  bic: v.nullable(v.number()),
  converged: v.literal(true),
  'moments-observed': moments,
  'moments-fitted': moments,
});

const bootstrap = v.object({
  replicates: v.number(),
  seed: v.number(),
  fitted: v.number(),
  failures: v.array(v.object({ problem: v.string(), count: v.number() })),
  degrees: v.array(v.object({ degree: v.number(), count: v.number() })),
  people: v.number(),
});

const row = v.object({
  score: v.number(),
  count: v.number(),
  weight: v.number(),
  cumulative: v.number(),
  'percentile-rank': v.number(),
  printed: v.string(),
  derived: v.object({
    z: v.nullable(v.number()),
    t: v.nullable(v.number()),
    nce: v.nullable(v.number()),
    stanine: v.number(),
    sten: v.nullable(v.number()),
    deviation: v.nullable(v.number()),
  }),
  interval: v.nullable(range),
  'standard-error': v.number(),
  smoothed: v.nullable(
    v.object({
      proportion: v.number(),
      'percentile-rank': v.number(),
      'standard-error': v.nullable(v.number()),
    }),
  ),
  alternatives: v.object({ low: v.string(), high: v.string() }),
  band: v.nullable(range),
  bootstrap: v.optional(
    v.object({ low: v.nullable(v.number()), high: v.nullable(v.number()), 'standard-error': v.number() }),
  ),
});

const group = v.object({
  /** Read as it is: the names of its keys are the file's own. */
  group: v.unknown(),
  n: v.number(),
  'weight-sum': v.number(),
  'effective-n': v.number(),
  clusters: v.nullable(v.number()),
  'design-effect': v.nullable(v.number()),
  mean: v.number(),
  sd: v.nullable(v.number()),
  skewness: v.nullable(v.number()),
  'excess-kurtosis': v.nullable(v.number()),
  'five-number': v.array(v.number()),
  points: v.array(v.object({ proportion: v.number(), definition: v.string(), score: v.number() })),
  smoothing: v.nullable(smoothing),
  bootstrap: v.optional(bootstrap),
  rows: v.array(row),
});

const tablesFile = v.object({
  source: v.object({
    file: v.string(),
    sha256: v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)),
    'rows-read': v.number(),
    'rows-kept': v.number(),
    'left-out': v.array(v.object({ rule: v.string(), count: v.number(), rows: v.array(v.number()) })),
  }),
  scale: v.object({ min: v.number(), max: v.number(), step: v.number() }),
  definition: v.string(),
  groups: v.array(group),
});

export type TablesFile = v.InferOutput<typeof tablesFile>;
export type TablesGroup = TablesFile['groups'][number];

/** Reads the json of `table` and of norm-set.json; fails on any other shape. */
export function readTables(text: string): TablesFile {
  return v.parse(tablesFile, JSON.parse(text));
}

/** Runs `table … --format json`, which must succeed, and reads what it printed. */
export function tables(...words: readonly string[]): TablesFile {
  const ran = normloom(['table', ...words, '--format', 'json']);
  expect([ran.exit, ran.stderr.match(/normloom:.*/)?.[0]]).toEqual([0, undefined]);
  return readTables(ran.stdout);
}

/** The only group of such a run. */
export function onlyTable(...words: readonly string[]): TablesGroup {
  const [group, ...others] = tables(...words).groups;
  if (group === undefined || others.length > 0) throw new Error('not one group');
  return group;
}
