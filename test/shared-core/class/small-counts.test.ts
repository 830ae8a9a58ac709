import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { withTotals, type CountRow } from '../../../shared-core/class/class-counts.ts';
import { smallCells } from '../../../shared-core/class/small-counts.ts';
import { cellsOf, possibleTables, row } from './possible-tables.ts';

/** Small cells as signs: how little each can be, or a point. */
const signs = (rows: readonly CountRow[], below: number): string =>
  smallCells(withTotals(rows), below)
    .map((limits) => (limits === null ? '.' : String(limits.least)))
    .join('');

describe('small cells', () => {
  it('are standings from 0 and sums and statuses from 1, below the smallest told count', () => {
    expect(signs([row([2, 5, 0, 3], [1, 0, 4])], 3)).toBe('0.0..0...' + '0.0..1...');
    expect(signs([row([2, 5, 0, 3], [1, 0, 4])], 1)).toBe('.'.repeat(18));
    expect(smallCells(withTotals([row([2, 5])]), 3)[0]).toEqual({ least: 0, most: 2 });
  });

  it('are the parts of a small sum, to the last', () => {
    expect(signs([row([1, 1], [0]), row([5, 6], [4])], 3)).toBe('00001' + '.....' + '.....');
    expect(signs([row([4, 5], [2]), row([5, 6], [0])], 3)).toBe('...0.' + '...0.' + '...1.');
    expect(signs([row([0, 9], [5]), row([2, 9], [5])], 3)).toBe('0....' + '0....' + '0....');
  });

  it('are no 0 that follows from a told 0', () => {
    expect(signs([row([0, 0], [6]), row([5, 6], [0])], 3)).toBe('.'.repeat(15));
    expect(signs([row([0, 0], [2])], 3)).toBe('...00' + '...11');
  });

  it('are the same in every table that keeps to their limits and to the other side of them elsewhere', () => {
    const below = 3;
    const width = 5;
    const shape = { rows: 2, standings: 2, statuses: 1 };
    const counts = fc.array(fc.nat(5), { minLength: 6, maxLength: 6 });
    let compared = 0;
    fc.assert(
      fc.property(counts, ([a = 0, b = 0, c = 0, d = 0, e = 0, f = 0]) => {
        const table = withTotals([row([a, b], [c]), row([d, e], [f])]);
        const small = smallCells(table, below);
        const ranges = cellsOf(table).map((count, cell) => {
          const limits = small[cell] ?? null;
          if (limits !== null) return limits;
          if (count === 0) return { least: 0, most: 0 };
          const isSum = cell >= 2 * width || [2, 4].includes(cell % width);
          return { least: below, most: isSum ? Infinity : 5 };
        });
        for (const [p = 0, q = 0, , r = 0, , s = 0, t = 0, , u = 0] of possibleTables(shape, ranges)) {
          expect(smallCells(withTotals([row([p, q], [r]), row([s, t], [u])]), below)).toEqual(small);
          compared += 1;
        }
      }),
      { numRuns: 60 },
    );
    expect(compared).toBeGreaterThan(1000);
  });
});
