import { describe, expect, it } from 'vitest';
import { mapCells, rowTogether, withTotals } from '../../../shared-core/class/class-counts.ts';
import { countNetwork, linkAt } from '../../../shared-core/class/count-network.ts';
import { cellsOf, row } from './possible-tables.ts';

const two = [row([2, 5, 4, 3], [1, 0]), row([1, 4, 6, 3], [2, 1])];

describe('counts of a class', () => {
  it('get all their sums', () => {
    expect(withTotals(two)).toEqual({
      rows: [
        { standings: [2, 5, 4, 3], tested: 14, statuses: [1, 0], total: 15 },
        { standings: [1, 4, 6, 3], tested: 14, statuses: [2, 1], total: 17 },
      ],
      together: { standings: [3, 9, 10, 6], tested: 28, statuses: [3, 1], total: 32 },
    });
    expect(withTotals([rowTogether(two)]).together).toEqual(withTotals(two).together);
  });

  it('are visited row by row, sums last', () => {
    expect(cellsOf(withTotals([row([1, 2], [3]), row([4, 5], [6])]))).toEqual([
      1, 2, 3, 3, 6, 4, 5, 9, 6, 15, 5, 7, 12, 9, 21,
    ]);
    const places: string[] = [];
    mapCells(withTotals([row([1], [2])]), (_, { row: at, kind, column }) =>
      places.push(`${at ?? 'all'} ${kind} ${column}`),
    );
    expect(places).toEqual(
      ['0', 'all'].flatMap((at) => ['standing 0', 'tested 0', 'status 0', 'total 0'].map((place) => `${at} ${place}`)),
    );
  });

  it('are refused when they are no table of counts', () => {
    for (const rows of [[], [row([])], [row([1, 2]), row([1])], [row([1], [1]), row([1])], [row([-1])], [row([0.5])]]) {
      expect(() => withTotals(rows)).toThrow(RangeError);
    }
  });

  it('flow round: as much comes into each node as goes out', () => {
    const network = countNetwork(withTotals(two));
    const balance = network.touching.map((links, node) =>
      links.reduce((sum, index) => {
        const { from, to, count } = linkAt(network, index);
        return sum + (to === node ? count : 0) - (from === node ? count : 0);
      }, 0),
    );
    expect(balance.length).toBe(3 + 6 + 4);
    expect(new Set(balance)).toEqual(new Set([0]));
    expect(() => linkAt(network, network.links.length)).toThrow(RangeError);
  });
});
