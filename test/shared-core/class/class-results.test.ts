import { describe, expect, it } from 'vitest';
import { classResults } from '../../../shared-core/class/class-results.ts';
import { quarterCounts, quarterOf } from '../../../shared-core/class/rank-quarters.ts';
import { FEWEST_FOR_BOX } from '../../../shared-core/class/score-facts.ts';
import { answered, classOf, resultsOf, settledTable, type Typed } from './classes.ts';
import { publishedTable } from './published-facts.ts';

/** Pupils P1, P2 … with these scores. */
const pupils = (scores: readonly number[], group = ''): readonly Typed[] =>
  scores.map((score, index) => [`P${group}${index + 1}`, String(score), group]);

describe('the results of a class', () => {
  it('print of every pupil what the table prints of the score', () => {
    const table = settledTable();
    const { pupils: found } = resultsOf(
      classOf([
        ['Ada', '0'],
        ['Ivo', '20', '10'],
        ['Eva', '13'],
      ]),
    );
    for (const { score, scoreText, found: row, table: group } of found) {
      const cell = table.groups.find(({ title }) => title === group.title)?.rows.find(({ low }) => low === score);
      expect(row).toEqual(cell);
      expect(scoreText).toBe(cell?.scoreText);
    }
    // 420 people spread evenly over 21 scores: midpoint ranks 100 (k + 1/2)/21 = 2.4, 64.3 and 97.6.
    expect(found.map(({ found: row, quarter }) => [row.printed, quarter])).toEqual([
      ['2', 1],
      ['98', 4],
      ['64', 3],
    ]);
    expect(found.map(({ table: group }) => group.title)).toEqual(['Grade 4', 'Grade 10', 'Grade 4']);
    expect(found.every(({ found: row }) => row.band !== null && row.texts['measurement-band'] === row.band.text)).toBe(
      true,
    );
  });

  it('find ends and ranges of a published table', () => {
    const table = publishedTable('5-9 <1\n10 50\n11-14 >99');
    const { pupils: found } = resultsOf(classOf(pupils([5, 9, 10, 11, 14]), { table, group: null }));
    expect(found.map(({ scoreText, found: row, quarter }) => [scoreText, row.scoreText, row.printed, quarter])).toEqual(
      [
        ['5', '5–9', '<1', 1],
        ['9', '5–9', '<1', 1],
        ['10', '10', '50', 3],
        ['11', '11–14', '>99', 4],
        ['14', '11–14', '>99', 4],
      ],
    );
  });

  it('describe the raw scores by the five numbers of Tukey', () => {
    // Hinges are medians of the halves, the middle one counted in both: 1 2 3 4 5 6 7 has 2.5, 4 and 5.5 (Tukey 1977).
    const { facts } = resultsOf(classOf(pupils([7, 3, 1, 6, 2, 5, 4])));
    expect(facts.fiveNumbers?.map(({ printed }) => printed)).toEqual(['1', '2.5', '4', '5.5', '7']);
    expect(facts.boxPlot).toEqual([1, 2.5, 4, 5.5, 7]);
    expect(facts.boxProblem).toBeNull();
  });

  it('count every row', () => {
    const file = answered(
      classOf([
        ['Ada', '7'],
        ['Ivo', 'absent'],
        ['Eva', 'abs'],
        ['Bo', 'n/t'],
        ['Ike', 'ex'],
        ['Una', '99'],
        ['Ora', ''],
      ]),
      [6],
      'leave-out',
    );
    const results = resultsOf(file);
    expect(results.counts).toEqual({ rows: 7, reported: 1, absent: 2, notTested: 1, excused: 1, leftOut: 1, open: 1 });
    expect(results.missed.map(({ name, status }) => `${name} ${status}`)).toEqual([
      'Ivo absent',
      'Eva absent',
      'Bo not-tested',
      'Ike excused',
    ]);
    expect(results.leftOut.map(({ name }) => name)).toEqual(['Una']);
    expect(results.open.map(({ name }) => name)).toEqual(['Ora']);
    // Nobody who is absent counts as 0.
    expect(results.facts.n).toBe(1);
    expect(results.facts.scores).toEqual([{ score: 7, scoreText: '7', count: 1 }]);
  });

  it('are had without a table only as a sentence', () => {
    expect(classResults(classOf([['Ada', '7']], { table: null }))).toEqual({
      ok: false,
      problem: 'There is no table to look the scores up in. Choose one, or report the standing within the class.',
    });
  });
});

