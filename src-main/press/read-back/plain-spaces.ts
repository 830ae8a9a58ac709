/** Every kind of space as the usual one: readers of PDF tell them apart by width alone. */
export function withPlainSpaces(text: string): string {
  return text.replace(/\s/g, ' ');
}
