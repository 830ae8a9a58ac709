import type { PupilResult } from '../class/class-results.ts';
import type { ClassTableColumn } from '../class/class-table.ts';
import { figure, say, type PrintWords } from '../languages/phrases.ts';
import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import { bandChart } from './band-chart-picture.ts';
import { LEAST_CHART_WIDTH, type ChartRow } from './band-chart-scale.ts';
import { labelOf, pupilsInOrder, rankPlace, type ClassPrint } from './class-print.ts';
import { figureInWords } from './class-words.ts';
import type { RowTable, RowTableCell, RowTableColumn } from './row-table.ts';

/** A column of the pupils' table: its key in files, its heading, and the text of a pupil as the table prints it. */
export interface PupilColumn {
  readonly key: string;
  readonly heading: readonly string[];
  readonly kind: RowTableColumn['kind'];
  readonly textOf: (pupil: PupilResult) => string;
}

const BAND = 'measurement-band';
/** A title of a table is no longer than this in a cell. */
const LONGEST_TITLE = 120;

/** The columns in print order: who, the group and the table where there are several, score, rank, and those chosen. */
export function pupilColumns(print: ClassPrint, words: PrintWords): readonly PupilColumn[] {
  const { results, file } = print;
  const { pupils } = results;
  const heading = (text: string): readonly string[] => text.split('\n');
  const figures = (key: string, head: readonly string[], textOf: PupilColumn['textOf']): PupilColumn => ({
    key,
    heading: head,
    kind: 'figures',
    textOf,
  });
  const named: PupilColumn = {
    key: file.sharing.as === 'codes' ? 'code' : 'name',
    heading: heading(say(words, file.sharing.as === 'codes' ? 'class.column-code' : 'class.column-name')),
    kind: 'words',
    textOf: (pupil) => labelOf(print, pupil),
  };
  const group: PupilColumn = {
    key: 'group',
    heading: heading(say(words, 'class.column-group')),
    kind: 'words',
    textOf: (pupil) => pupil.group,
  };
  const ofTable: PupilColumn = {
    key: 'table',
    heading: heading(say(words, 'class.column-table')),
    kind: 'words',
    textOf: (pupil) => shortened(pupil.table.title),
  };
  return [
    named,
    ...(pupils.some((pupil) => pupil.group !== '') ? [group] : []),
    ...(new Set(pupils.map((pupil) => pupil.table)).size > 1 ? [ofTable] : []),
    figures('raw-score', heading(say(words, 'class.column-score')), ({ scoreText }) => scoreText),
    figures('percentile-rank', heading(say(words, 'class.column-rank')), ({ found }) => found.printed),
    ...chosenColumns(print).map(({ key, heading: head }) =>
      key === BAND
        ? figures(key, heading(say(words, 'class.column-band')), ({ found }) => found.texts[BAND] ?? '')
        : figures(key, head, ({ found }) => found.texts[key] ?? ''),
    ),
  ];
}

/** The band wherever the table has one, and the chosen columns of the table, in their print order. */
function chosenColumns({ file, results }: ClassPrint): readonly ClassTableColumn[] {
  return results.table.columns.filter(({ key }) => key === BAND || file.report.columns.includes(key));
}

function shortened(title: string): string {
  const letters = [...title];
  return letters.length <= LONGEST_TITLE ? title : `${letters.slice(0, LONGEST_TITLE).join('')}…`;
}

/** True where somebody's band can be drawn. */
export function hasBands({ results }: ClassPrint): boolean {
  return results.pupils.some(({ found }) => found.band !== null);
}

/** Every pupil with a score, with rank and band on one common scale beside the figures. */
export function pupilsTable(print: ClassPrint, words: PrintWords): RowTable {
  const pupils = pupilsInOrder(print);
  const columns = pupilColumns(print, words).map(({ heading, kind, textOf }, index): RowTableColumn => ({
    heading,
    kind,
    bold: index === 0,
    cells: pupils.map((pupil) => cellOf(textOf(pupil), kind, words)),
  }));
  return {
    name: 'pupils',
    fives: true,
    columns,
    chart: {
      leastWidth: LEAST_CHART_WIDTH,
      draw: (rows, size, headRule) => {
        const shown = rows.flatMap(({ row, middle }) => {
          const pupil = pupils[row];
          return pupil === undefined ? [] : [{ pupil, middle }];
        });
        return {
          svg: bandChart(
            shown.map(({ pupil, middle }) => ({ ...chartRow(pupil), middle })),
            size,
            headRule,
          ),
          alt: chartInWords(
            print,
            words,
            shown.map(({ pupil }) => pupil),
          ),
        };
      },
    },
  };
}

function cellOf(printed: string, kind: RowTableColumn['kind'], words: PrintWords): RowTableCell {
  if (kind === 'words') return { text: printed, said: null };
  const text = figure(words, printed);
  const said = figureInWords(words, printed);
  if (printed.endsWith(ADJUSTED_MARK)) return { text, said: say(words, 'spoken.adjusted', { figure: said }) };
  return { text, said: said === text ? null : said };
}

/** What the chart shows of a pupil: the rank as it is printed. */
export function chartRow({ found }: PupilResult): ChartRow {
  return { rank: rankPlace(found), band: found.band };
}

/** The chart for those who do not see it: every rank and band in it. */
function chartInWords(print: ClassPrint, words: PrintWords, pupils: readonly PupilResult[]): string {
  const rows = pupils.map((pupil) => {
    const { printed, band } = pupil.found;
    const said = { name: labelOf(print, pupil), rank: figureInWords(words, printed) };
    return band === null
      ? say(words, 'class.chart-alt-row', said)
      : say(words, 'class.chart-alt-row-band', { ...said, band: figureInWords(words, band.text) });
  });
  return [say(words, hasBands(print) ? 'class.chart-alt-band' : 'class.chart-alt'), ...rows].join(' ');
}
