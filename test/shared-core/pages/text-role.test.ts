import { describe, expect, it } from 'vitest';
import type { BookletPage, TextLine } from '../../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { tableMarks } from '../../../shared-core/pages/table-blocks.ts';
import { LOG_LINEAR, sampleNormSet, WHOLE_SCALE } from './sample-norm-set.ts';

const linesOn = ({ blocks }: BookletPage): readonly TextLine[] =>
  blocks.flatMap((block) =>
    (block.kind === 'table-column' ? [...tableMarks(block)] : [block]).filter((mark) => mark.kind === 'text'),
  );

const textOf = ({ runs }: TextLine): string => runs.map(({ text }) => text).join('');

/** The words of the pieces that a page holds for itself. */
const repeatedOn = (page: BookletPage): string =>
  linesOn(page)
    .filter(({ role }) => role.kind === 'repeated')
    .map(textOf)
    .join(' ');

describe('what placed texts are', () => {
  const scale = { min: 0, max: 300, step: 1 };
  const booklet = composeBooklet(sampleNormSet({ scale, groups: ['4', '5'] }));

  it('is one cell for each head, raw score and column of a group, however many columns and pages', () => {
    for (const group of [0, 1]) {
      const cells = booklet.pages
        .filter((page) => page.group === group)
        .flatMap(linesOn)
        .flatMap(({ role }) => (role.kind === 'cell' ? [`${role.table} ${role.row} ${role.column}`] : []));
      const expected = ['head', ...Array.from({ length: 301 }, (_, score) => String(score))].flatMap((row) =>
        [0, 1, 2, 3].map((column) => `conversion ${row} ${column}`),
      );
      expect([...new Set(cells)].sort()).toEqual(expected.sort());
    }
  });

  it('is nothing to be read twice: further pages and columns repeat', () => {
    const [first, second] = booklet.pages;
    if (first === undefined || second === undefined) throw new Error('one page');
    expect(repeatedOn(first)).toMatch(/^(Raw score Percentile rank Sta- nine T ?)+$/);
    expect(repeatedOn(second)).toMatch(/\(continued\).* Raw score Percentile rank/);
    const read = linesOn(second).filter(({ role }) => role.kind === 'heading' || role.kind === 'paragraph');
    expect(read).toEqual([]);
  });

  it('is a paragraph under one name, whichever of its columns and pages a line stands on', () => {
    const notes = 'A long note. '.repeat(900);
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] }, (project) => ({
      ...project,
      sheet: { ...project.sheet, notes },
      curve: { ...project.curve, smoothing: LOG_LINEAR },
    }));
    const named = new Map<string, string>();
    for (const line of composeBooklet(normSet).pages.flatMap(linesOn)) {
      if (line.role.kind !== 'paragraph' && line.role.kind !== 'heading') continue;
      named.set(line.role.name, `${named.get(line.role.name) ?? ''}${textOf(line)} `);
    }
    const { sheet } = normSet.project;
    expect([...named.keys()].slice(0, 4)).toEqual(['title', 'subtitle', 'how to read 0', 'cautions 0']);
    expect(named.get('how to read 0')).toBe(`${sheet.howToRead} `);
    expect([...named.values()]).toContain(`Notes. ${notes}`);
  });
});
