import { describe, expect, it } from 'vitest';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import { normSetForFile } from '../../../shared-core/norms/norm-set-file.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { curveStatement, statementText } from '../../../shared-core/norms/statements.ts';
import { columnOf } from '../../../shared-core/norms/table-columns.ts';
import { workingsOf } from '../../../shared-core/norms/workings.ts';
import { groupMethod } from '../../../shared-core/pages/group-method.ts';
import { sampleFacts } from '../../../shared-core/pages/sheet-texts.ts';
import { clusterRankErrors } from '../../../shared-core/precision/cluster-variance.ts';
import { rankIntervals } from '../../../shared-core/precision/proportion-interval.ts';
import { printNumber } from '../../../shared-core/scores/printed-number.ts';
import { clusteredProject } from './clustered-project.ts';
import { builtSet, firstNorms, logLinear, READING, settledProject, smoothedBy } from './small-projects.ts';

const clustered = clusteredProject(24);
const norms = firstNorms(clustered);
const plain = firstNorms(settledProject());

function withColumns(project: NormProject): NormProject {
  return { ...project, table: { ...project.table, columns: ['interval', 'standard-error'] } };
}

function effectOf({ sampling }: GroupNorms): number {
  if (sampling.designEffect === null) throw new Error('no design effect');
  return sampling.designEffect;
}

describe('the set of a clustered cohort', () => {
  it('prints the same ranks, with errors between clusters and intervals on n over the design effect', () => {
    expect(norms.rows.map(({ printed }) => printed)).toEqual(plain.rows.map(({ printed }) => printed));
    expect(norms.summary).toEqual(plain.summary);
    const { table } = norms.group;
    const errors = clusterRankErrors(table, 'midpoint');
    expect(norms.rows.map(({ standardError }) => standardError)).toEqual(errors);
    expect(norms.rows.map(({ midpointError }) => midpointError)).toEqual(errors);
    expect(norms.sampling.clusters).toBe(24);
    expect(effectOf(norms)).toBeGreaterThan(10);
    expect(norms.sampling.effectiveN).toBe(420 / effectOf(norms));
    const { interval: method, level } = clustered.precision;
    const wanted = rankIntervals(table, norms.sampling.effectiveN, { kind: 'midpoint' }, { method, level });
    expect(norms.precision.intervals).toEqual(wanted.ok ? wanted.intervals : null);
  });

  it('says in the file how many clusters and what design effect, and leaves the effective n to the weights', () => {
    const groupsOf = (project: NormProject) =>
      JSON.parse(JSON.stringify(normSetForFile(builtSet(project), () => []))).groups;
    const [group] = groupsOf(clustered);
    expect([group.clusters, group['design-effect'], group['effective-n']]).toEqual([24, effectOf(norms), 420]);
    const [bare] = groupsOf(settledProject());
    expect([bare.clusters, bare['design-effect'], bare['effective-n']]).toEqual([null, null, 420]);
  });

  it('widens the errors of smoothed ranks by the root of the design effect', () => {
    const smoothed = firstNorms(smoothedBy(clustered, logLinear(2)));
    const before = firstNorms(smoothedBy(settledProject(), logLinear(2)));
    const factor = Math.sqrt(effectOf(smoothed));
    smoothed.rows.forEach((row, position) => {
      const error = before.rows[position]?.standardError ?? NaN;
      expect(row.standardError).toBeCloseTo(error * factor, 9);
      expect(row.smoothed?.standardError).toBe(row.standardError);
      expect(row.printed).toBe(before.rows[position]?.printed);
    });
  });

  it('has another check code when the design effect that is printed is another', () => {
    const checks = [settledProject(), clusteredProject(24), clusteredProject(30)].map((one) => builtSet(one).check);
    expect(new Set(checks).size).toBe(3);
  });
});

