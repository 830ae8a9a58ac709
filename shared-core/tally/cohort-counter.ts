import type { Reply } from '../desk.ts';
import { leftOutInWords, type LeftOutRule, type Reading } from '../norms/reading.ts';
import { parseDecimal, type DecimalMark } from '../scale/decimal.ts';
import { scaleGrid, scaleProblems } from '../scale/score-scale.ts';
import { countedColumns, type CountedColumns } from './cohort-counter-columns.ts';
import { ClusterCounter } from './cohort-counter-clusters.ts';
import { FlowRecorder, type RowFlow } from './cohort-counter-flow.ts';
import { GroupCells, type GroupCell } from './cohort-counter-groups.ts';
import type { Identities } from './cohort-counter-identities.ts';
import { scoreSlots, type PlacedSlots, type ScoreSlots } from './cohort-counter-scores.ts';
import { TextMemo } from './cohort-counter-texts.ts';
import { WeightReader, WeightUnit } from './cohort-counter-weights.ts';
import { compareGroupValues, type Tally, type CellClusters, type TallyCell } from './tally.ts';

export interface CountedCohort {
  readonly tally: Tally;
  readonly flow: RowFlow;
  /** True when the reading declares no scale and it was taken from the scores. */
  readonly scaleInferred: boolean;
}

/**
 * A counter for rows read in a given way, or the sentence that says why the reading does not fit the columns.
 * `identities` decides on duplicates where the reading has an id column; null looks at no identifier.
 */
export function cohortCounter(
  reading: Reading,
  columns: readonly string[],
  identities: Identities | null,
): Reply<CohortCounter> {
  const problems = reading.scale === null ? [] : scaleProblems(reading.scale);
  if (problems.length > 0) return { ok: false, problem: problems.join(' ') };
  const found = countedColumns(reading, columns);
  return found.ok ? { ok: true, value: new CohortCounter(reading, found.value, identities) } : found;
}

/**
 * Counts rows into a tally and keeps the exclusion flow. Rows read are rows of the file: in a file of counts one row may
 * stand for many people or, with a count of 0, for none, and is still one row kept. A weight in a file of counts is the
 * weight of each person of that row.
 *
 * The rules are asked in the order of LEFT_OUT_RULES. Sums are exact, so that neither the order of the rows nor the way
 * they are cut into files changes the tally.
 */
export class CohortCounter {
  private readonly recorder = new FlowRecorder();
  private readonly scores: ScoreSlots;
  private readonly groups: GroupCells;
  private readonly clusters: ClusterCounter | null;
  private readonly weightUnit: WeightUnit | null;
  private readonly weights: WeightReader;
  private readonly peopleIn: TextMemo<number>;
  private readonly keepsRagged: boolean;

  constructor(
    private readonly reading: Reading,
    private readonly at: CountedColumns,
    private readonly identities: Identities | null,
  ) {
    this.scores = scoreSlots(reading);
    this.weightUnit = at.weight === null ? null : new WeightUnit();
    this.weights = new WeightReader(reading.decimalMark);
    this.peopleIn = new TextMemo((text) => countIn(text, reading.decimalMark));
    this.keepsRagged = reading.decisions.raggedRow === 'keep-readable';
    const slots = reading.scale === null ? 0 : scaleGrid(reading.scale).length;
    const keepsBlank = reading.decisions.blankGroup === 'keep';
    const keepsAlone = reading.decisions.blankCluster === 'alone';
    this.clusters =
      at.cluster === null ? null : new ClusterCounter(at.cluster.at, at.cluster.name, keepsAlone, this.weightUnit);
    this.groups = new GroupCells(at.groups, at.groupColumns, keepsBlank, slots, this.weightUnit);
  }

  /** A sentence once the rows cannot be tallied whatever follows; null as long as they can. */
  get problem(): string | null {
    return this.scores.problem ?? this.groups.problem ?? this.clusters?.problem ?? null;
  }

  /** One row of texts with its number in the file, the heading being row 1. */
  add(row: readonly string[], rowNumber: number): void {
    const rule = this.count(row);
    if (rule === null) this.recorder.keep();
    else this.recorder.leaveOut(rule, rowNumber);
  }

  /** The tally and the flow of all rows so far; a sentence where nothing can be tabled. */
  finish(): Reply<CountedCohort> {
    if (this.problem !== null) return { ok: false, problem: this.problem };
    const flow = this.recorder.flow();
    if (flow.rowsKept === 0) return { ok: false, problem: nothingKept(flow, this.reading) };
    const placed = this.scores.place();
    if (!placed.ok) return placed;
    const { scale, inferred } = placed.value;
    const { length } = scaleGrid(scale);
    const found = this.groups.cells;
    const clusters = this.clusters?.finish(
      found.map((cell) => cell.clusters),
      placed.value,
      length,
    );
    const cells = found
      .map((cell, index) => tallyCell(cell, placed.value, length, clusters?.[index] ?? null))
      .filter((cell) => cell.counts.some((count) => count > 0))
      .sort((left, right) => compareGroupValues(left.values, right.values));
    if (cells.length === 0) return { ok: false, problem: 'All counts are 0: there is nobody to tally.' };
    if (cells.some((cell) => cell.counts.some((count) => !Number.isSafeInteger(count)))) {
      return {
        ok: false,
        problem: 'The counts add up to more people than can be counted exactly. Check the count column.',
      };
    }
    return {
      ok: true,
      value: {
        tally: { scale, groupColumns: this.at.groupColumns, weightDecimals: this.weightUnit?.decimals ?? null, cells },
        flow,
        scaleInferred: inferred,
      },
    };
  }

