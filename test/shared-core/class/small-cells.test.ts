import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { withTotals, type CountRow, type TotalledRow } from '../../../shared-core/class/class-counts.ts';
import { withComplementaryCells } from '../../../shared-core/class/complementary-cells.ts';
import { countNetwork } from '../../../shared-core/class/count-network.ts';
import {
  SHARED_AGAIN_CAUTION,
  smallestToldCount,
  suppressed,
  type SuppressedCell,
} from '../../../shared-core/class/small-cells.ts';
import { smallCells } from '../../../shared-core/class/small-counts.ts';
import { cellsOf, row } from './possible-tables.ts';

const sign = (cell: SuppressedCell): string =>
  cell.kind === 'told' ? String(cell.count) : cell.why === 'small' ? 's' : 'c';
const line = ({ standings, tested, statuses, total }: TotalledRow<SuppressedCell>): string =>
  [standings.map(sign).join(' '), sign(tested), statuses.map(sign).join(' '), sign(total)].join(' | ');

/** The page with "s" for small cells and "c" for complementary ones. */
const page = (rows: readonly CountRow[], smallestCell: number): readonly string[] => {
  const table = suppressed(rows, smallestCell);
  if (table.kind === 'nothing') return [table.sentence];
  return [...(table.kind === 'table' ? table.rows.map(line) : [table.sentence]), line(table.together)];
};

const counts = (most: number, length: number): fc.Arbitrary<number[]> =>
  fc.array(fc.oneof(fc.nat(most), fc.nat(6)), { minLength: length, maxLength: length });
const classes = (groups: number, standings: number, statuses: number, most: number): fc.Arbitrary<CountRow[]> =>
  fc.array(fc.record({ standings: counts(most, standings), statuses: counts(6, statuses) }), {
    minLength: 1,
    maxLength: groups,
  });

describe('suppression of small cells', () => {
  it('tells everything where no count is small', () => {
    expect(page([row([7, 9, 8, 4], [3, 0, 0])], 3)).toEqual(Array(2).fill('7 9 8 4 | 28 | 3 0 0 | 31'));
    expect(page([row([3, 5], [0]), row([4, 6], [3])], 3)).toEqual([
      '3 5 | 8 | 0 | 8',
      '4 6 | 10 | 3 | 13',
      '7 11 | 18 | 3 | 21',
    ]);
    fc.assert(
      fc.property(classes(4, 4, 2, 15), fc.integer({ min: 0, max: 5 }), (rows, smallestCell) => {
        const below = smallestToldCount(smallestCell);
        if (smallCells(withTotals(rows), below).some((small) => small !== null)) return;
        const table = suppressed(rows, smallestCell);
        expect(table.kind).toBe('table');
        expect(table.kind === 'table' && cellsOf(table).every(({ kind }) => kind === 'told')).toBe(true);
      }),
    );
    expect(page([row([1, 0, 2, 9], [1, 1, 1])], 1)[0]).toBe('1 0 2 9 | 12 | 1 1 1 | 15');
    expect(page([row([1, 0]), row([0, 1])], 0)).toEqual(['1 0 | 1 |  | 1', '0 1 | 1 |  | 1', '1 1 | 2 |  | 2']);
  });

  it('hides a small quarter with a second one, and few absent with the total', () => {
    expect(page([row([2, 9, 8, 7], [0, 0, 0])], 3)[0]).toBe('s c 8 7 | 26 | 0 0 0 | 26');
    expect(page([row([7, 9, 8, 4], [2, 0, 0])], 3)[0]).toBe('7 9 8 4 | 28 | s 0 0 | c');
    const table = suppressed([row([2, 9, 8, 7], [0, 0, 0])], 3);
    expect(table.kind === 'table' && table.rows[0]?.standings[0]).toEqual({
      kind: 'hidden',
      why: 'small',
      byReader: { least: 0, most: 11 },
      byInsider: { least: 0, most: 2 },
    });
  });

  it('hides that all, or nearly all, stand in one quarter', () => {
    expect(page([row([0, 0, 12, 0], [0])], 3)[0]).toBe('s s c s | 12 | 0 | 12');
    expect(page([row([0, 1, 26, 0], [0])], 3)[0]).toBe('s s c s | 27 | 0 | 27');
  });

  it('hides small counts of groups together with as many of another group', () => {
    expect(page([row([2, 12, 7, 8]), row([9, 7, 8, 7]), row([6, 9, 10, 7])], 3)).toEqual([
      's c c 8 | 29 |  | 29',
      'c c 8 7 | 31 |  | 31',
      'c 9 c 7 | 32 |  | 32',
      '17 28 25 22 | 92 |  | 92',
    ]);
  });

  it('leaves the groups out where they are too small, and tells the class', () => {
    const lines = page([row([2, 5, 4, 3], [1]), row([1, 4, 6, 3], [2])], 3);
    expect(lines[0]).toContain('Counts by group are left out');
    expect(lines[1]).toBe('3 9 10 6 | 28 | 3 | 31');
  });

  it('says so in a sentence where nothing can be told: a class of 1, of 2, and counts that force each other', () => {
    for (const rows of [[row([0, 1, 0, 0], [0])], [row([1, 1, 0, 0], [0])], [row([3, 3, 0, 0], [0])]]) {
      expect(page(rows, 3)).toEqual([
        'No counts are told: counts below 3 could be worked out from the others. Share the pages with names or codes with those who may see them.',
      ]);
    }
    expect(page([row([3, 10, 2, 5], [0]), row([3, 9, 1, 6], [0])], 3)[0]).toContain(
      'Share the class without its groups',
    );
  });

  it('tells that all were absent, and hides that one or two were', () => {
    expect(page([row([0, 0, 0, 0], [28, 0, 0])], 3)[0]).toBe('0 0 0 0 | 0 | 28 0 0 | 28');
    expect(page([row([0, 0, 0, 0], [2, 0, 0])], 3)[0]).toBe('0 0 0 0 | 0 | s 0 0 | s');
  });

  it('takes a smallest cell of 2 as 3, and refuses what is no number of people', () => {
    expect([0, 1, 2, 3, 4, 10].map(smallestToldCount)).toEqual([1, 1, 3, 3, 4, 10]);
    for (const cell of [-1, 2.5, NaN]) expect(() => smallestToldCount(cell)).toThrow(RangeError);
    const rows = [row([2, 9, 8, 7], [0])];
    expect(suppressed(rows, 2)).toEqual(suppressed(rows, 3));
    expect(() => suppressed([], 3)).toThrow(RangeError);
  });

  it('warns of sharing a class a second time, since the pages can be subtracted', () => {
    expect(SHARED_AGAIN_CAUTION).toContain('Share these counts once.');
    const [before, after] = [page([row([7, 9, 8, 4])], 3)[0], page([row([7, 9, 8, 5])], 3)[0]];
    expect([before, after]).toEqual(['7 9 8 4 | 28 |  | 28', '7 9 8 5 | 29 |  | 29']);
  });
});

