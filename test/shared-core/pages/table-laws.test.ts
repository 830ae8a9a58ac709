import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BLOCK_KINDS, type BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import { cutTables } from '../../../shared-core/norms/cut-table.ts';
import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Booklet } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { cellsOf, columnFaults, columnsOf, frameFaults } from './placed-laws.ts';
import { sampleNormSet, type SampleCohort } from './sample-norm-set.ts';
import { tries } from '../../thoroughness.ts';

const blocksOf = (...kinds: readonly BlockKind[]): NormProject['sheet']['blocks'] =>
  BLOCK_KINDS.map((kind) => ({ kind, printed: kinds.includes(kind), heading: '', text: '' }));

/** Each raw score of each group once and in order, with its own texts, and no range across a cut. */
function checkConversion({ project, groups }: NormSet, booklet: Booklet): void {
  const { columns } = project.table;
  groups.forEach(({ rows, group }, index) => {
    const placed = columnsOf(booklet, 'conversion', index).flatMap((column) => column.rows);
    expect(placed.flatMap(({ scores }) => scores)).toEqual(rows.map(({ score }) => score));
    const rowAt = new Map(rows.map((row) => [row.score, row]));
    const textAt = (score = NaN): string => rowAt.get(score)?.scoreText ?? '';
    const read = placed.flatMap(({ scores, cells }) => {
      const [range, ...others] = cells.map(({ text }) => text);
      return scores.map(() => [range, cells[1]?.marked, ...others]);
    });
    const expected = placed.flatMap(({ scores }) => {
      const ends = `${textAt(scores[0])}–${textAt(scores.at(-1))}`;
      return scores.map((score) => {
        const row = rowAt.get(score);
        const range = scores.length === 1 ? textAt(score) : ends;
        return [range, row?.adjusted !== null, row?.printed, ...columns.map((key) => row?.texts[key])];
      });
    });
    expect(read).toEqual(expected);
    const high = group.table.scale.direction === 'high-is-good';
    const own = project.cuts.filter(({ values }) => values === null || values[0] === group.values[0]);
    const across = placed.filter(({ scores }) =>
      own.some((cut) => new Set(scores.map((score) => (high ? score >= cut.score : score <= cut.score))).size > 1),
    );
    expect(across).toEqual([]);
    if (!project.sheet.rangeRows) expect(placed).toHaveLength(rows.length);
  });
}

/** Each group and raw score once, each group and percentile once, and each cut in each of its groups. */
function checkBlocks({ project, groups }: NormSet, booklet: Booklet): void {
  const titles = groups.map(({ group }, index) => ({ column: index + 1, title: group.title.replaceAll(' ', '') }));
  const shortened = booklet.remarks.some((remark) => remark.startsWith('Titles of groups are too long'));
  for (const table of ['groups-across', 'inverse-across'] as const) {
    const columns = columnsOf(booklet, table);
    for (const head of columns.flatMap(({ heads }) => heads)) {
      if (head.column === 0) continue;
      const title = titles.find(({ column }) => column === head.column)?.title ?? '';
      const printed = head.lines.join('').replaceAll(' ', '');
      if (shortened && printed.endsWith('…')) expect(title.startsWith(printed.slice(0, -1))).toBe(true);
      else expect(printed).toBe(title);
      expect(head.note).toMatch(/^n [\d\u202f]+$/);
    }
  }
  const across = groups.flatMap(({ rows }, index) =>
    rows.map((row) => [`${row.score} ${index + 1}`, `${row.printed}${row.adjusted === null ? '' : '†'}`] as const),
  );
  const scores = (groups[0]?.rows ?? []).map((row) => [`${row.score} 0`, row.scoreText] as const);
  expect(sorted(cellsOf(columnsOf(booklet, 'groups-across')))).toEqual(sorted(new Map([...scores, ...across])));
  const inverse = groups.flatMap((norms, index) =>
    norms.inverse.flatMap((row) => [
      [`${row.percentile} ${index + 1}`, row.scoreText] as const,
      [`${row.percentile} 0`, String(row.percentile)] as const,
    ]),
  );
  expect(sorted(cellsOf(columnsOf(booklet, 'inverse-across')))).toEqual(sorted(new Map(inverse)));
  cutTables(project, groups)
    .filter(({ rows }) => rows.length > 0)
    .forEach(({ rows }, cut) => {
      const cells = cellsOf(columnsOf(booklet, `cuts ${cut}`));
      for (const row of rows) {
        const printed = [0, 1, 2, 3, 4].map((column) => cells.get(`${row.group} ${column}`));
        const mark = row.row === null || row.row.adjusted === null ? '' : '†';
        expect(printed[0]?.replaceAll(' ', '')).toBe(row.title.replaceAll(' ', ''));
        expect(printed.slice(1, 3)).toEqual([row.n, `${row.rank}${mark}`]);
        expect(printed.slice(3).filter((text) => text !== undefined)).toEqual(
          [row.interval, row.shareText].filter((text) => text !== null),
        );
      }
      expect(cells.size).toBe(rows.length * (rows.some(({ interval }) => interval !== null) ? 5 : 4));
    });
}

