import type { BlockBody, BlockContext } from './block-pages.ts';
import { changeListPages } from './change-list-pages.ts';
import { colophonPages } from './colophon-pages.ts';
import { howToReadPages } from './how-to-read-pages.ts';
import { normGroupPages } from './norm-group-pages.ts';
import { picturesPages } from './pictures-pages.ts';
import { technicalNotesPages } from './technical-notes-pages.ts';
import { titlePage } from './title-page.ts';
import { cautionsPages } from './cautions-pages.ts';
import { cutScoresPages } from './cut-scores-pages.ts';
import { groupsAcrossPages } from './groups-across-pages.ts';
import { inversePages } from './inverse-pages.ts';

/** The pages of a block other than the contents and the tables, which need to know the other blocks. */
export function blockBody(context: BlockContext): BlockBody {
  const { kind } = context.block;
  switch (kind) {
    case 'cautions':
      return cautionsPages(context);
    case 'groups-across':
      return groupsAcrossPages(context);
    case 'inverse':
      return inversePages(context);
    case 'cut-scores':
      return cutScoresPages(context);
    case 'title-page':
      return titlePage(context);
    case 'norm-group':
      return normGroupPages(context);
    case 'how-to-read':
      return howToReadPages(context);
    case 'pictures':
      return picturesPages(context);
    case 'technical-notes':
      return technicalNotesPages(context);
    case 'change-list':
      return changeListPages(context);
    case 'colophon':
      return colophonPages(context);
    case 'contents':
    case 'tables':
      throw new RangeError(`${kind} are not a block of their own`);
  }
}
