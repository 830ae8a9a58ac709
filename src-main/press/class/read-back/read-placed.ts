import type { PlacedPages } from '../../../../shared-core/pages/booklet.ts';
import type { TextRole } from '../../../../shared-core/pages/text-role.ts';
import type { CellComparison } from '../../read-back/cell-differences.ts';
import { readPdfParts } from '../../read-back/pdf-text.ts';
import { foundLines, type FoundLine } from './found-lines.ts';

/** What a reader of the file finds in the place of every text. */
export interface FoundTexts {
  /** Of a cell of a table, its lines together; null where nothing was placed for it. */
  readonly cell: (table: string, row: number, column: number) => string | null;
  /** Of a heading or paragraph. */
  readonly prose: (name: string) => string | null;
}

/** Reads a PDF and compares every text of it with the pages as they were placed. */
export async function readPlaced(
  comparison: CellComparison,
  bytes: Uint8Array,
  placed: PlacedPages,
): Promise<FoundTexts> {
  const { lines, strays } = foundLines(placed, (await readPdfParts(bytes)).pages);
  for (const { page, role, expected, found } of lines) {
    comparison.compare({ where: `page ${page}`, group: '', score: '', column: roleInWords(role) }, expected, found);
  }
  for (const { page, text } of strays) {
    comparison.compare({ where: `page ${page}`, group: '', score: '', column: 'text' }, '', text);
  }
  const texts = new Map<string, string>();
  for (const line of lines) {
    const key = keyOf(line);
    if (key !== null) texts.set(key, `${texts.get(key) ?? ''}${line.found}`);
  }
  return {
    cell: (table, row, column) => texts.get(cellKey(table, row, column)) ?? null,
    prose: (name) => texts.get(proseKey(name)) ?? null,
  };
}

function keyOf({ role }: FoundLine): string | null {
  switch (role?.kind) {
    case 'cell':
      return cellKey(role.table, role.row, role.column);
    case 'heading':
    case 'paragraph':
      return proseKey(role.name);
    default:
      return null;
  }
}

function cellKey(table: string, row: 'head' | number, column: number): string {
  return `cell ${table} ${row} ${column}`;
}

function proseKey(name: string): string {
  return `prose ${name}`;
}

function roleInWords(role: TextRole | null): string {
  switch (role?.kind) {
    case undefined:
      return 'words of a picture';
    case 'running':
      return role.edge === 'top' ? 'running head' : 'foot';
    case 'repeated':
      return 'text printed again';
    case 'heading':
    case 'paragraph':
      return role.name;
    case 'cell':
      return `table ${role.table}, ${role.row === 'head' ? 'heads' : `row ${role.row + 1}`}, column ${role.column + 1}`;
  }
}
