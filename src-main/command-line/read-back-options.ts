import type { Reply } from '../../shared-core/desk.ts';
import { oneOf, readOrSay, textGiven, WrongOption, type OptionValues } from './option-values.ts';

const FORMATS = ['text', 'json'] as const;

export interface ReadBackOptions {
  /** Path of the project that the files were pressed from. */
  readonly against: string;
  readonly format: (typeof FORMATS)[number];
}

export function readBackOptions(values: OptionValues): Reply<ReadBackOptions> {
  return readOrSay(() => {
    const against = textGiven(values, 'against') ?? '';
    if (against === '') throw new WrongOption('Tell which project the files are compared with: --against PROJECT.');
    return { against, format: oneOf('format', FORMATS, textGiven(values, 'format') ?? 'text') };
  });
}
