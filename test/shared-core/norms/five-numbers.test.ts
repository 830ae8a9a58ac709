import { describe, expect, it } from 'vitest';
import { namedFiveNumbers } from '../../../shared-core/norms/five-numbers.ts';
import { sampleFacts, sheetTitle } from '../../../shared-core/pages/sheet-texts.ts';
import { firstNorms, projectOf, weightedProject } from './small-projects.ts';

const HUNDREDTHS = projectOf([1, 0, 1, 1, 1], { min: -0.1, max: 0.1, step: 0.05, direction: 'high-is-good' });

describe('the five numbers in print', () => {
  it('keep the decimals of the scale, one more where they lie between two scores', () => {
    expect(namedFiveNumbers(firstNorms(HUNDREDTHS)).map(({ name, printed }) => `${name} ${printed}`)).toEqual([
      'lowest −0.10',
      'lower hinge −0.05',
      'median 0.025',
      'upper hinge 0.075',
      'highest 0.10',
    ]);
    expect(sampleFacts(HUNDREDTHS, firstNorms(HUNDREDTHS))).toBe(
      '4 pupils. Mean 0.013, SD 0.085. ' +
        'Lowest score −0.10, lower hinge −0.05, median 0.025, upper hinge 0.075, highest score 0.10.',
    );
  });

  it('are quartiles where people weigh differently', () => {
    const weighted = weightedProject();
    expect(namedFiveNumbers(firstNorms(weighted)).map(({ name }) => name)).toEqual([
      'lowest',
      'lower quartile',
      'median',
      'upper quartile',
      'highest',
    ]);
    expect(sampleFacts(weighted, firstNorms(weighted))).toContain('lower quartile');
  });
});

describe('the title of a sheet', () => {
  it('stands in one line, whatever line ends the values hold', () => {
    const project = projectOf([1, 2]);
    const cell = { values: ['A\nB '], counts: [1, 2], weights: null, squares: null, clusters: null };
    const tally = project.tally && { ...project.tally, groupColumns: ['class'], cells: [cell] };
    const grouped = { ...project, tally, groups: { ...project.groups, by: ['class'] } };
    expect(sheetTitle(grouped, firstNorms(grouped))).toBe('Raw score to percentile rank, class A B');
  });
});
