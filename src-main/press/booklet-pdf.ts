import type { TDocumentDefinitions } from 'pdfmake/interfaces.js';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import type { Block, Booklet, Picture, Rule, TextLine } from '../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../shared-core/pages/booklet-pages.ts';
import { tableMarks } from '../../shared-core/pages/table-blocks.ts';
import { programVersion } from '../program-version.ts';
import { PICTURE_FONTS } from './fonts.ts';
import { housePrinter } from './house-printer.ts';
import { drawPicture, drawRule, drawText } from './page-drawing.ts';
import { releaseDay } from './release-day.ts';
import { packStructure } from './structure-packing.ts';
import { placeOf, StructureTree, type DrawnPart } from './structure-tree.ts';

export interface DrawnBooklet {
  readonly pdf: Uint8Array;
  readonly pages: number;
  readonly remarks: readonly string[];
}

/**
 * The booklet of a set as a tagged PDF of version 1.7: pdfmake makes the document, and every placed mark is drawn into it
 * under its element of the structure tree. The same set gives the same bytes.
 */
export async function bookletPdf(
  normSet: NormSet,
  onProgress: (share: number) => void = () => {},
): Promise<DrawnBooklet> {
  const booklet = composeBooklet(normSet, programVersion());
  const made = housePrinter(PICTURE_FONTS).createPdf(definition(booklet, releaseDay(normSet.project)));
  const document = await made.getStream();
  drawBooklet(document, booklet, onProgress);
  const { start, count } = document.bufferedPageRange();
  if (start + count !== booklet.pages.length) {
    throw new Error(`the booklet has ${booklet.pages.length} pages, but ${start + count} were drawn`);
  }
  return { pdf: packStructure(await made.getBuffer()), pages: start + count, remarks: booklet.remarks };
}

/** The document with its first page, still white. */
function definition({ title, paper }: Booklet, day: Date): TDocumentDefinitions {
  return {
    version: '1.7',
    language: 'en',
    tagged: true,
    displayTitle: true,
    info: { title, creator: 'Normloom', producer: 'Normloom', creationDate: day, modDate: day },
    pageSize: { width: paper.width, height: paper.height },
    pageMargins: 0,
    defaultStyle: { font: 'Source Sans 3' },
    content: [],
  };
}

function drawBooklet(
  document: PDFKit.PDFDocument,
  { paper, pages }: Booklet,
  onProgress: (share: number) => void,
): void {
  const tree = new StructureTree(document);
  const parts = pages.map(({ blocks }) => marksTogether(blocks.flatMap(marksOf)));
  const all = parts.reduce((sum, onPage) => sum + onPage.length, 0);
  let drawn = 0;
  numberPages(document);
  pages.forEach(({ number, opens }, index) => {
    if (number > 1) document.addPage({ size: [paper.width, paper.height] });
    if (opens !== null) {
      document.outline.addItem(opens);
      tree.openSheet(opens);
    }
    for (const { part, marks } of parts[index] ?? []) {
      tree.mark(part, () => {
        for (const mark of marks) drawMark(document, mark);
      });
      drawn += 1;
      onProgress(drawn / all);
    }
  });
  tree.closeSheet();
}

type Mark = TextLine | Rule | Picture;

function marksOf(block: Block): readonly Mark[] {
  return block.kind === 'table-column' ? tableMarks(block) : [block];
}

interface MarkedPart {
  readonly part: DrawnPart;
  readonly marks: readonly Mark[];
}

/** Marks that follow each other and belong to one part. */
function marksTogether(marks: readonly Mark[]): readonly MarkedPart[] {
  const parts: { readonly part: DrawnPart; readonly marks: Mark[] }[] = [];
  let before = '';
  for (const mark of marks) {
    const part = partOf(mark);
    const place = placeOf(part);
    if (place === before) parts.at(-1)?.marks.push(mark);
    else parts.push({ part, marks: [mark] });
    before = place;
  }
  return parts;
}

function partOf(mark: Mark): DrawnPart {
  return mark.kind === 'text' ? mark.role : mark;
}

function drawMark(document: PDFKit.PDFDocument, mark: Mark): void {
  switch (mark.kind) {
    case 'text':
      drawText(document, mark, spaceBehind(mark));
      return;
    case 'rule':
      drawRule(document, mark);
      return;
    case 'picture':
      drawPicture(document, mark);
      return;
  }
}

/** A line of prose or of a head ends in the space before the next word, unless its last word goes on in the next line. */
function spaceBehind({ role, runs }: TextLine): '' | ' ' {
  const goesOn = /[^ ][-–—/]$/.test(runs.at(-1)?.text ?? '');
  return (role.kind !== 'cell' || role.row === 'head') && !goesOn ? ' ' : '';
}

/** Pages carry their printed numbers as labels, which pdfkit has no call for. */
function numberPages(document: PDFKit.PDFDocument): void {
  const { _root } = document as PDFKit.PDFDocument & {
    readonly _root: { readonly data: Record<string, unknown> };
  };
  _root.data['PageLabels'] = { Nums: [0, { S: 'D' }] };
}
