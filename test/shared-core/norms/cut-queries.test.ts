import { describe, expect, it } from 'vitest';
import type { Cut, NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { Query } from '../../../shared-core/norms/queries.ts';
import { builtSet, settledProject } from './small-projects.ts';

const settled = settledProject();

function asked(cuts: readonly Partial<Cut>[], change: (project: NormProject) => NormProject = (project) => project) {
  const given = cuts.map((cut) => ({ name: 'Reading support', score: 7, values: null, ...cut }));
  return builtSet(change({ ...settled, cuts: given })).queries;
}

const ranged = (project: NormProject): NormProject => ({
  ...project,
  sheet: { ...project.sheet, rangeRows: true },
  table: { ...project.table, columns: [] },
});

/** Nobody above 15, so that the scores from 16 print alike. */
function emptyAbove15(project: NormProject): NormProject {
  if (project.tally === null) throw new Error('no tally');
  const counts = Array.from({ length: 21 }, (_, score) => (score > 15 ? 0 : 20));
  return {
    ...ranged(project),
    tally: { ...project.tally, cells: project.tally.cells.map((cell) => ({ ...cell, counts })) },
  };
}

const cutsAmong = (queries: readonly Query[]): readonly Query[] => queries.filter(({ id }) => /cut/.test(id));

describe('queries about cuts', () => {
  it('are none at a score of the scale, for all groups or for one', () => {
    expect(asked([{}, { values: ['4'] }])).toEqual([]);
    expect(asked([{}], ranged)).toEqual([]);
  });

  it('ask about a cut that is no attainable score, outside the scale, or of no group', () => {
    expect(asked([{ score: 7.5 }, { score: 21, name: ' ' }, { values: ['11'] }])).toMatchObject([
      {
        id: 'cut:7.5::Reading support',
        station: 'sheet',
        weight: 'must',
        group: null,
        lead: 'The cut “Reading support” at 7.5 has no place in the tables.',
        why: 'Nobody can have this score: the scores go from 0 to 20.',
        whatToDo: 'Give the cut the lowest score that is on its good side.',
      },
      { lead: 'The cut without a name at 21 has no place in the tables.', why: 'The scores go from 0 to 20.' },
      { id: 'cut:7:["11"]:Reading support', why: 'There is no group 11.' },
    ]);
  });

  it('belong to the group that a cut names, and tell two of one name apart', () => {
    expect(
      asked([
        { score: -1, values: ['4'] },
        { score: -1, values: ['4'] },
      ]),
    ).toMatchObject([
      { id: 'cut:-1:["4"]:Reading support', group: '["4"]' },
      { id: 'cut:-1:["4"]:Reading support:2', group: '["4"]' },
    ]);
  });

  it('ask about a cut between two scores where rows are ranges', () => {
    const queries = asked([{ score: 7.5, values: ['10'] }], ranged);
    expect(queries).toMatchObject([
      { weight: 'must' },
      {
        id: 'merged-rows-hide-cut:["10"]',
        station: 'sheet',
        weight: 'should',
        group: '["10"]',
        lead: 'In the rows of Grade 10 a cut stands between two scores: 7.5.',
      },
    ]);
    expect(cutsAmong(asked([{ score: 25 }], ranged)).map(({ id }) => id)).toEqual(['cut:25::Reading support']);
  });

  it('tell which rows a cut parts, and of none where it parts no row', () => {
    const found = cutsAmong(asked([{ score: 18 }], emptyAbove15));
    expect(found).toMatchObject([
      {
        id: 'rows-parted-by-cut:["4"]',
        weight: 'note',
        lead: 'Rows of Grade 4 that print alike are parted by a cut: 16–17 and 18–20.',
      },
      { id: 'rows-parted-by-cut:["10"]' },
    ]);
    expect(cutsAmong(asked([{ score: 16 }], emptyAbove15))).toEqual([]);
    const apart = (project: NormProject): NormProject => {
      const empty = emptyAbove15(project);
      return { ...empty, sheet: { ...empty.sheet, rangeRows: false } };
    };
    expect(cutsAmong(asked([{ score: 18 }], apart))).toEqual([]);
  });
});
