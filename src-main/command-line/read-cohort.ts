import { basename } from 'node:path';
import { newProject } from '../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { scaleInWords } from '../../shared-core/scale/score-scale.ts';
import { tallyCohort } from '../cohort-file/tally-cohort.ts';
import { chosenReading } from './chosen-reading.ts';
import type { CohortOptions } from './cohort-options.ts';
import { leftOutLines } from './left-out-lines.ts';
import { refused, wrongUsage, type Outcome } from './outcome.ts';

/** A cohort as a project with every other choice at its default, or how the command ends without one. */
export type CohortRead =
  | { readonly ok: true; readonly project: NormProject; readonly remarks: readonly string[] }
  | { readonly ok: false; readonly outcome: Outcome };

/** Nobody watches, and an interrupt from the keyboard ends the program. */
const HOOKS = { onProgress: () => undefined, signal: new AbortController().signal } as const;

/** Reads and tallies a cohort file. */
export async function readCohort(path: string, options: CohortOptions): Promise<CohortRead> {
  const file = basename(path);
  const chosen = await chosenReading(path, file, options);
  if (chosen.kind === 'no-such-column') return { ok: false, outcome: wrongUsage(chosen.problem) };
  if (chosen.kind === 'unreadable') return { ok: false, outcome: refused(chosen.problem) };
  const { reading } = chosen;
  const tallied = await tallyCohort(path, file, reading, HOOKS);
  if (!tallied.ok) return { ok: false, outcome: refused(tallied.problem, chosen.remarks) };
  const { source, tally } = tallied.value;
  const bare = newProject(file);
  const project: NormProject = {
    ...bare,
    source,
    reading,
    tally: { ...tally, scale: { ...tally.scale, direction: options.direction } },
    groups: { ...bare.groups, by: options.named.by },
  };
  return { ok: true, project, remarks: [...chosen.remarks, ...talliedRemarks(project)] };
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
