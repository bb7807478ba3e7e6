import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  DOCUMENT,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import type { ProgramText } from '#engine';
import { FindingCard } from '../finding-card/finding-card';
import type { RunMode, ShownFinding } from '../shown-finding';

/** Findings drawn at first, and more with each press: thousands at once would stall the page. */
const AT_ONCE = 40;

/** All findings one below the other, each with its line; what is printed of a report. */
@Component({
  selector: 'nl-finding-list',
  imports: [FindingCard],
  templateUrl: './finding-list.html',
  styleUrl: './finding-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingList {
  readonly findings = input.required<readonly ShownFinding[]>();
  readonly leftOut = input(0);
  readonly mode = input<RunMode>('attended');
  readonly texts = input<readonly ProgramText[]>([]);
  readonly current = input<string | null>(null);
  readonly lineAsked = output<number>();
  readonly findingAsked = output<string>();

  readonly #most = linkedSignal({ source: this.findings, computation: () => AT_ONCE });
  protected readonly shown = computed(() => this.findings().slice(0, this.#most()));
  protected readonly more = computed(() => this.findings().length - this.shown().length);
  protected readonly nextCount = computed(() => Math.min(this.more(), AT_ONCE));

  constructor() {
    // Paper has no button to press: a print shows all.
    const view = inject(DOCUMENT).defaultView;
    const showAll = (): void => this.#most.set(this.findings().length);
    view?.addEventListener('beforeprint', showAll);
    inject(DestroyRef).onDestroy(() => view?.removeEventListener('beforeprint', showAll));
  }

  protected showMore(): void {
    this.#most.update((most) => most + AT_ONCE);
  }
  protected ask(shown: ShownFinding, line: number): void {
    if (line === shown.line) this.findingAsked.emit(shown.id);
    else this.lineAsked.emit(line);
  }
}
