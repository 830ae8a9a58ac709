import { describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { DEFAULT_POLICY } from '../../../shared-core/norms/policy.ts';
import type { Policy } from '../../../shared-core/norms/policy-schema.ts';
import { openMustQueries, type Query } from '../../../shared-core/norms/queries.ts';
import { builtSet, projectOf, scaleTo, settledProject } from './small-projects.ts';

const settled = settledProject();
const OFFICE = 'Office rules, section 3';

function asked(project: NormProject): readonly Query[] {
  return builtSet(project).queries;
}

function idsOf(project: NormProject): readonly string[] {
  return asked(project).map(({ id }) => id);
}

function withPolicy<Key extends Exclude<keyof Policy, 'title'>>(
  key: Key,
  value: Policy[Key]['value'],
  project: NormProject = settled,
): NormProject {
  return { ...project, policy: { ...DEFAULT_POLICY, [key]: { value, source: OFFICE } } };
}

/** Grade 4 and grade 10 with counts of their own, one form. */
function twoGrades(four: readonly number[], ten: readonly number[], names: readonly [string, string] = ['4', '10']) {
  if (settled.tally === null) throw new Error('no tally');
  const [cell] = settled.tally.cells;
  if (cell === undefined) throw new Error('no cell');
  const cells = [four, ten].map((counts, index) => ({ ...cell, values: [names[index] ?? '', 'A'], counts }));
  return { ...settled, tally: { ...settled.tally, scale: scaleTo(four.length - 1), cells } };
}

const evenly = (each: number): readonly number[] => Array.from({ length: 21 }, () => each);

function withColumns(project: NormProject, ...columns: NormProject['table']['columns']): NormProject {
  return { ...project, table: { ...project.table, columns } };
}

describe('the thresholds of a policy', () => {
  it.each<[string, NormProject, string, string]>([
    ['smallest-must', withPolicy('smallestMust', 421), 'small-group:["4"]', 'must'],
    ['smallest-should', withPolicy('smallestShould', 421), 'small-group:["4"]', 'should'],
    ['most-left-out', withPolicy('mostLeftOut', 0.002), 'many-left-out', 'should'],
    ['crowded-end', withPolicy('crowdedEnd', 0.04), 'crowded-lowest:["4"]', 'should'],
    ['wide-step', withPolicy('wideStep', 4.7), 'wide-steps:["4"]', 'note'],
    ['least-effective', withPolicy('leastEffective', 1, weighted()), 'uneven-weights:["4"]', 'should'],
  ])('decide what is asked: %s', (_, project, id, weight) => {
    expect(idsOf({ ...project, policy: DEFAULT_POLICY })).not.toContain(id);
    const query = asked(project).find((one) => one.id === id);
    expect(query?.weight).toBe(weight);
    expect(query?.why).toContain('Policy: ');
    expect(query?.why).toContain(`(${OFFICE}).`);
  });

  it('keep the answer that was given under another threshold', () => {
    const release = { ...settled.release, answers: [{ query: 'small-group:["4"]', reason: 'Small island.' }] };
    const query = asked({ ...withPolicy('smallestShould', 500), release }).find(({ id }) => id === 'small-group:["4"]');
    expect(query?.answer).toBe('Small island.');
  });

  it('want a way of rounding and of printing the ends', () => {
    expect(idsOf(withPolicy('rounding', 'half-up'))).toEqual([]);
    expect(asked(withPolicy('rounding', 'half-even'))).toMatchObject([{ id: 'policy-rounding', weight: 'must' }]);
    expect(idsOf(withPolicy('ends', 'signs'))).toEqual([]);
    expect(asked(withPolicy('ends', 'held'))).toMatchObject([{ id: 'policy-ends', weight: 'must' }]);
    expect(asked(withPolicy('ends', 'held'))[0]?.why).toContain(`Policy: held, as in 1 (${OFFICE}).`);
  });

  it('require what a reader must be told', () => {
    const untold = (change: Partial<NormProject['groups']['documentation']>): NormProject => ({
      ...settled,
      groups: { ...settled.groups, documentation: { ...settled.groups.documentation, ...change } },
    });
    const fields = ['population', 'sampling', 'participation', 'testDates', 'weighting'] as const;
    for (const field of fields) expect(idsOf(untold({ [field]: ' ' }))).toEqual(['documentation']);
    expect(idsOf(withPolicy('documentation', ['sampling'], untold({ population: '' })))).toEqual([]);
    expect(idsOf(withPolicy('documentation', ['sampling'], untold({ sampling: '' })))).toEqual(['documentation']);
    expect(idsOf(withPolicy('documentation', ['test-dates'], untold({ testDates: '' })))).toEqual(['documentation']);
  });

  it('require that error of sampling is printed, as a column or in the picture', () => {
    const wanted = withPolicy('documentation', ['precision']);
    const bare = { ...wanted, sheet: { ...wanted.sheet, ogive: false } };
    expect(idsOf(wanted)).toEqual([]);
    expect(asked(bare)).toMatchObject([{ id: 'no-precision', station: 'table', weight: 'should' }]);
    expect(idsOf(withColumns(bare, 'interval'))).toEqual([]);
    expect(idsOf(withColumns(bare, 'standard-error'))).toEqual([]);
    expect(idsOf({ ...bare, policy: DEFAULT_POLICY })).toEqual([]);
  });
});

describe('queries of age', () => {
  const dated = (testDates: string, date = '2026-06-15', project = settled): NormProject => ({
    ...project,
    groups: { ...project.groups, documentation: { ...project.groups.documentation, testDates } },
    release: { ...project.release, date },
  });

  it('ask about norms older than the policy allows, from the last year of testing to the edition', () => {
    expect(idsOf(dated('May 2016'))).toEqual([]);
    expect(asked(dated('May 2015'))).toMatchObject([
      {
        id: 'stale-norms',
        station: 'release',
        weight: 'should',
        lead: 'The group was tested in 2015, 11 years before this edition.',
      },
    ]);
    expect(idsOf(dated('autumn 2012 to spring 2018'))).toEqual([]);
    expect(idsOf(withPolicy('oldestYears', 7, dated('2012–2018')))).toEqual(['stale-norms']);
  });

  it('say nothing where no year can be read', () => {
    expect(idsOf(dated('in spring, by 120151 people'))).toEqual([]);
    expect(idsOf(dated('May 2001', ''))).toEqual(['edition-date']);
  });
});

describe('queries of scores', () => {
  it('ask about gaps between scores that people obtained, longer than the policy allows', () => {
    const gap = (from: number, to: number) =>
      twoGrades(
        evenly(20).map((count, score) => (score >= from && score <= to ? 0 : count)),
        evenly(20),
      );
    const gaps = (project: NormProject) => asked(project).filter(({ id }) => id.startsWith('gap'));
    expect(gaps(gap(5, 6))).toEqual([]);
    expect(gaps(gap(5, 7))).toMatchObject([{ id: 'gap:["4"]', station: 'table', weight: 'should', group: '["4"]' }]);
    expect(gaps(gap(5, 7))[0]?.lead).toBe('Nobody in Grade 4 stands from 5 to 7, though others do on both sides.');
    expect(gaps(withPolicy('gapNeighbours', 21, gap(5, 7)))).toEqual([]);
    expect(gaps(withPolicy('gapNeighbours', 20, gap(5, 7)))).toHaveLength(1);
    expect([gaps(gap(0, 7)), gaps(gap(12, 20))]).toEqual([[], []]);
    expect(gaps(withPolicy('longestGap', 3, gap(5, 7)))).toEqual([]);
    expect(gaps(withPolicy('longestGap', 1, gap(5, 6)))).toHaveLength(1);
  });

  it('ask about small cells where counts are printed; nobody at a score is no cell', () => {
    const few = twoGrades(evenly(20).with(3, 2).with(9, 0), evenly(20));
    expect(idsOf(few).filter((id) => id.startsWith('small-cells'))).toEqual([]);
    const [query, ...others] = asked(withColumns(few, 'count')).filter(({ id }) => id.startsWith('small-cells'));
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'small-cells:["4"]', station: 'table', weight: 'should' });
    expect(query?.lead).toBe('The printed counts of Grade 4 tell of fewer than 3 pupils at 3.');
    expect(idsOf(withColumns(withPolicy('smallestCell', 2, few), 'count'))).not.toContain('small-cells:["4"]');
    expect(idsOf(withColumns(settled, 'count'))).toEqual([]);
  });

  it('note bands of derived scores that no raw score reaches, where they are printed', () => {
    const coarse = projectOf([100, 100, 100]);
    const unreached = (project: NormProject) => asked(project).filter(({ id }) => id.startsWith('unreached'));
    expect(unreached(withColumns(coarse, 't'))).toEqual([]);
    // Midpoint ranks 16.7, 50 and 83.3: z −0.97, 0 and 0.97, stens 4, 6 and 7.
    expect(unreached(withColumns(coarse, 'stanine', 'sten')).map(({ id, weight, lead }) => [id, weight, lead])).toEqual(
      [
        ['unreached-stanine:[]', 'note', 'No raw score of All pupils gives stanine 1, 2, 4, 6, 8 or 9.'],
        ['unreached-sten:[]', 'note', 'No raw score of All pupils gives sten 1, 2, 3, 5, 8, 9 and 1 more.'],
      ],
    );
    expect(unreached(withColumns(settled, 'stanine'))).toEqual([]);
  });
});

