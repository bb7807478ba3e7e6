import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { EMPTY, catchError, distinctUntilChanged, map, switchMap } from 'rxjs';
import type { CheckDetails, CheckRecord } from '#contracts';
import { setupSchema } from '#contracts';
import { CheckClient } from '../report/check-client';
import { CurrentUser } from '../sign-in/current-user';
import { RackStrip } from '../ui/rack-strip/rack-strip';

/**
 * The rack a finished check was held against, with the order in which the program calls its tools.
 * It only illustrates: when it cannot be read, it stays away and the report says the rest.
 */
@Component({
  selector: 'nl-program-rack',
  imports: [RackStrip],
  templateUrl: './program-rack.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgramRack {
  readonly #client = inject(CheckClient);
  readonly #user = inject(CurrentUser);
  readonly #details = signal<CheckDetails | null>(null);

  readonly check = input.required<CheckRecord>();

  protected readonly units = this.#user.units;
  protected readonly setup = computed(() => {
    const setup = setupSchema.safeParse(this.#details()?.setup);
    return setup.success ? setup.data : null;
  });
  protected readonly callOrder = computed(() =>
    (this.#details()?.summary?.tools ?? [])
      .toSorted((one, other) => one.firstLine - other.firstLine)
      .map((tool) => tool.number),
  );
  protected readonly caption = computed(() => {
    const { machineName, against } = this.check();
    return `${machineName}, loading ${against.loadingRevision}, as it stood at the check`;
  });

  constructor() {
    toObservable(this.check)
      .pipe(
        map((check) => check.id),
        distinctUntilChanged(),
        switchMap((id) => this.#client.details(id).pipe(catchError(() => EMPTY))),
        takeUntilDestroyed(),
      )
      .subscribe((details) => this.#details.set(details));
  }
}
