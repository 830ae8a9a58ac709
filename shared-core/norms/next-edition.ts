import type { FrozenEdition } from './edition-file.ts';
import type { NormProject } from './norm-project.ts';

/** Longest number of an edition that the project file takes. */
const LONGEST = 40;

/**
 * The project that goes on from a released edition: its choices and its tally, a number above the released one, nobody's
 * signature, and the released edition named as the one that changes are told against.
 */
export function nextEdition({ project, edition, date, check }: FrozenEdition): NormProject {
  return {
    ...project,
    release: {
      ...project.release,
      edition: raisedEdition(edition),
      analyst: '',
      checker: '',
      changes: { edition, date, check, lines: [] },
    },
  };
}

/** "1.0" → "1.1", "2.9" → "2.10", "Autumn" → "Autumn.1": one more behind the last point, which is begun where there is none. */
export function raisedEdition(edition: string): string {
  const [, before, number] = /^(.*\.)(\d{1,9})$/.exec(edition) ?? [];
  const raised = before === undefined ? `${edition.trim()}.1` : `${before}${Number(number) + 1}`;
  return raised.length > LONGEST ? edition : raised;
}
