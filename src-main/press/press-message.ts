import type { JobResult } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { ThreadReport } from '../thread-job.ts';

/** What a press worker is started with; plain JSON. */
export type PressRequest =
  | { readonly kind: 'draw'; readonly project: NormProject }
  | { readonly kind: 'press' | 'release'; readonly project: NormProject; readonly folder: string };

/** What a press worker reports; plain JSON. */
export type PressReport = ThreadReport<JobResult>;

export function isPressRequest(value: unknown): value is PressRequest {
  return typeof value === 'object' && value !== null && 'kind' in value && 'project' in value;
}
