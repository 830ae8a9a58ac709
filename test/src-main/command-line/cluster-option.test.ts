import { describe, expect, it } from 'vitest';
import { normloom, SAMPLE_COHORT } from './run-normloom.ts';
import { tables } from './tables-file.ts';

const WORDS = ['--score', 'raw_score', '--scale', '0:40', '--missing', '99,abs', '--id', 'pupil_id', '--by', 'grade'];

describe('--cluster', () => {
  const plain = tables(SAMPLE_COHORT, ...WORDS);
  const clustered = tables(SAMPLE_COHORT, ...WORDS, '--cluster', 'school');

  it('tells clusters and design effect of every group and keeps the ranks', () => {
    expect(clustered.groups.map(({ clusters }) => clusters)).toEqual([24, 24, 24]);
    clustered.groups.forEach((group, index) => {
      const other = plain.groups[index];
      expect([other?.clusters, other?.['design-effect']]).toEqual([null, null]);
      expect(group['effective-n']).toBe(other?.['effective-n']);
      expect(group['design-effect']).toBeGreaterThan(1.5);
      expect(group['design-effect']).toBeLessThan(20);
      expect(group.rows.map(({ printed }) => printed)).toEqual(other?.rows.map(({ printed }) => printed));
    });
  });

  it('widens intervals and standard errors about the middle', () => {
    const middle = (file: typeof plain) => file.groups[0]?.rows[20];
    const width = (file: typeof plain): number =>
      (middle(file)?.interval?.high ?? NaN) - (middle(file)?.interval?.low ?? NaN);
    expect(width(clustered)).toBeGreaterThan(1.2 * width(plain));
    expect(middle(clustered)?.['standard-error']).toBeGreaterThan(1.2 * (middle(plain)?.['standard-error'] ?? NaN));
  });

  it('says so in the text', () => {
    const ran = normloom(['table', SAMPLE_COHORT, ...WORDS, '--cluster', 'school', '--columns', 'interval']);
    expect(ran.exit).toBe(0);
    expect(ran.stdout).toMatch(/1\s600 people, drawn in 24 clusters, design effect \d+\.\d\./);
    expect(ran.stdout).toMatch(/error of sampling, for people drawn in 24 clusters, design effect \d+\.\d\./);
  });

  it.each([
    [['--cluster', 'scool'], 'has no column "scool"'],
    [['--cluster', 'grade'], 'Column "grade" is given two kinds of work.'],
  ])('is wrong usage with %j', (words, problem) => {
    const ran = normloom(['table', SAMPLE_COHORT, ...WORDS, ...words]);
    expect([ran.exit, ran.stdout]).toEqual([2, '']);
    expect(ran.stderr).toContain(problem);
  });
});
