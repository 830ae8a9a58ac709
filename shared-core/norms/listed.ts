const SHOWN = 6;

/** "0, 1, 2 or 7", or the first few and how many more there are. */
export function listed(texts: readonly string[]): string {
  const shown = texts.slice(0, SHOWN);
  if (texts.length > shown.length) return `${shown.join(', ')} and ${texts.length - shown.length} more`;
  return shown.length < 2 ? shown.join('') : `${shown.slice(0, -1).join(', ')} or ${shown.at(-1)}`;
}
