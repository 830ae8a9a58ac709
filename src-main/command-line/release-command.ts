import { basename } from 'node:path';
import { refused, type Outcome } from './outcome.ts';
import { fingerprintLines } from './press-command.ts';
import { readProject } from './read-project.ts';

/** Who signs; null where the project's own signature stands. */
export interface Signatures {
  readonly analyst: string | null;
  readonly checker: string | null;
}

/**
 * Presses a project into a folder and freezes it there as an edition; the result names each file with its SHA-256. The
 * project file is left as it is: signatures given here stand in the edition alone.
 */
export async function releaseCommand(path: string, into: string, signatures: Signatures): Promise<Outcome> {
  const read = await readProject(path);
  if (!read.ok) return refused(read.problem);
  const { normSet, edition } = read.value;
  const { project } = normSet;
  if (edition !== null) {
    return refused(
      `${basename(path)} is a released edition already. Press it with normloom press, or open it in the program to go ` +
        'on from it.',
    );
  }
  const signed = {
    ...project.release,
    analyst: signatures.analyst ?? project.release.analyst,
    checker: signatures.checker ?? project.release.checker,
  };
  const { releaseInto } = await import('../press/press-files.ts');
  const released = await releaseInto({ ...project, release: signed }, into);
  if (!released.ok) return refused(`${basename(path)}: ${released.problem}`);
  const { files, editionFile } = released.value;
  return {
    kind: 'done',
    result: fingerprintLines(files),
    remarks: [`Edition ${signed.edition} is released and frozen in ${editionFile ?? ''}.`],
  };
}
