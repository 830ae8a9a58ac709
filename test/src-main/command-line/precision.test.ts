import { describe, expect, it } from 'vitest';
import { EXACT, expectNear, NORMAL } from '../../reference/near.ts';
import { numberIn, readRows } from '../../reference/read-reference.ts';
import { fileForTest, normloom, referenceCohort } from './run-normloom.ts';
import { onlyTable, type TablesGroup } from './tables-file.ts';

const TINY = [referenceCohort('c1_tiny_cohort.csv'), '--score', 'score', '--scale', '0:20'];

const DEFINITIONS = { midpoint: 'mid', 'at-or-below': 'atbelow', below: 'below' } as const;
const METHODS = { wilson: 'wilson', 'clopper-pearson': 'clopper', jeffreys: 'jeffreys' } as const;

const ASKED = Object.entries(DEFINITIONS).flatMap(([definition, prefix]) =>
  Object.entries(METHODS)
    .filter(([method]) => definition !== 'midpoint' || method !== 'clopper-pearson')
    .flatMap(([method, word]) =>
      ['90', '95'].map((level) => ({ definition, method, level, column: `${prefix}_${word}_${level}` })),
    ),
);

function expectIntervals({ rows }: TablesGroup, column: string): void {
  const wanted = readRows('c1_tiny_intervals.csv');
  expect(rows).toHaveLength(wanted.length);
  wanted.forEach((row, position) => {
    const found = rows[position]?.interval ?? null;
    expectNear(found?.low ?? null, numberIn(row, `${column}_lo`) ?? NaN, NORMAL, `${column} of ${position}, low`);
    expectNear(found?.high ?? null, numberIn(row, `${column}_hi`) ?? NaN, NORMAL, `${column} of ${position}, high`);
  });
}

describe('intervals and standard errors', () => {
  it.each(ASKED)('by $method at $level % of the rank $definition are those of R', (asked) => {
    const { definition, method, level, column } = asked;
    expectIntervals(onlyTable(...TINY, '--definition', definition, '--interval', method, '--level', level), column);
  });

  it('are Wilson’s at 95 % where nothing is said, and none where the definition has none', () => {
    expectIntervals(onlyTable(...TINY), 'mid_wilson_95');
    const { rows } = onlyTable(...TINY, '--definition', 'plotting-position:3/8');
    expect(rows.every((row) => row.interval === null)).toBe(true);
  });

  it('have the multinomial standard error of the mid rank whatever the definition', () => {
    for (const words of [[], ['--definition', 'below'], ['--smooth', 'log-linear:2']]) {
      const { rows } = onlyTable(...TINY, ...words);
      readRows('c1_tiny_scores.csv').forEach((row, position) => {
        const wanted = numberIn(row, 'se_pr_mid_multinomial') ?? NaN;
        expectNear(rows[position]?.['standard-error'] ?? null, wanted, EXACT, `standard error of ${position}`);
      });
    }
  });

  it.each<[readonly string[], string]>([
    [['--interval', 'clopper-pearson'], 'the midpoint rank counts halves'],
    [['--interval', 'wilson', '--definition', 'grouped:2'], 'Intervals need a rank that counts people'],
    [['--interval', 'jeffreys', '--definition', 'plotting-position:0'], 'Intervals need a rank that counts people'],
  ])('%j are refused', (words, problem) => {
    const ran = normloom(['table', ...TINY, ...words, '--format', 'json']);
    expect([ran.exit, ran.stdout]).toEqual([3, '']);
    expect(ran.stderr).toMatch(/^normloom: Everybody: .*\.\n$/);
    expect(ran.stderr).toContain(problem);
  });

  it('by Clopper and Pearson are refused of weighted people', () => {
    const weighted = [referenceCohort('c5_weighted_cohort.csv'), '--score', 'score', '--weight', 'weight'];
    const words = ['--definition', 'below', '--interval', 'clopper-pearson'];
    expect(normloom(['table', ...weighted, ...words])).toMatchObject({ exit: 3, stdout: '' });
  });
});

