import type { GivenFile } from '../desk.ts';

/** Endings of the files that hold a whole project: as it is worked on, and as it was frozen at release. */
export const PROJECT_ENDING = '.normloom';
export const EDITION_ENDING = '.normedition';
/** Ending of the files that hold a class. */
export const CLASS_ENDING = '.normclass';

/** What a file from outside the program is opened as, by its name; whatever has no ending of ours is a cohort file. */
export function givenKind(name: string): GivenFile['kind'] {
  if (opensAsClass(name)) return 'class';
  return opensAsProject(name) ? 'project' : 'cohort';
}

/** Whether a file is opened as a project by its name; every other file is taken for a cohort file. */
export function opensAsProject(name: string): boolean {
  const plain = name.toLowerCase();
  return plain.endsWith(PROJECT_ENDING) || plain.endsWith(EDITION_ENDING);
}

/** Whether a file is opened as a class by its name. */
export function opensAsClass(name: string): boolean {
  return name.toLowerCase().endsWith(CLASS_ENDING);
}
