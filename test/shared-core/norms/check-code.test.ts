import { describe, expect, it } from 'vitest';
import { WHOLE_BOOKLET, type BlockKind, type BookletBlock } from '../../../shared-core/norms/booklet-blocks.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { builtSet, settledProject } from './small-projects.ts';

/** Worked out by the program before a booklet had other blocks. */
const BEFORE = '414D-B7B1';

const project = settledProject();
const checkOf = (changed: NormProject): string => builtSet(changed).check;

const withBlocks = (blocks: readonly BookletBlock[]): NormProject => ({
  ...project,
  sheet: { ...project.sheet, blocks },
});
const printing = (...kinds: readonly BlockKind[]): readonly BookletBlock[] =>
  kinds.map((kind) => ({ kind, printed: true, heading: '', text: '' }));
const withRelease = (from: NormProject, release: Partial<NormProject['release']>): NormProject => ({
  ...from,
  release: { ...from.release, ...release },
});

describe('the check code', () => {
  it('of a set that prints the tables alone is what it was before there were other blocks', () => {
    expect(checkOf(project)).toBe(BEFORE);
    expect(checkOf(withBlocks(printing('tables')))).toBe(BEFORE);
    const [tables] = printing('tables');
    const unprinted = { kind: 'colophon', printed: false, heading: 'Imprint', text: 'Of no matter.' } as const;
    expect(checkOf(withBlocks(tables === undefined ? [] : [unprinted, tables]))).toBe(BEFORE);
  });

  it('differs with the blocks that are printed, their order, headings and texts', () => {
    const whole = WHOLE_BOOKLET;
    const first = (change: Partial<BookletBlock>): readonly BookletBlock[] =>
      whole.map((block, index) => (index === 0 ? { ...block, ...change } : block));
    const codes = [
      project,
      withBlocks(whole),
      withBlocks(whole.toReversed()),
      withBlocks(first({ printed: false })),
      withBlocks(first({ heading: 'A booklet' })),
      withBlocks(first({ text: 'For those who test.' })),
    ].map(checkOf);
    expect(new Set(codes).size).toBe(codes.length);
  });

  it('covers what a block prints, where it is printed', () => {
    const changes = { edition: '0.9', date: '2025-06-01', check: 'AAAA-BBBB', lines: ['A row changed.'] };
    const cuts = [{ name: 'Support', score: 10, values: null }];
    const { source } = project;
    const cases: readonly (readonly [BlockKind, (from: NormProject) => NormProject])[] = [
      ['change-list', (from) => withRelease(from, { changes })],
      ['colophon', (from) => withRelease(from, { analyst: 'Ida Vale' })],
      ['colophon', (from) => withRelease(from, { checker: 'Ida Vale' })],
      ['colophon', (from) => ({ ...from, source: source && { ...source, bytes: source.bytes + 1 } })],
      ['cut-scores', (from) => ({ ...from, cuts })],
      [
        'norm-group',
        (from) => ({
          ...from,
          source: source && {
            ...source,
            leftOut: source.leftOut.map((rule, index) =>
              index === 0 ? { ...rule, rule: 'bad-count' as const } : rule,
            ),
          },
        }),
      ],
    ];
    for (const [kind, change] of cases) {
      const printed = withBlocks(printing('tables', kind));
      expect([kind, checkOf(change(printed))]).not.toEqual([kind, checkOf(printed)]);
      expect([kind, checkOf(change(project))]).toEqual([kind, checkOf(project)]);
    }
  });

  it('differs with the language of the booklet', () => {
    const { language } = project.sheet;
    const withLanguage = (change: Partial<typeof language>): NormProject => ({
      ...project,
      sheet: { ...project.sheet, language: { ...language, ...change } },
    });
    const codes = [
      project,
      withLanguage({ tag: 'en-GB' }),
      withLanguage({ words: 'de' }),
      withLanguage({ numbers: { ...language.numbers, decimalMark: ',' } }),
      withLanguage({ phrases: [{ key: 'head.draft', text: 'PROOF' }] }),
    ].map(checkOf);
    expect(new Set(codes).size).toBe(codes.length);
    const { tag, ...others } = language;
    expect(checkOf(withLanguage({ ...others, tag }))).toBe(checkOf(project));
  });
});
