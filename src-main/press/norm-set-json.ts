import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { normSetForFile } from '../../shared-core/norms/norm-set-file.ts';

export const NORM_SET_FORMAT = 'normloom-norm-set';
export const NORM_SET_VERSION = 1;

/** Every number of a set, unrounded beside its printed text, as JSON in UTF-8. */
export function normSetJson(normSet: NormSet): Uint8Array {
  const { title, subtitle, release } = normSet.project;
  const file = {
    format: NORM_SET_FORMAT,
    version: NORM_SET_VERSION,
    title,
    subtitle,
    edition: release.edition,
    date: release.date,
    check: normSet.check,
    status: normSet.status,
    ...normSetForFile(normSet, () => []),
  };
  return new TextEncoder().encode(`${JSON.stringify(file, null, 1)}\n`);
}
