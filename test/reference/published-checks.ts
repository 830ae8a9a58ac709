import * as v from 'valibot';
import { readText } from './read-reference.ts';

const numbers = v.array(v.number());
const quartiles = v.array(v.object({ data: numbers, q1: v.number(), q2: v.number(), q3: v.number() }));
const grouped = { intervals: v.array(v.tuple([v.number(), v.number()])), f: numbers };

const PUBLISHED = v.object({
  nist_percentile: v.object({
    data: numbers,
    p: v.number(),
    expected_4dp: v.number(),
    expected_exact: v.number(),
    R_types_1_to_9: numbers,
  }),
  quartiles_type7_and_hinges: quartiles,
  quartiles_halves_without_median: quartiles,
  five_number: v.array(v.object({ data: numbers, expected: numbers })),
  r_summary: v.object({
    data: numbers,
    summary: v.object({
      min: v.number(),
      q1: v.number(),
      median: v.number(),
      mean: v.number(),
      q3: v.number(),
      max: v.number(),
    }),
    type1: numbers,
  }),
  gravetter_wallnau: v.object({
    ungrouped: v.object({ scores: numbers, f: numbers, pr_at_7: v.number() }),
    grouped: v.object({ ...grouped, p40: v.number(), pr_at_9: v.number() }),
  }),
  pr_mid_ten_scores: v.object({ pr_at_4: v.number(), pr_at_7: v.number() }),
  stanine: v.object({ pct: numbers, cum: numbers, z_bounds: numbers }),
  nce: v.object({ multiplier_conventional: v.number(), coincide_at: numbers }),
  act_1999: v.object({ N: v.number(), columns: v.array(v.string()), rows: v.array(numbers) }),
});

/** The published values that these tests use; README.md says where each was read. */
export function readPublished(): v.InferOutput<typeof PUBLISHED> {
  return v.parse(PUBLISHED, JSON.parse(readText('published_checks.json')));
}
