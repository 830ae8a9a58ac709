import { BLOCK_KINDS } from '../../../shared-core/norms/booklet-blocks.ts';
import fc from 'fast-check';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import { PROJECT_FORMAT, PROJECT_VERSION, type NormProject } from '../../../shared-core/norms/norm-project.ts';
import { LEFT_OUT_RULES } from '../../../shared-core/norms/reading.ts';
import type { CellClusters } from '../../../shared-core/tally/tally.ts';
import { DEFAULT_POLICY } from '../../../shared-core/norms/policy.ts';
import type { ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import { drawnPrecision, drawnSmoothing } from './drawn-smoothing.ts';

/** Any text, with the names of keys and the words of the language that make poor keys among it. */
export const drawnText = fc.oneof(
  fc.string({ maxLength: 30 }),
  fc.string({ unit: 'grapheme', maxLength: 20 }),
  fc.constantFrom('__proto__', 'constructor', 'rows-read', 'testDates', 'a-b', 'toString', '', '\u2028', '"\\', '7'),
);

const drawnScale: fc.Arbitrary<ScoreScale> = fc
  .record({
    lowest: fc.integer({ min: -20, max: 20 }),
    scores: fc.integer({ min: 2, max: 12 }),
    step: fc.constantFrom(0.25, 0.5, 1, 5),
    direction: fc.constantFrom('high-is-good' as const, 'low-is-good' as const),
  })
  .map(({ lowest, scores, step, direction }) => {
    const min = lowest * step || 0;
    return { min, max: min + (scores - 1) * step, step, direction };
  });

function drawnTally(scale: ScoreScale, columns: readonly string[], weighted: boolean) {
  const length = Math.round((scale.max - scale.min) / scale.step) + 1;
  const counts = fc.array(fc.nat(50), { minLength: length, maxLength: length });
  const cell = fc.record({ values: fc.tuple(...columns.map(() => drawnText)), counts }).map((drawn) => ({
    ...drawn,
    weights: weighted ? drawn.counts.map((count) => String(count * 12)) : null,
    squares: weighted ? drawn.counts.map((count) => String(count * 144)) : null,
  }));
  const number = fc.option(fc.nat(1e6));
  return fc
    .record({ cells: fc.array(cell, { maxLength: 4 }), clustered: fc.boolean(), cluster: number })
    .map(({ cells, clustered, cluster }) => ({
      scale,
      groupColumns: columns,
      weightDecimals: weighted ? 1 : null,
      cells: cells.map((one) => ({ ...one, clusters: clustered ? clustersOf(one.counts, weighted, cluster) : null })),
    }));
}

/** Half of the people, rounded down, in a cluster and the others alone; all alone without a cluster. */
function clustersOf(counts: readonly number[], weighted: boolean, cluster: number | null): CellClusters {
  const within = counts.map((count) => (cluster === null ? 0 : Math.floor(count / 2)));
  const positions = within.flatMap((count, position) => (count > 0 ? [position] : []));
  const people = positions.map((position) => within[position] ?? 0);
  const alone = counts.map((count, position) => count - (within[position] ?? 0));
  return {
    parts:
      cluster === null || positions.length === 0
        ? []
        : [
            {
              cluster,
              positions,
              counts: people,
              weights: weighted ? people.map((count) => String(count * 12)) : null,
            },
          ],
    alone,
    aloneSquares: weighted ? alone.map((count) => String(count * 144)) : null,
  };
}

const drawnSource = fc
  .record({
    kind: fc.constantFrom('people' as const, 'counts' as const, 'typed' as const),
    file: drawnText,
    sha256: fc.constant('0123456789abcdef'.repeat(4)),
    bytes: fc.nat(),
    rowsKept: fc.nat(1e6),
    leftOut: fc.array(
      fc.record({ rule: fc.constantFrom(...LEFT_OUT_RULES), count: fc.nat(1000), rows: fc.array(fc.nat()) }),
      { maxLength: 3 },
    ),
    scaleInferred: fc.boolean(),
  })
  .map((source) => ({
    ...source,
    rowsRead: source.rowsKept + source.leftOut.reduce((sum, rule) => sum + rule.count, 0),
  }));

const drawnReading = (scale: ScoreScale | null) =>
  fc.record({
    layout: fc.constantFrom('people' as const, 'counts' as const),
    encoding: fc.constantFrom('utf-8' as const, 'utf-16le' as const, 'windows-1252' as const),
    separator: fc.constantFrom(',' as const, ';' as const, '\t' as const, '|' as const),
    decimalMark: fc.constantFrom('.' as const, ',' as const),
    header: fc.boolean(),
    sheet: fc.option(drawnText),
    roles: fc.array(
      fc.record({ column: drawnText, role: fc.constantFrom('score' as const, 'group' as const, 'cluster' as const) }),
    ),
    missing: fc.array(drawnText, { maxLength: 3 }),
    scale: fc.constant(scale),
    decisions: fc.record({
      duplicateId: fc.constantFrom('keep-first' as const, 'leave-out-all' as const, 'keep-all' as const),
      raggedRow: fc.constantFrom('leave-out' as const, 'keep-readable' as const),
      blankGroup: fc.constantFrom('leave-out' as const, 'keep' as const),
      blankCluster: fc.constantFrom('alone' as const, 'leave-out' as const),
    }),
  });

/** Margins, rows, blocks and language of a sheet. */
const drawnSetting = {
  marginMm: fc.constantFrom(null, 8, 18.5, 45),
  gutterMm: fc.constantFrom(0, 7.5, 30),
  rowType: fc.constantFrom(6, 8.7, 14),
  rowHeight: fc.constantFrom(8, 12.4, 36),
  fives: fc.boolean(),
  rangeRows: fc.boolean(),
  fillToFours: fc.boolean(),
  blocks: fc
    .shuffledSubarray([...BLOCK_KINDS])
    .chain((kinds) =>
      fc.tuple(
        ...kinds.map((kind) =>
          fc.record({ kind: fc.constant(kind), printed: fc.boolean(), heading: drawnText, text: drawnText }),
        ),
      ),
    ),
  language: fc.record({
    tag: fc.constantFrom('en', 'de-CH', 'nb'),
    words: fc.constantFrom('en' as const, 'de' as const, 'es' as const, 'fr' as const),
    numbers: fc.record({
      decimalMark: fc.constantFrom('.' as const, ',' as const),
      thousands: fc.constantFrom('narrow-space' as const, 'comma' as const, 'none' as const),
      minus: fc.constantFrom('minus' as const, 'hyphen' as const),
      dateOrder: fc.constantFrom('yyyy-mm-dd' as const, 'dd.mm.yyyy' as const),
    }),
    phrases: fc.array(fc.record({ key: fc.constantFrom('page', 'edition'), text: drawnText }), { maxLength: 2 }),
  }),
};

/** Any project that the schema accepts, one in some with nothing read yet. */
export const drawnProject: fc.Arbitrary<NormProject> = fc
  .record({ scale: drawnScale, columns: fc.uniqueArray(drawnText, { maxLength: 3 }), weighted: fc.boolean() })
  .chain(({ scale, columns, weighted }) =>
    fc.record({
      format: fc.constant(PROJECT_FORMAT),
      version: fc.constant(PROJECT_VERSION),
      title: drawnText,
      subtitle: drawnText,
      people: fc.constantFrom('pupils' as const, 'students' as const, 'candidates' as const, 'people' as const),
      source: fc.option(drawnSource),
      reading: fc.option(fc.oneof(drawnReading(scale), drawnReading(null))),
      tally: drawnTally(scale, columns, weighted),
      groups: fc.record({
        by: fc.subarray(columns),
        choices: fc.array(
          fc.record({ values: fc.array(drawnText, { maxLength: 3 }), title: drawnText, printed: fc.boolean() }),
          { maxLength: 3 },
        ),
        documentation: fc.record({
          population: drawnText,
          sampling: drawnText,
          participation: drawnText,
          testDates: drawnText,
          weighting: drawnText,
        }),
      }),
      curve: fc.record({
        definition: fc.oneof(
          fc.constant({ kind: 'midpoint' as const }),
          fc.constant({ kind: 'at-or-below' as const }),
          fc.constant({ kind: 'below' as const }),
          fc.record({ kind: fc.constant('plotting-position' as const), offset: fc.constantFrom('0', '3/8', '0.44') }),
          fc.record({ kind: fc.constant('grouped' as const), width: fc.constant(2 * scale.step) }),
        ),
        smoothing: drawnSmoothing(scale),
        exceptions: fc.array(
          fc.record({ values: fc.array(drawnText, { maxLength: 3 }), smoothing: drawnSmoothing(scale) }),
          { maxLength: 2 },
        ),
      }),
      precision: drawnPrecision,
      table: fc.record({
        columns: fc.shuffledSubarray([...COLUMN_KEYS]),
        decimals: fc.constantFrom(0 as const, 1 as const),
        rounding: fc.constantFrom('half-up' as const, 'half-even' as const),
        ends: fc.constantFrom('signs' as const, 'held' as const),
        zSource: fc.constantFrom('normalised' as const, 'linear' as const),
        zEnds: fc.constantFrom('limits' as const, 'half-person' as const),
      }),
      sheet: fc.record({
        paper: fc.constantFrom('a4' as const, 'letter' as const, 'a5' as const),
        orientation: fc.constantFrom('portrait' as const, 'landscape' as const),
        tableColumns: fc.constantFrom(1 as const, 2 as const, 3 as const, 4 as const),
        ...drawnSetting,
        title: drawnText,
        howToRead: drawnText,
        cautions: drawnText,
        notes: drawnText,
        ogive: fc.boolean(),
        inverse: fc.boolean(),
      }),
      release: fc.record({
        analyst: drawnText,
        checker: drawnText,
        changes: fc.option(
          fc.record({
            edition: fc.constantFrom('', '0.9'),
            date: fc.constantFrom('', '2025-06-15'),
            check: fc.constant('0123-89AB'),
            lines: fc.array(drawnText, { maxLength: 3 }),
          }),
        ),
        edition: drawnText,
        date: fc.constantFrom('', '2026-06-15'),
        answers: fc.array(fc.record({ query: drawnText, reason: drawnText }), { maxLength: 3 }),
      }),
      cuts: fc.array(
        fc.record({
          name: drawnText,
          score: fc.constantFrom(scale.min, scale.max, scale.max + 1),
          values: fc.option(fc.array(drawnText, { maxLength: 3 })),
        }),
        { maxLength: 2 },
      ),
      classTable: fc.option(fc.array(drawnText, { maxLength: 3 })),
      adjustments: fc.array(
        fc.record({
          values: fc.array(drawnText, { maxLength: 3 }),
          score: fc.constantFrom(scale.min, scale.max, scale.max + 1),
          to: fc.constantFrom('50', '<1', '50.5', 'high'),
          reason: drawnText.map((text) => `It says ${text}`),
          by: fc.constant('A. Reader'),
        }),
        { maxLength: 2 },
      ),
      policy: fc.constantFrom(DEFAULT_POLICY, { ...DEFAULT_POLICY, title: '', wideStep: { value: 2.5, source: '-' } }),
    }),
  );
