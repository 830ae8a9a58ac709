import { utils, write, type BookType } from '@e965/xlsx';
import { describe, expect, it } from 'vitest';
import { POINT_DEFINITIONS } from '../../../shared-core/percentile/percentile-point.ts';
import { EXACT, expectAllNear, expectNear, NORMAL } from '../../reference/near.ts';
import {
  numberIn,
  readCohortReference,
  readRows,
  readWeightedReference,
  rowsOf,
} from '../../reference/read-reference.ts';
import { fileForTest, normloom, referenceCohort, SAMPLE_COHORT } from './run-normloom.ts';
import { readTables, tables } from './tables-file.ts';

const ALL_SCORES = ['--score', 'raw_score', '--scale', '0:40', '--missing', '99,abs', '--id', 'pupil_id'];

describe('table as json', () => {
  it('has the reference numbers of the tiny cohort', () => {
    const reference = readCohortReference('c1_tiny');
    const words = ['--score', 'score', '--scale', '0:20', '--points', reference.probs.join(',')];
    const definitions = ['--point-definition', POINT_DEFINITIONS.slice(0, 9).join(',')];
    const file = tables(referenceCohort('c1_tiny_cohort.csv'), ...words, ...definitions);
    expect(file.source).toMatchObject({ file: 'c1_tiny_cohort.csv', 'rows-read': 37, 'rows-kept': 37, 'left-out': [] });
    expect(file.scale).toEqual({ min: 0, max: 20, step: 1 });
    expect(file.groups).toHaveLength(1);
    const [group] = file.groups;
    if (group === undefined) throw new Error('no group');
    expect([group.n, group['weight-sum'], group['effective-n']]).toEqual([37, 37, 37]);
    const { mean, sd_n1, skew_pop, excess_kurt_pop } = reference.moments_observed;
    expectNear(group.mean, mean, EXACT, 'mean');
    expectNear(group.sd, sd_n1, EXACT, 'sd');
    expectNear(group.skewness, skew_pop, EXACT, 'skewness');
    expectNear(group['excess-kurtosis'], excess_kurt_pop, EXACT, 'excess kurtosis');
    expect(group['five-number']).toEqual(reference.fivenum);
    for (const definition of POINT_DEFINITIONS.slice(0, 9)) {
      const scores = group.points.filter((point) => point.definition === definition).map(({ score }) => score);
      expectAllNear(scores, reference.quantiles[definition.replace('-', '')] ?? [], EXACT, definition);
    }
    const wanted = readRows('c1_tiny_scores.csv');
    expect(group.rows).toHaveLength(wanted.length);
    wanted.forEach((row, position) => {
      const found = group.rows[position];
      if (found === undefined) throw new Error('no row');
      expect([found.score, found.count]).toEqual([numberIn(row, 'score'), numberIn(row, 'freq')]);
      expect(found.cumulative).toBe(numberIn(row, 'cum_atbelow'));
      expectNear(found['percentile-rank'], numberIn(row, 'pr_mid') ?? NaN, EXACT, 'percentile rank');
      const z = numberIn(row, 'z_from_pr_mid');
      if (z === null) expect([found.derived.z, found.derived.t]).toEqual([null, null]);
      else {
        expectNear(found.derived.z, z, NORMAL, 'z');
        expectNear(found.derived.t, numberIn(row, 'T_mid') ?? NaN, 10 * NORMAL, 'T');
        expectNear(found.derived.nce, numberIn(row, 'nce2106_mid') ?? NaN, 22 * NORMAL, 'NCE');
        expectNear(found.derived.deviation, numberIn(row, 'dev100_15_mid') ?? NaN, 15 * NORMAL, 'deviation');
      }
      expect(found.derived.stanine).toBe(numberIn(row, 'stanine_pr_ge'));
    });
  });

  it.each([
    ['at-or-below', 'pr_atbelow'],
    ['below', 'pr_below'],
    ['plotting-position:0', 'pr_weibull'],
  ])('has the ranks of the definition %s', (definition, column) => {
    const cohort = referenceCohort('c1_tiny_cohort.csv');
    const file = tables(cohort, '--score', 'score', '--scale', '0:20', '--definition', definition);
    expect(file.definition).toBe(definition);
    readRows('c1_tiny_scores.csv').forEach((row, position) => {
      const wanted = numberIn(row, column);
      const found = file.groups[0]?.rows[position]?.['percentile-rank'] ?? null;
      if (wanted !== null) expectNear(found, wanted, EXACT, `${column} of ${row['score']}`);
    });
  });

  it('has the grouped ranks and points of classes', () => {
    const { grouped_exact_limits: wanted } = readCohortReference('c1_tiny');
    const words = ['--scale', '0:20', '--definition', `grouped:${wanted.width}`, '--points', wanted.probs.join(',')];
    const cohort = referenceCohort('c1_tiny_cohort.csv');
    const [group] = tables(cohort, '--score', 'score', ...words, '--point-definition', 'grouped').groups;
    const ranks = wanted.scores.map((score) => group?.rows.find((row) => row.score === score)?.['percentile-rank']);
    expectAllNear(
      ranks.map((rank) => rank ?? null),
      wanted.pr_at_scores,
      EXACT,
      'grouped rank',
    );
    expectAllNear(
      (group?.points ?? []).map(({ score }) => score),
      wanted.percentile_points,
      EXACT,
      'grouped point',
    );
  });

  it('has the reference numbers of the weighted cohort', () => {
    const reference = readWeightedReference('c5_weighted');
    const words = ['--score', 'score', '--weight', 'weight', '--scale', '0:40', '--points', reference.probs.join(',')];
    const cohort = referenceCohort('c5_weighted_cohort.csv');
    const [group] = tables(cohort, ...words, '--point-definition', 'type-1').groups;
    if (group === undefined) throw new Error('no group');
    expectNear(group['weight-sum'], reference.sum_w, EXACT, 'sum of weights');
    expectNear(group['effective-n'], reference.kish_neff, EXACT, 'effective n');
    expectNear(group.sd, reference.moments_weighted.sd_reliability_weights, EXACT, 'sd');
    expect(group.points.map(({ score }) => score)).toEqual(reference.quantile_inverse_weighted_ecdf);
    readRows('c5_weighted_scores.csv').forEach((row, position) => {
      const found = group.rows[position];
      expectNear(found?.weight ?? null, numberIn(row, 'w_freq') ?? NaN, EXACT, 'weight');
      expectNear(found?.['percentile-rank'] ?? null, numberIn(row, 'pr_mid') ?? NaN, EXACT, 'rank');
    });
  });

  it('has exactly the keys of the contract, the file’s own names only in "group"', () => {
    const ran = normloom([
      'table',
      SAMPLE_COHORT,
      ...ALL_SCORES,
      '--by',
      'grade',
      '--points',
      '0.5',
      '--format',
      'json',
    ]);
    const file = JSON.parse(ran.stdout);
    expect(Object.keys(file)).toEqual(['source', 'scale', 'definition', 'groups']);
    expect(Object.keys(file.source)).toEqual(['file', 'sha256', 'rows-read', 'rows-kept', 'left-out']);
    for (const rule of file.source['left-out']) expect(Object.keys(rule)).toEqual(['rule', 'count', 'rows']);
    expect(Object.keys(file.scale)).toEqual(['min', 'max', 'step']);
    expect(file.groups).toHaveLength(3);
    for (const group of file.groups) {
      expect(Object.keys(group)).toEqual(
        ['group', 'n', 'weight-sum', 'effective-n', 'clusters', 'design-effect', 'mean', 'sd'].concat([
          'skewness',
          'excess-kurtosis',
          'five-number',
          'points',
          'smoothing',
          'rows',
        ]),
      );
      expect(Object.keys(group.group)).toEqual(['grade']);
      for (const point of group.points) expect(Object.keys(point)).toEqual(['proportion', 'definition', 'score']);
      for (const row of group.rows) {
        expect(Object.keys(row)).toEqual([
          'score',
          'count',
          'weight',
          'cumulative',
          'percentile-rank',
          'printed',
          'adjusted',
          'derived',
          'interval',
          'standard-error',
          'smoothed',
          'alternatives',
          'band',
          'provenance',
        ]);
        const derived = ['deviation', 'nce', 'stanine', 'sten', 't', 'z'];
        expect(Object.keys(row.derived).toSorted()).toEqual(derived);
        expect([Object.keys(row.interval), Object.keys(row.alternatives)]).toEqual([
          ['low', 'high'],
          ['low', 'high'],
        ]);
        expect([row.smoothed, row.band]).toEqual([null, null]);
      }
    }
  });

  it('finds each defect of the sample cohort', () => {
    const file = tables(SAMPLE_COHORT, ...ALL_SCORES, '--by', 'grade,form', '--weight', 'weight');
    const leftOut = Object.fromEntries(file.source['left-out'].map(({ rule, count }) => [rule, count]));
    expect(leftOut).toEqual({
      'blank-row': 3,
      'ragged-row': 1,
      'duplicate-id': 9,
      'blank-score': 9,
      'missing-code': 19,
      'above-scale': 4,
      'off-grid': 2,
      'blank-group': 1,
      'bad-weight': 3,
    });
    expect(file.groups.map(({ group }) => group)).toEqual(
      ['4', '5', '6'].flatMap((grade) => ['A', 'B'].map((form) => ({ grade, form }))),
    );
    expect(file.groups.reduce((sum, { n }) => sum + n, 0)).toBe(file.source['rows-kept']);
  });

  it('finds each defect of a dirty file, and the flow adds up', () => {
    const lines = [
      '\uFEFFName;Klasse;Punkte;Gewicht',
      'a1;5;10,5;1,0',
      'a2;5;11;0,5',
      'a2;5;12;0,5',
      ';;;',
      '',
      'a3;5;99;1',
      'a4;5;;1',
      'a5;5;zehn;1',
      'a6;5;10,25;1',
      'a7;5;21;1',
      'a8;5;-1;1',
      'a9;;10;1',
      'b1;5;10;0',
      'b2;5;10',
      'b3;5;10;1;1',
      '"b;4";5;"10,0";1,5',
      'b5;6;20;1',
    ];
    const dirty = fileForTest('Mappe (1).csv', lines.join('\r\n'));
    const words = ['--score', 'Punkte', '--id', 'Name', '--by', 'Klasse', '--weight', 'Gewicht', '--missing', '99'];
    const file = tables(dirty, ...words, '--scale', '0:20:0.5');
    expect(file.source.file).toBe('Mappe (1).csv');
    expect(file.source['left-out']).toEqual([
      { rule: 'blank-row', count: 2, rows: [5, 6] },
      { rule: 'ragged-row', count: 2, rows: [15, 16] },
      { rule: 'duplicate-id', count: 1, rows: [4] },
      { rule: 'blank-score', count: 1, rows: [8] },
      { rule: 'missing-code', count: 1, rows: [7] },
      { rule: 'not-a-number', count: 1, rows: [9] },
      { rule: 'below-scale', count: 1, rows: [12] },
      { rule: 'above-scale', count: 1, rows: [11] },
      { rule: 'off-grid', count: 1, rows: [10] },
      { rule: 'blank-group', count: 1, rows: [13] },
      { rule: 'bad-weight', count: 1, rows: [14] },
    ]);
    const out = file.source['left-out'].reduce((sum, { count }) => sum + count, 0);
    expect([file.source['rows-read'], file.source['rows-kept'] + out]).toEqual([17, 17]);
    expect(file.groups.map(({ group, n, 'weight-sum': sum }) => [group, n, sum])).toEqual([
      [{ Klasse: '5' }, 3, 3],
      [{ Klasse: '6' }, 1, 1],
    ]);
  });

  it('takes counts for people, with the same numbers', () => {
    const people = tables(referenceCohort('c1_tiny_cohort.csv'), '--score', 'score', '--scale', '0:20');
    const lines = readRows('c1_tiny_scores.csv').map((row) => `${row['score']},${row['freq']}`);
    const counted = fileForTest('counts.csv', `mark,pupils\n${lines.join('\n')}\n`);
    const counts = tables(counted, '--score', 'mark', '--count', 'pupils', '--scale', '0:20');
    expect(counts.groups).toEqual(people.groups);
    expect(counts.source['rows-read']).toBe(21);
  });

  it('counts from the high end where low scores are good', () => {
    const seconds = fileForTest('run.csv', 'seconds\n10\n11\n11\n12\n');
    const [group] = tables(seconds, '--score', 'seconds', '--low-is-good', '--points', '0.25').groups;
    expect(group?.rows.map((row) => row['percentile-rank'])).toEqual([87.5, 50, 12.5]);
    expect(group?.points).toEqual([{ proportion: 0.25, definition: 'inverse', score: 11.5 }]);
  });

  it('takes a file without a heading, its columns by number', () => {
    const bare = fileForTest('bare.csv', '7,1\n8,2\n8,3\n');
    expect(tables(bare, '--score', 'column 1').groups[0]?.n).toBe(3);
  });

  it('takes decimal commas in a file of one column', () => {
    const halves = fileForTest('halves.csv', 'mark\n1,5\n2\n2,5\n');
    const file = tables(halves, '--score', 'mark', '--scale', '0:3:0.5');
    expect(file.groups[0]?.rows.map(({ count }) => count)).toEqual([0, 0, 0, 1, 1, 1, 0]);
    expect(file.source['left-out']).toEqual([]);
  });

  it.each<BookType>(['xlsx', 'ods', 'biff8'])('finds the sheet that has the columns in a workbook (%s)', (bookType) => {
    const book = utils.book_new();
    utils.book_append_sheet(book, utils.aoa_to_sheet([['Read the second sheet.']]), 'About');
    utils.book_append_sheet(book, utils.aoa_to_sheet([['mark'], [1], [2], [2]]), 'Marks');
    const path = fileForTest('marks.book', new Uint8Array(write(book, { type: 'buffer', bookType }) as Buffer));
    const ran = normloom(['table', path, '--score', 'mark', '--scale', '0:3', '--format', 'json']);
    expect([ran.exit, ran.stderr]).toEqual([0, 'Read with sheet "Marks" of 2.\n']);
    expect(readTables(ran.stdout).groups[0]?.n).toBe(3);
  });

  it('takes names with commas, keys of objects, and a heading that looks like data', () => {
    const odd = fileForTest('odd.csv', '"grade, or year",__proto__,2026\n5,x,3\n5,x,4\n6,y,4\n');
    const file = tables(odd, '--score', '2026', '--by', '"grade, or year",__proto__');
    expect(file.source['rows-read']).toBe(3);
    expect(file.groups.map(({ group }) => JSON.stringify(group))).toEqual([
      '{"grade, or year":"5","__proto__":"x"}',
      '{"grade, or year":"6","__proto__":"y"}',
    ]);
  });
});

