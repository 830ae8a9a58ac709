import { createHash } from 'node:crypto';
import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Papa from 'papaparse';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { normSetJson } from '../../../src-main/press/norm-set-json.ts';
import { drawPages, pressFiles, pressInto } from '../../../src-main/press/press-files.ts';
import { safeForCsv } from '../../../src-main/press/safe-text.ts';
import { tablesCsv } from '../../../src-main/press/tables-csv.ts';
import { LOG_LINEAR, sampleNormSet, sampleProject, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

let folder: string;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'normloom-press-'));
});

afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
});

describe('tablesCsv', () => {
  const normSet = sampleNormSet({ scale: { min: -3, max: 3, step: 0.5 }, groups: ['-1', '=2+3', 'a "b", c'] });
  const text = new TextDecoder('utf-8', { ignoreBOM: true }).decode(tablesCsv(normSet));

  it('is read back as it was printed', () => {
    expect(text.startsWith('\uFEFF')).toBe(true);
    expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
    const { data, errors } = Papa.parse<Record<string, string>>(text.slice(1), { header: true, skipEmptyLines: true });
    expect(errors).toEqual([]);
    const expected = normSet.groups.flatMap(({ group, rows }) =>
      rows.map((row) => [
        safeForCsv(group.values[0] ?? ''),
        row.score,
        row.count,
        row.cumulative,
        row.percentileRank,
        row.printed,
        row.texts.t,
      ]),
    );
    expect(
      data.map((row) => [
        row['grade'],
        Number(row['raw-score']),
        Number(row['count']),
        Number(row['cumulative']),
        Number(row['percentile-rank']),
        row['printed'],
        row['printed-t'],
      ]),
    ).toEqual(expected);
    expect(new Set(data.map((row) => row['check']))).toEqual(new Set([normSet.check]));
  });

  it('has observed and smoothed ranks, intervals and standard errors, empty where there are none', () => {
    const read = (set: NormSet): readonly Record<string, string>[] => {
      const csv = new TextDecoder().decode(tablesCsv(set));
      return Papa.parse<Record<string, string>>(csv, { header: true, skipEmptyLines: true }).data;
    };
    const cell = (value: number | null | undefined): string =>
      value === null || value === undefined ? '' : String(value);
    const smoothing: NormProject['curve'] = {
      definition: { kind: 'grouped', width: 5 },
      smoothing: LOG_LINEAR,
      exceptions: [{ values: ['5'], smoothing: { kind: 'none' } }],
    };
    const usual = { ...smoothing, definition: { kind: 'midpoint' } } as const;
    for (const curve of [smoothing, usual]) {
      const set = sampleNormSet({ scale: { min: 1, max: 40, step: 1 } }, (project) => ({ ...project, curve }));
      const rows = set.groups.flatMap((group) => group.rows);
      const data = read(set);
      expect(data).toHaveLength(80);
      data.forEach((record, index) => {
        const row = rows[index];
        expect(record['percentile-rank']).toBe(cell(row?.observed.percentileRank));
        expect(record['smoothed-percentile-rank']).toBe(index < 40 ? cell(row?.percentileRank) : '');
        expect(record['smoothed-standard-error']).toBe(index < 40 ? cell(row?.standardError) : '');
        expect(record['interval-low']).toBe(cell(row?.interval?.low));
        expect(record['interval-high']).toBe(cell(row?.interval?.high));
        expect(record['standard-error']).toBe(cell(row?.midpointError));
      });
      expect(data.every((record) => (record['interval-low'] === '') === (curve === smoothing))).toBe(true);
    }
  });

  it('starts no formula with a text of the user, and leaves negative numbers alone', () => {
    expect(['=1', '+1x', '-x', '@a', '\ta', '-1.5', 'a=1'].map(safeForCsv)).toEqual([
      "'=1",
      "'+1x",
      "'-x",
      "'@a",
      "'\ta",
      '-1.5',
      'a=1',
    ]);
    expect(text).toContain("'=2+3");
  });
});

describe('pressFiles', () => {
  const project = sampleProject({ scale: WHOLE_SCALE });

  it('makes the same files each time, reads them back, and writes them with their fingerprints', async () => {
    const told: number[] = [];
    const made = await pressFiles(project, (progress) => told.push(progress));
    if (!made.ok) throw new Error(made.problem);
    expect(made.value.files.map(({ file }) => file)).toEqual([
      'booklet.pdf',
      'tables.xlsx',
      'tables.csv',
      'norm-set.json',
      'certificate.json',
      'certificate.pdf',
    ]);
    expect(made.value.readBack.recomputed).toBe(2 * 41 * 6);
    expect(told).toEqual(told.toSorted((left, right) => left - right));

    const into = join(folder, 'a', 'b');
    const pressed = await pressInto(project, into);
    if (!pressed.ok) throw new Error(pressed.problem);
    expect((await readdir(into)).sort()).toEqual(made.value.files.map(({ file }) => file).sort());
    for (const [index, { file, bytes, sha256 }] of pressed.value.files.entries()) {
      const written = await readFile(join(into, file));
      expect(written.equals(Buffer.from(made.value.files[index]?.bytes ?? []))).toBe(true);
      expect(written.length).toBe(bytes);
      expect(createHash('sha256').update(written).digest('hex')).toBe(sha256);
    }
  });

  it('refuses in a sentence what cannot be pressed', async () => {
    expect(await pressFiles(newProject('Empty'))).toMatchObject({ ok: false });
    expect(await drawPages(newProject('Empty'))).toMatchObject({ ok: false });
    await writeFile(join(folder, 'taken'), '');
    const refused = await pressInto(project, join(folder, 'taken'));
    expect(refused).toMatchObject({ ok: false });
    expect(refused.ok ? '' : refused.problem).toMatch(/^The pressed files could not be written: /);
  });

  it('refuses a group that cannot be smoothed as chosen, on paper and on screen', async () => {
    const refused = sampleProject({ scale: { min: 0, max: 4, step: 1 } }, (sample) => ({
      ...sample,
      curve: {
        ...sample.curve,
        exceptions: [{ values: ['5'], smoothing: { ...LOG_LINEAR, degree: 9 } }],
      },
    }));
    const into = join(folder, 'refused');
    const replies = [await pressFiles(refused), await pressInto(refused, into), await drawPages(refused)];
    for (const reply of replies) {
      expect(reply.ok ? '' : reply.problem).toMatch(/^Grade 5 cannot be smoothed as chosen\. Degree 9 asks for more/);
    }
    expect(await readdir(folder)).not.toContain('refused');
  });

  it('writes the norm set with its format, edition and check', () => {
    const normSet = sampleNormSet({ scale: WHOLE_SCALE });
    const file: unknown = JSON.parse(new TextDecoder().decode(normSetJson(normSet)));
    expect(file).toMatchObject({
      format: 'normloom-norm-set',
      version: 1,
      edition: '1.0',
      date: '2026-06-01',
      check: normSet.check,
      definition: 'midpoint',
      groups: [{ group: { grade: '4' } }, { group: { grade: '5' } }],
    });
  });
});
