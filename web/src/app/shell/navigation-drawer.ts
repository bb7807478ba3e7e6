import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatDialogRef } from '@angular/material/dialog';
import { Navigation } from './navigation';

/** The navigation on a narrow screen: a drawer from the left that keeps focus until it closes. */
@Component({
  selector: 'nl-navigation-drawer',
  imports: [Navigation],
  template: '<nl-navigation (placeChosen)="close()" />',
  styleUrl: './navigation-drawer.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NavigationDrawer {
  readonly #dialog = inject<MatDialogRef<NavigationDrawer>>(MatDialogRef);

  protected close(): void {
    this.#dialog.close();
  }
}
