import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { describe, expect, it } from 'vitest';
import { expectAllNear, expectNear, NORMAL } from '../../reference/near.ts';
import { readRows } from '../../reference/read-reference.ts';
import { columnOf, readSmoothingReference } from '../../reference/smoothing-reference.ts';
import { fileForTest, normloom, referenceCohort, SAMPLE_COHORT } from './run-normloom.ts';
import { onlyTable, tables, type TablesGroup } from './tables-file.ts';

/** Degrees that R's lowest BIC names. */
const COHORTS = [
  { id: 'c1_tiny', last: 20, degree: 2 },
  { id: 'c2_leftskew', last: 30, degree: 2 },
  { id: 'c3_twomodes', last: 60, degree: 6 },
  { id: 'c4_large', last: 120, degree: 4 },
] as const;

const TOLERANCE = 1e-7;

function smoothTable(id: string, last: number, smooth: string, ...words: readonly string[]): TablesGroup {
  const file = referenceCohort(`${id}_cohort.csv`);
  return onlyTable(file, '--score', 'score', '--scale', `0:${last}`, '--smooth', smooth, ...words);
}

function smoothedColumn(group: TablesGroup, key: 'proportion' | 'percentile-rank' | 'standard-error') {
  return group.rows.map((row) => row.smoothed?.[key] ?? null);
}

/** Compares a group with a degree of R's fits. */
function expectLikeR(group: TablesGroup, id: string, degree: number): void {
  const rows = readRows(`${id}_loglinear.csv`);
  const reference = readSmoothingReference(id);
  const fit = reference.loglinear.fits[`k${degree}`];
  const found = group.smoothing;
  if (fit === undefined || found === null) throw new Error('no fit');
  expect([found.method, found.degree, found.bandwidth, found.df]).toEqual(['log-linear', degree, null, fit.df_resid]);
  expectNear(found.g2, fit.G2_deviance, TOLERANCE, 'G²');
  expectNear(found.x2, fit.X2_pearson, TOLERANCE * Math.max(1, fit.X2_pearson), 'X²');
  expectNear(found.aic, fit.AIC_dev, TOLERANCE, 'AIC');
  expectNear(found.bic, fit.BIC_dev_Ncases, TOLERANCE, 'BIC');
  const observed = found['moments-observed'];
  const fitted = found['moments-fitted'];
  expectNear(fitted.mean, observed.mean, 1e-9 * observed.mean, 'mean');
  expectNear(fitted.sd, observed.sd, 1e-9 * observed.sd, 'sd');
  if (degree >= 3) expectNear(fitted.skewness, observed.skewness, 1e-8, 'skewness');
  const frequencies = columnOf(rows, `fit_k${degree}`);
  expectAllNear(
    smoothedColumn(group, 'proportion'),
    frequencies.map((frequency) => frequency / reference.N),
    TOLERANCE,
    'proportion',
  );
  expectAllNear(smoothedColumn(group, 'percentile-rank'), columnOf(rows, `prmid_k${degree}`), TOLERANCE, 'rank');
  const errors = columnOf(rows, `se_prmid_k${degree}`);
  expectAllNear(smoothedColumn(group, 'standard-error'), errors, TOLERANCE, 'standard error');
}

describe.each(COHORTS)('table --smooth of $id', ({ id, last, degree }) => {
  it('has the log-linear fit of degree 3 that R has', () => {
    expectLikeR(smoothTable(id, last, 'log-linear:3'), id, 3);
  });

  it('chooses the degree with the lowest BIC', () => {
    expect(degree).toBe(readSmoothingReference(id).loglinear.best_k_by_BIC_dev_Ncases);
    expectLikeR(smoothTable(id, last, 'log-linear:auto'), id, degree);
  });

  it('has the kernel with a bandwidth given, alone and after a log-linear fit', () => {
    const { kernel } = readSmoothingReference(id);
    const [bandwidth = NaN] = kernel.h;
    const wanted = readRows(`${id}_kernel.csv`).filter(
      (row) => /^\d+$/.test(row['x'] ?? '') && Number(row['x']) <= last,
    );
    const alone = smoothTable(id, last, `kernel:${bandwidth}`);
    expect(alone.smoothing).toMatchObject({ method: 'kernel', degree: null, bandwidth, g2: null, bic: null });
    expectAllNear(
      smoothedColumn(alone, 'percentile-rank'),
      columnOf(wanted, `pr_obs_h${bandwidth}`),
      TOLERANCE,
      'rank',
    );
    expect(smoothedColumn(alone, 'standard-error').every((error) => error === null)).toBe(true);
    const used = kernel.smooth_k_used;
    const second = smoothTable(id, last, `log-linear:${used}+kernel:${bandwidth}`);
    expect(second.smoothing).toMatchObject({ method: 'kernel', degree: used, bandwidth });
    const ranks = columnOf(wanted, `pr_smooth_h${bandwidth}`);
    expectAllNear(smoothedColumn(second, 'percentile-rank'), ranks, TOLERANCE, 'rank after the fit');
  });
});

