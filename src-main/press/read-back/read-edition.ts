import { createHash } from 'node:crypto';
import { editionFromText } from '../../../shared-core/norms/edition-file.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { CellComparison, type FileReadBack } from './cell-differences.ts';
import type { FileFound } from './read-back.ts';

/**
 * Compares what an edition file says of its edition, the whole project frozen in it, and the fingerprints of those of its
 * files that lie beside it. Throws with a sentence where the file was changed after the release.
 */
export function readEdition(
  file: string,
  text: string,
  { project, check }: NormSet,
  files: readonly FileFound[],
): FileReadBack {
  const read = editionFromText(text);
  if (!read.ok) throw new Error(read.problem);
  const { edition } = read;
  const comparison = new CellComparison(file);
  const compare = (column: string, expected: string, found: string): void => {
    comparison.compare({ where: 'edition', group: '', score: '', column }, expected, found);
  };
  const { release } = project;
  compare('check code', check, edition.check);
  compare('edition', release.edition, edition.edition);
  compare('date', release.date, edition.date);
  compare('analyst', release.analyst, edition.analyst);
  compare('checker', release.checker, edition.checker);
  compare('SHA-256 of the project', fingerprint(project), fingerprint(edition.project));
  for (const frozen of edition.files) {
    const beside = files.find((other) => other.file === frozen.file);
    if (beside === undefined) continue;
    compare(`SHA-256 of ${frozen.file}`, createHash('sha256').update(beside.bytes).digest('hex'), frozen.sha256);
  }
  return comparison.result('edition');
}

function fingerprint(project: NormProject): string {
  return createHash('sha256').update(projectToText(project)).digest('hex');
}
