import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ClassListRow } from '../../../shared-core/class/class-list.ts';
import { guessClassReading } from '../../../shared-core/class/guess-class-reading.ts';
import { listedRows, pastedRows } from '../../../shared-core/class/pasted-rows.ts';
import { readClassList } from '../../../shared-core/class/read-class-list.ts';

function read(text: string) {
  const { rows } = pastedRows(text, null);
  const { reading, remarks } = guessClassReading(rows);
  return { ...readClassList(rows, reading), reading, remarks };
}

function rowsIn(text: string): readonly ClassListRow[] {
  const { list, problems } = read(text);
  if (list === null) throw new Error(JSON.stringify(problems));
  return list.rows;
}

/** Name, score, group and status of each row. */
function inShort(text: string): readonly (readonly string[])[] {
  return rowsIn(text).map(({ name, scoreText, group, statusText }) => [name, scoreText, group, statusText]);
}

describe('a pasted class list', () => {
  it.each([
    ['tabs', 'Name\tRaw score\tGroup\nAda Brook\t27\t5a\nIvo Vale\t17,5\t5b'],
    ['tabs and no heading', 'Ada Brook\t27\t5a\nIvo Vale\t17,5\t5b'],
    ['semicolons and space', 'Name; Score; Class\r\n Ada  Brook ; 27 ; 5a \r\nIvo Vale;17,5;5b\r\n'],
    ['bars', 'Pupil|Marks|Form\nAda Brook|27|5a\nIvo Vale|17,5|5b'],
    ['other columns', 'Nr\tSurname\tGroup\tDate\tPoints\n1\tAda Brook\t5a\t3 May\t27\n2\tIvo Vale\t5b\t3 May\t17,5'],
    ['names in two columns', 'First\tLast\tScore\tGroup\nAda\tBrook\t27\t5a\nIvo\tVale\t17,5\t5b'],
    ['a title', 'Spelling in May\n\nName\tScore\tGroup\nAda Brook\t27\t5a\nIvo Vale\t17,5\t5b'],
    ['derived scores beside', 'Name\tStandard score\tRaw score\tGroup\nAda Brook\t101\t27\t5a\nIvo Vale\t96\t17,5\t5b'],
    [
      'a column that only begins like a name',
      'Name\tPupil premium\tScore\tGroup\nAda Brook\tyes\t27\t5a\nIvo Vale\tno\t17,5\t5b',
    ],
  ])('is read with %s', (_, text) => {
    expect(inShort(text)).toEqual([
      ['Ada Brook', '27', '5a', ''],
      ['Ivo Vale', '17,5', '5b', ''],
    ]);
    expect(read(text).list?.decimalMark).toBe(',');
  });

  it('is read with commas', () => {
    expect(inShort('name,score\n"Brook, Ada",27\nIvo Vale,17.5')).toEqual([
      ['Brook, Ada', '27', '', ''],
      ['Ivo Vale', '17.5', '', ''],
    ]);
  });

  it('has quotation marks as spreadsheets paste them', () => {
    const text = 'Name\tScore\n"Ada ""Addie""\nBrook"\t27\nIvo "V" Vale\t30\n"Ivo" Brook\t31\n"Eva\t12\n';
    expect(rowsIn(text).map(({ line, name, scoreText }) => [line, name, scoreText])).toEqual([
      [2, 'Ada "Addie" Brook', '27'],
      [4, 'Ivo "V" Vale', '30'],
      [5, '"Ivo" Brook', '31'],
      [6, '"Eva', '12'],
    ]);
  });

  it('keeps names that begin like a formula, and takes unseen marks out', () => {
    const text = 'Name\tScore\n=HYPERLINK("x")\t27\n+Ada\t3\n-Ivo\t4\n@Eva\t5\n\u202eAda\u0000 \u00a0 B\t6';
    expect(rowsIn(text).map(({ name }) => name)).toEqual(['=HYPERLINK("x")', '+Ada', '-Ivo', '@Eva', 'Ada B']);
  });

  it('knows absence in the score column or in one of its own', () => {
    expect(inShort('Ada\t27\nIvo\tabsent\nEva\t\nBo\t30')).toEqual([
      ['Ada', '27', '', ''],
      ['Ivo', 'absent', '', ''],
      ['Eva', '', '', ''],
      ['Bo', '30', '', ''],
    ]);
    expect(inShort('Ada\t27\t\nIvo\t0\tabsent\nEva\t\texcused\nBo\t30\t')).toEqual([
      ['Ada', '27', '', ''],
      ['Ivo', '0', '', 'absent'],
      ['Eva', '', '', 'excused'],
      ['Bo', '30', '', ''],
    ]);
    expect(inShort('Name\tScore\tAttendance\nIvo\t0\tabsent')).toEqual([['Ivo', '0', '', 'absent']]);
  });

  it('never takes a pupil without a score for a heading', () => {
    expect(inShort('Ada\tabsent\nIvo\t12')).toHaveLength(2);
    expect(inShort('Mark Form\till\nIvo\t12\nEva\t13')).toHaveLength(3);
    expect(inShort('Nombre\tPuntos\nIvo\t12')).toEqual([['Ivo', '12', '', '']]);
    expect(inShort('Onoma\tVathmos\nIvo\t12')[0]).toEqual(['Onoma', 'Vathmos', '', '']);
  });

  it('is read where nobody was tested, and where there is one pupil', () => {
    expect(inShort('Ada\tabsent\nIvo\tabsent\nEva\tabs')).toHaveLength(3);
    expect(inShort('Name\tScore\nAda\tabsent')).toEqual([['Ada', 'absent', '', '']]);
    expect(inShort('Ada\t12')).toEqual([['Ada', '12', '', '']]);
  });

  it('has codes in place of names, or beside them', () => {
    expect(rowsIn('101\t27\n205\t30\n309\t12').map(({ code, name, scoreText }) => [code, name, scoreText])).toEqual([
      ['101', '', '27'],
      ['205', '', '30'],
      ['309', '', '12'],
    ]);
    const scores = ['27', '30', '30', '12', '27', '9'];
    const numbered = scores
      .map((score, index) => `${1000 + 7 * index}\tP${'abcdef'[index] ?? ''}\t${score}\t5`)
      .join('\n');
    expect(rowsIn(numbered).map(({ scoreText, group }) => [scoreText, group])).toEqual(
      scores.map((score) => [score, '5']),
    );
    expect(rowsIn('Pupil code\tName\tScore\nX7\tAda\t27').map(({ code, name }) => [code, name])).toEqual([
      ['X7', 'Ada'],
    ]);
  });

  it('says what was taken for what, and what was passed over', () => {
    const { remarks, passedOver, columns } = read('Spelling\n\nName\tScore\tShoe\nAda\t27\t34\n\t\t\nIvo\t3\t35\n');
    expect(remarks).toEqual([
      'Line 3 is taken as the heading; what stands above it is passed over.',
      '"Name" is taken as the name.',
      '"Score" is taken as the raw score.',
      '"Shoe" is taken as nothing that is used.',
    ]);
    expect(passedOver).toEqual([1, 2, 5]);
    expect(columns).toEqual(['Name', 'Score', 'Shoe']);
    expect(read('Ada\t3\nIvo\t4').remarks[0]).toBe('No heading is known: the first row is taken as a pupil.');
  });

  it('is read otherwise where the teacher says so', () => {
    const rows = listedRows([
      ['1', 'Ada', '27', '101'],
      ['2', 'Ivo', '30', '99'],
    ]);
    const reading = {
      decimalMark: '.' as const,
      headingLine: null,
      roles: ['unused', 'name', 'score', 'unused'] as const,
    };
    expect(readClassList(rows, reading).list?.rows.map(({ scoreText }) => scoreText)).toEqual(['27', '30']);
    const other = { ...reading, headingLine: 1, roles: ['code', 'group', 'unused', 'score'] as const };
    expect(readClassList(rows, other)).toMatchObject({
      columns: ['1', 'Ada', '27', '101'],
      list: { rows: [{ line: 2, code: '2', group: 'Ivo', scoreText: '99' }] },
    });
  });

  it('joins groups of several columns', () => {
    expect(rowsIn('Name\tGrade\tForm\tScore\nAda\t5\tA\t27\nIvo\t5\t\t12').map(({ group }) => group)).toEqual([
      '5, A',
      '5',
    ]);
  });

  it('says what to do where it cannot be read', () => {
    expect(read('Ada\nIvo').problems).toEqual([
      { line: 0, problem: expect.stringContaining('One column holds the raw scores.') },
    ]);
    expect(read('').problems[0]?.problem).toContain('There is no pupil in the list.');
    expect(read(`Name\tScore\n${'Ada\t1\n'.repeat(2001)}`).problems).toEqual([
      {
        line: 0,
        problem: 'The list has 2001 rows; a class may have at most 2000. Leave out what is not of this class.',
      },
    ]);
    expect(read(`Name\tScore\n${'Ada\t1\n'.repeat(2000)}`).list?.rows).toHaveLength(2000);
    expect(read(`Name\tScore\n${'A'.repeat(401)}\t1`).problems[0]).toMatchObject({ line: 2 });
    const reading = { decimalMark: '.' as const, headingLine: null, roles: ['name', 'score'] as const };
    expect(readClassList(listedRows([['Ada', '1', 'more']]), reading).problems[0]).toMatchObject({ line: 1 });
    expect(readClassList(listedRows([['Ada', '1']]), { ...reading, roles: ['score', 'score'] }).problems).toHaveLength(
      2,
    );
    const twice = { ...reading, roles: ['name', 'score', 'status', 'status'] as const };
    expect(readClassList(listedRows([['Ada', '1', '', '']]), twice).problems[0]?.problem).toContain('Only one column');
  });
});

