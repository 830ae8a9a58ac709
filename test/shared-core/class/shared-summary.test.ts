import { describe, expect, it } from 'vitest';
import { TELL_NOTHING, summariesMayTell, summaryMayTell } from '../../../shared-core/class/shared-summary.ts';
import { suppressed } from '../../../shared-core/class/small-cells.ts';
import { row } from './possible-tables.ts';

const told = (n: number, smallestCell: number): readonly string[] =>
  Object.entries(summaryMayTell(n, smallestCell, false)).flatMap(([name, may]) => (may ? [name] : []));

describe('statistics in a shared summary', () => {
  it('are told from the number of people at which each tells of no one', () => {
    expect(told(5, 3)).toEqual([]);
    expect(told(6, 3)).toEqual(['median', 'mean']);
    expect(told(11, 3)).toEqual(['median', 'mean']);
    expect(told(12, 3)).toEqual(['quartiles', 'median', 'mean', 'standardDeviation']);
    expect(told(10, 2)).toEqual(['median', 'mean']);
    expect(told(4, 1)).toEqual(['quartiles', 'median']);
    expect(told(10, 1)).toEqual(['quartiles', 'median', 'mean', 'standardDeviation']);
  });

  it('never include the lowest and the highest score, nor anything where all scores are alike', () => {
    for (const n of [0, 1, 28, 400]) {
      expect(told(n, 3)).not.toContain('lowest');
      expect(told(n, 3)).not.toContain('highest');
      expect(summaryMayTell(n, 3, true)).toEqual(TELL_NOTHING);
    }
  });

  const apart = { together: false, rows: [false, false, false] };
  const may = (rows: Parameters<typeof suppressed>[0], alike = apart) =>
    summariesMayTell(suppressed(rows, 3), 3, alike);

  it('are told of all groups or of none', () => {
    const large = row([7, 8, 9, 7], [0]);
    expect(may([large, large]).groups).toEqual(summaryMayTell(31, 3, false));
    expect(may([large, row([0, 0, 0, 0], [9])]).groups).toEqual(summaryMayTell(31, 3, false));
    expect(may([large, large], { together: false, rows: [false, true] }).groups).toEqual(TELL_NOTHING);
    expect(may([large, row([3, 3, 3, 0], [0])]).groups).toEqual(TELL_NOTHING);
    expect(may([row([3, 3, 3, 3], [0]), row([3, 3, 3, 3], [0])]).groups.standardDeviation).toBe(true);
  });

  it('are told of the class without its groups, and never where no counts are', () => {
    const both = may([row([2, 5, 4, 3], [0]), row([1, 4, 6, 3], [0])]);
    expect(both).toEqual({ together: summaryMayTell(28, 3, false), groups: TELL_NOTHING });
    expect(may([row([7, 8, 9, 7], [0])])).toEqual({ together: summaryMayTell(31, 3, false), groups: TELL_NOTHING });
    expect(may([row([1, 1, 0, 0], [0])])).toEqual({ together: TELL_NOTHING, groups: TELL_NOTHING });
    expect(may([row([7, 8, 9, 7], [0])], { ...apart, together: true }).together).toEqual(TELL_NOTHING);
  });
});
