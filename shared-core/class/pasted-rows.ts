import { guessSeparator, type Separator } from '../tally/guess-separator.ts';

/** One row of a class list before its columns are known. */
export interface ListedRow {
  /** Line of the pasted text or row of the file, from 1. */
  readonly line: number;
  readonly cells: readonly string[];
}

/** Rows of a file that were read already; `first` is the number of the first of them in the file. */
export function listedRows(rows: readonly (readonly string[])[], first = 1): readonly ListedRow[] {
  return rows.map((cells, index) => ({ line: first + index, cells }));
}

export interface PastedRows {
  readonly separator: Separator;
  readonly rows: readonly ListedRow[];
}

/**
 * Cuts a pasted text into rows and cells; without a separator it is guessed. As in what spreadsheets put on the
 * clipboard, a cell in quotation marks may hold separators, line ends and doubled quotation marks; a quotation mark that
 * does not open and close a whole cell is a letter like any other.
 */
export function pastedRows(text: string, declared: Separator | null): PastedRows {
  const even = text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n');
  const separator = declared ?? guessSeparator(`${even}\n`);
  const end = separator === '|' ? '\\|' : separator;
  const quoted = new RegExp(`"((?:[^"]|"")*)"[^\\S\\n\\t]*(?=${end}|\\n|$)`, 'y');
  const plain = new RegExp(`[^\\n${end}]*`, 'y');
  const rows: ListedRow[] = [];
  let cells: string[] = [];
  let [line, startLine, at] = [1, 1, 0];
  for (;;) {
    quoted.lastIndex = at;
    plain.lastIndex = at;
    const inQuotes = quoted.exec(even);
    const found = inQuotes ?? plain.exec(even);
    const whole = found?.[0] ?? '';
    cells.push(inQuotes === null ? whole : (inQuotes[1] ?? '').replaceAll('""', '"'));
    line += whole.split('\n').length - 1;
    at += whole.length;
    const next = even[at];
    if (next !== separator) {
      rows.push({ line: startLine, cells });
      if (next === undefined) return { separator, rows: cells.join('') === '' ? rows.slice(0, -1) : rows };
      cells = [];
      line += 1;
      startLine = line;
    }
    at += 1;
  }
}
