import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cellBounds } from '../../../shared-core/class/cell-bounds.ts';
import { withTotals } from '../../../shared-core/class/class-counts.ts';
import { countNetwork } from '../../../shared-core/class/count-network.ts';
import { cellsOf, possibleTables, row } from './possible-tables.ts';

const shapes = fc.constantFrom(
  { rows: 1, standings: 3, statuses: 1 },
  { rows: 2, standings: 2, statuses: 0 },
  { rows: 2, standings: 2, statuses: 1 },
  { rows: 3, standings: 2, statuses: 0 },
);

const tables = shapes.chain((shape) =>
  fc.record({
    shape: fc.constant(shape),
    rows: fc.array(
      fc.record({
        standings: fc.array(fc.nat(3), { minLength: shape.standings, maxLength: shape.standings }),
        statuses: fc.array(fc.nat(3), { minLength: shape.statuses, maxLength: shape.statuses }),
      }),
      { minLength: shape.rows, maxLength: shape.rows },
    ),
    // How far below and above its count each cell may be.
    slack: fc.array(fc.tuple(fc.nat(2), fc.nat(2), fc.nat(9)), { minLength: 24, maxLength: 24 }),
  }),
);

describe('bounds of a cell', () => {
  it('are those that trying all tables finds, and every count between them is possible', () => {
    let moved = 0;
    fc.assert(
      fc.property(tables, ({ shape, rows, slack }) => {
        const table = withTotals(rows);
        const limits = cellsOf(table).map((count, cell) => {
          const [down, up, told] = slack[cell] ?? [0, 0, 0];
          return told > 2 ? { least: Math.max(0, count - down), most: count + up } : { least: count, most: count };
        });
        const possible = possibleTables(shape, limits);
        limits.forEach((_, cell) => {
          const counts = [...new Set(possible.map((cells) => cells[cell] ?? NaN))].sort((a, b) => a - b);
          const { least, most } = cellBounds(countNetwork(table), limits, cell);
          expect(counts).toEqual(Array.from({ length: most - least + 1 }, (_gap, step) => least + step));
          if (most > least) moved += 1;
        });
      }),
      { numRuns: 150 },
    );
    expect(moved).toBeGreaterThan(100);
  });

  it('are open upwards where nothing limits a ring of cells, and look no further than asked', () => {
    const network = countNetwork(withTotals([row([2, 9])]));
    const open = network.links.map(() => ({ least: 0, most: Infinity }));
    expect(cellBounds(network, open, 0)).toEqual({ least: 0, most: Infinity });
    expect(cellBounds(network, open, 0, 3)).toEqual({ least: 0, most: 5 });
    expect(cellBounds(network, open, 1, 3)).toEqual({ least: 6, most: 12 });
  });
});
