import { statSync } from 'node:fs';
import { resolve } from 'node:path';

const isFile = (path: string): boolean => statSync(path, { throwIfNoEntry: false })?.isFile() ?? false;

/**
 * The file that a command line asks to open, as an absolute path; null when it names none. `words` are the arguments
 * after the program's own name; switches and folders are passed over, since Electron and Chromium add theirs.
 */
export const fileToOpen = (words: readonly string[], folder: string): string | null => {
  const paths = words.filter((word) => !word.startsWith('-')).map((word) => resolve(folder, word));
  return paths.findLast(isFile) ?? null;
};
