import type { FilledPart } from '../../../shared-core/languages/placeholders.ts';
import { squeezed } from './read-text.ts';

/**
 * How a printed phrase looks without spaces: its words, and in the place of each value a pattern, which becomes a group
 * of the name. A value without a pattern is any text, and no group.
 */
export function phrasePattern(
  parts: readonly FilledPart[],
  patterns: Readonly<Record<string, string>>,
  where: 'whole' | 'part' = 'whole',
): RegExp {
  const source = parts
    .map(({ text, placeholder }) => {
      if (placeholder === null) return squeezed(text).replace(/[\\^$.*+?()[\]{}|/-]/g, '\\$&');
      const pattern = patterns[placeholder];
      return pattern === undefined ? '.*' : `(?<${placeholder}>${pattern})`;
    })
    .join('');
  return new RegExp(where === 'whole' ? `^${source}$` : source, 'u');
}