describe('words about how people were drawn', () => {
  const drawn = `24 clusters, design effect ${printNumber(effectOf(norms), 1)}`;

  it('stand on the sheet', () => {
    const project = withColumns(clustered);
    const facts = sampleFacts(project, firstNorms(project));
    expect(facts).toContain(`420 pupils, drawn in ${drawn}. Mean`);
    const method = groupMethod(project, firstNorms(project));
    expect(method).toContain(`for pupils drawn in ${drawn}.`);
    expect(method).toContain('linearised between clusters');
    expect(method).toContain('The design effect is averaged over the scores whose rank lies between 10 and 90.');
    expect(method).not.toContain('one by one');
    const other = withColumns(settledProject());
    expect(groupMethod(other, firstNorms(other))).toContain('as if pupils were drawn one by one.');
    expect(groupMethod(other, firstNorms(other))).not.toContain('cluster');
  });

  it('stand in the statement and beside the column', () => {
    expect(statementText(curveStatement(clustered))).toContain('interval, for pupils drawn in clusters.');
    expect(statementText(curveStatement(settledProject()))).toContain('interval, as if pupils were drawn one by one.');
    expect(columnOf('standard-error', clustered).explanation).toContain('for people drawn in clusters.');
  });

  it('stand in the workings', () => {
    const set = builtSet(withColumns(clustered));
    const [group] = set.groups;
    if (group === undefined) throw new Error('no group');
    const linesOf = (column: 'interval' | 'standard-error'): string =>
      workingsOf(set.project, group, '10', column).lines.join(' ');
    const interval = linesOf('interval');
    const effect = printNumber(effectOf(norms), 2);
    expect(interval).toContain(`Effective n: 420 / ${effect} = ${printNumber(norms.sampling.effectiveN, 1)}.`);
    expect(interval).toContain(`for pupils drawn in ${drawn};`);
    expect(linesOf('standard-error')).toContain(`between ${drawn}, linearised: `);
  });
});

describe('queries about clusters', () => {
  const idsOf = (project: NormProject): readonly string[] => builtSet(project).queries.map(({ id }) => id);

  it('ask about fewer than twenty', () => {
    expect(idsOf(clusteredProject(20))).toEqual([]);
    expect(idsOf(clusteredProject(19))).toEqual(['few-clusters:["4"]', 'few-clusters:["10"]']);
    expect(builtSet(clusteredProject(19)).queries[0]).toMatchObject({ station: 'groups', weight: 'should' });
  });

  it('must be answered where there is one, of which no error can be told', () => {
    const one = clusteredProject(1);
    expect(idsOf(one)).toEqual(['one-cluster:["4"]', 'one-cluster:["10"]']);
    const { rows, precision, sampling } = firstNorms(one);
    expect(sampling).toEqual({ clusters: 1, designEffect: null, effectiveN: 420 });
    expect(precision.intervalProblem).toContain('All people of the group are in one cluster');
    expect(rows.map(({ interval, standardError, midpointError }) => [interval, standardError, midpointError])).toEqual(
      rows.map(() => [null, null, null]),
    );
    expect(firstNorms(smoothedBy(one, logLinear(2))).rows[3]?.standardError).toBeNull();
  });

  it('note a column of schools that is not used', () => {
    const withRole = (role: 'unused' | 'group'): NormProject => ({
      ...settledProject(),
      reading: { ...READING, roles: [...READING.roles, { column: 'School_name', role }] },
    });
    expect(builtSet(withRole('unused')).queries).toMatchObject([{ id: 'cluster-unused', weight: 'note', group: null }]);
    expect(idsOf(withRole('group'))).toEqual([]);
  });
});

describe('clusters in a project file', () => {
  const text = projectToText(clustered);

  it('come back', () => {
    expect(projectFromText(text)).toEqual({ ok: true, project: clustered });
  });

  it.each<[string, (clusters: FileClusters) => unknown]>([
    ['a person too many', (clusters) => ({ ...clusters, alone: [1, ...Array.from({ length: 20 }, () => 0)] })],
    ['people too few', (clusters) => ({ ...clusters, parts: clusters.parts.slice(1) })],
    ['a cluster twice', (clusters) => ({ ...clusters, parts: [clusters.parts[0], ...clusters.parts] })],
    ['a list too short', (clusters) => ({ ...clusters, alone: [0] })],
    [
      'squares without weights',
      (clusters) => ({ ...clusters, 'alone-squares': Array.from({ length: 21 }, () => '0') }),
    ],
    ['none in one cell alone', () => null],
  ])('are refused with %s', (_, change) => {
    const file = JSON.parse(text);
    const [cell] = file.tally.cells;
    cell.clusters = change(cell.clusters);
    const read = projectFromText(JSON.stringify(file));
    expect(read.ok ? 'was read' : read.problem).toContain('the tally does not fit its scale and columns');
  });
});

interface FileClusters {
  readonly parts: readonly unknown[];
}
