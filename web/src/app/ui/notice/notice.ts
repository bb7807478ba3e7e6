import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import type { ProblemError } from '../../http/problem-error';

/** waiting: being fetched. empty: nothing yet. refused: not allowed or not valid. failed: went wrong. */
export type NoticeKind = 'waiting' | 'empty' | 'refused' | 'failed' | 'said';

/**
 * What a page says instead of, or above, its content. Give `problem` to word a failed request: its
 * sentence, what to do next and each wrong field; listen to `tryAgain` to offer the button.
 */
@Component({
  selector: 'nl-notice',
  imports: [MatButton, MatProgressBar],
  templateUrl: './notice.html',
  styleUrl: './notice.scss',
  host: { '[class]': 'shownKind()', '[attr.role]': 'role()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Notice {
  readonly kind = input<NoticeKind>('said');
  readonly heading = input<string>();
  readonly problem = input<ProblemError | null>(null);
  readonly canTryAgain = input(false);
  readonly tryAgain = output();

  protected readonly shownKind = computed<NoticeKind>(() => {
    const problem = this.problem();
    if (!problem) return this.kind();
    return 400 <= problem.status && problem.status < 500 ? 'refused' : 'failed';
  });
  protected readonly shownHeading = computed(() => this.heading() ?? this.problem()?.message);
  protected readonly detail = computed(() =>
    this.heading() ? this.problem()?.message : undefined,
  );
  protected readonly fields = computed(() => this.problem()?.problem.fields ?? []);
  protected readonly role = computed(() =>
    ['refused', 'failed'].includes(this.shownKind()) ? 'alert' : 'status',
  );
}
