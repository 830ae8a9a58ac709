import { describe, expect, it } from 'vitest';
import { readingWith } from '../../shared-core/tally/readings.ts';
import { cohortFolder, leftOut, look, tally, tallyProblem } from './cohorts-at-hand.ts';

const folder = cohortFolder();
const SCORE = readingWith({ score: 'score' });

describe('records of a delimited text', () => {
  it('are the same whatever falls on the border of two blocks', async () => {
    const long = 'é'.repeat(90);
    for (const shift of [0, 1, 2, 3]) {
      const row = `"a ""quoted""\r\n${long}",5\r\n"plain",6\r\n`;
      const text = `name,score${' '.repeat(shift)}\r\n${row.repeat(6000)}`;
      const path = await folder.write(`blocks-${shift}.csv`, text);
      const { source, tally: made } = await tally(path, SCORE);
      expect(source.rowsRead).toBe(12_000);
      expect(source.rowsKept).toBe(12_000);
      expect(made.cells[0]?.counts.slice(5, 7)).toEqual([6000, 6000]);
    }
  });

  it('end with the last line end, but blank lines before it count', async () => {
    const rows = async (text: string): Promise<readonly number[]> => {
      const { source } = await tally(await folder.write('ends.csv', text), SCORE);
      return [source.rowsRead, source.rowsKept];
    };
    expect(await rows('score\n1\n2')).toEqual([2, 2]);
    expect(await rows('score\n1\n2\n')).toEqual([2, 2]);
    expect(await rows('score\r\n1\r\n2\r\n')).toEqual([2, 2]);
    expect(await rows('score\r1\r2\r')).toEqual([2, 2]);
    expect(await rows('score\n1\n2\n\n')).toEqual([3, 2]);
    expect(await rows('score\n1\n\n2\n\n\n')).toEqual([5, 2]);
    expect(await rows('score\n1\r\n2\r3\n')).toEqual([3, 3]);
  });

  it('keep their numbers below blank lines before the heading', async () => {
    const path = await folder.write('late.csv', '\n\nscore,x\n5,a\nbad,b\n');
    expect(leftOut(await tally(path, SCORE))).toEqual({ 'not-a-number': [5] });
  });

  it('start at row 1 without a heading', async () => {
    const path = await folder.write('bare.csv', '5,a\nbad,b\n');
    const reading = readingWith({ 'column 1': 'score' }, { header: false });
    const tallied = await tally(path, reading);
    expect(tallied.source.rowsRead).toBe(2);
    expect(leftOut(tallied)).toEqual({ 'not-a-number': [2] });
  });

  it('have columns with names of their own', async () => {
    const path = await folder.write('names.csv', ' score ,score,,"a\nb",score (2),score\n5,6,7,8,9,10\n');
    const { columns, remarks } = await look(path);
    expect(columns).toEqual(['score', 'score (2)', 'column 3', 'a b', 'score (2) (2)', 'score (3)']);
    expect(remarks.join(' ')).toMatch(/called score \(2\), column 3/);
    const second = await tally(path, readingWith({ 'score (2)': 'score' }));
    expect(second.tally.cells[0]?.counts[6]).toBe(1);
  });
});

describe('a quotation mark that is not closed', () => {
  it('is refused with its row', async () => {
    const start = 'name,score\nAsh,5\n"Fell",6\n';
    expect(await tallyProblem(await folder.write('open.csv', `${start}"Reed,7\nMoss,8\n`), SCORE)).toMatch(
      /^Row 4 has a quotation mark/,
    );
    expect(await tallyProblem(await folder.write('torn.csv', `${start}"Re"ed,7\nMoss,8\n"Sedge",9\n`), SCORE)).toMatch(
      /^Row 4 /,
    );
  });

  it('is refused without reading a large file into memory', async () => {
    const path = await folder.write('large.csv', `name,score\nAsh,5\n"Reed,7\n${'Moss,8\n'.repeat(2_000_000)}`);
    const started = performance.now();
    expect(await tallyProblem(path, SCORE)).toMatch(/^Row 3 /);
    expect(performance.now() - started).toBeLessThan(5000);
  });

  it('inside a cell is a part of it', async () => {
    const path = await folder.write('inside.csv', 'name,score\nO"Brien,5\n5" rule,6\n');
    expect((await tally(path, SCORE)).source.rowsKept).toBe(2);
    expect((await look(path)).rows[0]?.[0]).toBe('O"Brien');
  });
});

describe('bytes that the encoding does not have', () => {
  it('are refused with the way out', async () => {
    const path = await folder.write('bytes.csv', Buffer.from('name,score\nRené,5\n', 'latin1'));
    expect(await tallyProblem(path, SCORE)).toBe(
      'cohort has bytes that are not UTF-8. Choose another encoding, for example Windows-1252.',
    );
  });

  it('are found far down the file', async () => {
    const text = Buffer.concat([
      Buffer.from(`name,score\n${'Ash,5\n'.repeat(200_000)}`),
      Buffer.from([0xe9, 0x2c, 0x35]),
    ]);
    expect(await tallyProblem(await folder.write('far.csv', text), SCORE)).toMatch(/not UTF-8/);
  });

  it('of Windows-1252 are read as they are meant', async () => {
    const path = await folder.write('signs.csv', Buffer.from([0x6e, 0x0a, 0x80, 0x93, 0x94, 0x96, 0x9f, 0xe9, 0x0a]));
    const { rows } = await look(path, readingWith({ n: 'score' }, { encoding: 'windows-1252' }));
    expect(rows).toEqual([['€“”–Ÿé']]);
  });
});
