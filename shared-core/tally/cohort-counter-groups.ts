import { CellClusterCounts } from './cohort-counter-clusters.ts';
import { ownCopy, ValueNumbers } from './cohort-counter-texts.ts';
import { widened, type WeightSums, type WeightUnit } from './cohort-counter-weights.ts';

export const MAX_GROUPS = 2000;
const MAX_VALUE_LENGTH = 400;

/** What is counted of one combination of group values. */
export class GroupCell {
  counts: Float64Array;
  readonly clusters = new CellClusterCounts();

  constructor(
    readonly values: readonly string[],
    readonly sums: WeightSums | null,
    slots: number,
  ) {
    this.counts = new Float64Array(slots);
  }

  count(slot: number, people: number): void {
    if (slot >= this.counts.length) this.counts = widened(this.counts, slot);
    this.counts[slot] = (this.counts[slot] ?? 0) + people;
  }
}

interface GroupNode {
  readonly children: (GroupNode | undefined)[];
  cell: GroupCell | null;
}

/** Finds the cell of a row by its group values: one small table a column, no text built for a row. */
export class GroupCells {
  readonly cells: GroupCell[] = [];
  /** A sentence once there are too many groups to table; null as long as there are not. */
  problem: string | null = null;
  private readonly root: GroupNode = { children: [], cell: null };
  private readonly columns: readonly ValueNumbers[];

  constructor(
    private readonly positions: readonly number[],
    private readonly names: readonly string[],
    private readonly keepBlank: boolean,
    private readonly slots: number,
    private readonly weightUnit: WeightUnit | null,
  ) {
    this.columns = positions.map(() => new ValueNumbers());
  }

  /** Null when a grouping value is blank and such rows are left out. The cell is made at its first row. */
  nodeOf(row: readonly string[]): GroupNode | null {
    let node = this.root;
    for (let index = 0; index < this.columns.length; index += 1) {
      const column = this.columns[index];
      if (column === undefined) break;
      const number = column.numberOf(row[this.positions[index] ?? 0] ?? '');
      if (number === 0 && !this.keepBlank) return null;
      node = node.children[number] ??= { children: [], cell: null };
    }
    return node;
  }

  /** The cell of a row that is kept. */
  cellAt(node: GroupNode, row: readonly string[]): GroupCell {
    return (node.cell ??= this.newCell(row));
  }

  private newCell(row: readonly string[]): GroupCell {
    const values = this.positions.map((position) => ownCopy((row[position] ?? '').trim()));
    const cell = new GroupCell(values, this.weightUnit?.sums(this.slots) ?? null, this.slots);
    this.cells.push(cell);
    if (this.cells.length > MAX_GROUPS) this.problem = this.tooMany();
    const long = values.findIndex((value) => value.length > MAX_VALUE_LENGTH);
    if (long >= 0) {
      this.problem =
        `Column "${this.names[long] ?? ''}" holds a text of more than ${MAX_VALUE_LENGTH} characters, ` +
        'which cannot name a group. Choose another grouping column.';
    }
    return cell;
  }

  private tooMany(): string {
    const sizes = this.columns.map((column) => column.values.length);
    const widest = sizes.indexOf(Math.max(...sizes));
    return (
      `The grouping columns make more than ${MAX_GROUPS} groups; column "${this.names[widest] ?? ''}" ` +
      'has the most different values. Leave it unused, or give it fewer values.'
    );
  }
}
