import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { MachineClient } from './machine-client';

/** Stands where a machine would, when the shop has none yet or the list did not come. */
@Component({
  selector: 'nl-no-machine-page',
  imports: [Notice, PageHeader, RouterLink],
  templateUrl: './no-machine-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoMachinePage {
  readonly #client = inject(MachineClient);
  readonly #user = inject(CurrentUser);

  protected readonly machines = rxResource({ stream: () => this.#client.list() });
  protected readonly problem = computed(() => {
    const error = this.machines.error();
    return error ? toProblemError(error) : null;
  });
  protected readonly mayAdd = computed(() => this.#user.may('change-machine'));
}
