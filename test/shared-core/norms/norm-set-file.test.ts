import { describe, expect, it } from 'vitest';
import { normSetForFile } from '../../../shared-core/norms/norm-set-file.ts';
import { percentilePoint } from '../../../shared-core/percentile/percentile-point.ts';
import {
  builtSet,
  firstNorms,
  logLinear,
  projectOf,
  settledProject,
  smoothedBy,
  TEN_COUNTS,
} from './small-projects.ts';
import { SMOOTHED_COUNTS } from './smoothing-methods.ts';

describe('a norm set as plain JSON', () => {
  it('has exactly these keys', () => {
    const file = normSetForFile(builtSet(settledProject()), ({ group }) => [
      percentilePoint(group.table, 0.5, 'type-7', 1),
    ]);
    expect(Object.keys(file)).toEqual(['source', 'scale', 'definition', 'groups']);
    const plain = JSON.parse(JSON.stringify(file));
    expect(Object.keys(plain.source)).toEqual(['file', 'sha256', 'rows-read', 'rows-kept', 'left-out']);
    expect(plain.source['left-out']).toEqual([{ rule: 'missing-code', count: 2, rows: [7, 9] }]);
    expect(plain.scale).toEqual({ min: 0, max: 20, step: 1 });
    expect(plain.definition).toBe('midpoint');
    const [first, second] = plain.groups;
    expect([first.group, second.group]).toEqual([{ grade: '4' }, { grade: '10' }]);
    expect(Object.keys(first)).toEqual([
      'group',
      'n',
      'weight-sum',
      'effective-n',
      'clusters',
      'design-effect',
      'mean',
      'sd',
      'skewness',
      'excess-kurtosis',
      'five-number',
      'points',
      'smoothing',
      'rows',
    ]);
    expect(first.points).toEqual([{ proportion: 0.5, definition: 'type-7', score: 10 }]);
    const [row] = first.rows;
    expect(Object.keys(row)).toEqual([
      'score',
      'count',
      'weight',
      'cumulative',
      'percentile-rank',
      'printed',
      'adjusted',
      'derived',
      'interval',
      'standard-error',
      'smoothed',
      'alternatives',
      'band',
      'provenance',
    ]);
    expect(Object.keys(row.derived).toSorted()).toEqual(['deviation', 'nce', 'stanine', 'sten', 't', 'z']);
    expect(row.provenance).toEqual({
      'percentile-rank': { from: 'counts', observed: true, below: 0, at: 20, all: 420 },
      printed: { from: 'observed', end: null },
      derived: 'rank',
    });
  });

  it('holds numbers unrounded', () => {
    const file = JSON.parse(JSON.stringify(normSetForFile(builtSet(projectOf(TEN_COUNTS)), () => [])));
    const [group] = file.groups;
    expect(group.group).toEqual({});
    expect(group.sd).toBeCloseTo(Math.sqrt(20.4 / 9), 13);
    expect(group['five-number']).toEqual([0, 1, 2, 4, 4]);
    expect(group.rows[0].derived.z).toBeCloseTo(-1.6448536269514722, 12);
  });

  it('tells of smoothing and of how sure a rank is', () => {
    const project = projectOf(SMOOTHED_COUNTS);
    const precision = { ...project.precision, reliability: 0.9 };
    const smoothed = smoothedBy({ ...project, precision }, logLinear(2));
    const [group] = JSON.parse(JSON.stringify(normSetForFile(builtSet(smoothed), () => []))).groups;
    expect(Object.keys(group.smoothing)).toEqual([
      'method',
      'degree',
      'bandwidth',
      'g2',
      'x2',
      'df',
      'aic',
      'bic',
      'converged',
      'moments-observed',
      'moments-fitted',
    ]);
    for (const moments of ['moments-observed', 'moments-fitted']) {
      expect(Object.keys(group.smoothing[moments])).toEqual(['mean', 'sd', 'skewness', 'excess-kurtosis']);
    }
    const plain = firstNorms(projectOf(SMOOTHED_COUNTS)).rows;
    firstNorms(smoothed).rows.forEach((row, score) => {
      const inFile = group.rows[score];
      expect(Object.keys(inFile.smoothed)).toEqual(['proportion', 'percentile-rank', 'standard-error']);
      expect(inFile.smoothed['percentile-rank']).toBe(row.percentileRank);
      expect(inFile['percentile-rank']).toBe(plain[score]?.percentileRank);
      expect(inFile.printed).toBe(row.printed);
      expect(inFile.derived).toEqual(row.derived);
      expect([inFile.interval, inFile.band]).toEqual([row.interval, row.band]);
      expect(Object.keys(inFile.alternatives)).toEqual(['low', 'high']);
      expect(inFile.provenance.printed).toEqual({ from: 'smoothed', end: row.provenance.printed.end });
    });
  });

  it('has the same range of defensible ranks whether or not its column is printed', () => {
    const project = projectOf(SMOOTHED_COUNTS);
    const printed = { ...project, table: { ...project.table, columns: ['print-range' as const] } };
    const [group] = JSON.parse(JSON.stringify(normSetForFile(builtSet(project), () => []))).groups;
    firstNorms(printed).rows.forEach(({ range }, score) => {
      expect(group.rows[score].alternatives).toEqual({ low: range?.low, high: range?.high });
    });
  });

  it('says null for a group whose smoothing was refused', () => {
    const refused = smoothedBy(projectOf(TEN_COUNTS), logLinear(10));
    const [group] = JSON.parse(JSON.stringify(normSetForFile(builtSet(refused), () => []))).groups;
    expect([group.smoothing, group.rows[0].smoothed]).toEqual([null, null]);
  });

  it('takes any column name as it is', () => {
    const project = settledProject();
    const tally = project.tally && { ...project.tally, groupColumns: ['__proto__', 'test-dates'] };
    const by = ['__proto__', 'test-dates'];
    const file = normSetForFile(builtSet({ ...project, tally, groups: { ...project.groups, by } }), () => []);
    expect(JSON.stringify(file)).toContain('"group":{"__proto__":"4","test-dates":"A"}');
  });
});
