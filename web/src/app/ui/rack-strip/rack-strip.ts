import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import type { Units } from '#contracts';
import type { Loading, Rack, Tool } from '#engine';
import { wordFigure } from '../facts/measure';
import type { Mouth, RackMark, RackSlot } from './rack-slot';
import { MARKS_SHOWN, WORD_ROOM, layOutRack } from './lay-out-rack';

/** Width assumed until the box has been measured: the page's usual width. */
const USUAL_WIDTH = 1060;
/** Degrees by which a mouth that opens toward the person is turned. */
const TURN: Readonly<Record<Mouth, number>> = { toward: 0, left: 90, away: 180, right: 270 };

/**
 * The rack as it stands on the machine: pockets in their order, fork mouths where they open, each
 * tool's silhouette to scale. With `callOrder` the tools of a program carry their order in brass and
 * the others step back; `marks` says in words what is missing or wrong. Scrolls in its own box.
 */
@Component({
  selector: 'nl-rack-strip',
  templateUrl: './rack-strip.html',
  styleUrl: './rack-strip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackStrip {
  readonly #destroyRef = inject(DestroyRef);

  readonly rack = input.required<Rack>();
  readonly loading = input.required<Loading>();
  readonly tools = input.required<readonly Tool[]>();
  /** Tool numbers in the order in which a program first calls them. */
  readonly callOrder = input<readonly number[]>([]);
  readonly marks = input<readonly RackMark[]>([]);
  /** A pocket to point out, by its number: another part of the page speaks of it. */
  readonly pointedOut = input<number | null>(null);
  readonly units = input<Units>('mm');
  /** Whether choosing a pocket does something on this page; then pockets are buttons. */
  readonly canChoose = input(false);
  /** The pocket under the pointer or the focus; null when it left. */
  readonly pocketFocused = output<number | null>();
  readonly pocketChosen = output<number>();

  private readonly box = viewChild.required<ElementRef<HTMLElement>>('box');

  readonly #available = signal(USUAL_WIDTH);
  protected readonly drawing = computed(() =>
    layOutRack({
      rack: this.rack(),
      loading: this.loading(),
      tools: this.tools(),
      callOrder: this.callOrder(),
      marks: this.marks(),
      available: this.#available(),
    }),
  );
  protected readonly summary = computed(() => {
    const { heading, view, slots } = this.drawing();
    return `${heading}, ${view}: ${slots.length} places from ${this.drawing().leftEnd} to ${this.drawing().rightEnd}`;
  });

  constructor() {
    afterNextRender(() => {
      if (typeof ResizeObserver === 'undefined') return;
      const observer = new ResizeObserver(([entry]) => {
        if (entry && entry.contentRect.width > 0) this.#available.set(entry.contentRect.width);
      });
      observer.observe(this.box().nativeElement);
      this.#destroyRef.onDestroy(() => observer.disconnect());
    });
  }

  protected turn(mouth: Mouth): number {
    return TURN[mouth];
  }
  /** Baseline of a mark's word under its place; where there is no fork there is no mouth above it. */
  protected wordLine(slot: RackSlot, index: number): number {
    if (slot.pocket === null) return 37 + WORD_ROOM * index;
    return 54 + WORD_ROOM * (slot.state === 'in-spindle' ? index + 1 : index);
  }
  protected figure(length: number | null): string {
    return length === null ? '' : wordFigure(length, 'length', this.units());
  }
  protected focus(slot: RackSlot | null): void {
    this.pocketFocused.emit(slot?.pocket ?? null);
  }
  protected choose(slot: RackSlot): void {
    if (this.canChoose() && slot.pocket !== null) this.pocketChosen.emit(slot.pocket);
  }
  protected chooseByKey(event: Event, slot: RackSlot): void {
    event.preventDefault();
    this.choose(slot);
  }
  protected shownMarks(slot: RackSlot): readonly RackMark[] {
    return slot.marks.slice(0, MARKS_SHOWN);
  }
  protected tone(slot: RackSlot): 'stop' | 'hold' | null {
    if (slot.state === 'not-in-rack') return 'stop';
    if (slot.marks.length === 0) return null;
    return slot.marks.some((mark) => mark.severity === 'stop') ? 'stop' : 'hold';
  }
}
