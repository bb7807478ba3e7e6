import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import type { LoadingHistory as History } from '#contracts';
import type { Tool } from '#engine';
import { toProblemError } from '../http/problem-error';
import { MachineClient } from '../machines/machine-client';
import { MomentPipe } from '../ui/moment-pipe';
import { Notice } from '../ui/notice/notice';
import { wordDifferences } from './loading-words';

export type PastLoading = History['revisions'][number];

/** Who loaded what, when and why, newest first; an earlier loading can be taken up again. */
@Component({
  selector: 'nl-loading-history',
  imports: [MatButton, MomentPipe, Notice],
  templateUrl: './loading-history.html',
  styleUrl: './loading-history.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LoadingHistory {
  readonly #client = inject(MachineClient);

  readonly machineId = input.required<string>();
  /** The newest revision: when it grows the list is fetched again. */
  readonly newest = input.required<number>();
  readonly tools = input.required<ReadonlyMap<number, Tool>>();
  readonly canGoBack = input(false);
  readonly wentBack = output<PastLoading>();

  protected readonly past = rxResource({
    params: () => ({ id: this.machineId(), newest: this.newest() }),
    stream: ({ params }) => this.#client.loadings(params.id),
  });
  protected readonly problem = computed(() => {
    const error = this.past.error();
    return error ? toProblemError(error) : null;
  });
  protected readonly entries = computed(() => {
    const revisions = this.past.hasValue() ? this.past.value() : [];
    return revisions.map((revision, index) => {
      const before = revisions[index + 1];
      return {
        revision,
        differences: before
          ? wordDifferences(before.loading, revision.loading, this.tools())
          : [`${revision.loading.pockets.length} pockets loaded when the record begins.`],
      };
    });
  });
}
