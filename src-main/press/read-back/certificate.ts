import { createHash } from 'node:crypto';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { surveyName } from '../../../shared-core/pages/sheet-texts.ts';
import { comparedCells, compareEngines, isCounted } from '../../../shared-core/second-engine/compare-engines.ts';
import { recipeOf, recipeScore } from '../../../shared-core/second-engine/recipe.ts';
import type { FileReadBack } from './cell-differences.ts';
import type { FileFound } from './read-back.ts';

export const CERTIFICATE_FORMAT = 'normloom-certificate';
const CERTIFICATE_VERSION = 1;

export interface CertifiedFile {
  readonly file: string;
  readonly bytes: number;
  readonly sha256: string;
  readonly cells: number;
  /** Lines of text compared with the pages placed anew; 0 for files that have none. */
  readonly lines: number;
  readonly differences: number;
}

/** One row of a group, with how it is redone by hand. */
export interface CertifiedRow {
  readonly group: string;
  readonly score: string;
  readonly printed: string;
  readonly sentences: readonly string[];
}

/** What was found when the pressed files were read back. */
export interface Certificate {
  readonly survey: string;
  readonly edition: string;
  readonly date: string;
  readonly check: string;
  readonly programVersion: string;
  readonly files: readonly CertifiedFile[];
  /** Cells compared in all files together. */
  readonly cells: number;
  /** Cells that the second engine worked out anew, and on how many it differs. */
  readonly recomputed: { readonly cells: number; readonly differences: number };
  /** Groups that are smoothed, which the second engine leaves out. */
  readonly notRecomputed: readonly string[];
  readonly recipes: readonly CertifiedRow[];
}

/** The certificate of files that were read back, in the order of both lists. */
export function certificateOf(
  normSet: NormSet,
  files: readonly FileFound[],
  read: readonly FileReadBack[],
  programVersion: string,
): Certificate {
  const { project, groups, check } = normSet;
  return {
    survey: surveyName(project),
    edition: project.release.edition,
    date: project.release.date,
    check,
    programVersion,
    files: files.map(({ file, bytes }, index) => ({
      file,
      bytes: bytes.length,
      sha256: createHash('sha256').update(bytes).digest('hex'),
      cells: read[index]?.cells ?? 0,
      lines: read[index]?.lines ?? 0,
      differences: read[index]?.differences.length ?? 0,
    })),
    cells: read.reduce((sum, { cells }) => sum + cells, 0),
    recomputed: { cells: comparedCells(normSet), differences: compareEngines(normSet).length },
    notRecomputed: groups.filter((norms) => !isCounted(norms)).map(({ group }) => group.title),
    recipes: groups.map((norms, index) => {
      const score = recipeScore(norms);
      const row = norms.rows.find((each) => each.score === score);
      return {
        group: norms.group.title,
        score: row?.scoreText ?? '',
        printed: row?.printed ?? '',
        sentences: recipeOf(normSet, index, score),
      };
    }),
  };
}

/** The certificate as JSON in UTF-8; keys are lower-case-with-hyphens. */
export function certificateJson(certificate: Certificate): Uint8Array {
  const { survey, edition, date, check, files, cells, recomputed, notRecomputed, recipes } = certificate;
  const content = {
    format: CERTIFICATE_FORMAT,
    version: CERTIFICATE_VERSION,
    program: { name: 'Normloom', version: certificate.programVersion },
    survey,
    edition,
    date,
    check,
    'read-back': {
      'cells-compared': cells,
      differences: files.reduce((sum, { differences }) => sum + differences, 0),
      files: files.map((file) => ({
        file: file.file,
        bytes: file.bytes,
        sha256: file.sha256,
        'cells-compared': file.cells,
        'lines-compared': file.lines,
        differences: file.differences,
      })),
    },
    'second-engine': {
      'cells-recomputed': recomputed.cells,
      differences: recomputed.differences,
      'smoothed-groups-left-out': notRecomputed,
    },
    recipes: recipes.map(({ group, score, printed, sentences }) => ({
      group,
      'raw-score': score,
      printed,
      'by-hand': sentences,
    })),
  };
  return new TextEncoder().encode(`${JSON.stringify(content, null, 1)}\n`);
}
