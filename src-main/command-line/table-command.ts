import { basename } from 'node:path';
import type { TalliedCohort } from '../../shared-core/desk.ts';
import { newProject } from '../../shared-core/norms/new-project.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import { buildNormSet, type NormSet } from '../../shared-core/norms/norm-set.ts';
import { normSetForFile } from '../../shared-core/norms/norm-set-file.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { percentilePoint, pointProblem, type PercentilePoint } from '../../shared-core/percentile/percentile-point.ts';
import { scaleInWords } from '../../shared-core/scale/score-scale.ts';
import { tallyCohort } from '../cohort-file/tally-cohort.ts';
import { tablesCsv } from '../press/tables-csv.ts';
import { chosenReading } from './chosen-reading.ts';
import { leftOutLines } from './left-out-lines.ts';
import { refused, wrongUsage, type Outcome } from './outcome.ts';
import type { TableOptions } from './table-options.ts';
import { textTables } from './text-tables.ts';

/** Nobody watches, and an interrupt from the keyboard ends the program. */
const HOOKS = { onProgress: () => undefined, signal: new AbortController().signal } as const;

/** Reads a cohort file and makes its tables. */
export async function tableCommand(path: string, options: TableOptions): Promise<Outcome> {
  const file = basename(path);
  const chosen = await chosenReading(path, file, options);
  if (chosen.kind === 'no-such-column') return wrongUsage(chosen.problem);
  if (chosen.kind === 'unreadable') return refused(chosen.problem);
  const { reading } = chosen;
  const tallied = await tallyCohort(path, file, reading, HOOKS);
  if (!tallied.ok) return refused(tallied.problem, chosen.remarks);
  const project = projectOf(file, reading, tallied.value, options);
  const remarks = [...chosen.remarks, ...talliedRemarks(project)];
  const built = buildNormSet(project);
  if (!built.ok) return refused(built.problem, remarks);
  const { normSet } = built;
  for (const { group } of normSet.groups) {
    for (const definition of options.points.length === 0 ? [] : options.pointDefinitions) {
      const problem = pointProblem(group.table, definition, classWidth(normSet));
      if (problem !== null) return refused(`${group.title}: ${problem}`, remarks);
    }
  }
  return { kind: 'done', result: resultText(normSet, options), remarks };
}

function projectOf(
  file: string,
  reading: Reading,
  { source, tally }: TalliedCohort,
  { named, direction, definition, columns }: TableOptions,
): NormProject {
  const bare = newProject(file);
  return {
    ...bare,
    source,
    reading,
    tally: { ...tally, scale: { ...tally.scale, direction } },
    groups: { ...bare.groups, by: named.by },
    curve: { definition },
    table: { ...bare.table, columns: columns ?? bare.table.columns },
  };
}

function talliedRemarks({ source, tally }: NormProject): readonly string[] {
  if (source === null || tally === null) return [];
  return [
    ...leftOutLines(source),
    ...(source.scaleInferred
      ? [
          `The scale is ${scaleInWords(tally.scale)}, as met in the file. Give --scale MIN:MAX where more can be scored.`,
        ]
      : []),
  ];
}

function resultText(normSet: NormSet, options: TableOptions): string | Uint8Array {
  const pointsOf = (norms: GroupNorms): readonly PercentilePoint[] =>
    options.pointDefinitions.flatMap((definition) =>
      options.points.map((proportion) =>
        percentilePoint(norms.group.table, proportion, definition, classWidth(normSet)),
      ),
    );
  switch (options.format) {
    case 'json':
      return `${JSON.stringify(normSetForFile(normSet, pointsOf), null, 1)}\n`;
    case 'csv':
      return tablesCsv(normSet);
    case 'text':
      return textTables(normSet, pointsOf);
  }
}

/** Raw-score points of a class for grouped percentile points. */
function classWidth({ project }: NormSet): number {
  const { definition } = project.curve;
  return definition.kind === 'grouped' ? definition.width : (project.tally?.scale.step ?? 1);
}
