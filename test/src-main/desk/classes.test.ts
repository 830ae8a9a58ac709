import { copyFile, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import ExcelJS from 'exceljs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import { classFromText, classToText } from '../../../shared-core/class/class-file-text.ts';
import type { PressedClassFiles } from '../../../shared-core/desk.ts';
import { projectOf } from '../../shared-core/norms/small-projects.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { NAMES, sampleFile } from '../../shared-core/pages/sample-class.ts';
import { sample } from '../command-line/run-normloom.ts';
import { deskAtHand, type DeskAtHand } from './desk-at-hand.ts';

const CLASS = sampleFile({ entries: [12, 20, 31, 'absent'] });
const codes = (file: ClassFile): ClassFile => ({ ...file, sharing: { as: 'codes', seed: 9 } });
const PARTS = NAMES.slice(0, 4).flatMap((name) => name.split(' '));

let hand: DeskAtHand;
beforeEach(async () => {
  hand = await deskAtHand();
});
afterEach(() => hand.close());

const projects = (...names: readonly string[]): string => join(hand.folder, 'projects', ...names);

/** All that lies in a folder and below, as one text. */
async function allIn(folder: string): Promise<string> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true }).catch(() => []);
  const texts = await Promise.all(
    entries.map(async (entry) =>
      entry.isFile() ? `${entry.name}\n${await readFile(join(entry.parentPath, entry.name), 'latin1')}` : entry.name,
    ),
  );
  return texts.join('\n');
}

async function press(file: ClassFile, slips = false, name = 'Form 5b'): Promise<PressedClassFiles> {
  const { job } = await hand.ask('press-class', { class: file, slips, name });
  const end = await hand.endOf(job);
  if (end.state !== 'done' || end.result.kind !== 'pressed-class') throw new Error(JSON.stringify(end));
  return end.result.pressed;
}

describe('class files', () => {
  it('are saved, listed and opened again, and nothing of them is kept elsewhere', async () => {
    const saved = await hand.ask('save-class', { handle: null, name: 'Form 5b.normclass', class: CLASS });
    expect(saved).toMatchObject({ file: 'Form 5b.normclass', remark: null });
    expect(classFromText(await readFile(projects('Form 5b.normclass'), 'utf8'))).toEqual({ ok: true, file: CLASS });
    const [listed, ...others] = await hand.again().ask('list-classes', {});
    expect(others).toEqual([]);
    expect(listed).toMatchObject({ file: 'Form 5b.normclass', title: 'Class 5b' });
    expect((await hand.ask('list-projects', {})).recent).toEqual([]);
    const again = hand.again();
    const [first] = await again.ask('list-classes', {});
    const opened = await again.ask('open-class', { handle: first?.handle ?? '' });
    expect(opened).toMatchObject({ class: CLASS, file: 'Form 5b.normclass' });
    const kept = await allIn(join(hand.folder, 'data'));
    expect(kept).toContain('Form 5b.normclass');
    for (const part of [...PARTS, 'Class 5b']) expect(kept).not.toContain(part);
  });

  it('are replaced only as they were read: what another program changed stays', async () => {
    const saved = await hand.ask('save-class', { handle: null, name: 'a', class: CLASS });
    const handle = saved?.handle ?? '';
    const changed = { ...CLASS, title: 'Class 5c' };
    expect(await hand.ask('save-class', { handle, name: 'a', class: changed })).toMatchObject({ file: 'a.normclass' });
    const theirs = classToText({ ...CLASS, title: 'Theirs' });
    await writeFile(projects('a.normclass'), theirs);
    expect(await hand.ask('save-class', { handle, name: 'a', class: CLASS })).toMatchObject({
      file: 'a (2).normclass',
      remark: expect.stringContaining('and your class was saved as a (2).normclass.') as unknown,
    });
    expect(await readFile(projects('a.normclass'), 'utf8')).toBe(theirs);
    expect(await hand.ask('save-class', { handle: null, name: 'a', class: CLASS })).toMatchObject({
      file: 'a (3).normclass',
    });
  });

  it('that were handed over as copies are never saved into, and stand on no list', async () => {
    const path = join(hand.folder, 'upload-1');
    const text = classToText(CLASS);
    await writeFile(path, text);
    const handle = hand.desk.giveHandle(path, { name: '5b.normclass', standing: 'copy' });
    const opened = await hand.ask('open-class', { handle });
    expect([opened.file, await hand.ask('list-classes', {})]).toEqual(['5b.normclass', []]);
    const saved = await hand.ask('save-class', { handle: opened.handle, name: opened.file, class: CLASS });
    expect(saved?.file).toBe('5b.normclass');
    expect(await readFile(path, 'utf8')).toBe(text);
  });

  it('that cannot be read are a sentence, and stand on the list without a title', async () => {
    await hand.ask('save-class', { handle: null, name: 'a', class: CLASS });
    await writeFile(projects('a.normclass'), '{"format": "normloom-class"');
    const [listed] = await hand.ask('list-classes', {});
    expect(listed).toMatchObject({ file: 'a.normclass', title: '' });
    expect(await hand.problem('open-class', { handle: listed?.handle })).toMatch(/^The class file is damaged/);
    await writeFile(projects('b.normclass'), projectToText(projectOf([1, 2])));
    const other = hand.desk.giveHandle(projects('b.normclass'));
    expect(await hand.problem('open-class', { handle: other })).toMatch(/^This is not a Normloom class/);
    await rm(projects('a.normclass'));
    expect(await hand.ask('list-classes', {})).toEqual([]);
  });

  it('are saved where the dialog says, which is asked about a class', async () => {
    const asked: unknown[] = [];
    const window = hand.again({
      dialogs: {
        chooseFile: () => Promise.resolve(null),
        chooseFolder: () => Promise.resolve(null),
        chooseSave: (...words) => {
          asked.push(words);
          return Promise.resolve(asked.length === 1 ? join(hand.folder, 'here.normclass') : null);
        },
      },
    });
    const ask = { handle: null, name: '', class: CLASS };
    expect((await window.ask('save-class', ask))?.file).toBe('here.normclass');
    expect(await window.ask('save-class', ask)).toBeNull();
    expect(asked[0]).toEqual(['class', projects('Class.normclass')]);
  });

  it('are told from projects when the program is opened with one', async () => {
    const about = await hand.again({ openedWith: join(hand.folder, 'Form 5B.NORMCLASS') }).ask('about', {});
    expect(about.openedWith?.kind).toBe('class');
  });
});

