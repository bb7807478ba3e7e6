import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  afterNextRender,
  afterRenderEffect,
  computed,
  effect,
  inject,
  input,
  model,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import type { ProgramText } from '#engine';
import { formatCount } from '../../ui/count';
import { Notice } from '../../ui/notice/notice';
import { BlockWordsPanel } from '../block-words/block-words';
import { FindingCard } from '../finding-card/finding-card';
import type { RunMode, ShownFinding } from '../shown-finding';
import { drawRows, underlinesOf } from './draw-rows';
import type { LineRange } from './line-ranges';
import { joinRanges } from './line-ranges';
import type { Fold } from './line-rows';
import { layRows } from './line-rows';
import { MeasuredHeight } from './measured-height';
import { ProgramLines } from './program-lines';
import type { RowAnchor } from './row-anchor';
import { FoldPresses, anchorAt, openingAround, topFor } from './row-anchor';
import type { ScrollPlace, ScrollSize } from './scroll-map';
import { barHeight, follow, isAstray, isStuck, placeAt } from './scroll-map';
import { rowsWithin, stackRows, totalOf } from './stack-rows';

/** Rows are made in steps of this many px, so that a scroll inside a step makes none. */
const STEP = 240;
/** Rows kept ready above and below the window, px. */
const READY = 480;
/** The bar is set right once a scroll has come to rest (ms). */
const AT_REST = 160;
const FIRST_VIEW = 640;
/** Room above and below a finding's card (line-report.scss), px. */
const AROUND_CARD = 10;
/** A digit of the line numbers (0.75rem mono), px; the thin spaces between groups take less. */
const NUMBER_WIDTH = 6.9;

/**
 * The program as a marked-up proof: quiet stretches folded to a rule, each finding below its block,
 * the exact words underlined. Only the rows in the window exist, and their text is fetched by
 * ranges, so a program of a million lines scrolls like a short one.
 */
