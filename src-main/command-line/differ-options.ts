import type { Reply } from '../../shared-core/desk.ts';
import { cohortOptions, type CohortOptions } from './cohort-options.ts';
import { listOf, oneOf, readOrSay, textGiven, WrongOption, type OptionValues } from './option-values.ts';

const FORMATS = ['text', 'json'] as const;

export interface DifferOptions extends CohortOptions {
  /** Values of the group whose ranks are compared, one for each column of `named.by`. */
  readonly group: readonly string[];
  /** Path of the file with somebody's ranks. */
  readonly ranks: string;
  readonly format: (typeof FORMATS)[number];
}

/** Turns the texts of the options into what they mean; the problem says which option to change and how. */
export function differOptions(values: OptionValues): Reply<DifferOptions> {
  return readOrSay(() => {
    const cohort = cohortOptions(values);
    const ranks = textGiven(values, 'ranks') ?? '';
    if (ranks === '') throw new WrongOption('Tell which file holds the other ranks with --ranks RANKFILE.');
    const format = oneOf('format', FORMATS, textGiven(values, 'format') ?? 'text');
    return { ...cohort, group: groupGiven(values, cohort.named.by), ranks, format };
  });
}

function groupGiven(values: OptionValues, by: readonly string[]): readonly string[] {
  const text = textGiven(values, 'group');
  if (by.length === 0) {
    if (text !== null) throw new WrongOption('--group needs --by COL, the column that holds its value.');
    return [];
  }
  if (text === null) throw new WrongOption('--by needs --group VALUE: ranks are compared with one group.');
  const group = listOf('group', text);
  if (group.length === by.length) return group;
  throw new WrongOption(`--group holds one value for each column of --by: ${by.length}, not ${group.length}.`);
}
