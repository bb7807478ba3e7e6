import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { CurrentUser } from '../sign-in/current-user';
import { PageHeader } from '../ui/page-header/page-header';

/** The Shop place: people, the audit trail, the shop's settings and one's own. */
@Component({
  selector: 'nl-shop-page',
  imports: [PageHeader, RouterLink, RouterLinkActive, RouterOutlet],
  templateUrl: './shop-page.html',
  styleUrl: './shop-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShopPage {
  readonly #user = inject(CurrentUser);

  protected readonly shopName = computed(() => this.#user.shop()?.name ?? 'Shop');
  protected readonly pages = computed(() =>
    [
      { path: 'people', word: 'People', shown: this.#user.may('manage-people') },
      {
        path: 'audit',
        word: 'Audit trail',
        shown: this.#user.may('set-policy') || this.#user.may('manage-people'),
      },
      { path: 'settings', word: 'Settings', shown: true },
      { path: 'you', word: 'You', shown: true },
    ].filter((page) => page.shown),
  );
}
