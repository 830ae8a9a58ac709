import type { CohortPreview, FileHandle, OpenedProject } from '../../shared-core/desk.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import type { Station } from '../../shared-core/norms/queries.ts';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { readTypedCounts, type LineProblem } from '../../shared-core/tally/typed-counts.ts';
import type { ScoreScale } from '../../shared-core/scale/score-scale.ts';
import type { DeskWire } from '../desk/desk-wire.ts';
import { BuiltNorms } from './built-norms.svelte.ts';
import { Drawing } from './drawing.svelte.ts';
import { EarlierEditions } from './earlier-editions.svelte.ts';
import { ErratumWork } from './erratum-work.svelte.ts';
import { History } from './history.svelte.ts';
import { PressWork } from './press-work.svelte.ts';
import { ReadStates } from './read-states.ts';
import { RunningJobs } from './running-jobs.svelte.ts';
import { nounFrom, titleFrom } from './names-from-file.ts';
import { takenFile } from './taken-file.ts';
import { withTally } from './with-tally.ts';
import type { WorkFor } from './work-for.ts';

export type SaveState =
  | { readonly kind: 'unsaved' }
  | { readonly kind: 'kept'; readonly at: number }
  | { readonly kind: 'saved'; readonly at: number };

const AUTOSAVE_AFTER_MS = 400;

/** One open project: its choices and their history, where it is saved, and the work that runs for it. */
export class Workspace {
  readonly #wire: DeskWire;
  readonly #workFor: WorkFor;
  readonly #draft: string;
  readonly #jobs: RunningJobs;
  readonly #history: History<NormProject>;
  #autosave: ReturnType<typeof setTimeout> | null = null;

  station = $state<Station>('cohort');
  /** Key of the group looked at, at the stations that show one. */
  groupKey = $state<string | null>(null);
  file = $state<string | null>(null);
  saved = $state.raw<SaveState>({ kind: 'unsaved' });
  problem = $state<string | null>(null);
  preview = $state.raw<CohortPreview | null>(null);
  cohort = $state<FileHandle | null>(null);
  readonly #states = new ReadStates();
  #handle: FileHandle | null;
  /** Counts the readings of the cohort file; only the last one is taken. */
  #readings = 0;
  /** The tally that a reading without result put out of use: what was chosen with it serves the next one. */
  #lastTally: NormProject['tally'] = null;

  /** The numbers of the project, or of the one before it while the new ones are being worked out. */
  readonly norms = new BuiltNorms();
  readonly booklet: Drawing<NormProject>;
  readonly presses: PressWork;
  readonly earlier: EarlierEditions;
  readonly erratum: ErratumWork;
  readonly group: GroupNorms | null = $derived(
    this.norms.groups.find(({ group }) => group.key === this.groupKey) ?? this.norms.groups[0] ?? null,
  );

