import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ConversionRow } from '../../../shared-core/norms/conversion-table.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject, TableChoices } from '../../../shared-core/norms/norm-project.ts';
import { COLUMN_KEYS, type ColumnKey } from '../../../shared-core/norms/column-keys.ts';
import { curveOf, firstNorms, projectOf, scaleTo, TEN_COUNTS, weightedProject } from './small-projects.ts';

function rowsWith(project: NormProject, change: Partial<TableChoices>): readonly ConversionRow[] {
  return firstNorms({ ...project, table: { ...project.table, ...change } }).rows;
}

const texts = (rows: readonly ConversionRow[], key: ColumnKey): readonly string[] => rows.map((row) => row.texts[key]);
const printed = (rows: readonly ConversionRow[]): readonly string[] => rows.map((row) => row.printed);

describe('rows of a table', () => {
  const ten = projectOf(TEN_COUNTS);

  it('print ranks, counts and derived scores', () => {
    const rows = rowsWith(ten, {});
    expect(rows.map((row) => row.scoreText)).toEqual(['0', '1', '2', '3', '4']);
    expect(printed(rows)).toEqual(['5', '20', '45', '60', '80']);
    expect(texts(rows, 'count')).toEqual(['1', '2', '3', '0', '4']);
    expect(texts(rows, 'cumulative')).toEqual(['1', '3', '6', '6', '10']);
    expect(texts(rows, 'exact-rank')).toEqual(['5.00', '20.00', '45.00', '60.00', '80.00']);
    // Φ⁻¹ of 0.05, 0.2, 0.45, 0.6 and 0.8: −1.6449, −0.8416, −0.1257, 0.2533, 0.8416.
    expect(texts(rows, 'z')).toEqual(['\u22121.64', '\u22120.84', '\u22120.13', '0.25', '0.84']);
    expect(texts(rows, 't')).toEqual(['34', '42', '49', '53', '58']);
    expect(texts(rows, 'nce')).toEqual(['15', '32', '47', '55', '68']);
    expect(texts(rows, 'deviation')).toEqual(['75', '87', '98', '104', '113']);
    expect(texts(rows, 'stanine')).toEqual(['2', '3', '5', '6', '7']);
    expect(texts(rows, 'sten')).toEqual(['2', '4', '5', '6', '7']);
  });

  it('tell what each cell was made of', () => {
    const [, , , empty, top] = rowsWith({ ...ten, curve: curveOf({ kind: 'at-or-below' }) }, {});
    expect(empty?.provenance).toEqual({
      percentileRank: { from: 'counts', observed: false, below: 6, at: 0, all: 10 },
      printed: { from: 'observed', end: null },
      derived: 'rank',
    });
    expect(top?.provenance.printed.end).toBe('high');
    expect(top?.provenance.derived).toBe('held-at-limit');
    expect(top?.derived).toEqual({ z: null, t: null, nce: null, deviation: null, stanine: 9, sten: 10 });
  });

  it('print fractions of the scale with its decimals and a true minus sign', () => {
    const halves = projectOf([1, 2, 3, 0, 4], { min: -1, max: 1, step: 0.5, direction: 'high-is-good' });
    expect(rowsWith(halves, {}).map((row) => row.scoreText)).toEqual(['\u22121.0', '\u22120.5', '0.0', '0.5', '1.0']);
  });

  it('print weight sums to one decimal', () => {
    expect(texts(rowsWith(weightedProject(), {}), 'cumulative')).toEqual(['1.0', '2.0', '5.6', '5.6', '9.2']);
  });
});

describe('ends and halves', () => {
  const thousand = projectOf([1, 498, 500, 1]);

  it('print signs below the lowest and above the highest printed rank', () => {
    expect(printed(rowsWith(thousand, { ends: 'signs' }))).toEqual(['<1', '25', '75', '>99']);
    expect(printed(rowsWith(thousand, { ends: 'signs', decimals: 1 }))).toEqual(['<0.1', '25.0', '74.9', '>99.9']);
  });

  it('hold the ends where asked', () => {
    expect(printed(rowsWith(thousand, { ends: 'held' }))).toEqual(['1', '25', '75', '99']);
    expect(printed(rowsWith(thousand, { ends: 'held', decimals: 1 }))).toEqual(['0.1', '25.0', '74.9', '99.9']);
  });

  it('round an exact half up or to even', () => {
    const half = projectOf([1, 19]);
    expect(printed(rowsWith(half, { rounding: 'half-up' }))).toEqual(['3', '53']);
    expect(printed(rowsWith(half, { rounding: 'half-even' }))).toEqual(['2', '52']);
  });

  it('hold derived scores at z = −3 and 3, and the normal curve equivalent at 1 and 99', () => {
    const rows = rowsWith(thousand, { zEnds: 'limits' });
    expect(texts(rows, 'z')).toEqual(['\u22123.00', '\u22120.67', '0.67', '3.00']);
    expect(texts(rows, 't')).toEqual(['20', '43', '57', '80']);
    expect(texts(rows, 'nce')).toEqual(['1', '36', '64', '99']);
    expect(texts(rows, 'deviation')).toEqual(['55', '90', '110', '145']);
    expect(rows.map((row) => row.provenance.derived)).toEqual(['held-at-limit', 'rank', 'rank', 'held-at-limit']);
  });

  it('let half a person stand in at 0 and 100, holding nothing', () => {
    const below = { ...projectOf(TEN_COUNTS), curve: curveOf({ kind: 'below' }) };
    const rows = rowsWith(below, { zEnds: 'half-person' });
    // Half a person of ten is 5 per cent: Φ⁻¹(0.05) = −1.6449.
    expect(texts(rows, 't')[0]).toBe('34');
    expect(rows[0]?.printedZ).toBeCloseTo(-1.6448536269514722, 12);
    expect(rows[0]?.provenance.derived).toBe('half-person');
    const atOrBelow = { ...projectOf(TEN_COUNTS), curve: curveOf({ kind: 'at-or-below' }) };
    const best = rowsWith(atOrBelow, { zEnds: 'half-person' })[4];
    expect(best?.printedZ).toBeCloseTo(1.6448536269514722, 12);
    expect([best?.texts.t, best?.provenance.derived]).toEqual(['66', 'half-person']);
    expect(texts(rowsWith(thousand, { zEnds: 'half-person' }), 'nce')[3]).toBe('119');
    const limits = rowsWith(below, { zEnds: 'limits' });
    expect(texts(limits, 't')[0]).toBe('20');
  });
});

