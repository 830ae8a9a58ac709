import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { classToText } from '../../../shared-core/class/class-file-text.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { classCommand } from '../../../src-main/command-line/class-command.ts';
import { readCommand } from '../../../src-main/command-line/command.ts';
import type { Outcome } from '../../../src-main/command-line/outcome.ts';
import { sampleFile } from '../../shared-core/pages/sample-class.ts';
import { everythingIn } from '../press/class/pressed-class.ts';
import { fileForTest, folderForTest, normloom, SAMPLE_PROJECT } from './run-normloom.ts';

/** Invented names, one that begins like a formula among them, and no word of the program. */
const PEOPLE: readonly (readonly [string, string])[] = [
  ['Quillan Thornevar', '31'],
  ['=Brisa Mokkelund', '18'],
  ['Ottoline Skarsgrove', '27'],
  ['Zebedee Harrowmint', '40'],
  ['Ysolde Pennyfarrow', '0'],
  ['Corbin Eskeleth', 'absent'],
];
const PARTS = PEOPLE.flatMap(([name]) => name.replace('=', '').split(' '));
const LIST = listOf(PEOPLE);
const REPORT = ['class-report.pdf', 'class.xlsx', 'class.csv', 'class-certificate.json'];

function listOf(rows: readonly (readonly string[])[], heading = 'Name,Score'): string {
  return [heading, ...rows.map((row) => row.join(','))].join('\n');
}

/** The command as the words of a shell ask for it, in this process. */
async function run(...words: readonly string[]): Promise<Outcome> {
  const command = readCommand(['class', ...words]);
  if (!command.ok) return { kind: 'wrong-usage', problem: command.problem };
  if (command.value.kind !== 'class') throw new Error('another command');
  return classCommand(command.value.path, command.value.options);
}

function filesOf(outcome: Outcome): readonly string[] {
  if (outcome.kind !== 'done') throw new Error(JSON.stringify(outcome));
  return String(outcome.result)
    .split('\n')
    .slice(0, -1)
    .map((line) => /^[0-9a-f]{64} {2}(.+)$/.exec(line)?.[1] ?? line);
}

async function refusalOf(outcome: Promise<Outcome>): Promise<{ readonly problem: string; readonly remarks: string }> {
  const ended = await outcome;
  if (ended.kind !== 'refused') throw new Error(JSON.stringify(ended));
  return { problem: ended.problem, remarks: ended.remarks.join('\n') };
}

/** The sample with no table named for classes. */
let undecided = '';
beforeAll(() => {
  const read = projectFromText(readFileSync(SAMPLE_PROJECT, 'utf8'));
  if (!read.ok) throw new Error(read.problem);
  undecided = projectToText({ ...read.project, classTable: null });
});

