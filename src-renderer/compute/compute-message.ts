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
  | { readonly kind: 'bootstrap'; readonly project: NormProject; readonly group: string };

/** Why somebody's column differs, ready to be shown. */
export interface DifferAnswer {
  readonly problems: readonly LineProblem[];
  /** Null as long as the column cannot be read. */
  readonly finding: string | null;
  readonly explanations: readonly string[];
  readonly rows: readonly { readonly scoreText: string; readonly theirs: string; readonly ours: string }[];
}

export type ComputeAnswer =
  | { readonly kind: 'norm-set'; readonly built: NormSetBuilt }
  | { readonly kind: 'print-ranges'; readonly ranges: readonly PrintRange[] }
  | { readonly kind: 'differ'; readonly answer: DifferAnswer }
  | { readonly kind: 'bootstrap'; readonly result: BootstrapResult };

export type ToWorker = { readonly id: number; readonly ask: ComputeAsk } | { readonly id: number; readonly stop: true };

export type FromWorker =
  | { readonly id: number; readonly answer: ComputeAnswer }
  | { readonly id: number; readonly progress: BootstrapProgress }
  | { readonly id: number; readonly fault: string };
