import * as v from 'valibot';
import { tableStatement } from '../../../shared-core/norms/method-statements.ts';
import { describe, expect, it } from 'vitest';
import { alternatives, type ListedChoice } from '../../../shared-core/norms/alternatives.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { normProjectSchema, type NormProject } from '../../../shared-core/norms/norm-project.ts';
import { sheetStatement } from '../../../shared-core/norms/sheet-statement.ts';
import {
  cohortStatement,
  curveStatement,
  groupsStatement,
  joined,
  methodText,
  releaseStatement,
  statementText,
  type ChoiceKey,
  type StatementPart,
} from '../../../shared-core/norms/statements.ts';
import {
  builtSet,
  curveOf,
  logLinear,
  smoothedBy,
  projectOf,
  scaleTo,
  settledProject,
  TEN_COUNTS,
} from './small-projects.ts';

const LISTED = [
  'people',
  'direction',
  'duplicates',
  'definition',
  'smoothing',
  'degree',
  'interval',
  'level',
  'decimals',
  'rounding',
  'ends',
  'z-source',
  'z-ends',
  'booklet',
  'paper',
  'orientation',
  'fours',
  'table-columns',
  'fives',
  'range-rows',
  'ogive',
  'inverse',
] as const satisfies readonly ListedChoice[];

function allParts(project: NormProject): readonly StatementPart[] {
  return [
    cohortStatement(project),
    groupsStatement(project),
    curveStatement(project),
    tableStatement(project),
    sheetStatement(project),
    releaseStatement(project),
  ].flat();
}

function choicesIn(project: NormProject): readonly (ChoiceKey | null)[] {
  return allParts(project).map((part) => part.choice);
}

const settled = settledProject();

describe.each(LISTED)('the choice of %s', (choice) => {
  const start = choice === 'degree' ? smoothedBy(settled, logLinear('bic')) : settled;
  const listed = alternatives(start, choice);

  it('has exactly one alternative chosen, which is the project as it is', () => {
    const chosen = listed.filter((alternative) => alternative.chosen);
    expect(chosen).toHaveLength(1);
    expect(chosen[0]?.project).toEqual(start);
  });

  it('makes projects that the schema accepts, in which that alternative is the chosen one', () => {
    for (const { label, project } of listed) {
      expect(v.safeParse(normProjectSchema, project).success).toBe(true);
      const again = alternatives(project, choice).filter((alternative) => alternative.chosen);
      expect(again.map((alternative) => alternative.label)).toEqual([label]);
      expect(builtSet(project).groups.length).toBeGreaterThan(0);
    }
  });

  it('has a phrase in the statements, which changes with every alternative', () => {
    expect(choicesIn(start)).toContain(choice);
    const phrases = listed.map(({ project }) => allParts(project).find((part) => part.choice === choice)?.text);
    const sentences = listed.map(({ project }) => statementText(allParts(project)));
    expect(phrases).not.toContain(undefined);
    expect(new Set(phrases).size).toBe(listed.length);
    expect(new Set(sentences).size).toBe(listed.length);
  });

  it('explains every alternative in other words', () => {
    expect(new Set(listed.map(({ explanation }) => explanation)).size).toBe(listed.length);
    expect(new Set(listed.map(({ label }) => label)).size).toBe(listed.length);
  });
});

describe('alternatives', () => {
  it('leave a new project usable, one of each chosen where there is something to choose', () => {
    const fresh = newProject('');
    for (const choice of LISTED) {
      const listed = alternatives(fresh, choice);
      const chosen = listed.filter((alternative) => alternative.chosen).length;
      expect([choice, chosen]).toEqual([choice, choice === 'duplicates' ? 0 : 1]);
      for (const { project } of listed) expect(v.safeParse(normProjectSchema, project).success).toBe(true);
    }
  });

  it('hold the present definition even where it is not a usual one', () => {
    const definition = { kind: 'plotting-position', offset: '0.44' } as const;
    const listed = alternatives({ ...settled, curve: curveOf(definition) }, 'definition');
    expect(listed.filter(({ chosen }) => chosen).map(({ project }) => project.curve.definition)).toEqual([definition]);
  });

  it('offer classes that fit the step, whatever it is', () => {
    for (const step of [0.07, 0.1, 0.3, 0.5, 0.0011, 1, 2, 7]) {
      const scale = { min: 0, max: 4 * step, step, direction: 'high-is-good' } as const;
      const fitting = Number((4 * step).toPrecision(12));
      const project = projectOf(TEN_COUNTS, { ...scale, max: fitting });
      for (const alternative of alternatives(project, 'definition')) builtSet(alternative.project);
    }
  });

  it('turn the direction in the tally and in the reading alike', () => {
    const low = alternatives(settled, 'direction').find(({ chosen }) => !chosen)?.project;
    expect(low?.tally?.scale.direction).toBe('low-is-good');
    expect(low?.reading?.scale?.direction).toBe('low-is-good');
  });
});

