import { describe, expect, it } from 'vitest';
import { usualNumbers } from '../../../shared-core/languages/number-format.ts';
import { standingTexts } from '../../../shared-core/languages/standing-texts.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { withLanguage } from '../../../shared-core/norms/sheet-language.ts';

const english = newProject('Ostrey Vale reading (invented)');

describe('a project in another language', () => {
  it.each(['de', 'es', 'fr'] as const)('%s: has its words, tag, numbers and standing texts', (words) => {
    const { sheet, ...others } = withLanguage(english, words);
    const { sheet: before, ...same } = english;
    expect(others).toEqual(same);
    expect(sheet).toEqual({
      ...before,
      ...standingTexts(words),
      language: { tag: words, words, numbers: usualNumbers(words), phrases: [] },
    });
  });

  it('comes back as it was', () => {
    expect(withLanguage(withLanguage(withLanguage(english, 'de'), 'fr'), 'en')).toEqual(english);
  });

  it('keeps what the user wrote', () => {
    const own = {
      ...english,
      sheet: {
        ...english.sheet,
        cautions: 'Only for this valley.',
        title: '',
        language: { ...english.sheet.language, phrases: [{ key: 'head.draft', text: 'NOT YET' }] },
      },
    };
    const { sheet } = withLanguage(own, 'es');
    expect([sheet.cautions, sheet.title]).toEqual(['Only for this valley.', '']);
    expect(sheet.howToRead).toBe(standingTexts('es').howToRead);
    expect(sheet.language.phrases).toEqual(own.sheet.language.phrases);
  });

  it('can be saved and read', () => {
    const french = withLanguage(english, 'fr');
    expect(projectFromText(projectToText(french))).toMatchObject({ ok: true, project: french });
  });
});
