import type { Worksheet } from 'exceljs';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { adjustmentNote } from '../../shared-core/norms/adjustment-words.ts';
import { LEFT_OUT_WORDS } from '../../shared-core/norms/reading.ts';
import { methodText } from '../../shared-core/norms/statements.ts';
import { fitFacts } from '../../shared-core/pages/fit-notes.ts';
import { cautionsOf, smoothingSentence } from '../../shared-core/pages/group-method.ts';
import { draftTitle } from '../../shared-core/pages/sheet-texts.ts';
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
  sheet.getCell(1, 1).value = draftTitle(normSet, 'About these tables');
  asTitle(sheet.getCell(1, 1));
  [...aboutLines(normSet), ...checkLines(ranges)].forEach(([name, value], index) => {
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
  const { source, tally, release, groups } = project;
  const { population, sampling, participation, testDates, weighting } = groups.documentation;
  const lines: readonly (readonly [string, string | number])[] = [
    ['Survey', project.title],
    ['Subtitle', project.subtitle],
    ['Edition', release.edition],
    ['Date', release.date],
    ['Check', check],
    ['Status', status],
    ['Scale', tally === null ? '' : scaleInWords(tally.scale)],
    ['Method', methodText(project)],
    ...norms.flatMap((group): readonly (readonly [string, string])[] => [
      [`Smoothing: ${group.group.title}`, smoothingSentence(project, group)],
      [`Fit: ${group.group.title}`, fitFacts(project, group)],
      [`Adjusted: ${group.group.title}`, adjustmentNote(group) ?? ''],
    ]),
    ['How to read', project.sheet.howToRead],
    ['Cautions', cautionsOf(project)],
    ['Notes', project.sheet.notes],
    ['Population', population],
    ['Sampling', sampling],
    ['Participation', participation],
    ['Tested', testDates],
    ['Weighting', weighting],
    ...(source === null
      ? []
      : ([
          ['Source', source.kind === 'typed' ? 'counts typed in' : source.file],
          ['SHA-256 of the source', source.sha256],
          ['Rows read', source.rowsRead],
          ['Rows kept', source.rowsKept],
          ...source.leftOut.map(({ rule, count, rows }): readonly [string, string] => [
            'Left out',
            `${count} for ${LEFT_OUT_WORDS[rule]}${rowNumbers(rows, count)}`,
          ]),
        ] as const)),
  ];
  return lines.filter(([, value]) => String(value).trim() !== '');
}

function checkLines(ranges: readonly NamedRange[]): readonly (readonly [string, string])[] {
  return [
    [
      'Workings',
      'Each group has a sheet of workings, in which formulas make its printed ranks anew and compare them with the ' +
        'table. Change a count there and they follow; the tables themselves hold values.',
    ],
    ['Names', ranges.map((range) => `${range.name} = ${rangeText(range)}`).join('\n')],
  ];
}

function rowNumbers(rows: readonly number[], count: number): string {
  if (rows.length === 0) return '';
  const shown = rows.slice(0, ROW_NUMBERS_SHOWN);
  return `: ${shown.length === 1 ? 'row' : 'rows'} ${shown.join(', ')}${count > shown.length ? ' …' : ''}`;
}
