import type { NormProject } from './norm-project.ts';
import type { Asked } from './queries.ts';
import { signedByOne } from './signatures.ts';

/**
 * What a proof-reader would ask of the edition itself: who signed it, and whether its number is its own. `check` is the
 * code that its pages carry once it is released.
 */
export function editionQueries(project: NormProject, check: string): readonly Asked[] {
  return [...signatureQueries(project), ...numberQueries(project, check)];
}

function signatureQueries(project: NormProject): readonly Asked[] {
  const { analyst, checker } = project.release;
  const about = { station: 'release', weight: 'should', group: null } as const;
  if (analyst.trim() === '' || checker.trim() === '') {
    return [
      {
        ...about,
        id: 'unsigned',
        lead: 'The edition is not signed.',
        why: 'A reader cannot tell who answers for the tables, and whether anybody looked them over.',
        whatToDo: 'Let who prepared the tables and who checked them sign in the statement.',
      },
    ];
  }
  if (!signedByOne(project)) return [];
  return [
    {
      ...about,
      id: 'same-signature',
      lead: 'One person signs as analyst and as checker.',
      why: 'Nobody finds all of their own mistakes.',
      whatToDo: 'Let somebody else check the tables and sign.',
    },
  ];
}

/** Two different editions must not be told apart by their check codes alone. */
function numberQueries({ release }: NormProject, check: string): readonly Asked[] {
  const { changes, edition } = release;
  if (changes === null || changes.edition.trim() !== edition.trim() || changes.check === check) return [];
  return [
    {
      id: 'same-edition-number',
      station: 'release',
      weight: 'must',
      group: null,
      lead: `There is an edition ${edition.trim()} already, and it prints something else.`,
      why: `Its check code is ${changes.check}, this one’s would be ${check}: whoever holds both cannot tell which is right.`,
      whatToDo: 'Raise the number of this edition.',
    },
  ];
}
