import { describe, expect, it } from 'vitest';
import { ENGLISH_WORDS } from '../../../shared-core/languages/phrases.ts';
import { ogivePicture } from '../../../shared-core/pages/ogive-picture.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { LOG_LINEAR, sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';

const size = { width: 240, height: 112 };

function picture(cohort: SampleCohort, curve: Partial<NormProject['curve']> = {}, within = size): string {
  const set = sampleNormSet({ groups: ['4'], ...cohort }, (project) => ({
    ...project,
    curve: { ...project.curve, ...curve },
  }));
  const norms = set.groups[0];
  if (norms === undefined) throw new Error('no group');
  return ogivePicture(norms, 95, within, ENGLISH_WORDS);
}

const BAND = /<path d="([^"]+)" fill="#d3e4e5"/;

function corners(d: string): readonly (readonly [number, number])[] {
  return [...d.matchAll(/[ML]([\d.-]+) ([\d.-]+)/g)].map((match) => [Number(match[1]), Number(match[2])] as const);
}

/** Corners of the step line: the thin path in ink. */
function steps(svg: string): readonly (readonly [number, number])[] {
  const d = /<path d="([^"]+)" fill="none" stroke="#1e2326"/.exec(svg)?.[1] ?? '';
  return corners(d);
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

  it('shows the interval as a band round the observed ranks, where the definition has one', () => {
    const svg = picture({ scale: WHOLE_SCALE });
    const band = corners(BAND.exec(svg)?.[1] ?? '');
    const ranks = corners(/<path d="([^"]+)" fill="none" stroke="#0d5a66"/.exec(svg)?.[1] ?? '');
    expect(band).toHaveLength(2 * 41);
    ranks.forEach(([x, y], index) => {
      const [high, low] = [band[index], band.at(-1 - index)];
      expect([high?.[0], low?.[0]]).toEqual([x, x]);
      expect(high?.[1]).toBeLessThanOrEqual(y);
      expect(low?.[1]).toBeGreaterThanOrEqual(y);
    });
    expect(svg).toContain('95 % interval');
    const grouped = picture({ scale: { min: 0, max: 39, step: 1 } }, { definition: { kind: 'grouped', width: 5 } });
    expect(grouped).not.toMatch(BAND);
    expect(grouped).not.toContain('interval');
  });

  it('says which curve is smoothed, and draws it without dots', () => {
    const plain = picture({ scale: WHOLE_SCALE });
    const smoothed = picture({ scale: WHOLE_SCALE }, { smoothing: LOG_LINEAR });
    expect([plain.includes('>percentile rank<'), plain.includes('>smoothed<')]).toEqual([true, false]);
    expect([smoothed.includes('>percentile rank<'), smoothed.includes('>smoothed<')]).toEqual([false, true]);
    expect(plain.match(/<circle/g)).toHaveLength(42);
    expect(smoothed).not.toContain('<circle');
    expect(steps(smoothed)).toEqual(steps(plain));
  });

  it('keeps its labels clear of curve, steps and band', () => {
    for (const within of [size, { width: 164, height: 77 }]) {
      for (const direction of ['high-is-good', 'low-is-good'] as const) {
        for (const smoothing of [{ kind: 'none' } as const, LOG_LINEAR]) {
          const svg = picture({ scale: WHOLE_SCALE, direction }, { smoothing }, within);
          const band = corners(BAND.exec(svg)?.[1] ?? '');
          const texts = [...svg.matchAll(/<text x="([\d.]+)" y="([\d.]+)" text-anchor="start"[^>]*>([^<]+)</g)].filter(
            ([, , , text]) => text !== 'Per cent',
          );
          expect(texts).toHaveLength(3);
          for (const [, left, baseline, text = ''] of texts) {
            const [x, y] = [Number(left), Number(baseline)];
            const end = x + textWidth(text, 'sans', 6.6);
            expect(end).toBeLessThanOrEqual(within.width);
            const drawn = [...band, ...steps(svg)].filter(([at]) => at >= x - 13 && at <= end);
            for (const [, height] of drawn) expect(height < y - 5 || height > y).toBe(true);
          }
        }
      }
    }
  });
});
