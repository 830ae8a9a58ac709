import { homedir } from 'node:os';
import { isAbsolute, relative } from 'node:path';

/** A folder as a person at this machine would write it: the home folder as ~. */
export function asCalledHere(folder: string): string {
  if (process.platform === 'win32') return folder;
  const below = relative(homedir(), folder);
  return below === '' || below.startsWith('..') || isAbsolute(below) ? folder : `~/${below}`;
}
