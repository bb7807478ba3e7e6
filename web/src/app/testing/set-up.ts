import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideAppInitializer } from '@angular/core';
import type { ComponentFixture } from '@angular/core/testing';
import { TestBed } from '@angular/core/testing';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import type { Routes } from '@angular/router';
import { provideRouter, withComponentInputBinding } from '@angular/router';
import type { Role } from '#contracts';
import { OPEN_EVENTS } from '../http/event-stream';
import { problemInterceptor } from '../http/problem-interceptor';
import { refreshInterceptor } from '../http/refresh-interceptor';
import { CurrentUser } from '../sign-in/current-user';
import { registerIcons } from '../ui/register-icons';
import { aSession } from './records';

/** A stream of events that a spec opens, feeds and breaks by hand. */
export class FakeEvents {
  static readonly all: FakeEvents[] = [];
  onopen: (() => void) | null = null;
  onmessage: ((event: { data: string }) => void) | null = null;
  onerror: (() => void) | null = null;
  readyState = 0;
  isClosed = false;
  close(): void {
    this.isClosed = true;
  }
  say(data: unknown): void {
    this.onmessage?.({ data: JSON.stringify(data) });
  }
}

/** The client's own HTTP chain over a fake network, a router and a fake event stream. */
export function setUp(routes: Routes = [{ path: '**', children: [] }]): HttpTestingController {
  FakeEvents.all.length = 0;
  localStorage.clear();
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([problemInterceptor, refreshInterceptor])),
      provideHttpClientTesting(),
      provideRouter(routes, withComponentInputBinding()),
      provideAppInitializer(() => registerIcons()),
      { provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } },
      {
        provide: OPEN_EVENTS,
        useValue: () => {
          const events = new FakeEvents();
          FakeEvents.all.push(events);
          return events;
        },
      },
    ],
  });
  return TestBed.inject(HttpTestingController);
}

/** Signs a person with these roles in. */
export async function signInAs(http: HttpTestingController, ...roles: Role[]): Promise<void> {
  const resumed = TestBed.inject(CurrentUser).resume();
  http.expectOne('/api/v1/session').flush(aSession(roles));
  await resumed;
}

/** Lets promises and effects that are due run, and the page, when it is given, be drawn after them. */
export async function settle(page?: ComponentFixture<unknown>): Promise<void> {
  await new Promise((resolve) => setTimeout(resolve));
  await page?.whenStable();
}
