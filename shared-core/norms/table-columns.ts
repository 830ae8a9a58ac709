import type { ColumnKey } from './column-keys.ts';
import type { NormProject } from './norm-project.ts';
import { drawnInGeneral } from './sampling-words.ts';

/** How a column is headed and explained. The percentile rank and the raw score are columns of every table. */
export interface TableColumn {
  readonly key: ColumnKey | 'score' | 'rank';
  /** One or two lines. */
  readonly heading: readonly string[];
  /** One line, for lists and legends: "stanine", "T score". */
  readonly name: string;
  readonly explanation: string;
}

export function scoreColumn(): TableColumn {
  return {
    key: 'score',
    heading: ['Raw', 'score'],
    name: 'raw score',
    explanation: 'The score as counted on the test.',
  };
}

export function rankColumn(): TableColumn {
  return {
    key: 'rank',
    heading: ['Percentile', 'rank'],
    name: 'percentile rank',
    explanation: 'The place of the score in the group, rounded for print.',
  };
}

/** The column of a key in the words of this project. */
export function columnOf(key: ColumnKey, project: NormProject): TableColumn {
  const people = project.people.charAt(0).toUpperCase() + project.people.slice(1);
  const weighted = project.tally !== null && project.tally.weightDecimals !== null;
  const good = project.tally?.scale.direction !== 'low-is-good';
  switch (key) {
    case 'count':
      return {
        key,
        heading: [people],
        name: `number of ${project.people}`,
        explanation: 'How many obtained the score.',
      };
    case 'cumulative': {
      const side = good ? 'below' : 'above';
      return {
        key,
        heading: weighted ? ['Weight at', `or ${side}`] : ['At or', side],
        name: `${weighted ? 'weight' : 'number'} at or ${side}`,
        explanation: `${weighted ? 'The weight of those who' : 'How many'} obtained the score or a ${
          good ? 'lower one' : 'higher one, which here is the poorer side'
        }.`,
      };
    }
    case 'exact-rank':
      return {
        key,
        heading: ['Rank,', '2 decimals'],
        name: 'rank to two decimals',
        explanation: 'The percentile rank before it is rounded for print.',
      };
    case 'observed-rank':
      return {
        key,
        heading: ['Observed', 'rank'],
        name: 'observed rank',
        explanation: 'The percentile rank before smoothing and rounding.',
      };
    case 'interval':
      return {
        key,
        heading: [`${project.precision.level} %`, 'interval'],
        name: `${project.precision.level} % interval`,
        explanation: 'Error of sampling: how far the rank could move had other people been drawn.',
      };
    case 'standard-error':
      return {
        key,
        heading: ['Standard', 'error'],
        name: 'standard error of the rank',
        explanation: `Error of sampling, in percentile-rank points, ${drawnInGeneral({ ...project, people: 'people' })}.`,
      };
    case 'measurement-band':
      return {
        key,
        heading: ['Measure-', 'ment band'],
        name: 'measurement band',
        explanation: 'Error of measurement: where the rank of one person’s true score may lie, by the reliability.',
      };
    case 'print-range':
      return {
        key,
        heading: ['Could', 'be printed'],
        name: 'range of defensible ranks',
        explanation: 'Lowest and highest rank over the usual definitions, with and without smoothing.',
      };
    case 'z':
      return { key, heading: ['z'], name: 'z score', explanation: 'Distance from the middle in standard deviations.' };
    case 't':
      return { key, heading: ['T'], name: 'T score', explanation: '50 + 10 z.' };
    case 'nce':
      return {
        key,
        heading: ['NCE'],
        name: 'normal curve equivalent',
        explanation: '50 + 21.06 z: equal steps that meet the percentile rank at 1, 50 and 99.',
      };
    case 'deviation':
      return { key, heading: ['Deviation', 'score'], name: 'deviation score', explanation: '100 + 15 z.' };
    case 'sten':
      return { key, heading: ['Sten'], name: 'sten', explanation: 'Ten bands, half a standard deviation wide.' };
    case 'stanine':
      return {
        key,
        heading: ['Sta-', 'nine'],
        name: 'stanine',
        explanation:
          project.table.zSource === 'normalised'
            ? 'Nine bands holding 4, 7, 12, 17, 20, 17, 12, 7 and 4 per cent.'
            : 'Nine bands, half a standard deviation wide.',
      };
  }
}

/** All columns of the project's tables in print order. */
export function tableColumns(project: NormProject): readonly TableColumn[] {
  return [scoreColumn(), rankColumn(), ...project.table.columns.map((key) => columnOf(key, project))];
}
