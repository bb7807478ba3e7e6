import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';

export interface Question {
  readonly heading: string;
  /** What will happen, and to whom. */
  readonly text: string;
  /** The act itself, as a verb: "Deactivate". */
  readonly act: string;
  /** What leaving does; "Leave as it is" when not given. */
  readonly leave?: string;
  /** Whether the act takes something away; then it is drawn in brick. */
  readonly takesAway?: boolean;
}

@Component({
  selector: 'nl-confirm-dialog',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  templateUrl: './confirm-dialog.html',
  styleUrl: './confirm-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly question = inject<Question>(MAT_DIALOG_DATA);
}
