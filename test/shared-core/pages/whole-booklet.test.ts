import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BLOCK_KINDS, WHOLE_BOOKLET, type BookletBlock } from '../../../shared-core/norms/booklet-blocks.ts';
import { COLUMN_KEYS } from '../../../shared-core/norms/column-keys.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import type { Booklet, BookletPage } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { overlaps, widowedHeadings } from './block-laws.ts';
import { frameFaults, linesOn, textOf } from './placed-laws.ts';
import { KERNEL, LOG_LINEAR, sampleNormSet, WHOLE_SCALE, type SampleCohort } from './sample-norm-set.ts';
import { tries } from '../../thoroughness.ts';

type Sheet = Partial<NormProject['sheet']>;

function wholeSet(
  cohort: Partial<SampleCohort>,
  sheet: Sheet = {},
  change: (project: NormProject) => NormProject = (project) => project,
): NormSet {
  return sampleNormSet({ scale: WHOLE_SCALE, ...cohort }, (project) =>
    change({ ...project, sheet: { ...project.sheet, blocks: WHOLE_BOOKLET, ...sheet } }),
  );
}

const textsOn = (page: BookletPage): readonly string[] => linesOn(page).map(textOf);

function faults(booklet: Booklet): readonly string[] {
  return [...frameFaults(booklet), ...overlaps(booklet), ...widowedHeadings(booklet)];
}

const PAPERS = ['a4', 'letter', 'a5'] as const;
const ORIENTATIONS = ['portrait', 'landscape'] as const;
const grades = (count: number): readonly string[] => Array.from({ length: count }, (_, index) => String(index + 1));

