import { ENGLISH_WORDS, figure, say, sayCounted, type PrintWords } from '../languages/phrases.ts';
import { TEST_LEVEL } from './choose-degree.ts';
import type { LogLinearChoice, Smoothed } from './smoothing.ts';

/** What a smoothed distribution tells of how it was made. */
type SmoothingFacts = Pick<Smoothed, 'choice' | 'degree' | 'degrees' | 'bandwidth' | 'shape'>;

/** What was done, in a plain sentence or two. */
export function smoothingStatement(facts: SmoothingFacts, words = ENGLISH_WORDS): string {
  const { choice, bandwidth, shape } = facts;
  switch (choice.kind) {
    case 'log-linear':
      return logLinearStatement(choice, facts, words);
    case 'kernel': {
      if (bandwidth === null) throw new RangeError('a kernel without its bandwidth');
      const kernel = say(words, 'smoothing.gaussian', {
        bandwidth: figure(words, choice.bandwidth === 'auto' ? bandwidth.toFixed(4) : String(bandwidth)),
        chosen: choice.bandwidth === 'auto' ? say(words, 'smoothing.bandwidth-chosen') : '',
      });
      if (choice.after === null) return say(words, 'smoothing.kernel', { kernel });
      return say(words, 'smoothing.kernel-after', {
        statement: logLinearStatement(choice.after, facts, words),
        kernel,
      });
    }
    case 'beta-binomial': {
      if (shape === null) throw new RangeError('a beta-binomial distribution without its parameters');
      const [a, b] = [figure(words, shape.a.toFixed(4)), figure(words, shape.b.toFixed(4))];
      return say(words, 'smoothing.beta-binomial', { a, b });
    }
  }
}

function logLinearStatement(
  choice: LogLinearChoice,
  { degree, degrees }: Pick<SmoothingFacts, 'degree' | 'degrees'>,
  words: PrintWords,
): string {
  const { keptScores, comb } = choice;
  const kept = keptScores.map((score) => figure(words, String(score))).join(', ');
  const count = String(degree);
  return say(words, 'smoothing.log-linear', {
    degree: count,
    chosen: howChosen(choice, degrees, words),
    'kept-scores': kept === '' ? '' : say(words, 'smoothing.kept-scores', { scores: kept }),
    comb:
      comb === null
        ? ''
        : say(words, 'smoothing.comb', { every: String(comb.every), position: String(comb.offset + 1) }),
    moments: sayCounted(words, 'smoothing.moments', count, { count }),
  });
}

function howChosen(choice: LogLinearChoice, degrees: SmoothingFacts['degrees'], words: PrintWords): string {
  if (typeof choice.degree === 'number') return '';
  const level = figure(words, String(TEST_LEVEL));
  const count = String(degrees.length);
  const failed = degrees.filter(({ converged }) => !converged).map((line) => String(line.degree));
  return say(words, 'smoothing.chosen', {
    rule: say(words, `smoothing.rule.${choice.degree}`, { level }),
    degrees: sayCounted(words, 'smoothing.degrees', count, { count }),
    failed: failed.length === 0 ? '' : say(words, 'smoothing.failed', { degrees: failed.join(', ') }),
  });
}
