import type { ColumnRole, Reading } from '../norms/reading.ts';
import type { DecimalMark } from '../scale/decimal.ts';
import { isNumber } from './guess-numbers.ts';

export interface RoleGuess {
  readonly layout: Reading['layout'];
  readonly roles: Reading['roles'];
  /** Why, in sentences. */
  readonly remarks: readonly string[];
}

/** Words that a column name is made of: "Raw_Score2" holds raw and score. */
const SCORE = /^(score|scores|raw|rawscore|points|pts|total|mark|marks|result|sum)$/;
const WEIGHT = /^(weight|weights|wt|wgt|w)$/;
const GROUP = /^(grade|form|sex|gender|group|year|season|level|class|stratum|region|language|stage|version)$/;
const ID = /^(id|ids|code|pupil|pupilid|student|candidate|person|number|no|nr|name)$/;
const COUNT = /^(count|counts|n|freq|frequency|frequencies|f|number|people)$/;
/** Pupils of a school are drawn together. */
const CLUSTER = /^(school|schools|cluster|clusters|psu)$/;
const UNUSED = /^(age|ages|birth|birthday|dob|date|tested|teacher|city|town|comment|remarks?)$/;

const MAX_GROUP_VALUES = 20;

interface Column {
  readonly index: number;
  readonly name: string;
  readonly words: readonly string[];
  readonly filled: number;
  readonly distinct: number;
  /** Shares 0–1 of the filled cells. */
  readonly numeric: number;
  readonly whole: number;
}

/**
 * Guesses what the columns are from their names and the first rows. A name decides where the contents allow it; without
 * a telling name the score is the one numeric column that is left. Ages are left unused; schools are clusters.
 */
export function guessRoles(
  columns: readonly string[],
  rows: readonly (readonly string[])[],
  mark: DecimalMark,
): RoleGuess {
  const described = columns.map((name, index) => describe(name, rows, index, mark));
  const roles = new Map<string, ColumnRole>();
  const remarks: string[] = [];
  const give = (column: Column | undefined, role: ColumnRole, why: string): void => {
    if (column === undefined || roles.has(column.name)) return;
    roles.set(column.name, role);
    remarks.push(`"${column.name}" is taken as the ${role} column, ${why}.`);
  };
  const free = (test: (column: Column) => boolean): Column | undefined =>
    described.find((column) => !roles.has(column.name) && test(column));

  for (const column of described) if (named(column, UNUSED)) roles.set(column.name, 'unused');
  const schools = described.filter((column) => named(column, CLUSTER));
  give(
    schools.find((column) => column.distinct > 1),
    'cluster',
    'by its name: those of one school or the like were drawn together',
  );
  for (const column of schools) if (!roles.has(column.name)) roles.set(column.name, 'unused');
  give(
    free((column) => named(column, WEIGHT) && column.numeric > 0.9),
    'weight',
    'by its name and because it holds numbers',
  );
  give(
    free((column) => named(column, SCORE) && !named(column, ID) && column.numeric > 0.5),
    'score',
    'by its name and because it holds numbers',
  );
  const isGroup = (column: Column): boolean => named(column, GROUP) && fewValues(column, rows.length);
  if (![...roles.values()].includes('score')) {
    const left = described.filter(
      (column) =>
        !roles.has(column.name) &&
        column.numeric > 0.5 &&
        !isGroup(column) &&
        !isIdentifier(column) &&
        !named(column, COUNT),
    );
    give(left.length === 1 ? left[0] : undefined, 'score', 'as the only column of numbers that is left');
  }
  const score = described.find((column) => roles.get(column.name) === 'score');
  const count = free((column) => named(column, COUNT) && column.whole > 0.9 && !isRunning(cellsOf(rows, column.index)));
  const people = described.some((column) => column !== count && column !== score && isIdentifier(column));
  if (score !== undefined && count !== undefined && !people && scoresStandOnce(rows, count.index)) {
    give(count, 'count', 'so that each row is a score and how many people have it');
  }
  const layout = [...roles.values()].includes('count') ? 'counts' : 'people';
  if (layout === 'people') {
    give(
      free((column) => named(column, ID) && isIdentifier(column)),
      'id',
      'because nearly all its values are different',
    );
  }
  for (const column of described) {
    if (!roles.has(column.name) && isGroup(column)) {
      give(column, 'group', `with ${column.distinct} different ${column.distinct === 1 ? 'value' : 'values'}`);
    }
  }
  if (score === undefined)
    remarks.unshift('No column is clearly the score. Mark the column that holds the raw scores.');
  return { layout, roles: columns.map((column) => ({ column, role: roles.get(column) ?? 'unused' })), remarks };
}

/** True for the name of a column that by its words holds clusters, such as schools. */
export function isClusterName(name: string): boolean {
  return wordsIn(name).some((word) => CLUSTER.test(word));
}

function named(column: Column, words: RegExp): boolean {
  return column.words.some((word) => words.test(word));
}

function fewValues(column: Column, rows: number): boolean {
  return column.distinct > 0 && column.distinct <= Math.min(MAX_GROUP_VALUES, Math.max(2, rows / 2));
}

function isIdentifier(column: Column): boolean {
  return column.filled > 0 && column.distinct >= 0.9 * column.filled && (named(column, ID) || column.numeric < 0.5);
}

function cellsOf(rows: readonly (readonly string[])[], index: number): readonly string[] {
  return rows.map((row) => (row[index] ?? '').trim());
}

/** 1, 2, 3 …: a running number of people, not a count. */
function isRunning(cells: readonly string[]): boolean {
  return cells.length > 2 && cells.every((cell, row) => row === 0 || Number(cell) === Number(cells[row - 1]) + 1);
}

/** True when no two rows are the same but for their count, as in a table of frequencies. */
function scoresStandOnce(rows: readonly (readonly string[])[], countIndex: number): boolean {
  const keys = new Set(rows.map((row) => JSON.stringify(row.filter((_, index) => index !== countIndex))));
  return rows.length > 1 && keys.size === rows.length;
}

function describe(name: string, rows: readonly (readonly string[])[], index: number, mark: DecimalMark): Column {
  const cells = cellsOf(rows, index).filter((cell) => cell !== '');
  const filled = cells.length;
  const numeric = cells.filter((cell) => isNumber(cell, mark)).length;
  return {
    index,
    name,
    words: wordsIn(name),
    filled,
    distinct: new Set(cells).size,
    numeric: filled === 0 ? 0 : numeric / filled,
    whole: filled === 0 ? 0 : cells.filter((cell) => /^\d+$/.test(cell)).length / filled,
  };
}

function wordsIn(name: string): readonly string[] {
  return name
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .split(/[^\p{L}]+/u)
    .filter((word) => word !== '');
}
