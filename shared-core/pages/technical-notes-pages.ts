import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { inSeries } from '../languages/series.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { isClustered, clusterFacts, designEffectNote } from '../norms/sampling-words.ts';
import { methodText } from '../norms/statements.ts';
import { decimalOf } from '../scale/decimal.ts';
import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import { recipeOf, recipeScore } from '../second-engine/recipe.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import {
  heightOfParts,
  layHeading,
  layParts,
  layText,
  numberedGrid,
  numberedParts,
  type TextPart,
} from './block-text.ts';
import { layFitNotes } from './fit-notes-blocks.ts';
import { fitNotesOf } from './fit-notes.ts';
import { errorSentences, smoothingSentence } from './group-method.ts';
import { endsText } from './rank-ends.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { printedTitle, tableName } from './sheet-texts.ts';
import { READING } from './type-sizes.ts';

const ABOVE_FIT_NOTES = 10;
/** The recipe stands on one page where it takes no more than this share of it. */
const MOST_OF_PAGE = 0.85;

/** How the numbers were made: for those who want to know exactly, or to make them again. */
export const technicalNotesPages: BlockPages = (context) => {
  const flow = openBlock(context);
  layText(flow, 'own', ownText(context.block));
  layParts(flow, parts(context));
  const { normSet, words } = context;
  normSet.groups.forEach((norms, index) => {
    const notes = fitNotesOf(normSet.project, norms);
    if (notes === null) return;
    flow.skip(ABOVE_FIT_NOTES);
    const title = say(words, 'technical.fit-of', { group: printedTitle(normSet.project, norms.group) });
    layFitNotes(flow, notes, words, { title, prefix: `group ${index} ` });
  });
  layRecipe(flow, context);
  return { pages: flow.pages, remarks: [] };
};

function parts({ normSet, words }: BlockContext): readonly TextPart[] {
  const { project } = normSet;
  const scale = project.tally?.scale;
  const { rounding } = project.table;
  const errors = byGroup(normSet, words, (norms) => errorSentences(project, norms, words).join(' '));
  const smoothing = byGroup(normSet, words, (norms) => smoothingSentence(project, norms));
  const all: readonly (readonly [head: string, paragraphs: readonly string[]])[] = [
    [say(words, 'technical.method'), [methodText(project, words)]],
    [say(words, 'technical.scale'), scale === undefined ? [] : [scaleText(scale, words)]],
    [
      say(words, 'technical.rounding'),
      [
        [
          say(words, 'technical.rounding-exact'),
          say(words, `technical.rounding-${rounding}`),
          endsText(normSet, words),
        ].join(' '),
      ],
    ],
    [say(words, 'technical.smoothing'), smoothing],
    [say(words, 'technical.sampling'), sampling({ normSet, words })],
    [say(words, 'technical.precision'), errors.length === 0 ? [say(words, 'technical.no-errors')] : errors],
  ];
  return all
    .filter(([, paragraphs]) => paragraphs.length > 0)
    .map(([head, paragraphs], index) => ({ name: `part ${index}`, head, headIs: 'heading', paragraphs }));
}

function scaleText({ min, max, step, direction }: ScoreScale, words: PrintWords): string {
  const printed = (score: number): string => figure(words, printNumber(score, decimalOf(score).decimals));
  const scale = {
    lowest: printed(min),
    highest: printed(max),
    count: figure(words, printCount(attainableScores({ min, max, step, direction }).length)),
    direction: say(words, `technical.${direction}`),
  };
  return step === 1
    ? say(words, 'technical.scale-ones', scale)
    : say(words, 'technical.scale-steps', { ...scale, step: printed(step) });
}

/** A text once where it is that of all groups, otherwise behind the names of the groups that it is of. */
function byGroup(
  { project, groups }: NormSet,
  words: PrintWords,
  textOf: (norms: GroupNorms) => string,
): readonly string[] {
  const texts = [...new Set(groups.map(textOf))].filter((text) => text !== '');
  return texts.map((text) => {
    const names = groups.filter((norms) => textOf(norms) === text).map(({ group }) => printedTitle(project, group));
    return names.length === groups.length
      ? text
      : say(words, 'technical.of-groups', { groups: inSeries(words, names), text });
  });
}

function sampling({ normSet, words }: Pick<BlockContext, 'normSet' | 'words'>): readonly string[] {
  const { project, groups } = normSet;
  const people = say(words, `people.${project.people}`);
  const weighted = groups.some(({ group }) => group.table.weighted) ? [say(words, 'technical.weighted')] : [];
  if (!isClustered(project)) return [[say(words, 'technical.one-by-one', { people }), ...weighted].join(' ')];
  const list = groups.map(({ group, sampling: design }) =>
    say(words, 'technical.clusters-of', { group: printedTitle(project, group), facts: clusterFacts(design, words) }),
  );
  return [
    [
      say(words, 'technical.clustered', { people, list: list.join('; ') }),
      designEffectNote(words),
      ...weighted,
      say(words, 'technical.effective-clustered'),
    ].join(' '),
  ];
}

/** The first group that is not smoothed; smoothing cannot be redone by hand. */
function layRecipe(flow: SheetFlow, { normSet, words }: BlockContext): void {
  const index = normSet.groups.findIndex(({ smoothing }) => smoothing.state === 'none');
  const norms = normSet.groups[index];
  if (norms === undefined) return;
  const introduction = say(words, 'technical.recipe-of', { table: tableName(normSet.project, index, norms) });
  const steps = numberedParts(
    'step',
    recipeOf(normSet, index, recipeScore(norms), words, printedTitle(normSet.project, norms.group)),
  );
  const look = { grid: numberedGrid(flow), between: 3 };
  const whole = heightOfParts(flow, steps, look) + 3 * READING.leading;
  layHeading(flow, 'recipe heading', say(words, 'technical.recipe'), Math.min(whole, flow.freshRoom * MOST_OF_PAGE));
  layText(flow, 'recipe', [introduction]);
  layParts(flow, steps, look);
}
