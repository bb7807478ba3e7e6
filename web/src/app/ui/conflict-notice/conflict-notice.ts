import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Revision } from '#contracts';
import { Notice } from '../notice/notice';
import { formatMoment } from '../time';

/**
 * Another person saved first. Says who, when and what they changed, and offers to go on from theirs
 * with one's own changes still in place; nothing is saved until the person looks and saves again.
 */
@Component({
  selector: 'nl-conflict-notice',
  imports: [MatButton, Notice],
  templateUrl: './conflict-notice.html',
  styleUrl: './conflict-notice.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConflictNotice {
  /** What the revision is of: "loading", "description". */
  readonly subject = input.required<string>();
  readonly theirs = input.required<Revision>();
  /** What they changed, in sentences. */
  readonly changes = input<readonly string[]>([]);
  /** Where both changed the same thing. */
  readonly clashes = input<readonly string[]>([]);
  readonly goneOn = output();

  protected readonly heading = computed(() => {
    const { madeBy, madeAt, number } = this.theirs();
    const who = madeBy ?? 'Someone';
    const when = formatMoment(madeAt, new Date());
    return `${who} saved ${this.subject()} ${number} (${when}) while you were changing it.`;
  });
}
