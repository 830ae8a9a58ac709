import { createHash } from 'node:crypto';
import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it, onTestFinished, vi } from 'vitest';
import type * as fraction from '../../../../shared-core/second-engine/fraction.ts';
import { pressFiles } from '../../../../src-main/press/press-files.ts';
import type { FileToWrite } from '../../../../src-main/press/write-pressed.ts';
import { differenceLine } from '../../../../src-main/press/read-back/cell-differences.ts';
import { readBack } from '../../../../src-main/press/read-back/read-back.ts';
import type * as csv from '../../../../src-main/press/tables-csv.ts';
import { LOG_LINEAR, sampleNormSet, sampleProject, WHOLE_SCALE } from '../../../shared-core/pages/sample-norm-set.ts';
import type { NormProject } from '../../../../shared-core/norms/norm-project.ts';
import { readPdf } from '../pdf-text.ts';

const oneSmoothed = (project: NormProject): NormProject => ({
  ...project,
  curve: { ...project.curve, exceptions: [{ values: ['5'], smoothing: LOG_LINEAR }] },
});

const cohort = { scale: WHOLE_SCALE };
const project = sampleProject(cohort, oneSmoothed);

async function pressed(): Promise<readonly FileToWrite[]> {
  const made = await pressFiles(project);
  if (!made.ok) throw new Error(made.problem);
  return made.value.files;
}

const bytesIn = (files: readonly FileToWrite[], name: string): Uint8Array => {
  const found = files.find(({ file }) => file === name);
  if (found === undefined) throw new Error(`no ${name}`);
  return found.bytes;
};

describe('the certificate', () => {
  it('names every file with its fingerprint, and what was compared, and is the same bytes each time', async () => {
    const [first, second] = [await pressed(), await pressed()];
    for (const name of ['certificate.json', 'certificate.pdf']) {
      expect(Buffer.from(bytesIn(first, name)).equals(bytesIn(second, name))).toBe(true);
    }
    const certificate = JSON.parse(new TextDecoder().decode(bytesIn(first, 'certificate.json'))) as Certificate;
    expect(certificate).toMatchObject({
      format: 'normloom-certificate',
      version: 1,
      program: { name: 'Normloom', version: '0.1.0' },
      edition: '1.0',
      date: '2026-06-01',
      check: sampleNormSet(cohort, oneSmoothed).check,
      'second-engine': { 'cells-recomputed': 41 * 6, differences: 0, 'smoothed-groups-left-out': ['Grade 5'] },
    });
    const { files, differences, 'cells-compared': cells } = certificate['read-back'];
    expect(differences).toBe(0);
    expect(files.map(({ file }) => file)).toEqual(['booklet.pdf', 'tables.xlsx', 'tables.csv', 'norm-set.json']);
    expect(files.reduce((sum, each) => sum + each['cells-compared'], 0)).toBe(cells);
    for (const { file, sha256 } of files) {
      expect(sha256).toBe(createHash('sha256').update(bytesIn(first, file)).digest('hex'));
    }
    expect(certificate.recipes.map(({ group }) => group)).toEqual(['Grade 4', 'Grade 5']);
    expect(certificate.recipes[0]?.['by-hand'].at(-1)).toBe(`The table prints ${certificate.recipes[0]?.printed}.`);
    expect(certificate.recipes[1]?.['by-hand'].at(-1)).toContain('smoothing cannot be redone by hand');

    const { pages, title } = await readPdf(bytesIn(first, 'certificate.pdf'));
    expect(pages).toHaveLength(1);
    expect(title).toContain('Certificate of read-back');
    const text = pages
      .flat()
      .map((part) => part.text)
      .join(' ')
      .replace(/\s+/g, ' ');
    for (const { sha256 } of files) expect(text.replaceAll(' ', '')).toContain(sha256);
    expect(text).toContain('One row of each table, redone by hand');
    expect(text).toContain(`check ${certificate.check}`);
  });

  it('is read back with the files beside it: another edition or another file is found', async () => {
    const files = await pressed();
    const set = sampleNormSet(cohort, oneSmoothed);
    const read = await readBack(files, set);
    expect(read.ok && read.value.map(({ kind, differences }) => [kind, differences.length])).toEqual([
      ['booklet', 0],
      ['workbook', 0],
      ['csv', 0],
      ['norm set', 0],
      ['certificate', 0],
      ['certificate page', 0],
    ]);
    const csv = {
      file: 'tables.csv',
      bytes: new TextEncoder().encode(`${new TextDecoder().decode(bytesIn(files, 'tables.csv'))} `),
    };
    const others = files.slice(4);
    const next = { ...set, check: '0000-0000' };
    const differing = await readBack([csv, ...others], next);
    if (!differing.ok) throw new Error(differing.problem);
    const lines = differing.value.slice(1).flatMap(({ differences }) => differences.map(differenceLine));
    expect(lines[0]).toBe(`certificate.json, certificate: check code: expected "0000-0000", found "${set.check}"`);
    expect(lines[1]).toMatch(/^certificate\.json, certificate: SHA-256 of tables\.csv: expected/);
    expect(lines[2]).toBe(`certificate.pdf, page 1: check code: expected "0000-0000", found "${set.check}"`);
  });
});

