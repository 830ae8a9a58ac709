/**
 * A csv file by RFC 4180: UTF-8 with a byte-order mark (spreadsheets guess the encoding without it), comma, CRLF. Cells
 * that a user wrote must have gone through `safeForCsv`.
 */
export function csvBytes(records: readonly (readonly string[])[]): Uint8Array {
  const text = records.map((record) => `${record.map(quoted).join(',')}\r\n`).join('');
  return new TextEncoder().encode(`\uFEFF${text}`);
}

function quoted(cell: string): string {
  return /[",\r\n]|^\s|\s$/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}
