import { ENGLISH_WORDS, figure, say } from '../languages/phrases.ts';
import { parseOffset, type RankDefinition } from '../percentile/percentile-rank.ts';
import type { Direction } from '../scale/score-scale.ts';

/** The definition as commands and files write it: "midpoint", "plotting-position:3/8", "grouped:5". */
export function definitionKey(definition: RankDefinition): string {
  switch (definition.kind) {
    case 'plotting-position':
      return `plotting-position:${definition.offset}`;
    case 'grouped':
      return `grouped:${definition.width}`;
    default:
      return definition.kind;
  }
}

/** Reads what `definitionKey` writes; null for anything else. */
export function definitionFromKey(key: string): RankDefinition | null {
  const [kind, parameter, ...rest] = key.split(':');
  if (rest.length > 0) return null;
  switch (kind) {
    case 'midpoint':
    case 'at-or-below':
    case 'below':
      return parameter === undefined ? { kind } : null;
    case 'plotting-position':
      return parameter !== undefined && parseOffset(parameter) !== null ? { kind, offset: parameter } : null;
    case 'grouped': {
      const width = Number(parameter);
      return /^\d*\.?\d+$/.test(parameter ?? '') && Number.isFinite(width) && width > 0 ? { kind, width } : null;
    }
    default:
      return null;
  }
}

/** The definition in the middle of a sentence that begins "the share of the group scoring …". */
export function definitionInWords(definition: RankDefinition, direction: Direction, words = ENGLISH_WORDS): string {
  const worse = say(words, direction === 'high-is-good' ? 'worse.below' : 'worse.above');
  switch (definition.kind) {
    case 'midpoint':
    case 'at-or-below':
    case 'below':
      return say(words, `definition.${definition.kind}`, { worse });
    case 'plotting-position':
      return say(words, 'definition.plotting-position', { worse, offset: figure(words, definition.offset) });
    case 'grouped':
      return say(words, 'definition.grouped', { worse, width: figure(words, String(definition.width)) });
  }
}

/** Short name for the foot of a page. */
export function definitionName(definition: RankDefinition, words = ENGLISH_WORDS): string {
  switch (definition.kind) {
    case 'midpoint':
    case 'at-or-below':
    case 'below':
      return say(words, `definition-name.${definition.kind}`);
    case 'plotting-position':
      return say(words, 'definition-name.plotting-position', { offset: figure(words, definition.offset) });
    case 'grouped':
      return say(words, 'definition-name.grouped', { width: figure(words, String(definition.width)) });
  }
}
