import { describe, expect, it } from 'vitest';
import {
  definitionFromKey,
  definitionInWords,
  definitionKey,
  definitionName,
} from '../../../shared-core/norms/definitions.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';

const ALL: readonly (readonly [string, RankDefinition])[] = [
  ['midpoint', { kind: 'midpoint' }],
  ['at-or-below', { kind: 'at-or-below' }],
  ['below', { kind: 'below' }],
  ['plotting-position:3/8', { kind: 'plotting-position', offset: '3/8' }],
  ['plotting-position:0.375', { kind: 'plotting-position', offset: '0.375' }],
  ['plotting-position:0', { kind: 'plotting-position', offset: '0' }],
  ['grouped:5', { kind: 'grouped', width: 5 }],
  ['grouped:2.5', { kind: 'grouped', width: 2.5 }],
];

describe('keys of definitions', () => {
  it.each(ALL)('%s is written and read', (key, definition) => {
    expect(definitionKey(definition)).toBe(key);
    expect(definitionFromKey(key)).toEqual(definition);
  });

  it.each([
    '',
    'mid',
    'Midpoint',
    'midpoint:1',
    'below:',
    'plotting-position',
    'plotting-position:',
    'plotting-position:1',
    'plotting-position:-0.1',
    'plotting-position:1/0',
    'plotting-position:3/8:2',
    'grouped',
    'grouped:',
    'grouped: ',
    'grouped:0',
    'grouped:-5',
    'grouped:five',
    'grouped:0x10',
    'grouped:Infinity',
  ])('"%s" is none', (key) => {
    expect(definitionFromKey(key)).toBeNull();
  });

  it('have words of their own in both directions', () => {
    for (const direction of ['high-is-good', 'low-is-good'] as const) {
      const words = ALL.map(([, definition]) => definitionInWords(definition, direction));
      expect(new Set(words).size).toBe(ALL.length);
      expect(words.every((text) => text.includes(direction === 'high-is-good' ? 'below' : 'above'))).toBe(true);
    }
    expect(new Set(ALL.map(([, definition]) => definitionName(definition))).size).toBe(ALL.length);
  });
});
