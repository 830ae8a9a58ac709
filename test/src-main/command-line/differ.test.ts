import { readFileSync } from 'node:fs';
import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { cohortTable } from '../../reference/smoothing-reference.ts';
import { madeColumn, type Made } from '../../shared-core/norms/why-differ-columns-made.ts';
import { fileForTest, normloom, referenceCohort, SAMPLE_COHORT } from './run-normloom.ts';
import { tables } from './tables-file.ts';

const TINY = [referenceCohort('c1_tiny_cohort.csv'), '--score', 'score', '--scale', '0:20'];

const differFile = v.strictObject({
  source: v.strictObject({
    file: v.string(),
    sha256: v.string(),
    'rows-read': v.number(),
    'rows-kept': v.number(),
    'left-out': v.array(v.unknown()),
  }),
  group: v.unknown(),
  n: v.number(),
  ranks: v.strictObject({ file: v.string(), rows: v.number(), decimals: v.number(), proportions: v.boolean() }),
  reproduced: v.boolean(),
  finding: v.string(),
  explanations: v.array(
    v.strictObject({
      sentence: v.string(),
      convention: v.string(),
      'cut-to-three-digits': v.boolean(),
      reversed: v.boolean(),
      'weights-ignored': v.boolean(),
      ways: v.array(v.strictObject({ rounding: v.string(), ends: v.string(), limits: v.string() })),
    }),
  ),
  disagreeing: v.array(v.strictObject({ score: v.number(), theirs: v.string(), ours: v.nullable(v.string()) })),
});

function differ(ranks: string, ...words: readonly string[]): v.InferOutput<typeof differFile> {
  const ran = normloom(['differ', ...words, '--ranks', fileForTest('theirs.txt', ranks), '--format', 'json']);
  expect([ran.exit, ran.stderr.match(/normloom:.*/)?.[0]]).toEqual([0, undefined]);
  return v.parse(differFile, JSON.parse(ran.stdout));
}

