import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { readPrintable, type ProjectRead } from './read-project.ts';

/** The paths of two projects or released editions, the earlier one first. */
export interface EditionPaths {
  readonly before: string;
  readonly after: string;
}

export interface EditionPair {
  readonly before: NormSet;
  readonly after: NormSet;
  /** What is odd about a released edition, in sentences. */
  readonly remarks: readonly string[];
}

/** The norm sets of two editions, both fit to be printed; the problem names the file that stands in the way. */
export async function readEditions(paths: EditionPaths): Promise<Reply<EditionPair>> {
  const before = await readPrintable(paths.before);
  if (!before.ok) return before;
  const after = await readPrintable(paths.after);
  if (!after.ok) return after;
  return {
    ok: true,
    value: {
      before: before.value.normSet,
      after: after.value.normSet,
      remarks: [...remarksOn(paths.before, before.value), ...remarksOn(paths.after, after.value)],
    },
  };
}

/** Another version of the program may work an old project out, or print it, otherwise. */
function remarksOn(path: string, { normSet, edition }: ProjectRead): readonly string[] {
  if (edition === null || edition.check === normSet.check) return [];
  return [
    `${basename(path)} was released by Normloom ${edition.program.version} with check ${edition.check}; this version ` +
      `gives check ${normSet.check}. Press the file to see what differs from the release.`,
  ];
}
