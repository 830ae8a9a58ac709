import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';

/** An invented project with a tally of `groups` groups on a scale of 0 to 40. */
export function projectWithTally(title: string, groups: number): NormProject {
  const cells = Array.from({ length: groups }, (_, group) => ({
    values: [String(group)],
    counts: Array.from({ length: 41 }, (__, score) => (score * 7 + group * 3 + title.length) % 23),
    weights: null,
    squares: null,
    clusters: null,
  }));
  const people = cells.flatMap((cell) => cell.counts).reduce((sum, count) => sum + count, 0);
  return {
    ...newProject(title),
    source: {
      kind: 'people',
      file: 'readers.csv',
      sha256: 'ab'.repeat(32),
      bytes: 12,
      rowsRead: people + 2,
      rowsKept: people,
      leftOut: [{ rule: 'blank-row', count: 2, rows: [3, 9] }],
      scaleInferred: false,
    },
    tally: {
      scale: { min: 0, max: 40, step: 1, direction: 'high-is-good' },
      groupColumns: ['form'],
      weightDecimals: null,
      cells,
    },
  };
}
