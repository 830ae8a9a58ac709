import { cutScoreText, cutsOfGroup, firstOnGoodSide } from '../norms/cuts.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { Cut, NormProject } from '../norms/norm-project.ts';
import { say, type BlockWords } from './block-words.ts';

/** What the rules between the rows of a group's table mark; null where no cut stands in it. */
export function cutNote(project: NormProject, { group }: GroupNorms, words: BlockWords): string | null {
  const { scale } = group.table;
  const named = cutsOfGroup(project, group.key)
    .filter(({ score }) => firstOnGoodSide(scale, score) !== null)
    .map((cut) => cutInWords(cut, cutScoreText(scale, cut.score), words));
  const [cut] = named;
  if (cut === undefined) return null;
  return named.length === 1 ? say(words, 'cuts.rule', { cut }) : say(words, 'cuts.rules', { cuts: named.join(', ') });
}

function cutInWords({ name }: Cut, score: string, words: BlockWords): string {
  const given = name.trim();
  return given === '' ? say(words, 'cuts.nameless', { score }) : say(words, 'cuts.named', { name: given, score });
}
