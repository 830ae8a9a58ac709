/**
 * The spaces before colons, semicolons, question and exclamation marks and within quotation marks, which never end a
 * line: narrow ones, but a full one before a colon (common practice in French typesetting).
 */
export function frenchSpaces<Key extends string>(texts: Readonly<Record<Key, string>>): Readonly<Record<Key, string>> {
  const spaced: Record<Key, string> = { ...texts };
  for (const key in spaced) {
    spaced[key] = spaced[key]
      .replace(/ (?=:)/g, '\u00a0')
      .replace(/ (?=[;!?»])/g, '\u202f')
      .replace(/(?<=«) /g, '\u202f');
  }
  return spaced;
}
