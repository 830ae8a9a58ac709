import type { ClassTable } from '../../shared-core/class/class-table.ts';
import type { CohortPreview, JobResult, ListedFile, Reply } from '../../shared-core/desk.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import type { ErratumParts, ErratumRequest } from '../erratum/make-erratum.ts';
import type { PressRequest, TableRequest } from '../press/press-message.ts';
import type { JobHooks } from './jobs.ts';

/** The work behind the desk that is not about files kept: reading cohorts and lists, pressing and errata. */
export interface DeskWork {
  /** `path` is absolute; `file` is the name that the project will hold. */
  lookAtCohort(path: string, file: string, reading: Reading | null): Promise<Reply<CohortPreview>>;
  tally(path: string, file: string, reading: Reading, hooks: JobHooks, signal: AbortSignal): Promise<Reply<JobResult>>;
  /** `sheet` is one of a workbook; null: the first that holds anything. */
  lookAtList(path: string, file: string, sheet: string | null): Promise<Reply<ListedFile>>;
  classTable(request: Omit<TableRequest, 'kind'>): Promise<Reply<ClassTable>>;
  erratum(request: ErratumRequest, hooks: JobHooks, signal: AbortSignal): Promise<Reply<ErratumParts>>;
  press(request: PressRequest, hooks: JobHooks, signal: AbortSignal): Promise<Reply<JobResult>>;
}
