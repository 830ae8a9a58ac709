import { listed } from '../languages/lists.ts';
import { ENGLISH_WORDS, figure, say, sayInParts } from '../languages/phrases.ts';
import type { FilledPart } from '../languages/placeholders.ts';
import { definitionInWords } from './definitions.ts';
import { onePerson } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';
import type { ChoiceKey, StatementPart } from './statements.ts';
import { columnOf, levelInWords } from './table-columns.ts';

/** Placeholders of the statements here that stand for a choice. */
const CHOICES: readonly ChoiceKey[] = [
  'definition',
  'level',
  'interval',
  'reliability',
  'decimals',
  'rounding',
  'ends',
  'columns',
  'z-source',
  'z-ends',
];

/** What the percentile rank of a person is. */
export function rankStatement(project: NormProject, words = ENGLISH_WORDS): readonly StatementPart[] {
  const direction = project.tally?.scale.direction ?? 'high-is-good';
  return parts(
    sayInParts(words, 'statement.rank', {
      person: onePerson(project.people, words),
      definition: definitionInWords(project.curve.definition, direction, words),
    }),
  );
}

/** Which interval tells the sampling error of a rank. */
export function intervalStatement(project: NormProject, words = ENGLISH_WORDS): readonly StatementPart[] {
  return parts(
    sayInParts(words, 'statement.interval', {
      level: levelInWords(project, words),
      interval: say(words, `interval.${project.precision.interval}`),
    }),
  );
}

/** How reliable the test is. */
export function reliabilityStatement({ precision }: NormProject, words = ENGLISH_WORDS): readonly StatementPart[] {
  const { reliability } = precision;
  return parts(
    sayInParts(words, 'statement.reliability', {
      reliability: reliability === null ? say(words, 'reliability.not-given') : figure(words, String(reliability)),
    }),
  );
}

/** How ranks are printed, what stands beside them, and where z comes from in tables that need it. */
export function tableStatement(project: NormProject, words = ENGLISH_WORDS): readonly StatementPart[] {
  const { columns, decimals, rounding, ends, zSource, zEnds } = project.table;
  const names = columns.map((key) => columnOf(key, project, words).name);
  const derived = columns.some(
    (key) => ['z', 't', 'nce', 'deviation', 'sten'].includes(key) || (key === 'stanine' && zSource === 'linear'),
  );
  const printed = sayInParts(words, 'statement.table', {
    decimals: say(words, decimals === 0 ? 'decimals.none' : 'decimals.one'),
    rounding: say(words, `rounding.${rounding}`),
    ends: say(words, `ends.${ends}`, endsOf(project.table, words)),
    columns:
      names.length === 0 ? say(words, 'columns.none') : say(words, 'columns.some', { columns: listed(words, names) }),
  });
  if (!derived) return parts(printed);
  const z = sayInParts(words, 'statement.z', {
    'z-source': say(words, `z-source.${zSource}`),
    'z-ends': say(words, `z-ends.${zEnds}`, { low: figure(words, '−3'), high: '3' }),
  });
  return parts([...printed, { text: ' ', placeholder: null }, ...z]);
}

/** What stands at the ends of the table: "<1" and ">99", or the ranks that no other leaves. */
function endsOf(
  { decimals, ends }: NormProject['table'],
  words: typeof ENGLISH_WORDS,
): { readonly lowest: string; readonly highest: string } {
  const [low, high] = decimals === 0 ? ['1', '99'] : ['0.1', '99.9'];
  const [below, above] = ends === 'signs' ? ['<', '>'] : ['', ''];
  return { lowest: figure(words, `${below}${low}`), highest: figure(words, `${above}${high}`) };
}

/** Parts that stand for a choice, and plain words between them. */
function parts(filled: readonly FilledPart[]): readonly StatementPart[] {
  const made: { text: string; choice: ChoiceKey | null }[] = [];
  for (const { text, placeholder } of filled) {
    const choice = CHOICES.find((key) => key === placeholder) ?? null;
    const last = made.at(-1);
    if (choice === null && last?.choice === null) last.text += text;
    else made.push({ text, choice });
  }
  return made;
}
