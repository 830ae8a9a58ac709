import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { linesInWords, withAnswer } from '../../../shared-core/class/class-questions.ts';
import { rowsOfClass } from '../../../shared-core/class/class-rows.ts';
import { sortClass } from '../../../shared-core/class/sorted-class.ts';
import { statusWord } from '../../../shared-core/class/status-words.ts';
import { answered, classOf, outcomes, questionOn, settledTable, typedRows, type Typed } from './classes.ts';
import { publishedTable } from './published-facts.ts';

const sorted = (rows: readonly Typed[], more = {}) => outcomes(sortClass(classOf(rows, more)));

describe('what is not asked about', () => {
  it('is a score of the scale, and a known word in place of one', () => {
    const rows: readonly Typed[] = [
      ['Ada', '0'],
      ['Ivo', '20'],
      ['Eva', 'Absent'],
      ['Bo', 'n/t'],
      ['Ike', '', '', 'EX'],
    ];
    expect(sortClass(classOf(rows)).questions).toEqual([]);
    expect(sorted(rows)).toEqual([0, 20, 'absent', 'not-tested', 'excused']);
  });

  it('is a status that score and column agree on', () => {
    expect(
      sorted([
        ['Ada', 'abs', '', 'absent'],
        ['Ivo', '7', '', 'present'],
        ['Eva', '-', '', 'absent'],
      ]),
    ).toEqual(['absent', 7, 'absent']);
  });

  it('is a group that names one table, whatever way', () => {
    for (const group of ['10', '010', '10.0', 'Grade 10', 'GRADE  10']) {
      const [row] = sortClass(classOf([['Ada', '7', group]])).rows;
      expect(row?.outcome).toMatchObject({ kind: 'scored', found: { table: { title: 'Grade 10' } } });
    }
  });

  it('takes few words for a status', () => {
    for (const word of ['a', 'x', '0', '', '-', 'ill', 'absent today', 'none']) expect(statusWord(word)).toBeNull();
  });
});

describe('what is asked about', () => {
  it.each<[string, Typed, string]>([
    [
      'a score above the maximum',
      ['Ada', '21'],
      'Line 1: the score “21” lies above 20, the highest score of the table.',
    ],
    ['a score below the minimum', ['Ada', '-1'], 'Line 1: the score “-1” lies below 0, the lowest score of the table.'],
    [
      'a score between two',
      ['Ada', '17.5'],
      'Line 1: the score “17.5” lies between two scores of the table, which go in steps of 1.',
    ],
    ['a score that is no number', ['Ada', '1O'], 'Line 1: the score “1O” is not a number.'],
    ['another decimal mark', ['Ada', '17,0'], 'Line 1: the score “17,0” is not a number.'],
    ['no score', ['Ada', ''], 'Line 1: there is no score, and nothing says why.'],
    ['a dash', ['Ada', '–'], 'Line 1: there is no score, and nothing says why.'],
    ['a letter', ['Ada', 'a'], 'Line 1: “a” stands in place of a score.'],
    [
      'a score of an absent pupil',
      ['Ada', '7', '', 'absent'],
      'Line 1: “7” stands for the score, and “absent” beside it.',
    ],
    ['0 of an absent pupil', ['Ada', '0', '', 'absent'], 'Line 1: “0” stands for the score, and “absent” beside it.'],
    ['two statuses', ['Ada', 'abs', '', 'excused'], 'Line 1: “abs” stands for the score, and “excused” beside it.'],
    [
      'an unknown note',
      ['Ada', '7', '', 'left early'],
      'Line 1: it is not clear what “left early” says about the test.',
    ],
    ['no name', ['', '7'], 'Line 1: there is neither a name nor a code.'],
    ['a line of totals', ['Average', '7'], 'Line 1: the row may add the class up, as “average” and “total” do.'],
    ['a group without a table', ['Ada', '7', '6'], 'Line 1: the group “6” has no table.'],
  ])('%s', (_, row, sentence) => {
    const { questions, rows } = sortClass(classOf([row]));
    expect(questions.map((question) => question.sentence)).toEqual([sentence]);
    expect(rows[0]?.outcome.kind).toBe('open');
    expect(questions[0]?.choices.map(({ key }) => key)).toContain('leave-out');
    expect(sorted([row], { answers: [{ question: questions[0]?.id ?? '', choice: 'leave-out', value: '' }] })).toEqual([
      'left-out',
    ]);
  });

  it('tells lines and no names, and has no text of the list in its id', () => {
    for (const { sentence, id } of sortClass(
      classOf([
        ['Adaline', '99'],
        ['Adaline', ''],
        ['Max', '3'],
      ]),
    ).questions) {
      expect(sentence + id).not.toMatch(/Adaline|Max/);
    }
  });

  it('is outside of a published table', () => {
    const table = publishedTable('5-9 <1\n10 50\n11-14 80');
    expect(
      sorted(
        [
          ['Ada', '4'],
          ['Ivo', '15'],
          ['Eva', '7.5'],
          ['Bo', '13'],
        ],
        { table, group: null },
      ),
    ).toEqual(['open', 'open', 'open', 13]);
  });

  it('is the same word once, for all its rows', () => {
    const file = classOf([
      ['Ada', 'ill'],
      ['Ivo', '7'],
      ['Eva', 'ILL'],
      ['Bo', 'gone'],
    ]);
    expect(sortClass(file).questions.map(({ lines }) => lines)).toEqual([[1, 3], [4]]);
    expect(outcomes(sortClass(answered(file, [1, 3], 'absent')))).toEqual(['absent', 7, 'absent', 'open']);
  });

  it('is a group where there are several tables and none is named', () => {
    const none = { group: null };
    expect(
      sorted(
        [
          ['Ada', '7'],
          ['Ivo', '8'],
        ],
        none,
      ),
    ).toEqual(['open', 'open']);
    const file = classOf(
      [
        ['Ada', '7'],
        ['Ivo', '8'],
      ],
      none,
    );
    expect(outcomes(sortClass(answered(file, [1, 2], 'table:["10"]')))).toEqual([7, 8]);
    expect(sorted([['Ada', '7']], { ...none, table: settledTable({ classTable: ['10'] }) })).toEqual([7]);
    // Where some rows name their group, each of the others is asked about.
    const mixed = classOf(
      [
        ['Ada', '7', '4'],
        ['Ivo', '8'],
        ['Eva', '9'],
      ],
      none,
    );
    expect(sortClass(mixed).questions.map(({ lines }) => lines)).toEqual([[2], [3]]);
  });

  it('is no group where the table knows none', () => {
    expect(
      sorted(
        [
          ['Ada', '6', '5a'],
          ['Ivo', '7', ''],
        ],
        { table: publishedTable('5 40\n6 50\n7 60'), group: null },
      ),
    ).toEqual([6, 7]);
  });
});

