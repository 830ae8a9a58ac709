import { describe, expect, it } from 'vitest';
import { languageQueries } from '../../../shared-core/norms/language-queries.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { withLanguage } from '../../../shared-core/norms/sheet-language.ts';
import { projectOf, builtSet, TEN_COUNTS } from './small-projects.ts';

const english = newProject('Ostrey Vale reading (invented)');

function withChoice(project: NormProject, chosen: Partial<NormProject['sheet']['language']>): NormProject {
  return { ...project, sheet: { ...project.sheet, language: { ...project.sheet.language, ...chosen } } };
}

const idsOf = (project: NormProject): readonly string[] => languageQueries(project).map(({ id }) => id);

describe('queries on the language of the booklet', () => {
  it('are none in the English that ships', () => {
    expect(idsOf(english)).toEqual([]);
  });

  it.each([
    ['de', 'German'],
    ['es', 'Spanish'],
    ['fr', 'French'],
  ] as const)('ask for %s to be checked, and can be answered', (words, name) => {
    const project = withLanguage(projectOf(TEN_COUNTS), words);
    const id = `translation-unchecked:${words}`;
    expect(idsOf(project)).toEqual([id]);
    const answered = {
      ...project,
      release: { ...project.release, answers: [{ query: id, reason: 'Read by a teacher of the language.' }] },
    };
    const query = builtSet(answered).queries.find((each) => each.id === id);
    expect(query).toMatchObject({ weight: 'should', answer: 'Read by a teacher of the language.' });
    expect(query?.lead).toContain(name);
  });

  it('tell which words of the user cannot be printed, each once', () => {
    const phrases = [
      { key: 'foot.page', text: 'page' },
      { key: 'foot.page', text: '{page}' },
      { key: 'no.such', text: 'word' },
      { key: 'head.draft', text: 'NOT YET' },
    ];
    const asked = languageQueries(withChoice(english, { phrases }));
    expect(asked.map(({ id }) => id)).toEqual(['phrase:foot.page', 'phrase:no.such']);
    expect(asked[0]?.why).toContain('{pages}');
  });

  it('tell when a phrase is written twice', () => {
    const phrases = [
      { key: 'head.draft', text: 'NOT YET' },
      { key: 'head.draft', text: 'PROOF' },
    ];
    expect(languageQueries(withChoice(english, { phrases }))).toMatchObject([
      { id: 'phrase:head.draft', why: 'Only the last of them is printed.' },
    ]);
  });

  it('ask when one sign stands for thousands and decimals', () => {
    const { numbers } = english.sheet.language;
    const project = withChoice(english, { numbers: { ...numbers, thousands: 'point' } });
    expect(idsOf(project)).toEqual(['numbers-collide']);
  });

  it('ask when the tag is of another language than the words, unless the user wrote words', () => {
    expect(idsOf(withChoice(english, { tag: 'en-GB' }))).toEqual([]);
    expect(idsOf(withChoice(english, { tag: 'nl' }))).toEqual(['language-tag']);
    const phrases = [{ key: 'head.draft', text: 'ONTWERP' }];
    expect(idsOf(withChoice(english, { tag: 'nl', phrases }))).toEqual([]);
  });
});