describe('a press', () => {
  it('that read back anything else writes nothing, says which cell, and takes no certificate away', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'normloom-certificate-'));
    onTestFinished(() => rm(folder, { recursive: true, force: true }));
    await writeFile(join(folder, 'certificate.json'), '{}');
    vi.resetModules();
    vi.doMock('../../../../src-main/press/tables-csv.ts', async (original) => {
      const { tablesCsv } = await original<typeof csv>();
      const altered: typeof tablesCsv = (set) =>
        new TextEncoder().encode(
          new TextDecoder('utf-8', { ignoreBOM: true }).decode(tablesCsv(set)).replace('<1', '2'),
        );
      return { tablesCsv: altered };
    });
    onTestFinished(() => {
      vi.doUnmock('../../../../src-main/press/tables-csv.ts');
      vi.resetModules();
    });
    const { pressInto } = await import('../../../../src-main/press/press-files.ts');
    const reply = await pressInto(project, folder);
    expect(reply.ok ? '' : reply.problem).toBe(
      'The files were read back and do not say what the tables say, so nothing was written. tables.csv, line 2: ' +
        'Grade 4, raw score 0, printed: expected "<1", found "2". This is a fault of the program: keep the project and report it.',
    );
    expect(await readdir(folder)).toEqual(['certificate.json']);
  });

  it('whose tables the second engine works out otherwise is refused in a sentence', async () => {
    vi.resetModules();
    vi.doMock('../../../../shared-core/second-engine/fraction.ts', async (original) => {
      const real = await original<typeof fraction>();
      const nearestWhole: typeof real.nearestWhole = ({ top, bottom }) => top / bottom;
      return { ...real, nearestWhole };
    });
    onTestFinished(() => {
      vi.doUnmock('../../../../shared-core/second-engine/fraction.ts');
      vi.resetModules();
    });
    const { pressFiles: press } = await import('../../../../src-main/press/press-files.ts');
    const reply = await press(project);
    expect(reply.ok ? '' : reply.problem).toMatch(
      /^The tables were worked out twice and do not agree: Grade 4, raw score \d+, .*: ".*" by the first way, ".*" by the second\..* Nothing was pressed\./,
    );
  });
});

interface Certificate {
  readonly check: string;
  readonly 'read-back': {
    readonly differences: number;
    readonly 'cells-compared': number;
    readonly files: readonly { readonly file: string; readonly sha256: string; readonly 'cells-compared': number }[];
  };
  readonly recipes: readonly {
    readonly group: string;
    readonly printed: string;
    readonly 'by-hand': readonly string[];
  }[];
}
