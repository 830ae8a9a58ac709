import type { JobResult } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { DeskWire } from '../desk/desk-wire.ts';

/** What work that is done for the open project needs of it. */
export interface WorkFor {
  readonly wire: DeskWire;
  readonly project: () => NormProject;
  /** Shows a job until it ends; null when it failed, which has then been told, or was stopped. */
  readonly follow: (job: string, doing: string) => Promise<JobResult | null>;
  readonly fail: (problem: string) => void;
}
