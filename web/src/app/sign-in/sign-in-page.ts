import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { SignIn, Welcome } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { Notice } from '../ui/notice/notice';
import { CurrentUser } from './current-user';
import { returnAddress } from './return-address';
import { WelcomeReader } from './welcome-reader';

@Component({
  selector: 'nl-sign-in-page',
  imports: [
    MatButton,
    MatError,
    MatFormField,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MatSuffix,
    Notice,
    ReactiveFormsModule,
  ],
  templateUrl: './sign-in-page.html',
  styleUrl: './outside-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  readonly #user = inject(CurrentUser);
  readonly #router = inject(Router);
  readonly #welcome = inject(WelcomeReader);

  /** The page to come back to, from the address. */
  readonly then = input<string>();
  /** Present when a session ended while the person was working. */
  readonly ended = input<string>();

  protected readonly demo = signal<Welcome['demo']>([]);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly unreached = signal<ProblemError | null>(null);
  protected readonly busy = signal(false);
  protected readonly shown = signal(false);
  protected readonly form = new FormGroup({
    email: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.email],
    }),
    password: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
  });

  constructor() {
    void this.readWelcome();
  }

  protected async readWelcome(): Promise<void> {
    this.unreached.set(null);
    try {
      const welcome = await firstValueFrom(this.#welcome.read());
      this.demo.set(welcome.demo);
      if (welcome.needsFirstPerson) await this.#router.navigateByUrl('/first-run');
    } catch (error) {
      this.unreached.set(toProblemError(error));
    }
  }

  protected async signIn(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    await this.#enter(this.form.getRawValue());
  }

  protected async signInAs(each: Welcome['demo'][number]): Promise<void> {
    if (this.busy()) return;
    this.form.setValue({ email: each.email, password: each.password });
    await this.#enter({ email: each.email, password: each.password });
  }

  async #enter(body: SignIn): Promise<void> {
    this.busy.set(true);
    this.problem.set(null);
    try {
      await firstValueFrom(this.#user.signIn(body));
      await this.#router.navigateByUrl(returnAddress(this.then()));
    } catch (error) {
      this.problem.set(toProblemError(error));
    } finally {
      this.busy.set(false);
    }
  }
}
