import type { TextRun } from './booklet.ts';
import { textWidth, type FontFace } from './text-width.ts';

/** One line: runs of one face each, no white space at its ends. */
export type ProseLine = readonly TextRun[];

/**
 * Breaks text into lines no wider than `width` points. Lines end at spaces, behind hyphens, dashes and slashes, and
 * where the user pressed Enter; a word wider than a whole line is cut. Empty lines are left out; no text, no line.
 */
export function breakLines(runs: readonly TextRun[], size: number, width: number): readonly ProseLine[] {
  const lines: ProseLine[] = [];
  let line: Piece[] = [];
  let used = 0;
  const endLine = (): void => {
    const finished = asRuns(line);
    if (finished.length > 0) lines.push(finished);
    line = [];
    used = 0;
  };
  for (const word of wordsOf(runs)) {
    if (word.breakBefore) endLine();
    for (const piece of cut(word.pieces, size, width)) {
      const wide = widthOf(trimmedEnd(piece), size);
      if (line.length > 0 && used + wide > width) endLine();
      line.push(...piece);
      used += widthOf(piece, size);
    }
  }
  endLine();
  return lines;
}

/** The first lines of a text, the last of them closed with an ellipsis where text had to go. */
export function firstLines(
  runs: readonly TextRun[],
  size: number,
  width: number,
  most: number,
): { readonly lines: readonly ProseLine[]; readonly cut: boolean } {
  const lines = breakLines(runs, size, width);
  if (lines.length <= most) return { lines, cut: false };
  const last = [...(lines[most - 1] ?? [])];
  const end = last.pop() ?? { text: '', face: 'sans' };
  const before = widthOf(last, size);
  let text = end.text;
  while (text !== '' && before + textWidth(`${text}…`, end.face, size) > width) text = [...text].slice(0, -1).join('');
  return { lines: [...lines.slice(0, most - 1), [...last, { text: `${text.trimEnd()}…`, face: end.face }]], cut: true };
}

type Piece = TextRun;

interface Word {
  readonly breakBefore: boolean;
  /** More than one where the face changes inside a word; white space that follows it included. */
  readonly pieces: readonly Piece[];
}

/** Behind spaces that no per cent sign follows, and behind a hyphen, dash or slash that a letter follows. */
const BREAKS = /(?<= )(?=[^ %])|(?<=[-–—/])(?=\p{L})/u;

function wordsOf(runs: readonly TextRun[]): readonly Word[] {
  const words: { breakBefore: boolean; pieces: Piece[] }[] = [];
  let open = false;
  for (const { text, face } of runs) {
    text.split(/\r\n|\r|\n/).forEach((paragraph, index) => {
      if (index > 0) open = false;
      const parts = cleaned(paragraph)
        .split(BREAKS)
        .filter((part) => part !== '');
      parts.forEach((part, place) => {
        const last = words.at(-1);
        if (open && place === 0 && index === 0 && last !== undefined) last.pieces.push({ text: part, face });
        else words.push({ breakBefore: index > 0 && place === 0, pieces: [{ text: part, face }] });
        open = !/[ \-–—/]$/.test(part);
      });
    });
  }
  return words;
}

/** Tabs and the like as spaces, other control characters gone. No-break spaces stay. */
function cleaned(text: string): string {
  return text.replace(/[\t\v\f ]+/g, ' ').replace(/\p{Cc}/gu, '');
}

function cut(pieces: readonly Piece[], size: number, width: number): readonly (readonly Piece[])[] {
  if (widthOf(trimmedEnd(pieces), size) <= width) return [pieces];
  const parts: Piece[][] = [];
  let used = width;
  for (const { text, face } of pieces) {
    for (const character of text) {
      const wide = textWidth(character, face, size);
      const last = parts.at(-1);
      if (last === undefined || used + wide > width) {
        parts.push([{ text: character, face }]);
        used = wide;
      } else {
        last.push({ text: character, face });
        used += wide;
      }
    }
  }
  return parts;
}

function widthOf(pieces: readonly Piece[], size: number): number {
  return pieces.reduce((sum, { text, face }) => sum + textWidth(text, face, size), 0);
}

function trimmedEnd(pieces: readonly Piece[]): readonly Piece[] {
  const last = pieces.at(-1);
  return last === undefined ? pieces : [...pieces.slice(0, -1), { ...last, text: last.text.replace(/ +$/, '') }];
}

function asRuns(pieces: readonly Piece[]): ProseLine {
  const runs: { text: string; face: FontFace }[] = [];
  for (const { text, face } of pieces) {
    const last = runs.at(-1);
    if (last !== undefined && last.face === face) last.text += text;
    else runs.push({ text, face });
  }
  return trimmedBoth(runs).filter(({ text }) => text !== '');
}

function trimmedBoth(runs: readonly TextRun[]): readonly TextRun[] {
  return runs.map(({ text, face }, index) => ({
    text: trimmed(text, index === 0, index === runs.length - 1),
    face,
  }));
}

function trimmed(text: string, start: boolean, end: boolean): string {
  const left = start ? text.replace(/^ +/, '') : text;
  return end ? left.replace(/ +$/, '') : left;
}
