import { signsCollide } from '../languages/number-format.ts';
import { phraseProblem } from '../languages/phrases.ts';
import { LANGUAGE_NAMES } from '../languages/shipped-words.ts';
import type { NormProject } from './norm-project.ts';
import type { Asked } from './queries.ts';

/** What a proof-reader would ask of the language of the booklet: its translation, the user's words, its numbers, its tag. */
export function languageQueries({ sheet }: NormProject): readonly Asked[] {
  return [
    ...translationQueries(sheet.language),
    ...phraseQueries(sheet.language),
    ...numberQueries(sheet.language),
    ...tagQueries(sheet.language),
  ];
}

type Language = NormProject['sheet']['language'];

const ASKED = { station: 'sheet', weight: 'should', group: null } as const;

function translationQueries({ words }: Language): readonly Asked[] {
  if (words === 'en') return [];
  return [
    {
      ...ASKED,
      id: `translation-unchecked:${words}`,
      lead: `The standing texts in ${LANGUAGE_NAMES[words]} are a translation to be checked.`,
      why: 'They were translated from English and no office has used them yet. A wrong word in a caution misleads every reader.',
      whatToDo:
        'Let somebody who knows tests and the language read the booklet. Write other words where they are needed, and say ' +
        'who has checked them.',
    },
  ];
}

/** Words that cannot stand, and those that another of the same key hides. */
function phraseQueries({ phrases }: Language): readonly Asked[] {
  const asked = new Map<string, Asked>();
  phrases.forEach(({ key, text }, index) => {
    const problem = phraseProblem(key, text);
    const later = phrases.slice(index + 1).some((other) => other.key === key);
    if (problem === null && !later) return;
    const id = `phrase:${key}`;
    asked.set(id, {
      ...ASKED,
      id,
      lead: problem === null ? `The phrase “${key}” is written twice.` : `Words for “${key}” cannot be printed.`,
      why: problem ?? 'Only the last of them is printed.',
      whatToDo:
        problem === null
          ? 'Remove the others.'
          : 'Write them anew, or remove them; until then the shipped words print.',
    });
  });
  return [...asked.values()];
}

function numberQueries({ numbers }: Language): readonly Asked[] {
  if (!signsCollide(numbers)) return [];
  return [
    {
      ...ASKED,
      id: 'numbers-collide',
      lead: 'One sign would divide thousands and begin decimals.',
      why: 'A reader could not tell 1,234 people from 1.234; thousands are printed with a narrow space.',
      whatToDo: 'Choose another sign for one of the two.',
    },
  ];
}

/** A tag of another language is right only where the user wrote the words of it. */
function tagQueries({ tag, words, phrases }: Language): readonly Asked[] {
  if (tag.split('-')[0]?.toLowerCase() === words || phrases.length > 0) return [];
  return [
    {
      ...ASKED,
      id: 'language-tag',
      lead: `The words are ${LANGUAGE_NAMES[words]}, but the booklet is marked as “${tag}”.`,
      why: 'A screen reader speaks the booklet in the language it is marked as.',
      whatToDo: `Mark it as “${words}”, or write words in the language of “${tag}”.`,
    },
  ];
}
