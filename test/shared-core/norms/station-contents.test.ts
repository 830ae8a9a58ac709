import { describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { stationContents } from '../../../shared-core/norms/station-contents.ts';
import type { SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';
import { logLinear, settledProject, smoothedBy } from './small-projects.ts';

const settled = settledProject();

describe('what the stations hold', () => {
  it('is told in a few words', () => {
    expect(stationContents(settled, 0)).toEqual({
      cohort: '840 kept, 2 left out',
      groups: 'grade 4, 10',
      curve: 'midpoint, not smoothed',
      table: 'rank, stanine, T score',
      sheet: 'A4, three columns',
      release: 'edition 1.0',
    });
  });

  it('is nothing before a cohort was read', () => {
    const contents = stationContents(newProject(''), 0);
    expect(contents).toEqual({ cohort: 'no scores yet', groups: '', curve: '', table: '', sheet: '', release: '' });
  });

  it.each<[string, SmoothingChoice]>([
    ['midpoint, log-linear, degree 4', logLinear(4)],
    ['midpoint, log-linear, by BIC', logLinear('bic')],
    ['midpoint, log-linear, by AIC', logLinear('aic')],
    ['midpoint, log-linear, by likelihood-ratio tests', logLinear('likelihood-ratio')],
    ['midpoint, kernel', { kind: 'kernel', bandwidth: 'auto', after: null }],
    ['midpoint, log-linear and kernel', { kind: 'kernel', bandwidth: 0.7, after: logLinear(3) }],
    ['midpoint, beta-binomial', { kind: 'beta-binomial' }],
  ])('names the smoothing: %s', (words, smoothing) => {
    expect(stationContents(smoothedBy(settled, smoothing), 0).curve).toBe(words);
  });

  it('names groups, tables and open queries by their number', () => {
    const by = (columns: readonly string[]): NormProject => ({
      ...settled,
      groups: { ...settled.groups, by: columns },
    });
    expect(stationContents(by([]), 1)).toMatchObject({ groups: 'one table', release: '1 query open' });
    expect(stationContents(by(['grade', 'form']), 3)).toMatchObject({ groups: '4 tables', release: '3 queries open' });
    const columns = ['interval', 'standard-error', 'measurement-band', 'print-range', 'observed-rank'] as const;
    expect(stationContents({ ...settled, table: { ...settled.table, columns } }, 0).table).toBe(
      'rank, 95 % interval, standard error of the rank, measurement band, range of defensible ranks, observed rank',
    );
  });
});
