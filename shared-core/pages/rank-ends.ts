import { figure, type PrintWords, say } from '../languages/phrases.ts';
import type { NormSet } from '../norms/norm-set.ts';

/** The least and the greatest rank that print as numbers, and what stands beyond them. */
function endTexts(
  { project }: NormSet,
  words: PrintWords,
): Readonly<Record<'low' | 'high' | 'least' | 'most', string>> {
  const [least, most] = project.table.decimals === 0 ? ['1', '99'] : [figure(words, '0.1'), figure(words, '99.9')];
  return { low: `<${least}`, high: `>${most}`, least, most };
}

/** "<1 and >99", or the ends at which ranks are held. */
export function endsHead(normSet: NormSet, words: PrintWords): string {
  const { low, high, least, most } = endTexts(normSet, words);
  const signs = normSet.project.table.ends === 'signs';
  return say(words, 'how.ends', signs ? { low, high } : { low: least, high: most });
}

/** What is printed at the ends of a table, and why. */
export function endsText(normSet: NormSet, words: PrintWords): string {
  const { low, high, least, most } = endTexts(normSet, words);
  return normSet.project.table.ends === 'signs'
    ? say(words, 'how.ends-signs', { low, high, least, most })
    : say(words, 'how.ends-held', { least, most });
}
