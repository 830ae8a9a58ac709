import { basename } from 'node:path';
import type { ClassList } from '../../shared-core/class/class-list.ts';
import type { ClassReading, ClassRole } from '../../shared-core/class/class-reading.ts';
import { guessClassReading } from '../../shared-core/class/guess-class-reading.ts';
import { foldedText } from '../../shared-core/class/list-text.ts';
import type { ListedRow } from '../../shared-core/class/pasted-rows.ts';
import { readClassList } from '../../shared-core/class/read-class-list.ts';
import type { Reply } from '../../shared-core/desk.ts';
import { lookAtList } from '../cohort-file/look-at-list.ts';
import type { NamedColumns } from './class-options.ts';

export type ListFileRead =
  /** `remarks` say what was taken for what, and what looks odd. */
  | { readonly ok: true; readonly list: ClassList; readonly remarks: readonly string[] }
  | { readonly ok: false; readonly problem: string; readonly remarks: readonly string[] };

/** A heading stands no deeper in a list. */
const MOST_ABOVE_HEADING = 10;

/** Reads a class list from a file of any kind that cohorts are read from. Columns that are named go before guesses. */
export async function readListFile(path: string, named: NamedColumns): Promise<ListFileRead> {
  const file = basename(path);
  const looked = await lookAtList(path, file, null);
  if (!looked.ok) return { ...looked, remarks: [] };
  const { rows } = looked.value;
  const guess = guessClassReading(rows);
  const reading = withNamed(guess.reading, rows, named);
  if (!reading.ok) return { ok: false, problem: `${file}: ${reading.problem}`, remarks: [] };
  const { list, problems } = readClassList(rows, reading.value);
  const isGuess = reading.value === guess.reading;
  const remarks = [...looked.value.remarks, ...(isGuess ? guess.remarks : [])];
  if (list !== null) return { ok: true, list, remarks };
  return {
    ok: false,
    problem: `${file} cannot be read as a class list. Name its columns with --name and --score, or correct it.`,
    remarks: [
      ...remarks,
      ...problems.map(({ line, problem }) => (line === 0 ? problem : `${file}, line ${line}: ${problem}`)),
    ],
  };
}

/** The reading with the roles of the columns that were named; others keep what was guessed, as long as it is free. */
function withNamed(guess: ClassReading, rows: readonly ListedRow[], named: NamedColumns): Reply<ClassReading> {
  const given = new Map<ClassRole, readonly string[]>();
  if (named.name.length > 0) given.set('name', named.name);
  if (named.score !== null) given.set('score', [named.score]);
  if (named.by.length > 0) given.set('group', named.by);
  if (named.status !== null) given.set('status', [named.status]);
  const all = [...given.values()].flat();
  if (all.length === 0) return { ok: true, value: guess };
  const placesIn = ({ cells }: ListedRow): readonly number[] =>
    all.map((name) => cells.findIndex((cell) => foldedText(cell) === foldedText(name)));
  const heading =
    rows.find((row) => row.line === guess.headingLine && !placesIn(row).includes(-1)) ??
    rows.slice(0, MOST_ABOVE_HEADING).find((row) => !placesIn(row).includes(-1));
  if (heading === undefined) return { ok: false, problem: noHeading(all, rows, guess) };
  const roleAt = new Map<number, ClassRole>();
  for (const [role, names] of given) {
    for (const name of names) {
      const place = heading.cells.findIndex((cell) => foldedText(cell) === foldedText(name));
      if (roleAt.has(place)) return { ok: false, problem: `The column "${name}" is named twice. Give it one part.` };
      roleAt.set(place, role);
    }
  }
  const guessed = heading.line === guess.headingLine ? guess.roles : guess.roles.map((): ClassRole => 'unused');
  const roles = guessed.map((role, place) => roleAt.get(place) ?? (given.has(role) ? 'unused' : role));
  return { ok: true, value: { ...guess, headingLine: heading.line, roles } };
}

function noHeading(names: readonly string[], rows: readonly ListedRow[], { headingLine }: ClassReading): string {
  const heading = rows.find(({ line }) => line === headingLine);
  if (heading === undefined) {
    return `No row names the columns ${quoted(names)}. Write their names above the pupils, or leave the options out.`;
  }
  const missing = names.filter((name) => !heading.cells.some((cell) => foldedText(cell) === foldedText(name)));
  return `There is no column ${quoted(missing)}. The heading has ${quoted(heading.cells)}.`;
}

function quoted(names: readonly string[]): string {
  return names.map((name) => `"${name.trim()}"`).join(', ');
}