describe('the measurement band', () => {
  it('closes where the test is without error and opens with the error', () => {
    const bandsAt = (reliability: string): readonly { readonly low: number; readonly high: number }[] =>
      onlyTable(...TINY, '--reliability', reliability).rows.map(({ band }) => band ?? { low: NaN, high: NaN });
    const exact = bandsAt('1');
    const good = bandsAt('0.9');
    const poor = bandsAt('0.5');
    exact.forEach(({ low, high }, position) => {
      expect(low).toBe(high);
      expect(good[position]?.low).toBeLessThanOrEqual(low);
      expect(good[position]?.high).toBeGreaterThanOrEqual(high);
      expect(poor[position]?.low).toBeLessThanOrEqual(good[position]?.low ?? NaN);
      expect(poor[position]?.high).toBeGreaterThanOrEqual(good[position]?.high ?? NaN);
    });
    expect((poor[10]?.high ?? NaN) - (poor[10]?.low ?? NaN)).toBeGreaterThan(50);
    expect(onlyTable(...TINY).rows.every(({ band }) => band === null)).toBe(true);
  });
});

describe('the range of what could be printed', () => {
  it('holds the ranks of the three definitions', () => {
    const printed = ['midpoint', 'at-or-below', 'below'].map((definition) =>
      onlyTable(...TINY, '--definition', definition, '--smooth', 'log-linear:2').rows.map((row) => row.printed),
    );
    const { rows } = onlyTable(...TINY, '--smooth', 'log-linear:2');
    const place = (text: string): number => Number(text.replace('<1', '0').replace('>99', '100'));
    rows.forEach(({ alternatives: { low, high } }, position) => {
      for (const ranks of printed) {
        expect(place(ranks[position] ?? '')).toBeGreaterThanOrEqual(place(low));
        expect(place(ranks[position] ?? '')).toBeLessThanOrEqual(place(high));
      }
    });
  });
});

describe('the bootstrap', () => {
  const words = [...TINY, '--smooth', 'log-linear:auto', '--bootstrap', '120'];

  it('adds its own keys and no others', () => {
    const file = JSON.parse(normloom(['table', ...words, '--seed', '7', '--format', 'json']).stdout);
    const [group] = file.groups;
    const plain = JSON.parse(normloom(['table', ...TINY, '--smooth', 'log-linear:auto', '--format', 'json']).stdout);
    expect(Object.keys(group.bootstrap)).toEqual(['replicates', 'seed', 'fitted', 'failures', 'degrees', 'people']);
    for (const row of group.rows) expect(Object.keys(row.bootstrap)).toEqual(['low', 'high', 'standard-error']);
    delete group.bootstrap;
    for (const row of group.rows) delete row.bootstrap;
    expect(file).toEqual(plain);
    expect(Object.keys(group.smoothing)).toEqual(
      ['method', 'degree', 'bandwidth', 'g2', 'x2', 'df', 'aic', 'bic', 'converged'].concat([
        'moments-observed',
        'moments-fitted',
      ]),
    );
    expect(Object.keys(group.smoothing['moments-fitted'])).toEqual(['mean', 'sd', 'skewness', 'excess-kurtosis']);
    expect(Object.keys(group.rows[3].smoothed)).toEqual(['proportion', 'percentile-rank', 'standard-error']);
  });

  it('is drawn again by its seed, and otherwise by another', () => {
    const first = onlyTable(...words, '--seed', '7');
    expect(onlyTable(...words, '--seed', '7')).toEqual(first);
    expect(onlyTable(...words, '--seed', '8').rows).not.toEqual(first.rows);
    expect(onlyTable(...words).bootstrap?.seed).toBe(1);
    expect(first.bootstrap).toMatchObject({ replicates: 120, seed: 7, people: 37 });
    const { fitted, failures, degrees } = first.bootstrap ?? { fitted: NaN, failures: [], degrees: [] };
    expect(fitted + failures.reduce((sum, { count }) => sum + count, 0)).toBe(120);
    expect(degrees.reduce((sum, { count }) => sum + count, 0)).toBe(fitted);
  });

  it('comes near the formula for the error of the mid rank without smoothing', () => {
    const { rows, bootstrap } = onlyTable(...TINY, '--bootstrap', '4000', '--seed', '3');
    expect(bootstrap).toMatchObject({ fitted: 4000, failures: [], degrees: [] });
    for (const row of rows.filter(({ count }) => count > 2)) {
      const drawn = row.bootstrap?.['standard-error'] ?? NaN;
      expect(Math.abs(drawn / row['standard-error'] - 1)).toBeLessThan(0.08);
      expect(row.bootstrap?.low).toBeLessThan(row['percentile-rank']);
      expect(row.bootstrap?.high).toBeGreaterThan(row['percentile-rank']);
    }
  });

  it('counts the samples that could not be smoothed', () => {
    const few = fileForTest('few.csv', 'score\n1\n1\n1\n2\n3\n5\n');
    const asked = [few, '--score', 'score', '--scale', '1:5', '--smooth', 'log-linear:3', '--bootstrap', '100'];
    const drawnFrom = (seed: string) => {
      const { bootstrap, rows } = onlyTable(...asked, '--seed', seed);
      const failed = bootstrap?.failures.reduce((sum, { count }) => sum + count, 0) ?? NaN;
      expect(failed).toBeGreaterThan(0);
      expect((bootstrap?.fitted ?? NaN) + failed).toBe(100);
      return { fitted: bootstrap?.fitted ?? NaN, lows: rows.map((row) => row.bootstrap?.low) };
    };
    // An interval of 95 % takes 39 samples that could be smoothed.
    const tooFew = drawnFrom('1');
    expect(tooFew.fitted).toBeLessThan(39);
    expect(tooFew.lows).toEqual([null, null, null, null, null]);
    const enough = drawnFrom('2');
    expect(enough.fitted).toBeGreaterThanOrEqual(39);
    expect(enough.lows.every((low) => typeof low === 'number')).toBe(true);
    expect(normloom(['table', ...asked]).stdout).toMatch(/^ {2}\d+ not smoothed: Degree 3 asks for more/m);
  });

  it('is told in a line of the text', () => {
    const { stdout } = normloom(['table', ...words, '--seed', '7']);
    expect(stdout).toMatch(
      /^Bootstrap: 120 samples of 37 people from seed 7 \(xoshiro128\*\*\), each smoothed again, without failure\. Largest standard error \d\.\d points, at \d+\. Degrees taken: 2 in \d+/m,
    );
  });
});

