import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { definitionKey } from '../../../shared-core/norms/definitions.ts';
import { readForeignRanks, type ForeignColumn } from '../../../shared-core/norms/why-differ-column.ts';
import type { AppliedConvention } from '../../../shared-core/norms/why-differ-conventions.ts';
import { roundedTo, textOfPrint, withEnds } from '../../../shared-core/norms/why-differ-rules.ts';
import { findingInWords } from '../../../shared-core/norms/why-differ-words.ts';
import { whyDiffer, type WhyDiffer } from '../../../shared-core/norms/why-differ.ts';
import { ratio } from '../../../shared-core/percentile/exact-ratio.ts';
import { printRank } from '../../../shared-core/scores/printed-number.ts';
import { tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { countedTables, lowIsGood, weightedTables } from '../percentile/some-tables.ts';
import { DEFINITIONS, madeColumn, type Made } from './why-differ-columns-made.ts';

const MADE: readonly Made[] = Object.keys(DEFINITIONS).flatMap((definition) =>
  (['half-up', 'half-even', 'down'] as const).flatMap((rounding) =>
    (['signs', 'held', 'signs-rounded', 'open'] as const).flatMap((ends) =>
      ([0, 1] as const).map((decimals) => ({ definition, rounding, ends, decimals })),
    ),
  ),
);

function columnOf(table: FrequencyTable, text: string): ForeignColumn {
  const { column, problems } = readForeignRanks(text, table.scale);
  if (column === null) throw new Error(problems.map(({ problem }) => problem).join(' '));
  return column;
}

function keyOf({ convention }: AppliedConvention): string {
  if (convention.kind === 'definition') return definitionKey(convention.definition);
  return `percent-rank:${convention.ends}${convention.cutToThreeDigits ? ':cut' : ''}`;
}

/** Everything that the finding leaves open: "definition rounding ends", the ones from the other end marked. */
function fitsOf(found: WhyDiffer): readonly string[] {
  if (found.kind === 'nearest') return [];
  return found.explanations.flatMap(({ applied, ways }) =>
    ways.map(({ rounding, ends }) => {
      const limits = ends.kind === 'open' || ends.limits === 'last-place' ? '' : ' whole';
      return `${applied.reversed ? 'reversed ' : ''}${keyOf(applied)} ${rounding} ${ends.kind}${limits}`;
    }),
  );
}

const nameOf = ({ definition, rounding, ends, decimals }: Made): string =>
  `${definition} ${rounding} ${ends}${decimals === 0 && ends !== 'open' ? ' whole' : ''}`;

/** 611 people on 0 to 30: halves occur, no number of people divides another, and both ends lie below 1 and above 99. */
const telling = tableFromCounts(
  { min: 0, max: 30, step: 1, direction: 'high-is-good' },
  [1, 3, 4, 5, 9, 12, 15, 20, 24, 29, 31, 36, 39, 41, 42, 40, 42, 38, 34, 31, 29, 24, 20, 16, 13, 9, 8, 5, 4, 3, 1],
);

describe('columns that others made', () => {
  it.each(MADE)('$definition, $rounding, $ends, $decimals decimals is among the explanations', (made) => {
    fc.assert(
      fc.property(countedTables(), fc.boolean(), (some, reversed) => {
        const text = madeColumn(some, made, reversed);
        fc.pre(text !== '');
        // A whole column of 0.0 to 1.0 cannot be told from proportions.
        const column = columnOf(some, text);
        fc.pre(!column.proportions && column.decimals === made.decimals);
        const found = whyDiffer(some, column);
        expect(fitsOf(found), text).toContain(`${reversed ? 'reversed ' : ''}${nameOf(made)}`);
      }),
      { numRuns: 12 },
    );
  });

  /** The columns of this test that print the very same texts as one of them: what no method could tell apart. */
  function sameAs(table: FrequencyTable, made: Made): readonly string[] {
    const text = madeColumn(table, made);
    return MADE.filter((other) => other.decimals === made.decimals && madeColumn(table, other) === text).map(nameOf);
  }

  it('are told apart wherever they differ, and only there', () => {
    const everyScore = countedTables().map((some) =>
      tableFromCounts(
        some.scale,
        some.counts.map((count) => count + 1),
      ),
    );
    fc.assert(
      fc.property(everyScore, fc.constantFrom(...MADE), (some, made) => {
        const text = madeColumn(some, made);
        const column = columnOf(some, text);
        fc.pre(!column.proportions && column.decimals === made.decimals);
        const known = new Set(MADE.filter(({ decimals }) => decimals === made.decimals).map(nameOf));
        const fits = fitsOf(whyDiffer(some, column)).filter((fit) => known.has(fit));
        expect(fits.toSorted(), text).toEqual(sameAs(some, made).toSorted());
      }),
      { numRuns: 150 },
    );
  });

  it('have one definition each in a small group, where they print a decimal', () => {
    const small = tableFromCounts(
      { min: 0, max: 17, step: 1, direction: 'high-is-good' },
      [1, 1, 2, 2, 3, 3, 4, 5, 5, 6, 6, 6, 5, 4, 3, 2, 2, 1],
    );
    const clear = MADE.filter(({ decimals, definition }) => decimals === 1 && !definition.startsWith('percent-rank'));
    for (const made of clear) {
      const fits = fitsOf(whyDiffer(small, columnOf(small, madeColumn(small, made))));
      expect(new Set(fits.map((fit) => fit.split(' ')[0])), nameOf(made)).toEqual(new Set([made.definition]));
    }
  });

  it('name the ends when ranks reach them', () => {
    for (const ends of ['signs', 'held', 'open'] as const) {
      const made: Made = { definition: 'midpoint', rounding: 'half-up', ends, decimals: 0 };
      const fits = fitsOf(whyDiffer(telling, columnOf(telling, madeColumn(telling, made))));
      expect(fits.every((fit) => fit.includes(` ${ends}`))).toBe(true);
    }
  });

  it('name the rounding when halves occur', () => {
    const halves = tableFromCounts({ min: 0, max: 4, step: 1, direction: 'high-is-good' }, [25, 50, 50, 45, 30]);
    for (const rounding of ['half-up', 'half-even', 'down'] as const) {
      const made: Made = { definition: 'below', rounding, ends: 'open', decimals: 0 };
      const fits = fitsOf(whyDiffer(halves, columnOf(halves, madeColumn(halves, made))));
      expect(fits).toContain(`below ${rounding} open`);
      for (const other of ['half-up', 'half-even', 'down']) {
        expect(fits.includes(`below ${other} open`)).toBe(other === rounding);
      }
    }
  });

  it('may count from the other end', () => {
    const made: Made = { definition: 'at-or-below', rounding: 'half-up', ends: 'signs', decimals: 0 };
    for (const table of [telling, lowIsGood(telling)]) {
      const text = madeColumn(table, made, table === telling);
      const found = whyDiffer(table, columnOf(table, text));
      if (found.kind !== 'reproduced') throw new Error('not reproduced');
      expect(found.explanations[0]?.applied.reversed).toBe(true);
      expect(fitsOf(found)[0]).toBe('reversed at-or-below half-up signs whole');
    }
  });

  it('may leave the weights out', () => {
    const made: Made = { definition: 'midpoint', rounding: 'half-up', ends: 'signs', decimals: 1 };
    fc.assert(
      fc.property(weightedTables(), (some) => {
        const text = madeColumn(some, made);
        const column = columnOf(some, text);
        fc.pre(!column.proportions);
        const found = whyDiffer(some, column);
        if (found.kind !== 'reproduced') throw new Error('not reproduced');
        const people = found.explanations.filter(({ applied }) => keyOf(applied) === 'midpoint');
        expect(people.length).toBeGreaterThan(0);
      }),
      { numRuns: 40 },
    );
  });
});

describe('the percent rank of spreadsheets', () => {
  /** The documentation's own example: of 13, 12, 11, 8, 4, 3, 2, 1, 1, 1 the 2 has three below it and six above. */
  const table = tableFromCounts(
    { min: 1, max: 13, step: 1, direction: 'high-is-good' },
    [3, 1, 1, 1, 0, 0, 0, 1, 0, 0, 1, 1, 1],
  );

  it('is found from proportions cut to three digits, between scores too', () => {
    const inclusive = '1 0\n2 0.333\n4 0.555\n5 0.583\n8 0.666\n13 1';
    const found = whyDiffer(table, columnOf(table, inclusive));
    if (found.kind !== 'reproduced') throw new Error(JSON.stringify(found.disagreeing));
    expect(found.explanations.map(({ applied }) => keyOf(applied))).toContain('percent-rank:inclusive:cut');
    const exclusive = '1 0.09\n2 0.363\n4 0.545\n8 0.636\n13 0.909';
    const other = whyDiffer(table, columnOf(table, exclusive));
    if (other.kind !== 'reproduced') throw new Error(JSON.stringify(other.disagreeing));
    expect(other.explanations.map(({ applied }) => keyOf(applied))).toContain('percent-rank:exclusive:cut');
  });

  it('has nothing beyond the outermost scores', () => {
    const gaps = tableFromCounts({ min: 0, max: 4, step: 1, direction: 'high-is-good' }, [0, 7, 0, 8, 0]);
    const found = whyDiffer(gaps, columnOf(gaps, '0 3\n1 0\n2 25\n3 50\n4 88'));
    if (found.kind !== 'nearest') throw new Error('reproduced');
    expect(found.explanation.applied.convention).toEqual({
      kind: 'percent-rank',
      ends: 'inclusive',
      cutToThreeDigits: true,
    });
    expect(found.disagreeing).toEqual([
      { score: 0, theirs: '3', expected: null },
      { score: 4, theirs: '88', expected: null },
    ]);
  });
});

describe('a column that nothing reproduces', () => {
  it('gets the nearest explanation with the rows that disagree', () => {
    const made: Made = { definition: 'midpoint', rounding: 'half-up', ends: 'signs', decimals: 0 };
    const lines = madeColumn(telling, made).split('\n');
    const changed = lines.map((line) =>
      line.startsWith('12\t') ? '12\t77' : line.startsWith('20\t') ? '20\t3' : line,
    );
    const found = whyDiffer(telling, columnOf(telling, changed.join('\n')));
    if (found.kind !== 'nearest') throw new Error('reproduced');
    expect(keyOf(found.explanation.applied)).toBe('midpoint');
    const printed = (score: number): string => lines[score]?.split('\t')[1] ?? '';
    expect(found.disagreeing).toEqual([
      { score: 12, theirs: '77', expected: printed(12) },
      { score: 20, theirs: '3', expected: printed(20) },
    ]);
    expect(findingInWords(found, 'high-is-good', 0)).toMatch(
      /^Nothing known here reproduces all 31 ranks\. The nearest misses 2: scoring below, plus half of those at the same score; whole numbers, halves rounded up/,
    );
  });

  it('never counts a row as right without the same sign', () => {
    const one = tableFromCounts({ min: 0, max: 1, step: 1, direction: 'high-is-good' }, [100, 100]);
    const found = whyDiffer(one, columnOf(one, '0 <25\n1 75'));
    expect(found.kind).toBe('nearest');
  });
});

describe('the finding in words', () => {
  it('names the convention without the name of a product', () => {
    const made: Made = { definition: 'percent-rank:inclusive:cut', rounding: 'half-up', ends: 'open', decimals: 1 };
    const found = whyDiffer(telling, columnOf(telling, madeColumn(telling, made)));
    expect(findingInWords(found, 'high-is-good', 1)).toBe(
      "All 31 ranks are reproduced by: people below the score, divided by N − 1 (a spreadsheet's inclusive percent rank), " +
        'cut to three digits; numbers of 1 decimal, the same however rounded; ' +
        'ends as they are, 0 and 100 too. One other convention gives the same 31 ranks.',
    );
  });

  it('says what the rows cannot tell', () => {
    const found = whyDiffer(telling, columnOf(telling, '15 54\n16 61'));
    expect(findingInWords(found, 'high-is-good', 0)).toContain('; no rank so near an end that its rule shows.');
    const one = whyDiffer(telling, columnOf(telling, '0 <1'));
    expect(findingInWords(one, 'high-is-good', 0)).toMatch(/^The one rank is reproduced by: /);
  });
});

describe('rules for printing', () => {
  it('print what the tables of the program print, where they share a rule', () => {
    const ranks = fc
      .tuple(fc.bigInt({ min: 0n, max: 40_000n }), fc.constantFrom(400n, 37n, 1n))
      .filter(([numerator, denominator]) => numerator <= 100n * denominator);
    fc.assert(
      fc.property(
        ranks,
        fc.constantFrom(0 as const, 1 as const),
        fc.constantFrom('half-up' as const, 'half-even' as const),
        fc.constantFrom('signs' as const, 'held' as const),
        ([numerator, denominator], decimals, rounding, ends) => {
          const rank = ratio(numerator, denominator);
          const limits = decimals === 0 ? 'whole' : 'last-place';
          const ours = withEnds(rank, roundedTo(rank, decimals, rounding), decimals, { kind: ends, limits });
          expect(textOfPrint(ours, decimals)).toBe(printRank(rank, { decimals, rounding, ends }).text);
        },
      ),
      { numRuns: 2000 },
    );
  });
});
