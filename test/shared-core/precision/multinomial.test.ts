import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { multinomialSampler } from '../../../shared-core/precision/multinomial.ts';
import { seededRandom } from '../../../shared-core/precision/seeded-random.ts';

const shares = fc
  .array(fc.oneof(fc.constant(0), fc.double({ min: 0, max: 1, noNaN: true })), { minLength: 1, maxLength: 30 })
  .filter((masses) => masses.some((mass) => mass > 1e-6))
  .map((masses) => {
    const sum = masses.reduce((total, mass) => total + mass, 0);
    return masses.map((mass) => mass / sum);
  });

describe('samples', () => {
  it('have as many people as asked for, and nobody where the probability is 0', () => {
    fc.assert(
      fc.property(shares, fc.nat(500), fc.nat(), (probabilities, people, seed) => {
        const counts = multinomialSampler(probabilities)(people, seededRandom(seed));
        expect(counts.length).toBe(probabilities.length);
        expect(counts.reduce((sum, count) => sum + count, 0)).toBe(people);
        counts.forEach((count, cell) => {
          if (probabilities[cell] === 0) expect(count).toBe(0);
        });
      }),
    );
  });

  it('have the frequencies of the distribution: chi-square over cells of very different size', () => {
    const probabilities = [0.5, 0.001, 0.2, 0, 0.099, 0.05, 0.15];
    const people = 2_000_000;
    const counts = multinomialSampler(probabilities)(people, seededRandom(7));
    const chiSquare = probabilities.reduce((sum, probability, cell) => {
      const expected = probability * people;
      return expected === 0 ? sum : sum + ((counts[cell] ?? 0) - expected) ** 2 / expected;
    }, 0);
    // 99.9 % point of 5 degrees of freedom.
    expect(chiSquare).toBeLessThan(20.52);
  });

  it('vary and covary as multinomial counts do', () => {
    const probabilities = [0.2, 0.3, 0.5];
    const [people, samples] = [50, 40_000];
    const draw = multinomialSampler(probabilities);
    const next = seededRandom(11);
    let [squares, products] = [0, 0];
    for (let sample = 0; sample < samples; sample += 1) {
      const [first = 0, second = 0] = draw(people, next);
      squares += (first - 10) ** 2 / samples;
      products += ((first - 10) * (second - 15)) / samples;
    }
    // N p (1 − p) = 8 and −N p q = −3, with about five standard errors of either mean.
    expect(Math.abs(squares - 8)).toBeLessThan(0.3);
    expect(Math.abs(products + 3)).toBeLessThan(0.3);
  });

  it('are refused from what is no distribution', () => {
    expect(() => multinomialSampler([0.5, 0.4])).toThrow(RangeError);
    expect(() => multinomialSampler([1.5, -0.5])).toThrow(RangeError);
    expect(() => multinomialSampler([NaN, 1])).toThrow(RangeError);
    expect(() => multinomialSampler([])).toThrow(RangeError);
  });
});
