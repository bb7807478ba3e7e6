import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ReportSummary } from '#contracts';
import { formatDuration } from '../../ui/time';

/** How long the run takes, parted by what the machine does meanwhile. */
@Component({
  selector: 'nl-run-times',
  templateUrl: './run-times.html',
  styleUrl: './run-times.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunTimes {
  readonly seconds = input.required<ReportSummary['seconds']>();

  protected readonly total = computed(() => formatDuration(this.seconds().total));
  protected readonly parts = computed(() => {
    const { total, cutting, rapid, changes, dwell } = this.seconds();
    const rest = Math.max(0, total - cutting - rapid - changes - dwell);
    return [
      { name: 'cutting', seconds: cutting },
      { name: 'rapid', seconds: rapid },
      { name: 'tool changes', seconds: changes },
      { name: 'dwell', seconds: dwell },
      // Feed with the spindle still, and whatever else is none of these.
      { name: 'other', seconds: rest < 0.05 ? 0 : rest },
    ]
      .filter((part) => part.seconds > 0)
      .map((part) => ({
        ...part,
        look: part.name.replace(' ', '-'),
        share: total > 0 ? (100 * part.seconds) / total : 0,
        time: formatDuration(part.seconds),
      }));
  });
}