@Component({
  selector: 'nl-line-report',
  imports: [BlockWordsPanel, FindingCard, MeasuredHeight, Notice],
  providers: [ProgramLines],
  templateUrl: './line-report.html',
  styleUrl: './line-report.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineReport {
  readonly #destroyRef = inject(DestroyRef);
  protected readonly lines = inject(ProgramLines);

  readonly revisionId = input.required<string>();
  /** Lines of the program. */
  readonly lineCount = input.required<number>();
  /** Findings to show, ordered by line. */
  readonly findings = input.required<readonly ShownFinding[]>();
  /** Lines of the findings that a filter leaves out, ascending. */
  readonly leftOut = input<readonly number[]>([]);
  readonly mode = input<RunMode>('attended');
  readonly texts = input<readonly ProgramText[]>([]);
  /** The finding now read, by its id. */
  readonly current = model<string | null>(null);
  readonly lineShown = output<number>();

  private readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');

  readonly #opened = signal<readonly LineRange[]>([]);
  readonly #heights = signal<ReadonlyMap<string, number>>(new Map());
  readonly #place = signal<ScrollPlace>({ bar: 0, top: 0 });
  readonly #view = signal(FIRST_VIEW);
  readonly #presses = new FoldPresses();
  #anchor: RowAnchor | null = null;
  #restTimer: ReturnType<typeof setTimeout> | undefined;
  protected readonly width = signal(0);
  /** A line that was asked for, pointed out until the next one is. */
  protected readonly askedLine = signal<number | null>(null);
  /** The line whose words are spelt out below the report. */
  protected readonly wordsOf = signal<number | null>(null);
  protected readonly said = signal('');

  readonly #indexOf = computed(
    () => new Map(this.findings().map(({ id }, index) => [id, index] as const)),
  );
  readonly #segments = computed(() =>
    layRows({
      lines: this.lineCount(),
      findings: this.findings(),
      leftOut: this.leftOut(),
      opened: this.#opened(),
    }),
  );
  readonly #stack = computed(() => {
    const heights = this.#heights();
    const findings = this.findings();
    return stackRows(this.#segments(), (index) => heights.get(findings[index]!.id));
  });
  readonly #size = computed<ScrollSize>(() => ({
    total: totalOf(this.#stack()),
    view: this.#view(),
  }));
  protected readonly bar = computed(() => barHeight(this.#size()));
  readonly #step = computed(() => Math.floor(this.#place().top / STEP));
  readonly #rows = computed(() => {
    const top = Math.max(0, this.#step() * STEP - READY);
    return rowsWithin(this.#stack(), top, this.#view() + STEP + 2 * READY);
  });
  /** Where the rows lie in the scrolled element; it stays put while a scroll goes on. */
  readonly #shift = computed(() => this.#place().bar - this.#place().top);
  protected readonly layerTop = computed(() => (this.#rows()[0]?.top ?? 0) + this.#shift());
  readonly #underlines = computed(() => underlinesOf(this.findings()));
  protected readonly drawn = computed(() => {
    this.lines.version();
    return drawRows({
      stack: this.#stack(),
      rows: this.#rows(),
      findings: this.findings(),
      underlines: this.#underlines(),
      // An empty program still has a line to set findings at; there is nothing to fetch for it.
      text: (line) => (this.lineCount() === 0 ? '' : this.lines.text(line)),
      isMeasured: (id) => this.#heights().has(id),
    });
  });
  /** Room for line numbers, px; ranges of folds must fit. */
  protected readonly gutter = computed(() => {
    const range = 2 * formatCount(this.lineCount()).length + 1;
    return Math.ceil(range * NUMBER_WIDTH);
  });
  protected readonly hasUnfolded = computed(() => this.#opened().length > 0);

  constructor() {
    effect(() => {
      this.lines.open(this.revisionId(), this.lineCount());
      untracked(() => this.foldAll());
    });
    effect(() => {
      const stack = this.#stack();
      const shown = this.#rows()
        .filter((row) => stack.segments[row.segment]!.kind === 'lines')
        .map(({ line }) => ({ from: line, to: line }));
      this.revisionId();
      untracked(() => this.lines.want(joinRanges(shown, this.lineCount())));
    });
    afterRenderEffect(() => {
      this.#size();
      untracked(() => this.#holdStill());
    });
    afterNextRender(() => this.#watchSize());
    this.#destroyRef.onDestroy(() => clearTimeout(this.#restTimer));
  }

  /** Shows a line with its surroundings, unfolding what hides it. */
  showLine(line: number): void {
    const asked = Math.min(Math.max(1, Math.round(line)), Math.max(1, this.lineCount()));
    this.#open(openingAround(asked));
    this.askedLine.set(asked);
    this.#goTo({ line: asked, finding: null, below: this.#view() / 3 });
    this.said.set(`Line ${formatCount(asked)}.`);
    this.lineShown.emit(asked);
  }

  /** Shows a finding and makes it the one now read. */
  showFinding(id: string): void {
    const index = this.#indexOf().get(id);
    if (index === undefined) return;
    const shown = this.findings()[index]!;
    this.current.set(id);
    this.askedLine.set(null);
    this.#goTo({ line: shown.line, finding: id, below: Math.min(120, this.#view() / 3) });
    this.said.set(
      `Finding ${index + 1} of ${this.findings().length}, ${shown.severity}, line ${formatCount(shown.line)}: ${shown.message}`,
    );
  }

  /** The next finding in reading order (1), the one before (-1). */
  step(by: 1 | -1): void {
    const findings = this.findings();
    if (findings.length === 0) return;
    const at = this.#indexOf().get(this.current() ?? '');
    const next = at === undefined ? this.#nearest(by) : at + by;
    const found = findings[Math.min(findings.length - 1, Math.max(0, next))]!;
    this.showFinding(found.id);
  }

  first(): void {
    const [first] = this.findings();
    if (first) this.showFinding(first.id);
  }

  foldAll(): void {
    this.#presses.clear();
    this.#opened.set([]);
  }

  /** Unfolds the first fold in the window, or the one nearest below it. */
  unfoldNext(): void {
    const stack = this.#stack();
    const { top } = this.#place();
    const next = rowsWithin(stack, top, totalOf(stack) - top).find((row) =>
      ['quiet', 'repeat'].includes(stack.segments[row.segment]!.kind),
    );
    if (next) this.unfold(stack.segments[next.segment] as Fold, 'top');
  }

  protected unfold(fold: Fold, from: 'top' | 'bottom'): void {
    this.#anchor =
      from === 'top'
        ? { line: fold.from - 1, finding: null, below: this.#belowOf(fold.from - 1) }
        : { line: fold.to + 1, finding: null, below: this.#belowOf(fold.to + 1) };
    this.#open(this.#presses.press(fold, from));
  }
  protected unfoldWhole(fold: Fold): void {
    this.#anchor = { line: fold.from - 1, finding: null, below: this.#belowOf(fold.from - 1) };
    this.#open(fold);
  }

  /** Whole pixels, or the rows below would stand between two and blur. */
  protected keepHeight(id: string, card: number): void {
    const height = Math.ceil(card) + AROUND_CARD;
    if (this.#heights().get(id) === height) return;
    this.#heights.update((heights) => new Map(heights).set(id, height));
  }

  /** Enter on the report itself, not on a fold's own button. */
  protected unfoldByKey(event: Event): void {
    if (event.target !== event.currentTarget) return;
    event.preventDefault();
    this.unfoldNext();
  }

  protected scrolled(): void {
    const bar = this.scroller().nativeElement.scrollTop;
    const before = this.#place();
    if (Math.abs(bar - before.bar) < 1) return;
    this.#anchor = null;
    const place = follow(before, bar, this.#size());
    this.#place.set(place);
    clearTimeout(this.#restTimer);
    if (isStuck(place, this.#size())) this.#moveTo(place.top);
    else this.#restTimer = setTimeout(() => this.#setBarRight(), AT_REST);
  }

  #open(range: LineRange): void {
    this.#opened.update((opened) => joinRanges([...opened, range], Math.max(1, this.lineCount())));
  }

  #goTo(anchor: RowAnchor): void {
    // The row comes into the window; the window itself must be on the screen too.
    this.scroller().nativeElement.scrollIntoView?.({ block: 'nearest' });
    this.#anchor = anchor;
    this.#holdStill();
  }

  /** Keeps the anchor where it stood after rows around it changed their heights. */
  #holdStill(): void {
    const size = this.#size();
    const top = this.#anchor ? topFor(this.#stack(), this.#anchor, this.#indexOf()) : null;
    const wanted = placeAt(top ?? this.#place().top, size).top;
    const moved = Math.abs(wanted - this.#place().top) > 0.5;
    const element = this.scroller().nativeElement;
    if (moved || Math.abs(element.scrollTop - this.#place().bar) >= 1) this.#moveTo(wanted);
    this.#anchor ??= anchorAt(this.#stack(), this.#place().top, this.findings());
  }

  #moveTo(top: number): void {
    const place = placeAt(top, this.#size());
    const element = this.scroller().nativeElement;
    element.scrollTop = place.bar;
    // Browsers round to what their screen can show, and clip while the element is still lower.
    this.#place.set({ top: place.top, bar: element.scrollTop });
  }

  #setBarRight(): void {
    if (isAstray(this.#place(), this.#size())) this.#moveTo(this.#place().top);
    this.#anchor = anchorAt(this.#stack(), this.#place().top, this.findings());
  }

  #belowOf(line: number): number {
    const top = topFor(this.#stack(), { line, finding: null, below: 0 }, this.#indexOf());
    return (top ?? 0) - this.#place().top;
  }

  /** With no finding current, reading begins from what is in the window. */
  #nearest(by: 1 | -1): number {
    const line = anchorAt(this.#stack(), this.#place().top, this.findings())?.line ?? 1;
    const findings = this.findings();
    if (by === 1) {
      const after = findings.findIndex((each) => line <= each.line);
      return after < 0 ? findings.length - 1 : after;
    }
    return findings.findLastIndex((each) => each.line < line);
  }

  #watchSize(): void {
    const element = this.scroller().nativeElement;
    const measure = (): void => {
      if (element.clientHeight > 0) this.#view.set(element.clientHeight);
      this.width.set(element.clientWidth);
    };
    measure();
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    this.#destroyRef.onDestroy(() => observer.disconnect());
  }
}
