import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { Notice } from '../ui/notice/notice';
import { CurrentUser } from './current-user';
import { WelcomeReader } from './welcome-reader';

const typed = (...validators: NonNullable<FormControl<string>['validator']>[]) =>
  new FormControl('', { nonNullable: true, validators });

/** Makes the shop and its first person, once, on a fresh installation. */
@Component({
  selector: 'nl-first-run-page',
  imports: [
    MatButton,
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
  templateUrl: './first-run-page.html',
  styleUrl: './outside-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstRunPage {
  readonly #user = inject(CurrentUser);
  readonly #router = inject(Router);
  readonly #welcome = inject(WelcomeReader);

  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly busy = signal(false);
  protected readonly shown = signal(false);
  protected readonly form = new FormGroup({
    shopName: typed(Validators.required, Validators.maxLength(200)),
    name: typed(Validators.required, Validators.maxLength(200)),
    email: typed(Validators.required, Validators.email, Validators.maxLength(200)),
    password: typed(Validators.required, Validators.minLength(12), Validators.maxLength(200)),
  });

  constructor() {
    void this.#leaveIfSetUp();
  }

  protected async setUp(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      await firstValueFrom(this.#user.makeFirstPerson(this.form.getRawValue()));
      await this.#router.navigateByUrl('/bench');
    } catch (error) {
      this.problem.set(toProblemError(error));
    } finally {
      this.busy.set(false);
    }
  }

  async #leaveIfSetUp(): Promise<void> {
    try {
      const welcome = await firstValueFrom(this.#welcome.read());
      if (!welcome.needsFirstPerson) await this.#router.navigateByUrl('/sign-in');
    } catch (error) {
      this.problem.set(toProblemError(error));
    }
  }
}
