import { percentInterval, type PercentInterval } from './percent-interval.ts';

/** The ranks, in per cent, that each score had in a number of replicates. */
export class ReplicateRanks {
  readonly #scores: number;
  readonly #room: number;
  readonly #ranks: Float64Array;
  #added = 0;

  constructor(scores: number, room: number) {
    this.#scores = scores;
    this.#room = room;
    this.#ranks = new Float64Array(scores * room);
  }

  /** Replicates added so far. */
  get added(): number {
    return this.#added;
  }

  /** One rank for each score, lowest score first. */
  add(ranks: readonly number[]): void {
    if (ranks.length !== this.#scores || this.#added >= this.#room) throw new RangeError('no room for these ranks');
    ranks.forEach((rank, score) => {
      this.#ranks[score * this.#room + this.#added] = rank;
    });
    this.#added += 1;
  }

  /** Standard deviations dividing by replicates − 1, in percentile-rank points. */
  standardErrors(): readonly number[] {
    return this.#eachScore((ranks) => {
      const mean = ranks.reduce((sum, rank) => sum + rank, 0) / ranks.length;
      const squares = ranks.reduce((sum, rank) => sum + (rank - mean) ** 2, 0);
      return Math.sqrt(squares / (ranks.length - 1));
    });
  }

  /** The ranks at positions (R + 1)·tail from either end, interpolated between neighbours; tail 0–0.5. */
  intervals(tail: number): readonly PercentInterval[] {
    return this.#eachScore((ranks) => {
      const sorted = ranks.toSorted();
      const position = (sorted.length + 1) * tail;
      const low = between(sorted, position);
      const high = between(sorted, sorted.length + 1 - position);
      return percentInterval(low / 100, high / 100);
    });
  }

  #eachScore<T>(value: (ranks: Float64Array) => T): readonly T[] {
    return Array.from({ length: this.#scores }, (_, score) =>
      value(this.#ranks.subarray(score * this.#room, score * this.#room + this.#added)),
    );
  }
}

/** The value at a position counted from 1, held at the first and the last. */
function between(sorted: Float64Array, position: number): number {
  const held = Math.min(sorted.length, Math.max(1, position));
  const whole = Math.floor(held);
  const lower = sorted[whole - 1] ?? NaN;
  const part = held - whole;
  return part === 0 ? lower : lower + part * ((sorted[whole] ?? lower) - lower);
}
