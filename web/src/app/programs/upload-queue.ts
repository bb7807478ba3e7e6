import type { HttpEvent } from '@angular/common/http';
import { HttpClient, HttpEventType } from '@angular/common/http';
import { DOCUMENT, Injectable, computed, inject, signal } from '@angular/core';
import type { Observable } from 'rxjs';
import { Subject, catchError, filter, map, mergeMap, of, switchMap, takeUntil, tap } from 'rxjs';
import { uploadResultSchema } from '#contracts';
import { toProblemError, unexpectedReply } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import type { UploadItem, UploadState } from './upload-item';
import { isUnderWay, refusalBeforehand, stateOfAnswer, stateOfProblem } from './upload-item';

/** So many files go out at the same time: one stores while the next is on the wire. */
const AT_ONCE = 2;

/**
 * The files on their way into the shop, each in a request of its own, so that each has its own
 * progress and its own refusal. It lives as long as the application: leaving the page stops nothing.
 */
@Injectable({ providedIn: 'root' })
export class UploadQueue {
  readonly #http = inject(HttpClient);
  readonly #user = inject(CurrentUser);
  readonly #items = signal<readonly UploadItem[]>([]);
  readonly #files = new Map<number, File>();
  readonly #waiting = new Subject<number>();
  readonly #dropped = new Subject<number>();
  readonly #stored = new Subject<UploadItem>();
  #lastId = 0;

  readonly items = this.#items.asReadonly();
  readonly isSending = computed(() => this.#items().some(isUnderWay));
  /** One file arrived whole and its check is queued. */
  readonly stored$ = this.#stored.asObservable();

  constructor() {
    this.#waiting.pipe(mergeMap((id) => this.#send(id), AT_ONCE)).subscribe();
    inject(DOCUMENT).defaultView?.addEventListener('beforeunload', (event) => {
      if (this.isSending()) event.preventDefault();
    });
  }

  add(files: readonly File[], machineId: string): void {
    const limit = this.#user.shop()?.uploadLimitBytes ?? Infinity;
    const added = files.map((file): UploadItem => {
      const id = ++this.#lastId;
      this.#files.set(id, file);
      const state = refusalBeforehand(file, limit) ?? { step: 'waiting' };
      return { id, name: file.name, bytes: file.size, machineId, state };
    });
    this.#items.update((items) => [...added, ...items]);
    for (const item of added) if (isUnderWay(item)) this.#waiting.next(item.id);
  }

  sendAgain(id: number): void {
    this.#set(id, { step: 'waiting' });
    this.#waiting.next(id);
  }

  /** Takes a file off the list; one still on its way is broken off and not stored. */
  drop(id: number): void {
    this.#dropped.next(id);
    this.#files.delete(id);
    this.#items.update((items) => items.filter((item) => item.id !== id));
  }

  clearFinished(): void {
    for (const item of this.#items()) if (!isUnderWay(item)) this.drop(item.id);
  }

  #send(id: number): Observable<unknown> {
    const file = this.#files.get(id);
    const item = this.#items().find((each) => each.id === id);
    if (!file || !item) return of(null);
    const form = new FormData();
    form.append('files', file, file.name);
    this.#set(id, { step: 'sending', sent: 0 });
    const options = {
      params: { machineId: item.machineId },
      reportProgress: true,
      observe: 'events' as const,
    };
    return this.#user.freshen().pipe(
      switchMap(() => this.#http.post('/api/v1/programs', form, options)),
      map((event) => stateOfEvent(event, file.size)),
      filter((state) => state !== null),
      catchError((error: unknown) => of(stateOfProblem(toProblemError(error)))),
      tap((state) => this.#set(id, state)),
      takeUntil(this.#dropped.pipe(filter((dropped) => dropped === id))),
    );
  }

  #set(id: number, state: UploadState): void {
    this.#items.update((items) =>
      items.map((item) => (item.id === id ? { ...item, state } : item)),
    );
    if (state.step !== 'stored') return;
    this.#files.delete(id);
    const item = this.#items().find((each) => each.id === id);
    if (item) this.#stored.next(item);
  }
}

/** What an event of the request says about its file; null when nothing new. */
function stateOfEvent(event: HttpEvent<unknown>, bytes: number): UploadState | null {
  if (event.type === HttpEventType.UploadProgress) {
    // The form's own bytes come on top of the file's.
    return event.loaded < bytes ? { step: 'sending', sent: event.loaded } : { step: 'storing' };
  }
  if (event.type !== HttpEventType.Response) return null;
  const answer = uploadResultSchema.safeParse(event.body);
  if (!answer.success) throw unexpectedReply();
  return stateOfAnswer(answer.data);
}
