import { writeFileSync } from 'node:fs';
import { readFile, stat } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as v from 'valibot';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { normProjectSchema } from '../../../shared-core/norms/norm-project.ts';
import { tallyCohort } from '../../../src-main/cohort-file/tally-cohort.ts';
import { CANCELLED } from '../../../src-main/cohort-file/row-taker.ts';
import { readingWith } from '../../shared-core/tally/readings.ts';
import { cohortFolder, leftOut, tally, tallyProblem } from './cohorts-at-hand.ts';

const folder = cohortFolder();
const reference = (name: string): string => fileURLToPath(new URL(`../../reference/cohorts/${name}`, import.meta.url));

describe('identifiers that occur twice', () => {
  const withIds = readingWith({ id: 'id', score: 'score' });
  const leaveAll = { ...withIds, decisions: { ...withIds.decisions, duplicateId: 'leave-out-all' } } as const;
  const keepAll = { ...withIds, decisions: { ...withIds.decisions, duplicateId: 'keep-all' } } as const;
  const tinyFilter = 9;

  it('are found whatever the size of the filter, and nothing else is', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(fc.integer({ min: 0, max: 150 }), { minLength: 1, maxLength: 250 }), async (ids) => {
        const path = await folder.write('ids.csv', `id,score\n${ids.map((id) => `p${id},${id % 21}\n`).join('')}`);
        const later = ids.flatMap((id, row) => (ids.indexOf(id) < row ? [row + 2] : []));
        const all = ids.flatMap((id, row) => (ids.indexOf(id) !== ids.lastIndexOf(id) ? [row + 2] : []));
        for (const bits of [tinyFilter, 20]) {
          const first = await tally(path, withIds, bits);
          expect(leftOut(first)['duplicate-id'] ?? []).toEqual(later);
          if (all.length < ids.length) {
            expect(leftOut(await tally(path, leaveAll, bits))['duplicate-id'] ?? []).toEqual(all);
          }
        }
        expect((await tally(path, keepAll)).source.leftOut).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });

  it('are told where everybody occurs twice', async () => {
    const path = await folder.write('twice.csv', 'id,score\na,1\na,2\n');
    expect(await tallyProblem(path, leaveAll)).toMatch(/identifier met before.*Is the id column the right one/);
  });
});

describe('the weighted reference cohort', () => {
  it('has the reference sums: exact as decimals, and in floating point those of R', async () => {
    const { tally: made, source } = await tally(
      reference('c5_weighted_cohort.csv'),
      readingWith(
        { id: 'id', score: 'score', weight: 'weight' },
        { scale: { min: 0, max: 40, step: 1, direction: 'high-is-good' } },
      ),
    );
    const expected = JSON.parse(await readFile(reference('c5_weighted_ref.json'), 'utf8')) as {
      readonly sum_w: number;
      readonly sum_w2: number;
      readonly n: number;
    };
    const total = (texts: readonly string[] | null | undefined): bigint =>
      (texts ?? []).reduce((sum, text) => sum + BigInt(text), 0n);
    const [cell] = made.cells;
    // The file writes its weights with 17 digits; these are the sums of just those decimals.
    expect(made.weightDecimals).toBe(17);
    expect(total(cell?.weights)).toBe(98_325_340_000_000_000_047n);
    expect(total(cell?.squares)).toBe(15_225_047_383_000_000_048_245_560_000_000_037_197n);
    expect(Number(total(cell?.weights)) / 1e17).toBe(expected.sum_w);
    expect(Number(total(cell?.squares)) / 1e34).toBeCloseTo(expected.sum_w2, 9);
    expect(source.rowsKept).toBe(expected.n);
  });

  it('has 983.2534 and 1522.5047383 with the weights at their 4 decimals', async () => {
    const text = await readFile(reference('c5_weighted_cohort.csv'), 'utf8');
    const rounded = text.replace(/\d+\.\d+$/gm, (weight) => String(Number(weight)));
    const { tally: made } = await tally(
      await folder.write('rounded.csv', rounded),
      readingWith({ score: 'score', weight: 'weight' }, { scale: null }),
    );
    const total = (texts: readonly string[] | null | undefined): bigint =>
      (texts ?? []).reduce((sum, text) => sum + BigInt(text), 0n);
    expect(made.weightDecimals).toBe(4);
    expect(total(made.cells[0]?.weights)).toBe(9_832_534n);
    expect(total(made.cells[0]?.squares)).toBe(152_250_473_830n);
  });
});

