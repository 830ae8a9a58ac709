import { basename, dirname, extname, join } from 'node:path';
import type { FileHandle, Reply } from '../../shared-core/desk.ts';
import { CLASS_ENDING, PROJECT_ENDING } from '../../shared-core/norms/file-endings.ts';
import type { Dialogs, SavedFile } from '../dialogs.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';
import { cleanFileName } from '../project-file/file-name.ts';
import type { ProjectSaver } from '../project-file/project-saver.ts';
import { fingerprintAt, fingerprintOf } from '../project-file/stored-text.ts';
import type { FileHandles, KnownFile } from './file-handles.ts';
import { answered, refused } from './reply.ts';

export interface WritingParts {
  readonly handles: FileHandles;
  readonly saver: ProjectSaver;
  readonly dialogs: Dialogs | null;
  readonly projectsFolder: string;
}

export interface Written {
  readonly handle: FileHandle;
  readonly path: string;
  /** A sentence for the user, or null. */
  readonly remark: string | null;
}

const ENDINGS = { project: PROJECT_ENDING, class: CLASS_ENDING } as const satisfies Record<SavedFile, string>;
const UNNAMED = { project: 'Norm project', class: 'Class' } as const satisfies Record<SavedFile, string>;

/**
 * Writes a project or a class into the file it came from. When another program changed that file in between, its changes stay and
 * ours goes into a new file beside it.
 */
export async function writeAgain(
  { handles, saver }: WritingParts,
  kind: SavedFile,
  handle: FileHandle,
  file: KnownFile,
  text: string,
): Promise<Reply<Written>> {
  const fingerprint = fingerprintOf(text);
  try {
    const there = await fingerprintAt(file.path);
    if (there === null || there === file.fingerprint || there === fingerprint) {
      await saver.replace(file.path, text);
      handles.noteFingerprint(handle, fingerprint);
      return answered({ handle, path: file.path, remark: null });
    }
    const ending = extname(file.path);
    const path = await saver.createBeside(dirname(file.path), basename(file.path, ending), ending, text);
    const remark = `${file.name} was changed by another program since it was opened here. It was left as it is, and your ${kind} was saved as ${basename(path)}.`;
    return answered({ handle: handles.give(path, { fingerprint }), path, remark });
  } catch (error) {
    return refused(diskTrouble(file.name, 'saved', error));
  }
}

/** Writes a project or a class into a new file: where the dialog says, or under a free name in the projects folder. */
export async function writeNew(
  { handles, saver, dialogs, projectsFolder }: WritingParts,
  kind: SavedFile,
  name: string,
  text: string,
): Promise<Reply<Written | null>> {
  const ending = ENDINGS[kind];
  const given = name.toLowerCase().endsWith(ending) ? ending.length : 0;
  const clean = cleanFileName(name.slice(0, name.length - given), UNNAMED[kind]);
  const written = (path: string): Reply<Written> =>
    answered({ handle: handles.give(path, { fingerprint: fingerprintOf(text) }), path, remark: null });
  try {
    if (dialogs === null) return written(await saver.createBeside(projectsFolder, clean, ending, text));
    const chosen = await dialogs.chooseSave(kind, join(projectsFolder, `${clean}${ending}`));
    if (chosen === null) return answered(null);
    if (extname(chosen).toLowerCase() === ending) {
      await saver.replace(chosen, text);
      return written(chosen);
    }
    // The dialog asked about another name than the one with its ending, so nothing of that name may be replaced.
    return written(await saver.createBeside(dirname(chosen), basename(chosen), ending, text));
  } catch (error) {
    return refused(diskTrouble(`The ${kind}`, 'saved', error));
  }
}
