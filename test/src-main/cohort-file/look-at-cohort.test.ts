import { describe, expect, it } from 'vitest';
import { cohortFolder, look, lookProblem } from './cohorts-at-hand.ts';

const folder = cohortFolder();

function survey(separator: string, mark: string): string {
  const rows = Array.from({ length: 400 }, (_, index) => [
    String(index + 1).padStart(5, '0'),
    `School ${index % 30}`,
    String(4 + (index % 3)),
    'AB'[index % 2] ?? '',
    `${9 + (index % 30) / 10}`.replace('.', mark),
    `${0.5 + (index % 10) / 8}`.replace('.', mark),
    index % 50 === 49 ? '99' : index % 70 === 69 ? 'NA' : String((index * 7) % 41),
  ]);
  return [['id', 'school', 'grade', 'form', 'age', 'weight', 'raw score'], ...rows]
    .map((row) => row.join(separator))
    .join('\n');
}

describe('a first look at a cohort file', () => {
  it.each([
    [',', '.'],
    [';', ','],
    ['\t', ','],
    ['|', '.'],
  ] as const)('guesses how it is read (%j, %j)', async (separator, mark) => {
    const { reading, rows, columns, remarks, bytes } = await look(
      await folder.write('survey.txt', survey(separator, mark)),
    );
    expect(reading).toEqual({
      layout: 'people',
      encoding: 'utf-8',
      separator,
      decimalMark: mark,
      header: true,
      sheet: null,
      roles: [
        { column: 'id', role: 'id' },
        { column: 'school', role: 'cluster' },
        { column: 'grade', role: 'group' },
        { column: 'form', role: 'group' },
        { column: 'age', role: 'unused' },
        { column: 'weight', role: 'weight' },
        { column: 'raw score', role: 'score' },
      ],
      missing: ['NA', '99'],
      scale: null,
      decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
    });
    expect(rows).toHaveLength(200);
    expect(rows[0]?.slice(0, 2)).toEqual(['00001', 'School 0']);
    expect(columns).toHaveLength(7);
    expect(bytes).toBeGreaterThan(1000);
    expect(remarks.join(' ')).toMatch(/"raw score" is taken as the score column/);
    expect(remarks.join(' ')).toMatch(/NA, 99 are taken as codes for missing scores/);
  });

  it('keeps a reading that is given and splits the file anew', async () => {
    const path = await folder.write('survey.csv', survey(';', ','));
    const guessed = (await look(path)).reading;
    const chosen = {
      ...guessed,
      missing: ['7'],
      roles: guessed.roles.map((role) => (role.column === 'form' ? { ...role, role: 'unused' as const } : role)),
    };
    expect((await look(path, chosen)).reading).toEqual(chosen);
    const split = await look(path, { ...chosen, separator: ',' });
    expect(split.reading.separator).toBe(',');
    expect(split.columns).toEqual(['id;school;grade;form;age;weight;raw score']);
    const bare = await look(path, { ...chosen, header: false });
    expect(bare.columns[6]).toBe('column 7');
    expect(bare.rows[0]?.[6]).toBe('raw score');
    expect(bare.reading.roles).toHaveLength(7);
  });

  it('tells which chosen columns are not there', async () => {
    const path = await folder.write('two.csv', 'id,score\n1,5\n2,6\n');
    const { reading } = await look(path);
    const { remarks, reading: fitted } = await look(path, {
      ...reading,
      roles: [...reading.roles, { column: 'w', role: 'weight' }],
    });
    expect(remarks).toContain('The file has no column "w" now, which was the weight column.');
    expect(fitted.roles.map(({ column }) => column)).toEqual(['id', 'score']);
  });

  it('sees a table of counts, a single column, and rows that differ', async () => {
    const counts = await look(await folder.write('counts.csv', 'score;frequency\n0;4\n1;9\n2;3\n'));
    expect(counts.reading.layout).toBe('counts');
    const single = await look(await folder.write('single.csv', 'score\n5\n6\n5\n'));
    expect(single.reading.roles).toEqual([{ column: 'score', role: 'score' }]);
    expect(single.remarks.join(' ')).toMatch(/Only one column was found/);
    const ragged = await look(await folder.write('ragged.csv', 'id,score\n1,5\n2,6,7\n3\n\n4,5\n'));
    expect(ragged.remarks).toContain('2 of the first 5 rows have more or fewer cells than the heading.');
  });

  it('tells of lines above the heading, and of bytes that do not fit the mark at the start', async () => {
    const titled = await look(await folder.write('titled.csv', 'Survey of Ostrey Vale\n\nid,score\n1,5\n2,6\n3,7\n'));
    expect(titled.remarks.join(' ')).toMatch(/Take out what stands above it/);
    const bytes = Buffer.concat([Buffer.from('\uFEFFid,score\n'), Buffer.from('René,5\n', 'latin1')]);
    expect(await lookProblem(await folder.write('marked.csv', bytes))).toMatch(/not UTF-8/);
  });
});
