import { DOCUMENT, Injectable, inject } from '@angular/core';

const KEPT_AS = 'nightlatch.machine';

/** The machine last looked at on this screen: a tablet usually hangs beside one machine. */
@Injectable({ providedIn: 'root' })
export class LastMachine {
  readonly #storage = inject(DOCUMENT).defaultView?.localStorage;

  get id(): string | null {
    return this.#storage?.getItem(KEPT_AS) ?? null;
  }
  remember(id: string): void {
    this.#storage?.setItem(KEPT_AS, id);
  }
  /** Of the machines there are, the one to open when nobody said which. */
  among<M extends { readonly id: string }>(machines: readonly M[]): M | undefined {
    return machines.find((machine) => machine.id === this.id) ?? machines[0];
  }
}
