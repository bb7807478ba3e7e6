import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { CheckRecord } from '#contracts';
import { checkSchema } from '#contracts';
import { parsed } from '../http/parsed';

/** Asks for a check of one program revision against one machine as it stands now. */
@Injectable({ providedIn: 'root' })
export class CheckStarter {
  readonly #http = inject(HttpClient);

  start(revisionId: string, machineId: string): Observable<CheckRecord> {
    return this.#http
      .post(`/api/v1/program-revisions/${revisionId}/checks`, { machineId })
      .pipe(parsed(checkSchema));
  }
}
