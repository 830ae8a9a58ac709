import { figure, say, wordsOf, type PrintWords } from '../languages/phrases.ts';
import { inSentence } from '../languages/sentence.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import { onePerson } from '../norms/norm-groups.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { smoothingOf } from '../norms/smoothing-choice.ts';
import { designEffectNote, drawnInWords } from '../norms/sampling-words.ts';
import { methodText } from '../norms/statements.ts';
import { columnOf, levelInWords } from '../norms/table-columns.ts';
import { printNumber } from '../scores/printed-number.ts';
import { smoothingStatement } from '../smoothing/smoothing-statement.ts';
import { headInOneLine } from './spoken-text.ts';

/**
 * The method of one group in sentences: what holds for all tables, how this group is smoothed, which may be a way of its
 * own, and what each column of errors holds.
 */
export function groupMethod(project: NormProject, norms: GroupNorms): string {
  return [
    methodText(project, wordsOf(project)),
    smoothingSentence(project, norms),
    ...errorSentences(project, norms, wordsOf(project)),
  ]
    .filter((sentence) => sentence !== '')
    .join(' ');
}

/** How the group is smoothed, in a sentence; empty where no group is. */
export function smoothingSentence(project: NormProject, { group, smoothing }: GroupNorms): string {
  const words = wordsOf(project);
  if (smoothing.state === 'smoothed') return smoothingStatement(smoothing.curve, words);
  const somewhere = [project.curve.smoothing, ...project.curve.exceptions.map((exception) => exception.smoothing)].some(
    ({ kind }) => kind !== 'none',
  );
  if (!somewhere) return '';
  return say(words, smoothingOf(project, group.key).kind === 'none' ? 'smoothing.not-this-group' : 'smoothing.refused');
}

/** What the printed columns of errors hold, a sentence each. */
function errorSentences(project: NormProject, norms: GroupNorms, words: PrintWords): readonly string[] {
  const { smoothing, precision, sampling } = norms;
  const { columns } = project.table;
  const smoothed = smoothing.state === 'smoothed';
  const clustered = sampling.clusters !== null;
  const drawn = drawnSo(project, norms, words);
  const sentences: string[] = [];
  if (columns.includes('interval') && precision.intervals !== null) {
    sentences.push(say(words, smoothed ? 'errors.interval-smoothed' : 'errors.interval', { drawn }));
  }
  if (columns.includes('standard-error')) {
    const values = smoothed ? smoothing.curve.standardErrors : precision.standardErrors;
    sentences.push(
      values === null
        ? say(words, smoothed ? 'errors.none-for-smoothing' : 'errors.none-for-definition')
        : say(words, 'errors.standard-error', { method: say(words, errorMethod(smoothed, clustered)), drawn }),
    );
  }
  if (clustered && sentences.length > 0 && sampling.designEffect !== null) sentences.push(designEffectNote(words));
  if (columns.includes('measurement-band') && precision.sem !== null) {
    const error = figure(words, printNumber(precision.sem, 2));
    sentences.push(say(words, 'errors.band', { level: levelInWords(project, words), error }));
  }
  if (columns.includes('print-range')) {
    const { heading, explanation } = columnOf('print-range', project, words);
    sentences.push(
      say(words, 'errors.column', { heading: headInOneLine(heading), explanation: inSentence(words, explanation) }),
    );
  }
  return sentences;
}

/** How people were drawn, and where weights alone make an effective n, that it counts. */
function drawnSo(project: NormProject, { group, sampling }: GroupNorms, words: PrintWords): string {
  const drawn = drawnInWords(project.people, sampling, words);
  return group.table.weighted && sampling.clusters === null ? say(words, 'drawn.on-effective-n', { drawn }) : drawn;
}

function errorMethod(
  smoothed: boolean,
  clustered: boolean,
): 'errors.by-delta' | 'errors.by-delta-widened' | 'errors.by-multinomial' | 'errors.by-clusters' {
  if (smoothed) return clustered ? 'errors.by-delta-widened' : 'errors.by-delta';
  return clustered ? 'errors.by-clusters' : 'errors.by-multinomial';
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
  const words = wordsOf(project);
  const person = onePerson(project.people, words);
  const drawn = say(words, 'caution.drawn', { people: say(words, `people.${project.people}`) });
  const blurred = say(words, 'caution.blurred', { person });
  const [interval, error] = [columns.includes('interval'), columns.includes('standard-error')];
  const band = columns.includes('measurement-band');
  if (!interval && !error) return band ? say(words, 'caution.band-alone', { blurred }) : '';
  const told = interval && error ? 'interval-and-error' : interval ? 'interval' : 'standard-error';
  const sampling = say(words, `caution.${told}`, { drawn });
  return band
    ? say(words, 'caution.with-band', { sampling, blurred })
    : say(words, 'caution.without-band', { sampling, person });
}
