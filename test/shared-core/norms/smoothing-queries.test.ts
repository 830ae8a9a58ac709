import { describe, expect, it } from 'vitest';
import type { NormProject, PrecisionChoices } from '../../../shared-core/norms/norm-project.ts';
import { openQueries, type Query } from '../../../shared-core/norms/queries.ts';
import { cohortTable } from '../../reference/smoothing-reference.ts';
import { builtSet, curveOf, logLinear, projectOf, smoothedBy } from './small-projects.ts';

/** The queries of smoothing and precision alone. */
function asked(project: NormProject): readonly Query[] {
  const own =
    /^(smoothing-refused|smoothing-fills-gap|smoothing-invents-dip|degree-nearly-as-good|no-interval|no-reliability):/;
  return builtSet(project).queries.filter(({ id }) => own.test(id));
}

const twoModes = projectOf(cohortTable('c3_twomodes').counts);
const skewed = projectOf(cohortTable('c2_leftskew').counts);

describe('queries of a smoothed group', () => {
  it('are none without smoothing, nor for a fair curve', () => {
    expect(asked(twoModes)).toEqual([]);
    expect(asked(smoothedBy(projectOf(cohortTable('c4_large').counts), logLinear(4)))).toEqual([]);
  });

  it('ask what works instead of a refused smoothing', () => {
    const [query, ...others] = asked(smoothedBy(projectOf([0, 3, 0, 5, 0, 2, 0]), logLinear(9)));
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'smoothing-refused:[]', station: 'curve', weight: 'must', group: '[]' });
    expect(query?.lead).toBe('All pupils cannot be smoothed so.');
    expect(query?.why).toMatch(/^Degree 9 asks for more/);
  });

  it('ask about gaps that the curve fills', () => {
    const [query, ...others] = asked(smoothedBy(twoModes, logLinear(6)));
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'smoothing-fills-gap:[]', station: 'curve', weight: 'should' });
    expect(query?.lead).toBe('Smoothing puts people at 11, 24, 25, 37 or 52, where nobody in All pupils is.');
    const kept = { ...logLinear(6), keptScores: [11, 24, 25, 37, 52] };
    expect(asked(smoothedBy(twoModes, kept)).map(({ id }) => id)).not.toContain('smoothing-fills-gap:[]');
  });

  it('ask about dips that the data do not have', () => {
    const query = asked(smoothedBy(skewed, logLinear(10))).find(({ id }) => id.startsWith('smoothing-invents-dip'));
    expect(query).toMatchObject({ station: 'curve', weight: 'should' });
    expect(query?.lead).toBe('The smooth curve dips at 28; the data do not.');
    const fair = asked(smoothedBy(skewed, logLinear(4))).filter(({ weight }) => weight !== 'note');
    expect(fair).toEqual([]);
  });

  it('note degrees that do as well', () => {
    const notes = asked(smoothedBy(twoModes, logLinear(8))).filter(({ weight }) => weight === 'note');
    expect(notes.map(({ id, lead }) => [id, lead])).toEqual([
      ['degree-nearly-as-good:[]', 'Degree 4, 5, 6 or 7 does as well by BIC.'],
    ]);
    expect(openQueries(notes)).toEqual([]);
  });
});

describe('queries of precision', () => {
  const withColumn = (
    column: 'interval' | 'measurement-band',
    precision: Partial<PrecisionChoices>,
    definition: NormProject['curve']['definition'] = { kind: 'midpoint' },
  ): NormProject => ({
    ...skewed,
    curve: curveOf(definition),
    table: { ...skewed.table, columns: [column] },
    precision: { ...skewed.precision, ...precision },
  });

  it('ask about an empty column of intervals', () => {
    const [query, ...others] = asked(withColumn('interval', { interval: 'clopper-pearson' }));
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'no-interval:[]', station: 'table', weight: 'must' });
    expect(query?.why).toMatch(/^Clopper–Pearson intervals need whole counts/);
    const plotting = asked(withColumn('interval', {}, { kind: 'plotting-position', offset: '3/8' }));
    expect(plotting.map(({ id }) => id)).toEqual(['no-interval:[]']);
    expect(asked(withColumn('interval', {}))).toEqual([]);
    expect(asked(withColumn('interval', { interval: 'clopper-pearson' }, { kind: 'below' }))).toEqual([]);
    const without = withColumn('interval', { interval: 'clopper-pearson' });
    expect(asked({ ...without, table: { ...without.table, columns: [] } })).toEqual([]);
  });

  it('ask for the reliability that a band of measurement needs', () => {
    const [query, ...others] = asked(withColumn('measurement-band', {}));
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'no-reliability:[]', station: 'table', weight: 'must' });
    expect(query?.why).toBe('It needs the reliability of the test.');
    expect(asked(withColumn('measurement-band', { reliability: 0.88 }))).toEqual([]);
    const alone = { ...projectOf([0, 1, 0]), table: withColumn('measurement-band', {}).table };
    const one = asked({ ...alone, precision: { ...alone.precision, reliability: 0.9 } });
    expect(one[0]?.why).toContain('at least two people');
  });
});
