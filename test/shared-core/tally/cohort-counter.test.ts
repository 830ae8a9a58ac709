import { describe, expect, it } from 'vitest';
import { MAX_ROWS_LISTED } from '../../../shared-core/norms/reading.ts';
import { UniqueIdentities } from '../../../shared-core/tally/cohort-counter-identities.ts';
import { countRows, readingWith, tryRows } from './readings.ts';

const SCORE = { score: 'score' } as const;

describe('the exclusion flow', () => {
  it('counts each row under the first rule that applies, and adds up', () => {
    const reading = readingWith(
      { id: 'id', grade: 'group', score: 'score', weight: 'weight' },
      { missing: ['99', 'NA'], scale: { min: 0, max: 20, step: 0.5, direction: 'high-is-good' } },
    );
    const { flow, tally } = countRows(
      reading,
      ['id', 'grade', 'score', 'weight'],
      [
        ['1', '4', '10', '1'],
        ['', ' ', '', '\t'],
        ['2', '4', '10'],
        ['1', '4', '11', '1'],
        ['3', '4', '  ', '1'],
        ['4', '4', '99.0', '1'],
        ['5', '4', 'NA', '1'],
        ['6', '4', 'ten', '1'],
        ['7', '4', '-0.5', '1'],
        ['8', '4', '20.5', '1'],
        ['9', '4', '7.25', '1'],
        ['10', ' ', '7', '1'],
        ['11', '4', '7', '0'],
        ['12', '4', '7', '-1'],
        ['13', '4', '7', ''],
        ['14', '4', '7.5', '0.25'],
        ['3', '4', '8', '1'],
      ],
    );
    expect(flow.leftOut).toEqual([
      { rule: 'blank-row', count: 1, rows: [3] },
      { rule: 'ragged-row', count: 1, rows: [4] },
      { rule: 'duplicate-id', count: 2, rows: [5, 18] },
      { rule: 'blank-score', count: 1, rows: [6] },
      { rule: 'missing-code', count: 2, rows: [7, 8] },
      { rule: 'not-a-number', count: 1, rows: [9] },
      { rule: 'below-scale', count: 1, rows: [10] },
      { rule: 'above-scale', count: 1, rows: [11] },
      { rule: 'off-grid', count: 1, rows: [12] },
      { rule: 'blank-group', count: 1, rows: [13] },
      { rule: 'bad-weight', count: 3, rows: [14, 15, 16] },
    ]);
    expect(flow.rowsRead).toBe(17);
    expect(flow.rowsKept).toBe(2);
    expect(tally.cells[0]?.counts[20]).toBe(1);
    expect(tally.cells[0]?.weights?.[15]).toBe('25');
    expect(tally.cells[0]?.squares?.[15]).toBe('625');
    expect(tally.weightDecimals).toBe(2);
  });

  it('lists the first row numbers of a rule and counts on beyond them', () => {
    const rows = Array.from({ length: MAX_ROWS_LISTED + 500 }, () => ['x']);
    const { flow } = countRows(readingWith(SCORE), ['score'], [...rows, ['3']]);
    expect(flow.leftOut[0]?.count).toBe(MAX_ROWS_LISTED + 500);
    expect(flow.leftOut[0]?.rows).toHaveLength(MAX_ROWS_LISTED);
    expect(flow.leftOut[0]?.rows.at(-1)).toBe(MAX_ROWS_LISTED + 1);
  });

  it('keeps ragged rows whose needed cells are there, when that is decided', () => {
    const decisions = {
      duplicateId: 'keep-first',
      raggedRow: 'keep-readable',
      blankGroup: 'leave-out',
      blankCluster: 'alone',
    } as const;
    const { flow } = countRows(
      readingWith({ score: 'score' }, { decisions }),
      ['a', 'score', 'b'],
      [['x', '5'], ['x', '5', 'y', 'z'], ['x']],
    );
    expect(flow.rowsKept).toBe(2);
    expect(flow.leftOut).toEqual([{ rule: 'ragged-row', count: 1, rows: [4] }]);
  });

  it('keeps blank groups as a group of their own, when that is decided', () => {
    const decisions = {
      duplicateId: 'keep-first',
      raggedRow: 'leave-out',
      blankGroup: 'keep',
      blankCluster: 'alone',
    } as const;
    const { tally } = countRows(
      readingWith({ g: 'group', score: 'score' }, { decisions }),
      ['g', 'score'],
      [
        ['A', '5'],
        [' ', '6'],
      ],
    );
    expect(tally.cells.map(({ values }) => values)).toEqual([[''], ['A']]);
  });

  it('tells "007" from "7", trims identifiers, and passes over blank ones', () => {
    const { flow } = countRows(
      readingWith({ id: 'id', score: 'score' }),
      ['id', 'score'],
      [
        ['007', '5'],
        ['7', '5'],
        [' 7 ', '5'],
        ['', '5'],
        ['', '5'],
      ],
    );
    expect(flow.leftOut).toEqual([{ rule: 'duplicate-id', count: 1, rows: [4] }]);
  });

  it('leaves out all rows of a repeated identifier, or none', () => {
    const reading = readingWith({ id: 'id', score: 'score' });
    const rows = [
      ['a', '5'],
      ['b', '5'],
      ['a', '6'],
    ];
    expect(countRows(reading, ['id', 'score'], rows, new UniqueIdentities(new Set(['a']))).flow.leftOut).toEqual([
      { rule: 'duplicate-id', count: 2, rows: [2, 4] },
    ]);
    expect(countRows(reading, ['id', 'score'], rows, null).flow.rowsKept).toBe(3);
  });
});

