import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  publishedTableText,
  readPublishedTable,
  type PublishedFacts,
} from '../../../shared-core/class/published-table.ts';
import { PUBLISHED_FACTS, publishedTable } from './published-facts.ts';

type Triple = readonly [string, string, number | null];

function triples(text: string, facts: Partial<PublishedFacts> = {}): readonly Triple[] {
  const [group] = publishedTable(text, facts).groups;
  return (group?.rows ?? []).map(({ scoreText, printed, rank }) => [scoreText, printed, rank]);
}

function problems(text: string, facts: Partial<PublishedFacts> = {}): readonly (readonly [number, string])[] {
  const read = readPublishedTable(text, { ...PUBLISHED_FACTS, ...facts });
  expect(read.table).toBeNull();
  return read.problems.map(({ line, problem }) => [line, problem]);
}

const THREE: readonly Triple[] = [
  ['25–27', '61', 61],
  ['28', '63', 63],
  ['29', '>99', null],
];

describe('a published table', () => {
  it.each([
    ['tabs', '25-27\t61\n28\t63\n29\t>99'],
    ['semicolons', '25–27;61\r\n28;63\r\n29; >99'],
    ['bars', '| 25 to 27 | 61 |\n|----|----|\n| 28 | 63 |\n| 29 | > 99 |'],
    ['commas', '25..27,61\n28,63\n29,>99'],
    ['quotation marks', '"25-27","61"\n"28","63"\n"29",">99"'],
    ['two spaces', '25 – 27  61\n28   63\n29  > 99'],
    ['single spaces', '25 - 27 61\n28 63\n29 > 99'],
    ['spaces of both kinds', ' 25 to 27 61\n28   63\n\n29 >99 \n'],
    ['a heading', 'Raw score;Percentile rank\n25—27;61\n28;63\n29;>99'],
    ['a heading of many words', 'Raw score Percentile rank\n25-27 61\n28 63\n29 >99'],
    ['the rank in front', 'Percentile;Raw score\n61;25-27\n63;28\n>99;29'],
    ['a heading of the rank alone', '%ile\tItems right\n61\t25-27\n63\t28\n>99\t29'],
    ['a heading with figures in it', 'Score (0-40)\tPR\n25-27\t61\n28\t63\n29\t>99'],
    ['per cent signs', '25-27 61%\n28 63%\n29 >99%'],
    ['another order', '29 >99\n25-27 61\n28 63'],
  ])('is read with %s', (_, text) => {
    expect(triples(text)).toEqual(THREE);
  });

  it('has decimals with a point or a comma, printed alike', () => {
    const expected = [
      ['0.5', '<0.5', null],
      ['1.0', '4.0', 4],
      ['1.5', '12.5', 12.5],
    ];
    expect(triples('0,5;<0,5\n1;4\n1,5;12,5')).toEqual(expected);
    expect(triples('0.5 <0.5\n1.0 4\n1.5 12.5')).toEqual(expected);
    expect(triples('0,5 <0,5\n1 4\n1,5 12,5')).toEqual(expected);
    expect(problems('0,5;3\n1.0;4\n1.5;5')).toEqual([[1, expect.stringContaining('with the decimal mark "."')]]);
  });

  it('has scores below 0, whatever their minus', () => {
    expect(triples('-3 - -2 4\n\u22121 9\n0 to 1 20')).toEqual([
      ['\u22123–\u22122', '4', 4],
      ['\u22121', '9', 9],
      ['0–1', '20', 20],
    ]);
  });

  it('keeps further columns as they are printed', () => {
    const table = publishedTable('Raw\tPR\tStanine\tT\n27\t63\t6\t53,5\n28\t70\t\t55,5');
    expect(table.columns.map(({ key, name }) => [key, name])).toEqual([
      ['column-1', 'Stanine'],
      ['column-2', 'T'],
    ]);
    expect(table.groups[0]?.rows.map(({ texts }) => texts)).toEqual([
      { 'column-1': '6', 'column-2': '53,5' },
      { 'column-1': '–', 'column-2': '55,5' },
    ]);
    expect(publishedTable('27 63 6\n28 70 7').columns.map(({ name }) => name)).toEqual(['Column 3']);
  });

  it('has a normal curve equivalent where the printed rank has one', () => {
    // NCE = 50 + 21.06 z; z(84) = 0.99446, z(50) = 0 (tables of the normal distribution).
    const [below, half, high, above] = publishedTable('1 <1\n2 50\n3 84\n4 >99').groups[0]?.rows ?? [];
    expect([below?.nce, half?.nce, above?.nce]).toEqual([null, 50, null]);
    expect(high?.nce).toBeCloseTo(50 + 21.06 * 0.99446, 3);
    const printed = publishedTable('Raw PR NCE\n1 <1 1\n2 50 50\n3 84 70,9').groups[0]?.rows;
    expect(printed?.map(({ nce }) => nce)).toEqual([1, 50, 70.9]);
  });

  it('has ranks that fall where low scores are good, which is asked', () => {
    expect(problems('10 90\n11 60\n12 30')).toEqual([[0, expect.stringContaining('If low scores are good here')]]);
    expect(triples('10 90\n11 60\n12 30', { direction: 'low-is-good' }).map(([, rank]) => rank)).toEqual([
      '90',
      '60',
      '30',
    ]);
    expect(problems('10 90\n11 60', { direction: 'high-is-good' })).toEqual([
      [0, expect.stringContaining('high scores are said')],
    ]);
    expect(problems('10 30\n11 60', { direction: 'low-is-good' })).toEqual([
      [0, expect.stringContaining('low scores are said')],
    ]);
    expect(publishedTable('10 50\n11 50', { direction: 'low-is-good' }).scale.direction).toBe('low-is-good');
  });

  it('says what a rank counts where that is known', () => {
    expect(publishedTable('1 5\n2 6')).toMatchObject({ definition: '', definitionKind: 'unknown' });
    expect(publishedTable('1 6\n2 5', { definition: 'at-or-below', direction: 'low-is-good' })).toMatchObject({
      definition: 'at the same score or above',
      definitionKind: 'at-or-below',
    });
  });

  it('knows its scale by its scores', () => {
    expect(publishedTable('10 5\n12 6\n14 7').scale).toEqual({ min: 10, max: 14, step: 2, direction: 'high-is-good' });
    expect(publishedTable('0-4.5 5\n5-9.5 6').scale.step).toBe(0.5);
    expect(publishedTable('0-9 5\n10-19 6').scale).toMatchObject({ min: 0, max: 19, step: 1 });
    expect(publishedTable('0-20 5\n25-40 6', { step: 5 }).scale.step).toBe(5);
    expect(publishedTable('0 5\n0.5 6\n1 7', { step: 0.25 * 2 }).scale.step).toBe(0.5);
  });
});

