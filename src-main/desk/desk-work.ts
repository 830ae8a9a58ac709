import type { CohortPreview, JobResult, Reply } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import type { JobHooks } from './jobs.ts';

export type PressRequest =
  | { readonly kind: 'draw'; readonly project: NormProject }
  | { readonly kind: 'press'; readonly project: NormProject; readonly folder: string };

/** The work behind the desk that is not about project files: reading cohorts and pressing. */
export interface DeskWork {
  /** `path` is absolute; `file` is the name that the project will hold. */
  lookAtCohort(path: string, file: string, reading: Reading | null): Promise<Reply<CohortPreview>>;
  tally(path: string, file: string, reading: Reading, hooks: JobHooks, signal: AbortSignal): Promise<Reply<JobResult>>;
  press(request: PressRequest, hooks: JobHooks, signal: AbortSignal): Promise<Reply<JobResult>>;
}
