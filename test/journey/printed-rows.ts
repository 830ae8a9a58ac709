import { readPdf, type PlacedText } from '../src-main/press/pdf-text.ts';

/** One row of a printed table as a reader finds it: its group, raw score and percentile rank. */
export interface PrintedRow {
  readonly group: string;
  readonly score: string;
  readonly printed: string;
}

/**
 * Finds the rows of all conversion tables in a PDF by the places of its texts alone: the heading word "Raw" begins a
 * column of the table, a line of as many cells as the table has columns is a row, and the running head names the group.
 */
export async function rowsInPdf(bytes: Uint8Array, cells: number): Promise<readonly PrintedRow[]> {
  const { pages } = await readPdf(bytes);
  return pages.flatMap((page) => rowsOnPage(page, cells));
}

function rowsOnPage(page: readonly PlacedText[], cells: number): readonly PrintedRow[] {
  const head = page.find(({ text }) => /^Table \d+ · /.test(text))?.text;
  if (head === undefined) throw new Error('a page without its running head');
  const group = head.replace(/^Table \d+ · /, '');
  const starts = page.filter(({ text }) => text === 'Raw').map(({ x }) => x - 25);
  const columnOf = (x: number): number => starts.filter((start) => start <= x).length;
  const lines = new Map<string, PlacedText[]>();
  for (const item of page) {
    const key = `${item.y.toFixed(1)}/${columnOf(item.x)}`;
    lines.set(key, [...(lines.get(key) ?? []), item]);
  }
  return [...lines.values()].flatMap((line) => {
    const texts = line.toSorted((left, right) => left.x - right.x).map(({ text }) => text.trim());
    const [score = '', printed = ''] = texts;
    return texts.length === cells && /^−?[\d.]+$/.test(score) ? [{ group, score, printed }] : [];
  });
}
