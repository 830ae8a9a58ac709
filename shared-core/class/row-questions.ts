import { parseDecimal, type DecimalMark } from '../scale/decimal.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import type { ClassListRow, MissedStatus, PupilStatus } from './class-list.ts';
import type { QuestionBook, QuestionChoice, UsableAnswer } from './class-questions.ts';
import { foldedText } from './list-text.ts';
import { scoreProblem, toPoints, typedProblem, typedScore } from './score-check.ts';
import { saysNothing, statusWord } from './status-words.ts';

/** What is known of one thing in a row. */
export type Known<T> =
  | { readonly state: 'known'; readonly value: T }
  | { readonly state: 'left-out'; readonly why: string }
  | { readonly state: 'open' };

export type ScoreOrStatus =
  | { readonly kind: 'score'; readonly points: number; readonly corrected: boolean }
  | { readonly kind: 'missed'; readonly status: MissedStatus };

/** What all rows of a list are read by. */
export interface ListFacts {
  readonly mark: DecimalMark;
  /** Null where there is no table. */
  readonly scale: ScoreScale | null;
  readonly book: QuestionBook;
}

/** A row with what tells it from all others, also from one that says exactly the same. */
export interface KeyedRow {
  readonly row: ClassListRow;
  readonly key: readonly unknown[];
}

const STATUS_CHOICES: readonly (QuestionChoice & { readonly key: MissedStatus })[] = [
  { key: 'absent', text: 'Absent' },
  { key: 'not-tested', text: 'Not tested' },
  { key: 'excused', text: 'Excused' },
];
export const LEAVE_OUT: QuestionChoice = { key: 'leave-out', text: 'Leave the row out' };
const NEW_SCORE: QuestionChoice = { key: 'value', text: 'Type the right score' };

/** Names under which spreadsheets add a class up. */
const TOTALS = new Set(
  'average,mean,total,totals,sum,median,max,maximum,min,minimum,count,n,sd,standard deviation,durchschnitt,mittelwert,summe,moyenne,somme,promedio,media,suma'.split(
    ',',
  ),
);

/** The name under which a row is printed: its own, its code, or what was answered. */
export function nameIn({ row, key }: KeyedRow, book: QuestionBook): Known<string> {
  const { line } = row;
  const name = row.name || row.code;
  const asked = { about: 'name' as const, line, name };
  if (name === '') {
    const answer = book.ask({
      ...asked,
      key: ['no-name', ...key],
      sentence: (where) => `${where}: there is neither a name nor a code.`,
      choices: [
        { key: 'value', text: 'Type the name' },
        { key: 'unnamed', text: `Report as \u201cLine ${line}\u201d` },
        LEAVE_OUT,
      ],
      valueProblem: (value) => (value === '' ? 'Type a name, or choose another answer.' : null),
    });
    if (answer?.choice === 'unnamed') return known(`Line ${line}`);
    return answer?.choice === 'value' ? known(answer.value) : unsettled(answer, 'has no name');
  }
  if (!TOTALS.has(foldedText(name))) return known(name);
  const answer = book.ask({
    ...asked,
    key: ['total', ...key],
    sentence: (where) => `${where}: the row may add the class up, as \u201caverage\u201d and \u201ctotal\u201d do.`,
    choices: [{ key: 'pupil', text: 'It is a pupil of this name' }, LEAVE_OUT],
  });
  return answer?.choice === 'pupil' ? known(name) : unsettled(answer, 'adds the class up');
}

/**
 * The score of a row, or why there is none. Known words are taken for a status where nothing speaks against it; a score
 * beside such a word, 0 too, is asked about, and so is every text that is neither a score nor such a word.
 */
export function scoreIn(keyed: KeyedRow, list: ListFacts): Known<ScoreOrStatus> {
  const { row } = keyed;
  const told = statusTold(keyed, list);
  if (told.state !== 'known') return told;
  const byColumn = told.value;
  const byScore = missedWord(row.scoreText);
  const blank = saysNothing(row.scoreText);
  if (byColumn !== null && byColumn !== 'tested') {
    return blank || byScore === byColumn ? missed(byColumn) : contradiction(keyed, list);
  }
  if (byScore !== null) return byColumn === null ? missed(byScore) : contradiction(keyed, list);
  return blank ? noScore(keyed, list) : numberIn(keyed, list);
}

