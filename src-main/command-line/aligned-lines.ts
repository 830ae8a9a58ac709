const GAP = '  ';

/** Lines of cells in columns that are aligned to the right; a line without cells is empty. */
export function alignedLines(lines: readonly (readonly string[])[]): readonly string[] {
  const columns = Math.max(0, ...lines.map((line) => line.length));
  const widths = Array.from({ length: columns }, (_, index) =>
    Math.max(...lines.map((line) => (line[index] ?? '').length)),
  );
  return lines.map((line) =>
    line
      .map((text, index) => text.padStart(widths[index] ?? 0))
      .join(GAP)
      .trimEnd(),
  );
}
