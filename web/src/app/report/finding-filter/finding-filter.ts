import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { SeverityMark } from '../../ui/severity-mark/severity-mark';
import type { Severity } from '#engine';
import type { FindingFilter, RunMode } from '../shown-finding';
import { EVERYTHING, SEVERITIES, isOpen } from '../shown-finding';

/** Which findings to show: by severity, tool and words, for a run somebody stands by or nobody does. */
@Component({
  selector: 'nl-finding-filter',
  imports: [SeverityMark],
  templateUrl: './finding-filter.html',
  styleUrl: './finding-filter.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingFilterBar {
  readonly counts = input.required<Readonly<Record<Severity, number>>>();
  /** Tools that findings name. */
  readonly tools = input<readonly number[]>([]);
  readonly filter = model.required<FindingFilter>();
  readonly mode = model.required<RunMode>();

  protected readonly chips = computed(() =>
    SEVERITIES.map((severity) => ({
      severity,
      count: this.counts()[severity],
      on: this.filter().severities.has(severity),
    })),
  );
  protected readonly isOpen = computed(() => isOpen(this.filter()));

  toggle(severity: Severity): void {
    this.filter.update((filter) => {
      const severities = new Set(filter.severities);
      if (!severities.delete(severity)) severities.add(severity);
      return { ...filter, severities };
    });
  }
  protected chooseTool(value: string): void {
    this.filter.update((filter) => ({ ...filter, tool: value === '' ? null : Number(value) }));
  }
  protected write(text: string): void {
    this.filter.update((filter) => ({ ...filter, text }));
  }
  protected clear(): void {
    this.filter.set(EVERYTHING);
  }
}
