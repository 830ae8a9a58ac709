import { describe, expect, it } from 'vitest';
import { BLOCK_KINDS, WHOLE_BOOKLET } from '../../../shared-core/norms/booklet-blocks.ts';
import { composeBooklet } from '../../../shared-core/pages/booklet-pages.ts';
import { printCount, printNumber, printShare } from '../../../shared-core/scores/printed-number.ts';
import { linesOn, textOf } from './placed-laws.ts';
import { cellsOf, documented, printing, source, textsOn, wordsOf, type Change } from './printed-blocks.ts';
import { LOG_LINEAR } from './sample-norm-set.ts';

describe('the title page', () => {
  it('tells what the booklet is, of whom, which edition, and whom it is for', () => {
    const words = wordsOf(composeBooklet(printing(['title-page'])), 'title-page');
    for (const told of ['Ostrey Vale reading survey (invented)', 'Form A', 'Grade 4 · Grade 5', 'Edition 1.0']) {
      expect(words).toContain(told);
    }
    expect(words).toContain('Date 2026-06-01');
    expect(words).toContain('Tables of a sample');
    expect(words).toContain('qualified');
    expect(words).not.toContain('Draft');
    const norms = composeBooklet(printing(['title-page'], {}, documented));
    expect(wordsOf(norms, 'title-page')).toContain('Norm tables');
  });
});

describe('the norm group', () => {
  it('is told by its documentation, or what of it is missing', () => {
    const whole = composeBooklet(printing(['norm-group'], {}, documented));
    expect(whole.pages[0]?.opens).toBe('The norm group');
    expect(wordsOf(whole, 'norm-group')).toContain('Population All of the vale. Sampling Nobody was chosen.');
    const bare = composeBooklet(printing(['norm-group']));
    expect(bare.pages[0]?.opens).toBe('The sample');
    expect(wordsOf(bare, 'norm-group')).toContain('how people were chosen');
  });

  it('is counted in a row for each group', () => {
    const normSet = printing(['norm-group'], { weighted: true, groups: ['4', '5', '6'] });
    const [heads, ...rows] = cellsOf(composeBooklet(normSet), 'numbers');
    expect(heads).toEqual(
      'Group|n|Effective n|Mean|SD|Lower quartile|Median|Upper quartile|At lowest|At highest'.split('|'),
    );
    expect(rows).toEqual(
      normSet.groups.map(({ group, summary }) => [
        group.title,
        printCount(summary.n),
        printNumber(summary.effectiveN, 1),
        printNumber(summary.mean, 1),
        printNumber(summary.sd ?? NaN, 1),
        ...summary.fiveNumbers.slice(1, 4).map(String),
        printShare(summary.shareAtLowest),
        printShare(summary.shareAtHighest),
      ]),
    );
  });

  it('is followed from the rows of the file, whose numbers add up', () => {
    const booklet = composeBooklet(printing(['norm-group'], {}, (project) => ({ ...project, source })));
    expect(cellsOf(booklet, 'rows')).toEqual([
      ['Rows', 'Number'],
      ['Read from reading.csv', '20\u202f000'],
      ['Left out: an identifier met before', '4'],
      ['Left out: a score above the scale', '6'],
      ['Kept', '19\u202f990'],
    ]);
    expect(wordsOf(booklet, 'norm-group')).toMatch(
      /Of those kept, \d+\u202f\d{3} stand in groups that have no table here/,
    );
  });
});

describe('how to read', () => {
  it('takes its example from the first table', () => {
    const normSet = printing(['how-to-read']);
    const words = wordsOf(composeBooklet(normSet), 'how-to-read');
    const [, score = '', rank = ''] =
      /Table 1 · Grade 4, the raw score (\d+) has the percentile rank (\d+)\./.exec(words) ?? [];
    const row = normSet.groups[0]?.rows.find(({ scoreText }) => scoreText === score);
    if (row === undefined) throw new Error('no example');
    expect(rank).toBe(row.printed);
    expect(words).toContain(`${row.texts['exact-rank']} per cent, printed as\u00a0${rank}.`);
    expect(words).toContain(`stanine ${row.texts.stanine} and T score ${row.texts.t}`);
    expect(words.replaceAll('\u202f', '')).toContain(
      `Of ${row.provenance.percentileRank.all} pupils, ${row.provenance.percentileRank.below} had a lower score and ${row.count} this`,
    );
    const away = Math.abs(row.percentileRank - 60);
    for (const other of normSet.groups[0]?.rows ?? []) {
      expect(Math.abs(other.percentileRank - 60)).toBeGreaterThanOrEqual(away);
    }
  });

  it('says what stands at the ends, and that low scores are good where they are', () => {
    const low = printing(['how-to-read'], { direction: 'low-is-good' }, (project) => ({
      ...project,
      table: { ...project.table, ends: 'held', decimals: 1 },
    }));
    const words = wordsOf(composeBooklet(low), 'how-to-read');
    expect(words).toContain('a low raw score is the good one');
    expect(words).toContain('had a higher score');
    expect(words).toContain('below 0.1 are printed as 0.1, and those above 99.9 as 99.9');
    expect(wordsOf(composeBooklet(printing(['how-to-read'])), 'how-to-read')).toContain('<1 is printed for a rank');
  });
});

