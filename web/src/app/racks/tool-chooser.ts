import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { IntoView } from '../ui/into-view/into-view';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import type { ToolOffer } from './tool-offers';
import { searchOffers } from './tool-offers';

export interface ToolChoice {
  readonly heading: string;
  readonly offers: readonly ToolOffer[];
}

/**
 * Which tool? One touch takes a tool that fits. One that does not fit says why, and is taken only on
 * a second touch: the record must be able to say what really stands there. Another taper is refused.
 */
@Component({
  selector: 'nl-tool-chooser',
  imports: [
    FormsModule,
    IntoView,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatFormField,
    MatInput,
    MatLabel,
    SeverityMark,
  ],
  templateUrl: './tool-chooser.html',
  styleUrl: './tool-chooser.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ToolChooser {
  readonly #dialog = inject<MatDialogRef<ToolChooser, number>>(MatDialogRef);
  protected readonly choice = inject<ToolChoice>(MAT_DIALOG_DATA);

  protected readonly search = signal('');
  protected readonly doubted = signal<number | null>(null);
  protected readonly offers = computed(() => searchOffers(this.choice.offers, this.search()));

  protected choose(offer: ToolOffer): void {
    if (offer.refused) return;
    if (offer.against.length > 0 && this.doubted() !== offer.number) {
      this.doubted.set(offer.number);
      return;
    }
    this.#dialog.close(offer.number);
  }
  protected takeAnyway(offer: ToolOffer): void {
    this.#dialog.close(offer.number);
  }
  /** Enter in the search takes the only tool left, if nothing is against it. */
  protected takeOnlyOne(): void {
    const [offer, second] = this.offers();
    if (offer && !second) this.choose(offer);
  }
}
