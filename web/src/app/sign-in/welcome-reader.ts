import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { Welcome } from '#contracts';
import { welcomeSchema } from '#contracts';
import { withoutRefresh } from '../http/no-refresh';
import { parsed } from '../http/parsed';

/** What an unsigned visitor may know; reading it also hands out the anti-forgery cookie. */
@Injectable({ providedIn: 'root' })
export class WelcomeReader {
  readonly #http = inject(HttpClient);

  read(): Observable<Welcome> {
    return this.#http
      .get('/api/v1/welcome', { context: withoutRefresh() })
      .pipe(parsed(welcomeSchema));
  }
}
