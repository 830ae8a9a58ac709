import { afterEach, describe, expect, it } from 'vitest';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { printNumber } from '../../../shared-core/scores/printed-number.ts';
import { bookletPdf } from '../../../src-main/press/booklet-pdf.ts';
import { KERNEL, LOG_LINEAR, sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';
import { readPdf, type PlacedText } from './pdf-text.ts';

/** Smoothed in two ways, with every kind of error printed. */
const withErrors = (project: NormProject): NormProject => ({
  ...project,
  curve: { ...project.curve, smoothing: LOG_LINEAR, exceptions: [{ values: ['5'], smoothing: KERNEL }] },
  precision: { ...project.precision, reliability: 0.9 },
  table: {
    ...project.table,
    columns: ['observed-rank', 'interval', 'standard-error', 'measurement-band', 'print-range', 't'],
  },
});

const zone = process.env['TZ'];

afterEach(() => {
  if (zone === undefined) delete process.env['TZ'];
  else process.env['TZ'] = zone;
});

/** Texts that stand on one line between two places, from left to right. */
function lineAt(page: readonly PlacedText[], y: number, from: number, to: number): readonly string[] {
  return page
    .filter((text) => Math.abs(text.y - y) < 0.6 && text.x >= from && text.x < to)
    .sort((left, right) => left.x - right.x)
    .map(({ text }) => text);
}

describe('bookletPdf', () => {
  it('holds the printed row of each group and raw score exactly once, where it was placed', async () => {
    const normSet = sampleNormSet({ scale: { min: -10, max: 110, step: 1 }, groups: ['4', '5', '6'] }, withErrors);
    const booklet = composeBooklet(normSet);
    const read = await readPdf((await bookletPdf(normSet)).pdf);
    expect(read.pages.length).toBe(booklet.pages.length);
    const seen: string[] = [];
    booklet.pages.forEach((page, index) => {
      const texts = read.pages[index] ?? [];
      for (const block of page.blocks) {
        if (block.kind !== 'table-column') continue;
        for (const row of block.rows) {
          const y = booklet.paper.height - row.baseline;
          const printed = row.cells.map(({ text }) => text);
          expect(lineAt(texts, y, block.x - 1, block.x + block.width + 1)).toEqual(printed);
          seen.push(`${page.group} ${printed.slice(0, 2).join(' ')}`);
        }
      }
    });
    const expected = normSet.groups.flatMap(({ rows }, group) =>
      rows.map((row) => `${group} ${row.scoreText} ${row.printed}`),
    );
    expect(seen).toEqual(expected);
    expect(read.outline).toEqual(['Table 1 · Grade 4', 'Table 2 · Grade 5', 'Table 3 · Grade 6']);
    expect(read.title).toBe('Ostrey Vale reading survey (invented) · Form A');
    expect(read.language).toBe('en');
  });

  it('prints the fit of each smoothed group, as it was worked out', async () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5'] }, withErrors);
    const read = await readPdf((await bookletPdf(normSet)).pdf);
    const texts = read.pages.flat().map(({ text }) => text);
    const { smoothing } = normSet.groups[0] ?? {};
    if (smoothing?.state !== 'smoothed') throw new Error('not smoothed');
    for (const { g2, x2, aic, bic } of smoothing.curve.degrees) {
      for (const figure of [g2, x2, aic, bic]) expect(texts).toContain(printNumber(figure, 1));
    }
    for (const moments of [smoothing.curve.momentsObserved, smoothing.curve.momentsFitted]) {
      for (const moment of Object.values(moments)) expect(texts).toContain(printNumber(moment, 3));
    }
    expect(texts.filter((text) => text === 'Technical notes on the smoothing')).toHaveLength(2);
    expect(texts.filter((text) => text === '95 % interval')).toHaveLength(2);
  });

  it('prints no figure that stands in no table', async () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4'] }, (project) => ({
      ...project,
      sheet: { ...project.sheet, ogive: false },
    }));
    const { rows } = normSet.groups[0] ?? { rows: [] };
    const read = await readPdf((await bookletPdf(normSet)).pdf);
    const figures = read.pages.flat().filter(({ text }) => /^[<>−\d.–]+$/.test(text));
    expect(figures.length).toBe(rows.length * 4);
  });

  it('is the same in every time zone and run, whatever was drawn before', async () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE, weighted: true }, withErrors);
    const first = await bookletPdf(normSet);
    process.env['TZ'] = 'Pacific/Auckland';
    await bookletPdf(sampleNormSet({ scale: { min: 0, max: 9, step: 1 } }));
    const second = await bookletPdf(normSet);
    expect(Buffer.from(second.pdf).equals(Buffer.from(first.pdf))).toBe(true);
    expect(Buffer.from(first.pdf).toString('latin1')).toContain('D:20260601000000Z');
  });

  it('draws as many pages as were placed, in many settings', async () => {
    for (const [paper, orientation, tableColumns, notes] of [
      ['a4', 'landscape', 1, ''],
      ['letter', 'portrait', 2, 'A note. '.repeat(400)],
      ['a5', 'portrait', 3, 'A note.\n\nAnother, in Ελληνικά.'],
      ['a5', 'landscape', 3, 'A note. '.repeat(900)],
    ] as const) {
      const normSet = sampleNormSet(
        { scale: { min: 0, max: 60, step: 0.5 }, direction: 'low-is-good', weighted: true },
        (project) => ({
          ...project,
          sheet: { ...project.sheet, paper, orientation, tableColumns, notes, inverse: true },
          table: { ...project.table, columns: ['count', 'cumulative', 'exact-rank', 'z', 't', 'stanine'] },
        }),
      );
      const { pages } = await bookletPdf(normSet);
      expect(pages).toBe(composeBooklet(normSet).pages.length);
    }
  });

  it('tells how far it is', async () => {
    const shares: number[] = [];
    await bookletPdf(sampleNormSet({ scale: WHOLE_SCALE }), (share) => shares.push(share));
    expect(shares.length).toBeGreaterThan(10);
    expect(shares.at(-1)).toBe(1);
  });
});
