import { squeezed } from './read-text.ts';

/** A printed cell that does not say what the norm set says. */
export interface CellDifference {
  readonly file: string;
  /** Where in the file: "page 2", "Grade 4!C12", "line 17". */
  readonly where: string;
  /** Title of the group; empty where the cell belongs to none. */
  readonly group: string;
  /** Raw score as printed; empty where the cell belongs to no row. */
  readonly score: string;
  readonly column: string;
  /** Empty where nothing should stand there, or nothing does. */
  readonly expected: string;
  readonly found: string;
}

export interface FileReadBack {
  readonly file: string;
  readonly kind: string;
  /** Printed cells that were compared with the norm set. */
  readonly cells: number;
  /** Lines of text that were compared with the pages placed anew; 0 for files that have none. */
  readonly lines: number;
  readonly differences: readonly CellDifference[];
  /** What could not be compared, as sentences. */
  readonly remarks: readonly string[];
}

export type CellPlace = Pick<CellDifference, 'where' | 'group' | 'score' | 'column'>;

/** Collects what was compared in one file, and what differed. */
export class CellComparison {
  readonly #file: string;
  readonly #differences: CellDifference[] = [];
  #cells = 0;
  #lines = 0;
  readonly #remarks: string[] = [];

  constructor(file: string) {
    this.#file = file;
  }

  /** Counts a cell; texts that differ in any character are a difference. */
  compare(place: CellPlace, expected: string, found: string): void {
    this.#cells += 1;
    if (expected !== found) this.#differ(place, expected, found);
  }

  /** Counts a line of text, and tells one that differs unless a cell of it that differs was told already. */
  compareLine(place: CellPlace, expected: string, found: string): void {
    this.#lines += 1;
    if (squeezed(expected) === squeezed(found)) return;
    const told = this.#differences.some((cell) => cell.where === place.where && explains(cell, expected, found));
    if (!told) this.#differ(place, expected, found);
  }

  remark(sentence: string): void {
    this.#remarks.push(sentence);
  }

  result(kind: string): FileReadBack {
    return {
      file: this.#file,
      kind,
      cells: this.#cells,
      lines: this.#lines,
      differences: this.#differences,
      remarks: this.#remarks,
    };
  }

  #differ(place: CellPlace, expected: string, found: string): void {
    this.#differences.push({ file: this.#file, ...place, expected, found });
  }
}

/** Whether a line differs in nothing but a cell that differs. */
function explains(cell: CellDifference, expected: string, found: string): boolean {
  const [line, other, part, instead] = [expected, found, cell.expected, cell.found].map(squeezed);
  if (line === undefined || other === undefined || part === undefined || part === '') return false;
  for (let at = line.indexOf(part); at >= 0; at = line.indexOf(part, at + 1)) {
    if (`${line.slice(0, at)}${instead}${line.slice(at + part.length)}` === other) return true;
  }
  return false;
}

/** "tables.csv, line 17: Grade 5, raw score 23, printed: expected 46, found 47". */
export function differenceLine({ file, where, group, score, column, expected, found }: CellDifference): string {
  const cell = [group, score === '' ? '' : `raw score ${score}`, column].filter((part) => part !== '').join(', ');
  return `${file}, ${where}: ${cell}: expected ${shown(expected)}, found ${shown(found)}`;
}

function shown(text: string): string {
  return text === '' ? 'nothing' : `"${text}"`;
}
