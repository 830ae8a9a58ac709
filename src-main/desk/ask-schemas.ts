import * as v from 'valibot';
import { classFileSchema } from '../../shared-core/class/class-file.ts';
import type { DeskRequest, DeskRequests } from '../../shared-core/desk.ts';
import { normProjectSchema } from '../../shared-core/norms/norm-project.ts';
import { draftNameSchema } from '../project-file/drafts.ts';

/** What each request may be asked with. Keys that are not named here are left behind. */
type AskSchemas = {
  readonly [R in DeskRequest]: v.GenericSchema<unknown, DeskRequests[R]['ask']>;
};

const FILE_KINDS = ['cohort', 'project', 'edition', 'roster', 'class', 'class-list'] as const;
const nothing = v.object({});
const handle = v.pipe(v.string(), v.maxLength(64));
const name = v.pipe(v.string(), v.maxLength(400));
const job = v.pipe(v.string(), v.maxLength(64));
const reading = normProjectSchema.entries.reading;

export const ASK_SCHEMAS: AskSchemas = {
  about: nothing,
  'list-projects': nothing,
  'choose-file': v.object({ kind: v.picklist(FILE_KINDS) }),
  'open-project': v.object({ handle }),
  'look-at-edition': v.object({ handle }),
  'open-draft': v.object({ draft: draftNameSchema }),
  'open-sample': nothing,
  'forget-draft': v.object({ draft: draftNameSchema }),
  'keep-draft': v.object({ draft: draftNameSchema, handle: v.nullable(handle), project: normProjectSchema }),
  'save-project': v.object({ draft: draftNameSchema, handle: v.nullable(handle), name, project: normProjectSchema }),
  'look-at-cohort': v.object({ handle, reading }),
  'tally-cohort': v.object({ handle, reading: reading.wrapped }),
  'draw-pages': v.object({ project: normProjectSchema }),
  press: v.object({ project: normProjectSchema, name }),
  release: v.object({ project: normProjectSchema, name }),
  'make-erratum': v.object({
    before: normProjectSchema,
    after: normProjectSchema,
    roster: v.nullable(
      v.object({
        handle,
        reading: reading.wrapped,
        columns: v.object({ score: name, person: v.nullable(name), by: v.array(name) }),
      }),
    ),
    cut: v.pipe(v.string(), v.maxLength(40)),
    write: v.boolean(),
  }),
  'list-classes': nothing,
  'open-class': v.object({ handle }),
  'save-class': v.object({ handle: v.nullable(handle), name, class: classFileSchema }),
  'class-table': v.object({ handle: v.nullable(handle) }),
  'look-at-list': v.object({ handle, sheet: v.nullable(name) }),
  'draw-class': v.object({ class: classFileSchema, what: v.picklist(['report', 'slips']) }),
  'press-class': v.object({ class: classFileSchema, slips: v.boolean(), name }),
  'job-state': v.object({ job }),
  'cancel-job': v.object({ job }),
  'show-pressed': nothing,
};
