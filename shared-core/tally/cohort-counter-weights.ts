import { parseDecimal, powerOfTen, type Decimal, type DecimalMark } from '../scale/decimal.ts';
import { TextMemo } from './cohort-counter-texts.ts';

/** Longest text read digit by digit: its digits always fit a safe integer. */
const PLAIN_LENGTH = 15;
const ZERO = 48;
const NINE = 57;

const POWERS = Array.from({ length: 16 }, (_, exponent) => 10 ** exponent);

/** A weight read from a text: whole units of 10^-decimals, without trailing zeros. */
export interface ReadWeight {
  /** Units where they are a safe integer; null where only `bigUnits` holds them. */
  readonly units: number | null;
  readonly bigUnits: bigint;
  readonly decimals: number;
}

/**
 * Reads weights. Plain short texts are read digit by digit, all others by `parseDecimal`; both give the same. The last
 * weight read stands in `units`, `bigUnits` (where `units` is null) and `decimals`.
 */
export class WeightReader implements ReadWeight {
  units: number | null = 0;
  bigUnits = 0n;
  decimals = 0;
  private readonly markCode: number;
  private readonly memo: TextMemo<ReadWeight | 'bad'>;

  constructor(mark: DecimalMark) {
    this.markCode = mark.charCodeAt(0);
    this.memo = new TextMemo((text) => slowWeight(text, mark));
  }

  /** False when the text is not a number above 0. */
  read(text: string): boolean {
    if (text.length <= PLAIN_LENGTH && this.readPlain(text)) return true;
    const weight = this.memo.get(text);
    if (weight === 'bad') return false;
    this.units = weight.units;
    this.bigUnits = weight.bigUnits;
    this.decimals = weight.decimals;
    return true;
  }

  private readPlain(text: string): boolean {
    let units = 0;
    let decimals = -1;
    for (let index = 0; index < text.length; index += 1) {
      const code = text.charCodeAt(index);
      if (code >= ZERO && code <= NINE) {
        units = units * 10 + (code - ZERO);
        if (decimals >= 0) decimals += 1;
      } else if (code === this.markCode && decimals < 0) {
        decimals = 0;
      } else {
        return false;
      }
    }
    if (units === 0) return false;
    if (decimals < 0) decimals = 0;
    while (decimals > 0 && units % 10 === 0) {
      units /= 10;
      decimals -= 1;
    }
    this.units = units;
    this.decimals = decimals;
    return true;
  }
}

function slowWeight(text: string, mark: DecimalMark): ReadWeight | 'bad' {
  const decimal: Decimal | null = parseDecimal(text, mark);
  if (decimal === null || decimal.units <= 0n) return 'bad';
  let { units, decimals } = decimal;
  while (decimals > 0 && units % 10n === 0n) {
    units /= 10n;
    decimals -= 1;
  }
  return { units: units <= BigInt(Number.MAX_SAFE_INTEGER) ? Number(units) : null, bigUnits: units, decimals };
}

/** Sums of whole numbers by slot, exact at any size: plain numbers as long as they are safe, BigInt beyond. */
export class ExactSums {
  private small: Float64Array;
  private readonly big = new Map<number, bigint>();

  constructor(slots: number) {
    this.small = new Float64Array(slots);
  }

  /** Adds a safe integer of 0 or more. */
  add(slot: number, value: number): void {
    if (slot >= this.small.length) this.small = widened(this.small, slot);
    const sum = (this.small[slot] ?? 0) + value;
    if (sum <= Number.MAX_SAFE_INTEGER) {
      this.small[slot] = sum;
    } else {
      this.addBig(slot, BigInt(this.small[slot] ?? 0));
      this.small[slot] = value;
    }
  }

  addBig(slot: number, value: bigint): void {
    this.big.set(slot, (this.big.get(slot) ?? 0n) + value);
  }

  total(slot: number): bigint {
    return BigInt(this.small[slot] ?? 0) + (this.big.get(slot) ?? 0n);
  }

  /** All sums in a smaller unit. */
  multiply(factor: bigint): void {
    for (let slot = 0; slot < this.small.length; slot += 1) {
      const sum = this.small[slot] ?? 0;
      if (sum > 0) this.addBig(slot, BigInt(sum));
    }
    this.small.fill(0);
    for (const [slot, sum] of this.big) this.big.set(slot, sum * factor);
  }
}

/** The same numbers with room for the slot. */
export function widened(numbers: Float64Array, slot: number): Float64Array {
  const wide = new Float64Array(Math.max(16, numbers.length * 2, slot + 1));
  wide.set(numbers);
  return wide;
}

/** Sums of weights and of their squares, in one unit for all cells of a tally. */
export class WeightUnit {
  /** Decimals of the unit: the most that any weight added so far has. */
  decimals = 0;
  private readonly all: WeightSums[] = [];

  sums(slots: number): WeightSums {
    const sums = new WeightSums(slots);
    this.all.push(sums);
    return sums;
  }

  /** Adds the weight of `count` people (a safe integer of 0 or more), each of the weight read. */
  add(sums: WeightSums, slot: number, weight: ReadWeight, count: number): void {
    if (weight.decimals > this.decimals) this.refine(weight.decimals);
    const shift = this.decimals - weight.decimals;
    const units = weight.units === null ? Infinity : weight.units * (POWERS[shift] ?? Infinity);
    if (units * units * count <= Number.MAX_SAFE_INTEGER && units * count <= Number.MAX_SAFE_INTEGER) {
      sums.weights.add(slot, units * count);
      sums.squares.add(slot, units * units * count);
      return;
    }
    const exact = (weight.units === null ? weight.bigUnits : BigInt(weight.units)) * powerOfTen(shift);
    const people = BigInt(count);
    sums.weights.addBig(slot, exact * people);
    sums.squares.addBig(slot, exact * exact * people);
  }

  private refine(decimals: number): void {
    const factor = powerOfTen(decimals - this.decimals);
    for (const { weights, squares } of this.all) {
      weights.multiply(factor);
      squares.multiply(factor * factor);
    }
    this.decimals = decimals;
  }
}

export class WeightSums {
  readonly weights: ExactSums;
  readonly squares: ExactSums;

  constructor(slots: number) {
    this.weights = new ExactSums(slots);
    this.squares = new ExactSums(slots);
  }
}
