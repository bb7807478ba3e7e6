import { HttpClient } from '@angular/common/http';
import { Injectable, computed, inject, signal } from '@angular/core';
import { Router } from '@angular/router';
import type { Observable } from 'rxjs';
import { finalize, firstValueFrom, shareReplay, tap } from 'rxjs';
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
import { parsed } from '../http/parsed';

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
    return this.#keep(this.#http.post('/api/v1/session', body));
  }

  makeFirstPerson(body: FirstPerson): Observable<Session> {
    return this.#keep(this.#http.post('/api/v1/first-person', body));
  }

  /** A new access token; requests that ask at the same moment share one exchange. */
  refresh(): Observable<Session> {
    this.#refreshing ??= this.#keep(this.#http.post('/api/v1/session/refresh', {})).pipe(
      finalize(() => (this.#refreshing = null)),
      shareReplay(1),
    );
    return this.#refreshing;
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
