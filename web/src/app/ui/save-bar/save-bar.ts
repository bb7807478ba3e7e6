import {
  ChangeDetectionStrategy,
  Component,
  ViewEncapsulation,
  input,
  model,
  output,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';

/** Stands at the foot of a page with unsaved changes: why (if a person likes), save, or drop them. */
@Component({
  selector: 'nl-save-bar',
  imports: [FormsModule, MatButton, MatFormField, MatInput, MatLabel],
  templateUrl: './save-bar.html',
  styleUrl: './save-bar.scss',
  // Its styles reach the page: whatever takes the focus must not end up beneath it.
  encapsulation: ViewEncapsulation.None,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SaveBar {
  /** What the saving makes: "Save as loading 42". */
  readonly act = input.required<string>();
  readonly saving = input(false);
  /** What leaving does: "Leave without saving". */
  readonly leave = input('Drop the changes');
  readonly reason = model('');
  readonly saved = output();
  readonly dropped = output();
}
