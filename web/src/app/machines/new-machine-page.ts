import { ChangeDetectionStrategy, Component, inject, signal, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { map, of, tap } from 'rxjs';
import type { MachineDetails } from '#contracts';
import { CurrentUser } from '../sign-in/current-user';
import type { FactChange, Keeping, Standing } from '../ui/facts/revised-facts';
import { RevisedFacts } from '../ui/facts/revised-facts';
import { SectionExtra } from '../ui/facts/section-extra';
import { PageHeader } from '../ui/page-header/page-header';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { MachineClient } from './machine-client';
import { NEW_MACHINE, NEW_MACHINE_SECTIONS, setupOf, validateNewMachine } from './new-machine';
import { PocketSpacing } from './pocket-spacing-form';
import { SetupImport } from './setup-import';

/** A new machine: from a setup file, or described here from a form in which no figure is made up. */
@Component({
  selector: 'nl-new-machine-page',
  imports: [
    MatButton,
    PageHeader,
    PocketSpacing,
    RevisedFacts,
    RouterLink,
    SectionExtra,
    SetupImport,
  ],
  templateUrl: './new-machine-page.html',
  styleUrl: './setup-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewMachinePage implements HoldsUnsaved {
  readonly #client = inject(MachineClient);
  readonly #router = inject(Router);

  private readonly facts = viewChild(RevisedFacts);

  protected readonly units = inject(CurrentUser).units;
  protected readonly sections = NEW_MACHINE_SECTIONS;
  protected readonly standing: Standing = { value: NEW_MACHINE, revision: null };
  protected readonly byForm = signal(false);
  #added: MachineDetails | null = null;

  protected readonly keeping: Keeping = {
    validate: validateNewMachine,
    keep: (change) => this.#keep(change),
    fetch: () => of(this.standing),
  };

  hasUnsaved(): boolean {
    return this.facts()?.hasUnsaved() ?? false;
  }
  protected async open(machine: MachineDetails | null = this.#added): Promise<void> {
    if (machine) await this.#router.navigate(['/machines', machine.id]);
  }

  #keep({ value, reason }: FactChange) {
    const parts = validateNewMachine(value);
    // RevisedFacts only keeps what was validated; a miss here is our bug.
    if (!parts.success) throw new Error('Unvalidated machine');
    return this.#client.addMachine(setupOf(parts.data, reason)).pipe(
      tap((machine) => (this.#added = machine)),
      map(() => this.standing),
    );
  }
}
