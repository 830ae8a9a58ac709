import { describe, expect, it } from 'vitest';
import { BLOCK_KINDS, type BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import type { Booklet } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { linesOn, textOf } from './placed-laws.ts';
import { printing, textsOn } from './printed-blocks.ts';
import { sampleNormSet, WHOLE_SCALE } from './sample-norm-set.ts';

describe('the contents', () => {
  /** Names and page numbers as they stand. */
  function entriesOf({ pages }: Booklet): readonly (readonly [string, number])[] {
    const names = new Map<string, string[]>();
    for (const line of pages.filter(({ block }) => block === 'contents').flatMap(linesOn)) {
      if (line.role.kind !== 'paragraph' || !line.role.name.startsWith('entry')) continue;
      names.set(line.role.name, [...(names.get(line.role.name) ?? []), textOf(line)]);
    }
    return [...names.values()].map((texts) => [texts.slice(0, -1).join(' '), Number(texts.at(-1))]);
  }

  it.each([
    ['a few groups', 3, {}],
    [
      'more groups than stand on a page, filled to fours',
      16,
      { fillToFours: true, paper: 'a5', orientation: 'landscape' },
    ],
    ['a colophon behind blank pages', 2, { fillToFours: true, orientation: 'landscape' }],
  ] as const)('tell the page of every block and table, with %s', (_, count, sheet) => {
    const groups = Array.from({ length: count }, (_, index) => String(index + 1));
    const normSet = printing(BLOCK_KINDS, { groups, scale: { min: 0, max: 9, step: 1 } }, (project) => ({
      ...project,
      sheet: { ...project.sheet, ...sheet, ogive: false },
      cuts: [{ name: 'Goal', score: 5, values: null }],
    }));
    const booklet = composeBooklet(normSet);
    const opened = booklet.pages.flatMap(({ block, opens, number }) =>
      opens === null || block === 'title-page' || block === 'contents' ? [] : [[opens, number] as const],
    );
    const tables = opened.find(([name]) => name.startsWith('Table 1 '));
    const at = opened.findIndex(([name]) => name.startsWith('Table 1 '));
    const expected = [...opened.slice(0, at), ['Conversion tables', tables?.[1]], ...opened.slice(at)];
    expect(entriesOf(booklet)).toEqual(expected);
    expect(opened).toHaveLength(count + 10);
    const pages = booklet.pages.filter(({ block }) => block === 'contents').length;
    expect(pages > 1).toBe(count === 16);
  });

  it('set page numbers under each other, ending at one edge', () => {
    const booklet = composeBooklet(printing(['contents', 'tables', 'cautions']));
    const numbers = booklet.pages
      .filter(({ block }) => block === 'contents')
      .flatMap(linesOn)
      .filter(({ role, align }) => role.kind === 'paragraph' && align === 'right');
    expect(numbers.map(textOf)).toEqual(['2', '2', '3', '4']);
    expect(new Set(numbers.map(({ x, width }) => x + width)).size).toBe(1);
  });
});

describe('the pages of a booklet', () => {
  it('are filled to fours, with the colophon on the back', () => {
    const blocksOf = (kinds: readonly BlockKind[]): readonly (string | null)[] =>
      composeBooklet(
        printing(kinds, { groups: ['4'] }, (project) => ({
          ...project,
          sheet: { ...project.sheet, fillToFours: true },
        })),
      ).pages.map(({ block }) => block);
    expect(blocksOf(['tables', 'colophon'])).toEqual(['tables', null, null, 'colophon']);
    expect(blocksOf(['colophon', 'tables'])).toEqual(['colophon', 'tables', null, null]);
    expect(blocksOf(['title-page', 'tables', 'cautions', 'colophon'])).not.toContain(null);
    const { pages } = composeBooklet(
      printing(['tables'], { groups: ['4'] }, (project) => ({
        ...project,
        sheet: { ...project.sheet, fillToFours: true },
      })),
    );
    expect(pages.map(textsOn).filter((texts) => texts.includes('This page is left blank.'))).toHaveLength(3);
  });

  it('mirror their gutter: left on odd pages, right on even ones', () => {
    const withGutter = (gutterMm: number): Booklet =>
      composeBooklet(
        printing(['title-page', 'cautions', 'tables'], {}, (project) => ({
          ...project,
          sheet: { ...project.sheet, gutterMm },
        })),
      );
    const { pages, paper } = withGutter(10);
    const points = (10 * 72) / 25.4;
    expect(pages).toHaveLength(4);
    for (const { number, blocks } of pages) {
      const [head] = blocks.filter((block) => block.kind === 'rule');
      expect(head?.x).toBeCloseTo(paper.margin + (number % 2 === 1 ? points : 0), 9);
      expect(head?.width).toBeCloseTo(paper.width - 2 * paper.margin - points, 9);
    }
  });

  it('keep the margins that are chosen, and say so where these leave no room', () => {
    const withMargin = (marginMm: number, gutterMm = 0): Booklet =>
      composeBooklet(
        printing(['tables'], {}, (project) => ({ ...project, sheet: { ...project.sheet, marginMm, gutterMm } })),
      );
    for (const marginMm of [8, 30]) {
      const { pages, paper, remarks } = withMargin(marginMm);
      expect(remarks).toEqual([]);
      const points = (marginMm * 72) / 25.4;
      expect(paper.margin).toBeCloseTo(points, 9);
      for (const line of pages.flatMap(linesOn)) {
        expect(line.x).toBeGreaterThanOrEqual(points - 1e-9);
        expect(line.baseline - 0.75 * line.size).toBeGreaterThanOrEqual(points - 1e-9);
        expect(line.baseline).toBeLessThanOrEqual(paper.height - points);
      }
    }
    const narrow = sampleNormSet({ scale: WHOLE_SCALE }, (project) => ({
      ...project,
      sheet: { ...project.sheet, paper: 'a5', marginMm: 45 },
    }));
    expect(composeBooklet(narrow).remarks.join(' ')).toContain('the margins are set at 29 mm');
  });
});

describe('headings and texts of the user', () => {
  it.each(BLOCK_KINDS.filter((kind) => kind !== 'tables'))('stand in the place of the standing ones: %s', (kind) => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE }, (project) => ({
      ...project,
      cuts: [{ name: 'Goal', score: 9, values: null }],
      sheet: {
        ...project.sheet,
        blocks: [{ kind, printed: true, heading: 'Words of my own', text: 'First line.\n\n  \nSecond line.' }],
      },
    }));
    const booklet = composeBooklet(normSet);
    expect(booklet.pages[0]?.opens).toBe('Words of my own');
    const lines = booklet.pages.flatMap(linesOn);
    const headings = lines.filter(({ role }) => role.kind === 'heading' && role.level === 1).map(textOf);
    expect(headings).toEqual(['Words of my own']);
    const texts = lines.map(textOf);
    expect(texts.indexOf('Second line.')).toBe(texts.indexOf('First line.') + 1);
    expect(texts).not.toContain(
      'A percentile rank is a place in a named group. It is not a per cent of correct answers, and',
    );
  });

  it('open the tables where a text is written for them', () => {
    const withTables = (heading: string, text: string): Booklet =>
      composeBooklet(
        sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] }, (project) => ({
          ...project,
          sheet: { ...project.sheet, blocks: [{ kind: 'tables', printed: true, heading, text }] },
        })),
      );
    expect(withTables('', '').pages.map(({ opens }) => opens)).toEqual(['Table 1 · Grade 4']);
    const { pages } = withTables('Part two', 'Of the tables.');
    expect(pages.map(({ opens, group }) => [opens, group])).toEqual([
      ['Part two', null],
      ['Table 1 · Grade 4', 0],
    ]);
    expect(pages[0] === undefined ? [] : textsOn(pages[0])).toContain('Of the tables.');
  });
});
