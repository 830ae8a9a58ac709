import type { CohortPreview, DrawnPages, FileHandle, OpenedProject, Pressed } from '../../shared-core/desk.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSetBuilt } from '../../shared-core/norms/norm-set.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { openQueries, type Query, type Station } from '../../shared-core/norms/queries.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { readTypedCounts, type LineProblem } from '../../shared-core/tally/typed-counts.ts';
import type { ScoreScale } from '../../shared-core/scale/score-scale.ts';
import { compute } from '../compute/compute.ts';
import type { DeskWire } from '../desk/desk-wire.ts';
import { ProjectHistory } from './history.svelte.ts';
import { followJob } from './run-job.ts';
import { nounFrom, titleFrom } from './names-from-file.ts';
import { withTally } from './with-tally.ts';

export interface RunningWork {
  readonly job: string;
  readonly doing: string;
  readonly progress: number;
}

export type SaveState =
  | { readonly kind: 'unsaved' }
  | { readonly kind: 'kept'; readonly at: number }
  | { readonly kind: 'saved'; readonly at: number };

const AUTOSAVE_AFTER_MS = 400;

/** One open project: its choices and their history, where it is saved, and the work that runs for it. */
export class Workspace {
  readonly #wire: DeskWire;
  readonly #draft: string;
  readonly #history: ProjectHistory;
  #autosave: ReturnType<typeof setTimeout> | null = null;

  station = $state<Station>('cohort');
  /** Key of the group looked at, at the stations that show one. */
  groupKey = $state<string | null>(null);
  file = $state<string | null>(null);
  saved = $state.raw<SaveState>({ kind: 'unsaved' });
  work = $state.raw<RunningWork | null>(null);
  problem = $state<string | null>(null);
  preview = $state.raw<CohortPreview | null>(null);
  pressed = $state.raw<Pressed | null>(null);
  drawn = $state.raw<DrawnPages | null>(null);
  cohort = $state<FileHandle | null>(null);
  /** The project that `drawn` shows. */
  drawnFor = $state.raw<NormProject | null>(null);
  #handle: FileHandle | null;
  #drawing: string | null = null;

  /** The norm set of the project, or of the one before it while the new one is being worked out. */
  built = $state.raw<NormSetBuilt>({ ok: false, problem: 'The tables are being worked out.' });
  /** The project that `built` belongs to. */
  builtFor = $state.raw<NormProject | null>(null);
  readonly groups: readonly GroupNorms[] = $derived(this.built.ok ? this.built.normSet.groups : []);
  readonly queries: readonly Query[] = $derived(this.built.ok ? this.built.normSet.queries : []);
  readonly open: readonly Query[] = $derived(openQueries(this.queries));
  readonly group: GroupNorms | null = $derived(
    this.groups.find(({ group }) => group.key === this.groupKey) ?? this.groups[0] ?? null,
  );

  constructor(wire: DeskWire, opened: OpenedProject) {
    this.#wire = wire;
    this.#draft = opened.draft;
    this.#history = new ProjectHistory(opened.project);
    this.#handle = opened.handle;
    this.file = opened.file;
    this.cohort = opened.cohort;
    if (opened.project.tally !== null) this.station = 'curve';
    void this.#build();
    if (opened.cohort !== null) void this.lookAgain();
  }

  get project(): NormProject {
    return this.#history.project;
  }

  get canUndo(): boolean {
    return this.#history.canUndo;
  }

  get canRedo(): boolean {
    return this.#history.canRedo;
  }

  /** Takes a choice: the next project, made from the present one. A changed reading reads the file again. */
  choose(project: NormProject): void {
    const before = this.project;
    this.#history.push(project);
    this.#changed();
    if (project.reading !== null && project.reading !== before.reading) void this.tallyAgain(before.reading);
  }

  undo(): void {
    this.#history.undo();
    this.#changed();
  }

