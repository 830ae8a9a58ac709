import { describe, expect, it } from 'vitest';
import { ratio, type Rounding } from '../../../shared-core/percentile/exact-ratio.ts';
import { printRank, type RankEnds } from '../../../shared-core/scores/printed-number.ts';

const LARGEST_GROUP = 400n;

/**
 * What each way of printing must show for the ranks 100·k/(2N), k = 0 … 2N, found without dividing: a counter m of
 * whole or tenth parts goes up while m − 1/2 still lies at or below the rank, by comparing products of whole numbers.
 */
function* expectedTexts(people: bigint, decimals: 0 | 1, rounding: Rounding, ends: RankEnds): Generator<string> {
  const parts = decimals === 0 ? 100n : 1000n;
  const halves = 2n * people;
  let multiple = 0n;
  for (let k = 0n; k <= halves; k += 1n) {
    while ((2n * multiple + 1n) * halves <= 2n * parts * k) multiple += 1n;
    const onHalf = (2n * multiple - 1n) * halves === 2n * parts * k;
    const rounded = onHalf && rounding === 'half-even' && multiple % 2n === 1n ? multiple - 1n : multiple;
    const text = (whole: bigint): string => (decimals === 0 ? `${whole}` : `${whole / 10n}.${whole % 10n}`);
    if (ends === 'signs' && parts * k < halves) yield `<${text(1n)}`;
    else if (ends === 'signs' && parts * k > (parts - 1n) * halves) yield `>${text(parts - 1n)}`;
    else yield text(rounded < 1n ? 1n : rounded > parts - 1n ? parts - 1n : rounded);
  }
}

describe(`printed ranks of every half-count in every group of up to ${LARGEST_GROUP} people`, () => {
  const ways = ([0, 1] as const).flatMap((decimals) =>
    (['half-up', 'half-even'] as const).flatMap((rounding) =>
      (['signs', 'held'] as const).map((ends) => ({ decimals, rounding, ends })),
    ),
  );

  it.each(ways)('$decimals decimals, $rounding, ends by $ends', (print) => {
    const wrong: string[] = [];
    let compared = 0;
    for (let people = 1n; people <= LARGEST_GROUP; people += 1n) {
      let k = 0n;
      for (const expected of expectedTexts(people, print.decimals, print.rounding, print.ends)) {
        const { text } = printRank(ratio(100n * k, 2n * people), print);
        if (text !== expected) wrong.push(`${k}/${2n * people}: ${text}, not ${expected}`);
        k += 1n;
        compared += 1;
      }
    }
    expect(wrong.slice(0, 5)).toEqual([]);
    expect(compared).toBe(160_800);
  });
});

describe('a printed rank', () => {
  const up = { decimals: 0, rounding: 'half-up', ends: 'signs' } as const;

  it('is never 0 or 100', () => {
    expect(printRank(ratio(0n, 1n), up)).toEqual({ text: '<1', end: 'low' });
    expect(printRank(ratio(100n, 1n), up)).toEqual({ text: '>99', end: 'high' });
    expect(printRank(ratio(0n, 1n), { ...up, ends: 'held' })).toEqual({ text: '1', end: 'low' });
    expect(printRank(ratio(100n, 1n), { ...up, ends: 'held' })).toEqual({ text: '99', end: 'high' });
    expect(printRank(ratio(0n, 1n), { ...up, decimals: 1 })).toEqual({ text: '<0.1', end: 'low' });
    expect(printRank(ratio(100n, 1n), { ...up, decimals: 1 })).toEqual({ text: '>99.9', end: 'high' });
    expect(printRank(ratio(100n, 1n), { ...up, decimals: 1, ends: 'held' })).toEqual({ text: '99.9', end: 'high' });
  });

  it('takes its sign from the unrounded rank', () => {
    expect(printRank(ratio(99n, 100n), up).text).toBe('<1');
    expect(printRank(ratio(1n, 1n), up)).toEqual({ text: '1', end: null });
    expect(printRank(ratio(99n, 1n), up)).toEqual({ text: '99', end: null });
    expect(printRank(ratio(9901n, 100n), up).text).toBe('>99');
    expect(printRank(ratio(99n, 100n), { ...up, ends: 'held' })).toEqual({ text: '1', end: null });
  });

  it('decides halves exactly where a double could not', () => {
    const half = ratio(47n, 2n);
    const justBelow = ratio(47n * 10n ** 30n - 1n, 2n * 10n ** 30n);
    expect(printRank(half, up).text).toBe('24');
    expect(printRank(justBelow, up).text).toBe('23');
    expect(printRank(half, { ...up, rounding: 'half-even' }).text).toBe('24');
    expect(printRank(ratio(45n, 2n), { ...up, rounding: 'half-even' }).text).toBe('22');
    expect(printRank(ratio(1005n, 100n), { ...up, decimals: 1 }).text).toBe('10.1');
    expect(printRank(ratio(1005n, 100n), { ...up, decimals: 1, rounding: 'half-even' }).text).toBe('10.0');
  });
});
