import { ENGLISH_WORDS, figure, say, wordsOf, type PrintWords } from '../languages/phrases.ts';
import type { ColumnKey } from './column-keys.ts';
import type { NormProject } from './norm-project.ts';
import { drawnInGeneral } from './sampling-words.ts';

/** Points of a normal curve equivalent to one of z. */
const NCE_FACTOR = '21.06';

/** How a column is headed and explained. The percentile rank and the raw score are columns of every table. */
export interface TableColumn {
  readonly key: ColumnKey | 'score' | 'rank';
  /** One or two lines. */
  readonly heading: readonly string[];
  /** One line, for lists and legends: "stanine", "T score". */
  readonly name: string;
  readonly explanation: string;
}

export function scoreColumn(words = ENGLISH_WORDS): TableColumn {
  return {
    key: 'score',
    heading: linesOf(say(words, 'column.score.heading')),
    name: say(words, 'column.score.name'),
    explanation: say(words, 'column.score.explanation'),
  };
}

export function rankColumn(words = ENGLISH_WORDS): TableColumn {
  return {
    key: 'rank',
    heading: linesOf(say(words, 'column.rank.heading')),
    name: say(words, 'column.rank.name'),
    explanation: say(words, 'column.rank.explanation'),
  };
}

/** The column of a key in the words of this project. */
export function columnOf(key: ColumnKey, project: NormProject, words = ENGLISH_WORDS): TableColumn {
  return { key, ...textsOf(key, project, words) };
}

function textsOf(key: ColumnKey, project: NormProject, words: PrintWords): Omit<TableColumn, 'key'> {
  switch (key) {
    case 'count':
      return {
        heading: linesOf(say(words, `column.count.heading.${project.people}`)),
        name: say(words, 'column.count.name', { people: say(words, `people.${project.people}`) }),
        explanation: say(words, 'column.count.explanation'),
      };
    case 'cumulative': {
      const what = project.tally !== null && project.tally.weightDecimals !== null ? 'weight' : 'number';
      const side = project.tally?.scale.direction === 'low-is-good' ? 'above' : 'below';
      return {
        heading: linesOf(say(words, `column.cumulative.heading.${what}-${side}`)),
        name: say(words, `column.cumulative.name.${what}-${side}`),
        explanation: say(words, `column.cumulative.explanation.${what}-${side}`),
      };
    }
    case 'interval': {
      const level = levelInWords(project, words);
      return {
        heading: linesOf(say(words, 'column.interval.heading', { level })),
        name: say(words, 'column.interval.name', { level }),
        explanation: say(words, 'column.interval.explanation'),
      };
    }
    case 'standard-error':
      return {
        heading: linesOf(say(words, 'column.standard-error.heading')),
        name: say(words, 'column.standard-error.name'),
        explanation: say(words, 'column.standard-error.explanation', {
          drawn: drawnInGeneral({ ...project, people: 'people' }, words),
        }),
      };
    case 'nce':
      return {
        heading: linesOf(say(words, 'column.nce.heading')),
        name: say(words, 'column.nce.name'),
        explanation: say(words, 'column.nce.explanation', { factor: figure(words, NCE_FACTOR) }),
      };
    case 'stanine':
      return {
        heading: linesOf(say(words, 'column.stanine.heading')),
        name: say(words, 'column.stanine.name'),
        explanation: say(words, `column.stanine.explanation.${project.table.zSource}`),
      };
    case 'exact-rank':
    case 'observed-rank':
    case 'measurement-band':
    case 'print-range':
    case 'z':
    case 't':
    case 'deviation':
    case 'sten':
      return {
        heading: linesOf(say(words, `column.${key}.heading`)),
        name: say(words, `column.${key}.name`),
        explanation: say(words, `column.${key}.explanation`),
      };
  }
}

function linesOf(heading: string): readonly string[] {
  return heading.split('\n');
}

/** The level of intervals and bands: "95 %". */
export function levelInWords(
  { precision }: { readonly precision: { readonly level: number } },
  words = ENGLISH_WORDS,
): string {
  return `${figure(words, String(precision.level))} %`;
}

/** All columns of the project's tables in print order. */
export function tableColumns(project: NormProject, words = ENGLISH_WORDS): readonly TableColumn[] {
  return [scoreColumn(words), rankColumn(words), ...project.table.columns.map((key) => columnOf(key, project, words))];
}

/** The same in the language of the booklet. */
export function printedColumns(project: NormProject): readonly TableColumn[] {
  return tableColumns(project, wordsOf(project));
}
