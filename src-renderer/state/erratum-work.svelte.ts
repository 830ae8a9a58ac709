import type { CohortPreview, EarlierEdition, Erratum, FileHandle } from '../../shared-core/desk.ts';
import type { ColumnRole, Reading } from '../../shared-core/norms/reading.ts';
import { takenFile } from './taken-file.ts';
import type { WorkFor } from './work-for.ts';

/** A list of people as it was chosen; nothing of it is kept with the project. */
export interface ChosenRoster {
  readonly handle: FileHandle;
  readonly preview: CohortPreview;
}

/** The erratum of an earlier edition: the list of people that is followed, the rank that decides, and what came of it. */
export class ErratumWork {
  readonly #for: WorkFor;

  roster = $state.raw<ChosenRoster | null>(null);
  /** Columns of the roster; empty while none is chosen. */
  score = $state('');
  person = $state('');
  by = $state.raw<readonly string[]>([]);
  /** A percentile rank as it is typed; empty for none. */
  cut = $state('');
  made = $state.raw<Erratum | null>(null);

  constructor(workFor: WorkFor) {
    this.#for = workFor;
  }

  /** Opens the host’s dialog, or takes what the page’s file field gave; the columns are guessed. */
  async choose(file: File | null): Promise<void> {
    const handle = await takenFile(this.#for, file, 'roster');
    if (handle === null) return;
    const seen = await this.#for.wire.ask('look-at-cohort', { handle, reading: null });
    if (!seen.ok) {
      this.#for.fail(seen.problem);
      return;
    }
    const { columns, reading } = seen.value;
    const named = (wanted: string): string =>
      columns.find((column) => column.toLowerCase() === wanted.toLowerCase()) ?? '';
    this.roster = { handle, preview: seen.value };
    this.score = columnOf(reading, 'score');
    this.person = named('name') === '' ? columnOf(reading, 'id') : named('name');
    this.by = this.#for.present().groups.by.map(named);
    this.made = null;
  }

  forget(): void {
    this.roster = null;
    this.made = null;
  }

  /** Follows the people and, with `write`, writes the files. */
  async make({ project: before }: EarlierEdition, write: boolean): Promise<void> {
    const { wire, follow, fail } = this.#for;
    const { roster, score, person, by, cut } = this;
    this.made = null;
    const columns = { score, person: person === '' ? null : person, by };
    const started = await wire.ask('make-erratum', {
      before,
      after: this.#for.present(),
      roster: roster === null ? null : { handle: roster.handle, reading: roster.preview.reading, columns },
      cut,
      write,
    });
    if (!started.ok) {
      fail(started.problem);
      return;
    }
    const result = await follow(started.value.job, write ? 'Writing the erratum' : 'Following the people');
    if (result?.kind === 'erratum') this.made = result.erratum;
  }
}

function columnOf({ roles }: Reading, role: ColumnRole): string {
  return roles.find((known) => known.role === role)?.column ?? '';
}
