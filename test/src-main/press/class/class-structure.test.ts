import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import type { PlacedPages } from '../../../../shared-core/pages/booklet.ts';
import { composeClassReport } from '../../../../shared-core/pages/class-report-pages.ts';
import { composeSlips } from '../../../../shared-core/pages/slip-pages.ts';
import { placedPdf } from '../../../../src-main/press/placed-pdf.ts';
import { NAMES, printOf, sampleFile, spreadScores } from '../../../shared-core/pages/sample-class.ts';
import { readStructure, type ReadElement } from '../structure-reader.ts';
import { cellsHeard, elementsIn, findAll, findOne, printed, spoken } from '../structure-speech.ts';

const folder = mkdtempSync(join(tmpdir(), 'normloom-class-structure-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function treeOf(placed: PlacedPages, name: string): Promise<ReadElement> {
  const { pdf } = await placedPdf(placed, new Date(0));
  const file = join(folder, `${name}.pdf`);
  writeFileSync(file, pdf);
  expect(execFileSync('qpdf', ['--check', file], { encoding: 'utf8' })).toContain(
    'No syntax or stream encoding errors',
  );
  const tree = await readStructure(file, pdf);
  expect(tree.faults).toEqual([]);
  expect(tree.loose).toEqual([]);
  return tree.root;
}

/** Spoken texts as a person would write them down, sign by sign. */
function saidOf(text: string): string {
  const words: Readonly<Record<string, string>> = { '<': 'below ', '>': 'above ', '–': ' to ' };
  return [...text].map((sign) => words[sign] ?? sign).join('');
}

describe('the structure tree of a class', () => {
  it('gives every cell of the report its pupil and the head of its column, over pages', async () => {
    const print = printOf(sampleFile({ entries: spreadScores(120), groups: ['a', 'b'] }));
    const root = await treeOf(composeClassReport(print), 'report');
    const [sheet, ...others] = elementsIn(root);
    if (sheet === undefined || others.length > 0) throw new Error('not one section');
    expect(sheet.title).toBe('Class 5b');
    const [table] = findAll(sheet, 'Table');
    const expected = print.results.pupils.flatMap(({ name, group, scoreText, found }) =>
      [
        ['Group', group],
        ['Raw score', scoreText],
        ['Percentile rank', found.printed],
        ['Band', found.texts['measurement-band'] ?? ''],
        ['Stanine', found.texts['stanine'] ?? ''],
      ].map(([columnHead, text = '']) => ({ rowHead: name, columnHead, spoken: saidOf(text), printed: text })),
    );
    expect(table === undefined ? [] : cellsHeard(table)).toEqual(expected);
    const figures = findAll(sheet, 'Figure');
    const charts = figures.map(({ alt }) => alt).filter((alt) => alt.startsWith('Percentile ranks and bands'));
    expect(charts.length).toBeGreaterThan(1);
    for (const { name } of print.results.pupils) {
      expect(charts.filter((alt) => alt.includes(` ${name}: `))).toHaveLength(1);
    }
    expect(findAll(sheet, 'H1').map(printed)).toEqual(['Class 5b']);
    expect(findAll(sheet, 'H2').map((head) => printed(head).trim())).toEqual([
      'Who is in this report',
      'Raw scores of the class',
      'Where the class stands in the sample',
      'Groups in the class',
    ]);
  });

  it('reads a slip from name to what it does not mean, with its figures under their labels', async () => {
    const print = printOf(sampleFile({ entries: [18, 0, 40] }));
    const made = composeSlips(print);
    if (!made.ok) throw new Error(made.problem);
    const root = await treeOf(made.value, 'slips');
    const sheet = findOne(root, 'Sect');
    expect(findAll(sheet, 'H1').map((head) => printed(head).trim())).toEqual(NAMES.slice(0, 3));
    const tables = findAll(sheet, 'Table');
    print.results.pupils.forEach(({ scoreText, found }, index) => {
      const table = tables[index];
      if (table === undefined) throw new Error('no figures');
      expect(findAll(findOne(table, 'THead'), 'TH').map((head) => spoken(head).trim())).toEqual([
        'Score',
        'Percentile rank',
        'Band',
      ]);
      expect(findAll(findOne(table, 'TBody'), 'TD').map(spoken)).toEqual(
        [scoreText, found.printed, found.band?.text ?? ''].map(saidOf),
      );
    });
    expect(findAll(sheet, 'Figure').map(({ alt }) => alt)).toEqual(
      print.results.pupils.map(
        ({ found }) =>
          `A scale of percentile ranks from 1 to 99. The percentile rank is ${saidOf(found.printed)}, the band ${saidOf(found.band?.text ?? '')}.`,
      ),
    );
    const order = elementsIn(sheet)
      .slice(0, 8)
      .map(({ type }) => type);
    expect(order).toEqual(['H1', 'P', 'Table', 'Figure', 'P', 'H2', 'P', 'P']);
  });
});
