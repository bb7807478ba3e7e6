import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { firstValueFrom } from 'rxjs';
import type { ToolRecord } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { readFigure, suffixOf, wordBoth, wordFigure } from '../ui/facts/measure';
import { Notice } from '../ui/notice/notice';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import { formatMoment } from '../ui/time';
import { judgeJump } from './length-jump';
import { ToolClient } from './tool-client';

/** Ways of measuring that the shop may name; any other text is kept as typed. */
export const METHODS = ['setter', 'presetter', 'block', 'touch plate'] as const;

/** Records a measured gauge length; closes with the tool as it then stands. */
@Component({
  selector: 'nl-measure-dialog',
  imports: [
    FormsModule,
    MatButton,
    MatCheckbox,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatSuffix,
    Notice,
    SeverityMark,
  ],
  templateUrl: './measure-dialog.html',
  styleUrl: './measure-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MeasureDialog {
  readonly #client = inject(ToolClient);
  readonly #dialog = inject<MatDialogRef<MeasureDialog, ToolRecord>>(MatDialogRef);
  protected readonly record = inject<ToolRecord>(MAT_DIALOG_DATA);
  protected readonly units = inject(CurrentUser).units;
  protected readonly methods = METHODS;

  protected readonly typed = signal('');
  protected readonly method = signal(this.record.tool.measured?.method ?? METHODS[0]);
  protected readonly inTable = signal(true);
  protected readonly saving = signal(false);
  protected readonly tried = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);

  protected readonly suffix = computed(() => suffixOf('length', this.units()));
  protected readonly last = computed(() => {
    const { gaugeLength, measured } = this.record.tool;
    const when = measured
      ? `measured ${formatMoment(measured.at, new Date())}, ${measured.method}`
      : 'never measured';
    return `Last: ${wordFigure(gaugeLength, 'length', this.units())}, ${when}`;
  });
  readonly #read = computed(() => readFigure(this.typed(), 'length', this.units()));
  readonly #length = computed(() => {
    const read = this.#read();
    return 'stored' in read ? read.stored : null;
  });
  protected readonly wrong = computed(() => {
    const read = this.#read();
    if ('sentence' in read) return read.sentence;
    if ('empty' in read) return this.tried() ? 'Type the length the setter showed.' : null;
    return 0 < read.stored ? null : 'A gauge length is greater than 0.';
  });
  protected readonly matcher = { isErrorState: () => this.wrong() !== null };
  protected readonly jump = computed(() => {
    const length = this.#length();
    if (length === null || this.wrong() !== null) return null;
    const last = this.record.tool.gaugeLength;
    const kind = judgeJump(last, length);
    if (kind === 'none') return null;
    const by = length - last;
    const than = 0 < by ? 'longer' : 'shorter';
    const difference = `${wordBoth(Math.abs(by))} ${than} than the last value.`;
    return kind === 'large'
      ? {
          mark: 'stop' as const,
          words: `${difference} That is more than wear: is it the right tool, seated, in the right unit?`,
        }
      : { mark: 'hold' as const, words: `${difference} Look whether the cutter was changed.` };
  });
  protected readonly stickOut = computed(() => {
    const length = this.#length();
    const { gaugeLength, stickOut } = this.record.tool;
    if (length === null || length === gaugeLength) return null;
    return wordFigure(stickOut + length - gaugeLength, 'length', this.units());
  });

  protected async save(): Promise<void> {
    this.tried.set(true);
    const gaugeLength = this.#length();
    const method = this.method().trim();
    if (gaugeLength === null || this.wrong() !== null || method === '') return;
    this.saving.set(true);
    this.problem.set(null);
    try {
      const saved = await firstValueFrom(
        this.#client.measure(this.record.id, { gaugeLength, method, inTable: this.inTable() }),
      );
      this.#dialog.close(saved);
    } catch (error) {
      this.problem.set(toProblemError(error));
    } finally {
      this.saving.set(false);
    }
  }
}
