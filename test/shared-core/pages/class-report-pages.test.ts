import { describe, expect, it } from 'vitest';
import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import type { PlacedPages } from '../../../shared-core/pages/booklet.ts';
import { pupilsInOrder, type ClassPrint } from '../../../shared-core/pages/class-print.ts';
import { printOfClass, reportPages } from '../../../shared-core/pages/print-of-class.ts';
import { usualNumbers } from '../../../shared-core/languages/number-format.ts';
import { checkPages, linesOn, textOf, textsOf } from './placed-checks.ts';
import { NAMES, printOf, SAMPLE_TABLE, sampleFile, sampleTable, spreadScores } from './sample-class.ts';

function pagesOf(file: ClassFile): { readonly print: ClassPrint; readonly placed: PlacedPages } {
  const made = printOfClass(file);
  if (!made.ok || made.value.kind !== 'report') throw new Error('no report');
  return { print: made.value.print, placed: reportPages(made.value) };
}

/** The texts of the cells of the pupils' table by row and column, lines of a cell together. */
function cellsIn(placed: PlacedPages): ReadonlyMap<string, string> {
  const cells = new Map<string, string>();
  for (const line of placed.pages.flatMap(linesOn)) {
    const { role } = line;
    if (role.kind !== 'cell' || role.table !== 'pupils' || role.row === 'head') continue;
    const key = `${role.row} ${role.column}`;
    cells.set(key, `${cells.get(key) ?? ''}${textOf(line)}`);
  }
  return cells;
}

const bare = (text: string): string => text.replace(/\s/g, '');

/** What must hold for every report: each pupil once, in order, with the texts of the table; heads and feet on every page. */
function check(file: ClassFile): PlacedPages {
  const { print, placed } = pagesOf(file);
  checkPages(placed);
  const { results } = print;
  const pupils = pupilsInOrder(print);
  const cells = cellsIn(placed);
  expect([...cells.keys()].filter((key) => key.endsWith(' 0'))).toHaveLength(pupils.length);
  pupils.forEach((pupil, row) => {
    const printed = Array.from({ length: 8 }, (_, column) => cells.get(`${row} ${column}`) ?? '').map(bare);
    const label = file.sharing.as === 'codes' ? (print.codes[pupil.index] ?? '') : pupil.name;
    expect(printed[0]).toBe(bare(label));
    expect(printed.join('|')).toContain(
      `|${pupil.scoreText}|${pupil.found.printed}|${pupil.found.texts['measurement-band'] ?? ''}|`,
    );
  });
  const total = placed.pages.length;
  for (const page of placed.pages) {
    const texts = linesOn(page).map(textOf);
    expect(texts).toContain(`page ${page.number} of ${total}`);
    expect(texts.join(' ')).toContain(`report check ${results.check}`);
    expect(texts.join(' ')).toContain(`table check ${SAMPLE_TABLE.check}`);
    const hasRows = linesOn(page).some(({ role }) => role.kind === 'cell' && role.table === 'pupils');
    if (hasRows) expect(texts.filter((text) => text === 'rank')).toHaveLength(1);
  }
  return placed;
}

const PAPERS = ['a4', 'letter', 'a5'] as const;

const onPaper = (file: ClassFile, paper: (typeof PAPERS)[number]): ClassFile => ({
  ...file,
  report: { ...file.report, paper },
});

