import { headOf, linkAt, tailOf, type CountNetwork, type Way } from './count-network.ts';

/** The whole numbers that a count may be as far as somebody knows; `most` is Infinity where nothing limits it. */
export interface CountLimits {
  readonly least: number;
  readonly most: number;
}

/**
 * The least and the most that the count of one cell can be when every cell keeps within its limits, exactly. The true
 * counts must keep within them. Because limits are whole numbers and the sums make a network, each whole number between
 * the two is the count of some table as well (integrality of flows in networks). With `enough`, no further from the true
 * count than this many either way.
 */
export function cellBounds(
  network: CountNetwork,
  limits: readonly CountLimits[],
  cell: number,
  enough = Infinity,
): CountLimits {
  const { count } = linkAt(network, cell);
  return {
    least: count - furthestMove(network, limits, cell, 'down', enough),
    most: count + furthestMove(network, limits, cell, 'up', enough),
  };
}

interface Step {
  readonly link: number;
  readonly way: Way;
}

/** How far one cell can move: a largest flow round its link, by shortest augmenting paths (Edmonds and Karp 1972). */
function furthestMove(
  network: CountNetwork,
  limits: readonly CountLimits[],
  cell: number,
  way: Way,
  enough: number,
): number {
  const flow = network.links.map(({ count }) => count);
  const slack = ({ link, way: side }: Step): number => {
    const { least, most } = limits[link] ?? { least: 0, most: 0 };
    const count = flow[link] ?? 0;
    return side === 'up' ? most - count : count - least;
  };
  const wanted = Math.min(enough, slack({ link: cell, way }));
  let moved = 0;
  while (moved < wanted) {
    const path = shortestWayBack(network, slack, cell, way);
    if (path === null) return moved;
    const width = Math.min(wanted - moved, ...path.map(slack));
    if (width === Infinity) return Infinity;
    for (const { link, way: side } of path) flow[link] = (flow[link] ?? 0) + (side === 'up' ? width : -width);
    moved += width;
  }
  return moved;
}

/** The steps that balance a move of one cell: from where it arrives to where it set out, not along itself. */
function shortestWayBack(
  network: CountNetwork,
  slack: (step: Step) => number,
  cell: number,
  way: Way,
): readonly Step[] | null {
  const moving = linkAt(network, cell);
  const [start, end] = [headOf(moving, way), tailOf(moving, way)];
  const arrivedBy = new Map<number, Step>();
  const queue = [start];
  for (const node of queue) {
    for (const index of network.touching[node] ?? []) {
      const link = linkAt(network, index);
      const step: Step = { link: index, way: link.from === node ? 'up' : 'down' };
      const head = headOf(link, step.way);
      if (index === cell || head === start || arrivedBy.has(head) || slack(step) <= 0) continue;
      arrivedBy.set(head, step);
      if (head === end) return stepsTo(network, arrivedBy, start, end);
      queue.push(head);
    }
  }
  return null;
}

function stepsTo(
  network: CountNetwork,
  arrivedBy: ReadonlyMap<number, Step>,
  start: number,
  end: number,
): readonly Step[] {
  const steps: Step[] = [];
  for (let node = end; node !== start;) {
    const step = arrivedBy.get(node);
    if (step === undefined) throw new Error('a path that was found can be walked back');
    steps.push(step);
    node = tailOf(linkAt(network, step.link), step.way);
  }
  return steps;
}
