/**
 * How a command ended: its result for stdout, or why there is none; remarks are for stderr either way. Where files differ
 * there are both, the cells as the result.
 */
export type Outcome =
  | { readonly kind: 'done'; readonly result: string | Uint8Array; readonly remarks: readonly string[] }
  | { readonly kind: 'wrong-usage'; readonly problem: string }
  | {
      readonly kind: 'differs';
      readonly result: string;
      readonly problem: string;
      readonly remarks: readonly string[];
    }
  | { readonly kind: 'refused'; readonly problem: string; readonly remarks: readonly string[] };

export function wrongUsage(problem: string): Outcome {
  return { kind: 'wrong-usage', problem };
}

export function refused(problem: string, remarks: readonly string[] = []): Outcome {
  return { kind: 'refused', problem, remarks };
}

/** Exit codes that scripts rely on. */
export const EXIT_CODES = { done: 0, 'wrong-usage': 2, differs: 3, refused: 3 } as const satisfies Record<
  Outcome['kind'],
  number
>;

/** What a shell reports for a program that was interrupted from the keyboard. */
export const EXIT_INTERRUPTED = 130;