describe('what smoothing changes', () => {
  it('is what is printed, not the observed rank', () => {
    const plain = smoothTable('c1_tiny', 20, 'none');
    const smooth = smoothTable('c1_tiny', 20, 'log-linear:auto');
    expect([plain.smoothing, plain.rows.every((row) => row.smoothed === null)]).toEqual([null, true]);
    const observed = (group: TablesGroup) => group.rows.map((row) => [row['percentile-rank'], row['standard-error']]);
    expect(observed(smooth)).toEqual(observed(plain));
    const [at11, plainAt11] = [smooth.rows[11], plain.rows[11]];
    expect([plainAt11?.printed, at11?.printed]).toEqual(['55', '61']);
    const z = normalQuantile((columnOf(readRows('c1_tiny_loglinear.csv'), 'prmid_k2')[11] ?? NaN) / 100, 0, 1);
    expectNear(at11?.derived.z ?? null, z, NORMAL, 'z of the smooth rank');
  });

  it('is the mean and the spread of number-right scores by a beta-binomial curve', () => {
    const { smoothing, rows } = smoothTable('c2_leftskew', 30, 'beta-binomial');
    if (smoothing === null) throw new Error('not smoothed');
    expect(smoothing).toMatchObject({ method: 'beta-binomial', degree: null, bandwidth: null, aic: null, bic: null });
    expectNear(smoothing['moments-fitted'].mean, smoothing['moments-observed'].mean, 1e-9, 'mean');
    expectNear(smoothing['moments-fitted'].sd, smoothing['moments-observed'].sd, 1e-9, 'sd');
    const sum = rows.reduce((total, row) => total + (row.smoothed?.proportion ?? NaN), 0);
    expectNear(sum, 1, 1e-12, 'sum of proportions');
  });

  it('goes group by group, with weights on the effective n', () => {
    const words = ['--score', 'raw_score', '--scale', '0:40', '--missing', '99,abs', '--weight', 'weight'];
    const { groups } = tables(SAMPLE_COHORT, ...words, '--by', 'grade', '--smooth', 'log-linear:auto');
    expect(groups.map(({ group }) => group)).toEqual(['4', '5', '6'].map((grade) => ({ grade })));
    for (const { smoothing, rows } of groups) {
      expect(smoothing?.method).toBe('log-linear');
      const ranks = rows.map((row) => row.smoothed?.['percentile-rank'] ?? NaN);
      expect(ranks).toEqual(ranks.toSorted((left, right) => left - right));
    }
  });
});

