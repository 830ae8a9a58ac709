import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import type { Reading } from '../../../shared-core/norms/reading.ts';
import { readingWith } from '../../shared-core/tally/readings.ts';
import { cohortFolder, leftOut, look, tally } from './cohorts-at-hand.ts';

const HEADING = ['pupil', 'school', 'grade', 'score', 'weight'];

/** Row 2 on, with one planted defect a row; scores in halves from 0 to 40. */
const ROWS = [
  ['0001', 'Überlingen', '04', '12', '1.25'],
  ['0002', 'Überlingen', '04', '12.5', '0.8'],
  ['0001', 'Überlingen', '04', '13', '1'],
  ['0003', 'Ford, North', '04', '99', '1'],
  ['0004', 'Ford, North', '04', '', '1'],
  [''],
  ['0005', 'Ford "Old"', '05', 'absent', '1'],
  ['0006', 'Ford "Old"', '05', '41', '1'],
  ['0007', 'Ford "Old"', '05', '-1', '1'],
  ['0008', 'Ford', '05', '7.25', '1'],
  ['0009', 'Ford', '05'],
  ['0010', 'Ford', '05', '8', '1', 'more'],
  ['0011', 'Ford', '', '8', '1'],
  ['0012', 'Ford', '05', '8', '-2'],
  ['', '', ' ', '', ''],
  ['13', 'Line\nbreak', '05', '40', '2.75'],
  ['013', 'Ford', '06', '0.0', '1'],
];

const FOUND = {
  'blank-row': [7, 16],
  'ragged-row': [12, 13],
  'duplicate-id': [4],
  'blank-score': [6],
  'missing-code': [5],
  'not-a-number': [8],
  'below-scale': [10],
  'above-scale': [9],
  'off-grid': [11],
  'blank-group': [14],
  'bad-weight': [15],
};

const READING = readingWith(
  { pupil: 'id', school: 'unused', grade: 'group', score: 'score', weight: 'weight' },
  { missing: ['99'], scale: { min: 0, max: 40, step: 0.5, direction: 'high-is-good' } },
);

interface Variant {
  readonly name: string;
  readonly reading: Partial<Reading>;
  readonly lineEnd?: string;
  readonly bytes: (text: string) => Uint8Array;
}

function swapped(bytes: Buffer): Buffer {
  return Buffer.from(bytes).swap16();
}

const VARIANTS: readonly Variant[] = [
  { name: 'utf-8', reading: {}, bytes: (text) => Buffer.from(text) },
  {
    name: 'utf-8 with a byte order mark and CRLF',
    reading: {},
    lineEnd: '\r\n',
    bytes: (text) => Buffer.from(`\uFEFF${text}`),
  },
  { name: 'lone CR', reading: {}, lineEnd: '\r', bytes: (text) => Buffer.from(text) },
  { name: 'windows-1252', reading: { encoding: 'windows-1252' }, bytes: (text) => Buffer.from(text, 'latin1') },
  {
    name: 'semicolons and decimal commas in windows-1252',
    reading: { encoding: 'windows-1252', separator: ';', decimalMark: ',' },
    lineEnd: '\r\n',
    bytes: (text) => Buffer.from(text, 'latin1'),
  },
  { name: 'tabs', reading: { separator: '\t' }, bytes: (text) => Buffer.from(text) },
  { name: 'upright bars', reading: { separator: '|' }, bytes: (text) => Buffer.from(text) },
  {
    name: 'utf-16le with a byte order mark',
    reading: { encoding: 'utf-16le', separator: '\t' },
    lineEnd: '\r\n',
    bytes: (text) => Buffer.from(`\uFEFF${text}`, 'utf16le'),
  },
  { name: 'utf-16le without one', reading: { encoding: 'utf-16le' }, bytes: (text) => Buffer.from(text, 'utf16le') },
  {
    name: 'utf-16be with a byte order mark',
    reading: { encoding: 'utf-16be' },
    bytes: (text) => swapped(Buffer.from(`\uFEFF${text}`, 'utf16le')),
  },
  {
    name: 'utf-16be without one',
    reading: { encoding: 'utf-16be' },
    bytes: (text) => swapped(Buffer.from(text, 'utf16le')),
  },
];

function written({ separator, decimalMark }: Reading, lineEnd: string): string {
  const cell = (text: string): string => {
    const marked = /^-?\d+\.\d+$/.test(text) ? text.replace('.', decimalMark) : text;
    return marked.includes(separator) || /["\n]/.test(marked) ? `"${marked.replaceAll('"', '""')}"` : marked;
  };
  return [HEADING, ...ROWS].map((row) => row.map(cell).join(separator) + lineEnd).join('');
}

describe('a file with planted defects', () => {
  const folder = cohortFolder();

  it.each(VARIANTS)(
    'shows each of them at its row: $name',
    async ({ name, reading: changes, lineEnd = '\n', bytes }) => {
      const reading = { ...READING, ...changes };
      const content = bytes(written(reading, lineEnd));
      const path = await folder.write(`${name}.csv`, content);

      const guessed = (await look(path)).reading;
      expect(guessed.encoding).toBe(reading.encoding);
      expect(guessed.separator).toBe(reading.separator);
      expect(guessed.decimalMark).toBe(reading.decimalMark);
      expect(guessed.header).toBe(true);
      expect(guessed.missing).toContain('99');

      const tallied = await tally(path, reading);
      expect(leftOut(tallied)).toEqual(FOUND);
      const { source, tally: made } = tallied;
      expect(source.rowsRead).toBe(ROWS.length);
      expect(source.rowsKept).toBe(4);
      expect(source.rowsKept + source.leftOut.reduce((sum, { count }) => sum + count, 0)).toBe(source.rowsRead);
      expect(source.sha256).toBe(createHash('sha256').update(content).digest('hex'));
      expect(source.bytes).toBe(content.length);
      expect(made.cells.map(({ values }) => values)).toEqual([['04'], ['05'], ['06']]);
      expect(
        made.cells.map(({ counts }) => counts.flatMap((count, at) => (count > 0 ? [[at / 2, count]] : []))),
      ).toEqual([
        [
          [12, 1],
          [12.5, 1],
        ],
        [[40, 1]],
        [[0, 1]],
      ]);
      expect(made.cells[0]?.weights?.slice(24, 26)).toEqual(['125', '80']);
    },
  );

  it('shows its texts unharmed in the preview', async () => {
    const path = await folder.write(
      'texts.csv',
      Buffer.from(written({ ...READING, separator: ';' }, '\r\n'), 'latin1'),
    );
    const { columns, rows } = await look(path);
    expect(columns).toEqual(HEADING);
    expect(rows[0]).toEqual(ROWS[0]);
    expect(rows.map((row) => row[1]).slice(3, 8)).toEqual([
      'Ford, North',
      'Ford, North',
      undefined,
      'Ford "Old"',
      'Ford "Old"',
    ]);
    expect(rows[15]?.[1]).toBe('Line\nbreak');
  });

  it('keeps what can be read of ragged rows, when that is decided', async () => {
    const path = await folder.write('ragged.csv', written(READING, '\n'));
    const decisions = { ...READING.decisions, raggedRow: 'keep-readable' } as const;
    const tallied = await tally(path, { ...READING, decisions });
    expect(leftOut(tallied)['ragged-row']).toEqual([12]);
    expect(tallied.source.rowsKept).toBe(5);
  });
});
