import { guessDecimalMark, isNumber } from '../tally/guess-numbers.ts';
import type { DecimalMark } from '../scale/decimal.ts';
import type { ClassReading, ClassRole } from './class-reading.ts';
import { cellText, foldedText } from './list-text.ts';
import type { ListedRow } from './pasted-rows.ts';
import { saysNothing, statusWord } from './status-words.ts';

export interface ClassReadingGuess {
  readonly reading: ClassReading;
  /** What was taken for what, in sentences. */
  readonly remarks: readonly string[];
}

/** Words of column names, in the languages of the program. */
const NAMES: Readonly<Record<Exclude<ClassRole, 'unused'>, RegExp>> = {
  score: whole(
    'raw|scores?|points?|pts|marks?|total|result|correct|right|rohwert|punkte|punktzahl|puntos|puntuación|puntaje|resultado',
  ),
  status: whole('status|attendance|absences?|absent|presence|anwesenheit|abwesend|estado|asistencia|présence'),
  group: whole('group|grade|class|form|year|set|gruppe|klasse|stufe|grupo|clase|curso|grado|groupe|classe|niveau'),
  code: whole('id|code|number|no|nr|nummer|kennung|código|número|numéro|identifiant'),
  name: whole(
    // "First" and "Last" head parts of a name where they stand alone.
    'names?|surname|forename|pupils?|students?|candidates?|vorname|nachname|schüler|nombre|apellidos?|alumnos?|noms?|prénoms?|élèves?',
    '|^(?:first|last|full)$',
  ),
};

/** Scores that are made of raw scores. */
const DERIVED = whole('standard|standardi[sz]ed|scaled|percent|percentile|rank|stanine|sten|age|nce');
const RAW = whole('raw|rohwert');

function whole(words: string, more = ''): RegExp {
  return new RegExp(`(?<!\\p{L})(?:${words})(?!\\p{L})${more}`, 'u');
}

/** The order in which the name of a column is tried: "class score" is a score, "pupil code" a code. */
const ORDER = ['score', 'status', 'code', 'name', 'group'] as const;

interface Column {
  readonly index: number;
  /** Cells with something in them. */
  readonly filled: number;
  readonly numbers: number;
  /** Words for a status, and cells that are one or say that there is nothing. */
  readonly words: number;
  readonly statuses: number;
  readonly wordy: number;
  readonly distinct: number;
  /** 1, 2, 3 …: a number on the list. */
  readonly running: boolean;
}

/**
 * Guesses heading and columns. A row is a heading only if it names columns in words that are known and holds no number:
 * the row of an absent pupil is never taken for one. It may stand under a title without numbers. Names of columns
 * decide; without them the score is the column of numbers with the most different ones that are not all different, the
 * name is the first column of words, and what has few different values is the group.
 */
export function guessClassReading(rows: readonly ListedRow[]): ClassReadingGuess {
  const width = rows.reduce((most, { cells }) => Math.max(most, cells.length), 0);
  const texts = rows.map(({ cells }) => Array.from({ length: width }, (_, index) => cellText(cells[index] ?? '')));
  const decimalMark = guessDecimalMark(texts);
  const at = headingAt(texts, decimalMark);
  const heading = texts[at] ?? null;
  const body = texts.slice(at + 1);
  const columns = Array.from({ length: width }, (_, index) => describe(body, index, decimalMark));
  const given = heading === null ? new Map<number, ClassRole>() : namedRoles(heading, columns);
  fillIn(given, columns, body.length, heading !== null);
  const roles = columns.map(({ index }) => given.get(index) ?? 'unused');
  const named = columns.map(({ index }) => (heading?.[index] ? `"${heading[index]}"` : `Column ${index + 1}`));
  const headingLine = rows[at]?.line ?? null;
  return { reading: { decimalMark, headingLine, roles }, remarks: remarksOn(roles, named, headingLine) };
}

const MOST_ABOVE_HEADING = 5;

/** Index of the heading; −1 where there is none. */
function headingAt(texts: readonly (readonly string[])[], mark: DecimalMark): number {
  const hasNumber = (cells: readonly string[]): boolean => cells.some((cell) => cell !== '' && isNumber(cell, mark));
  const first = texts.findIndex(hasNumber);
  const above = texts.slice(0, Math.min(first < 0 ? texts.length : first, MOST_ABOVE_HEADING + 1));
  return above.findIndex(isHeading);
}

/** Two cells or more that name columns, or one that says that it heads the names. */
function isHeading(cells: readonly string[]): boolean {
  const known = cells.filter((cell) => cell !== '' && statusWord(cell) === null && roleNamed(cell) !== null);
  return known.length > 1 || known.some(namesOnly);
}

/** "Name", "First name", but not "Pupil premium". */
function namesOnly(cell: string): boolean {
  return wordsIn(cell).every((word) => NAMES.name.test(word));
}

function wordsIn(cell: string): readonly string[] {
  return foldedText(cell)
    .split(/[^\p{L}]+/u)
    .filter((word) => word !== '');
}

