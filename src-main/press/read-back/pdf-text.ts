import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';
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

/** The lines of every page of a PDF, from the top, as another program reads them. Throws on a file that is no PDF. */
export async function pdfPages(bytes: Uint8Array): Promise<PdfPages> {
  return (await pdfParts(bytes)).map(linesOf);
}

/** The pieces of text of every page as they were drawn, in no order. Throws on a file that is no PDF. */
export async function pdfParts(bytes: Uint8Array): Promise<readonly (readonly PdfCell[])[]> {
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
      pages.push(
        items.flatMap((item): PdfCell[] => {
          if (!('str' in item) || item.str.trim() === '') return [];
          const [size, slant, , , left, baseline] = item.transform.map(Number);
          if (size === undefined || slant !== 0 || left === undefined || baseline === undefined) return [];
          return [{ text: item.str, left, right: left + item.width, baseline, size }];
        }),
      );
      page.cleanup();
    }
    return pages;
  } finally {
    await task.destroy();
  }
}

/** Without any space: line breaks and the width of spaces say nothing about a text. */
export function squeezed(text: string): string {
  return text.replace(/\s+/g, '');
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