  /** Counts the row, or returns the rule that leaves it out. */
  private count(row: readonly string[]): LeftOutRule | null {
    const { at } = this;
    if (isBlank(row)) return 'blank-row';
    if (row.length !== at.width && !(this.keepsRagged && row.length > at.lastNeeded)) return 'ragged-row';
    if (this.identities !== null && at.id !== null) {
      const id = (row[at.id] ?? '').trim();
      if (id !== '' && this.identities.leavesOut(id)) return 'duplicate-id';
    }
    const slot = this.scores.slotOf(row[at.score] ?? '');
    if (typeof slot === 'string') return slot;
    const node = this.groups.nodeOf(row);
    if (node === null) return 'blank-group';
    const cluster = this.clusters?.numberOf(row) ?? null;
    if (this.clusters !== null && cluster === null) return 'blank-cluster';
    if (at.weight !== null && !this.weights.read(row[at.weight] ?? '')) return 'bad-weight';
    const people = at.count === null ? 1 : this.peopleIn.get(row[at.count] ?? '');
    if (people < 0) return 'bad-count';
    const cell = this.groups.cellAt(node, row);
    this.scores.use(slot);
    cell.count(slot, people);
    if (this.weightUnit !== null && cell.sums !== null) this.weightUnit.add(cell.sums, slot, this.weights, people);
    if (cluster !== null) this.clusters?.add(cell.clusters, cluster, slot, people, this.weights);
    return null;
  }
}

function isBlank(row: readonly string[]): boolean {
  for (const cell of row) {
    if (cell.trim() !== '') return false;
  }
  return true;
}

/** A whole number of 0 or more; −1 for anything else. */
function countIn(text: string, mark: DecimalMark): number {
  const decimal = parseDecimal(text, mark);
  if (decimal === null || decimal.units < 0n) return -1;
  const unit = 10n ** BigInt(decimal.decimals);
  const people = Number(decimal.units / unit);
  return decimal.units % unit === 0n && Number.isSafeInteger(people) ? people : -1;
}

function tallyCell(cell: GroupCell, placed: PlacedSlots, length: number, clusters: CellClusters | null): TallyCell {
  const counts = new Array<number>(length).fill(0);
  const weights = cell.sums === null ? null : new Array<string>(length).fill('0');
  const squares = cell.sums === null ? null : new Array<string>(length).fill('0');
  cell.counts.forEach((count, slot) => {
    if (count === 0) return;
    const position = placed.positionOf(slot);
    counts[position] = count;
    if (cell.sums === null || weights === null || squares === null) return;
    weights[position] = cell.sums.weights.total(slot).toString();
    squares[position] = cell.sums.squares.total(slot).toString();
  });
  return { values: cell.values, counts, weights, squares, clusters };
}

function nothingKept({ rowsRead, leftOut }: RowFlow, reading: Reading): string {
  const [most] = leftOut.toSorted((left, right) => right.count - left.count);
  if (most === undefined) return 'The file has no rows below the heading.';
  const words = leftOutInWords(most.rule);
  const why =
    rowsRead === 1
      ? `The only row cannot be counted: it has ${words}.`
      : `None of the ${rowsRead} rows can be counted; ${most.count} of them have ${words}.`;
  return `${why} ${whatToDo(most.rule, reading)}`;
}

function whatToDo(rule: LeftOutRule, { decimalMark }: Reading): string {
  switch (rule) {
    case 'not-a-number':
      return `Is the score column the right one, and is "${decimalMark}" the decimal mark of the file?`;
    case 'blank-row':
    case 'ragged-row':
      return 'Is the separator the right one?';
    case 'duplicate-id':
      return 'Is the id column the right one?';
    case 'blank-score':
    case 'missing-code':
      return 'Is the score column the right one, and are the codes for missing scores right?';
    case 'below-scale':
    case 'above-scale':
    case 'off-grid':
      return 'Are the ends and the step of the scale right?';
    case 'blank-group':
      return 'Are the grouping columns the right ones?';
    case 'blank-cluster':
      return 'Is the cluster column the right one?';
    case 'bad-weight':
      return 'Is the weight column the right one, and is the decimal mark right?';
    case 'bad-count':
      return 'Is the count column the right one?';
  }
}
