import { describe, expect, it } from 'vitest';
import type { ColumnKey } from '../../../shared-core/norms/column-keys.ts';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { alternativeInWords } from '../../../shared-core/norms/precision-workings.ts';
import { workingsOf } from '../../../shared-core/norms/workings.ts';
import { ratioNear } from '../../../shared-core/percentile/exact-ratio.ts';
import {
  observedContinuization,
  rankAt,
  smoothedContinuization,
} from '../../../shared-core/precision/continuized-rank.ts';
import { normalisedZ } from '../../../shared-core/scores/derived-score.ts';
import { printRank } from '../../../shared-core/scores/printed-number.ts';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import type { SmoothingChoice } from '../../../shared-core/smoothing/smoothing.ts';
import { numberIn, workedOut } from './arithmetic.ts';
import { curveOf, firstNorms, logLinear, projectOf, scaleTo, weightedProject } from './small-projects.ts';
import { SMOOTHED_COUNTS, SMOOTHING_METHODS } from './smoothing-methods.ts';

const Z_95 = 1.959963984540054;

function linesOf(project: NormProject, norms: GroupNorms, row: ConversionRow, column: ColumnKey | 'rank') {
  const { lines, result } = workingsOf(project, norms, row.scoreText, column);
  expect(lines.join(' ')).not.toMatch(/NaN|undefined|Infinity|-\d/);
  expect(result).toBe(column === 'rank' ? row.printed : row.texts[column]);
  return lines;
}

/** The numbers in the first line that matches; each group of the pattern is one. */
function numbersIn(lines: readonly string[], pattern: RegExp): readonly number[] {
  const [match] = lines.flatMap((line) => {
    const found = pattern.exec(line);
    return found === null ? [] : [found];
  });
  if (match === undefined) throw new Error(`no line like ${pattern.source}: ${lines.join(' | ')}`);
  return match.slice(1).map((text) => numberIn(text));
}

function expectWithin(found: number | undefined, wanted: number, reach: number): void {
  expect(Math.abs((found ?? NaN) - wanted)).toBeLessThan(reach);
}

function shares(row: ConversionRow): { readonly below: number; readonly at: number } {
  const { below, at, all } = row.provenance.percentileRank;
  return { below: below / all, at: at / all };
}

describe.each(SMOOTHING_METHODS)('workings of ranks smoothed by %s', (_, choice) => {
  const bare = projectOf(SMOOTHED_COUNTS, scaleTo(10, 'low-is-good'));
  const project: NormProject = { ...bare, curve: curveOf({ kind: 'midpoint' }, choice) };
  const norms = firstNorms(project);

  it('go from the counts to the observed rank, then to the smoothed one and its print', () => {
    for (const row of norms.rows) {
      for (const column of ['rank', 'exact-rank', 'observed-rank'] as const) {
        const lines = linesOf(project, norms, row, column);
        const [left = '', right = ''] = lines.find((line) => line.startsWith('100 × '))?.split(' = ') ?? [];
        expectWithin(workedOut(left), numberIn(right), 0.51e-4);
        expectWithin(numberIn(right), row.observed.percentileRank, 0.51e-4);
        if (column === 'observed-rank') {
          expect(lines.some((line) => line.startsWith('Smoothed'))).toBe(false);
          expect(numberIn(right).toFixed(2)).toBe(row.texts['observed-rank']);
          continue;
        }
        expect(lines).toContain(norms.smoothing.state === 'smoothed' ? norms.smoothing.curve.statement : '');
        const [value = NaN] = numbersIn(lines, /^Smoothed: ([\d.]+?)(?:, with .*)?$/);
        expectWithin(value, row.percentileRank, 0.51e-4);
        if (column === 'rank') expect(printRank(ratioNear(value), project.table).text).toBe(row.printed);
        const { standardError } = row;
        if (standardError === null) continue;
        expectWithin(numbersIn(lines, /^Smoothed: .* error of ([\d.]+)$/)[0], standardError, 0.0051);
      }
    }
  });

  it('lead to derived scores', () => {
    for (const row of norms.rows) {
      const lines = linesOf(project, norms, row, 'z');
      const [rank = NaN] = numbersIn(lines, /^Smoothed: ([\d.]+?)(?:, with .*)?$/);
      const [z = NaN] = numbersIn(lines, /deviate of the rank: (\u2212?[\d.]+)\.$/);
      expectWithin(z, normalisedZ(ratioNear(rank)) ?? NaN, 0.02);
    }
  });
});

const PROJECTS: readonly (readonly [string, NormProject])[] = [
  ['people', projectOf(SMOOTHED_COUNTS)],
  ['people, low is good', projectOf(SMOOTHED_COUNTS, scaleTo(10, 'low-is-good'))],
  ['weights', weightedProject()],
];

