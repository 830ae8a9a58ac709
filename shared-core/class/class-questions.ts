/** What a question of a class list is about. */
export type QuestionAbout = 'name' | 'status' | 'score' | 'group' | 'two-rows';

/** `value` takes a text typed anew; every other key is complete in itself. */
export interface QuestionChoice {
  readonly key: string;
  readonly text: string;
}

/** Something in the list that does not fit and that only the teacher can tell. */
export interface ClassQuestion {
  /** The same as long as the rows say the same, wherever they stand; it holds texts of the list. */
  readonly id: string;
  readonly about: QuestionAbout;
  /** Lines of the list it is about. */
  readonly lines: readonly number[];
  /** What does not fit, in one or two sentences. */
  readonly sentence: string;
  readonly choices: readonly QuestionChoice[];
  /** The answer given; null while it is open. */
  readonly answer: { readonly choice: string; readonly value: string } | null;
  /** Why the answer given cannot be used, in a sentence; null where it can or none was given. */
  readonly problem: string | null;
}
