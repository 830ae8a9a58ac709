import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import * as v from 'valibot';
import { fromFileKeys, toFileKeys } from './file-keys.ts';
import { isFileObject, jsonIn } from './json-object.ts';
import type { NormProject } from './norm-project.ts';
import { projectFromText, projectFromValue, type ProjectRead } from './project-text.ts';

export const EDITION_FORMAT = 'normloom-edition';
export const EDITION_VERSION = 1;

const text = v.string();
const wholeNumber = v.pipe(v.number(), v.safeInteger(), v.minValue(0));
const fingerprint = v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/));

/** What a released edition holds beside its project. */
const frozenSchema = v.object({
  program: v.pipe(v.object({ name: v.literal('Normloom'), version: text }), v.readonly()),
  edition: text,
  /** yyyy-mm-dd, or empty. */
  date: text,
  check: text,
  analyst: text,
  checker: text,
  /** The pressed files, in the order in which they were made, with the SHA-256 of their bytes. */
  files: v.pipe(
    v.array(v.pipe(v.object({ file: text, bytes: wholeNumber, sha256: fingerprint }), v.readonly())),
    v.readonly(),
  ),
  /** Cells of these files that were compared with the norm set, and cells worked out a second time; none differed. */
  readBack: v.pipe(v.object({ cellsCompared: wholeNumber, cellsRecomputed: wholeNumber }), v.readonly()),
});

/** An edition as it was released: the whole project, who signed it, and what every pressed file held. */
export type FrozenEdition = Readonly<v.InferOutput<typeof frozenSchema>> & { readonly project: NormProject };
export type FrozenFile = FrozenEdition['files'][number];

export type EditionRead =
  { readonly ok: true; readonly edition: FrozenEdition } | { readonly ok: false; readonly problem: string };

/**
 * Turns an edition into the text of a `*.normedition` file: JSON, keys in lower-case-with-hyphens, one line at the end.
 * Its seal is the SHA-256 of all that stands before it, as JSON without blanks: a file in which something was changed
 * afterwards is told by it.
 */
export function editionToText(edition: FrozenEdition): string {
  const { project, program, date, check, analyst, checker, files, readBack } = edition;
  const content = toFileKeys({
    format: EDITION_FORMAT,
    version: EDITION_VERSION,
    program,
    edition: edition.edition,
    date,
    check,
    analyst,
    checker,
    files,
    readBack,
    project,
  });
  return `${JSON.stringify({ ...Object(content), seal: sealOf(content) }, null, 1)}\n`;
}

/** Reads the text of a `*.normedition` file; whatever is wrong comes back as a sentence. */
export function editionFromText(editionText: string): EditionRead {
  const value = jsonIn(editionText);
  if (value === undefined) return damaged('it is not complete JSON, as after a copy that broke off');
  if (!isEditionValue(value)) {
    return {
      ok: false,
      problem: 'This is not a released edition. Choose a file that Normloom released (*.normedition).',
    };
  }
  return editionFromValue(value);
}

export type ProjectFileRead =
  | {
      readonly ok: true;
      readonly project: NormProject;
      /** The edition whose project it is; null for a project file. */
      readonly edition: FrozenEdition | null;
    }
  | { readonly ok: false; readonly problem: string };

/** Reads the text of a project file or of an edition file, told apart by their content. */
export function projectOrEditionFromText(fileText: string): ProjectFileRead {
  const value = jsonIn(fileText);
  if (isEditionValue(value)) {
    const read = editionFromValue(value);
    return read.ok ? { ok: true, project: read.edition.project, edition: read.edition } : read;
  }
  const read: ProjectRead = value === undefined ? projectFromText(fileText) : projectFromValue(value);
  return read.ok ? { ok: true, project: read.project, edition: null } : read;
}

type EditionValue = Readonly<Record<string, unknown>> & { readonly format: typeof EDITION_FORMAT };

function isEditionValue(value: unknown): value is EditionValue {
  return isFileObject(value) && value['format'] === EDITION_FORMAT;
}

function editionFromValue(value: EditionValue): EditionRead {
  const { seal, ...content } = value;
  const { version, project } = content;
  if (typeof version === 'number' && version > EDITION_VERSION) {
    return {
      ok: false,
      problem:
        `This edition was released by a newer Normloom (file version ${version}; this one reads up to ` +
        `${EDITION_VERSION}). Open it with the newer program; the file was not touched.`,
    };
  }
  if (seal !== sealOf(content)) return damaged('its seal does not fit: something in it was changed after the release');
  const frozen = v.safeParse(frozenSchema, fromFileKeys({ ...content, project: null }));
  if (version !== EDITION_VERSION || !frozen.success) return damaged('it lacks a part that every edition has');
  const read = projectFromValue(project);
  return read.ok ? { ok: true, edition: { ...frozen.output, project: read.project } } : read;
}

function sealOf(content: unknown): string {
  return bytesToHex(sha256(utf8ToBytes(JSON.stringify(content))));
}

function damaged(why: string): EditionRead {
  return {
    ok: false,
    problem: `The edition file is damaged (${why}). Use another copy of it; the file was not touched.`,
  };
}
