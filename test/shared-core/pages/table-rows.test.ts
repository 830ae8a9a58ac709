import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { conversionLines } from '../../../shared-core/pages/conversion-rows.ts';
import { columnHeight, fillColumns, rowBlocks } from '../../../shared-core/pages/table-rows.ts';
import { sampleNormSet } from './sample-norm-set.ts';

const measure = { pitch: 12, gap: 5 };

function fives(min: number, max: number, step = 1) {
  const { groups, project } = sampleNormSet({ scale: { min, max, step }, groups: ['4'] });
  const [norms] = groups;
  if (norms === undefined) throw new Error('no group');
  return rowBlocks(conversionLines(project, norms), project.sheet, norms.group.table.scale);
}

const scores = (blocks: ReturnType<typeof fives>): number[][] =>
  blocks.map((five) => five.flatMap((row) => row.scores));

describe('rows in fives', () => {
  it('begin at multiples of five steps', () => {
    expect(scores(fives(0, 11))).toEqual([
      [0, 1, 2, 3, 4],
      [5, 6, 7, 8, 9],
      [10, 11],
    ]);
    expect(scores(fives(-7, 2))).toEqual([
      [-7, -6],
      [-5, -4, -3, -2, -1],
      [0, 1, 2],
    ]);
    expect(scores(fives(1, 4, 0.5))).toEqual([
      [1, 1.5, 2],
      [2.5, 3, 3.5, 4],
    ]);
  });

  it('fill columns evenly and are not split where they fit', () => {
    const { columns, rest } = fillColumns(fives(0, 40), 3, 500, measure);
    expect(rest).toEqual([]);
    expect(columns.map((column) => column.flat().length)).toEqual([15, 15, 11]);
  });

  it('keep every row in order, whatever the room', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -20, max: 20 }),
        fc.integer({ min: 1, max: 120 }),
        fc.integer({ min: 1, max: 3 }),
        fc.integer({ min: 13, max: 700 }),
        (min, span, count, height) => {
          const all = fives(min, min + span);
          let left: ReturnType<typeof fives> = all;
          const seen: number[] = [];
          while (left.length > 0) {
            const filled = fillColumns(left, count, height, measure);
            expect(filled.columns.length).toBeLessThanOrEqual(count);
            for (const column of filled.columns) {
              expect(column.flat().length).toBeGreaterThan(0);
              expect(columnHeight(column, measure)).toBeLessThanOrEqual(height + 1e-6);
              seen.push(...column.flat().flatMap((row) => row.scores));
            }
            left = filled.rest;
          }
          expect(seen).toEqual(all.flat().flatMap((row) => row.scores));
        },
      ),
      { numRuns: 60 },
    );
  });
});
