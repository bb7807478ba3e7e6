import { Injectable, inject } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';
import type { Question } from './confirm-dialog';
import { ConfirmDialog } from './confirm-dialog';

/** Asks before something is taken away. Escape and a click beside the dialog mean "leave it". */
@Injectable({ providedIn: 'root' })
export class Confirm {
  readonly #dialog = inject(MatDialog);

  async ask(question: Question): Promise<boolean> {
    const dialog = this.#dialog.open<ConfirmDialog, Question, boolean>(ConfirmDialog, {
      data: question,
      maxWidth: '32rem',
    });
    return (await firstValueFrom(dialog.afterClosed())) === true;
  }
}
