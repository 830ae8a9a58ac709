import { parseArgs, type ParseArgsConfig } from 'node:util';
import type { Reply } from '../../shared-core/desk.ts';
import type { OptionNames } from './option-names.ts';
import type { OptionValues } from './option-values.ts';

export interface Words {
  readonly values: OptionValues;
  readonly positionals: readonly string[];
}

/** Tells options from other words; the problem is a sentence about an option that is unknown, bare or given twice. */
export function readWords(words: readonly string[], options: OptionNames): Reply<Words> {
  const args = words.some((word) => word === '--') ? [...words] : withNegativeValues(words, options);
  const config = { args, options, strict: true, allowPositionals: true, tokens: true } satisfies ParseArgsConfig;
  try {
    const { values, positionals, tokens } = parseArgs(config);
    const names = tokens.flatMap((token) => (token.kind === 'option' ? [token.name] : []));
    const twice = names.find((name, index) => names.indexOf(name) !== index);
    if (twice !== undefined) return { ok: false, problem: `--${twice} is given twice.` };
    return { ok: true, value: { values, positionals } };
  } catch (error) {
    if (!(error instanceof TypeError) || !('code' in error) || !String(error.code).startsWith('ERR_PARSE_ARGS')) {
      throw error;
    }
    return { ok: false, problem: `${error.message.split(/[.\n]/, 1).join('')}.` };
  }
}

/** "--scale -5:5" becomes "--scale=-5:5": a value may begin with a minus sign before a digit. */
function withNegativeValues(words: readonly string[], options: OptionNames): string[] {
  const joined: string[] = [];
  for (const word of words) {
    const before = joined.at(-1);
    const takesValue = before?.startsWith('--') === true && options[before.slice(2)]?.type === 'string';
    if (takesValue && /^-[\d.]/.test(word)) joined.splice(-1, 1, `${before}=${word}`);
    else joined.push(word);
  }
  return joined;
}
