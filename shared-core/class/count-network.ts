import { mapCells, type CellPlace, type TotalledTable } from './class-counts.ts';

/** A cell as a link: its count flows from one node to another. */
export interface CountLink {
  readonly from: number;
  readonly to: number;
  readonly count: number;
  readonly place: CellPlace;
}

/**
 * A table of counts with all its sums as a circulation: at every node as much comes in as goes out. The total of a row
 * runs from the source to the row, from there to its tested and its statuses, from its tested to its standings; the
 * columns gather them, and the row of sums leads back to the source. The tables that agree in the told cells are the
 * whole-number circulations that agree in these links.
 */
export interface CountNetwork {
  /** In the order in which `mapCells` visits the cells. */
  readonly links: readonly CountLink[];
  /** For each node the numbers of the links that begin or end there. */
  readonly touching: readonly (readonly number[])[];
}

export type Way = 'up' | 'down';

export function countNetwork(table: TotalledTable<number>): CountNetwork {
  const [source, classAll, classTested, firstColumn] = [0, 1, 2, 3];
  const standings = table.together.standings.length;
  const firstRow = firstColumn + standings + table.together.statuses.length;
  const links: CountLink[] = [];
  mapCells(table, (count, place) => {
    const { row, kind } = place;
    const all = row === null ? classAll : firstRow + 2 * row;
    const tested = row === null ? classTested : all + 1;
    const column = firstColumn + (kind === 'status' ? standings : 0) + place.column;
    const ends = { standing: [tested, column], tested: [all, tested], status: [all, column], total: [source, all] };
    const [outer = 0, inner = 0] = ends[kind];
    links.push(row === null ? { from: inner, to: outer, count, place } : { from: outer, to: inner, count, place });
  });
  const nodes = firstRow + 2 * table.rows.length;
  const touching = Array.from({ length: nodes }, (): number[] => []);
  links.forEach(({ from, to }, index) => [from, to].forEach((node) => touching[node]?.push(index)));
  return { links, touching };
}

/** The node at which one arrives who goes along a link: with the flow when it goes up, against it when it goes down. */
export function headOf({ from, to }: CountLink, way: Way): number {
  return way === 'up' ? to : from;
}

/** The node at which one sets out. */
export function tailOf({ from, to }: CountLink, way: Way): number {
  return way === 'up' ? from : to;
}

export function linkAt({ links }: CountNetwork, index: number): CountLink {
  const link = links[index];
  if (link === undefined) throw new RangeError(`no cell ${index} in this table`);
  return link;
}

export function isStandingAt(network: CountNetwork, cell: number): boolean {
  return linkAt(network, cell).place.kind === 'standing';
}
