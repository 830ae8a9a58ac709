import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Papa from 'papaparse';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ErratumPeople } from '../../../shared-core/desk.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { Reading } from '../../../shared-core/norms/reading.ts';
import { makeErratum, type ErratumRequest } from '../../../src-main/erratum/make-erratum.ts';
import { groupedProject } from '../../shared-core/norms/edition-projects.ts';
import { projectOf } from '../../shared-core/norms/small-projects.ts';

// Midpoint ranks of 1, 2, 3, 0, 4 of 10: 5, 20, 45, 60, 80; with one pupil moved 5, 25, 50, 60, 80.
const BEFORE = graded({ '4': [1, 2, 3, 0, 4], '=5': [2, 2, 2, 2, 2] }, '1.0', 2);
const AFTER = graded({ '4': [1, 3, 2, 0, 4], '=5': [2, 2, 2, 2, 2] }, '1.1', 3);

function graded(counts: Readonly<Record<string, readonly number[]>>, edition: string, cut: number): NormProject {
  const bare = groupedProject('grade', counts);
  return {
    ...bare,
    table: { ...bare.table, columns: [] },
    release: { ...bare.release, edition },
    cuts: [{ name: 'Support', score: cut, values: null }],
  };
}

const ROSTER = 'name,class,points\n"Ann, A",4,1\n=Ben,4,2\nCai,=5,2\nDot,4,4\nEva,9,1\n,4,1\n,,\n';

const READING: Reading = {
  layout: 'people',
  encoding: 'utf-8',
  separator: ',',
  decimalMark: '.',
  header: true,
  sheet: null,
  roles: ['name', 'class', 'points'].map((column) => ({ column, role: 'unused' })),
  missing: [],
  scale: null,
  decisions: { duplicateId: 'keep-all', raggedRow: 'keep-readable', blankGroup: 'keep', blankCluster: 'alone' },
};

let folder: string;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'normloom-erratum-'));
  await writeFile(join(folder, 'roster.csv'), ROSTER);
});
afterEach(() => rm(folder, { recursive: true, force: true }));

function request(change: Partial<ErratumRequest> = {}): ErratumRequest {
  const columns = { score: 'points', person: 'name', by: ['class'] };
  const roster = { path: join(folder, 'roster.csv'), file: 'roster.csv', reading: READING, columns };
  return { before: BEFORE, after: AFTER, roster, cut: '', folder: null, ...change };
}

async function peopleOf(change: Partial<ErratumRequest> = {}): Promise<ErratumPeople> {
  const made = await makeErratum(request(change));
  if (!made.ok) throw new Error(made.problem);
  if (made.value.people === null) throw new Error('nobody was followed');
  return made.value.people;
}

async function problemOf(change: Partial<ErratumRequest>): Promise<string> {
  const made = await makeErratum(request(change));
  return made.ok ? 'was made' : made.problem;
}