describe('statements', () => {
  it('read as sentences', () => {
    expect(statementText(cohortStatement(settled))).toBe(
      'The rows are pupils whose scores run from 0 to 20; high scores are good. 99 and abs stand for a missing score; ' +
        'of repeated identifiers the first row is kept.',
    );
    expect(statementText(groupsStatement(settled))).toBe('There is one table for each grade.');
    expect(methodText(settled)).toBe(
      'A pupil’s percentile rank is the share of the group scoring below, plus half of those at the same score. ' +
        'Percentile ranks are printed as whole numbers, halves rounded up, with <1 and >99 at the ends; ' +
        'beside them the stanine and T score. ' +
        'z scores are normal deviates of the ranks; they are held between −3 and 3.',
    );
    expect(statementText(sheetStatement(settled))).toBe(
      'The booklet is a sheet for each table, on A4, portrait, with the usual margins, no gutter and no blank pages. ' +
        'Tables stand in three columns, figures of 8.7 points on rows of 12.4 points, set in fives, with a row for each ' +
        'score. Each comes with its ogive and with the lowest score for each percentile.',
    );
    expect(statementText(releaseStatement(settled))).toBe(
      'This is edition 1.0, dated 2026-06-15, prepared by A. Weir, checked by J. Lund.',
    );
  });

  it('turn round where low scores are good', () => {
    const seconds = projectOf(TEN_COUNTS, scaleTo(4, 'low-is-good'));
    expect(statementText(cohortStatement(seconds))).toBe(
      'The rows are pupils whose scores run from 0 to 4; low scores are good.',
    );
    expect(statementText(curveStatement(seconds))).toContain('scoring above, plus half');
  });

  it('leave out what there is nothing to say about', () => {
    const bare = newProject('');
    expect(choicesIn(bare)).not.toContain('duplicates');
    expect(choicesIn(bare)).not.toContain('missing');
    const columns = (keys: NormProject['table']['columns'], zSource: 'normalised' | 'linear'): NormProject => ({
      ...bare,
      table: { ...bare.table, columns: keys, zSource },
    });
    expect(choicesIn(columns(['count', 'stanine'], 'normalised'))).not.toContain('z-source');
    expect(choicesIn(columns(['count', 'stanine'], 'linear'))).toContain('z-source');
    expect(statementText(tableStatement(columns([], 'normalised')))).toContain('beside them nothing else.');
    expect(statementText(groupsStatement(bare))).toBe('There is one table for all people.');
    expect(statementText(releaseStatement({ ...bare, release: { ...bare.release, edition: ' ', date: '' } }))).toBe(
      'This is edition (no number), dated (no date), prepared by (nobody yet), checked by (nobody yet).',
    );
  });

  it('say when the scale was taken from the scores, and when no code is missing', () => {
    const reading = settled.reading && { ...settled.reading, scale: null, missing: [] };
    const text = statementText(cohortStatement({ ...settled, reading }));
    expect(text).toContain('from 0 to 20, as met;');
    expect(text).toContain('No code stands for a missing score');
    const one = statementText(cohortStatement({ ...settled, reading: reading && { ...reading, missing: ['99'] } }));
    expect(one).toContain('99 stands for a missing score');
    expect(statementText(cohortStatement({ ...settled, reading, tally: null }))).toContain(
      'from the lowest to the highest met;',
    );
  });

  it('join lists', () => {
    expect([[], ['a'], ['a', 'b'], ['a', 'b', 'c']].map(joined)).toEqual(['', 'a', 'a and b', 'a, b and c']);
  });
});
