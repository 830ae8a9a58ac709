import type { BlockKind } from './booklet-blocks.ts';
import { normGroups } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';

/** What a block is called in the program; the booklet prints its heading. */
export const BLOCK_NAMES: Readonly<Record<BlockKind, string>> = {
  'title-page': 'Title page',
  contents: 'Contents',
  'norm-group': 'Norm group',
  'how-to-read': 'How to read the tables',
  tables: 'Tables',
  'groups-across': 'Groups side by side',
  inverse: 'Inverse table',
  'cut-scores': 'Cut scores',
  pictures: 'Pictures',
  'technical-notes': 'Technical notes',
  cautions: 'Cautions',
  'change-list': 'Change list',
  colophon: 'Colophon',
};

/** What a block holds, in one sentence; for one that would print nothing yet, why. */
export function blockHolds(project: NormProject, kind: BlockKind): string {
  switch (kind) {
    case 'title-page':
      return 'Title, form or season, edition and date.';
    case 'contents':
      return 'What stands on which page.';
    case 'norm-group':
      return 'Who was tested, how, and the facts of each group.';
    case 'how-to-read':
      return 'What a percentile rank tells, with an example.';
    case 'tables': {
      const count = normGroups(project).filter(({ printed }) => printed).length;
      return count === 1 ? 'One sheet for the one table.' : `A sheet for each of ${count} tables.`;
    }
    case 'groups-across':
      return 'The ranks of all groups in one table.';
    case 'inverse':
      return 'Raw scores that reach certain percentiles.';
    case 'cut-scores':
      return cutsInWords(project.cuts.length);
    case 'pictures':
      return 'Ogives and box plots of the groups.';
    case 'technical-notes':
      return 'Definition, smoothing and errors, in full.';
    case 'cautions':
      return 'What the tables must not be used for.';
    case 'change-list':
      return project.release.changes === null
        ? 'Prints nothing yet: no edition was compared.'
        : `What changed since edition ${project.release.changes.edition}.`;
    case 'colophon':
      return 'Fingerprint, versions and the check code.';
  }
}

function cutsInWords(count: number): string {
  if (count === 0) return 'Prints nothing yet: no cut score is named.';
  return count === 1
    ? 'One raw score that decides, with its ranks.'
    : `${count} raw scores that decide, with their ranks.`;
}

/** The printed blocks in print order, as a list of their names; empty for none. */
export function blocksInWords(project: NormProject): string {
  return project.sheet.blocks
    .filter(({ printed }) => printed)
    .map(({ kind }) => BLOCK_NAMES[kind].toLowerCase())
    .join(', ');
}
