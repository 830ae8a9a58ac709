/** Characters at which spreadsheet programs take a text for a formula or a command. */
const FORMULA_START = /^[=+\-@\t\r]/;
const PLAIN_NUMBER = /^-?\d+(\.\d+)?$/;

/** A user's text for a csv cell: one that a spreadsheet would run as a formula begins with an apostrophe instead. */
export function safeForCsv(text: string): string {
  return FORMULA_START.test(text) && !PLAIN_NUMBER.test(text) ? `'${text}` : text;
}
