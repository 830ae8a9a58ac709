import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';
import { BOX } from './read-text.ts';
import type * as pdfjs from 'pdfjs-dist/legacy/build/pdf.mjs';

/** Words that stand together on a page; points from the left and from the bottom of the paper. */
export interface PdfCell {
  readonly text: string;
  readonly left: number;
  readonly right: number;
  readonly baseline: number;
  readonly size: number;
}

/** Cells on one baseline, from left to right. */
export interface PdfLine {
  readonly baseline: number;
  readonly cells: readonly PdfCell[];
}

/** Lines of each page, from the top. */
export type PdfPages = readonly (readonly PdfLine[])[];

/** Shares of the type size: wider gaps than these part words, and cells. */
const WORD_GAP = 0.12;
const CELL_GAP = 0.35;
const SAME_LINE = 0.6;
/** What a reader is told where a box is drawn. */
const NO_GLYPH = '\0';

/** A PDF as another program reads it. */
export interface PdfRead<Page> {
  readonly pages: readonly Page[];
  /** The program that made it, as it names itself; empty where it does not. */
  readonly producer: string;
}

/** Reads the lines of every page of a PDF, from the top. Throws on a file that is no PDF. */
export async function readPdf(bytes: Uint8Array): Promise<PdfRead<readonly PdfLine[]>> {
  const { pages, producer } = await readPdfParts(bytes);
  return { pages: pages.map(linesOf), producer };
}

/** Reads the pieces of text of every page as they were drawn, in no order. Throws on a file that is no PDF. */
export async function readPdfParts(bytes: Uint8Array): Promise<PdfRead<readonly PdfCell[]>> {
  const { getDocument } = await pdfReader();
  const task = getDocument({
    data: Uint8Array.from(bytes),
    isEvalSupported: false,
    useSystemFonts: false,
    verbosity: 0,
  });
  try {
    const document = await task.promise;
    const pages: (readonly PdfCell[])[] = [];
    for (let number = 1; number <= document.numPages; number += 1) {
      const page = await document.getPage(number);
      const { items } = await page.getTextContent({ disableNormalization: true });
      const parts = items.flatMap((item): PdfCell[] => {
        if (!('str' in item) || item.str.trim() === '') return [];
        const [size, slant, , , left, baseline] = item.transform.map(Number);
        if (size === undefined || slant !== 0 || left === undefined || baseline === undefined) return [];
        return [{ text: item.str.replaceAll(NO_GLYPH, BOX), left, right: left + item.width, baseline, size }];
      });
      pages.push(parts);
      page.cleanup();
    }
    const { info } = await document.getMetadata();
    const producer: unknown = Reflect.get(info, 'Producer');
    return { pages, producer: typeof producer === 'string' ? producer : '' };
  } finally {
    await task.destroy();
  }
}

function linesOf(parts: readonly PdfCell[]): readonly PdfLine[] {
  const lines: PdfCell[][] = [];
  for (const part of parts.toSorted((left, right) => right.baseline - left.baseline)) {
    const line = lines.at(-1);
    if (line?.[0] !== undefined && line[0].baseline - part.baseline < SAME_LINE) line.push(part);
    else lines.push([part]);
  }
  return lines.map((line) => ({ baseline: line[0]?.baseline ?? 0, cells: joined(line) }));
}

function joined(line: readonly PdfCell[]): readonly PdfCell[] {
  const cells: PdfCell[] = [];
  for (const part of line.toSorted((left, right) => left.left - right.left)) {
    const before = cells.at(-1);
    const gap = before === undefined ? Infinity : part.left - before.right;
    if (before === undefined || gap > CELL_GAP * part.size) cells.push({ ...part, text: part.text.trim() });
    else {
      const between = gap > WORD_GAP * part.size ? ' ' : '';
      cells.splice(-1, 1, { ...before, text: `${before.text}${between}${part.text.trim()}`, right: part.right });
    }
  }
  return cells;
}

type PdfReader = typeof pdfjs;

let reader: Promise<PdfReader> | null = null;

/**
 * The reader of PDF texts. It names classes of a drawing library when it is loaded, which reading a text never uses;
 * empty ones stand in, and its remark that the library is missing is not passed on.
 */
function pdfReader(): Promise<PdfReader> {
  reader ??= loadReader();
  return reader;
}

async function loadReader(): Promise<PdfReader> {
  for (const name of ['DOMMatrix', 'ImageData', 'Path2D']) {
    if (!Reflect.has(globalThis, name)) Reflect.set(globalThis, name, function unused(): void {});
  }
  const { warn } = console;
  console.warn = (...told: unknown[]): void => {
    if (!String(told[0]).includes('@napi-rs/canvas')) warn(...told);
  };
  try {
    // Loaded at hand, the part that reads files is found in every host, packed or not.
    const { resolve } = createRequire(import.meta.url);
    await import(pathToFileURL(resolve('pdfjs-dist/legacy/build/pdf.worker.mjs')).href);
    return await import('pdfjs-dist/legacy/build/pdf.mjs');
  } finally {
    console.warn = warn;
  }
}
