import { differenceLine, type FileReadBack } from '../press/read-back/cell-differences.ts';

/** One line for each cell that differs; a line for each file in which all agree. */
export function readBackLines(read: readonly FileReadBack[]): string {
  return read
    .flatMap(({ file, kind, cells, lines, differences, remarks }) => [
      ...(differences.length === 0
        ? [`${file}: ${kind}, ${cells} cells${lines === 0 ? '' : ` and ${lines} lines`} compared, no difference`]
        : differences.map(differenceLine)),
      ...remarks,
    ])
    .map((line) => `${line}\n`)
    .join('');
}

export function readBackJson(read: readonly FileReadBack[]): string {
  const files = read.map(({ file, kind, cells, lines, differences, remarks }) => ({
    file,
    kind,
    'cells-compared': cells,
    'lines-compared': lines,
    remarks,
    differences: differences.map(({ where, group, score, column, expected, found }) => ({
      where,
      group,
      'raw-score': score,
      column,
      expected,
      found,
    })),
  }));
  return `${JSON.stringify({ files }, null, 1)}\n`;
}
