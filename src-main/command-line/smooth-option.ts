import { bandwidthProblem } from '../../shared-core/smoothing/bandwidth.ts';
import type { LogLinearChoice, SmoothingChoice } from '../../shared-core/smoothing/smoothing.ts';
import { numberIn, WrongOption } from './option-values.ts';

type Degree = LogLinearChoice['degree'];

/** Reads the value of --smooth; throws `WrongOption`. */
export function smoothingFromOption(text: string): SmoothingChoice {
  const choice = choiceOf(text);
  if (choice !== null) return choice;
  throw new WrongOption(
    `--smooth is none, log-linear:C, kernel:H, log-linear:C+kernel:H or beta-binomial, with C auto, aic, likelihood-ratio ` +
      `or 1 to 10 and H auto or a number above 0; not "${text}".`,
  );
}

/** What to type for a choice that was made with --smooth, which cannot keep scores or a comb. */
export function smoothingAsOption(choice: SmoothingChoice): string {
  switch (choice.kind) {
    case 'none':
    case 'beta-binomial':
      return choice.kind;
    case 'log-linear':
      return modelAsOption(choice);
    case 'kernel': {
      const kernel = `kernel:${choice.bandwidth}`;
      return choice.after === null ? kernel : `${modelAsOption(choice.after)}+${kernel}`;
    }
  }
}

function choiceOf(text: string): SmoothingChoice | null {
  if (text === 'none' || text === 'beta-binomial') return { kind: text };
  const [first = '', second, ...others] = text.split('+');
  if (others.length > 0) return null;
  const model = modelOf(first);
  if (second === undefined) {
    if (model !== null) return { kind: 'log-linear', ...model };
    const alone = bandwidthOf(first);
    return alone === null ? null : { kind: 'kernel', bandwidth: alone, after: null };
  }
  const bandwidth = bandwidthOf(second);
  return model === null || bandwidth === null ? null : { kind: 'kernel', bandwidth, after: model };
}

function modelOf(text: string): LogLinearChoice | null {
  const degree = text.startsWith('log-linear:') ? degreeOf(text.slice('log-linear:'.length)) : null;
  return degree === null ? null : { degree, keptScores: [], comb: null };
}

function degreeOf(text: string): Degree | null {
  switch (text) {
    case 'auto':
      return 'bic';
    case 'aic':
    case 'likelihood-ratio':
      return text;
    default:
      return /^(?:[1-9]|10)$/.test(text) ? Number(text) : null;
  }
}

function modelAsOption({ degree }: LogLinearChoice): string {
  return `log-linear:${degree === 'bic' ? 'auto' : degree}`;
}

function bandwidthOf(text: string): number | 'auto' | null {
  if (!text.startsWith('kernel:')) return null;
  const value = text.slice('kernel:'.length);
  if (value === 'auto') return value;
  const bandwidth = numberIn(value);
  return bandwidth !== null && bandwidthProblem(bandwidth) === null ? bandwidth : null;
}
