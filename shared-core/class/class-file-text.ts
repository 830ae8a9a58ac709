import * as v from 'valibot';
import { fromFileKeys, toFileKeys } from '../norms/file-keys.ts';
import { CLASS_ENDING } from '../norms/file-endings.ts';
import { isFileObject, jsonIn, type FileObject } from '../norms/json-object.ts';
import { notAsSaved, notComplete, savedObject, type SavedKind } from '../norms/saved-text.ts';
import { CLASS_FORMAT, CLASS_VERSION, classFileSchema, type ClassFile } from './class-file.ts';
import type { ClassTable } from './class-table.ts';

const CLASS: SavedKind = {
  format: CLASS_FORMAT,
  version: CLASS_VERSION,
  name: 'class',
  ending: `*${CLASS_ENDING}`,
  wayOut: 'Open a backup, or read the class list again',
};

/** Turns a class into the text of a `*.normclass` file: JSON, keys in lower-case-with-hyphens, one line at the end. */
export function classToText(file: ClassFile): string {
  const table = file.table === null ? null : withListedTexts(file.table);
  return `${JSON.stringify(toFileKeys({ ...file, table }), null, 1)}\n`;
}

export type ClassRead =
  { readonly ok: true; readonly file: ClassFile } | { readonly ok: false; readonly problem: string };

/** Reads the text of a `*.normclass` file. Unknown keys are left behind; whatever is wrong comes back as a sentence. */
export function classFromText(text: string): ClassRead {
  const json = jsonIn(text);
  if (json === undefined) return notComplete(CLASS);
  const saved = savedObject(json, CLASS);
  if (!saved.ok) return saved;
  const value = fromFileKeys(saved.value);
  const parsed = v.safeParse(
    classFileSchema,
    isFileObject(value) ? { ...value, table: withKeyedTexts(value['table']) } : value,
  );
  return parsed.success ? { ok: true, file: parsed.output } : notAsSaved(CLASS, parsed.issues[0]);
}

/** Keys of columns are no keys of a file: the texts of a row stand in the order of the columns. */
function withListedTexts(table: ClassTable): unknown {
  const groups = table.groups.map((group) => ({
    ...group,
    rows: group.rows.map((row) => ({ ...row, texts: table.columns.map(({ key }) => row.texts[key] ?? '') })),
  }));
  return { ...table, groups };
}

/** The way back; what is not as it was written is left for the schema to tell. */
function withKeyedTexts(table: unknown): unknown {
  if (!isFileObject(table) || !Array.isArray(table['columns']) || !Array.isArray(table['groups'])) return table;
  const keys = table['columns'].map((column: unknown) => (isFileObject(column) ? String(column['key']) : ''));
  const keyed = (row: FileObject): FileObject => {
    const { texts } = row;
    if (!Array.isArray(texts) || texts.length !== keys.length) return row;
    return { ...row, texts: Object.fromEntries(keys.map((key, index): [string, unknown] => [key, texts[index]])) };
  };
  const inEach = (list: unknown, change: (item: FileObject) => FileObject): unknown =>
    Array.isArray(list) ? list.map((item: unknown) => (isFileObject(item) ? change(item) : item)) : list;
  return { ...table, groups: inEach(table['groups'], (group) => ({ ...group, rows: inEach(group['rows'], keyed) })) };
}