describe('what is wrong with a published table', () => {
  it.each<[string, string, number, string]>([
    ['an overlap', '1-3 5\n3-5 8', 2, 'Scores 3 to 5 overlap with 1 to 3 in line 1.'],
    ['a score twice', '1 5\n2 6\n2 7', 3, 'Score 2 stands in line 2 already.'],
    ['a range within another', '1-9 5\n4 6', 2, 'Score 4 overlaps with 1 to 9 in line 1.'],
    ['a gap', '1 5\n2 6\n5 9', 3, 'Scores 3 to 4 have no rank: line 2 ends at 2 and this one begins at 5.'],
    ['a gap of one', '1-2 5\n4-5 6', 2, 'Score 3 has no rank'],
    ['a gap in tens', '0-10 5\n20-30 6', 2, 'Scores 11 to 19 have no rank'],
    ['a rank that falls', '1 5\n2 9\n3 7\n4 12', 3, 'The rank falls from 9 in line 2 to 7 while the score rises.'],
    ['a rank above 100', '1 5\n2 101', 2, 'A percentile rank lies between 0 and 100, and "101" does not.'],
    ['a rank below 0', '1;-5\n2;6', 1, '"-5" is not a percentile rank.'],
    ['a rank as some print it', '1 1-\n2 5', 1, 'Write "<1" for a rank below 1.'],
    ['a rank as others print it', '1 5\n2 99+', 2, 'Write ">99" for a rank above 99.'],
    ['a sign that says too little', '1 <40\n2 60', 1, '"<40" leaves open where the score stands.'],
    ['a sign at an end', '1 5\n2 >100', 2, 'lies between 0 and 100'],
    ['a range that runs backwards', '3-1 5\n4 6', 1, 'runs backwards'],
    ['a range without an end', '1 5\n2+ 9', 2, '"2+" has no end.'],
    ['a range without a beginning', '<2;5\n3;9', 1, '"<2" has no end.'],
    ['a word for a score', '1;5\nx;6', 2, '"x" is not a raw score.'],
    ['no rank', '1;5\n2;', 2, 'There is no percentile rank in this line.'],
    ['no score', '1;5\n;6', 2, 'There is no raw score in this line.'],
    ['a mark of thousands', '999;5\n1,000;9', 2, '"1,000" may mean thousands or three decimals.'],
    ['a space of thousands', '999;5\n1 000;9', 2, '"1 000" is not a raw score.'],
    ['columns that come and go', '1 5 3\n2 6\n3 7 4', 2, 'This line has 2 entries and the first line 3.'],
    ['more columns than heads', 'Raw;PR\n1;5\n2;6;4', 3, 'This line has 3 entries and the heading 2.'],
  ])('is told with its line: %s', (_, text, line, words) => {
    expect(problems(text)).toContainEqual([line, expect.stringContaining(words)]);
    for (const [, problem] of problems(text)) expect(problem).toMatch(/^["A-Z].*\.$/);
  });

  it('is told of the whole where no line is to blame', () => {
    for (const empty of ['', '\n \n', 'Raw score;Percentile rank', '| --- |']) {
      expect(problems(empty)).toEqual([[0, expect.stringContaining('Type one line for each score')]]);
    }
    expect(problems('5 50')).toEqual([[0, expect.stringContaining('The highest score of the scale must lie above')]]);
    expect(problems('1 5\n2 6', { step: 0 })).toEqual([[0, 'The step of the scores must be above 0, as in 1 or 0.5.']]);
    expect(problems('1 5\n3 6', { step: 4 })).toEqual([[2, expect.stringContaining('does not lie on steps of 4')]]);
    expect(problems('0 1\n9999 2', { step: 1 })).toHaveLength(1);
    expect(problems('0-9999 1')).toEqual([[0, expect.stringContaining('at most 5001')]]);
  });

  it('is never a mistake of the program, whatever was pasted', () => {
    const cell = fc.oneof(
      fc.constantFrom('1', '2-3', '<1', '>99', '50', '1,5', '-', 'to', '"', ''),
      fc.string({ maxLength: 6 }),
    );
    const separator = fc.constantFrom('\t', ';', ',', ' ', '  ', '|');
    fc.assert(
      fc.property(fc.array(fc.array(cell, { maxLength: 4 }), { maxLength: 6 }), separator, (lines, between) => {
        const { table, problems: told } = readPublishedTable(
          lines.map((cells) => cells.join(between)).join('\n'),
          PUBLISHED_FACTS,
        );
        expect(table === null).toBe(told.length > 0);
      }),
    );
  });
});

/** Rows of a table without gaps: where each ends, how its rank is printed, and whether it is a single score. */
const drawnTable = fc
  .record({
    first: fc.integer({ min: -30, max: 60 }),
    step: fc.constantFrom(0.25, 0.5, 1),
    widths: fc.array(fc.integer({ min: 1, max: 4 }), { minLength: 2, maxLength: 30 }),
    ranks: fc.uniqueArray(fc.integer({ min: 1, max: 99 }), { minLength: 30, maxLength: 30 }),
    signs: fc.boolean(),
    low: fc.boolean(),
    further: fc.constantFrom('', 'Stanine', 'T score'),
  })
  .map(({ first, step, widths, ranks, signs, low, further }) => {
    const rising = ranks.slice(0, widths.length).toSorted((a, b) => (low ? b - a : a - b));
    let from = first;
    const rows = widths.map((width, index) => {
      const ends = [from * step, (from + width - 1) * step];
      from += width;
      const edge = index === (low ? widths.length - 1 : 0);
      return { ends, rank: signs && edge ? '<1' : String(rising[index] ?? 0) };
    });
    const lines = rows.map(({ ends: [a = 0, b = 0], rank }, index) =>
      [a === b ? String(a) : `${a} to ${b}`, rank, ...(further === '' ? [] : [String(index)])].join('\t'),
    );
    const heading = ['Raw', 'PR', ...(further === '' ? [] : [further])].join('\t');
    const direction = low ? ('low-is-good' as const) : ('high-is-good' as const);
    return { heading, lines, facts: { ...PUBLISHED_FACTS, direction, step } };
  });

describe('laws of published tables', () => {
  it('a table written out reads back as the same', () => {
    fc.assert(
      fc.property(drawnTable, ({ heading, lines, facts }) => {
        const table = publishedTable([heading, ...lines].join('\n'), facts);
        expect(publishedTable(publishedTableText(table), facts)).toEqual(table);
      }),
    );
  });

  it('lines in another order give the same table, and every attainable score has one row', () => {
    fc.assert(
      fc.property(
        drawnTable.chain((drawn) =>
          fc.tuple(fc.constant(drawn), fc.shuffledSubarray(drawn.lines, { minLength: drawn.lines.length })),
        ),
        ([{ heading, lines, facts }, shuffled]) => {
          const table = publishedTable([heading, ...lines].join('\n'), facts);
          expect(publishedTable([heading, ...shuffled].join('\n'), facts)).toEqual(table);
          const { min, max, step } = table.scale;
          for (let score = min; score <= max; score += step) {
            expect(table.groups[0]?.rows.filter(({ low, high }) => low <= score && score <= high)).toHaveLength(1);
          }
        },
      ),
    );
  });

  it('a line left out of the middle is a gap that is told', () => {
    fc.assert(
      fc.property(drawnTable, fc.nat(), ({ heading, lines, facts }, at) => {
        if (lines.length < 3) return;
        const index = 1 + (at % (lines.length - 2));
        const { table, problems: told } = readPublishedTable([heading, ...lines.toSpliced(index, 1)].join('\n'), facts);
        expect(table).toBeNull();
        expect(told.some(({ problem }) => problem.includes('no rank'))).toBe(true);
      }),
    );
  });
});
