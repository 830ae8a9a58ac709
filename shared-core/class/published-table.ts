import { definitionInWords } from '../norms/definitions.ts';
import { DEFAULT_POLICY } from '../norms/policy.ts';
import { standingTitle } from '../norms/norm-groups.ts';
import type { PeopleNoun } from '../norms/norm-project.ts';
import { ratioNear } from '../percentile/exact-ratio.ts';
import { decimalOf, parseDecimal, unitsAt } from '../scale/decimal.ts';
import { scaleProblems, type Direction, type ScoreScale } from '../scale/score-scale.ts';
import { linearScale, NCE_FACTOR, normalisedZ } from '../scores/derived-score.ts';
import { printScore } from '../scores/printed-number.ts';
import type { LineProblem } from '../tally/typed-counts.ts';
import type { ClassTable, ClassTableColumn, ClassTableRow } from './class-table.ts';
import { readRank, readScores } from './published-cells.ts';
import { cutPublished, type PublishedText } from './published-lines.ts';
import {
  inUnits,
  rangeProblems,
  rankOrder,
  rankText,
  stepShown,
  toNumber,
  type PublishedRow,
  type RowUnits,
} from './published-rows.ts';

/** What the lines of a published table do not say, told by the user. */
export interface PublishedFacts {
  readonly title: string;
  readonly form: string;
  readonly edition: string;
  /** yyyy-mm-dd, or empty. */
  readonly date: string;
  /** Where the table is printed. */
  readonly cited: string;
  /** What a rank counts, where the table says so. */
  readonly definition: 'midpoint' | 'at-or-below' | 'below' | 'unknown';
  /** Whom the group stands for, and how many were tested; empty and null where it is not known. */
  readonly population: string;
  readonly n: number | null;
  /** Which end of the scores is good; null: high scores are, and ranks that fall are asked about. */
  readonly direction: Direction | null;
  /** Raw-score points from one score to the next; null: as the scores show it. */
  readonly step: number | null;
  readonly peopleNoun: PeopleNoun;
}

export interface PublishedRead {
  /** Null as long as there are problems. */
  readonly table: ClassTable | null;
  /** In order of lines; line 0 stands for the table as a whole. */
  readonly problems: readonly LineProblem[];
}

const NO_VALUE = '\u2013';
const MOST_LINES = 1000;
const MOST_FURTHER = 12;
const LONGEST_CELL = 400;

/**
 * Reads a table that is printed somewhere, typed or pasted: a raw score or a range of scores, its percentile rank and,
 * where there are any, further columns such as stanines. Checked are overlaps, gaps, order and ends; nothing is looked
 * up as long as a line has a problem. The order of the lines plays no part.
 */
export function readPublishedTable(text: string, facts: PublishedFacts): PublishedRead {
  const cut = cutPublished(text);
  if (cut.lines.length === 0) {
    return failed('Type one line for each score or range of scores: the score, a space, and its percentile rank.');
  }
  if (cut.lines.length > MOST_LINES) {
    return failed(`The table has ${cut.lines.length} lines; at most ${MOST_LINES} can be read. Give ranges of scores.`);
  }
  const columns = columnsOf(cut);
  if (columns.length > MOST_FURTHER) {
    return failed(
      `The table has ${columns.length} columns beside score and rank; at most ${MOST_FURTHER} can be printed. Leave some out.`,
    );
  }
  if (facts.step !== null && !(facts.step > 0))
    return failed('The step of the scores must be above 0, as in 1 or 0.5.');
  const problems: LineProblem[] = [];
  const read = rowsOf(cut, problems);
  if (problems.length > 0) return { table: null, problems };
  const { decimals, rows } = inUnits(read, facts.step);
  const step = facts.step === null ? stepShown(rows, decimals) : unitsAt(decimalOf(facts.step), decimals);
  const order = rankOrder(rows, facts.direction);
  const ranges = rangeProblems(rows, decimals, step);
  // Where scores stand twice, the run of the ranks says nothing.
  const found = [...ranges, ...(ranges.length > 0 ? [] : order.problems)].toSorted((a, b) => a.line - b.line);
  if (found.length > 0) return { table: null, problems: found };
  const inPoints = (units: bigint): number => Number(units) / 10 ** decimals;
  const scale: ScoreScale = {
    min: inPoints(rows[0]?.low ?? 0n),
    max: inPoints(rows.at(-1)?.high ?? 0n),
    step: inPoints(step),
    direction: facts.direction ?? 'high-is-good',
  };
  const [unusable] = scaleProblems(scale);
  if (unusable !== undefined) return failed(`The scores cannot be used. ${unusable}`);
  return { table: tableOf(facts, scale, rows, columns), problems: [] };
}

function rowsOf(cut: PublishedText, problems: LineProblem[]): readonly PublishedRow[] {
  const { lines, scoreAt, rankAt, mark } = cut;
  const width = widthOf(cut);
  const threeDecimals = lines.some(({ cells }) => provesDecimals(cells[scoreAt] ?? ''));
  return lines.flatMap(({ line, cells }) => {
    const told = (problem: string): readonly PublishedRow[] => {
      problems.push({ line, problem });
      return [];
    };
    const scores = readScores(cells[scoreAt] ?? '', mark, threeDecimals);
    if (!scores.ok) return told(scores.problem);
    const { low, high } = scores.value;
    if (toNumber(low) > toNumber(high)) {
      return told(`The range ${cells[scoreAt] ?? ''} runs backwards. Write the lower score first.`);
    }
    const rank = readRank(cells[rankAt] ?? '', mark);
    if (!rank.ok) return told(rank.problem);
    if (cells.length !== width && !(cut.blanksKept && cells.length < width)) {
      return told(
        `This line has ${entries(cells.length)} and the ${cut.heading === null ? 'first line' : 'heading'} ${width}. Give every line the same columns, with "${NO_VALUE}" where there is nothing.`,
      );
    }
    if (cells.some((cell) => cell.length > LONGEST_CELL))
      return told('This line has a cell that is too long to be printed. Shorten it.');
    return [{ line, scores: scores.value, rank: rank.value, further: furtherOf(cut, cells, width) }];
  });
}

