import { describe, expect, it } from 'vitest';
import { COLUMN_KEYS, type ColumnKey } from '../../../shared-core/norms/column-keys.ts';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import type { NormProject, TableChoices } from '../../../shared-core/norms/norm-project.ts';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import { workingsOf } from '../../../shared-core/norms/workings.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { normalisedZ } from '../../../shared-core/scores/derived-score.ts';
import { ratio } from '../../../shared-core/percentile/exact-ratio.ts';
import { numberIn, workedOut } from './arithmetic.ts';
import { curveOf, firstNorms, projectOf, scaleTo, TEN_COUNTS, weightedProject } from './small-projects.ts';

const DEFINITIONS: readonly RankDefinition[] = [
  { kind: 'midpoint' },
  { kind: 'at-or-below' },
  { kind: 'below' },
  { kind: 'plotting-position', offset: '3/8' },
  { kind: 'plotting-position', offset: '0.5' },
  { kind: 'grouped', width: 2 },
];

const halves = projectOf([3, 0, 7, 11, 4, 1, 900], { min: -1, max: 2, step: 0.5, direction: 'high-is-good' });
const PROJECTS: readonly (readonly [string, NormProject])[] = [
  ['ten people', projectOf(TEN_COUNTS)],
  ['ten people, low is good', projectOf(TEN_COUNTS, scaleTo(4, 'low-is-good'))],
  ['halves below and above 0', halves],
  [
    'the same, low is good',
    projectOf([3, 0, 7, 11, 4, 1, 900], { min: -1, max: 2, step: 0.5, direction: 'low-is-good' }),
  ],
  ['weights', weightedProject()],
  ['weights, low is good', weightedProject('low-is-good')],
  ['thousands', projectOf([1, 12000, 30000, 1])],
  ['all equal', projectOf([0, 6, 0])],
];

function withChoices(project: NormProject, definition: RankDefinition, table: Partial<TableChoices>): NormProject {
  return { ...project, curve: curveOf(definition), table: { ...project.table, ...table } };
}

/** The equations among the lines: what stands left and right of the last sign of equality. */
function equations(lines: readonly string[]): readonly { readonly sum: string; readonly value: number }[] {
  return lines.flatMap((line) => {
    const match = /^(?:Together: |z = )?([\d\u202f.()×/+\u2212 ]+) = (\u2212?[\d.]+)(?:\. Printed: .*)?$/.exec(line);
    return match === null ? [] : [{ sum: match[1] ?? '', value: numberIn(match[2] ?? '') }];
  });
}

function workingsFor(
  project: NormProject,
  norms: GroupNorms,
  row: ConversionRow,
  column: ColumnKey | 'score' | 'rank',
) {
  const workings = workingsOf(project, norms, row.scoreText, column);
  expect(workings.title).toBe(`Raw score ${row.scoreText}, ${norms.group.title}`);
  expect(workings.lines.join(' ')).not.toMatch(/NaN|undefined|Infinity|-\d/);
  return workings;
}

describe.each(PROJECTS)('workings of %s', (_, bare) => {
  it.each(DEFINITIONS)('come to the rank by $kind', (definition) => {
    const wide = definition.kind === 'grouped' ? 2 * (bare.tally?.scale.step ?? 1) : 0;
    const project = withChoices(bare, wide > 0 ? { kind: 'grouped', width: wide } : definition, {});
    const norms = firstNorms(project);
    for (const row of norms.rows) {
      for (const column of ['rank', 'exact-rank'] as const) {
        const { lines, result } = workingsFor(project, norms, row, column);
        const [equation, ...others] = equations(lines);
        expect(others).toEqual([]);
        expect(Math.abs(workedOut(equation?.sum ?? '') - (equation?.value ?? NaN))).toBeLessThan(1.01e-4);
        expect(Math.abs((equation?.value ?? NaN) - row.percentileRank)).toBeLessThan(0.51e-4);
        expect(result).toBe(column === 'rank' ? row.printed : row.texts['exact-rank']);
        if (column === 'rank') expect(lines.at(-1)).toMatch(new RegExp(`: ${result}\\.$`));
      }
    }
  });

  it('count people and weights', () => {
    const norms = firstNorms(bare);
    for (const row of norms.rows) {
      const weighted = norms.group.table.weighted;
      const { lines } = workingsFor(bare, norms, row, 'count');
      const numbers = lines.map((line) => line.match(/[\d.\u202f]*\d/g)?.map(numberIn) ?? []);
      const { below, at, all } = row.provenance.percentileRank;
      const score = Math.abs(row.score);
      expect(numbers.at(-1)).toEqual(weighted ? [below, score, at, all] : [below, score, at, score, all]);
      const cumulative = workingsFor(bare, norms, row, 'cumulative');
      const [equation] = equations(cumulative.lines);
      expect(workedOut(equation?.sum ?? '')).toBeCloseTo(row.cumulative, 9);
      expect(equation?.value).toBeCloseTo(row.cumulative, 9);
      expect(cumulative.lines.at(-1)).toContain(`Printed: ${cumulative.result}.`);
      expect(workingsFor(bare, norms, row, 'score').result).toBe(row.scoreText);
    }
  });
});

