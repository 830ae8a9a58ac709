import { getDocument, PDFWorker, type PDFDocumentProxy } from 'pdfjs-dist';
import workerUrl from 'pdfjs-dist/build/pdf.worker.min.mjs?url';
import { startWorker } from '../compute/own-worker.ts';

/** One worker serves all documents; a document that is closed leaves it to the others. */
let shared: PDFWorker | null = null;

/** Opens a PDF given as base64. Whoever opens it destroys it when it is no longer shown. */
export async function openPages(base64: string): Promise<PDFDocumentProxy> {
  shared ??= PDFWorker.create({ port: startWorker(workerUrl) });
  const binary = atob(base64);
  const data = Uint8Array.from(binary, (letter) => letter.charCodeAt(0));
  return getDocument({ data, worker: shared, isEvalSupported: false, useWorkerFetch: false }).promise;
}

/** Width of the first page against its height; all pages of a booklet are alike. */
export async function shapeOf(pages: PDFDocumentProxy): Promise<number> {
  const { width, height } = (await pages.getPage(1)).getViewport({ scale: 1 });
  return width / height;
}

/** A page (from 1) as a picture that fills `width` CSS pixels. */
export async function drawPage(pages: PDFDocumentProxy, number: number, width: number): Promise<HTMLCanvasElement> {
  const page = await pages.getPage(number);
  const whole = page.getViewport({ scale: 1 });
  const density = Math.max(1, window.devicePixelRatio);
  const viewport = page.getViewport({ scale: (width / whole.width) * density });
  const canvas = document.createElement('canvas');
  canvas.width = Math.round(viewport.width);
  canvas.height = Math.round(viewport.height);
  await page.render({ canvas, viewport }).promise;
  return canvas;
}
