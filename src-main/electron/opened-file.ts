import { statSync } from 'node:fs';
import { resolve } from 'node:path';
import { opensAsProject } from '../../shared-core/norms/file-endings.ts';

const isFile = (path: string): boolean => statSync(path, { throwIfNoEntry: false })?.isFile() ?? false;

/**
 * The file that a command line asks to open, as an absolute path; null when it names none. `words` are the arguments
 * after the program's own name; switches and folders are passed over, since Electron and Chromium add theirs.
 */
export const fileToOpen = (words: readonly string[], folder: string): string | null => {
  const paths = words.filter((word) => !word.startsWith('-')).map((word) => resolve(folder, word));
  return paths.findLast(isFile) ?? null;
};

/** Projects and released editions are known by their endings; every other file is taken for a cohort file. */
export const openedKind = (path: string): 'project' | 'cohort' => (opensAsProject(path) ? 'project' : 'cohort');