const CHOICES: readonly (readonly [string, Partial<TableChoices>])[] = [
  ['normalised, held', { zSource: 'normalised', zEnds: 'limits' }],
  ['normalised, half a person', { zSource: 'normalised', zEnds: 'half-person' }],
  ['linear, held', { zSource: 'linear', zEnds: 'limits' }],
  ['linear, not held', { zSource: 'linear', zEnds: 'half-person' }],
];

describe.each(CHOICES)('workings of derived scores, %s', (_, table) => {
  it.each(PROJECTS)('come to what is printed: %s', (_name, bare) => {
    for (const definition of DEFINITIONS.slice(0, 4)) {
      const project = withChoices(bare, definition, table);
      const norms = firstNorms(project);
      for (const row of norms.rows) {
        for (const column of ['z', 't', 'nce', 'deviation', 'sten', 'stanine'] as const) {
          const { lines, result } = workingsFor(project, norms, row, column);
          expect(result).toBe(row.texts[column]);
          expect(lines.at(-1)).toBe(`Printed: ${result}.`);
          checkDerived(lines, result, column);
        }
      }
    }
  });
});

/** Follows the lines from z to the printed score and fails where they do not lead there. */
function checkDerived(lines: readonly string[], result: string, column: ColumnKey): void {
  for (const { sum, value } of equations(lines)) expect(Math.abs(workedOut(sum) - value)).toBeLessThan(0.02);
  if (result === '\u2013') return expect(lines[lines.length - 2]).toContain('there is no z');
  const zLine = lines.find((line) => /(deviate of|z = |the limit stands in)/.test(line));
  const z = numberIn(/(\u2212?[\d.]+?)\.?$/.exec(zLine ?? '')?.[1] ?? 'none');
  const banded = /^([\d.]+) \+ 2 × (\(?\u2212?[\d.]+\)?), rounded/.exec(lines.at(-2) ?? '');
  if (banded !== null) {
    expect(numberIn((banded[2] ?? '').replace(/[()]/g, ''))).toBe(z);
    const value = numberIn(banded[1] ?? '') + 2 * z;
    const cut = Math.min(column === 'sten' ? 10 : 9, Math.max(1, value));
    expect(Math.abs(Number(result) - cut)).toBeLessThan(0.5002);
    return;
  }
  if (zLine === undefined) return expect(lines.join(' ')).toMatch(/outermost sten|Stanines begin at ranks/);
  const value = column === 'z' ? z : (equations(lines).at(-1)?.value ?? NaN);
  const limits = /held between (\u2212?\d+) and (\d+)/.exec(lines.join(' '));
  const held =
    limits === null ? value : Math.min(numberIn(limits[2] ?? ''), Math.max(numberIn(limits[1] ?? ''), value));
  if (limits !== null) expect(held).not.toBe(value);
  expect(Math.abs(numberIn(result) - held)).toBeLessThan(column === 'z' ? 0.00506 : 0.506);
}

describe('particular workings', () => {
  const lines = (project: NormProject, score: string, column: ColumnKey | 'rank'): readonly string[] =>
    workingsOf(project, firstNorms(project), score, column).lines;

  it('read as a reader would do the sum', () => {
    expect(lines(projectOf(TEN_COUNTS), '2', 'rank')).toEqual([
      '3 pupils scored below 2, 3 scored 2, of 10.',
      'Rank: the share scoring below, plus half of those at the same score.',
      '100 × (3 + 3/2) / 10 = 45.0000',
      'Rounded to whole numbers, halves up: 45.',
    ]);
    const grouped = withChoices(projectOf(TEN_COUNTS), { kind: 'grouped', width: 2 }, {});
    expect(lines(grouped, '0', 'rank')[2]).toBe(
      '100 × (0 + 3 × (0 − (−0.5)) / 2) / 10 = 7.5000'.replaceAll('−', '\u2212'),
    );
  });

  it('name the stanine cuts only where stanines follow ranks', () => {
    expect(lines(projectOf(TEN_COUNTS), '2', 'stanine')[2]).toContain('Stanines begin at ranks');
    const linear = withChoices(projectOf(TEN_COUNTS), { kind: 'midpoint' }, { zSource: 'linear' });
    expect(lines(linear, '2', 'stanine').join(' ')).toContain('5 + 2 × ');
  });

  it('give the normal deviate of half a person', () => {
    const project = withChoices(projectOf(TEN_COUNTS), { kind: 'below' }, { zEnds: 'half-person' });
    const z = normalisedZ(ratio(5n, 1n)) ?? NaN;
    expect(lines(project, '0', 'z').join(' ')).toContain(`half a person of 10 from the end: \u2212${(-z).toFixed(4)}.`);
  });

  it('throw for a score without a row', () => {
    const project = projectOf(TEN_COUNTS);
    for (const column of COLUMN_KEYS) {
      expect(() => workingsOf(project, firstNorms(project), '5', column)).toThrow(RangeError);
    }
  });
});
