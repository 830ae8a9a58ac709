import { describe, expect, it } from 'vitest';
import { compareCommand } from '../../../src-main/command-line/compare-command.ts';
import { readCommand, type Command } from '../../../src-main/command-line/command.ts';
import { erratumCommand } from '../../../src-main/command-line/erratum-command.ts';
import type { Outcome } from '../../../src-main/command-line/outcome.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { logLinear, projectOf, scaleTo, settledProject, smoothedBy } from '../../shared-core/norms/small-projects.ts';
import { fileForTest, folderForTest, SAMPLE_PROJECT } from './run-normloom.ts';

function commandOf(...words: readonly string[]): Command {
  const read = readCommand(words);
  if (!read.ok) throw new Error(read.problem);
  return read.value;
}

function problemOf(...words: readonly string[]): string {
  const read = readCommand(words);
  return read.ok ? `understood as ${read.value.kind}` : read.problem;
}

function projectFile(name: string, project: NormProject): string {
  return fileForTest(name, projectToText(project));
}

async function ran(...words: readonly string[]): Promise<Outcome> {
  const command = commandOf(...words);
  switch (command.kind) {
    case 'compare':
      return compareCommand(command.paths, command.format);
    case 'erratum':
      return erratumCommand(command.paths, command.options);
    default:
      throw new Error(command.kind);
  }
}

async function resultOf(...words: readonly string[]): Promise<string> {
  const outcome = await ran(...words);
  if (outcome.kind !== 'done') throw new Error(outcome.problem);
  expect(outcome.remarks).toEqual([]);
  return String(outcome.result);
}

const OLD = projectOf([1, 2, 3, 0, 4]);
const NEW = projectOf([1, 3, 2, 0, 4]);

describe('the words of compare and erratum', () => {
  it('name two projects, the earlier one first', () => {
    expect(commandOf('compare', 'a.normloom', 'b.normloom')).toEqual({
      kind: 'compare',
      paths: { before: 'a.normloom', after: 'b.normloom' },
      format: 'text',
    });
    expect(commandOf('erratum', 'a.normloom', 'b.normloom')).toEqual({
      kind: 'erratum',
      paths: { before: 'a.normloom', after: 'b.normloom' },
      options: { roster: null, cut: null },
    });
    expect(problemOf('compare', 'a')).toMatch(/^compare takes two projects, the earlier one first, not 1\./);
    expect(problemOf('erratum', 'a', 'b', 'c')).toMatch(/^erratum takes two projects, the earlier one first, not 3\./);
    expect(commandOf('compare', '--help').kind).toBe('help');
  });

  it('are refused where an option is wrong', () => {
    const erratum = (...words: readonly string[]): string => problemOf('erratum', 'a', 'b', ...words);
    expect(problemOf('compare', 'a', 'b', '--format', 'csv')).toBe('--format knows text, json; not "csv".');
    expect(erratum('--cut', '25')).toBe('--cut needs --roster FILE, the list of people.');
    expect(erratum('--score', 'raw')).toBe('--score needs --roster FILE, the list of people.');
    expect(erratum('--roster', 'r.csv')).toBe('Name the column of raw scores with --score COL.');
    expect(erratum('--roster', 'r.csv', '--score', 'x', '--person', 'x')).toContain('given two kinds of work');
    for (const cut of ['101', '-1', 'low', '']) {
      expect(erratum('--roster', 'r.csv', '--score', 'x', `--cut=${cut}`)).toContain('--cut is a percentile rank');
    }
  });
});

