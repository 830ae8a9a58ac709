import { describe, expect, it } from 'vitest';
import { readForeignRanks } from '../../../shared-core/norms/why-differ-column.ts';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';

const scale = { min: 0, max: 20, step: 0.5, direction: 'high-is-good' as const };

function read(text: string): readonly (readonly [number, string, number])[] {
  const { column, problems } = readForeignRanks(text, scale);
  expect(problems).toEqual([]);
  return (column?.rows ?? []).map(({ position, printed }) => [position, printed.sign, ratioToNumber(printed.value)]);
}

function problemsOf(text: string): readonly string[] {
  const { column, problems } = readForeignRanks(text, scale);
  expect(column).toBeNull();
  return problems.map(({ line, problem }) => `${line}: ${problem}`);
}

describe('a pasted column of ranks', () => {
  it('is read with tabs, semicolons, commas and spaces, in any order of the scores', () => {
    const rows = [
      [0, '<', 1],
      [21, '', 50],
      [40, '>', 99],
    ];
    expect(read('20\t>99\n10.5\t50\n0\t<1\n')).toEqual(rows);
    expect(read('Score;Rank\r\n0;<1\r\n\r\n10,5;50\r\n20;>99')).toEqual(rows);
    expect(read('0,<1\n10.5,50\n20,>99')).toEqual(rows);
    expect(read('0 < 1\n10.5   50\n20 ≥ 99')).toEqual(rows);
  });

  it('takes signs of per cent and decimals as they are written', () => {
    expect(read('1\t12.50 %\n2\t13%')).toEqual([
      [2, '', 12.5],
      [4, '', 13],
    ]);
    expect(readForeignRanks('1\t12.50\n2\t13', scale).column?.decimals).toBe(2);
    expect(readForeignRanks('1\t12,5\n2\t13', scale).column?.decimals).toBe(1);
    expect(readForeignRanks('1\t12\n2\t13', scale).column?.decimals).toBe(0);
  });

  it('reads proportions where no rank exceeds 1 and some have decimals', () => {
    const { column } = readForeignRanks('1\t0.333\n2\t0.5\n3\t1', scale);
    expect(column?.proportions).toBe(true);
    expect(column?.decimals).toBe(1);
    expect(column?.rows.map(({ printed }) => ratioToNumber(printed.value))).toEqual([33.3, 50, 100]);
    expect(readForeignRanks('1\t0\n2\t1', scale).column?.proportions).toBe(false);
    expect(readForeignRanks('1\t0.3 %\n2\t0.5 %', scale).column?.proportions).toBe(false);
    expect(readForeignRanks('1\t0.3\n2\t1.5', scale).column?.proportions).toBe(false);
  });

  it('tells by line what cannot be read', () => {
    expect(problemsOf('1\t50\n2\tmuch\n30\t60\n1.25\t61\nx\t62\n1.0\t63\n3\t101\n4\t-1\n5')).toEqual([
      '2: "much" is not a percentile rank. Write a number from 0 to 100, <1 or >99.',
      '3: Score 30 is not on the scale of this group. Leave the line out.',
      '4: Score 1.25 is not on the scale of this group. Leave the line out.',
      '5: "x" is not a score. Give each score a line of its own.',
      '6: Score 1.0 stands in line 1 already.',
      '7: "101" is not a percentile rank. Write a number from 0 to 100, <1 or >99.',
      '8: "-1" is not a percentile rank. Write a number from 0 to 100, <1 or >99.',
      '9: A line holds a score and a rank; this one holds 1 entry.',
    ]);
    expect(problemsOf('')).toEqual(['0: Paste one line for each score: the score, a space, and its percentile rank.']);
    expect(problemsOf('score rank')).toHaveLength(1);
    expect(problemsOf('1\t0.1234567890123')).toHaveLength(1);
    expect(problemsOf('3-5\t20')[0]).toContain('"3-5" is not a score');
  });
});
