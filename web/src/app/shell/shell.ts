import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { CurrentUser } from '../sign-in/current-user';
import { PLACES } from './places';

@Component({
  selector: 'nl-shell',
  imports: [MatIcon, RouterLink, RouterLinkActive, RouterOutlet],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  protected readonly user = inject(CurrentUser);
  protected readonly places = PLACES;
}
