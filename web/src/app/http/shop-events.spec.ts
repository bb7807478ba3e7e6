import { TestBed } from '@angular/core/testing';
import { CHECK, aSession } from '../testing/records';
import { FakeEvents, setUp } from '../testing/set-up';
import { ShopEvents } from './shop-events';

const progress = { checkId: CHECK, state: 'running', linesRead: 10, lines: 80, verdict: null };

describe('ShopEvents', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('opens one stream for all who listen and closes it with the last', () => {
    setUp();
    const events = TestBed.inject(ShopEvents);
    const one = events.progress$.subscribe();
    const other = events.progress$.subscribe();
    expect(FakeEvents.all).toHaveLength(1);
    one.unsubscribe();
    expect(FakeEvents.all[0]?.isClosed).toBe(false);
    other.unsubscribe();
    expect(FakeEvents.all[0]?.isClosed).toBe(true);
  });

  it('remembers the newest word on a check and drops what it cannot read', () => {
    setUp();
    const events = TestBed.inject(ShopEvents);
    const heard: unknown[] = [];
    const listening = events.progress$.subscribe((each) => heard.push(each));
    const [stream] = FakeEvents.all;
    stream?.onopen?.();
    expect(events.live()).toBe(true);
    stream?.say(progress);
    stream?.say({ checkId: 'not an id' });
    stream?.onmessage?.({ data: '{broken' });
    stream?.say({ ...progress, linesRead: 20 });
    expect(heard).toHaveLength(2);
    expect(events.byCheck().get(CHECK)?.linesRead).toBe(20);
    listening.unsubscribe();
  });

  it('opens a refused stream again with a fresh token, later each time', async () => {
    const http = setUp();
    const events = TestBed.inject(ShopEvents);
    const listening = events.progress$.subscribe();
    for (const [pause, opened] of [
      [2_000, 2],
      [4_000, 3],
    ] as const) {
      const stream = FakeEvents.all.at(-1);
      Object.assign(stream ?? {}, { readyState: 2 });
      stream?.onerror?.();
      expect(events.live()).toBe(false);
      await vi.advanceTimersByTimeAsync(pause - 1);
      http.expectNone('/api/v1/session/refresh');
      await vi.advanceTimersByTimeAsync(1);
      http.expectOne('/api/v1/session/refresh').flush(aSession());
      expect(FakeEvents.all).toHaveLength(opened);
    }
    listening.unsubscribe();
  });

  it('leaves a broken connection to the browser, which mends it', () => {
    setUp();
    const events = TestBed.inject(ShopEvents);
    const listening = events.progress$.subscribe();
    FakeEvents.all[0]?.onopen?.();
    FakeEvents.all[0]?.onerror?.();
    expect(events.live()).toBe(false);
    expect(FakeEvents.all).toHaveLength(1);
    listening.unsubscribe();
  });
});
