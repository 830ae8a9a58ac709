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

/** Projects of version 1 knew neither smoothing nor precision: they get the defaults. */
function broughtForward(value: Readonly<Record<string, unknown>>): Readonly<Record<string, unknown>> {
  if (value['version'] !== 1) return value;
  const { curve: now, precision } = newProject('');
  const curve = isRecord(value['curve']) ? { ...now, ...value['curve'] } : value['curve'];
  return { ...value, version: PROJECT_VERSION, curve, precision };
}

function damaged(why: string): ProjectRead {
  return {
    ok: false,
    problem: `The project file is damaged (${why}). Open a backup, or the draft that Normloom kept on the start page; the file was not touched.`,
  };
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
