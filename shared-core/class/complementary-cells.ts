import type { CellPlace } from './class-counts.ts';
import { headOf, isStandingAt, linkAt, tailOf, type CountNetwork } from './count-network.ts';

/**
 * What is lost with a cell, in the cells of one group, and in the row of sums. The total goes first: how many pupils a
 * class has is no result.
 */
const LOSS = { standing: [10, 30], tested: [16, 40], status: [6, 12], total: [5, 8] } as const;
/** So dear that it is only taken where nothing else is left. */
const LAST_RESORT = 1000;
const THROUGH_SMALL = 100;
const ON_FIRST_RING = 200;

/**
 * The cells that are hidden so that the small ones cannot be worked out, with the small ones, by their numbers in the
 * network. Each small cell is put on a ring of hidden cells round which pupils could be moved without any sum changing:
 * the cheapest ring by what is lost, and where there are several groups a second one that shares as little as can be with
 * the first, since a ring is blocked where a count on it lies at its limit.
 *
 * A ring for a standing keeps to standings and their sums as long as it can, so that it holds against people who know how
 * many of each group were tested and how many were absent, as staff of a school do. Rings for the others keep clear of
 * told standings as long as they can; a standing that one of them hides gets a ring of its own.
 *
 * The choice looks only at which cells are small and which are 0, never at the other counts: so the pattern on the page
 * tells no more than that. Rings as in Cox (1980), Journal of the American Statistical Association 75, 377–385 (from
 * memory); weights and the second ring are this program's own.
 */
export function withComplementaryCells(
  network: CountNetwork,
  isSmall: (cell: number) => boolean,
  rings: 1 | 2,
): ReadonlySet<number> {
  const hidden = new Set([...network.links.keys()].filter(isSmall));
  const waiting = [...hidden];
  for (const cell of waiting) {
    const isStanding = isStandingAt(network, cell);
    const used = new Set<number>();
    for (let ring = 0; ring < rings; ring += 1) {
      const loss = (other: number): number => {
        const { place, count } = linkAt(network, other);
        const isStrange = isStandingAt(network, other) !== isStanding;
        if (used.has(other)) return ON_FIRST_RING;
        if (hidden.has(other) && !(isStanding && isStrange)) return isSmall(other) ? THROUGH_SMALL : 0;
        if (count === 0 && !hidden.has(other)) return Infinity;
        return lossOf(place) + (isStrange ? LAST_RESORT : 0);
      };
      const found = cheapestRing(network, cell, loss);
      if (found === null || (ring > 0 && found.loss >= LAST_RESORT)) break;
      for (const other of found.cells) {
        if (!isSmall(other)) used.add(other);
        if (!hidden.has(other) && !isStanding && isStandingAt(network, other)) waiting.push(other);
        hidden.add(other);
      }
    }
  }
  return hidden;
}

function lossOf({ kind, row }: CellPlace): number {
  return LOSS[kind][row === null ? 1 : 0];
}

interface Ring {
  readonly cells: readonly number[];
  readonly loss: number;
}

/** The ring through a cell with the least loss, of these the shortest, of these the first (Bellman and Ford). */
function cheapestRing(network: CountNetwork, cell: number, loss: (cell: number) => number): Ring | null {
  const { from, to } = linkAt(network, cell);
  const reached = new Map<number, Ring>([[from, { cells: [], loss: 0 }]]);
  for (let isBetter = true; isBetter;) {
    isBetter = false;
    for (const [index, link] of network.links.entries()) {
      if (index === cell || loss(index) === Infinity) continue;
      for (const way of ['up', 'down'] as const) {
        const before = reached.get(tailOf(link, way));
        if (before === undefined) continue;
        const ring = { cells: [...before.cells, index], loss: before.loss + loss(index) };
        if (!isLess(ring, reached.get(headOf(link, way)))) continue;
        reached.set(headOf(link, way), ring);
        isBetter = true;
      }
    }
  }
  return reached.get(to) ?? null;
}

function isLess(ring: Ring, known: Ring | undefined): boolean {
  if (known === undefined || ring.loss < known.loss) return true;
  return ring.loss === known.loss && ring.cells.length < known.cells.length;
}
