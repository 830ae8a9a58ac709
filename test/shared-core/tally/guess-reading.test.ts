import { describe, expect, it } from 'vitest';
import { guessDecimalMark, guessHeader, guessMissingCodes } from '../../../shared-core/tally/guess-numbers.ts';
import { guessRoles } from '../../../shared-core/tally/guess-roles.ts';
import { guessSeparator } from '../../../shared-core/tally/guess-separator.ts';

describe('the separator', () => {
  it.each([
    [',', 'id,score\n1,5\n2,6\n'],
    [';', 'id;score\n1;5,5\n2;6,5\n'],
    [';', 'id;score;w\n1;5;0,5\n2;6;1\n3;7;1,25\n'],
    ['\t', 'id\tscore\n1\t5\n2\t6\n'],
    ['|', 'id|name, first|score\n1|Ash, B|5\n2|Fell, C|6\n'],
    [',', 'id,name,score\n1,"Ash; B; C",5\n2,"Fell\n; D",6\n'],
    [',', 'score\n5\n6\n'],
    [';', 'score\n5,5\n6\n7,5\n'],
    [';', 'score\n5,5\n6,5\n\nabs\n'],
    [',', 'score\n5,5,\n6\n'],
    [',', 'Spring survey\nscore,count\n5,6\n6,7\n'],
  ] as const)('%j is seen in %j', (separator, text) => {
    expect(guessSeparator(text)).toBe(separator);
  });
});

describe('decimal mark and heading', () => {
  it('the mark is what more cells need', () => {
    expect(
      guessDecimalMark([
        ['1,5', '2'],
        ['3,25', 'a, b'],
      ]),
    ).toBe(',');
    expect(
      guessDecimalMark([
        ['1.5', '2'],
        ['3', '4'],
      ]),
    ).toBe('.');
    expect(guessDecimalMark([['1', '2']])).toBe('.');
  });

  it('a heading holds no number and stands over numbers, or names every column', () => {
    expect(
      guessHeader(
        [
          ['id', 'score'],
          ['1', '5'],
        ],
        '.',
      ),
    ).toBe(true);
    expect(
      guessHeader(
        [
          ['id', ''],
          ['1', '5'],
        ],
        '.',
      ),
    ).toBe(true);
    expect(
      guessHeader(
        [
          ['1', '5'],
          ['2', '6'],
        ],
        '.',
      ),
    ).toBe(false);
    expect(
      guessHeader(
        [
          ['A', '5'],
          ['B', '6'],
        ],
        '.',
      ),
    ).toBe(false);
  });
});

describe('codes for a missing score', () => {
  const scores = ['0', '12', '25', '31', '40'];

  it('are words, and numbers well outside the rest', () => {
    expect(guessMissingCodes([...scores, '99', 'NA', '-9', '', '99'], '.')).toEqual(['NA', '99', '-9']);
    expect(guessMissingCodes([...scores, '999', '-99'], '.')).toEqual(['999', '-99']);
  });

  it('are not scores that merely look like codes', () => {
    expect(guessMissingCodes(['70', '88', '95', '98', '99', '100'], '.')).toEqual([]);
    expect(guessMissingCodes(['-8', '-20', '-9', '4', '-11'], '.')).toEqual([]);
    expect(guessMissingCodes(['99', '99'], '.')).toEqual([]);
  });
});

describe('roles', () => {
  const rolesOf = (
    columns: readonly string[],
    rows: readonly (readonly string[])[],
  ): Readonly<Record<string, string>> => {
    const { layout, roles } = guessRoles(columns, rows, '.');
    return { layout, ...Object.fromEntries(roles.map(({ column, role }) => [column, role])) };
  };

  it('come from names and contents', () => {
    const rows = Array.from({ length: 40 }, (_, index) => [
      `00${index}`,
      `S${index % 7}`,
      `${4 + (index % 3)}`,
      'AB'[index % 2] ?? '',
      `${9 + (index % 4)}.5`,
      `${(index * 7) % 30}`,
      `1.${index}`,
    ]);
    expect(rolesOf(['Pupil ID', 'School', 'Grade', 'form', 'age_years', 'rawScore', 'WT'], rows)).toEqual({
      layout: 'people',
      'Pupil ID': 'id',
      School: 'cluster',
      Grade: 'group',
      form: 'group',
      age_years: 'unused',
      rawScore: 'score',
      WT: 'weight',
    });
  });

  it('find a table of counts', () => {
    const rows = Array.from({ length: 20 }, (_, index) => [`${index}`, `${(index * 13) % 50}`]);
    expect(rolesOf(['score', 'n'], rows)).toEqual({ layout: 'counts', score: 'score', n: 'count' });
    expect(rolesOf(['Raw score', 'Frequency'], rows)).toEqual({
      layout: 'counts',
      'Raw score': 'score',
      Frequency: 'count',
    });
  });

  it('do not take a running number for counts', () => {
    const rows = Array.from({ length: 20 }, (_, index) => [`${index + 1}`, `${(index * 13) % 7}`]);
    expect(rolesOf(['number', 'score'], rows)).toEqual({ layout: 'people', number: 'id', score: 'score' });
  });

  it('take the one column of numbers that is left for the score', () => {
    const rows = Array.from({ length: 20 }, (_, index) => [`p${index}`, `${(index * 13) % 7}`]);
    expect(rolesOf(['code', 'reading'], rows)).toEqual({ layout: 'people', code: 'id', reading: 'score' });
  });

  it('do not take a grade with as many values as rows for a group', () => {
    const rows = Array.from({ length: 60 }, (_, index) => [`${index}.5`, `${index % 9}`]);
    expect(rolesOf(['year', 'score'], rows)).toEqual({ layout: 'people', year: 'unused', score: 'score' });
  });

  it('say why, and when no score is clear', () => {
    const { remarks } = guessRoles(
      ['a', 'b'],
      [
        ['1', '2'],
        ['3', '5'],
      ],
      '.',
    );
    expect(remarks[0]).toMatch(/Mark the column that holds the raw scores/);
    const rows = [
      ['1', 'A'],
      ['2', 'B'],
      ['2', 'A'],
      ['3', 'B'],
    ];
    expect(guessRoles(['score', 'form'], rows, '.').remarks).toEqual([
      '"score" is taken as the score column, by its name and because it holds numbers.',
      '"form" is taken as the group column, with 2 different values.',
    ]);
  });
});
