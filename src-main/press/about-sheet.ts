import type { Worksheet } from 'exceljs';
import { dateInLanguage } from '../../shared-core/languages/number-format.ts';
import { say, sayCounted, wordsOf, type PrintWords } from '../../shared-core/languages/phrases.ts';
import type { LeftOut } from '../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { adjustmentNote } from '../../shared-core/norms/adjustment-words.ts';
import { leftOutInWords } from '../../shared-core/norms/reading.ts';
import { methodText } from '../../shared-core/norms/statements.ts';
import { fitFacts } from '../../shared-core/pages/fit-notes.ts';
import { cautionsOf, smoothingSentence } from '../../shared-core/pages/group-method.ts';
import { draftTitle, printedTitle } from '../../shared-core/pages/sheet-texts.ts';
import { scaleInWords } from '../../shared-core/scale/score-scale.ts';
import { asBold, asProse, asTitle, linesIn, ruleBelow } from './workbook-look.ts';
import { rangeText, type NamedRange } from './workbook-names.ts';
import { editionFoot, setUpPages } from './workbook-pages.ts';

export const ABOUT = 'About';
const WIDTHS = [24, 90] as const;
const ROW_NUMBERS_SHOWN = 20;

/**
 * Where the numbers come from: method, cautions, the source file with its fingerprint, and every row left out; then how
 * the workbook can be checked, and its named ranges.
 */
export function fillAboutSheet(sheet: Worksheet, normSet: NormSet, ranges: readonly NamedRange[]): void {
  sheet.columns = WIDTHS.map((width) => ({ width }));
  sheet.getCell(1, 1).value = draftTitle(normSet, say(wordsOf(normSet.project), 'about.title'));
  asTitle(sheet.getCell(1, 1));
  [...aboutLines(normSet), ...checkLines(wordsOf(normSet.project), ranges)].forEach(([name, value], index) => {
    const [left, right] = [sheet.getCell(index + 3, 1), sheet.getCell(index + 3, 2)];
    left.value = name;
    right.value = value;
    asBold(left);
    asProse(left);
    asProse(right);
    if (typeof value === 'number') right.alignment = { horizontal: 'left', vertical: 'top' };
    sheet.getRow(index + 3).height = 15 * Math.max(linesIn(name, WIDTHS[0]), linesIn(String(value), WIDTHS[1]));
    for (const cell of [left, right]) ruleBelow(cell, 'fine');
  });
  setUpPages(sheet, normSet.project.sheet, editionFoot(normSet), WIDTHS[0] + WIDTHS[1]);
}

function aboutLines({
  project,
  check,
  status,
  groups: norms,
}: NormSet): readonly (readonly [string, string | number])[] {
  const words = wordsOf(project);
  const { source, tally, release, groups } = project;
  const { population, sampling, participation, testDates, weighting } = groups.documentation;
  const lines: readonly (readonly [string, string | number])[] = [
    [say(words, 'about.survey'), project.title],
    [say(words, 'about.subtitle'), project.subtitle],
    [say(words, 'about.edition'), release.edition],
    [say(words, 'about.date'), dateInLanguage(release.date, words.numbers)],
    [say(words, 'about.check'), check],
    [say(words, 'about.status'), say(words, `about.status-${status}`)],
    [say(words, 'about.scale'), tally === null ? '' : scaleInWords(tally.scale, words)],
    [say(words, 'about.method'), methodText(project, words)],
    ...norms.flatMap((group): readonly (readonly [string, string])[] => [
      [say(words, 'about.smoothing', { group: printedTitle(project, group.group) }), smoothingSentence(project, group)],
      [say(words, 'about.fit', { group: printedTitle(project, group.group) }), fitFacts(project, group)],
      [say(words, 'about.adjusted', { group: printedTitle(project, group.group) }), adjustmentNote(group, words) ?? ''],
    ]),
    [say(words, 'about.how-to-read'), project.sheet.howToRead],
    [say(words, 'about.cautions'), cautionsOf(project)],
    [say(words, 'about.notes'), project.sheet.notes],
    [say(words, 'about.population'), population],
    [say(words, 'about.sampling'), sampling],
    [say(words, 'about.participation'), participation],
    [say(words, 'about.test-dates'), testDates],
    [say(words, 'about.weighting'), weighting],
    ...(source === null
      ? []
      : ([
          [say(words, 'about.source'), source.kind === 'typed' ? say(words, 'workbook.typed-in') : source.file],
          [say(words, 'about.fingerprint'), source.sha256],
          [say(words, 'about.rows-read'), source.rowsRead],
          [say(words, 'about.rows-kept'), source.rowsKept],
          ...source.leftOut.map((leftOut): readonly [string, string] => [
            say(words, 'about.left-out'),
            leftOutLine(words, leftOut),
          ]),
        ] as const)),
  ];
  return lines.filter(([, value]) => String(value).trim() !== '');
}

function checkLines(words: PrintWords, ranges: readonly NamedRange[]): readonly (readonly [string, string])[] {
  return [
    [say(words, 'about.workings'), say(words, 'about.workings-text')],
    [say(words, 'about.names'), ranges.map((range) => `${range.name} = ${rangeText(range)}`).join('\n')],
  ];
}

function leftOutLine(words: PrintWords, { rule, count, rows }: LeftOut): string {
  const leftOut = say(words, 'about.left-out-for', { count: String(count), rule: leftOutInWords(rule, words) });
  if (rows.length === 0) return leftOut;
  const shown = rows.slice(0, ROW_NUMBERS_SHOWN);
  const numbers = `${shown.join(', ')}${count > shown.length ? ' …' : ''}`;
  return sayCounted(words, 'about.left-out-rows', String(shown.length), { 'left-out': leftOut, rows: numbers });
}
