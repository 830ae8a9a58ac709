import { describe, expect, it } from 'vitest';
import { withExtent } from '../../../shared-core/norms/booklet-choice.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { bookletSections } from '../../../shared-core/pages/booklet-sections.ts';
import { builtSet, settledProject } from '../norms/small-projects.ts';

describe('the sections of a booklet', () => {
  it('begin where a heading opens or a block changes, and leave blank pages out', () => {
    const pages = [
      { number: 1, block: 'title-page', opens: null },
      { number: 2, block: 'contents', opens: 'Contents' },
      { number: 3, block: 'contents', opens: null },
      { number: 4, block: 'tables', opens: 'Table 1 · Grade 4' },
      { number: 5, block: 'tables', opens: null },
      { number: 6, block: 'tables', opens: 'Table 2 · Grade 5' },
      { number: 7, block: null, opens: null },
    ] as const;
    expect(bookletSections(pages)).toEqual([
      { block: 'title-page', name: null, page: 1, pages: 1 },
      { block: 'contents', name: 'Contents', page: 2, pages: 2 },
      { block: 'tables', name: 'Table 1 · Grade 4', page: 4, pages: 2 },
      { block: 'tables', name: 'Table 2 · Grade 5', page: 6, pages: 1 },
    ]);
    expect(bookletSections([])).toEqual([]);
  });

  it('cover every page of a whole booklet that is not blank, one after the other', () => {
    const settled = settledProject();
    const sheet = withExtent(settled.sheet, 'whole');
    const { pages } = composeBooklet(builtSet({ ...settled, sheet }));
    const sections = bookletSections(pages);
    const covered = sections.flatMap(({ page, pages: count, block }) =>
      Array.from({ length: count }, (_, further) => [page + further, block]),
    );
    expect(covered).toEqual(pages.filter(({ block }) => block !== null).map(({ number, block }) => [number, block]));
    expect(sections.filter(({ block }) => block === 'tables')).toHaveLength(2);
  });
});