describe('a class of any size', () => {
  it('of nobody, or of which nobody was tested', () => {
    for (const rows of [
      [],
      [['Ada', 'absent']],
      [
        ['Ada', 'absent'],
        ['Ivo', 'ex'],
      ],
    ] as const) {
      const { facts, comparison, counts } = resultsOf(classOf(rows));
      expect(facts).toMatchObject({ n: 0, fiveNumbers: null, boxPlot: null, scores: [] });
      expect(facts.boxProblem).toBe('Nobody has a score yet, so there is no box plot.');
      expect(facts.quarters.map(({ count }) => count)).toEqual([0, 0, 0, 0]);
      expect([comparison, counts.reported]).toEqual([null, 0]);
    }
  });

  it('of one or two, whose scores are listed', () => {
    const one = resultsOf(classOf(pupils([7]))).facts;
    expect(one.fiveNumbers?.map(({ printed }) => printed)).toEqual(['7', '7', '7', '7', '7']);
    expect([one.boxPlot, one.boxProblem]).toEqual([
      null,
      'A box plot needs 5 scores or more; with 1 pupil the scores themselves are listed.',
    ]);
    const two = resultsOf(classOf(pupils([7, 8]))).facts;
    expect(two.fiveNumbers?.map(({ printed }) => printed)).toEqual(['7', '7', '7.5', '8', '8']);
    expect(two.scores.map(({ scoreText, count }) => [scoreText, count])).toEqual([
      ['7', 1],
      ['8', 1],
    ]);
  });

  it('at the size from which a box plot is drawn', () => {
    expect(resultsOf(classOf(pupils([1, 2, 3, 4]))).facts.boxPlot).toBeNull();
    expect(resultsOf(classOf(pupils([1, 2, 3, 4, 5]))).facts.boxPlot).toEqual([1, 2, 3, 4, 5]);
    expect(FEWEST_FOR_BOX).toBe(5);
  });

  it('of all the same score, and of 400', () => {
    const same = resultsOf(classOf(pupils([9, 9, 9, 9, 9, 9]))).facts;
    expect([same.boxPlot, same.boxProblem]).toEqual([[9, 9, 9, 9, 9], null]);
    const many = resultsOf(classOf(pupils(Array.from({ length: 400 }, (_, index) => index % 21))));
    expect([many.counts.reported, many.facts.n]).toEqual([400, 400]);
    expect(many.facts.quarters.reduce((sum, { count }) => sum + count, 0)).toBe(400);
  });
});

describe('quarters of the norm group', () => {
  it('go by the printed rank, whatever its ends and decimals', () => {
    const printed = [
      '<1',
      '<0.1',
      '0.5',
      '1',
      '24',
      '24.9',
      '25',
      '49',
      '49.9',
      '50',
      '50†',
      '74.9',
      '75',
      '99',
      '>99',
      '99.9',
      '>99.9†',
      '0',
      '100',
    ];
    expect(printed.map(quarterOf)).toEqual([1, 1, 1, 1, 1, 1, 2, 2, 2, 3, 3, 3, 4, 4, 4, 4, 4, 1, 4]);
    expect(() => quarterOf('–')).toThrow('not a printed percentile rank');
    expect(quarterCounts(['24', '25', '25', '>99'])).toEqual([
      { quarter: 1, ranks: '1–24', count: 1 },
      { quarter: 2, ranks: '25–49', count: 2 },
      { quarter: 3, ranks: '50–74', count: 0 },
      { quarter: 4, ranks: '75–99', count: 1 },
    ]);
  });
});

