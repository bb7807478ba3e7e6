import type { HttpTestingController, TestRequest } from '@angular/common/http/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { TestBed } from '@angular/core/testing';

/** Turns given to the page before a request counts as not sent; promises and effects need a few. */
const TURNS = 30;

/** The request to this address, once the page has got round to sending it. */
export async function awaitRequest(
  http: HttpTestingController,
  url: string,
  method = 'GET',
): Promise<TestRequest> {
  for (let turn = 0; turn < TURNS; turn += 1) {
    const [request] = http.match((each) => each.url === url && each.method === method);
    if (request) return request;
    await eventLoop();
    TestBed.tick();
  }
  return http.expectOne({ url, method });
}

/** Lets an answer reach the page and be drawn. */
export async function settle(fixture: ComponentFixture<unknown>): Promise<void> {
  for (let turn = 0; turn < TURNS; turn += 1) {
    await eventLoop();
    TestBed.tick();
  }
  await fixture.whenStable();
}

/** One turn of the event loop: harnesses and dialogs wait for timers, not for promises alone. */
function eventLoop(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve));
}
