import type { BookletBlock } from '../norms/booklet-blocks.ts';
import { groupNoun } from '../norms/norm-groups.ts';
import type { NormProject } from '../norms/norm-project.ts';
import type { BlockBody, BlockContext } from './block-pages.ts';
import { say, type BlockWord, type BlockWords } from './block-words.ts';
import { cautionsPages } from './cautions-pages.ts';

/** The heading of a block as it is printed. */
export function blockHeading({ kind, heading }: BookletBlock, project: NormProject, words: BlockWords): string {
  const own = heading.trim();
  if (own !== '') return own;
  const noun = groupNoun(project.groups.documentation);
  const key: BlockWord = kind === 'norm-group' && noun === 'sample' ? 'block.sample' : `block.${kind}`;
  return say(words, key);
}

/** The pages of a block other than the contents and the tables, which need to know the other blocks. */
export function blockBody(context: BlockContext): BlockBody {
  const { kind } = context.block;
  switch (kind) {
    case 'cautions':
      return cautionsPages(context);
    case 'title-page':
    case 'norm-group':
    case 'how-to-read':
    case 'groups-across':
    case 'inverse':
    case 'cut-scores':
    case 'pictures':
    case 'technical-notes':
    case 'change-list':
    case 'colophon':
      return { pages: [], remarks: [] };
    case 'contents':
    case 'tables':
      throw new RangeError(`${kind} are not a block of their own`);
  }
}