const sorted = (cells: ReadonlyMap<string, string>): readonly (readonly [string, string])[] =>
  [...cells].sort(([left], [right]) => (left < right ? -1 : 1));

type Drawn<A> = A extends fc.Arbitrary<infer Value> ? Value : never;

const drawnSheet = fc.record({
  paper: fc.constantFrom('a4', 'letter', 'a5'),
  orientation: fc.constantFrom('portrait', 'landscape'),
  tableColumns: fc.constantFrom(1, 2, 3, 4),
  marginMm: fc.constantFrom(null, 8, 20, 45),
  gutterMm: fc.constantFrom(0, 10, 30),
  rowType: fc.constantFrom(6, 8.7, 11.3, 14),
  rowHeight: fc.constantFrom(8, 12.4, 17, 36),
  fives: fc.boolean(),
  rangeRows: fc.boolean(),
  ogive: fc.boolean(),
  inverse: fc.boolean(),
});

const drawnCohort = fc.record({
  length: fc.oneof(fc.integer({ min: 2, max: 70 }), fc.constantFrom(2, 151)),
  min: fc.integer({ min: -30, max: 30 }),
  step: fc.constantFrom(1, 0.5, 10),
  direction: fc.constantFrom('high-is-good', 'low-is-good'),
  weighted: fc.boolean(),
  groups: fc.constantFrom(
    ['4'],
    ['4', '5', '6'],
    ['4', '5', '6, Form A, of those schools in the upper Ostrey Vale that begin after noon', '7', '8', '9'],
    Array.from({ length: 14 }, (_, index) => String(index + 1)),
  ),
});

const drawnTable = fc.record({
  columns: fc.subarray([...COLUMN_KEYS], { maxLength: 5 }),
  decimals: fc.constantFrom(0, 1),
  ends: fc.constantFrom('signs', 'held'),
});

/** Places on the scale and beyond it, as shares of its length. */
const drawnCuts = fc.array(
  fc.record({
    name: fc.constantFrom('', 'Support', 'A name of a cut that is as long as nobody would give one. '.repeat(3)),
    place: fc.constantFrom(-0.2, 0, 0.31, 0.5, 0.77, 1, 1.2),
    values: fc.constantFrom(null, ['4'], ['nobody']),
  }),
  { maxLength: 3 },
);

/** The last ranks of the first and the last group changed by hand. */
function withAdjusted(normSet: NormSet): NormSet {
  const change = (norms: GroupNorms): GroupNorms => ({
    ...norms,
    rows: norms.rows.map((row, position) =>
      position < norms.rows.length - 2
        ? row
        : { ...row, printed: '42', adjusted: { from: row.printed, reason: 'order', by: 'A. B.' } },
    ),
  });
  const last = normSet.groups.length - 1;
  return {
    ...normSet,
    groups: normSet.groups.map((norms, group) => (group === 0 || group === last ? change(norms) : norms)),
  };
}

/** One group in a part of a page that is too narrow for it: it must not be set in columns of rows side by side. */
const NARROW: readonly [Drawn<typeof drawnSheet>, Drawn<typeof drawnCohort>, Drawn<typeof drawnTable>] = [
  {
    paper: 'a5',
    orientation: 'portrait',
    tableColumns: 4,
    marginMm: 45,
    gutterMm: 0,
    rowType: 8.7,
    rowHeight: 17,
    fives: false,
    rangeRows: false,
    ogive: false,
    inverse: false,
  },
  { length: 2, min: 0, step: 1, direction: 'high-is-good', weighted: false, groups: ['4'] },
  { columns: [], decimals: 0, ends: 'signs' },
];

describe('tables on the page', () => {
  it('hold every score of every group once, within the frame, whatever the setting', () => {
    fc.assert(
      fc.property(
        drawnSheet,
        drawnCohort,
        drawnTable,
        drawnCuts,
        fc.boolean(),
        (sheet, { length, min, step, ...more }, table, cuts, adjusted) => {
          const max = min + (length - 1) * step;
          const cohort: SampleCohort = { ...more, scale: { min, max, step } };
          const computed = sampleNormSet(cohort, (project) => ({
            ...project,
            cuts: cuts.map(({ name, place, values }) => ({
              name,
              values,
              score: Math.round((min + place * (max - min)) * 2) / 2,
            })),
            table: { ...project.table, ...table },
            sheet: {
              ...project.sheet,
              ...sheet,
              blocks: blocksOf('tables', 'groups-across', 'inverse', 'cut-scores'),
            },
          }));
          const normSet = adjusted ? withAdjusted(computed) : computed;
          const booklet = composeBooklet(normSet);
          expect([...frameFaults(booklet), ...columnFaults(booklet)]).toEqual([]);
          checkConversion(normSet, booklet);
          checkBlocks(normSet, booklet);
        },
      ),
      { numRuns: tries(18, 400), seed: 20260615, examples: [[...NARROW, [], false]] },
    );
  }, 120_000);
});
