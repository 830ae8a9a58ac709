import type { ScoreScale } from '../scale/score-scale.ts';
import { cutName, cutScoreText, cutsOfGroup } from './cuts.ts';
import { groupKey } from './norm-groups.ts';
import type { Cut, NormProject } from './norm-project.ts';

/** A cut score that was moved over somebody. */
export interface CrossedCut {
  /** “Reading support”. */
  readonly name: string;
  /** The cut score as printed in either edition. */
  readonly before: string;
  readonly after: string;
  /** Whether the new edition puts the person on the good side, where the old one did not, or the other way round. */
  readonly nowGood: boolean;
}

/** The cut scores that both editions have for a group and that put a raw score on another side now than before. */
export function crossedCuts(
  before: NormProject,
  after: NormProject,
  key: string,
  score: number,
): readonly CrossedCut[] {
  const [old, now] = [before.tally?.scale, after.tally?.scale];
  if (old === undefined || now === undefined) return [];
  const later = cutsOfGroup(after, key);
  return cutsOfGroup(before, key).flatMap((cut): readonly CrossedCut[] => {
    const same = later.find((other) => sameCut(cut, other));
    if (same === undefined) return [];
    const [wasGood, nowGood] = [onGoodSide(old, cut, score), onGoodSide(now, same, score)];
    if (wasGood === nowGood) return [];
    const texts = { before: cutScoreText(old, cut.score), after: cutScoreText(now, same.score) };
    return [{ name: cutName(cut), ...texts, nowGood }];
  });
}

function sameCut(one: Cut, other: Cut): boolean {
  const groupOf = ({ values }: Cut): string => (values === null ? '' : groupKey(values));
  return cutName(one) === cutName(other) && groupOf(one) === groupOf(other);
}

/** Who has the score of the cut or a better one stands on its good side. */
function onGoodSide({ direction }: ScoreScale, cut: Cut, score: number): boolean {
  return direction === 'high-is-good' ? score >= cut.score : score <= cut.score;
}
