import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  afterNextRender,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { select } from 'd3-selection';
import { zoom, zoomIdentity, type ZoomBehavior, type ZoomTransform } from 'd3-zoom';
import type { PlanPath, Units } from '#contracts';
import type { JobSheet, Machine, Offsets, Rack } from '#engine';
import { wordFigure } from '../facts/measure';
import type { PathMark, PathTool } from './draw-path';
import { drawPath, findMark, pathBox, pathTools } from './draw-path';
import { keepApart, layOutPlan } from './lay-out-plan';

const USUAL_WIDTH = 340;
const TALLEST = 560;
const MARGIN = 22;
const GREATEST_ZOOM = 80;
const ZOOM_STEP = 1.5;
/** How far a drawn path may lie from the true one (px): below what an eye can tell. */
const UNSEEN = 0.35;
/** Tools beyond this many share colours and dashes again; the numbers always tell them apart. */
const LOOKS = 8;

/**
 * The table from above: travel, rack and forks, zones, spoilboard, stock, work zero and the path of
 * each tool. Zooms by wheel with Ctrl, pinch, buttons and keys, and says the same in a table.
 */
@Component({
  selector: 'nl-table-plan',
  templateUrl: './table-plan.html',
  styleUrl: './table-plan.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TablePlan {
  readonly #destroyRef = inject(DestroyRef);

  readonly machine = input.required<Machine>();
  readonly rack = input.required<Rack>();
  readonly work = input.required<Offsets['work']>();
  readonly job = input<JobSheet>();
  readonly path = input<PlanPath | null>(null);
  /** The place a finding speaks of. */
  readonly mark = input<PathMark | null>(null);
  /** A tool that another part of the page points at. */
  readonly pointedOut = input<number | null>(null);
  readonly units = input<Units>('mm');

  private readonly frame = viewChild.required<ElementRef<HTMLElement>>('frame');

  protected readonly zoomStep = ZOOM_STEP;
  readonly #width = signal(USUAL_WIDTH);
  readonly #transform = signal<ZoomTransform>(zoomIdentity);
  /** The tool shown alone; null: all. */
  protected readonly only = linkedSignal<PlanPath | null, number | null>({
    source: this.path,
    computation: () => null,
  });
  #zoom: ZoomBehavior<HTMLElement, unknown> | null = null;

  readonly #runs = computed(() => this.path()?.runs ?? []);
  protected readonly plan = computed(() =>
    layOutPlan({
      machine: this.machine(),
      rack: this.rack(),
      work: this.work(),
      job: this.job(),
      path: pathBox(this.#runs()),
    }),
  );
  /** Pixels a millimetre before zooming, and the size of the picture. */
  protected readonly fit = computed(() => {
    const { bounds } = this.plan();
    const width = this.#width();
    const scale = Math.min(
      (width - 2 * MARGIN) / Math.max(1, bounds.width),
      (TALLEST - 2 * MARGIN) / Math.max(1, bounds.height),
    );
    const height = bounds.height * scale + 2 * MARGIN;
    const left = (width - bounds.width * scale) / 2 - bounds.x * scale;
    return { scale, width, height, left, top: MARGIN + (bounds.y + bounds.height) * scale };
  });
  protected readonly zoomed = computed(() => this.#transform().toString());
  /** Machine millimetres to pixels: X to the right, Y up. */
  protected readonly onTable = computed(() => {
    const { scale, left, top } = this.fit();
    return `matrix(${scale} 0 0 ${-scale} ${left} ${top})`;
  });
  /** Scale by powers of two: the path is drawn anew only when the zoom has changed that much. */
  readonly #detail = computed(() => {
    const pixels = this.fit().scale * this.#transform().k;
    return 2 ** Math.ceil(Math.log2(Math.max(1e-6, pixels)));
  });
  protected readonly tools = computed(() => pathTools(this.#runs()));
  readonly #lookOf = computed(
    () => new Map(this.tools().map(({ tool }, index) => [tool, index % LOOKS] as const)),
  );
  protected readonly paths = computed(() =>
    drawPath(this.#runs(), UNSEEN / this.#detail())
      .map((path) => ({ ...path, look: `look${this.#lookOf().get(path.tool) ?? 0}` }))
      // Rapids lie under what is cut.
      .sort((a, b) => Number(a.kind === 'feed') - Number(b.kind === 'feed')),
  );
  /** Labels keep their size while the drawing under them grows. */
  protected readonly labels = computed(() => {
    const { travel, zeros } = this.plan();
    const placed = [
      ...zeros.map(({ name, x, y }) => ({ kind: 'zero' as const, name, look: '', tool: 0, x, y })),
      ...this.tools().map((each) => ({
        kind: 'tool' as const,
        name: this.nameOf(each.tool),
        look: this.lookOf(each),
        tool: each.tool,
        x: each.start[0],
        y: each.start[1],
      })),
      {
        kind: 'edge' as const,
        name: 'front',
        look: '',
        tool: 0,
        x: travel.x + travel.width / 2,
        y: travel.y,
      },
    ].map((label) => this.#labelAt(label));
    return keepApart(placed);
  });
  protected readonly marked = computed(() => {
    const mark = this.mark();
    const found = mark && findMark(this.#runs(), mark);
    if (!mark || !found) return null;
    const label = this.#labelAt({ ...found, name: mark.words });
    const isRight = label.across > this.fit().width / 2;
    return {
      ...found,
      severity: mark.severity,
      words: found.exact ? mark.words : `about ${mark.words}`,
      at: label.at,
      anchor: isRight ? 'end' : 'start',
      dx: isRight ? -9 : 9,
    };
  });
  protected readonly sentence = computed(() => {
    const { travel, zeros, stock } = this.plan();
    const figure = (value: number) => wordFigure(round(value), 'length', this.units());
    const zero = zeros.map(
      (each) => `${each.name} zero at X ${figure(each.x)}, Y ${figure(each.y)}`,
    );
    const parts = [
      `Table from above. Travel ${figure(travel.width)} by ${figure(travel.height)}`,
      ...zero,
      ...(stock ? [`stock ${figure(stock.width)} by ${figure(stock.height)}`] : []),
    ];
    return `${parts.join('; ')}.`;
  });

  constructor() {
    afterNextRender(() => {
      this.#watchSize();
      this.#listen();
    });
  }

  protected nameOf(tool: number | null): string {
    if (tool === null) return 'spindle as found';
    return tool === 0 ? 'no tool' : `T${tool}`;
  }
  protected lookOf(each: PathTool): string {
    return `look${this.#lookOf().get(each.tool) ?? 0}`;
  }
  protected isBack(tool: number | null): boolean {
    const shown = this.only() ?? this.pointedOut();
    return shown !== null && shown !== tool && this.tools().some((each) => each.tool === shown);
  }
  protected toggle(tool: number | null): void {
    this.only.update((only) => (only === tool ? null : tool));
  }
  protected extent(each: PathTool, axis: 'x' | 'y'): string {
    const from = each.box[axis];
    const to = from + (axis === 'x' ? each.box.width : each.box.height);
    const figure = (value: number) => wordFigure(round(value), 'length', this.units());
    return `${figure(from)} to ${figure(to)}`;
  }

  protected zoomBy(factor: number): void {
    this.#zoom?.scaleBy(select(this.frame().nativeElement), factor);
  }
  protected zoomOut(): void {
    this.zoomBy(1 / ZOOM_STEP);
  }
  protected showAll(): void {
    this.#zoom?.transform(select(this.frame().nativeElement), zoomIdentity);
  }
  protected moveByKey(event: KeyboardEvent): void {
    if (event.ctrlKey || event.altKey || event.metaKey) return;
    const acts: Readonly<Record<string, () => void>> = {
      ArrowLeft: () => this.#move(1, 0),
      ArrowRight: () => this.#move(-1, 0),
      ArrowUp: () => this.#move(0, 1),
      ArrowDown: () => this.#move(0, -1),
      '+': () => this.zoomBy(ZOOM_STEP),
      '=': () => this.zoomBy(ZOOM_STEP),
      '-': () => this.zoomOut(),
      '0': () => this.showAll(),
    };
    const act = acts[event.key];
    if (!act) return;
    event.preventDefault();
    act();
  }

  /** Where a label stands on the screen, zoomed, and how wide it is about. */
  #labelAt<Label extends { readonly name: string; readonly x: number; readonly y: number }>(
    label: Label,
  ) {
    const { scale, left, top } = this.fit();
    const { k } = this.#transform();
    const across = left + label.x * scale;
    const down = top - label.y * scale;
    return {
      ...label,
      across,
      at: `translate(${across} ${down}) scale(${1 / k})`,
      x: across * k,
      y: down * k,
      width: 10 + 8 * label.name.length,
    };
  }

  #move(right: number, down: number): void {
    const step = 40 / this.#transform().k;
    this.#zoom?.translateBy(select(this.frame().nativeElement), right * step, down * step);
  }

  #listen(): void {
    this.#zoom = zoom<HTMLElement, unknown>()
      .scaleExtent([1, GREATEST_ZOOM])
      .extent(() => from00(this.fit()))
      .translateExtent(from00(this.fit()))
      // A plain wheel and a finger scroll the page; only what clearly means the plan moves it.
      .filter((event: Event) => meansPlan(event, this.#transform().k))
      .on('zoom', ({ transform }: { transform: ZoomTransform }) => this.#transform.set(transform));
    select(this.frame().nativeElement).call(this.#zoom);
  }

  #watchSize(): void {
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => {
      if (!entry || entry.contentRect.width <= 0) return;
      this.#width.set(entry.contentRect.width);
      this.#zoom?.translateExtent(from00(this.fit()));
    });
    observer.observe(this.frame().nativeElement);
    this.#destroyRef.onDestroy(() => observer.disconnect());
  }
}

function from00(size: {
  readonly width: number;
  readonly height: number;
}): [[number, number], [number, number]] {
  return [
    [0, 0],
    [size.width, size.height],
  ];
}

function meansPlan(event: Event, zoomedTo: number): boolean {
  if (event instanceof WheelEvent) return event.ctrlKey || event.metaKey;
  if (typeof TouchEvent !== 'undefined' && event instanceof TouchEvent) {
    return event.touches.length > 1 || zoomedTo > 1;
  }
  return !(event instanceof MouseEvent) || event.button === 0;
}
function round(value: number): number {
  return Math.round(value * 100) / 100;
}