describe('queries of groups in an order', () => {
  const rising = evenly(20).map((count, score) => count + score);
  const falling = rising.toReversed();
  const reversals = (project: NormProject) => asked(project).filter(({ id }) => id.startsWith('reversal'));

  it('ask about a later group that does worse', () => {
    expect(reversals(twoGrades(falling, rising))).toEqual([]);
    const [query, ...others] = reversals(twoGrades(rising, falling));
    expect(others).toEqual([]);
    expect(query).toMatchObject({
      id: 'reversal-level:grade:["10"]',
      station: 'groups',
      weight: 'should',
      group: '["10"]',
    });
    expect(query?.lead).toBe('Grade 10 does worse than Grade 4: mean 8.78 after 11.22.');
  });

  it('ask about the median where the mean goes the other way', () => {
    const low = [0, 0, 100, 100, 100, 0, 0, 0, 0, 0];
    const split = [0, 151, 0, 0, 0, 0, 0, 0, 0, 149];
    expect(reversals(twoGrades(low, split))[0]?.lead).toBe('Grade 10 does worse than Grade 4: median 1.00 after 3.00.');
  });

  it('turn with the direction of the scale', () => {
    const turned = (project: NormProject): NormProject => ({
      ...project,
      tally: project.tally && { ...project.tally, scale: { ...project.tally.scale, direction: 'low-is-good' } },
    });
    expect(reversals(turned(twoGrades(rising, falling)))).toEqual([]);
    expect(reversals(turned(twoGrades(falling, rising)))).toHaveLength(1);
  });

  it('ask about scores that rank higher in a later group, beyond the policy', () => {
    // More people at both ends: better on the whole, yet 4.5, 10.9 and 14.5 stand against 2.4, 7.1 and 11.9.
    const spread = evenly(20).with(0, 50).with(20, 120);
    const pair = twoGrades(evenly(20), spread);
    const [query, ...others] = reversals(pair);
    expect(others).toEqual([]);
    expect(query).toMatchObject({ id: 'reversal-ranks:grade:["10"]', station: 'table', weight: 'should' });
    expect(query?.lead).toBe('At 0, 1 or 2 the same score ranks higher in Grade 10 than in Grade 4.');
    expect(reversals(withPolicy('rankReversal', 10, pair))).toEqual([]);
  });

  it('say nothing of groups that have no order, or twice the same number', () => {
    expect(reversals(twoGrades(rising, falling, ['north', 'south']))).toEqual([]);
    expect(reversals(twoGrades(rising, falling, ['4', 'Grade 4b']))).toEqual([]);
    expect(reversals(twoGrades(rising, falling, ['Year 4', 'Year 5'])).map(({ id }) => id)).toEqual([
      'reversal-level:grade:["Year 5"]',
    ]);
  });

  it('compare only groups that are alike otherwise', () => {
    const by = { ...settled, groups: { ...settled.groups, by: ['grade', 'form'] } };
    const cells = settled.tally?.cells.map((cell) => ({
      ...cell,
      counts: cell.values[0] === '4' && cell.values[1] === 'A' ? rising : evenly(20),
    }));
    const project = { ...by, tally: settled.tally && { ...settled.tally, cells: cells ?? [] } };
    expect(reversals(project).map(({ id }) => id)).toEqual(['reversal-level:grade:["10","A"]']);
  });
});

