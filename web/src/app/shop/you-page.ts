import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  signal,
} from '@angular/core';
import type { AbstractControl, ValidationErrors } from '@angular/forms';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { MatSlideToggle } from '@angular/material/slide-toggle';
import { MatSnackBar } from '@angular/material/snack-bar';
import { firstValueFrom } from 'rxjs';
import type { OwnChange, Units } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import type { Theme } from '../shell/theme-choice';
import { THEMES, ThemeChoice } from '../shell/theme-choice';
import { CurrentUser } from '../sign-in/current-user';
import { Notice } from '../ui/notice/notice';
import { Shortcuts } from '../ui/shortcuts/shortcuts';

/** One's own name, units, theme, keys and password. */
@Component({
  selector: 'nl-you-page',
  imports: [
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatRadioButton,
    MatRadioGroup,
    MatSlideToggle,
    Notice,
    ReactiveFormsModule,
  ],
  templateUrl: './you-page.html',
  styleUrl: './you-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class YouPage {
  readonly #snackBar = inject(MatSnackBar);
  readonly #themeChoice = inject(ThemeChoice);
  protected readonly shortcuts = inject(Shortcuts);
  protected readonly user = inject(CurrentUser);

  protected readonly theme = this.#themeChoice.theme;
  protected readonly themes = THEMES.map((theme) => ({ theme, word: THEME_WORDS[theme] }));
  protected readonly roles = computed(() => this.user.person()?.roles.join(', ') ?? '');
  protected readonly saving = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly passwordProblem = signal<ProblemError | null>(null);
  protected readonly name = new FormControl('', {
    nonNullable: true,
    validators: [Validators.required, Validators.maxLength(200)],
  });
  protected readonly passwords = new FormGroup(
    {
      current: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
      next: new FormControl('', {
        nonNullable: true,
        validators: [Validators.required, Validators.minLength(12), Validators.maxLength(200)],
      }),
      again: new FormControl('', { nonNullable: true }),
    },
    { validators: sameTwice },
  );

  constructor() {
    effect(() => {
      const name = this.user.person()?.name;
      if (name !== undefined && !this.name.dirty) this.name.setValue(name);
    });
  }

  protected chooseTheme(theme: Theme): void {
    this.#themeChoice.choose(theme);
  }

  protected async chooseUnits(units: Units): Promise<void> {
    await this.#change({ units }, 'Lengths are shown in ' + UNIT_WORDS[units] + ' now.');
  }

  protected async saveName(): Promise<void> {
    if (this.name.invalid) return this.name.markAsTouched();
    const saved = await this.#change({ name: this.name.value }, 'Your name is saved.');
    if (saved) this.name.markAsPristine();
  }

  protected async changePassword(): Promise<void> {
    this.passwords.markAllAsTouched();
    if (this.passwords.invalid || this.saving()) return;
    const { current, next } = this.passwords.getRawValue();
    const said = 'Your password is changed. Other places where you were signed in are signed out.';
    const saved = await this.#change({ password: { current, next } }, said, this.passwordProblem);
    if (saved) this.passwords.reset();
  }

  async #change(change: OwnChange, said: string, problem = this.problem): Promise<boolean> {
    this.saving.set(true);
    problem.set(null);
    try {
      await firstValueFrom(this.user.changeOwn(change));
      this.#snackBar.open(said);
      return true;
    } catch (error) {
      problem.set(toProblemError(error));
      return false;
    } finally {
      this.saving.set(false);
    }
  }
}

const THEME_WORDS: Readonly<Record<Theme, string>> = {
  system: 'as the system has it',
  light: 'light',
  dark: 'dark, for the night shift',
};
const UNIT_WORDS: Readonly<Record<Units, string>> = { mm: 'millimetres', inch: 'inches' };

/** Marks the second field, so that the message stands where the slip is. */
function sameTwice(group: AbstractControl): ValidationErrors | null {
  const { next, again } = group.value as { next: string; again: string };
  const differs = next !== again;
  group.get('again')?.setErrors(differs ? { differs: true } : null);
  return differs ? { differs: true } : null;
}