describe('a whole booklet', () => {
  it.each(PAPERS.flatMap((paper) => ORIENTATIONS.map((orientation) => [paper, orientation] as const)))(
    'prints every block on %s %s, nothing outside the margins, on each other or widowed',
    (paper, orientation) => {
      const normSet = wholeSet({ groups: grades(7) }, { paper, orientation }, (project) => ({
        ...project,
        curve: {
          ...project.curve,
          smoothing: LOG_LINEAR,
          exceptions: [{ values: ['2'], smoothing: { kind: 'none' } }],
        },
        cuts: [{ name: 'Support', score: 12, values: null }],
      }));
      const booklet = composeBooklet(normSet, '1.2.3');
      expect(new Set(booklet.pages.map(({ block }) => block))).toEqual(new Set(BLOCK_KINDS));
      expect(faults(booklet)).toEqual([]);
    },
  );

  it('holds these laws for many cohorts, texts, margins and gutters', () => {
    const long = 'A sentence of the documentation that goes on for a while. '.repeat(30);
    fc.assert(
      fc.property(
        fc.record({
          paper: fc.constantFrom(...PAPERS),
          orientation: fc.constantFrom(...ORIENTATIONS),
          marginMm: fc.constantFrom(null, 8, 20, 45),
          gutterMm: fc.constantFrom(0, 7, 30),
          fillToFours: fc.boolean(),
        }),
        fc.record({
          groups: fc.constantFrom(1, 2, 5, 40),
          scores: fc.constantFrom(2, 31, 151),
          min: fc.constantFrom(-5, 0),
          step: fc.constantFrom(1, 0.5),
          direction: fc.constantFrom('high-is-good', 'low-is-good'),
          weighted: fc.boolean(),
        }),
        fc.record({
          columns: fc.subarray([...COLUMN_KEYS]),
          smoothing: fc.constantFrom({ kind: 'none' } as const, LOG_LINEAR, KERNEL),
          text: fc.constantFrom('', 'One line.\nAnother.', long),
          title: fc.constantFrom('', 'Survey', 'A survey with a very long name indeed '.repeat(9)),
          group: fc.constantFrom('', 'A group of pupils whose name is long '.repeat(9)),
        }),
        (sheet, { groups, scores, min, step, ...cohort }, { columns, smoothing, text, title, group }) => {
          const scale = { min, max: min + (scores - 1) * step, step };
          const normSet = wholeSet({ ...cohort, scale, groups: grades(groups) }, {}, (project) => ({
            ...project,
            title,
            sheet: {
              ...project.sheet,
              ...sheet,
              blocks: WHOLE_BOOKLET.map((block) => ({ ...block, text, heading: text.slice(0, 300) })),
            },
            table: { ...project.table, columns },
            curve: { ...project.curve, smoothing },
            groups: {
              ...project.groups,
              choices: [{ values: ['1'], title: group, printed: true }],
              documentation: { ...project.groups.documentation, population: text, sampling: text },
            },
          }));
          const booklet = composeBooklet(normSet);
          expect(faults(booklet)).toEqual([]);
          if (sheet.fillToFours) expect(booklet.pages.length % 4).toBe(0);
        },
      ),
      { numRuns: tries(12, 300), seed: 20260601 },
    );
  }, 240_000);

  it('carries title, groups, form, edition, date, definition, check code and page number on every page', () => {
    const normSet = wholeSet({ groups: grades(3) }, { fillToFours: true }, (project) => ({
      ...project,
      curve: { ...project.curve, exceptions: [{ values: ['2'], smoothing: LOG_LINEAR }] },
    }));
    const { pages } = composeBooklet(normSet);
    const n = normSet.groups.map(({ summary }) => summary.n);
    const printed = (count: number): string => String(count).replace(/(?=\d{3}$)/, '\u202f');
    for (const page of pages) {
      const texts = textsOn(page);
      const of =
        page.group === null
          ? `definition: midpoint, smoothed in part · 3 groups, ${printed(n.reduce((sum, each) => sum + each, 0))} pupils`
          : `definition: midpoint${page.group === 1 ? ', smoothed' : ''} · ${printed(n[page.group] ?? 0)} pupils`;
      expect(texts).toContain('Ostrey Vale reading survey (invented) · Form A');
      expect(texts).toContain(`Edition 1.0 · 2026-06-01 · check ${normSet.check} · ${of}`);
      expect(texts).toContain(`page ${page.number} of ${pages.length}`);
    }
    expect(pages.map(({ number }) => number)).toEqual(pages.map((_, index) => index + 1));
  });

  it('says on every page that it is a draft', () => {
    const normSet = { ...wholeSet({}, { fillToFours: true }), status: 'draft' } as const;
    const { pages, title } = composeBooklet(normSet);
    expect(title.startsWith('DRAFT · ')).toBe(true);
    for (const page of pages) expect(textsOn(page).filter((text) => text.startsWith('DRAFT')).length).toBe(2);
    expect(pages[0] === undefined ? [] : textsOn(pages[0])).toContain('Draft, not released');
  });

  it('follows the order of the blocks, and leaves out what is not printed', () => {
    const order = (blocks: readonly BookletBlock[]): readonly (string | null)[] =>
      composeBooklet(wholeSet({}, { blocks }, withCut))
        .pages.map(({ block }) => block)
        .filter((block, index, all) => block !== all[index - 1]);
    const withCut = (project: NormProject): NormProject => ({
      ...project,
      cuts: [{ name: '', score: 9, values: null }],
    });
    expect(order(WHOLE_BOOKLET)).toEqual(BLOCK_KINDS);
    expect(order(WHOLE_BOOKLET.toReversed())).toEqual(BLOCK_KINDS.toReversed());
    const some = WHOLE_BOOKLET.map((block) => ({ ...block, printed: ['cautions', 'contents'].includes(block.kind) }));
    expect(order(some)).toEqual(['contents', 'cautions']);
  });

  it('prints the tables, and says so, where no block is chosen', () => {
    const none = WHOLE_BOOKLET.map((block) => ({ ...block, printed: false }));
    const { pages, remarks } = composeBooklet(wholeSet({}, { blocks: none }));
    expect(pages.map(({ block }) => block)).toEqual(['tables', 'tables']);
    expect(remarks.join(' ')).toContain('No block of the booklet is chosen');
    expect(composeBooklet(wholeSet({}, { blocks: [] })).pages).toHaveLength(2);
  });

  it('is the same each time', () => {
    expect(composeBooklet(wholeSet({ weighted: true }))).toEqual(composeBooklet(wholeSet({ weighted: true })));
  });
});
