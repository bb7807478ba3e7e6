import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatSnackBar } from '@angular/material/snack-bar';
import { firstValueFrom } from 'rxjs';
import type { Person } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { Confirm } from '../ui/confirm/confirm';
import { Notice } from '../ui/notice/notice';
import type { PersonTask } from './person-dialog';
import { PersonDialog } from './person-dialog';
import { ShopClient } from './shop-client';

/** Everyone of the shop: who they are, what they may do, whether they may still sign in. */
@Component({
  selector: 'nl-people-page',
  imports: [MatButton, MatIcon, Notice],
  templateUrl: './people-page.html',
  styleUrl: './people-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePage {
  readonly #client = inject(ShopClient);
  readonly #confirm = inject(Confirm);
  readonly #dialog = inject(MatDialog);
  readonly #snackBar = inject(MatSnackBar);
  readonly #user = inject(CurrentUser);
  readonly #people = signal<readonly Person[] | null>(null);

  protected readonly problem = signal<ProblemError | null>(null);
  /** Those who may sign in first, then by name. */
  protected readonly rows = computed(() =>
    this.#people()
      ?.toSorted(
        (one, other) =>
          Number(other.active) - Number(one.active) || one.name.localeCompare(other.name),
      )
      .map((person) => ({
        person,
        roles: person.roles.join(', '),
        isSelf: person.id === this.#user.person()?.id,
      })),
  );

  constructor() {
    void this.read();
  }

  protected async read(): Promise<void> {
    try {
      this.#people.set(await firstValueFrom(this.#client.people()));
      this.problem.set(null);
    } catch (error) {
      this.problem.set(toProblemError(error));
    }
  }

  protected async add(): Promise<void> {
    const person = await this.#openDialog({ kind: 'add' });
    if (!person) return;
    this.#people.update((people) => [...(people ?? []), person]);
    this.#snackBar.open(`${person.name} can sign in now.`);
  }

  protected async change(person: Person): Promise<void> {
    this.#keep(await this.#openDialog({ kind: 'change', person }));
  }

  protected async givePassword(person: Person): Promise<void> {
    const changed = await this.#openDialog({ kind: 'password', person });
    this.#keep(changed);
    if (changed) this.#snackBar.open(`${changed.name} has a new password.`);
  }

  protected async deactivate(person: Person): Promise<void> {
    const sure = await this.#confirm.ask({
      heading: `Deactivate ${person.name}?`,
      text: 'They are signed out everywhere at once and cannot sign in. What they did stays on record, and you can let them in again.',
      act: 'Deactivate',
      takesAway: true,
    });
    if (sure) await this.#setActive(person, false);
  }

  protected async letIn(person: Person): Promise<void> {
    await this.#setActive(person, true);
  }

  async #setActive(person: Person, active: boolean): Promise<void> {
    try {
      this.#keep(await firstValueFrom(this.#client.changePerson(person.id, { active })));
    } catch (error) {
      const problem = toProblemError(error);
      this.#snackBar.open([problem.message, problem.next].filter(Boolean).join(' '), 'Close', {
        duration: 12_000,
      });
    }
  }

  #openDialog(task: PersonTask): Promise<Person | undefined> {
    const dialog = this.#dialog.open<PersonDialog, PersonTask, Person>(PersonDialog, {
      data: task,
      width: '30rem',
    });
    return firstValueFrom(dialog.afterClosed());
  }

  #keep(changed: Person | undefined): void {
    if (!changed) return;
    this.#people.update(
      (people) => people?.map((each) => (each.id === changed.id ? changed : each)) ?? null,
    );
  }
}
