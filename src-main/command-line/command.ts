import type { Reply } from '../../shared-core/desk.ts';
import { differOptions, type DifferOptions } from './differ-options.ts';
import { DIFFER, GENERAL, PRESS, READ_BACK, TABLE, type OptionNames } from './option-names.ts';
import { textGiven, type OptionValues } from './option-values.ts';
import { readBackOptions, type ReadBackOptions } from './read-back-options.ts';
import { readWords } from './read-words.ts';
import { tableOptions, type TableOptions } from './table-options.ts';

/** What the words after the program's name ask for. */
export type Command =
  | { readonly kind: 'help' }
  | { readonly kind: 'version' }
  | { readonly kind: 'table'; readonly path: string; readonly options: TableOptions }
  | { readonly kind: 'differ'; readonly path: string; readonly options: DifferOptions }
  | { readonly kind: 'press'; readonly path: string; readonly into: string }
  | { readonly kind: 'read-back'; readonly paths: readonly string[]; readonly options: ReadBackOptions };

/** Reads the words; the problem is a sentence about what is wrong with them. */
export function readCommand(words: readonly string[]): Reply<Command> {
  const [name, ...others] = words;
  switch (name) {
    case 'table':
      return readFileCommand(others, TABLE, 'table takes one file', (path, values) => {
        const options = tableOptions(values);
        return options.ok ? { ok: true, value: { kind: 'table', path, options: options.value } } : options;
      });
    case 'differ':
      return readFileCommand(others, DIFFER, 'differ takes one file', (path, values) => {
        const options = differOptions(values);
        return options.ok ? { ok: true, value: { kind: 'differ', path, options: options.value } } : options;
      });
    case 'press':
      return readFileCommand(others, PRESS, 'press takes one project', (path, values) => {
        const into = textGiven(values, 'into') ?? '';
        return into === ''
          ? wrong('Tell where to press with --into FOLDER.')
          : { ok: true, value: { kind: 'press', path, into } };
      });
    case 'read-back':
      return readReadBack(others);
    default: {
      const read = readWords(words, GENERAL);
      if (!read.ok) return read;
      const general = generalCommand(read.value.values);
      if (general !== null) return { ok: true, value: general };
      return wrong(
        name === undefined ? 'Tell what to do: table, differ, press or read-back.' : `There is no command "${name}".`,
      );
    }
  }
}

/** A command that works on one file; help and version come before all else. */
function readFileCommand(
  words: readonly string[],
  names: OptionNames,
  takes: string,
  commandOn: (path: string, values: OptionValues) => Reply<Command>,
): Reply<Command> {
  const read = readWords(words, names);
  if (!read.ok) return read;
  const { values, positionals } = read.value;
  const general = generalCommand(values);
  if (general !== null) return { ok: true, value: general };
  const [path] = positionals;
  if (path === undefined || positionals.length > 1) {
    return wrong(`${takes}, not ${positionals.length}. Put names with spaces in quotes.`);
  }
  return commandOn(path, values);
}

function readReadBack(words: readonly string[]): Reply<Command> {
  const read = readWords(words, READ_BACK);
  if (!read.ok) return read;
  const { values, positionals } = read.value;
  const general = generalCommand(values);
  if (general !== null) return { ok: true, value: general };
  if (positionals.length === 0) return wrong('read-back takes at least one pressed file.');
  const options = readBackOptions(values);
  return options.ok ? { ok: true, value: { kind: 'read-back', paths: positionals, options: options.value } } : options;
}

function generalCommand(values: OptionValues): Command | null {
  if (values['help'] === true) return { kind: 'help' };
  return values['version'] === true ? { kind: 'version' } : null;
}

function wrong<T>(problem: string): Reply<T> {
  return { ok: false, problem };
}
