import { HttpClient } from '@angular/common/http';
import { Injectable, computed, inject, signal } from '@angular/core';
import { Router } from '@angular/router';
import type { Observable } from 'rxjs';
import {
  catchError,
  finalize,
  firstValueFrom,
  of,
  shareReplay,
  switchMap,
  tap,
  throwError,
  timer,
} from 'rxjs';
import type {
  FirstPerson,
  OwnChange,
  Permission,
  Person,
  Session,
  SignIn,
  Units,
} from '#contracts';
import { may, personSchema, sessionSchema } from '#contracts';
import { withoutRefresh } from '../http/no-refresh';
import { parsed } from '../http/parsed';
import { toProblemError } from '../http/problem-error';

/** A session with less than this left is about to end (ms). */
const ABOUT_TO_END = 60_000;
/** So long after another tab renewed the session its cookies are surely here (ms). */
const TWIN_PAUSE = 1_000;

/** Who sits at this screen, what they may do and in which units they think. */
@Injectable({ providedIn: 'root' })
export class CurrentUser {
  readonly #http = inject(HttpClient);
  readonly #router = inject(Router);
  readonly #session = signal<Session | null>(null);
  #refreshing: Observable<Session> | null = null;

  readonly session = this.#session.asReadonly();
  readonly person = computed<Person | null>(() => this.#session()?.person ?? null);
  readonly shop = computed(() => this.#session()?.shop ?? null);
  readonly units = computed<Units>(() => this.person()?.units ?? 'mm');

  /** Whether any of the person's roles grants it. Reads a signal: use it in templates and computeds. */
  may(permission: Permission): boolean {
    return may(this.person()?.roles ?? [], permission);
  }

  /** The session the cookies stand for, or null when there is none. */
  async resume(): Promise<Session | null> {
    if (this.#session()) return this.#session();
    try {
      return await firstValueFrom(this.#keep(this.#http.get('/api/v1/session')));
    } catch (error) {
      if (isUnauthorised(error)) return null;
      throw error;
    }
  }

  signIn(body: SignIn): Observable<Session> {
    return this.#keep(this.#http.post('/api/v1/session', body, { context: withoutRefresh() }));
  }

  makeFirstPerson(body: FirstPerson): Observable<Session> {
    const context = withoutRefresh();
    return this.#keep(this.#http.post('/api/v1/first-person', body, { context }));
  }

  /** A new access token; requests that ask at the same moment share one exchange. */
  refresh(): Observable<Session> {
    this.#refreshing ??= this.#renew().pipe(
      finalize(() => (this.#refreshing = null)),
      shareReplay(1),
    );
    return this.#refreshing;
  }

  /** Renews the session now if it is about to end: before a long upload, which is read only once. */
  freshen(): Observable<unknown> {
    const ends = Date.parse(this.#session()?.expiresAt ?? '');
    if (ABOUT_TO_END < ends - Date.now()) return of(null);
    // Whatever is wrong, the request that follows will say so in its own words.
    return this.refresh().pipe(catchError(() => of(null)));
  }

  changeOwn(change: OwnChange): Observable<Person> {
    return this.#http.patch('/api/v1/session/person', change).pipe(
      parsed(personSchema),
      tap((person) =>
        this.#session.update((session) => (session ? { ...session, person } : session)),
      ),
    );
  }

  /** The shop's name or limit was changed here: keep the session in step. */
  shopChanged(shop: Session['shop']): void {
    this.#session.update((session) => (session ? { ...session, shop } : session));
  }

  async signOut(): Promise<void> {
    await firstValueFrom(this.#http.delete('/api/v1/session'), { defaultValue: null });
    this.#session.set(null);
    await this.#router.navigate(['/sign-in']);
  }

  /** The server no longer knows this session: ask again, then return to the page left. */
  sessionEnded(): void {
    const wasSignedIn = this.#session() !== null;
    this.#session.set(null);
    if (!wasSignedIn) return;
    void this.#router.navigate(['/sign-in'], {
      queryParams: { then: this.#router.url, ended: true },
    });
  }

  #renew(): Observable<Session> {
    const context = withoutRefresh();
    return this.#keep(this.#http.post('/api/v1/session/refresh', {}, { context })).pipe(
      catchError((error: unknown) => {
        if (toProblemError(error).code !== 'session-just-renewed') return throwError(() => error);
        // Another tab was first: its cookies are ours too, once they have arrived.
        return timer(TWIN_PAUSE).pipe(
          switchMap(() => this.#keep(this.#http.get('/api/v1/session', { context }))),
        );
      }),
    );
  }

  #keep(reply: Observable<unknown>): Observable<Session> {
    return reply.pipe(
      parsed(sessionSchema),
      tap((session) => this.#session.set(session)),
    );
  }
}

function isUnauthorised(error: unknown): boolean {
  return typeof error === 'object' && error !== null && 'status' in error && error.status === 401;
}
