import type { Reply } from '../../shared-core/desk.ts';
import { classOptions, type ClassOptions } from './class-options.ts';
import { COMPARE_FORMATS, type CompareFormat } from './compare-command.ts';
import { differOptions, type DifferOptions } from './differ-options.ts';
import type { EditionPaths } from './edition-pair.ts';
import { erratumOptions, type ErratumOptions } from './erratum-options.ts';
import {
  CLASS,
  COMPARE,
  DIFFER,
  ERRATUM,
  GENERAL,
  PRESS,
  QUERIES,
  READ_BACK,
  RELEASE,
  TABLE,
  type OptionNames,
} from './option-names.ts';
import { oneOf, readOrSay, textGiven, type OptionValues } from './option-values.ts';
import { queriesOptions, type QueriesFormat } from './queries-options.ts';
import { readBackOptions, type ReadBackOptions } from './read-back-options.ts';
import type { Signatures } from './release-command.ts';
import { readWords } from './read-words.ts';
import { tableOptions, type TableOptions } from './table-options.ts';

/** What the words after the program's name ask for. */
export type Command =
  | { readonly kind: 'help' }
  | { readonly kind: 'version' }
  | { readonly kind: 'table'; readonly path: string; readonly options: TableOptions }
  | { readonly kind: 'differ'; readonly path: string; readonly options: DifferOptions }
  | { readonly kind: 'press'; readonly path: string; readonly into: string }
  | { readonly kind: 'release'; readonly path: string; readonly into: string; readonly signatures: Signatures }
  | { readonly kind: 'read-back'; readonly paths: readonly string[]; readonly options: ReadBackOptions }
  | { readonly kind: 'queries'; readonly path: string; readonly format: QueriesFormat }
  | { readonly kind: 'compare'; readonly paths: EditionPaths; readonly format: CompareFormat }
  | { readonly kind: 'class'; readonly path: string; readonly options: ClassOptions }
  | { readonly kind: 'erratum'; readonly paths: EditionPaths; readonly options: ErratumOptions };

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
    case 'release':
      return readFileCommand(others, RELEASE, 'release takes one project', (path, values) => {
        const into = textGiven(values, 'into') ?? '';
        const signatures = { analyst: textGiven(values, 'analyst'), checker: textGiven(values, 'checker') };
        return into === ''
          ? wrong('Tell where the edition is released to with --into FOLDER.')
          : { ok: true, value: { kind: 'release', path, into, signatures } };
      });
    case 'read-back':
      return readFilesCommand(others, READ_BACK, (paths, values) => {
        if (paths.length === 0) return wrong('read-back takes at least one pressed file.');
        const options = readBackOptions(values);
        return options.ok ? { ok: true, value: { kind: 'read-back', paths, options: options.value } } : options;
      });
    case 'compare':
      return readPairCommand(others, COMPARE, 'compare takes two projects', (paths, values) =>
        readOrSay(() => {
          const format = oneOf('format', COMPARE_FORMATS, textGiven(values, 'format') ?? 'text');
          return { kind: 'compare', paths, format };
        }),
      );
    case 'erratum':
      return readPairCommand(others, ERRATUM, 'erratum takes two projects', (paths, values) => {
        const options = erratumOptions(values);
        return options.ok ? { ok: true, value: { kind: 'erratum', paths, options: options.value } } : options;
      });
    case 'class':
      return readFileCommand(others, CLASS, 'class takes one list', (path, values) => {
        const options = classOptions(values);
        return options.ok ? { ok: true, value: { kind: 'class', path, options: options.value } } : options;
      });
    case 'queries':
      return readFileCommand(others, QUERIES, 'queries takes one project', (path, values) => {
        const format = queriesOptions(values);
        return format.ok ? { ok: true, value: { kind: 'queries', path, format: format.value } } : format;
      });
    default: {
      const read = readWords(words, GENERAL);
      if (!read.ok) return read;
      const general = generalCommand(read.value.values);
      if (general !== null) return { ok: true, value: general };
      return wrong(
        name === undefined
          ? 'Tell what to do: table, differ, press, release, read-back, queries, compare, erratum or class.'
          : `There is no command "${name}".`,
      );
    }
  }
}

/** A command that works on one file. */
function readFileCommand(
  words: readonly string[],
  names: OptionNames,
  takes: string,
  commandOn: (path: string, values: OptionValues) => Reply<Command>,
): Reply<Command> {
  return readFilesCommand(words, names, (paths, values) => {
    const [path] = paths;
    if (path !== undefined && paths.length === 1) return commandOn(path, values);
    return wrong(`${takes}, not ${paths.length}. Put names with spaces in quotes.`);
  });
}

/** A command that works on two projects, the earlier one first. */
function readPairCommand(
  words: readonly string[],
  names: OptionNames,
  takes: string,
  commandOn: (paths: EditionPaths, values: OptionValues) => Reply<Command>,
): Reply<Command> {
  return readFilesCommand(words, names, (paths, values) => {
    const [before, after] = paths;
    if (before !== undefined && after !== undefined && paths.length === 2) return commandOn({ before, after }, values);
    return wrong(`${takes}, the earlier one first, not ${paths.length}. Put names with spaces in quotes.`);
  });
}

/** A command that works on files; help and version come before all else. */
function readFilesCommand(
  words: readonly string[],
  names: OptionNames,
  commandOn: (paths: readonly string[], values: OptionValues) => Reply<Command>,
): Reply<Command> {
  const read = readWords(words, names);
  if (!read.ok) return read;
  const { values, positionals } = read.value;
  const general = generalCommand(values);
  if (general !== null) return { ok: true, value: general };
  return commandOn(positionals, values);
}

function generalCommand(values: OptionValues): Command | null {
  if (values['help'] === true) return { kind: 'help' };
  return values['version'] === true ? { kind: 'version' } : null;
}

function wrong<T>(problem: string): Reply<T> {
  return { ok: false, problem };
}
