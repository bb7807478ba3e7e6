import { Injectable, computed, inject, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { MachineDetails } from '#contracts';
import type { Loading, Tool } from '#engine';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { MachineClient } from '../machines/machine-client';
import type { LoadingEdit } from './loading-edits';
import { applyEdits } from './loading-edits';
import { wordDifferences, wordEdit } from './loading-words';

export interface LoadingConflict {
  readonly newest: MachineDetails;
  readonly changes: readonly string[];
}

/** The loading of one machine as saved, with the acts of the person at this screen on top. */
@Injectable()
export class LoadingDraft {
  readonly #client = inject(MachineClient);
  readonly #machine = signal<MachineDetails | null>(null);
  readonly #edits = signal<readonly LoadingEdit[]>([]);
  readonly #tools = signal<ReadonlyMap<number, Tool>>(new Map());

  readonly machine = this.#machine.asReadonly();
  readonly edits = this.#edits.asReadonly();
  readonly reason = signal('');
  readonly saving = signal(false);
  readonly problem = signal<ProblemError | null>(null);
  readonly conflict = signal<LoadingConflict | null>(null);

  readonly loading = computed<Loading | null>(() => {
    const machine = this.#machine();
    return machine ? applyEdits(machine.loading, this.#edits()) : null;
  });
  /** The unsaved acts in sentences, each worded against what stood before it. */
  readonly sentences = computed(() => {
    const machine = this.#machine();
    if (!machine) return [];
    return this.#edits().map((edit, index) =>
      wordEdit(edit, applyEdits(machine.loading, this.#edits().slice(0, index)), this.#tools()),
    );
  });

  /** Another machine, or the same one fetched again: acts on another machine are dropped. */
  open(machine: MachineDetails): void {
    if (this.#machine()?.id !== machine.id) this.drop();
    this.#machine.set(machine);
  }
  know(tools: ReadonlyMap<number, Tool>): void {
    this.#tools.set(tools);
  }
  add(edit: LoadingEdit): void {
    this.problem.set(null);
    this.#edits.update((edits) => [...edits, edit]);
  }
  undo(index: number): void {
    this.#edits.update((edits) => edits.toSpliced(index, 1));
  }
  drop(): void {
    this.#edits.set([]);
    this.reason.set('');
    this.problem.set(null);
    this.conflict.set(null);
  }

  /** Saves as a new revision; gives its number, or null when it was not taken (then it says why). */
  async save(): Promise<number | null> {
    const machine = this.#machine();
    const loading = this.loading();
    if (!machine || !loading) return null;
    this.saving.set(true);
    this.problem.set(null);
    try {
      const saved = await firstValueFrom(
        this.#client.saveLoading(machine.id, {
          basedOn: machine.loadingRevision.number,
          reason: this.reason(),
          loading: { ...loading, pockets: [...loading.pockets], byHand: [...loading.byHand] },
        }),
      );
      this.#machine.set(saved);
      this.drop();
      return saved.loadingRevision.number;
    } catch (error) {
      await this.#explain(toProblemError(error), machine);
      return null;
    } finally {
      this.saving.set(false);
    }
  }

  /** Puts my acts on top of what the other saved; they are looked at before they are saved. */
  goOnFromTheirs(): void {
    const conflict = this.conflict();
    if (!conflict) return;
    this.#machine.set(conflict.newest);
    this.conflict.set(null);
  }

  /** A 409 is told by what the other did; a 409 with nothing newer is told by its own words. */
  async #explain(problem: ProblemError, mine: MachineDetails): Promise<void> {
    if (problem.status !== 409) return this.problem.set(problem);
    try {
      const newest = await firstValueFrom(this.#client.details(mine.id));
      if (newest.loadingRevision.number === mine.loadingRevision.number) {
        return this.problem.set(problem);
      }
      const changes = wordDifferences(mine.loading, newest.loading, this.#tools());
      this.conflict.set({ newest, changes });
    } catch (error) {
      this.problem.set(toProblemError(error));
    }
  }
}
