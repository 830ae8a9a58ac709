import type { GroupNorms } from '../norms/group-norms.ts';
import { onePerson } from '../norms/norm-groups.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { smoothingOf } from '../norms/smoothing-choice.ts';
import { DESIGN_EFFECT_NOTE, drawnInWords } from '../norms/sampling-words.ts';
import { methodText } from '../norms/statements.ts';
import { columnOf } from '../norms/table-columns.ts';
import { printNumber } from '../scores/printed-number.ts';

/**
 * The method of one group in sentences: what holds for all tables, how this group is smoothed, which may be a way of its
 * own, and what each column of errors holds.
 */
export function groupMethod(project: NormProject, norms: GroupNorms): string {
  return [methodText(project), smoothingSentence(project, norms), ...errorSentences(project, norms)]
    .filter((sentence) => sentence !== '')
    .join(' ');
}

/** How the group is smoothed, in a sentence; empty where no group is. */
export function smoothingSentence(project: NormProject, { group, smoothing }: GroupNorms): string {
  if (smoothing.state === 'smoothed') return smoothing.curve.statement;
  const somewhere = [project.curve.smoothing, ...project.curve.exceptions.map((exception) => exception.smoothing)].some(
    ({ kind }) => kind !== 'none',
  );
  if (!somewhere) return '';
  return smoothingOf(project, group.key).kind === 'none'
    ? 'The distribution of this group is not smoothed.'
    : 'The smoothing chosen for this group was refused; these are its observed ranks.';
}

/** What the printed columns of errors hold, a sentence each. */
function errorSentences(
  project: NormProject,
  { group, smoothing, precision, sampling }: GroupNorms,
): readonly string[] {
  const { columns } = project.table;
  const smoothed = smoothing.state === 'smoothed';
  const clustered = sampling.clusters !== null;
  const on = group.table.weighted && !clustered ? ' and on the effective n' : '';
  const asIf = `${drawnInWords(project.people, sampling)}${on}`;
  const sentences: string[] = [];
  if (columns.includes('interval') && precision.intervals !== null) {
    sentences.push(`The interval is that of the observed rank${smoothed ? ', before smoothing' : ''}, ${asIf}.`);
  }
  if (columns.includes('standard-error')) {
    const values = smoothed ? smoothing.curve.standardErrors : precision.standardErrors;
    const how = errorMethod(smoothed, clustered);
    sentences.push(
      values === null
        ? `The standard error has no formula for this ${smoothed ? 'smoothing' : 'definition'}; its column is empty.`
        : `The standard error is error of sampling in percentile-rank points, ${how}, ${asIf}.`,
    );
  }
  if (clustered && sentences.length > 0 && sampling.designEffect !== null) sentences.push(DESIGN_EFFECT_NOTE);
  if (columns.includes('measurement-band') && precision.sem !== null) {
    sentences.push(
      `The ${project.precision.level} % measurement band is error of measurement, by a standard error of ` +
        `${printNumber(precision.sem, 2)} raw-score points.`,
    );
  }
  if (columns.includes('print-range')) {
    const { heading, explanation } = columnOf('print-range', project);
    sentences.push(`“${heading.join(' ')}”: ${inSentence(explanation)}`);
  }
  return sentences;
}

function errorMethod(smoothed: boolean, clustered: boolean): string {
  if (smoothed) {
    return clustered
      ? 'by the delta method for the smoothed rank, widened by the design effect'
      : 'by the delta method for the smoothed rank';
  }
  return clustered ? 'linearised between clusters' : 'from the multinomial distribution';
}

/** The project's cautions and, where a column of errors is printed, that the two errors are different things. */
export function cautionsOf(project: NormProject): string {
  const own = project.sheet.cautions.trim();
  const errors = errorCaution(project);
  if (own === '' || errors === '') return `${own}${errors}`;
  return `${own}${/[.!?…]$/.test(own) ? ' ' : '\n'}${errors}`;
}

/** What the printed columns of errors tell, and that the two errors are different things; empty without such a column. */
export function errorCaution(project: NormProject): string {
  const { columns } = project.table;
  const one = onePerson(project.people);
  const sampling = [
    ...(columns.includes('interval') ? ['interval'] : []),
    ...(columns.includes('standard-error') ? ['standard error'] : []),
  ];
  const band = columns.includes('measurement-band');
  const drawn = `how far a rank could move had other ${project.people} been drawn (error of sampling)`;
  const blurred = `where the rank of one ${one}’s true score may lie (error of measurement)`;
  if (sampling.length === 0 && !band) return '';
  const tell = `The ${sampling.join(' and the ')} ${sampling.length === 1 ? 'tells' : 'tell'} ${drawn}`;
  if (sampling.length === 0) {
    return `The measurement band tells ${blurred}. It leaves out error of sampling, which is a different thing.`;
  }
  return band
    ? `${tell}; the measurement band tells ${blurred}. They are different things: neither holds the other.`
    : `${tell}. Error of measurement in one ${one}’s score is a different thing and is left out.`;
}

function inSentence(words: string): string {
  return words.charAt(0).toLowerCase() + words.slice(1);
}
