import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import { classResults } from '../../../shared-core/class/class-results.ts';
import { classTableOfSet } from '../../../shared-core/class/class-table-of-set.ts';
import type { ClassTable } from '../../../shared-core/class/class-table.ts';
import { newClass } from '../../../shared-core/class/new-class.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { ClassPrint } from '../../../shared-core/pages/class-print.ts';
import { sampleNormSet, WHOLE_SCALE } from './sample-norm-set.ts';

/** Invented names of an invented place. */
export const NAMES: readonly string[] =
  'Mira Halvorsen,Tomas Wren,Ida Castellan,Jonas Okoro,Lena Bramble,Piet van Oord,Sana Iqbal,Noor El Amin,Anselm Grütter,Béatrice Lacombe,Óscar Peralta,Žofie Malá,Kofi Ansah,Wilma Treloar,Emil Stroud,Rosa Quill,Hana Sorensen,Luca Fenwick,Ada Ormerod,Bruno Tarrant,Clara Vesely,Dara Nwosu,Edda Lindqvist,Finn Abernathy,Greta Hollis,Hugo Marchbanks,Ines Duarte,Jasper Coyle,Karim Sabry,Lotte Engel,Maya Thorne'.split(
    ',',
  );

/** Tables of grades 4 and 5 on whole scores from 0 to 40, with a reliability: invented. */
export function sampleTable(change: (project: NormProject) => NormProject = (project) => project): ClassTable {
  const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5'] }, (project) =>
    change({
      ...project,
      precision: { ...project.precision, reliability: 0.88 },
      table: { ...project.table, columns: ['measurement-band', 'stanine'] },
    }),
  );
  const made = classTableOfSet(normSet, 'project');
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

/** Made once: it is the same for every class. */
export const SAMPLE_TABLE = sampleTable();

/** The table of grade 5 alone, beside which a list may name groups of its own. */
export const UNGROUPED_TABLE: ClassTable = {
  ...SAMPLE_TABLE,
  groupColumns: [],
  groups: SAMPLE_TABLE.groups.slice(1).map((group) => ({ ...group, values: [] })),
};

export interface SampleClass {
  /** A score for each, or a text: "absent", "excused", or what does not fit. */
  readonly entries: readonly (number | string)[];
  /** Names of the first; the others have those of the invented place. */
  readonly names?: readonly string[];
  /** Groups in turn. */
  readonly groups?: readonly string[];
}

/** A class of grade 5 whose members have different names. */
export function sampleFile(
  { entries, names = [], groups = [''] }: SampleClass,
  more: Partial<ClassFile> = {},
): ClassFile {
  const file = newClass('Class 5b', 20260612);
  return {
    ...file,
    date: '2026-06-12',
    ...(groups.every((group) => group === '' || group === '4' || group === '5')
      ? { table: SAMPLE_TABLE, group: ['5'] }
      : { table: UNGROUPED_TABLE, group: null }),
    report: { ...file.report, columns: ['stanine'] },
    list: {
      decimalMark: '.',
      rows: entries.map((entry, index) => ({
        line: index + 2,
        name: names[index] ?? nameOf(index),
        code: '',
        scoreText: typeof entry === 'number' ? String(entry) : '',
        group: groups[index % groups.length] ?? '',
        statusText: typeof entry === 'number' ? '' : entry,
      })),
    },
    ...more,
  };
}

function nameOf(index: number): string {
  const round = Math.floor(index / NAMES.length);
  const name = NAMES[index % NAMES.length] ?? '';
  return round === 0 ? name : `${name} ${'ABCDEFGHIJKLMNOPQRSTUVWXYZ'.charAt(round)}.`;
}

/** A class of so many with scores that lie all over the scale. */
export function spreadScores(count: number): readonly number[] {
  return Array.from({ length: count }, (_, place) => (place * 17 + ((place * place) % 7)) % 41);
}

export function printOf(file: ClassFile): ClassPrint {
  const built = classResults(file);
  if (!built.ok) throw new Error(built.problem);
  return { file, results: built.results, codes: [] };
}
