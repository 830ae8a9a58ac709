import { compareRatios, ratio, roundRatio, type ExactRatio, type Rounding } from '../percentile/exact-ratio.ts';
import { powerOfTen } from '../scale/decimal.ts';
import { printRatio } from '../scores/printed-number.ts';
import type { PrintedValue } from './why-differ-column.ts';

/** How a rank may have been brought to its decimals; `down` leaves out the further digits. */
export const ROUNDING_RULES = ['half-up', 'half-even', 'down'] as const satisfies readonly (Rounding | 'down')[];

export type RoundingRule = (typeof ROUNDING_RULES)[number];

/**
 * How the ends may have been printed: `open` as they are, 0 and 100 too; `held` at the limits; `signs` where the unrounded
 * rank lies beyond a limit, `signs-rounded` where the rounded one does. The limits are 1 and 99, or, with decimals, one
 * unit of the last place from 0 and 100.
 */
export interface EndRule {
  readonly kind: 'open' | 'held' | 'signs' | 'signs-rounded';
  readonly limits: 'whole' | 'last-place';
}

/** The rules for ends that a column with so many decimals may follow. */
export function endRules(decimals: number): readonly EndRule[] {
  const limits = decimals === 0 ? (['whole'] as const) : (['last-place', 'whole'] as const);
  const kinds = ['signs', 'held', 'signs-rounded'] as const;
  return [
    ...limits.flatMap((limit) => kinds.map((kind) => ({ kind, limits: limit }))),
    { kind: 'open', limits: 'whole' },
  ];
}

/** A rank 0–100 brought to a number of decimals, exactly. */
export function roundedTo(rank: ExactRatio, decimals: number, rule: RoundingRule): ExactRatio {
  const unit = powerOfTen(decimals);
  if (rule === 'down') return ratio((rank.numerator * unit) / rank.denominator, unit);
  return ratio(roundRatio(rank, decimals, rule), unit);
}

/** A rank as the rule for ends prints it, from itself and its rounded value. */
export function withEnds(rank: ExactRatio, rounded: ExactRatio, decimals: number, rule: EndRule): PrintedValue {
  const unit = rule.limits === 'whole' ? 1n : powerOfTen(decimals);
  const [low, high] = [ratio(1n, unit), ratio(100n * unit - 1n, unit)];
  const decides = rule.kind === 'signs' ? rank : rounded;
  const end = compareRatios(decides, low) < 0 ? 'low' : compareRatios(decides, high) > 0 ? 'high' : null;
  if (rule.kind === 'open' || end === null) return { sign: '', value: rounded };
  const value = end === 'low' ? low : high;
  if (rule.kind === 'held') return { sign: '', value };
  return { sign: end === 'low' ? '<' : '>', value };
}

export function samePrint(left: PrintedValue, right: PrintedValue): boolean {
  return left.sign === right.sign && compareRatios(left.value, right.value) === 0;
}

/** The text of a printed rank; limits that are whole numbers have no decimals behind a sign. */
export function textOfPrint({ sign, value }: PrintedValue, decimals: number): string {
  const whole = value.numerator % value.denominator === 0n;
  return `${sign}${printRatio(value, sign !== '' && whole ? 0 : decimals)}`;
}

export function roundingInWords(rule: RoundingRule): string {
  switch (rule) {
    case 'half-up':
      return 'halves rounded up';
    case 'half-even':
      return 'halves rounded to even';
    case 'down':
      return 'further digits left out';
  }
}

export function endsInWords({ kind, limits }: EndRule, decimals: number): string {
  const unit = limits === 'whole' ? 1n : powerOfTen(decimals);
  const low = printRatio(ratio(1n, unit), limits === 'whole' ? 0 : decimals);
  const high = printRatio(ratio(100n * unit - 1n, unit), limits === 'whole' ? 0 : decimals);
  switch (kind) {
    case 'open':
      return 'ends as they are, 0 and 100 too';
    case 'held':
      return `held between ${low} and ${high}`;
    case 'signs':
      return `<${low} and >${high} at the ends`;
    case 'signs-rounded':
      return `<${low} and >${high} where the rounded rank lies beyond`;
  }
}