describe('a refused smoothing', () => {
  const refusal = (path: string, smooth: string, ...words: readonly string[]): string => {
    const ran = normloom(['table', path, '--score', 'score', ...words, '--smooth', smooth]);
    expect([ran.exit, ran.stdout]).toEqual([3, '']);
    const [sentence = '', ...others] = ran.stderr.split('\n').filter((line) => line.startsWith('normloom: '));
    expect(others).toEqual([]);
    return sentence;
  };

  it('tells the degree that works, and it does', () => {
    const few = fileForTest('few.csv', 'score\n1\n2\n2\n3\n3\n3\n4\n9\n');
    const sentence = refusal(few, 'log-linear:9');
    expect(sentence).toMatch(
      /^normloom: Everybody cannot be smoothed as chosen\. Degree 9 asks for more .* Type --smooth log-linear:\d\.$/,
    );
    const offered = /--smooth (\S+)\.$/.exec(sentence)?.[1] ?? '';
    expect(onlyTable(few, '--score', 'score', '--smooth', offered).smoothing?.degree).toBe(Number(offered.slice(-1)));
    expect(refusal(few, 'log-linear:9+kernel:0.5')).toContain(`Type --smooth ${offered}+kernel:0.5.`);
  });

  it('of several groups tells what works for all of them', () => {
    const lines = ['a,1', 'a,2', 'a,2', 'a,3', ...[1, 2, 3, 4, 5, 5, 3, 3].map((score) => `b,${score}`), 'c,1', 'c,1'];
    const two = fileForTest('two.csv', `g,score\n${lines.slice(0, -2).join('\n')}\n`);
    const sentence = refusal(two, 'log-linear:6', '--by', 'g');
    expect(sentence).toContain('normloom: G a cannot be smoothed as chosen.');
    expect(sentence).toContain('Another group cannot either. Type --smooth log-linear:2, which works for every group.');
    const three = fileForTest('three.csv', `g,score\n${lines.join('\n')}\n`);
    expect(refusal(three, 'log-linear:6', '--by', 'g')).toContain('Type --smooth none, which works for every group.');
    expect(refusal(three, 'log-linear:2', '--by', 'g')).toContain('People on two scores or more are needed');
  });

  it('comes where a beta-binomial curve does not fit the scale or the spread', () => {
    const narrow = fileForTest('narrow.csv', `score\n${'5\n'.repeat(20)}4\n6\n`);
    const sentence = refusal(narrow, 'beta-binomial', '--scale', '0:10');
    expect(sentence).toContain('The scores spread no more than the binomial distribution of their mean');
    expect(sentence).toContain('Type --smooth log-linear:auto.');
    expect(refusal(narrow, 'beta-binomial', '--scale', '1:10')).toContain('whole marks from 0 to 2 or more');
  });
});

describe('smoothing as text and csv', () => {
  const words = ['table', referenceCohort('c1_tiny_cohort.csv'), '--score', 'score', '--scale', '0:20'];

  it('states what was done, the fit, and what it does to the ranks', () => {
    const { stdout } = normloom([...words, '--smooth', 'log-linear:auto', '--points', '0.5']);
    expect(stdout.split('\n').slice(3, 7)).toEqual([
      'Log-linear smoothing of degree 2 of the observed scores, chosen by the lowest BIC (people counted) among degrees 1 to 10; their first 2 moments are kept.',
      'Fit: G² 6.91, X² 6.00, df 18, AIC 12.91, BIC 17.75.',
      'Smoothing moves a rank by at most 6.0 points, at 11, and changes 13 of 21 printed ranks.',
      '',
    ]);
    expect(stdout).toContain('Percentile points of the scores before smoothing, ');
    const kernel = normloom([...words, '--smooth', 'kernel:0.5']).stdout;
    expect(kernel).toContain('a Gaussian kernel with a bandwidth of 0.5 raw-score points');
    expect(kernel).not.toContain('Fit:');
    expect(normloom([...words, '--smooth', 'beta-binomial']).stdout).toMatch(
      /^Fit: G² \d+\.\d\d, X² \d+\.\d\d, df 18\.$/m,
    );
  });

  it('warns on stderr where the curve may be unfair to the data', () => {
    const holes = Array.from({ length: 21 }, (_, score) => `${score},${score % 2 === 0 ? 40 : 0}`).join('\n');
    const combed = fileForTest('comb.csv', `score,n\n${holes}\n`);
    const ran = normloom([
      'table',
      combed,
      '--score',
      'score',
      '--count',
      'n',
      '--scale',
      '0:20',
      '--smooth',
      'log-linear:2',
    ]);
    expect(ran.exit).toBe(0);
    expect(ran.stderr).toMatch(/^Smoothing puts people at 1, 3, .*, where nobody in Everybody is\. The curve expects/m);
  });

  it('has the smooth and the observed rank side by side in columns', () => {
    const columns = ['--columns', 'exact-rank,observed-rank', '--smooth', 'log-linear:2'];
    const { stdout } = normloom([...words, ...columns]);
    expect(stdout).toMatch(/^ +11 +61 +61\.\d\d +55\.41$/m);
    const csv = normloom([...words, ...columns, '--format', 'csv']).stdout;
    expect(csv.split('\r\n')[0]).toContain('printed-exact-rank,printed-observed-rank');
    expect(csv).toContain(',55.41,');
  });
});
