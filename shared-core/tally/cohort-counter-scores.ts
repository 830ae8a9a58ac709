import type { Reply } from '../desk.ts';
import type { LeftOutRule, Reading } from '../norms/reading.ts';
import { parseDecimal, powerOfTen, unitsAt, type Decimal, type DecimalMark } from '../scale/decimal.ts';
import {
  MAX_ATTAINABLE_SCORES,
  placeOnGrid,
  scaleGrid,
  scaleProblems,
  type PlaceOnScale,
  type ScaleGrid,
  type ScoreScale,
} from '../scale/score-scale.ts';
import { TextMemo } from './cohort-counter-texts.ts';

/** A slot of 0 or more, or the rule that leaves the row out. */
export type ScoreSlot = number | LeftOutRule;

export interface PlacedSlots {
  readonly scale: ScoreScale;
  readonly inferred: boolean;
  /** Position on the scale of a slot that was used. */
  positionOf(slot: number): number;
}

/** Turns score texts into slots: positions of the declared scale, or, without one, distinct scores as they come. */
export interface ScoreSlots {
  slotOf(text: string): ScoreSlot;
  /** Called with every slot of a row that is kept. */
  use(slot: number): void;
  /** A sentence once the scores cannot be tabled; null as long as they can. */
  readonly problem: string | null;
  place(): Reply<PlacedSlots>;
}

export function scoreSlots(reading: Reading): ScoreSlots {
  return reading.scale === null ? new FoundSlots(reading) : new DeclaredSlots(reading, reading.scale);
}

class DeclaredSlots implements ScoreSlots {
  readonly problem = null;
  private readonly memo: TextMemo<ScoreSlot>;

  constructor(
    reading: Reading,
    private readonly scale: ScoreScale,
  ) {
    const grid: ScaleGrid = scaleGrid(scale);
    const read = scoreReader(reading);
    this.memo = new TextMemo((text) => {
      const score = read(text);
      return typeof score === 'string' ? score : (placeOnGrid(grid, score) satisfies PlaceOnScale);
    });
  }

  slotOf(text: string): ScoreSlot {
    return this.memo.get(text);
  }

  use(): void {
    // Every position of a declared scale has its row, used or not.
  }

  place(): Reply<PlacedSlots> {
    return { ok: true, value: { scale: this.scale, inferred: false, positionOf: (slot) => slot } };
  }
}

class FoundSlots implements ScoreSlots {
  problem: string | null = null;
  private readonly scores: Decimal[] = [];
  private readonly used: boolean[] = [];
  private readonly slots = new Map<string, number>();
  private readonly memo: TextMemo<ScoreSlot>;

  constructor(reading: Reading) {
    const read = scoreReader(reading);
    this.memo = new TextMemo((text) => {
      const score = read(text);
      return typeof score === 'string' ? score : this.slotFor(score);
    });
  }

  slotOf(text: string): ScoreSlot {
    return this.memo.get(text);
  }

  use(slot: number): void {
    this.used[slot] = true;
  }

  place(): Reply<PlacedSlots> {
    const inferred = inferScale(this.scores.filter((_, slot) => this.used[slot] === true));
    if (!inferred.ok) return inferred;
    const grid = scaleGrid(inferred.value);
    const positions = this.scores.map((score, slot) => (this.used[slot] === true ? placeOnGrid(grid, score) : 0));
    const positionOf = (slot: number): number => {
      const place = positions[slot];
      if (typeof place !== 'number') throw new RangeError('the inferred scale does not carry its scores');
      return place;
    };
    return { ok: true, value: { scale: inferred.value, inferred: true, positionOf } };
  }

  private slotFor(score: Decimal): number {
    const key = decimalKey(score);
    const known = this.slots.get(key);
    if (known !== undefined) return known;
    const slot = this.scores.length;
    this.scores.push(score);
    this.slots.set(key, slot);
    if (slot >= MAX_ATTAINABLE_SCORES) {
      this.problem =
        `The score column holds more than ${MAX_ATTAINABLE_SCORES} different scores, too many for a table. ` +
        'Choose another score column, or declare the scale.';
    }
    return slot;
  }
}

/** Reads a score or says which rule it falls under. */
function scoreReader({ missing, decimalMark }: Reading): (text: string) => Decimal | LeftOutRule {
  const texts = new Set(missing.map((text) => text.trim()));
  const numbers = new Set(missing.flatMap((text) => keyOf(text, decimalMark)));
  return (text) => {
    const trimmed = text.trim();
    if (trimmed === '') return 'blank-score';
    if (texts.has(trimmed)) return 'missing-code';
    const score = parseDecimal(trimmed, decimalMark);
    if (score === null) return 'not-a-number';
    return numbers.has(decimalKey(score)) ? 'missing-code' : score;
  };
}

function keyOf(text: string, mark: DecimalMark): readonly string[] {
  const decimal = parseDecimal(text, mark);
  return decimal === null ? [] : [decimalKey(decimal)];
}

/** One text for every way of writing a number. */
export function decimalKey({ units, decimals }: Decimal): string {
  let whole = units;
  let left = decimals;
  while (left > 0 && whole % 10n === 0n) {
    whole /= 10n;
    left -= 1;
  }
  return `${whole}/${left}`;
}

const STEPS = [1, 0.5, 0.25, 0.2, 0.1, 0.05, 0.025, 0.02, 0.01, 0.005, 0.0025, 0.002, 0.001, 0.0005, 0.0001] as const;
const STEP_DECIMALS = 4;

/**
 * The scale that the scores themselves show: from the lowest to the highest, in the largest of STEPS of which all are
 * multiples; high is good. Refused when there are fewer than two different scores, or more decimals than a scale has.
 */
export function inferScale(scores: readonly Decimal[]): Reply<ScoreScale> {
  const decimals = scores.reduce((most, score) => Math.max(most, score.decimals), STEP_DECIMALS);
  const units = scores.map((score) => unitsAt(score, decimals)).sort((left, right) => (left < right ? -1 : 1));
  const lowest = units[0];
  const highest = units.at(-1);
  if (lowest === undefined || highest === undefined || lowest === highest) {
    return {
      ok: false,
      problem: 'Everybody has the same score, so the scale cannot be seen in it. Declare the scale.',
    };
  }
  const unit = powerOfTen(decimals);
  const stepUnits = (step: number): bigint => (BigInt(Math.round(step * 10 ** STEP_DECIMALS)) * unit) / 10_000n;
  const step = STEPS.find((candidate) => units.every((score) => score % stepUnits(candidate) === 0n));
  if (step === undefined) {
    return {
      ok: false,
      problem: `Some scores have more than ${STEP_DECIMALS} decimals. Round them, or declare the scale.`,
    };
  }
  const scale: ScoreScale = {
    min: Number(lowest) / Number(unit),
    max: Number(highest) / Number(unit),
    step,
    direction: 'high-is-good',
  };
  const problems = scaleProblems(scale);
  return problems.length > 0
    ? {
        ok: false,
        problem: `No scale was declared, and the one seen in the scores cannot be used. ${problems.join(' ')}`,
      }
    : { ok: true, value: scale };
}
