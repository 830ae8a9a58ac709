import { describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { recipeOf, recipeScore } from '../../../shared-core/second-engine/recipe.ts';
import { sampleNormSet } from '../pages/sample-norm-set.ts';

/** Ten pupils on 0 to 4: 1, 2, 4, 2, 1; with weights each person weighs 1.5, 1.0, 2.0, 1.0 and 0.5 by score. */
function small(
  definition: RankDefinition,
  weighted = false,
  direction: 'high-is-good' | 'low-is-good' = 'high-is-good',
  table: Partial<NormProject['table']> = {},
) {
  const counts = [1, 2, 4, 2, 1];
  const weights = [15, 20, 80, 20, 5];
  const squares = [225, 200, 1600, 200, 25];
  return sampleNormSet({ scale: { min: 0, max: 4, step: 1 }, groups: ['4'] }, (project) => ({
    ...project,
    tally: {
      scale: { min: 0, max: 4, step: 1, direction },
      groupColumns: ['grade'],
      weightDecimals: weighted ? 1 : null,
      cells: [
        {
          values: ['4'],
          counts,
          weights: weighted ? weights.map(String) : null,
          squares: weighted ? squares.map(String) : null,
          clusters: null,
        },
      ],
    },
    curve: { ...project.curve, definition },
    table: { ...project.table, ...table },
  }));
}

describe('recipeOf', () => {
  it('redoes a midpoint rank from the counts', () => {
    expect(recipeOf(small({ kind: 'midpoint' }), 0, 3)).toEqual([
      'Take the 10 pupils of Grade 4 and the raw score 3.',
      'Count those with a lower score: 7. Count those with this score: 2.',
      'Add half of the second number to the first: 8.',
      'Divide by 10 and multiply by 100: 80.',
      'Round to a whole number, a half upwards. That gives 80.',
      'The table prints 80.',
    ]);
  });

  it('names the side, the weights and the ends of the table', () => {
    expect(recipeOf(small({ kind: 'at-or-below' }, true, 'low-is-good', { decimals: 1 }), 0, 1)).toEqual([
      'Take the 10 pupils of Grade 4, whose weights add up to 14, and the raw score 1.',
      'Add up the weights of those with a higher score: 10.5; and of those with this score: 2.',
      'Add both numbers: 12.5.',
      'Divide by 14 and multiply by 100: 89.2857…',
      'Round to one decimal, a half upwards. That gives 89.3.',
      'The table prints 89.3.',
    ]);
    expect(recipeOf(small({ kind: 'below' }), 0, 0).slice(-3)).toEqual([
      'Divide by 10 and multiply by 100: 0.',
      'Below 1 prints as <1, above 99 as >99. That gives <1.',
      'The table prints <1.',
    ]);
    const held = small({ kind: 'below' }, false, 'high-is-good', { ends: 'held', rounding: 'half-even' });
    expect(recipeOf(held, 0, 0).at(-2)).toBe(
      'Round to a whole number, a half to the even digit, held between 1 and 99. That gives 1.',
    );
  });

  it('redoes plotting positions and classes', () => {
    expect(recipeOf(small({ kind: 'plotting-position', offset: '3/8' }), 0, 3).slice(2, 4)).toEqual([
      'Add half of the second number to the first and add 1/2: the mean rank r is 8.5.',
      'With a = 3/8, 100 (r − a)/(10 + 1 − 2a) is 79.2682… (held between 0 and 100).',
    ]);
    expect(recipeOf(small({ kind: 'plotting-position', offset: '0' }, true), 0, 3)[2]).toBe(
      'Add half of the second number to the first, multiply by 10/14 and add 1/2: the mean rank r is 9.4285…',
    );
    expect(recipeOf(small({ kind: 'grouped', width: 2 }, false, 'low-is-good'), 0, 1).slice(2, 5)).toEqual([
      'Classes of 2 scores are laid from the poor end of the scale; this score is number 2 in its class, and its middle lies 3/4 of the way through it.',
      'In poorer classes stand 3, in this class 6: add that part of the second to the first.',
      'Divide by 10 and multiply by 100: 75.',
    ]);
  });

  it('shows the score that most people obtained, and throws on one that is not there', () => {
    const set = small({ kind: 'midpoint' });
    const [four] = set.groups;
    if (four === undefined) throw new Error('no group');
    expect(recipeScore(four)).toBe(2);
    expect(() => recipeOf(set, 0, 7)).toThrow('no such row');
    expect(() => recipeOf(set, 1, 2)).toThrow('no such row');
  });
});
