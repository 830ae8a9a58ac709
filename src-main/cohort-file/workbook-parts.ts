import { Readable } from 'node:stream';
import type JSZip from 'jszip';
import { isBuiltInDateFormat, isDateFormat } from './cell-text.ts';
import { RichText } from './sheet-records.ts';
import { attribute, XmlScanner, type XmlSeer } from './xml-scanner.ts';

export interface WorkbookSheet {
  readonly name: string;
  /** Path of the sheet's XML inside the zip. */
  readonly path: string;
}

export interface WorkbookContents {
  readonly sheets: readonly WorkbookSheet[];
  readonly from1904: boolean;
}

/** Sheets that hold cells, in the order of the tabs; chart sheets are left out. */
export async function workbookContents(zip: JSZip): Promise<WorkbookContents> {
  const targets = new Map<string, string>();
  await scanPart(zip, 'xl/_rels/workbook.xml.rels', {
    open: (name, attributes) => {
      if (name !== 'Relationship' || attribute(attributes, 'Type')?.endsWith('/worksheet') !== true) return;
      const target = attribute(attributes, 'Target') ?? '';
      targets.set(attribute(attributes, 'Id') ?? '', target.startsWith('/') ? target.slice(1) : `xl/${target}`);
    },
  });
  const sheets: WorkbookSheet[] = [];
  let from1904 = false;
  await scanPart(zip, 'xl/workbook.xml', {
    open: (name, attributes) => {
      if (name === 'workbookPr') from1904 = /^(1|true)$/.test(attribute(attributes, 'date1904') ?? '');
      if (name !== 'sheet') return;
      const path = targets.get(attribute(attributes, 'id') ?? '');
      if (path !== undefined) sheets.push({ name: attribute(attributes, 'name') ?? '', path });
    },
  });
  return { sheets, from1904 };
}

/** Texts that cells name by their number. */
export async function sharedTexts(zip: JSZip): Promise<readonly string[]> {
  const texts: string[] = [];
  const rich = new RichText();
  await scanPart(zip, 'xl/sharedStrings.xml', {
    open: (name) => rich.open(name),
    close: (name) => {
      if (name === 'si') texts.push(rich.take());
      else rich.close(name);
    },
    text: (text) => rich.add(text),
  });
  return texts;
}

/** For each style number whether numbers of that style are dates. */
export async function dateStyles(zip: JSZip): Promise<readonly boolean[]> {
  const dateFormats = new Map<number, boolean>();
  const styles: boolean[] = [];
  let inCellStyles = false;
  await scanPart(zip, 'xl/styles.xml', {
    open: (name, attributes) => {
      if (name === 'numFmt') {
        dateFormats.set(
          Number(attribute(attributes, 'numFmtId')),
          isDateFormat(attribute(attributes, 'formatCode') ?? ''),
        );
      } else if (name === 'cellXfs') {
        inCellStyles = true;
      } else if (name === 'xf' && inCellStyles) {
        const id = Number(attribute(attributes, 'numFmtId') ?? 0);
        styles.push(dateFormats.get(id) ?? isBuiltInDateFormat(id));
      }
    },
    close: (name) => {
      if (name === 'cellXfs') inCellStyles = false;
    },
  });
  return styles;
}

/** Scans one part of the workbook, where it is there. */
async function scanPart(zip: JSZip, path: string, seer: Partial<XmlSeer>): Promise<void> {
  const scanner = new XmlScanner({
    open: (name, attributes) => seer.open?.(name, attributes),
    close: (name) => seer.close?.(name),
    text: (text) => seer.text?.(text),
  });
  for await (const text of partTexts(zip, path)) scanner.write(text);
}

/** A part of the workbook as text, block by block. */
export async function* partTexts(
  zip: JSZip,
  path: string,
  onProgress: (done: number) => void = () => undefined,
): AsyncGenerator<string> {
  const part = zip.file(path);
  if (part === null) return;
  const decoder = new TextDecoder('utf-8');
  const packed = part.nodeStream('nodebuffer', ({ percent }) => onProgress(percent / 100));
  const blocks: AsyncIterable<Buffer> = new Readable().wrap(packed);
  for await (const block of blocks) yield decoder.decode(block, { stream: true });
  yield decoder.decode();
}
