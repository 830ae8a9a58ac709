import type { Reply } from '../../../shared-core/desk.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { differenceLine, type CellDifference, type FileReadBack } from './cell-differences.ts';
import { readPdf, type PdfLine, type PdfRead } from './pdf-text.ts';
import { pressedContent } from './pressed-kind.ts';
import { readBooklet } from './read-booklet.ts';
import { isCertificatePage, readCertificate, readCertificatePage } from './read-certificate.ts';
import { readCsv } from './read-csv.ts';
import { readEdition } from './read-edition.ts';
import { readNormSet } from './read-norm-set.ts';
import { readWorkbook } from './read-workbook.ts';

/** A file as it was found: a name for sentences, and its bytes. */
export interface FileFound {
  readonly file: string;
  readonly bytes: Uint8Array;
}

/** Told before each file, with its name. */
export type ReadingFile = (file: string) => void;

/**
 * Opens pressed files of any kind, told apart by their content, and compares every cell with the set. The problem is a
 * sentence about a file that cannot be read at all.
 */
export async function readBack(
  files: readonly FileFound[],
  normSet: NormSet,
  onFile: ReadingFile = () => {},
): Promise<Reply<readonly FileReadBack[]>> {
  const read: FileReadBack[] = [];
  for (const found of files) {
    onFile(found.file);
    const reply = await readOne(found, files, normSet);
    if (!reply.ok) return reply;
    read.push(reply.value);
  }
  return { ok: true, value: read };
}

/** All differences of several files. */
export function differencesIn(read: readonly FileReadBack[]): readonly CellDifference[] {
  return read.flatMap(({ differences }) => differences);
}

const DIFFERENCES_TOLD = 5;

/** Why files that were just made may not be handed out, with the first cells that differ; null where all agree. */
export function readBackProblem(read: readonly FileReadBack[]): string | null {
  const differences = differencesIn(read);
  if (differences.length === 0) return null;
  const told = differences.slice(0, DIFFERENCES_TOLD).map(differenceLine).join('; ');
  const more = differences.length > DIFFERENCES_TOLD ? `; and ${differences.length - DIFFERENCES_TOLD} more` : '';
  return (
    `The files were read back and do not say what the tables say, so nothing was written. ${told}${more}. ` +
    'This is a fault of the program: keep the project and report it.'
  );
}

async function readOne(
  { file, bytes }: FileFound,
  files: readonly FileFound[],
  normSet: NormSet,
): Promise<Reply<FileReadBack>> {
  const found = pressedContent(bytes);
  if (found === null) {
    return {
      ok: false,
      problem: `${file} is no file that Normloom presses. Name a booklet, workbook, csv or norm set.`,
    };
  }
  try {
    switch (found.kind) {
      case 'booklet':
        return { ok: true, value: readPdfFile(file, await readPdf(bytes), normSet) };
      case 'workbook':
        return { ok: true, value: await readWorkbook(file, bytes, normSet) };
      case 'csv':
        return { ok: true, value: readCsv(file, found.text, normSet) };
      case 'norm-set':
        return { ok: true, value: readNormSet(file, found.content, normSet) };
      case 'certificate':
        return { ok: true, value: readCertificate(file, found.content, normSet, files) };
      case 'edition':
        return { ok: true, value: readEdition(file, found.text, normSet, files) };
    }
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return { ok: false, problem: `${file} cannot be opened (${why}). It is damaged; press the edition again.` };
  }
}

function readPdfFile(file: string, read: PdfRead<readonly PdfLine[]>, normSet: NormSet): FileReadBack {
  return isCertificatePage(read.pages)
    ? readCertificatePage(file, read.pages, normSet)
    : readBooklet(file, read, normSet);
}
