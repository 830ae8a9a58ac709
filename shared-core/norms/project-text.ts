import * as v from 'valibot';
import { fileKey, fromFileKeys, toFileKeys } from './file-keys.ts';
import { newProject } from './new-project.ts';
import { normProjectSchema, PROJECT_FORMAT, PROJECT_VERSION, type NormProject } from './norm-project.ts';

/** Turns a project into the text of a `*.normloom` file: JSON, keys in lower-case-with-hyphens, one line at the end. */
export function projectToText(project: NormProject): string {
  return `${JSON.stringify(toFileKeys(project), null, 1)}\n`;
}

export type ProjectRead =
  { readonly ok: true; readonly project: NormProject } | { readonly ok: false; readonly problem: string };

/** Reads the text of a `*.normloom` file. Unknown keys are left behind; whatever is wrong comes back as a sentence. */
export function projectFromText(text: string): ProjectRead {
  let value: unknown;
  try {
    value = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch {
    return damaged('it is not complete JSON, as after a copy that broke off');
  }
  if (!isRecord(value) || value['format'] !== PROJECT_FORMAT) {
    return { ok: false, problem: 'This is not a Normloom project. Choose a file that Normloom saved (*.normloom).' };
  }
  const version = value['version'];
  if (typeof version === 'number' && version > PROJECT_VERSION) {
    return {
      ok: false,
      problem: `This project was saved by a newer Normloom (file version ${version}; this one reads up to ${PROJECT_VERSION}). Open it with the newer program; the file was not touched.`,
    };
  }
  const parsed = v.safeParse(normProjectSchema, fromFileKeys(broughtForward(value)));
  if (parsed.success) return { ok: true, project: parsed.output };
  const issue = parsed.issues[0];
  return damaged(`${fileKey(v.getDotPath(issue) ?? 'the whole')}: ${issue.message}`);
}

type FileObject = Readonly<Record<string, unknown>>;

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
  const curve = isRecord(value['curve']) ? { ...now, ...value['curve'] } : value['curve'];
  return { ...value, curve, precision };
}

/** Projects before version 3 knew no clusters: their people stay drawn one by one. */
function withClusters(value: FileObject): FileObject {
  const { tally, reading } = value;
  const cells = isRecord(tally) ? tally['cells'] : null;
  const decisions = isRecord(reading) ? reading['decisions'] : null;
  return {
    ...value,
    version: PROJECT_VERSION,
    tally:
      isRecord(tally) && Array.isArray(cells)
        ? { ...tally, cells: cells.map((cell: unknown) => (isRecord(cell) ? { ...cell, clusters: null } : cell)) }
        : tally,
    reading:
      isRecord(reading) && isRecord(decisions)
        ? { ...reading, decisions: { ...decisions, 'blank-cluster': 'alone' } }
        : reading,
  };
}

function damaged(why: string): ProjectRead {
  return {
    ok: false,
    problem: `The project file is damaged (${why}). Open a backup, or the draft that Normloom kept on the start page; the file was not touched.`,
  };
}

function isRecord(value: unknown): value is FileObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
