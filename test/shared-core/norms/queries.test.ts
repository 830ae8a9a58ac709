import { describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { openQueries, type Query } from '../../../shared-core/norms/queries.ts';
import { builtSet, projectOf, READING, scaleTo, settledProject } from './small-projects.ts';

const settled = settledProject();

function queriesOf(project: NormProject): readonly Query[] {
  return builtSet(project).queries;
}

function idsOf(project: NormProject): readonly string[] {
  return queriesOf(project).map((query) => query.id);
}

/** The settled project with other counts in each of its four cells. */
function withCounts(counts: readonly number[]): NormProject {
  if (settled.tally === null) throw new Error('no tally');
  const cells = settled.tally.cells.map((cell) => ({ ...cell, counts }));
  return { ...settled, tally: { ...settled.tally, scale: scaleTo(counts.length - 1), cells } };
}

function withSource(change: Partial<NonNullable<NormProject['source']>>): NormProject {
  return { ...settled, source: settled.source && { ...settled.source, ...change } };
}

function keepingAll(role: 'id' | 'unused'): NormProject {
  const roles = READING.roles.map((column) => (column.role === 'id' ? { ...column, role } : column));
  const decisions = { ...READING.decisions, duplicateId: 'keep-all' as const };
  return { ...settled, reading: { ...READING, roles, decisions } };
}

const evenly = (each: number): readonly number[] => Array.from({ length: 21 }, () => each);

describe('queries', () => {
  it('are none for a settled project', () => {
    expect(idsOf(settled)).toEqual([]);
  });

  it('ask whether a scale taken from the scores is the whole scale', () => {
    expect(queriesOf(withSource({ scaleInferred: true }))).toMatchObject([
      { id: 'scale-inferred', station: 'cohort', weight: 'must', group: null },
    ]);
  });

  it('ask about many rows left out, above one in twenty', () => {
    const leftOut = (count: number) =>
      withSource({ rowsRead: 840 + count, leftOut: [{ rule: 'not-a-number', count, rows: [] }] });
    expect(idsOf(leftOut(44))).toEqual([]);
    expect(idsOf(leftOut(45))).toEqual(['many-left-out']);
    expect(queriesOf(leftOut(45))[0]?.lead).toBe('5.1\u00a0% of the rows are left out.');
  });

  it('ask about repeated identifiers that are kept, where there is an identifier', () => {
    expect(idsOf(keepingAll('id'))).toEqual(['duplicates-kept']);
    expect(idsOf(keepingAll('unused'))).toEqual([]);
  });

  it('ask about tables of one title', () => {
    const renamed = (titles: readonly string[]): NormProject => ({
      ...settled,
      groups: {
        ...settled.groups,
        choices: ['4', '10'].map((value, index) => ({ values: [value], title: titles[index] ?? '', printed: true })),
      },
    });
    expect(idsOf(renamed(['Both', 'Others']))).toEqual([]);
    expect(queriesOf(renamed(['Both', ' Both']))).toMatchObject([
      { id: 'same-title:Both', station: 'groups', weight: 'must', lead: 'More than one table is called Both.' },
    ]);
  });

  it('name the documentation that is missing', () => {
    const documentation = { ...settled.groups.documentation, sampling: ' ', testDates: '' };
    const [query, ...others] = queriesOf({ ...settled, groups: { ...settled.groups, documentation } });
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'documentation', station: 'groups', weight: 'should' });
    expect(query?.why).toContain('how people were chosen; when they were tested.');
  });

  it('ask for the date of the edition', () => {
    expect(idsOf({ ...settled, release: { ...settled.release, date: '' } })).toEqual(['edition-date']);
  });

  it('ask for the cautions', () => {
    expect(queriesOf({ ...settled, sheet: { ...settled.sheet, cautions: ' \n' } })).toMatchObject([
      { id: 'no-cautions', station: 'sheet', weight: 'must' },
    ]);
  });

  it('weigh small groups', () => {
    const group = 'small-group:["4"]';
    // Two cells make a grade.
    const small = queriesOf(withCounts(evenly(4)));
    expect(small.map(({ id, weight }) => [id, weight])).toEqual([
      [group, 'should'],
      ['small-group:["10"]', 'should'],
    ]);
    expect(small[0]).toMatchObject({ lead: 'Only 168 pupils in Grade 4.', group: '["4"]' });
    expect(queriesOf(withCounts([5, 5]))[0]).toMatchObject({ id: group, weight: 'must' });
    expect(idsOf(withCounts([...evenly(5).slice(1), 1]))).toEqual([]);
  });

  it('speak of one pupil in the singular', () => {
    expect(queriesOf(projectOf([0, 1, 0])).find((query) => query.id.startsWith('small-group'))?.lead).toBe(
      'Only 1 pupil in All pupils.',
    );
  });

  it('ask about very uneven weights', () => {
    const weighted = (light: number): NormProject => {
      if (settled.tally === null) throw new Error('no tally');
      // At each score nine people weigh `light` hundredths and one weighs 10.
      const sum = String(9 * light + 1000);
      const squares = String(9 * light * light + 1000 * 1000);
      const cells = settled.tally.cells.map((cell) => ({
        ...cell,
        weights: cell.counts.map(() => sum),
        squares: cell.counts.map(() => squares),
      }));
      return { ...settled, tally: { ...settled.tally, weightDecimals: 2, cells } };
    };
    expect(idsOf(weighted(1000))).toEqual([]);
    expect(idsOf(weighted(100))).toEqual(['uneven-weights:["4"]', 'uneven-weights:["10"]']);
  });

  it('ask about crowded ends, and which end is which', () => {
    const crowd = (first: number, last: number, direction: 'high-is-good' | 'low-is-good') => {
      const counts = [first, ...evenly(10).slice(2), last];
      const project = withCounts(counts);
      const tally = project.tally && { ...project.tally, scale: scaleTo(20, direction) };
      return queriesOf({ ...project, tally, groups: { ...project.groups, by: [] } }).filter(({ id }) =>
        id.startsWith('crowded'),
      );
    };
    expect(crowd(33, 10, 'high-is-good')).toEqual([]);
    expect(crowd(37, 10, 'high-is-good')).toMatchObject([
      { id: 'crowded-lowest:[]', station: 'table', weight: 'should' },
    ]);
    expect(crowd(37, 10, 'high-is-good')[0]?.why).toContain('poorest');
    expect(crowd(37, 10, 'low-is-good')[0]?.why).toContain('best');
    expect(crowd(10, 37, 'high-is-good')[0]?.why).toContain('best');
    expect(crowd(10, 37, 'low-is-good')[0]?.why).toContain('poorest');
    expect(crowd(60, 60, 'low-is-good').map(({ id }) => id)).toEqual(['crowded-lowest:[]', 'crowded-highest:[]']);
  });

  it('note wide steps', () => {
    const [query] = queriesOf(withCounts([...evenly(10).slice(0, 10), 30, 80, ...evenly(10).slice(0, 9)]));
    expect(query).toMatchObject({ id: 'wide-steps:["4"]', station: 'curve', weight: 'note' });
    expect(query?.lead).toBe('One mark is worth more than 10 points at 11 or 12.');
  });

  it('note scores that nobody obtained', () => {
    const holes = evenly(20).map((count, score) => (score >= 2 && score <= 9 ? 0 : count));
    const lead = (counts: readonly number[]) =>
      queriesOf(withCounts(counts)).find(({ id }) => id.startsWith('unobserved'))?.lead;
    expect(lead(holes)).toBe('Nobody in Grade 4 scored 2, 3, 4, 5, 6, 7 and 2 more.');
    expect(lead(evenly(20).with(3, 0))).toBe('Nobody in Grade 4 scored 3.');
    expect(lead(evenly(20).with(3, 0).with(7, 0))).toBe('Nobody in Grade 4 scored 3 or 7.');
  });
});

