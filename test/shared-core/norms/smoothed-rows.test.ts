import { describe, expect, it } from 'vitest';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import { ratioNear } from '../../../shared-core/percentile/exact-ratio.ts';
import { percentileRanks, type RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { smoothedRanks } from '../../../shared-core/precision/counted-rank.ts';
import { smoothedStandardErrors } from '../../../shared-core/precision/rank-variance.ts';
import { normalisedZ, stanineOfRank } from '../../../shared-core/scores/derived-score.ts';
import { printRank } from '../../../shared-core/scores/printed-number.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import type { Smoothed, SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';
import { tableFromCounts } from '../../../shared-core/tally/frequency-table.ts';
import { builtSet, curveOf, firstNorms, projectOf, scaleTo } from './small-projects.ts';
import { SMOOTHED_COUNTS, SMOOTHING_METHODS } from './smoothing-methods.ts';

const KINDS = ['midpoint', 'at-or-below', 'below'] as const;
const DIRECTIONS = ['high-is-good', 'low-is-good'] as const;

function curve(counts: readonly number[], choice: Smoothed['choice']): Smoothed {
  const result = smooth(tableFromCounts(scaleTo(counts.length - 1), counts), choice);
  if (!result.ok) throw new Error(result.problem);
  return result.smoothed;
}

function smoothedRows(
  definition: RankDefinition,
  smoothing: SmoothingChoice,
  direction: 'high-is-good' | 'low-is-good' = 'high-is-good',
  counts: readonly number[] = SMOOTHED_COUNTS,
): readonly ConversionRow[] {
  const project = projectOf(counts, scaleTo(counts.length - 1, direction));
  return firstNorms({ ...project, curve: curveOf(definition, smoothing) }).rows;
}

function close(found: readonly (number | null | undefined)[], wanted: readonly number[], digits = 8): void {
  expect(found).toHaveLength(wanted.length);
  found.forEach((value, index) => expect(value).toBeCloseTo(wanted[index] ?? NaN, digits));
}

describe.each(SMOOTHING_METHODS)('rows smoothed by %s', (_, choice) => {
  const project = projectOf(SMOOTHED_COUNTS);
  const fit = curve(SMOOTHED_COUNTS, choice);

  it.each(KINDS)('have the ranks and errors of the curve, %s', (kind) => {
    for (const direction of DIRECTIONS) {
      const rows = smoothedRows({ kind }, choice, direction);
      const ranks = smoothedRanks(fit, direction, kind);
      expect(rows.map(({ rank }) => rank)).toEqual(ranks.map(ratioNear));
      close(
        rows.map((row) => row.smoothed?.percentileRank),
        ranks,
      );
      close(
        rows.map((row) => row.smoothed?.proportion),
        fit.probabilities,
        12,
      );
      const errors = smoothedStandardErrors(fit, direction, kind);
      if (errors === null) expect(rows.every((row) => row.standardError === null)).toBe(true);
      else
        close(
          rows.map((row) => row.standardError),
          errors,
          12,
        );
      expect(rows.map((row) => row.smoothed?.standardError)).toEqual(rows.map((row) => row.standardError));
    }
  });

  it('print from the curve and keep the observed rank beside it', () => {
    const rows = smoothedRows({ kind: 'midpoint' }, choice);
    const observed = percentileRanks(tableFromCounts(scaleTo(10), SMOOTHED_COUNTS), { kind: 'midpoint' });
    const plain = smoothedRows({ kind: 'midpoint' }, { kind: 'none' });
    rows.forEach((row, score) => {
      expect(row.printed).toBe(printRank(row.rank, project.table).text);
      expect(row.derived.z).toBe(normalisedZ(row.rank));
      expect(row.derived.stanine).toBe(stanineOfRank(row.rank));
      expect(row.texts['exact-rank']).toBe(row.percentileRank.toFixed(2));
      expect(row.provenance.printed.from).toBe('smoothed');
      expect(row.observed.rank).toEqual(observed[score]);
      expect(row.texts['observed-rank']).toBe(plain[score]?.texts['exact-rank']);
      for (const key of ['count', 'cumulative', 'weight', 'parts', 'interval', 'midpointError', 'observed'] as const) {
        const of = (one: ConversionRow | undefined): unknown =>
          key === 'count' || key === 'cumulative' ? one?.texts[key] : one?.[key];
        expect(of(row)).toEqual(of(plain[score]));
      }
    });
    expect(rows.some((row, score) => row.printed !== plain[score]?.printed)).toBe(true);
  });

  it('are plain data', () => {
    const set = builtSet({ ...project, curve: curveOf({ kind: 'midpoint' }, choice) });
    expect(structuredClone(set)).toEqual(set);
  });

  it('are those of the mirrored group where low scores are good', () => {
    // A kept score or a comb would have to be mirrored too; this one is the same from either end.
    const mirrored = {
      ...choice,
      ...('keptScores' in choice && choice.keptScores.length > 0 ? { keptScores: [6] } : {}),
    };
    for (const kind of KINDS) {
      const low = smoothedRows({ kind }, choice, 'low-is-good').toReversed();
      const high = smoothedRows({ kind }, mirrored, 'high-is-good', SMOOTHED_COUNTS.toReversed());
      close(
        low.map(({ percentileRank }) => percentileRank),
        high.map(({ percentileRank }) => percentileRank),
        6,
      );
      expect(low.map(({ printed }) => printed)).toEqual(high.map(({ printed }) => printed));
      expect(low.map(({ texts }) => texts.t)).toEqual(high.map(({ texts }) => texts.t));
    }
  });
});

describe('other definitions on a smooth curve', () => {
  it.each(['0', '3/8', '0.5'])('take N times the middle of the curve and a half as mean rank, a = %s', (offset) => {
    const a = { '0': 0, '3/8': 0.375, '0.5': 0.5 }[offset] ?? NaN;
    for (const [, choice] of SMOOTHING_METHODS) {
      const people = 173;
      const rows = smoothedRows({ kind: 'plotting-position', offset }, choice);
      const fit = curve(SMOOTHED_COUNTS, choice);
      close(
        rows.map(({ percentileRank }) => percentileRank),
        rows.map((_, k) => (100 * (people * fit.cumulative(k, 0) + 0.5 - a)) / (people + 1 - 2 * a)),
      );
      expect(rows.every(({ interval, standardError }) => interval === null && standardError === null)).toBe(true);
    }
  });

  it('interpolate in classes of the curve, counted from the poor end', () => {
    for (const [, choice] of SMOOTHING_METHODS) {
      const fit = curve(SMOOTHED_COUNTS, choice);
      const at = (k: number): number => 100 * (k > 10 ? fit.cumulative(10, 0.5) : fit.cumulative(k, -0.5));
      const inClass = (score: number): number => {
        const start = score - (score % 3);
        return at(start) + ((at(start + 3) - at(start)) * (score - start + 0.5)) / 3;
      };
      const rows = smoothedRows({ kind: 'grouped', width: 3 }, choice);
      close(
        rows.map(({ percentileRank }) => percentileRank),
        SMOOTHED_COUNTS.map((_, score) => inClass(score)),
      );
      // From the top: classes 10–8, 7–5, 4–2 and 1–0; above the edge below a score lie those who did worse.
      const seconds = smoothedRows({ kind: 'grouped', width: 3 }, choice, 'low-is-good');
      const fromTop = (score: number): number => {
        const from = 10 - score - ((10 - score) % 3);
        const worse = 100 - at(11 - from);
        const upTo = 100 - at(Math.max(0, 8 - from));
        return worse + ((upTo - worse) * (10 - score - from + 0.5)) / 3;
      };
      close(
        seconds.map(({ percentileRank }) => percentileRank),
        SMOOTHED_COUNTS.map((_, score) => fromTop(score)),
      );
    }
  });
});
