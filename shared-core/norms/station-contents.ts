import { printCount } from '../scores/printed-number.ts';
import { bookletExtent, printedBlocks } from './booklet-choice.ts';
import { definitionName } from './definitions.ts';
import { columnInWords, normGroups } from './norm-groups.ts';
import type { NormProject, SheetChoices } from './norm-project.ts';
import type { Station } from './queries.ts';
import { COLUMN_WORDS, PAPER_NAMES } from './sheet-statement.ts';
import { smoothingInBrief } from './smoothing-words.ts';
import { columnOf } from './table-columns.ts';

/** What each station holds now, in a few words for the list of stations. */
export function stationContents(project: NormProject, openQueries: number): Readonly<Record<Station, string>> {
  const { source, tally, groups, table, sheet, release } = project;
  if (tally === null || source === null) {
    return { cohort: 'no scores yet', groups: '', curve: '', table: '', sheet: '', release: '' };
  }
  const out = source.rowsRead - source.rowsKept;
  return {
    cohort: `${printCount(source.rowsKept)} kept, ${printCount(out)} left out`,
    groups: groupsInWords(project),
    curve: `${definitionName(project.curve.definition)}, ${smoothingInBrief(project.curve.smoothing)}`,
    table: ['rank', ...table.columns.map((key) => columnOf(key, project).name)].join(', '),
    sheet: sheetInWords(sheet),
    release:
      openQueries === 0
        ? `edition ${release.edition}`
        : openQueries === 1
          ? '1 query open'
          : `${openQueries} queries open`,
  };

  function groupsInWords(of: NormProject): string {
    if (groups.by.length === 0) return 'one table';
    const titles = normGroups(of).filter((group) => group.printed);
    const [only] = groups.by;
    if (groups.by.length === 1 && only !== undefined && titles.length <= 4) {
      return `${columnInWords(only).toLowerCase()} ${titles.map((group) => group.values[0] ?? '').join(', ')}`;
    }
    return `${titles.length} tables`;
  }
}

/** "A4, three columns"; "booklet of 9 blocks, A4" */
function sheetInWords(sheet: SheetChoices): string {
  const paper = PAPER_NAMES[sheet.paper];
  const extent = bookletExtent(sheet);
  switch (extent) {
    case 'tables':
    case 'nothing':
      return `${paper}, ${COLUMN_WORDS[sheet.tableColumns]}`;
    case 'whole':
      return `whole booklet, ${paper}`;
    case 'own': {
      const count = printedBlocks(sheet);
      return `booklet of ${count === 1 ? 'one block' : `${count} blocks`}, ${paper}`;
    }
  }
}