describe('table as text and csv', () => {
  it('is a table in fives with definition and n above, cautions below', () => {
    const ran = normloom(['table', referenceCohort('c1_tiny_cohort.csv'), '--score', 'score', '--scale', '0:20']);
    const lines = ran.stdout.split('\n');
    expect([ran.exit, ran.stderr]).toEqual([0, '']);
    expect(lines.slice(0, 14)).toEqual([
      'Everybody',
      'The share of the sample scoring below, plus half of those at the same score.',
      '37 people. Mean 10.1, SD 3.0. Lowest score 4, lower hinge 8, median 11, upper hinge 12, highest score 16.',
      'The distribution is not smoothed.',
      '',
      '  Raw  Percentile  Sta-',
      'score        rank  nine   T',
      '',
      '    0          <1     1  20',
      '    1          <1     1  20',
      '    2          <1     1  20',
      '    3          <1     1  20',
      '    4           1     1  28',
      '',
    ]);
    expect(lines.at(-2)).toMatch(/^A percentile rank is a place in a named group, .* professional\.$/);
    expect(lines.at(-1)).toBe('');
    expect(lines.filter((line) => /^ +\d+ +[<>]?\d+ +\d+ +\d+$/.test(line))).toHaveLength(21);
  });

  it('has the columns asked for, and points', () => {
    const words = [
      '--score',
      'score',
      '--columns',
      'count,cumulative',
      '--points',
      '0.5',
      '--point-definition',
      'type-7',
    ];
    const { stdout } = normloom(['table', referenceCohort('c1_tiny_cohort.csv'), ...words]);
    expect(stdout).toContain('score        rank  People  below\n');
    expect(stdout).toContain('Percentile points, interpolated at position (n − 1)p + 1 (type 7):\n  0.5: 11.0000\n');
  });

  it('sets one table after the other', () => {
    const { stdout } = normloom(['table', SAMPLE_COHORT, ...ALL_SCORES, '--by', 'grade']);
    expect(stdout.match(/^Grade \d$/gm)).toEqual(['Grade 4', 'Grade 5', 'Grade 6']);
  });

  it('prints in csv what it prints in json', () => {
    const words = ['table', SAMPLE_COHORT, ...ALL_SCORES, '--by', 'grade', '--columns', 'stanine'];
    const csv = normloom([...words, '--format', 'csv']);
    expect(csv.exit).toBe(0);
    const found = rowsOf(csv.stdout.replace('\uFEFF', '').replaceAll('\r', ''));
    const file = readTables(normloom([...words, '--format', 'json']).stdout);
    const wanted = file.groups.flatMap(({ group, n, rows }) =>
      rows.map((row) => ({
        ...Object(group),
        'raw-score': String(row.score),
        n: String(n),
        count: String(row.count),
        'percentile-rank': String(row['percentile-rank']),
        printed: row.printed,
        'printed-stanine': String(row.derived.stanine),
      })),
    );
    expect(wanted).toHaveLength(3 * 41);
    expect(found).toMatchObject(wanted);
  });
});