describe('differ', () => {
  it.each<Made>([
    { definition: 'midpoint', rounding: 'half-up', ends: 'signs', decimals: 0 },
    { definition: 'at-or-below', rounding: 'half-even', ends: 'held', decimals: 1 },
    { definition: 'below', rounding: 'down', ends: 'open', decimals: 1 },
    { definition: 'percent-rank:inclusive:cut', rounding: 'half-up', ends: 'open', decimals: 1 },
    { definition: 'percent-rank:exclusive:cut', rounding: 'half-up', ends: 'open', decimals: 1 },
    { definition: 'plotting-position:3/8', rounding: 'half-up', ends: 'signs-rounded', decimals: 1 },
    { definition: 'plotting-position:0', rounding: 'half-up', ends: 'held', decimals: 1 },
  ])('finds $definition, $rounding, $ends, $decimals decimals', (made) => {
    const column = madeColumn(cohortTable('c1_tiny'), made);
    const found = differ(column, ...TINY);
    expect(found).toMatchObject({ group: {}, n: 37, reproduced: true, disagreeing: [] });
    expect(found.ranks).toEqual({
      file: 'theirs.txt',
      rows: column.split('\n').length,
      decimals: made.decimals,
      proportions: false,
    });
    const [convention = '', ends = '', cut] = made.definition
      .split(/(?<=percent-rank:\w+):/)
      .flatMap((part, index) => (index === 0 ? [part, ''] : [part]));
    expect(ends).toBe('');
    const explanation = found.explanations.find(
      (one) => one.convention === convention && one['cut-to-three-digits'] === (cut === 'cut') && !one.reversed,
    );
    expect(explanation?.ways).toContainEqual(expect.objectContaining({ rounding: made.rounding, ends: made.ends }));
    expect(found.finding).toContain(`All ${found.ranks.rows} ranks are reproduced by: `);
  });

  it('finds that they counted from the other end', () => {
    const made = { definition: 'below', rounding: 'half-up', ends: 'signs', decimals: 1 } as const;
    const column = madeColumn(cohortTable('c1_tiny'), made, true);
    expect(differ(column, ...TINY).explanations[0]).toMatchObject({ convention: 'below', reversed: true });
    expect(differ(column, ...TINY, '--low-is-good').explanations[0]).toMatchObject({ reversed: false });
  });

  it('names the nearest with the rows that disagree', () => {
    const made = { definition: 'at-or-below', rounding: 'half-up', ends: 'signs', decimals: 0 } as const;
    const column = madeColumn(cohortTable('c1_tiny'), made).replace(/^11\t.*$/m, '11\t77');
    const found = differ(column, ...TINY);
    expect(found.reproduced).toBe(false);
    expect(found.explanations).toHaveLength(1);
    expect(found.explanations[0]?.convention).toBe('at-or-below');
    expect(found.disagreeing).toEqual([{ score: 11, theirs: '77', ours: '62' }]);
    expect(found.finding).toContain('Nothing known here reproduces all 21 ranks. The nearest misses 1: ');
  });

  it('compares with one group, and finds that weights were left out', () => {
    const cohort = [SAMPLE_COHORT, '--score', 'raw_score', '--scale', '0:40', '--missing', '99,abs', '--by', 'grade'];
    const { groups } = tables(...cohort, '--definition', 'below');
    const grade = groups.find(({ group }) => JSON.stringify(group) === '{"grade":"5"}');
    const column = grade?.rows.map((row) => `${row.score},${row.printed}`).join('\n') ?? '';
    const found = differ(column, ...cohort, '--group', '5');
    expect(found).toMatchObject({ group: { grade: '5' }, n: grade?.n, reproduced: true });
    expect(found.explanations[0]).toMatchObject({ convention: 'below', 'weights-ignored': false });
    const weighted = differ(column, ...cohort, '--group', '5', '--weight', 'weight');
    expect(weighted.reproduced).toBe(true);
    expect(weighted.explanations.some((one) => one.convention === 'below' && one['weights-ignored'])).toBe(true);
    expect(differ(column, ...cohort, '--group', '4').reproduced).toBe(false);
  });

  it('takes counts, a heading and proportions', () => {
    const counted = fileForTest('counts.csv', 'mark,n\n0,1\n1,2\n2,3\n4,4\n');
    const words = [counted, '--score', 'mark', '--count', 'n', '--scale', '0:4'];
    const found = differ('mark;share\n0;0,05\n1;0,2\n2;0,45\n3;0,6\n4;0,8\n', ...words);
    expect(found).toMatchObject({ n: 10, reproduced: true, ranks: { rows: 5, proportions: true } });
    expect(found.explanations[0]?.convention).toBe('midpoint');
  });

  it('tells it as text', () => {
    const made = { definition: 'at-or-below', rounding: 'half-up', ends: 'signs', decimals: 0 } as const;
    const column = madeColumn(cohortTable('c1_tiny'), made);
    const run = (text: string) => normloom(['differ', ...TINY, '--ranks', fileForTest('theirs.txt', text)]);
    expect(run(column)).toMatchObject({ exit: 0, stderr: '' });
    expect(run(column).stdout).toMatch(
      /^theirs\.txt beside Everybody \(37 people\)\nAll 21 ranks are reproduced by: scoring at the same score or below; whole numbers, .*\.\n$/,
    );
    const nearest = run(column.replace(/^11\t.*$/m, '11\t77')).stdout;
    expect(nearest).toContain('The nearest misses 1: ');
    expect(nearest.endsWith('\nRaw score  Theirs  By the nearest\n       11      77              62\n')).toBe(true);
    const several = run('11\t55\n').stdout;
    expect(several).toContain('The one rank is reproduced by: ');
    expect(several).toMatch(/\nAlso by:\n {2}scoring /);
  });

  it.each<[string, string | Uint8Array, string]>([
    ['nothing', '', 'theirs.txt holds no ranks. Write one line for each score'],
    ['a heading alone', 'score rank\n', 'holds no ranks'],
    ['three entries a line', '1 2\n2 3 4\n', 'theirs.txt, line 2: A line holds a score and a rank; this one holds 3'],
    ['a score off the scale', '1 2\n21 99\n22 99\n', 'line 2: Score 21 is not on the scale of this group.'],
    ['a rank above 100', '1 2\n2 101\n', 'line 2: "101" is not a percentile rank'],
    ['a workbook', readFileSync(process.execPath).subarray(0, 4096), 'is not a text file'],
    ['too much', ' '.repeat(4_000_001), 'is too large'],
  ])('refuses ranks of %s', (_, ranks, problem) => {
    const ran = normloom(['differ', ...TINY, '--ranks', fileForTest('theirs.txt', ranks)]);
    expect([ran.exit, ran.stdout]).toEqual([3, '']);
    expect(ran.stderr).toContain(problem);
  });

  it('refuses files that are not there and groups that do not exist', () => {
    const one = fileForTest('one.txt', '1 2\n');
    expect(normloom(['differ', ...TINY, '--ranks', 'nowhere.txt'])).toMatchObject({ exit: 3, stdout: '' });
    expect(normloom(['differ', 'nowhere.csv', '--score', 's', '--ranks', one])).toMatchObject({ exit: 3, stdout: '' });
    const words = ['differ', SAMPLE_COHORT, '--score', 'raw_score', '--by', 'grade', '--ranks', one];
    const ran = normloom([...words, '--group', '9']);
    expect([ran.exit, ran.stdout]).toEqual([2, '']);
    expect(ran.stderr).toContain('There is no group "9". The groups: "4", "5", "6".');
    expect(normloom(['differ', ...TINY, '--ranks', one, '--count', 'people'])).toMatchObject({ exit: 2, stdout: '' });
  });
});