describe('queries of adjusted ranks', () => {
  it('note which ranks are adjusted', () => {
    const project = { ...settled, adjustments: [{ values: ['4'], score: 3, to: '18', reason: 'Board', by: 'M. Orr' }] };
    expect(asked(project)).toMatchObject([{ id: 'adjusted:["4"]', station: 'table', weight: 'note', group: '["4"]' }]);
    expect(asked(project)[0]?.lead).toBe('Ranks of Grade 4 are adjusted by hand at 3.');
    expect(builtSet(project).status).toBe('released');
  });
});

describe('the status of a set', () => {
  it('is a draft while a query that must be answered is open', () => {
    const bare = { ...settled, sheet: { ...settled.sheet, cautions: '' } };
    const answered = {
      ...bare,
      release: { ...bare.release, answers: [{ query: 'no-cautions', reason: 'On the cover.' }] },
    };
    const undated = { ...settled, release: { ...settled.release, date: '' } };
    expect([settled, bare, answered, undated].map((project) => builtSet(project).status)).toEqual([
      'released',
      'draft',
      'released',
      'released',
    ]);
    expect(openMustQueries(asked(bare)).map(({ id }) => id)).toEqual(['no-cautions']);
    expect(openMustQueries(asked(answered))).toEqual([]);
  });
});

function weighted(): NormProject {
  if (settled.tally === null) throw new Error('no tally');
  const cells = settled.tally.cells.map((cell) => ({
    ...cell,
    weights: cell.counts.map(() => '110'),
    squares: cell.counts.map(() => '1300'),
  }));
  return { ...settled, tally: { ...settled.tally, weightDecimals: 1, cells } };
}
