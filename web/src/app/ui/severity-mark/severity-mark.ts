import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { MarkKind } from './mark-kind';
import { MARK_WORDS } from './mark-kind';

/**
 * The shape of a severity or verdict with its word: filled octagon with a bar, half-filled square,
 * small ring, closed latch. The word is always there; `wordUnseen` keeps it for readers only, where
 * a sentence that says the same stands right beside.
 */
@Component({
  selector: 'nl-severity-mark',
  templateUrl: './severity-mark.html',
  styleUrl: './severity-mark.scss',
  host: { '[class]': 'kind()', '[class.large]': 'large()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SeverityMark {
  readonly kind = input.required<MarkKind>();
  /** Another word than the usual one, such as "stopped" for a verdict. */
  readonly word = input<string>();
  /** A count that follows the word: "stop 3". */
  readonly count = input<number>();
  readonly wordUnseen = input(false);
  readonly large = input(false);

  protected readonly shownWord = computed(() => this.word() ?? MARK_WORDS[this.kind()]);
}
