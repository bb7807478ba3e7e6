import { Injectable, computed, inject, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { MachineList } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { LastMachine } from '../machines/last-machine';
import { MachineClient } from '../machines/machine-client';

/** The machines a program can be held against, and the one this browser chose last. */
@Injectable({ providedIn: 'root' })
export class MachineChoices {
  readonly #client = inject(MachineClient);
  readonly #last = inject(LastMachine);
  readonly #machines = signal<MachineList['machines'] | null>(null);
  readonly #problem = signal<ProblemError | null>(null);
  readonly #wanted = signal<string | null>(null);

  /** null while they are being read. */
  readonly machines = this.#machines.asReadonly();
  readonly problem = this.#problem.asReadonly();
  readonly chosen = computed(() => {
    const machines = this.#machines() ?? [];
    return machines.find(({ id }) => id === this.#wanted()) ?? this.#last.among(machines) ?? null;
  });

  async read(): Promise<void> {
    try {
      this.#machines.set(await firstValueFrom(this.#client.list()));
      this.#problem.set(null);
    } catch (error) {
      this.#problem.set(toProblemError(error));
    }
  }

  choose(id: string): void {
    this.#wanted.set(id);
    this.#last.remember(id);
  }
}
