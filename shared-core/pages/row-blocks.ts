import { scaleGrid, type ScoreScale } from '../scale/score-scale.ts';

const ROWS_IN_BLOCK = 5n;

/**
 * Rows are set in fives that begin at multiples of five steps: 0–4, 5–9, … on a scale from 0. Number of the block that
 * the row at a position (0 = lowest score) stands in; equal numbers belong together.
 */
export function blockOf(scale: ScoreScale, position: number): number {
  const grid = scaleGrid(scale);
  const steps = grid.minUnits + BigInt(position) * grid.stepUnits;
  const size = ROWS_IN_BLOCK * grid.stepUnits;
  const floor = steps >= 0n ? steps / size : -((-steps + size - 1n) / size);
  return Number(floor);
}

/** True when the row at a position is the last of its five, so that a gap follows it. */
export function endsBlock(scale: ScoreScale, position: number): boolean {
  return blockOf(scale, position) !== blockOf(scale, position + 1);
}
