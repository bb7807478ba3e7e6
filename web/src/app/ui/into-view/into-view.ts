import { Directive, ElementRef, afterNextRender, inject } from '@angular/core';

/** Brings what was just said into view: on a phone the button that caused it is screens away. */
@Directive({ selector: '[nlIntoView]' })
export class IntoView {
  constructor() {
    const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    afterNextRender(() => bringIntoView(element));
  }
}

/** Room is left above for the bar that stays at the top of a narrow page. */
export function bringIntoView(element: HTMLElement): void {
  element.style.scrollMarginTop = '4.5rem';
  // Not every test browser lays pages out.
  element.scrollIntoView?.({ block: 'nearest' });
}
