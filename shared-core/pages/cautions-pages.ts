import { onePerson } from '../norms/norm-groups.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { openBlock, ownText } from './block-opening.ts';
import { layParts, layText, numberedGrid, type TextPart } from './block-text.ts';
import { say, type BlockWord } from './block-words.ts';
import { surveyName } from './sheet-texts.ts';

const CAUTIONS: readonly BlockWord[] = [
  'cautions.place',
  'cautions.steps',
  'cautions.average',
  'cautions.valid',
  'cautions.measurement',
  'cautions.sampling',
  'cautions.decision',
  'cautions.rules',
  'cautions.age',
];

/** The cautions as a numbered list, fuller than beside the tables; a text of the user's own stands in its place. */
export const cautionsPages: BlockPages = (context) => {
  const flow = openBlock(context);
  const own = ownText(context.block);
  if (own.length > 0) layText(flow, 'cautions', own);
  else layParts(flow, standing(context), { grid: numberedGrid(flow) });
  return { pages: flow.pages, remarks: [] };
};

function standing({ normSet: { project }, words }: BlockContext): readonly TextPart[] {
  const values = {
    survey: surveyName(project) || say(words, 'cautions.this-test'),
    person: onePerson(project.people),
    people: project.people,
  };
  return CAUTIONS.map((key, index) => ({
    name: `caution ${index + 1}`,
    head: `${index + 1}`,
    headIs: 'words',
    paragraphs: [say(words, key, values)],
  }));
}
