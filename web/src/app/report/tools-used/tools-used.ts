import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ReportSummary, Units } from '#contracts';
import type { Tool } from '#engine';
import { formatCount } from '../../ui/count';
import { formatLength } from '../../ui/length';
import { formatDuration } from '../../ui/time';

/** The tools a program calls, in order of call, with what each is asked to do. */
@Component({
  selector: 'nl-tools-used',
  templateUrl: './tools-used.html',
  styleUrl: './tools-used.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ToolsUsed {
  readonly used = input.required<ReportSummary['tools']>();
  readonly tools = input<readonly Tool[]>([]);
  readonly units = input<Units>('mm');
  /** A tool another part of the page points at. */
  readonly pointedOut = input<number | null>(null);
  readonly toolFocused = output<number | null>();
  readonly lineAsked = output<number>();

  protected readonly rows = computed(() =>
    [...this.used()]
      .sort((a, b) => a.firstLine - b.firstLine)
      .map((use, index) => {
        const tool = this.tools().find((each) => each.number === use.number);
        return {
          ...use,
          order: index + 1,
          name: tool?.name ?? 'not in the tool list',
          known: tool !== undefined,
          diameter: tool ? formatLength(tool.diameter, this.units(), 3) : '–',
          gaugeLength: tool ? formatLength(tool.gaugeLength, this.units()) : '–',
          place: use.pocket === null ? 'none' : String(use.pocket),
          line: formatCount(use.firstLine),
          cutting: formatDuration(use.cutSeconds),
          cut: this.#cut(use.cutLength),
          deepest: formatLength(use.lowest, this.units()),
        };
      }),
  );

  /** Cut length runs to hundreds of metres: metres or feet say it better. */
  #cut(mm: number): string {
    if (this.units() === 'mm') {
      return mm < 10_000 ? formatLength(mm, 'mm', 0) : `${(mm / 1000).toFixed(1)} m`;
    }
    return mm < 25.4 * 120 ? formatLength(mm, 'inch', 0) : `${(mm / 304.8).toFixed(1)} ft`;
  }
}