describe('class', () => {
  it('presses the same bytes in two time zones and languages, and names nobody under codes but in the key', async () => {
    const list = fileForTest('list.csv', LIST);
    const pressed = [
      ['Pacific/Kiritimati', 'de_DE.UTF-8'],
      ['America/Los_Angeles', 'tr_TR.UTF-8'],
    ].map(([zone = '', language = '']) => {
      const folder = folderForTest();
      const words = [
        'class',
        list,
        '--table',
        SAMPLE_PROJECT,
        '--into',
        folder,
        '--codes',
        '--seed',
        '77',
        '--slips',
        '4',
      ];
      const ran = normloom(words, { TZ: zone, LANG: language, LC_ALL: language });
      return { folder, ran };
    });
    const [first, second] = pressed;
    if (first === undefined || second === undefined) throw new Error('nothing pressed');
    expect(first.ran.exit).toBe(0);
    expect(second.ran).toEqual(first.ran);
    expect(first.ran.stdout.match(/^[0-9a-f]{64} {2}/gm)).toHaveLength(6);
    expect(first.ran.stderr).toContain('key-to-codes.csv tells who has which code.');
    for (const part of PARTS) expect(`${first.ran.stdout}${first.ran.stderr}`).not.toContain(part);
    const names = readdirSync(first.folder);
    expect(names.toSorted()).toEqual([...REPORT, 'slips.pdf', 'key-to-codes.csv'].toSorted());
    for (const name of names) {
      const bytes = readFileSync(join(first.folder, name));
      expect(readFileSync(join(second.folder, name)).equals(bytes), name).toBe(true);
      const all = await everythingIn(bytes);
      expect(
        PARTS.filter((part) => all.includes(part)),
        name,
      ).toEqual(name.includes('key') ? PARTS : []);
    }
  });

  it('draws other codes each time where no seed is given', async () => {
    const list = fileForTest('list.csv', listOf(Array.from({ length: 24 }, (_, index) => [`P${index}`, `${index}`])));
    const keys: string[] = [];
    for (let time = 0; time < 2; time += 1) {
      const folder = folderForTest();
      filesOf(await run(list, '--table', SAMPLE_PROJECT, '--into', folder, '--codes'));
      keys.push(readFileSync(join(folder, 'key-to-codes.csv'), 'utf8'));
    }
    expect(keys[0]).not.toBe(keys[1]);
  });

  it('writes a report with names: formulas stay texts, and slips are made only where they are asked for', async () => {
    const folder = folderForTest();
    const words = [fileForTest('list.csv', LIST), '--table', SAMPLE_PROJECT, '--into', folder, '--title', 'Class 5a'];
    expect(filesOf(await run(...words, '--date', '2026-06-15', '--language', 'de'))).toEqual(REPORT);
    const csv = readFileSync(join(folder, 'class.csv'), 'utf8');
    expect(csv).toContain("\r\n'=Brisa Mokkelund,");
    expect(csv).toMatch(/Corbin Eskeleth,,.*absent/);
    expect(await everythingIn(readFileSync(join(folder, 'class.xlsx')))).not.toMatch(/<f[ >]/);
    const certificate = readFileSync(join(folder, 'class-certificate.json'), 'utf8');
    expect(certificate).toContain('"title": "Class 5a"');
    expect(certificate).toContain('"date": "2026-06-15"');
    expect(filesOf(await run(...words, '--slips', '2'))).toContain('slips.pdf');
    // What an earlier press left and this one would not replace may show who is who.
    const { problem } = await refusalOf(run(...words, '--codes'));
    expect(problem).toMatch(/^The folder holds slips\.pdf of an earlier press/);
  });

  it('shares a summary in which no small cell and no pupil stands', async () => {
    const folder = folderForTest();
    const many = Array.from({ length: 30 }, (_, index): readonly [string, string] => [
      PEOPLE[index]?.[0] ?? `Pupil-${index}`,
      index < 28 ? String(index + 5) : 'absent',
    ]);
    const list = fileForTest('list.csv', listOf(many));
    expect(filesOf(await run(list, '--table', SAMPLE_PROJECT, '--into', folder, '--summary'))).toEqual(REPORT);
    for (const name of readdirSync(folder)) {
      const all = await everythingIn(readFileSync(join(folder, name)));
      expect(
        [...PARTS, 'Pupil-'].filter((part) => all.includes(part)),
        name,
      ).toEqual([]);
    }
    const lines = readFileSync(join(folder, 'class.csv'), 'utf8').split('\r\n');
    expect(lines[0]).toMatch(/^\uFEFF?group,ranks-1-24,/);
    expect(lines).toHaveLength(3);
    // The sample's policy tells no count below 3; of the two absent the count is hidden.
    const cells = lines[1]?.split(',').slice(1, -1) ?? [];
    expect(cells.filter((cell) => cell !== 'hidden' && cell !== '0' && Number(cell) < 3)).toEqual([]);
    expect(cells[5]).toBe('hidden');
  });

  it('puts a class in order within itself without a table, and has no slips then', async () => {
    const folder = folderForTest();
    const outcome = await run(fileForTest('list.csv', LIST), '--into', folder, '--slips', '1', '--low-is-good');
    expect(filesOf(outcome)).toEqual(REPORT);
    expect(outcome).toMatchObject({
      remarks: expect.arrayContaining([expect.stringContaining('no slips')]) as unknown,
    });
    const csv = readFileSync(join(folder, 'class.csv'), 'utf8');
    expect(csv.split('\r\n').find((line) => line.includes('Pennyfarrow'))).toMatch(/^Ysolde Pennyfarrow,0,1,/);
  });

  it('reads a published table, and tells what is wrong with one by its lines', async () => {
    const list = fileForTest('list.csv', listOf([...PEOPLE.slice(0, 3)]));
    const table = fileForTest('Reading test.txt', '0-17 20\n18-26 45\n27-30 70\n31-40 95\n');
    const folder = folderForTest();
    filesOf(await run(list, '--table', table, '--into', folder));
    const csv = readFileSync(join(folder, 'class.csv'), 'utf8');
    const ranks = PEOPLE.slice(0, 3).map(
      ([name]) =>
        csv
          .split('\r\n')
          .find((line) => line.includes(name.slice(1)))
          ?.split(',')[2],
    );
    expect(ranks).toEqual(['95', '45', '70']);
    const gap = fileForTest('gap.txt', '0-17 20\n19-40 95\n');
    const { problem, remarks } = await refusalOf(run(list, '--table', gap, '--into', folder));
    expect(problem).toBe('gap.txt cannot be read as a published table. Correct it, and try again.');
    expect(remarks).toMatch(/^gap\.txt, line 2: .*18/m);
  });

  it('takes none of several tables where nothing says which, and the one that list or option names', async () => {
    const project = fileForTest('undecided.normloom', undecided);
    const list = fileForTest('list.csv', LIST);
    const into = join(folderForTest(), 'out');
    const { problem, remarks } = await refusalOf(run(list, '--table', project, '--into', into));
    expect(problem).toMatch(/^1 question is open, so that nothing was written\. Correct list\.csv, name the table, or/);
    expect(remarks).toContain('no group is named, and there are several tables.');
    expect(remarks).toContain('There are tables for Grade 4 (--group 4), Grade 5 (--group 5), Grade 6 (--group 6).');
    expect(existsSync(into)).toBe(false);

    const rankOf = async (...words: readonly string[]): Promise<string> => {
      const folder = folderForTest();
      filesOf(await run(...words, '--into', folder));
      const line = readFileSync(join(folder, 'class.csv'), 'utf8').split('\r\n')[1] ?? '';
      return line.split(',').find((cell) => /^\d+\u2020?$/.test(cell) && cell !== '31' && cell.length > 1) ?? '';
    };
    const [four, six] = [
      await rankOf(list, '--table', project, '--group', '4'),
      await rankOf(list, '--table', project, '--group', 'Grade 6'),
    ];
    expect(Number(four)).toBeGreaterThan(Number(six));
    const named = fileForTest('named.csv', listOf([['Quillan Thornevar', '31', '6']], 'Name,Score,Grade'));
    expect(await rankOf(named, '--table', project)).toBe(six);
    const unknown = await refusalOf(run(list, '--table', project, '--group', '9', '--into', into));
    expect(unknown.problem).toMatch(/^There is no table for the group "9"\. There are tables for Grade 4/);
  });

  it('asks about what does not fit, by lines and without names, and writes nothing', () => {
    const rows = [...PEOPLE, ['Wilmot Ashgarden', '41'], ['Quillan Thornevar', '12'], ['Nerys Oakhollow', '']];
    const into = join(folderForTest(), 'out');
    const list = fileForTest('list.csv', listOf(rows));
    const ran = normloom(['class', list, '--table', SAMPLE_PROJECT, '--into', into]);
    expect([ran.exit, ran.stdout]).toEqual([3, '']);
    expect(ran.stderr).toMatch(/^Line 8: .*41/m);
    expect(ran.stderr).toMatch(/^Lines 2 and 9 /m);
    expect(ran.stderr).toMatch(/^Line 10: /m);
    expect(ran.stderr).toContain('normloom: 3 questions are open, so that nothing was written.');
    for (const part of PARTS) expect(ran.stderr).not.toContain(part);
    expect(existsSync(into)).toBe(false);
  });

  it('takes columns by their names, and says which there are', async () => {
    const odd = ['Nr;Kandidat;Vorwahl;Wert;Probe', '1;Thornevar;Quillan;31;3', '2;Mokkelund;Brisa;18;4'].join('\n');
    const list = fileForTest('odd.csv', odd);
    const folder = folderForTest();
    filesOf(
      await run(list, '--table', SAMPLE_PROJECT, '--into', folder, '--name', 'vorwahl,Kandidat', '--score', 'Wert'),
    );
    expect(readFileSync(join(folder, 'class.csv'), 'utf8')).toContain('\r\nThornevar Quillan,31,');
    const plain = fileForTest('list.csv', LIST);
    const { problem } = await refusalOf(run(plain, '--into', folder, '--score', 'Wert'));
    expect(problem).toBe('list.csv: There is no column "Wert". The heading has "Name", "Score".');
    expect((await refusalOf(run(plain, '--into', folder, '--score', 'Score', '--name', 'Score'))).problem).toContain(
      'is named twice',
    );
  });

  it('presses a class file by its own choices, and others where they are given', async () => {
    const file = { ...sampleFile({ entries: [12, 20, 31, 'absent'] }), title: 'Class 5b' };
    const path = fileForTest('5b.normclass', classToText({ ...file, sharing: { as: 'codes', seed: 4 } }));
    const [own, again, other] = [folderForTest(), folderForTest(), folderForTest()];
    expect(filesOf(await run(path, '--into', own))).toContain('key-to-codes.csv');
    expect(await run(path, '--into', again)).toEqual(await run(path, '--into', own));
    filesOf(await run(path, '--into', other, '--codes', '--seed', '5'));
    const key = (folder: string): string => readFileSync(join(folder, 'key-to-codes.csv'), 'utf8');
    expect(key(again)).toBe(key(own));
    expect(key(other)).not.toBe(key(own));
    expect(await run(path, '--into', own, '--score', 'Score')).toMatchObject({
      kind: 'wrong-usage',
      problem: expect.stringContaining('columns are known') as unknown,
    });
    expect((await refusalOf(run(fileForTest('list.csv', LIST), '--table', path, '--into', own))).problem).toContain(
      'Put it in place of the list',
    );
  });

  it.each<readonly [string, readonly string[], string]>([
    ['no folder', [], '--into FOLDER'],
    ['two ways of sharing', ['--into', 'x', '--codes', '--summary'], 'Give one of them'],
    ['slips of a summary', ['--into', 'x', '--summary', '--slips', '2'], 'it has no slips'],
    ['five slips', ['--into', 'x', '--slips', '5'], '1 to 4'],
    ['a seed without codes', ['--into', 'x', '--seed', '5'], 'Give --codes with it'],
    ['half a seed', ['--into', 'x', '--codes', '--seed', '0.5'], 'whole number'],
    ['no day', ['--into', 'x', '--date', '2026-02-30'], 'a day such as'],
    ['no language', ['--into', 'x', '--language', 'tlh'], '--language knows en, de, es, fr'],
    ['a group without a table', ['--into', 'x', '--group', '5'], 'needs --table'],
  ])('knows wrong usage: %s', async (_, words, problem) => {
    const outcome = await run(fileForTest('list.csv', LIST), ...words);
    expect(outcome).toEqual({ kind: 'wrong-usage', problem: expect.stringContaining(problem) as unknown });
  });

  it('refuses what is no list and no table with a sentence', async () => {
    const folder = folderForTest();
    const list = fileForTest('list.csv', LIST);
    writeFileSync(join(folder, 'empty.csv'), '');
    mkdirSync(join(folder, 'a-folder'));
    const into = ['--into', join(folder, 'out')];
    for (const [words, problem] of [
      [[join(folder, 'absent.csv'), ...into], 'is not there any more'],
      [[join(folder, 'empty.csv'), ...into], 'is empty'],
      [[join(folder, 'a-folder'), ...into], 'is a folder'],
      [[fileForTest('none.csv', 'Name,Score\n'), ...into], 'cannot be read as a class list'],
      [[list, '--table', join(folder, 'absent.normloom'), ...into], 'could not be read'],
      [[list, '--table', join(folder, 'absent.txt'), ...into], 'could not be read'],
      [[list, '--table', fileForTest('x.normloom', '{}'), ...into], 'not a Normloom project'],
      [[list, '--table', SAMPLE_PROJECT, '--low-is-good', ...into], 'Leave out --low-is-good'],
      [[fileForTest('x.normclass', '{}'), ...into], 'not a Normloom class'],
    ] as const) {
      expect((await refusalOf(run(...words))).problem).toContain(problem);
    }
    expect(existsSync(join(folder, 'out'))).toBe(false);
  });
});