describe('compare', () => {
  it('finds no difference between a project and itself', async () => {
    expect(await resultOf('compare', SAMPLE_PROJECT, SAMPLE_PROJECT)).toContain('\nNo printed cell differs. ');
  });

  it('tells differences as text and as JSON, the same each time', async () => {
    const words = ['compare', projectFile('old.normloom', OLD), projectFile('new.normloom', NEW)];
    const text = await resultOf(...words);
    expect(text).toContain(`\n${cellsIn(text)} cells in 2 rows changed.`);
    expect(text).toContain('  raw score 1: percentile rank 20 → 25');
    expect(await resultOf(...words)).toBe(text);
    const file: unknown = JSON.parse(await resultOf(...words, '--format', 'json'));
    expect(file).toMatchObject({
      same: false,
      before: { title: 'Ostrey Vale spelling (invented)', edition: '1.0' },
      counts: { 'rows-changed': 2, 'groups-compared': 1, 'cells-compared': 15 },
      groups: [{ kind: 'changed', rows: [{ 'score-text': '1' }, { 'score-text': '2' }] }],
    });
  });

  it.each<[string, NormProject, string]>([
    ['a project without a tally', newProject('Nothing yet'), 'new.normloom: No cohort has been read yet.'],
    ['one that cannot be printed', smoothedBy(projectOf([1, 0, 0, 2]), logLinear(9)), 'cannot be smoothed as chosen'],
  ])('refuses %s', async (_, project, problem) => {
    const outcome = await ran('compare', projectFile('old.normloom', OLD), projectFile('new.normloom', project));
    expect(outcome).toMatchObject({ kind: 'refused' });
    expect(outcome).toHaveProperty('problem', expect.stringContaining(problem));
  });

  it('refuses a file that is not there or is no project', async () => {
    const old = projectFile('old.normloom', OLD);
    const missing = await ran('compare', `${folderForTest()}/none.normloom`, old);
    expect(missing).toMatchObject({ kind: 'refused' });
    expect(missing).toHaveProperty('problem', expect.stringMatching(/^none\.normloom could not be read: /));
    const outcome = await ran('compare', old, fileForTest('b.normloom', '{}'));
    expect(outcome).toHaveProperty('problem', expect.stringContaining('b.normloom: This is not a Normloom project.'));
  });
});

/** Cells that the rows of a comparison's text list. */
function cellsIn(text: string): number {
  return text
    .split('\n')
    .reduce((sum, line) => (line.includes('raw score ') ? sum + line.split(' → ').length - 1 : sum), 0);
}

describe('erratum', () => {
  const ROSTER = 'name;points\nAnn;1\nBen;4\n\n;2\nCai;7\n';

  it('tells whom of a roster it concerns, in the order of the roster', async () => {
    const text = await resultOf(
      ...['erratum', projectFile('old.normloom', OLD), projectFile('new.normloom', NEW)],
      ...['--roster', fileForTest('r.csv', ROSTER), '--score', 'points', '--person', 'name', '--cut', '22.5'],
    );
    expect(text).toContain(
      '  4 rows: 1 unchanged, 2 changed, 1 not found in both editions; 1 changes the side of 22.5.\n',
    );
    expect(text).toMatch(
      /Ann \(All pupils, raw score 1\): percentile rank 20 → 25;.* at or below 22\.5 → above 22\.5\n/,
    );
    expect(text).toContain('  row 5 (All pupils, raw score 2): percentile rank 45 → 50');
    expect(text).toContain('  Cai: In both editions 7 lies above the scale, 0 to 4.\n');
    expect(text).not.toContain('Ben');
  });

  it('reads group values from columns called as in the project, or from those named', async () => {
    const project = settledProject();
    const wider = { ...project, table: { ...project.table, decimals: 1 as const } };
    const words = ['erratum', projectFile('old.normloom', project), projectFile('new.normloom', wider)];
    const first = fileForTest('r.csv', 'pupil,grade,score\nA1,4,3\nA2,10,20\nA3,11,20\n');
    const text = await resultOf(...words, '--roster', first, '--score', 'score', '--person', 'pupil');
    expect(text).toContain('3 rows: 0 unchanged, 2 changed, 1 not found in both editions.');
    expect(text).toContain('  A3: In both editions there is no table for 11.\n');
    const second = fileForTest('r.csv', 'pupil,class,score\nA1,4,3\nA2,10,20\nA3,11,20\n');
    const named = ['--roster', second, '--score', 'score', '--person', 'pupil'];
    expect(await resultOf(...words, ...named, '--by', 'class')).toBe(text);
    expect(await ran(...words, ...named)).toMatchObject({ kind: 'wrong-usage' });
    expect(await ran(...words, ...named, '--by', 'class,form')).toMatchObject({ kind: 'wrong-usage' });
  });

  it('names nobody where a file is refused', async () => {
    const small = projectFile('old.normloom', projectOf([1, 2], scaleTo(1)));
    const outcome = await ran('erratum', small, small, '--roster', `${folderForTest()}/none.csv`, '--score', 'x');
    expect(outcome).toMatchObject({ kind: 'refused', remarks: [] });
  });
});
