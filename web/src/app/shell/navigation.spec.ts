import { TestBed } from '@angular/core/testing';
import { BenchStore } from '../bench/bench-store';
import { aBench } from '../testing/records';
import { setUp, settle, signInAs } from '../testing/set-up';
import { Navigation } from './navigation';

describe('Navigation', () => {
  it('lists the places that are built, and no others', async () => {
    setUp();
    const fixture = TestBed.createComponent(Navigation);
    await fixture.whenStable();
    const places = [...(fixture.nativeElement as HTMLElement).querySelectorAll('.place')];
    expect(places.map((place) => place.textContent.trim())).toEqual([
      'Bench',
      'Programs',
      'Rack',
      'Tools',
      'Machine',
      'Change macro',
      'Shop',
    ]);
  });

  it('says on the bench’s line how many programs need someone', async () => {
    const http = setUp();
    await signInAs(http, 'operator');
    TestBed.runInInjectionContext(() => TestBed.inject(BenchStore).follow());
    const counts = { waiting: 5, stopped: 2, held: 1, clear: 9, outOfDate: 1 };
    http.expectOne('/api/v1/bench').flush(aBench({ counts }));
    const fixture = TestBed.createComponent(Navigation);
    await settle(fixture);
    const badge = (fixture.nativeElement as HTMLElement).querySelector('.badge');
    expect(badge?.textContent).toBe('4 programs need someone');
  });
});
