import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ReportSummary } from '#contracts';
import { wordCoverage, wordLines } from '../word-report';
import type { ShownFinding } from '../shown-finding';

const NOT_FOLLOWED: ReadonlySet<string> = new Set(['not-modelled', 'unreadable-block']);

/** What the check understood, and what no check of numbers can see. */
@Component({
  selector: 'nl-what-it-covers',
  templateUrl: './what-it-covers.html',
  styleUrl: './what-it-covers.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WhatItCovers {
  readonly summary = input.required<ReportSummary>();
  /** Every finding, whatever the filter. */
  readonly findings = input<readonly ShownFinding[]>([]);
  readonly lineAsked = output<number>();

  protected readonly coverage = computed(() => wordCoverage(this.summary()));
  protected readonly isWhole = computed(
    () => this.summary().coverage.blocks === this.summary().coverage.modelled,
  );
  readonly #missed = computed(() =>
    this.findings().filter((each) => NOT_FOLLOWED.has(each.finding.rule)),
  );
  protected readonly missedLines = computed(() =>
    wordLines(this.#missed().map(({ line }) => line)),
  );
  protected readonly firstMissed = computed(() => this.#missed()[0]?.line ?? null);
}
