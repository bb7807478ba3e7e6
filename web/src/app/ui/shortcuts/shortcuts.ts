import { DOCUMENT, DestroyRef, Injectable, inject, signal } from '@angular/core';
import type { Shortcut } from './shortcut';
import { matchKey } from './shortcut';

const KEPT_AS = 'nightlatch.shortcuts';
/** The second key of a pair must follow within this (ms); after a longer pause it stands alone. */
const PAIR_PAUSE = 1500;

/**
 * Keys that act without a modifier. They rest while a field is being typed in or a dialog is open,
 * and a person can turn them off (WCAG 2.1.4), for speech input types letters.
 */
@Injectable({ providedIn: 'root' })
export class Shortcuts {
  readonly #document = inject(DOCUMENT);
  readonly #all = signal<readonly Shortcut[]>([]);
  readonly #on = signal(this.#storage()?.getItem(KEPT_AS) !== 'off');
  #begun = '';
  #begunAt = 0;

  readonly all = this.#all.asReadonly();
  readonly on = this.#on.asReadonly();

  constructor() {
    this.#document.addEventListener('keydown', (event) => this.#press(event));
  }

  /** Adds shortcuts for as long as the caller lives. Call in an injection context. */
  add(...shortcuts: readonly Shortcut[]): void {
    this.#all.update((all) => [...all, ...shortcuts]);
    inject(DestroyRef).onDestroy(() =>
      this.#all.update((all) => all.filter((each) => !shortcuts.includes(each))),
    );
  }

  turn(on: boolean): void {
    this.#on.set(on);
    this.#storage()?.setItem(KEPT_AS, on ? 'on' : 'off');
  }

  #press(event: KeyboardEvent): void {
    if (!this.#on() || event.ctrlKey || event.altKey || event.metaKey) return;
    if (event.defaultPrevented || isTyping(event.target)) return;
    if (this.#document.querySelector('[role=dialog], [role=alertdialog], [role=menu]')) return;
    const begun = event.timeStamp - this.#begunAt <= PAIR_PAUSE ? this.#begun : '';
    this.#begun = '';
    const match = matchKey(this.#all(), begun, event.key);
    if (match.kind === 'none') return;
    event.preventDefault();
    if (match.kind === 'whole') return match.shortcut.run();
    this.#begun = match.first;
    this.#begunAt = event.timeStamp;
  }

  #storage(): Storage | undefined {
    return this.#document.defaultView?.localStorage;
  }
}

/** Whether the key goes into a field: then it is text, not an act. */
function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target.isContentEditable) return true;
  if (target instanceof HTMLInputElement)
    return !['checkbox', 'radio', 'button', 'file'].includes(target.type);
  return target.matches('textarea, select, [role=combobox], [role=listbox], [role=textbox]');
}