  constructor(wire: DeskWire, opened: OpenedProject) {
    this.#wire = wire;
    this.#jobs = new RunningJobs(wire, (problem) => (this.problem = problem));
    this.#workFor = {
      wire,
      present: () => this.project,
      follow: (job, doing) => this.#jobs.follow(job, doing),
      fail: (problem) => (this.problem = problem),
    };
    this.booklet = new Drawing(this.#workFor, (project) => wire.ask('draw-pages', { project }));
    this.presses = new PressWork(this.#workFor);
    this.earlier = new EarlierEditions(this.#workFor, opened.earlier);
    this.erratum = new ErratumWork(this.#workFor);
    this.#draft = opened.draft;
    this.#history = new History(opened.project);
    this.#handle = opened.handle;
    this.file = opened.file;
    this.cohort = opened.cohort;
    this.#states.note(opened.project, opened.cohort, false);
    if (opened.project.tally !== null) this.station = 'curve';
    void this.norms.build(this.project);
    if (opened.cohort !== null) void this.lookAgain();
  }

  get project(): NormProject {
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

  /** Takes a choice: the next project, made from the present one. A changed reading reads the file again. */
  choose(project: NormProject): void {
    const before = this.project;
    const reads = project.reading !== null && project.reading !== before.reading;
    this.#push(project, reads || (project.reading !== null && this.#states.waits(before)));
    if (reads) void this.tallyAgain(before.reading);
  }

  undo(): void {
    const before = this.project;
    this.#history.undo();
    if (this.project !== before) void this.#comeBack(before);
  }

  redo(): void {
    const before = this.project;
    this.#history.redo();
    if (this.project !== before) void this.#comeBack(before);
  }

  dismiss(): void {
    this.problem = null;
  }

  /** Opens the host's dialog, or takes what the page's file field or the host gave. */
  async takeCohort(file: File | FileHandle | null): Promise<void> {
    const handle = await takenFile(this.#workFor, file, 'cohort');
    if (handle === null) return;
    const seen = await this.#wire.ask('look-at-cohort', { handle, reading: null });
    if (!seen.ok) {
      this.problem = seen.problem;
      return;
    }
    const again = await this.#lookAsBefore(handle, seen.value.file);
    const { project } = this;
    this.cohort = handle;
    this.preview = again ?? seen.value;
    if (again !== null) {
      this.#push({ ...project, reading: again.reading }, true);
    } else {
      this.#lastTally = null;
      this.#push(
        {
          ...project,
          title: project.title === '' ? titleFrom(seen.value.file) : project.title,
          people: project.people === 'people' ? nounFrom(seen.value.columns) : project.people,
          reading: seen.value.reading,
          source: null,
          tally: null,
          groups: { ...project.groups, by: [], choices: [] },
        },
        true,
      );
    }
    if (hasScore(this.preview.reading)) await this.tallyAgain(null);
  }

  /** A file of the same name that still has its score column is read as before; null for any other. */
  async #lookAsBefore(handle: FileHandle, file: string): Promise<CohortPreview | null> {
    const { reading, source } = this.project;
    if (reading === null || source?.file !== file) return null;
    const seen = await this.#wire.ask('look-at-cohort', { handle, reading });
    return seen.ok && hasScore(seen.value.reading) ? seen.value : null;
  }

  /** Refreshes the first rows shown, as after opening a project beside its cohort file. */
  async lookAgain(): Promise<void> {
    const { cohort, project } = this;
    if (cohort === null) return;
    const seen = await this.#wire.ask('look-at-cohort', { handle: cohort, reading: project.reading });
    if (this.cohort !== cohort || this.project.reading !== project.reading) return;
    if (seen.ok) this.preview = seen.value;
    else this.problem = seen.problem;
  }

  /** Reads the cohort file with the present reading; completes the present step of the history. */
  async tallyAgain(before: Reading | null): Promise<void> {
    this.#readings += 1;
    const round = this.#readings;
    if (this.project.reading === null) return;
    if (this.cohort === null) {
      this.problem =
        'The cohort file is not at hand. Choose it again at the Cohort station, so that it can be read in the new way.';
      return;
    }
    if (before !== null && layoutChanged(before, this.project.reading)) {
      await this.lookAgain();
      if (this.#overtaken(round)) return;
      this.#takeColumns();
    }
    const { reading } = this.project;
    if (!hasScore(reading)) {
      this.#withoutTally();
      return;
    }
    await this.cancel();
    const started = await this.#wire.ask('tally-cohort', { handle: this.cohort, reading });
    if (this.#overtaken(round)) return;
    if (!started.ok) {
      this.problem = started.problem;
      return;
    }
    const result = await this.#jobs.follow(started.value.job, 'Reading');
    if (this.#overtaken(round) || this.project.reading !== reading) return;
    if (result?.kind === 'tallied') {
      this.#amend(withTally(this.project, result.tallied, this.project.tally ?? this.#lastTally), false);
      this.#lastTally = null;
    } else {
      this.#withoutTally();
    }
  }

  #overtaken(round: number): boolean {
    return this.#readings !== round;
  }

  /** A file cut in another way has other columns: their roles are those of the first rows shown. */
  #takeColumns(): void {
    const { project, preview } = this;
    if (project.reading === null || preview === null) return;
    const { roles } = preview.reading;
    this.#amend({ ...project, reading: { ...project.reading, roles } }, true);
  }

  /** No number of an earlier reading stands beside one that gave none. */
  #withoutTally(): void {
    this.#lastTally = this.project.tally ?? this.#lastTally;
    this.#amend({ ...this.project, source: null, tally: null }, true);
  }

  /** After undo and redo: the file, its first rows and its tally are those of the state that is present again. */
  async #comeBack(before: NormProject): Promise<void> {
    this.#changed();
    this.#readings += 1;
    this.problem = null;
    const { project } = this;
    const cohort = this.#states.cohortOf(project);
    const other = cohort !== this.cohort;
    this.cohort = cohort;
    if (cohort === null) this.preview = null;
    else if (other || columnsChanged(before.reading, project.reading)) await this.lookAgain();
    if (this.project === project && this.#states.waits(project)) await this.tallyAgain(null);
  }

  /** Takes counts typed or pasted; returns the problems, one sentence a line, or nothing when they were taken. */
  takeTypedCounts(text: string, scale: ScoreScale | null): readonly LineProblem[] {
    const { counted, problems } = readTypedCounts(text, scale);
    if (counted === null) return problems;
    this.preview = null;
    this.cohort = null;
    this.#readings += 1;
    this.#lastTally = null;
    this.#push(withTally({ ...this.project, reading: null }, counted, null), false);
    return [];
  }

  cancel(): Promise<void> {
    return this.#jobs.cancel();
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

  /** Before the project is closed: what is not yet kept is kept now. */
  async settle(): Promise<void> {
    if (this.#autosave === null) return;
    clearTimeout(this.#autosave);
    this.#autosave = null;
    await this.#keepDraft();
  }

  #push(project: NormProject, waits: boolean): void {
    this.#states.note(project, this.cohort, waits);
    this.#history.push(project);
    this.#changed();
  }

  #amend(project: NormProject, waits: boolean): void {
    this.#states.note(project, this.cohort, waits);
    this.#history.amend(project);
    this.#changed();
  }

  #changed(): void {
    void this.norms.build(this.project);
    this.saved = { kind: 'unsaved' };
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

function hasScore({ roles }: Reading): boolean {
  return roles.some(({ role }) => role === 'score');
}

function columnsChanged(before: Reading | null, after: Reading | null): boolean {
  return before === null || after === null ? before !== after : layoutChanged(before, after);
}

function layoutChanged(before: Reading, after: Reading): boolean {
  return (['separator', 'decimalMark', 'encoding', 'header', 'sheet'] as const).some(
    (key) => before[key] !== after[key],
  );
}
