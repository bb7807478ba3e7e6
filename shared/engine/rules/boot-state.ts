import type { DeedEvent } from '../interpreter/events';

/**
 * Whether a boot that lifts or docks is down. A program starts with it down, as a cut needs it, and a
 * boot nobody lifted is one to run into.
 */
export function bootAfter(event: DeedEvent, isDown: boolean): boolean {
  switch (event.does) {
    case 'boot-up':
    case 'boot-dock':
      return false;
    case 'boot-down':
    case 'boot-fetch':
      return true;
    default:
      return isDown;
  }
}
