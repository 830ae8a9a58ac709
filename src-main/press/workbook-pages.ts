import type { Worksheet } from 'exceljs';
import { dateInLanguage } from '../../shared-core/languages/number-format.ts';
import { printWords, say, wordsOf } from '../../shared-core/languages/phrases.ts';
import type { SheetChoices } from '../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { draftTitle } from '../../shared-core/pages/sheet-texts.ts';
import { asColophon, linesIn } from './workbook-look.ts';

/** Numbers by which workbooks name paper (Office Open XML, part 1, 18.3.1.63), and the sides in points. */
const PAPER: Readonly<Record<SheetChoices['paper'], { readonly number: number; readonly sides: [number, number] }>> = {
  letter: { number: 1, sides: [612, 792] },
  a4: { number: 9, sides: [595, 842] },
  a5: { number: 11, sides: [420, 595] },
};

/** Inches; the foot has room for four small lines. */
const MARGINS = { left: 0.6, right: 0.6, top: 0.6, bottom: 0.9, header: 0.3, footer: 0.3 } as const;
const POINTS_IN_AN_INCH = 72;
/** One character of the usual type, and of the small type of the foot, in points. */
const CHARACTER = 5.4;
const FOOT_CHARACTER = 4.2;
/** A sheet is turned on its side before its type would be smaller than this share of the usual one. */
const SMALLEST_SCALE = 0.75;
const FOOT_SIZE = 8;
const SEPARATOR = ' \u00b7 ';

/**
 * Paper as in the booklet, on its side where the columns (in characters of the usual type) ask for it, fitted to one
 * page across. The foot tells the edition and, in a line of its own, the page, so that the two cannot run together.
 */
export function setUpPages(
  sheet: Worksheet,
  choices: Pick<SheetChoices, 'paper' | 'orientation' | 'language'>,
  foot: string,
  across: number,
): void {
  const page = say(printWords(choices.language), 'workbook.page', { page: '&P', pages: '&N' });
  const { number, sides } = PAPER[choices.paper];
  const room = (side: number): number => side - (MARGINS.left + MARGINS.right) * POINTS_IN_AN_INCH;
  const needed = across * CHARACTER * SMALLEST_SCALE;
  const landscape = choices.orientation === 'landscape' || needed > room(sides[0]);
  Object.assign(sheet.pageSetup, {
    paperSize: number,
    orientation: landscape ? 'landscape' : 'portrait',
    fitToPage: true,
    fitToWidth: 1,
    fitToHeight: 0,
    margins: MARGINS,
  });
  const lines = footLines(foot, Math.floor(room(sides[landscape ? 1 : 0]) / FOOT_CHARACTER));
  // A space keeps the size of the type apart from a text that begins with a digit.
  sheet.headerFooter.oddFooter = [...lines.map((line) => line.replaceAll('&', '&&')), page]
    .map((line, index) => `${index === 0 ? '&L' : ''}&${FOOT_SIZE} ${line}`)
    .join('\n');
}

/** The foot of a sheet that is of no single group. */
export function editionFoot(normSet: NormSet): string {
  const edition = normSet.project.release.edition.trim();
  const words = wordsOf(normSet.project);
  return draftTitle(
    normSet,
    [
      ...(edition === '' ? [] : [say(words, 'foot.edition', { edition })]),
      say(words, 'foot.check', { check: normSet.check }),
    ].join(SEPARATOR),
  );
}

/** The parts of a foot in lines of at most so many characters; a part is never broken. */
function footLines(foot: string, longest: number): readonly string[] {
  const lines: string[] = [];
  for (const part of foot.replace(/\s*\n\s*/g, ' ').split(SEPARATOR)) {
    const last = lines.at(-1);
    const joined = `${last ?? ''}${SEPARATOR}${part}`;
    if (last === undefined || joined.length > longest) lines.push(part);
    else lines[lines.length - 1] = joined;
  }
  return lines;
}

/** Where a sheet comes from, below what stands on it: edition, date, check and the source with its fingerprint. */
export function colophonRow(sheet: Worksheet, row: number, normSet: NormSet, columns: number, across: number): void {
  const text = colophonText(normSet);
  if (columns > 1) sheet.mergeCells(row, 1, row, columns);
  const cell = sheet.getCell(row, 1);
  cell.value = text;
  asColophon(cell);
  sheet.getRow(row).height = 11 * linesIn(text, across * 1.2);
}

function colophonText({ project, check }: NormSet): string {
  const { release, source } = project;
  const words = wordsOf(project);
  const edition = release.edition.trim();
  const origin =
    source === null
      ? []
      : [
          `${source.kind === 'typed' ? say(words, 'workbook.typed-in') : say(words, 'workbook.source', { file: source.file })}, SHA-256 ${source.sha256}`,
        ];
  return [
    say(words, 'workbook.made-with'),
    ...(edition === '' ? [] : [say(words, 'workbook.edition', { edition })]),
    ...(release.date === '' ? [] : [dateInLanguage(release.date, words.numbers)]),
    say(words, 'foot.check', { check }),
    ...origin,
  ].join(SEPARATOR);
}
