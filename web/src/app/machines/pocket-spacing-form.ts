import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatSelect } from '@angular/material/select';
import { pocketSchema } from '#contracts';
import { CurrentUser } from '../sign-in/current-user';
import { childOf, setEntries } from '../ui/facts/fact-form';
import type { FactForm } from '../ui/facts/fact-form';
import { part } from '../ui/facts/fact-node';
import { wordFigure } from '../ui/facts/measure';
import { placeRow, spaceEvenly } from './pocket-spacing';

/** Teach the two outer pockets, and let the ones between be worked out. */
@Component({
  selector: 'nl-pocket-spacing',
  imports: [MatButton, MatFormField, MatLabel, MatOption, MatSelect],
  templateUrl: './pocket-spacing-form.html',
  styleUrl: './pocket-spacing-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PocketSpacing {
  readonly #user = inject(CurrentUser);

  readonly form = input.required<FactForm>();
  /** The rack as typed at this moment. */
  readonly rack = input.required<unknown>();
  /** The part of the form the rack stands in, where the form is of several. */
  readonly under = input<string>();

  /** Pockets whose figures are all there; only between two of those can a row be worked out. */
  protected readonly pockets = computed(() => {
    const pockets = part(this.rack(), 'pockets');
    const typed: readonly unknown[] = Array.isArray(pockets) ? pockets : [];
    return typed.flatMap((each) => {
      const pocket = pocketSchema.safeParse(each);
      return pocket.success ? [pocket.data] : [];
    });
  });
  protected readonly first = linkedSignal(() => this.pockets()[0]?.number);
  protected readonly last = linkedSignal(() => this.pockets().at(-1)?.number);
  protected readonly said = signal('');

  protected readonly spaced = computed(() => {
    const find = (number: number | undefined) =>
      this.pockets().find((each) => each.number === number);
    const [first, last] = [find(this.first()), find(this.last())];
    return first && last ? spaceEvenly(first, last) : null;
  });
  protected readonly words = computed(() => {
    const spaced = this.spaced();
    if (!spaced) return '';
    if ('sentence' in spaced) return spaced.sentence;
    const pitch = wordFigure(Math.round(spaced.pitch * 1000) / 1000, 'length', this.#user.units());
    const between = spaced.pockets.length - 2;
    return between === 0
      ? `They are neighbours, ${pitch} apart; there is none between them.`
      : `${between} between them, ${pitch} from grip to grip. A place worked out is not taught: check it on the machine.`;
  });
  protected readonly canFill = computed(() => {
    const spaced = this.spaced();
    return spaced !== null && 'pockets' in spaced && 2 < spaced.pockets.length;
  });

  protected fill(): void {
    const spaced = this.spaced();
    const under = this.under();
    const group = under ? childOf(this.form().root, under) : this.form().root;
    if (!spaced || 'sentence' in spaced || group.kind !== 'group') return;
    const list = childOf(group, 'pockets');
    if (list.kind !== 'list') return;
    const placed = placeRow(this.pockets(), spaced.pockets);
    setEntries(this.form(), list, placed);
    this.said.set(`The rack has ${placed.length} pockets now; nothing is saved yet.`);
  }
}
