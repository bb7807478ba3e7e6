import {
  DOCUMENT,
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { firstValueFrom } from 'rxjs';
import type { MachineDetails } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { Notice } from '../ui/notice/notice';
import { MachineClient } from './machine-client';
import { MachineOnPage } from './machine-on-page';
import { SetupImport } from './setup-import';

/** The setup as one file: taken out, kept under version control by the shop, brought back in. */
@Component({
  selector: 'nl-setup-page',
  imports: [MatButton, Notice, SetupImport],
  templateUrl: './setup-page.html',
  styleUrl: './setup-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetupPage {
  readonly #client = inject(MachineClient);
  readonly #document = inject(DOCUMENT);
  readonly #snackBar = inject(MatSnackBar);
  readonly #user = inject(CurrentUser);
  protected readonly page = inject(MachineOnPage);

  protected readonly mayImport = computed(() => this.#user.may('change-machine'));
  protected readonly fetching = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);

  protected async download(machine: MachineDetails): Promise<void> {
    this.fetching.set(true);
    this.problem.set(null);
    try {
      const file = await firstValueFrom(this.#client.setupFile(machine.id));
      this.#save(file, `${machine.name}.setup.json`);
    } catch (error) {
      this.problem.set(toProblemError(error));
    } finally {
      this.fetching.set(false);
    }
  }
  protected taken(machine: MachineDetails): void {
    this.page.keep(machine);
    this.#snackBar.open(`Imported. ${machine.name} stands as the file says.`);
  }

  #save(file: Blob, name: string): void {
    const address = URL.createObjectURL(file);
    const link = this.#document.createElement('a');
    link.href = address;
    link.download = name;
    link.click();
    URL.revokeObjectURL(address);
  }
}
