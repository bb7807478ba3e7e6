import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatProgressBar } from '@angular/material/progress-bar';
import { RouterLink } from '@angular/router';
import type { CheckProgress } from '#contracts';
import { percentRead } from '../bench/bench-lists';
import { formatBytes } from '../ui/count';
import { markOfCheck } from '../ui/severity-mark/mark-kind';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import type { UploadItem } from './upload-item';
import { isUnderWay, percentSent } from './upload-item';

/** One file: on its way, stored with its check, or not taken and why. */
@Component({
  selector: 'nl-upload-row',
  imports: [MatButton, MatIcon, MatIconButton, MatProgressBar, RouterLink, SeverityMark],
  templateUrl: './upload-row.html',
  styleUrl: './upload-row.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UploadRow {
  readonly item = input.required<UploadItem>();
  /** How far the check of a stored file has got, when anything was heard. */
  readonly progress = input<CheckProgress | null>(null);
  readonly sendAgain = output();
  readonly taken = output();

  protected readonly size = computed(() => formatBytes(this.item().bytes));
  protected readonly stored = computed(() => {
    const { state } = this.item();
    return state.step === 'stored' ? state.stored : null;
  });
  protected readonly trouble = computed(() => {
    const { state } = this.item();
    return state.step === 'refused' || state.step === 'failed' ? state : null;
  });
  protected readonly canSendAgain = computed(() => this.item().state.step === 'failed');
  protected readonly underWay = computed(() => isUnderWay(this.item()));
  protected readonly words = computed(() => WORDS[this.item().state.step]);
  protected readonly storedWords = computed(() => {
    const stored = this.stored();
    if (!stored) return '';
    return stored.unchanged
      ? `same bytes as revision ${stored.revision}, checked again`
      : `stored as revision ${stored.revision}`;
  });
  protected readonly mark = computed(() =>
    markOfCheck(this.progress() ?? { state: 'queued', verdict: null }),
  );
  /** Per cent of the step under way: bytes sent, then lines read; null when it cannot be counted. */
  protected readonly percent = computed(() => {
    const progress = this.progress();
    if (progress?.state === 'running') return percentRead(progress);
    return percentSent(this.item());
  });
  protected readonly barShown = computed(
    () => this.underWay() || this.progress()?.state === 'running',
  );
  protected readonly dropWords = computed(() =>
    this.underWay() ? `Break off ${this.item().name}` : `Take ${this.item().name} off this list`,
  );
}

const WORDS: Readonly<Record<UploadItem['state']['step'], string>> = {
  waiting: 'waits for its turn',
  sending: 'being sent',
  storing: 'being stored',
  stored: '',
  refused: 'Not taken',
  failed: 'Not sent',
};
