import { describe, expect, it } from 'vitest';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import type { SmoothingResult } from '../../../shared-core/smoothing/smoothing.ts';
import { tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { wholeScale } from '../../reference/read-reference.ts';
import { logLinear, smoothed } from '../../reference/smoothing-reference.ts';
import { generator } from './random-cohorts.ts';

/** People at given places of the scale 0 to 20. */
function peopleAt(places: Readonly<Record<number, number>>): FrequencyTable {
  return tableFromCounts(
    wholeScale(0, 20),
    Array.from({ length: 21 }, (_, k) => places[k] ?? 0),
  );
}

function refusal(result: SmoothingResult): Extract<SmoothingResult, { readonly ok: false }> {
  if (result.ok) throw new Error(`not refused: ${result.smoothed.statement}`);
  return result;
}

describe('a log-linear fit is refused', () => {
  it('for an empty group and for people on one score', () => {
    for (const table of [peopleAt({}), peopleAt({ 7: 30 })]) {
      const { problem, instead } = refusal(smooth(table, logLinear('bic')));
      expect(problem).toContain('two scores or more');
      expect(instead).toEqual({ kind: 'none' });
    }
  });

  it('for hardly any people', () => {
    const { problem, instead } = refusal(smooth(peopleAt({ 7: 1, 9: 1 }), logLinear('bic')));
    expect(problem).toContain('too few people');
    expect(instead).toEqual({ kind: 'none' });
    expect(smoothed(peopleAt({ 7: 1, 9: 1, 12: 1 }), logLinear('bic')).degree).toBe(1);
  });

  // The roots that a polynomial needs to be 0 at all of these and below 0 at the others: neighbours share a pair.
  it.each([
    ['two neighbours', { 7: 20, 8: 10 }, 1],
    ['two apart', { 7: 20, 12: 10 }, 3],
    ['an end and two neighbours', { 0: 5, 9: 20, 10: 10 }, 2],
    ['both ends', { 0: 15, 20: 15 }, 1],
    ['an end with its neighbour', { 0: 15, 1: 15 }, 1],
    ['three in a row', { 7: 20, 8: 10, 9: 10 }, 3],
    ['three in a row at an end', { 18: 20, 19: 10, 20: 10 }, 2],
  ] as const)('above the degree that %s determine, with that degree offered', (_, places, highest) => {
    const table = peopleAt(places);
    const { problem, instead, degrees } = refusal(smooth(table, logLinear(highest + 1)));
    expect(problem).toContain('too few distinct scores');
    expect(problem).toContain(`Degree ${highest} is the nearest`);
    expect(instead).toEqual(logLinear(highest));
    expect(degrees.map((line) => line.degree)).toEqual(Array.from({ length: highest }, (_line, index) => index + 1));
    expect(smoothed(table, logLinear(highest)).degree).toBe(highest);
    expect(smoothed(table, logLinear('bic')).degrees.length).toBe(highest);
  });

  it('whatever the data: fits meet their equations, refusals offer what works', () => {
    const next = generator(77);
    for (let group = 0; group < 300; group += 1) {
      const places: Record<number, number> = {};
      for (let person = 0; person < 4 + 30 * next(); person += 1) {
        const place = Math.floor(next() < 0.5 ? 21 * next() : 3 + 4 * next());
        places[place] = (places[place] ?? 0) + 1;
      }
      const table = peopleAt(places);
      const n = table.counts.reduce((sum, count) => sum + count, 0);
      for (const degree of [1, 3, 5, 8, 10]) {
        const result = smooth(table, logLinear(degree));
        const fit = result.ok || result.instead.kind !== 'log-linear' ? result : smooth(table, result.instead);
        if (!fit.ok) {
          expect(fit.instead).toEqual({ kind: 'none' });
          continue;
        }
        const gap = table.counts.reduce(
          (sum, count, k) => sum + (count / n - (fit.smoothed.probabilities[k] ?? NaN)) * k,
          0,
        );
        expect(Math.abs(gap)).toBeLessThan(1e-9);
      }
    }
  });
});

describe('degrees that no control can ask for', () => {
  it.each([0, 11, 2.5, NaN])('throw: %d', (degree) => {
    expect(() => smooth(peopleAt({ 3: 9, 8: 5 }), logLinear(degree))).toThrow('whole number from 1 to 10');
  });
});

describe('a refit alone', () => {
  it('has the same curve, without the table of degrees', () => {
    const table = peopleAt({ 2: 3, 5: 9, 6: 14, 8: 20, 9: 11, 12: 8, 15: 2 });
    for (const degree of [1, 3, 6]) {
      const [alone, full] = [smooth(table, logLinear(degree), 'fit-only'), smooth(table, logLinear(degree))];
      if (!alone.ok || !full.ok) throw new Error('refused');
      expect(alone.smoothed.degrees).toEqual([]);
      full.smoothed.probabilities.forEach((probability, k) => {
        expect(Math.abs((alone.smoothed.probabilities[k] ?? NaN) - probability)).toBeLessThan(1e-12);
      });
    }
  });

  it('chooses by the same table where a rule does', () => {
    const table = peopleAt({ 2: 3, 5: 9, 6: 14, 8: 20, 9: 11, 12: 8, 15: 2 });
    const [alone, full] = [smooth(table, logLinear('aic'), 'fit-only'), smooth(table, logLinear('aic'))];
    expect(alone.ok && alone.smoothed.degrees).toEqual(full.ok && full.smoothed.degrees);
    expect(full.ok && full.smoothed.statement).toContain('lowest AIC among degrees 1 to 9');
  });
});
