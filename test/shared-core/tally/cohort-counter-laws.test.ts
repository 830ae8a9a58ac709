import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseDecimal } from '../../../shared-core/scale/decimal.ts';
import { SeenFilter } from '../../../shared-core/tally/cohort-counter-identities.ts';
import { WeightReader } from '../../../shared-core/tally/cohort-counter-weights.ts';
import type { Tally } from '../../../shared-core/tally/tally.ts';
import { countRows, readingWith } from './readings.ts';

const reading = readingWith({ g: 'group', score: 'score', w: 'weight' }, { scale: null });
const COLUMNS = ['g', 'score', 'w'];

const digits = (most: number): fc.Arbitrary<string> =>
  fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 1, maxLength: most }).map((all) => all.join(''));
const weight = fc.oneof(
  fc.tuple(digits(4), digits(6)).map(([whole, part]) => `${whole}.${part}`),
  fc.tuple(digits(17), digits(22)).map(([whole, part]) => `${whole}.${part}`),
  digits(16),
  fc.constantFrom('1', '0.5', '2e3', '1.50', '4.7000000000000002', '.25'),
);
const row = fc.tuple(fc.constantFrom('A', 'B', '04'), fc.integer({ min: 0, max: 30 }).map(String), weight);
const rows = fc.array(row, { minLength: 1, maxLength: 60 }).map((some) => [['A', '0', '1'], ['A', '30', '1'], ...some]);

/** Sums by plain BigInt arithmetic, every weight in units of 10^-40. */
function plainSums(some: readonly (readonly string[])[]): readonly [bigint, bigint] {
  return some.reduce<readonly [bigint, bigint]>(
    ([sum, squares], [, , text = '']) => {
      const read = parseDecimal(text);
      if (read === null || read.units <= 0n) return [sum, squares];
      const units = read.units * 10n ** BigInt(40 - read.decimals);
      return [sum + units, squares + units * units];
    },
    [0n, 0n],
  );
}

function tallySums(tally: Tally): readonly [bigint, bigint] {
  const unit = 10n ** BigInt(40 - (tally.weightDecimals ?? 0));
  const total = (texts: readonly string[]): bigint => texts.reduce((sum, text) => sum + BigInt(text), 0n);
  return [
    total(tally.cells.flatMap(({ weights }) => weights ?? [])) * unit,
    total(tally.cells.flatMap(({ squares }) => squares ?? [])) * unit * unit,
  ];
}

describe('exact sums', () => {
  it('equal plain BigInt arithmetic for weights of any size', () => {
    fc.assert(
      fc.property(rows, (some) => {
        expect(tallySums(countRows(reading, COLUMNS, some).tally)).toEqual(plainSums(some));
      }),
    );
  });

  it('do not depend on the order of the rows, to the byte', () => {
    fc.assert(
      fc.property(
        rows,
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 62, maxLength: 62 }),
        (some, keys) => {
          const shuffled = some
            .map((one, index) => ({ one, key: keys[index] ?? 0 }))
            .sort((left, right) => left.key - right.key)
            .map(({ one }) => one);
          const text = (all: readonly (readonly string[])[]): string =>
            JSON.stringify(countRows(reading, COLUMNS, all).tally);
          expect(text(shuffled)).toBe(text(some));
        },
      ),
    );
  });

  it('stay when a row is split into two of half the weight', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 10_000_000 }), { minLength: 2 }), (units) => {
        const whole = units.map((unit, index) => ['A', String(index % 30), `${2 * unit}`]);
        const halves = whole.flatMap(([group = '', score = ''], index) => {
          const half = [group, score, `${units[index] ?? 0}`];
          return [half, half];
        });
        const sums = (all: readonly (readonly string[])[]): unknown =>
          countRows(reading, COLUMNS, all).tally.cells.map(({ weights }) => weights);
        expect(sums(halves)).toEqual(sums(whole));
      }),
    );
  });

  it('equal the counts where all weigh 1', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 20 }), { minLength: 1 }), (scores) => {
        const one = readingWith({ score: 'score', w: 'weight' });
        const { tally } = countRows(
          one,
          ['score', 'w'],
          scores.map((score) => [String(score), '1.000']),
        );
        expect(tally.weightDecimals).toBe(0);
        for (const { counts, weights, squares } of tally.cells) {
          expect(weights).toEqual(counts.map(String));
          expect(squares).toEqual(weights);
        }
      }),
    );
  });

  it('grow past what a plain number holds', () => {
    const heavy = Array.from({ length: 50 }, (_, index) => ['A', String(index % 2), '94906265.5']);
    expect(tallySums(countRows(reading, COLUMNS, heavy).tally)).toEqual(plainSums(heavy));
    const large = Array.from({ length: 5 }, (_, index) => ['A', String(index % 2), '9007199254740991']);
    expect(tallySums(countRows(reading, COLUMNS, large).tally)).toEqual(plainSums(large));
  });
});

describe('reading a weight', () => {
  it('gives what parseDecimal gives', () => {
    const text = fc.oneof(
      weight,
      fc
        .array(fc.constantFrom('0', '1', '9', '.', ',', '-', '+', 'e', ' ', 'x'), { maxLength: 8 })
        .map((all) => all.join('')),
    );
    fc.assert(
      fc.property(text, fc.constantFrom('.' as const, ',' as const), (written, mark) => {
        const reader = new WeightReader(mark);
        const plain = parseDecimal(written, mark);
        expect(reader.read(written)).toBe(plain !== null && plain.units > 0n);
        if (plain === null || plain.units <= 0n) return;
        const units = reader.units === null ? reader.bigUnits : BigInt(reader.units);
        expect(units * 10n ** BigInt(plain.decimals)).toBe(plain.units * 10n ** BigInt(reader.decimals));
        expect(reader.decimals === 0 || units % 10n !== 0n).toBe(true);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('the filter of identifiers', () => {
  it('never forgets', () => {
    fc.assert(
      fc.property(fc.array(fc.string(), { maxLength: 300 }), fc.integer({ min: 9, max: 14 }), (texts, bits) => {
        const filter = new SeenFilter(bits);
        for (const text of texts) filter.meet(text);
        expect(texts.every((text) => filter.meet(text))).toBe(true);
      }),
    );
  });

  it('hardly ever claims what it has not met', () => {
    const filter = new SeenFilter(20);
    let claims = 0;
    for (let id = 0; id < 20_000; id += 1) if (filter.meet(String(id).padStart(8, '0'))) claims += 1;
    expect(claims).toBeLessThan(20);
  });
});
