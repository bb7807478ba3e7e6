import { inject } from '@angular/core';
import type { CanDeactivateFn } from '@angular/router';
import { Confirm } from '../confirm/confirm';

/** A page that may hold changes nobody saved yet. */
export interface HoldsUnsaved {
  /** Whether leaving now would lose something typed. */
  hasUnsaved(): boolean;
}

/** Asks before a page with unsaved changes is left; the person may stay and save. */
export const unsavedGuard: CanDeactivateFn<HoldsUnsaved> = (page) => {
  if (!page.hasUnsaved()) return true;
  return inject(Confirm).ask({
    heading: 'Leave without saving?',
    text: 'What you changed on this page is not saved yet. Leaving drops it.',
    act: 'Leave and drop it',
    leave: 'Stay here',
    takesAway: true,
  });
};
