import type { GroupNorms } from '../../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { bookletLine, editionLine, tableName } from '../../../shared-core/pages/sheet-texts.ts';
import { producerName, programVersion } from '../../program-version.ts';
import { AcrossRows, groupsAcrossExpected, inverseAcrossExpected } from './across-rows.ts';
import { BookletPlaces, pageTotal, saysHead, type BookletFoot } from './booklet-place.ts';
import { BookletRows } from './booklet-rows.ts';
import { CellComparison, type CellPlace, type FileReadBack } from './cell-differences.ts';
import { comparePages } from './compare-pages.ts';
import { CutRows } from './cut-rows.ts';
import type { PdfLine, PdfRead } from './pdf-text.ts';
import { squeezed } from './read-text.ts';

/**
 * Reads a booklet by its text. First what it says is compared with the norm set: the running head tells the group of a
 * page, the heads the columns, the places the rows. Every cell of every table, and head, foot and number of every page
 * are compared; each group and raw score must stand in the conversion tables exactly once, in order, and once more in
 * the table of all groups where that is printed; no page may be missing. Then every line of text is compared with the
 * booklet placed anew, so that nothing else on its pages can differ either; one that another version of the program
 * placed may break its lines elsewhere, and is left out of that.
 */
export function readBooklet(
  file: string,
  { pages, producer }: PdfRead<readonly PdfLine[]>,
  normSet: NormSet,
): FileReadBack {
  const comparison = new CellComparison(file);
  const rows = new BookletRows(normSet, comparison);
  const blocks = [
    new AcrossRows(normSet, comparison, groupsAcrossExpected(normSet)),
    new AcrossRows(normSet, comparison, inverseAcrossExpected(normSet)),
    new CutRows(normSet, comparison),
  ];
  const reader = new BookletPlaces(normSet);
  const places = pages.map((lines) => reader.of(lines));
  const total = pageTotal(places, pages);
  pages.forEach((lines, index) => {
    const where = `page ${index + 1}`;
    const { sheet, foot } = places[index] ?? { sheet: null, foot: null };
    const norms = sheet === null ? undefined : normSet.groups[sheet.group];
    const place = { where, group: norms?.group.title ?? '', score: '', column: '' };
    const number = reader.pageNumber(index + 1, total);
    if (foot !== null || norms !== undefined) {
      comparison.compare({ ...place, column: 'page number' }, number, foot?.number ?? '');
      compareFoot(comparison, place, normSet, norms, foot);
    }
    if (sheet === null || norms === undefined) {
      for (const block of blocks) block.take(where, lines);
      return;
    }
    const name = tableName(normSet.project, sheet.group, norms);
    comparison.compare({ ...place, column: 'running head' }, name, saysHead(name, sheet.head) ? name : sheet.head);
    rows.take(sheet.group, where, lines);
  });
  const numbers = new Set(places.map(({ foot }, index) => foot?.page ?? index + 1));
  for (let number = 1; number <= total; number += 1) {
    if (numbers.has(number)) continue;
    const place = { where: `page ${number}`, group: '', score: '', column: 'page' };
    comparison.compare(place, reader.pageNumber(number, total), '');
  }
  rows.finish();
  for (const block of blocks) block.finish();
  const version = programVersion();
  if (producer === producerName(version)) {
    comparePages(comparison, composeBooklet(normSet, version), pages);
  } else {
    comparison.remark(
      `${file} was not made by this version of the program (${producerName(version)}); its tables, heads and feet were ` +
        'compared, its other texts were not. Read it back with the version that made it.',
    );
  }
  return comparison.result('booklet');
}

function compareFoot(
  comparison: CellComparison,
  place: CellPlace,
  normSet: NormSet,
  norms: GroupNorms | undefined,
  foot: BookletFoot | null,
): void {
  const text = foot?.text ?? '';
  const found = /(?<![0-9A-F])[0-9A-F]{4}-[0-9A-F]{4}(?![0-9A-F])/.exec(squeezed(text))?.[0] ?? '';
  comparison.compare({ ...place, column: 'check code' }, normSet.check, found);
  if (found !== normSet.check) return;
  const expected = norms === undefined ? bookletLine(normSet) : editionLine(normSet, norms);
  const same = squeezed(expected) === squeezed(text);
  comparison.compare({ ...place, column: 'foot' }, expected, same ? expected : text);
}
