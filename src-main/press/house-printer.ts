import pdfmake from 'pdfmake';
import { fontFiles } from './fonts.ts';

/** The writer of PDF files with the bundled typefaces, which opens no other file and no address. */
export function housePrinter(onProgress: (share: number) => void): typeof pdfmake {
  const files = new Set(Object.values(fontFiles()).flatMap((family) => Object.values(family)));
  pdfmake.setFonts(fontFiles());
  pdfmake.setUrlAccessPolicy(() => false);
  pdfmake.setLocalAccessPolicy((path) => files.has(path));
  pdfmake.setProgressCallback(onProgress);
  return pdfmake;
}
