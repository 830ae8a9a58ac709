import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';

export interface PlacedText {
  readonly text: string;
  /** Points from the left and from the bottom of the page. */
  readonly x: number;
  readonly y: number;
}

export interface ReadPdf {
  readonly pages: readonly (readonly PlacedText[])[];
  readonly outline: readonly string[];
  readonly title: string;
  readonly language: string;
}

/** Texts of a PDF with their places, its outline, title and language, as another program reads them. */
export async function readPdf(bytes: Uint8Array): Promise<ReadPdf> {
  const task = getDocument({ data: bytes.slice(), isEvalSupported: false, verbosity: 0 });
  const document = await task.promise;
  const pages: PlacedText[][] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const { items } = await page.getTextContent();
    pages.push(
      items.flatMap((item) =>
        'str' in item && item.str.trim() !== ''
          ? [{ text: item.str, x: Number(item.transform[4]), y: Number(item.transform[5]) }]
          : [],
      ),
    );
  }
  const outline = await document.getOutline();
  const { info } = await document.getMetadata();
  const facts = new Map(Object.entries(info));
  await task.destroy();
  return {
    pages,
    outline: outline.map(({ title }) => title),
    title: String(facts.get('Title')),
    language: String(facts.get('Language')),
  };
}