describe('the audit', () => {
  it('leaves a reader as many counts as the smallest told one, and an insider two, and tells nothing wrong', () => {
    let hidden = 0;
    fc.assert(
      fc.property(classes(4, 4, 2, 30), fc.constantFrom(2, 3, 5), (rows, smallestCell) => {
        const table = suppressed(rows, smallestCell);
        if (table.kind === 'nothing') return;
        const truth = withTotals(rows);
        const [told, counted] =
          table.kind === 'table'
            ? [cellsOf(table), cellsOf(truth)]
            : [cellsOf({ rows: [], together: table.together }), cellsOf({ rows: [], together: truth.together })];
        expect(told.length).toBe(counted.length);
        told.forEach((cell, index) => {
          const count = counted[index] ?? NaN;
          if (cell.kind === 'told') {
            expect(cell.count).toBe(count);
            return;
          }
          hidden += 1;
          expect(cell.byReader.most - cell.byReader.least).toBeGreaterThanOrEqual(table.below - 1);
          expect(cell.byInsider.most - cell.byInsider.least).toBeGreaterThanOrEqual(1);
          for (const { least, most } of [cell.byReader, cell.byInsider]) {
            expect(count).toBeGreaterThanOrEqual(least);
            expect(count).toBeLessThanOrEqual(most);
          }
          expect(cell.why === 'small').toBe(count < table.below);
        });
      }),
    );
    expect(hidden).toBeGreaterThan(200);
  });

  it('never tells a standing in which all of a row stand, nor a count below the smallest', () => {
    fc.assert(
      fc.property(fc.nat(40), fc.nat(3), fc.nat(1), fc.nat(3), (many, few, where, absent) => {
        const standings = [0, 0, 0, 0].map((_, quarter) => (quarter === where ? many : quarter === 3 ? few : 0));
        const table = suppressed([row(standings, [absent])], 4);
        if (table.kind !== 'table' || many + few === 0) return;
        for (const [quarter, cell] of (table.rows[0]?.standings ?? []).entries()) {
          if (quarter === where || (standings[quarter] ?? 0) < 4) expect(cell.kind).toBe('hidden');
        }
      }),
    );
  });
});

describe('the choice of complementary cells', () => {
  it('looks only at which cells are small and which are 0', () => {
    fc.assert(
      fc.property(
        classes(4, 3, 2, 20),
        classes(4, 3, 2, 20),
        fc.constantFrom(1 as const, 2 as const),
        (rows, others, rings) => {
          const small = smallCells(withTotals(rows), 3);
          const isSmall = (cell: number): boolean => small[cell] !== null;
          // The same small cells and zeros, other large counts.
          const changed = rows.map(({ standings, statuses }, index) => {
            const more = (count: number, column: number): number =>
              count < 3 ? count : count + (others[index]?.standings[column % 3] ?? 7);
            return { standings: standings.map(more), statuses: statuses.map(more) };
          });
          const alike = smallCells(withTotals(changed), 3);
          if (!alike.every((limits, cell) => (limits === null) === !isSmall(cell))) return;
          const chosen = (table: readonly CountRow[]): ReadonlySet<number> =>
            withComplementaryCells(countNetwork(withTotals(table)), isSmall, rings);
          expect(chosen(changed)).toEqual(chosen(rows));
        },
      ),
    );
  });
});
