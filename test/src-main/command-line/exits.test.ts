import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fileForTest, folderForTest, normloom, PROGRAM, SAMPLE_COHORT } from './run-normloom.ts';
import { readTables } from './tables-file.ts';

const JSON_WORDS = ['table', SAMPLE_COHORT, '--score', 'raw_score', '--scale', '0:40', '--format', 'json'];

describe('what the command line leaves behind', () => {
  it('is help and version on stdout', () => {
    const help = normloom(['--help']);
    expect([help.exit, help.stderr]).toEqual([0, '']);
    for (const option of [
      '--score',
      '--count',
      '--weight',
      '--by',
      '--scale',
      '--missing',
      '--definition',
      '--points',
      '--smooth',
      '--interval',
      '--level',
      '--reliability',
      '--bootstrap',
      '--seed',
      '--ranks',
      '--group',
    ]) {
      expect(help.stdout).toContain(`  ${option} `);
    }
    expect(help.stdout.split('\n').filter((line) => line.length > 110)).toEqual([]);
    const { version } = JSON.parse(readFileSync(new URL('../../../package.json', import.meta.url), 'utf8'));
    expect(normloom(['--version'])).toEqual({ exit: 0, stdout: `${version}\n`, stderr: '' });
  });

  it.each<[string, readonly string[], string]>([
    ['no command', [], 'Tell what to do'],
    ['an unknown option', [...JSON_WORDS, '--smoothe'], "Unknown option '--smoothe'."],
    ['an unknown smoothing', [...JSON_WORDS, '--smooth', 'loess'], '--smooth is none, log-linear:C'],
    ['a proportion above 1', [...JSON_WORDS, '--points', '50'], 'proportions from 0 to 1'],
    [
      'a column that is not there',
      ['table', SAMPLE_COHORT, '--score', 'Raw_Score'],
      'has no column "Raw_Score". Its columns: pupil_id, school, grade, form, age_months, raw_score, weight.',
    ],
    ['a grouping column that is not there', [...JSON_WORDS, '--by', 'grade,sex'], 'has no column "sex"'],
    ['a press without a folder', ['press', 'a.normloom'], '--into FOLDER'],
  ])('is 2 and a sentence for %s', (_, words, problem) => {
    const ran = normloom(words);
    expect([ran.exit, ran.stdout]).toEqual([2, '']);
    expect(ran.stderr).toContain(problem);
    expect(ran.stderr.trimEnd().split('\n')).toHaveLength(2);
  });

  it('is 3 and a sentence for data that are refused', () => {
    const refusals: readonly (readonly [readonly string[], string])[] = [
      [['table', SAMPLE_COHORT, '--score', 'school'], 'None of the 4863 rows can be counted'],
      [['table', 'nowhere.csv', '--score', 's'], 'nowhere.csv'],
      [['table', folderForTest(), '--score', 's'], 'is a folder'],
      [['table', fileForTest('empty.csv', ''), '--score', 's'], 'is empty'],
      [['table', fileForTest('a.pdf', '%PDF-1.7\n'), '--score', 's'], 'is a PDF'],
      [[...JSON_WORDS, '--definition', 'grouped:1.5'], 'must be a multiple of the scale'],
      [[...JSON_WORDS, '--weight', 'weight', '--points', '0.5', '--point-definition', 'type-7'], 'with weights use'],
      [['table', fileForTest('one.csv', 'score\n7\n7\n'), '--score', 'score'], ''],
    ];
    for (const [words, problem] of refusals) {
      const ran = normloom(words);
      expect([words, ran.exit, ran.stdout]).toEqual([words, 3, '']);
      expect(ran.stderr).toContain(problem);
      expect(ran.stderr).toMatch(/^normloom: .*[.?]\n$/m);
    }
  });

  it('keeps remarks off stdout', () => {
    const ran = normloom(['table', SAMPLE_COHORT, '--score', 'raw_score', '--format', 'json']);
    expect(ran.exit).toBe(0);
    expect(readTables(ran.stdout).scale).toEqual({ min: 0, max: 99, step: 0.5 });
    expect(ran.stderr).toContain('4863 rows read, 4845 kept, 18 left out:');
    expect(ran.stderr).toContain('  5: a score that is not a number (rows 319, 471, 2197, 2452, 3052)');
    expect(ran.stderr).toContain('"99" looks like a code for a missing score; if it is one, give --missing 99.');
    expect(ran.stderr).toContain('The scale is 0 to 99 in steps of 0.5, as met in the file.');
    expect(ran.stderr).not.toContain('normloom:');
  });

  it('says nothing where there is nothing to say', () => {
    const clean = fileForTest('clean.csv', 'score\n1\n2\n3\n');
    expect(normloom(['table', clean, '--score', 'score', '--scale', '0:3']).stderr).toBe('');
  });

  it('tells how it read a file that is not the usual one', () => {
    const german = fileForTest('werte.csv', Buffer.from('Sch\u00fcler;Wert\na;1,5\nb;2\n', 'latin1'));
    const ran = normloom(['table', german, '--score', 'Wert', '--scale', '0:3:0.5']);
    expect(ran.stderr).toBe('Read with Windows-1252, the semicolon as separator, the comma as decimal mark.\n');
  });

  it('is the same in every time zone and language', () => {
    const run = (zone: string, language: string) =>
      normloom([...JSON_WORDS, '--by', 'grade'], { TZ: zone, LANG: language, LC_ALL: language, LC_NUMERIC: language });
    const first = run('Pacific/Kiritimati', 'de_DE.UTF-8');
    expect(first.exit).toBe(0);
    expect(run('America/Los_Angeles', 'ar_EG.UTF-8')).toEqual(first);
    expect(run('UTC', 'C')).toEqual(first);
  });

  it('names the file by its own bytes', () => {
    const sha256 = createHash('sha256').update(readFileSync(SAMPLE_COHORT)).digest('hex');
    expect(readTables(normloom(JSON_WORDS).stdout).source).toMatchObject({ file: 'ostrey-vale-reading.csv', sha256 });
  });

  it('is quiet when the reader of stdout leaves early', async () => {
    const child = spawn(process.execPath, [PROGRAM, ...JSON_WORDS, '--by', 'school']);
    let stderr = '';
    child.stderr.on('data', (chunk: Buffer) => {
      stderr += chunk.toString();
    });
    child.stdout.destroy();
    const [exit] = await once(child, 'close');
    expect(exit).toBe(0);
    expect(stderr).not.toMatch(/EPIPE|Error/);
  });
});