describe('two rows of one pupil', () => {
  const file = classOf([
    ['Ada Brook', '7'],
    ['Ivo', '8'],
    [' ada  BROOK', '9'],
  ]);

  it('are asked about, and kept as is answered', () => {
    expect(outcomes(sortClass(file))).toEqual(['open', 8, 'open']);
    expect(questionOn(file, [1, 3]).sentence).toBe('Lines 1 and 3 have the same name or code.');
    expect(outcomes(sortClass(answered(file, [1, 3], 'all')))).toEqual([7, 8, 9]);
    expect(outcomes(sortClass(answered(file, [1, 3], 'keep-1')))).toEqual([7, 8, 'left-out']);
    expect(outcomes(sortClass(answered(file, [1, 3], 'keep-2')))).toEqual(['left-out', 8, 9]);
    expect(outcomes(sortClass(answered(file, [1, 3], 'leave-out')))).toEqual(['left-out', 8, 'left-out']);
  });

  it('are known by code as well, and hang together over a third', () => {
    const coded = classOf([
      ['Ada', '7', '', '', 'X1'],
      ['A. Brook', '8', '', '', 'x1'],
      ['A. Brook', '9'],
    ]);
    expect(sortClass(coded).questions.map(({ lines }) => lines)).toEqual([[1, 2, 3]]);
    expect(
      sorted([
        ['Ada', '7', '', '', '5'],
        ['5', '8'],
      ]),
    ).toEqual([7, 8]);
  });

  it('are asked about after a name was typed anew', () => {
    const named = answered(
      classOf([
        ['Ada', '7'],
        ['', '8'],
      ]),
      [2],
      'value',
      'ADA',
    );
    expect(sortClass(named).questions.find(({ about }) => about === 'same-pupil')?.lines).toEqual([1, 2]);
  });

  it('that say exactly the same are two rows all the same', () => {
    const twins = classOf([
      ['Ada', '7'],
      ['Ada', '7'],
    ]);
    expect(outcomes(sortClass(answered(twins, [1, 2], 'keep-1')))).toEqual([7, 'left-out']);
  });
});