/** Columns of the heading, or else of the first line. */
function widthOf({ heading, lines }: PublishedText): number {
  return (heading ?? lines[0]?.cells ?? []).length;
}

/** Cells that are neither score nor rank, in their order. */
function furtherOf({ scoreAt, rankAt }: PublishedText, cells: readonly string[], width: number): readonly string[] {
  return Array.from({ length: width }, (_, index) => index)
    .filter((index) => index !== scoreAt && index !== rankAt)
    .map((index) => (cells[index] ?? '').replace(/\s+/g, ' '));
}

/** One, two or four decimals, or a 0 before three of them: commas and points are then no marks of thousands. */
function provesDecimals(cell: string): boolean {
  return /\d[.,](?:\d{1,2}|\d{4,})(?!\d)|(?<!\d)0[.,]\d{3}(?!\d)/.test(cell);
}

function columnsOf(cut: PublishedText): readonly ClassTableColumn[] {
  const width = widthOf(cut);
  const names = cut.heading === null ? [] : furtherOf(cut, cut.heading, width);
  const places = furtherOf(
    cut,
    Array.from({ length: width }, (_, index) => String(index + 1)),
    width,
  );
  return places.map((place, index) => {
    const name = names[index] || `Column ${place}`;
    return { key: `column-${index + 1}`, name, heading: [name] };
  });
}

function tableOf(
  facts: PublishedFacts,
  scale: ScoreScale,
  rows: readonly RowUnits[],
  columns: readonly ClassTableColumn[],
): ClassTable {
  const { title, form, edition, date, cited, definition, population, n, peopleNoun } = facts;
  return {
    source: 'published',
    title,
    form,
    edition,
    date,
    check: '',
    draft: false,
    cited,
    definition: definition === 'unknown' ? '' : definitionInWords({ kind: definition }, scale.direction),
    definitionKind: definition,
    groupNoun: 'norm group',
    groupColumns: [],
    groups: [
      {
        values: [],
        title: standingTitle([], [], peopleNoun),
        n,
        population,
        note: '',
        rows: printedRows(scale, rows, columns),
      },
    ],
    columns,
    scale,
    reliability: null,
    level: null,
    defaultGroup: null,
    smallestCell: DEFAULT_POLICY.smallestCell.value,
    peopleNoun,
  };
}

function printedRows(
  scale: ScoreScale,
  rows: readonly RowUnits[],
  columns: readonly ClassTableColumn[],
): readonly ClassTableRow[] {
  // A table that prints normal curve equivalents is taken at its word.
  const ownNce = columns.findIndex(({ name }) => /^nce$/i.test(name));
  const written = rows.reduce((most, { row }) => Math.max(most, row.rank.written), 0);
  return rows.map(({ row: { scores, rank, further } }) => {
    const [low, high] = [toNumber(scores.low), toNumber(scores.high)];
    const ends = [printScore(scale, low), printScore(scale, high)];
    const known = rank.side === 'at' ? toNumber(rank.value) : null;
    return {
      low,
      high,
      scoreText: low === high ? (ends[0] ?? '') : ends.join('\u2013'),
      printed: rankText(rank, rank.side === 'at' ? written : rank.written),
      rank: known,
      nce: ownNce < 0 ? nceOf(known) : printedNumber(further[ownNce]),
      band: null,
      texts: Object.fromEntries(columns.map(({ key }, index) => [key, further[index] || NO_VALUE])),
    };
  });
}

/** NCE = 50 + 21.06 Φ⁻¹(rank/100) of the rank as it is printed; null for "<1", ">99", 0 and 100, which have none. */
function nceOf(rank: number | null): number | null {
  const z = rank === null ? null : normalisedZ(ratioNear(rank));
  return z === null ? null : linearScale(z, 50, NCE_FACTOR);
}

/** A number as a cell of the table prints it, whichever its decimal mark. */
function printedNumber(text = ''): number | null {
  const value = parseDecimal(text.replace(',', '.'));
  return value === null ? null : toNumber(value);
}

/** The table as lines that `readPublishedTable` reads as the same table, for corrections. */
export function publishedTableText({ columns, groups }: ClassTable): string {
  const heading = ['Raw score', 'Percentile rank', ...columns.map(({ name }) => name)];
  const lines = (groups[0]?.rows ?? []).map(({ scoreText, printed, texts }) => [
    scoreText,
    printed,
    ...columns.map(({ key }) => texts[key] ?? ''),
  ]);
  return [heading, ...lines].map((cells) => `${cells.join('\t')}\n`).join('');
}

function entries(count: number): string {
  return `${count} ${count === 1 ? 'entry' : 'entries'}`;
}

function failed(problem: string): PublishedRead {
  return { table: null, problems: [{ line: 0, problem }] };
}
