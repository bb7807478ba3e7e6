import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { firstValueFrom } from 'rxjs';
import type { Observable } from 'rxjs';
import type { Person, Role } from '#contracts';
import { ROLES } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { Notice } from '../ui/notice/notice';
import { ROLE_WORDS } from './role-words';
import { ShopClient } from './shop-client';

export type PersonTask =
  | { readonly kind: 'add' }
  | { readonly kind: 'change'; readonly person: Person }
  | { readonly kind: 'password'; readonly person: Person };

/** Adds a person, changes name and roles, or gives a new password. Closes with the person as saved. */
@Component({
  selector: 'nl-person-dialog',
  imports: [
    MatButton,
    MatCheckbox,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatHint,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MatSuffix,
    Notice,
    ReactiveFormsModule,
  ],
  templateUrl: './person-dialog.html',
  styleUrl: './person-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonDialog {
  readonly #client = inject(ShopClient);
  readonly #dialog = inject<MatDialogRef<PersonDialog, Person>>(MatDialogRef);
  protected readonly task = inject<PersonTask>(MAT_DIALOG_DATA);

  protected readonly roles = ROLES.map((role) => ({ role, words: ROLE_WORDS[role] }));
  protected readonly heading = headingOf(this.task);
  protected readonly act = ACTS[this.task.kind];
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly saving = signal(false);
  protected readonly shown = signal(false);
  protected readonly noRole = signal(false);
  protected readonly form = formOf(this.task);

  protected async save(): Promise<void> {
    this.form.markAllAsTouched();
    this.noRole.set(this.task.kind !== 'password' && this.#chosenRoles().length === 0);
    if (this.form.invalid || this.noRole() || this.saving()) return;
    this.saving.set(true);
    this.problem.set(null);
    // A stray click beside the dialog must not hide a refusal that is under way.
    this.#dialog.disableClose = true;
    try {
      this.#dialog.close(await firstValueFrom(this.#send()));
    } catch (error) {
      this.problem.set(toProblemError(error));
    } finally {
      this.#dialog.disableClose = false;
      this.saving.set(false);
    }
  }

  #send(): Observable<Person> {
    const { name, email, password } = this.form.getRawValue();
    const roles = this.#chosenRoles();
    switch (this.task.kind) {
      case 'add':
        return this.#client.addPerson({ name, email, password, roles });
      case 'change':
        return this.#client.changePerson(this.task.person.id, { name, roles });
      case 'password':
        return this.#client.changePerson(this.task.person.id, { password });
    }
  }

  #chosenRoles(): Role[] {
    const { roles } = this.form.getRawValue();
    return ROLES.filter((role) => roles[role]);
  }
}

const ACTS: Readonly<Record<PersonTask['kind'], string>> = {
  add: 'Add the person',
  change: 'Save',
  password: 'Set the password',
};

function headingOf(task: PersonTask): string {
  if (task.kind === 'add') return 'Add a person';
  return task.kind === 'change' ? task.person.name : `New password for ${task.person.name}`;
}

/** All fields stand in the form; those that the task does not ask for are not checked. */
function formOf(task: PersonTask) {
  const person = task.kind === 'add' ? null : task.person;
  const asks = (...kinds: readonly PersonTask['kind'][]): boolean => kinds.includes(task.kind);
  const ticked = (role: Role) =>
    new FormControl(person?.roles.includes(role) ?? false, { nonNullable: true });
  return new FormGroup({
    name: new FormControl(person?.name ?? '', {
      nonNullable: true,
      validators: asks('add', 'change') ? [Validators.required, Validators.maxLength(200)] : [],
    }),
    email: new FormControl(person?.email ?? '', {
      nonNullable: true,
      validators: asks('add') ? [Validators.required, Validators.email] : [],
    }),
    password: new FormControl('', {
      nonNullable: true,
      validators: asks('add', 'password') ? [Validators.required, Validators.minLength(12)] : [],
    }),
    roles: new FormGroup({
      operator: ticked('operator'),
      programmer: ticked('programmer'),
      lead: ticked('lead'),
      admin: ticked('admin'),
    }),
  });
}
