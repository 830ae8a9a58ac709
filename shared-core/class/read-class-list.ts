import type { LineProblem } from '../tally/typed-counts.ts';
import { MOST_CLASS_ROWS, type ClassList, type ClassListRow } from './class-list.ts';
import type { ClassReading, ClassRole } from './class-reading.ts';
import { cellText } from './list-text.ts';
import type { ListedRow } from './pasted-rows.ts';

export interface ClassListRead {
  /** Null as long as there are problems. */
  readonly list: ClassList | null;
  /** In order of lines; line 0 stands for the list as a whole. */
  readonly problems: readonly LineProblem[];
  /** Names of the columns, from the heading or by their number. */
  readonly columns: readonly string[];
  /** Lines passed over: those above the heading, and those with nothing in any column. */
  readonly passedOver: readonly number[];
}

const LONGEST_CELL = 400;

/**
 * Rows of a pasted text or a file as a class list. Texts are only trimmed: what a score, a status or a group means is
 * asked later, and a name that begins with =, +, - or @ is a name. Every row below the heading with anything in it is a
 * row of the list.
 */
export function readClassList(rows: readonly ListedRow[], reading: ClassReading): ClassListRead {
  const { roles, headingLine, decimalMark } = reading;
  const heading = rows.find(({ line }) => line === headingLine);
  const columns = roles.map((_, index) => cellText(heading?.cells[index] ?? '') || `Column ${index + 1}`);
  const isBlank = ({ cells }: ListedRow): boolean => cells.every((cell) => cellText(cell) === '');
  const isAbove = ({ line }: ListedRow): boolean => heading !== undefined && line < heading.line;
  const body = rows.filter((row) => row !== heading && !isAbove(row) && !isBlank(row));
  const passedOver = rows.filter((row) => row !== heading && (isAbove(row) || isBlank(row)));
  const problems: LineProblem[] = wholeProblems(body.length, roles).map((problem) => ({ line: 0, problem }));
  const listed = body.map(({ line, cells }) => {
    const row = rowOf(line, cells, roles);
    const problem = rowProblem(row, cells, roles);
    if (problem !== null) problems.push({ line, problem });
    return row;
  });
  return {
    list: problems.length > 0 ? null : { decimalMark, rows: listed },
    problems,
    columns,
    passedOver: passedOver.map(({ line }) => line),
  };
}

function wholeProblems(rows: number, roles: readonly ClassRole[]): readonly string[] {
  const scores = roles.filter((role) => role === 'score').length;
  if (rows === 0) return ['There is no pupil in the list. Type or paste one line for each: name and raw score.'];
  if (rows > MOST_CLASS_ROWS) {
    return [
      `The list has ${rows} rows; a class may have at most ${MOST_CLASS_ROWS}. Leave out what is not of this class.`,
    ];
  }
  return [
    ...(scores === 1
      ? []
      : ['One column holds the raw scores. Mark that one, with a tab or a semicolon between the columns.']),
    ...(roles.includes('name') || roles.includes('code')
      ? []
      : ['Mark the column that holds the names, or the codes.']),
    ...(['status', 'code'] as const)
      .filter((role) => roles.filter((one) => one === role).length > 1)
      .map((role) => `Only one column can be the ${role}. Mark the others as something else.`),
  ];
}

function rowOf(line: number, cells: readonly string[], roles: readonly ClassRole[]): ClassListRow {
  const of = (role: ClassRole, between: string): string =>
    roles
      .flatMap((one, index) => (one === role ? [cellText(cells[index] ?? '')] : []))
      .filter((text) => text !== '')
      .join(between);
  return {
    line,
    name: of('name', ' '),
    code: of('code', ' '),
    scoreText: of('score', ' '),
    group: of('group', ', '),
    statusText: of('status', ' '),
  };
}

function rowProblem(row: ClassListRow, cells: readonly string[], roles: readonly ClassRole[]): string | null {
  if (cells.slice(roles.length).some((cell) => cellText(cell) !== '')) {
    return `This row has ${cells.length} cells and the list ${roles.length} columns. Read the columns again, or correct the row.`;
  }
  const { name, code, scoreText, group, statusText } = row;
  if ([name, code, scoreText, group, statusText].some((text) => text.length > LONGEST_CELL)) {
    return `This row has a cell of more than ${LONGEST_CELL} letters. Shorten it, or look for a quotation mark that was not closed.`;
  }
  return null;
}
