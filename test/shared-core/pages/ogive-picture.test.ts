import { describe, expect, it } from 'vitest';
import { ogivePicture } from '../../../shared-core/pages/ogive-picture.ts';
import { sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';

const size = { width: 240, height: 112 };

function picture(cohort: SampleCohort): string {
  const norms = sampleNormSet({ groups: ['4'], ...cohort }).groups[0];
  if (norms === undefined) throw new Error('no group');
  return ogivePicture(norms, size);
}

/** Corners of the step line: the thin path in ink. */
function steps(svg: string): readonly (readonly [number, number])[] {
  const d = /<path d="([^"]+)" fill="none" stroke="#1e2326"/.exec(svg)?.[1] ?? '';
  return [...d.matchAll(/[ML]([\d.-]+) ([\d.-]+)/g)].map((match) => [Number(match[1]), Number(match[2])] as const);
}

describe('ogivePicture', () => {
  it('needs nothing from outside and holds no style or script', () => {
    const svg = picture({ scale: WHOLE_SCALE });
    expect(svg).not.toMatch(/style=|<style|<script|href|url\(/);
    expect(svg.match(/<svg /g)).toHaveLength(1);
    expect(svg).not.toContain('NaN');
    expect(svg).toContain('font-family="Source Sans 3"');
  });

  it('climbs from 0 to 100 per cent, and comes down where low is good', () => {
    const up = steps(picture({ scale: WHOLE_SCALE }));
    const down = steps(picture({ scale: WHOLE_SCALE, direction: 'low-is-good' }));
    const [bottom, top] = [91, 4];
    expect([up[0]?.[1], up.at(-1)?.[1]]).toEqual([bottom, top]);
    expect([down[0]?.[1], down.at(-1)?.[1]]).toEqual([top, bottom]);
    for (const [index, [, y]] of up.entries()) expect(y).toBeLessThanOrEqual(up[index - 1]?.[1] ?? Infinity);
  });

  it('follows the weights', () => {
    expect(steps(picture({ scale: WHOLE_SCALE, weighted: true }))).not.toEqual(steps(picture({ scale: WHOLE_SCALE })));
  });

  it('stays inside its frame on every scale', () => {
    for (const scale of [
      { min: 0, max: 1, step: 1 },
      { min: -3, max: 4.5, step: 0.5 },
      { min: 200, max: 1200, step: 10 },
      { min: 0, max: 0.5, step: 0.001 },
    ]) {
      const svg = picture({ scale });
      for (const [, x, y] of svg.matchAll(/[ML]([\d.-]+) ([\d.-]+)/g)) {
        expect(Number(x)).toBeGreaterThanOrEqual(0);
        expect(Number(x)).toBeLessThanOrEqual(size.width);
        expect(Number(y)).toBeGreaterThanOrEqual(0);
        expect(Number(y)).toBeLessThanOrEqual(size.height);
      }
      const ticks = [...svg.matchAll(/text-anchor="middle"/g)].length;
      expect(ticks).toBeGreaterThanOrEqual(2);
      expect(ticks).toBeLessThanOrEqual(10);
    }
  });
});
