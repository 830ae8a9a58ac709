import { decimalOf, unitsAt } from '../scale/decimal.ts';
import { scaleGrid, type ScaleGrid, type ScoreScale } from '../scale/score-scale.ts';

const ROWS_IN_BLOCK = 5;

/**
 * Rows are set in fives that begin at multiples of five steps: 0–4, 5–9, … on a scale from 0. True when the row at a
 * position (0 = lowest score) is the last of its five, so that a gap follows it.
 */
export function endsBlock(scale: ScoreScale, position: number): boolean {
  const grid = scaleGrid(scale);
  const units = grid.minUnits + BigInt(position) * grid.stepUnits;
  return blockOf(grid, units) !== blockOf(grid, units + grid.stepUnits);
}

/** Rows in order, parted into their fives: 0–4, 5–9, … on whole scores; 0–2, 2.5–4.5, … on halves. */
export function inFives<Row>(
  rows: readonly Row[],
  scale: ScoreScale,
  scoreOf: (row: Row) => number,
): readonly (readonly Row[])[] {
  const grid = scaleGrid(scale);
  const fives: Row[][] = [];
  let current: bigint | null = null;
  for (const row of rows) {
    const block = blockOf(grid, unitsAt(decimalOf(scoreOf(row)), grid.decimals));
    if (block === current) fives.at(-1)?.push(row);
    else fives.push([row]);
    current = block;
  }
  return fives;
}

/** Five rows each, counted from the first. */
export function inCountedFives<Row>(rows: readonly Row[]): readonly (readonly Row[])[] {
  return Array.from({ length: Math.ceil(rows.length / ROWS_IN_BLOCK) }, (_, five) =>
    rows.slice(five * ROWS_IN_BLOCK, (five + 1) * ROWS_IN_BLOCK),
  );
}

/** Number of the five that a score stands in; equal numbers belong together. */
function blockOf({ stepUnits }: ScaleGrid, units: bigint): bigint {
  const size = BigInt(ROWS_IN_BLOCK) * stepUnits;
  return (units - (((units % size) + size) % size)) / size;
}
