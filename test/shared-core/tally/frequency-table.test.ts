import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { percentileRanks } from '../../../shared-core/percentile/percentile-rank.ts';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import {
  mergeTables,
  mirrorTable,
  peopleIn,
  squaredUnitsIn,
  tableFromCell,
  tableFromCounts,
  tablesByGroup,
  weighsEqually,
  weightUnitsIn,
} from '../../../shared-core/tally/frequency-table.ts';
import type { Tally, TallyCell } from '../../../shared-core/tally/tally.ts';
import { weightedTables } from '../percentile/some-tables.ts';

const SCALE: ScoreScale = { min: 0, max: 3, step: 1, direction: 'high-is-good' };

function cellOf(values: readonly string[], units: readonly (readonly number[])[]): TallyCell {
  const sum = (power: number): string[] =>
    units.map((weights) => String(weights.reduce((total, weight) => total + BigInt(weight) ** BigInt(power), 0n)));
  return { values, counts: units.map((weights) => weights.length), weights: sum(1), squares: sum(2), clusters: null };
}

/** Tallies by grade and form: the weights, in ten-thousandths, of the people at each of four scores. */
function someTallies(): fc.Arbitrary<Tally> {
  const weights = fc.array(fc.integer({ min: 1, max: 60_000 }), { maxLength: 4 });
  const units = fc.array(weights, { minLength: 4, maxLength: 4 });
  const cell = fc
    .tuple(fc.constantFrom('3', '10', '04', 'KG', ''), fc.constantFrom('A', 'B', 'b'), units)
    .map(([grade, form, people]) => cellOf([grade, form], people));
  return fc
    .uniqueArray(cell, { minLength: 1, maxLength: 12, selector: ({ values }) => JSON.stringify(values) })
    .map((cells) => ({ scale: SCALE, groupColumns: ['grade', 'form'], weightDecimals: 4, cells }));
}

function bytesOf(value: unknown): string {
  return JSON.stringify(value, (_, part: unknown) => (typeof part === 'bigint' ? `${part}n` : part));
}

describe('a table from counts', () => {
  it('weighs each person one unit', () => {
    const table = tableFromCounts(SCALE, [1, 0, 2, 4]);
    expect(table).toMatchObject({
      weights: [1n, 0n, 2n, 4n],
      squares: [1n, 0n, 2n, 4n],
      weightUnit: 1n,
      weighted: false,
    });
    expect([peopleIn(table), weightUnitsIn(table), squaredUnitsIn(table)]).toEqual([7, 7n, 7n]);
    expect(weighsEqually(table)).toBe(true);
  });

  it.each([[[1, 2, 3]], [[1, 2, 3, 4, 5]], [[1, -1, 0, 0]], [[1.5, 0, 0, 0]], [[NaN, 0, 0, 0]], [[2 ** 53, 0, 0, 0]]])(
    'refuses %j',
    (counts) => {
      expect(() => tableFromCounts(SCALE, counts)).toThrow(RangeError);
    },
  );
});

describe('a table from a tally cell', () => {
  it('is exact however long the weights are', () => {
    const long = '123456789012345678901234567890';
    const cell: TallyCell = {
      values: [],
      counts: [1, 0, 0, 0],
      weights: [long, '0', '0', '0'],
      squares: [long, '0', '0', '0'],
      clusters: null,
    };
    const table = tableFromCell({ scale: SCALE, groupColumns: [], weightDecimals: 25, cells: [cell] }, cell);
    expect(weightUnitsIn(table)).toBe(123456789012345678901234567890n);
    expect(table.weightUnit).toBe(10n ** 25n);
  });

  it('has no weights where the tally has none', () => {
    const cell: TallyCell = { values: [], counts: [1, 0, 0, 2], weights: null, squares: null, clusters: null };
    const table = tableFromCell({ scale: SCALE, groupColumns: [], weightDecimals: null, cells: [cell] }, cell);
    expect(table).toEqual(tableFromCounts(SCALE, [1, 0, 0, 2]));
  });

  it('knows whether all weigh the same', () => {
    const tally = (cell: TallyCell): Tally => ({ scale: SCALE, groupColumns: [], weightDecimals: 4, cells: [cell] });
    const same = cellOf([], [[3, 3], [], [3], []]);
    const differing = cellOf([], [[3, 3], [], [4], []]);
    expect(weighsEqually(tableFromCell(tally(same), same))).toBe(true);
    expect(weighsEqually(tableFromCell(tally(differing), differing))).toBe(false);
  });
});

