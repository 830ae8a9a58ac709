import type { Direction } from '../scale/score-scale.ts';
import type { Explanation, WhyDiffer } from './why-differ.ts';
import { conventionInWords } from './why-differ-conventions.ts';
import { endRules, endsInWords, ROUNDING_RULES, roundingInWords } from './why-differ-rules.ts';

/** "whole numbers", "numbers of 1 decimal" */
function decimalsInWords(decimals: number): string {
  if (decimals === 0) return 'whole numbers';
  return `numbers of ${decimals} ${decimals === 1 ? 'decimal' : 'decimals'}`;
}

function either(texts: readonly string[]): string {
  if (texts.length < 2) return texts[0] ?? '';
  return `${texts.slice(0, -1).join(', ')} or ${texts.at(-1) ?? ''}`;
}

/**
 * One explanation: "scoring below, plus half of those at the same score; whole numbers, halves rounded up; held between 1
 * and 99". What the rows cannot tell is not guessed at.
 */
export function explanationInWords({ applied, ways }: Explanation, direction: Direction, decimals: number): string {
  const roundings = [...new Set(ways.map(({ rounding }) => roundingInWords(rounding)))];
  const ends = [...new Set(ways.map((way) => endsInWords(way.ends, decimals)))];
  const rounded = roundings.length === ROUNDING_RULES.length ? 'the same however rounded' : either(roundings);
  const ended = ends.length === endRules(decimals).length ? 'no rank so near an end that its rule shows' : either(ends);
  return `${conventionInWords(applied, direction)}; ${decimalsInWords(decimals)}, ${rounded}; ${ended}`;
}

/** The finding in one or two sentences, for screen and terminal. */
export function findingInWords(found: WhyDiffer, direction: Direction, decimals: number): string {
  const ranks = `${found.compared} ${found.compared === 1 ? 'rank' : 'ranks'}`;
  if (found.kind === 'reproduced') {
    const [first, ...others] = found.explanations;
    if (first === undefined) throw new RangeError('reproduced by nothing');
    const more = others.length === 1 ? 'One other convention gives' : `${others.length} other conventions give`;
    const also = others.length === 0 ? '' : ` ${more} the same ${ranks}.`;
    const all = found.compared === 1 ? 'The one rank is' : `All ${ranks} are`;
    return `${all} reproduced by: ${explanationInWords(first, direction, decimals)}.${also}`;
  }
  const missed = found.disagreeing.length;
  const nearest = explanationInWords(found.explanation, direction, decimals);
  return `Nothing known here reproduces all ${ranks}. The nearest misses ${missed}: ${nearest}.`;
}
