import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { BenchStore } from '../bench/bench-store';
import { PersonMenu } from './person-menu';
import { PLACES } from './places';

/** The list of places with what waits in each, and who is signed in. Drawn at the left and in the drawer. */
@Component({
  selector: 'nl-navigation',
  imports: [MatIcon, PersonMenu, RouterLink, RouterLinkActive],
  templateUrl: './navigation.html',
  styleUrl: './navigation.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Navigation {
  readonly #bench = inject(BenchStore);

  readonly placeChosen = output();

  protected readonly places = computed(() => {
    const waiting = this.#bench.needingSomeone();
    return PLACES.map((place) => ({
      ...place,
      waiting: place.path === '/bench' && 0 < waiting ? waiting : null,
    }));
  });
}
