import { createHash } from 'node:crypto';
import type { FileReadBack } from '../read-back/cell-differences.ts';
import type { FileFound } from '../read-back/read-back.ts';

const CLASS_CERTIFICATE_FORMAT = 'normloom-class-certificate';
const CLASS_CERTIFICATE_VERSION = 1;

/** What the certificate says of the class and its table; nothing of any pupil. */
export interface CertifiedClass {
  readonly title: string;
  /** yyyy-mm-dd, or empty. */
  readonly date: string;
  /** Of the report. */
  readonly check: string;
  readonly sharing: 'names' | 'codes' | 'summary';
  /** Null of a class in order within itself. */
  readonly table: { readonly title: string; readonly edition: string; readonly check: string } | null;
}

/**
 * The certificate of class files that were read back, in the order of both lists, as JSON in UTF-8. The key to codes is
 * not among them: nothing beside the key may tell of it.
 */
export function classCertificateJson(
  certified: CertifiedClass,
  files: readonly FileFound[],
  read: readonly FileReadBack[],
  programVersion: string,
): Uint8Array {
  const content = {
    format: CLASS_CERTIFICATE_FORMAT,
    version: CLASS_CERTIFICATE_VERSION,
    program: { name: 'Normloom', version: programVersion },
    ...certified,
    'read-back': {
      'cells-compared': read.reduce((sum, { cells }) => sum + cells, 0),
      differences: read.reduce((sum, { differences }) => sum + differences.length, 0),
      files: files.map(({ file, bytes }, index) => ({
        file,
        bytes: bytes.length,
        sha256: createHash('sha256').update(bytes).digest('hex'),
        'cells-compared': read[index]?.cells ?? 0,
        differences: read[index]?.differences.length ?? 0,
      })),
    },
  };
  return new TextEncoder().encode(`${JSON.stringify(content, null, 1)}\n`);
}