describe('an erratum', () => {
  it('tells the people of a roster whose rank or side of a cut score changes, and who cannot be found', async () => {
    const people = await peopleOf();
    expect(people).toMatchObject({ rows: 6, unchanged: 1, changed: 4, unplaced: 1, crossing: 2 });
    expect(people.changedFirst).toEqual([
      { row: 2, person: 'Ann, A', group: 'Grade 4', score: '1', changes: ['percentile rank 20 → 25'] },
      {
        row: 3,
        person: '=Ben',
        group: 'Grade 4',
        score: '2',
        changes: ['percentile rank 45 → 50', 'cut “Support” 2 → 3: now on its other side'],
      },
      {
        row: 4,
        person: 'Cai',
        group: 'Grade =5',
        score: '2',
        changes: ['percentile rank stays 50', 'cut “Support” 2 → 3: now on its other side'],
      },
      { row: 7, person: 'row 7', group: 'Grade 4', score: '1', changes: ['percentile rank 20 → 25'] },
    ]);
    expect(people.unplacedFirst).toEqual([
      { row: 6, person: 'Eva', problem: 'In both editions there is no table for 9.' },
    ]);
  });

  it('counts a cut the other way round where low scores are good, and takes a typed rank beside it', async () => {
    const low = (project: NormProject): NormProject => ({
      ...project,
      tally: project.tally && { ...project.tally, scale: { ...project.tally.scale, direction: 'low-is-good' } },
    });
    const [, , cai] = (await peopleOf({ before: low(BEFORE), after: low(AFTER) })).changedFirst;
    // 2 is not at or below a cut of 2 and then of 3 in turn: it is on the good side of both.
    expect(cai?.person).not.toBe('Cai');
    const sides = await peopleOf({ cut: '22.5' });
    expect(sides.changedFirst[0]?.changes).toEqual(['percentile rank 20 → 25', 'at or below 22.5 → above 22.5']);
    expect(sides.crossing).toBe(4);
  });

  it('writes its text and lists, in which no text of the user starts a formula', async () => {
    const into = join(folder, 'out');
    const made = await makeErratum(request({ folder: into }));
    expect(made).toMatchObject({
      ok: true,
      value: { files: [{ file: 'erratum.txt' }, { file: 'erratum.csv' }, { file: 'erratum-people.csv' }] },
    });
    const text = await readFile(join(into, 'erratum.txt'), 'utf8');
    expect(text).toContain('Ann, A (Grade 4, raw score 1): percentile rank 20 → 25\n');
    expect(text).toContain('2 change the side of a cut score.');
    expect(text).toContain('look again at every decision that was taken by one of them.');
    const rows = async (name: string) =>
      Papa.parse<readonly string[]>((await readFile(join(into, name), 'utf8')).slice(1), { skipEmptyLines: true }).data;
    expect(await rows('erratum.csv')).toEqual([
      ['group', 'raw-score', 'column', 'before', 'after'],
      ['Grade 4', '1', 'rank', '20', '25'],
      ['Grade 4', '2', 'rank', '45', '50'],
    ]);
    expect(await rows('erratum-people.csv')).toEqual([
      ['row', 'person', 'group', 'raw-score', 'what', 'before', 'after', 'remark'],
      ['2', 'Ann, A', 'Grade 4', '1', 'rank', '20', '25', ''],
      ['3', "'=Ben", 'Grade 4', '2', 'rank', '45', '50', ''],
      ['3', "'=Ben", 'Grade 4', '2', 'side of cut “Support”', 'good side', 'other side', 'cut score 2 → 3'],
      ['4', 'Cai', 'Grade =5', '2', 'side of cut “Support”', 'good side', 'other side', 'cut score 2 → 3'],
      ['7', 'row 7', 'Grade 4', '1', 'rank', '20', '25', ''],
      ['6', 'Eva', '9', '1', 'not found', '', '', 'In both editions there is no table for 9.'],
    ]);
  });

  it('without a roster names nobody, and tells tables and rows that only one edition has', async () => {
    const into = join(folder, 'out');
    const before = graded({ '4': [1, 2, 3], '5': [2, 2, 2] }, '1.0', 2);
    const after = graded({ '4': [1, 2, 3, 4], '6': [2, 2, 2, 2] }, '1.1', 2);
    const made = await makeErratum(request({ before, after, roster: null, folder: into }));
    expect(made).toMatchObject({ ok: true, value: { people: null } });
    expect((await readdir(into)).sort()).toEqual(['erratum.csv', 'erratum.txt']);
    const csv = await readFile(join(into, 'erratum.csv'), 'utf8');
    expect(csv).toContain('Grade 5,,table,printed,\r\n');
    expect(csv).toContain('Grade 6,,table,,printed\r\n');
    expect(csv).toMatch(/^Grade 4,3,rank,,\d+\r$/m);
  });

  it('refuses in a sentence what cannot be followed', async () => {
    expect(await problemOf({ cut: '101' })).toBe(
      'The rank that decides is a number from 0 to 100, such as 25, not “101”.',
    );
    const { roster } = request();
    if (roster === null) throw new Error('no roster');
    expect(await problemOf({ roster: { ...roster, columns: { ...roster.columns, by: [] } } })).toBe(
      'Choose a column of the list for each of grade.',
    );
    expect(await problemOf({ roster: { ...roster, path: join(folder, 'none.csv') } })).toContain(
      'roster.csv is not there any more',
    );
    expect(await problemOf({ after: projectOf([1, 2]) })).toContain('only between editions that group alike');
    expect(await problemOf({ before: { ...BEFORE, tally: null } })).toContain(
      'The earlier edition cannot be compared.',
    );
    await writeFile(join(folder, 'taken'), '');
    expect(await problemOf({ folder: join(folder, 'taken') })).toMatch(/^The erratum could not be written: /);
  });
});
