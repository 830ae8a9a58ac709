import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import type { CohortSource } from '../norms/norm-project.ts';
import { parseDecimal, type Decimal, type DecimalMark } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, scaleProblems, type ScoreScale } from '../scale/score-scale.ts';
import { decimalKey, inferScale } from './cohort-counter-scores.ts';
import type { Tally } from './tally.ts';

export interface LineProblem {
  /** Line of the text, from 1; 0 for the text as a whole. */
  readonly line: number;
  /** What is wrong and what to do. */
  readonly problem: string;
}

export interface TypedCounts {
  /** Null as long as there are problems. */
  readonly counted: { readonly source: CohortSource; readonly tally: Tally } | null;
  readonly problems: readonly LineProblem[];
}

const COMMA = /\s*,\s*/;

interface TypedLine {
  readonly line: number;
  readonly content: string;
  readonly cells: readonly string[];
}

interface ScoreLine {
  readonly line: number;
  readonly score: Decimal;
  readonly count: number;
}

/**
 * Reads counts typed or pasted, one "score count" a line, separated by tab, semicolon, comma or spaces; a first line
 * without any digit is a heading, blank lines are passed over. A decimal comma is read where the separator is not a
 * comma. Each score stands once; ranges such as "10-14" and lines of a class table are refused. Without a scale it is
 * taken from the scores. Nothing is counted until every line can be read.
 */
export function readTypedCounts(text: string, scale: ScoreScale | null): TypedCounts {
  const wrong = scale === null ? [] : scaleProblems(scale);
  if (wrong.length > 0) return { counted: null, problems: [{ line: 0, problem: wrong.join(' ') }] };
  const problems: LineProblem[] = [];
  const rows: ScoreLine[] = [];
  const firstLines = new Map<string, number>();
  const { lines, mark } = typedLines(text);
  for (const typed of lines) {
    const read = readLine(typed, mark);
    if (typeof read === 'string') {
      problems.push({ line: typed.line, problem: read });
      continue;
    }
    const key = decimalKey(read.score);
    const first = firstLines.get(key);
    if (first !== undefined) {
      const score = typed.cells[0] ?? '';
      problems.push({
        line: typed.line,
        problem: `Score ${score} stands in line ${first} already. Give each score one line.`,
      });
      continue;
    }
    firstLines.set(key, typed.line);
    rows.push(read);
  }
  if (problems.length > 0) return { counted: null, problems };
  if (rows.length === 0) return whole('Type one line for each score: the score, a space, and how many people have it.');
  return tallied(text, rows, scale);
}

const SEPARATORS = [/\s*\t\s*/, /\s*;\s*/, COMMA, /\s+/] as const;

/** All lines have one separator: the one that cuts the most of them into two entries. */
export function typedLines(text: string): { readonly lines: readonly TypedLine[]; readonly mark: DecimalMark } {
  const contents = text
    .replace(/^\uFEFF/, '')
    .split(/\r\n|\n|\r/)
    .map((content, index) => ({ line: index + 1, content: content.trim() }))
    .filter(({ content }) => content !== '');
  const headed = contents[0] !== undefined && !/\d/.test(contents[0].content);
  const body = headed ? contents.slice(1) : contents;
  const pairs = SEPARATORS.map((candidate) => body.filter(({ content }) => isPair(content.split(candidate))).length);
  const separator = SEPARATORS[pairs.indexOf(Math.max(...pairs))] ?? COMMA;
  const lines = body.map(({ line, content }) => ({ line, content, cells: content.split(separator) }));
  const pointed = separator === COMMA || lines.some(({ cells }) => cells.some((cell) => /^-?\d*\.\d+$/.test(cell)));
  return { lines, mark: pointed ? '.' : ',' };
}

function isPair(cells: readonly string[]): boolean {
  return cells.length === 2 && cells.every((cell) => !/\s/.test(cell));
}

const RANGE = /\d(?:-|–|\.\.)\d|\d\s+(?:-|–|to)\s+\d/;

function readLine({ line, content, cells }: TypedLine, mark: DecimalMark): ScoreLine | string {
  const [scoreText = '', countText = ''] = cells;
  if (RANGE.test(content)) {
    return 'A range of scores cannot be read. Give one line for each score.';
  }
  if (cells.length !== 2)
    return `A line holds a score and a count; this one holds ${cells.length} ${cells.length === 1 ? 'entry' : 'entries'}.`;
  const score = parseDecimal(scoreText, mark);
  if (score === null) return `"${scoreText}" is not a score. Write a number.`;
  const count = /^\d{1,15}$/.test(countText) ? Number(countText) : null;
  if (count === null) return `"${countText}" is not a count. Write a whole number of 0 or more.`;
  return { line, score, count };
}

function tallied(text: string, rows: readonly ScoreLine[], declared: ScoreScale | null): TypedCounts {
  const inferred = declared === null ? inferScale(rows.map(({ score }) => score)) : null;
  if (inferred !== null && !inferred.ok) return whole(inferred.problem);
  const scale = declared ?? inferred?.value;
  if (scale === undefined) throw new RangeError('a scale is either declared or inferred');
  const grid = scaleGrid(scale);
  const counts = new Array<number>(grid.length).fill(0);
  const problems: LineProblem[] = [];
  for (const { line, score, count } of rows) {
    const place = placeOnGrid(grid, score);
    if (typeof place === 'number') counts[place] = count;
    else problems.push({ line, problem: OFF_SCALE[place] });
  }
  if (problems.length > 0) return { counted: null, problems };
  const people = counts.reduce((sum, count) => sum + count, 0);
  if (people === 0) return whole('All counts are 0: there is nobody to tally.');
  if (!Number.isSafeInteger(people)) return whole('The counts add up to more people than can be counted exactly.');
  const bytes = utf8ToBytes(text);
  const source: CohortSource = {
    kind: 'typed',
    file: '',
    sha256: bytesToHex(sha256(bytes)),
    bytes: bytes.length,
    rowsRead: rows.length,
    rowsKept: rows.length,
    leftOut: [],
    scaleInferred: declared === null,
  };
  const cells = [{ values: [], counts, weights: null, squares: null, clusters: null }];
  return { counted: { source, tally: { scale, groupColumns: [], weightDecimals: null, cells } }, problems: [] };
}

const OFF_SCALE = {
  'below-scale': 'The score lies below the scale. Correct it, or change the lowest score of the scale.',
  'above-scale': 'The score lies above the scale. Correct it, or change the highest score of the scale.',
  'off-grid': 'The score lies between two steps of the scale. Correct it, or change the step.',
} as const;

function whole(problem: string): TypedCounts {
  return { counted: null, problems: [{ line: 0, problem }] };
}