describe('what a class is made from', () => {
  it('are the tables of a project, of an edition or of the sample', async () => {
    await copyFile(
      sample('ostrey-vale.normloom'),
      join(hand.folder, 'assets', 'sample-cohorts', 'ostrey-vale.normloom'),
    );
    const table = await hand.ask('class-table', { handle: null });
    expect(table).toMatchObject({ source: 'project', defaultGroup: ['5'] });
    expect(table.groups.map(({ title }) => title)).toEqual(['Grade 4', 'Grade 5', 'Grade 6']);
    const path = join(hand.folder, 'small.normloom');
    await writeFile(path, projectToText(projectOf([1, 2, 3])));
    const small = await hand.ask('class-table', { handle: hand.desk.giveHandle(path) });
    expect(small.groups.map(({ rows }) => rows.map(({ scoreText }) => scoreText))).toEqual([['0', '1', '2']]);
    await writeFile(path, '{}');
    expect(await hand.problem('class-table', { handle: hand.desk.giveHandle(path) })).toMatch(/not a Normloom project/);
  });

  it('are the rows of a text as they stand, numbered as in the file', async () => {
    const path = join(hand.folder, 'list.csv');
    await writeFile(path, '\n\nName;Punkte\n"=Ivo; Junior";12,5\n\nAda;\n');
    const looked = await hand.ask('look-at-list', { handle: hand.desk.giveHandle(path), sheet: null });
    expect(looked).toMatchObject({ file: 'list.csv', sheets: [], sheet: null, remarks: [] });
    expect(looked.rows.filter(({ cells }) => cells.join('') !== '')).toEqual([
      { line: 3, cells: ['Name', 'Punkte'] },
      { line: 4, cells: ['=Ivo; Junior', '12,5'] },
      { line: 6, cells: ['Ada', ''] },
    ]);
    await writeFile(path, ' \n \n');
    expect(await hand.problem('look-at-list', { handle: hand.desk.giveHandle(path), sheet: null })).toBe(
      'There is nothing in list.csv. Choose the file that holds the class list.',
    );
    await writeFile(path, `Name,Score\n${'Ada,1\n'.repeat(5000)}`);
    const many = await hand.ask('look-at-list', { handle: hand.desk.giveHandle(path), sheet: null });
    expect([many.rows.length, many.remarks[0]]).toEqual([4000, expect.stringContaining('Only the first 4000 rows')]);
  });

  it('are the rows of a sheet: the first that holds anything, or the one asked for', async () => {
    const workbook = new ExcelJS.Workbook();
    workbook.addWorksheet('Cover');
    workbook.addWorksheet('5b').addRows([
      ['Name', 'Score'],
      ['Ada', 12],
    ]);
    workbook.addWorksheet('5c').addRow(['Ivo', 3.5]);
    const path = join(hand.folder, 'lists.xlsx');
    await workbook.xlsx.writeFile(path);
    const handle = hand.desk.giveHandle(path);
    expect(await hand.ask('look-at-list', { handle, sheet: null })).toEqual({
      file: 'lists.xlsx',
      sheets: ['Cover', '5b', '5c'],
      sheet: '5b',
      rows: [
        { line: 1, cells: ['Name', 'Score'] },
        { line: 2, cells: ['Ada', '12'] },
      ],
      remarks: ['The workbook has 3 sheets; “5b” is read.'],
    });
    expect((await hand.ask('look-at-list', { handle, sheet: '5c' })).rows).toEqual([
      { line: 1, cells: ['Ivo', '3.5'] },
    ]);
    expect(await hand.problem('look-at-list', { handle, sheet: 'Cover' })).toMatch(/^There is nothing in lists\.xlsx/);
    expect(await hand.problem('look-at-list', { handle, sheet: '6a' })).toMatch(/^lists\.xlsx has no sheet “6a”/);
  });
});

