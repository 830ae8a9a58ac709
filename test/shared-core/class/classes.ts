import { classResults, type ClassResults } from '../../../shared-core/class/class-results.ts';
import type { ClassAnswer, ClassFile } from '../../../shared-core/class/class-file.ts';
import type { ClassListRow } from '../../../shared-core/class/class-list.ts';
import { classTableOfSet } from '../../../shared-core/class/class-table-of-set.ts';
import type { ClassTable } from '../../../shared-core/class/class-table.ts';
import { newClass } from '../../../shared-core/class/new-class.ts';
import { sortClass, type SortedClass } from '../../../shared-core/class/sorted-class.ts';
import type { ClassQuestion } from '../../../shared-core/class/class-questions.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { builtSet, settledProject } from '../norms/small-projects.ts';

/** A row as it is typed: name, score, group, status, code. */
export type Typed = readonly [string, string, string?, string?, string?];

export function typedRows(rows: readonly Typed[]): readonly ClassListRow[] {
  return rows.map(([name, scoreText, group = '', statusText = '', code = ''], index) => ({
    line: index + 1,
    name,
    code,
    scoreText,
    group,
    statusText,
  }));
}

export function tableOfProject(project: NormProject): ClassTable {
  const made = classTableOfSet(builtSet(project), 'project');
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

/** Grades 4 and 10, scores 0 to 20 spread evenly, reliability 0.9: invented. */
export function settledTable(more: Partial<NormProject> = {}): ClassTable {
  const project = settledProject();
  return tableOfProject({ ...project, precision: { ...project.precision, reliability: 0.9 }, ...more });
}

/** Made once: it is the same for every class. */
const SETTLED_TABLE = settledTable();

/** A class looked up in grade 4 unless a row says otherwise. */
export function classOf(rows: readonly Typed[], more: Partial<ClassFile> = {}): ClassFile {
  return {
    ...newClass('Class 4a (invented)', 7),
    table: SETTLED_TABLE,
    group: ['4'],
    list: { decimalMark: '.', rows: typedRows(rows) },
    ...more,
  };
}

/** The class with the question about some lines answered. */
export function answered(file: ClassFile, lines: readonly number[], choice: string, value = ''): ClassFile {
  const question = questionOn(file, lines);
  const answer: ClassAnswer = { question: question.id, choice, value };
  return { ...file, answers: [...file.answers, answer] };
}

export function questionOn(file: ClassFile, lines: readonly number[]): ClassQuestion {
  const asked = sortClass(file).questions;
  const question = asked.find((one) => one.lines.join() === lines.join() && one.answer === null);
  if (question === undefined) throw new Error(`nothing is asked about ${lines.join()}: ${JSON.stringify(asked)}`);
  return question;
}

/** What becomes of each row: a score, a status, "left-out" or "open". */
export function outcomes({ rows }: SortedClass): readonly (number | string)[] {
  return rows.map(({ outcome }) =>
    outcome.kind === 'scored' ? outcome.score : outcome.kind === 'missed' ? outcome.status : outcome.kind,
  );
}

export function resultsOf(file: ClassFile): ClassResults {
  const built = classResults(file);
  if (!built.ok) throw new Error(built.problem);
  return built.results;
}
