import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { queriesOf } from '../../../shared-core/norms/queries.ts';
import { methodText } from '../../../shared-core/norms/statements.ts';
import { workingsOf } from '../../../shared-core/norms/workings.ts';
import { builtSet, firstNorms, logLinear, settledProject, smoothedBy, weightedProject } from './small-projects.ts';

/** Without and with smoothing, with columns that tell how sure a rank is. */
function projects(): readonly ReturnType<typeof settledProject>[] {
  const [settled, weighted] = [settledProject(), weightedProject()];
  const columns = ['interval', 'standard-error', 'measurement-band', 'print-range', 't'] as const;
  return [
    settled,
    weighted,
    smoothedBy({ ...settled, precision: { ...settled.precision, reliability: 0.9 } }, logLinear('bic')),
    smoothedBy(weighted, { kind: 'kernel', bandwidth: 'auto', after: logLinear(1) }),
  ].map((project) => ({ ...project, table: { ...project.table, columns } }));
}

/** Everything a project leads to, as one text. */
function everythingOf(project: ReturnType<typeof settledProject>): string {
  const normSet = builtSet(project);
  const norms = firstNorms(project);
  const workings = norms.rows.map((row) => workingsOf(project, norms, row.scoreText, 't'));
  const queries = queriesOf(project, normSet.groups, normSet.refusedAdjustments, normSet.check);
  const parts = [normSet, workings, queries, methodText(project), projectToText(project)];
  return JSON.stringify(parts, (_, value: unknown) => (typeof value === 'bigint' ? `${value}n` : value));
}

function forbidden(): never {
  throw new Error('asks the machine for its locale, its clock or for chance');
}

describe('a project', () => {
  const before = projects().map(everythingOf);

  beforeEach(() => {
    vi.spyOn(Number.prototype, 'toLocaleString').mockImplementation(forbidden);
    vi.spyOn(String.prototype, 'localeCompare').mockImplementation(forbidden);
    vi.spyOn(String.prototype, 'toLocaleLowerCase').mockImplementation(forbidden);
    vi.spyOn(String.prototype, 'toLocaleUpperCase').mockImplementation(forbidden);
    vi.spyOn(Intl, 'NumberFormat').mockImplementation(forbidden);
    vi.spyOn(Intl, 'DateTimeFormat').mockImplementation(forbidden);
    vi.spyOn(Intl, 'Collator').mockImplementation(forbidden);
    vi.spyOn(Math, 'random').mockImplementation(forbidden);
    vi.spyOn(Date, 'now').mockImplementation(forbidden);
  });

  afterEach(() => {
    vi.restoreAllMocks();
  });

  it('leads to the same texts without locale, clock or chance', () => {
    expect(projects().map(everythingOf)).toEqual(before);
  });

  it('leads to the same numbers in whatever order its cells were added up', () => {
    const project = settledProject();
    const tally = project.tally && { ...project.tally, cells: project.tally.cells.toReversed() };
    const numbers = (one: typeof project) => {
      const { check, groups } = builtSet(one);
      return [check, groups.map(({ rows }) => rows.map((row) => [row.printed, row.texts]))];
    };
    expect(numbers({ ...project, tally })).toEqual(numbers(project));
  });
});
