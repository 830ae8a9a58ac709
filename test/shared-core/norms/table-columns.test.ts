import { describe, expect, it } from 'vitest';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import { columnOf, tableColumns } from '../../../shared-core/norms/table-columns.ts';
import { projectOf, scaleTo, settledProject, TEN_COUNTS } from './small-projects.ts';

describe('columns of a table', () => {
  it('stand in the order the user gave, after raw score and percentile rank', () => {
    const project = settledProject();
    const columns = tableColumns({ ...project, table: { ...project.table, columns: ['t', 'count', 'stanine'] } });
    expect(columns.map(({ key }) => key)).toEqual(['score', 'rank', 't', 'count', 'stanine']);
  });

  it('have names, headings and explanations unlike one another', () => {
    const columns = COLUMN_KEYS.map((key) => columnOf(key, settledProject()));
    for (const part of ['name', 'heading', 'explanation'] as const) {
      expect(new Set(columns.map((column) => String(column[part]))).size).toBe(COLUMN_KEYS.length);
    }
  });

  it('speak of the people and of the poor end', () => {
    expect(columnOf('count', settledProject()).heading).toEqual(['Pupils']);
    const seconds = projectOf(TEN_COUNTS, scaleTo(4, 'low-is-good'));
    expect(columnOf('cumulative', seconds).heading).toEqual(['At or', 'above']);
    const project = projectOf(TEN_COUNTS);
    expect(columnOf('cumulative', project).heading).toEqual(['At or', 'below']);
    const tally = project.tally === null ? null : { ...project.tally, weightDecimals: 2 };
    expect(columnOf('cumulative', { ...project, tally }).heading).toEqual(['Weight at', 'or below']);
  });

  it('explain stanines by ranks or by z, as they are made', () => {
    const project = settledProject();
    const linear = { ...project, table: { ...project.table, zSource: 'linear' as const } };
    expect(columnOf('stanine', project).explanation).toContain('per cent');
    expect(columnOf('stanine', linear).explanation).toBe('Nine bands, half a standard deviation wide.');
  });

  it('name the level of the interval, and keep the two errors apart', () => {
    const project = settledProject();
    const level = { ...project, precision: { ...project.precision, level: 90 } };
    expect(columnOf('interval', level).heading).toEqual(['90 %', 'interval']);
    expect(columnOf('interval', level).name).toBe('90 % interval');
    for (const key of ['interval', 'standard-error'] as const) {
      expect(columnOf(key, project).explanation).toMatch(/^Error of sampling/);
    }
    expect(columnOf('measurement-band', project).explanation).toMatch(/^Error of measurement/);
  });
});