function roleNamed(cell: string): (typeof ORDER)[number] | null {
  const words = wordsIn(cell).join(' ');
  return ORDER.find((role) => NAMES[role].test(words)) ?? null;
}

function describe(rows: readonly (readonly string[])[], index: number, mark: DecimalMark): Column {
  const cells = rows.map((row) => row[index] ?? '').filter((cell) => cell !== '');
  const words = cells.filter((cell) => statusWord(cell) !== null).length;
  return {
    index,
    filled: cells.length,
    numbers: cells.filter((cell) => isNumber(cell, mark)).length,
    words,
    statuses: words + cells.filter(saysNothing).length,
    wordy: cells.filter((cell) => /^[^\d]*\p{L}[^\d]*$/u.test(cell) && statusWord(cell) === null).length,
    distinct: new Set(cells.map(foldedText)).size,
    running: cells.length > 1 && cells.every((cell, row) => Number(cell) === Number(cells[0]) + row),
  };
}

/** Roles by heading; where several columns call themselves the score it is the raw one, or else one that is not derived. */
function namedRoles(heading: readonly string[], columns: readonly Column[]): Map<number, ClassRole> {
  const roles = new Map<number, ClassRole>();
  heading.forEach((cell, index) => {
    const role = cell === '' ? null : roleNamed(cell);
    if (role !== null) roles.set(index, role);
  });
  const worth = ({ index, distinct }: Column): number => {
    const words = wordsIn(heading[index] ?? '').join(' ');
    return (RAW.test(words) ? 2 : DERIVED.test(words) ? 0 : 1) * 10_000 + distinct;
  };
  for (const role of ['score', 'status', 'code'] as const) {
    const claimed = columns.filter(({ index }) => roles.get(index) === role);
    const kept = best(claimed, worth);
    for (const { index } of claimed) if (index !== kept?.index) roles.set(index, 'unused');
  }
  const nameParts = columns.filter(({ index }) => roles.get(index) === 'name');
  if (nameParts.some(({ index }) => namesOnly(heading[index] ?? ''))) {
    for (const { index } of nameParts) if (!namesOnly(heading[index] ?? '')) roles.set(index, 'unused');
  }
  return roles;
}

/** What the heading leaves open, by what stands in the columns. */
function fillIn(roles: Map<number, ClassRole>, columns: readonly Column[], people: number, headed: boolean): void {
  const few = Math.max(2, people / 3);
  const has = (role: ClassRole): boolean => [...roles.values()].includes(role);
  const free = (test: (column: Column) => boolean): readonly Column[] =>
    columns.filter((column) => !roles.has(column.index) && column.filled > 0 && test(column));
  const give = (column: Column | undefined, role: ClassRole): void => {
    if (column !== undefined) roles.set(column.index, role);
  };
  if (!has('score')) {
    const counted = free(
      ({ numbers, statuses, filled, running }) => numbers > 0 && numbers + statuses > filled / 2 && !running,
    );
    // Few different numbers are groups, and numbers that are all different may be those of the pupils.
    const worth = ({ distinct, filled }: Column): number =>
      (distinct <= few ? 0 : distinct === filled ? 1 : 2) * 10_000 + distinct;
    const numeric = best(counted, worth) ?? free(({ numbers }) => numbers > 0)[0];
    // A class of which nobody was tested has words in place of scores.
    give(numeric ?? free(saysStatus)[0], 'score');
  }
  if (!has('status')) give(free(saysStatus)[0], 'status');
  if (!has('name')) {
    const wordy = free((column) => column.wordy > column.filled / 2 && column.distinct > column.filled / 2);
    const [one, two] = wordy;
    give(one, 'name');
    if (one !== undefined && two?.index === one.index + 1) give(two, 'name');
  }
  if (!has('name') && !has('code')) give(free(({ distinct, filled }) => distinct > filled / 2)[0], 'code');
  if (!has('group') && !headed) give(free(({ distinct }) => distinct <= few)[0], 'group');
}

function saysStatus({ words, filled }: Column): boolean {
  return words > 0 && words >= filled / 4;
}

/** Of equal ones the last: scores stand behind numbers of pupils. */
function best(columns: readonly Column[], worth: (column: Column) => number): Column | undefined {
  return columns.reduce<Column | undefined>(
    (known, column) => (known === undefined || worth(column) >= worth(known) ? column : known),
    undefined,
  );
}

const ROLE_WORDS: Readonly<Record<ClassRole, string>> = {
  name: 'the name',
  code: 'the code',
  score: 'the raw score',
  group: 'the group',
  status: 'the word about absence',
  unused: 'nothing that is used',
};

function remarksOn(
  roles: readonly ClassRole[],
  named: readonly string[],
  headingLine: number | null,
): readonly string[] {
  return [
    headingLine === null
      ? 'No heading is known: the first row is taken as a pupil.'
      : `Line ${headingLine} is taken as the heading${headingLine > 1 ? '; what stands above it is passed over' : ''}.`,
    ...roles.map((role, index) => `${named[index] ?? ''} is taken as ${ROLE_WORDS[role]}.`),
  ];
}
