import { ChangeDetectionStrategy, Component, DOCUMENT, inject } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { Router, RouterLink, RouterOutlet } from '@angular/router';
import { BenchStore } from '../bench/bench-store';
import { ShortcutHelp } from '../ui/shortcuts/shortcut-help';
import { Shortcuts } from '../ui/shortcuts/shortcuts';
import { Navigation } from './navigation';
import { NavigationDrawer } from './navigation-drawer';
import { PLACES } from './places';

/** What stands around every page of a signed-in person. */
@Component({
  selector: 'nl-shell',
  imports: [MatIcon, MatIconButton, Navigation, RouterLink, RouterOutlet],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  readonly #dialog = inject(MatDialog);
  readonly #document = inject(DOCUMENT);
  readonly #router = inject(Router);

  constructor() {
    inject(BenchStore).follow();
    const go = PLACES.map((place) => ({
      keys: `g ${place.key}`,
      does: `Go to ${place.word}`,
      place: 'Everywhere',
      run: () => void this.#router.navigateByUrl(place.path),
    }));
    const help = { keys: '?', does: 'Show these keys', place: 'Everywhere' };
    inject(Shortcuts).add({ ...help, run: () => this.#showKeys() }, ...go);
  }

  protected openDrawer(): void {
    this.#dialog.open(NavigationDrawer, {
      ariaLabel: 'Places',
      panelClass: 'drawer',
      position: { left: '0', top: '0' },
      height: '100%',
      width: '16rem',
      maxWidth: '85vw',
    });
  }

  /** A plain `#main` link would leave the page: the base address is the site's root. */
  protected skipToPage(event: Event): void {
    event.preventDefault();
    const page = this.#document.getElementById('page');
    page?.focus();
    page?.scrollIntoView();
  }

  #showKeys(): void {
    this.#dialog.open(ShortcutHelp, { width: '28rem' });
  }
}
