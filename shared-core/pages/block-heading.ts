import { type PrintWords, say } from '../languages/phrases.ts';
import type { BookletBlock } from '../norms/booklet-blocks.ts';
import { groupNoun } from '../norms/norm-groups.ts';
import type { NormProject } from '../norms/norm-project.ts';

/** The heading of a block as it is printed. */
export function blockHeading({ kind, heading }: BookletBlock, project: NormProject, words: PrintWords): string {
  const own = heading.trim();
  if (own !== '') return own;
  switch (kind) {
    case 'title-page':
      return project.title.trim() || say(words, 'block.tables');
    case 'norm-group': {
      const norms = groupNoun(project.groups.documentation) === 'norm group';
      return say(words, norms ? 'block.norm-group' : 'block.sample');
    }
    default:
      return say(words, `block.${kind}`);
  }
}