describe('the technical notes', () => {
  const kinds = ['tables', 'norm-group', 'technical-notes'] as const;

  it('stand once, and no longer beside each table', () => {
    const smoothed: Change = (project) => ({ ...project, curve: { ...project.curve, smoothing: LOG_LINEAR } });
    const beside = composeBooklet(printing(['tables'], {}, (project) => smoothed(documented(project))));
    const apart = composeBooklet(printing(kinds, {}, (project) => smoothed(documented(project))));
    for (const [booklet, here] of [
      [beside, true],
      [apart, false],
    ] as const) {
      const words = wordsOf(booklet, 'tables');
      expect(words.includes('Method.')).toBe(here);
      expect(words.includes('Nobody was chosen.')).toBe(here);
      expect(words.includes('Technical notes on the smoothing')).toBe(here);
      expect(words).toContain('Norm group. ');
    }
    const notes = wordsOf(apart, 'technical-notes');
    expect(notes).toContain('Fit of the smoothing: Grade 4');
    expect(notes).toContain('Fit of the smoothing: Grade 5');
    expect(notes).not.toContain('One row worked out by hand');
  });

  it('work out a row of the first group that is not smoothed', () => {
    const normSet = printing(['technical-notes'], { groups: ['4', '5', '6'] }, (project) => ({
      ...project,
      curve: {
        ...project.curve,
        smoothing: { ...LOG_LINEAR, degree: 2 },
        exceptions: [{ values: ['5'], smoothing: { kind: 'none' } }],
      },
    }));
    const notes = wordsOf(composeBooklet(normSet), 'technical-notes');
    expect(notes).toContain('one raw score of Table 2 · Grade 5, from the tally alone');
    expect(notes).toContain('Grade 4 and Grade 6:');
    expect(notes).toMatch(/6 The table prints \d+\./);
  });
});

describe('the change list', () => {
  it('names the earlier edition and its lines, or says that none was compared', () => {
    const changes = { edition: '0.9', date: '2025-06-01', check: 'AAAA-BBBB', lines: ['Grade 4', '  raw 3: 2 → 3'] };
    const compared = composeBooklet(
      printing(['change-list'], {}, (project) => ({ ...project, release: { ...project.release, changes } })),
    );
    const words = wordsOf(compared, 'change-list');
    expect(words).toContain(
      'Compared with edition 0.9 of 2025-06-01. Its check code is AAAA-BBBB. Grade 4 raw 3: 2 → 3',
    );
    const [group, row] = compared.pages.flatMap(linesOn).filter((line) => /^(Grade 4|raw 3)/.test(textOf(line)));
    expect((row?.x ?? 0) - (group?.x ?? 0)).toBeGreaterThan(5);
    expect(wordsOf(composeBooklet(printing(['change-list'])), 'change-list')).toContain(
      'No earlier edition was compared',
    );
  });
});

describe('the colophon', () => {
  it('tells where the numbers come from, who signed, and how to verify', () => {
    const normSet = printing(['colophon'], {}, (project) => ({
      ...project,
      source,
      release: { ...project.release, analyst: 'Ida Marsh' },
    }));
    const words = wordsOf(composeBooklet(normSet, '9.8.7'), 'colophon');
    for (const told of [
      'Edition 1.0',
      'Date 2026-06-01',
      'Status released',
      'Prepared by Ida Marsh',
      'Checked by not signed',
      'Source reading.csv, 178\u202f259 bytes',
      `SHA-256 ${source.sha256}`,
      'Rows 20\u202f000 read, 19\u202f990 kept, 10 left out',
      'Definition midpoint',
      `Check code ${normSet.check}.`,
      'normloom read-back booklet.pdf',
      'Program Normloom 9.8.7',
      'SIL Open Font License',
    ]) {
      expect(words).toContain(told);
    }
    expect(wordsOf(composeBooklet(normSet), 'colophon')).toContain('Program Normloom Typefaces');
  });
});

