import fc from 'fast-check';
import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { ENGLISH_WORDS } from '../../../shared-core/languages/phrases.ts';
import { classTableOfSet } from '../../../shared-core/class/class-table-of-set.ts';
import { classTableSchema, type ClassTable } from '../../../shared-core/class/class-table.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { buildNormSet } from '../../../shared-core/norms/norm-set.ts';
import { cellText, markedText } from '../../../shared-core/pages/sheet-texts.ts';
import { tableColumns } from '../../../shared-core/norms/table-columns.ts';
import { drawnProject } from '../norms/drawn-project.ts';
import { builtSet, projectOf, settledProject, smoothedBy, TEN_COUNTS } from '../norms/small-projects.ts';

function tableOf(project: NormProject): ClassTable {
  const made = classTableOfSet(builtSet(project), 'project');
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

const settled = settledProject();
const reliable: NormProject = { ...settled, precision: { ...settled.precision, reliability: 0.9, level: 80 } };

describe('the class table of a norm set', () => {
  it('tells what it is and whom it speaks of', () => {
    const set = builtSet(settled);
    const table = tableOf(settled);
    expect(table).toMatchObject({
      source: 'project',
      title: 'Ostrey Vale reading (invented)',
      form: 'Forms A and B',
      edition: '1.0',
      date: '2026-06-15',
      check: set.check,
      draft: false,
      cited: '',
      definition: 'below, plus half of those at the same score',
      definitionKind: 'midpoint',
      groupNoun: 'norm group',
      groupColumns: ['grade'],
      reliability: null,
      level: null,
      defaultGroup: null,
      smallestCell: 3,
      peopleNoun: 'pupils',
    });
    expect(table.groups.map(({ values, title, n }) => [values, title, n])).toEqual([
      [['4'], 'Grade 4', 420],
      [['10'], 'Grade 10', 420],
    ]);
  });

  it('prints every text as the booklet does, whatever the project', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        const built = buildNormSet(project);
        if (!built.ok) return;
        const made = classTableOfSet(built.normSet, 'edition');
        if (!made.ok) return;
        const table = made.value;
        expect(v.parse(classTableSchema, table)).toEqual(table);
        const columns = tableColumns(project).filter(({ key }) => key !== 'measurement-band');
        built.normSet.groups.forEach((norms, index) => {
          const group = table.groups[index];
          expect(group?.rows).toHaveLength(norms.rows.length);
          norms.rows.forEach((row, place) => {
            const found = group?.rows[place];
            for (const column of columns) {
              const text =
                column.key === 'score'
                  ? found?.scoreText
                  : column.key === 'rank'
                    ? found?.printed
                    : found?.texts[column.key];
              expect(text).toBe(column.key === 'rank' ? markedText(ENGLISH_WORDS, row, column) : cellText(row, column));
            }
            expect([found?.low, found?.high]).toEqual([row.score, row.score]);
          });
        });
      }),
      { numRuns: 60 },
    );
  });

  it('has the measurement band exactly where a reliability is given, chosen or not', () => {
    expect(tableOf(settled).columns.map(({ key }) => key)).toEqual(['stanine', 't']);
    const chosen: NormProject = { ...settled, table: { ...settled.table, columns: ['measurement-band', 't'] } };
    expect(tableOf(chosen).columns.map(({ key }) => key)).toEqual(['t']);
    const table = tableOf(reliable);
    expect(table.columns.map(({ key }) => key)).toEqual(['stanine', 't', 'measurement-band']);
    expect([table.reliability, table.level]).toEqual([0.9, 80]);
    const both = tableOf({ ...reliable, table: chosen.table });
    expect(both.columns.map(({ key }) => key)).toEqual(['measurement-band', 't']);
    const rows = builtSet(reliable).groups[0]?.rows;
    expect(table.groups[0]?.rows.map(({ band }) => band?.text)).toEqual(
      rows?.map(({ texts }) => texts['measurement-band']),
    );
    expect(
      table.groups[0]?.rows.every(
        ({ band, rank }) => band !== null && rank !== null && band.low <= rank && rank <= band.high,
      ),
    ).toBe(true);
  });

  it('carries the normal curve equivalent behind the printed one', () => {
    // The ten people at or below: 1, 3, 6, 6 and 10 of 10; the last has rank 100, whose z is held at 3.
    const project: NormProject = {
      ...projectOf(TEN_COUNTS),
      curve: { ...settled.curve, definition: { kind: 'at-or-below' } },
    };
    const [group] = tableOf({ ...project, table: { ...project.table, columns: ['nce'] } }).groups;
    // NCE 50 + 21.06 z with z(10) = -1.28155, z(30) = -0.52440, z(60) = 0.25335 (tables of the normal distribution).
    const expected = [50 - 21.06 * 1.28155, 50 - 21.06 * 0.5244, 50 + 21.06 * 0.25335, 50 + 21.06 * 0.25335, 99];
    group?.rows.forEach(({ nce, texts }, index) => {
      expect(nce).toBeCloseTo(expected[index] ?? NaN, 3);
      expect(texts['nce']).toBe(String(Math.round(nce ?? NaN)));
    });
  });

  it('marks ranks adjusted by hand and keeps what is said of them', () => {
    const adjustments = [{ values: ['4'], score: 10, to: '51', reason: 'Agreed with form B.', by: 'A. Reader' }];
    const [group, other] = tableOf({ ...settled, adjustments }).groups;
    expect(
      group?.rows.filter(({ printed }) => printed.endsWith('†')).map(({ scoreText, printed }) => [scoreText, printed]),
    ).toEqual([['10', '51†']]);
    expect(group?.note).toContain('raw 10 from 50 to 51 (Agreed with form B.; A. Reader)');
    expect(other?.note).toBe('');
  });

  it('takes the group that the project names for classes, if it has a table', () => {
    expect(tableOf({ ...settled, classTable: ['10'] }).defaultGroup).toEqual(['10']);
    expect(tableOf({ ...settled, classTable: ['7'] }).defaultGroup).toBeNull();
    expect(tableOf({ ...projectOf(TEN_COUNTS), classTable: [] }).defaultGroup).toEqual([]);
  });

  it('says that a draft is one', () => {
    expect(tableOf(projectOf(TEN_COUNTS))).toMatchObject({ draft: true, groupNoun: 'sample', groupColumns: [] });
  });

  it('is refused where the set may not be pressed', () => {
    const refused = smoothedBy(projectOf([0, 0, 12, 0, 0]), { kind: 'beta-binomial' });
    expect(classTableOfSet(builtSet(refused), 'project')).toEqual({
      ok: false,
      problem: expect.stringContaining('cannot be smoothed as chosen'),
    });
  });
});
