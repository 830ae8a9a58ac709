import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import type { ClassAnswer } from './class-file.ts';

/** What a question of a class list is about. */
export type QuestionAbout = 'name' | 'same-pupil' | 'status' | 'score' | 'group';

export interface QuestionChoice {
  /** `value` takes a text typed anew; every other key is complete in itself. */
  readonly key: string;
  readonly text: string;
}

/** Something in the list that does not fit and that only the teacher can tell. */
export interface ClassQuestion {
  /** The same as long as the rows say the same, wherever they stand. No text of the list can be read in it. */
  readonly id: string;
  readonly about: QuestionAbout;
  /** Lines of the list it is about, and the names that stand there. */
  readonly lines: readonly number[];
  readonly names: readonly string[];
  /** What does not fit, in one or two sentences that tell lines but no names. */
  readonly sentence: string;
  readonly choices: readonly QuestionChoice[];
  /** The answer given; null while it is open. */
  readonly answer: { readonly choice: string; readonly value: string } | null;
  /** Why the answer given cannot be used, so that the question is open; null where there is nothing wrong. */
  readonly problem: string | null;
}

/** One row that asks; rows that ask the same thing share one question and one answer. */
export interface AskedRow {
  readonly about: QuestionAbout;
  /** What tells this question from all others. */
  readonly key: readonly unknown[];
  readonly line: number;
  readonly name: string;
  /** `where` is "Line 7", or "Lines 7, 9 and 12". */
  readonly sentence: (where: string) => string;
  readonly choices: readonly QuestionChoice[];
  /** What is wrong with a text typed anew, in a sentence, or null. */
  readonly valueProblem?: (value: string) => string | null;
}

export interface UsableAnswer {
  readonly choice: string;
  readonly value: string;
}

/** Collects the questions of a list and looks up what was answered to each. */
export class QuestionBook {
  private readonly asked = new Map<string, AskedRow[]>();
  private readonly answers: ReadonlyMap<string, ClassAnswer>;

  constructor(answers: readonly ClassAnswer[]) {
    this.answers = new Map(answers.map((answer) => [answer.question, answer]));
  }

  /** The answer, where there is one that can be used; null leaves the question open. */
  ask(row: AskedRow): UsableAnswer | null {
    const id = questionId(row);
    const before = this.asked.get(id);
    if (before === undefined) this.asked.set(id, [row]);
    else before.push(row);
    const answer = this.answers.get(id);
    if (answer === undefined || answerProblem(answer, row) !== null) return null;
    return { choice: answer.choice, value: answer.value.trim() };
  }

  /** In order of the first line that asks. */
  get questions(): readonly ClassQuestion[] {
    return [...this.asked]
      .map(([id, rows]) => this.questionOf(id, rows))
      .toSorted((a, b) => firstLine(a) - firstLine(b));
  }

  private questionOf(id: string, rows: readonly AskedRow[]): ClassQuestion {
    const [row] = rows;
    if (row === undefined) throw new RangeError('a question that nobody asks');
    const { about, sentence, choices } = row;
    const lines = rows.map(({ line }) => line);
    const given = this.answers.get(id);
    const problem = given === undefined ? null : answerProblem(given, row);
    const answer = given === undefined || problem !== null ? null : { choice: given.choice, value: given.value };
    return {
      id,
      about,
      lines,
      names: rows.map(({ name }) => name),
      sentence: sentence(linesInWords(lines)),
      choices,
      answer,
      problem,
    };
  }
}

function firstLine({ lines }: ClassQuestion): number {
  return lines[0] ?? 0;
}

/** Half of the SHA-256 of what is asked about. */
function questionId({ about, key }: AskedRow): string {
  return `${about}-${bytesToHex(sha256(utf8ToBytes(JSON.stringify([about, ...key])))).slice(0, 32)}`;
}

function answerProblem({ choice, value }: ClassAnswer, { choices, valueProblem }: AskedRow): string | null {
  if (!choices.some(({ key }) => key === choice)) return 'This answer is no longer one of the choices. Choose again.';
  if (choice !== 'value') return null;
  return valueProblem?.(value.trim()) ?? null;
}

const LINES_SHOWN = 6;

/** "Line 7", "Lines 7, 9 and 12"; of many only the first. */
export function linesInWords(lines: readonly number[]): string {
  if (lines.length < 2) return `Line ${lines.join('')}`;
  const shown = lines.slice(0, LINES_SHOWN);
  const last = lines.length > shown.length ? `${lines.length - shown.length} more` : String(shown.pop() ?? '');
  return `Lines ${shown.join(', ')} and ${last}`;
}

/** The answers with one given anew; an answer to the same question is replaced. */
export function withAnswer(answers: readonly ClassAnswer[], answer: ClassAnswer): readonly ClassAnswer[] {
  return [...answers.filter(({ question }) => question !== answer.question), answer];
}
