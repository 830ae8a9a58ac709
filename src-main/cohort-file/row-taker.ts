import type { Reply } from '../../shared-core/desk.ts';

/** Takes the rows of a file as they are read. Both functions answer whether to go on. */
export interface RowTaker {
  /** Called once, before any row, with the names of the columns: each one different, none blank. */
  columns(names: readonly string[]): boolean;
  /** Rows of texts, in file order, with the number of the first of them in the file (the heading is row 1). */
  rows(rows: readonly (readonly string[])[], firstNumber: number): boolean;
}

export interface ReadHooks {
  /** 0–1, never falling within one pass. */
  readonly onProgress: (done: number) => void;
  readonly signal: AbortSignal;
}

/** How a pass over a file ended; a file read to its end has the fingerprint of the bytes that were read. */
export type PassEnd = Reply<{
  /** SHA-256 of the file's bytes, lower-case hexadecimal; null when the taker stopped before the end. */
  readonly sha256: string | null;
}>;

/** What a cancelled reading answers. */
export const CANCELLED = 'The reading was cancelled. The file was not changed.';

/** Lets a programmer's mistake through where everything else that was thrown speaks of the file. */
export function throwMistake(error: unknown): void {
  if (error instanceof RangeError || error instanceof TypeError || error instanceof ReferenceError) throw error;
}