describe('laws of class lists', () => {
  const cell = fc.oneof(
    fc.string({ maxLength: 8 }),
    fc.constantFrom('absent', '12', '"', 'a"b', '\t', 'x\ny', '=1+1', 'Name', 'Score'),
  );

  it('cells come back as they were put on the clipboard', () => {
    const quoted = (text: string): string => (/["\t\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);
    fc.assert(
      fc.property(fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), { minLength: 1, maxLength: 5 }), (rows) => {
        fc.pre(rows.every((row) => row.join('') !== ''));
        const text = rows.map((row) => row.map(quoted).join('\t')).join('\n');
        const expected = rows.map((row) => row.map((one) => one.replace(/\r\n?/g, '\n')));
        expect(pastedRows(text, '\t').rows.map(({ cells }) => cells)).toEqual(expected);
      }),
    );
  });

  it('every row below the heading is a row of the list or told as passed over', () => {
    fc.assert(
      fc.property(fc.array(fc.array(cell, { maxLength: 4 }), { maxLength: 8 }), (cells) => {
        const rows = listedRows(cells);
        const { reading } = guessClassReading(rows);
        const { list, problems, passedOver } = readClassList(rows, reading);
        expect(list === null).toBe(problems.length > 0);
        if (list === null) return;
        const heads = reading.headingLine === null ? 0 : 1;
        expect(list.rows.length + passedOver.length + heads).toBe(rows.length);
      }),
    );
  });
});
