import { decimalOf } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, scaleInWords, type ScoreScale } from '../scale/score-scale.ts';
import { cutName, cutsOfGroup, cutScoreText, firstOnGoodSide } from './cuts.ts';
import type { GroupNorms } from './group-norms.ts';
import { listed } from './listed.ts';
import { groupKey, normGroups, valueInWords } from './norm-groups.ts';
import type { Cut, NormProject } from './norm-project.ts';
import { partedByCuts } from './printed-rows.ts';
import type { Asked, AskedOfGroup } from './queries.ts';

/** What a proof-reader would ask of cuts that no table can show: at no score of the scale, or of no group. */
export function cutQueries(project: NormProject): readonly Asked[] {
  const { tally, cuts } = project;
  if (tally === null || cuts.length === 0) return [];
  const keys = new Set(normGroups(project).map(({ key }) => key));
  const seen = new Map<string, number>();
  return cuts.flatMap((cut): readonly Asked[] => {
    const key = cut.values === null ? null : groupKey(cut.values);
    const problem = offScale(tally.scale, cut) ?? (key === null || keys.has(key) ? null : ofNoGroup(cut.values ?? []));
    if (problem === null) return [];
    const id = `cut:${cut.score}:${key ?? ''}:${cut.name}`;
    const before = seen.get(id) ?? 0;
    seen.set(id, before + 1);
    return [
      {
        id: before === 0 ? id : `${id}:${before + 1}`,
        station: 'sheet',
        weight: 'must',
        group: key !== null && keys.has(key) ? key : null,
        lead: `The cut ${cutName(cut)} at ${cutScoreText(tally.scale, cut.score)} has no place in the tables.`,
        ...problem,
      },
    ];
  });
}

type Problem = Pick<Asked, 'why' | 'whatToDo'>;

/** Why a cut has no place on the scale, and what to do; null where it has one. */
export function offScale(scale: ScoreScale, { score }: Pick<Cut, 'score'>): Problem | null {
  const place = placeOnGrid(scaleGrid(scale), decimalOf(score));
  if (typeof place === 'number') return null;
  const inWords = scaleInWords(scale);
  if (place !== 'off-grid') {
    return { why: `The scores go from ${inWords}.`, whatToDo: 'Give the cut a score of the scale, or remove it.' };
  }
  const side = scale.direction === 'high-is-good' ? 'lowest' : 'highest';
  return {
    why: `Nobody can have this score: the scores go from ${inWords}.`,
    whatToDo: `Give the cut the ${side} score that is on its good side.`,
  };
}

function ofNoGroup(values: readonly string[]): Problem {
  return {
    why: `There is no group ${values.map((value) => valueInWords(value)).join(', ') || 'of everybody'}.`,
    whatToDo: 'Name one of the groups, let the cut hold for all, or remove it.',
  };
}

/** What a proof-reader would ask of cuts in a table whose rows are ranges of scores. */
export function rangeRowQueries(project: NormProject, norms: GroupNorms): readonly AskedOfGroup[] {
  if (!project.sheet.rangeRows) return [];
  return [...hiddenCutQueries(project, norms), ...partedRowQueries(project, norms)];
}

function hiddenCutQueries(project: NormProject, { group }: GroupNorms): readonly AskedOfGroup[] {
  const { scale } = group.table;
  const grid = scaleGrid(scale);
  const between = cutsOfGroup(project, group.key).filter(
    ({ score }) => firstOnGoodSide(scale, score) !== null && placeOnGrid(grid, decimalOf(score)) === 'off-grid',
  );
  if (between.length === 0) return [];
  return [
    {
      id: 'merged-rows-hide-cut',
      station: 'sheet',
      weight: 'should',
      lead: `In the rows of ${group.title} a cut stands between two scores: ${listed(between.map(({ score }) => cutScoreText(scale, score)))}.`,
      why: 'Rows that stand for several scores are parted at the score that follows the cut, which no row names.',
      whatToDo: 'Give the cut a score that can be obtained, or print a row for each score.',
    },
  ];
}

function partedRowQueries(project: NormProject, norms: GroupNorms): readonly AskedOfGroup[] {
  const parted = partedByCuts(project, norms);
  if (parted.length === 0) return [];
  const pairs = parted.map(([below, above]) => `${below} and ${above}`);
  return [
    {
      id: 'rows-parted-by-cut',
      station: 'sheet',
      weight: 'note',
      lead: `Rows of ${norms.group.title} that print alike are parted by a cut: ${pairs.join('; ')}.`,
      why: 'In one row they would hide on which side of the cut a score stands.',
      whatToDo: 'Nothing.',
    },
  ];
}
