import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { counted } from '../ui/count';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { MachineClient } from './machine-client';

/** The machines of the shop. */
@Component({
  selector: 'nl-machines-page',
  imports: [MatButton, Notice, PageHeader, RouterLink],
  templateUrl: './machines-page.html',
  styleUrl: './machines-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachinesPage {
  readonly #client = inject(MachineClient);
  readonly #user = inject(CurrentUser);

  protected readonly list = rxResource({ stream: () => this.#client.list() });
  protected readonly mayAdd = computed(() => this.#user.may('change-machine'));
  protected readonly machines = computed(() => (this.list.hasValue() ? this.list.value() : []));
  protected readonly count = computed(() => counted(this.machines().length, 'machine'));
  protected readonly problem = computed(() => {
    const error = this.list.error();
    return error ? toProblemError(error) : null;
  });
}