describe('pressed classes', () => {
  it('lie in a folder by how they are shared, and the key in one of its own beside it', async () => {
    const made = await press(codes(CLASS), true);
    expect(made.folder).toContain('Form 5b – class report with codes');
    expect(made.keyFile).toBe('Form 5b – class report with codes – key to codes, keep apart/key-to-codes.csv');
    expect(made.files.map(({ file }) => file)).toContain(made.keyFile);
    const handedOn = projects('Form 5b – class report with codes');
    expect((await readdir(handedOn)).toSorted()).toEqual(
      made.files.flatMap(({ file }) => (file === made.keyFile ? [] : [file])).toSorted(),
    );
    expect(await readFile(projects(made.keyFile ?? ''), 'utf8')).toContain(PARTS[0]);
    expect((await press(CLASS)).folder).toContain('Form 5b – class report with names');
    expect((await press({ ...CLASS, sharing: { as: 'summary', seed: 9 } })).keyFile).toBeNull();
    expect((await readdir(projects())).toSorted()).toEqual([
      'Form 5b – class report with codes',
      'Form 5b – class report with codes – key to codes, keep apart',
      'Form 5b – class report with names',
      'Form 5b – class summary',
    ]);
    expect(PARTS.filter((part) => handedOn.includes(part))).toEqual([]);
    const kept = await allIn(join(hand.folder, 'data'));
    for (const part of PARTS) expect(kept).not.toContain(part);
  });

  it('leave no slips of an earlier press beside another report, unless they were changed since', async () => {
    const folder = projects('Form 5b – class report with names');
    await press(CLASS, true);
    expect(await readdir(folder)).toContain('slips.pdf');
    await press(CLASS, false);
    expect(await readdir(folder)).not.toContain('slips.pdf');
    await press(CLASS, true);
    await writeFile(join(folder, 'slips.pdf'), 'mine');
    await press(CLASS, false);
    expect(await readFile(join(folder, 'slips.pdf'), 'utf8')).toBe('mine');
  });

  it('never replace a key that was changed or put there by somebody', async () => {
    const made = await press(codes(CLASS));
    await writeFile(projects(made.keyFile ?? ''), 'mine');
    const again = await press(codes(CLASS));
    expect(again.keyFile).toBe('Form 5b – class report with codes – key to codes, keep apart (2)/key-to-codes.csv');
    expect(await readFile(projects(made.keyFile ?? ''), 'utf8')).toBe('mine');
  });

  it('leave nothing behind where there is a problem, and say it', async () => {
    const summary: ClassFile = { ...CLASS, table: null, group: null, sharing: { as: 'summary', seed: 9 } };
    const { job } = await hand.ask('press-class', { class: summary, slips: false, name: '' });
    expect(await hand.endOf(job)).toEqual({ state: 'failed', problem: expect.stringContaining('Choose a table') });
    expect(await readdir(projects())).toEqual([]);
  });

  it('are drawn for the screen, report and slips', async () => {
    for (const what of ['report', 'slips'] as const) {
      const { job } = await hand.ask('draw-class', { class: CLASS, what });
      const end = await hand.endOf(job);
      if (end.state !== 'done' || end.result.kind !== 'drawn-class') throw new Error(JSON.stringify(end));
      expect(Buffer.from(end.result.drawn.pdf, 'base64').toString('latin1', 0, 5)).toBe('%PDF-');
      expect(end.result.drawn.pages).toBeGreaterThan(0);
    }
    const { job } = await hand.ask('draw-class', { class: { ...CLASS, table: null, group: null }, what: 'slips' });
    expect(await hand.endOf(job)).toMatchObject({ state: 'failed' });
  });
});
