import { comparisonText } from '../../shared-core/norms/edition-compare-words.ts';
import { compareEditions, printsTheSame, type EditionComparison } from '../../shared-core/norms/edition-compare.ts';
import { toFileKeys } from '../../shared-core/norms/file-keys.ts';
import { readEditions, type EditionPaths } from './edition-pair.ts';
import { refused, type Outcome } from './outcome.ts';

export const COMPARE_FORMATS = ['text', 'json'] as const;
export type CompareFormat = (typeof COMPARE_FORMATS)[number];

/** Tells every printed cell and every choice in which two editions differ; done whether or not they do. */
export async function compareCommand(paths: EditionPaths, format: CompareFormat): Promise<Outcome> {
  const editions = await readEditions(paths);
  if (!editions.ok) return refused(editions.problem);
  const { before, after, remarks } = editions.value;
  const comparison = compareEditions(before, after);
  return { kind: 'done', result: format === 'json' ? asJson(comparison) : comparisonText(comparison), remarks };
}

/** Every key is lower-case-with-hyphens; what users wrote stands in values only. */
function asJson(comparison: EditionComparison): string {
  const file = { same: printsTheSame(comparison), ...comparison };
  return `${JSON.stringify(toFileKeys(file), null, 1)}\n`;
}
