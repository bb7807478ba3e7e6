import { DestroyRef, Directive, ElementRef, afterNextRender, inject, output } from '@angular/core';

/** Tells how high an element is drawn, px, and again whenever that changes. */
@Directive({ selector: '[nlMeasuredHeight]' })
export class MeasuredHeight {
  readonly #element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  readonly #destroyRef = inject(DestroyRef);

  readonly nlMeasuredHeight = output<number>();

  constructor() {
    afterNextRender(() => {
      if (typeof ResizeObserver === 'undefined') return;
      const observer = new ResizeObserver(() => {
        const height = this.#element.getBoundingClientRect().height;
        if (height > 0) this.nlMeasuredHeight.emit(height);
      });
      observer.observe(this.#element);
      this.#destroyRef.onDestroy(() => observer.disconnect());
    });
  }
}
