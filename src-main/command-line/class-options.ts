import type { Reply } from '../../shared-core/desk.ts';
import type { ClassFile } from '../../shared-core/class/class-file.ts';
import { LARGEST_SEED } from '../../shared-core/precision/seeded-random.ts';
import { listOf, numberIn, oneOf, readOrSay, textGiven, WrongOption, type OptionValues } from './option-values.ts';

type Words = ClassFile['report']['language']['words'];
type PerPage = ClassFile['slips']['perPage'];

/** Columns of the list by the work they do, as its heading names them; null and empty: as guessed. */
export interface NamedColumns {
  readonly name: readonly string[];
  readonly score: string | null;
  readonly by: readonly string[];
  readonly status: string | null;
}

export interface ClassOptions {
  readonly into: string;
  /** Path of a project, a released edition or a published table; null where none is given. */
  readonly table: string | null;
  /** The table for pupils whose row names no group, by its values or its title; null where none is given. */
  readonly group: string | null;
  readonly lowIsGood: boolean;
  /** Null: as the class file says, and with names where the list is none. */
  readonly sharing: 'codes' | 'summary' | null;
  readonly seed: number | null;
  /** Slips to a page; null for no slips. */
  readonly slips: PerPage | null;
  readonly title: string | null;
  /** yyyy-mm-dd. */
  readonly date: string | null;
  readonly language: Words | null;
  readonly columns: NamedColumns;
}

/** Turns the texts of the options into what they mean; the problem says which option to change and how. */
export function classOptions(values: OptionValues): Reply<ClassOptions> {
  return readOrSay(() => {
    const into = textGiven(values, 'into') ?? '';
    if (into === '') throw new WrongOption('Tell where the files of the class go with --into FOLDER.');
    const sharing = sharingIn(values);
    const slips = textGiven(values, 'slips');
    if (sharing === 'summary' && slips !== null) {
      throw new WrongOption('A summary names nobody, so that it has no slips. Leave out --slips or --summary.');
    }
    const language = textGiven(values, 'language');
    return {
      into,
      table: textGiven(values, 'table'),
      group: textGiven(values, 'group'),
      lowIsGood: values['low-is-good'] === true,
      sharing,
      seed: seedIn(values, sharing),
      slips: slips === null ? null : perPage(slips),
      title: textGiven(values, 'title'),
      date: dateIn(textGiven(values, 'date')),
      language: language === null ? null : oneOf('language', ['en', 'de', 'es', 'fr'] as const, language),
      columns: {
        name: listOf('name', textGiven(values, 'name')),
        score: textGiven(values, 'score'),
        by: listOf('by', textGiven(values, 'by')),
        status: textGiven(values, 'status'),
      },
    };
  });
}

function sharingIn(values: OptionValues): ClassOptions['sharing'] {
  const [codes, summary] = [values['codes'] === true, values['summary'] === true];
  if (codes && summary) throw new WrongOption('--codes and --summary are two ways to share a class. Give one of them.');
  if (codes) return 'codes';
  return summary ? 'summary' : null;
}

function seedIn(values: OptionValues, sharing: ClassOptions['sharing']): number | null {
  const text = textGiven(values, 'seed');
  if (text === null) return null;
  if (sharing !== 'codes') throw new WrongOption('--seed is of the codes. Give --codes with it.');
  const seed = numberIn(text);
  if (seed === null || !Number.isSafeInteger(seed) || seed < 0) {
    throw new WrongOption(`--seed is a whole number from 0 to ${LARGEST_SEED}; not "${text}".`);
  }
  return seed;
}

function perPage(text: string): PerPage {
  const found = ([1, 2, 3, 4] as const).find((count) => String(count) === text);
  if (found === undefined) throw new WrongOption(`--slips tells how many stand on a page, 1 to 4; not "${text}".`);
  return found;
}

function dateIn(text: string | null): string | null {
  if (text === null) return null;
  const day = new Date(`${text}T00:00:00Z`);
  const isDay = /^\d{4}-\d\d-\d\d$/.test(text) && !Number.isNaN(day.getTime());
  if (isDay && day.toISOString().startsWith(text)) return text;
  throw new WrongOption(`--date is a day such as 2026-06-15; not "${text}".`);
}
