import type { ClassFile } from '../../shared-core/class/class-file.ts';
import type { ClassTable } from '../../shared-core/class/class-table.ts';
import type { DeskRequests, JobResult } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { ThreadReport } from '../thread-job.ts';

/** What a press worker presses or draws; plain JSON. */
export type PressRequest =
  | { readonly kind: 'draw'; readonly project: NormProject }
  | { readonly kind: 'press' | 'release'; readonly project: NormProject; readonly folder: string }
  | { readonly kind: 'draw-class'; readonly class: ClassFile; readonly what: DeskRequests['draw-class']['ask']['what'] }
  | {
      readonly kind: 'press-class';
      readonly class: ClassFile;
      readonly slips: boolean;
      readonly folder: string;
      /** Where the key to codes goes, in a folder apart. */
      readonly keyFolder: string;
    };

/** The tables of a project as a class is looked up in them, worked out in the same thread; plain JSON. */
export interface TableRequest {
  readonly kind: 'class-table';
  readonly project: NormProject;
  readonly source: 'project' | 'edition';
}

/** What a press worker reports; plain JSON. */
export type PressReport = ThreadReport<JobResult | ClassTable>;

const KINDS: readonly unknown[] = [
  'draw',
  'press',
  'release',
  'draw-class',
  'press-class',
  'class-table',
] satisfies readonly (PressRequest | TableRequest)['kind'][];

export function isPressRequest(value: unknown): value is PressRequest | TableRequest {
  return typeof value === 'object' && value !== null && 'kind' in value && KINDS.includes(value.kind);
}
