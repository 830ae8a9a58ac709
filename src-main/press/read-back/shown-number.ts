const SECTION = /("[^"]*"|[^;"])+/g;
const PIECE = /"([^"]*)"|([0#.]+)|(.)/g;

/**
 * What a spreadsheet program shows of a number in one of the formats that printed tables use: zeros, one point, texts in
 * quotes, and a second section for negative numbers. Null for any other format.
 */
export function shownNumber(value: number, format: string): string | null {
  const [positive, negative = null] = format.match(SECTION) ?? [];
  const section = value < 0 ? negative : (positive ?? null);
  if (section === null) return null;
  const pieces = [...section.matchAll(PIECE)];
  if (pieces.some(([, , places, other]) => other !== undefined || places?.includes('#'))) return null;
  const places = pieces.map(([, , zeros]) => zeros ?? '').join('');
  const [whole = '', fraction = '', ...more] = places.split('.');
  if (more.length > 0 || whole === '') return null;
  const digits = Math.abs(value).toFixed(fraction.length);
  const spare = digits.length - places.length;
  if (spare < 0) return null;
  let next = 0;
  let first = true;
  return pieces
    .map(([, quoted, zeros = '']) => {
      if (quoted !== undefined) return quoted;
      const length = zeros.length + (first ? spare : 0);
      first = false;
      next += length;
      return digits.slice(next - length, next);
    })
    .join('');
}
