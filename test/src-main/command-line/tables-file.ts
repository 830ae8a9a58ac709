import * as v from 'valibot';

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
});

const group = v.object({
  /** Read as it is: the names of its keys are the file's own. */
  group: v.unknown(),
  n: v.number(),
  'weight-sum': v.number(),
  'effective-n': v.number(),
  mean: v.number(),
  sd: v.nullable(v.number()),
  skewness: v.nullable(v.number()),
  'excess-kurtosis': v.nullable(v.number()),
  'five-number': v.array(v.number()),
  points: v.array(v.object({ proportion: v.number(), definition: v.string(), score: v.number() })),
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

/** Reads the json of `table` and of norm-set.json; fails on any other shape. */
export function readTables(text: string): TablesFile {
  return v.parse(tablesFile, JSON.parse(text));
}
