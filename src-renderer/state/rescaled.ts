import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { decimalOf } from '../../shared-core/scale/decimal.ts';
import { attainableScores, placeOnGrid, scaleGrid, type ScoreScale } from '../../shared-core/scale/score-scale.ts';
import type { TallyCell } from '../../shared-core/tally/tally.ts';

/**
 * The project on another scale. A cohort file is read again by that scale; typed counts, which have no file, are moved
 * onto it, and the sentence says what does not fit.
 */
export function rescaled(project: NormProject, scale: ScoreScale): NormProject | string {
  if (project.reading !== null) return { ...project, reading: { ...project.reading, scale } };
  const { tally, source } = project;
  if (tally === null || source === null) return project;
  const grid = scaleGrid(scale);
  const old = attainableScores(tally.scale);
  const places = old.map((score) => placeOnGrid(grid, decimalOf(score)));
  const lost = old.find(
    (_, position) =>
      typeof places[position] !== 'number' && tally.cells.some((cell) => (cell.counts[position] ?? 0) > 0),
  );
  if (lost !== undefined) return `The counts hold the score ${lost}, which this scale does not have.`;
  const move = (cell: TallyCell): TallyCell => {
    const counts = Array.from({ length: grid.length }, () => 0);
    places.forEach((place, position) => {
      if (typeof place === 'number') counts[place] = cell.counts[position] ?? 0;
    });
    return { ...cell, counts };
  };
  return {
    ...project,
    source: { ...source, scaleInferred: false },
    tally: { ...tally, scale, cells: tally.cells.map(move) },
  };
}
