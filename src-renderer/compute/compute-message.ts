import type { EditionComparison } from '../../shared-core/norms/edition-compare.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { NormSetBuilt } from '../../shared-core/norms/norm-set.ts';
import type { PrintRange } from '../../shared-core/norms/print-range.ts';
import type { LineProblem } from '../../shared-core/tally/typed-counts.ts';
import type { BootstrapProgress, BootstrapResult } from '../../shared-core/precision/bootstrap.ts';

/** What the compute worker is asked; plain data. Groups are named by their keys. */
export type ComputeAsk =
  | { readonly kind: 'norm-set'; readonly project: NormProject }
  | { readonly kind: 'print-ranges'; readonly project: NormProject; readonly group: string }
  | { readonly kind: 'differ'; readonly project: NormProject; readonly group: string; readonly text: string }
  | { readonly kind: 'comparison'; readonly before: NormProject; readonly after: NormProject }
  | { readonly kind: 'bootstrap'; readonly project: NormProject; readonly group: string };

/** Why somebody's column differs, ready to be shown. */
export interface DifferAnswer {
  readonly problems: readonly LineProblem[];
  /** Null as long as the column cannot be read. */
  readonly finding: string | null;
  readonly explanations: readonly string[];
  readonly rows: readonly { readonly scoreText: string; readonly theirs: string; readonly ours: string }[];
}

/** Two editions compared, with the sentences of a change list. */
export type ComparedForPage =
  | { readonly ok: true; readonly comparison: EditionComparison; readonly lines: readonly string[] }
  | { readonly ok: false; readonly problem: string };

export type ComputeAnswer =
  | { readonly kind: 'norm-set'; readonly built: NormSetBuilt }
  | { readonly kind: 'print-ranges'; readonly ranges: readonly PrintRange[] }
  | { readonly kind: 'differ'; readonly answer: DifferAnswer }
  | { readonly kind: 'comparison'; readonly compared: ComparedForPage }
  | { readonly kind: 'bootstrap'; readonly result: BootstrapResult };

export type ToWorker = { readonly id: number; readonly ask: ComputeAsk } | { readonly id: number; readonly stop: true };

export type FromWorker =
  | { readonly id: number; readonly answer: ComputeAnswer }
  | { readonly id: number; readonly progress: BootstrapProgress }
  | { readonly id: number; readonly fault: string };