describe('groups side by side', () => {
  const table = publishedTable('1 16\n2 50\n3 84\n4 >99');
  const compare = (rows: readonly Typed[]) => resultsOf(classOf(rows, { table, group: null })).comparison;

  it('have n, median and mean of raw scores, and the mean of normal curve equivalents', () => {
    const comparison = compare([
      ['A', '1', '5b'],
      ['B', '2', '5B'],
      ['C', '3', '5a'],
      ['D', '3', '5a'],
      ['E', '1', '5a'],
    ]);
    // z(16) = −0.99446, z(50) = 0, z(84) = 0.99446 (tables of the normal distribution): NCE 29.06, 50 and 70.94.
    // 5a: (70.94 + 70.94 + 29.06)/3 = 56.98; 5b: (29.06 + 50)/2 = 39.53.
    expect(comparison).toEqual({
      groups: [
        { group: '5a', n: 3, median: '3', mean: '2.3', nceMean: '57.0' },
        { group: '5b', n: 2, median: '1.5', mean: '1.5', nceMean: '39.5' },
      ],
      hasNce: true,
      remarks: [],
    });
  });

  it('have no mean where somebody has none, and none of a single pupil; it is said', () => {
    const comparison = compare([
      ['A', '4', 'x'],
      ['B', '2', 'x'],
      ['C', '3', 'y'],
      ['D', '1', ''],
    ]);
    expect(comparison?.groups).toEqual([
      { group: 'x', n: 2, median: '3', mean: '3.0', nceMean: null },
      { group: 'y', n: 1, median: null, mean: null, nceMean: null },
    ]);
    expect(comparison?.hasNce).toBe(false);
    expect(comparison?.remarks).toEqual([
      'Group x has no mean of normal curve equivalents, since 1 pupil of it has a rank without one.',
      'Group y has one score only, so that neither median nor mean is given.',
      'The list names no group for 1 pupil.',
    ]);
  });

  it('are compared only where there are two', () => {
    expect(
      compare([
        ['A', '1', 'x'],
        ['B', '2', 'X'],
        ['C', '2', ''],
      ]),
    ).toBeNull();
    expect(
      compare([
        ['A', '1', 'x'],
        ['B', 'absent', 'y'],
      ]),
    ).toBeNull();
  });
});

describe('the check code', () => {
  const file = classOf([
    ['Ada', '7'],
    ['Ivo', '8'],
    ['Eva', 'absent'],
  ]);
  const { check } = resultsOf(file);

  it('is the same for the same texts and another when one differs', () => {
    expect(check).toMatch(/^[0-9A-F]{4}-[0-9A-F]{4}$/);
    expect(resultsOf(file).check).toBe(check);
    for (const other of [
      { title: 'Class 4b (invented)' },
      { date: '2026-05-12' },
      { table: settledTable({ subtitle: 'Form C' }) },
      {
        list: classOf([
          ['Ada', '7'],
          ['Ivo', '9'],
          ['Eva', 'absent'],
        ]).list,
      },
      {
        list: classOf([
          ['Ada', '7'],
          ['Ivo', '8'],
          ['Eva', 'ex'],
        ]).list,
      },
      {
        list: classOf([
          ['Ada', '7', '10'],
          ['Ivo', '8'],
          ['Eva', 'absent'],
        ]).list,
      },
    ]) {
      expect(resultsOf({ ...file, ...other }).check).not.toBe(check);
    }
  });

  it('says nothing of who is who', () => {
    expect(
      resultsOf(
        classOf([
          ['Una', '7', '', '', 'X1'],
          ['Ora', '8'],
          ['Ike', 'absent'],
        ]),
      ).check,
    ).toBe(check);
    expect(resultsOf({ ...file, sharing: { as: 'codes', seed: 99 } }).check).toBe(check);
  });
});
