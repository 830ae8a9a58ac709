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
export function definitionInWords(definition: RankDefinition, direction: Direction): string {
  const worse = direction === 'high-is-good' ? 'below' : 'above';
  switch (definition.kind) {
    case 'midpoint':
      return `${worse}, plus half of those at the same score`;
    case 'at-or-below':
      return `at the same score or ${worse}`;
    case 'below':
      return `${worse} that score`;
    case 'plotting-position':
      return `${worse}, by mean rank (r − a)/(N + 1 − 2a) with a = ${definition.offset}`;
    case 'grouped':
      return `${worse}, interpolated in classes of ${definition.width} points between exact limits`;
  }
}

/** Short name for the foot of a page. */
export function definitionName(definition: RankDefinition): string {
  switch (definition.kind) {
    case 'midpoint':
      return 'midpoint';
    case 'at-or-below':
      return 'at or below';
    case 'below':
      return 'below';
    case 'plotting-position':
      return `plotting position, a = ${definition.offset}`;
    case 'grouped':
      return `grouped by ${definition.width}`;
  }
}
