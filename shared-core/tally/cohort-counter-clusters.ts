import { ValueNumbers } from './cohort-counter-texts.ts';
import type { PlacedSlots } from './cohort-counter-scores.ts';
import type { ReadWeight, WeightSums, WeightUnit } from './cohort-counter-weights.ts';
import { compareGroupValues, type CellClusters, type ClusterPart } from './tally.ts';

/** Most parts (a cluster within a combination of group values) that a tally holds. */
export const MAX_CLUSTER_PARTS = 5000;

/** Number of the blank value: whoever has it stands alone. */
const BLANK = 0;

/** People by slot, held for the slots that occur alone. */
class SlotPeople {
  readonly counts: number[] = [];
  readonly places = new Map<number, number>();

  constructor(readonly sums: WeightSums | null) {}

  add(slot: number, people: number, unit: WeightUnit | null, weight: ReadWeight): void {
    let place = this.places.get(slot);
    if (place === undefined) {
      place = this.counts.length;
      this.places.set(slot, place);
      this.counts.push(0);
    }
    this.counts[place] = (this.counts[place] ?? 0) + people;
    if (unit !== null && this.sums !== null) unit.add(this.sums, place, weight, people);
  }

  /** Positions with people, ascending, and where each stands in the lists. */
  placed(slots: PlacedSlots): readonly { readonly position: number; readonly place: number }[] {
    return [...this.places]
      .filter(([, place]) => (this.counts[place] ?? 0) > 0)
      .map(([slot, place]) => ({ position: slots.positionOf(slot), place }))
      .sort((left, right) => left.position - right.position);
  }
}

/** The people of one combination of group values by cluster. */
export class CellClusterCounts {
  readonly byNumber = new Map<number, SlotPeople>();
}

/** Counts people by the cluster they were drawn in; the names are forgotten when the tally is made. */
export class ClusterCounter {
  /** A sentence once there are too many clusters to hold; null as long as there are not. */
  problem: string | null = null;
  private readonly values = new ValueNumbers();
  private parts = 0;

  constructor(
    private readonly position: number,
    private readonly name: string,
    private readonly keepsBlank: boolean,
    private readonly unit: WeightUnit | null,
  ) {}

  /** The number of a row's cluster; null when it has none and such rows are left out. */
  numberOf(row: readonly string[]): number | null {
    const number = this.values.numberOf(row[this.position] ?? '');
    return number === BLANK && !this.keepsBlank ? null : number;
  }

  add(cell: CellClusterCounts, number: number, slot: number, people: number, weight: ReadWeight): void {
    let part = cell.byNumber.get(number);
    if (part === undefined) {
      part = new SlotPeople(this.unit?.sums(0) ?? null);
      cell.byNumber.set(number, part);
      if (number !== BLANK) this.parts += 1;
      if (this.parts > MAX_CLUSTER_PARTS) this.problem = this.tooMany();
    }
    part.add(slot, people, this.unit, weight);
  }

  /**
   * What a tally holds of each cell, in the order given. Clusters are numbered from 0 in the order of their values, so
   * that the order of the rows shows nowhere.
   */
  finish(cells: readonly CellClusterCounts[], placed: PlacedSlots, length: number): readonly CellClusters[] {
    const used = [...new Set(cells.flatMap((cell) => numbersIn(cell)))];
    const valueOf = (number: number): string => this.values.values[number] ?? '';
    const order = used.sort((left, right) => compareGroupValues([valueOf(left)], [valueOf(right)]));
    const clusterOf = new Map(order.map((number, cluster) => [number, cluster]));
    return cells.map((cell) => {
      const parts = numbersIn(cell).flatMap((number): readonly ClusterPart[] => {
        const people = cell.byNumber.get(number);
        return people === undefined ? [] : [partOf(clusterOf.get(number) ?? 0, people, placed)];
      });
      return {
        parts: parts.sort((left, right) => left.cluster - right.cluster),
        ...this.alone(cell.byNumber.get(BLANK), placed, length),
      };
    });
  }

  private alone(
    people: SlotPeople | undefined,
    placed: PlacedSlots,
    length: number,
  ): Pick<CellClusters, 'alone' | 'aloneSquares'> {
    const alone = new Array<number>(length).fill(0);
    const aloneSquares = this.unit === null ? null : new Array<string>(length).fill('0');
    for (const { position, place } of people?.placed(placed) ?? []) {
      alone[position] = people?.counts[place] ?? 0;
      if (aloneSquares !== null) aloneSquares[position] = String(people?.sums?.squares.total(place) ?? 0n);
    }
    return { alone, aloneSquares };
  }

  private tooMany(): string {
    return (
      `Column "${this.name}" and the groups make more than ${MAX_CLUSTER_PARTS} clusters within groups, more than can ` +
      'be told apart. Choose a column of larger clusters, use fewer groups, or leave the column unused.'
    );
  }
}

/** Numbers of the named clusters that have people in the cell. */
function numbersIn(cell: CellClusterCounts): readonly number[] {
  return [...cell.byNumber]
    .filter(([number, { counts }]) => number !== BLANK && counts.some((people) => people > 0))
    .map(([number]) => number);
}

function partOf(cluster: number, people: SlotPeople, slots: PlacedSlots): ClusterPart {
  const placed = people.placed(slots);
  const { sums } = people;
  return {
    cluster,
    positions: placed.map(({ position }) => position),
    counts: placed.map(({ place }) => people.counts[place] ?? 0),
    weights: sums === null ? null : placed.map(({ place }) => String(sums.weights.total(place))),
  };
}