describe('groups', () => {
  it('keeps values as texts and orders numbers before words', () => {
    const rows = [
      ['10', 'B'],
      ['04', 'A'],
      ['x', 'A'],
      ['4', 'A'],
      ['10', 'A'],
    ].map(([grade = '', form = '']) => [grade, form, '5']);
    const { tally } = countRows(
      readingWith({ form: 'group', grade: 'group', score: 'score' }),
      ['grade', 'form', 'score'],
      rows,
    );
    expect(tally.groupColumns).toEqual(['grade', 'form']);
    expect(tally.cells.map(({ values }) => values.join('/'))).toEqual(['04/A', '4/A', '10/A', '10/B', 'x/A']);
  });

  it('refuses more than 2,000 groups and names the column', () => {
    const rows = Array.from({ length: 2001 }, (_, index) => ['A', `s${index}`, '5']);
    const problem = tryRows(
      readingWith({ form: 'group', school: 'group', score: 'score' }),
      ['form', 'school', 'score'],
      rows,
    );
    expect(problem).toMatch(/more than 2000 groups; column "school"/);
  });
});

describe('counts', () => {
  const reading = readingWith({ score: 'score', n: 'count' }, { layout: 'counts' });

  it('adds the people of each row and keeps rows of nobody', () => {
    const { tally, flow } = countRows(
      reading,
      ['score', 'n'],
      [
        ['3', '12'],
        ['4', '0'],
        ['3', '5'],
        ['5', '2.0'],
      ],
    );
    expect(flow).toEqual({ rowsRead: 4, rowsKept: 4, leftOut: [] });
    expect(tally.cells[0]?.counts.slice(3, 6)).toEqual([17, 0, 2]);
  });

  it('leaves out counts that are not whole', () => {
    const { flow } = countRows(
      reading,
      ['score', 'n'],
      [
        ['3', '1'],
        ['3', '1.5'],
        ['3', '-1'],
        ['3', ''],
        ['3', 'x'],
      ],
    );
    expect(flow.leftOut).toEqual([{ rule: 'bad-count', count: 4, rows: [3, 4, 5, 6] }]);
  });

  it('takes a weight as that of each person of the row', () => {
    const weighted = readingWith({ score: 'score', n: 'count', w: 'weight' }, { layout: 'counts' });
    const { tally } = countRows(weighted, ['score', 'n', 'w'], [['3', '4', '1.5']]);
    expect(tally.cells[0]?.weights?.[3]).toBe('60');
    expect(tally.cells[0]?.squares?.[3]).toBe('900');
    expect(tally.weightDecimals).toBe(1);
  });

  it('refuses counts that are all 0', () => {
    expect(tryRows(reading, ['score', 'n'], [['3', '0']])).toMatch(/nobody/);
  });
});

