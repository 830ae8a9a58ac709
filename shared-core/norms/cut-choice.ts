import { parseDecimal } from '../scale/decimal.ts';
import { offScale } from './cut-queries.ts';
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
  const off = offScale(scale, { score });
  if (off !== null) return refused(`${off.why} ${off.whatToDo}`);
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

/** "all groups", "Grade 5" */
export function cutGroupInWords(project: NormProject, { values }: Cut): string {
  if (values === null) return 'all groups';
  const group = normGroups(project).find(({ key }) => key === groupKey(values));
  return group?.title ?? standingTitle(project.groups.by, values, project.people);
}

function typedScore(text: string): number | null {
  const decimal = parseDecimal(text, text.includes(',') ? ',' : '.');
  return decimal === null ? null : Number(decimal.units) / 10 ** decimal.decimals;
}

function overlap(left: Cut['values'], right: Cut['values']): boolean {
  return left === null || right === null || groupKey(left) === groupKey(right);
}

function refused(problem: string): CutTaken {
  return { ok: false, problem };
}
