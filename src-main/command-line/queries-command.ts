import { openMustQueries, openQueries, type Query } from '../../shared-core/norms/queries.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { refused, type Outcome } from './outcome.ts';
import type { QueriesFormat } from './queries-options.ts';
import { readProject } from './read-project.ts';

/** Lists what a proof-reader would ask of a project, most pressing first; how many are open is a remark. */
export async function queriesCommand(path: string, format: QueriesFormat): Promise<Outcome> {
  const read = await readProject(path);
  if (!read.ok) return refused(read.problem);
  const { normSet } = read.value;
  const { queries } = normSet;
  return {
    kind: 'done',
    result: format === 'json' ? asJson(normSet) : queries.map((query) => asText(query)).join('\n'),
    remarks: [openInWords(queries)],
  };
}

function openInWords(queries: readonly Query[]): string {
  const [open, must] = [openQueries(queries).length, openMustQueries(queries).length];
  if (open === 0) return 'No query is open.';
  const draft = must === 0 ? '' : `; while ${must} of them must be answered, the edition is a draft`;
  return `${open === 1 ? '1 query is' : `${open} queries are`} open${draft}.`;
}

/** One query in lines of its own: how pressing, where, and its id; what it says; its answer. */
function asText({ id, station, weight, lead, why, whatToDo, answer }: Query): string {
  return [
    `${weight}  ${station}  ${id}`,
    `  ${lead} ${why} ${whatToDo}`,
    ...(answer === null ? [] : [`  Answered: ${answer}`]),
    '',
  ].join('\n');
}

function asJson(normSet: NormSet): string {
  const { by } = normSet.project.groups;
  const list = normSet.queries.map(({ id, station, weight, group, lead, why, whatToDo, answer }) => ({
    id,
    station,
    weight,
    group: groupOf(group),
    lead,
    why,
    'what-to-do': whatToDo,
    answer,
  }));
  return `${JSON.stringify(list, null, 1)}\n`;

  function groupOf(key: string | null): Readonly<Record<string, string>> | null {
    const found = normSet.groups.find(({ group }) => group.key === key);
    if (found === undefined) return null;
    return Object.fromEntries(by.map((column, index) => [column, found.group.values[index] ?? '']));
  }
}