describe('composeClassReport', () => {
  it.each([1, 2, 5, 28, 31, 400])('prints each of %i pupils once, on any paper, by name or code', (count) => {
    const file = sampleFile({ entries: spreadScores(count) });
    for (const paper of PAPERS) {
      check(onPaper(file, paper));
      check(onPaper({ ...file, sharing: { as: 'codes', seed: 5 } }, paper));
    }
  });

  it('takes two pages for 28 pupils with three absent, and one for a small class', () => {
    expect(check(sampleFile({ entries: [...spreadScores(28), 'absent', 'absent', 'absent'] })).pages).toHaveLength(2);
    expect(check(sampleFile({ entries: spreadScores(4) })).pages).toHaveLength(1);
  });

  it.each(['list', 'name', 'score', 'rank', 'group'] as const)('is sorted by %s', (sort) => {
    const file = sampleFile({ entries: spreadScores(28), groups: ['b', 'a'] });
    const sorted = { ...file, report: { ...file.report, sort } };
    check(sorted);
    const { print } = pagesOf(sorted);
    const pupils = pupilsInOrder(print);
    const next = pupils.slice(1).map((pupil, index) => [pupils[index], pupil] as const);
    for (const [before, after] of next) {
      if (before === undefined) continue;
      if (sort === 'list') expect(before.index).toBeLessThan(after.index);
      if (sort === 'score') expect(before.score).toBeGreaterThanOrEqual(after.score);
      if (sort === 'group') expect(before.group <= after.group).toBe(true);
    }
    if (sort === 'name') {
      expect(pupils.map(({ name }) => name).slice(0, 3)).toEqual(['Ada Ormerod', 'Anselm Grütter', 'Béatrice Lacombe']);
      expect(pupils.at(-1)?.name).toBe('Žofie Malá');
    }
  });

  it('has no place for nobody, and says so', () => {
    for (const entries of [[], ['absent', 'absent', 'excused']]) {
      const placed = check(sampleFile({ entries }));
      expect(textsOf(placed).join(' ')).toContain('Nobody in the list has a score that can be reported.');
      expect(placed.pages).toHaveLength(1);
    }
  });

  it('tells the table of each where several were looked up in', () => {
    const texts = textsOf(check(sampleFile({ entries: spreadScores(12), groups: ['4', '5'] })));
    expect(texts.filter((text) => text === 'Grade 4')).toHaveLength(6);
    expect(texts.filter((text) => text === 'Grade 5')).toHaveLength(6);
  });

  it('draws a class that all have the same score', () => {
    for (const count of [2, 5, 28]) check(sampleFile({ entries: Array.from({ length: count }, () => 20) }));
  });

  it('breaks long names into lines, and never cuts one', () => {
    const long = [
      'x'.repeat(200),
      'Maximiliana-Theodora von und zu '.repeat(6).trim(),
      'Ω'.repeat(200),
      'W W '.repeat(50),
    ];
    for (const paper of PAPERS) {
      const file = sampleFile({
        entries: spreadScores(9),
        names: long,
        groups: ['a group with a long name '.repeat(6)],
      });
      check(onPaper(file, paper));
    }
  });

  it('prints a name that begins with "=" as that name', () => {
    const placed = check(sampleFile({ entries: [12, 13], names: ['=1+1', '=HYPERLINK("x")'] }));
    expect(textsOf(placed)).toContain('=1+1');
    expect(textsOf(placed)).toContain('=HYPERLINK("x")');
  });

  it('names everybody who has no result, with the reason', () => {
    const entries = [...spreadScores(20), 'absent', 'not tested', 'excused', 'unwell?'];
    const texts = textsOf(check(sampleFile({ entries }))).join(' ');
    expect(texts).toContain(`Absent (1): ${NAMES[20] ?? ''}.`);
    expect(texts).toContain(`Not tested (1): ${NAMES[21] ?? ''}.`);
    expect(texts).toContain(`Excused (1): ${NAMES[22] ?? ''}.`);
    expect(texts).toContain(`Not yet answered (1): ${NAMES[23] ?? ''}`);
  });

  it('holds no name anywhere under codes, not in alternatives of pictures, titles or roles either', () => {
    const entries = [...spreadScores(28), 'absent', 'excused', 'what?'];
    const file = sampleFile({ entries });
    const placed = check({ ...file, sharing: { as: 'codes', seed: 11 } });
    const everything = JSON.stringify(placed);
    for (const name of NAMES)
      for (const part of name.split(' ')) if (part.length > 3) expect(everything).not.toContain(part);
    const codes = cellsIn(placed);
    const order = Array.from({ length: 28 }, (_, row) => codes.get(`${row} 0`) ?? '');
    expect(order).toEqual(order.toSorted());
  });

  it('says in the picture for those who do not see it what stands beside it', () => {
    const file = sampleFile({ entries: [0, 20, 40] });
    const { print, placed } = pagesOf(file);
    const chart = placed.pages.flatMap(({ blocks }) => blocks).find((block) => block.kind === 'picture');
    expect(chart?.alt).toContain('Percentile ranks and bands on one scale from 1 to 99.');
    const [first, second] = print.results.pupils;
    expect(chart?.alt).toContain(
      `${NAMES[0] ?? ''}: below 1, band ${(first?.found.band?.text ?? '').replace('<', 'below ')}.`,
    );
    expect(chart?.alt).toContain(
      `${NAMES[1] ?? ''}: ${second?.found.printed ?? ''}, band ${(second?.found.band?.text ?? '').replace('–', ' to ')}.`,
    );
  });

  it('leaves the band out where the table gives no reliability, and says so', () => {
    const table = sampleTable((project) => ({ ...project, precision: { ...project.precision, reliability: null } }));
    const { placed } = pagesOf(sampleFile({ entries: spreadScores(28) }, { table }));
    checkPages(placed);
    const texts = textsOf(placed);
    expect(texts.join(' ')).toContain('No band is printed, because the table gives no reliability.');
    expect(texts).not.toContain('Band');
    const chart = placed.pages.flatMap(({ blocks }) => blocks).find((block) => block.kind === 'picture');
    expect(chart?.alt).toContain('Percentile ranks on one scale from 1 to 99.');
  });

  it('sets many columns smaller, and tells which it had no room for', () => {
    const keys = [
      'count',
      'cumulative',
      'exact-rank',
      'observed-rank',
      'interval',
      'standard-error',
      'z',
      't',
      'nce',
      'deviation',
      'sten',
      'stanine',
    ] as const;
    const table = sampleTable((project) => ({
      ...project,
      table: { ...project.table, columns: [...keys, 'measurement-band'] },
    }));
    for (const paper of PAPERS) {
      const file = sampleFile({ entries: spreadScores(28) }, { table });
      const { placed } = pagesOf({ ...file, report: { ...file.report, paper, columns: [...keys] } });
      checkPages(placed);
      expect(placed.remarks.length).toBeGreaterThan(0);
    }
  });

  it('speaks German, Spanish and French, with figures as they are written there', () => {
    for (const words of ['de', 'es', 'fr'] as const) {
      const language = { tag: words, words, numbers: usualNumbers(words), phrases: [] };
      const table = sampleTable((project) => ({
        ...project,
        table: { ...project.table, decimals: 1, columns: ['z'] },
      }));
      const file = sampleFile({ entries: [...spreadScores(28), 'absent'], groups: ['4', '5'] }, { table });
      for (const paper of PAPERS) {
        const { placed } = pagesOf({ ...file, report: { ...file.report, paper, language, columns: ['z'] } });
        checkPages(placed);
        const texts = textsOf(placed).join(' ');
        expect(texts).toMatch(/\d,\d/);
        expect(texts).not.toMatch(/percentile rank|\bpupils\b|\bthe\b/i);
      }
    }
  });

  it('marks a draft on every page', () => {
    const table = { ...SAMPLE_TABLE, draft: true };
    const { placed } = pagesOf(sampleFile({ entries: spreadScores(31) }, { table }));
    expect(placed.title.startsWith('DRAFT · ')).toBe(true);
    for (const page of placed.pages)
      expect(
        linesOn(page)
          .map(textOf)
          .some((text) => text.startsWith('DRAFT')),
      ).toBe(true);
  });

  it('is the same for the same class', () => {
    const file = sampleFile({ entries: spreadScores(28) });
    expect(reportPages({ kind: 'report', print: printOf(file) })).toEqual(
      reportPages({ kind: 'report', print: printOf(file) }),
    );
  });
});
