import { inLanguage } from '../../../shared-core/languages/number-format.ts';
import type { ShippedWords } from '../../../shared-core/languages/shipped-words.ts';
import { DEFAULT_BLOCKS, WHOLE_BOOKLET } from '../../../shared-core/norms/booklet-blocks.ts';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import { buildNormSet, type NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { LEFT_OUT_RULES } from '../../../shared-core/norms/reading.ts';
import { withLanguage } from '../../../shared-core/norms/sheet-language.ts';
import type { Booklet } from '../../../shared-core/pages/booklet.ts';
import { clustersOf } from '../norms/clustered-project.ts';
import { KERNEL, LOG_LINEAR, sampleProject } from '../pages/sample-norm-set.ts';

/** A set whose own texts are numbers and invented names, so that every other word is one of the program's. */
export function wordlessSet(words: ShippedWords, change: (project: NormProject) => NormProject): NormSet {
  const project = sampleProject({ scale: { min: -2, max: 20, step: 0.5 }, groups: ['4', '5', ''] }, (made) => ({
    ...made,
    title: 'Ostrey',
    subtitle: '',
    source: {
      kind: 'people',
      file: 'ostrey.csv',
      sha256: 'a'.repeat(64),
      bytes: 123_456,
      rowsRead: 6794,
      rowsKept: 6691,
      leftOut: LEFT_OUT_RULES.map((rule, index) => ({ rule, count: index === 0 ? 91 : 1, rows: [] })),
      scaleInferred: false,
    },
    release: {
      ...made.release,
      edition: '2',
      changes: { edition: '1', date: '2025-06-01', check: '7F3A-91C2', lines: ['Ostrey'] },
    },
    cuts: [{ name: 'Ostrey', score: 9.5, values: null }],
    sheet: { ...made.sheet, inverse: true, notes: 'Ostrey 12.5.', blocks: WHOLE_BOOKLET },
  }));
  const built = buildNormSet(withLanguage(change(project), words));
  if (!built.ok) throw new Error(built.problem);
  return built.normSet;
}

const withColumns = (project: NormProject, columns: NormProject['table']['columns']): NormProject => ({
  ...project,
  table: { ...project.table, columns },
  precision: { ...project.precision, reliability: 0.9 },
});

/** All columns beside the ranks, which have one decimal. */
export function withEveryColumn(project: NormProject): NormProject {
  const all = withColumns(project, COLUMN_KEYS);
  return { ...all, table: { ...all.table, decimals: 1 }, sheet: { ...all.sheet, orientation: 'landscape' } };
}

/** Changes of a project that between them print every kind of sentence. */
export const EVERY_KIND: readonly (readonly [string, (project: NormProject) => NormProject])[] = [
  ['as it comes', (project) => project],
  ['with every column and one decimal', withEveryColumn],
  [
    'smoothed in three ways',
    (project) => ({
      ...withColumns(project, ['interval', 'standard-error', 'measurement-band']),
      curve: {
        ...project.curve,
        smoothing: { ...LOG_LINEAR, keptScores: [3.5], comb: { every: 4, offset: 1 } },
        exceptions: [
          { values: ['5'], smoothing: KERNEL },
          { values: [''], smoothing: { kind: 'none' } },
        ],
      },
    }),
  ],
  [
    'held ranks by mean rank, low scores good, a draft',
    (project) => ({
      ...withColumns(project, ['cumulative', 'measurement-band']),
      curve: { ...project.curve, definition: { kind: 'plotting-position', offset: '0.375' } },
      table: { ...project.table, ends: 'held', rounding: 'half-even', zSource: 'linear', zEnds: 'half-person' },
      tally: project.tally && {
        ...project.tally,
        scale: { ...project.tally.scale, direction: 'low-is-good' },
      },
      sheet: { ...project.sheet, cautions: '' },
    }),
  ],
  [
    'weighted, smoothed in two more ways',
    (project) => ({
      ...withColumns(project, ['cumulative', 'standard-error']),
      curve: {
        ...project.curve,
        definition: { kind: 'at-or-below' },
        smoothing: { kind: 'kernel', bandwidth: 1.5, after: { ...LOG_LINEAR, degree: 'aic' } },
        exceptions: [
          { values: ['4'], smoothing: { ...LOG_LINEAR, degree: 'likelihood-ratio' } },
          { values: ['5'], smoothing: { kind: 'none' } },
        ],
      },
      tally: project.tally && {
        ...project.tally,
        weightDecimals: 1,
        cells: project.tally.cells.map((cell) => ({
          ...cell,
          weights: cell.counts.map((count) => String(count * 15)),
          squares: cell.counts.map((count) => String(count * 225)),
        })),
      },
    }),
  ],
  [
    'drawn in clusters, tables alone',
    (project) => ({
      ...withColumns(project, ['interval', 'standard-error']),
      people: 'students',
      curve: { ...project.curve, definition: { kind: 'below' } },
      tally: project.tally && {
        ...project.tally,
        cells: project.tally.cells.map((cell) => ({ ...cell, clusters: clustersOf(cell.counts, 12) })),
      },
      sheet: { ...project.sheet, blocks: DEFAULT_BLOCKS },
    }),
  ],
  [
    'everybody in one table, documented',
    (project) => ({
      ...withColumns(project, ['standard-error']),
      people: 'candidates',
      groups: {
        ...project.groups,
        by: [],
        documentation: {
          population: 'Ostrey',
          sampling: 'Ostrey',
          participation: '81 %',
          testDates: '2024',
          weighting: 'Ostrey',
        },
      },
    }),
  ],
  [
    'in classes, with a rank adjusted by hand',
    (project) => ({
      ...project,
      curve: { ...project.curve, definition: { kind: 'grouped', width: 2.5 } },
      adjustments: [{ values: ['4'], score: 9.5, from: '50', to: '51', reason: 'Ostrey', by: 'Ostrey' }],
    }),
  ],
];

/** Every printed word and figure of a booklet: lines, heads, cells, pictures and what is read aloud. */
export function textsOf({ title, pages }: Booklet): readonly string[] {
  const texts: string[] = [title];
  const visit = (value: unknown, key: string): void => {
    if (Array.isArray(value)) value.forEach((each) => visit(each, key));
    else if (typeof value === 'object' && value !== null) {
      Object.entries(value).forEach(([name, each]) => visit(each, name));
    } else if (typeof value === 'string' && PRINTED_KEYS.has(key)) {
      texts.push(key === 'svg' ? value.replace(/<[^>]*>/g, ' ') : value);
    }
  };
  visit(pages, '');
  return texts;
}

const PRINTED_KEYS = new Set(['text', 'lines', 'note', 'said', 'svg', 'alt', 'opens']);

/** Text of each cell of the conversion tables, in order. */
export function cellsOf({ pages }: Booklet): readonly string[] {
  return pages.flatMap(({ blocks }) =>
    blocks.flatMap((block) =>
      block.kind === 'table-column' && block.table === 'conversion'
        ? block.rows.flatMap(({ cells }) => cells.map(({ text }) => text))
        : [],
    ),
  );
}

/** The figures of a set as they are printed in its language. */
export function printedFigures({ groups, project }: NormSet): readonly string[] {
  return groups.flatMap(({ rows }) =>
    rows.flatMap((row) =>
      [row.scoreText, row.printed, ...project.table.columns.map((key) => row.texts[key])].map((text) =>
        inLanguage(text, project.sheet.language.numbers),
      ),
    ),
  );
}
