import type { NormProject } from './norm-project.ts';

/** Whether one person signed twice: the same name, whatever its blanks and capitals. */
export function signedByOne({ release }: Pick<NormProject, 'release'>): boolean {
  const [analyst, checker] = [release.analyst, release.checker].map(asPerson);
  return analyst !== '' && analyst === checker;
}

function asPerson(name: string): string {
  return name.normalize('NFKC').replace(/\s+/g, ' ').trim().toLowerCase();
}
