import { wordsOf } from '../../shared-core/languages/phrases.ts';
import { adjustmentNote } from '../../shared-core/norms/adjustment-words.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { printedColumns, type TableColumn } from '../../shared-core/norms/table-columns.ts';
import { cautionsOf, smoothingSentence } from '../../shared-core/pages/group-method.ts';
import { editionLine, sampleFacts, sheetSubtitle, surveyName } from '../../shared-core/pages/sheet-texts.ts';
import { unroundedColumns, type UnroundedColumn } from './unrounded-columns.ts';

/** Where the cells of a group's table stand on its sheet; rows and columns are counted from 1. */
export interface TableSheetLayout {
  /** Lines above the table, from row 2 on; the title stands in row 1. */
  readonly prose: readonly string[];
  readonly headRow: number;
  /** Rows of the lowest and the highest score; every attainable score has one row between them. */
  readonly firstRow: number;
  readonly lastRow: number;
  /** Printed columns: the first stands in column 1, the next in column 2 and so on. */
  readonly columns: readonly TableColumn[];
  /** Columns of unrounded numbers, to the right of the printed ones. */
  readonly unrounded: readonly UnroundedColumn[];
  /** All columns. */
  readonly width: number;
}

/** Where formulas of other sheets find a group's scores and printed ranks. */
export interface TablePlaces {
  readonly sheetName: string;
  readonly firstRow: number;
  readonly scoreColumn: number;
  readonly rankColumn: number;
}

/** The one description of a table sheet: the press fills the sheet by it, and whoever reads the sheet finds cells by it. */
export function tableSheetLayout(normSet: NormSet, norms: GroupNorms): TableSheetLayout {
  const { project } = normSet;
  const columns = printedColumns(project);
  const unrounded = unroundedColumns(project, norms);
  const prose = [
    surveyName(project),
    `${sheetSubtitle(project)}.`,
    sampleFacts(project, norms),
    smoothingSentence(project, norms),
    `${editionLine(normSet, norms)}.`,
    project.sheet.howToRead,
    cautionsOf(project),
    project.sheet.notes,
    adjustmentNote(norms, wordsOf(project)) ?? '',
  ].filter((text) => text.trim() !== '');
  const headRow = prose.length + 3;
  return {
    prose,
    headRow,
    firstRow: headRow + 1,
    lastRow: headRow + norms.rows.length,
    columns,
    unrounded,
    width: columns.length + unrounded.length,
  };
}

/** The places of scores and ranks on a sheet of that name. */
export function tablePlaces(sheetName: string, { firstRow, columns }: TableSheetLayout): TablePlaces {
  const columnOf = (key: TableColumn['key']): number => columns.findIndex((column) => column.key === key) + 1;
  return { sheetName, firstRow, scoreColumn: columnOf('score'), rankColumn: columnOf('rank') };
}
