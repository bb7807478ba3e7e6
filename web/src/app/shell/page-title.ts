import { Injectable, inject } from '@angular/core';
import { Title } from '@angular/platform-browser';
import type { RouterStateSnapshot } from '@angular/router';
import { TitleStrategy } from '@angular/router';

/** The browser's tab says the place first: many tabs stand open on a workshop computer. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  readonly #title = inject(Title);

  override updateTitle(snapshot: RouterStateSnapshot): void {
    const place = this.buildTitle(snapshot);
    this.#title.setTitle(place ? `${place} · Nightlatch` : 'Nightlatch');
  }
}
