import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import { buildNormSet } from '../../../shared-core/norms/norm-set.ts';
import { normSetForFile } from '../../../shared-core/norms/norm-set-file.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { workingsOf } from '../../../shared-core/norms/workings.ts';
import type { RankDefinition } from '../../../shared-core/percentile/percentile-rank.ts';
import { drawnProject } from './drawn-project.ts';
import { drawnSmoothing } from './drawn-smoothing.ts';
import { curveOf, firstNorms, logLinear, projectOf, scaleTo, weightedProject } from './small-projects.ts';
import { SMOOTHED_COUNTS, SMOOTHING_METHODS } from './smoothing-methods.ts';

describe('laws of smoothed rows', () => {
  const drawn = fc
    .record({
      counts: fc
        .array(fc.integer({ min: 0, max: 60 }), { minLength: 3, maxLength: 25 })
        .filter((counts) => counts.some((count) => count > 0)),
      direction: fc.constantFrom('high-is-good' as const, 'low-is-good' as const),
      definition: fc.constantFrom<RankDefinition>(
        { kind: 'midpoint' },
        { kind: 'at-or-below' },
        { kind: 'below' },
        { kind: 'plotting-position', offset: '3/8' },
        { kind: 'plotting-position', offset: '0.9' },
        { kind: 'grouped', width: 4 },
      ),
    })
    .chain(({ counts, direction, definition }) =>
      drawnSmoothing(scaleTo(counts.length - 1)).map((smoothing): NormProject => {
        const project = projectOf(counts, scaleTo(counts.length - 1, direction));
        const table = {
          ...project.table,
          columns: ['print-range' as const, 'interval' as const],
          decimals: 1 as const,
        };
        return { ...project, table, curve: curveOf(definition, smoothing) };
      }),
    );

  it('ranks never fall towards the good end, stay within 0 and 100, and never print 0 or 100', () => {
    fc.assert(
      fc.property(drawn, (project) => {
        const { rows, group, smoothing } = firstNorms(project);
        const fromPoor = group.table.scale.direction === 'high-is-good' ? rows : rows.toReversed();
        fromPoor.forEach((row, index) => {
          expect(row.percentileRank).toBeGreaterThanOrEqual(fromPoor[index - 1]?.percentileRank ?? 0);
          expect(row.percentileRank).toBeLessThanOrEqual(100);
          expect(row.printed).not.toMatch(/^(0\.0|100\.0)$/);
          for (const text of Object.values(row.texts)) expect(text).not.toMatch(/NaN|undefined|Infinity/);
          expect(row.smoothed === null).toBe(smoothing.state !== 'smoothed');
        });
      }),
      { numRuns: 300 },
    );
  });

  it('the printed rank lies within the range of defensible ranks', () => {
    const size = (text: string): number => (text.startsWith('<') ? 0 : text.startsWith('>') ? 100 : Number(text));
    fc.assert(
      fc.property(drawn, (project) => {
        for (const { printed, range } of firstNorms(project).rows) {
          if (range === null) throw new Error('no range');
          expect(size(printed)).toBeGreaterThanOrEqual(size(range.low));
          expect(size(printed)).toBeLessThanOrEqual(size(range.high));
        }
      }),
      { numRuns: 200 },
    );
  });

  it('everything can be told of every project: file, workings of every cell and queries', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        const built = buildNormSet(project);
        if (!built.ok) return;
        const { normSet } = built;
        const file = JSON.parse(JSON.stringify(normSetForFile(normSet, () => [])));
        expect(file.groups).toHaveLength(normSet.groups.length);
        const told = normSet.groups.flatMap((norms) =>
          norms.rows.flatMap(({ scoreText }) =>
            [...COLUMN_KEYS, 'rank' as const].flatMap((key) => workingsOf(project, norms, scoreText, key).lines),
          ),
        );
        const asked = normSet.queries.flatMap(({ lead, why, whatToDo }) => [lead, why, whatToDo]);
        expect([...told, ...asked].filter((text) => /NaN|undefined|Infinity|null/.test(text))).toEqual([]);
        for (const { rows } of file.groups) {
          for (const row of rows) {
            expect(row['percentile-rank'] >= 0 && row['standard-error'] >= 0).toBe(true);
            expect(row.interval === null || row.interval.low <= row.interval.high).toBe(true);
            expect(row.smoothed === null || row.smoothed.proportion >= 0).toBe(true);
          }
        }
      }),
      { numRuns: 60 },
    );
  });

  it('all people weighing the same changes nothing', () => {
    const bare = projectOf(SMOOTHED_COUNTS);
    const equally: NormProject = {
      ...bare,
      tally: bare.tally && {
        ...bare.tally,
        weightDecimals: 1,
        cells: [
          {
            values: [],
            counts: SMOOTHED_COUNTS,
            weights: SMOOTHED_COUNTS.map((count) => String(count * 7)),
            squares: SMOOTHED_COUNTS.map((count) => String(count * 49)),
            clusters: null,
          },
        ],
      },
    };
    for (const [, choice] of SMOOTHING_METHODS) {
      const printed = (project: NormProject) =>
        firstNorms({ ...project, curve: curveOf({ kind: 'midpoint' }, choice) }).rows.map((row) => [
          row.rank,
          row.texts['standard-error'],
          row.texts.interval,
        ]);
      expect(printed(equally)).toEqual(printed(bare));
    }
    const weighted = { ...weightedProject(), curve: curveOf({ kind: 'midpoint' }, logLinear(1)) };
    expect(firstNorms(weighted).rows.every((row) => row.smoothed !== null)).toBe(true);
  });
});