describe('tables taken together', () => {
  it('give the same bytes in whatever order the cells of a tally lie', () => {
    const shuffles = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 12, maxLength: 12 });
    fc.assert(
      fc.property(someTallies(), shuffles, (tally, keys) => {
        const order = tally.cells.map((cell, index) => ({ cell, key: keys[index] ?? 0 }));
        const shuffled = order.toSorted((left, right) => left.key - right.key).map(({ cell }) => cell);
        for (const by of [[], ['grade'], ['form'], ['form', 'grade'], ['grade', 'form']]) {
          expect(bytesOf(tablesByGroup({ ...tally, cells: shuffled }, by))).toBe(bytesOf(tablesByGroup(tally, by)));
        }
      }),
    );
  });

  it('are associative: groups by grade add up to the whole', () => {
    fc.assert(
      fc.property(someTallies(), (tally) => {
        const [whole, ...others] = tablesByGroup(tally, []);
        expect(others).toEqual([]);
        const parts = tablesByGroup(tally, ['grade']).map(({ table }) => table);
        expect(parts.reduce(mergeTables)).toEqual(whole?.table);
      }),
    );
  });

  it('stand in the order of group values: numbers by size, then text', () => {
    const cells = ['KG', '10', '3', '', '04'].map((grade) => cellOf([grade, 'A'], [[1], [], [], []]));
    const tally: Tally = { scale: SCALE, groupColumns: ['grade', 'form'], weightDecimals: 4, cells };
    expect(tablesByGroup(tally, ['grade']).map(({ values }) => values[0])).toEqual(['3', '04', '10', '', 'KG']);
    expect(() => tablesByGroup(tally, ['school'])).toThrow(/no column school/);
  });

  it('must be of one scale and one weight unit', () => {
    const table = tableFromCounts(SCALE, [1, 0, 0, 2]);
    const shifted = tableFromCounts({ ...SCALE, min: 1, max: 4 }, [1, 0, 0, 2]);
    const longer = tableFromCounts({ ...SCALE, max: 4 }, [1, 0, 0, 2, 0]);
    const reversed = tableFromCounts({ ...SCALE, direction: 'low-is-good' }, [1, 0, 0, 2]);
    for (const other of [shifted, longer, reversed, { ...table, weightUnit: 10n }, { ...table, weighted: true }]) {
      expect(() => mergeTables(table, other)).toThrow(RangeError);
    }
  });

  it('leave what they are made of alone', () => {
    const frozen = tableFromCounts(SCALE, Object.freeze([1, 0, 0, 2]));
    Object.freeze(frozen.weights);
    expect(mergeTables(frozen, mirrorTable(frozen)).counts).toEqual([3, 0, 0, 3]);
    expect(frozen.counts).toEqual([1, 0, 0, 2]);
  });
});

describe('people', () => {
  it('split into two of half the weight leave every rank as it is', () => {
    fc.assert(
      fc.property(weightedTables(), (table) => {
        const doubled = {
          ...table,
          weights: table.weights.map((weight) => weight * 2n),
          squares: table.squares.map((square) => square * 4n),
          weightUnit: table.weightUnit * 2n,
        };
        const split = {
          ...doubled,
          counts: table.counts.map((count) => count * 2),
          squares: table.squares.map((square) => square * 2n),
        };
        for (const kind of ['below', 'midpoint', 'at-or-below'] as const) {
          expect(percentileRanks(split, { kind })).toEqual(percentileRanks(doubled, { kind }));
        }
      }),
    );
  });

  it('read from the other end twice are as they were', () => {
    fc.assert(
      fc.property(weightedTables(), (table) => {
        expect(mirrorTable(mirrorTable(table))).toEqual(table);
      }),
    );
  });
});
