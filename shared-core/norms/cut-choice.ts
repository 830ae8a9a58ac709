import { decimalOf, parseDecimal } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, scaleInWords, type ScoreScale } from '../scale/score-scale.ts';
import { printScore } from '../scores/printed-number.ts';
import { groupKey, normGroups, standingTitle } from './norm-groups.ts';
import type { Cut, NormProject } from './norm-project.ts';

/** A cut score as it is typed. */
export interface TypedCut {
  readonly name: string;
  readonly score: string;
  /** Null for all groups. */
  readonly values: readonly string[] | null;
}

export type CutTaken =
  { readonly ok: true; readonly project: NormProject } | { readonly ok: false; readonly problem: string };

const MOST_CUTS = 50;

/** The project with a cut score added, or put in the place of another; refused with a sentence that tells what to do. */
export function withCut(project: NormProject, typed: TypedCut, inPlaceOf: Cut | null = null): CutTaken {
  const scale = project.tally?.scale;
  if (scale === undefined) return refused('Read the cohort first: a cut score is one of its raw scores.');
  const name = typed.name.trim();
  if (name === '') return refused('Give the cut score a name; it is printed.');
  const score = typedScore(typed.score);
  if (score === null) return refused('Type the raw score, for example 23.');
  const off = attainableProblem(scale, score);
  if (off !== null) return refused(off);
  const others = project.cuts.filter((cut) => cut !== inPlaceOf);
  if (others.length >= MOST_CUTS) return refused(`At most ${MOST_CUTS} cut scores can be named. Remove one first.`);
  const twin = others.find((cut) => cut.name === name && overlap(cut.values, typed.values));
  if (twin !== undefined) {
    return refused(
      `“${name}” holds for ${cutGroupInWords(project, twin)} already. Change that one, or take another name.`,
    );
  }
  const cut: Cut = { name, score, values: typed.values };
  const replaced = inPlaceOf !== null && project.cuts.includes(inPlaceOf);
  const cuts = replaced ? project.cuts.map((known) => (known === inPlaceOf ? cut : known)) : [...others, cut];
  return { ok: true, project: { ...project, cuts } };
}

/** The project without a cut score. */
export function withoutCut(project: NormProject, cut: Cut): NormProject {
  return { ...project, cuts: project.cuts.filter((known) => known !== cut) };
}

/** A cut's score as it is printed on the scale of the cohort. */
export function cutScoreText(project: NormProject, { score }: Cut): string {
  const scale = project.tally?.scale;
  return scale === undefined || attainableProblem(scale, score) !== null ? String(score) : printScore(scale, score);
}

/** "all groups", "Grade 5" */
export function cutGroupInWords(project: NormProject, { values }: Cut): string {
  if (values === null) return 'all groups';
  const group = normGroups(project).find(({ key }) => key === groupKey(values));
  return group?.title ?? standingTitle(project.groups.by, values, project.people);
}

/** Why a cut that was taken once no longer holds for the cohort and groups as they are; null where it does. */
export function cutProblem(project: NormProject, { score, values }: Cut): string | null {
  const scale = project.tally?.scale;
  if (scale === undefined) return null;
  if (values !== null && !normGroups(project).some(({ key }) => key === groupKey(values))) {
    return 'There is no such group now. Choose another, or remove the cut score.';
  }
  return attainableProblem(scale, score);
}

function typedScore(text: string): number | null {
  const decimal = parseDecimal(text, text.includes(',') ? ',' : '.');
  return decimal === null ? null : Number(decimal.units) / 10 ** decimal.decimals;
}

function attainableProblem(scale: ScoreScale, score: number): string | null {
  if (typeof placeOnGrid(scaleGrid(scale), decimalOf(score)) === 'number') return null;
  return `Nobody can score ${score}: scores run from ${scaleInWords(scale)}. Choose one of them.`;
}

function overlap(left: Cut['values'], right: Cut['values']): boolean {
  return left === null || right === null || groupKey(left) === groupKey(right);
}

function refused(problem: string): CutTaken {
  return { ok: false, problem };
}
