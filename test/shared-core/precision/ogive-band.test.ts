import { describe, expect, it } from 'vitest';
import { multinomialSampler } from '../../../shared-core/precision/multinomial.ts';
import { ogiveBand, ogiveReach } from '../../../shared-core/precision/ogive-band.ts';
import { seededRandom } from '../../../shared-core/precision/seeded-random.ts';

describe('the band of a whole ogive', () => {
  it('reaches √(ln(2/α)/(2n)) to either side, in points', () => {
    expect(ogiveReach(100, 95)).toBeCloseTo(13.5810151574062, 10);
    expect(ogiveReach(1600, 95)).toBeCloseTo(13.5810151574062 / 4, 10);
    expect(ogiveReach(50, 99)).toBeCloseTo(100 * Math.sqrt(Math.log(200) / 100), 10);
    expect(() => ogiveReach(0, 95)).toThrow(RangeError);
    expect(() => ogiveReach(10, 100)).toThrow(RangeError);
  });

  it('is held within 0 and 100', () => {
    const [low, middle, high] = ogiveBand([2, 50, 99], 100, 95);
    expect(low?.low).toBe(0);
    expect(middle?.low).toBeCloseTo(36.4189848425938, 9);
    expect(middle?.high).toBeCloseTo(63.5810151574062, 9);
    expect(high?.high).toBe(100);
  });

  it('holds the whole of a known ogive in at least 95 of 100 samples', () => {
    const shares = new Array<number>(200).fill(1 / 200);
    const draw = multinomialSampler(shares);
    const next = seededRandom(5);
    const [people, samples] = [100, 4000];
    const reach = ogiveReach(people, 95);
    let held = 0;
    for (let sample = 0; sample < samples; sample += 1) {
      let [seen, far] = [0, 0];
      draw(people, next).forEach((count, place) => {
        seen += count;
        far = Math.max(far, Math.abs((100 * seen) / people - (place + 1) / 2));
      });
      if (far <= reach) held += 1;
    }
    // Not far above 95 either, on so fine a scale; a standard error is 0.35 points.
    expect((100 * held) / samples).toBeGreaterThan(94.5);
    expect((100 * held) / samples).toBeLessThan(98);
  });
});
