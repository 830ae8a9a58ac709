const MOST_STEPS = 500;

/** Work with every earlier and undone state of it: states are plain data that share what did not change. */
export class History<State> {
  #states = $state.raw<readonly State[]>([]);
  #at = $state(0);

  constructor(first: State) {
    this.#states = [first];
  }

  get present(): State {
    const present = this.#states[this.#at];
    if (present === undefined) throw new RangeError('the history has lost its place');
    return present;
  }

  get canUndo(): boolean {
    return this.#at > 0;
  }

  get canRedo(): boolean {
    return this.#at < this.#states.length - 1;
  }

  /** A new step; what was undone is gone. */
  push(next: State): void {
    if (next === this.present) return;
    const kept = this.#states.slice(Math.max(0, this.#at + 2 - MOST_STEPS), this.#at + 1);
    this.#states = [...kept, next];
    this.#at = this.#states.length - 1;
  }

  /** Completes the present step, as when the tally for a changed reading has come. */
  amend(next: State): void {
    this.#states = [...this.#states.slice(0, this.#at), next, ...this.#states.slice(this.#at + 1)];
  }

  undo(): void {
    if (this.canUndo) this.#at -= 1;
  }

  redo(): void {
    if (this.canRedo) this.#at += 1;
  }
}
