import type { Content, TableCell, TDocumentDefinitions } from 'pdfmake/interfaces.js';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { PRINTED_COLOURS } from '../../../shared-core/pages/ogive-picture.ts';
import { paperOf } from '../../../shared-core/pages/paper.ts';
import {
  FINE_RULE,
  PROSE,
  RUNNING,
  SMALL_PROSE,
  STRONG_RULE,
  SUBTITLE,
  TITLE,
} from '../../../shared-core/pages/type-sizes.ts';
import { printCount } from '../../../shared-core/scores/printed-number.ts';
import { FACE_FONTS } from '../fonts.ts';
import { housePrinter } from '../house-printer.ts';
import { releaseDay } from '../release-day.ts';
import type { Certificate, CertifiedFile } from './certificate.ts';

export const CERTIFICATE_TITLE = 'Certificate of read-back';

/** The certificate as a PDF page, on the paper of the booklet; the recipes of many groups go on on further pages. */
export async function certificatePdf(certificate: Certificate, { project }: NormSet): Promise<Uint8Array> {
  const paper = paperOf(project.sheet);
  const day = releaseDay(project);
  const title = `${CERTIFICATE_TITLE} · ${certificate.survey}`;
  const foot = [`Edition ${certificate.edition}`, certificate.date, `check ${certificate.check}`]
    .filter((part) => part !== '')
    .join(' · ');
  const definition: TDocumentDefinitions = {
    version: '1.7',
    language: 'en',
    displayTitle: true,
    info: { title, creator: 'Normloom', producer: 'Normloom', creationDate: day, modDate: day },
    pageSize: { width: paper.width, height: paper.height },
    pageMargins: paper.margin,
    defaultStyle: { font: 'sans', fontSize: PROSE.size, color: PRINTED_COLOURS.ink, lineHeight: 1.05 },
    footer: (page, pages) => ({
      margin: [paper.margin, 12, paper.margin, 0],
      fontSize: RUNNING.size,
      color: PRINTED_COLOURS.soft,
      columns: [{ text: foot }, { text: `page ${page} of ${pages}`, alignment: 'right', width: 'auto' }],
    }),
    content: contentOf(certificate),
  };
  return new Uint8Array(await housePrinter(FACE_FONTS).createPdf(definition).getBuffer());
}

function contentOf(certificate: Certificate): Content[] {
  const { survey, programVersion, cells, recomputed, notRecomputed, recipes } = certificate;
  const lines = certificate.files.reduce((sum, file) => sum + file.lines, 0);
  const differ = certificate.files.reduce((sum, { differences }) => sum + differences, 0);
  return [
    { text: CERTIFICATE_TITLE, outline: true, font: 'serif-bold', fontSize: TITLE.size },
    { text: survey, font: 'serif-italic', fontSize: SUBTITLE.size, margin: [0, 2, 0, 12] },
    paragraph(
      `Normloom ${programVersion} opened the files below again after they were made and compared every printed cell ` +
        `with the norm set: ${printCount(cells)} cells. Every line of text of the booklet, ${printCount(lines)} of them, was ` +
        `compared with its pages placed anew. There is ${differences(differ)}.`,
    ),
    paragraph(
      'Tables that are not smoothed were worked out a second time from the tally, by another way of counting and of ' +
        `rounding: ${printCount(recomputed.cells)} cells, ${differences(recomputed.differences)}.` +
        (notRecomputed.length === 0 ? '' : ` Smoothed, and so left out of this: ${notRecomputed.join(', ')}.`),
    ),
    filesTable(certificate.files),
    paragraph('To compare again at any time: normloom read-back FILE … --against PROJECT.'),
    {
      text: 'One row of each table, redone by hand',
      font: 'serif-bold',
      fontSize: SUBTITLE.size,
      margin: [0, 10, 0, 4],
    },
    ...recipes.map(({ group, score, printed, sentences }) => ({
      text: [{ text: `${group}, raw score ${score}: ${printed}. `, font: 'sans-bold' }, sentences.join(' ')],
      margin: [0, 0, 0, 5] as [number, number, number, number],
      unbreakable: true,
    })),
  ];
}

function filesTable(files: readonly CertifiedFile[]): Content {
  const head = (text: string, alignment: 'left' | 'right'): TableCell => ({
    text,
    alignment,
    font: 'sans-bold',
  });
  return {
    margin: [0, 6, 0, 10],
    fontSize: SMALL_PROSE.size,
    layout: {
      hLineWidth: (line, node) =>
        line === 0 || line === node.table.body.length ? STRONG_RULE : line === 1 ? FINE_RULE : 0,
      vLineWidth: () => 0,
      hLineColor: () => PRINTED_COLOURS.ink,
      paddingLeft: (column) => (column === 0 ? 0 : 8),
      paddingRight: () => 0,
    },
    table: {
      headerRows: 1,
      widths: ['auto', 'auto', 'auto', 'auto', '*'],
      body: [
        [
          head('File', 'left'),
          head('Bytes', 'right'),
          head('Cells', 'right'),
          head('Differ', 'right'),
          head('SHA-256', 'left'),
        ],
        ...files.map(({ file, bytes, cells, differences: differ, sha256 }): TableCell[] => [
          { text: file },
          { text: printCount(bytes), alignment: 'right' },
          { text: printCount(cells), alignment: 'right' },
          { text: printCount(differ), alignment: 'right' },
          { text: `${sha256.slice(0, 32)} ${sha256.slice(32)}` },
        ]),
      ],
    },
  };
}

function paragraph(text: string): Content {
  return { text, margin: [0, 0, 0, 5] };
}

function differences(count: number): string {
  return count === 0 ? 'no difference' : count === 1 ? 'one difference' : `${printCount(count)} differences`;
}
