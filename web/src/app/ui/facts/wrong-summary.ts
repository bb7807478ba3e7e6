import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  ElementRef,
  afterRenderEffect,
  computed,
  inject,
  input,
} from '@angular/core';
import { bringIntoView } from '../into-view/into-view';
import { Notice } from '../notice/notice';
import { counted } from '../count';
import type { MarkedFact } from './wrong-facts';

/** Everything that keeps a form from being saved, each with a way to its field. */
@Component({
  selector: 'nl-wrong-summary',
  imports: [Notice],
  templateUrl: './wrong-summary.html',
  styleUrl: './wrong-summary.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WrongSummary {
  readonly #document = inject(DOCUMENT);
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);

  readonly facts = input.required<readonly MarkedFact[]>();

  protected readonly heading = computed(
    () =>
      `${counted(this.facts().length, 'entry', 'entries')} to put right; nothing was saved, nothing lost.`,
  );

  constructor() {
    // After each attempt, also when the same entries are still wrong.
    afterRenderEffect(() => {
      if (this.facts().length > 0) bringIntoView(this.#host.nativeElement);
    });
  }

  protected goTo(fact: MarkedFact): void {
    if (fact.fieldId === undefined) return;
    const field = this.#document.getElementById(fact.fieldId);
    field?.scrollIntoView({ block: 'center' });
    field?.focus();
  }
}
