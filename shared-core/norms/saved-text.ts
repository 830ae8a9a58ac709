import * as v from 'valibot';
import { fileKey } from './file-keys.ts';
import { isFileObject, type FileObject } from './json-object.ts';

/** A kind of file that the program saves as JSON with a format and a version. */
export interface SavedKind {
  readonly format: string;
  readonly version: number;
  /** "project", as sentences call it. */
  readonly name: string;
  /** "*.normloom". */
  readonly ending: string;
  /** What to do with a damaged one, at the beginning of a sentence. */
  readonly wayOut: string;
}

interface Unreadable {
  readonly ok: false;
  readonly problem: string;
}

/** What JSON holds as the object of a saved file, of this version or an earlier one; keys are those of the file. */
export function savedObject(
  value: unknown,
  { format, version, name, ending }: SavedKind,
): { readonly ok: true; readonly value: FileObject } | Unreadable {
  if (!isFileObject(value) || value['format'] !== format) {
    return { ok: false, problem: `This is not a Normloom ${name}. Choose a file that Normloom saved (${ending}).` };
  }
  const saved = value['version'];
  if (typeof saved === 'number' && saved > version) {
    return {
      ok: false,
      problem: `This ${name} was saved by a newer Normloom (file version ${saved}; this one reads up to ${version}). Open it with the newer program; the file was not touched.`,
    };
  }
  return { ok: true, value };
}

/** A text that is no JSON. */
export function notComplete(kind: SavedKind): Unreadable {
  return damaged(kind, 'it is not complete JSON, as after a copy that broke off');
}

/** What the schema of a file found first, with where it stands. */
export function notAsSaved(kind: SavedKind, issue: v.BaseIssue<unknown>): Unreadable {
  return damaged(kind, `${fileKey(v.getDotPath(issue) ?? 'the whole')}: ${issue.message}`);
}

function damaged({ name, wayOut }: SavedKind, why: string): Unreadable {
  return { ok: false, problem: `The ${name} file is damaged (${why}). ${wayOut}; the file was not touched.` };
}
