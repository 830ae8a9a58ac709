import type { Reply } from '../../shared-core/desk.ts';
import { oneOf, readOrSay, textGiven, type OptionValues } from './option-values.ts';

const FORMATS = ['text', 'json'] as const;

export type QueriesFormat = (typeof FORMATS)[number];

/** How the queries are to be listed; the problem says which option to change and how. */
export function queriesOptions(values: OptionValues): Reply<QueriesFormat> {
  return readOrSay(() => oneOf('format', FORMATS, textGiven(values, 'format') ?? 'text'));
}
