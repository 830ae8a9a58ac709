import { describe, expect, it } from 'vitest';
import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import { usualNumbers } from '../../../shared-core/languages/number-format.ts';
import type { PlacedPages } from '../../../shared-core/pages/booklet.ts';
import { pupilsInOrder } from '../../../shared-core/pages/class-print.ts';
import { printOfClass } from '../../../shared-core/pages/print-of-class.ts';
import { slipBoxes } from '../../../shared-core/pages/slip-cuts.ts';
import { composeSlips, slipKey } from '../../../shared-core/pages/slip-pages.ts';
import { checkPages, inkOf, linesOn, meet, textOf, textsOf } from './placed-checks.ts';
import { NAMES, SAMPLE_TABLE, sampleFile, sampleTable, spreadScores } from './sample-class.ts';

type PerPage = ClassFile['slips']['perPage'];

function printFor(file: ClassFile) {
  const made = printOfClass(file);
  if (!made.ok || made.value.kind !== 'report') throw new Error('no report');
  return made.value.print;
}

function slipsFor(file: ClassFile): PlacedPages {
  const made = composeSlips(printFor(file));
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

const withSlips = (file: ClassFile, slips: Partial<ClassFile['slips']>): ClassFile => ({
  ...file,
  slips: { ...file.slips, ...slips },
});

/** As chosen, or as the remark says. */
function perPageOf(file: ClassFile, { remarks }: PlacedPages): PerPage {
  const fewer = /; ([123]) stands? on each/.exec(remarks[0] ?? '')?.[1];
  return ([1, 2, 3] as const).find((count) => String(count) === fewer) ?? file.slips.perPage;
}

/** Every slip whole in its own box, in order; no cut through a text. */
function check(file: ClassFile): void {
  const placed = slipsFor(file);
  const perPage = perPageOf(file, placed);
  const pupils = pupilsInOrder(printFor(file));
  checkPages(placed, 0);
  expect(placed.pages).toHaveLength(Math.ceil(pupils.length / perPage));
  const boxes = slipBoxes(perPage, placed.paper);
  pupils.forEach((pupil, index) => {
    const page = placed.pages.findIndex((each) => linesOn(each).some((line) => belongs(line.role, index)));
    const elsewhere = placed.pages.filter(
      (each, at) => at !== page && linesOn(each).some((line) => belongs(line.role, index)),
    );
    expect(elsewhere).toEqual([]);
    const lines = linesOn(placed.pages[page] ?? { number: 0, opens: null, blocks: [] }).filter((line) =>
      belongs(line.role, index),
    );
    const head = lines.filter(({ role }) => role.kind === 'heading' && role.name === `${slipKey(index)} name`);
    expect(head.map(textOf).join('').replace(/\s/g, '')).toBe(pupil.name.replace(/\s/g, ''));
    const box = boxes[index % boxes.length];
    if (box === undefined) throw new Error('no box');
    for (const line of lines) {
      const { left, right, top, bottom } = inkOf(line);
      expect(left).toBeGreaterThanOrEqual(box.x - 0.01);
      expect(right).toBeLessThanOrEqual(box.x + box.width + 0.01);
      expect(top).toBeGreaterThanOrEqual(box.y - 0.01);
      expect(bottom).toBeLessThanOrEqual(box.y + box.height + 2);
    }
  });
  for (const page of placed.pages) {
    const [texts, rules] = [linesOn(page), page.blocks.filter((block) => block.kind === 'rule')];
    for (const rule of rules)
      for (const line of texts) expect(meet(inkOf(rule), inkOf(line)), textOf(line)).toBe(false);
  }
}

const belongs = (role: { readonly kind: string }, index: number): boolean => {
  const name = 'name' in role ? String(role.name) : 'table' in role ? String(role.table) : '';
  return name.startsWith(`${slipKey(index)} `);
};

const textOfSlip = (file: ClassFile, index: number): string =>
  slipsFor(file)
    .pages.flatMap(linesOn)
    .filter(({ role }) => belongs(role, index))
    .map(textOf)
    .join(' ');

describe('composeSlips', () => {
  it.each([1, 2, 3, 4] as const)('sets %i to a page of A4 and Letter, each whole between its cuts', (perPage) => {
    for (const paper of ['a4', 'letter'] as const) {
      const file = withSlips(sampleFile({ entries: spreadScores(9) }), { perPage, paper });
      check(file);
      expect(slipsFor(file).remarks).toEqual([]);
    }
  });

  it('sets fewer to a small page, and says so', () => {
    const file = withSlips(sampleFile({ entries: spreadScores(9) }), { perPage: 4, paper: 'a5' });
    check(file);
    expect(perPageOf(file, slipsFor(file))).toBe(2);
    expect(slipsFor(file).remarks[0]).toContain('4 slips do not fit on a page of this paper');
  });

  it.each([1, 2, 5, 28, 31, 400])('makes one for each of %i pupils, and none for the absent', (count) => {
    const file = sampleFile({ entries: [...spreadScores(count), 'absent', 'excused'] });
    check(withSlips(file, { perPage: 4 }));
  });

  it('says that there is none where nobody has a result', () => {
    expect(composeSlips(printFor(sampleFile({ entries: ['absent'] })))).toEqual({
      ok: false,
      problem: expect.stringContaining('Nobody in the list has a score') as string,
    });
  });

  it('never divides a slip with a long name', () => {
    for (const perPage of [1, 2, 3, 4] as PerPage[]) {
      check(withSlips(sampleFile({ entries: [3, 20, 39], names: ['x'.repeat(200), 'Ω Ω'.repeat(60)] }), { perPage }));
    }
  });

  it('says exactly what the table says', () => {
    const file = sampleFile({ entries: [18, 0, 40] });
    const { pupils } = printFor(file).results;
    const [middle, low, high] = pupils.map(({ found }) => found);
    const text = textOfSlip(file, 0);
    expect(text).toContain(`${NAMES[0] ?? ''} reached a score of 18 on a scale from 0 to\u00a040.`);
    expect(text).toContain(`about ${middle?.printed ?? ''} scored lower: this is the percentile rank.`);
    expect(text).toContain('(Of those with exactly the same score, half are counted as lower.)');
    expect(text).toContain(
      `The band, ${(middle?.band?.text ?? '').replace('–', ' to ')}, allows for this: for about 95 out of every 100 pupils`,
    );
    expect(low?.printed).toBe('<1');
    expect(textOfSlip(file, 1)).toContain('fewer than 1 scored lower');
    expect(textOfSlip(file, 1)).toContain('The ring stands for a percentile rank beyond the end of the scale.');
    expect(high?.printed).toBe('>99');
    expect(textOfSlip(file, 2)).toContain('more than 99 scored lower');
  });

  it.each([
    ['midpoint', 'half are counted as lower'],
    ['at-or-below', 'had the same score or scored lower'],
    ['below', 'scored lower: this is the percentile rank.'],
    ['plotting-position', 'are counted in part'],
    ['grouped', 'or one close to it, are counted in part'],
    ['unknown', 'is not known'],
  ] as const)('follows the definition %s', (definitionKind, words) => {
    const file = sampleFile({ entries: [18] }, { table: { ...SAMPLE_TABLE, definitionKind } });
    expect(textOfSlip(file, 0)).toContain(words);
    if (definitionKind === 'below') expect(textOfSlip(file, 0)).not.toContain('same score');
  });

  it('turns the sentence where a low score is good', () => {
    const scale = { ...SAMPLE_TABLE.scale, direction: 'low-is-good' } as const;
    const text = textOfSlip(sampleFile({ entries: [18] }, { table: { ...SAMPLE_TABLE, scale } }), 0);
    expect(text).toContain('On this test a low score is good.');
    expect(text).toContain('scored higher');
    expect(text).not.toContain('scored lower');
  });

  it('has no band and says why not where the table gives no reliability', () => {
    const table = sampleTable((project) => ({ ...project, precision: { ...project.precision, reliability: null } }));
    const text = textOfSlip(sampleFile({ entries: [18] }, { table }), 0);
    expect(text).toContain('How much is not known of this test.');
    expect(text).not.toMatch(/band|bar/i);
  });

  it('says of a rank set by hand that it was', () => {
    const groups = SAMPLE_TABLE.groups.map((group) => ({
      ...group,
      rows: group.rows.map((row) => (row.low === 18 ? { ...row, printed: '26†' } : row)),
    }));
    const text = textOfSlip(sampleFile({ entries: [18] }, { table: { ...SAMPLE_TABLE, groups } }), 0);
    expect(text).toContain('about 26 scored lower');
    expect(text).toContain('set this percentile rank by hand');
  });

  it('puts sentences of the user in place of the standing ones, and tells of those that cannot stand', () => {
    const own = [
      { key: 'slip.ask', text: 'Come and see us on Thursday.' },
      { key: 'slip.score', text: '{name}: {score} of {highest}, from {lowest}.' },
      { key: 'slip.group', text: 'No places.' },
    ];
    const file = withSlips(sampleFile({ entries: [18] }), { texts: own });
    const text = textOfSlip(file, 0);
    expect(text).toContain('Come and see us on Thursday.');
    expect(text).toContain(`${NAMES[0] ?? ''}: 18 of 40, from 0.`);
    expect(text).toContain('The score is compared with those of other pupils');
    expect(slipsFor(file).remarks.join(' ')).toContain('slip.group');
  });

  it('refuses sentences that fit no page', () => {
    const texts = [{ key: 'slip.ask', text: 'Too long. '.repeat(780) }];
    const made = composeSlips(printFor(withSlips(sampleFile({ entries: [18] }), { texts })));
    expect(made).toEqual({ ok: false, problem: expect.stringContaining('do not fit a page') as string });
  });

  it('speaks German, Spanish and French', () => {
    for (const words of ['de', 'es', 'fr'] as const) {
      const language = { tag: words, words, numbers: usualNumbers(words), phrases: [] };
      for (const perPage of [1, 2, 3, 4] as PerPage[]) {
        const file = withSlips(sampleFile({ entries: [18, 0, 40] }), { language, perPage });
        check(file);
        expect(textsOf(slipsFor(file)).join(' ')).not.toMatch(/\b(the|percentile rank|score of|scored)\b/);
      }
    }
  });

  it('holds no name under codes', () => {
    const file: ClassFile = { ...sampleFile({ entries: spreadScores(31) }), sharing: { as: 'codes', seed: 3 } };
    const everything = JSON.stringify(slipsFor(file));
    for (const name of NAMES)
      for (const part of name.split(' ')) if (part.length > 3) expect(everything).not.toContain(part);
  });

  it('names no pupil in its title and calls nobody anything', () => {
    const placed = slipsFor(sampleFile({ entries: spreadScores(28) }));
    expect(placed.title).toBe('Class 5b · Slips');
    const texts = textsOf(placed).join(' ');
    expect(texts).not.toMatch(/average pupil|below average|above average|weak|strong|gifted|poor|excellent|good at/i);
  });
});
