import type { Direction } from '../scale/score-scale.ts';
import type { Explanation, WhyDiffer } from './why-differ.ts';
import { conventionInWords } from './why-differ-conventions.ts';
import { endsInWords, roundingInWords } from './why-differ-rules.ts';

/** "whole numbers", "numbers of 1 decimal" */
function decimalsInWords(decimals: number): string {
  if (decimals === 0) return 'whole numbers';
  return `numbers of ${decimals} ${decimals === 1 ? 'decimal' : 'decimals'}`;
}

function either(texts: readonly string[]): string {
  const different = [...new Set(texts)];
  if (different.length < 2) return different[0] ?? '';
  return `${different.slice(0, -1).join(', ')} or ${different.at(-1) ?? ''}`;
}

/** One explanation: "people below the score, divided by N − 1 …; whole numbers, halves rounded up; held between 1 and 99". */
export function explanationInWords({ applied, ways }: Explanation, direction: Direction, decimals: number): string {
  const roundings = either(ways.map(({ rounding }) => roundingInWords(rounding)));
  const ends = either(ways.map((way) => endsInWords(way.ends, decimals)));
  return `${conventionInWords(applied, direction)}; ${decimalsInWords(decimals)}, ${roundings}; ${ends}`;
}

/** The finding in one or two sentences, for screen and terminal. */
export function findingInWords(found: WhyDiffer, direction: Direction, decimals: number): string {
  const ranks = `${found.compared} ${found.compared === 1 ? 'rank' : 'ranks'}`;
  if (found.kind === 'reproduced') {
    const [first, ...others] = found.explanations;
    if (first === undefined) throw new RangeError('reproduced by nothing');
    const more = others.length === 1 ? 'One other convention gives' : `${others.length} other conventions give`;
    const also = others.length === 0 ? '' : ` ${more} the same ${ranks}.`;
    return `All ${ranks} are reproduced by: ${explanationInWords(first, direction, decimals)}.${also}`;
  }
  const missed = found.disagreeing.length;
  const nearest = explanationInWords(found.explanation, direction, decimals);
  return `Nothing known here reproduces all ${ranks}. The nearest misses ${missed}: ${nearest}.`;
}