describe('a scale taken from the scores', () => {
  const infer = (...scores: string[]): unknown => {
    const counted = tryRows(
      readingWith(SCORE, { scale: null }),
      ['score'],
      scores.map((score) => [score]),
    );
    return typeof counted === 'string' ? counted : { ...counted.tally.scale, inferred: counted.scaleInferred };
  };
  const scale = (min: number, max: number, step: number): unknown => ({
    min,
    max,
    step,
    direction: 'high-is-good',
    inferred: true,
  });

  it('has the largest step that carries all scores', () => {
    expect(infer('3', '7', '12.0')).toEqual(scale(3, 12, 1));
    expect(infer('3', '7.5')).toEqual(scale(3, 7.5, 0.5));
    expect(infer('0.25', '7.5')).toEqual(scale(0.25, 7.5, 0.25));
    expect(infer('0.2', '1')).toEqual(scale(0.2, 1, 0.2));
    expect(infer('0.1', '0.35')).toEqual(scale(0.1, 0.35, 0.05));
    expect(infer('-2', '2')).toEqual(scale(-2, 2, 1));
  });

  it('puts the scores at their places', () => {
    const { tally } = countRows(readingWith(SCORE, { scale: null }), ['score'], [['5'], ['3'], ['5.0'], ['4.5']]);
    expect(tally.cells[0]?.counts).toEqual([1, 0, 0, 1, 2]);
  });

  it('takes rows left out for other reasons into no account', () => {
    const { tally } = countRows(
      readingWith({ g: 'group', score: 'score' }, { scale: null }),
      ['g', 'score'],
      [
        ['a', '3'],
        ['a', '4'],
        ['', '88.5'],
      ],
    );
    expect(tally.scale).toEqual({ min: 3, max: 4, step: 1, direction: 'high-is-good' });
  });

  it('is refused where the scores show none', () => {
    expect(infer('4', '4')).toMatch(/Declare the scale/);
    expect(infer('0.00001', '4')).toMatch(/more than 4 decimals/);
    expect(infer('0.0001', '4')).toMatch(/Use a larger step/);
    expect(infer(...Array.from({ length: 5002 }, (_, index) => `${index}`))).toMatch(/more than 5001 different scores/);
  });
});

describe('readings that do not fit', () => {
  const refusal = (roles: Parameters<typeof readingWith>[0], more?: Parameters<typeof readingWith>[1]): unknown =>
    tryRows(readingWith(roles, more), ['a', 'b'], [['1', '1']]);

  it('are refused with a sentence', () => {
    expect(refusal({})).toMatch(/No column is marked as the score/);
    expect(refusal({ z: 'score' })).toMatch(/no column "z"/);
    expect(refusal({ a: 'score', b: 'score' })).toMatch(/Both "a" and "b" are marked as score/);
    expect(refusal({ a: 'score' }, { layout: 'counts' })).toMatch(/no column is marked as the count/);
    expect(refusal({ a: 'score', b: 'count' })).toMatch(/Read the rows as counts/);
    expect(refusal({ a: 'score' }, { scale: { min: 3, max: 1, step: 1, direction: 'high-is-good' } })).toMatch(
      /highest/,
    );
  });

  it('name why no row can be kept', () => {
    const commas = tryRows(readingWith(SCORE), ['score'], [['1,5'], ['2,5'], ['']]);
    expect(commas).toMatch(/None of the 3 rows.*2 of them have a score that is not a number.*decimal mark/);
    expect(tryRows(readingWith(SCORE), ['score'], [['x']])).toMatch(
      /^The only row cannot be counted: it has a score that/,
    );
    expect(tryRows(readingWith(SCORE), ['score'], [])).toMatch(/no rows below the heading/);
  });

  it('reads a decimal comma where it is declared', () => {
    const reading = readingWith(
      { score: 'score', w: 'weight' },
      { decimalMark: ',', missing: ['9,0'], scale: { min: 0, max: 20, step: 0.5, direction: 'high-is-good' } },
    );
    const { tally, flow } = countRows(
      reading,
      ['score', 'w'],
      [
        ['1,5', '0,75'],
        ['9', '1'],
        ['1.5', '1'],
        ['2', '1.5'],
      ],
    );
    expect(tally.cells[0]?.weights?.[3]).toBe('75');
    expect(flow.leftOut.map(({ rule, rows }) => [rule, ...rows])).toEqual([
      ['missing-code', 3],
      ['not-a-number', 4],
      ['bad-weight', 5],
    ]);
  });
});
