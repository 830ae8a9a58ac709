import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import { buildNormSet, type NormSet } from '../../shared-core/norms/norm-set.ts';
import { normSetForFile } from '../../shared-core/norms/norm-set-file.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { percentilePoint, pointProblem } from '../../shared-core/percentile/percentile-point.ts';
import { tablesCsv } from '../press/tables-csv.ts';
import { groupBootstraps } from './group-bootstraps.ts';
import { refused, type Outcome } from './outcome.ts';
import { precisionRemarks } from './precision-remarks.ts';
import { readCohort } from './read-cohort.ts';
import { smoothingRefusal } from './smoothing-refusal.ts';
import type { TableOptions } from './table-options.ts';
import { textTables, type BesideRows } from './text-tables.ts';

/** Reads a cohort file and makes its tables. */
export async function tableCommand(path: string, options: TableOptions): Promise<Outcome> {
  const cohort = await readCohort(path, options);
  if (!cohort.ok) return cohort.outcome;
  const built = buildNormSet(withChoices(cohort.project, options));
  if (!built.ok) return refused(built.problem, cohort.remarks);
  const { normSet } = built;
  const problem = smoothingRefusal(normSet) ?? intervalRefusal(normSet, options) ?? pointRefusal(normSet, options);
  if (problem !== null) return refused(problem, cohort.remarks);
  const { bootstrap } = options.precision;
  const bootstraps = bootstrap === null ? null : await groupBootstraps(normSet, bootstrap);
  if (bootstraps?.ok === false) return refused(bootstraps.problem, cohort.remarks);
  const beside: BesideRows = {
    pointsOf: ({ group }) =>
      options.pointDefinitions.flatMap((definition) =>
        options.points.map((proportion) => percentilePoint(group.table, proportion, definition, classWidth(normSet))),
      ),
    bootstrapOf: ({ group }) => bootstraps?.value.get(group.key) ?? null,
  };
  return {
    kind: 'done',
    result: resultText(normSet, options, beside),
    remarks: [...cohort.remarks, ...precisionRemarks(normSet, options)],
  };
}

function withChoices(project: NormProject, { definition, smoothing, precision, columns }: TableOptions): NormProject {
  const usual = project.precision;
  return {
    ...project,
    curve: { ...project.curve, definition, smoothing },
    precision: {
      interval: precision.interval ?? usual.interval,
      level: precision.level ?? usual.level,
      reliability: precision.reliability,
      bootstrap: precision.bootstrap ?? usual.bootstrap,
    },
    table: { ...project.table, columns: columns ?? project.table.columns },
  };
}

/** Intervals that were asked for by name must fit every group. */
function intervalRefusal({ groups }: NormSet, { precision }: TableOptions): string | null {
  if (precision.interval === null) return null;
  const without = groups.find((norms) => norms.precision.intervalProblem !== null);
  return without === undefined ? null : titled(without, without.precision.intervalProblem ?? '');
}

function pointRefusal(normSet: NormSet, { points, pointDefinitions }: TableOptions): string | null {
  if (points.length === 0) return null;
  for (const norms of normSet.groups) {
    for (const definition of pointDefinitions) {
      const problem = pointProblem(norms.group.table, definition, classWidth(normSet));
      if (problem !== null) return titled(norms, problem);
    }
  }
  return null;
}

function titled({ group }: GroupNorms, problem: string): string {
  return `${group.title}: ${problem}`;
}

function resultText(normSet: NormSet, { format }: TableOptions, beside: BesideRows): string | Uint8Array {
  switch (format) {
    case 'json':
      return `${JSON.stringify(normSetForFile(normSet, beside.pointsOf, beside.bootstrapOf), null, 1)}\n`;
    case 'csv':
      return tablesCsv(normSet);
    case 'text':
      return textTables(normSet, beside);
  }
}

/** Raw-score points of a class for grouped percentile points. */
function classWidth({ project }: NormSet): number {
  const { definition } = project.curve;
  return definition.kind === 'grouped' ? definition.width : (project.tally?.scale.step ?? 1);
}
