import { InjectionToken } from '@angular/core';

/** Opens a stream of server-sent events; a token, so that tests can hand out one of their own. */
export const OPEN_EVENTS = new InjectionToken<(address: string) => EventSource>('open events', {
  providedIn: 'root',
  factory: () => (address) => new EventSource(address),
});
