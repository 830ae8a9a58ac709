import type { BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Booklet, BookletPage, TextLine } from '../../../shared-core/pages/booklet.ts';
import { linesOn, textOf } from './placed-laws.ts';
import { sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';

export type Change = (project: NormProject) => NormProject;

/** A set that prints some blocks, in the order given. */
export function printing(
  kinds: readonly BlockKind[],
  cohort: Partial<SampleCohort> = {},
  change: Change = (same) => same,
): NormSet {
  return sampleNormSet({ scale: WHOLE_SCALE, ...cohort }, (project) =>
    change({
      ...project,
      sheet: {
        ...project.sheet,
        blocks: kinds.map((kind) => ({ kind, printed: true, heading: '', text: '' })),
      },
    }),
  );
}

export const textsOn = (page: BookletPage): readonly string[] => linesOn(page).map(textOf);

/** The words of a block on all its pages, head and foot left out. */
export function wordsOf({ pages }: Booklet, kind: BlockKind): string {
  return pages
    .filter(({ block }) => block === kind)
    .flatMap(linesOn)
    .filter(({ role }) => role.kind !== 'running')
    .map(textOf)
    .join(' ');
}

/** The cells of a small table, row by row. */
export function cellsOf({ pages }: Booklet, table: string): readonly (readonly string[])[] {
  const rows = new Map<string | number, Map<number, string>>();
  for (const { role, ...line } of pages.flatMap(linesOn)) {
    if (role.kind !== 'cell' || role.table !== table) continue;
    const row = rows.get(role.row) ?? new Map<number, string>();
    const before = row.get(role.column);
    const text = textOf(line as TextLine);
    row.set(role.column, before === undefined ? text : `${before} ${text}`);
    rows.set(role.row, row);
  }
  return [...rows.values()].map((row) => [...row.entries()].sort(([a], [b]) => a - b).map(([, text]) => text));
}

/** A source whose rows add up. */
export const source: NonNullable<NormProject['source']> = {
  kind: 'people',
  file: 'reading.csv',
  sha256: 'ab'.repeat(32),
  bytes: 178_259,
  rowsRead: 20_000,
  rowsKept: 19_990,
  leftOut: [
    { rule: 'duplicate-id', count: 4, rows: [] },
    { rule: 'blank-score', count: 0, rows: [] },
    { rule: 'above-scale', count: 6, rows: [] },
  ],
  scaleInferred: false,
};

export const documented: Change = (project) => ({
  ...project,
  groups: {
    ...project.groups,
    documentation: {
      population: 'All of the vale',
      sampling: 'Nobody was chosen.',
      participation: '95 in 100.',
      testDates: 'May 2026',
      weighting: 'None.',
    },
  },
});
