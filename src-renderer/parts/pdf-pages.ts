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

/** Draws a page (from 1) into a canvas so wide that it fills `width` CSS pixels; returns its height in CSS pixels. */
export async function drawPage(
  pages: PDFDocumentProxy,
  number: number,
  canvas: HTMLCanvasElement,
  width: number,
): Promise<number> {
  const page = await pages.getPage(number);
  const whole = page.getViewport({ scale: 1 });
  const density = Math.max(1, window.devicePixelRatio);
  const viewport = page.getViewport({ scale: (width / whole.width) * density });
  canvas.width = Math.round(viewport.width);
  canvas.height = Math.round(viewport.height);
  await page.render({ canvas, viewport }).promise;
  return viewport.height / density;
}