  redo(): void {
    this.#history.redo();
    this.#changed();
  }

  dismiss(): void {
    this.problem = null;
  }

  /** Opens the host's dialog, or takes what the page's file field or the host gave. */
  async takeCohort(file: File | FileHandle | null): Promise<void> {
    const handle = await this.#handleOf(file);
    if (handle === null) return;
    this.cohort = handle;
    const seen = await this.#wire.ask('look-at-cohort', { handle, reading: null });
    if (!seen.ok) {
      this.problem = seen.problem;
      return;
    }
    this.preview = seen.value;
    const { project } = this;
    this.#history.push({
      ...project,
      title: project.title === '' ? titleFrom(seen.value.file) : project.title,
      people: project.people === 'people' ? nounFrom(seen.value.columns) : project.people,
      reading: seen.value.reading,
      source: null,
      tally: null,
      groups: { ...project.groups, by: [], choices: [] },
    });
    this.#changed();
    if (seen.value.reading.roles.some(({ role }) => role === 'score')) await this.tallyAgain(null);
  }

  /** Refreshes the first rows shown, as after opening a project beside its cohort file. */
  async lookAgain(): Promise<void> {
    if (this.cohort === null) return;
    const seen = await this.#wire.ask('look-at-cohort', { handle: this.cohort, reading: this.project.reading });
    if (seen.ok) this.preview = seen.value;
    else this.problem = seen.problem;
  }

  /** Reads the cohort file with the present reading; completes the present step of the history. */
  async tallyAgain(before: Reading | null): Promise<void> {
    const { reading } = this.project;
    if (reading === null) return;
    if (this.cohort === null) {
      this.problem =
        'The cohort file is not at hand. Choose it again at the Cohort station, so that it can be read in the new way.';
      return;
    }
    if (before === null || layoutChanged(before, reading)) await this.lookAgain();
    if (!reading.roles.some(({ role }) => role === 'score')) {
      this.#history.amend({ ...this.project, source: null, tally: null });
      this.#changed();
      return;
    }
    await this.cancel();
    const started = await this.#wire.ask('tally-cohort', { handle: this.cohort, reading });
    if (!started.ok) {
      this.problem = started.problem;
      return;
    }
    const result = await this.#follow(started.value.job, 'Reading');
    if (this.project.reading !== reading) return;
    if (result?.kind === 'tallied') {
      this.#history.amend(withTally(this.project, result.tallied));
      this.#changed();
    }
  }

  /** Takes counts typed or pasted; returns the problems, one sentence a line, or nothing when they were taken. */
  takeTypedCounts(text: string, scale: ScoreScale | null): readonly LineProblem[] {
    const { counted, problems } = readTypedCounts(text, scale);
    if (counted === null) return problems;
    this.preview = null;
    this.cohort = null;
    this.#history.push(withTally({ ...this.project, reading: null, tally: null }, counted));
    this.#changed();
    return [];
  }

  async cancel(): Promise<void> {
    const running = this.work;
    if (running === null) return;
    await this.#wire.ask('cancel-job', { job: running.job });
    this.#ended(running.job);
  }

  async save(): Promise<void> {
    const { project } = this;
    const answer = await this.#wire.ask('save-project', {
      draft: this.#draft,
      handle: this.#handle,
      name: project.title === '' ? 'Untitled norms' : project.title,
      project,
    });
    if (!answer.ok) {
      this.problem = answer.problem;
    } else if (answer.value !== null) {
      this.#handle = answer.value.handle;
      this.file = answer.value.file;
      this.saved = { kind: 'saved', at: answer.value.at };
      this.problem = answer.value.remark;
    }
  }

  /** The booklet as the press would draw it now. */
  async draw(): Promise<void> {
    const { project } = this;
    if (this.drawnFor === project) return;
    if (this.#drawing !== null) await this.#wire.ask('cancel-job', { job: this.#drawing });
    const started = await this.#wire.ask('draw-pages', { project });
    if (!started.ok) {
      this.problem = started.problem;
      return;
    }
    this.#drawing = started.value.job;
    const result = await this.#follow(started.value.job, 'Drawing the pages');
    if (this.#drawing === started.value.job) this.#drawing = null;
    if (result?.kind === 'drawn' && this.project === project) {
      this.drawn = result.drawn;
      this.drawnFor = project;
    }
  }

  async press(): Promise<void> {
    const { project } = this;
    this.pressed = null;
    const started = await this.#wire.ask('press', {
      project,
      name: project.title === '' ? 'Untitled norms' : project.title,
    });
    if (!started.ok) {
      this.problem = started.problem;
      return;
    }
    const result = await this.#follow(started.value.job, 'Pressing');
    if (result?.kind === 'pressed') this.pressed = result.pressed;
  }

  async showPressed(): Promise<void> {
    const shown = await this.#wire.ask('show-pressed', {});
    if (!shown.ok) this.problem = shown.problem;
  }

  /** Before the project is closed: what is not yet kept is kept now. */
  async settle(): Promise<void> {
    if (this.#autosave === null) return;
    clearTimeout(this.#autosave);
    this.#autosave = null;
    await this.#keepDraft();
  }

  async #follow(job: string, doing: string) {
    this.work = { job, doing, progress: 0 };
    const result = await followJob(this.#wire, job, (progress, now) => {
      if (this.work?.job === job) this.work = { job, doing: now, progress };
    });
    this.#ended(job);
    if (result.ok) return result.value;
    this.problem = result.problem;
    return null;
  }

  /** Another job may have taken the place meanwhile. */
  #ended(job: string): void {
    if (this.work?.job === job) this.work = null;
  }

  async #handleOf(file: File | FileHandle | null): Promise<FileHandle | null> {
    if (typeof file === 'string') return file;
    return file === null ? this.#chooseHandle() : this.#received(file);
  }

  async #chooseHandle(): Promise<FileHandle | null> {
    const chosen = await this.#wire.ask('choose-file', { kind: 'cohort' });
    if (chosen.ok) return chosen.value?.handle ?? null;
    this.problem = chosen.problem;
    return null;
  }

  async #received(file: File): Promise<FileHandle | null> {
    const received = await this.#wire.receiveFile(file);
    if (received.ok) return received.value;
    this.problem = received.problem;
    return null;
  }

  /** Works the numbers out beside the page; an answer that came too late is dropped. */
  async #build(): Promise<void> {
    const { project } = this;
    const built = await compute.ask({ kind: 'norm-set', project }).then(
      (answer) => answer.built,
      (fault: unknown): NormSetBuilt => ({
        ok: false,
        problem: `The tables could not be worked out (${fault instanceof Error ? fault.message : 'unknown fault'}). Undo the last choice.`,
      }),
    );
    if (this.project !== project) return;
    this.built = built;
    this.builtFor = project;
  }

  #changed(): void {
    void this.#build();
    this.pressed = null;
    if (this.saved.kind === 'saved') this.saved = { kind: 'unsaved' };
    if (this.#autosave !== null) clearTimeout(this.#autosave);
    this.#autosave = setTimeout(() => {
      this.#autosave = null;
      void this.#keepDraft();
    }, AUTOSAVE_AFTER_MS);
  }

  async #keepDraft(): Promise<void> {
    const { project } = this;
    const kept = await this.#wire.ask('keep-draft', { draft: this.#draft, handle: this.#handle, project });
    if (!kept.ok) this.problem = kept.problem;
    else if (this.project === project && this.saved.kind !== 'saved') this.saved = { kind: 'kept', at: kept.value.at };
  }
}

function layoutChanged(before: Reading, after: Reading): boolean {
  return (['separator', 'decimalMark', 'encoding', 'header', 'sheet'] as const).some(
    (key) => before[key] !== after[key],
  );
}
