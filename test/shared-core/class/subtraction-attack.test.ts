import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { withTotals, type CountRow } from '../../../shared-core/class/class-counts.ts';
import { suppressed, type SuppressedCell } from '../../../shared-core/class/small-cells.ts';
import { cellsOf, possibleTables, row, splits, type Range } from './possible-tables.ts';

interface Shape {
  readonly rows: number;
  readonly standings: number;
  readonly statuses: number;
}

const shapeOf = (rows: readonly CountRow[]): Shape => ({
  rows: rows.length,
  standings: rows[0]?.standings.length ?? 0,
  statuses: rows[0]?.statuses.length ?? 0,
});

const isStandingAt = ({ standings, statuses }: Shape, cell: number): boolean =>
  cell % (standings + statuses + 2) < standings;

/** So far an attacker looks for counts that nothing limits: more counts can only protect. */
const FAR = 2;

/**
 * What the attacker takes for possible: the told cells as told; the hidden ones by the rule, small or not; and if he knows
 * the sums, all that are no standings as they are.
 */
function attackersRanges(
  rows: readonly CountRow[],
  cells: readonly SuppressedCell[],
  below: number,
  knows: { readonly why: boolean; readonly sums: boolean },
): readonly Range[] {
  const truth = cellsOf(withTotals(rows));
  return cells.map((cell, index) => {
    const count = truth[index] ?? 0;
    if (cell.kind === 'told') return { least: cell.count, most: cell.count };
    if (knows.sums && !isStandingAt(shapeOf(rows), index)) return { least: count, most: count };
    const [least, most] = [0, Math.max(count, below) + FAR];
    if (!knows.why) return { least, most };
    return cell.why === 'small' ? { least, most: below - 1 } : { least: below, most };
  });
}

const countsAt = (tables: readonly (readonly number[])[], cell: number): ReadonlySet<number> =>
  new Set(tables.map((counts) => counts[cell] ?? NaN));

const small = fc.array(fc.nat(9), { minLength: 3, maxLength: 3 });
const oneRow = fc.tuple(small, fc.array(fc.nat(4), { minLength: 1, maxLength: 1 })).map(([a, b]) => [row(a, b)]);
const twoRows = fc
  .array(fc.tuple(fc.nat(9), fc.integer({ min: 0, max: 9 })), { minLength: 2, maxLength: 2 })
  .map((pairs) => pairs.map(([one, other]) => row([one, 9 - one + other])));

describe('an attacker who tries all tables that fit the page', () => {
  it.each([
    ['knows the page', { why: false, sums: false }],
    ['knows why each cell is hidden', { why: true, sums: false }],
    ['knows that, and how many were tested and absent', { why: true, sums: true }],
  ])('and %s is left with two counts or more for every hidden standing', (_, knows) => {
    let attacked = 0;
    fc.assert(
      fc.property(fc.oneof(oneRow, twoRows), (rows) => {
        const table = suppressed(rows, 3);
        if (table.kind !== 'table') return;
        const cells = cellsOf(table);
        const tables = possibleTables(shapeOf(rows), attackersRanges(rows, cells, table.below, knows));
        cells.forEach((cell, index) => {
          if (cell.kind === 'told' || (knows.sums && !isStandingAt(shapeOf(rows), index))) return;
          expect(countsAt(tables, index).size).toBeGreaterThanOrEqual(2);
          attacked += 1;
        });
      }),
      { numRuns: 150 },
    );
    expect(attacked).toBeGreaterThan(100);
  });

  it('would find every small count, were no other cells hidden', () => {
    for (const rows of [[row([2, 9, 8])], [row([2, 9]), row([8, 5])]]) {
      const cells = cellsOf(withTotals(rows));
      const onlySmall = cells.map((count): Range =>
        count < 3 ? { least: 0, most: 9 } : { least: count, most: count },
      );
      const tables = possibleTables(shapeOf(rows), onlySmall);
      expect([...countsAt(tables, 0)]).toEqual([2]);
    }
  });
});

describe('an attacker who has this program', () => {
  /** All classes with these numbers of tested and absent, by the page that they lead to. */
  const byPage = (tested: readonly number[], standings: number, absent: readonly number[], smallestCell: number) => {
    const choices = tested.map((pupils) => splits(pupils, standings));
    const classes = choices.reduce<readonly (readonly CountRow[])[]>(
      (starts, options, group) =>
        starts.flatMap((start) => options.map((own) => [...start, row(own, [absent[group] ?? 0])])),
      [[]],
    );
    const pages = new Map<string, { readonly signs: readonly string[]; readonly tables: (readonly number[])[] }>();
    for (const rows of classes) {
      const truth = withTotals(rows);
      const table = suppressed(rows, smallestCell);
      const hidden = cellsOf(truth).map(() => '*');
      const width = standings + 3;
      const signsOf = (cells: readonly SuppressedCell[]): readonly string[] =>
        cells.map((cell) => (cell.kind === 'told' ? String(cell.count) : '*'));
      const signs =
        table.kind === 'nothing'
          ? hidden
          : table.kind === 'table'
            ? signsOf(cellsOf(table))
            : [...hidden.slice(width), ...signsOf(cellsOf({ rows: [], together: table.together }))];
      const key = `${table.kind} ${signs.join(' ')}`;
      const known = pages.get(key) ?? { signs, tables: [] };
      known.tables.push(cellsOf(truth));
      pages.set(key, known);
    }
    return [...pages.values()];
  };

  it.each([
    [[5], 3, [0], 3],
    [[7], 4, [2], 3],
    [[12], 4, [1], 3],
    [[10], 4, [0], 4],
    [[6, 7], 2, [0, 1], 3],
    [[9, 10], 2, [1, 0], 3],
    [[12, 14], 2, [1, 3], 4],
    [[9, 9, 10], 2, [0, 1, 0], 3],
  ])(
    'runs it on all classes with %j tested, and is still left with two counts for every hidden standing',
    (tested, standings, absent, smallestCell) => {
      const shape = { rows: tested.length, standings, statuses: 1 };
      let hidden = 0;
      for (const { signs, tables } of byPage(tested, standings, absent, smallestCell)) {
        signs.forEach((sign, cell) => {
          if (sign !== '*' || !isStandingAt(shape, cell)) return;
          hidden += 1;
          expect(countsAt(tables, cell).size).toBeGreaterThanOrEqual(2);
        });
      }
      expect(hidden).toBeGreaterThan(3);
    },
  );
});
