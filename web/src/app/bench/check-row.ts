import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { RouterLink } from '@angular/router';
import type { CheckRecord } from '#contracts';
import { formatCount } from '../ui/count';
import { MomentPipe } from '../ui/moment-pipe';
import { markOfCheck } from '../ui/severity-mark/mark-kind';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import { percentRead } from './bench-lists';
import { countsInWords } from './counts-in-words';

/** One check in a list of the bench: its mark, the program, the machine, and how far or how it went. */
@Component({
  selector: 'nl-check-row',
  imports: [MatButton, MatProgressBar, MomentPipe, RouterLink, SeverityMark],
  templateUrl: './check-row.html',
  styleUrl: './check-row.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CheckRow {
  readonly check = input.required<CheckRecord>();
  /** Which of its names leads: on a program's own page that is the machine. */
  readonly leads = input<'program' | 'machine'>('program');
  /** Whether to offer the check again. */
  readonly canCheckAgain = input(false);
  readonly busy = input(false);
  readonly checkAgain = output();

  protected readonly mark = computed(() => markOfCheck(this.check()));
  protected readonly underWay = computed(() => ['queued', 'running'].includes(this.check().state));
  protected readonly reading = computed(() => this.check().state === 'running');
  protected readonly name = computed(() =>
    this.leads() === 'machine' ? this.check().machineName : this.check().programName,
  );
  protected readonly aside = computed(() => {
    const { programRevision, machineName, outOfDate } = this.check();
    if (this.leads() === 'program') return `revision ${programRevision} · ${machineName}`;
    return outOfDate ? 'out of date: something it was held against has changed' : '';
  });
  protected readonly percent = computed(() => percentRead(this.check()));
  protected readonly progressWords = computed(() => {
    const check = this.check();
    if (check.state === 'queued') return 'waits for its turn';
    if (!(0 < check.lines)) return 'reading';
    return `${formatCount(check.linesRead)} of ${formatCount(check.lines)} lines`;
  });
  protected readonly counts = computed(() => countsInWords(this.check().counts));
}
