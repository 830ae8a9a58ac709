import pdfmake from 'pdfmake';
import { FONT_FILES, type FACE_FONTS, type PICTURE_FONTS } from './fonts.ts';

/** The writer of PDF files with some of the bundled typefaces; it opens no other file and no address. */
export function housePrinter(fonts: typeof FACE_FONTS | typeof PICTURE_FONTS): typeof pdfmake {
  const files = new Set<string>(Object.values(FONT_FILES));
  pdfmake.setFonts({ ...fonts });
  pdfmake.setUrlAccessPolicy(() => false);
  pdfmake.setLocalAccessPolicy((path) => files.has(path));
  return pdfmake;
}
