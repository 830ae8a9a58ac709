import { say } from '../languages/phrases.ts';
import { onePerson } from '../norms/norm-groups.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { openBlock, ownText } from './block-opening.ts';
import { layParts, layText, numberedGrid, numberedParts, type TextPart } from './block-text.ts';
import { surveyName } from './sheet-texts.ts';

/** The cautions as a numbered list, fuller than beside the tables; a text of the user's own stands in its place. */
export const cautionsPages: BlockPages = (context) => {
  const flow = openBlock(context);
  const own = ownText(context.block);
  if (own.length > 0) layText(flow, 'cautions', own);
  else layParts(flow, standing(context), { grid: numberedGrid(flow) });
  return { pages: flow.pages, remarks: [] };
};

function standing({ normSet: { project }, words }: BlockContext): readonly TextPart[] {
  const people = say(words, `people.${project.people}`);
  const texts = [
    say(words, 'cautions.place'),
    say(words, 'cautions.steps'),
    say(words, 'cautions.average'),
    say(words, 'cautions.valid', { survey: surveyName(project) || say(words, 'cautions.this-test') }),
    say(words, 'cautions.measurement', { person: onePerson(project.people, words) }),
    say(words, 'cautions.sampling', { people }),
    say(words, 'cautions.decision'),
    say(words, 'cautions.rules'),
    say(words, 'cautions.age'),
  ];
  return numberedParts('caution', texts);
}