/** What the column about absence says; null where it says nothing. */
function statusTold({ row }: KeyedRow, { book }: ListFacts): Known<PupilStatus | null> {
  const { statusText, line, name } = row;
  if (saysNothing(statusText)) return known(null);
  const status = statusWord(statusText);
  if (status !== null) return known(status);
  const answer = book.ask({
    about: 'status',
    key: ['word', foldedText(statusText)],
    line,
    name: name || row.code,
    sentence: (where) => `${where}: it is not clear what \u201c${statusText}\u201d says about the test.`,
    choices: [{ key: 'tested', text: 'Tested' }, ...STATUS_CHOICES, LEAVE_OUT],
  });
  if (answer?.choice === 'tested') return known('tested');
  const absent = statusChosen(answer);
  return absent === null ? unsettled(answer, 'has a note that was not used') : known(absent);
}

function contradiction(keyed: KeyedRow, list: ListFacts): Known<ScoreOrStatus> {
  const { row, key } = keyed;
  const { line, scoreText, statusText } = row;
  const counts = missedWord(scoreText) === null;
  const answer = list.book.ask({
    about: 'status',
    key: ['contradiction', ...key],
    line,
    name: row.name || row.code,
    sentence: (where) =>
      `${where}: \u201c${scoreText}\u201d stands for the score, and \u201c${statusText}\u201d beside it.`,
    choices: [counts ? { key: 'tested', text: 'Tested: the score counts' } : NEW_SCORE, ...STATUS_CHOICES, LEAVE_OUT],
    valueProblem: (value) => typedProblem(value, list.scale),
  });
  if (answer?.choice === 'tested') return numberIn(keyed, list);
  return scoreAnswered(answer, 'says both that there is a score and that there is none');
}

function noScore({ row, key }: KeyedRow, list: ListFacts): Known<ScoreOrStatus> {
  const answer = list.book.ask({
    about: 'score',
    key: ['no-score', ...key],
    line: row.line,
    name: row.name || row.code,
    sentence: (where) => `${where}: there is no score, and nothing says why.`,
    choices: [...STATUS_CHOICES, NEW_SCORE, LEAVE_OUT],
    valueProblem: (value) => typedProblem(value, list.scale),
  });
  return scoreAnswered(answer, 'has no score');
}

function numberIn({ row, key }: KeyedRow, list: ListFacts): Known<ScoreOrStatus> {
  const { scoreText, line } = row;
  const { mark, scale, book } = list;
  const asked = { about: 'score' as const, line, name: row.name || row.code };
  const score = parseDecimal(scoreText, mark);
  if (score === null && !/\d/.test(scoreText)) {
    const answer = book.ask({
      ...asked,
      key: ['word', foldedText(scoreText)],
      sentence: (where) => `${where}: \u201c${scoreText}\u201d stands in place of a score.`,
      choices: [...STATUS_CHOICES, LEAVE_OUT],
    });
    return scoreAnswered(answer, 'has a word in place of a score');
  }
  const problem = score === null ? 'is not a number' : scoreProblem(score, scale);
  if (score !== null && problem === null) return known({ kind: 'score', points: toPoints(score), corrected: false });
  const answer = book.ask({
    ...asked,
    key: ['number', ...key, problem],
    sentence: (where) => `${where}: the score \u201c${scoreText}\u201d ${problem ?? ''}.`,
    choices: [NEW_SCORE, ...STATUS_CHOICES, LEAVE_OUT],
    valueProblem: (value) => typedProblem(value, list.scale),
  });
  return scoreAnswered(answer, 'has a score that was not used');
}

/** A score typed anew, a status, or nothing. */
function scoreAnswered(answer: UsableAnswer | null, what: string): Known<ScoreOrStatus> {
  const status = statusChosen(answer);
  if (status !== null) return missed(status);
  const score = answer?.choice === 'value' ? typedScore(answer.value) : null;
  return score === null ? unsettled(answer, what) : known({ kind: 'score', points: toPoints(score), corrected: true });
}

function statusChosen(answer: UsableAnswer | null): MissedStatus | null {
  return STATUS_CHOICES.find(({ key }) => key === answer?.choice)?.key ?? null;
}

/** The status without a score that a text names. */
function missedWord(text: string): MissedStatus | null {
  const status = statusWord(text);
  return status === 'tested' ? null : status;
}

export function known<T>(value: T): Known<T> {
  return { state: 'known', value };
}

function missed(status: MissedStatus): Known<ScoreOrStatus> {
  return known({ kind: 'missed', status });
}

/** Open without an answer, and left out by any that is not a finding; `what` says why in "It …". */
export function unsettled<T>(answer: UsableAnswer | null, what: string): Known<T> {
  return answer === null ? { state: 'open' } : { state: 'left-out', why: `It ${what}.` };
}
