import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import { classStanding } from '../../../shared-core/class/class-standing.ts';
import { classFromText, classToText } from '../../../shared-core/class/class-file-text.ts';
import { classSheets, summarySheets } from '../../../shared-core/pages/class-sheets.ts';
import { printOfClass, reportPages } from '../../../shared-core/pages/print-of-class.ts';
import { codeFiles, withoutWords } from '../../architecture/source-files.ts';
import { classOf, resultsOf, type Typed } from './classes.ts';
import { publishedTable } from './published-facts.ts';

/** Every number in plain data, and every number that a text of it prints. */
function numbersIn(value: unknown): readonly number[] {
  if (typeof value === 'number') return [value];
  if (typeof value === 'string') return [...value.matchAll(/\d+(?:\.\d+)?/g)].map(([found]) => Number(found));
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(numbersIn);
}

/** Every text in plain data; places on paper are numbers and no texts. */
function textsIn(value: unknown): readonly string[] {
  if (typeof value === 'string') return [value];
  return typeof value !== 'object' || value === null ? [] : Object.values(value).flatMap(textsIn);
}

/** Numbers that stand alone in a text, parts of check codes not among them. */
function figuresOf(text: string): readonly number[] {
  return [...text.matchAll(/(?<![\w.-])\d+(?:\.\d+)?(?![\w-])/g)].map(([found]) => Number(found));
}

const meanOf = (values: readonly number[]): number => values.reduce((sum, one) => sum + one, 0) / values.length;

/** Ranks far from any raw score, n or equivalent: 101 scores, a rank of three decimals each. */
const RANKS = Array.from(
  { length: 101 },
  (_, score) => Math.round((1 + (97 * (score + 0.137)) / 101 + 0.013) * 1000) / 1000,
);
const TABLE = publishedTable(RANKS.map((rank, score) => `${score} ${rank.toFixed(3)}`).join('\n'));

function pupilsOf(scores: readonly number[]): ClassFile {
  const rows = scores.map((score, index): Typed => [`P${index}`, String(score), index % 2 === 0 ? 'a' : 'b']);
  return classOf(rows, { table: TABLE, group: null });
}

/** Means of the ranks of the class and of its groups, exact and rounded as they could be printed. */
function meansOfRanks(file: ClassFile): readonly number[] {
  const ranks = resultsOf(file).pupils.map(({ found }) => found.rank ?? NaN);
  const sets = [ranks, ranks.filter((_, index) => index % 2 === 0), ranks.filter((_, index) => index % 2 === 1)];
  return sets.map(meanOf);
}

describe('a mean of percentile ranks', () => {
  it('stands nowhere in the results, the standing or the file of a class', () => {
    const scores = fc.array(fc.nat(100), { minLength: 7, maxLength: 30 });
    fc.assert(
      fc.property(scores, (drawn) => {
        const file = pupilsOf(drawn);
        // What is no mean: the table, and what each pupil has of it.
        const { table, pupils, ...rest } = resultsOf(file);
        const own = pupils.map(({ table: _looked, found: _found, ...pupil }) => pupil);
        expect([table.title, pupils.length]).toEqual([TABLE.title, drawn.length]);
        const made = numbersIn([rest, own, classStanding(file)]);
        const cells = new Set(TABLE.groups[0]?.rows.map(({ rank }) => rank));
        for (const mean of meansOfRanks(file)) {
          // A mean that by chance is the rank of a score, or a number of few digits, would prove nothing.
          fc.pre(!cells.has(mean) && Math.abs(mean * 10 - Math.round(mean * 10)) > 1e-6);
          expect(made.filter((number) => Math.abs(number - mean) < 1e-6)).toEqual([]);
        }
      }),
    );
  });

  it('is no mean in print either: 37.123 of a class made for it', () => {
    // Five ranks whose mean is 37.123 and rounds to 37.1 and 37; every other number of the class is far from it.
    const table = publishedTable('200 20.005\n201 31.11\n202 40.5\n203 44\n204 50', {});
    const file = classOf(
      [
        ['A', '200', 'x'],
        ['B', '201', 'x'],
        ['C', '202', 'y'],
        ['D', '203', 'y'],
        ['E', '204', 'y'],
      ],
      { table, group: null },
    );
    expect(meanOf([20.005, 31.11, 40.5, 44, 50])).toBeCloseTo(37.123, 9);
    const { table: known, pupils, ...rest } = resultsOf(file);
    const printed = numbersIn([rest, classStanding(file)]);
    for (const mean of [37.123, 37.12, 37.1, 37, 25.5575, 25.6, 44.8333, 44.83, 44.8])
      expect(printed).not.toContain(mean);
    // The mean of the equivalents is there, so that the search does find means.
    const nces = pupils.slice(0, 2).map(({ found }) => found.nce ?? NaN);
    expect(printed).toContain(Number(meanOf(nces).toFixed(1)));
    expect(known.groups).toHaveLength(1);
    for (const as of ['names', 'codes', 'summary'] as const) {
      const made = printOfClass({ ...file, sharing: { as, seed: 5 } });
      if (!made.ok || made.value.kind === 'standing') throw new Error('no report');
      const sheets = as === 'summary' ? summarySheets(made.value.print) : classSheets(made.value.print);
      const texts = [reportPages(made.value), sheets].flatMap(textsIn).flatMap(figuresOf);
      expect(texts.length).toBeGreaterThan(20);
      for (const mean of [37.123, 37.12, 37.1, 37, 25.5575, 25.6, 44.8333, 44.83, 44.8])
        expect(texts.filter((one) => Math.abs(one - mean) < 1e-6)).toEqual([]);
    }
    expect(classFromText(classToText(file))).toEqual({ ok: true, file });
  });

  it('is not changed for: groups stand as their raw scores do, whatever the ranks', () => {
    // The same scores under other ranks: only the equivalents move.
    const steep = publishedTable('1 5\n2 50\n3 95');
    const flat = publishedTable('1 49\n2 50\n3 51');
    const rows: readonly Typed[] = [
      ['A', '1', 'x'],
      ['B', '3', 'x'],
      ['C', '2', 'y'],
      ['D', '2', 'y'],
    ];
    const [one, other] = [steep, flat].map(
      (table) => resultsOf(classOf(rows, { table, group: null })).comparison?.groups,
    );
    const scoresOf = (groups = one) => groups?.map(({ n, median, mean }) => [n, median, mean]);
    expect(scoresOf(one)).toEqual(scoresOf(other));
    expect(scoresOf(one)).toEqual([
      [2, '2', '2.0'],
      [2, '2', '2.0'],
    ]);
  });
});

