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

export function path(points: readonly Point[], colour: string, weight: number): string {
  return `<path d="${outline(points)}" fill="none" stroke="${colour}" stroke-width="${weight}" stroke-linejoin="round"/>`;
}

/** A closed surface without an edge. */
export function area(points: readonly Point[], colour: string): string {
  return `<path d="${outline(points)}Z" fill="${colour}"/>`;
}

export function dot({ x, y }: Point, colour: string): string {
  return `<circle cx="${fixed(x)}" cy="${fixed(y)}" r="1.1" fill="${colour}"/>`;
}

export function words(text: string, { x, y }: Point, anchor: 'start' | 'middle' | 'end', colour: string): string {
  return `<text x="${fixed(x)}" y="${fixed(y)}" text-anchor="${anchor}" font-family="${FONT}" font-size="${LABEL_SIZE}" fill="${colour}">${text}</text>`;
}

function outline(points: readonly Point[]): string {
  return points.map(({ x, y }, index) => `${index === 0 ? 'M' : 'L'}${fixed(x)} ${fixed(y)}`).join('');
}
