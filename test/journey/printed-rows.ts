import { readPdf, type PlacedText } from '../src-main/press/pdf-text.ts';

/** One row of a printed table as a reader finds it: its group, raw score and percentile rank. */
export interface PrintedRow {
  readonly group: string;
  readonly score: string;
  readonly printed: string;
}

/** Points from one line of a table to the next, at most; what stands further below is no longer the table. */
const LARGEST_STEP = 28;

/**
 * Finds the rows of all conversion tables in a PDF by the places of its texts alone: the heading word "Raw" begins a
 * column of the table, the lines close below it are its rows, the first two texts of a line are raw score and percentile
 * rank, and the running head names the group.
 */
export async function rowsInPdf(bytes: Uint8Array): Promise<readonly PrintedRow[]> {
  const { pages } = await readPdf(bytes);
  return pages.flatMap(rowsOnPage);
}

function rowsOnPage(page: readonly PlacedText[]): readonly PrintedRow[] {
  const head = page.find(({ text }) => /^Table \d+ · /.test(text))?.text;
  if (head === undefined) throw new Error('a page without its running head');
  const group = head.replace(/^Table \d+ · /, '');
  const headings = page.filter(({ text }) => text === 'Raw');
  return headings.flatMap((heading, index) => {
    const start = heading.x - 25;
    const end = (headings[index + 1]?.x ?? Infinity) - 25;
    const column = page.filter(({ x, y }) => x >= start && x < end && y < heading.y);
    return tableLines(column, heading.y).flatMap((line) => {
      const texts = line.toSorted((left, right) => left.x - right.x).map(({ text }) => text.trim());
      const [score = '', printed = ''] = texts;
      return /^−?[\d.]+$/.test(score) ? [{ group, score, printed }] : [];
    });
  });
}

/** The lines of a column from its heading down to the first large gap. */
function tableLines(column: readonly PlacedText[], from: number): readonly (readonly PlacedText[])[] {
  const lines = new Map<string, PlacedText[]>();
  for (const item of column) lines.set(item.y.toFixed(1), [...(lines.get(item.y.toFixed(1)) ?? []), item]);
  const heights = [...lines.keys()].map(Number).sort((left, right) => right - left);
  let last = from;
  const table: (readonly PlacedText[])[] = [];
  for (const height of heights) {
    if (last - height > LARGEST_STEP) break;
    last = height;
    table.push(lines.get(height.toFixed(1)) ?? []);
  }
  return table;
}
