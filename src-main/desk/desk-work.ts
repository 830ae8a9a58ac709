import type { CohortPreview, JobResult, Reply } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import type { PressRequest } from '../press/press-message.ts';
import type { JobHooks } from './jobs.ts';

/** The work behind the desk that is not about project files: reading cohorts and pressing. */
export interface DeskWork {
  /** `path` is absolute; `file` is the name that the project will hold. */
  lookAtCohort(path: string, file: string, reading: Reading | null): Promise<Reply<CohortPreview>>;
  tally(path: string, file: string, reading: Reading, hooks: JobHooks, signal: AbortSignal): Promise<Reply<JobResult>>;
  press(request: PressRequest, hooks: JobHooks, signal: AbortSignal): Promise<Reply<JobResult>>;
}
