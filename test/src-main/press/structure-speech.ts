import type { ReadElement } from './structure-reader.ts';

export const elementsIn = ({ children }: ReadElement): readonly ReadElement[] =>
  children.filter((child) => typeof child !== 'string');

/** All elements of a type, however deep, in reading order. */
export function findAll(element: ReadElement, type: string): readonly ReadElement[] {
  return elementsIn(element).flatMap((child) => (child.type === type ? [child] : findAll(child, type)));
}

/** The one element of a type. */
export function findOne(element: ReadElement, type: string): ReadElement {
  const [found, ...others] = findAll(element, type);
  if (found === undefined || others.length > 0) throw new Error(`${others.length + 1} elements ${type}`);
  return found;
}

/** What is heard of an element: the words given for it, or else those of its parts one after the other. */
export function spoken({ alt, actual, children }: ReadElement): string {
  if (actual !== '') return actual;
  if (alt !== '') return alt;
  return children.map((child) => (typeof child === 'string' ? child : spoken(child))).join('');
}

/** What is printed of it. */
export function printed({ children }: ReadElement): string {
  return children.map((child) => (typeof child === 'string' ? child : printed(child))).join('');
}

export interface HeardCell {
  readonly rowHead: string;
  readonly columnHead: string;
  readonly spoken: string;
  readonly printed: string;
}

/**
 * Each data cell of a table with the head of its row and of its column, found as ISO 32000-1, 14.8.4.3.4 has it: the
 * heads of columns by their place in the row, the head of a row in the row itself, both by their scope.
 */
export function cellsHeard(table: ReadElement): readonly HeardCell[] {
  const [heads, ...more] = elementsIn(findOne(table, 'THead'));
  if (heads === undefined || more.length > 0) throw new Error('not one row of heads');
  const columns = elementsIn(heads);
  return elementsIn(findOne(table, 'TBody')).flatMap((row) => {
    const cells = elementsIn(row);
    if (row.type !== 'TR' || cells.length !== columns.length) throw new Error('a row of another length');
    const [rowHead, ...others] = cells.filter(({ type, scope }) => type === 'TH' && scope === 'Row');
    if (rowHead === undefined || others.length > 0) throw new Error('a row without its one head');
    return cells.flatMap((cell, place) => {
      if (cell === rowHead) return [];
      const column = columns[place];
      if (cell.type !== 'TD' || column?.type !== 'TH' || column.scope !== 'Column')
        throw new Error('no head of a column');
      const heard = { rowHead: spoken(rowHead), columnHead: spoken(column).trim() };
      return [{ ...heard, spoken: spoken(cell), printed: printed(cell) }];
    });
  });
}
