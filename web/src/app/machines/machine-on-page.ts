import { Injectable, computed, inject, linkedSignal, signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import type { MachineDetails } from '#contracts';
import { toProblemError } from '../http/problem-error';
import { MachineClient } from './machine-client';

/** The machine whose pages are open, fetched once for all of them. */
@Injectable()
export class MachineOnPage {
  readonly #client = inject(MachineClient);
  readonly #id = signal<string | undefined>(undefined);
  readonly #details = rxResource({
    params: () => this.#id(),
    stream: ({ params }) => this.#client.details(params),
  });
  /** As last fetched or saved. */
  readonly #machine = linkedSignal<MachineDetails | null>(() =>
    this.#details.hasValue() ? this.#details.value() : null,
  );

  readonly machine = this.#machine.asReadonly();
  readonly isLoading = this.#details.isLoading;
  readonly problem = computed(() => {
    const error = this.#details.error();
    return error ? toProblemError(error) : null;
  });

  open(id: string): void {
    this.#id.set(id);
  }
  keep(machine: MachineDetails): void {
    this.#machine.set(machine);
  }
  fetchAgain(): void {
    this.#details.reload();
  }
}
