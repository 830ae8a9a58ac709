import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstOnGoodSide } from '../../../shared-core/norms/cuts.ts';
import { cutTables, type CutRow } from '../../../shared-core/norms/cut-table.ts';
import type { Cut, NormProject } from '../../../shared-core/norms/norm-project.ts';
import { ratioToNumber } from '../../../shared-core/percentile/exact-ratio.ts';
import { builtSet, projectOf, scaleTo, settledProject, TEN_COUNTS, weightedProject } from './small-projects.ts';

const cutAt = (score: number, values: Cut['values'] = null): Cut => ({ name: 'Support', score, values });

function rowsOf(project: NormProject, ...cuts: readonly Cut[]): readonly (readonly CutRow[])[] {
  const set = builtSet({ ...project, cuts });
  return cutTables(set.project, set.groups).map(({ rows }) => rows);
}

describe('the first score on the good side of a cut', () => {
  it('is the cut itself where it can be obtained, otherwise the next towards the good end', () => {
    expect(firstOnGoodSide(scaleTo(4), 2)).toBe(2);
    expect(firstOnGoodSide(scaleTo(4), 2.5)).toBe(3);
    expect(firstOnGoodSide(scaleTo(4, 'low-is-good'), 2.5)).toBe(2);
    expect(firstOnGoodSide({ min: -1, max: 1, step: 0.1, direction: 'high-is-good' }, 0.3)).toBe(13);
  });

  it('is none outside the scale', () => {
    expect([-1, 5].map((score) => firstOnGoodSide(scaleTo(4), score))).toEqual([null, null]);
  });
});

describe('cutTables', () => {
  it('counts everybody at the cut or better, by hand', () => {
    // 1, 2, 3, 0 and 4 people at 0 to 4.
    const texts = [0, 1, 2, 3, 4].map((score) => rowsOf(projectOf(TEN_COUNTS), cutAt(score))[0]?.[0]?.shareText);
    expect(texts).toEqual(['100.0', '90.0', '70.0', '40.0', '40.0']);
  });

  it('counts from the other end where low is good', () => {
    const project = projectOf(TEN_COUNTS, scaleTo(4, 'low-is-good'));
    const texts = [0, 1, 2, 3, 4].map((score) => rowsOf(project, cutAt(score))[0]?.[0]?.shareText);
    expect(texts).toEqual(['10.0', '30.0', '60.0', '60.0', '100.0']);
  });

  it('weighs people where they are weighted, and rounds a half up', () => {
    // Weights 1.0, 1.0, 3.6, 0 and 3.6 of 9.2.
    const [[row] = []] = rowsOf(weightedProject(), cutAt(2));
    expect(row?.share).toEqual({ numerator: 7200n, denominator: 92n });
    expect(row?.shareText).toBe('78.3');
    expect(row?.n).toBe('10');
    // 3 of 16 are 18.75 per cent.
    expect(rowsOf(projectOf([13, 3]), cutAt(1))[0]?.[0]?.shareText).toBe('18.8');
  });

  it('prints the rank and the interval of the row at the cut', () => {
    const set = builtSet({ ...settledProject(), cuts: [cutAt(7)] });
    const [table] = cutTables(set.project, set.groups);
    expect(table?.rows.map(({ rank, interval }) => [rank, interval])).toEqual(
      set.groups.map(({ rows }) => [rows[7]?.printed, rows[7]?.texts.interval]),
    );
    expect(table?.scoreText).toBe('7');
  });

  it('has no rank at a score that nobody can have, and nothing outside the scale', () => {
    const [[between] = [], [outside] = []] = rowsOf(projectOf(TEN_COUNTS), cutAt(1.5), cutAt(9));
    expect(between).toMatchObject({ rank: '–', interval: '–', shareText: '70.0', row: null });
    expect(outside).toMatchObject({ rank: '–', interval: '–', shareText: '–', share: null });
  });

  it('holds for the one group that it names', () => {
    const tables = rowsOf(settledProject(), cutAt(7), cutAt(7, ['10']), cutAt(7, ['11']));
    expect(tables.map((rows) => rows.map(({ title }) => title))).toEqual([['Grade 4', 'Grade 10'], ['Grade 10'], []]);
  });

  it('never falls towards the poor end, and is 100 per cent at it', () => {
    fc.assert(
      fc.property(
        fc.array(fc.nat(20), { minLength: 2, maxLength: 12 }).filter((counts) => counts.some((count) => count > 0)),
        fc.constantFrom('high-is-good', 'low-is-good'),
        (counts, direction) => {
          const project = projectOf(counts, scaleTo(counts.length - 1, direction));
          const shares = rowsOf(project, ...counts.map((_, score) => cutAt(score))).map(([row]) =>
            row?.share ? ratioToNumber(row.share) : NaN,
          );
          const fromPoor = direction === 'high-is-good' ? shares : shares.toReversed();
          expect(fromPoor[0]).toBe(100);
          expect(fromPoor.every((share, index) => index === 0 || share <= (fromPoor[index - 1] ?? 0))).toBe(true);
        },
      ),
      { numRuns: 30 },
    );
  });
});