describe('precision as text and csv', () => {
  const columns = 'interval,standard-error,measurement-band,observed-rank,print-range';

  it('has its columns, and says which method they are of', () => {
    const { stdout, stderr } = normloom([
      'table',
      ...TINY,
      '--columns',
      columns,
      '--reliability',
      '0.88',
      '--level',
      '90',
      '--interval',
      'jeffreys',
    ]);
    expect(stderr).toBe('');
    expect(stdout).toContain('Intervals: 90 %, equal-tailed beta interval with the prior of Jeffreys, of the observed');
    expect(stdout).toContain(
      'Measurement bands: 90 %, at a reliability of 0.88, which is a standard error of 1.04 raw',
    );
    expect(stdout).toMatch(/^ {2}Raw +Percentile +90 % +Standard +Measure- +Observed +Could$/m);
    expect(stdout).toMatch(/^ {3}10 +45 +\d+–\d+ +7\.\d +\d+–\d+ +44\.59 +\d+–\d+$/m);
    const csv = normloom(['table', ...TINY, '--columns', columns, '--reliability', '0.88', '--format', 'csv']).stdout;
    for (const column of columns.split(',')) expect(csv.split('\r\n')[0]).toContain(`printed-${column}`);
  });

  it('tells where what was asked for does not show', () => {
    const unseen = normloom(['table', ...TINY, '--reliability', '0.88', '--interval', 'wilson']);
    expect(unseen.exit).toBe(0);
    expect(unseen.stderr).toContain('Intervals show in the column interval; name it in --columns to see it.');
    expect(unseen.stderr).toContain('A reliability shows in the column measurement-band;');
    const empty = normloom(['table', ...TINY, '--columns', 'interval', '--definition', 'grouped:2']);
    expect(empty.exit).toBe(0);
    expect(empty.stderr).toContain('The interval column of Everybody is empty. Intervals need a rank');
  });
});
