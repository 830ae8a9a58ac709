import { withTable } from '../../shared-core/class/class-columns.ts';
import type { ClassStation } from '../../shared-core/class/class-contents.ts';
import type { ClassFile } from '../../shared-core/class/class-file.ts';
import { withAnswer } from '../../shared-core/class/class-questions.ts';
import { classStanding } from '../../shared-core/class/class-standing.ts';
import { newClass } from '../../shared-core/class/new-class.ts';
import { pastedRows } from '../../shared-core/class/pasted-rows.ts';
import { sortClass } from '../../shared-core/class/sorted-class.ts';
import type { FileHandle, OpenedClass } from '../../shared-core/desk.ts';
import { printOfClass } from '../../shared-core/pages/print-of-class.ts';
import type { DeskWire } from '../desk/desk-wire.ts';
import { ClassPress } from './class-press.svelte.ts';
import { Drawing } from './drawing.svelte.ts';
import { History } from './history.svelte.ts';
import { ListReading } from './list-reading.svelte.ts';
import { RunningJobs } from './running-jobs.svelte.ts';
import { takenFile } from './taken-file.ts';
import type { WorkFor } from './work-for.ts';

/** One open class: its choices and their history, where it is saved, and the work that runs for it. */
export class ClassWork {
  readonly #wire: DeskWire;
  readonly #workFor: WorkFor<ClassFile>;
  readonly #jobs: RunningJobs;
  readonly #history: History<ClassFile>;
  #handle: FileHandle | null;
  /** The class as its file holds it, or as it began. */
  #kept = $state.raw<ClassFile | null>(null);

  station = $state<ClassStation>('table');
  /** Name of its file; null where it was never saved. */
  fileName = $state<string | null>(null);
  /** When it was saved last in this window, milliseconds since 1970. */
  savedAt = $state<number | null>(null);
  problem = $state<string | null>(null);
  /** A list that was pasted or chosen and is not yet taken. */
  incoming = $state.raw<ListReading | null>(null);

  readonly report: Drawing<ClassFile>;
  readonly slips: Drawing<ClassFile>;
  readonly press: ClassPress;

  readonly sorted = $derived.by(() => sortClass(this.file));
  readonly printed = $derived.by(() => printOfClass(this.file));
  readonly standing = $derived.by(() => (this.file.table === null ? classStanding(this.file) : null));
  readonly open = $derived(this.sorted.questions.filter(({ answer }) => answer === null).length);

  /** A new class where none is opened. */
  constructor(wire: DeskWire, opened: OpenedClass | null) {
    this.#wire = wire;
    const fail = (problem: string): void => {
      this.problem = problem;
    };
    this.#jobs = new RunningJobs(wire, fail);
    const follow = (job: string, doing: string) => this.#jobs.follow(job, doing);
    this.#workFor = { wire, present: () => this.file, follow, fail };
    const first = opened?.class ?? newClass('', drawnSeed());
    this.#history = new History(first);
    this.#kept = first;
    this.#handle = opened?.handle ?? null;
    this.fileName = opened?.file ?? null;
    if (first.list.rows.length > 0) this.station = 'list';
    this.report = new Drawing(this.#workFor, (file) => wire.ask('draw-class', { class: file, what: 'report' }));
    this.slips = new Drawing(this.#workFor, (file) => wire.ask('draw-class', { class: file, what: 'slips' }));
    this.press = new ClassPress(this.#workFor);
  }

  get file(): ClassFile {
    return this.#history.present;
  }

  get work(): RunningJobs['work'] {
    return this.#jobs.work;
  }

  get canUndo(): boolean {
    return this.#history.canUndo;
  }

  get canRedo(): boolean {
    return this.#history.canRedo;
  }

  /** True where leaving would lose something: a class is kept nowhere but in its file. */
  get unsaved(): boolean {
    return this.file !== this.#kept;
  }

  /** Takes a choice: the next class, made from the present one. */
  choose(file: ClassFile): void {
    this.#history.push(file);
  }

  undo(): void {
    this.#history.undo();
  }

  redo(): void {
    this.#history.redo();
  }

  cancel(): Promise<void> {
    return this.#jobs.cancel();
  }

  /** Another order and other codes. */
  drawCodes(): void {
    this.choose({ ...this.file, sharing: { ...this.file.sharing, seed: drawnSeed() } });
  }

  /** The answer to a question; null opens it again. */
  answer(question: string, given: { readonly choice: string; readonly value: string } | null): void {
    const { answers } = this.file;
    const next =
      given === null
        ? answers.filter((known) => known.question !== question)
        : withAnswer(answers, { question, ...given });
    this.choose({ ...this.file, answers: next });
  }

  /** The table of a project or an edition: opens the host’s dialog, or takes what the page’s file field gave. */
  async tableFrom(file: File | null): Promise<void> {
    const handle = await takenFile(this.#workFor, file, 'project');
    if (handle !== null) await this.#tableOf(handle);
  }

  async sampleTable(): Promise<void> {
    await this.#tableOf(null);
  }

  async #tableOf(handle: FileHandle | null): Promise<void> {
    const table = await this.#wire.ask('class-table', { handle });
    if (table.ok) this.choose(withTable(this.file, table.value));
    else this.problem = table.problem;
  }

  /** Takes a list that was pasted, to be looked at before it is taken. */
  paste(text: string): void {
    this.incoming = new ListReading(pastedRows(text, null).rows, null);
  }

  /** The same of a file. */
  async listFrom(file: File | null): Promise<void> {
    const handle = await takenFile(this.#workFor, file, 'class-list');
    if (handle !== null) await this.lookAtList(handle, null);
  }

  async lookAtList(handle: FileHandle, sheet: string | null): Promise<void> {
    const listed = await this.#wire.ask('look-at-list', { handle, sheet });
    if (listed.ok) this.incoming = new ListReading(listed.value.rows, { handle, listed: listed.value });
    else this.problem = listed.problem;
  }

  /** Puts the list that is looked at in place of the one before; answers to the same questions stay. */
  takeList(): void {
    const list = this.incoming?.read.list ?? null;
    if (list === null) return;
    this.choose({ ...this.file, list });
    this.incoming = null;
  }

  /** True where it is in its file now. */
  async save(): Promise<boolean> {
    const { file } = this;
    const answer = await this.#wire.ask('save-class', {
      handle: this.#handle,
      name: file.title || 'Class',
      class: file,
    });
    if (!answer.ok) {
      this.problem = answer.problem;
      return false;
    }
    if (answer.value === null) return false;
    this.#handle = answer.value.handle;
    this.fileName = answer.value.file;
    this.savedAt = answer.value.at;
    this.problem = answer.value.remark;
    this.#kept = file;
    return true;
  }

  dismiss(): void {
    this.problem = null;
  }
}

/** Drawn, not chosen, so that codes cannot be guessed from it: a whole number below 2^53. */
function drawnSeed(): number {
  const [high = 0, low = 0] = crypto.getRandomValues(new Uint32Array(2));
  return (high % 2 ** 21) * 2 ** 32 + low;
}