describe('the source of the class', () => {
  /** Ranks are passed on, compared with another and printed; nothing is added to them, and they are added to nothing. */
  const ARITHMETIC =
    /(?:\b(?:rank|ranks|percentileRank|printed|percentText)\b(?:\.\w+)?\s*(?:[+*/]|-(?!\w))\s*)|(?:[+*/]\s*(?:\w+\.)*(?:rank|ranks|percentileRank)\b)|(?:\b(?:sum|total|mean|meanOf|average)\w*\(.*\b(?:rank|ranks|percentileRank)\b)/;

  it('is searched with a pattern that finds what it should', () => {
    for (const code of [
      'sum + row.rank',
      'rank / n',
      'meanOf(ranks)',
      'ranks * 2',
      'mean(pupils.map((p) => p.found.rank))',
    ]) {
      expect(ARITHMETIC.test(code)).toBe(true);
    }
    expect(ARITHMETIC.test('rank === null ? null : normalisedZ(ratioNear(rank))')).toBe(false);
  });

  /** All code that knows classes: the rooms, their pages and how these are pressed. */
  const classCode = () => [
    ...codeFiles('shared-core/class'),
    ...codeFiles('shared-core/pages').filter(({ path }) => /\/(?:class|standing|slip|band-chart|print-of)-/.test(path)),
    ...codeFiles('src-main/press/class'),
  ];
  const plainCode = (text: string): string => withoutWords(text.replace(/`[^`]*`/g, ''));

  it('reckons with no rank', () => {
    const files = classCode();
    expect(files.length).toBeGreaterThan(60);
    const found = files.flatMap(({ path, text }) =>
      plainCode(text)
        .split('\n')
        .flatMap((line) => (ARITHMETIC.test(line) ? [`${path}: ${line.trim()}`] : [])),
    );
    // One rank as an exact share, to find its place on the scale of the band chart.
    expect(found).toEqual([
      'shared-core/pages/band-chart-scale.ts: const z = normalisedZ(ratio(BigInt(Math.round(rank * PARTS)), BigInt(PARTS)));',
    ]);
  });

  it('averages in two places only: raw scores in numbers, and groups by raw scores and normal curve equivalents', () => {
    // A mean is a sum over a length, or is had from the summary of a frequency table.
    const averages = /\/\s*(?:\w+\.)*(?:length|n|count)\b|\bsummarise\(/;
    for (const code of ['sum / values.length', 'total / n', 'summarise(table)']) expect(averages.test(code)).toBe(true);
    const takers = classCode().filter(({ text }) => averages.test(plainCode(text)));
    expect(takers.map(({ path }) => path)).toEqual([
      'shared-core/class/group-comparison.ts',
      'shared-core/class/score-facts.ts',
    ]);
  });

  it('passes means on that were made there: a summary only tells which of them may stand in it', () => {
    const users = classCode().filter(({ text }) => /\b(?:mean|nceMean|meanOf)\b/.test(plainCode(text)));
    expect(users.map(({ path }) => path)).toEqual([
      'shared-core/class/group-comparison.ts',
      'shared-core/class/shared-summary.ts',
      'shared-core/pages/class-facts-blocks.ts',
      'shared-core/pages/class-sheets.ts',
      'shared-core/pages/class-summary-pages.ts',
      'shared-core/pages/class-summary.ts',
    ]);
    const [summary] = users.filter(({ path }) => path.endsWith('/shared-summary.ts'));
    expect(plainCode(summary?.text ?? '')).not.toMatch(/\brank|\bnce|[^/*]\/[^/*]|\breduce\(/i);
  });
});