describe('an answer', () => {
  it('puts a score in place, with either mark, if it fits', () => {
    const file = classOf([['Ada', '71']]);
    expect(outcomes(sortClass(answered(file, [1], 'value', ' 17 ')))).toEqual([17]);
    for (const [value, problem] of [
      ['71', '“71” lies above 20'],
      ['x', '“x” is not a number'],
      ['7,5', '“7,5” lies between'],
    ] as const) {
      const { questions, rows } = sortClass(answered(file, [1], 'value', value));
      expect(questions[0]).toMatchObject({ answer: null, problem: expect.stringContaining(problem) });
      expect(rows[0]?.outcome.kind).toBe('open');
    }
  });

  it('may say that the score counts, which then is looked at', () => {
    expect(outcomes(sortClass(answered(classOf([['Ada', '0', '', 'absent']]), [1], 'tested')))).toEqual([0]);
    expect(outcomes(sortClass(answered(classOf([['Ada', '0', '', 'absent']]), [1], 'absent')))).toEqual(['absent']);
    const above = answered(classOf([['Ada', '99', '', 'absent']]), [1], 'tested');
    expect(questionOn(above, [1]).sentence).toContain('lies above 20');
  });

  it('may name a pupil, or report one without a name', () => {
    const file = classOf([['', '7']]);
    expect(sortClass(answered(file, [1], 'value', 'Ada')).rows[0]).toMatchObject({
      name: 'Ada',
      outcome: { score: 7 },
    });
    expect(sortClass(answered(file, [1], 'unnamed')).rows[0]?.name).toBe('Line 1');
    expect(sortClass(answered(classOf([['Max', '7']]), [1], 'pupil')).rows[0]?.name).toBe('Max');
  });

  it('that is no choice leaves the question open and says so', () => {
    const { questions } = sortClass(answered(classOf([['Ada', '71']]), [1], 'table:["4"]'));
    expect(questions[0]?.problem).toBe('This answer is no longer one of the choices. Choose again.');
  });

  it('stays with its rows wherever they stand, and goes with none that changed', () => {
    const rows: readonly Typed[] = [
      ['Ada', '71'],
      ['Ivo', '8'],
    ];
    const file = answered(classOf(rows), [1], 'absent');
    const moved = {
      ...file,
      list: { decimalMark: '.' as const, rows: typedRows([['Eva', '3'], ...rows.toReversed()]) },
    };
    expect(outcomes(sortClass(moved))).toEqual([3, 8, 'absent']);
    const changed = {
      ...file,
      list: {
        decimalMark: '.' as const,
        rows: typedRows([
          ['Ada', '72'],
          ['Ivo', '8'],
        ]),
      },
    };
    expect(outcomes(sortClass(changed))).toEqual(['open', 8]);
  });

  it('replaces an earlier one', () => {
    const [one, two] = [
      { question: 'q', choice: 'a', value: '' },
      { question: 'q', choice: 'b', value: '' },
    ];
    expect(withAnswer([one, { ...one, question: 'r' }], two)).toEqual([{ ...one, question: 'r' }, two]);
  });
});

it('lines are told in words', () => {
  expect(linesInWords([7])).toBe('Line 7');
  expect(linesInWords([7, 9, 12])).toBe('Lines 7, 9 and 12');
  expect(linesInWords([1, 2, 3, 4, 5, 6])).toBe('Lines 1, 2, 3, 4, 5 and 6');
  expect(linesInWords([1, 2, 3, 4, 5, 6, 7, 8])).toBe('Lines 1, 2, 3, 4, 5, 6 and 2 more');
});

describe('laws of questions', () => {
  const text = (...texts: readonly string[]) => fc.constantFrom(...texts);
  const row = fc.tuple(
    text('Ada', 'Ivo', 'ada', '', 'Mean', '=1+1'),
    text('7', '0', '21', '', 'absent', 'ill', '7.5', '1O'),
    text('', '4', '10', '6'),
    text('', 'absent', 'present', 'gone'),
    text('', 'X', 'Y'),
  );
  const list = fc.array(row, { maxLength: 12 });

  it('rows in = reported + absent + not tested + excused + left out + open, however they are answered', () => {
    fc.assert(
      fc.property(list, fc.array(fc.nat(9), { minLength: 12, maxLength: 12 }), fc.boolean(), (rows, picks, grouped) => {
        let file = classOf(rows, grouped ? {} : { group: null });
        for (const pick of picks) {
          const open = sortClass(file).questions.filter(({ answer }) => answer === null);
          const question = open[pick % Math.max(1, open.length)];
          const choice = question?.choices[pick % question.choices.length];
          if (question === undefined || choice === undefined) break;
          file = {
            ...file,
            answers: withAnswer(file.answers, { question: question.id, choice: choice.key, value: '12' }),
          };
        }
        const { questions } = sortClass(file);
        const { counts, open } = rowsOfClass(file);
        const { reported, absent, notTested, excused, leftOut } = counts;
        expect(reported + absent + notTested + excused + leftOut + counts.open).toBe(rows.length);
        expect(counts.rows).toBe(rows.length);
        // A row is open exactly as long as something about it is.
        const asked = new Set(questions.filter(({ answer }) => answer === null).flatMap(({ lines }) => lines));
        for (const { row: one } of open) expect(asked.has(one.line)).toBe(true);
        if (asked.size === 0) expect(counts.open).toBe(0);
      }),
    );
  });

  it('ids are different for different questions, and the same for the same list', () => {
    fc.assert(
      fc.property(list, (rows) => {
        const first = sortClass(classOf(rows)).questions;
        expect(new Set(first.map(({ id }) => id)).size).toBe(first.length);
        expect(sortClass(classOf(rows)).questions).toEqual(first);
      }),
    );
  });
});
