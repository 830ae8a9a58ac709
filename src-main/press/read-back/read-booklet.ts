import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { editionLine, tableName } from '../../../shared-core/pages/sheet-texts.ts';
import { BookletRows } from './booklet-rows.ts';
import { CellComparison, type FileReadBack } from './cell-differences.ts';
import { squeezed, type PdfLine, type PdfPages } from './pdf-text.ts';

const PAGE_NUMBER = /^page (\d+) of (\d+)$/;
const TABLE_NAME = /^Table (\d+) ·/;
/** The running head stands within so many points of the first line; its own lines lie closer than so many. */
const HEAD_DEPTH = 40;
const HEAD_LEADING = 11;

/**
 * Reads a booklet by its text: the running head tells the group of a page, the heads the columns, the places the rows.
 * Every cell of every table, each percentile of the inverse table, and head, foot and number of every page are compared
 * with the set; each group and raw score must stand there exactly once, in order, and no page may be missing.
 */
export function readBooklet(file: string, pages: PdfPages, normSet: NormSet): FileReadBack {
  const comparison = new CellComparison(file);
  const rows = new BookletRows(normSet, comparison);
  const total = pageTotal(pages);
  const numbers: number[] = [];
  let group = 0;
  pages.forEach((lines, index) => {
    const where = `page ${index + 1}`;
    const foot = footOf(lines);
    group = groupOn(lines) ?? group;
    const norms = normSet.groups[group];
    if (norms === undefined) {
      comparison.compare({ where, group: '', score: '', column: 'running head' }, '', `Table ${group + 1}`);
      return;
    }
    const place = { where, group: norms.group.title, score: '' };
    comparison.compare({ ...place, column: 'page number' }, `page ${index + 1} of ${total}`, foot.number);
    numbers.push(Number(PAGE_NUMBER.exec(foot.number)?.[1] ?? index + 1));
    compareHead(comparison, place, tableName(normSet.project, group, norms), headText(lines));
    compareFoot(comparison, place, normSet, norms, foot.text);
    rows.take(group, where, lines);
  });
  for (let number = 1; number <= total; number += 1) {
    if (numbers.includes(number)) continue;
    const place = { where: `page ${number}`, group: '', score: '', column: 'page' };
    comparison.compare(place, `page ${number} of ${total}`, '');
  }
  rows.finish();
  return comparison.result('booklet');
}

type PagePlace = { readonly where: string; readonly group: string; readonly score: string };

function compareHead(comparison: CellComparison, place: PagePlace, expected: string, found: string): void {
  const cut = found.endsWith('…') && squeezed(expected).startsWith(squeezed(found.slice(0, -1)));
  const same = cut || squeezed(expected) === squeezed(found);
  comparison.compare({ ...place, column: 'running head' }, expected, same ? expected : found);
}

function compareFoot(
  comparison: CellComparison,
  place: PagePlace,
  normSet: NormSet,
  norms: GroupNorms,
  text: string,
): void {
  const found = /check([0-9A-F]{4}-[0-9A-F]{4})/.exec(squeezed(text))?.[1] ?? '';
  comparison.compare({ ...place, column: 'check code' }, normSet.check, found);
  if (found !== normSet.check) return;
  const expected = editionLine(normSet, norms);
  const same = squeezed(expected) === squeezed(text);
  comparison.compare({ ...place, column: 'foot' }, expected, same ? expected : text);
}

/** "page 2 of 3" and everything beside and below it. */
function footOf(lines: readonly PdfLine[]): { readonly number: string; readonly text: string } {
  const at = lines.findLastIndex(({ cells }) => PAGE_NUMBER.test(cells.at(-1)?.text ?? ''));
  const foot = at < 0 ? lines.slice(-1) : lines.slice(at);
  const cells = foot.flatMap((line) => line.cells);
  const number = at < 0 ? '' : (foot[0]?.cells.at(-1)?.text ?? '');
  const text = cells.map((cell) => cell.text).filter((each) => each !== number);
  return { number, text: text.join(' ') };
}

/** Pages as the booklet counts them: what most of its pages say. */
function pageTotal(pages: PdfPages): number {
  const said = pages.flatMap((lines) => {
    const found = PAGE_NUMBER.exec(footOf(lines).number);
    return found === null ? [] : [Number(found[2])];
  });
  const times = (total: number): number => said.filter((other) => other === total).length;
  return said.reduce((best, total) => (times(total) > times(best) ? total : best), said[0] ?? pages.length);
}

function headCell(
  lines: readonly PdfLine[],
): { readonly line: number; readonly right: number; readonly text: string } | null {
  const [top] = lines;
  if (top === undefined) return null;
  const line = lines.findIndex(({ cells }) => TABLE_NAME.test(cells.at(-1)?.text ?? ''));
  const cell = lines[line]?.cells.at(-1);
  if (cell === undefined || top.baseline - cell.baseline > HEAD_DEPTH) return null;
  return { line, right: cell.right, text: cell.text };
}

function groupOn(lines: readonly PdfLine[]): number | null {
  const number = TABLE_NAME.exec(headCell(lines)?.text ?? '')?.[1];
  return number === undefined ? null : Number(number) - 1;
}

/** The name of the table with the lines it goes on in, all ending at the right margin. */
function headText(lines: readonly PdfLine[]): string {
  const head = headCell(lines);
  if (head === null) return lines[0]?.cells.at(-1)?.text ?? '';
  const texts = [head.text];
  for (let at = head.line + 1; at < lines.length; at += 1) {
    const cell = lines[at]?.cells.at(-1);
    const above = lines[at - 1]?.baseline ?? 0;
    if (cell === undefined || above - cell.baseline > HEAD_LEADING || Math.abs(cell.right - head.right) > 1) break;
    texts.push(cell.text);
  }
  return texts.join(' ');
}