describe('answers', () => {
  const asking: NormProject = {
    ...withCounts([5, 0, 5]),
    source: settled.source && { ...settled.source, scaleInferred: true },
    sheet: { ...settled.sheet, cautions: '' },
    release: {
      ...settled.release,
      edition: '1.0',
      date: '',
      answers: [{ query: 'scale-inferred', reason: 'Yes, 0 to 20.' }],
    },
  };

  it('go to their query alone, and answered queries stand last', () => {
    const queries = queriesOf(asking);
    expect(queries.at(-1)).toMatchObject({ id: 'scale-inferred', answer: 'Yes, 0 to 20.' });
    expect(queries.slice(0, -1).map((query) => query.answer)).toEqual(queries.slice(1).map(() => null));
  });

  it('leave the most pressing first', () => {
    const order = { must: 0, should: 1, note: 2 };
    const weights = queriesOf(asking)
      .slice(0, -1)
      .map((query) => order[query.weight]);
    expect(weights).toEqual(weights.toSorted((left, right) => left - right));
    expect(new Set(weights).size).toBe(3);
  });

  it('close a query; notes need none', () => {
    const open = openQueries(queriesOf(asking)).map(({ id }) => id);
    expect(open).toContain('no-cautions');
    expect(open).not.toContain('scale-inferred');
    expect(open.filter((id) => id.startsWith('unobserved') || id.startsWith('wide-steps'))).toEqual([]);
  });

  it('stay with a query whatever else changes: ids are unlike one another and the same each time', () => {
    const ids = idsOf(asking);
    expect(new Set(ids).size).toBe(ids.length);
    expect(idsOf({ ...asking, title: 'Other' })).toEqual(ids);
  });
});
