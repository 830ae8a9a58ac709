import { randomInt } from 'node:crypto';
import { basename } from 'node:path';
import { withTable } from '../../shared-core/class/class-columns.ts';
import type { ClassFile } from '../../shared-core/class/class-file.ts';
import type { ClassTable, ClassTableGroup } from '../../shared-core/class/class-table.ts';
import { foldedText } from '../../shared-core/class/list-text.ts';
import { newClass } from '../../shared-core/class/new-class.ts';
import { sortClass } from '../../shared-core/class/sorted-class.ts';
import type { PressedClassFiles } from '../../shared-core/desk.ts';
import { usualNumbers } from '../../shared-core/languages/number-format.ts';
import { opensAsClass } from '../../shared-core/norms/file-endings.ts';
import { readClass } from '../project-file/class-store.ts';
import { readListFile } from './class-list-file.ts';
import type { ClassOptions } from './class-options.ts';
import { readTableFile } from './class-table-file.ts';
import { refused, wrongUsage, type Outcome } from './outcome.ts';
import { fingerprintLines } from './press-command.ts';

type ClassRead =
  | { readonly ok: true; readonly file: ClassFile; readonly remarks: readonly string[] }
  | { readonly ok: false; readonly outcome: Outcome };

/** `randomInt` draws below this. */
const SEEDS = 2 ** 48 - 1;

/**
 * Report, slips, workbook and csv of a class; the result names each file with its SHA-256. Whatever in the list does not
 * fit is told with its lines, and then nothing is written. No sentence names a pupil.
 */
export async function classCommand(path: string, options: ClassOptions): Promise<Outcome> {
  const read = opensAsClass(path) ? await fromClassFile(path, options) : await fromList(path, options);
  if (!read.ok) return read.outcome;
  const tabled = await withTableOf(read.file, options);
  if (!tabled.ok) return tabled.outcome;
  const file = withChoices(tabled.file, options);
  const { remarks } = read;
  const open = openQuestions(path, file);
  if (open !== null) return { ...open, remarks: [...remarks, ...open.remarks] };
  const { pressClassInto } = await import('../press/class/press-class-into.ts');
  const { into } = options;
  const pressed = await pressClassInto(file, { slips: options.slips !== null }, { folder: into, keyFolder: into });
  if (!pressed.ok) return refused(pressed.problem, remarks);
  const told = [...remarks, ...pressed.value.remarks, ...keyRemark(pressed.value)];
  return { kind: 'done', result: fingerprintLines(pressed.value.files), remarks: told };
}

async function fromClassFile(path: string, { columns }: ClassOptions): Promise<ClassRead> {
  const { name, score, by, status } = columns;
  if (name.length > 0 || score !== null || by.length > 0 || status !== null) {
    const problem = `${basename(path)} is a class, whose columns are known. Leave out --name, --score, --by and --status.`;
    return { ok: false, outcome: wrongUsage(problem) };
  }
  const read = await readClass(path);
  if (!read.ok) return { ok: false, outcome: refused(read.problem) };
  return { ok: true, file: read.value.class, remarks: [] };
}

async function fromList(path: string, { columns }: ClassOptions): Promise<ClassRead> {
  const read = await readListFile(path, columns);
  if (!read.ok) return { ok: false, outcome: refused(read.problem, read.remarks) };
  // Codes that could be drawn again by whoever knows the list would hide nobody, so chance draws them.
  const file = { ...newClass('', randomInt(SEEDS)), list: read.list };
  return { ok: true, file, remarks: read.remarks };
}

async function withTableOf(file: ClassFile, { table, group, lowIsGood }: ClassOptions): Promise<ClassRead> {
  let tabled = file;
  if (table !== null) {
    const read = await readTableFile(table, lowIsGood);
    if (!read.ok) return { ok: false, outcome: refused(read.problem, read.remarks) };
    tabled = withTable(file, read.table);
  } else if (lowIsGood) {
    if (file.table !== null)
      return wrong('The class has a table, which tells which scores are good. Leave out --low-is-good.');
    tabled = { ...file, direction: 'low-is-good' };
  }
  if (group === null) return { ok: true, file: tabled, remarks: [] };
  if (tabled.table === null) return wrong('--group needs --table, whose groups it names.');
  const found = groupNamed(tabled.table, group);
  if (found !== null) return { ok: true, file: { ...tabled, group: found.values }, remarks: [] };
  return { ok: false, outcome: refused(`There is no table for the group "${group}". ${groupsOf(tabled.table)}`) };
}

function wrong(problem: string): ClassRead {
  return { ok: false, outcome: wrongUsage(problem) };
}

function groupNamed({ groups }: ClassTable, text: string): ClassTableGroup | null {
  const named = foldedText(text);
  return (
    groups.find(({ values, title }) =>
      [values.join(','), values.join(', '), title].some((one) => foldedText(one) === named),
    ) ?? null
  );
}

function groupsOf({ groups }: ClassTable): string {
  const named = groups.map(({ title, values }) => `${title} (--group ${quotedIfNeeded(values.join(','))})`);
  return `There are tables for ${named.join(', ')}.`;
}

function quotedIfNeeded(value: string): string {
  return /^[\w,.-]+$/.test(value) ? value : `"${value}"`;
}

function withChoices(file: ClassFile, options: ClassOptions): ClassFile {
  const { language, sharing, seed, slips } = options;
  const words =
    language === null ? null : { tag: language, words: language, numbers: usualNumbers(language), phrases: [] };
  return {
    ...file,
    title: options.title ?? file.title,
    date: options.date ?? file.date,
    report: { ...file.report, language: words ?? file.report.language },
    slips: { ...file.slips, perPage: slips ?? file.slips.perPage, language: words ?? file.slips.language },
    sharing: { as: sharing ?? file.sharing.as, seed: seed ?? file.sharing.seed },
  };
}

/** Questions without an answer, one sentence each; null where there are none. */
function openQuestions(path: string, file: ClassFile): Extract<Outcome, { kind: 'refused' }> | null {
  const open = sortClass(file).questions.filter(({ answer }) => answer === null);
  if (open.length === 0) return null;
  const { table } = file;
  const hints = table !== null && open.some(({ about }) => about === 'group') ? [groupsOf(table)] : [];
  const many = open.length === 1 ? '1 question is' : `${open.length} questions are`;
  return {
    kind: 'refused',
    problem:
      `${many} open, so that nothing was written. Correct ${basename(path)}${hints.length > 0 ? ', name the table' : ''}, or ` +
      'open it in the program and answer there.',
    remarks: [...open.map(({ sentence }) => sentence), ...hints],
  };
}

function keyRemark({ keyFile }: PressedClassFiles): readonly string[] {
  return keyFile === null ? [] : [`${keyFile} tells who has which code. Take it away before you hand the folder on.`];
}
