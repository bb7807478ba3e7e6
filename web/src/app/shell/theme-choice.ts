import { DOCUMENT, Injectable, inject, signal } from '@angular/core';

export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];
const KEPT_AS = 'nightlatch.theme';

/** Light, dark or as the system has it; kept in this browser, for it belongs to the screen. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  readonly #document = inject(DOCUMENT);
  readonly #theme = signal<Theme>(this.#kept());
  readonly theme = this.#theme.asReadonly();

  choose(theme: Theme): void {
    this.#theme.set(theme);
    this.#document.defaultView?.localStorage.setItem(KEPT_AS, theme);
    this.apply();
  }

  /** Called once before the first page is drawn, so that it never flashes in the other theme. */
  apply(): void {
    const root = this.#document.documentElement;
    const theme = this.#theme();
    if (theme === 'system') root.removeAttribute('data-theme');
    else root.setAttribute('data-theme', theme);
  }

  #kept(): Theme {
    const kept = this.#document.defaultView?.localStorage.getItem(KEPT_AS);
    return THEMES.find((theme) => theme === kept) ?? 'system';
  }
}
