import * as v from 'valibot';
import { fromFileKeys, toFileKeys } from './file-keys.ts';
import { isFileObject, jsonIn, type FileObject } from './json-object.ts';
import { newProject } from './new-project.ts';
import { normProjectSchema, PROJECT_FORMAT, PROJECT_VERSION, type NormProject } from './norm-project.ts';
import { notAsSaved, notComplete, savedObject, type SavedKind } from './saved-text.ts';

/** Turns a project into the text of a `*.normloom` file: JSON, keys in lower-case-with-hyphens, one line at the end. */
export function projectToText(project: NormProject): string {
  return `${JSON.stringify(toFileKeys(project), null, 1)}\n`;
}

export type ProjectRead =
  { readonly ok: true; readonly project: NormProject } | { readonly ok: false; readonly problem: string };

const PROJECT: SavedKind = {
  format: PROJECT_FORMAT,
  version: PROJECT_VERSION,
  name: 'project',
  ending: '*.normloom',
  wayOut: 'Open a backup, or the draft that Normloom kept on the start page',
};

/** Reads the text of a `*.normloom` file. Unknown keys are left behind; whatever is wrong comes back as a sentence. */
export function projectFromText(text: string): ProjectRead {
  const value = jsonIn(text);
  return value === undefined ? notComplete(PROJECT) : projectFromValue(value);
}

/** The same for a project that is part of another file, parsed, with the keys of files. */
export function projectFromValue(value: unknown): ProjectRead {
  const saved = savedObject(value, PROJECT);
  if (!saved.ok) return saved;
  const parsed = v.safeParse(normProjectSchema, fromFileKeys(broughtForward(saved.value)));
  return parsed.success ? { ok: true, project: parsed.output } : notAsSaved(PROJECT, parsed.issues[0]);
}

/** A project of an earlier version with what it did not know yet; keys are those of the file. */
function broughtForward(value: FileObject): FileObject {
  switch (value['version']) {
    case 1:
      return withClusters(withPrecision(value));
    case 2:
      return withClusters(value);
    case 3:
      // Blocks, setting, language, cuts and signatures have defaults of their own.
      return { ...value, version: PROJECT_VERSION };
    default:
      return value;
  }
}

/** Projects of version 1 knew neither smoothing nor precision: they get the defaults. */
function withPrecision(value: FileObject): FileObject {
  const { curve: now, precision } = newProject('');
  const curve = isFileObject(value['curve']) ? { ...now, ...value['curve'] } : value['curve'];
  return { ...value, curve, precision };
}

/** Projects before version 3 knew no clusters: their people stay drawn one by one. */
function withClusters(value: FileObject): FileObject {
  const { tally, reading } = value;
  const cells = isFileObject(tally) ? tally['cells'] : null;
  const decisions = isFileObject(reading) ? reading['decisions'] : null;
  return {
    ...value,
    version: PROJECT_VERSION,
    tally:
      isFileObject(tally) && Array.isArray(cells)
        ? { ...tally, cells: cells.map((cell: unknown) => (isFileObject(cell) ? { ...cell, clusters: null } : cell)) }
        : tally,
    reading:
      isFileObject(reading) && isFileObject(decisions)
        ? { ...reading, decisions: { ...decisions, 'blank-cluster': 'alone' } }
        : reading,
  };
}
