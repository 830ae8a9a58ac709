import fc from 'fast-check';
import type { PrecisionChoices } from '../../../shared-core/norms/norm-project.ts';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import type { LogLinearChoice, SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';

const degree = fc.oneof(
  fc.integer({ min: 1, max: 10 }),
  fc.constantFrom('bic' as const, 'aic' as const, 'likelihood-ratio' as const),
);

const comb = fc
  .record({ every: fc.integer({ min: 2, max: 100 }), start: fc.nat(99) })
  .map(({ every, start }) => ({ every, offset: start % every }));

/** Any log-linear model; the scores it keeps lie on the scale or beyond it. */
function drawnLogLinear({ min, max, step }: ScoreScale): fc.Arbitrary<LogLinearChoice> {
  const score = fc.oneof(fc.constantFrom(min, min + step, max), fc.constantFrom(max + step, 0.125));
  return fc.record({
    degree,
    keptScores: fc.oneof({ weight: 3, arbitrary: fc.constant([]) }, fc.array(score, { maxLength: 3 })),
    comb: fc.oneof({ weight: 3, arbitrary: fc.constant(null) }, comb),
  });
}

/** Any smoothing that a project may ask for on a scale, whether or not the data can carry it. */
export function drawnSmoothing(scale: ScoreScale): fc.Arbitrary<SmoothingChoice> {
  const model = drawnLogLinear(scale);
  const bandwidth = fc.oneof(
    fc.constant('auto' as const),
    fc.double({ min: 0.01, max: 100, noNaN: true }),
    fc.constantFrom(1e-6, 1e6),
  );
  return fc.oneof(
    fc.constant({ kind: 'none' as const }),
    model.map((choice) => ({ kind: 'log-linear' as const, ...choice })),
    fc.record({ kind: fc.constant('kernel' as const), bandwidth, after: fc.option(model) }),
    fc.constant({ kind: 'beta-binomial' as const }),
  );
}

/** Any choices of precision that the schema accepts. */
export const drawnPrecision: fc.Arbitrary<PrecisionChoices> = fc.record({
  interval: fc.constantFrom('wilson' as const, 'clopper-pearson' as const, 'jeffreys' as const),
  level: fc.oneof(fc.constantFrom(50, 95, 99.9), fc.double({ min: 50, max: 99.9, noNaN: true })),
  reliability: fc.option(fc.oneof(fc.constantFrom(0, 0.9, 1), fc.double({ min: 0, max: 1, noNaN: true }))),
  bootstrap: fc.record({ replicates: fc.integer({ min: 1, max: 20_000 }), seed: fc.maxSafeNat() }),
});
