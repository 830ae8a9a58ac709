import type { FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';

/** Plain arithmetic in floating point that makes the columns others may paste, apart from the program's own. */
export interface Made {
  readonly definition: string;
  readonly rounding: 'half-up' | 'half-even' | 'down';
  readonly ends: 'signs' | 'held' | 'signs-rounded' | 'open';
  readonly decimals: 0 | 1;
}

/** Ranks in per cent as exact pairs of whole numbers, by definition; null where the definition has none. */
type Share = readonly [number, number] | null;

export const DEFINITIONS: Readonly<Record<string, (below: number, at: number, n: number) => Share>> = {
  midpoint: (below, at, n) => [100 * (2 * below + at), 2 * n],
  'at-or-below': (below, at, n) => [100 * (below + at), n],
  below: (below, _at, n) => [100 * below, n],
  'percent-rank:inclusive:cut': (below, at, n) => (at === 0 || n < 2 ? null : cut(100 * below, n - 1)),
  'percent-rank:exclusive:cut': (below, at, n) => (at === 0 ? null : cut(100 * (below + 1), n + 1)),
  'percent-rank:inclusive': (below, at, n) => (at === 0 || n < 2 ? null : [100 * below, n - 1]),
  'percent-rank:exclusive': (below, at, n) => (at === 0 ? null : [100 * (below + 1), n + 1]),
  'plotting-position:0': (below, at, n) => [100 * (2 * below + at + 1), 2 * (n + 1)],
  'plotting-position:3/8': (below, at, n) => [100 * (8 * below + 4 * at + 1), 8 * n + 2],
  'plotting-position:1/3': (below, at, n) => [100 * (6 * below + 3 * at + 1), 6 * n + 2],
};

function cut(numerator: number, denominator: number): Share {
  return [Math.floor((10 * numerator) / denominator), 10];
}

/** Lines "score rank" of the scores that have one. */
export function madeColumn(table: FrequencyTable, made: Made, reversed = false): string {
  const counts = reversed ? table.counts.toReversed() : table.counts;
  const n = counts.reduce((sum, count) => sum + count, 0);
  const lines: string[] = [];
  let below = 0;
  counts.forEach((at, place) => {
    const share = DEFINITIONS[made.definition]?.(below, at, n) ?? null;
    below += at;
    const position = reversed ? counts.length - 1 - place : place;
    const score = table.scale.min + position * table.scale.step;
    if (share !== null) lines.push(`${Number(score.toFixed(6))}\t${printed(share, made)}`);
  });
  return lines.join('\n');
}

function printed([numerator, denominator]: readonly [number, number], made: Made): string {
  const unit = made.decimals === 0 ? 1 : 10;
  const scaled = numerator * unit;
  const whole = Math.floor(scaled / denominator);
  const twice = 2 * (scaled - whole * denominator);
  const up =
    made.rounding !== 'down' &&
    (twice > denominator || (twice === denominator && (made.rounding === 'half-up' || whole % 2 === 1)));
  const rounded = whole + (up ? 1 : 0);
  const text = (units: number): string => (units / unit).toFixed(made.decimals);
  const [low, high] = [1, 100 * unit - 1];
  switch (made.ends) {
    case 'open':
      return text(rounded);
    case 'held':
      return text(Math.min(high, Math.max(low, rounded)));
    case 'signs':
      return scaled < low * denominator
        ? `<${text(low)}`
        : scaled > high * denominator
          ? `>${text(high)}`
          : text(rounded);
    case 'signs-rounded':
      return rounded < low ? `<${text(low)}` : rounded > high ? `>${text(high)}` : text(rounded);
  }
}
