import { createHash } from 'node:crypto';
import * as v from 'valibot';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { CellComparison, type FileReadBack } from './cell-differences.ts';
import { CERTIFICATE_TITLE } from './certificate-page.ts';
import type { PdfPages } from './pdf-text.ts';
import type { FileFound } from './read-back.ts';
import { squeezed } from './read-text.ts';

const certificateSchema = v.object({
  edition: v.string(),
  date: v.string(),
  check: v.string(),
  'read-back': v.object({
    differences: v.number(),
    files: v.array(v.object({ file: v.string(), sha256: v.string() })),
  }),
});

/** Compares what a certificate says of its edition, and the fingerprints of those of its files that lie beside it. */
export function readCertificate(
  file: string,
  content: unknown,
  { project, check }: NormSet,
  files: readonly FileFound[],
): FileReadBack {
  const comparison = new CellComparison(file);
  const certificate = v.parse(certificateSchema, content);
  const compare = (column: string, expected: string, found: string): void => {
    comparison.compare({ where: 'certificate', group: '', score: '', column }, expected, found);
  };
  compare('check code', check, certificate.check);
  compare('edition', project.release.edition, certificate.edition);
  compare('date', project.release.date, certificate.date);
  compare('differences', '0', String(certificate['read-back'].differences));
  for (const certified of certificate['read-back'].files) {
    const beside = files.find((other) => other.file === certified.file);
    if (beside === undefined) continue;
    const sha256 = createHash('sha256').update(beside.bytes).digest('hex');
    compare(`SHA-256 of ${certified.file}`, sha256, certified.sha256);
  }
  return comparison.result('certificate');
}

export function isCertificatePage(pages: PdfPages): boolean {
  return pages[0]?.[0]?.cells[0]?.text === CERTIFICATE_TITLE;
}

/** The check code on every page of a printed certificate. */
export function readCertificatePage(file: string, pages: PdfPages, { check }: NormSet): FileReadBack {
  const comparison = new CellComparison(file);
  pages.forEach((lines, index) => {
    const text = squeezed((lines.at(-1)?.cells ?? []).map((cell) => cell.text).join(' '));
    const found = /check([0-9A-F]{4}-[0-9A-F]{4})/.exec(text)?.[1] ?? '';
    comparison.compare({ where: `page ${index + 1}`, group: '', score: '', column: 'check code' }, check, found);
  });
  return comparison.result('certificate page');
}
