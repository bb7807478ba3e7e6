import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { MatSnackBar } from '@angular/material/snack-bar';
import { RouterLink } from '@angular/router';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { ShortcutHelp } from '../ui/shortcuts/shortcut-help';
import { THEMES, ThemeChoice } from './theme-choice';
import type { Theme } from './theme-choice';

/** Who is signed in, and what belongs to them: settings, theme, keys, signing out. */
@Component({
  selector: 'nl-person-menu',
  imports: [MatIcon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink],
  templateUrl: './person-menu.html',
  styleUrl: './person-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonMenu {
  readonly #dialog = inject(MatDialog);
  readonly #snackBar = inject(MatSnackBar);
  readonly #user = inject(CurrentUser);
  readonly #themeChoice = inject(ThemeChoice);

  readonly chosen = output();

  protected readonly name = computed(() => this.#user.person()?.name ?? '');
  protected readonly roles = computed(() => this.#user.person()?.roles.join(', ') ?? '');
  protected readonly shopName = computed(() => this.#user.shop()?.name ?? '');
  protected readonly themes = computed(() =>
    THEMES.map((theme) => ({
      theme,
      word: THEME_WORDS[theme],
      chosen: theme === this.#themeChoice.theme(),
    })),
  );

  protected chooseTheme(theme: Theme): void {
    this.#themeChoice.choose(theme);
  }

  protected showKeys(): void {
    this.#dialog.open(ShortcutHelp, { width: '28rem' });
  }

  protected async signOut(): Promise<void> {
    this.chosen.emit();
    try {
      await this.#user.signOut();
    } catch (error) {
      this.#snackBar.open(`You are still signed in: ${toProblemError(error).message}`, 'Close');
    }
  }
}

const THEME_WORDS: Readonly<Record<Theme, string>> = {
  system: 'Theme as the system has it',
  light: 'Light theme',
  dark: 'Dark theme',
};
