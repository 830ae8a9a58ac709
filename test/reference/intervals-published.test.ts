import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { proportionInterval, type IntervalMethod } from '../../shared-core/precision/proportion-interval.ts';
import { readText } from './read-reference.ts';

const limits = v.array(v.tuple([v.number(), v.number()]));

const PUBLISHED = v.object({
  newcombe_1998_table_I_95pct: v.object({
    cases: v.array(v.string()),
    wilson_method3: limits,
    clopper_pearson_method5: limits,
  }),
  clopper_pearson_5_of_25: v.object({ expected: v.tuple([v.number(), v.number()]) }),
});

/** Newcombe (1998), Statistics in Medicine 17, 857–872, Table I: read in public files that quote it, computed again. */
describe('Newcombe’s Table I of 95 % intervals', () => {
  const { newcombe_1998_table_I_95pct: table, clopper_pearson_5_of_25: five } = v.parse(
    PUBLISHED,
    JSON.parse(readText('published_checks.json')),
  );

  function expectPrinted(method: IntervalMethod, rows: readonly (readonly [number, number])[]): void {
    expect(rows.length).toBe(4);
    table.cases.forEach((text, index) => {
      const [count = NaN, n = NaN] = text.split('/').map(Number);
      const { low, high } = proportionInterval(count, n, { method, level: 95 });
      const printed = [low, high].map((limit) => (limit / 100).toFixed(4));
      expect(printed, `${method} ${text}`).toEqual(rows[index]?.map((limit) => limit.toFixed(4)));
    });
  }

  it('method 3, Wilson', () => expectPrinted('wilson', table.wilson_method3));

  it('method 5, Clopper and Pearson', () => expectPrinted('clopper-pearson', table.clopper_pearson_method5));

  it('the same cases by Jeffreys, computed with R and in no table', () => {
    const computed = [
      [0.254522, 0.365647],
      [0.060449, 0.157643],
      [0.000024, 0.116639],
      [0.003746, 0.150078],
    ];
    table.cases.forEach((text, index) => {
      const [count = NaN, n = NaN] = text.split('/').map(Number);
      const { low, high } = proportionInterval(count, n, { method: 'jeffreys', level: 95 });
      expect([low, high].map((limit) => (limit / 100).toFixed(6))).toEqual(computed[index]?.map((x) => x.toFixed(6)));
    });
  });

  /** influentialpoints.com, confidence intervals of proportions: read to three decimals. */
  it('Clopper and Pearson for 5 of 25', () => {
    const { low, high } = proportionInterval(5, 25, { method: 'clopper-pearson', level: 95 });
    expect([low, high].map((limit) => (limit / 100).toFixed(3))).toEqual(five.expected.map((limit) => limit.toFixed(3)));
  });

  /** Wilson 95 % of 20/60 and 5/60: read in public files, computed again. */
  it('Wilson for 20 and 5 of 60', () => {
    const printed = [20, 5].map((count) => {
      const { low, high } = proportionInterval(count, 60, { method: 'wilson', level: 95 });
      return [low, high].map((limit) => (limit / 100).toFixed(5));
    });
    expect(printed).toEqual([
      ['0.22729', '0.45943'],
      ['0.03612', '0.18069'],
    ]);
  });
});
