import { TestBed } from '@angular/core/testing';
import { BenchStore } from '../bench/bench-store';
import { EAST, aBench, aCheck } from '../testing/records';
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

  it('says on the bench’s line how many checks need someone', async () => {
    const http = setUp();
    await signInAs(http, 'operator');
    TestBed.runInInjectionContext(() => TestBed.inject(BenchStore).follow());
    const checks = [
      aCheck({ verdict: 'stopped' }),
      aCheck({ machineId: EAST, verdict: 'clear', outOfDate: true }),
    ];
    http.expectOne('/api/v1/bench').flush(aBench({ checks }));
    const fixture = TestBed.createComponent(Navigation);
    await settle(fixture);
    const badge = (fixture.nativeElement as HTMLElement).querySelector('.badge');
    expect(badge?.textContent).toBe('2 checks need someone');
  });
});
