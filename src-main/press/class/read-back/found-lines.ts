import type { Block, Picture, PlacedPages, TextLine } from '../../../../shared-core/pages/booklet.ts';
import { tableMarks } from '../../../../shared-core/pages/table-blocks.ts';
import type { TextRole } from '../../../../shared-core/pages/text-role.ts';
import { missingCharacters, textWidth, type FontFace } from '../../../../shared-core/pages/text-width.ts';
import type { PdfCell } from '../../read-back/pdf-text.ts';

/** A line as it was placed, and what a reader of the file finds at its place. */
export interface FoundLine {
  /** 1 for the first. */
  readonly page: number;
  /** Null for words of a picture. */
  readonly role: TextRole | null;
  /** Without spaces. Of a line with signs that the typefaces lack, only the others, in the order of the alphabet. */
  readonly expected: string;
  readonly found: string;
}

export interface FoundPages {
  readonly lines: readonly FoundLine[];
  /** Texts of the file that stand where nothing was placed. */
  readonly strays: readonly { readonly page: number; readonly text: string }[];
}

/** Points by which a text may lie beside its place: kerning draws letters together, and numbers are rounded. */
const BESIDE = 1;
const ABOVE = 0.35;
/** Texts that follow each other closer than this are read as one. */
const JOINED = 1.2;

interface PlacedLine {
  readonly role: TextRole | null;
  readonly text: string;
  /** True where a typeface lacks a sign of it. */
  readonly lacks: boolean;
  readonly left: number;
  readonly right: number;
  /** From the bottom of the paper, as PDF counts. */
  readonly baseline: number;
}

/** Lays the texts of a PDF beside the lines that were placed. A page too few or too many has all its texts as lost or stray. */
export function foundLines(placed: PlacedPages, parts: readonly (readonly PdfCell[])[]): FoundPages {
  const lines: FoundLine[] = [];
  const strays: { page: number; text: string }[] = [];
  const count = Math.max(placed.pages.length, parts.length);
  for (let index = 0; index < count; index += 1) {
    const page = index + 1;
    const expected = joined(
      (placed.pages[index]?.blocks ?? []).flatMap((block) => linesOf(block, placed.paper.height)),
    );
    const found = expected.map(() => '');
    for (const part of (parts[index] ?? []).toSorted((a, b) => a.left - b.left)) {
      const at = expected.findIndex((line) => liesOn(part, line));
      if (at < 0) strays.push({ page, text: part.text.trim() });
      else found[at] = `${found[at] ?? ''}${part.text}`;
    }
    expected.forEach(({ role, text, lacks }, place) => {
      const shown = lacks ? signsDrawn : withoutSpaces;
      lines.push({ page, role, expected: shown(text), found: shown(found[place] ?? '') });
    });
  }
  return { lines, strays };
}

function liesOn({ left, baseline }: PdfCell, line: PlacedLine): boolean {
  return Math.abs(baseline - line.baseline) < ABOVE && left > line.left - BESIDE && left < line.right + BESIDE;
}

function linesOf(block: Block, height: number): readonly PlacedLine[] {
  switch (block.kind) {
    case 'text':
      return [lineOf(block, height)];
    case 'rule':
      return [];
    case 'picture':
      return wordsIn(block, height);
    case 'table-column':
      return tableMarks(block).flatMap((mark) => (mark.kind === 'text' ? [lineOf(mark, height)] : []));
  }
}

function lineOf({ x, width, align, baseline, size, runs, role }: TextLine, height: number): PlacedLine {
  const wide = runs.reduce((sum, { text, face }) => sum + textWidth(text, face, size), 0);
  const left = align === 'left' ? x : x + width - wide;
  const text = runs.map((run) => run.text).join('');
  const lacks = runs.some((run) => missingCharacters(run.text, run.face).length > 0);
  return { role, text, lacks, left, right: left + wide, baseline: height - baseline };
}

const WORDS =
  /<text x="([\d.-]+)" y="([\d.-]+)" text-anchor="(start|middle|end)"[^>]*font-size="([\d.]+)"[^>]*>([^<]*)</g;

/** The words of a picture at their places on the page. */
function wordsIn({ svg, x, y }: Picture, height: number): readonly PlacedLine[] {
  return [...svg.matchAll(WORDS)].map(([, across = '', down = '', anchor, size = '', text = '']) => {
    const wide = textWidth(text, 'sans', Number(size));
    const start = x + Number(across) - (anchor === 'start' ? 0 : anchor === 'middle' ? wide / 2 : wide);
    return { role: null, text, lacks: false, left: start, right: start + wide, baseline: height - y - Number(down) };
  });
}

/** Lines that touch, as a figure and the mark behind it, are one. */
function joined(lines: readonly PlacedLine[]): readonly PlacedLine[] {
  const together: PlacedLine[] = [];
  for (const line of lines) {
    const before = together.at(-1);
    const touches =
      before !== undefined &&
      Math.abs(before.baseline - line.baseline) < ABOVE &&
      line.left >= before.left &&
      line.left - before.right < JOINED;
    if (touches)
      together.splice(-1, 1, {
        ...before,
        text: `${before.text}${line.text}`,
        lacks: before.lacks || line.lacks,
        right: line.right,
      });
    else together.push(line);
  }
  return together;
}

function withoutSpaces(text: string): string {
  return text.normalize('NFC').replace(/\s+/g, '');
}

const FACES = ['sans', 'sans-bold', 'serif-bold', 'serif-italic'] as const satisfies readonly FontFace[];

/** A sign that a typeface lacks is drawn as a box, read back as some other, and may have been written from right to left. */
function signsDrawn(text: string): string {
  const plain = withoutSpaces(text.normalize('NFKC'));
  const lacking = new Set(FACES.flatMap((face) => missingCharacters(plain, face)));
  return [...plain]
    .filter((sign) => !lacking.has(sign))
    .toSorted()
    .join('');
}
