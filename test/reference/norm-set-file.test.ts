import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { normSetForFile } from '../../shared-core/norms/norm-set-file.ts';
import type { NormProject, PrecisionChoices } from '../../shared-core/norms/norm-project.ts';
import type { RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import type { SmoothingChoice } from '../../shared-core/smoothing/smoothing.ts';
import { builtSet, curveOf, projectOf } from '../shared-core/norms/small-projects.ts';
import { EXACT, expectAllNear, expectNear, NORMAL } from './near.ts';
import { numberIn, readRows, readText } from './read-reference.ts';
import { cohortTable, columnOf, logLinear, REFERENCE_DEGREES, SMOOTHED_COHORTS } from './smoothing-reference.ts';

/** The numbers as a reader of the file finds them, so that nothing but the file's own keys is relied on. */
const number = v.number();
const moments = v.strictObject({ mean: number, sd: number, skewness: number, 'excess-kurtosis': number });
const FILE = v.object({
  groups: v.tuple([
    v.object({
      smoothing: v.nullable(
        v.strictObject({
          method: v.string(),
          degree: v.nullable(number),
          bandwidth: v.nullable(number),
          g2: v.nullable(number),
          x2: v.nullable(number),
          df: v.nullable(number),
          aic: v.nullable(number),
          bic: v.nullable(number),
          converged: v.literal(true),
          'moments-observed': moments,
          'moments-fitted': moments,
        }),
      ),
      rows: v.array(
        v.object({
          'percentile-rank': number,
          printed: v.string(),
          interval: v.nullable(v.strictObject({ low: number, high: number })),
          'standard-error': number,
          smoothed: v.nullable(
            v.strictObject({ proportion: number, 'percentile-rank': number, 'standard-error': v.nullable(number) }),
          ),
          alternatives: v.strictObject({ low: v.string(), high: v.string() }),
        }),
      ),
    }),
  ]),
});

function groupInFile(
  id: string,
  definition: RankDefinition,
  smoothing: SmoothingChoice,
  precision: Partial<PrecisionChoices> = {},
): v.InferOutput<typeof FILE>['groups'][0] {
  const bare = projectOf(cohortTable(id).counts);
  const curve = curveOf(definition, smoothing);
  const project: NormProject = { ...bare, curve, precision: { ...bare.precision, ...precision } };
  const text = JSON.stringify(normSetForFile(builtSet(project), () => []));
  return v.parse(FILE, JSON.parse(text)).groups[0];
}

const MIDPOINT = { kind: 'midpoint' } as const;
const NONE = { kind: 'none' } as const;

const DEFINITIONS = [
  ['below', 'below'],
  ['atbelow', 'at-or-below'],
  ['mid', 'midpoint'],
] as const;
const METHODS = [
  ['wilson', 'wilson'],
  ['clopper', 'clopper-pearson'],
  ['jeffreys', 'jeffreys'],
] as const;

describe.each(SMOOTHED_COHORTS)('the norm set of %s as a file', (id) => {
  const scores = readRows(`${id}_scores.csv`);

  it('has the intervals that R gives, on the count that the definition uses', () => {
    const expected = readRows(`${id}_intervals.csv`);
    for (const [prefix, kind] of DEFINITIONS) {
      for (const [word, interval] of METHODS) {
        const { rows } = groupInFile(id, { kind }, NONE, { interval, level: 95 });
        expect(rows.length).toBe(expected.length);
        rows.forEach((row, position) => {
          const line = expected[position] ?? {};
          const what = `${prefix}_${word} of ${position}`;
          if (kind === 'midpoint' && interval === 'clopper-pearson') return expect(row.interval).toBeNull();
          expectNear(row.interval?.low ?? null, numberIn(line, `${prefix}_${word}_95_lo`) ?? NaN, NORMAL, what);
          expectNear(row.interval?.high ?? null, numberIn(line, `${prefix}_${word}_95_hi`) ?? NaN, NORMAL, what);
        });
      }
    }
  });

  it('has the observed rank and the error of the midpoint rank whatever is chosen', () => {
    const errors = columnOf(scores, 'se_pr_mid_multinomial');
    for (const [column, definition, smoothing] of [
      ['pr_mid', MIDPOINT, NONE],
      ['pr_below', { kind: 'below' }, NONE],
      ['pr_atbelow', { kind: 'at-or-below' }, logLinear(3)],
      ['pr_mid', MIDPOINT, { kind: 'kernel', bandwidth: 'auto', after: null }],
    ] as const) {
      const { rows } = groupInFile(id, definition, smoothing);
      expectAllNear(rows.map((row) => row['percentile-rank']), columnOf(scores, column), EXACT, column);
      expectAllNear(rows.map((row) => row['standard-error']), errors, EXACT, 'standard error of the midpoint rank');
    }
    const { rows } = groupInFile(id, { kind: 'plotting-position', offset: '3/8' }, NONE);
    expectAllNear(rows.map((row) => row['standard-error']), errors, EXACT, 'standard error of the midpoint rank');
  });

  it.each(REFERENCE_DEGREES)('has the log-linear fit of degree %i', (degree) => {
    const { smoothing, rows } = groupInFile(id, MIDPOINT, logLinear(degree));
    const fits = readRows(`${id}_loglinear.csv`);
    const tolerance = degree <= 6 ? 1e-7 : 1e-5;
    const people = columnOf(fits, 'freq').reduce((sum, count) => sum + count, 0);
    const of = (pick: (smoothed: NonNullable<(typeof rows)[number]['smoothed']>) => number | null) =>
      rows.map((row) => (row.smoothed === null ? null : pick(row.smoothed)));
    expectAllNear(of((one) => one['percentile-rank']), columnOf(fits, `prmid_k${degree}`), tolerance, 'smoothed rank');
    expectAllNear(of((one) => one['standard-error']), columnOf(fits, `se_prmid_k${degree}`), tolerance, 'its error');
    const fitted = columnOf(fits, `fit_k${degree}`);
    fitted.forEach((frequency, k) => {
      expectNear(of((one) => one.proportion * people)[k] ?? null, frequency, 1e-6 + tolerance * frequency, `at ${k}`);
    });

    expect(smoothing?.method).toBe('log-linear');
    expect([smoothing?.degree, smoothing?.bandwidth]).toEqual([degree, null]);
    const expected = fitOf(id, degree);
    expectNear(smoothing?.g2 ?? null, expected.G2_deviance, 1e-7, 'G²');
    expectNear(smoothing?.x2 ?? null, expected.X2_pearson, 1e-7 * Math.max(1, expected.X2_pearson), 'X²');
    expect(smoothing?.df).toBe(expected.df_resid);
    expectNear(smoothing?.aic ?? null, expected.AIC_dev, 1e-7, 'AIC');
    expectNear(smoothing?.bic ?? null, expected.BIC_dev_Ncases, 1e-7, 'BIC');
    const { mean, sd_pop, skew_pop, kurt_pop } = expected.moments_fitted;
    const found = smoothing?.['moments-fitted'];
    expectAllNear(
      [found?.mean ?? null, found?.sd ?? null, found?.skewness ?? null, found?.['excess-kurtosis'] ?? null],
      [mean, sd_pop, skew_pop, kurt_pop - 3],
      1e-7,
      'fitted moments',
    );
  });

  it('has the kernel curve at a bandwidth', () => {
    const rows = readRows(`${id}_kernel.csv`);
    const file = groupInFile(id, MIDPOINT, { kind: 'kernel', bandwidth: 1, after: null });
    expect([file.smoothing?.method, file.smoothing?.degree, file.smoothing?.bandwidth]).toEqual(['kernel', null, 1]);
    file.rows.forEach((row, score) => {
      const line = rows.find((candidate) => Number(candidate['x']) === score) ?? {};
      const expected = numberIn(line, 'pr_obs_h1') ?? NaN;
      expectNear(row.smoothed?.['percentile-rank'] ?? null, expected, 1e-7, `kernel at ${score}`);
      expect(row.smoothed?.['standard-error']).toBeNull();
    });
  });

  it('says null where nothing is smoothed', () => {
    const { smoothing, rows } = groupInFile(id, MIDPOINT, NONE);
    expect(smoothing).toBeNull();
    expect(rows.every((row) => row.smoothed === null)).toBe(true);
  });
});

const FITS = v.object({
  loglinear: v.object({
    fits: v.record(
      v.string(),
      v.object({
        G2_deviance: number,
        X2_pearson: number,
        df_resid: number,
        AIC_dev: number,
        BIC_dev_Ncases: number,
        moments_fitted: v.object({ mean: number, sd_pop: number, skew_pop: number, kurt_pop: number }),
      }),
    ),
  }),
});

function fitOf(id: string, degree: number) {
  const { loglinear } = v.parse(FITS, JSON.parse(readText(`cohorts/${id}_ref.json`)));
  const fit = loglinear.fits[`k${degree}`];
  if (fit === undefined) throw new Error(`no degree ${degree}`);
  return fit;
}
