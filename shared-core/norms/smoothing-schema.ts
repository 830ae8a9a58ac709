import * as v from 'valibot';
import { INTERVAL_METHODS } from '../precision/proportion-interval.ts';
import { bandwidthProblem } from '../smoothing/bandwidth.ts';
import { HIGHEST_LEVEL, LOWEST_LEVEL } from '../precision/confidence-level.ts';

/** The file format of the choices of smoothing and precision; see the types of the same names. */

const degree = v.union([
  v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(10)),
  v.picklist(['bic', 'aic', 'likelihood-ratio']),
]);

const bandwidth = v.pipe(
  v.number(),
  v.check((points) => bandwidthProblem(points) === null, 'the bandwidth cannot be used'),
);

const logLinearParts = {
  degree,
  keptScores: v.pipe(v.array(v.pipe(v.number(), v.finite())), v.maxLength(50), v.readonly()),
  comb: v.nullable(
    v.pipe(
      v.object({
        every: v.pipe(v.number(), v.integer(), v.minValue(2), v.maxValue(100)),
        offset: v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(99)),
      }),
      v.check(({ every, offset }) => offset < every, 'a comb starts before its second tooth'),
      v.readonly(),
    ),
  ),
};

export const smoothingSchema = v.pipe(
  v.variant('kind', [
    v.object({ kind: v.literal('none') }),
    v.object({ kind: v.literal('log-linear'), ...logLinearParts }),
    v.object({
      kind: v.literal('kernel'),
      bandwidth: v.union([bandwidth, v.literal('auto')]),
      after: v.nullable(v.pipe(v.object(logLinearParts), v.readonly())),
    }),
    v.object({ kind: v.literal('beta-binomial') }),
  ]),
  v.readonly(),
);

export const precisionSchema = v.pipe(
  v.object({
    /** How the sampling interval of each rank is found. */
    interval: v.picklist(INTERVAL_METHODS),
    /** Confidence of intervals and bands, per cent. */
    level: v.pipe(v.number(), v.finite(), v.minValue(LOWEST_LEVEL), v.maxValue(HIGHEST_LEVEL)),
    /** Reliability of the test, 0–1, for the measurement band; null where none is known. */
    reliability: v.nullable(v.pipe(v.number(), v.finite(), v.minValue(0), v.maxValue(1))),
    bootstrap: v.pipe(
      v.object({
        replicates: v.pipe(v.number(), v.integer(), v.minValue(1), v.maxValue(20_000)),
        seed: v.pipe(v.number(), v.safeInteger(), v.minValue(0)),
      }),
      v.readonly(),
    ),
  }),
  v.readonly(),
);
