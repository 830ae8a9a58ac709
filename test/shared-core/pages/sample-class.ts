import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import type { MissedStatus } from '../../../shared-core/class/class-list.ts';
import type { ClassResults, PupilResult } from '../../../shared-core/class/class-results.ts';
import { classTableOfSet } from '../../../shared-core/class/class-table-of-set.ts';
import type { ClassTable } from '../../../shared-core/class/class-table.ts';
import { ENGLISH_LANGUAGE } from '../../../shared-core/norms/sheet-schema.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { ClassPrint } from '../../../shared-core/pages/class-print.ts';
import { rankPlace } from '../../../shared-core/pages/class-print.ts';
import { sampleNormSet, WHOLE_SCALE } from './sample-norm-set.ts';

/** Invented names of an invented place. */
export const NAMES: readonly string[] = [
  'Mira Halvorsen', 'Tomas Wren', 'Ida Castellan', 'Jonas Okoro', 'Lena Bramble', 'Piet van Oord', 'Sana Iqbal',
  'Noor El Amin', 'Anselm Grütter', 'Béatrice Lacombe', 'Óscar Peralta', 'Žofie Malá', 'Kofi Ansah', 'Wilma Treloar',
  'Emil Stroud', 'Rosa Quill', 'Hana Sorensen', 'Luca Fenwick', 'Ada Ormerod', 'Bruno Tarrant', 'Clara Vesely',
  'Dara Nwosu', 'Edda Lindqvist', 'Finn Abernathy', 'Greta Hollis', 'Hugo Marchbanks', 'Ines Duarte', 'Jasper Coyle',
  'Karim Sabry', 'Lotte Engel', 'Maya Thorne',
];

export function sampleTable(change: (project: NormProject) => NormProject = (project) => project): ClassTable {
  const made = classTableOfSet(
    sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5'] }, (project) =>
      change({
        ...project,
        precision: { ...project.precision, reliability: 0.88 },
        table: { ...project.table, columns: ['measurement-band', 'stanine'] },
      }),
    ),
    'project',
  );
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

export interface SampleClass {
  readonly scores: readonly number[];
  readonly names?: readonly string[];
  readonly missed?: readonly MissedStatus[];
  readonly groups?: readonly string[];
  readonly table?: ClassTable;
  readonly file?: Partial<ClassPrint['file']>;
  readonly open?: readonly string[];
}

export function sampleClass({ scores, names = NAMES, missed = [], groups = [], table = sampleTable(), file = {}, open = [] }: SampleClass): ClassPrint {
  const nameAt = (index: number): string => names[index] ?? `${NAMES[index % NAMES.length] ?? ''} ${index}`;
  const row = (index: number, scoreText: string): PupilResult['row'] => ({
    line: index + 2, name: nameAt(index), code: '', scoreText, group: groups[index % Math.max(1, groups.length)] ?? '', statusText: '',
  });
  const of = table.groups.at(-1);
  if (of === undefined) throw new Error('no group');
  const pupils = scores.map((score, index): PupilResult => {
    const found = of.rows.find(({ low, high }) => low <= score && score <= high);
    if (found === undefined) throw new Error('off the scale');
    const place = rankPlace(found);
    const quarter = place < 24.5 ? 1 : place < 49.5 ? 2 : place < 74.5 ? 3 : 4;
    return { index, row: row(index, String(score)), name: nameAt(index), group: groups[index % Math.max(1, groups.length)] ?? '', score, scoreText: String(score), corrected: false, table: of, found, quarter };
  });
  const sorted = [...scores].sort((a, b) => a - b);
  const at = (share: number): number => sorted[Math.round((sorted.length - 1) * share)] ?? 0;
  const five = [0, 0.25, 0.5, 0.75, 1].map(at) as [number, number, number, number, number];
  const gone = missed.map((status, place) => ({ index: scores.length + place, row: row(scores.length + place, ''), name: nameAt(scores.length + place), group: '', status }));
  const results: ClassResults = {
    table, pupils, missed: gone, leftOut: [],
    open: open.map((why, place) => { const index = scores.length + missed.length + place; return { index, row: row(index, '99'), name: nameAt(index), why }; }),
    counts: { rows: scores.length + missed.length + open.length, reported: scores.length, absent: missed.filter((m) => m === 'absent').length, notTested: missed.filter((m) => m === 'not-tested').length, excused: missed.filter((m) => m === 'excused').length, leftOut: 0, open: open.length },
    facts: {
      n: scores.length,
      fiveNumbers: scores.length === 0 ? null : five.map((n, i) => ({ name: String(i), printed: String(n) })),
      boxPlot: scores.length < 5 ? null : five,
      boxProblem: null,
      scores: [...new Set(sorted)].map((score) => ({ score, scoreText: String(score), count: sorted.filter((s) => s === score).length })),
      quarters: ([1, 2, 3, 4] as const).map((quarter) => ({ quarter, ranks: ['1–24', '25–49', '50–74', '75–99'][quarter - 1] ?? '', count: pupils.filter((p) => p.quarter === quarter).length })),
    },
    comparison: groups.length < 2 ? null : { hasNce: true, remarks: [], groups: groups.map((group) => ({ group, n: 3, median: '12', mean: '12.3', nceMean: null })) },
    check: '7F3A-91C2',
  };
  const standing: ClassPrint['file'] = {
    title: 'Class 5b', date: '2026-06-12', people: 'pupils',
    report: { paper: 'a4', sort: 'list', columns: ['measurement-band', 'stanine'], language: ENGLISH_LANGUAGE },
    slips: { paper: 'a4', perPage: 2, language: ENGLISH_LANGUAGE, texts: [] },
    sharing: { as: 'names', seed: 7 },
  };
  return { file: { ...standing, ...file }, results, codes: [...scores, ...missed, ...open].map((_, index) => `K${((index * 37) % 89) + 10}`) };
}
void (null as unknown as ClassFile);
