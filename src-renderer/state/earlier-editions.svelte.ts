import type { EarlierEdition, FileHandle } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';
import { compute } from '../compute/compute.ts';
import type { ComparedForPage } from '../compute/compute-message.ts';
import { takenFile } from './taken-file.ts';
import type { WorkFor } from './work-for.ts';

/** The earlier edition that the project is compared with, and the comparison, worked out beside the page. */
export class EarlierEditions {
  readonly #for: WorkFor;
  #wanted: NormProject | null = null;

  edition = $state.raw<EarlierEdition | null>(null);
  compared = $state.raw<ComparedForPage | null>(null);
  /** The project that `compared` belongs to. */
  comparedFor = $state.raw<NormProject | null>(null);

  constructor(workFor: WorkFor, edition: EarlierEdition | null) {
    this.#for = workFor;
    this.edition = edition;
  }

  /** Opens the host’s dialog, or takes what the page’s file field gave. */
  async choose(file: File | FileHandle | null): Promise<void> {
    const handle = await takenFile(this.#for, file, 'edition');
    if (handle === null) return;
    const looked = await this.#for.wire.ask('look-at-edition', { handle });
    if (looked.ok) this.take(looked.value);
    else this.#for.fail(looked.problem);
  }

  take(edition: EarlierEdition): void {
    this.edition = edition;
    this.compared = null;
    this.comparedFor = null;
  }

  /** Compares with the project as it stands now; an answer that another question has overtaken is dropped. */
  async compare(): Promise<void> {
    const { edition } = this;
    const project = this.#for.present();
    if (edition === null || this.comparedFor === project || this.#wanted === project) return;
    this.#wanted = project;
    const compared = await compute.ask({ kind: 'comparison', before: edition.project, after: project }).then(
      (answer) => answer.compared,
      (fault: unknown): ComparedForPage => ({
        ok: false,
        problem: `The editions could not be compared (${fault instanceof Error ? fault.message : 'unknown fault'}).`,
      }),
    );
    if (this.#wanted === project) this.#wanted = null;
    if (this.edition !== edition || this.#for.present() !== project) return;
    this.compared = compared;
    this.comparedFor = project;
  }
}