describe('linear z', () => {
  it('keeps the shape of the scores', () => {
    const rows = rowsWith(projectOf(TEN_COUNTS), { zSource: 'linear' });
    const sd = Math.sqrt(20.4 / 9);
    rows.forEach((row, score) => expect(row.derived.z).toBeCloseTo((score - 2.4) / sd, 12));
    expect(texts(rows, 't')).toEqual(['34', '41', '47', '54', '61']);
    expect(texts(rows, 'stanine')).toEqual(['2', '3', '4', '6', '7']);
    expect(texts(rows, 'sten')).toEqual(['2', '4', '5', '6', '8']);
    expect(rows.map((row) => row.provenance.derived)).toEqual(Array.from({ length: 5 }, () => 'linear'));
  });

  it('turns round where low scores are good', () => {
    const rows = rowsWith(projectOf(TEN_COUNTS, scaleTo(4, 'low-is-good')), { zSource: 'linear' });
    expect(texts(rows, 't')).toEqual(['66', '59', '53', '46', '39']);
  });

  it('has no value where all scores are equal', () => {
    const rows = rowsWith(projectOf([0, 5, 0]), { zSource: 'linear' });
    expect(texts(rows, 'z')).toEqual(['\u2013', '\u2013', '\u2013']);
    expect(rows.map((row) => row.provenance.derived)).toEqual(['none', 'none', 'none']);
    expect(rows.map((row) => row.printedZ)).toEqual([null, null, null]);
  });
});

describe('laws of every table', () => {
  const drawn = fc.record({
    counts: fc
      .array(fc.integer({ min: 0, max: 40 }), { minLength: 2, maxLength: 30 })
      .filter((counts) => counts.some((count) => count > 0)),
    definition: fc.constantFrom(
      { kind: 'midpoint' } as const,
      { kind: 'at-or-below' } as const,
      { kind: 'below' } as const,
      { kind: 'plotting-position', offset: '3/8' } as const,
      { kind: 'grouped', width: 3 } as const,
    ),
    good: fc.boolean(),
    table: fc.record({
      columns: fc.constant([...COLUMN_KEYS]),
      decimals: fc.constantFrom(0 as const, 1 as const),
      rounding: fc.constantFrom('half-up' as const, 'half-even' as const),
      ends: fc.constantFrom('signs' as const, 'held' as const),
      zSource: fc.constantFrom('normalised' as const, 'linear' as const),
      zEnds: fc.constantFrom('limits' as const, 'half-person' as const),
    }),
  });

  it('one row for each score, no printed 0 or 100, ranks that never fall towards the good end', () => {
    fc.assert(
      fc.property(drawn, ({ counts, definition, good, table }) => {
        const scale = scaleTo(counts.length - 1, good ? 'high-is-good' : 'low-is-good');
        const project = { ...newProject(''), ...projectOf(counts, scale), curve: curveOf(definition), table };
        const { rows } = firstNorms(project);
        expect(rows.map((row) => row.score)).toEqual(counts.map((_, score) => score));
        expect(printed(rows).filter((text) => /^(0|100|0\.0|100\.0)$/.test(text))).toEqual([]);
        const towardsGood = good ? rows : rows.toReversed();
        towardsGood.forEach((row, index) => {
          const before = towardsGood[index - 1];
          if (before !== undefined) expect(row.percentileRank).toBeGreaterThanOrEqual(before.percentileRank);
        });
        for (const row of rows) {
          for (const key of COLUMN_KEYS) expect(row.texts[key]).not.toMatch(/NaN|undefined|Infinity/);
        }
      }),
    );
  });
});
