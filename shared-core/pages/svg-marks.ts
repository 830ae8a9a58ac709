/** Marks of a picture as SVG without scripts, styles or outside references. Lengths are in the picture's own points. */

export interface Point {
  readonly x: number;
  readonly y: number;
}

const FONT = 'Source Sans 3';
export const LABEL_SIZE = 6.6;

/** Two decimals, so that the text is the same everywhere. */
export function fixed(value: number): string {
  return value.toFixed(2);
}

export function horizontal(y: number, from: number, to: number, colour: string): string {
  return `<path d="M${fixed(from)} ${fixed(y)}H${fixed(to)}" fill="none" stroke="${colour}" stroke-width="0.5"/>`;
}

export function vertical(x: number, from: number, to: number, colour: string, weight = 0.5): string {
  return `<path d="M${fixed(x)} ${fixed(from)}V${fixed(to)}" fill="none" stroke="${colour}" stroke-width="${weight}"/>`;
}

/** A filled rectangle without an edge. */
export function bar(
  { x, y }: Point,
  { width, height }: { readonly width: number; readonly height: number },
  colour: string,
): string {
  return `<path d="M${fixed(x)} ${fixed(y)}h${fixed(width)}v${fixed(height)}h${fixed(-width)}Z" fill="${colour}"/>`;
}

export function path(points: readonly Point[], colour: string, weight: number): string {
  return `<path d="${outline(points)}" fill="none" stroke="${colour}" stroke-width="${weight}" stroke-linejoin="round"/>`;
}

/** A closed surface without an edge. */
export function area(points: readonly Point[], colour: string): string {
  return `<path d="${outline(points)}Z" fill="${colour}"/>`;
}

export function dot({ x, y }: Point, colour: string, radius = 1.1): string {
  return `<circle cx="${fixed(x)}" cy="${fixed(y)}" r="${radius}" fill="${colour}"/>`;
}

/** A ring on white ground. */
export function ring({ x, y }: Point, colour: string, radius: number): string {
  return `<circle cx="${fixed(x)}" cy="${fixed(y)}" r="${radius}" fill="#ffffff" stroke="${colour}" stroke-width="0.8"/>`;
}

/** A whole picture of marks. */
export function picture(
  { width, height }: { readonly width: number; readonly height: number },
  marks: readonly string[],
): string {
  const [across, down] = [fixed(width), fixed(height)];
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${across}" height="${down}" viewBox="0 0 ${across} ${down}">`,
    ...marks,
    '</svg>',
  ].join('');
}

export function words(
  text: string,
  { x, y }: Point,
  anchor: 'start' | 'middle' | 'end',
  colour: string,
  size = LABEL_SIZE,
): string {
  return `<text x="${fixed(x)}" y="${fixed(y)}" text-anchor="${anchor}" font-family="${FONT}" font-size="${size}" fill="${colour}">${text}</text>`;
}

function outline(points: readonly Point[]): string {
  return points.map(({ x, y }, index) => `${index === 0 ? 'M' : 'L'}${fixed(x)} ${fixed(y)}`).join('');
}
