import type { SheetChoices } from '../norms/norm-project.ts';
import type { Paper } from './booklet.ts';

/** Shorter and longer edge in points: A4 and A5 by ISO 216 (210 × 297 and 148 × 210 mm), Letter 8½ × 11 inches. */
const EDGES: Readonly<Record<SheetChoices['paper'], readonly [number, number]>> = {
  a4: [595.28, 841.89],
  letter: [612, 792],
  a5: [419.53, 595.28],
};

/** 18 mm, and 12 mm on the small sheet. */
const MARGINS: Readonly<Record<SheetChoices['paper'], number>> = { a4: 51, letter: 51, a5: 34 };

export function paperOf({ paper, orientation }: Pick<SheetChoices, 'paper' | 'orientation'>): Paper {
  const [short, long] = EDGES[paper];
  const margin = MARGINS[paper];
  return orientation === 'portrait' ? { width: short, height: long, margin } : { width: long, height: short, margin };
}
