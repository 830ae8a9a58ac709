import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { dateInLanguage } from '../languages/number-format.ts';
import { definitionName } from '../norms/definitions.ts';
import type { NormProject } from '../norms/norm-project.ts';
import { methodText } from '../norms/statements.ts';
import { printCount } from '../scores/printed-number.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockContext, BlockPages } from './block-pages.ts';
import { factGrid, layParts, layText } from './block-text.ts';
import { surveyName } from './sheet-texts.ts';
import { PROSE } from './type-sizes.ts';

/** How the press names the booklet, and what reads it back. */
const READ_BACK = 'normloom read-back booklet.pdf --against PROJECT';

/** Which edition this is, where its numbers come from, who answers for them, and how all of it can be verified. */
export const colophonPages: BlockPages = (context) => {
  const flow = openBlock(context);
  layText(flow, 'own', ownText(context.block));
  const parts = facts(context).map(([head, text], index) => ({
    name: `fact ${index}`,
    head,
    headIs: 'words' as const,
    paragraphs: [text],
  }));
  layParts(flow, parts, { grid: factGrid(flow, parts, PROSE), type: PROSE, between: 4 });
  return { pages: flow.pages, remarks: [] };
};

type Fact = readonly [head: string, text: string];

function facts({ normSet, words, programVersion }: BlockContext): readonly Fact[] {
  const { project, check, status } = normSet;
  const { edition, date, analyst, checker } = project.release;
  const orElse = (text: string, key: 'colophon.no-edition' | 'colophon.no-date' | 'colophon.not-signed'): string =>
    text.trim() === '' ? say(words, key) : text.trim();
  const survey = surveyName(project);
  return [
    ...(survey === '' ? [] : [[say(words, 'colophon.survey'), survey] as const]),
    [say(words, 'colophon.edition'), orElse(edition, 'colophon.no-edition')],
    [say(words, 'colophon.date'), orElse(dateInLanguage(date, words.numbers), 'colophon.no-date')],
    [say(words, 'colophon.status'), say(words, status === 'draft' ? 'colophon.draft' : 'colophon.released')],
    [say(words, 'colophon.prepared'), orElse(analyst, 'colophon.not-signed')],
    [say(words, 'colophon.checked'), orElse(checker, 'colophon.not-signed')],
    ...sourceFacts(project, words),
    [say(words, 'colophon.definition'), definitionName(project.curve.definition, words)],
    [say(words, 'colophon.method'), methodText(project, words)],
    [say(words, 'colophon.check'), say(words, 'colophon.check-text', { check })],
    [say(words, 'colophon.verify'), say(words, 'colophon.verify-text', { command: READ_BACK })],
    [
      say(words, 'colophon.program'),
      programVersion === null
        ? say(words, 'colophon.program-plain')
        : say(words, 'colophon.program-text', { version: programVersion }),
    ],
    [say(words, 'colophon.typefaces'), say(words, 'colophon.typefaces-text')],
  ];
}

function sourceFacts({ source }: NormProject, words: PrintWords): readonly Fact[] {
  if (source === null) return [[say(words, 'colophon.source'), say(words, 'colophon.source-none')]];
  const { kind, file, bytes, sha256, rowsRead, rowsKept } = source;
  return [
    [
      say(words, 'colophon.source'),
      kind === 'typed'
        ? say(words, 'colophon.source-typed')
        : say(words, 'colophon.source-file', { file, bytes: figure(words, printCount(bytes)) }),
    ],
    [say(words, 'colophon.fingerprint'), sha256],
    [
      say(words, 'colophon.rows'),
      say(words, 'colophon.rows-text', {
        read: figure(words, printCount(rowsRead)),
        kept: figure(words, printCount(rowsKept)),
        left: figure(words, printCount(rowsRead - rowsKept)),
      }),
    ],
  ];
}
