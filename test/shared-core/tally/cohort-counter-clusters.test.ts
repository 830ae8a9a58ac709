import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_CLUSTER_PARTS } from '../../../shared-core/tally/cohort-counter-clusters.ts';
import { tablesByGroup } from '../../../shared-core/tally/frequency-table.ts';
import { countRows, readingWith, tryRows } from './readings.ts';

const COLUMNS = ['grade', 'school', 'score', 'w'];
const ROLES = { grade: 'group', school: 'cluster', score: 'score' } as const;
const plain = readingWith(ROLES, { scale: { min: 0, max: 3, step: 1, direction: 'high-is-good' } });
const weighted = readingWith({ ...ROLES, w: 'weight' }, { scale: null });

describe('clusters in a tally', () => {
  const rows = [
    ['5', 'West', '2', '1'],
    ['4', 'West', '1', '1'],
    ['4', 'East', '3', '1'],
    ['4', 'West', '1', '1'],
    ['4', '', '0', '1'],
    ['4', '', '0', '1'],
    ['5', ' East ', '0', '1'],
  ];

  it('are numbered by their values, the same in every group, and nameless', () => {
    const { tally, flow } = countRows(plain, COLUMNS, rows);
    expect(flow).toEqual({ rowsRead: 7, rowsKept: 7, leftOut: [] });
    expect(tally.cells).toEqual([
      {
        values: ['4'],
        counts: [2, 2, 0, 1],
        weights: null,
        squares: null,
        clusters: {
          parts: [
            { cluster: 0, positions: [3], counts: [1], weights: null },
            { cluster: 1, positions: [1], counts: [2], weights: null },
          ],
          alone: [2, 0, 0, 0],
          aloneSquares: null,
        },
      },
      {
        values: ['5'],
        counts: [1, 0, 1, 0],
        weights: null,
        squares: null,
        clusters: {
          parts: [
            { cluster: 0, positions: [0], counts: [1], weights: null },
            { cluster: 1, positions: [2], counts: [1], weights: null },
          ],
          alone: [0, 0, 0, 0],
          aloneSquares: null,
        },
      },
    ]);
    expect(JSON.stringify(tally)).not.toMatch(/West|East/);
  });

  it('leave out whoever has none where that is decided', () => {
    const { decisions } = plain;
    const { tally, flow } = countRows(
      { ...plain, decisions: { ...decisions, blankCluster: 'leave-out' } },
      COLUMNS,
      rows,
    );
    expect(flow.leftOut).toEqual([{ rule: 'blank-cluster', count: 2, rows: [6, 7] }]);
    expect(tally.cells[0]?.counts).toEqual([0, 2, 0, 1]);
    expect(tally.cells[0]?.clusters?.alone).toEqual([0, 0, 0, 0]);
  });

  it('hold weights to the last digit', () => {
    const { tally } = countRows(weighted, COLUMNS, [
      ['4', 'West', '1', '0.25'],
      ['4', 'West', '1', '1.5'],
      ['4', '', '2', '1.125'],
      ['4', '', '2', '2'],
    ]);
    expect(tally.cells[0]?.clusters).toEqual({
      parts: [{ cluster: 0, positions: [0], counts: [2], weights: ['1750'] }],
      alone: [0, 2],
      aloneSquares: ['0', String(1125 ** 2 + 2000 ** 2)],
    });
  });

  it('take many people of one row, and none', () => {
    const reading = readingWith({ school: 'cluster', score: 'score', n: 'count' }, { layout: 'counts' });
    const { tally } = countRows(
      { ...reading, scale: { min: 0, max: 2, step: 1, direction: 'high-is-good' } },
      ['school', 'score', 'n'],
      [
        ['West', '0', '7'],
        ['', '2', '1000000000'],
        ['East', '1', '0'],
      ],
    );
    expect(tally.cells[0]?.clusters).toEqual({
      parts: [{ cluster: 0, positions: [0], counts: [7], weights: null }],
      alone: [0, 0, 1_000_000_000],
      aloneSquares: null,
    });
  });

  it('are refused in a sentence where there are too many', () => {
    const rowsOf = (schools: number): readonly (readonly string[])[] =>
      Array.from({ length: schools }, (_, school) => ['4', `s${school}`, String(school % 4), '1']);
    expect(typeof tryRows(plain, COLUMNS, rowsOf(MAX_CLUSTER_PARTS))).toBe('object');
    expect(tryRows(plain, COLUMNS, rowsOf(MAX_CLUSTER_PARTS + 1))).toBe(
      'Column "school" and the groups make more than 5000 clusters within groups, more than can be told apart. ' +
        'Choose a column of larger clusters, use fewer groups, or leave the column unused.',
    );
  });

  it('stand in one column that has no other work', () => {
    const two = readingWith({ school: 'cluster', area: 'cluster', score: 'score' });
    expect(tryRows(two, ['school', 'area', 'score'], [])).toBe(
      'Both "school" and "area" are marked as cluster. Keep one of them.',
    );
  });
});

const row = fc
  .tuple(
    fc.constantFrom('4', '5', '6'),
    fc.constantFrom('', 'a', 'b', '1', '01', '2', '10'),
    fc.integer({ min: 0, max: 9 }).map(String),
    fc.constantFrom('1', '0.5', '1.25', '0.001', '9007199254740993.5'),
  )
  .map((cells): readonly string[] => cells);
const rows = fc
  .array(row, { maxLength: 40 })
  .map((some): readonly (readonly string[])[] => [['4', 'a', '0', '1'], ['4', 'a', '9', '1'], ...some]);

describe('clusters of any rows', () => {
  it('do not depend on the order of the rows, to the byte', () => {
    fc.assert(
      fc.property(
        rows.chain((some) => fc.tuple(fc.constant(some), fc.shuffledSubarray([...some], { minLength: some.length }))),
        ([some, shuffled]) => {
          const text = (all: readonly (readonly string[])[]): string =>
            JSON.stringify(countRows(weighted, COLUMNS, all).tally);
          expect(text(shuffled)).toBe(text(some));
        },
      ),
    );
  });

  it('of merged groups are those of the file without groups', () => {
    const ungrouped = readingWith({ school: 'cluster', score: 'score', w: 'weight' }, { scale: null });
    fc.assert(
      fc.property(rows, (some) => {
        const [merged] = tablesByGroup(countRows(weighted, COLUMNS, some).tally, []);
        const [whole] = tablesByGroup(countRows(ungrouped, COLUMNS, some).tally, []);
        expect(merged?.table).toEqual(whole?.table);
      }),
    );
  });
});
