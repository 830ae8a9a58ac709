import { usualNumbers } from '../languages/number-format.ts';
import type { ShippedWords } from '../languages/shipped-words.ts';
import { standingTexts, type StandingTexts } from '../languages/standing-texts.ts';
import type { NormProject } from './norm-project.ts';

/**
 * The project with its booklet in another language: its words, its tag, and numbers and dates as they are usually written
 * in it. Texts that still are the standing ones give way to those of the new language; what the user wrote stays.
 */
export function withLanguage(project: NormProject, words: ShippedWords): NormProject {
  const { sheet } = project;
  const [before, after] = [standingTexts(sheet.language.words), standingTexts(words)];
  const text = (key: keyof StandingTexts): string => (sheet[key] === before[key] ? after[key] : sheet[key]);
  return {
    ...project,
    sheet: {
      ...sheet,
      title: text('title'),
      howToRead: text('howToRead'),
      cautions: text('cautions'),
      language: { ...sheet.language, tag: words, words, numbers: usualNumbers(words) },
    },
  };
}