describe('the pictures', () => {
  it('show the ogive of each group, two to a page, each with its words', () => {
    for (const orientation of ['portrait', 'landscape'] as const) {
      const normSet = printing(['pictures'], { groups: ['4', '5', '6', '7'] }, (project) => ({
        ...project,
        sheet: { ...project.sheet, orientation },
      }));
      const { pages } = composeBooklet(normSet);
      const ogives = pages.map(
        ({ blocks }) => blocks.filter((block) => block.kind === 'picture' && block.alt.startsWith('Cumulative')).length,
      );
      expect(ogives.slice(0, 2)).toEqual([2, 2]);
      const captions = pages.flatMap(textsOn).filter((text) => /^Table \d · Grade \d\. Cumulative/.test(text));
      expect(captions).toHaveLength(4);
    }
  });

  it('draw the boxes of all groups on one scale, their numbers beside them', () => {
    const normSet = printing(['pictures'], { groups: ['4', '5', '6'] });
    const booklet = composeBooklet(normSet);
    const [heads, ...rows] = cellsOf(booklet, 'five numbers');
    expect(heads).toEqual(['Group', 'Lowest', 'Lower hinge', 'Median', 'Upper hinge', 'Highest']);
    expect(rows).toEqual(
      normSet.groups.map(({ group, summary }) => [
        group.title,
        ...summary.fiveNumbers.map((number) => printNumber(number, Number.isInteger(number) ? 0 : 1)),
      ]),
    );
    const page = booklet.pages.at(-1);
    const picture = page?.blocks.find((block) => block.kind === 'picture' && block.alt.startsWith('Box plots'));
    if (page === undefined || picture?.kind !== 'picture') throw new Error('no boxes');
    expect(picture.alt).toContain('Grade 4, Grade 5 and Grade 6 on one scale from 0 to 40');
    // The axis: half a step beyond either end of the scale, five points from either edge.
    const x = (score: number): number => 5 + ((score + 0.5) * (picture.width - 10)) / 41;
    const boxes = [
      ...picture.svg.matchAll(/<path d="M([\d.]+) ([\d.]+)L([\d.]+) [\d.]+L[\d.]+ ([\d.]+)L[\d.]+ [\d.]+Z"/g),
    ];
    expect(boxes).toHaveLength(3);
    boxes.forEach(([, left, top, right, bottom], index) => {
      const five = normSet.groups[index]?.summary.fiveNumbers;
      expect(Number(left)).toBeCloseTo(x(five?.[1] ?? NaN), 1);
      expect(Number(right)).toBeCloseTo(x(five?.[3] ?? NaN), 1);
      const name = linesOn(page).find((line) => textOf(line) === normSet.groups[index]?.group.title);
      expect(Math.abs(picture.y + (Number(top) + Number(bottom)) / 2 - (name?.baseline ?? 0))).toBeLessThan(4);
    });
  });

  it('print the numbers below the boxes where the page is narrow', () => {
    const normSet = printing(['pictures'], {}, (project) => ({
      ...project,
      sheet: { ...project.sheet, paper: 'a5', marginMm: 29 },
    }));
    const [heads, ...rows] = cellsOf(composeBooklet(normSet), 'five numbers');
    expect(heads).toHaveLength(6);
    expect(rows).toHaveLength(2);
  });
});

describe('the whole booklet of a set', () => {
  it('prints every standing block of WHOLE_BOOKLET under its heading', () => {
    expect(WHOLE_BOOKLET.map(({ kind }) => kind)).toEqual(BLOCK_KINDS);
    const booklet = composeBooklet(printing(BLOCK_KINDS, {}, (project) => documented({ ...project, source })));
    const opened = booklet.pages.flatMap(({ opens }) => (opens === null ? [] : [opens]));
    expect(opened).toEqual([
      'Ostrey Vale reading survey (invented)',
      'Contents',
      'The norm group',
      'How to read the tables',
      'Table 1 · Grade 4',
      'Table 2 · Grade 5',
      'All groups side by side',
      'From percentile rank to raw score',
      'Pictures',
      'Technical notes',
      'Cautions',
      'Changes',
      'Colophon',
    ]);
  });
});
