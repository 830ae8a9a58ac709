import { parseArgs, type ParseArgsConfig } from 'node:util';
import type { Reply } from '../../shared-core/desk.ts';
import { tableOptions, type TableOptions } from './table-options.ts';

/** What the words after the program's name ask for. */
export type Command =
  | { readonly kind: 'help' }
  | { readonly kind: 'version' }
  | { readonly kind: 'table'; readonly path: string; readonly options: TableOptions }
  | { readonly kind: 'press'; readonly path: string; readonly into: string };

const text = { type: 'string' } as const;
const flag = { type: 'boolean' } as const;

const GENERAL = { help: flag, version: flag } as const;

const TABLE = {
  ...GENERAL,
  score: text,
  count: text,
  weight: text,
  id: text,
  by: text,
  scale: text,
  'low-is-good': flag,
  missing: text,
  definition: text,
  points: text,
  'point-definition': text,
  columns: text,
  format: text,
} as const;

const PRESS = { ...GENERAL, into: text } as const;

/** Reads the words; the problem is a sentence about what is wrong with them. */
export function readCommand(words: readonly string[]): Reply<Command> {
  const [name] = words;
  if (name === 'table') return readTable(words.slice(1));
  if (name === 'press') return readPress(words.slice(1));
  const read = readWords(words, GENERAL);
  if (!read.ok) return read;
  if (read.value.values['help'] === true) return { ok: true, value: { kind: 'help' } };
  if (read.value.values['version'] === true) return { ok: true, value: { kind: 'version' } };
  return wrong(name === undefined ? 'Tell what to do: table or press.' : `There is no command "${name}".`);
}

function readTable(words: readonly string[]): Reply<Command> {
  const read = readWords(words, TABLE);
  if (!read.ok) return read;
  const { values, positionals } = read.value;
  const general = generalCommand(values);
  if (general !== null) return { ok: true, value: general };
  const [path] = positionals;
  if (path === undefined || positionals.length > 1) {
    return wrong(`table takes one file, not ${positionals.length}. Put names with spaces in quotes.`);
  }
  const options = tableOptions(values);
  return options.ok ? { ok: true, value: { kind: 'table', path, options: options.value } } : options;
}

function readPress(words: readonly string[]): Reply<Command> {
  const read = readWords(words, PRESS);
  if (!read.ok) return read;
  const { values, positionals } = read.value;
  const general = generalCommand(values);
  if (general !== null) return { ok: true, value: general };
  const [path] = positionals;
  if (path === undefined || positionals.length > 1) {
    return wrong(`press takes one project, not ${positionals.length}. Put names with spaces in quotes.`);
  }
  const into = values['into'];
  if (typeof into !== 'string' || into === '') return wrong('Tell where to press with --into FOLDER.');
  return { ok: true, value: { kind: 'press', path, into } };
}

function generalCommand(values: OptionValues): Command | null {
  if (values['help'] === true) return { kind: 'help' };
  return values['version'] === true ? { kind: 'version' } : null;
}

export type OptionValues = Readonly<Record<string, string | boolean | undefined>>;

interface Words {
  readonly values: OptionValues;
  readonly positionals: readonly string[];
}

type Options = Readonly<Record<string, { readonly type: 'string' | 'boolean' }>>;

function readWords(words: readonly string[], options: Options): Reply<Words> {
  const args = words.some((word) => word === '--') ? [...words] : withNegativeValues(words, options);
  const config = { args, options, strict: true, allowPositionals: true, tokens: true } satisfies ParseArgsConfig;
  try {
    const { values, positionals, tokens } = parseArgs(config);
    const names = tokens.flatMap((token) => (token.kind === 'option' ? [token.name] : []));
    const twice = names.find((name, index) => names.indexOf(name) !== index);
    if (twice !== undefined) return wrong(`--${twice} is given twice.`);
    return { ok: true, value: { values, positionals } };
  } catch (error) {
    if (!(error instanceof TypeError) || !('code' in error) || !String(error.code).startsWith('ERR_PARSE_ARGS')) {
      throw error;
    }
    return wrong(`${error.message.split(/[.\n]/, 1).join('')}.`);
  }
}

/** "--scale -5:5" becomes "--scale=-5:5": a value may begin with a minus sign before a digit. */
function withNegativeValues(words: readonly string[], options: Options): string[] {
  const joined: string[] = [];
  for (const word of words) {
    const before = joined.at(-1);
    const takesValue = before?.startsWith('--') === true && options[before.slice(2)]?.type === 'string';
    if (takesValue && /^-[\d.]/.test(word)) joined.splice(-1, 1, `${before}=${word}`);
    else joined.push(word);
  }
  return joined;
}

function wrong<T>(problem: string): Reply<T> {
  return { ok: false, problem };
}