describe.each(PROJECTS)('workings of how sure ranks are, %s', (_, bare) => {
  const precision = { ...bare.precision, reliability: 0.84 };
  const smoothedSo = (smoothing: SmoothingChoice): NormProject => ({
    ...bare,
    precision,
    table: { ...bare.table, columns: ['print-range'] },
    curve: curveOf({ kind: 'midpoint' }, smoothing),
  });
  const project = smoothedSo({ kind: 'none' });
  const norms = firstNorms(project);
  const n = norms.summary.effectiveN;

  it('come to the interval of Wilson', () => {
    for (const row of norms.rows) {
      const lines = linesOf(project, norms, row, 'interval');
      const { below, at } = shares(row);
      const p = below + at / 2;
      const centre = p + Z_95 ** 2 / (2 * n);
      const reach = Z_95 * Math.sqrt((p * (1 - p)) / n + Z_95 ** 2 / (4 * n * n));
      const ends = [centre - reach, centre + reach].map((end) => (100 * end) / (1 + Z_95 ** 2 / n));
      const [low, high] = numbersIn(lines, /^The 95 % Wilson interval .*: ([\d.]+) to ([\d.]+)\.$/);
      expectWithin(low, Math.max(0, ends[0] ?? NaN), 0.0051);
      expectWithin(high, Math.min(100, ends[1] ?? NaN), 0.0051);
      expect(lines.join(' ')).toContain(norms.group.table.weighted ? 'the effective n, 9.3' : 'on n = 173:');
      expect(lines.at(-1)).toBe(`Printed: ${row.texts.interval}.`);
    }
  });

  it('come to the standard error', () => {
    for (const row of norms.rows) {
      const lines = linesOf(project, norms, row, 'standard-error');
      const { below, at } = shares(row);
      const error = 100 * Math.sqrt(Math.max(0, below + at / 4 - (below + at / 2) ** 2) / n);
      const [found = NaN] = numbersIn(lines, /^Multinomial standard error of the midpoint rank.*: ([\d.]+) points\.$/);
      expectWithin(found, error, 0.51e-4);
      expectWithin(numberIn(row.texts['standard-error']), found, 0.0501);
    }
    const curved = smoothedSo(logLinear(2));
    const other = firstNorms(curved);
    for (const row of other.rows) {
      const lines = linesOf(curved, other, row, 'standard-error');
      const [found] = numbersIn(
        lines,
        /^Standard error of the smoothed rank by the delta method.*: ([\d.]+) points\.$/,
      );
      expectWithin(found, row.smoothed?.standardError ?? NaN, 0.51e-4);
    }
  });

  it('come to the band of measurement', () => {
    for (const choice of [{ kind: 'none' }, logLinear(2)] as const) {
      const chosen = smoothedSo(choice);
      const of = firstNorms(chosen);
      const { table } = of.group;
      const fit = choice.kind === 'none' ? null : smooth(table, choice);
      const ranks =
        fit?.ok === true ? smoothedContinuization(fit.smoothed, table.scale) : observedContinuization(table);
      for (const row of of.rows) {
        const lines = linesOf(chosen, of, row, 'measurement-band');
        const [sem = NaN] = numbersIn(lines, /^Standard error of measurement: SD × √\(1 − 0\.84\) = ([\d.]+) raw/);
        expectWithin(sem, (of.summary.sd ?? NaN) * 0.4, 0.51e-4);
        const ends = [row.score - Z_95 * sem, row.score + Z_95 * sem].map((score) => rankAt(ranks, score));
        const [low, high] = numbersIn(
          lines,
          /^Ranks of the scores at either end of the 95 % band: ([\d.]+) to ([\d.]+)\.$/,
        );
        expectWithin(low, Math.min(...ends), 0.02);
        expectWithin(high, Math.max(...ends), 0.02);
      }
    }
  });

  it('name what prints the lowest and the highest rank', () => {
    const kinds = { midpoint: 'midpoint', 'at or below': 'at-or-below', below: 'below' } as const;
    for (const row of norms.rows) {
      const lines = linesOf(project, norms, row, 'print-range');
      const named = lines
        .slice(-3, -1)
        .map((line) => /^(?:Lowest|Highest): (.*?), (not smoothed|smoothed.*)\.$/.exec(line));
      const texts = [row.range?.low, row.range?.high];
      named.forEach((match, index) => {
        const kind = Object.entries(kinds).find(([words]) => words === match?.[1])?.[1];
        if (kind === undefined) throw new Error(lines.join(' | '));
        if (match?.[2] !== 'not smoothed') return;
        const plain = firstNorms({ ...project, curve: curveOf({ kind }) }).rows.find(
          ({ score }) => score === row.score,
        );
        expect(plain?.printed).toBe(texts[index]);
      });
    }
    expect(alternativeInWords({ definition: { kind: 'below' }, smoothing: 0 })).toBe('below, smoothed');
    expect(alternativeInWords({ definition: { kind: 'grouped', width: 5 }, smoothing: 2 })).toBe(
      'grouped by 5, smoothed with a neighbouring degree',
    );
  });

  it('say why there is nothing', () => {
    const none = { ...project, precision: { ...precision, reliability: null }, table: { ...bare.table, columns: [] } };
    const position = { ...none, curve: curveOf({ kind: 'plotting-position', offset: '0' }) };
    const of = firstNorms(position);
    const [row] = of.rows;
    if (row === undefined) throw new Error('no row');
    const why = (column: ColumnKey): string => linesOf(position, of, row, column).slice(0, -1).at(-1) ?? '';
    expect(why('interval')).toContain('Define the rank as midpoint, at or below, or below.');
    expect(why('standard-error')).toBe('This definition or method has no standard error in closed form.');
    expect(why('measurement-band')).toBe('The reliability of the test is not given.');
    for (const column of ['interval', 'standard-error', 'measurement-band'] as const) {
      expect(linesOf(position, of, row, column).at(-1)).toBe('Printed: \u2013.');
    }
  });
});
