import type { JobResult } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { DeskWire } from '../desk/desk-wire.ts';

/** What work that is done for an open project, or an open class, needs of it. */
export interface WorkFor<Source = NormProject> {
  readonly wire: DeskWire;
  /** As it stands now. */
  readonly present: () => Source;
  /** Shows a job until it ends; null when it failed, which has then been told, or was stopped. */
  readonly follow: (job: string, doing: string) => Promise<JobResult | null>;
  readonly fail: (problem: string) => void;
}
