import { createRequire } from 'node:module';
import type { Picture, Rule, TextLine } from '../../shared-core/pages/booklet.ts';
import { PRINTED_COLOURS } from '../../shared-core/pages/ogive-picture.ts';
import { FONT_FILES } from './fonts.ts';

/** pdfmake's own drawing of SVG, which it does not offer outside of its layout; the version of pdfmake is fixed. */
interface SvgRenderer {
  renderSVG(picture: { svg: string; x: number; y: number; _width: number; _height: number }): void;
}

const { default: Renderer } = createRequire(import.meta.url)('pdfmake/js/Renderer.js') as {
  readonly default: new (document: PDFKit.PDFDocument) => SvgRenderer;
};

/** One line of text on the current page; `after` is drawn behind it and moves nothing. */
export function drawText(document: PDFKit.PDFDocument, line: TextLine, after: '' | ' '): void {
  const { x, baseline, width, align, size, colour, runs } = line;
  document.fillColor(PRINTED_COLOURS[colour]).fontSize(size);
  const widths = runs.map(({ text, face }) => document.font(FONT_FILES[face]).widthOfString(text));
  let left = align === 'left' ? x : x + width - widths.reduce((sum, wide) => sum + wide, 0);
  runs.forEach(({ text, face }, index) => {
    const whole = index === runs.length - 1 ? `${text}${after}` : text;
    document.font(FONT_FILES[face]).text(whole, left, baseline, { lineBreak: false, baseline: 'alphabetic' });
    left += widths[index] ?? 0;
  });
}

export function drawRule(document: PDFKit.PDFDocument, { x, y, width, weight }: Rule): void {
  document
    .lineWidth(weight)
    .moveTo(x, y)
    .lineTo(x + width, y)
    .stroke(PRINTED_COLOURS.ink);
}

export function drawPicture(document: PDFKit.PDFDocument, { svg, x, y, width, height }: Picture): void {
  new Renderer(document).renderSVG({ svg, x, y, _width: width, _height: height });
}
