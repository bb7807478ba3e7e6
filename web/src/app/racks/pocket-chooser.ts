import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';

export interface PocketOffer {
  readonly pocket: number;
  /** What happens there: "empty", "changes places with T7 (3 mm ball)". */
  readonly words: string;
  /** What is against it, if anything. */
  readonly against: readonly string[];
  readonly refused: boolean;
}
export interface PocketChoice {
  readonly heading: string;
  readonly offers: readonly PocketOffer[];
}

/** Where to? Pockets in their order; a full one means that two tools change places. */
@Component({
  selector: 'nl-pocket-chooser',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  templateUrl: './pocket-chooser.html',
  styleUrl: './tool-chooser.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PocketChooser {
  protected readonly choice = inject<PocketChoice>(MAT_DIALOG_DATA);
}
