import type { Reply, TalliedCohort } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';

/** What a tally worker is started with; plain JSON. */
export interface TallyRequest {
  readonly path: string;
  readonly file: string;
  readonly reading: Reading;
}

/** What a tally worker reports; plain JSON. */
export type TallyReport =
  | { readonly kind: 'progress'; readonly done: number; readonly doing: string }
  | { readonly kind: 'result'; readonly result: Reply<TalliedCohort> };

export function isTallyRequest(value: unknown): value is TallyRequest {
  return typeof value === 'object' && value !== null && 'path' in value && 'file' in value && 'reading' in value;
}
