import fc from 'fast-check';
import {
  CLASS_FORMAT,
  CLASS_SORTS,
  CLASS_VERSION,
  SHARING,
  type ClassFile,
} from '../../../shared-core/class/class-file.ts';
import type { ClassTable } from '../../../shared-core/class/class-table.ts';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import { ENGLISH_LANGUAGE } from '../../../shared-core/norms/sheet-schema.ts';
import { drawnText } from '../norms/drawn-project.ts';

const people = fc.constantFrom('pupils' as const, 'students' as const, 'candidates' as const, 'people' as const);
const direction = fc.constantFrom('high-is-good' as const, 'low-is-good' as const);
const percent = fc.double({ min: 0, max: 100, noNaN: true }).map((value) => value || 0);
const language = fc.record({
  tag: fc.constantFrom('en', 'de-CH'),
  words: fc.constantFrom('en' as const, 'de' as const, 'es' as const, 'fr' as const),
  numbers: fc.constant(ENGLISH_LANGUAGE.numbers),
  phrases: fc.array(fc.record({ key: fc.constantFrom('page', 'edition'), text: drawnText }), { maxLength: 2 }),
});
const columnKey = fc.constantFrom(...COLUMN_KEYS, 'column-1', 'column-2', 'column-12');

function drawnRow(low: number, high: number, keys: readonly string[]) {
  return fc.record({
    low: fc.constant(low),
    high: fc.constant(high),
    scoreText: drawnText,
    printed: fc.constantFrom('1', '63', '<1', '>99', '50.5', '84†'),
    rank: fc.option(percent),
    nce: fc.option(percent),
    band: fc.option(fc.record({ text: drawnText, low: percent, high: percent })),
    texts: fc
      .tuple(...keys.map(() => drawnText))
      .map((texts) => Object.fromEntries(keys.map((key, i) => [key, texts[i] ?? '']))),
  });
}

/** Any table that the schema accepts, with rows of one or more scores. */
export const drawnTable: fc.Arbitrary<ClassTable> = fc
  .record({
    keys: fc.uniqueArray(columnKey, { maxLength: 4 }),
    columns: fc.nat(2),
    min: fc.integer({ min: -5, max: 5 }),
    widths: fc.array(fc.integer({ min: 1, max: 3 }), { minLength: 2, maxLength: 5 }),
  })
  .chain(({ keys, columns, min, widths }) => {
    let from = min;
    const ends = widths.map((width): readonly [number, number] => {
      const low = from;
      from += width;
      return [low, from - 1];
    });
    const texts = fc.array(drawnText, { minLength: columns, maxLength: columns });
    const group = fc.record({
      values: texts,
      title: drawnText,
      n: fc.option(fc.nat()),
      population: drawnText,
      note: drawnText,
      rows: fc.tuple(...ends.map(([low, high]) => drawnRow(low, high, keys))),
    });
    return fc.record({
      source: fc.constantFrom('project' as const, 'edition' as const, 'published' as const),
      title: drawnText,
      form: drawnText,
      edition: drawnText,
      date: drawnText,
      check: drawnText,
      draft: fc.boolean(),
      cited: drawnText,
      definition: drawnText,
      definitionKind: fc.constantFrom('midpoint' as const, 'unknown' as const),
      groupNoun: fc.constantFrom('norm group' as const, 'sample' as const),
      groupColumns: texts,
      groups: fc.array(group, { minLength: 1, maxLength: 3 }),
      columns: fc.tuple(
        ...keys.map((key) =>
          fc.record({ key: fc.constant(key), name: drawnText, heading: fc.array(drawnText, { maxLength: 2 }) }),
        ),
      ),
      scale: direction.map((good) => ({ min, max: from - 1, step: 1, direction: good })),
      reliability: fc.option(fc.constantFrom(0, 0.88, 1)),
      level: fc.option(fc.constantFrom(80, 95)),
      defaultGroup: fc.option(texts),
      smallestCell: fc.nat(10),
      peopleNoun: people,
    });
  });

const listRow = fc.record({
  line: fc.integer({ min: 1, max: 5000 }),
  name: drawnText,
  code: drawnText,
  scoreText: fc.oneof(drawnText, fc.constantFrom('1', '2', 'absent', '3')),
  group: drawnText,
  statusText: drawnText,
});

/** Any class that the schema accepts. */
export const drawnClass: fc.Arbitrary<ClassFile> = fc.record({
  format: fc.constant(CLASS_FORMAT),
  version: fc.constant(CLASS_VERSION),
  title: drawnText,
  date: fc.constantFrom('', '2026-06-15'),
  people,
  table: fc.option(drawnTable),
  group: fc.option(fc.array(drawnText, { maxLength: 2 })),
  direction,
  list: fc.record({
    decimalMark: fc.constantFrom('.' as const, ',' as const),
    rows: fc.array(listRow, { maxLength: 6 }),
  }),
  answers: fc.array(fc.record({ question: drawnText, choice: drawnText, value: drawnText }), { maxLength: 3 }),
  report: fc.record({
    paper: fc.constantFrom('a4' as const, 'letter' as const, 'a5' as const),
    sort: fc.constantFrom(...CLASS_SORTS),
    columns: fc.array(drawnText, { maxLength: 3 }),
    language,
  }),
  slips: fc.record({
    paper: fc.constantFrom('a4' as const, 'letter' as const, 'a5' as const),
    perPage: fc.constantFrom(1 as const, 2 as const, 3 as const, 4 as const),
    language,
    texts: fc.array(fc.record({ key: drawnText, text: drawnText }), { maxLength: 2 }),
  }),
  sharing: fc.record({ as: fc.constantFrom(...SHARING), seed: fc.maxSafeNat() }),
});