describe('what a tally is made of', () => {
  it('fits into a project file, with weights of 40 digits too', async () => {
    const digits = '0.123456789012345678901234567890123456789';
    const path = await folder.write('long.csv', `score,w\n5,${digits}\n6,${digits}\n6,12345678\n`);
    const { source, tally: made } = await tally(path, readingWith({ score: 'score', w: 'weight' }));
    expect(made.weightDecimals).toBe(39);
    expect(BigInt(made.cells[0]?.weights?.[5] ?? 0)).toBe(BigInt(digits.slice(2)));
    expect(BigInt(made.cells[0]?.squares?.[5] ?? 0)).toBe(BigInt(digits.slice(2)) ** 2n);
    const project = { ...newProject('Long weights'), source, tally: made };
    expect(v.safeParse(normProjectSchema, project).success).toBe(true);
  });

  it('is the same when the rows come from two halves of a file', async () => {
    const rows = Array.from({ length: 500 }, (_, index) => `${index % 21},${(index % 37) + 1}.${index}\n`);
    const reading = readingWith({ score: 'score', w: 'weight' });
    const one = await tally(await folder.write('one.csv', `score,w\n${rows.join('')}`), reading);
    const turned = await tally(
      await folder.write(
        'turned.csv',
        `w,score\n${rows
          .toReversed()
          .map((row) => row.trim().split(',').reverse().join(','))
          .join('\n')}`,
      ),
      reading,
    );
    expect(JSON.stringify(turned.tally)).toBe(JSON.stringify(one.tally));
  });

  it('says when the reading does not fit the file', async () => {
    const path = await folder.write('plain.csv', 'id,score\n1,5\n');
    expect(await tallyProblem(path, readingWith({ points: 'score' }))).toMatch(/no column "points"/);
    expect(await tallyProblem(path, readingWith({ id: 'id' }))).toMatch(/No column is marked as the score/);
    expect(await tallyProblem(folder.path('gone.csv'), readingWith({}))).toMatch(/not there any more/);
  });
});

describe('while a file is read', () => {
  it('progress rises to 1 with what is being done', async () => {
    const path = await folder.write(
      'long.csv',
      `id,score\n${Array.from({ length: 100_000 }, (_, row) => `${row},5\n`).join('')}1,6\n`,
    );
    const seen: (readonly [number, string])[] = [];
    const reading = readingWith({ id: 'id', score: 'score' });
    const signal = new AbortController().signal;
    const made = await tallyCohort(path, 'long', reading, {
      onProgress: (done, doing) => seen.push([done, doing]),
      signal,
    });
    expect(made.ok).toBe(true);
    const [counting = '', checking = ''] = [...new Set(seen.map(([, doing]) => doing))];
    expect(counting).toBe('Counting the rows');
    expect(checking).toMatch(/identifiers/);
    for (const doing of [counting, checking]) {
      const steps = seen.filter(([, at]) => at === doing).map(([done]) => done);
      expect(steps).toEqual(steps.toSorted((left, right) => left - right));
      expect(steps.at(-1)).toBe(1);
    }
  });

  it('it can be cancelled', async () => {
    const path = await folder.write('cancel.csv', `score\n${'5\n'.repeat(2_000_000)}`);
    const before = await stat(path);
    const controller = new AbortController();
    const made = await tallyCohort(path, 'cancel', readingWith({ score: 'score' }), {
      onProgress: (done) => {
        if (done > 0.2) controller.abort();
      },
      signal: controller.signal,
    });
    expect(made).toEqual({ ok: false, problem: CANCELLED });
    expect((await stat(path)).mtimeMs).toBe(before.mtimeMs);
  });

  it('a change of the file is noticed', async () => {
    const text = `id,score\n${Array.from({ length: 50_000 }, (_, row) => `${row % 40_000},5\n`).join('')}`;
    const path = await folder.write('changing.csv', text);
    let changed = false;
    const made = await tallyCohort(path, 'changing.csv', readingWith({ id: 'id', score: 'score' }), {
      onProgress: (done) => {
        if (changed || done < 1) return;
        changed = true;
        writeFileSync(path, text.replaceAll(',5', ',6'));
      },
      signal: new AbortController().signal,
    });
    expect(made.ok ? made.value.source.rowsRead : made).toEqual({
      ok: false,
      problem: 'changing.csv was changed while it was read. Read it again when nobody writes to it.',
    });
  });
});
