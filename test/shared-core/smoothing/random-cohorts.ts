import { tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { wholeScale } from '../../reference/read-reference.ts';

/** Numbers from 0 up to 1 with a fixed start, the same in each run (mulberry32). */
export function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Shapes of cohorts as shares of the scale: even, at a ceiling, of two kinds of people, near the floor, narrow. */
const SHAPES: readonly ((normal: number, uniform: number) => number)[] = [
  (normal) => 0.5 + 0.15 * normal,
  (normal) => 0.85 + 0.15 * normal,
  (normal, uniform) => (uniform < 0.6 ? 0.3 : 0.75) + 0.08 * normal,
  (_normal, uniform) => uniform ** 3,
  (normal) => 0.6 + 0.05 * normal,
];

/** So many people drawn from one of five shapes on one of four scales; draws beyond an end are put on it. */
export function randomCohort(next: () => number, people: number): FrequencyTable {
  const last = [20, 30, 60, 120][Math.floor(next() * 4)] ?? 20;
  const shape = SHAPES[Math.floor(next() * SHAPES.length)];
  if (shape === undefined) throw new RangeError('no such shape');
  const counts = new Array<number>(last + 1).fill(0);
  for (let person = 0; person < people; person += 1) {
    const normal = Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next());
    const place = Math.min(last, Math.max(0, Math.round(last * shape(normal, next()))));
    counts[place] = (counts[place] ?? 0) + 1;
  }
  return tableFromCounts(wholeScale(0, last), counts);
}
