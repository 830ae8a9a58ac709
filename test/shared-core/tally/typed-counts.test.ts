import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import * as v from 'valibot';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { normProjectSchema } from '../../../shared-core/norms/norm-project.ts';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import { readTypedCounts } from '../../../shared-core/tally/typed-counts.ts';

const TO_TEN: ScoreScale = { min: 0, max: 10, step: 1, direction: 'high-is-good' };

/** The scores with their counts, or the problems as "line: sentence". */
function read(text: string, scale: ScoreScale | null = null): Readonly<Record<string, number>> | readonly string[] {
  const { counted, problems } = readTypedCounts(text, scale);
  if (counted === null) return problems.map(({ line, problem }) => `${line}: ${problem}`);
  expect(problems).toEqual([]);
  const { min, step } = counted.tally.scale;
  return Object.fromEntries(
    (counted.tally.cells[0]?.counts ?? []).map((count, index) => [String(min + index * step), count]),
  );
}

describe('counts typed in', () => {
  it.each([
    ['tabs', '3\t10\n4\t12'],
    ['commas', '3,10\n4,12'],
    ['commas and spaces', '3, 10\n4, 12'],
    ['semicolons', '3;10\n4;12'],
    ['spaces', '3 10\n 4   12 '],
    ['a heading, blank lines and CRLF', '\uFEFFscore\tcount\r\n\r\n3\t10\r\n4\t12\r\n\r\n'],
    ['lone CR', '3 10\r4 12'],
  ])('are read with %s', (_, text) => {
    expect(read(text)).toEqual({ 3: 10, 4: 12 });
  });

  it('are read with a decimal comma where the separator is another', () => {
    expect(read('7,5 12\n8 3\n8,5 1')).toEqual({ 7.5: 12, 8: 3, 8.5: 1 });
    expect(read('7,5;12\n8;3')).toEqual({ 7.5: 12, 8: 3 });
  });

  it('are read with a decimal point', () => {
    expect(read('7.5,12\n8,3')).toEqual({ 7.5: 12, 8: 3 });
  });

  it('stand on the declared scale', () => {
    expect(readTypedCounts('3 1\n4 2', TO_TEN).counted?.tally.cells[0]?.counts).toEqual([
      0, 0, 0, 1, 2, 0, 0, 0, 0, 0, 0,
    ]);
    expect(read('3 1\n11 2\n-1 4\n2.5 1', TO_TEN)).toEqual([
      '2: The score lies above the scale. Correct it, or change the highest score of the scale.',
      '3: The score lies below the scale. Correct it, or change the lowest score of the scale.',
      '4: The score lies between two steps of the scale. Correct it, or change the step.',
    ]);
  });

  it('are refused line by line', () => {
    expect(read('3 10\n4 12\n3.0 1\n\nfive 1\n6 1.5\n7\n10-14 3\n8 -1')).toEqual([
      '3: Score 3.0 stands in line 1 already. Give each score one line.',
      '5: "five" is not a score. Write a number.',
      '6: "1.5" is not a count. Write a whole number of 0 or more.',
      '7: A line holds a score and a count; this one holds 1 entry.',
      '8: A range of scores cannot be read. Give one line for each score.',
      '9: "-1" is not a count. Write a whole number of 0 or more.',
    ]);
    expect(readTypedCounts('10 – 14 3\n15 – 19 4', null).problems[0]?.problem).toMatch(/^A range/);
  });

  it('are refused as a whole where nothing can be tallied', () => {
    expect(read('')).toEqual(['0: Type one line for each score: the score, a space, and how many people have it.']);
    expect(read('3 0\n4 0')).toEqual(['0: All counts are 0: there is nobody to tally.']);
    expect(read('3 5')).toEqual([
      '0: Everybody has the same score, so the scale cannot be seen in it. Declare the scale.',
    ]);
    expect(readTypedCounts('3 5', { ...TO_TEN, step: 0 }).problems).toHaveLength(1);
  });

  it('come with the fingerprint of the text and fit into a project', () => {
    const text = 'Wert;Häufigkeit\n3;10\n4;12\n';
    const { counted } = readTypedCounts(text, null);
    expect(counted?.source).toEqual({
      kind: 'typed',
      file: '',
      sha256: createHash('sha256').update(text, 'utf8').digest('hex'),
      bytes: Buffer.byteLength(text),
      rowsRead: 2,
      rowsKept: 2,
      leftOut: [],
      scaleInferred: true,
    });
    expect(v.safeParse(normProjectSchema, { ...newProject('Typed'), ...counted }).success).toBe(true);
  });
});
