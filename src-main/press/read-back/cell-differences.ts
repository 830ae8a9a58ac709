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
  readonly cells: number;
  readonly differences: readonly CellDifference[];
}

export type CellPlace = Pick<CellDifference, 'where' | 'group' | 'score' | 'column'>;

/** Collects what was compared in one file, and what differed. */
export class CellComparison {
  readonly #file: string;
  readonly #differences: CellDifference[] = [];
  #cells = 0;

  constructor(file: string) {
    this.#file = file;
  }

  /** Counts a cell; texts that differ in any character are a difference. */
  compare(place: CellPlace, expected: string, found: string): void {
    this.#cells += 1;
    if (expected !== found) this.#differences.push({ file: this.#file, ...place, expected, found });
  }

  result(kind: string): FileReadBack {
    return { file: this.#file, kind, cells: this.#cells, differences: this.#differences };
  }
}

/** "tables.csv, line 17: Grade 5, raw score 23, printed: expected 46, found 47". */
export function differenceLine({ file, where, group, score, column, expected, found }: CellDifference): string {
  const cell = [group, score === '' ? '' : `raw score ${score}`, column].filter((part) => part !== '').join(', ');
  return `${file}, ${where}: ${cell}: expected ${shown(expected)}, found ${shown(found)}`;
}

function shown(text: string): string {
  return text === '' ? 'nothing' : `"${text}"`;
}
